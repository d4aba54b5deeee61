import { temperature } from './show.ts';
import type { MeasurementNode } from './tree.ts';

/** Where the bands were measured, in a few words: "water, 295(5) K", "crystal, 77(1) K". */
export function conditions({ row }: MeasurementNode): string {
  const where = row.phase === 'solution'
    ? (row.medium ?? 'solution, medium not recorded')
    : [row.phase, row.host ? `in ${row.host}` : row.medium].filter(Boolean).join(', ');
  const technique = row.technique === null || row.technique === 'absorption' ? '' : `, ${row.technique}`;
  return `${where}, ${temperature(row.temperature_K, row.temperature_u_K)}${technique}`;
}
