/** The metal ion of a complex: element symbol, oxidation state and number of d electrons. */
export interface Ion {
  /** "Cr(III)": the name by which records, pages and the database know the ion. */
  readonly name: string;
  readonly metal: string;
  readonly oxidation: number;
  /** Number of d electrons, 0 to 10. */
  readonly electrons: number;
  readonly row: '3d' | '4d' | '5d';
}

/** The geometries whose levels the engine computes. Others are stored and drawn, never fitted. */
export type Geometry = 'octahedral' | 'tetrahedral';

export type FreeIonSetName = 'published' | 'atomic-levels';

/** Racah parameters of a free ion in one named set, in cm-1. */
export interface FreeIon {
  readonly set: FreeIonSetName;
  readonly ion: string;
  readonly racahB0: number;
  /** null where the set has no C for this ion. */
  readonly racahC0: number | null;
  /** How B0 was obtained: "two highest-multiplicity terms", "least squares over all terms", "as printed". */
  readonly kind: string;
  readonly source: string;
}
