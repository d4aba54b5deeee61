import { concise } from '../quantity/print.ts';
import type { Caution } from './types.ts';

/** One measurement of a complex as its cautions need it. */
export interface MeasurementFacts {
  readonly id: string;
  readonly phase: string;
  readonly temperature: number | null;
  readonly delta: { readonly value: number; readonly u: number } | null;
  readonly racahB: { readonly value: number; readonly u: number } | null;
  /** Quoted numbers that disagree with the refitted ones: "Delta = 21 600 against 22 130(170) cm-1". */
  readonly quotedDisagrees: readonly string[];
}

/** A complex with all its measurements. */
export interface ComplexFacts {
  /** Whether three chelate rings surround an octahedral ion. */
  readonly trisChelate: boolean;
  readonly measurements: readonly MeasurementFacts[];
}

/** Conditions further apart than this are not alike, K. */
const alikeWithin = 50;

const alike = (a: MeasurementFacts, b: MeasurementFacts): boolean =>
  (a.phase === 'solution') === (b.phase === 'solution') && (a.temperature === null || b.temperature === null || Math.abs(a.temperature - b.temperature) <= alikeWithin);

/** Repeats of one complex carry the same model error, so they are compared by the readings alone. */
const distinguishable = (a: { value: number; u: number } | null, b: { value: number; u: number } | null): boolean =>
  a !== null && b !== null && Math.abs(a.value - b.value) > 2 * Math.hypot(a.u, b.u);

/**
 * Cautions that need more than one measurement, or the ligands: for each measurement, by its id.
 */
export function complexCautions(complex: ComplexFacts): ReadonlyMap<string, readonly Caution[]> {
  return new Map(
    complex.measurements.map((one) => {
      const found: Caution[] = [];
      const others = complex.measurements.filter((other) => other !== one);
      if (complex.trisChelate) found.push({ code: 'TRIGONAL_FIELD', text: 'Three chelate rings give a trigonal field, which is not in the model.' });
      const contrary = others.find((other) => alike(one, other) && (distinguishable(one.delta, other.delta) || distinguishable(one.racahB, other.racahB)));
      if (contrary) {
        const [name, mine, theirs] = distinguishable(one.delta, contrary.delta) ? (['Delta', one.delta!, contrary.delta!] as const) : (['B', one.racahB!, contrary.racahB!] as const);
        found.push({
          code: 'MEASUREMENTS_DISAGREE',
          text: `${contrary.id} of the same complex under like conditions gives ${name} ${concise(theirs.value, theirs.u, 'page')} against ${concise(mine.value, mine.u, 'page')} cm⁻¹ (uncertainties from the readings alone).`,
        });
      }
      const unlike = others.find((other) => !alike(one, other));
      if (unlike) found.push({ code: 'CONDITIONS_DIFFER', text: `${unlike.id} of the same complex was measured in another phase or more than ${alikeWithin} K away: compare with care.` });
      if (one.quotedDisagrees.length > 0) found.push({ code: 'QUOTED_VALUE_DISAGREES', text: `Printed elsewhere: ${one.quotedDisagrees.join('; ')}.` });
      return [one.id, found] as const;
    }),
  );
}
