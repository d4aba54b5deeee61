import { cpSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { beforeAll, expect, inject, test } from 'vitest';
import { type ComparedCollection, measurementId, policyId, recordText } from '#engine';
import { readStoredCollection } from '../../../scripts/compare/collection.ts';
import { placeRecord } from '../../../scripts/compare/place.ts';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { places } from '../../../scripts/places.ts';
import { type PackedCollection, unpackCollection } from '../../../site/client/compare/compareData.ts';
import { readForm } from '../../../site/client/compare/readForm.ts';
import { createPlacer, placementMarkup } from '../../../site/client/compare/placing.ts';
import { createReader } from '../../../site/client/compare/reckon.ts';
import { formOfQuery, formOfRecord, formQuery, recordOfForm } from '../../../site/client/compare/typedForm.ts';
import { comparedCollection, comparedComplex } from '../../../site/data/compare.ts';
import { readRows } from '../../../site/data/database.ts';
import { type CollectionTree, collectionTree } from '../../../site/data/tree.ts';
import { refittedDemonstration } from '../demonstration.ts';

let demonstration: string;
let tree: CollectionTree;
let packed: PackedCollection;
beforeAll(async () => {
  demonstration = await refittedDemonstration();
  tree = collectionTree(readRows(demonstration));
  packed = JSON.parse(JSON.stringify(comparedCollection(tree))) as PackedCollection;
});

test('the page compares with the very numbers that the command reads from the database', () => {
  const command: ComparedCollection = readStoredCollection(demonstration).compared;
  expect(unpackCollection(packed)).toEqual(command);
  expect(packed.policyId).toBe(policyId(packed.policy));
});

test('every measurement of the collection, opened to be read otherwise, is read and placed to the same bits as by the command', () => {
  const stored = readStoredCollection(demonstration);
  const readBands = createReader(packed);
  const place = createPlacer(packed);
  const read = readCollection(places.content);
  if (read.collection === null) throw new Error('the demonstration does not check');
  let compared = 0;
  for (const record of read.collection.complexes) {
    const complex = comparedComplex(tree, tree.complexes.find(({ row }) => row.id === record.id)!);
    const [command] = placeRecord({ ...record, measurements: record.measurements.slice(0, 1) }, stored).measurements;
    if (command === undefined) continue;
    // Through the address, as a reader shares it.
    const form = formOfQuery(new URLSearchParams(formQuery(formOfRecord(complex.typed[0]!)).toString()));
    const { measurement, identity, faults } = readForm(form, packed);
    expect(faults, record.id).toEqual([]);
    if (policyId(command.measurement.policy) !== packed.policyId) continue;
    const { chosen } = readBands(measurement!);
    expect(chosen, record.id).toEqual(command.reading);
    const placement = place({ ...identity!, id: record.id, formula: record.formula }, command.measurement.id, measurement!, chosen, measurementId(command.placement.result));
    expect(placement, record.id).toEqual(command.placement);
    compared += 1;
  }
  expect(compared).toBeGreaterThan(60);
});

test('a record that the page offers passes the check in content/complexes, and is the record that was typed', () => {
  const content = join(inject('runFolder'), 'offered');
  cpSync(places.content, content, { recursive: true });
  const offered = tree.complexes.filter(({ measurements }) => measurements.length > 0).map((complex) => {
    const form = formOfRecord(comparedComplex(tree, complex).typed[0]!);
    return { id: `again-${complex.row.id}`, of: complex.row.id, text: recordText(recordOfForm({ ...form, notebook: 'VII p. 3' }, complex.row.formula, complex.measurements[0]!.row.id)) };
  });
  for (const { id, text } of offered) writeFileSync(join(content, 'complexes', `${id}.yaml`), text);
  const read = readCollection(content);
  expect(read.faults).toEqual([]);
  const records = new Map(read.collection!.complexes.map((record) => [record.id, record]));
  for (const { id, of } of offered) expect(records.get(id)!.measurements[0]!.engine, id).toEqual(records.get(of)!.measurements[0]!.engine);
});

test('Delta/g is a bare ratio: no unit stands at its head', () => {
  const stored = readStoredCollection(demonstration);
  const record = readCollection(places.content).collection!.complexes.find(({ id }) => id === 'cr-am6')!;
  const html = placementMarkup(placeRecord(record, stored).measurements[0]!.placement, []);
  const heads = [...html.slice(html.indexOf('Nearest earlier complexes')).matchAll(/<th scope="col"[^>]*>(.*?)<\/th>/g)].map(([, head]) => head!.replaceAll(/<[^>]+>/g, ''));
  expect(heads).toEqual(['Complex', 'Kind', 'Δ/g', 'β', 'What differs']);
});
