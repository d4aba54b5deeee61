import { hazardCautions } from '#engine';
import type { HazardSubject } from '#engine';
import { describe, expect, it } from 'vitest';
import { ionNamed } from '../measurement/sample.ts';
import { hazardCases, ligand, sample } from './hazardCases.ts';

function subject(changes: Partial<HazardSubject>): HazardSubject {
  return { ion: ionNamed('Cr(III)'), formula: '[Cr(NH3)6]3+', name: null, ligands: [], measurements: [], overridden: [], ...changes };
}

function codes(changes: Partial<HazardSubject>): readonly string[] {
  return hazardCautions(subject(changes)).map(({ code }) => code);
}

describe('hazard cautions', () => {
  for (const [code, { raise, spare }] of Object.entries(hazardCases)) {
    it(`${code} is raised where it should be`, () => {
      expect(raise.length).toBeGreaterThan(0);
      expect(raise.filter((changes) => !codes(changes).includes(code))).toEqual([]);
    });
    it(`${code} is not raised by its near misses`, () => {
      expect(spare.length).toBeGreaterThan(0);
      expect(spare.filter((changes) => codes(changes).includes(code))).toEqual([]);
    });
  }

  it('a harmless record raises nothing', () => {
    expect(codes({ ...ligand('ammine', 'NH3'), measurements: [{ id: 'a', sample: '[Cr(NH3)6]Cl3', medium: 'water', host: null }] })).toEqual([]);
  });

  it('says where each was found, once for each place', () => {
    const [caution] = hazardCautions(subject({ formula: '[Cr(CN)6]3-', ...ligand('cyanido', 'CN') }));
    expect(caution?.foundIn).toBe('the formula; the ligand cyanido');
  });

  it('the text follows the pattern: class, what this page is, and the advice', () => {
    const [caution] = hazardCautions(subject(sample('[Cr(NH3)6](ClO4)3')));
    expect(caution?.text).toMatch(/^Caution: perchlorate\. .*This page is a data record, not a preparation\. Before handling, consult the safety data sheet/);
  });

  it('an overridden code is left out, and only that one', () => {
    const changes = { ...sample('[Cr(NH3)6](ClO4)3'), formula: '[Cr(CN)6]3-' };
    expect(codes(changes)).toEqual(['PERCHLORATE', 'CYANIDE']);
    expect(codes({ ...changes, overridden: ['PERCHLORATE'] })).toEqual(['CYANIDE']);
  });
});
