import { resultColumns } from '../../scripts/export/columns.ts';
import { type Table, column, longColumn, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';

export interface DataPage {
  readonly files: readonly { readonly name: string; readonly path: string; readonly about: string }[];
  readonly dictionary: Table;
  readonly citation: string;
  readonly licence: string;
  readonly licenceAddress: string | null;
  readonly people: readonly { readonly name: string; readonly orcid: string | null }[];
  readonly contact: string | null;
}

export function dataPage(tree: CollectionTree): DataPage {
  const meta = (key: string): string | null => tree.meta.get(`group.${key}`) ?? null;
  const licence = meta('licence') ?? 'not recorded';
  return {
    files: [
      { name: 'results.csv', path: 'data/results.csv', about: 'one row for each measurement’s chosen reading, numbers in full' },
      { name: 'results.json', path: 'data/results.json', about: 'the same rows with the meaning and unit of every column' },
      { name: 'collection.sqlite', path: 'data/collection.sqlite', about: 'everything: readings as typed, fits, uncertainties, cautions; the view “result” is the flat table' },
    ],
    dictionary: {
      caption: 'Columns of the results',
      columns: [rowColumn('Column'), column('Unit (UCUM)'), longColumn('Meaning')],
      rows: resultColumns.map(({ name, unit, meaning }) => [name, unit ?? 'text', meaning]),
    },
    citation: `${meta('name') ?? 'The group'}, ${meta('title') ?? 'Ligand-field parameters'}, release ${meta('release') ?? 'not recorded'}, ${meta('url') ?? 'address not recorded'}. DOI: ${meta('doi') ?? 'not yet assigned'}.`,
    licence, licenceAddress: /^[A-Za-z0-9.+-]+$/.test(licence) ? `https://spdx.org/licenses/${licence}.html` : null,
    people: tree.people.map(({ name, orcid }) => ({ name, orcid })), contact: meta('contact'),
  };
}
