import type { Change } from '../release/types.ts';
import { counted } from './columns.ts';

/** Most changes that are told one by one. */
const mostTold = 20;

/** What a release changed, as lines for a person. */
export function releaseLines(changes: readonly Change[], first: boolean): string[] {
  if (first) return ['It is the first release.'];
  const rest = changes.length - mostTold;
  return [`${counted(changes.length, 'change')} since the release before.`, ...changes.slice(0, mostTold).map(({ text }) => `  ${text}`), ...(rest > 0 ? [`  and ${rest} more`] : [])];
}
