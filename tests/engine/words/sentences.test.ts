import { describe, expect, test } from 'vitest';
import { helpfulBandSentence } from '../../../engine/words/measureNext.ts';
import { doubletSentence, groundSentence, rivalSentence } from '../../../engine/words/remarks.ts';
import { thesisSentence } from '../../../engine/words/thesis.ts';
import type { ThesisFacts } from '../../../engine/words/thesis.ts';

const thin = '\u2009';

describe('what to measure next', () => {
  test('a band that would sharpen one number and fix another: where to look and what it brings', () => {
    expect(helpfulBandSentence('b4T1g', 36_000, 40_000, [{ parameter: 'B', uNow: 107, uThen: 16 }, { parameter: 'C', uNow: null, uThen: 90 }]))
      .toBe(`b4T1g, expected 36${thin}000 to 40${thin}000 cm⁻¹, would cut u(B) from 107 to 16 cm⁻¹ and fix C to about ±90 cm⁻¹.`);
  });

  test('an uncertainty to come is told to two figures: it is an estimate', () => {
    expect(helpfulBandSentence('a1Eg', 11_100, 17_700, [{ parameter: 'C', uNow: null, uThen: 159.4 }])).toContain('fix C to about ±160 cm⁻¹.');
  });
});

describe('ground level', () => {
  // High-spin d6: t2g4 eg2, -0.4 Delta; d5 high spin: 0.
  test('stabilisation in Delta and cm-1, and the distance from the spin crossing', () => {
    expect(groundSentence({ crossing: 20.3, deltaOverB: 12.44, stabilisationInDelta: -0.4, stabilisation: -4160, ground: '5T2g' }))
      .toBe('The field lowers the ground level 5T2g by 0.40 Delta, −4160 cm⁻¹; Delta/B = 12.4 against 20.3 where the ground spin changes.');
  });

  test('a half-filled shell is not lowered', () => {
    expect(groundSentence({ crossing: 28.4, deltaOverB: 12.56, stabilisationInDelta: 0, stabilisation: -0, ground: '6A1g' }))
      .toBe('The field leaves the ground level 6A1g where it is; Delta/B = 12.6 against 28.4 where the ground spin changes.');
  });

  test('without a B, or without a crossing, the field alone is told', () => {
    for (const part of [{ crossing: null, deltaOverB: 24 }, { crossing: 20.3, deltaOverB: null }])
      expect(groundSentence({ ...part, stabilisationInDelta: -1.2, stabilisation: -20_880, ground: '4A2g' })).toBe(`The field lowers the ground level 4A2g by 1.20 Delta, −20${thin}880 cm⁻¹.`);
  });
});

describe('order of 2Eg and 4T2g', () => {
  test('with C assumed it is not decidable, whatever the numbers', () => {
    expect(doubletSentence({ gap: 3000, u: 50, decidable: false })).toMatch(/not decidable.*C is assumed/);
  });

  test('decided: which lies lower, by how much, and that vertical energies are meant', () => {
    expect(doubletSentence({ gap: 3150, u: 120, decidable: true })).toMatch(/^2Eg lies below 4T2g by 3150\(120\) cm⁻¹: vertical, not thermal/);
    expect(doubletSentence({ gap: -3150, u: 120, decidable: true })).toMatch(/^4T2g lies below 2Eg by 3150\(120\) cm⁻¹: vertical, not thermal/);
  });

  test('a gap within two of its uncertainties says so', () => {
    expect(doubletSentence({ gap: 150, u: 120, decidable: true })).toContain('within its uncertainty');
    expect(doubletSentence({ gap: 250, u: 120, decidable: true })).not.toContain('within its uncertainty');
  });
});

describe('what the verdict adds', () => {
  test('nothing where nothing rivals', () => {
    expect(rivalSentence({ best: null, sameNumbers: false }, false)).toBe('');
  });

  test('a near rival, a better one and a second solution each have their own sentence', () => {
    const sentences = [rivalSentence({ best: 'near', sameNumbers: false }, false), rivalSentence({ best: 'better', sameNumbers: false }, false), rivalSentence({ best: null, sameNumbers: false }, true)];
    expect(new Set(sentences).size).toBe(3);
    expect(rivalSentence({ best: 'near', sameNumbers: false }, true)).toBe(sentences[0]! + sentences[2]!);
    for (const sentence of sentences) expect(sentence).toMatch(/^ [A-Z].*\.$/);
  });
});

describe('the sentence for a thesis', () => {
  const chromium: ThesisFacts = {
    verdict: 'untested', bands: [{ observed: 17_400, label: '4T2g' }, { observed: 24_600, label: 'a4T1g' }],
    parameters: [
      { name: 'Delta', value: 17_400, uTotal: 180, standing: 'fitted' }, { name: 'B', value: 729, uTotal: 28, standing: 'fitted' },
      { name: 'C', value: null, uTotal: null, standing: 'withheld' }, { name: 'beta', value: 0.794, uTotal: 0.04, standing: 'fitted' },
    ],
    freeIon: { racahB0: 918, set: 'published' }, spareBands: 0, assumed: null, reason: null, policy: 'house-2026-1f00c3aa',
  };

  test('bands with their transitions, numbers with uncertainties, B0 with its set, standing and policy; no withheld number', () => {
    const sentence = thesisSentence(chromium);
    for (const part of [`17${thin}400 cm⁻¹ (4T2g)`, `24${thin}600 cm⁻¹ (a4T1g)`, 'B = 729(28) cm⁻¹', 'B₀ = 918 cm⁻¹', '“published”', 'untested', 'standard uncertainties', 'house-2026-1f00c3aa'])
      expect(sentence).toContain(part);
    expect(sentence).not.toMatch(/\bC =|null|NaN|undefined/);
  });

  test('what rests on an assumed value says so beside the number', () => {
    const parameters = chromium.parameters.map((one) => (one.name === 'Delta' ? { ...one, standing: 'assumed' as const } : one));
    expect(thesisSentence({ ...chromium, verdict: 'assumed', parameters, assumed: 'C/B = 4.5(9)' })).toMatch(/Delta = [^;]*assumed value.*with C\/B = 4\.5\(9\) assumed/);
  });

  test('one spare band that agrees, and spare bands that do not', () => {
    expect(thesisSentence({ ...chromium, verdict: 'tested', spareBands: 1 })).toContain('one spare band agrees');
    expect(thesisSentence({ ...chromium, verdict: 'strained', spareBands: 1 })).toContain('strained');
  });

  test('no number at all: the reason instead, and no empty list', () => {
    const sentence = thesisSentence({ ...chromium, verdict: 'refused', parameters: chromium.parameters.map((one) => ({ ...one, value: null, uTotal: null, standing: 'withheld' as const })), reason: 'no Delta and B give both bands' });
    expect(sentence).toBe('The bands give no ligand-field parameters: no Delta and B give both bands (policy house-2026-1f00c3aa).');
  });
});
