import type { Geometry } from '../ions/types.ts';
import { notLike } from '../words/series.ts';
import type { Unlike } from '../words/series.ts';
import { roomTemperature, selectComparable } from './comparable.ts';
import type { Comparable, NotCompared } from './comparable.ts';
import { measurementId } from './identity.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

/**
 * The results that enter a factor fit, in the order of their ids, and those that do not with the reason. Like with like in policy,
 * geometry and temperature (within 50 K of room temperature, or not recorded); phases are pooled, since few ions have enough
 * complexes in one; one result stands for each complex. A Delta that rests on an assumed B stays out.
 */
export function factorRows(
  results: readonly SeriesResult[], parameter: SeriesParameter, geometry: Geometry, policy: string,
): Pick<Comparable, 'members' | 'leftOut'> {
  const leftOut: NotCompared[] = [];
  const candidates = results.filter((result) => {
    const unlike = whyNot(result, parameter);
    if (unlike !== null) leftOut.push({ result, ...unlike });
    return unlike === null;
  });
  const chosen = selectComparable(candidates, parameter, {
    policy, ion: null, geometry, multiplicity: null, ligandSet: null, phase: null,
    temperature: { near: roomTemperature, orNotRecorded: true },
  });
  const inOrder = (a: SeriesResult, b: SeriesResult): number => (measurementId(a) < measurementId(b) ? -1 : 1);
  return {
    members: [...chosen.members].sort(inOrder),
    leftOut: [...leftOut, ...chosen.leftOut].sort((a, b) => inOrder(a.result, b.result)),
  };
}

function whyNot({ complex, cautions, parameters }: SeriesResult, parameter: SeriesParameter): Unlike | null {
  if (complex.geometry !== null && complex.multiplicity === null) return notLike.spinUnknown;
  if (parameter === 'Delta' && cautions.includes('B_ASSUMED')) return notLike.fieldRestsOnB;
  const { value, uTotal } = parameters[parameter];
  return value !== null && uTotal === null ? notLike.noUncertainty : null;
}
