import type { ParameterName } from '#engine';

/** A number as a release froze it; all null where withheld. */
export interface FrozenNumber {
  readonly value: number | null;
  readonly u: number | null;
  readonly u_total: number | null;
  readonly standing: string;
}

export interface FrozenMeasurement {
  readonly id: string;
  readonly verdict: string;
  /** sha256 of what was typed and enters the fit, hex. */
  readonly readings: string;
  readonly policy: string;
  /** Set, B0 and C0: "published 918 3850". */
  readonly free_ion: string;
  readonly numbers: Readonly<Record<ParameterName, FrozenNumber>>;
}

export interface FrozenComplex {
  readonly id: string;
  readonly formula: string;
  readonly ion: string;
  readonly geometry: string;
  readonly isomer: string;
  /** Ascending by id. */
  readonly measurements: readonly FrozenMeasurement[];
}

/** What a collection holds at one moment, as far as releases keep it. */
export interface Snapshot {
  readonly software: string;
  /** sha256 of the engine's sources. */
  readonly engine: string;
  readonly licence: string;
  readonly doi: string | null;
  /** Ascending by id. */
  readonly complexes: readonly FrozenComplex[];
  /** Published addresses from the site's root, ascending. */
  readonly addresses: readonly string[];
}

/** A file of content/releases/. */
export interface FrozenRelease extends Snapshot {
  readonly release: string;
  /** Place in the order of release, from 1. */
  readonly number: number;
  /** ISO date. */
  readonly date: string;
  readonly who: string;
  readonly cause: string;
  /** Revision under version control, null where there is none. */
  readonly code_version: string | null;
}

export type GoneKind = 'tombstone' | 'redirect' | 'corrected';

/** What became of a published address. */
export interface Gone {
  readonly address: string;
  readonly kind: GoneKind;
  /** Successor of a tombstone, or the new address of a redirect. */
  readonly target: string | null;
  readonly reason: string | null;
}

export interface History {
  /** Oldest first. */
  readonly releases: readonly FrozenRelease[];
  readonly gone: readonly Gone[];
}

export const noHistory: History = { releases: [], gone: [] };

export type ChangeKind = 'complex added' | 'complex removed' | 'measurement added' | 'measurement removed' | 'verdict' | 'number';

export interface Change {
  readonly kind: ChangeKind;
  readonly complex: string;
  readonly measurement: string | null;
  readonly parameter: ParameterName | null;
  readonly before: number | null;
  readonly beforeU: number | null;
  readonly after: number | null;
  readonly afterU: number | null;
  readonly cause: string;
  readonly text: string;
}
