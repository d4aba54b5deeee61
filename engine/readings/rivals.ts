import type { FreeIon } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { rivalCases } from './cases.ts';
import { isFit } from './fitTypes.ts';
import { ratioFor } from './ratioFor.ts';
import { checkGround } from './groundCheck.ts';
import { keepWithin, searchReadings } from './search.ts';
import type { ScoredReading } from './scoring.ts';
import type { GroundCase } from './transitions.ts';

/** More rivals than this are not kept. */
const rivalsAtMost = 4;

/** The chosen assignment and those that compete with it, best first. */
export interface Contest {
  readonly chosen: ScoredReading | null;
  readonly rivals: readonly ScoredReading[];
  /** false: not every way to read the bands was tried. */
  readonly complete: boolean;
}

const keyOf = ({ ion, assigned }: ScoredReading): string =>
  [ion.geometry, ion.multiplicity, ...assigned.map((one) => `${one.label}@${one.observation.bands.join('+')}`)].join(' ');

/** Whether a reading says of some bands what the other says of them too, and nothing of the rest: that is no other reading. */
function isPartOf(reading: ScoredReading, other: ScoredReading): boolean {
  if (reading.ion.geometry !== other.ion.geometry || reading.ion.multiplicity !== other.ion.multiplicity) return false;
  return reading.assigned.every(({ label, observation }) => other.assigned.some((one) => one.label === label && one.observation.bands.join() === observation.bands.join()));
}

/**
 * The typed reading, or the best one where no terms are typed, against every other way to read the bands: other
 * candidates, free assignment, the other geometry, the other spin state.
 *
 * A typed assignment stays chosen whatever its rivals score.
 */
export function contest(measurement: Measurement, ion: GroundCase, policy: Policy, freeIon: FreeIon | null): Contest {
  const ratio = ratioFor(policy, measurement.ion.name);
  const task = { measurement, ion, policy, ratio, freeIon };
  const typed = searchReadings(task, 'as typed');
  const chosen = typed.readings[0] ?? null;
  const known = chosen?.score;
  const anyTyped = measurement.bands.some((band) => band.terms.length > 0);
  const searches = [
    ...(anyTyped ? [searchReadings(task, 'free', known)] : []),
    ...rivalCases(ion).map((other) => searchReadings({ ...task, ion: other }, 'free', known)),
  ];
  const others = [...typed.readings.slice(1), ...searches.flatMap(({ readings }) => readings)];
  const seen = new Set(chosen ? [keyOf(chosen)] : []);
  const distinct = others.filter((reading) => {
    if (!isFit(reading.outcome) || !Number.isFinite(reading.score) || reading.assigned.length === 0) return false;
    if (checkGround(reading.ion, reading.outcome, freeIon) === 'contradicts') return false;
    const key = keyOf(reading);
    if (seen.has(key)) return false;
    seen.add(key);
    return true;
  });
  distinct.sort((a, b) => a.score - b.score);
  const notWithin = distinct.filter((reading, i) => !(chosen && isPartOf(reading, chosen)) && !distinct.slice(0, i).some((better) => isPartOf(reading, better)));
  const chosenScore = chosen && Number.isFinite(chosen.score) ? chosen.score : Number.POSITIVE_INFINITY;
  const reference = Math.min(chosenScore, notWithin[0]?.score ?? Number.POSITIVE_INFINITY);
  const within = Math.max(reference, Number.isFinite(chosenScore) ? chosenScore : reference) + keepWithin;
  return { chosen, complete: [typed, ...searches].every(({ complete }) => complete), rivals: notWithin.filter((reading) => reading.score <= within).slice(0, rivalsAtMost) };
}
