import { metalOf } from '../ions/metals.ts';
import type { Policy } from '../policy/types.ts';
import { difference } from './difference.ts';
import type { Difference } from './difference.ts';
import { ligandSetKey, measurementId } from './identity.ts';
import { publishedIonOf } from './publishedMatch.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

export type TrendKind = 'oxidation state' | 'down the group' | 'along 3d';

/** What is expected along a trend, and what that rests on. */
export interface Expectation {
  readonly trend: TrendKind;
  readonly parameter: SeriesParameter;
  readonly direction: 'rises' | 'falls';
  readonly basis: string;
}

const practice = 'common practice, no source';

/** The directions that a trend is held against. beta has none down a group or along 3d. */
export const expectations: readonly Expectation[] = [
  { trend: 'oxidation state', parameter: 'Delta', direction: 'rises', basis: `${practice}: by 40 to 80 % from M(II) to M(III)` },
  { trend: 'oxidation state', parameter: 'beta', direction: 'falls', basis: practice },
  { trend: 'down the group', parameter: 'Delta', direction: 'rises', basis: `${practice}: by 30 to 50 % from 3d to 4d` },
  { trend: 'along 3d', parameter: 'Delta', direction: 'rises', basis: 'in the order of the printed g of Jørgensen' },
];

/** Two complexes with the same ligands that are neighbours along a trend. */
export interface TrendStep {
  readonly expectation: Expectation;
  readonly from: SeriesResult;
  readonly to: SeriesResult;
  /** to less from. */
  readonly difference: Difference;
  /** to over from. */
  readonly ratio: number;
  readonly spinDiffers: boolean;
  readonly outcome: 'as expected' | 'against' | 'not distinguishable';
}

/**
 * Every step along oxidation state, down a group and along the 3d row between complexes of the same ligands, isomer and geometry.
 * Neighbours are compared: M(II) with M(III) where both are there, 3d with 4d.
 *
 * @param members results fit to be compared, one for each complex, of one geometry
 */
export function trendSteps(members: readonly SeriesResult[], parameter: SeriesParameter, floor: Policy['differentialFloor']): readonly TrendStep[] {
  return expectations.filter((one) => one.parameter === parameter).flatMap((expectation) =>
    [...chains(members, expectation.trend)].flatMap((chain) => chain.slice(1).flatMap((to, i) => stepOf(expectation, chain[i]!, to, floor) ?? [])));
}

function stepOf(expectation: Expectation, from: SeriesResult, to: SeriesResult, floor: Policy['differentialFloor']): TrendStep | null {
  const { parameter, direction } = expectation;
  const found = difference(to, from, parameter, floor);
  if (found === null) return null;
  const along = direction === 'rises' ? found.value > 0 : found.value < 0;
  return {
    expectation, from, to, difference: found, ratio: to.parameters[parameter].value! / from.parameters[parameter].value!,
    spinDiffers: to.complex.multiplicity !== from.complex.multiplicity,
    outcome: !found.distinguishable ? 'not distinguishable' : along ? 'as expected' : 'against',
  };
}

/** Complexes that differ along one trend alone, each chain in the order of the trend. */
function chains(members: readonly SeriesResult[], trend: TrendKind): readonly (readonly SeriesResult[])[] {
  const groups = new Map<string, { readonly result: SeriesResult; readonly place: number }[]>();
  for (const result of members) {
    const at = placeAlong(result, trend);
    if (at === null) continue;
    const { complex } = result;
    const key = [complex.geometry, complex.isomer, ligandSetKey(complex), at.key].join(' | ');
    const group = groups.get(key);
    if (group) group.push({ result, place: at.place });
    else groups.set(key, [{ result, place: at.place }]);
  }
  return [...groups].sort(([a], [b]) => (a < b ? -1 : 1)).map(([, group]) => {
    const sorted = group.sort((a, b) => a.place - b.place || (measurementId(a.result) < measurementId(b.result) ? -1 : 1));
    // Two spin states of one ion share a place: the trend says nothing between them, the first by id stands.
    return sorted.filter((one, i) => i === 0 || one.place !== sorted[i - 1]!.place).map(({ result }) => result);
  });
}

function placeAlong({ complex: { ion, multiplicity, geometry } }: SeriesResult, trend: TrendKind): { readonly key: string; readonly place: number } | null {
  if (trend === 'oxidation state') return { key: ion.metal, place: ion.oxidation };
  if (trend === 'down the group') {
    const metal = metalOf(ion.metal);
    // Octahedral low-spin ions of one row are the fair neighbours of the 4d row, which knows no other.
    return metal === null ? null : { key: `${metal.group} ${ion.oxidation} ${multiplicity}`, place: Number(ion.row[0]) };
  }
  const printed = ion.row === '3d' && geometry === 'octahedral' ? publishedIonOf(ion.name, multiplicity) : null;
  return printed?.g == null ? null : { key: `${ion.oxidation}`, place: printed.g };
}
