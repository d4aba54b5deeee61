/**
 * The normal deviate that is as improbable as Student's t with a number of degrees of freedom, so that a z from few complexes is not
 * read as one from many: z = (8n + 1)/(8n + 3) * sqrt(n ln(1 + t^2/n)), good to a few hundredths
 * (D. L. Wallace, Ann. Math. Stat. 30, 1121 (1959)).
 *
 * @param degrees degrees of freedom, above 0; null: the uncertainty is taken as known, and z is t
 */
export function normalOfStudent(t: number, degrees: number | null): number {
  if (degrees === null) return t;
  if (!(degrees > 0)) throw new RangeError(`degrees: ${degrees} is not above 0`);
  return Math.sign(t) * ((8 * degrees + 1) / (8 * degrees + 3)) * Math.sqrt(degrees * Math.log1p((t * t) / degrees));
}

/**
 * Degrees of freedom of a variance of which a part was estimated (Satterthwaite's formula, GUM (JCGM 100:2008) G.4.1): those of the
 * estimate over the square of its share. null where nothing of it was estimated.
 *
 * @param share the estimated part of the variance, 0 to 1
 * @param degrees those of the estimated part, at least 1
 */
export function effectiveDegrees(share: number, degrees: number): number | null {
  return share > 0 ? degrees / share ** 2 : null;
}
