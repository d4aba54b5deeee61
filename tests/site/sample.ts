import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { readRows } from '../../site/data/database.ts';
import { type CollectionTree, collectionTree } from '../../site/data/tree.ts';
import { writeSampleDatabase } from './sampleDatabase.ts';

/** The sample collection as the pages see it, through a real database file. */
export function sampleTree(options: Parameters<typeof writeSampleDatabase>[1] = {}): CollectionTree {
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-sample-'));
  try {
    return collectionTree(readRows(writeSampleDatabase(join(folder, 'collection.sqlite'), options)));
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}
