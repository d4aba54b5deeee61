// The formula of a complex against its ion and ligands, and the sample against the formula.

import { complexCharge, containsComplex, elementCounts, parseFormula } from '#engine';
import type { Abbreviation, Formula, FormulaFault } from '#engine';
import { typedText } from '../report.ts';
import type { Finding, Reporter } from '../report.ts';
import type { ComplexDraft, KnownRecords, MeasurementDraft } from './complex.ts';
import type { CountedLigand } from './ligands.ts';

/** "3+", "1-", "0". */
export function chargeText(charge: number): string {
  if (charge === 0) return '0';
  return `${Math.abs(charge)}${charge > 0 ? '+' : '-'}`;
}

/** A formula that cannot be read, in the words of a fault report. */
export function formulaFinding(typed: string, fault: FormulaFault): Finding {
  const place = fault.position < typed.length && fault.found !== '' ? `, at "${fault.found}" (character ${fault.position + 1})` : '';
  return { code: 'BAD_FORMULA', found: `${typedText(typed)}${place}`, expected: fault.expected, mend: fault.mend };
}

/**
 * What the words in a formula may stand for: a ligand's abbreviation, its id or its name, "en", "urea".
 * Only words that stand in one of the texts: each explained word costs a reading of its ligand's formula.
 */
function abbreviationsIn(texts: readonly string[], known: KnownRecords): Abbreviation[] {
  return [...known.ligands.values()].flatMap(({ id, name, abbreviation, formula }) =>
    [...new Set([abbreviation, id, name])].flatMap((word) => (word !== null && texts.some((text) => text.includes(word)) ? [{ abbreviation: word, formula }] : [])));
}

/** Reads the formula and compares charge and atoms with ion and ligands. Returns it where it was read. */
export function checkFormula(complex: ComplexDraft, ligands: readonly CountedLigand[] | null, report: Reporter, known: KnownRecords): Formula | null {
  const typed = complex.formula;
  if (typed === undefined) return null;
  const abbreviations = abbreviationsIn([typed], known);
  const parsed = parseFormula(typed, { abbreviations: abbreviations.map(({ abbreviation }) => abbreviation) });
  if (!parsed.ok) {
    report.at(['formula'], formulaFinding(typed, parsed));
    return null;
  }
  const { formula } = parsed;
  if (!isOneEntity(formula)) {
    report.at(['formula'], { code: 'FORMULA_CONTENT', found: typedText(typed), expected: 'the complex alone, in square brackets with its charge', mend: 'write the complex here and the salt, with its counter-ions and water, as sample: of the measurement' });
    return null;
  }
  const { ion } = complex;
  if (ion === undefined || ligands === null) return formula;
  const metals = complex.nuclearity ?? 1;
  const charge = complexCharge(ion.oxidation, ligands.map(({ record, count }) => ({ charge: record.charge, count })), metals);
  if ((formula.charge ?? 0) !== charge) {
    const parts = [`${metals === 1 ? '' : `${metals} `}${ion.name}`, ...ligands.map(({ record, count }) => `${count} ${record.id} (${chargeText(record.charge)})`)].join(', ');
    report.at(['formula'], {
      code: 'CHARGE_SUM', found: `${typedText(typed)}, charge ${chargeText(formula.charge ?? 0)}`, expected: `charge ${chargeText(charge)}: ${parts}`,
      mend: charge === 0 ? 'take the charge out of the formula, or check the ion, the ligands and their charges' : `write ${chargeText(charge).replace(/^1(?=[+-])/, '')} behind the bracket, or check the ion, the ligands and their charges`,
    });
  }
  const difference = compositionDifference(formula, ion.metal, metals, ligands, abbreviations);
  if (difference?.unknown != null) {
    const { unknown } = difference;
    report.at(['formula'], { code: 'FORMULA_CONTENT', found: `${typedText(typed)}, with ${unknown}`, expected: 'symbols of elements, and ligands by the abbreviation, id or name of their record', mend: `give ${unknown} as abbreviation: in its ligand record, or write the ligand in full` });
  } else if (difference !== null) {
    report.at(['formula'], { code: 'FORMULA_CONTENT', found: `${typedText(typed)}: ${difference.formula}`, expected: `${difference.sum} from ion and ligands`, mend: 'correct the formula, or the ion and the ligands' });
  }
  return formula;
}

/** One group in square brackets (or none at all), no counter-ion, no water. */
function isOneEntity(formula: Formula): boolean {
  const [part, second] = formula.parts;
  if (part === undefined || second !== undefined || part.multiplier !== 1) return false;
  const bracketed = part.nodes.filter((node) => node.kind === 'group' && node.bracket === '[');
  return bracketed.length === 0 || (part.nodes.length === 1 && bracketed.length === 1);
}

interface Difference {
  readonly formula: string;
  readonly sum: string;
  /** An abbreviation in the formula that no ligand record explains. */
  readonly unknown: string | null;
}

/** Where the atoms of a formula differ from those of ion and ligands, the atoms that differ; null where all agree. */
function compositionDifference(formula: Formula, metal: string, metals: number, ligands: readonly CountedLigand[], abbreviations: readonly Abbreviation[]): Difference | null {
  const sum = new Map<string, number>([[metal, metals]]);
  for (const { record, count } of ligands) {
    const parsed = parseFormula(record.formula);
    if (!parsed.ok) return null;
    for (const [symbol, atoms] of elementCounts(parsed.formula, abbreviations)) sum.set(symbol, (sum.get(symbol) ?? 0) + atoms * count);
  }
  const found = elementCounts(formula, abbreviations);
  const symbols = [...new Set([...found.keys(), ...sum.keys()])].filter((symbol) => (found.get(symbol) ?? 0) !== (sum.get(symbol) ?? 0)).sort();
  if (symbols.length === 0) return null;
  const list = (counts: ReadonlyMap<string, number>) => symbols.map((symbol) => `${counts.get(symbol) ?? 0} ${symbol}`).join(', ');
  const unknown = symbols.find((symbol) => /^[a-z]/.test(symbol)) ?? null;
  return { formula: list(found), sum: list(sum), unknown };
}

/** The sample of a measurement contains the complex. A doped crystal, with a host typed, is not compared. */
export function checkSample(
  { sample, host }: MeasurementDraft, path: readonly (string | number)[],
  complexTyped: string | undefined, complex: Formula | null, report: Reporter, known: KnownRecords,
): void {
  if (sample === undefined || host !== undefined) return;
  const abbreviations = abbreviationsIn([sample, complexTyped ?? ''], known);
  const parsed = parseFormula(sample, { abbreviations: abbreviations.map(({ abbreviation }) => abbreviation) });
  if (!parsed.ok) {
    const finding = formulaFinding(sample, parsed);
    report.at([...path, 'sample'], { ...finding, mend: `${finding.mend}; of a doped crystal name the lattice by host:` });
    return;
  }
  if (complex === null || containsComplex(parsed.formula, complex, abbreviations)) return;
  report.at([...path, 'sample'], {
    code: 'SAMPLE_CONTENT', found: typedText(sample), expected: `a compound that contains the complex, ${complexTyped ?? ''}`,
    mend: 'correct the sample or the formula; of a doped crystal name the lattice by host:',
  });
}
