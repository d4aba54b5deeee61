import { differenceOf, kindOf, kinds, seriesOfKind } from './comparable.ts';
import { oncePerCollection } from './memo.ts';
import { complexPath } from './paths.ts';
import { energy, parameterShown } from './show.ts';
import { type Cell, type Table, column, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';

const EACH_SIDE = 3;

/** Where a complex stands among those of its ion, geometry and spin, by Delta. */
export interface Neighbours {
  readonly sentence: string;
  readonly table: Table | null;
}

const deltaSeries = oncePerCollection((tree, key) => seriesOfKind(tree, kinds(tree).find((kind) => kind.key === key)!, 'Delta'));

export function neighbours(tree: CollectionTree, complex: ComplexNode): Neighbours {
  const kind = kindOf(tree, complex);
  if (kind === undefined) return { sentence: 'The engine does not fit this geometry, so the complex stands in no series.', table: null };
  const series = deltaSeries(tree, kind.key);
  const place = series.members.findIndex((member) => member.complex === complex);
  if (place < 0) {
    const out = series.leftOut.find(({ measurement }) => measurement.complex === complex);
    return { sentence: `Not in the series of ${kind.words} (${series.conditions}): ${out?.reason ?? 'no comparable measurement'}.`, table: null };
  }
  if (series.members.length === 1) return { sentence: `The only comparable complex of ${kind.words} in the collection.`, table: null };
  const here = series.members[place]!;
  const shown = series.members.slice(Math.max(0, place - EACH_SIDE), place + EACH_SIDE + 1);
  return {
    sentence: `Number ${place + 1} of ${series.members.length} by Δ among ${kind.words} (${series.conditions}).`,
    table: {
      caption: 'Nearest by Δ',
      columns: [rowColumn('Complex'), quantity('Δ', 'cm-1'), quantity('difference', 'cm-1', true), column('Against this')],
      rows: shown.map((member) => neighbourRow(tree, here, member)),
    },
  };
}

function neighbourRow(tree: CollectionTree, here: MeasurementNode, other: MeasurementNode): readonly Cell[] {
  const value = parameterShown(other.chosen.parameters.Delta).total.text ?? 'withheld';
  if (other === here) return [{ parts: other.complex.formula.parts }, value, '', 'itself'];
  const apart = differenceOf(tree, other, here, 'Delta');
  return [
    { parts: other.complex.formula.parts, path: complexPath(other.complex.row.id) }, value,
    apart === null ? soft('not known') : `${apart.value >= 0 ? '+' : ''}${energy(apart.value, apart.u)}`,
    apart === null ? soft('not tested') : apart.distinguishable ? (apart.value > 0 ? 'higher' : 'lower') : 'not distinguishable',
  ];
}
