import { describe, expect, test } from 'vitest';
import { aboveCeiling, verdictSentence } from '../../../engine/words/verdict.ts';
import type { VerdictFacts } from '../../../engine/words/verdict.ts';

const facts = (given: Partial<VerdictFacts> & Pick<VerdictFacts, 'verdict'>): VerdictFacts => ({
  bandsUsed: 2, spareBands: 0, chi2: 0, probability: null, reason: null, resting: [], assumed: null, ...given,
});

describe('each verdict begins with its own word and says why', () => {
  test('tested: how many bands, how many spare, chi-square and its probability', () => {
    expect(verdictSentence(facts({ verdict: 'tested', bandsUsed: 3, spareBands: 1, chi2: 0.108, probability: 0.742 })))
      .toBe('Tested: 3 bands with 1 spare agree (chi-square 0.1, probability 0.74).');
  });

  test('strained: the same facts, and that they disagree', () => {
    expect(verdictSentence(facts({ verdict: 'strained', bandsUsed: 4, spareBands: 2, chi2: 31.44, probability: 1.5e-7 })))
      .toBe('Strained: 4 bands with 2 spare disagree by more than readings and model allow (chi-square 31.4, probability below 0.001).');
  });

  test('a small probability keeps its figures: what is below 0.01, where strain begins, never reads 0.01', () => {
    const shown = (probability: number) => verdictSentence(facts({ verdict: 'tested', bandsUsed: 3, spareBands: 1, probability }));
    expect(shown(0.012)).toContain('probability 0.012');
    expect(shown(0.009)).toContain('probability 0.0090)');
    expect(shown(0.00999)).toContain('probability 0.0099)');
    expect(shown(0.0101)).toContain('probability 0.010)');
  });

  test('untested: no test possible, for one band and for several', () => {
    expect(verdictSentence(facts({ verdict: 'untested', bandsUsed: 1 }))).toBe('Untested: one band fixes one number and none is spare, so no test of the reading is possible.');
    expect(verdictSentence(facts({ verdict: 'untested', bandsUsed: 2 }))).toBe('Untested: 2 bands fix as many numbers and none is spare, so no test of the reading is possible.');
  });

  test('assumed: which numbers rest on what, verb and subject agreeing', () => {
    expect(verdictSentence(facts({ verdict: 'assumed', resting: ['Delta'], assumed: 'the assumed C/B = 4.5(9)' }))).toBe('Assumed: Delta moves with the assumed C/B = 4.5(9) by more than the readings are uncertain.');
    expect(verdictSentence(facts({ verdict: 'assumed', resting: ['Delta', 'B', 'beta'], assumed: 'the assumed C/B = 4.5(9)' }))).toMatch(/^Assumed: Delta, B and beta move with/);
  });

  test.each([['refused', 'Refused: no Delta gives this band.'], ['not determinable', 'Not determinable: no Delta gives this band.']] as const)('%s: the reason handed in, once', (verdict, sentence) => {
    expect(verdictSentence(facts({ verdict, reason: 'no Delta gives this band' }))).toBe(sentence);
  });
});

test('a number above its ceiling names both fractions and the parameter', () => {
  expect(aboveCeiling('B', 0.684, 0.15)).toBe("its uncertainty would be 68 %, above the policy's ceiling of 15 %; these bands hardly move with B");
});
