import { romanNumeral } from '../ions/oxidation.ts';
import { entitiesOf } from './composition.ts';
import { countedWord, entityWords, groupWordOf } from './groupWords.ts';
import { additiveName, otherLigandNames } from './names.ts';
import { parseFormula } from './parse.ts';
import { plainFormula } from './print.ts';
import { folded, nameWords, squeezed } from './words.ts';

/** A ligand of a complex with everything by which people call it. */
export interface SearchedLigand {
  readonly name: string;
  readonly formula: string;
  readonly abbreviation: string | null;
  readonly synonyms: readonly string[];
  /** Element symbols of the donor atoms it binds with. */
  readonly donors: readonly string[];
  readonly count: number;
}

export interface SearchedComplex {
  /** As typed, "[Cr(NH3)6]3+". */
  readonly formula: string;
  readonly charge: number;
  /** "cis", "none", ... */
  readonly isomer: string;
  readonly metal: string;
  readonly metalName: string;
  readonly oxidation: number;
  readonly ligands: readonly SearchedLigand[];
  /** Further names and words, such as the complex's own name or the geometry. */
  readonly more?: readonly string[];
}

/** What a query is compared with. All text is folded; equal complexes give equal keys. */
export interface FormulaKeys {
  readonly charge: number;
  readonly isomer: string;
  /** Formulas as letters and digits alone, in the usual spellings of the ligands: "crnh36", "cren3". */
  readonly formulas: readonly string[];
  /** Metal with its donor atoms, "crn6", "crcl2n4". */
  readonly donors: readonly string[];
  /** Additive names as letters and digits alone. */
  readonly names: readonly string[];
  /** "=cr" the metal, "h3n:6" a ligand with its number, and the words of all names. */
  readonly words: readonly string[];
}

const mostSpellings = 24;

function unique(list: readonly string[]): readonly string[] {
  return [...new Set(list)].sort();
}

function spellings(ligand: SearchedLigand): readonly string[] {
  const short = [...ligand.synonyms, ...otherLigandNames(ligand.name)].filter((synonym) => groupWordOf(synonym) !== null && !/[a-z]{6}/.test(synonym));
  return unique([ligand.formula.replace(/[\s^]*\d*[+\-−]$/, ''), ...(ligand.abbreviation === null ? [] : [ligand.abbreviation]), ...short]);
}

/** Every way of taking one from each list, at most `mostSpellings`. */
function choices(lists: readonly (readonly string[])[]): readonly (readonly string[])[] {
  return lists.reduce<readonly (readonly string[])[]>(
    (rows, list) => rows.flatMap((row) => list.map((item) => [...row, item])).slice(0, mostSpellings),
    [[]],
  );
}

/** The orders in which few things can be written. */
function orders<T>(list: readonly T[]): readonly (readonly T[])[] {
  if (list.length < 2 || list.length > 3) return [list];
  return list.flatMap((one, index) => orders(list.filter((_, other) => other !== index)).map((rest) => [one, ...rest]));
}

function numbered(text: string, count: number): string {
  return text + (count === 1 ? '' : String(count));
}

function donorKeys(complex: SearchedComplex): readonly string[] {
  const donors = new Map<string, number>();
  for (const ligand of complex.ligands) for (const donor of ligand.donors) donors.set(donor, (donors.get(donor) ?? 0) + ligand.count);
  return orders([...donors]).map((order) => squeezed(complex.metal + order.map(([donor, count]) => numbered(donor, count)).join('')));
}

/** The keys by which a complex is found; `searchScore` compares a query with them. */
export function formulaKeys(complex: SearchedComplex): FormulaKeys {
  const { ligands, metal } = complex;
  const parsed = parseFormula(complex.formula, { abbreviations: ligands.flatMap(({ abbreviation }) => abbreviation ?? []) });
  const entity = parsed.ok ? entitiesOf(parsed.formula)[0] ?? [] : null;
  const typed = entity === null ? squeezed(complex.formula) : squeezed(plainFormula({ isomer: null, parts: [{ multiplier: 1, nodes: entity }], charge: null }));
  const spelled = ligands.map(spellings);
  const spelt = choices(spelled.map((texts, index) => texts.map((text) => numbered(text, ligands[index]?.count ?? 1))))
    .flatMap((row) => orders(row).map((order) => squeezed(metal + order.join(''))));
  const numeral = romanNumeral(complex.oxidation);
  const ligandNames = ligands.map(({ name, synonyms }) => [...new Set([name, ...otherLigandNames(name), ...synonyms.filter((synonym) => /[a-z]{4}/.test(synonym))])]);
  const names = choices(ligandNames).map((row) => {
    const named = row.map((name, index) => ({ name, count: ligands[index]?.count ?? 1 }));
    return squeezed(additiveName(metal, complex.metalName, numeral, named, complex.charge));
  });
  const perLigand = ligands.flatMap((ligand, index) => [
    ...(spelled[index] ?? []).flatMap((text) => [groupWordOf(text) ?? [], squeezed(text)].flat()).map((word) => countedWord(word, ligand.count)),
    ...[...(ligandNames[index] ?? []), ...ligand.synonyms].flatMap(nameWords),
  ]);
  const words = [
    `=${folded(metal)}`, folded(metal), folded(complex.metalName), folded(numeral), folded(metal + numeral),
    ...(parsed.ok ? entityWords(parsed.formula) : []),
    ...perLigand,
    ...(complex.isomer === 'none' ? [] : [folded(complex.isomer)]),
    ...(complex.more ?? []).flatMap(nameWords),
  ];
  return {
    charge: complex.charge,
    isomer: folded(complex.isomer),
    formulas: unique([typed, ...spelt]),
    donors: unique(donorKeys(complex)),
    names: unique([...names, ...(complex.more ?? []).map(squeezed)].filter((name) => name.length > 2)),
    words: unique(words),
  };
}
