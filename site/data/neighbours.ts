import { differenceU, kindKey, kinds, seriesOf } from './comparable.ts';
import { oncePerCollection } from './memo.ts';
import { kindWords } from './seriesFigures.ts';
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

const deltaSeries = oncePerCollection((tree) => new Map(kinds(tree.complexes.flatMap((complex) => complex.measurements))
  .map((kind) => [kindKey(kind.measurements[0]!.complex), { kind, series: seriesOf(tree, kind.measurements, 'Delta') }])));

export function neighbours(tree: CollectionTree, complex: ComplexNode): Neighbours {
  const found = deltaSeries(tree).get(kindKey(complex));
  if (found === undefined) return { sentence: 'The engine does not fit this geometry, so the complex stands in no series.', table: null };
  const { kind, series } = found;
  const place = series.members.findIndex((member) => member.complex === complex);
  if (place < 0) {
    const out = series.leftOut.find(({ measurement }) => measurement.complex === complex);
    return { sentence: `Not in the series of ${kindWords(kind)} (${series.conditions}): ${out?.reason ?? 'no comparable measurement'}.`, table: null };
  }
  if (series.members.length === 1) return { sentence: `The only comparable complex of ${kindWords(kind)} in the collection.`, table: null };
  const here = series.members[place]!;
  const shown = series.members.slice(Math.max(0, place - EACH_SIDE), place + EACH_SIDE + 1);
  return {
    sentence: `Number ${place + 1} of ${series.members.length} by Δ among ${kindWords(kind)} (${series.conditions}).`,
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
  const difference = other.chosen.parameters.Delta.value! - here.chosen.parameters.Delta.value!;
  const u = differenceU(tree, here.chosen, other.chosen, 'Delta');
  const sign = difference >= 0 ? '+' : '';
  return [
    { parts: other.complex.formula.parts, path: complexPath(other.complex.row.id) }, value, u === null ? soft('u not known') : `${sign}${energy(difference, u)}`,
    u === null ? soft('not tested') : Math.abs(difference) > 2 * u ? (difference > 0 ? 'higher' : 'lower') : 'not distinguishable',
  ];
}
