import { expect, test } from 'vitest';
import { formulaShown, inlineText, sentenceShown } from '../../../site/data/typeset.ts';

const marked = (parts: readonly { readonly text: string; readonly style: string }[]): string => parts.map(({ text, style }) => style === 'plain' ? text : `<${style}>${text}</${style}>`).join('');

test('an isomer stands before a formula that does not name it', () => {
  expect(marked(formulaShown('[CrCl2(en)2]+', 'cis', ['en']).parts)).toMatch(/^<italic>cis<\/italic>-\[CrCl<sub>2<\/sub>/);
  expect(formulaShown('cis-[CrCl2(en)2]+', 'cis', ['en']).text).toBe('cis-[CrCl2(en)2]+');
  expect(formulaShown('[Cr(NH3)6]3+', 'none', []).spoken).toBe('Cr, N H 3 six times, charge three plus');
});

test('text that is no formula stays as typed', () => {
  expect(formulaShown('<b>?', 'none', [])).toMatchObject({ text: '<b>?', parts: [{ text: '<b>?', style: 'plain' }] });
});

test('stored sentences get their term labels and symbols typeset and lose nothing', () => {
  expect(marked(sentenceShown('a1T2g, expected 27 400 to 32 200 cm⁻¹, would fix B; Delta and beta follow.')))
    .toBe('<italic>a</italic><super>1</super>T<sub>2g</sub>, expected 27 400 to 32 200\u00a0cm⁻¹, would fix <italic>B</italic>; <italic>Δ</italic> and <italic>β</italic> follow.');
  for (const text of ['', '3A2g', 'no term here', '1Eg lies near 3T1g(P).', 'in K3[Cr(CN)6] at 80 K', 'x4A1g/4Eg y 4A1g/4Eg']) {
    const back = sentenceShown(text).map((part) => part.text).join('');
    expect(back.replaceAll(', ', '/'), text).toBe(text.replaceAll(', ', '/'));
  }
});

test('media and hosts keep figures low and powers high', () => {
  expect(inlineText('perchloric acid, 0.1 mol L-1')).toBe('perchloric acid, 0.1 mol L⁻¹');
  expect(inlineText('K3[Al(C2O4)3].3H2O')).toBe('K₃[Al(C₂O₄)₃]·3H₂O');
  expect(inlineText('water')).toBe('water');
  expect(inlineText('4 to 1')).toBe('4 to 1');
});
