import type { Geometry, Ion, Measurement, Policy } from '#engine';

/** A fault in the content: what was found, what was expected, how to mend it. Line and column count from 1. */
export interface Fault {
  readonly file: string;
  readonly line: number;
  readonly column: number;
  /** Path of the field within the record, "measurements[0].bands[1].position"; "" for the whole file. */
  readonly field: string;
  /** Lasting code, listed in content/README.md. */
  readonly code: string;
  readonly found: string;
  readonly expected: string;
  readonly mend: string;
}

export interface Group {
  readonly title: string;
  readonly name: string;
  readonly description: string | null;
  readonly contact: string | null;
  readonly people: readonly { readonly name: string; readonly orcid: string | null; readonly initials: string | null }[];
  /** SPDX identifier of the content's licence. */
  readonly licence: string;
  /** Site URL with its base path, "https://example.org/bands/". */
  readonly url: string;
  readonly release: string;
  /** ISO date on which the collection was started. */
  readonly started: string;
  readonly doi: string | null;
  readonly demonstration: boolean;
}

export interface LigandRecord {
  readonly id: string;
  readonly file: string;
  readonly name: string;
  readonly formula: string;
  readonly abbreviation: string | null;
  readonly synonyms: readonly string[];
  readonly charge: number;
  readonly denticity: number;
  /** Donor atoms bound, element symbols in the order typed; as many as `denticity`. */
  readonly donors: readonly string[];
  readonly smiles: string | null;
  readonly notes: string | null;
}

export interface SourceRecord {
  readonly id: string;
  readonly file: string;
  readonly reference: string;
  readonly authors: readonly string[];
  readonly title: string | null;
  readonly journal: string | null;
  readonly year: string | null;
  readonly volume: string | null;
  readonly pages: string | null;
  readonly doi: string | null;
  readonly url: string | null;
}

export interface BandRecord {
  /** Exactly what was typed for the position, "351.0(8) nm". */
  readonly positionTyped: string;
  readonly widthTyped: string | null;
  readonly notes: string | null;
}

export interface QuotedRecord {
  readonly Delta: number | null;
  readonly Dq: number | null;
  readonly B: number | null;
  readonly C: number | null;
  readonly beta: number | null;
  readonly cite: string;
  readonly where: string | null;
  /** As typed, by parameter. */
  readonly typed: Readonly<Record<string, string>>;
}

export interface MeasurementRecord {
  readonly id: string;
  /** What the engine fits. `engine.bands[i]` goes with `bands[i]`. */
  readonly engine: Measurement;
  readonly bands: readonly BandRecord[];
  /** Goes with `engine.absent`. */
  readonly absentNotes: readonly (string | null)[];
  readonly sample: string | null;
  readonly medium: string | null;
  readonly temperatureTyped: string | null;
  readonly temperatureU: number | null;
  readonly temperatureAssumed: boolean;
  readonly scannedTyped: string | null;
  readonly host: string | null;
  readonly notebook: string | null;
  readonly by: string | null;
  readonly date: string | null;
  readonly cite: string | null;
  readonly where: string | null;
  readonly concentration: string | null;
  readonly pathLength: string | null;
  readonly batch: string | null;
  readonly rawFile: string | null;
  readonly rawHash: string | null;
  readonly magneticMoment: string | null;
  readonly eprG: string | null;
  readonly notes: string | null;
  readonly quoted: readonly QuotedRecord[];
  /** The collection's policy, or a copy with the values this measurement overrides. */
  readonly policy: Policy;
  /** Reason typed for an override of the policy, null where nothing is overridden. */
  readonly policyReason: string | null;
}

export interface ComplexRecord {
  readonly id: string;
  readonly file: string;
  /** sha256 of the file's bytes, hex. */
  readonly hash: string;
  /** As typed. */
  readonly formula: string;
  readonly name: string | null;
  readonly charge: number;
  /** Remark on how the charge was assigned. */
  readonly chargeNote: string | null;
  readonly ion: Ion;
  readonly geometryName: string;
  readonly geometry: Geometry | null;
  readonly isomer: string;
  /** `bound`: donor atoms that each of the `count` ligands binds. */
  readonly ligands: readonly { readonly ligand: string; readonly count: number; readonly bound: number }[];
  readonly spinTyped: string | null;
  readonly multiplicity: number | null;
  readonly spinAssumed: boolean;
  readonly notes: string | null;
  /** Hazard caution codes the group declared not to apply, with the reason. */
  readonly hazardOverrides: Readonly<Record<string, string>>;
  readonly measurements: readonly MeasurementRecord[];
}

export interface Collection {
  readonly group: Group;
  readonly policy: Policy;
  readonly policyId: string;
  readonly ligands: readonly LigandRecord[];
  readonly sources: readonly SourceRecord[];
  /** Ascending by id. */
  readonly complexes: readonly ComplexRecord[];
}

export interface ReadResult {
  /** null where any fault was found. */
  readonly collection: Collection | null;
  /** Sorted by file, line and column. */
  readonly faults: readonly Fault[];
  readonly filesRead: number;
}
