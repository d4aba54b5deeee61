import { freeIon, readWithRivals } from '#engine';
import type { Reading } from '#engine';
import type { ComplexRecord, LigandRecord, MeasurementRecord } from '../content/types.ts';
import { complexResult } from './rows/complexResult.ts';
import { pack } from './rows/packed.ts';
import type { PackedTables } from './rows/packed.ts';
import { measurementKey } from './rows/tables.ts';

/** What all complexes of a collection are fitted with. */
export interface Basis {
  readonly ligands: readonly LigandRecord[];
  /** Id of the policy in force. */
  readonly policyId: string;
}

/** One complex to be fitted; `known` are the readings of its measurements as JSON, null where they have to be found. */
export interface ComplexTask {
  readonly complex: ComplexRecord;
  readonly known: readonly (string | null)[];
}

/** A complex that is fitted; what is long stands as JSON text, which passes between threads faster than objects. */
export interface FittedComplex {
  readonly id: string;
  /** `PackedTables`. */
  readonly tables: string;
  /** `ComplexFacts`. */
  readonly facts: string;
  /** Readings where they were found now, by measurement. */
  readonly fresh: readonly (string | null)[];
}

export function tablesOf({ tables }: FittedComplex): PackedTables {
  return JSON.parse(tables) as PackedTables;
}

/**
 * Reads the measurements of a complex that are not known, and makes its rows. Every reading passes through the same JSON text, so that
 * cold and cached runs agree. Throws where the engine fails, naming the measurement.
 */
export function fitComplex({ complex, known }: ComplexTask, { ligands, policyId }: Basis): FittedComplex {
  const fresh = complex.measurements.map((measurement, index) => (known[index] == null ? readingsOf(complex.id, measurement) : null));
  const readings = complex.measurements.map((_, index) => JSON.parse(known[index] ?? fresh[index]!) as readonly Reading[]);
  const { tables, facts } = complexResult(complex, ligands, readings, policyId);
  return { id: complex.id, tables: JSON.stringify(pack(tables)), facts: JSON.stringify(facts), fresh };
}

/** The readings of one measurement as JSON text, the chosen one first. */
function readingsOf(complex: string, { id, engine, policy }: MeasurementRecord): string {
  try {
    const { chosen, rivals } = readWithRivals(engine, policy, freeIon(policy.freeIons, engine.ion));
    return JSON.stringify([chosen, ...rivals]);
  } catch (error) {
    throw new Error(`the fit of ${measurementKey(complex, id)} failed: ${error instanceof Error ? error.message : String(error)}`, { cause: error });
  }
}
