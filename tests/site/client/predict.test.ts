import { describe, expect, test } from 'vitest';
import { predict } from '../../../scripts/predict/prediction.ts';
import { type PredictForm, readAsked, stepped } from '../../../site/client/predict/asked.ts';
import { predictionMarkup } from '../../../site/client/predict/shown.ts';
import { runScript } from '../../scripts/commands/runScript.ts';

const form = (changes: Partial<PredictForm> = {}): PredictForm => ({ ion: 'Co(II)', geometry: 'octahedral', spin: '', Delta: '9200', B: '850', C: '', ratio: '', ...changes });

interface Answer { readonly Delta: number; readonly B: number; readonly C: number; readonly ground: string; readonly assumed: readonly string[]; readonly bands: readonly { readonly label: string; readonly position: number }[] }

describe('the page predicts what the command predicts', () => {
  test.each<readonly [string, readonly string[], Partial<PredictForm>]>([
    ['high-spin Co(II)', ['Co(II)', '--Delta', '9200', '--B', '850'], {}],
    ['low-spin Fe(II)', ['Fe(II)', '--Delta', '33000', '--B', '420', '--C/B', '4.5', '--spin', 'low'], { ion: 'Fe(II)', Delta: '33000', B: '420', ratio: '4.5', spin: 'low' }],
    ['tetrahedral Ni(II)', ['Ni(II)', '--Delta', '3.6 kK', '--B', '800', '--C', '3200', '--geometry', 'tetrahedral'], { ion: 'Ni(II)', Delta: '3.6 kK', B: '800', C: '3200', geometry: 'tetrahedral' }],
  ])('%s', (_, words, changes) => {
    const { code, stdout } = runScript('predict', [...words, '--json']);
    expect(code).toBe(0);
    const command = JSON.parse(stdout) as Answer;
    const { asked } = readAsked(form(changes));
    const page = predict({ electrons: asked!.ion.electrons, geometry: asked!.geometry, multiplicity: asked!.multiplicity, delta: asked!.delta, racahB: asked!.racahB, racahC: asked!.racahC });
    expect([asked!.delta, asked!.racahB, asked!.racahC, page.ground]).toEqual([command.Delta, command.B, command.C, command.ground]);
    expect(page.transitions.map(({ label, position }) => ({ label, position }))).toEqual(command.bands.map(({ label, position }) => ({ label, position })));
    expect(asked!.assumed).toEqual(command.assumed.filter((text) => text !== 'octahedral'));
    const markup = predictionMarkup(asked!, page);
    expect(markup).not.toMatch(/NaN|undefined|null/);
    expect(markup.match(/<svg/g)).toHaveLength(2);
  });
});

test.each<readonly [string, Partial<PredictForm>, string]>([
  ['an unknown metal', { ion: 'Xx(II)' }, 'ion'], ['an ion without d-d bands', { ion: 'Zn(II)' }, 'ion'], ['no number', { Delta: 'much' }, 'Delta'],
  ['C and C/B together', { C: '3500', ratio: '4' }, 'ratio'], ['a spin that cannot be', { ion: 'Ni(II)', spin: 'low' }, 'spin'],
])('%s is said beside its field', (_, changes, field) => {
  expect(readAsked(form(changes)).faults.map((fault) => fault.field)).toEqual([field]);
});

test('empty fields are waited for', () => {
  expect(readAsked(form({ Delta: '', B: '' }))).toEqual({ asked: null, faults: [] });
});

test('arrow keys step bare numbers by the step of the field, never to 0 or below, and leave other text alone', () => {
  expect(stepped('Delta', '9200', 1)).toBe('9300');
  expect(stepped('Delta', '9200 cm-1', -10)).toBe('8200');
  expect(stepped('ratio', '4.5', 1)).toBe('4.6');
  expect(stepped('B', '5', -1)).toBe('5');
  expect(stepped('Delta', '9.2 kK', 1)).toBeNull();
  expect(stepped('ion', '3', 1)).toBeNull();
});
