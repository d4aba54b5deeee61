/** One fitted band of a record with spare bands. */
export interface ResidualRow {
  readonly residual: number;
  readonly u: number;
  readonly floor: number;
}

/** The factor on an ion's floors that its records suggest. */
export interface FloorFactor {
  readonly kappa: number;
  readonly u: number;
  readonly spareBands: number;
}

/** Below this many spare bands nothing is said. */
export const fewestSpare = 8;

/** The factor is drawn towards 1 as if this many spare bands had given 1. */
const priorSpare = 8;

/**
 * The factor kappa on the model floors that would make chi2 per spare band one, from the records of one ion:
 * sum r^2 / (u^2 + kappa^2 tau^2) = spare, shrunk towards 1 with the weight of eight spare bands,
 * u(kappa)/kappa = 1/sqrt(2 n). For the steward's eye: it is never applied.
 *
 * @param rows every fitted band of the ion's readings that have spare bands
 * @param spareBands their spare bands in all
 * @returns null from fewer than eight spare bands
 */
export function floorFactor(rows: readonly ResidualRow[], spareBands: number): FloorFactor | null {
  if (spareBands < fewestSpare) return null;
  const chi2 = (kappa: number): number => rows.reduce((sum, row) => sum + row.residual ** 2 / (row.u ** 2 + (kappa * row.floor) ** 2), 0);
  let low = 0;
  let high = 1;
  if (chi2(0) <= spareBands) high = 0;
  else {
    while (chi2(high) > spareBands && high < 1e6) high *= 2;
    for (let i = 0; i < 60; i++) {
      const middle = (low + high) / 2;
      if (chi2(middle) > spareBands) low = middle;
      else high = middle;
    }
  }
  const kappa = (spareBands * high + priorSpare) / (spareBands + priorSpare);
  return { kappa, u: kappa / Math.sqrt(2 * spareBands), spareBands };
}
