import { describe, expect, it } from 'vitest';
import { metals } from '#engine';
import * as published from '../../../scripts/export/paths.ts';
import * as site from '../../../site/data/paths.ts';

describe('published addresses', () => {
  it('are those of the site\'s own pages', () => {
    const ions = [...metals].flatMap((metal) => ['-I', '0', 'II', 'III', 'VII'].map((oxidation) => `${typeof metal === 'string' ? metal : metal.symbol}(${oxidation})`));
    expect(ions.length).toBeGreaterThan(50);
    for (const ion of ions) expect(published.ionPath(ion)).toBe(site.ionPath(ion));
    expect(published.complexPath('cr-am6')).toBe(site.complexPath('cr-am6'));
    expect(published.ligandPath('ammine')).toBe(site.ligandPath('ammine'));
    expect(published.measurementPath('cr-am6', 'aq')).toBe(`${site.complexPath('cr-am6')}#aq`);
  });
});
