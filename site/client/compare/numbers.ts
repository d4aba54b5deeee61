import { type Difference, type SeriesNumber, concise } from '#engine';
import { plainNumber } from '../../data/show.ts';
import { type Cell, soft, words } from '../../data/table.ts';
import { sentenceShown } from '../../data/typeset.ts';

/** A derived number with its total u, or that it is withheld. */
export const numberCell = ({ value, uTotal }: Pick<SeriesNumber, 'value' | 'uTotal'>): Cell => value === null ? soft('withheld') : concise(value, uTotal, 'page');

/** The same with the reason where it is withheld. */
export const numberOrReason = ({ value, uTotal, reason }: Pick<SeriesNumber, 'value' | 'uTotal' | 'reason'>): Cell =>
  value === null ? { parts: sentenceShown(reason === null ? 'withheld' : `withheld: ${reason}`), soft: true } : concise(value, uTotal, 'page');

/** A signed number with a plus sign. */
export const signed = (value: number, decimals: number): string => `${value > 0 ? '+' : ''}${plainNumber(value, decimals)}`;

export const differenceCell = (found: Difference | null): Cell => found === null ? soft('not known') : `${found.value > 0 ? '+' : ''}${concise(found.value, found.u, 'page')}`;
export const zCell = (found: { readonly z: number | null } | null): Cell => found?.z == null ? soft('none') : signed(found.z, 1);
export const verdictCell = (found: Difference | null): Cell => found === null ? soft('not tested') : found.distinguishable ? { parts: words('differs') } : 'not distinguishable';
