import { policyId } from '#engine';
import type { Caution, Policy, Reading } from '#engine';
import { detailRows } from './readingDetail.ts';
import { flag, list } from './row.ts';
import type { Row, Tables } from './row.ts';

const parameterOrder = ['Delta', 'B', 'C', 'beta'];

/** Rows of one reading of a measurement. `number` 1 is the chosen reading. Spectral cautions are left to `cautionRows`. */
export function readingRows(complex: string, measurement: string, number: number, reading: Reading, policy: Policy, electrons: number): Tables {
  const key = { complex, measurement, reading: number };
  return {
    reading: [{
      complex, measurement, number, chosen: flag(number === 1), verdict: reading.verdict, reason: reading.reason,
      assignment: reading.assignment, geometry: reading.geometry, multiplicity: reading.multiplicity, ground: reading.ground,
      Delta_over_B: reading.deltaOverB, chi2: reading.chi2, bands_used: reading.bandsUsed, spare_bands: reading.spareBands,
      rms_residual: reading.rmsResidual, C_over_B: reading.ratio?.value ?? null, C_over_B_u: reading.ratio?.u ?? null,
      C_over_B_origin: reading.ratio?.origin ?? null, free_ion_set: policy.freeIons, policy: policyId(policy),
      measure_next: reading.measureNext, score: reading.score, ranking: reading.ranking,
      combination: reading.identifiability?.combination ?? null, rank: reading.identifiability?.rank ?? null,
      singular_values: reading.identifiability ? list(reading.identifiability.singularValues) : null,
      spin_crossing: reading.groundState?.crossing ?? null, remarks: list(reading.remarks), sentence: reading.sentence,
    }],
    reading_band: reading.bands.map((band, index) => ({
      ...key, number: index + 1, label: band.label, observed: band.observed, u_minus: band.uMinus, u_plus: band.uPlus,
      u_assumed: flag(band.uAssumed), floor: band.floor, used: flag(band.used), calculated: band.calculated,
      residual: band.residual, leverage: band.leverage, gradient_Delta: band.gradient?.delta ?? null, gradient_B: band.gradient?.racahB ?? null,
      gradient_C: band.gradient?.racahC ?? null,
    })),
    reading_band_member: reading.bands.flatMap((band, index) =>
      band.bands.map((member) => ({ ...key, reading_band: index + 1, band: member + 1 }))),
    not_fitted: reading.notFitted.map(({ band, reason }) => ({ ...key, band: band + 1, reason })),
    branch: reading.branches.map((branch, index) => ({
      ...key, number: index + 1, Delta: branch.delta, B: branch.racahB, C: branch.racahC, chi2: branch.chi2, chosen: flag(branch.chosen),
    })),
    parameter: reading.parameters.map((parameter) => ({
      ...key, name: parameter.name, value: parameter.value, u: parameter.u, u_total: parameter.uTotal,
      low: parameter.limits?.low ?? null, high: parameter.limits?.high ?? null,
      standing: parameter.standing, reason: parameter.reason,
    })),
    correlation: reading.correlations.map((correlation) => correlationRow(key, correlation)),
    predicted_band: reading.predicted.map((band) => ({
      ...key, label: band.label, position: band.position, u: band.u, spin_allowed: flag(band.spinAllowed), looked: band.looked,
    })),
    ...detailRows(key, reading, electrons),
  };
}

// The pair is stored in the order of the parameter table, whichever way it arrived.
function correlationRow(key: Row, { first, second, value }: Reading['correlations'][number]): Row {
  const inOrder = parameterOrder.indexOf(first) <= parameterOrder.indexOf(second);
  return { ...key, first: inOrder ? first : second, second: inOrder ? second : first, value };
}

/** Rows of the spectral cautions of one reading; `before` is how many caution rows the complex has already. */
export function cautionRows(complex: string, measurement: string, number: number, cautions: readonly Caution[], before: number): Row[] {
  return cautions.map((caution, index) => ({
    complex, number: before + index + 1, subject: 'spectral', measurement, reading: number,
    code: caution.code, found_in: null, text: caution.text,
  }));
}
