import { existsSync, mkdirSync, mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { parse } from 'yaml';
import { z } from 'zod';
import { codeGroups } from '../../../scripts/content/codes.ts';
import { jsonSchemaText } from '../../../scripts/content/manual/jsonSchema.ts';
import { renewedManual } from '../../../scripts/content/manual/write.ts';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { recordKinds } from '../../../scripts/content/schema/kinds.ts';

const content = join(import.meta.dirname, '../../../content');
const cases = join(import.meta.dirname, '../../cases');
const manual = readFileSync(join(content, 'README.md'), 'utf8');

describe('what is generated is up to date (npm run check -- --write-manual renews it)', () => {
  test('the field tables and the codes of content/README.md', () => {
    expect(renewedManual(manual)).toBe(manual);
  });

  test('content/record.schema.json', () => {
    expect(readFileSync(join(content, 'record.schema.json'), 'utf8')).toBe(jsonSchemaText());
  });

  test('a manual that lost its marks is refused', () => {
    expect(() => renewedManual('# no marks')).toThrow(/marks/);
  });
});

test('the manual names every field of every record', () => {
  for (const { schema } of recordKinds) {
    for (const name of Object.keys(schema.shape)) expect(manual).toContain(`\`${name}\``);
  }
});

test('the example of a publishing job runs commands of the project', () => {
  const block = /```yaml\n(publish:\n[\s\S]*?)```/.exec(manual)![1]!;
  const { publish } = parse(block) as { publish: { script: string[]; artifacts: string[] } };
  const { scripts } = JSON.parse(readFileSync(join(content, '../package.json'), 'utf8')) as { scripts: Record<string, string> };
  const named = publish.script.flatMap((line) => /^npm run (\w+)/.exec(line)?.[1] ?? []);
  expect(named).toEqual(['check', 'build']);
  for (const name of named) expect(scripts).toHaveProperty(name);
  expect(publish.script.at(-1)).toContain(`--out ${publish.artifacts[0]!.replace('/', '')}`);
});

test('a code stands in one group only', () => {
  const codes = codeGroups.flatMap((group) => Object.keys(group.codes));
  expect(new Set(codes).size).toBe(codes.length);
});

test('the example records of the manual make a collection without faults', () => {
  const folder = mkdtempSync(join(tmpdir(), 'manual-'));
  try {
    const blocks = [...manual.matchAll(/```yaml\n# (\S+\.yaml)[^\n]*\n([\s\S]*?)```/g)];
    expect(blocks.map((block) => block[1])).toEqual(['complexes/cr-am6.yaml', 'ligands/ammine.yaml', 'sources/author-1999.yaml', 'group.yaml', 'policy.yaml']);
    for (const [, file, text] of blocks) {
      mkdirSync(join(folder, file!, '..'), { recursive: true });
      writeFileSync(join(folder, file!), text!);
    }
    expect(readCollection(folder).faults).toEqual([]);
  } finally {
    rmSync(folder, { recursive: true });
  }
});

describe('the JSON Schema that editors use', () => {
  // Editors read YAML with its core schema: numbers, truth values and null are no text there.
  const schema = z.fromJSONSchema(JSON.parse(jsonSchemaText()));
  const recordsOf = (folder: string) => ['complexes', 'ligands', 'sources']
    .flatMap((kind) => (existsSync(join(folder, kind)) ? readdirSync(join(folder, kind)).map((name) => join(folder, kind, name)) : []))
    .concat(['group.yaml', 'policy.yaml'].map((name) => join(folder, name)).filter((file) => existsSync(file)));

  test.each([join(cases, 'good-full'), content])('accepts every good record of %s', (folder) => {
    const files = recordsOf(folder);
    expect(files.length).toBeGreaterThan(10);
    const refused = files.filter((file) => !schema.safeParse(parse(readFileSync(file, 'utf8'))).success);
    expect(refused).toEqual([]);
  });

  test.each([
    ['an unknown field', { formula: 'x', ion: 'Cr(III)', geometry: 'octahedral', ligands: { ammine: 6 }, colour: 'red' }],
    ['a missing field', { formula: 'x', ion: 'Cr(III)', geometry: 'octahedral' }],
    ['a word that is not on the list', { formula: 'x', ion: 'Cr(III)', geometry: 'octahedrel', ligands: { ammine: 6 } }],
  ])('underlines %s', (_, record) => {
    expect(schema.safeParse(record).success).toBe(false);
  });
});
