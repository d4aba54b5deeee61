import * as Plot from '@observablehq/plot';
import { DIAGRAM_GUTTER, DIAGRAM_HEIGHT, DIAGRAM_MARGIN, DIAGRAM_WIDTH, type DiagramMark, diagramOver } from './diagramParts.ts';
import { FINENESS, type LevelDiagram, below, thinned } from './levelCurves.ts';
import { drawPlot, dressed } from './plot.ts';

export { type DiagramMark, diagramCeiling, diagramOverlay, diagramPlace } from './diagramParts.ts';

/**
 * The Tanabe-Sugano diagram of an ion with complexes on it: E/B against Delta/B, levels of the ground level's
 * multiplicity solid, others thin and dashed, a dotted upright where the ground level changes.
 * @param ceiling upper end of the E/B axis, `diagramCeiling`
 */
export function levelDiagramFigure(
  diagram: LevelDiagram, ceiling: number, marks: readonly DiagramMark[], document: Document,
  dress: { readonly id: string; readonly title: string; readonly description: string },
): string {
  const drawing = drawPlot(document, {
    width: DIAGRAM_WIDTH, height: DIAGRAM_HEIGHT,
    marginLeft: DIAGRAM_MARGIN.left, marginRight: DIAGRAM_MARGIN.right, marginTop: DIAGRAM_MARGIN.top, marginBottom: DIAGRAM_MARGIN.bottom,
    insetLeft: DIAGRAM_GUTTER,
    x: { domain: [0, diagram.reach], label: null },
    y: { domain: [0, ceiling], label: null },
    marks: [
      Plot.axisX({ ticks: diagram.reach / 5, tickSize: 5, label: null }),
      Plot.axisY({ ticks: 10, tickSize: 5, label: null }),
      ...levelMarks(diagram, ceiling, true),
      ...levelMarks(diagram, ceiling, false),
    ],
  });
  const over = diagramOver(drawing, diagram, ceiling, marks);
  return dressed(drawing, { ...dress, over });
}

/** Piece by piece between changes of the ground level, because what is spin-allowed changes with it. */
function levelMarks(diagram: LevelDiagram, ceiling: number, allowed: boolean): Plot.Markish[] {
  const points = diagram.grounds.flatMap(({ from, to, multiplicity }, range) =>
    diagram.curves.filter((curve) => (curve.multiplicity === multiplicity) === allowed)
      .flatMap((curve) => below(curve.points.filter((point) => point.x >= from && point.x <= to), ceiling)
        .flatMap((piece, index) => thinned(piece, ceiling / FINENESS).map((point) => ({ ...point, line: `${curve.labels[0]} ${range} ${index}` })))));
  return [Plot.line(points, { x: 'x', y: 'y', z: 'line', stroke: 'currentColor', className: allowed ? 'level' : 'level forbidden' })];
}
