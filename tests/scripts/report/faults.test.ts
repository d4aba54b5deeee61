import { describe, expect, test } from 'vitest';
import type { Fault } from '../../../scripts/content/types.ts';
import { faultReport, folderName } from '../../../scripts/report/faults.ts';

const fault: Fault = {
  file: 'complexes/cr-am6.yaml', line: 12, column: 9, field: 'bands[1].position', code: 'THOUSANDS_COMMA', found: '"24,500 cm-1"',
  expected: 'a number with a unit, e.g. 24500(100) cm-1 or 408.2(5) nm', mend: 'write 24500 cm-1 (no thousands comma)',
};

test('a fault is printed in four lines, and the faults are counted', () => {
  expect(faultReport([fault, { ...fault, file: 'group.yaml', line: 1, column: 1, field: '' }], 'content')).toBe(`content/complexes/cr-am6.yaml:12:9  bands[1].position  THOUSANDS_COMMA
  found     "24,500 cm-1"
  expected  a number with a unit, e.g. 24500(100) cm-1 or 408.2(5) nm
  to mend   write 24500 cm-1 (no thousands comma)

content/group.yaml:1:1  whole file  THOUSANDS_COMMA
  found     "24,500 cm-1"
  expected  a number with a unit, e.g. 24500(100) cm-1 or 408.2(5) nm
  to mend   write 24500 cm-1 (no thousands comma)

2 faults in 2 files
`);
});

test('one fault is one fault', () => {
  expect(faultReport([fault], 'content')).toMatch(/\n1 fault in 1 file\n$/);
});

describe('the folder is named as the user sees it', () => {
  test.each([['/desk/project/content', '/desk/project', 'content'], ['/desk/project', '/desk/project', '.'], ['/desk/other', '/desk/project', '../other'], ['/srv/records/our-bands', '/desk/project', '/srv/records/our-bands']])('%s from %s is %s', (directory, standing, name) => {
    expect(folderName(directory, standing)).toBe(name);
  });
});
