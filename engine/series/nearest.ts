import { nearestReason, whatDiffers } from '../words/placing.ts';
import { ionKey, ionWords, ligandSetKey, phaseClass } from './identity.ts';
import type { FactorFit } from './factorTypes.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

/** An earlier complex near the new one once the ion's own share of Delta is taken out. */
export interface NearComplex {
  readonly result: SeriesResult;
  /** Delta over the ion's g: what its ligands do. */
  readonly deltaOverG: number;
  readonly beta: number | null;
  /** In spreads of the collection. */
  readonly distance: number;
  /** "another ion: V(II)", "another isomer": what is not the same. */
  readonly differs: readonly string[];
}

export interface NearestComplexes {
  readonly deltaOverG: number | null;
  readonly complexes: readonly NearComplex[];
  /** Why there are none, or that beta played no part; null otherwise. */
  readonly reason: string | null;
}

/** So many are named. */
const named = 5;

/**
 * The earlier complexes nearest in (Delta/g, beta), each axis in units of its spread over the collection. g comes from the factors without
 * the new complex's data, so that complexes of different ions of one island can be compared by what their ligands do.
 */
export function nearestComplexes(result: SeriesResult, fits: Readonly<Record<SeriesParameter, FactorFit>> | null): NearestComplexes {
  const none = (reason: string): NearestComplexes => ({ deltaOverG: null, complexes: [], reason });
  const { Delta, beta } = result.parameters;
  if (fits === null) return none(nearestReason.geometry);
  if (Delta.value === null) return none(nearestReason.withheld);
  const scaleOf = (one: SeriesResult): { readonly g: number; readonly island: number } | null => {
    const factor = fits.Delta.factors.find(({ kind, name }) => kind === 'ion' && name === ionKey(one.complex));
    return factor?.value == null ? null : { g: factor.value, island: factor.island };
  };
  const own = scaleOf(result);
  if (own === null) return none(nearestReason.noFactor(ionWords(result.complex)));
  const members = fits.Delta.complexes.map((one) => one.result);
  const placed = members.flatMap((member) => {
    const scale = scaleOf(member);
    return scale === null || scale.island !== own.island ? [] : [{ member, x: member.parameters.Delta.value! / scale.g, y: member.parameters.beta.value }];
  });
  const withBeta = beta.value !== null;
  const usable = withBeta ? placed.filter(({ y }) => y !== null) : placed;
  const [spreadX, spreadY] = [spread(usable.map(({ x }) => x)), spread(usable.flatMap(({ y }) => y ?? []))];
  const x0 = Delta.value / own.g;
  const complexes = usable.map(({ member, x, y }): NearComplex => ({
    result: member, deltaOverG: x, beta: y,
    distance: Math.hypot((x - x0) / spreadX, withBeta ? (y! - beta.value!) / spreadY : 0),
    differs: differences(result, member),
  })).sort((a, b) => a.distance - b.distance || (a.result.complex.id < b.result.complex.id ? -1 : 1)).slice(0, named);
  const reason = complexes.length === 0 ? nearestReason.nothing : withBeta ? null : nearestReason.withoutBeta;
  return { deltaOverG: x0, complexes, reason };
}

/** Standard deviation; 1 where nothing varies. */
function spread(values: readonly number[]): number {
  const mean = values.reduce((a, b) => a + b, 0) / values.length;
  const deviation = Math.sqrt(values.reduce((sum, value) => sum + (value - mean) ** 2, 0) / values.length);
  return deviation > 0 ? deviation : 1;
}

function differences(a: SeriesResult, b: SeriesResult): readonly string[] {
  const [own, other] = [a.complex, b.complex];
  return [
    ...(ionKey(own) === ionKey(other) ? [] : [whatDiffers.ion(ionWords(other))]),
    ...(ligandSetKey(own) === ligandSetKey(other) ? [] : [whatDiffers.ligands]),
    ...(own.isomer === other.isomer || ligandSetKey(own) !== ligandSetKey(other) ? [] : [whatDiffers.isomer(other.isomer)]),
    ...(phaseClass(a) === phaseClass(b) ? [] : [whatDiffers.phase(b.phase)]),
    ...(a.transitions.join(' ') === b.transitions.join(' ') || ionKey(own) !== ionKey(other) ? [] : [whatDiffers.transitions]),
  ];
}
