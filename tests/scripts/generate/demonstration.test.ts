import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import type { ComplexRecord } from '../../../scripts/content/types.ts';
import { demonstrationSeed, draftDemonstration } from '../../../scripts/generate/demonstration/draft.ts';

const content = join(import.meta.dirname, '../../../content');
const isDemonstration = /^demonstration: true$/m.test(readFileSync(join(content, 'group.yaml'), 'utf8'));

// A group that has put its own records into content/ has nothing to do with what follows.
describe.runIf(isDemonstration)('the demonstration collection', () => {
  const result = readCollection(content);
  const complexes: readonly ComplexRecord[] = result.collection?.complexes ?? [];
  const measurements = complexes.flatMap((one) => one.measurements);
  const bands = measurements.flatMap((one) => one.engine.bands);

  it('is read without a fault', () => {
    expect(result.faults).toEqual([]);
  });

  it('says that it is invented, and names nobody by a public identifier', () => {
    expect(result.collection?.group.demonstration).toBe(true);
    expect(result.collection?.group.people.every((person) => person.orcid === null)).toBe(true);
    for (const source of result.collection?.sources ?? []) {
      expect(source.reference).toContain('Invented');
      expect(source.doi).toBeNull();
    }
  });

  it('holds sixty complexes or more with fourteen ligands or more, of d1 to d9', () => {
    expect(complexes.length).toBeGreaterThanOrEqual(60);
    expect(new Set(complexes.flatMap((one) => one.ligands.map((ligand) => ligand.ligand))).size).toBeGreaterThanOrEqual(14);
    const fitted = complexes.filter((one) => one.geometry !== null);
    for (let electrons = 1; electrons <= 9; electrons += 1) expect(fitted.some((one) => one.ion.electrons === electrons), `d${electrons}`).toBe(true);
  });

  it.each([
    ['tetrahedral complexes', () => complexes.filter((one) => one.geometry === 'tetrahedral').length, 8],
    ['high-spin complexes where low spin is possible', () => complexes.filter((one) => one.spinTyped === 'high').length, 8],
    ['low-spin complexes', () => complexes.filter((one) => one.spinTyped === 'low').length, 8],
    ['complexes measured more than once', () => complexes.filter((one) => one.measurements.length > 1).length, 15],
    ['complexes of two kinds of ligand', () => complexes.filter((one) => one.ligands.length > 1).length, 10],
    ['isomers', () => complexes.filter((one) => one.isomer !== 'none').length, 8],
    ['lines', () => bands.filter((one) => one.kind === 'line').length, 20],
    ['shoulders with a side', () => bands.filter((one) => one.kind === 'shoulder' && one.side !== null).length, 8],
    ['components with a degeneracy', () => bands.filter((one) => one.kind === 'component' && one.degeneracy !== null).length, 10],
    ['dips', () => bands.filter((one) => one.kind === 'dip').length, 1],
    ['zero-phonon lines', () => bands.filter((one) => one.kind === 'zero-phonon').length, 1],
    ['bands left out with a reason', () => bands.filter((one) => one.leftOut !== null).length, 3],
    ['charge-transfer bands', () => bands.filter((one) => one.role === 'CT').length, 10],
    ['readings in nm', () => measurements.flatMap((one) => one.bands).filter((one) => one.positionTyped.endsWith('nm')).length, 20],
    ['readings in eV', () => measurements.flatMap((one) => one.bands).filter((one) => one.positionTyped.endsWith('eV')).length, 20],
    ['absent ranges', () => measurements.flatMap((one) => one.engine.absent).length, 4],
    ['quoted values', () => measurements.flatMap((one) => one.quoted).length, 8],
    ['doped hosts', () => measurements.filter((one) => one.host !== null).length, 5],
    ['records of doubtful innocence', () => measurements.filter((one) => one.engine.innocenceDoubtful).length, 1],
    ['measurements at room temperature', () => measurements.filter((one) => (one.engine.temperature ?? 0) >= 290).length, 60],
    ['measurements at 80 K or below', () => measurements.filter((one) => one.engine.temperature !== null && one.engine.temperature <= 80).length, 15],
  ] as const)('holds %s', (_, count, least) => {
    expect(count()).toBeGreaterThanOrEqual(least);
  });

  it('shares ligands between ions and ions between ligands, so that series have something to compare', () => {
    const ionsWith = (ligand: string): number => new Set(complexes.filter((one) => one.ligands.length === 1 && one.ligands[0]?.ligand === ligand).map((one) => one.ion.name)).size;
    for (const ligand of ['aqua', 'ammine', 'en', 'chlorido', 'fluorido']) expect(ionsWith(ligand), ligand).toBeGreaterThanOrEqual(4);
    const ligandsOf = (ion: string): number => complexes.filter((one) => one.ion.name === ion && one.ligands.length === 1 && one.geometry === 'octahedral').length;
    for (const ion of ['Cr(III)', 'Co(III)', 'Ni(II)']) expect(ligandsOf(ion), ion).toBeGreaterThanOrEqual(6);
  });

  it('still follows from its seed: the records that nobody edited are those that the generator drafts', () => {
    const drafts = draftDemonstration(demonstrationSeed);
    const asDrafted = drafts.filter((file) => existsSync(join(content, file.path)) && readFileSync(join(content, file.path), 'utf8') === file.text);
    // Some fifty at the time of writing; a reading changed here and there does no harm.
    expect(asDrafted.length).toBeGreaterThanOrEqual(40);
  });
});
