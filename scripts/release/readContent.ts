import { readCollection } from '../content/readCollection.ts';
import { sortedFaults } from '../content/report.ts';
import type { Collection, Fault } from '../content/types.ts';
import { identitiesOf, permanenceFaults } from './permanence.ts';
import { readHistory } from './readHistory.ts';
import { noHistory } from './types.ts';
import type { History } from './types.ts';

export interface Content {
  /** null where any fault was found. */
  readonly collection: Collection | null;
  readonly history: History;
  readonly faults: readonly Fault[];
  readonly filesRead: number;
}

/** Reads a content folder with its releases, and holds the one against the other. Never throws for what stands in the folder. */
export function readContent(directory: string): Content {
  const { collection, faults, filesRead } = readCollection(directory);
  const read = readHistory(directory);
  const found = [...faults, ...read.faults];
  const all = found.length > 0 || collection === null ? found : permanenceFaults(read.history, identitiesOf(collection.complexes), collection.ligands);
  return all.length > 0
    ? { collection: null, history: noHistory, faults: sortedFaults(all), filesRead }
    : { collection, history: read.history, faults: [], filesRead };
}
