import { distinguishableAbove, reviewAbove } from '#engine';
import { energy, listed, parameterShown, ratio } from './show.ts';
import type { PlacementRow } from './rows.ts';
import { type Cell, type Table, column, quantity, rowColumn, soft } from './table.ts';
import type { ComplexNode, MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown } from './typeset.ts';

/** What the rest of the collection predicts for a complex, its own data taken out. */
export interface Placements {
  readonly table: Table | null;
  /** Why a method predicts nothing, in sentences. */
  readonly reasons: readonly Parts[];
}

const SYMBOL: Readonly<Record<PlacementRow['parameter'], string>> = { Delta: 'Δ', B: 'B', beta: 'β' };
const UNIT: Readonly<Record<PlacementRow['parameter'], string>> = { Delta: ' / cm⁻¹', B: ' / cm⁻¹', beta: '' };

export function placements({ measurements }: ComplexNode): Placements {
  const all = measurements.flatMap((measurement) => measurement.placements.map((row) => ({ measurement, row })));
  const predicted = all.filter(({ row }) => row.predicted !== null);
  const silent = all.filter(({ row }) => row.reason !== null);
  const sentences = [...new Set(silent.map(({ row }) => `${row.method} ${row.reason}`))].map((key) => {
    const same = silent.filter(({ row }) => `${row.method} ${row.reason}` === key);
    const parameters = [...new Set(same.map(({ row }) => row.parameter))];
    const method = same[0]!.row.method;
    return `${method[0]!.toUpperCase()}${method.slice(1)} ${method === 'factors' ? 'predict' : 'predicts'} no ${listed(parameters)}: ${same[0]!.row.reason}.`;
  });
  return {
    table: predicted.length === 0 ? null : {
      caption: 'Predicted by the rest of the collection, its own data taken out',
      columns: [...(measurements.length > 1 ? [rowColumn('Measurement'), column('Quantity')] : [rowColumn('Quantity')]), column('By'), quantity('predicted', null, true), quantity('found', null, true), quantity('z', null), column('So')],
      rows: predicted.map(({ measurement, row }) => placementRow(measurement, row, measurements.length > 1)),
    },
    reasons: sentences.map(sentenceShown),
  };
}

function placementRow(measurement: MeasurementNode, row: PlacementRow, several: boolean): readonly Cell[] {
  const found = parameterShown(measurement.chosen.parameters[row.parameter]).total.text;
  const quantityCell: Cell = { parts: [{ text: SYMBOL[row.parameter], style: 'italic' }, { text: UNIT[row.parameter], style: 'plain' }] };
  return [
    ...(several ? [measurement.row.id] : []), quantityCell, row.method, energy(row.predicted!, row.u), found ?? soft('withheld'),
    row.z === null ? soft('none') : ratio(row.z, 1), row.z === null ? soft('no test') : agreement(Math.abs(row.z)),
  ];
}

const agreement = (z: number): string => z > reviewAbove ? 'apart: put up for review' : z > distinguishableAbove ? 'apart' : 'not distinguishable';
