import { placeOnDiagram, hasPlace } from './diagram.ts';
import { svgElement } from '../charts/svg.ts';
import { type FigureShown, drawingSize } from './figure.ts';
import { hasScheme, levelFigure } from './measurementMeaning.ts';
import { stripOf } from './measurementRead.ts';
import { measurementRivals } from './measurementRivals.ts';
import { counted } from './show.ts';
import type { CollectionTree, ComplexNode } from './tree.ts';

/** Names of the figures of a complex's own page: known without drawing them. */
export function ownFigureIds(tree: CollectionTree, complex: ComplexNode): readonly string[] {
  return [
    ...complex.measurements.flatMap((measurement) => {
      const { id } = measurement.row;
      return [...(measurement.bands.length > 0 ? [`${id}-strip`] : []), ...(hasScheme(measurement) ? [`${id}-levels`] : []), ...(measurement.rivals.length > 0 ? [`${id}-readings`] : [])];
    }),
    ...(hasPlace(tree, complex) ? ['place'] : []),
  ];
}

/** One figure of a complex's own page. @throws RangeError for a name that is not among `ownFigureIds` */
export function ownFigure(tree: CollectionTree, complex: ComplexNode, name: string): Pick<FigureShown, 'id' | 'svg'> {
  const drawn = name === 'place' ? placeOnDiagram(tree, complex)?.whole() : complex.measurements.flatMap((measurement) => {
    const { id } = measurement.row;
    return name === `${id}-strip` ? stripOf(measurement, id) ?? [] : name === `${id}-levels` ? levelFigure(measurement, id) ?? [] : name === `${id}-readings` ? measurementRivals(measurement, id)?.figure ?? [] : [];
  })[0];
  if (drawn === undefined) throw new RangeError(`complex ${complex.row.id} has no figure "${name}"`);
  return drawn;
}

/** The two files of drawings beside a complex's page: bands and their readings; levels and the place on the diagram. */
export const SHEETS = ['strip', 'levels'] as const;
export type Sheet = (typeof SHEETS)[number];

const onSheet = (sheet: Sheet) => (name: string): boolean => (/-(?:strip|readings)$/.test(name) ? 'strip' : 'levels') === sheet;

export const hasSheet = (tree: CollectionTree, complex: ComplexNode, sheet: Sheet): boolean => ownFigureIds(tree, complex).some(onSheet(sheet));

/** All figures of one kind of a complex under one another, each a drawing of its own within the sheet, found by its name. */
export function ownSheet(tree: CollectionTree, complex: ComplexNode, sheet: Sheet): string {
  let [bottom, width] = [0, 0];
  const inner = ownFigureIds(tree, complex).filter(onSheet(sheet)).map((name) => {
    const { svg } = ownFigure(tree, complex, name);
    const size = drawingSize(svg);
    const placed = svg.replace('<svg ', `<svg id="${name}" y="${bottom}" `);
    [bottom, width] = [bottom + size.height + 16, Math.max(width, size.width)];
    return placed;
  });
  return svgElement({ id: sheet, title: `${complex.formula.text}: ${sheet === 'strip' ? 'band strips' : 'levels'}`, description: `${counted(inner.length, 'figure')} of the record ${complex.row.id}, under one another.` }, width, bottom, inner.join(''));
}
