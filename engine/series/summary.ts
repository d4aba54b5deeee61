import type { Measurement } from '../measurement/types.ts';
import type { Reading } from '../readings/types.ts';
import type { ParameterName } from '../words/types.ts';
import type { ComplexIdentity, SeriesNumber, SeriesResult } from './types.ts';

/**
 * A measurement's chosen reading as a comparison needs it.
 *
 * @param policy id of the policy under which it was fitted
 */
export function seriesResult(
  complex: ComplexIdentity, id: string, measurement: Pick<Measurement, 'phase' | 'temperature'>, policy: string, reading: Reading,
): SeriesResult {
  return {
    complex: { ...complex, multiplicity: complex.multiplicity ?? reading.multiplicity },
    measurement: id, phase: measurement.phase, temperature: measurement.temperature, policy, verdict: reading.verdict,
    parameters: parametersByName(reading.parameters),
    correlation: reading.correlations.find(({ first, second }) => [first, second].includes('Delta') && [first, second].includes('B'))?.value ?? null,
    transitions: usedTransitions(reading.bands),
    cautions: comparisonCautions(reading.cautions.map(({ code }) => code)),
  };
}

/** Codes of cautions that decide whether a result may be compared. Others are for people to read. */
const deciding: readonly string[] = ['B_ASSUMED', 'JAHN_TELLER_ENVELOPE', 'MORE_THAN_ONE_METAL'];

/** Of some caution codes those that a comparison asks for, in alphabetical order. */
export function comparisonCautions(codes: readonly string[]): readonly string[] {
  return deciding.filter((code) => codes.includes(code));
}

/** Labels of the transitions that entered a fit, in alphabetical order. */
export function usedTransitions(bands: readonly { readonly label: string; readonly used: boolean }[]): readonly string[] {
  return bands.filter(({ used }) => used).map(({ label }) => label).sort();
}

/** Delta, B, C and beta by name. Throws RangeError where one is missing. */
export function parametersByName(parameters: readonly (SeriesNumber & { readonly name: ParameterName })[]): Readonly<Record<ParameterName, SeriesNumber>> {
  const numberOf = (wanted: ParameterName): SeriesNumber => {
    const found = parameters.find(({ name }) => name === wanted);
    if (found === undefined) throw new RangeError(`parameters: ${wanted} is missing`);
    const { value, u, uTotal, standing, reason } = found;
    return { value, u, uTotal, standing, reason };
  };
  return { Delta: numberOf('Delta'), B: numberOf('B'), C: numberOf('C'), beta: numberOf('beta') };
}
