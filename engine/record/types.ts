// A complex record as it is typed: every value is the text that will stand in the file, under the name of its field there.
// Absent is undefined or null; nothing here is parsed or judged.

export type Typed = string | null | undefined;

/** A band, or (with `absent` in place of `position`) a range without a band. */
export interface TypedBand {
  readonly position?: Typed;
  readonly kind?: Typed;
  readonly side?: Typed;
  readonly degeneracy?: Typed;
  readonly epsilon?: Typed;
  readonly strength?: Typed;
  readonly width?: Typed;
  readonly deconvoluted?: Typed;
  /** One label, or a list of candidates. */
  readonly term?: Typed | readonly string[];
  readonly 'left-out'?: Typed;
  readonly absent?: Typed;
  readonly notes?: Typed;
}

export interface TypedQuoted {
  readonly Delta?: Typed;
  readonly Dq?: Typed;
  readonly B?: Typed;
  readonly C?: Typed;
  readonly beta?: Typed;
  readonly cite?: Typed;
  readonly where?: Typed;
}

export interface TypedSource {
  readonly notebook?: Typed;
  readonly by?: Typed;
  readonly date?: Typed;
  readonly cite?: Typed;
  readonly where?: Typed;
}

export interface TypedOverride {
  readonly 'C/B'?: Typed;
  readonly C?: Typed;
  readonly floors?: { readonly general?: Typed; readonly 'spin-flip'?: Typed; readonly 'two-electron'?: Typed } | null;
  readonly ceilings?: { readonly Delta?: Typed; readonly B?: Typed; readonly C?: Typed } | null;
  readonly 'rival-margin'?: Typed;
  readonly 'default-uncertainties'?: { readonly maximum?: Typed; readonly line?: Typed } | null;
  readonly because?: Typed;
}

export interface TypedMeasurement {
  readonly id: string;
  readonly sample?: Typed;
  readonly phase?: Typed;
  readonly medium?: Typed;
  readonly host?: Typed;
  readonly temperature?: Typed;
  readonly technique?: Typed;
  /** One text, ranges behind semicolons, or a list of ranges. */
  readonly scanned?: Typed | readonly string[];
  readonly concentration?: Typed;
  readonly 'path-length'?: Typed;
  readonly batch?: Typed;
  readonly raw?: { readonly file?: Typed; readonly sha256?: Typed } | null;
  readonly 'magnetic-moment'?: Typed;
  readonly 'epr-g'?: Typed;
  readonly source?: TypedSource | null;
  readonly bands?: readonly TypedBand[] | null;
  readonly quoted?: readonly TypedQuoted[] | null;
  readonly policy?: TypedOverride | null;
  readonly notes?: Typed;
}

/** How many of a ligand, or how many and by how many donor atoms each is bound. */
export type TypedLigandCount = string | { readonly count: string; readonly bound?: Typed };

export interface TypedComplex {
  readonly formula: string;
  readonly name?: Typed;
  readonly ion?: Typed;
  readonly geometry?: Typed;
  readonly isomer?: Typed;
  /** By id of the ligand's record. */
  readonly ligands?: Readonly<Record<string, TypedLigandCount>> | null;
  readonly spin?: Typed;
  readonly nuclearity?: Typed;
  readonly innocence?: Typed;
  readonly 'charge-note'?: Typed;
  /** Reasons by code of the hazard caution that does not apply. */
  readonly hazards?: Readonly<Record<string, string>> | null;
  readonly notes?: Typed;
  readonly measurements?: readonly TypedMeasurement[] | null;
}
