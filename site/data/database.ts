import { statSync } from 'node:fs';
import { resolve } from 'node:path';
import Database from 'better-sqlite3';
import { type CollectionTree, collectionTree } from './tree.ts';
import type { Rows } from './rows.ts';

const TABLES: readonly (keyof Rows)[] = [
  'meta', 'person', 'policy', 'ion', 'free_ion', 'source', 'ligand', 'complex', 'complex_ligand', 'measurement', 'observed_range',
  'band', 'quoted', 'reading', 'reading_band', 'reading_band_member', 'not_fitted', 'branch', 'stress_left_out', 'stress_pair', 'evidence', 'helpful_band', 'parameter', 'correlation',
  'predicted_band', 'caution', 'hazard_override', 'audit', 'placement', 'floor_factor', 'review', 'frozen_release', 'frozen_value', 'change', 'gone',
];

/** File of the database: BANDSTEAD_DATABASE, else the project's own cache. Pages are bundled elsewhere, so the working folder counts. */
export function databaseFile(): string {
  return resolve(process.cwd(), process.env['BANDSTEAD_DATABASE'] ?? '.cache/collection.sqlite');
}

/** Every row of every table, one query a table. Tables WITHOUT ROWID come in the order of their keys. */
export function readRows(file: string): Rows {
  const database = new Database(file, { readonly: true, fileMustExist: true });
  try {
    return Object.fromEntries(TABLES.map((table) => [table, database.prepare(`SELECT * FROM ${table}`).all()])) as unknown as Rows;
  } finally {
    database.close();
  }
}

let loaded: { readonly stamp: string; readonly tree: CollectionTree } | null = null;

/** The collection, read once; read again only where the file was replaced, as happens under the development server. */
export function loadCollection(): CollectionTree {
  const file = databaseFile();
  const { mtimeMs, ino, size } = statSync(file);
  const stamp = `${file} ${mtimeMs} ${ino} ${size}`;
  if (loaded?.stamp !== stamp) loaded = { stamp, tree: collectionTree(readRows(file)) };
  return loaded.tree;
}
