import fc from 'fast-check';
import { expect, test } from 'vitest';
import { spreadLabels } from '../../../site/charts/spread.ts';

const labels = fc.array(fc.record({ wish: fc.double({ min: -50, max: 550, noNaN: true }), extent: fc.double({ min: 0.5, max: 12, noNaN: true }) }), { maxLength: 40 });

test('labels that fit never overlap, keep the order of their wishes and stay inside the line', () => {
  fc.assert(fc.property(labels, (wanted) => {
    const extents = wanted.map(({ extent }) => extent);
    const centres = spreadLabels(wanted.map(({ wish }) => wish), extents, [0, 500]);
    const order = wanted.map((_, index) => index).sort((a, b) => wanted[a]!.wish - wanted[b]!.wish || a - b);
    for (let place = 1; place < order.length; place++) {
      const [before, here] = [order[place - 1]!, order[place]!];
      expect(centres[here]! - centres[before]!).toBeGreaterThanOrEqual((extents[here]! + extents[before]!) / 2 - 1e-6);
    }
    centres.forEach((centre, index) => {
      expect(centre - extents[index]! / 2).toBeGreaterThanOrEqual(-1e-6);
      expect(centre + extents[index]! / 2).toBeLessThanOrEqual(500 + 1e-6);
    });
  }));
});

test('labels with room around them stay where they want to be', () => {
  expect(spreadLabels([10, 100, 300], [8, 8, 8], [0, 500])).toEqual([10, 100, 300]);
});

test('two labels with one wish share it evenly', () => {
  expect(spreadLabels([100, 100], [10, 10], [0, 500])).toEqual([95, 105]);
});

test('more labels than fit stand in order from the start and still do not overlap', () => {
  expect(spreadLabels([5, 5, 5], [10, 10, 10], [0, 20])).toEqual([5, 15, 25]);
});

test('a missing extent is an error', () => {
  expect(() => spreadLabels([1, 2], [1], [0, 10])).toThrow('one extent for each label');
});
