import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csvText, guessedSeparator, readCsv } from '../../../scripts/table/csv.ts';
import { decoded, guessedEncoding } from '../../../scripts/table/encoding.ts';

describe('a table as text', () => {
  it.each([
    ['line ends of Unix', 'a,b\nc,d\n'],
    ['line ends of Windows', 'a,b\r\nc,d\r\n'],
    ['line ends of old Macs', 'a,b\rc,d\r'],
    ['no line end at the end', 'a,b\nc,d'],
  ])('is read with %s', (_, text) => {
    expect(readCsv(text, ',')).toEqual({ rows: [['a', 'b'], ['c', 'd']], fault: null });
  });

  it('keeps separators, quotes and line ends within quotes', () => {
    expect(readCsv('"a;b";"say ""x""";"two\r\nlines";\n', ';').rows).toEqual([['a;b', 'say "x"', 'two\r\nlines', '']]);
  });

  it('takes a quote inside an unquoted cell as it stands', () => {
    expect(readCsv('5" tube,b', ',').rows).toEqual([['5" tube', 'b']]);
  });

  it.each([
    ['a quote that nothing closes', 'a,b\nc,"d\ne', 2, 2],
    ['text behind a closing quote', 'a\n"b"c\n', 2, 1],
  ])('names row and column of %s', (_, text, row, column) => {
    expect(readCsv(text, ',').fault).toMatchObject({ row, column });
  });

  it('is read back as it was written, whatever the cells hold', () => {
    const cell = fc.array(fc.oneof(fc.constantFrom(',', ';', '\t', '"', '\r\n', '\n', ' ', 'é'), fc.string({ maxLength: 3 }))).map((parts) => parts.join(''));
    const rows = fc.array(fc.array(cell, { minLength: 1, maxLength: 5 }), { maxLength: 5 });
    fc.assert(fc.property(rows, fc.constantFrom(',', ';', '\t'), (table, separator) => {
      expect(readCsv(csvText(table, separator), separator)).toEqual({ rows: table, fault: null });
    }), { numRuns: 500 });
  });

  it.each([
    ['semicolon', 'a;b;c\n1,5;2,5;3,5\n4,5;5,5;6\n'],
    ['comma', 'a,b,c\n1.5,"x; y; z",3\n'],
    ['tab', 'a\tb\n1,5\t2\n'],
    ['semicolon', 'a\nb\n'],
  ])('is taken to be separated by %s', (name, text) => {
    expect(guessedSeparator(text)).toBe(name);
  });
});

describe('the bytes of a table', () => {
  const bytes = (...numbers: number[]): Uint8Array => Uint8Array.from(numbers);
  it.each([
    ['utf-8', 'é', bytes(0xc3, 0xa9)],
    ['utf-8', 'é', bytes(0xef, 0xbb, 0xbf, 0xc3, 0xa9)],
    ['windows-1252', 'é', bytes(0xe9)],
    ['utf-16', 'é', bytes(0xff, 0xfe, 0xe9, 0x00)],
    ['utf-16', 'é', bytes(0xfe, 0xff, 0x00, 0xe9)],
  ] as const)('in %s are seen to be that, and lose their byte order mark', (encoding, text, raw) => {
    expect([guessedEncoding(raw), decoded(raw, encoding)]).toEqual([encoding, text]);
  });

  it('in another encoding than the declared one are refused', () => {
    expect(decoded(bytes(0xe9, 0x20), 'utf-8')).toBeNull();
  });
});
