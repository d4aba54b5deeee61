import { defaultPolicy, freeIon, readMeasurement } from '#engine';
import type { Measurement, Parameter, ParameterName, Policy, Reading } from '#engine';

/** Reads a measurement under a policy with the free ion of the policy's own set. */
export function read(sample: Measurement, policy: Policy = defaultPolicy): Reading {
  return readMeasurement(sample, policy, freeIon(policy.freeIons, sample.ion));
}

export function parameter(reading: Reading, name: ParameterName): Parameter {
  const found = reading.parameters.find((one) => one.name === name);
  if (found === undefined) throw new Error(`no ${name} in the reading`);
  return found;
}

/** The published value; throws where it is withheld. */
export function numberOf(reading: Reading, name: ParameterName): number {
  const { value, reason } = parameter(reading, name);
  if (value === null) throw new Error(`${name} is withheld: ${reason}`);
  return value;
}

export const codesOf = (reading: Reading): readonly string[] => reading.cautions.map((caution) => caution.code);
