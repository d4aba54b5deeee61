import type { FreeIon } from '../ions/types.ts';
import type { Measurement } from '../measurement/types.ts';
import type { Policy } from '../policy/types.ts';
import { concise } from '../quantity/print.ts';
import { aboveCeiling } from '../words/verdict.ts';
import type { ParameterName, Standing } from '../words/types.ts';
import type { Fit } from './fitTypes.ts';
import type { Parameter } from './types.ts';

const withheld = (name: ParameterName, reason: string): Parameter => ({ name, value: null, u: null, uTotal: null, limits: null, standing: 'withheld', reason });

const published = (name: ParameterName, value: number, u: number, uTotal: number, standing: Standing, reason: string | null = null): Parameter => ({
  name, value, u, uTotal, limits: null, standing, reason,
});

/** All four numbers withheld for one reason. */
export function nothingPublished(reason: string): readonly Parameter[] {
  return (['Delta', 'B', 'C', 'beta'] as const).map((name) => withheld(name, reason));
}

/** How far a number moves over one standard uncertainty of the assumed C/B; 0 where C/B was fitted. */
const shiftByRatio = (fit: Fit, index: number): number => Math.abs(fit.byRatio[index]!) * fit.ratio.u;

/**
 * Delta, B, C and beta with both uncertainties and standing, or withheld with the reason.
 *
 * A number is published only under the policy's ceiling on u(total); C never where it was assumed; beta only
 * from a B fitted to spin-allowed bands or with a free C.
 */
export function publishParameters(measurement: Measurement, fit: Fit, policy: Policy, freeIon: FreeIon | null): readonly Parameter[] {
  const { at } = fit.solutions[0]!;
  const u = [0, 1, 2].map((i) => Math.sqrt(Math.max(0, fit.reading[i]![i]!)));
  const uTotal = [0, 1, 2].map((i) => Math.sqrt(Math.max(0, fit.total[i]![i]!)));
  const ratioText = `C/B = ${concise(fit.ratio.value, fit.ratio.u)}`;

  const delta = ((): Parameter => {
    const relative = uTotal[0]! / at.delta;
    if (!(relative <= policy.ceilings.delta)) return withheld('Delta', aboveCeiling('Delta', relative, policy.ceilings.delta));
    if (fit.mode === 'field, B assumed') return published('Delta', at.delta, u[0]!, uTotal[0]!, 'assumed', `beta = ${concise(fit.assumedBeta!.value, fit.assumedBeta!.u)} was assumed`);
    if (shiftByRatio(fit, 0) > u[0]!) return published('Delta', at.delta, u[0]!, uTotal[0]!, 'assumed', `${ratioText} was assumed`);
    return published('Delta', at.delta, u[0]!, uTotal[0]!, 'fitted');
  })();

  const racahB = ((): Parameter => {
    if (fit.mode === 'field') return withheld('B', 'none of the bands in the fit moves with B');
    if (fit.mode === 'field, B assumed') return withheld('B', 'one band fixes one number: B was assumed to find Delta');
    const relative = uTotal[1]! / at.racahB;
    if (!(relative <= policy.ceilings.racahB)) return withheld('B', aboveCeiling('B', relative, policy.ceilings.racahB));
    if (fit.mode === 'field, B by a line') return published('B', at.racahB, u[1]!, uTotal[1]!, 'assumed', `taken from a spin-flip line with ${ratioText} assumed`);
    if (shiftByRatio(fit, 1) > u[1]!) return published('B', at.racahB, u[1]!, uTotal[1]!, 'assumed', `${ratioText} was assumed`);
    return published('B', at.racahB, u[1]!, uTotal[1]!, 'fitted');
  })();

  const racahC =
    fit.mode === 'field, B, C'
      ? published('C', at.racahC, u[2]!, uTotal[2]!, 'fitted')
      : withheld('C', `${whyNoC(fit, policy)}; ${ratioText} was assumed`);

  const beta = ((): Parameter => {
    if (racahB.value === null) return withheld('beta', 'B is withheld');
    if (fit.mode === 'field, B by a line') return withheld('beta', 'B rests on a spin-flip line with C/B assumed');
    if (measurement.innocenceDoubtful) return withheld('beta', 'the oxidation state is in doubt, so no free ion can be named');
    if (!freeIon) return withheld('beta', `the free-ion set "${policy.freeIons}" has no B0 for ${measurement.ion.name}`);
    return published('beta', racahB.value / freeIon.racahB0, racahB.u! / freeIon.racahB0, racahB.uTotal! / freeIon.racahB0, racahB.standing, racahB.reason);
  })();

  return [delta, racahB, racahC, beta];
}

/** Why C was not fitted. */
function whyNoC(fit: Fit, policy: Policy): string {
  if (fit.used.every(Boolean)) return 'no spin-flip bands fix it';
  return policy.cFitted ? 'the spin-flip bands do not fix it under the policy\'s ceiling' : 'the policy assumes C always';
}

/** Published numbers that rest on an assumed value, and that value in words; null where none does. */
export function restingOn(parameters: readonly Parameter[], fit: Fit): { readonly names: readonly ParameterName[]; readonly assumed: string } | null {
  const names = parameters.filter((parameter) => parameter.standing === 'assumed').map((parameter) => parameter.name);
  if (names.length === 0) return null;
  const assumed =
    fit.mode === 'field, B assumed'
      ? `the assumed beta = ${concise(fit.assumedBeta!.value, fit.assumedBeta!.u)}`
      : `the assumed C/B = ${concise(fit.ratio.value, fit.ratio.u)}`;
  return { names, assumed };
}

/** Correlations between the published numbers, from the total covariance. */
export function publishedCorrelations(parameters: readonly Parameter[], fit: Fit): { first: ParameterName; second: ParameterName; value: number }[] {
  const open = parameters.slice(0, 3).map((parameter) => parameter.value !== null);
  const pairs: [number, number][] = [[0, 1], [0, 2], [1, 2]];
  return pairs
    .filter(([i, j]) => open[i] && open[j])
    .map(([i, j]) => ({
      first: parameters[i]!.name, second: parameters[j]!.name,
      value: fit.total[i]![j]! / Math.sqrt(fit.total[i]![i]! * fit.total[j]![j]!),
    }));
}

