import { expect, test } from 'vitest';
import { type Donor, type Isomer, OPPOSITE, octahedralArrangement } from '../../../site/data/arrangement.ts';

/** "A A A B B B" single ligands; "AA AA B C" with chelates in one word, one letter a donor. */
const donors = (text: string): readonly Donor[] => text.split(' ').flatMap((ligand, number) => [...ligand].map((kind) => ({ kind, ligand: number })));
const arranged = (text: string, isomer: Isomer) => octahedralArrangement(donors(text), isomer);
/** Kinds of the donors that stand opposite each other, in order. */
const axes = (text: string, isomer: Isomer) => {
  const all = donors(text);
  const corners = arranged(text, isomer)!;
  return [0, 2, 3].map((corner) => [corner, OPPOSITE[corner]!].map((one) => all[corners[one]!]!.kind).sort().join('')).sort();
};

test('cis and trans, fac and mer put like donors where the words say', () => {
  expect(axes('A A A A B B', 'trans')).toEqual(['AA', 'AA', 'BB']);
  expect(axes('A A A A B B', 'cis')).toEqual(['AA', 'AB', 'AB']);
  expect(axes('A A A B B B', 'fac')).toEqual(['AB', 'AB', 'AB']);
  expect(axes('A A A B B B', 'mer')).toEqual(['AA', 'AB', 'BB']);
  expect(axes('NN NN B B', 'trans')).toEqual(['BB', 'NN', 'NN']);
  expect(axes('NN NN B B', 'cis')).toEqual(['BN', 'BN', 'NN']);
  expect(axes('NN NN B C', 'trans')).toEqual(['BC', 'NN', 'NN']);
  expect(axes('A A A A B C', 'trans')).toEqual(['AA', 'AA', 'BC']);
  expect(axes('NO NO NO', 'fac')).toEqual(['NO', 'NO', 'NO']);
  expect(axes('NO NO NO', 'mer')).toEqual(['NN', 'NO', 'OO']);
});

test('one arrangement alone needs no word', () => {
  for (const text of ['A A A A A A', 'A A A A A B', 'NN NN NN', 'NN A A A A']) expect(arranged(text, 'none')).not.toBeNull();
});

test('nothing is drawn where the record leaves more than one arrangement open, or the word means nothing', () => {
  for (const text of ['A A A A B B', 'A A A B B B', 'NN NN B B', 'NO NO NO', 'A A B B C C']) expect(arranged(text, 'none')).toBeNull();
  expect(arranged('NO NO B B', 'cis')).toBeNull();
  expect(arranged('A A A A A A', 'trans')).toBeNull();
  expect(arranged('A A A A B B', 'fac')).toBeNull();
  expect(arranged('A A A A', 'none')).toBeNull();
});

test('each donor has one corner, and neighbours of one ligand are never opposite', () => {
  for (const [text, isomer] of [['NN NN NN', 'none'], ['NN NN B B', 'cis'], ['NN NN B B', 'trans'], ['NO NO NO', 'mer'], ['NNN A A A', 'fac'], ['NNN A A A', 'mer'], ['abcdef', 'none']] as const) {
    const corners = arranged(text, isomer);
    if (corners === null) {
      expect(text).toBe('abcdef');
      continue;
    }
    expect([...corners].sort()).toEqual([0, 1, 2, 3, 4, 5]);
    const all = donors(text);
    for (let donor = 1; donor < 6; donor++) if (all[donor]!.ligand === all[donor - 1]!.ligand) expect(OPPOSITE[corners.indexOf(donor)]).not.toBe(corners.indexOf(donor - 1));
  }
});
