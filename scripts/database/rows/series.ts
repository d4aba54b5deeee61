import { aquaLigand, fitFactors, memberPlacements, policyId, seriesParameters, seriesResult } from '#engine';
import type { ComplexIdentity, FactorFit, Geometry, Reading, SeriesLigand, SeriesResult } from '#engine';
import type { ComplexRecord } from '../../content/types.ts';
import { flag, mergeTables } from './row.ts';
import type { Tables } from './row.ts';

const geometries: readonly Geometry[] = ['octahedral', 'tetrahedral'];

/** What makes a complex this complex, as a comparison needs it. */
export function identityOf({ id, formula, ion, geometry, geometryName, multiplicity, isomer, ligands }: ComplexRecord): ComplexIdentity {
  return { id, formula, ion, geometry, geometryName, multiplicity, isomer, ligands };
}

/** The chosen reading of every measurement of a complex as a comparison needs it; `chosen` are in the order of the measurements. */
export function complexSeriesResults(complex: ComplexRecord, chosen: readonly Reading[]): readonly SeriesResult[] {
  // A complex has one spin state: where none was typed, that of its first measurement's reading.
  const identity = { ...identityOf(complex), multiplicity: complex.multiplicity ?? chosen[0]?.multiplicity ?? null };
  return complex.measurements.map(({ id, engine, policy }, index) => seriesResult(identity, id, engine, policyId(policy), chosen[index]!));
}

/** Rows of the factor fits and of every measurement's predictions from the rest of the collection. */
export function seriesRows(results: readonly SeriesResult[], ligands: readonly SeriesLigand[], policy: string): Tables {
  const aqua = aquaLigand(ligands);
  return mergeTables(seriesParameters.flatMap((parameter) => geometries.map((geometry) => {
    const own = results.filter(({ complex }) => complex.geometry === geometry);
    return fitRows(fitFactors(own, { parameter, geometry, policy, aqua }), own);
  })));
}

function fitRows(fit: FactorFit, results: readonly SeriesResult[]): Tables {
  const { parameter, geometry } = fit;
  return {
    factor_fit: fit.complexes.length === 0 ? [] : [{
      parameter, geometry, complexes: fit.complexes.length, scatter: fit.scatter.value, scatter_standing: fit.scatter.standing, spare_complexes: fit.scatter.spare,
    }],
    factor_island: fit.islands.map((island) => ({
      parameter, geometry, number: island.number, gauge: island.gauge, gauge_is_aqua: flag(island.gaugeIsAqua),
      complexes: island.complexes, rank: island.rank, spare_complexes: island.spare,
    })),
    factor: fit.factors.map((factor) => ({
      parameter, geometry, kind: factor.kind, name: factor.name, value: factor.value, u: factor.u, complexes: factor.complexes,
      island: factor.island, gauge: flag(factor.gauge), tested: flag(factor.tested), reason: factor.reason,
    })),
    factor_complex: fit.complexes.map(({ result, island, fitted, residual, leverage }) => ({
      parameter, complex: result.complex.id, measurement: result.measurement, geometry, island, fitted, residual, leverage,
    })),
    factor_left_out: fit.leftOut.map(({ result, reason }) => ({ parameter, complex: result.complex.id, measurement: result.measurement, reason })),
    placement: memberPlacements(results, fit).flatMap(({ result, placed }) => placed.map((one) => ({
      complex: result.complex.id, measurement: result.measurement, parameter, method: one.method,
      predicted: one.predicted, u: one.u, z: one.z, reason: one.reason,
    }))),
  };
}
