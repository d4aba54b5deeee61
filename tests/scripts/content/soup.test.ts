// Whatever stands in a file, reading it gives records or faults and never throws.

import { mkdirSync, mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import fc from 'fast-check';
import { afterAll, describe, expect, test } from 'vitest';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { readYaml } from '../../../scripts/content/yaml/read.ts';
import { scanTraps } from '../../../scripts/content/yaml/traps.ts';

const cases = join(import.meta.dirname, '../../cases');
const good = readFileSync(join(cases, 'good-full/complexes/cr-am6.yaml'), 'utf8');
const folder = mkdtempSync(join(tmpdir(), 'soup-'));
for (const name of ['complexes', 'ligands', 'sources']) mkdirSync(join(folder, name));
writeFileSync(join(folder, 'group.yaml'), readFileSync(join(cases, 'good-full/group.yaml')));
writeFileSync(join(folder, 'ligands/ammine.yaml'), readFileSync(join(cases, 'good-full/ligands/ammine.yaml')));
writeFileSync(join(folder, 'sources/author-1999.yaml'), readFileSync(join(cases, 'good-full/sources/author-1999.yaml')));
afterAll(() => rmSync(folder, { recursive: true }));

function write(file: string, bytes: string | Uint8Array): void {
  writeFileSync(join(folder, file), bytes);
}

/** Reads the folder with one file put in and states what must hold of every answer. */
function read(file: string, bytes: string | Uint8Array): void {
  write(file, bytes);
  try {
    const { collection, faults } = readCollection(folder);
    expect(collection === null).toBe(faults.length > 0);
    for (const fault of faults) {
      expect(fault.line).toBeGreaterThan(0);
      expect(fault.column).toBeGreaterThan(0);
      expect([fault.found, fault.expected, fault.mend].every((text) => text !== '' && !/[\n\r]/.test(text))).toBe(true);
    }
  } finally {
    rmSync(join(folder, file));
  }
}

/** Texts made of the pieces that YAML and records are made of. */
const pieces = fc.array(fc.constantFrom(
  '{', '}', '[', ']', '(', ')', ',', ':', ': ', '#', ' #', '- ', '-', '\n', '  ', '    ', '\t', '"', "'", '|', '>', '&a', '*a', '!t', '%', '@', '?', '<<: ', '---\n', '...', '\\', '\r\n', '\u2028',
  'formula', 'ion: Cr(III)', 'measurements:', 'bands:', 'position', '24,500 cm-1', '[Cr(NH3)6]3+', 'term: 4T1g', '__proto__', 'constructor: ', 'absent: 1 - 2 nm', 'ligands: { ammine: 6 }', '\u0000', '\ud800', 'é',
), { maxLength: 40 }).map((list) => list.join(''));

describe('no text makes the reader throw', () => {
  test('any string', () => {
    fc.assert(fc.property(fc.oneof(fc.string({ unit: 'binary', maxLength: 200 }), pieces), (text) => {
      readYaml(text);
    }), { numRuns: 800 });
  });

  test('a scan keeps the number of lines', () => {
    fc.assert(fc.property(pieces, (text) => {
      expect(scanTraps(text).text.split('\n').length).toBe(text.split('\n').length);
    }), { numRuns: 600 });
  });

  test('any bytes in any kind of file', () => {
    fc.assert(fc.property(fc.constantFrom('complexes/x1.yaml', 'ligands/x1.yaml', 'sources/x1.yaml', 'policy.yaml'), fc.uint8Array({ maxLength: 60 }), (file, bytes) => read(file, bytes)), { numRuns: 60 });
  });

  test('pieces of records in any kind of file', () => {
    fc.assert(fc.property(fc.constantFrom('complexes/x1.yaml', 'ligands/x1.yaml', 'sources/x1.yaml', 'policy.yaml'), pieces, (file, text) => read(file, text)), { numRuns: 200 });
  });

  test('a good record with a few slips of the fingers', () => {
    const slip = fc.tuple(fc.nat(good.length - 1), fc.constantFrom('delete', 'insert', 'line'), fc.constantFrom(' ', ',', ':', '#', '"', '{', ']', '\t', '\n', 'x', '9', '(', '-'));
    fc.assert(fc.property(fc.array(slip, { minLength: 1, maxLength: 4 }), (slips) => {
      let text = good;
      for (const [at, kind, letter] of slips) {
        const end = kind === 'delete' ? at + 1 : kind === 'line' ? Math.max(at, text.indexOf('\n', at)) : at;
        text = `${text.slice(0, at)}${kind === 'insert' ? letter : ''}${text.slice(end)}`;
      }
      read('complexes/x1.yaml', text);
    }), { numRuns: 200 });
  });
});

test.each([
  ['open brackets', '['.repeat(120_000)], ['dashes', '- '.repeat(90_000)], ['open braces', '{a: '.repeat(60_000)],
  ['brackets in a field', `a: ${'[x]'.repeat(60_000)}`], ['quotes', '"'.repeat(150_001)], ['colons', 'a: b: '.repeat(40_000)],
  ['hashes', `x: y${' #a'.repeat(60_000)}`], ['commas in braces', `{${'a: 1,2,'.repeat(25_000)}}`], ['tabs', '\t'.repeat(250_000)],
  ['one field again and again', 'a: 1\n'.repeat(40_000)], ['many fields', Array.from({ length: 25_000 }, (_, index) => `k${index}: 1\n`).join('')],
  ['aliases', 'a: &x *x\n'.repeat(25_000)], ['many items', `a: [${'1,'.repeat(90_000)}1]`],
])('a file of some 0.2 MB of %s is refused, without end or overflow', (_, text) => {
  write('complexes/x1.yaml', text);
  const { faults } = readCollection(folder);
  rmSync(join(folder, 'complexes/x1.yaml'));
  expect(faults.length).toBeGreaterThan(0);
  expect(faults.length).toBeLessThan(110);
}, 60_000);
