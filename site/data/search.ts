import { type Geometry, shownLabel } from '#engine';
import { lowSpinMultiplicity, possibleMultiplicities } from '../../scripts/content/spin.ts';
import { digits, signedDigits } from '../client/collection/digits.ts';
import { type PackedSearch, bandUnit, deltaUnit, heldLigands, usualFormula } from '../client/collection/packed.ts';
import { collectionPage, orderedResults } from './collection.ts';
import { groupBy } from './group.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';

/** What the search in the page reads, in the order of the book. */
export function searchData(tree: CollectionTree): PackedSearch {
  const [words, word] = places<string>();
  const [sets, set] = places<readonly number[]>();
  const [states, state] = places<PackedSearch['states'][number]>();
  const [circumstances, circumstance] = places<PackedSearch['circumstances'][number]>();
  const [outcomes, outcome] = places<PackedSearch['outcomes'][number]>();
  const [terms, term] = places<readonly number[]>();
  const ionPlace = new Map(tree.ions.map((row, place) => [row.name, place]));
  const ligandPlace = new Map(tree.ligands.map((row, place) => [row.id, place]));
  const racahB0 = new Map(tree.freeIons.filter((row) => row.set_name === tree.policy.free_ion_set).map((row) => [row.ion, row.B0]));
  const byComplex = [...groupBy(orderedResults(tree), (measurement) => measurement.complex)];
  const complexes = byComplex.map(([complex]) => complex);
  const rows = byComplex.flatMap(([, measurements]) => measurements);
  const deltas = rows.map(({ chosen }) => Math.round((chosen.parameters.Delta.value ?? 0) / deltaUnit));
  const ligands = tree.ligands.map((row) => ({
    name: row.name, formula: row.formula, abbreviation: row.abbreviation, synonyms: JSON.parse(row.synonyms) as string[], donors: JSON.parse(row.donors) as string[], charge: row.charge,
  }));
  const kindKey = (complex: ComplexNode): KindKey => {
    const held = complex.ligands.flatMap(({ row: link }) => [ligandPlace.get(link.ligand)!, link.count]);
    const usual = usualFormula(complex.ion, heldLigands(held, ligands)) === complex.row.formula;
    return { set: set(held), isomer: word(complex.row.isomer), tail: complex.row.id.slice(headOf(complex.row.id).length), formula: usual ? null : complex.row.formula.replace(complex.ion.metal, '*') };
  };
  const keys = complexes.map(kindKey);
  const kinds = [...new Map(keys.map((key) => [JSON.stringify(key), key])).entries()].sort(([, a], [, b]) => a.set - b.set || a.isomer - b.isomer || (a.tail < b.tail ? -1 : 1));
  const kindPlace = new Map(kinds.map(([key], place) => [key, place]));
  const packed: Pick<PackedSearch, 'kinds' | 'complexes' | 'rows'> = {
    kinds: {
      set: digits(kinds.map(([, key]) => key.set)), isomer: digits(kinds.map(([, key]) => key.isomer)), tail: kinds.map(([, key]) => key.tail).join(' '),
      formula: kinds.flatMap(([, { formula }], place) => formula === null ? [] : [[place, formula] as const]),
    },
    complexes: {
      state: digits(complexes.map(({ row, ion }) => state([ionPlace.get(ion.name)!, word(row.geometry), word(spinText(row, ion.electrons)), headOf(row.id)]))),
      kind: digits(keys.map((key) => kindPlace.get(JSON.stringify(key))!)),
      rows: digits(byComplex.map(([, measurements]) => measurements.length)),
      names: complexes.flatMap(({ row }, place) => row.name === null ? [] : [[place, row.name] as const]),
    },
    rows: {
      circumstance: digits(rows.map(({ row }) => circumstance([word(row.id), word(row.phase), word(row.medium ?? row.host ?? '')]))),
      outcome: digits(rows.map((measurement) => outcome([
        word(measurement.chosen.row.verdict), measurement.chosen.parameters.C.standing === 'fitted' ? 1 : 0, measurement.chosen.parameters.beta.value === null ? 0 : 1, measurement.bands.length,
        term(observedTerms(measurement).map(word)),
      ]))),
      deltaStep: signedDigits(deltas.map((delta, place) => delta - (deltas[place - 1] ?? 0))), racahB: digits(rows.map(({ chosen }) => Math.round(chosen.parameters.B.value ?? 0))),
      bands: digits(rows.flatMap(({ bands }) => bands.map(({ position }) => Math.round(position / bandUnit)))),
    },
  };
  return {
    counts: collectionPage(tree, 1).counts, ligands, ions: tree.ions.map(({ name, metal, oxidation, electrons }) => ({ name, metal, oxidation, electrons, racahB0: racahB0.get(name) ?? null })),
    ...packed, words: words(), sets: sets(), states: states(), circumstances: circumstances(), outcomes: outcomes(), terms: terms(),
  };
}

/** Each term once, as printed, that the chosen reading takes a band for. */
const observedTerms = ({ chosen, complex }: MeasurementNode): readonly string[] => [...new Set(chosen.transitions.map(({ row }) => shownLabel(row.label, complex.ion.electrons)))].sort();

interface KindKey {
  readonly set: number;
  readonly isomer: number;
  readonly tail: string;
  readonly formula: string | null;
}

/** "quartet", or "singlet, low spin" where the ion has a choice in its geometry. */
export function spinText({ spin, multiplicity, geometry, fitted }: ComplexNode['row'], electrons: number): string {
  if (spin === null) return '';
  const low = fitted === 1 ? lowSpinMultiplicity(electrons, geometry as Geometry) : null;
  if (low === null) return spin;
  return multiplicity === low ? `${spin}, low spin` : multiplicity === possibleMultiplicities(electrons)[0] ? `${spin}, high spin` : `${spin}, intermediate spin`;
}

/** An id up to its first hyphen, which is often the ion. */
const headOf = (id: string): string => /^[^-]*/.exec(id)![0];

/** A list that grows by each new value, and the place of a value in it. */
function places<Value>(): readonly [all: () => readonly Value[], place: (value: Value) => number] {
  const known = new Map<string, number>();
  const all: Value[] = [];
  return [() => all, (value) => {
    const key = JSON.stringify(value);
    const place = known.get(key) ?? all.length;
    if (place === all.length) {
      known.set(key, place);
      all.push(value);
    }
    return place;
  }];
}
