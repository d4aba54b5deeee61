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
