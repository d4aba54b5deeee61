import fc from 'fast-check';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { bandFields, complexFields, measurementFields, quotedFields, recordText } from '../../../engine/index.ts';
import type { TypedBand, TypedComplex } from '../../../engine/index.ts';
import { complexSchema } from '../../../scripts/content/schema/complex.ts';
import { typedComplex } from '../../../scripts/content/typedRecord.ts';

const whole: TypedComplex = {
  formula: '[Cr(NH3)6]3+',
  ion: 'Cr(III)',
  geometry: 'octahedral',
  ligands: { ammine: '6', oxalato: { count: '2', bound: '1' } },
  spin: 'quartet',
  hazards: { PERCHLORATE: 'never in contact: "dry" or wet' },
  measurements: [{
    id: 'aq-295',
    sample: '[Cr(NH3)6](NO3)3',
    phase: 'solution',
    medium: 'water, 0.1 mol/L acid',
    temperature: '295 K',
    scanned: ['300 - 700 nm', '750 - 1100 nm'],
    raw: { file: 'a b.csv' },
    source: { notebook: '17, p. 42', by: 'TL', date: '2024-03-11' },
    policy: { 'C/B': '4.0(3)', floors: { general: '100 cm-1' }, because: 'fitted # elsewhere' },
    bands: [
      { position: '21550(60) cm-1', kind: 'maximum', epsilon: '36', width: '3100 cm-1', term: '4T2g' },
      { position: '351.0(8) nm', term: ['4T1g(F)', 'CT'] },
      { absent: '28600 - 33300 cm-1', notes: '10 cm cell' },
    ],
    quoted: [{ Dq: '2160 cm-1', cite: 'author-1999', where: 'p. 12' }],
  }],
};

describe('the text of a record', () => {
  it('reads like one that a person typed', () => {
    expect(recordText(whole, { heading: ['An example.', '', 'Two\nlines'] })).toBe(`# An example.
#
# Two lines
formula: "[Cr(NH3)6]3+"
ion: Cr(III)
geometry: octahedral
ligands: { ammine: 6, oxalato: { count: 2, bound: 1 } }
spin: quartet
hazards: { PERCHLORATE: "never in contact: \\"dry\\" or wet" }
measurements:
  - id: aq-295
    sample: "[Cr(NH3)6](NO3)3"
    phase: solution
    medium: "water, 0.1 mol/L acid"
    temperature: 295 K
    scanned: [300 - 700 nm, 750 - 1100 nm]
    raw: { file: a b.csv }
    source: { notebook: "17, p. 42", by: TL, date: 2024-03-11 }
    policy: { C/B: 4.0(3), floors: { general: 100 cm-1 }, because: "fitted # elsewhere" }
    bands:
      - { position: 21550(60) cm-1, kind: maximum, epsilon: 36, width: 3100 cm-1, term: 4T2g }
      - { position: 351.0(8) nm, term: [4T1g(F), CT] }
      - { absent: 28600 - 33300 cm-1, notes: 10 cm cell }
    quoted:
      - { Dq: 2160 cm-1, cite: author-1999, where: p. 12 }
`);
  });

  it('puts a comment behind each field where one is wanted, and the comments change nothing', () => {
    const text = recordText(whole, { explained: true });
    expect(text).toContain('formula: "[Cr(NH3)6]3+"                  # the complex with its charge; equals ion and ligands\n');
    expect(text).toContain('    phase: solution                      # solution, solid, crystal, glass or film\n');
    expect(typedComplex(text)).toEqual(whole);
  });

  it('leaves out what is absent or blank', () => {
    const { measurements: _, ...rest } = whole;
    expect(recordText({ ...rest, name: null, notes: ' ', hazards: {}, isomer: undefined, measurements: [] })).not.toMatch(/name|notes|hazards|isomer|measurements|null|undefined/);
  });

  it('refuses a field that it would lose', () => {
    expect(() => recordText({ ...whole, colour: 'red' } as TypedComplex)).toThrow(/"colour"/);
    expect(() => recordText({ ...whole, measurements: [{ id: 'a1', bands: [{ position: '1 eV', shape: 'round' } as TypedBand] }] })).toThrow(/"shape"/);
  });

  it('knows every field of the record format and no other', () => {
    const inner = (schema: unknown): z.core.$ZodType => (schema instanceof z.ZodOptional ? inner(schema.unwrap()) : schema instanceof z.ZodArray ? inner(schema.element) : (schema as z.core.$ZodType));
    const keys = (schema: unknown): string[] => {
      const one = inner(schema);
      if (one instanceof z.ZodUnion) return one.options.flatMap(keys);
      return one instanceof z.ZodObject ? Object.keys(one.shape) : [];
    };
    const sorted = (names: readonly string[]) => [...new Set(names)].sort();
    const measurement = inner(complexSchema.shape.measurements) as z.ZodObject;
    expect(sorted(complexFields)).toEqual(sorted(keys(complexSchema)));
    expect(sorted(measurementFields)).toEqual(sorted(keys(measurement)));
    expect(sorted(bandFields)).toEqual(sorted(keys(measurement.shape['bands'])));
    expect(sorted(quotedFields)).toEqual(sorted(keys(measurement.shape['quoted'])));
  });
});

describe('read back by the reader of records', () => {
  const content = join(import.meta.dirname, '../../../content/complexes');
  it('every record of the collection says the same', () => {
    const names = readdirSync(content).filter((name) => name.endsWith('.yaml'));
    expect(names.length).toBeGreaterThan(0);
    for (const name of names) {
      const typed = typedComplex(readFileSync(join(content, name), 'utf8'));
      expect(typed, name).not.toBeNull();
      expect(typedComplex(recordText(typed!)), name).toEqual(typed);
    }
  });

  it('any text comes back as it was given, whatever marks it holds', () => {
    const marks = fc.constantFrom('#', ' # ', ': ', ':', ',', '{', '}', '[', ']', '"', "'", '\\', '&', '*', '!', '|', '>', '@', '%', '`', '- ', '? ', '~', '\n', '\t', '\u00a0', '\u2028', '\ufeff', '±', '−', 'é', '²', 'null', 'no', '1E3', '---', '...', '<<');
    const text = fc.array(fc.oneof(marks, fc.string({ maxLength: 6 }), fc.string({ unit: 'grapheme', maxLength: 4 })), { minLength: 1, maxLength: 6 })
      .map((parts) => parts.join('').replace(/[\ud800-\udfff]/gu, '').trim()).filter((one) => one !== '');
    const optional = fc.option(text, { nil: undefined });
    const record = fc.record({
      formula: text, name: optional, notes: optional, 'charge-note': optional,
      measurements: fc.tuple(fc.record({
        id: fc.constant('aa'), medium: optional, notes: optional,
        source: fc.record({ notebook: text, by: optional }),
        bands: fc.array(fc.record({ position: text, notes: optional, 'left-out': optional, term: fc.oneof(text, fc.array(text, { minLength: 1, maxLength: 3 })) }), { minLength: 1, maxLength: 3 }),
      })),
    });
    const present = (value: unknown): unknown => JSON.parse(JSON.stringify(value));
    fc.assert(fc.property(record, fc.boolean(), (typed, explained) => {
      expect(typedComplex(recordText(typed, { explained }))).toEqual(present(typed));
    }), { numRuns: 400 });
  });
});
