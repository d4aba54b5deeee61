/**
 * What each kind of evidence adds to the score of a reading, on the scale of chi2. Our own choice: 9 is three standard
 * uncertainties, 4 is two. A weight "for each ... squared" is multiplied by the square of how far off it is.
 */
export const evidenceWeights = {
  /** Each fitted parameter; an assumed B counts as one. */
  parameter: 2,
  /** Each band that no transition is left for. */
  leftOver: 9,
  /** A spin-allowed transition predicted between two assigned bands and not assigned. */
  gap: 9,
  /** The same, elsewhere inside what was scanned. */
  unseen: 4,
  /** Both for transitions that move two electrons: weak, and often under charge transfer. Beyond the assigned bands they count once together. */
  twoElectronGap: 3,
  twoElectronUnseen: 1,
  /** A transition below the lowest assigned band, outside what was scanned: the spin-allowed order is read from below. */
  below: 4,
  /** A spin-flip line below an assigned one and not seen. */
  lineSkipped: 2,
  /** For each decade squared that the molar absorption coefficient lies outside the usual range. */
  absorptivityDecade: 4,
  /** A line where a broad band is expected, or the reverse. */
  width: 4,
  /** Another number of donor atoms in the record than the geometry has corners. */
  donors: 5,
  /** A broad band of unrecorded strength taken for a spin-forbidden transition. */
  forbiddenBroad: 4,
} as const;

/** beta outside these limits adds the square of how many steps it lies outside. */
export const usualBeta = { low: 0.5, high: 1, step: 0.05 } as const;

/**
 * Usual molar absorption coefficients of a d-d transition, L mol-1 cm-1 (common practice, no source): spin-forbidden
 * bands are stronger where there is no centre of inversion.
 */
export const usualAbsorptivities = {
  octahedral: { spinAllowed: { low: 1, high: 100 }, spinForbidden: { low: 0, high: 1 } },
  tetrahedral: { spinAllowed: { low: 50, high: 1000 }, spinForbidden: { low: 0, high: 10 } },
} as const;

/** Molar absorption coefficients, L mol-1 cm-1: stronger is charge transfer, weaker is spin-forbidden (common practice, no source). */
export const absorptivityLimits = { chargeTransfer: 1000, spinAllowed: 1 } as const;

/** Full widths at half height, cm-1: narrower is a line, wider is no spin-flip line (common practice, no source). */
export const widthLimits = { line: 600, spinFlip: 1000 } as const;
