import { coefficient, correlationVerdict, correlations, limits } from './correlationFigures.ts';
import { ionPath } from './paths.ts';
import { type SeriesEntry, pictureEntry } from './seriesEntry.ts';
import { ratio } from './show.ts';
import { type Cell, type Table, longColumn, quantity, rowColumn, words } from './table.ts';
import type { CollectionTree } from './tree.ts';

export interface CorrelationPage {
  readonly table: Table;
  readonly entries: readonly SeriesEntry[];
}

export function correlationPage(tree: CollectionTree): CorrelationPage {
  const all = correlations(tree);
  return {
    table: {
      caption: 'Correlation of Δ with β',
      columns: [rowColumn('Ion'), quantity('n', null), quantity('r', null), quantity('95 % interval', null, true), quantity('one left out', null, true), quantity('null band', null, true), longColumn('So')],
      rows: all.map(({ ion, words: text, correlation, figure }): readonly Cell[] => [
        { parts: words(text), path: `${ionPath(ion)}#${figure.id}` }, ratio(correlation.points.length, 0), coefficient(correlation.r),
        limits(correlation.interval), limits(correlation.leaveOneOut), limits(correlation.nullBand), correlationVerdict(correlation),
      ]),
    },
    entries: all.map(({ ion, figure, correlation }) => pictureEntry(figure, correlation.points.length, ionPath(ion), ion)),
  };
}
