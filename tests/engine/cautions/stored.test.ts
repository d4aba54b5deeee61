// Cautions as they reach the database: from records on disk, through the refit. tests/cases/hazards has one record for each class of
// hazard, named after its code; tests/cases/cautions has the cautions that need more than one measurement, or the ligands.

import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, describe, expect, test } from 'vitest';
import { hazardCodes } from '#engine';
import { refit } from '../../../scripts/database/refit.ts';
import { complexCases } from './complexCases.ts';

const folder = mkdtempSync(join(tmpdir(), 'bandstead-cautions-'));
afterAll(() => rmSync(folder, { recursive: true }));

interface Stored {
  readonly complex: string;
  readonly subject: string;
  readonly measurement: string | null;
  readonly code: string;
  readonly found_in: string | null;
  readonly text: string;
}

function storedOf(name: string) {
  const file = join(folder, `${name}.sqlite`);
  const outcome = refit({ content: join(import.meta.dirname, '../../cases', name), database: file, cache: null });
  if (!outcome.ok) throw new Error(outcome.faults.map((fault) => `${fault.file}:${fault.line} ${fault.field} ${fault.code} ${fault.found}`).join('\n'));
  const database = new Database(file, { readonly: true });
  try {
    return {
      cautions: database.prepare('SELECT complex, subject, measurement, code, found_in, text FROM caution ORDER BY complex, number').all() as Stored[],
      overrides: database.prepare('SELECT complex, code, reason FROM hazard_override').all() as { complex: string; code: string; reason: string }[],
    };
  } finally {
    database.close();
  }
}

describe('hazards', () => {
  const { cautions, overrides } = storedOf('hazards');
  const hazards = cautions.filter(({ subject }) => subject === 'hazard');
  const codesOf = (complex: string): string[] => hazards.filter((row) => row.complex === complex).map(({ code }) => code);
  const idOf = (code: string): string => code.toLowerCase().replaceAll('_', '-');

  /** Classes that come with the seeded one of a record. */
  const besides: Readonly<Record<string, readonly string[]>> = { NICKEL_CARBONYL: ['CARBONYL', 'CARCINOGENIC_METAL'] };

  test.each(hazardCodes)('%s is raised by its seeded record, and what else that record holds', (code) => {
    expect(codesOf(idOf(code)).toSorted()).toEqual([code, ...(besides[code] ?? [])].toSorted());
  });

  test('each says where it was found and gives the advice', () => {
    expect(hazards.length).toBeGreaterThanOrEqual(hazardCodes.length);
    for (const { found_in: where, text } of hazards) {
      expect(where).toMatch(/^the (formula|metal ion|ligand|sample|medium|host)/);
      expect(text).toMatch(/^Caution: .*This page is a data record, not a preparation\./);
    }
  });

  test('a harmless record raises nothing', () => {
    expect(codesOf('harmless')).toEqual([]);
  });

  test('a caution that the group overrides is gone, the others stay, and the reason is stored', () => {
    expect(codesOf('overridden')).toEqual(['CYANIDE']);
    expect(overrides).toEqual([{ complex: 'overridden', code: 'PERCHLORATE', reason: expect.stringContaining('perchlorate-free acid') }]);
  });
});

describe('cautions of a complex', () => {
  const { cautions } = storedOf('cautions');
  const has = (id: string, code: string): boolean => cautions.some((row) => `${row.complex}/${row.measurement}` === id && row.code === code);

  test.each(Object.entries(complexCases))('%s: raised by its record, not by those that come near', (code, { raise, spare }) => {
    expect(has(raise, code)).toBe(true);
    expect(spare.filter((id) => has(id, code))).toEqual([]);
  });

  test('solution against solid is another condition, whatever the temperature', () => {
    expect(has('cr-cl6/dissolved', 'CONDITIONS_DIFFER')).toBe(true);
    expect(has('cr-cl6/pressed', 'CONDITIONS_DIFFER')).toBe(true);
  });

  test('a disagreement names the other measurement and both numbers', () => {
    const { text } = cautions.find(({ complex, measurement, code }) => complex === 'cr-en3' && measurement === 'first' && code === 'MEASUREMENTS_DISAGREE')!;
    expect(text).toMatch(/^again of the same complex.*Delta 22\D?150\(60\) against 21\D?850\(60\)/);
  });
});
