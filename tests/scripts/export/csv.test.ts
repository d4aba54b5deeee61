import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { csvText } from '../../../scripts/export/csv.ts';
import type { TableEntry } from '../../../scripts/export/dictionary/types.ts';
import { noLimits } from '../../../scripts/export/dictionary/types.ts';
import { readCsv } from '../../../scripts/export/readCsv.ts';
import { readTableCsv, tableCsv } from '../../../scripts/export/tableFiles.ts';

const column = (name: string, type: 'text' | 'real', required = false) => ({ name, type, required, meaning: name, units: [], limits: noLimits, values: null });
const table: TableEntry = { name: 'sample', meaning: '', key: ['id'], references: [], columns: [column('id', 'text', true), column('x', 'real'), column('note', 'text')] };

describe('a CSV file', () => {
  it('gives back every text and every number to the last bit, and tells nothing from an empty text', () => {
    const rows = fc.array(fc.record({ id: fc.string({ unit: 'grapheme' }), x: fc.option(fc.double({ noNaN: true, noDefaultInfinity: true }).map((x) => (x === 0 ? 0 : x))), note: fc.option(fc.string()) }));
    fc.assert(fc.property(rows, (some) => {
      expect(readTableCsv(table, tableCsv(table, some))).toEqual(some);
    }), { seed: 7, numRuns: 300 });
  });

  it('is read with either line end and with a byte order mark', () => {
    expect(readCsv('\ufeffa,b\n1,\n')).toEqual([['a', 'b'], ['1', null]]);
    expect(readCsv('a\r\n""\r\n')).toEqual([['a'], ['']]);
    expect(readCsv('a,b')).toEqual([['a', 'b']]);
    expect(csvText(['a'], [[null], ['']])).toBe('a\r\n\r\n""\r\n');
  });

  it.each([['"open', /line 1: a quotation mark is not closed/], ['a"b', /within a cell/], ['"a"b', /behind a closing/]])('that is damaged (%s) is refused', (text, message) => {
    expect(() => readCsv(text)).toThrow(message);
  });

  it('with another header, a missing value or a word for a number is refused with table, row and column', () => {
    expect(() => readTableCsv(table, 'id,x\r\n')).toThrow('sample.csv has the columns id, x; expected id, x, note');
    expect(() => readTableCsv(table, 'id,x,note\r\n,1,\r\n')).toThrow('sample.csv, row 1, column id: an empty cell');
    expect(() => readTableCsv(table, 'id,x,note\r\na,many,\r\n')).toThrow('sample.csv, row 1, column x: "many"; expected a number');
    expect(() => readTableCsv(table, 'id,x,note\r\na,1\r\n')).toThrow('row 1: 2 cells; expected 3');
  });
});
