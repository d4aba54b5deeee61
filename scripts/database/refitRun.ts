import type { ComplexRecord } from '../content/types.ts';
import { complexFits } from './complexFits.ts';
import type { FitOrder } from './complexFits.ts';
import { tablesOf } from './fitComplex.ts';
import { factsOf } from './keptComplexes.ts';
import type { KeptComplex, KeptRun } from './keptComplexes.ts';
import { frameRows, sharedRows } from './rows/collection.ts';
import type { CollectionFrame } from './rows/collection.ts';
import type { ComplexFacts } from './rows/complexResult.ts';
import { pack } from './rows/packed.ts';
import type { Tables } from './rows/row.ts';
import { byId } from './rows/tables.ts';
import type { Origin } from './rows/tables.ts';
import { draftDatabase } from './write.ts';
import type { DraftDatabase } from './write.ts';

export interface RunOrder extends Pick<FitOrder, 'cache' | 'expected' | 'progress'> {
  readonly frame: CollectionFrame;
  readonly origin: Origin;
  readonly database: string;
  /** What the last run left; the database at its place is its work. */
  readonly before: KeptRun | null;
}

/** One refit at work: complexes are fitted or kept, and their rows go into a draft of the database as they come. */
export interface RefitRun {
  /** Keeps a complex as the last run left it. */
  readonly keep: (id: string, kept: KeptComplex) => void;
  readonly fit: (complex: ComplexRecord, stamp: string | null) => void;
  /** Waits for the fits. All complexes, ascending by id, and how many measurements were fitted. */
  readonly finish: () => { readonly complexes: ReadonlyMap<string, KeptComplex>; readonly refitted: number };
  /** Whether any row of a complex differs from those of the last run. To be asked after \`finish\`. */
  readonly changed: () => boolean;
  /** Adds the rows that hang on all complexes together. */
  readonly rest: (whole: Tables, facts: readonly ComplexFacts[]) => void;
  /** Puts the database in its place; where no row was added or taken away the old one stays as it is. */
  readonly write: () => void;
  readonly close: () => void;
}

export function refitRun({ frame, origin, database, cache, expected, progress, before }: RunOrder): RefitRun {
  const complexes = new Map<string, KeptComplex>();
  const read = new Map<string, Pick<KeptComplex, 'hash' | 'stamp'>>();
  const shared = sharedRows(frame);
  let touched = false;
  let draft: DraftDatabase | null = null;
  const rows = (): DraftDatabase => {
    if (draft !== null) return draft;
    draft = draftDatabase(database, before === null ? 'nothing' : 'target');
    draft.removeWhole();
    draft.insert(pack(frameRows(frame, origin.engine, origin.software)));
    return draft;
  };
  const fits = complexFits({
    basis: frame, engine: origin.engine, cache, expected, progress,
    take: (fitted, readings) => {
      touched = true;
      if (before?.complexes.has(fitted.id)) rows().removeComplexes([fitted.id]);
      rows().insert(pack(shared(factsOf(fitted))));
      rows().insert(tablesOf(fitted));
      complexes.set(fitted.id, { ...read.get(fitted.id)!, facts: fitted.facts, readings });
    },
  });
  return {
    keep: (id, kept) => { complexes.set(id, kept); },
    fit: (complex, stamp) => {
      read.set(complex.id, { hash: complex.hash, stamp });
      fits.add(complex);
    },
    finish: () => {
      const refitted = fits.finish(readingsKept(complexes));
      const gone = [...(before?.complexes.keys() ?? [])].filter((id) => !complexes.has(id));
      if (gone.length > 0) {
        touched = true;
        rows().removeComplexes(gone);
      }
      return { complexes: new Map([...complexes].map(([id, one]) => ({ id, one })).sort(byId).map(({ id, one }) => [id, one])), refitted };
    },
    changed: () => touched,
    rest: (whole, facts) => {
      for (const complex of facts) rows().insert(pack(shared(complex)));
      rows().insert(pack(whole));
    },
    write: () => { draft?.finish(); },
    close: () => {
      fits.close();
      draft?.close();
    },
  };
}

function* readingsKept(complexes: ReadonlyMap<string, KeptComplex>): Iterable<string> {
  for (const { readings } of complexes.values()) yield* readings;
}
