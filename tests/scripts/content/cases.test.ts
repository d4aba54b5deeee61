// Each folder of tests/cases is a small content folder; its expected.txt is the whole report of npm run check.
// UPDATE_CASES=1 rewrites the reports: read each aloud before keeping it.

import { existsSync, readdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { codeGroups } from '../../../scripts/content/codes.ts';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { faultReport } from '../../../scripts/report/faults.ts';

const folder = join(import.meta.dirname, '../../cases');
const names = readdirSync(folder).filter((name) => existsSync(join(folder, name, 'expected.txt')) || process.env['UPDATE_CASES'] === '1');

describe('a content folder is reported as expected', () => {
  test.each(names)('%s', (name) => {
    const { collection, faults } = readCollection(join(folder, name));
    const report = faults.length === 0 ? 'no faults\n' : faultReport(faults, 'content');
    expect(collection === null).toBe(faults.length > 0);
    const file = join(folder, name, 'expected.txt');
    if (process.env['UPDATE_CASES'] === '1') writeFileSync(file, report);
    expect(report).toBe(readFileSync(file, 'utf8'));
  });
});

/** Codes that need a file which no repository can hold (files.test.ts shows each) or a history of releases (release/history.test.ts). */
const shownElsewhere = [
  'FILE_UNREADABLE', 'FILE_TOO_LARGE', 'TEXT_TOO_LONG', 'CONTROL_CHARACTER', 'MORE_FAULTS',
  'RELEASE_FILE', 'GONE_ADDRESS', 'ADDRESS_VANISHED', 'ID_REUSED', 'IDENTITY_CHANGED',
];

test('every code of the manual is shown by a case', () => {
  const reports = names.map((name) => readFileSync(join(folder, name, 'expected.txt'), 'utf8')).join('\n');
  const codes = codeGroups.flatMap((group) => Object.keys(group.codes));
  const unseen = codes.filter((code) => !new RegExp(`  ${code}$`, 'm').test(reports) && !shownElsewhere.includes(code));
  expect(unseen).toEqual([]);
});
