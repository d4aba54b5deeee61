import { temperature } from './show.ts';
import type { MeasurementNode } from './tree.ts';
import { inlineText } from './typeset.ts';

/** Where the bands were measured, in a few words: "water, 295(5) K", "crystal, 77(1) K". */
export function conditions({ row }: MeasurementNode): string {
  const where = row.phase === 'solution'
    ? (row.medium === null ? 'solution, medium not recorded' : inlineText(row.medium))
    : [row.phase, row.host ? `in ${inlineText(row.host)}` : row.medium === null ? null : inlineText(row.medium)].filter(Boolean).join(', ');
  const technique = row.technique === null || row.technique === 'absorption' ? '' : `, ${row.technique}`;
  return `${where}, ${temperature(row.temperature_K, row.temperature_u_K)}${technique}`;
}

/** Where the readings are written down, in a few words: "notebook 17, p. 42", "source smith-1990, Table 2". */
export function writtenDown({ row }: MeasurementNode): string {
  return row.source === null ? `notebook ${row.notebook ?? 'not recorded'}` : `source ${row.source}${row.source_place === null ? '' : `, ${row.source_place}`}`;
}
