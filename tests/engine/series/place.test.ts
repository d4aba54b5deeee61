import { describe, expect, test } from 'vitest';
import { averageEnvironment, fitFactors, memberPlacements, parentsOf, placeWords } from '#engine';
import type { Placement, SeriesResult } from '#engine';
import { codes, place, planted, regular } from './plantedSeries.ts';
import { identity, result, testPolicy } from './sample.ts';

const prediction = (placement: Placement, parameter: string, method: string) => placement.predictions.find((one) => one.parameter === parameter && one.method === method)!;

describe('a new complex', () => {
  const mixed = planted('Cr(III)', { ammine: 3, chlorido: 3 });
  const placement = place(mixed);
  test('is predicted by the average environment and by the factors, and lies where they say', () => {
    expect(placement.predictions.map(({ parameter, method }) => `${parameter} ${method}`)).toEqual(['Delta average environment', 'Delta factors', 'beta average environment', 'beta factors']);
    for (const one of placement.predictions) {
      expect(Math.abs(one.z!), `${one.parameter} ${one.method}`).toBeLessThan(2);
      expect(one.u).toBeGreaterThan(0);
    }
    const [ammine, chlorido] = ['ammine', 'chlorido'].map((ligand) => regular.find(({ complex }) => complex.ion.name === 'Cr(III)' && complex.ligands[0]!.ligand === ligand)!.parameters.Delta.value!);
    expect(prediction(placement, 'Delta', 'average environment').predicted).toBeCloseTo((ammine! + chlorido!) / 2, 6);
  });
  test('stands above what it is above, below what it is below, and is told from nothing that it is like', () => {
    const [delta] = placement.places;
    expect(delta).toMatchObject({ subject: 'ion', parameter: 'Delta', members: 4, widened: 'none' });
    expect(delta!.below!.result.complex.ligands[0]!.ligand).toBe('ammine');
    expect(delta!.above!.result.complex.ligands[0]!.ligand).toBe('aqua');
    expect(delta!.aboveCount + delta!.belowCount + delta!.alike.length).toBe(4);
    const near = place(planted('Cr(III)', { ammine: 5, aqua: 1 }, { delta: regular.find(({ complex }) => complex.id === 'criii--ammine6')!.parameters.Delta.value! - 100 }));
    expect(near.places[0]!.alike.map((one) => one.result.complex.id)).toEqual(['criii--ammine6']);
    expect(placeWords(near.places[0]!, near.result).sentence).toBe('Delta, among 4 comparable complexes of Cr(III), octahedral, quartet: above [Cr(III) (aqua)6] and 1 more; not distinguishable from [Cr(III) (ammine)6]; below [Cr(III) (cyanido)6].');
  });
  test('finds the nearest earlier complexes by what the ligands do, across ions, and says what differs', () => {
    const { nearest } = place(planted('Cr(III)', { ammine: 6 }));
    expect(nearest.complexes[0]!.differs).toEqual([expect.stringContaining('another ion')]);
    expect(nearest.complexes[0]!.result.complex.ligands[0]!.ligand).toBe('ammine');
    expect(nearest.deltaOverG).toBeCloseTo(1.25, 1);
  });
  test('does not hang on anything of its own that the collection may hold already', () => {
    expect(JSON.stringify(place(mixed, [...regular, mixed]).predictions)).toBe(JSON.stringify(placement.predictions));
    expect(JSON.stringify(place(mixed, [...regular, mixed]).places)).toBe(JSON.stringify(placement.places));
    expect(codes(place(mixed, [...regular, mixed]))).toEqual(['ALREADY_THERE']);
  });
  test('is set beside earlier measurements of the same complex with the readings alone, and a disagreement is said', () => {
    const earlier = planted('Cr(III)', { chlorido: 3, ammine: 3 }, { id: 'old-name', measurement: 'aq-1998', delta: mixed.parameters.Delta.value! - 400 });
    const again = place(mixed, [...regular, earlier]);
    expect(again.earlier).toMatchObject([{ result: { complex: { id: 'old-name' } }, differences: { Delta: { basis: 'readings', value: 400, distinguishable: true }, beta: { distinguishable: false } } }]);
    expect(again.cautions.map(({ text }) => text)).toEqual([expect.stringContaining('as old-name'), expect.stringContaining('old-name/aq-1998')]);
    expect(JSON.stringify(again.places)).toBe(JSON.stringify(placement.places));
  });
  test('one that lies 10 u off is told so, beside each prediction', () => {
    const far = place(planted('Cr(III)', { ammine: 6 }, { delta: 1.35 * 17400 * 1.25 }));
    expect(prediction(far, 'Delta', 'factors').z).toBeGreaterThan(3);
    expect(codes(far)).toEqual(['ALREADY_THERE', 'FAR_FROM_PREDICTION']);
    expect(far.cautions[1]!.text).toMatch(/^Delta lies \d+\.\d standard uncertainties from what the factors predict: look at the assignment, or there is something new\.$/);
  });
});

describe('what cannot be concluded is said', () => {
  test('an ion with no other record', () => {
    const placement = place(result({ ion: 'Mn(IV)', ligands: { ammine: 6 }, delta: 30000 }));
    expect(codes(placement)).toEqual(['NO_OTHER_RECORD']);
    expect(placement.places[0]).toMatchObject({ members: 0, above: null, below: null, alike: [] });
    expect(placeWords(placement.places[0]!, placement.result).sentence).toBe('Delta: no complex of Mn(IV), octahedral, quartet can be compared.');
    expect(prediction(placement, 'Delta', 'factors')).toMatchObject({ predicted: null, u: null, z: null, reason: 'no factor of Mn(IV), octahedral, quartet: no other complex of it is in the fit' });
    expect(placement.nearest).toMatchObject({ complexes: [], reason: expect.stringContaining('give no g of Mn(IV)') });
    // Its ligands have a series all the same.
    expect(placement.places[2]).toMatchObject({ subject: 'ligands', members: 3 });
  });
  test('a ligand never seen', () => {
    const placement = place(result({ ligands: { thiourea: 6 }, delta: 17000 }));
    expect(codes(placement)).toEqual(['LIGAND_NEVER_SEEN']);
    expect(placement.cautions[0]!.text).toContain('thiourea is in no other complex');
    expect(prediction(placement, 'Delta', 'factors').reason).toContain('no factor of thiourea');
    expect(placement.places[0]!.members).toBe(4);
  });
  test('a single-complex island', () => {
    const placement = place(result({ ion: 'Mn(IV)', ligands: { thiourea: 5, aqua: 1 }, delta: 17000 }), [...regular, result({ ion: 'Mn(IV)', ligands: { thiourea: 6 }, delta: 16000 })]);
    expect(codes(placement)).toEqual(expect.arrayContaining(['SERIES_OF_ONE', 'ISLAND_OF_ITS_OWN']));
    expect(prediction(placement, 'Delta', 'factors').reason).toContain('different islands');
  });
  test('all complexes equal', () => {
    const equal = regular.map((one): SeriesResult => ({ ...one, parameters: { ...one.parameters, Delta: { ...one.parameters.Delta, value: 20000 }, beta: { ...one.parameters.beta, value: 0.75 } } }));
    const placement = place(result({ ligands: { ammine: 3, chlorido: 3 }, delta: 20000, beta: 0.75 }), equal);
    expect(placement.places[0]).toMatchObject({ above: null, below: null, alike: { length: 4 } });
    for (const { z } of placement.predictions) expect(Math.abs(z!)).toBeLessThan(1e-6);
    expect(placeWords(placement.places[0]!, placement.result).sentence).toMatch(/: not distinguishable from .*\.$/);
  });
  test('a series of one', () => {
    const placement = place(planted('Cr(III)', { ammine: 6 }), [planted('Cr(III)', { aqua: 6 })]);
    expect(codes(placement)).toEqual(['SERIES_OF_ONE', 'LIGAND_NEVER_SEEN']);
    expect(placement.cautions.map(({ text }) => text)).toEqual([
      'Only one other complex of Cr(III), octahedral, quartet can be compared: above, below or alike is all that can be said.',
      'ammine is in no other complex of this geometry: nothing predicts what it does.',
    ]);
    expect(placeWords(placement.places[0]!, placement.result).sentence).toBe('Delta, against the one comparable complex of Cr(III), octahedral, quartet: above [Cr(III) (aqua)6].');
    expect(placement.places[0]!.members).toBe(1);
  });
  test('an empty collection', () => {
    const placement = place(planted('Cr(III)', { ammine: 6 }), []);
    expect(codes(placement)).toEqual(['NO_OTHER_RECORD', 'LIGAND_NEVER_SEEN']);
    expect(placement.predictions.every(({ predicted, reason }) => predicted === null && reason !== null)).toBe(true);
  });
  test('a withheld number stands nowhere, and the other one is placed all the same', () => {
    const placement = place(result({ ligands: { ammine: 3, chlorido: 3 }, beta: null }));
    expect(placement.places.map(({ withheld, above, below, alike }) => [withheld, above === null && below === null && alike.length === 0])).toEqual([[false, false], [true, true], [false, true], [true, true]]);
    expect(placeWords(placement.places[1]!, placement.result).sentence).toBe('beta is withheld (these bands do not fix it), so it stands nowhere in the series of Cr(III), octahedral, quartet.');
    expect(prediction(placement, 'beta', 'factors')).toMatchObject({ z: null, predicted: expect.any(Number) });
    expect(placement.nearest.reason).toContain('Delta/g alone');
  });
  test('a geometry that is not fitted', () => {
    const placement = place(result({ geometry: null, ligands: { ammine: 4 }, delta: null, beta: null }));
    expect(placement.predictions).toEqual([]);
    expect(placement.nearest).toMatchObject({ complexes: [], reason: 'the geometry is not fitted' });
  });
  test('no recorded temperature, another phase, a policy of its own', () => {
    expect(codes(place(planted('Cr(III)', { ammine: 3, aqua: 3 }, { temperature: null })))).toEqual(['TEMPERATURE_NOT_RECORDED']);
    const solid = place(planted('Cr(III)', { ammine: 3, aqua: 3 }, { phase: 'crystal' }));
    expect([codes(solid), solid.places[0]!.widened, solid.places[0]!.members]).toEqual([['PHASES_MIXED'], 'phase', 4]);
    const own = place(planted('Cr(III)', { ammine: 3, aqua: 3 }, { policy: 'own-1' }));
    expect([codes(own), own.places[0]!.members, own.places[0]!.above!.difference.basis]).toEqual([['OTHER_POLICY'], 4, 'total']);
  });
  test('an id that another complex has', () => {
    expect(codes(place(planted('Cr(III)', { ammine: 3, aqua: 3 }, { id: 'criii--aqua6' })))).toEqual(['ID_TAKEN']);
  });
});

describe('placements of the collection itself', () => {
  const fit = fitFactors(regular, { parameter: 'Delta', geometry: 'octahedral', policy: testPolicy, aqua: 'aqua' });
  test('every measurement is predicted without its complex: as a new one would be', () => {
    const repeat = { ...regular[2]!, measurement: 'again' };
    const placements = memberPlacements([...regular, repeat], fit);
    expect(placements).toHaveLength(13);
    for (const { result: one, placed } of placements) {
      const asNew = prediction(place(one), 'Delta', 'factors');
      const factors = placed.find(({ method }) => method === 'factors')!;
      // A new fit of eleven weighs them a little otherwise: a tenth of u at most.
      expect(Math.abs(factors.predicted! - asNew.predicted!) / asNew.u!, one.complex.id).toBeLessThan(0.1);
      expect(Math.abs(factors.z! - asNew.z!), one.complex.id).toBeLessThan(0.3);
    }
  });
  test('one that is not in the fit is predicted by the whole of it', () => {
    const cold = planted('Cr(III)', { ammine: 3, chlorido: 3 }, { temperature: 20 });
    const [only] = memberPlacements([cold], fit);
    expect(only!.placed.map(({ method, predicted }) => [method, predicted === null])).toEqual([['average environment', false], ['factors', false]]);
  });
});

test('the rule of average environment weighs by donor atoms and names the parents that are missing', () => {
  const parents = parentsOf(regular);
  const scatter = { value: 0.02, share: 1, standing: 'fitted', spare: 20 } as const;
  const one = averageEnvironment(identity({ ligands: { ammine: 4, chlorido: 2 } }), 'beta', parents, scatter);
  expect(one).toMatchObject({ predicted: expect.closeTo(1 - 0.21 * ((4 * 1.4 + 2 * 2) / 6), 9), u: expect.closeTo(Math.hypot((4 * 0.03) / 6, (2 * 0.03) / 6, 0.02), 9) });
  expect(averageEnvironment(identity({ ligands: { ammine: 4, en: 1, urea: 1 } }), 'Delta', parents, scatter)).toEqual({ reason: 'no complex of Cr(III) with en and urea alone is measured' });
  expect(averageEnvironment(identity({ ligands: { ammine: 6 } }), 'Delta', parents, scatter)).toEqual({ reason: 'it has one kind of ligand: there is nothing to average' });
});
