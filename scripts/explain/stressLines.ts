import { pairAlone, pairsCaption, shownLabel, stressTable } from '#engine';
import type { Reading, StressColumn } from '#engine';
import { aligned } from '../report/columns.ts';

const heads: Readonly<Record<StressColumn, string>> = {
  leverage: 'leverage', 'by Delta': 'd/dDelta', 'by B': 'd/dB', 'by C': 'd/dC', 'Delta without': 'Delta without', 'B without': 'B without', 'put at': 'put at', z: 'z',
};

/** Each band of the fit under stress, then each pair alone, as the complex page tells them. */
export function stressLines(reading: Reading, electrons: number): string[] {
  return [...transitions(reading, electrons), ...pairs(reading, electrons)];
}

function transitions({ bands, stress }: Reading, electrons: number): string[] {
  const table = stressTable(bands.map(({ label, leverage, gradient }, place) => {
    const without = stress?.leftOut.find(({ band }) => band === place);
    return {
      label, leverage, by: [gradient?.delta ?? null, gradient?.racahB ?? null, gradient?.racahC ?? null] as const,
      without: without === undefined ? null : { delta: without.at?.delta ?? null, racahB: without.at?.racahB ?? null, predicted: without.predicted, z: without.z },
    };
  }), 'text');
  if (table === null) return [];
  return [
    table.caption,
    ...aligned([['to', ...table.columns.map((column) => heads[column])], ...table.rows.map(({ label, cells }) => [shownLabel(label, electrons), ...cells])]),
  ];
}

function pairs({ stress }: Reading, electrons: number): string[] {
  if (stress === null || stress.pairs.length === 0) return [];
  return [pairsCaption, ...aligned(stress.pairs.map(({ labels, at }) => [labels.map((label) => shownLabel(label, electrons)).join(' and '), pairAlone(at, 'text')]))];
}
