import { mkdirSync, mkdtempSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterEach, beforeEach, describe, expect, test } from 'vitest';
import { readCollection } from '../../../scripts/content/readCollection.ts';

const record = 'formula: "[Cr(NH3)6]3+"\nion: Cr(III)\ngeometry: octahedral\nligands: { ammine: 6 }\n';
let folder = '';

beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), 'content-'));
  write('group.yaml', 'title: T\ngroup: G\nlicence: CC0-1.0\nurl: https://example.org/\nrelease: "1"\nstarted: 2004-09-01\n');
  write('ligands/ammine.yaml', 'name: ammine\nformula: NH3\ncharge: 0\ndenticity: 1\ndonors: N\n');
});
afterEach(() => rmSync(folder, { recursive: true }));

function write(file: string, text: string | Uint8Array): void {
  mkdirSync(join(folder, file, '..'), { recursive: true });
  writeFileSync(join(folder, file), text);
}

const codes = () => readCollection(folder).faults.map((fault) => `${fault.file} ${fault.code}`);

describe('files that no repository holds', () => {
  test('a folder that is not there has no content', () => {
    expect(readCollection(join(folder, 'nowhere')).faults.map((fault) => fault.code)).toEqual(['NO_CONTENT']);
  });

  test('a file of more than 1 MB is not read', () => {
    write('complexes/large.yaml', `${record}notes: "${'x'.repeat(1_000_000)}"\n`);
    expect(codes()).toEqual(['complexes/large.yaml FILE_TOO_LARGE']);
  });

  test('a text of more than 4000 characters is refused', () => {
    write('complexes/long.yaml', `${record}notes: "${'x'.repeat(4001)}"\n`);
    expect(codes()).toEqual(['complexes/long.yaml TEXT_TOO_LONG']);
  });

  test('an invisible control character is refused', () => {
    write('complexes/control.yaml', `${record}notes: "a\\u0007b"\n`);
    expect(codes()).toEqual(['complexes/control.yaml CONTROL_CHARACTER']);
  });

  test('a file with more than 100 faults shows the first of them and says that there are more', () => {
    write('complexes/many.yaml', record + Array.from({ length: 150 }, (_, index) => `x${index}: 1\n`).join(''));
    const found = codes();
    expect(found.length).toBe(101);
    expect(found.at(-1)).toBe('complexes/many.yaml MORE_FAULTS');
  });

  test('a link that leads nowhere is reported', () => {
    mkdirSync(join(folder, 'complexes'));
    symlinkSync(join(folder, 'gone.yaml'), join(folder, 'complexes/cr-am6.yaml'));
    expect(codes()).toEqual(['complexes/cr-am6.yaml FILE_UNREADABLE']);
  });

  test('a link to a file, or of a folder, outside the content folder is reported; a link within it is read', () => {
    const outside = mkdtempSync(join(tmpdir(), 'outside-'));
    try {
      mkdirSync(join(folder, 'complexes'));
      writeFileSync(join(outside, 'cr-am6.yaml'), record);
      writeFileSync(join(outside, 'smith-1998.yaml'), 'title: T\n');
      symlinkSync(join(outside, 'cr-am6.yaml'), join(folder, 'complexes/cr-am6.yaml'));
      symlinkSync(outside, join(folder, 'sources'));
      expect(codes().filter((one) => one.endsWith('FILE_UNREADABLE'))).toEqual(expect.arrayContaining(['complexes/cr-am6.yaml FILE_UNREADABLE', 'sources/smith-1998.yaml FILE_UNREADABLE']));
      expect(readCollection(folder).faults.find(({ file }) => file === 'complexes/cr-am6.yaml')).toMatchObject({ found: 'a link to a place outside the content folder', mend: 'put the file itself here' });
      rmSync(join(folder, 'sources'));
      rmSync(join(folder, 'complexes/cr-am6.yaml'));
      write('complexes/cr-am6.yaml', record);
      symlinkSync(join(folder, 'complexes/cr-am6.yaml'), join(folder, 'complexes/cr-am6-again.yaml'));
      expect(codes()).not.toContain('complexes/cr-am6-again.yaml FILE_UNREADABLE');
    } finally {
      rmSync(outside, { recursive: true });
    }
  });

  test.each([['little end first', [0xff, 0xfe], 'utf16le'], ['without a mark', [], 'utf16le']] as const)('UTF-16, %s, is refused with the way to mend it', (_, mark, encoding) => {
    write('complexes/cr-am6.yaml', Buffer.concat([Buffer.from(mark), Buffer.from(record, encoding)]));
    expect(codes()).toEqual(['complexes/cr-am6.yaml NOT_UTF8']);
    expect(readCollection(folder).faults[0]!.mend).toContain('UTF-8');
  });

  test('ids that differ in capitals or ending alone are one id', () => {
    write('complexes/cr-am6.yaml', record);
    write('complexes/cr-am6.yml', record);
    expect(codes()).toEqual(expect.arrayContaining(['complexes/cr-am6.yml DUPLICATE_ID']));
  });

  test('a byte order mark and line ends of Windows are read', () => {
    write('complexes/cr-am6.yaml', `\ufeff${record.replaceAll('\n', '\r\n')}notes: |\r\n  two\r\n  lines\r\n`);
    const { collection, faults } = readCollection(folder);
    expect(faults).toEqual([]);
    expect(collection!.complexes[0]!.notes).toBe('two\nlines');
  });

  test('hidden files and copies of an editor are passed over', () => {
    write('complexes/.cr-am6.yaml.swp', 'x');
    write('complexes/cr-am6.yaml~', 'x');
    expect(codes()).toEqual([]);
  });
});

test('faults come sorted by file, line and column whatever the order of reading', () => {
  write('complexes/b.yaml', 'x: 1\n');
  write('complexes/aa.yaml', `${record}colour: red\nspin: low\n`);
  write('ligands/zz.yaml', 'name: z\n');
  const { faults } = readCollection(folder);
  const keys = faults.map((fault) => [fault.file, String(fault.line).padStart(6, '0'), String(fault.column).padStart(6, '0')].join(' '));
  expect(keys).toEqual([...keys].sort());
  expect(new Set(faults.map((fault) => fault.file)).size).toBe(3);
});
