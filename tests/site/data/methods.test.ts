import { expect, test } from 'vitest';
import { evidenceWeights, strainedBelow } from '#engine';
import { methodsPage } from '../../../site/data/methods.ts';
import { overrideTable } from '../../../site/data/policyTables.ts';
import type { Cell } from '../../../site/data/table.ts';
import type { CollectionTree } from '../../../site/data/tree.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const text = (cell: Cell | undefined): string => typeof cell === 'string' ? cell : (cell?.parts ?? []).map((part) => part.text).join('');
const page = methodsPage(tree);

test('every weight of evidence that the engine uses stands on the methods page', () => {
  const cells = page.evidence.rows.map((row) => text(row[1])).join(' ; ');
  for (const [name, weight] of Object.entries(evidenceWeights)) expect(cells, name).toMatch(new RegExp(`(?<![\\d.])${weight}(?![\\d.])`));
  expect(page.evidence.rows).toHaveLength(12);
  expect(page.limits.strained).toBe(String(strainedBelow));
});

test('default uncertainties are those of the engine under the policy in force', () => {
  const rows = new Map(page.defaults.rows.map((row) => [text(row[0]), row.slice(1).map(text)]));
  expect(rows.get('maximum')).toEqual(['80', '90']);
  expect(rows.get('line, zero-phonon line')).toEqual(['15', '15']);
  expect(rows.get('shoulder below a stronger band')).toEqual(['600 down, 250 up', '1050 down, 450 up']);
  const wider = methodsPage({ ...tree, policy: { ...tree.policy, default_u_maximum: 120 } });
  expect(text(wider.defaults.rows[0]![1])).toBe('120');
});

test('the policy says whether C is fitted, and names C/B of single ions', () => {
  const own = methodsPage({ ...tree, policy: { ...tree.policy, C_fitted: 1, C_over_B_per_ion: '{"Cr(III)":{"value":4.8,"u":0.5}}' } }).policy.rows;
  expect(own).toContainEqual(['C/B for Cr(III)', '4.8(5)']);
  expect(own).toContainEqual(['C where spin-flip bands fix it', 'fitted']);
});

test('a measurement with values of its own is listed with what differs and why', () => {
  expect(overrideTable(tree)).toBeNull();
  const policies = new Map([...tree.policies, ['own-11112222', { ...tree.policy, id: 'own-11112222', in_force: 0, C_over_B: 4, floor_general: 100 }]]) as CollectionTree['policies'];
  const complexes = tree.complexes.map((complex) => complex.row.id !== 'ti-aq6' ? complex : {
    ...complex, measurements: complex.measurements.map((one) => ({ ...one, row: { ...one.row, policy: 'own-11112222', policy_reason: 'a test' } })),
  });
  const table = overrideTable({ ...tree, policies, complexes });
  expect(table!.rows.map((row) => row.map(text))).toEqual([['[Ti(H2O)6]3+', 'aq-295', 'C/B where C is not fitted: 4.0(9); Model floor, general: 100 cm⁻¹', 'a test', 'own-11112222']]);
});
