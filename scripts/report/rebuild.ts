import type { RowDifference } from '../export/compareRows.ts';
import type { Rebuild } from '../export/fromExport.ts';
import { counted } from './columns.ts';

/** Most differences that are told one by one. */
const mostTold = 20;

/** What a rebuild from an export found, as lines for a person. */
export function rebuildLines({ comparison: { cells, differences, largest }, sameBytes }: Rebuild): string[] {
  const rest = differences.length - mostTold;
  return [
    `Compared ${counted(cells, 'cell')} with the export: ${counted(differences.length, 'difference')}.`,
    ...(differences.some(({ table, row }) => table === 'meta' && (row === 'engine' || row === 'software')) ? ['The export was made by another version of this software.'] : []),
    ...(differences.length === 0 ? [] : [`Largest difference of a fitted parameter or its uncertainty: ${largest === 0 ? 'none' : `${largest.toPrecision(2)} of itself`}.`]),
    ...(sameBytes === null ? [] : [sameBytes ? 'The rebuilt database has the bytes of the published one.' : 'The rebuilt database has not the bytes of the published one.']),
    ...differences.slice(0, mostTold).map(differenceLine),
    ...(rest > 0 ? [`and ${rest} more`] : []),
  ];
}

function differenceLine({ table, row, column, published, rebuilt }: RowDifference): string {
  return `  ${table}, ${row}${column === null ? '' : `, ${column}`}: published ${published ?? 'empty'}, rebuilt ${rebuilt ?? 'empty'}`;
}
