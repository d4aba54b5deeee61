import { describe, expect, test } from 'vitest';
import { factorMap, fitFactors, predictFromFactors } from '#engine';
import type { FactorFit, SeriesParameter, SeriesResult } from '#engine';
import { randomFrom } from '../../../scripts/generate/random.ts';
import { identity, result, testPolicy } from './sample.ts';
import type { Invented } from './sample.ts';

const fit = (results: readonly SeriesResult[], parameter: SeriesParameter = 'Delta', aqua: string | null = 'aqua'): FactorFit =>
  fitFactors(results, { parameter, geometry: 'octahedral', policy: testPolicy, aqua });
const factor = (one: FactorFit, name: string) => {
  const found = one.factors.find((row) => row.name === name);
  if (found === undefined) throw new Error(`no factor ${name}`);
  return found;
};
const quartet = (ion: string) => `${ion} octahedral quartet`;

const f: Readonly<Record<string, number>> = { aqua: 1, chlorido: 0.78, ammine: 1.25, cyanido: 1.7, fluorido: 0.9, pyridine: 1.22 };
const h: Readonly<Record<string, number>> = { aqua: 1, chlorido: 2, ammine: 1.4, cyanido: 2.1, fluorido: 0.8, pyridine: 1.3 };
const g: Readonly<Record<string, number>> = { 'Cr(III)': 17400, 'V(II)': 12000, 'Mo(III)': 24600, 'Mn(IV)': 24000 };
const k: Readonly<Record<string, number>> = { 'Cr(III)': 0.21, 'V(II)': 0.08, 'Mo(III)': 0.15, 'Mn(IV)': 0.5 };

const average = (values: Readonly<Record<string, number>>, ligands: Readonly<Record<string, number>>): number =>
  Object.entries(ligands).reduce((sum, [ligand, count]) => sum + count * values[ligand]!, 0) / Object.values(ligands).reduce((a, b) => a + b);

/** A planted complex: Delta and beta from the factors, with noise of the rule and of the reading where asked for. */
function planted(ion: string, ligands: Readonly<Record<string, number>>, noise: { readonly delta: number; readonly beta: number } = { delta: 0, beta: 0 }, more: Partial<Invented> = {}): SeriesResult {
  return result({
    ion, ligands, delta: g[ion]! * average(f, ligands) * Math.exp(noise.delta), beta: 1 - k[ion]! * average(h, ligands) + noise.beta, ...more,
  });
}

/** Homoleptic complexes of every ion and ligand and mixed ones with water. */
const everyLigandSet = [...Object.keys(f).map((ligand) => ({ [ligand]: 6 })), ...Object.keys(f).filter((one) => one !== 'aqua').flatMap((ligand) => [{ [ligand]: 3, aqua: 3 }, { [ligand]: 2, aqua: 4 }])];
const pairs = Object.keys(g).flatMap((ion) => everyLigandSet.map((ligands) => ({ ion, ligands })));

describe('planted factors', () => {
  test('come back to 0.5 % from a collection without noise, and the scatter is nothing', () => {
    const delta = fit(pairs.map(({ ion, ligands }) => planted(ion, ligands)));
    const beta = fit(pairs.map(({ ion, ligands }) => planted(ion, ligands)), 'beta');
    for (const [name, value] of Object.entries(f)) expect(Math.abs(factor(delta, name).value! / value - 1), name).toBeLessThan(1e-6);
    for (const [name, value] of Object.entries(g)) expect(Math.abs(factor(delta, quartet(name)).value! / value - 1), name).toBeLessThan(1e-6);
    for (const [name, value] of Object.entries(h)) expect(Math.abs(factor(beta, name).value! / value - 1), name).toBeLessThan(1e-6);
    for (const [name, value] of Object.entries(k)) expect(Math.abs(factor(beta, quartet(name)).value! / value - 1), name).toBeLessThan(1e-6);
    expect([delta.scatter.value, beta.scatter.value]).toEqual([0, 0]);
  });
  test.each([1e-3, 1, 1e3])('do not hang on the unit: a collection scaled by %s has g scaled and f as it was', (scale) => {
    const one = fit(pairs.map(({ ion, ligands }) => planted(ion, ligands, undefined, { delta: scale * g[ion]! * average(f, ligands), uDeltaTotal: scale * 160 })));
    expect(factor(one, quartet('Cr(III)')).value! / scale).toBeCloseTo(17400, 4);
    expect(factor(one, 'ammine').value).toBeCloseTo(1.25, 8);
  });
  test('do not hang on the order of the records', () => {
    const results = pairs.map(({ ion, ligands }) => planted(ion, ligands, { delta: Math.sin(ligands[Object.keys(ligands)[0]!]! + ion.length), beta: 0 }));
    expect(JSON.stringify(fit([...results].reverse()).factors)).toBe(JSON.stringify(fit(results).factors));
  });
});

describe('planted factors with noise', () => {
  const noise = { delta: 0.025, beta: 0.02 };
  const noisy = (seed: number): SeriesResult[] => {
    const random = randomFrom(seed, 'factors');
    return pairs.map(({ ion, ligands }) => planted(ion, ligands, { delta: random.normal(0, noise.delta), beta: random.normal(0, noise.beta) }, { uDeltaTotal: 1, uBetaTotal: 1e-4 }));
  };
  // 60 collections of 9 free f (h) and 4 g (k); 95.4 % of normal deviates lie within 2 u, and 900 draws know that share to about 1 %.
  test.each(['Delta', 'beta'] as const)('%s: intervals of 2 u hold the planted values in about 95 of 100 cases', (parameter) => {
    const truth = parameter === 'Delta' ? { ...f, ...Object.fromEntries(Object.entries(g).map(([ion, value]) => [quartet(ion), value])) }
      : { ...h, ...Object.fromEntries(Object.entries(k).map(([ion, value]) => [quartet(ion), value])) };
    let [inside, all] = [0, 0];
    const scatter: number[] = [];
    for (let seed = 1; seed <= 100; seed++) {
      const one = fit(noisy(seed), parameter);
      scatter.push(one.scatter.value);
      for (const { name, value, u, gauge } of one.factors) {
        if (gauge) continue;
        all += 1;
        if (Math.abs(value! - truth[name]!) <= 2 * u!) inside += 1;
      }
    }
    expect(all).toBe(900);
    expect(inside / all).toBeGreaterThan(0.92);
    expect(inside / all).toBeLessThan(0.98);
    const mean = scatter.reduce((a, b) => a + b) / scatter.length;
    expect(mean / (parameter === 'Delta' ? noise.delta : noise.beta)).toBeGreaterThan(0.95);
    expect(mean / (parameter === 'Delta' ? noise.delta : noise.beta)).toBeLessThan(1.05);
  });
  test('a complex is predicted without its own data: the algebra gives what a fit without it gives', () => {
    const results = noisy(7);
    const whole = fit(results);
    for (const place of [0, 7, 20, 41, 63]) {
      const one = whole.complexes[place]!;
      const without = predictFromFactors(fit(results.filter((other) => other !== one.result)), one.result.complex);
      if (!('predicted' in without)) throw new Error(without.reason);
      // Deletion is exact to first order in mixed complexes, and the weights of the others hardly move.
      expect(Math.abs(one.leftOut!.predicted / without.predicted - 1)).toBeLessThan(2e-4);
      expect(Math.abs(one.leftOut!.u / without.u - 1)).toBeLessThan(0.02);
    }
  });
  test('studentised residuals scatter like normal deviates', () => {
    const all = Array.from({ length: 20 }, (_, seed) => fit(noisy(seed + 100)).complexes.map((one) => one.leftOut!.z)).flat();
    const square = all.reduce((sum, z) => sum + z * z, 0) / all.length;
    expect(all.length).toBe(20 * pairs.length);
    expect(square).toBeGreaterThan(0.9);
    expect(square).toBeLessThan(1.1);
  });
  test('one outlier of 10 u is put up for review, alone, and hardly moves the others', () => {
    const results = noisy(3).map((one, i) => (i === 30 ? { ...one, parameters: { ...one.parameters, Delta: { ...one.parameters.Delta, value: one.parameters.Delta.value! * Math.exp(10 * noise.delta) } } } : one));
    const { complexes } = fit(results);
    const far = complexes.filter((one) => Math.abs(one.leftOut!.z) > 3);
    expect(far.map((one) => one.result)).toEqual([results[30]]);
    expect(far[0]!.leftOut!.z).toBeGreaterThan(6);
  });
});

describe('islands', () => {
  const first = [planted('Cr(III)', { aqua: 6 }), planted('Cr(III)', { ammine: 6 }), planted('V(II)', { aqua: 6 }), planted('V(II)', { ammine: 6 })];
  const second = [planted('Mo(III)', { chlorido: 6 }), planted('Mn(IV)', { chlorido: 6 }), planted('Mn(IV)', { fluorido: 6 })];
  test('are fitted apart, each with its own ligand at 1: water where it is, else the ligand in most complexes', () => {
    const one = fit([...first, ...second]);
    expect(one.islands.map(({ ions, gauge, gaugeIsAqua, complexes, spare }) => ({ ions, gauge, gaugeIsAqua, complexes, spare }))).toEqual([
      { ions: [quartet('Cr(III)'), quartet('V(II)')], gauge: 'aqua', gaugeIsAqua: true, complexes: 4, spare: 1 },
      { ions: [quartet('Mn(IV)'), quartet('Mo(III)')], gauge: 'chlorido', gaugeIsAqua: false, complexes: 3, spare: 0 },
    ]);
    expect(factor(one, 'fluorido').value).toBeCloseTo(0.9 / 0.78, 8);
    expect(factor(one, 'chlorido')).toMatchObject({ value: 1, u: 0, gauge: true });
    expect(factor(one, quartet('Mo(III)')).value).toBeCloseTo(24600 * 0.78, 4);
  });
  test('are never joined: nothing is predicted across them, and one complex that links them joins them', () => {
    const across = identity({ ion: 'Mo(III)', ligands: { ammine: 6 } });
    expect(predictFromFactors(fit([...first, ...second]), across)).toEqual({ reason: expect.stringContaining('different islands') });
    const joined = fit([...first, ...second, planted('Cr(III)', { fluorido: 6 })]);
    expect(joined.islands).toHaveLength(1);
    expect(predictFromFactors(joined, across)).toMatchObject({ predicted: expect.closeTo(24600 * 1.25, 3) });
  });
  test('do not hang on one another: the values of one are the same to the last digits without the other', () => {
    const [both, alone] = [fit([...first, ...second]), fit(first)];
    for (const { name, value } of alone.factors) expect(factor(both, name).value! / value!).toBeCloseTo(1, 12);
  });
  test('a spin state of its own makes an ion of its own', () => {
    const one = fit([result({ ion: 'Fe(II)', multiplicity: 5, ligands: { aqua: 6 } }), result({ ion: 'Fe(II)', multiplicity: 1, ligands: { cyanido: 6 } })]);
    expect(one.islands.map(({ ions }) => ions)).toEqual([['Fe(II) octahedral quintet'], ['Fe(II) octahedral singlet']]);
  });
});

describe('what the complexes leave open', () => {
  test('one ion with one mixed complex is connected and still undetermined: the combination that is fixed is named', () => {
    const one = fit([planted('Cr(III)', { ammine: 3, chlorido: 3 })], 'Delta', null);
    const [island] = one.islands;
    expect([island!.gauge, island!.rank, island!.spare]).toEqual(['ammine', 1, 0]);
    for (const name of [quartet('Cr(III)'), 'chlorido'])
      expect(factor(one, name)).toMatchObject({ value: null, u: null, reason: 'not fixed alone: only g(Cr(III) octahedral quartet) × (3 f(ammine) + 3 f(chlorido))/6 is fixed' });
    expect(predictFromFactors(one, identity({ ion: 'Cr(III)', ligands: { ammine: 6 } }))).toEqual({ reason: expect.stringContaining('do not fix this product') });
    // What is fixed is predicted: the same complex, under another id.
    expect(predictFromFactors(one, identity({ ion: 'Cr(III)', ligands: { chlorido: 3, ammine: 3 } }))).toMatchObject({ predicted: expect.closeTo(17400 * 1.015, 3) });
  });
  test('within a large island only the open factors are withheld', () => {
    const one = fit([...['aqua', 'ammine', 'fluorido'].flatMap((ligand) => ['Cr(III)', 'V(II)'].map((ion) => planted(ion, { [ligand]: 6 }))), planted('Mn(IV)', { aqua: 3, cyanido: 3 })]);
    expect(one.factors.filter(({ value }) => value === null).map(({ name }) => name)).toEqual([quartet('Mn(IV)'), 'cyanido']);
    expect(factor(one, 'cyanido').reason).toContain('g(Mn(IV) octahedral quartet) × (3 f(aqua) + 3 f(cyanido))/6');
    expect(factor(one, 'ammine').value).toBeCloseTo(1.25, 8);
  });
  test('a second mixed complex of other proportions fixes them', () => {
    const one = fit([planted('Cr(III)', { ammine: 3, chlorido: 3 }), planted('Cr(III)', { ammine: 5, chlorido: 1 })], 'Delta', null);
    expect(factor(one, 'chlorido').value).toBeCloseTo(0.78 / 1.25, 6);
  });
  test('for k and h the same', () => {
    const one = fit([planted('Cr(III)', { ammine: 3, chlorido: 3 })], 'beta', null);
    expect(factor(one, 'chlorido')).toMatchObject({ value: null, reason: expect.stringContaining('k(Cr(III) octahedral quartet) × (3 h(ammine) + 3 h(chlorido))/6') });
  });
  test('a factor from one complex says no test, and so does one whose complexes are all needed', () => {
    const one = fit([planted('Cr(III)', { aqua: 6 }), planted('Cr(III)', { cyanido: 6 }), planted('V(II)', { cyanido: 6 })]);
    expect(factor(one, quartet('V(II)'))).toMatchObject({ complexes: 1, tested: false, reason: 'from one complex: no test' });
    expect(factor(one, 'cyanido')).toMatchObject({ complexes: 2, tested: false, reason: 'no spare complex: no test' });
    expect(one.complexes.map(({ leftOut, leverage }) => [leftOut, Math.round(1e9 * leverage) / 1e9])).toEqual([[null, 1], [null, 1], [null, 1]]);
    expect(one.scatter).toMatchObject({ standing: 'assumed', spare: 0 });
  });
});

describe('awkward collections', () => {
  test('a beta at or above 1 is a datum like any other', () => {
    const some = pairs.map(({ ion, ligands }, i) => planted(ion, ligands, undefined, i === 0 ? { beta: 1.04 } : {}));
    const one = fit(some, 'beta');
    expect(one.complexes).toHaveLength(pairs.length);
    for (const { value } of one.factors) expect(Number.isFinite(value)).toBe(true);
    expect(Math.abs(factor(one, 'ammine').value! / 1.4 - 1)).toBeLessThan(0.1);
    const above = fit(['aqua', 'ammine'].flatMap((ligand) => ['Cr(III)', 'V(II)'].map((ion) => planted(ion, { [ligand]: 6 }, undefined, { beta: 1.1 }))), 'beta');
    expect(factor(above, quartet('Cr(III)')).value).toBeCloseTo(-0.1, 8);
  });
  test('a beta that the factors put at 0 or below is refused as a prediction, with the reason; the datum itself stays', () => {
    // k = 0.7 and h = 0.8/0.5: 1 - k h = -0.12.
    const far = fit([['Cr(III)', 'aqua', 0.5], ['Cr(III)', 'cyanido', 0.2], ['V(II)', 'aqua', 0.3]].map(([ion, ligand, beta]) => result({ ion: ion as string, ligands: { [ligand as string]: 6 }, beta: beta as number, uBetaTotal: 0.005 })), 'beta');
    expect(factor(far, quartet('V(II)')).value! * factor(far, 'cyanido').value!).toBeCloseTo(1.12, 6);
    const reason = 'the factors put beta at 0 or below, which no complex can have: carried so far, the rule does not hold';
    expect(predictFromFactors(far, identity({ ion: 'V(II)', ligands: { cyanido: 6 } }))).toEqual({ reason });
    // Half way it is above 0 and is predicted.
    expect(predictFromFactors(far, identity({ ion: 'V(II)', ligands: { aqua: 3, cyanido: 3 } }))).toMatchObject({ predicted: expect.closeTo(1 - 0.7 * 1.3, 6) });
    const empty = factorMap(far).rows.flat().filter(({ found }) => found === null);
    expect(empty.map(({ ion, ligand, predicted }) => [ion, ligand, predicted])).toEqual([[quartet('V(II)'), 'cyanido', { reason }]]);
  });
  test('all complexes equal: every f is 1, nothing scatters and nothing is far', () => {
    const one = fit(Object.keys(f).flatMap((ligand) => Object.keys(g).map((ion) => planted(ion, { [ligand]: 6 }, undefined, { delta: 20000 }))));
    for (const { kind, value } of one.factors) expect(value).toBeCloseTo(kind === 'ion' ? 20000 : 1, 6);
    for (const { leftOut } of one.complexes) expect(Math.abs(leftOut!.z)).toBeLessThan(1e-6);
    const flat = fit(Object.keys(f).flatMap((ligand) => Object.keys(g).map((ion) => planted(ion, { [ligand]: 6 }, undefined, { beta: 1 }))), 'beta');
    expect(factor(flat, quartet('Cr(III)')).value).toBeCloseTo(0, 10);
    expect(factor(flat, 'ammine')).toMatchObject({ value: null, u: null });
  });
  test('a factor that hardly anything holds is withheld, not printed: k close to nothing leaves h loose', () => {
    const one = fit([...['aqua', 'ammine'].map((ligand) => result({ ligands: { [ligand]: 6 }, beta: 0.98, uBetaTotal: 0.05 })), result({ ligands: { fluorido: 6 }, beta: 1.03, uBetaTotal: 0.05 })], 'beta');
    expect(factor(one, 'fluorido')).toMatchObject({ value: null, u: null, reason: expect.stringContaining('hardly fix it') });
    expect(factor(one, quartet('Cr(III)')).value).toBeCloseTo(0.02, 6);
  });
  test('where the best fit lies at no finite factor the answer comes all the same, and nothing that drifts is printed', () => {
    // beta falls below 1 with one ligand and above it with the other on one ion, and the other way round on the next: no k and h do that.
    const one = fit([['Cr(III)', 'aqua', 0.7], ['Cr(III)', 'ammine', 1.2], ['V(II)', 'aqua', 1.2], ['V(II)', 'ammine', 0.7], ['Mo(III)', 'ammine', 0.9]]
      .map(([ion, ligand, beta]) => result({ ion: ion as string, ligands: { [ligand as string]: 6 }, beta: beta as number })), 'beta');
    for (const { value, u } of one.factors) expect(value === null || (Number.isFinite(value) && Number.isFinite(u!))).toBe(true);
    expect(one.factors.filter(({ value }) => value !== null && Math.abs(value) > 20)).toEqual([]);
  });
  test('no complex at all gives an empty fit', () => {
    expect(fit([])).toMatchObject({ factors: [], islands: [], complexes: [], leftOut: [] });
    expect(predictFromFactors(fit([]), identity({ ligands: { aqua: 6 } }))).toEqual({ reason: expect.stringContaining('no other complex of it is in the fit') });
  });
  test('what stays out is named with its reason', () => {
    const one = fit([
      planted('Cr(III)', { aqua: 6 }), planted('Cr(III)', { ammine: 6 }, undefined, { delta: null }), planted('Cr(III)', { cyanido: 6 }, undefined, { policy: 'other-1' }),
      planted('Cr(III)', { fluorido: 6 }, undefined, { cautions: ['JAHN_TELLER_ENVELOPE'] }), planted('V(II)', { aqua: 6 }, undefined, { cautions: ['B_ASSUMED'] }),
      planted('Mo(III)', { aqua: 6 }, undefined, { temperature: 80 }), planted('Mn(IV)', { aqua: 4 }, undefined, { geometry: 'tetrahedral' }),
      planted('Mn(IV)', { fluorido: 6 }, undefined, { multiplicity: null }), planted('Cr(III)', { aqua: 6 }, undefined, { measurement: 'worse', uDeltaTotal: 500 }),
    ]);
    expect(one.complexes.map(({ result: { complex } }) => complex.id)).toEqual(['criii--aqua6']);
    expect(one.leftOut.map(({ reason }) => reason).sort()).toEqual([
      'Delta is withheld: these bands do not fix it', 'Delta rests on an assumed B', 'another geometry: tetrahedral', 'criii--aqua6/aq stands for the complex: its total uncertainty is smaller',
      'fitted under another policy: other-1', 'measured at 80 K, more than 50 K from 295 K', 'one band stands for a transition that a Jahn–Teller distortion splits', 'the spin state is not declared',
    ]);
  });
});
