import { describe, expect, test } from 'vitest';
import { defaultPolicy } from '#engine';
import { bandUncertainty } from '../../../engine/measurement/defaultUncertainty.ts';
import { band } from './sample.ts';

const of = (given: Parameters<typeof band>[1]) => bandUncertainty(band(20_000, given), defaultPolicy);

describe('what was typed stands', () => {
  test('a typed u is taken as it is, whatever the kind and however coarse the digits', () => {
    for (const kind of ['maximum', 'shoulder', 'line', 'zero-phonon', 'dip', 'centroid', 'component', 'envelope'] as const)
      expect(of({ kind, uMinus: 3, uPlus: 7, width: 4000, side: 'higher', halfDigit: 500 }), kind).toEqual({ uMinus: 3, uPlus: 7, assumed: false });
  });
});

describe('the default by kind, in cm-1', () => {
  test.each([
    ['a maximum of width 3000', { kind: 'maximum', width: 3000 }, 90],
    ['a narrow maximum of width 200', { kind: 'maximum', width: 200 }, 34],
    ['a maximum without a width', { kind: 'maximum' }, 80],
    ['a line', { kind: 'line' }, 15],
    ['a broad line: still a line', { kind: 'line', width: 900 }, 15],
    ['a zero-phonon position', { kind: 'zero-phonon' }, 15],
    ['a dip of width 400: half its width', { kind: 'dip', width: 400 }, 200],
    ['a centroid of width 2000: a twentieth', { kind: 'centroid', width: 2000 }, 100],
    ['an envelope of width 4000: 0.15 of it', { kind: 'envelope', width: 4000 }, 600],
    ['a component of width 2000: as a maximum', { kind: 'component', width: 2000 }, 70],
    ['a component without a width: as a maximum', { kind: 'component' }, 80],
    ['a component taken apart by a fit of the curve: twice that', { kind: 'component', width: 2000, deconvoluted: true }, 140],
  ] as const)('%s', (_, given, u) => {
    expect(of(given)).toEqual({ uMinus: u, uPlus: u, assumed: true });
  });

  test('dip, centroid and envelope without a width still get an uncertainty, and a wide one', () => {
    for (const kind of ['dip', 'centroid', 'envelope'] as const) expect(of({ kind }).uMinus, kind).toBeGreaterThanOrEqual(100);
  });

  test("the policy's own values are used where no width was recorded", () => {
    const policy = { ...defaultPolicy, defaultUncertainties: { maximum: 55, line: 4 } };
    expect(bandUncertainty(band(20_000), policy).uPlus).toBe(55);
    expect(bandUncertainty(band(20_000, { kind: 'line' }), policy).uPlus).toBe(4);
    expect(bandUncertainty(band(20_000, { width: 1000 }), policy).uPlus).toBe(50);
  });
});

describe('a shoulder: its band lies on the far side of the stronger neighbour', () => {
  test('the stronger band lies higher: the shoulder may well lie lower, by 0.35 width, and hardly higher, by 0.15 width', () => {
    expect(of({ kind: 'shoulder', side: 'higher', width: 2000 })).toEqual({ uMinus: 700, uPlus: 300, assumed: true });
  });

  test('the stronger band lies lower: the other way round', () => {
    expect(of({ kind: 'shoulder', side: 'lower', width: 2000 })).toEqual({ uMinus: 300, uPlus: 700, assumed: true });
  });

  test('which side is not recorded: the larger of the two both ways', () => {
    expect(of({ kind: 'shoulder', width: 2000 })).toEqual({ uMinus: 700, uPlus: 700, assumed: true });
  });

  test.each([['higher', 600, 250], ['lower', 250, 600], [null, 600, 600]] as const)('no width, stronger band %s: %i below and %i above', (side, uMinus, uPlus) => {
    expect(of({ kind: 'shoulder', side })).toEqual({ uMinus, uPlus, assumed: true });
  });
});

// GUM 4.3.7: a rectangular distribution of half-width a has the standard uncertainty a / sqrt 3.
describe('a position rounded by hand is not known better than its last digit', () => {
  test('a line typed as 14.4 kK, half a digit 50 cm-1: 28.9 rather than 15', () => {
    const { uMinus, uPlus } = of({ kind: 'line', halfDigit: 50 });
    expect(uMinus).toBeCloseTo(50 / Math.sqrt(3), 12);
    expect(uPlus).toBe(uMinus);
  });

  test('a maximum typed as 21 kK: 289 rather than 80', () => {
    expect(of({ halfDigit: 500 }).uPlus).toBeCloseTo(288.675, 3);
  });

  test('each side of a shoulder by itself: only the narrow side is raised', () => {
    const { uMinus, uPlus } = of({ kind: 'shoulder', side: 'higher', halfDigit: 500 });
    expect(uMinus).toBe(600);
    expect(uPlus).toBeCloseTo(500 / Math.sqrt(3), 12);
  });

  test('fine digits change nothing', () => {
    expect(of({ halfDigit: 0.05 }).uPlus).toBe(80);
  });
});
