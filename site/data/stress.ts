import { noStress, pairAlone, pairsCaption, stressTable } from '#engine';
import type { StressColumn } from '#engine';
import { type Cell, type Column, type Table, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { termShown } from './typeset.ts';

const derivative = (parameter: string): Column => ({ figure: true, head: [{ text: '∂ν̃/∂', style: 'plain' }, { text: parameter, style: 'italic' }] });
const without = (symbol: string): Column => ({ figure: true, head: [{ text: symbol, style: 'italic' }, { text: ' without / cm', style: 'plain' }, { text: '−1', style: 'super' }] });

const heads: Readonly<Record<StressColumn, Column>> = {
  leverage: quantity('leverage', null, true), 'by Delta': derivative('Δ'), 'by B': derivative('B'), 'by C': derivative('C'),
  'Delta without': without('Δ'), 'B without': without('B'), 'put at': quantity('put at', 'cm-1', true), z: quantity('z', null),
};

const shown = (text: string): Cell => (text === noStress ? soft(text) : text);

/** Each transition of the fit: how much hangs on it, what it moves with, what the others give without it and where they put it. */
export function stressOfTransitions({ chosen, complex }: MeasurementNode): Table | null {
  const table = stressTable(chosen.transitions.map(({ row }) => {
    const left = chosen.leftOut.find(({ number }) => number === row.number);
    return {
      label: row.label, leverage: row.leverage, by: [row.gradient_Delta, row.gradient_B, row.gradient_C] as const,
      without: left === undefined ? null : { delta: left.Delta, racahB: left.B, predicted: left.predicted, z: left.z },
    };
  }), 'page');
  return table && {
    caption: table.caption, columns: [rowColumn('To'), ...table.columns.map((column) => heads[column])],
    rows: table.rows.map(({ label, cells }): readonly Cell[] => [{ parts: termShown(label, complex.ion.electrons) }, ...cells.map(shown)]),
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
    return shown(pairAlone(pair.Delta === null || pair.B === null ? null : { delta: pair.Delta, racahB: pair.B }, 'page'));
  };
  return {
    caption: pairsCaption,
    columns: [rowColumn('From'), ...places.slice(1).map((place): Column => ({ figure: true, head: [...words('and '), ...label(place)] }))],
    rows: places.slice(0, -1).map((first) => [{ parts: label(first) }, ...places.slice(1).map((second) => cell(first, second))]),
  };
}
