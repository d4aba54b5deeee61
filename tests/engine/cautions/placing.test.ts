import { expect, test } from 'vitest';
import { codes } from '../series/plantedSeries.ts';
import { placingCases } from './placingCases.ts';

test.each(Object.entries(placingCases))('%s: said where it applies, not at a near miss', (code, [trigger, nearMiss]) => {
  const raised = trigger();
  expect(codes(raised)).toContain(code);
  expect(codes(nearMiss())).not.toContain(code);
  expect(raised.cautions.find((one) => one.code === code)!.text).toMatch(/^\S[^\n]{40,}\.$/);
});
