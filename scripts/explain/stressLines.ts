import { pairsCaption, plain, shownLabel, significant, stressCaption } from '#engine';
import type { Reading } from '#engine';
import { aligned } from '../report/columns.ts';

const none = 'none';

/** Each band of the fit under stress, then each pair alone, as the complex page tells them. */
export function stressLines(reading: Reading, electrons: number): string[] {
  return [...transitions(reading, electrons), ...pairs(reading, electrons)];
}

function transitions({ bands, stress }: Reading, electrons: number): string[] {
  const used = bands.filter(({ leverage }) => leverage !== null);
  if (used.length === 0) return [];
  const left = stress?.leftOut ?? [];
  const tried = left.length > 0;
  const withC = used.some(({ gradient }) => gradient !== null && Math.abs(gradient.racahC) > 5e-4);
  const number = (value: number | null | undefined, decimals: number): string => (value === null || value === undefined ? none : plain(value, decimals));
  return [
    stressCaption(tried),
    ...aligned([
      ['to', 'leverage', 'd/dDelta', 'd/dB', ...(withC ? ['d/dC'] : []), ...(tried ? ['Delta without', 'B without', 'put at', 'z'] : [])],
      ...used.map(({ label, leverage, gradient }, place) => [
        shownLabel(label, electrons), number(leverage, 2), number(gradient?.delta, 2), number(gradient?.racahB, 1), ...(withC ? [number(gradient?.racahC, 1)] : []),
        ...(tried ? [number(left[place]?.at?.delta, 0), number(left[place]?.at?.racahB, 0), number(left[place]?.predicted, 0), number(left[place]?.z, 1)] : []),
      ]),
    ]),
  ];
}

function pairs({ stress }: Reading, electrons: number): string[] {
  if (stress === null || stress.pairs.length === 0) return [];
  return [
    pairsCaption,
    ...aligned(stress.pairs.map(({ labels, at }) => [
      labels.map((label) => shownLabel(label, electrons)).join(' and '), at === null ? none : `${plain(at.delta, 0)}; ${significant(at.racahB, 3)}`,
    ])),
  ];
}
