import { DIAGRAM_HEIGHT, DIAGRAM_MARGIN, DIAGRAM_WIDTH, type DiagramMark, type DiagramScales, diagramOver, diagramPlace } from './diagramParts.ts';
import { FINENESS, type LevelDiagram, below, thinned } from './levelCurves.ts';
import { type Dress, svgElement } from './svg.ts';
import { coordinate as c } from './text.ts';

/**
 * The Tanabe-Sugano diagram drawn in the page: the same scales, lines and labels as `levelDiagramFigure`, by hand in place of the chart
 * library, which is too heavy for a page.
 */
export function liveLevelDiagram(diagram: LevelDiagram, ceiling: number, marks: readonly DiagramMark[], dress: Dress): string {
  const scales = diagramPlace(diagram.reach, ceiling);
  return svgElement(dress, DIAGRAM_WIDTH, DIAGRAM_HEIGHT, [
    ticks(scales, diagram.reach, ceiling), lines(scales, diagram, ceiling, true), lines(scales, diagram, ceiling, false),
    diagramOver(scales, diagram, ceiling, marks),
  ].join(''));
}

function ticks({ x, y }: DiagramScales, reach: number, ceiling: number): string {
  const below = Array.from({ length: Math.floor(reach / 5) + 1 }, (_, index) => 5 * index).map((value) =>
    `<path class="axis" d="M${c(x(value))} ${c(y(0))}v5"/><text x="${c(x(value))}" y="${c(y(0) + 17)}" text-anchor="middle" font-size="12.5">${value}</text>`);
  const step = ceiling > 100 ? 20 : 10;
  const { left } = DIAGRAM_MARGIN;
  const beside = Array.from({ length: Math.floor(ceiling / step) + 1 }, (_, index) => step * index).map((value) =>
    `<path class="axis" d="M${c(left)} ${c(y(value))}h-5"/><text x="${c(left - 8)}" y="${c(y(value) + 4)}" text-anchor="end" font-size="12.5">${value}</text>`);
  return below.join('') + beside.join('');
}

/** Piece by piece between changes of the ground level, because what is spin-allowed changes with it. */
function lines({ x, y }: DiagramScales, diagram: LevelDiagram, ceiling: number, allowed: boolean): string {
  const pieces = diagram.grounds.flatMap(({ from, to, multiplicity }) =>
    diagram.curves.filter((curve) => (curve.multiplicity === multiplicity) === allowed)
      .flatMap((curve) => below(curve.points.filter((point) => point.x >= from && point.x <= to), ceiling)));
  return pieces.filter((piece) => piece.length > 1)
    .map((piece) => `<path class="level${allowed ? '' : ' forbidden'}" d="M${thinned(piece, ceiling / FINENESS).map((point) => `${c(x(point.x))} ${c(y(point.y))}`).join('L')}"/>`).join('');
}
