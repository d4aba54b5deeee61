import { freeIon, readWithRivals } from '#engine';
import type { Measurement, Policy } from '#engine';

/** One measurement to be read, with its full id for messages. */
export interface ReadingTask {
  readonly id: string;
  readonly measurement: Measurement;
  readonly policy: Policy;
}

/** The readings of one measurement as JSON text, the chosen one first. Throws where the engine fails, naming the measurement. */
export function readOneAsJson({ id, measurement, policy }: ReadingTask): string {
  try {
    const { chosen, rivals } = readWithRivals(measurement, policy, freeIon(policy.freeIons, measurement.ion));
    return JSON.stringify([chosen, ...rivals]);
  } catch (error) {
    throw new Error(`the fit of ${id} failed: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}
