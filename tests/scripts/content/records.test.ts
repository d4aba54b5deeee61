import { join } from 'node:path';
import { describe, expect, test } from 'vitest';
import { defaultPolicy, policyId } from '#engine';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import type { Collection, ComplexRecord } from '../../../scripts/content/types.ts';

const cases = join(import.meta.dirname, '../../cases');

function goodCollection(name: string): Collection {
  const { collection, faults } = readCollection(join(cases, name));
  expect(faults).toEqual([]);
  return collection!;
}

const full = goodCollection('good-full');
const complex = (id: string): ComplexRecord => full.complexes.find((record) => record.id === id)!;
const measurement = (id: string, place = 0) => complex(id).measurements[place]!;

describe('a record is read as it was typed', () => {
  test('complexes ascend by id', () => {
    const ids = full.complexes.map(({ id }) => id);
    expect(ids).toEqual([...ids].sort());
  });

  test('numbers that look like numbers stay the text that was typed', () => {
    expect(measurement('cr-am6').batch).toBe('7');
    expect(full.group.release).toBe('2026.1');
    expect(full.sources[0]!.volume).toBe('12');
  });

  test('positions in nm, eV and kK come out in cm-1 with their uncertainties, and as typed', () => {
    const { engine, bands } = measurement('cr-am6');
    expect(bands.map((band) => band.positionTyped)).toEqual(['21550(60) cm-1', '351.0(8) nm', '1.897(+2 -4) eV', '40 500 ± 120 cm-1 (k = 2)', '38.1 kK']);
    expect(engine.bands[0]).toMatchObject({ position: 21550, uMinus: 60, uPlus: 60, halfDigit: 0.5, width: 3100, epsilon: 36, terms: ['4T2g'] });
    // 1e7 / 351 and 1e7 * 0.8 / 351^2
    expect(engine.bands[1]!.position).toBeCloseTo(28490.0285, 4);
    expect(engine.bands[1]!.uPlus).toBeCloseTo(64.9345, 4);
    // both half-height points: 1e7/(351 - 22.5) - 1e7/(351 + 22.5)
    expect(engine.bands[1]!.width).toBeCloseTo(1e7 / 328.5 - 1e7 / 373.5, 6);
    expect(engine.bands[2]!.position).toBeCloseTo(1.897 * 8065.543937349212, 6);
    expect(engine.bands[2]!.uMinus).toBeCloseTo(0.004 * 8065.543937, 3);
    expect(engine.bands[3]).toMatchObject({ position: 40500, uMinus: 60, coverageNotStated: false, kind: 'shoulder', side: 'higher', role: 'CT', terms: [] });
    expect(engine.bands[4]).toMatchObject({ position: 38100, uMinus: null, uPlus: null, halfDigit: 50, leftOut: 'foot of the charge-transfer band', strength: 'weak', deconvoluted: true });
  });

  test('a plain plus-minus says that its coverage is not stated', () => {
    expect(measurement('cr-am6', 1).engine.bands[0]).toMatchObject({ position: 21550, uMinus: 60, coverageNotStated: true });
  });

  test('absent and scanned ranges are kept apart from bands, in cm-1', () => {
    const { engine, absentNotes, scannedTyped } = measurement('cr-am6');
    expect(engine.absent.map(({ low, high }) => [Math.round(low), Math.round(high)])).toEqual([[28600, 33300], [14085, 14286], [10000, 11111]]);
    expect(absentNotes).toEqual(['10 cm cell', null, null]);
    expect(engine.scanned.map(({ low, high }) => [Math.round(low), Math.round(high)])).toEqual([[14286, 33333], [9091, 13333]]);
    expect(scannedTyped).toBe('300 - 700 nm; 750 - 1100 nm');
  });

  test('room temperature is 295(5) K and marked as assumed', () => {
    const { engine, temperatureTyped, temperatureU, temperatureAssumed } = measurement('cr-am6', 1);
    expect({ kelvin: engine.temperature, temperatureTyped, temperatureU, temperatureAssumed }).toEqual({ kelvin: 295, temperatureTyped: 'room', temperatureU: 5, temperatureAssumed: true });
  });

  test('what was not typed is null, never zero', () => {
    const { engine, sample, medium, temperatureTyped, notebook, date, policyReason } = measurement('mn-aq6');
    expect([sample, medium, temperatureTyped, date, policyReason, engine.temperature, engine.technique, engine.bands[0]!.epsilon, engine.bands[0]!.width]).toEqual(Array(9).fill(null));
    expect(notebook).toBe('4');
    expect(engine.scanned).toEqual([]);
  });

  test('quoted parameters are kept in cm-1 and as typed', () => {
    const [first, second] = measurement('cr-am6').quoted;
    expect(first).toEqual({ Delta: 21600, Dq: null, B: 650, C: null, beta: null, cite: 'author-1999', where: 'p. 12', typed: { Delta: '21600 cm-1', B: '650 cm-1' } });
    expect(second).toMatchObject({ Dq: 2160, C: 3200, beta: 0.71, where: null, typed: { Dq: '2.16 kK', C: '3200 cm-1', beta: '0.71' } });
  });
});

describe('the complex itself', () => {
  test('charge, donors bound and spin are worked out', () => {
    expect(complex('cr-ox2-mono')).toMatchObject({ charge: -1, multiplicity: 4, spinTyped: null, spinAssumed: false });
    expect(complex('cr-ox2-mono').ligands).toEqual([{ ligand: 'oxalato', count: 2, bound: 1 }, { ligand: 'aqua', count: 4, bound: 1 }]);
    expect(complex('co-ox2-am2-trans')).toMatchObject({ charge: -1, multiplicity: 1, isomer: 'trans' });
  });

  test('a geometry that is not fitted is kept by name', () => {
    expect(complex('pt-cl4')).toMatchObject({ geometry: null, geometryName: 'square planar', multiplicity: null });
    expect(measurement('pt-cl4').engine).toMatchObject({ geometry: null, geometryName: 'square planar' });
  });

  test('doubtful innocence, hazard overrides and remarks are carried along', () => {
    expect(measurement('cr-am6').engine.innocenceDoubtful).toBe(true);
    expect(complex('cr-am6').hazardOverrides).toEqual({ PERCHLORATE: 'never in contact with perchlorate' });
    expect(complex('cr-am6').notes).toBe('A text in two lines: with a colon,\na # and a "quote".');
  });

  test('the hash is that of the bytes of its file', () => {
    expect(complex('cr-am6').hash).toMatch(/^[0-9a-f]{64}$/);
    expect(new Set(full.complexes.map(({ hash }) => hash)).size).toBe(full.complexes.length);
  });
});

describe('the policy', () => {
  test('is the default where nothing is typed', () => {
    const { policy, policyId: id } = goodCollection('good-minimal');
    expect(policy).toEqual(defaultPolicy);
    expect(id).toBe(policyId(defaultPolicy));
  });

  test('takes typed values and keeps the defaults of the rest', () => {
    expect(full.policy).toEqual({
      name: 'house-2026',
      cOverB: { general: { value: 4.4, u: 0.8 }, perIon: { 'Cr(III)': { value: 4.5, u: 0.5 }, 'Ni(II)': { value: 4, u: 0 } } },
      floors: { general: 140, spinFlip: 250, twoElectron: 0 },
      ceilings: { delta: 0.12, racahB: 0.2, racahC: 0.15 },
      differentialFloor: { delta: 40, racahB: 0.02 },
      freeIons: 'atomic-levels',
      cFitted: true,
      rivalMargin: 5,
      defaultUncertainties: { maximum: 90, line: 15 },
    });
  });

  test('is overridden for one measurement only, with the reason', () => {
    const [first, second] = complex('cr-am6').measurements;
    expect(first!.policy).toEqual({ ...full.policy, cOverB: { general: { value: 4, u: 0.3 }, perIon: {} } });
    expect(first!.policyReason).toBe('fitted in the parent compound');
    expect(second!.policy).toEqual(full.policy);
  });
});

test('the group is read with its people; a web address gets its closing slash', () => {
  expect(full.group).toEqual({
    title: 'A small collection for tests', name: 'Invented group', description: 'Invented readings in two lines.', contact: 'bands@example.org',
    people: [{ name: 'Tove Lind', orcid: '0000-0002-1825-0097', initials: 'TL' }, { name: 'Nils Berg', orcid: null, initials: null }],
    licence: 'CC-BY-4.0', url: 'https://example.org/bands/', release: '2026.1', started: '2004-09-01', doi: '10.5555/example.1', demonstration: false,
  });
});

test('a collection without complexes is legal', () => {
  expect(goodCollection('no-complexes').complexes).toEqual([]);
});
