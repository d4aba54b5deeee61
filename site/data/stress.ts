import { pairsCaption, stressCaption } from '#engine';
import { figures, ratio } from './show.ts';
import { type Cell, type Column, type Table, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { termShown } from './typeset.ts';

const none = soft('none');
const derivative = (parameter: string): Column => ({ figure: true, head: [{ text: '∂ν̃/∂', style: 'plain' }, { text: parameter, style: 'italic' }] });
const without = (symbol: string): Column => ({ figure: true, head: [{ text: symbol, style: 'italic' }, { text: ' without / cm', style: 'plain' }, { text: '−1', style: 'super' }] });

/** Each transition of the fit: how much hangs on it, what it moves with, what the others give without it and where they put it. */
export function stressOfTransitions({ chosen, complex }: MeasurementNode): Table | null {
  const rows = chosen.transitions.filter(({ row }) => row.leverage !== null);
  if (rows.length === 0) return null;
  const tried = chosen.leftOut.length > 0;
  const withC = rows.some(({ row }) => row.gradient_C !== null && Math.abs(row.gradient_C) > 5e-4);
  const number = (value: number | null, decimals: number): Cell => value === null ? none : ratio(value, decimals);
  return {
    caption: stressCaption(tried),
    columns: [rowColumn('To'), quantity('leverage', null, true), derivative('Δ'), derivative('B'), ...(withC ? [derivative('C')] : []),
      ...(tried ? [without('Δ'), without('B'), quantity('put at', 'cm-1', true), quantity('z', null)] : [])],
    rows: rows.map(({ row }): readonly Cell[] => {
      const left = chosen.leftOut.find(({ number: place }) => place === row.number);
      return [
        { parts: termShown(row.label, complex.ion.electrons) }, number(row.leverage, 2), number(row.gradient_Delta, 2), number(row.gradient_B, 1), ...(withC ? [number(row.gradient_C, 1)] : []),
        ...(tried ? [number(left?.Delta ?? null, 0), number(left?.B ?? null, 0), number(left?.predicted ?? null, 0), number(left?.z ?? null, 1)] : []),
      ];
    }),
  };
}

/** Delta and B from each pair of bands alone, as a triangle: one band heads the row, the other the column. */
export function stressOfPairs({ chosen, complex }: MeasurementNode): Table | null {
  if (chosen.pairs.length === 0) return null;
  const places = [...new Set(chosen.pairs.flatMap(({ first_number, second_number }) => [first_number, second_number]))].sort((a, b) => a - b);
  const label = (place: number) => termShown(chosen.transitions.find(({ row }) => row.number === place)!.row.label, complex.ion.electrons);
  const cell = (first: number, second: number): Cell => {
    const pair = chosen.pairs.find((one) => one.first_number === first && one.second_number === second);
    if (second <= first || pair === undefined) return '';
    return pair.Delta === null || pair.B === null ? none : `${ratio(pair.Delta, 0)}; ${figures(pair.B, 3)}`;
  };
  return {
    caption: pairsCaption,
    columns: [rowColumn('From'), ...places.slice(1).map((place): Column => ({ figure: true, head: [...words('and '), ...label(place)] }))],
    rows: places.slice(0, -1).map((first) => [{ parts: label(first) }, ...places.slice(1).map((second) => cell(first, second))]),
  };
}
