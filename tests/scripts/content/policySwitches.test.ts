// Each value of policy.yaml, typed as a group types it, changes the results that it should and no others.

import { cpSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { afterAll, describe, expect, test } from 'vitest';
import { freeIon, policyId, readWithRivals } from '#engine';
import type { Parameter, Policy, Reading } from '#engine';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { codesOf } from '../../engine/readings/readSample.ts';

const cases = join(import.meta.dirname, '../../cases');
const folder = mkdtempSync(join(tmpdir(), 'bandstead-policy-'));
afterAll(() => rmSync(folder, { recursive: true }));

interface TypedRecord {
  readonly head: string;
  readonly bands: string;
}

const cobaltic: TypedRecord = { head: 'formula: "[Co(NH3)6]3+"\nion: Co(III)\nspin: low', bands: '{ position: 21050(100) cm-1, term: a1T1g }, { position: 29500(100) cm-1, term: a1T2g }' };

const records: Readonly<Record<string, TypedRecord>> = {
  'cobaltic-ammine': cobaltic,
  'rhodium-ammine': { head: 'formula: "[Rh(NH3)6]3+"\nion: Rh(III)\nspin: low', bands: '{ position: 32700(100) cm-1, term: a1T1g }, { position: 39100(100) cm-1, term: a1T2g }' },
  // The line makes C determinable.
  'chromium-line': { head: 'formula: "[Cr(NH3)6]3+"\nion: Cr(III)', bands: '{ position: 21550(100) cm-1, term: 4T2g }, { position: 28490(100) cm-1, term: 4T1g(F) }, { position: 15300(20) cm-1, kind: line, term: 2Eg }' },
  'chromium-three': { head: 'formula: "[Cr(NH3)6]3+"\nion: Cr(III)', bands: '{ position: 21550(100) cm-1, term: 4T2g }, { position: 28490(100) cm-1, term: 4T1g(F) }, { position: 43000(100) cm-1, term: 4T1g(P) }' },
  'nickel-typed-u': { head: 'formula: "[Ni(NH3)6]2+"\nion: Ni(II)', bands: '{ position: 10750(100) cm-1, term: 3T2g }, { position: 17500(100) cm-1, term: 3T1g(F) }, { position: 28200(100) cm-1, term: 3T1g(P) }' },
  'nickel-bare': { head: 'formula: "[Ni(NH3)6]2+"\nion: Ni(II)', bands: '{ position: 10750 cm-1, term: 3T2g }, { position: 17500 cm-1, term: 3T1g(F) }, { position: 28200 cm-1, term: 3T1g(P) }' },
  'chromium-bare-line': { head: 'formula: "[Cr(NH3)6]3+"\nion: Cr(III)', bands: '{ position: 21550(100) cm-1, term: 4T2g }, { position: 28490(100) cm-1, term: 4T1g(F) }, { position: 15300 cm-1, kind: line, term: 2Eg }' },
  // The tetrahedral ion reads it about as well.
  'chromium-near': { head: 'formula: "[Cr(NH3)6]3+"\nion: Cr(III)', bands: '{ position: 26700(100) cm-1, term: 4T2g }, { position: 30500(100) cm-1, term: 4T1g(F) }' },
};

/** What came out, by the id of the record. */
interface Read {
  readonly readings: ReadonlyMap<string, Reading>;
  readonly rivals: ReadonlyMap<string, readonly Reading[]>;
  readonly policies: ReadonlyMap<string, Policy>;
}

/** Reads all records under a typed policy; `override` is a line of the measurement of the record it names. */
function readUnder(policyText: string, override: { readonly of: string; readonly line: string } | null = null): Read {
  const content = mkdtempSync(join(folder, 'content-'));
  mkdirSync(join(content, 'complexes'), { recursive: true });
  mkdirSync(join(content, 'ligands'));
  cpSync(join(cases, 'bands', 'group.yaml'), join(content, 'group.yaml'));
  cpSync(join(cases, 'terms', 'ligands', 'ammine.yaml'), join(content, 'ligands', 'ammine.yaml'));
  if (policyText !== '') writeFileSync(join(content, 'policy.yaml'), `${policyText}\n`);
  for (const [id, { head, bands }] of Object.entries(records)) {
    const line = override?.of === id ? `    ${override.line}\n` : '';
    writeFileSync(join(content, 'complexes', `${id}.yaml`),
      `${head}\ngeometry: octahedral\nligands: { ammine: 6 }\nmeasurements:\n  - id: m1\n    phase: solution\n    source: { notebook: "1" }\n${line}    bands: [${bands}]\n`);
  }
  const { collection, faults } = readCollection(content);
  if (collection === null) throw new Error(faults.map((fault) => `${fault.file}:${fault.line} ${fault.field} ${fault.code} ${fault.found}`).join('\n'));
  const all = collection.complexes.map(({ id, ion, measurements: [only] }) => {
    const { engine, policy } = only!;
    return { id, policy, read: readWithRivals(engine, policy, freeIon(policy.freeIons, ion)) };
  });
  return {
    readings: new Map(all.map(({ id, read }) => [id, read.chosen])),
    rivals: new Map(all.map(({ id, read }) => [id, read.rivals])),
    policies: new Map(all.map(({ id, policy }) => [id, policy])),
  };
}

const usual = readUnder('');

/** Ids of the records of which any of the four parameters differs from that under the default policy. */
function changed({ readings }: Read): readonly string[] {
  return [...readings].filter(([id, reading]) => JSON.stringify(reading.parameters) !== JSON.stringify(usual.readings.get(id)!.parameters)).map(([id]) => id).toSorted();
}

function of(read: Read, id: string, name: Parameter['name']): Parameter {
  return read.readings.get(id)!.parameters.find((one) => one.name === name)!;
}

describe('C/B', () => {
  const exact = readUnder('C/B: 4.0');

  test('a bare value is exact: Delta of low-spin d6 moves by 0.4 to 1.0 %, and is fitted instead of assumed', () => {
    for (const id of ['cobaltic-ammine', 'rhodium-ammine']) {
      const [before, after] = [of(usual, id, 'Delta'), of(exact, id, 'Delta')];
      expect([before.standing, after.standing]).toEqual(['assumed', 'fitted']);
      expect(Math.abs(after.value! - before.value!) / before.value!).toBeGreaterThan(0.004);
      expect(Math.abs(after.value! - before.value!) / before.value!).toBeLessThan(0.01);
      expect(after.uTotal!).toBeLessThan(before.uTotal!);
    }
  });

  test('what does not feel C keeps its numbers; only the reason why C is withheld names the other value', () => {
    for (const id of ['nickel-typed-u', 'chromium-three', 'chromium-line'])
      for (const name of ['Delta', 'B'] as const) expect(of(exact, id, name).value).toBeCloseTo(of(usual, id, name).value!, 3);
    expect(of(exact, 'nickel-typed-u', 'C').reason).toContain('C/B = 4');
  });

  test('one an ion: that ion alone is read with it', () => {
    const perIon = readUnder('C/B: { Co(III): 4.0, general: 4.5(9) }');
    expect(of(perIon, 'cobaltic-ammine', 'Delta')).toEqual(of(exact, 'cobaltic-ammine', 'Delta'));
    expect(perIon.readings.get('cobaltic-ammine')!.ratio).toEqual({ value: 4, u: 0, origin: 'policy for this ion' });
    expect(changed(perIon)).toEqual(['cobaltic-ammine']);
  });

  test('its uncertainty reaches u(total), not u', () => {
    const wide = readUnder('C/B: 4.5(18)');
    expect(of(wide, 'cobaltic-ammine', 'Delta').uTotal!).toBeGreaterThan(1.5 * of(usual, 'cobaltic-ammine', 'Delta').uTotal!);
    expect(of(wide, 'cobaltic-ammine', 'Delta').u).toBe(of(usual, 'cobaltic-ammine', 'Delta').u);
  });
});

describe('C', () => {
  const assumed = readUnder('C: assumed');

  test('fitted where determinable is the default, and typed changes nothing', () => {
    expect(of(usual, 'chromium-line', 'C').standing).toBe('fitted');
    expect(changed(readUnder('C: fitted where determinable'))).toEqual([]);
  });

  test('assumed: C is withheld, the line is compared and not fitted', () => {
    expect(of(assumed, 'chromium-line', 'C')).toMatchObject({ value: null, standing: 'withheld' });
    expect(assumed.readings.get('chromium-line')!.bands.find(({ label }) => label === 'a2Eg')).toMatchObject({ used: false });
    expect(usual.readings.get('chromium-line')!.bands.find(({ label }) => label === 'a2Eg')).toMatchObject({ used: true });
    expect(changed(assumed)).toEqual(['chromium-bare-line', 'chromium-line']);
  });
});

describe('default uncertainties', () => {
  test('maximum: of readings typed without one, and of no others', () => {
    const doubled = readUnder('default-uncertainties: { maximum: 160 cm-1 }');
    expect(changed(doubled)).toEqual(['nickel-bare']);
    expect(usual.readings.get('nickel-bare')!.bands.map(({ uPlus, uAssumed }) => ({ uPlus, uAssumed }))).toEqual(Array(3).fill({ uPlus: 80, uAssumed: true }));
    expect(doubled.readings.get('nickel-bare')!.bands.map(({ uPlus }) => uPlus)).toEqual([160, 160, 160]);
    expect(of(doubled, 'nickel-bare', 'Delta').u!).toBeGreaterThan(1.5 * of(usual, 'nickel-bare', 'Delta').u!);
  });

  test('line: of lines typed without one', () => {
    const wide = readUnder('default-uncertainties: { line: 60 cm-1 }');
    expect(changed(wide)).toEqual(['chromium-bare-line']);
    expect(wide.readings.get('chromium-bare-line')!.bands.find(({ label }) => label === 'a2Eg')!.uPlus).toBe(60);
  });
});

describe('floors', () => {
  test('general 0: nothing but the readings is left of u(total) where every band is of the general kind', () => {
    const none = readUnder('floors: { general: 0 cm-1 }');
    const { u, uTotal } = of(none, 'nickel-typed-u', 'Delta');
    expect(uTotal!).toBeCloseTo(u!, 9);
    expect(of(usual, 'nickel-typed-u', 'Delta').uTotal!).toBeGreaterThan(1.5 * of(usual, 'nickel-typed-u', 'Delta').u!);
  });

  test('spin-flip: readings with a line in the fit, and no others', () => {
    const wide = readUnder('floors: { spin-flip: 500 cm-1 }');
    expect(changed(wide)).toEqual(['chromium-bare-line', 'chromium-line']);
    expect(of(wide, 'chromium-line', 'C').uTotal!).toBeGreaterThan(of(usual, 'chromium-line', 'C').uTotal!);
  });

  test('two-electron: the reading with nu3 of d3; a low floor lets it pull B', () => {
    const low = readUnder('floors: { two-electron: 50 cm-1 }');
    expect(changed(low)).toEqual(['chromium-three']);
    expect(Math.abs(of(low, 'chromium-three', 'B').value! - of(usual, 'chromium-three', 'B').value!)).toBeGreaterThan(5);
    expect(low.readings.get('chromium-three')!.chi2!).toBeGreaterThan(usual.readings.get('chromium-three')!.chi2!);
  });
});

describe('ceilings', () => {
  test.each([['Delta', 'nickel-typed-u', '0.5 %'], ['B', 'nickel-typed-u', '1 %']] as const)('%s: above it the number is withheld, the ceiling named', (name, id, ceiling) => {
    expect(of(usual, id, name).value).not.toBeNull();
    const found = of(readUnder(`ceilings: { ${name}: ${ceiling} }`), id, name);
    expect(found).toMatchObject({ value: null, uTotal: null, standing: 'withheld' });
    expect(found.reason).toContain('ceiling');
  });

  test('C: above it C is withheld and the reading falls back on the assumed C/B', () => {
    const low = readUnder('ceilings: { C: 1 % }');
    expect(of(usual, 'chromium-line', 'C').value).not.toBeNull();
    expect(of(low, 'chromium-line', 'C')).toMatchObject({ value: null, uTotal: null, standing: 'withheld' });
    expect(low.readings.get('chromium-line')!.ratio).toMatchObject({ value: 4.5, origin: 'policy' });
    expect(changed(low)).toEqual(['chromium-bare-line', 'chromium-line']);
  });
});

test('free-ion set: B stays, beta is taken against the other B0', () => {
  const other = readUnder('free-ions: atomic-levels');
  expect(of(other, 'nickel-typed-u', 'B')).toEqual(of(usual, 'nickel-typed-u', 'B'));
  // B0 of Ni(II): 1030 as printed, 1056 from the levels 3F and 3P (check of both sets: tests/engine/ions).
  expect(of(usual, 'nickel-typed-u', 'beta').value! / of(other, 'nickel-typed-u', 'beta').value!).toBeCloseTo(1056 / 1030, 3);
  expect(of(other, 'rhodium-ammine', 'beta')).toMatchObject({ value: null, reason: expect.stringContaining('atomic-levels') });
});

test('rival margin: the nearest rival is named within it and not beyond it', () => {
  const id = 'chromium-near';
  const gap = Math.abs(usual.rivals.get(id)![0]!.score! - usual.readings.get(id)!.score!);
  expect(gap).toBeGreaterThan(0.6);
  const named = (margin: number): boolean => codesOf(readUnder(`rival-margin: ${margin.toFixed(1)}`).readings.get(id)!).includes('NEAR_RIVAL');
  expect([named(gap + 0.5), named(gap - 0.5)]).toEqual([true, false]);
  expect(changed(readUnder('rival-margin: 0'))).toEqual([]);
});

describe('an override on a measurement', () => {
  const override = { of: 'cobaltic-ammine', line: 'policy: { C/B: 4.0, because: "fitted in the parent compound" }' };
  const overridden = readUnder('', override);

  test('changes that measurement alone, to what the whole policy would give it', () => {
    expect(changed(overridden)).toEqual(['cobaltic-ammine']);
    expect(of(overridden, 'cobaltic-ammine', 'Delta')).toEqual(of(readUnder('C/B: 4.0'), 'cobaltic-ammine', 'Delta'));
  });

  test('shows in the policy id of that measurement', () => {
    const ids = new Map([...overridden.policies].map(([id, policy]) => [id, policyId(policy)]));
    expect(ids.get('cobaltic-ammine')).not.toBe(ids.get('nickel-bare'));
    expect(ids.get('nickel-bare')).toBe(policyId(usual.policies.get('nickel-bare')!));
  });

  test('without a reason it is a fault', () => {
    expect(() => readUnder('', { of: 'cobaltic-ammine', line: 'policy: { C/B: 4.0 }' })).toThrow(/policy\.because MISSING_FIELD/);
  });
});

test('every value of the policy shows in its id', () => {
  const texts = [
    '', 'C/B: 4.0', 'C/B: { Co(III): 4.0 }', 'C: assumed', 'default-uncertainties: { maximum: 160 cm-1 }', 'default-uncertainties: { line: 60 cm-1 }', 'floors: { general: 0 cm-1 }',
    'floors: { spin-flip: 500 cm-1 }', 'floors: { two-electron: 50 cm-1 }', 'ceilings: { Delta: 5 % }', 'ceilings: { B: 5 % }', 'ceilings: { C: 5 % }', 'free-ions: atomic-levels',
    'rival-margin: 0', 'differential-floor: { Delta: 60 cm-1 }', 'differential-floor: { B: 2 % }',
  ];
  const ids = texts.map((text) => policyId(readUnder(text).policies.get('nickel-bare')!));
  expect(new Set(ids).size).toBe(texts.length);
});
