import type { FreeIon } from '../ions/types.ts';
import { lowestLevel } from '../levels/crossings.ts';
import type { Fit } from './fitTypes.ts';
import type { GroundCase } from './transitions.ts';

/**
 * Whether the fitted parameters give the declared ground multiplicity:
 * `agrees`; `near`: only within the range of an assumed C/B; `contradicts`.
 */
export type GroundCheck = 'agrees' | 'near' | 'contradicts';

/** beta between these where B was not fitted. */
const betaRange = [0.6, 0.95] as const;

/** Where B was not fitted, Delta/B must miss the crossing by this much at both ends before a reading is refused. */
const clearMargin = 0.15;

/** Above this u(B)/B the fitted B is no ground for a refusal. */
const looseB = 0.15;

/** Where the ground multiplicity changes. */
export interface SpinCrossing {
  readonly deltaOverB: number;
  /** Ground multiplicity below and above. */
  readonly below: number;
  readonly above: number;
}

/** Delta/B up to which a crossing is looked for. */
const strongestField = 60;

/**
 * The field only ever favours fewer unpaired electrons, so the ground multiplicity falls once from the
 * highest; found by bisection to 1e-9 in Delta/B.
 */
function crossingOfSpin(ion: GroundCase, ratio: number): SpinCrossing | null {
  const spinAt = (x: number): number => lowestLevel(ion.electrons, ion.geometry, x, 1, ratio).multiplicity;
  const below = spinAt(0.5);
  if (spinAt(strongestField) === below) return null;
  let low = 0.5;
  let high = strongestField;
  while (high - low > 1e-9) {
    const middle = (low + high) / 2;
    if (spinAt(middle) === below) low = middle;
    else high = middle;
  }
  return { deltaOverB: (low + high) / 2, below, above: spinAt(high) };
}

const crossingsHeld = new Map<string, SpinCrossing | null>();

/** Delta/B at which the ground multiplicity changes at a given C/B; null where it never does. Held: a policy uses few C/B. */
export function spinCrossing(ion: GroundCase, ratio: number): SpinCrossing | null {
  const key = `${ion.electrons} ${ion.geometry} ${ratio}`;
  let found = crossingsHeld.get(key);
  if (found === undefined) {
    found = crossingOfSpin(ion, ratio);
    if (crossingsHeld.size > 500) crossingsHeld.clear();
    crossingsHeld.set(key, found);
  }
  return found;
}

/** Compares the declared ground multiplicity with the ground level at the fitted parameters. */
export function checkGround(ion: GroundCase, fit: Fit, freeIon: FreeIon | null): GroundCheck {
  const { delta, racahB, racahC } = fit.solutions[0]!.at;
  // A B that these bands hardly fix says nothing of the spin state either.
  const loose = Math.sqrt(fit.total[1]![1]!) > looseB * racahB;
  if (fit.mode === 'field' || fit.mode === 'field, B assumed' || loose) return checkWithoutB(ion, delta, fit.ratio.value, freeIon);
  if (fit.ratio.origin === 'fitted')
    return lowestLevel(ion.electrons, ion.geometry, delta, racahB, racahC).multiplicity === ion.multiplicity ? 'agrees' : 'contradicts';
  const agrees = (ratio: number): boolean => {
    const crossing = spinCrossing(ion, ratio);
    return !crossing || ion.multiplicity === (delta / racahB < crossing.deltaOverB ? crossing.below : crossing.above);
  };
  const { value, u } = fit.ratio;
  if (agrees(value)) return 'agrees';
  return agrees(Math.max(0, value - u)) || agrees(value + u) ? 'near' : 'contradicts';
}

function checkWithoutB(ion: GroundCase, delta: number, ratio: number, freeIon: FreeIon | null): GroundCheck {
  const crossing = spinCrossing(ion, ratio);
  if (!crossing || !freeIon) return 'agrees';
  const places = betaRange.map((beta) => delta / (beta * freeIon.racahB0) / crossing.deltaOverB);
  const wrong = ion.multiplicity === crossing.below ? (x: number) => x > 1 : (x: number) => x < 1;
  const clear = ion.multiplicity === crossing.below ? (x: number) => x > 1 + clearMargin : (x: number) => x < 1 / (1 + clearMargin);
  if (places.every(clear)) return 'contradicts';
  return places.every(wrong) ? 'near' : 'agrees';
}
