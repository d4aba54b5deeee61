import { type DataFile, mainFiles, sumsFile, tableFile } from '../../scripts/export/files.ts';
import { licenceAddress } from '../../scripts/export/metadata/publication.ts';
import { databaseTables } from './dictionary.ts';
import { type Citation, citation, publication } from './publication.ts';
import type { CollectionTree } from './tree.ts';

export interface FileShown { readonly name: string; readonly path: string; readonly about: string }

export const filesShown = (files: readonly DataFile[], folder: string): readonly FileShown[] => files.map(({ name, about }) => ({ name, path: `${folder}${name}`, about }));

export interface DataPage {
  readonly files: readonly FileShown[];
  /** One CSV file a table. */
  readonly tables: readonly FileShown[];
  /** The command that rebuilds the database from the downloads. */
  readonly rebuild: string;
  readonly citation: Citation;
  readonly licence: string;
  readonly licenceAddress: string;
  readonly people: readonly { readonly name: string; readonly orcid: string | null }[];
  readonly contact: string | null;
}

export function dataPage(tree: CollectionTree): DataPage {
  const { licence, people, contact } = publication(tree);
  return {
    files: filesShown([...mainFiles, sumsFile], 'data/'), tables: filesShown(databaseTables.map(tableFile), 'data/'), rebuild: 'npm run refit -- --from-export DIR',
    citation: citation(tree), licence, licenceAddress: licenceAddress(licence), people, contact,
  };
}
