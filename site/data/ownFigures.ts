import { placeOnDiagram, hasPlace } from './diagram.ts';
import type { FigureShown } from './figure.ts';
import { hasScheme, levelFigure } from './measurementMeaning.ts';
import { stripOf } from './measurementRead.ts';
import { measurementRivals } from './measurementRivals.ts';
import type { CollectionTree, ComplexNode } from './tree.ts';

/** Names of the figures of a complex's own page, as their files are called: known without drawing them. */
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
