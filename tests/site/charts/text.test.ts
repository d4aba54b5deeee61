import { termParts } from '#engine';
import { expect, test } from 'vitest';
import { coordinate, escapeText, spans } from '../../../site/charts/text.ts';

test('a term label is raised, set back and lowered, so that the shifts add up to the low part alone', () => {
  const markup = spans(termParts('b4T1g'), 10);
  const shifts = [...markup.matchAll(/dy="([-\d.]+)"/g)].map(([, shift]) => Number(shift));
  expect(shifts).toEqual([-3.6, 3.6, 2.2]);
  expect(markup.replace(/<[^>]*>/g, '')).toBe('b4T1g');
});

test('text from records cannot become markup', () => {
  const hostile = '</text><script>alert("1")</script>&';
  expect(escapeText(hostile)).toBe('&lt;/text&gt;&lt;script&gt;alert(&quot;1&quot;)&lt;/script&gt;&amp;');
  expect(spans([{ text: hostile, style: 'sub' }], 10)).not.toContain('<script');
});

test('coordinates have two decimals, no negative zero, and never hide a number that is none', () => {
  expect(coordinate(1 / 3)).toBe('0.33');
  expect(coordinate(-0.001)).toBe('0');
  expect(() => coordinate(Number.NaN)).toThrow(RangeError);
});
