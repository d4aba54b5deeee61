import { describe, expect, test } from 'vitest';
import { difference, differenceBasis, indistinguishableGroups, ionSubject, ligandSubject, leftOutWords, measurementId, notDistinguishableSentence, selectComparable, usualSeries, whyUnlike } from '#engine';
import type { Frame } from '#engine';
import { identity, result, testFloor, testPolicy } from './sample.ts';
import type { Invented } from './sample.ts';

const frame: Frame = { policy: testPolicy, ion: 'Cr(III)', geometry: 'octahedral', multiplicity: 4, ligandSet: null, phase: 'solution', temperature: { near: 295, orNotRecorded: false } };
const one = (changes: Partial<Invented> = {}) => result({ ligands: { ammine: 6 }, ...changes });

describe('like with like', () => {
  test('a result like the frame stands in it', () => {
    expect(whyUnlike(one(), 'Delta', frame)).toBeNull();
    for (const phase of ['crystal', 'glass', 'film', 'solid'] as const) expect(whyUnlike(one({ phase }), 'Delta', { ...frame, phase: 'solid' })).toBeNull();
    for (const temperature of [245, 345]) expect(whyUnlike(one({ temperature }), 'Delta', frame)).toBeNull();
  });
  test.each<readonly [string, Partial<Invented>, string]>([
    ['another ion', { ion: 'V(II)' }, 'another ion: V(II)'],
    ['a geometry that is not fitted', { geometry: null }, 'square planar complexes are stored and drawn, not fitted'],
    ['another geometry', { geometry: 'tetrahedral' }, 'another geometry: tetrahedral'],
    ['another spin state', { multiplicity: 2 }, 'another spin state: doublet'],
    ['a spin state nobody declared', { multiplicity: null }, 'the spin state is not declared'],
    ['another policy', { policy: 'house-2' }, 'fitted under another policy: house-2'],
    ['a withheld number', { delta: null }, 'Delta is withheld: these bands do not fix it'],
    ['an apparent Delta', { cautions: ['JAHN_TELLER_ENVELOPE'] }, 'one band stands for a transition that a Jahn–Teller distortion splits'],
    ['two metals', { cautions: ['MORE_THAN_ONE_METAL'] }, 'more than one metal centre'],
    ['another phase class', { phase: 'crystal' }, 'another phase: crystal'],
    ['50.1 K away', { temperature: 244.9 }, 'measured at 244.9 K, more than 50 K from 295 K'],
    ['no temperature', { temperature: null }, 'the temperature is not recorded'],
  ])('%s is kept out, with the reason', (_, changes, reason) => {
    expect(whyUnlike(one(changes), 'Delta', frame)?.reason).toBe(reason);
  });
  test('a frame may be open in any of these', () => {
    const open: Frame = { policy: testPolicy, ion: null, geometry: null, multiplicity: null, ligandSet: null, phase: null, temperature: { near: 295, orNotRecorded: true } };
    for (const changes of [{ ion: 'V(II)' }, { geometry: 'tetrahedral' as const }, { multiplicity: 2 }, { phase: 'film' as const }, { temperature: null }]) expect(whyUnlike(one(changes), 'Delta', open)).toBeNull();
    expect(whyUnlike(one({ ligands: { aqua: 6 } }), 'Delta', { ...open, ligandSet: 'ammine 6x1' })?.kind).toBe('ligands');
  });
  test('one result stands for a complex, the best determined, and the members ascend', () => {
    const [worse, better, other] = [one({ measurement: 'a', uDeltaTotal: 200 }), one({ measurement: 'b', uDeltaTotal: 150 }), one({ ligands: { aqua: 6 }, delta: 17400 })];
    const { members, leftOut } = selectComparable([worse, better, other], 'Delta', frame);
    expect(members).toEqual([other, better]);
    expect(leftOut).toEqual([{ result: worse, kind: 'repeat', reason: `${measurementId(better)} stands for the complex: its total uncertainty is smaller` }]);
    expect(selectComparable([other, better, worse], 'Delta', frame).members).toEqual([other, better]);
  });
  test('isomers are complexes of their own, whatever their ids', () => {
    const cis = one({ ligands: { en: 2, chlorido: 2 }, isomer: 'cis' });
    const trans = one({ ligands: { chlorido: 2, en: 2 }, isomer: 'trans' });
    expect(selectComparable([cis, trans], 'Delta', frame).members).toHaveLength(2);
    expect(selectComparable([cis, one({ id: 'same-thing', ligands: { chlorido: 2, en: 2 }, isomer: 'cis' })], 'Delta', frame).members).toHaveLength(1);
  });
  test('the usual series takes the conditions under which most can be compared', () => {
    const subject = ionSubject(identity({ ligands: { ammine: 6 } }), testPolicy);
    const solid = ['aqua', 'ammine', 'en'].map((ligand) => one({ ligands: { [ligand]: 6 }, phase: 'solid' }));
    const solution = ['aqua', 'ammine'].map((ligand) => one({ ligands: { [ligand]: 6 } }));
    expect(usualSeries([...solution, ...solid], 'Delta', subject).members).toEqual(expect.arrayContaining(solid));
    expect(usualSeries([...solution, ...solid.slice(1)], 'Delta', subject).frame.phase).toBe('solution');
    const unrecorded = ['aqua', 'ammine', 'en', 'urea'].map((ligand) => one({ ligands: { [ligand]: 6 }, temperature: null }));
    expect(usualSeries([...solution, ...unrecorded], 'Delta', subject).members).toHaveLength(4);
    const cold = ['aqua', 'ammine', 'en'].map((ligand) => one({ ligands: { [ligand]: 6 }, phase: 'crystal', temperature: 80 }));
    expect(usualSeries(cold, 'Delta', subject)).toMatchObject({ members: { length: 3 }, frame: { temperature: { near: 77 } } });
    expect(usualSeries([], 'Delta', subject).members).toEqual([]);
  });
  test('the series of a ligand set holds every ion and spin state of the geometry', () => {
    const subject = ligandSubject(identity({ ligands: { ammine: 6 } }), testPolicy);
    const members = [one(), one({ ion: 'Co(III)', multiplicity: 1 }), one({ ion: 'Ni(II)', multiplicity: 3 })];
    expect(usualSeries([...members, one({ ligands: { aqua: 6 } })], 'Delta', subject).members).toHaveLength(3);
  });
});

describe('the difference of two results', () => {
  const [a, b] = [one({ ligands: { ammine: 6 }, delta: 21550, uDelta: 60, uDeltaTotal: 160 }), one({ ligands: { en: 6 }, delta: 21850, uDelta: 80, uDeltaTotal: 170 })];
  test('like results carry the readings alone and the differential floor', () => {
    expect(difference(b, a, 'Delta', testFloor)).toEqual({ value: 300, u: Math.hypot(60, 80, 50), basis: 'readings and differential floor', z: 300 / Math.hypot(60, 80, 50), distinguishable: true });
    expect(difference(b, a, 'beta', testFloor)!.u).toBeCloseTo(Math.hypot(0.01, 0.01, 0.015 * 0.75), 12);
  });
  test('repeats of one complex carry the readings alone', () => {
    expect(difference(a, one({ measurement: 'again', delta: 21650, uDelta: 80 }), 'Delta', testFloor)).toMatchObject({ basis: 'readings', u: 100, z: -1, distinguishable: false });
  });
  test.each<readonly [string, Partial<Invented>]>([
    ['other transitions', { transitions: ['a4T2g'] }], ['C standing otherwise', { cFitted: true }], ['another ion', { ion: 'V(II)' }], ['another spin state', { multiplicity: 2 }], ['another policy', { policy: 'house-2' }],
  ])('%s: the total uncertainty', (_, changes) => {
    const other = one({ ligands: { en: 6 }, delta: 21850, uDelta: 80, uDeltaTotal: 170, ...changes });
    expect(differenceBasis(a, other)).toBe('total');
    expect(difference(a, other, 'Delta', testFloor)!.u).toBeCloseTo(Math.hypot(160, 170), 9);
  });
  test('2 u is not enough to tell two results apart, and anything above is', () => {
    const at = (delta: number) => difference(one({ ion: 'V(II)', delta }), one({ ligands: { aqua: 6 }, delta: 10000, uDeltaTotal: 120 }), 'Delta', testFloor)!;
    expect([at(10400).distinguishable, at(10401).distinguishable, at(9599).distinguishable]).toEqual([false, true, true]);
  });
  test('it is antisymmetric, and null where a number is withheld', () => {
    expect(difference(a, b, 'Delta', testFloor)!.value).toBe(-difference(b, a, 'Delta', testFloor)!.value);
    expect(difference(a, one({ ligands: { aqua: 6 }, delta: null }), 'Delta', testFloor)).toBeNull();
  });
});

describe('groups that cannot be told apart', () => {
  const series = (deltas: readonly number[], u = 30) => ({ parameter: 'Delta' as const, members: deltas.map((delta, i) => one({ id: `c-${i}`, ligands: { aqua: 6 - i, ammine: i + 1 }, delta, uDelta: u })) });
  // u of a difference is hypot(30, 30, 50), so that 131 cm-1 can just not be told apart.
  test('neighbours are bracketed where no two of them differ, and brackets may overlap', () => {
    expect(indistinguishableGroups(series([10000, 10100, 10200, 11000]), testFloor)).toEqual([{ first: 0, last: 1 }, { first: 1, last: 2 }]);
    expect(indistinguishableGroups(series([10000, 10050, 10100, 11000, 11010]), testFloor)).toEqual([{ first: 0, last: 2 }, { first: 3, last: 4 }]);
  });
  test('all equal is one group, all apart is none, one or none is none', () => {
    expect(indistinguishableGroups(series([10000, 10000, 10000, 10000]), testFloor)).toEqual([{ first: 0, last: 3 }]);
    expect(indistinguishableGroups(series([10000, 12000, 14000]), testFloor)).toEqual([]);
    expect(indistinguishableGroups(series([10000]), testFloor)).toEqual([]);
    expect(indistinguishableGroups(series([]), testFloor)).toEqual([]);
  });
  test('in any series every group holds no two that differ, none can be made longer, and none lies within another', () => {
    for (let seed = 0; seed < 50; seed++) {
      const { members } = series(Array.from({ length: 12 }, (_, i) => 10000 + ((seed * 37 + i * i * 53) % 900)).sort((x, y) => x - y), 10 + (seed % 60));
      const alike = (i: number, j: number) => !difference(members[i]!, members[j]!, 'Delta', testFloor)!.distinguishable;
      const whole = (first: number, last: number) => members.slice(first, last + 1).every((_, i) => members.slice(first, last + 1).every((__, j) => alike(first + i, first + j)));
      const groups = indistinguishableGroups({ parameter: 'Delta', members }, testFloor);
      const expected = members.flatMap((_, first) => members.flatMap((__, last) => (last > first && whole(first, last) && !(first > 0 && whole(first - 1, last)) && !(last < 11 && whole(first, last + 1)) ? [{ first, last }] : [])));
      expect(groups).toEqual(expected);
    }
  });
});

test('the words name what is alike and what was left out', () => {
  expect(notDistinguishableSentence('A', [])).toBe('A is distinguishable from every other.');
  expect(notDistinguishableSentence('A', ['B', 'C'])).toBe('A is not distinguishable from B and C.');
  expect(notDistinguishableSentence('A', ['B', 'C', 'D', 'E', 'F'])).toBe('A is not distinguishable from B, C, D and 2 more.');
  expect([leftOutWords('phase', 1), leftOutWords('phase', 6)]).toEqual(['1 in another phase', '6 in other phases']);
});
