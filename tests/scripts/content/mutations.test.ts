import { readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { afterAll, expect, test } from 'vitest';
import { defaultPolicy, freeIon, readWithRivals } from '#engine';
import { referable, readNewRecord } from '../../../scripts/compare/newRecord.ts';
import type { ComplexRecord } from '../../../scripts/content/types.ts';
import { seeded } from '../../published/random.ts';
import { temporaryFolder } from '../commands/sampleContent.ts';

// Good records with bytes flipped, pieces moved and hostile fragments put in: each is read or refused with faults that a person can
// use, and what is read is what stands in the file. A long run takes 200 000.

const count = process.env['BANDSTEAD_LONG'] === '1' ? 200_000 : 5000;
const cases = join(import.meta.dirname, '../../cases/good-full');
const records = ['cr-am6', 'co-cl4', 'co-ox2-am2-trans', 'cr-ox2-mono', 'mn-aq6', 'pt-cl4'].map((id) => readFileSync(join(cases, 'complexes', `${id}.yaml`)));
const place = temporaryFolder();
afterAll(() => place.remove());
const known = referable(cases, { ligands: [], sources: [] } as unknown as Parameters<typeof referable>[1]);

const fragments = [
  '__proto__: { x: 1 }', 'constructor: x', '\u202e', '\u0000', '\u0007', '\ufeff', '&a [*a, *a]', '*a', '!!js/function x', '<<: *a', '--- ', '...', '%YAML 1.1', '|', '>', '? ', '@', '`', '../../etc',
  '1e308', '-1', '0', 'NaN', 'Infinity', '.inf', '1E3', '24,500 cm-1', '21550(0) cm-1', '21550(1e9) cm-1', '99999999999999999999 cm-1', '٣ cm-1', '½ nm', '−5 nm', "'; DROP TABLE complex;--",
  '"><script>alert(1)</script>', '\u0338', 'Cr(III)', '4T2g', 'position: 1 nm', 'bands: []', 'null', '~', 'true', '\t', '\r', '#', ' #x', ': ', ', ', '{', '}', '[', ']', '"', "'",
].map((text) => Buffer.from(text));

function mutated(next: () => number): Buffer {
  const pick = <T>(list: readonly T[]): T => list[Math.floor(next() * list.length)]!;
  let bytes = Buffer.from(pick(records));
  for (let n = 1 + Math.floor(3 * next() ** 2); n > 0; n--) {
    const at = Math.floor(next() * bytes.length);
    const length = 1 + Math.floor(12 * next());
    const piece = bytes.subarray(at, at + length);
    switch (Math.floor(7 * next())) {
      case 0: bytes[at] = bytes[at]! ^ (1 << Math.floor(8 * next())); break;
      case 1: bytes[at] = Math.floor(256 * next()); break;
      case 2: bytes = Buffer.concat([bytes.subarray(0, at), bytes.subarray(at + length)]); break;
      case 3: bytes = Buffer.concat([bytes.subarray(0, at), piece, bytes.subarray(at)]); break;
      case 4: bytes = Buffer.concat([bytes.subarray(0, at), pick(fragments), bytes.subarray(at)]); break;
      case 5: bytes = Buffer.concat([bytes.subarray(0, at), pick(fragments), bytes.subarray(at + length)]); break;
      default: {
        const digit = [...bytes.keys()].filter((i) => bytes[i]! >= 48 && bytes[i]! <= 57);
        if (digit.length > 0) bytes[pick(digit)] = 48 + Math.floor(10 * next());
      }
    }
  }
  return bytes;
}

/** Numbers of a record that are not finite, texts that steer a terminal, and keys that no record has. */
function unsound(value: unknown, path: string): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (typeof value === 'string') return /[\u0000-\u0008\u000b-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069]/.test(value) ? [`${path} holds ${JSON.stringify(value)}`] : [];
  if (value === null || typeof value !== 'object') return [];
  const prototype = Object.getPrototypeOf(value) as unknown;
  return [
    ...(prototype === Object.prototype || prototype === Array.prototype || prototype === null || value instanceof Map ? [] : [`${path} has another prototype`]),
    ...Object.entries(value).flatMap(([key, inner]) => unsound(inner, `${path}.${key}`)),
  ];
}

/** What an accepted record says that does not stand in its file. */
function notTyped(record: ComplexRecord, text: string): string[] {
  return record.measurements.flatMap(({ bands }) => bands.flatMap(({ positionTyped }) => (text.includes(positionTyped) ? [] : [`"${positionTyped}" was not typed`])));
}

test(`of ${count} mutated records none is misread, and none makes the reader fail`, () => {
  const next = seeded(70);
  const file = join(place.path, 'x1.yaml');
  const faulty: string[] = [];
  const fitted = new Set<string>();
  let accepted = 0;
  for (let n = 0; n < count; n++) {
    const bytes = mutated(next);
    writeFileSync(file, bytes);
    const started = performance.now();
    const read = readNewRecord(file, 'x1.yaml', known, defaultPolicy);
    if (performance.now() - started > 2000) faulty.push(`case ${n}: ${performance.now() - started} ms`);
    if (read.ok) {
      accepted += 1;
      faulty.push(...[...unsound(read.record, 'record'), ...notTyped(read.record, bytes.toString('utf8'))].map((one) => `case ${n}: ${one}`));
      // Every twentieth is fitted too: a record without a fault never makes the engine fail.
      for (const { engine, policy } of accepted % 20 === 0 ? read.record.measurements : []) {
        const key = JSON.stringify(engine);
        if (fitted.has(key)) continue;
        fitted.add(key);
        const { chosen } = readWithRivals(engine, policy, freeIon(policy.freeIons, read.record.ion));
        faulty.push(...unsound(chosen, 'reading').map((one) => `case ${n}: ${one}`));
      }
    } else {
      if (read.faults.length === 0) faulty.push(`case ${n}: refused without a fault`);
      for (const { line, column, found, expected, mend } of read.faults) {
        if (!(line > 0 && column > 0)) faulty.push(`case ${n}: a fault at ${line}:${column}`);
        if ([found, expected, mend].some((text) => text === '' || /[\u0000-\u001f\u007f-\u009f\u202a-\u202e\u2066-\u2069]/.test(text))) faulty.push(`case ${n}: a fault that cannot be printed: ${JSON.stringify([found, expected, mend])}`);
      }
    }
  }
  expect(faulty.slice(0, 20)).toEqual([]);
  // Many slips fall into comments and notes, and many make a fault.
  expect(accepted).toBeGreaterThan(count / 20);
  expect(accepted).toBeLessThan((count * 3) / 4);
  expect(fitted.size).toBeGreaterThan(5);
}, 3_600_000);
