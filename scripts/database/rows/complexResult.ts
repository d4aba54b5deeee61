import { hazardCautions, policyId } from '#engine';
import type { Ion, Policy, Reading, SeriesResult, Verdict } from '#engine';
import type { ComplexRecord, LigandRecord } from '../../content/types.ts';
import { frozenComplexes } from '../../release/snapshot.ts';
import type { FrozenComplex } from '../../release/types.ts';
import { freeIonRows, freeIonSetNames } from './collection.ts';
import { complexRows } from './complex.ts';
import { auditRows, cautionsOfComplex, readRecord } from './complexFacts.ts';
import { hazardSubject } from './hazardSubject.ts';
import { cautionRows, readingRows } from './reading.ts';
import { reviewItems, spareReadings } from './review.ts';
import type { ReviewItem, SpareReading } from './review.ts';
import { mergeTables } from './row.ts';
import type { Tables } from './row.ts';
import { complexSeriesResults } from './series.ts';

/** What the rows of the collection as a whole need to know of one complex. Stands through JSON without loss. */
export interface ComplexFacts {
  readonly id: string;
  readonly ion: Ion;
  /** Policies of its measurements that are not the collection's. */
  readonly overrides: readonly Policy[];
  /** Of the chosen readings, in the order of the measurements. */
  readonly verdicts: readonly Verdict[];
  readonly review: readonly ReviewItem[];
  readonly spare: readonly SpareReading[];
  readonly series: readonly SeriesResult[];
  readonly frozen: FrozenComplex;
}

/** Tables whose rows come from one complex each, and hang on no other. */
export const complexTables: readonly string[] = [
  'complex', 'complex_ligand', 'hazard_override', 'measurement', 'observed_range', 'band', 'quoted', 'reading', 'reading_band', 'reading_band_member', 'not_fitted',
  'branch', 'parameter', 'correlation', 'predicted_band', 'evidence', 'helpful_band', 'stress_pair', 'stress_left_out', 'audit', 'caution',
];

/**
 * Every row of one complex, and what the collection needs of it. They hang on its record, its ligands, its readings and the policy alone.
 * @param readings of each measurement in the order of the record, the chosen one first; throws where one has none
 * @param inForce id of the collection's policy
 */
export function complexResult(
  complex: ComplexRecord, ligands: readonly LigandRecord[], readings: readonly (readonly Reading[])[], inForce: string,
): { readonly tables: Tables; readonly facts: ComplexFacts } {
  const chosen = complex.measurements.map(({ id }, index) => {
    const first = readings[index]?.[0];
    if (first === undefined) throw new Error(`no reading for ${complex.id}/${id}`);
    return first;
  });
  const records = complex.measurements.map((measurement, index) => readRecord(measurement, chosen[index]!));
  const cautions = cautionsOfComplex(complex, ligands, records);
  const reviewed = { complex, records, cautions };
  const hazards = hazardCautions(hazardSubject(complex, ligands));
  let numbered = hazards.length;
  const parts: Tables[] = [complexRows(complex, complex.multiplicity ?? chosen[0]?.multiplicity ?? null, hazards), { audit: records.flatMap((record) => auditRows(complex.id, record)) }];
  complex.measurements.forEach((measurement, place) => {
    readings[place]!.forEach((reading, index) => {
      const all = index === 0 ? [...reading.cautions, ...(cautions.get(measurement.id) ?? [])] : reading.cautions;
      const rows = cautionRows(complex.id, measurement.id, index + 1, all, numbered);
      numbered += rows.length;
      parts.push(readingRows(complex.id, measurement.id, index + 1, reading, measurement.policy, complex.ion.electrons), { caution: rows });
    });
  });
  const tables = mergeTables(parts);
  const freeIons = freeIonSetNames.flatMap((set) => freeIonRows(set, complex.ion));
  return {
    tables,
    facts: {
      id: complex.id,
      ion: complex.ion,
      overrides: complex.measurements.map(({ policy }) => policy).filter((policy) => policyId(policy) !== inForce),
      verdicts: chosen.map(({ verdict }) => verdict),
      review: reviewItems(reviewed),
      spare: spareReadings(reviewed),
      series: complexSeriesResults(complex, chosen),
      frozen: frozenComplexes({ ...tables, free_ion: freeIons })[0]!,
    },
  };
}
