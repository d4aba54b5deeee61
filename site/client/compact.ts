import type { BandKind, FormulaKeys, SearchedLigand } from '#engine';
import { elementName, formulaKeys } from '#engine';
import type { ResultRow } from '../components/resultRow.ts';
import { formulaShown } from '../data/typeset.ts';

/** The collection as search reads it: short lists instead of objects, so that ten thousand rows stay small. */
export interface CompactCollection {
  readonly counts: string;
  readonly ligands: readonly Omit<SearchedLigand, 'count'>[];
  readonly ions: readonly { readonly name: string; readonly metal: string; readonly oxidation: number }[];
  readonly words: readonly string[];
  readonly complexes: readonly CompactComplex[];
}

/** id, formula as typed, isomer, charge, ion's place, [ligand's place, count] pairs, further words, rows. */
export type CompactComplex = readonly [
  id: string, formula: string, isomer: string, charge: number, ion: number, ligands: readonly (readonly [number, number])[], more: readonly string[], rows: readonly CompactRow[],
];

/** Measurement, conditions, Delta, B and beta as printed (0: withheld), verdict's place, scanned, absent, bands. */
export type CompactRow = readonly [
  id: string, conditions: string, delta: string | 0, racahB: string | 0, beta: string | 0, verdict: number,
  scanned: readonly (readonly [number, number])[], absent: readonly (readonly [number, number])[], bands: readonly CompactBand[],
];

/** Position, kind's place, side (-1, 0, 1), fitted, width or 0. */
export type CompactBand = readonly [position: number, kind: number, side: -1 | 0 | 1, fitted: 0 | 1, width: number];

export const KINDS: readonly BandKind[] = ['maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope'];

/** A complex of the search with the rows that it shows and the keys it is found by. */
export interface SearchEntry {
  readonly keys: FormulaKeys;
  readonly ion: string;
  readonly rows: readonly ResultRow[];
}

/** Unpacks one complex. */
export function searchEntry(collection: CompactCollection, [id, formula, isomer, charge, ion, ligands, more, rows]: CompactComplex): SearchEntry {
  const { name, metal, oxidation } = collection.ions[ion]!;
  const held = ligands.map(([place, count]) => ({ ...collection.ligands[place]!, count }));
  const abbreviations = collection.ligands.map(({ abbreviation }) => abbreviation).filter((text) => text !== null);
  const shown = formulaShown(formula, isomer, abbreviations);
  return {
    ion: name,
    keys: formulaKeys({ formula, charge, isomer, metal, metalName: elementName(metal) ?? metal, oxidation, ligands: held, more: [id, ...more] }),
    rows: rows.map(([measurement, conditions, delta, racahB, beta, verdict, scanned, absent, bands]) => ({
      complex: id, measurement, formula: shown, ion: name, conditions, delta: delta || null, racahB: racahB || null, beta: beta || null, verdict: collection.words[verdict]!,
      stripTitle: `Bands at ${bands.map(([position]) => position).join(', ')} cm⁻¹`,
      strip: {
        scanned: scanned.map(([low, high]) => ({ low, high })), absent: absent.map(([low, high]) => ({ low, high })),
        bands: bands.map(([position, kind, side, fitted, width]) => ({
          position, kind: KINDS[kind]!, side: side === 0 ? null : side > 0 ? 'higher' : 'lower', fitted: fitted === 1, width: width || null,
        })),
      },
    })),
  };
}
