import { type ResultRow, resultRow } from '../../components/resultRow.ts';
import { type FormulaShown, formulaShown } from '../../data/typeset.ts';
import { escapeText } from '../../charts/text.ts';
import { fetchJson } from '../page/fetchJson.ts';
import type { FoundCollection } from './packed.ts';
import { type PackedRow, SLICE_ROWS, unpackRow } from './rowSlice.ts';

/** Rows by their place, fetched in slices when they are wanted. */
export interface RowStore {
  /** Fetches what the rows need; settles when all of it is there. @throws Error where a file cannot be had */
  readonly load: (rows: readonly number[]) => Promise<void>;
  /** The row as the build draws it, or with its name alone where its slice is not there yet. */
  readonly markup: (row: number, id: string, why: string | null, index: number | null) => string;
}

export function createRowStore({ packed, complexes, rows }: FoundCollection): RowStore {
  const slices = new Map<number, readonly PackedRow[]>();
  const coming = new Map<number, Promise<void>>();
  const abbreviations = packed.ligands.flatMap(({ abbreviation }) => abbreviation ?? []);
  const formulas = new Map<number, FormulaShown>();
  const formula = (complex: number): FormulaShown => {
    const known = formulas.get(complex) ?? formulaShown(complexes[complex]!.formula, complexes[complex]!.isomer, abbreviations);
    formulas.set(complex, known);
    return known;
  };
  const fetchSlice = (slice: number): Promise<void> => {
    const known = coming.get(slice) ?? fetchJson<readonly PackedRow[]>(`data/rows/${slice + 1}.json`).then((data) => { slices.set(slice, data); });
    coming.set(slice, known);
    known.catch(() => coming.delete(slice));
    return known;
  };
  return {
    load: async (wanted) => { await Promise.all([...new Set(wanted.map((row) => Math.floor(row / SLICE_ROWS)))].filter((slice) => !slices.has(slice)).map(fetchSlice)); },
    markup: (place, id, why, index) => {
      const row = rows[place]!;
      const complex = complexes[row.complex]!;
      const packedRow = slices.get(Math.floor(place / SLICE_ROWS))?.[place % SLICE_ROWS];
      const known: Pick<ResultRow, 'complex' | 'measurement' | 'ion' | 'verdict' | 'formula'> = { complex: complex.id, measurement: row.measurement, ion: complex.ion.name, verdict: row.verdict, formula: formula(row.complex) };
      if (packedRow !== undefined) return resultRow(unpackRow(packedRow, known), id, { why, index });
      return `<tr${index === null ? '' : ` aria-rowindex="${index}"`}><th scope="row">${escapeText(known.formula.text)}</th><td colspan="6" class="withheld">loading</td></tr>`;
    },
  };
}
