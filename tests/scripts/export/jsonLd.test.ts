import { expect, it } from 'vitest';
import { mainFiles } from '../../../scripts/export/files.ts';
import { dataCatalog, dataset, jsonLdText, recordDataset } from '../../../scripts/export/metadata/jsonLd.ts';
import type { JsonObject } from '../../../scripts/export/json.ts';
import { schemaOrgProblems } from '../../schemas/schemaOrg.ts';
import { ordinary, publications, record } from './publications.ts';

const values = publications.flatMap(([, publication]) => [dataCatalog(publication), dataset(publication, mainFiles), recordDataset(publication, record)]);

it('JSON-LD holds types, properties and kinds of values that schema.org knows, and nothing else', () => {
  expect(schemaOrgProblems(values)).toEqual([]);
});

it('the check notices a misspelt property or type, at any depth, and a value of the wrong kind', () => {
  const good = dataset(ordinary, mainFiles);
  const [file] = good['distribution'] as readonly JsonObject[];
  const found = schemaOrgProblems([{ ...good, licence: 'x' }, { ...good, '@type': 'DataSet' }, { ...good, distribution: [{ ...file, contenturl: 'x' }] }, { ...good, isAccessibleForFree: 'yes and no' }]);
  expect(found).toHaveLength(4);
  for (const [index, word] of ['licence', 'DataSet', 'contenturl', 'isAccessibleForFree'].entries()) expect(found[index]).toContain(word);
});

it('every Dataset, also one within another, has name, description, licence and creator, and every number its unit', () => {
  const within = (value: unknown): JsonObject[] => (typeof value !== 'object' || value === null ? [] : [...(Array.isArray(value) ? [] : [value as JsonObject]), ...Object.values(value).flatMap(within)]);
  const all = values.flatMap(within);
  const lacking = (type: string, names: readonly string[]): readonly JsonObject[] => all.filter((one) => one['@type'] === type && names.some((name) => !(name in one)));
  expect(all.filter((one) => one['@type'] === 'Dataset').length).toBeGreaterThan(values.length);
  expect(lacking('Dataset', ['name', 'description', 'license', 'creator'])).toEqual([]);
  expect(lacking('PropertyValue', ['name', 'unitText'])).toEqual([]);
  expect(lacking('DataDownload', ['contentUrl', 'encodingFormat'])).toEqual([]);
  for (const value of values) expect(value['@context']).toBe('https://schema.org/');
});

it('stands in a page as a script that no text can end', () => {
  for (const value of values) {
    expect(jsonLdText(value)).not.toContain('<');
    expect(JSON.parse(jsonLdText(value))).toEqual(value);
  }
});
