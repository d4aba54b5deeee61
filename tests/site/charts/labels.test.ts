import { expect, test } from 'vitest';
import { levelDiagram } from '../../../site/charts/levelCurves.ts';
import { type DiagramMark, diagramCeiling, levelDiagramFigure } from '../../../site/charts/levelDiagram.ts';
import { liveLevelDiagram } from '../../../site/charts/levelDiagramLive.ts';
import { newDocument } from '../../../site/charts/plot.ts';
import { collisions, textBoxes } from './textBoxes.ts';

const dress = { id: 'd', title: 'Levels', description: 'Levels of an ion' };
const IONS = [1, 2, 3, 4, 5, 6, 7, 8, 9].flatMap((electrons) => (['octahedral', 'tetrahedral'] as const).map((geometry) => [electrons, geometry] as const));

/** Complexes crowded at one place, spread, and at both ends of the axis. */
const crowded = (reach: number): readonly DiagramMark[] => [0.02, 0.3, 0.301, 0.305, 0.31, 0.5, 0.98].map((share, index) => ({ key: 'abcdefg'[index]!, x: share * reach, bands: [{ y: 20 + index, used: true }] }));

test.each(IONS)('d%i %s: no label of a diagram lies on another, wherever axes end and complexes crowd', (electrons, geometry) => {
  for (const cOverB of [3.2, 4.5, 6]) for (const reach of [20, 40, 80]) for (const marks of [[], crowded(reach)]) {
    const diagram = levelDiagram({ electrons, geometry }, cOverB, reach);
    const ceiling = diagramCeiling(reach, marks);
    for (const svg of [levelDiagramFigure(diagram, ceiling, marks, newDocument(), dress), liveLevelDiagram(diagram, ceiling, marks, dress)]) {
      const boxes = textBoxes(svg);
      expect(collisions(boxes), `C/B ${cOverB}, to ${reach}`).toEqual([]);
      expect(Math.min(...boxes.map(({ left }) => left)), 'left edge').toBeGreaterThanOrEqual(-1);
      expect(Math.max(...boxes.map(({ right }) => right)), 'right edge').toBeLessThanOrEqual(761);
      expect(Math.min(...boxes.map(({ top }) => top)), 'top edge').toBeGreaterThanOrEqual(-1);
      expect(Math.max(...boxes.map(({ bottom }) => bottom)), 'bottom edge').toBeLessThanOrEqual(621);
    }
  }
});

test('boxes that overlap are noticed', () => {
  const svg = (x: number) => `<svg viewBox="0 0 99 99"><text x="10" y="20" font-size="10">one</text><text x="${x}" y="21" font-size="10">two</text></svg>`;
  expect(collisions(textBoxes(svg(18)))).toEqual(['one on two']);
  expect(collisions(textBoxes(svg(30)))).toEqual([]);
});
