import { formulaParts, parseFormula, plainFormula, shownLabel, spokenFormula, termParts } from '#engine';
import type { TextPart } from '../charts/text.ts';

export type { TextPart } from '../charts/text.ts';
export type Parts = readonly TextPart[];

/** A formula set for the page and said for a reader who hears it. */
export interface FormulaShown {
  readonly parts: Parts;
  /** One plain string, as it goes to the clipboard and into search. */
  readonly text: string;
  readonly spoken: string;
}

/**
 * A formula as typed, typeset; text that is no formula stays as it is. An isomer that the formula does not name stands before it.
 * @param abbreviations of the collection's ligands, which a formula may hold as symbols
 */
export function formulaShown(typed: string, isomer: string, abbreviations: readonly string[]): FormulaShown {
  const read = parseFormula(typed, { abbreviations });
  const named = isomer === 'none' || (read.ok && read.formula.isomer !== null) ? '' : isomer;
  const before: Parts = named === '' ? [] : [{ text: named, style: 'italic' }, { text: '-', style: 'plain' }];
  const prefix = named === '' ? '' : `${named}-`;
  if (!read.ok) return { parts: [...before, { text: typed, style: 'plain' }], text: prefix + typed, spoken: prefix + typed };
  return {
    parts: [...before, ...formulaParts(read.formula)], text: prefix + plainFormula(read.formula),
    spoken: (named === '' ? '' : `${named}, `) + spokenFormula(read.formula),
  };
}

/** A term label in letter form, set as chemists print it. */
export function termShown(label: string, electrons: number): Parts {
  return termParts(shownLabel(label, electrons));
}

/** d count of an ion, "d" with the number raised. */
export function configuration(electrons: number): Parts {
  return [{ text: 'd', style: 'plain' }, { text: String(electrons), style: 'super' }];
}
