import { refitCollection } from '../database/refit.ts';
import type { Refit, RefitOrder } from '../database/refit.ts';
import { databaseBytes } from '../database/write.ts';
import { replaceFile } from '../database/writeFile.ts';
import { historyFromRows } from '../release/rows.ts';
import { collectionFromRows } from './collectionFromRows.ts';
import { compareRows } from './compareRows.ts';
import type { RowComparison } from './compareRows.ts';
import { readExport } from './readExport.ts';

export interface RebuildOrder extends Pick<RefitOrder, 'database' | 'progress'> {
  /** Folder of the export. */
  readonly from: string;
}

export interface Rebuild {
  readonly refit: Refit;
  readonly comparison: RowComparison;
  /** Whether the rebuilt database has the bytes of the published one; null: the export holds no database. */
  readonly sameBytes: boolean | null;
}

/**
 * Rebuilds a database from an export alone: what was typed is read from its CSV files, everything is fitted anew without a cache, and
 * every cell is compared with what was published.
 */
export function rebuildFromExport({ from, database, progress }: RebuildOrder): Rebuild {
  const published = readExport(from);
  const collection = collectionFromRows(published.rows);
  const records = collection.complexes.length + collection.ligands.length + collection.sources.length;
  const { refit, tables } = refitCollection(collection, historyFromRows(published.rows), records, { cache: null, ...(progress === undefined ? {} : { progress }) });
  const bytes = databaseBytes(tables);
  replaceFile(database, bytes);
  return {
    refit,
    comparison: compareRows(published.tables, published.rows, tables),
    sameBytes: published.database === null ? null : published.database.equals(bytes),
  };
}
