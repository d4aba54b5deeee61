import { expect, test } from 'vitest';
import { bracketLanes, bracketMarks } from '../../../site/charts/brackets.ts';
import { newDocument } from '../../../site/charts/plot.ts';
import { type SeriesPoint, seriesFigure } from '../../../site/charts/seriesFigure.ts';

const bracket = (first: number, last: number, letter = 'a') => ({ first, last, letter });

test('brackets that share a row stand in different lanes, others share one', () => {
  expect(bracketLanes([bracket(0, 2), bracket(1, 4), bracket(3, 6), bracket(5, 7)])).toEqual({ lanes: [0, 1, 0, 1], count: 2 });
  expect(bracketLanes([])).toEqual({ lanes: [], count: 0 });
  // Touching runs share the row where they touch.
  expect(bracketLanes([bracket(0, 2), bracket(2, 3)]).lanes).toEqual([0, 1]);
});

test('no two brackets in one lane overlap, whatever the runs', () => {
  const runs = Array.from({ length: 60 }, (_, i) => bracket(i, i + 1 + ((i * 7) % 9)));
  const { lanes } = bracketLanes(runs);
  runs.forEach((one, i) => runs.slice(i + 1).forEach((other, j) => {
    if (lanes[i] === lanes[i + 1 + j]) expect(other.first).toBeGreaterThan(one.last);
  }));
});

test('a bracket spans its rows and has a tick at each end that is on the drawing', () => {
  const path = (one: Parameters<typeof bracketMarks>[0][number]) => / d="([^"]+)"/.exec(bracketMarks([one], [0], (place) => 100 - 10 * place, 0))![1]!;
  expect(path(bracket(1, 3))).toBe('M1 87.8H5V62.2H1');
  expect(path({ ...bracket(1, 3), openBehind: true })).toBe('M1 87.8H5V60');
  expect(path({ ...bracket(1, 3), openBefore: true })).toBe('M5 90H5V62.2H1');
});

test('a series figure holds its brackets, what stands beside a value, its notes and its upright', () => {
  const point = (value: number, beside: number | null): SeriesPoint => ({ label: [{ text: 'x', style: 'plain' }], value, u: null, uTotal: 1, open: false, beside, note: '7' });
  const svg = seriesFigure([point(5, 6), point(6, null), point(9, null)], [], newDocument(), { id: 's', title: 'S', description: 'D' }, { brackets: [bracket(0, 1)], upright: 0, noteHead: [{ text: 'n', style: 'italic' }] });
  expect(svg.match(/class="bracket"/g)).toHaveLength(1);
  expect(svg.match(/class="beside"/g)).toHaveLength(1);
  expect(svg.match(/>7<\/text>/g)).toHaveLength(3);
  expect(svg).toContain('class="crossing"');
  expect(svg).not.toMatch(/NaN|undefined|Infinity/);
});
