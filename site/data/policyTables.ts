import { concise, fewestSpare } from '#engine';
import { complexPath } from './paths.ts';
import type { PolicyRow } from './rows.ts';
import { energy, ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, words } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** One declared choice: its name, its value as printed. */
interface Choice { readonly name: string; readonly value: string }

const percent = (fraction: number): string => `${ratio(100 * fraction, Number.isInteger(Math.round(1e9 * fraction) / 1e7) ? 0 : 1)} %`;

/** Every value of a policy, each with its unit. */
function choices(policy: PolicyRow): readonly Choice[] {
  const perIon = Object.entries(JSON.parse(policy.C_over_B_per_ion) as Record<string, { value: number; u: number }>);
  const wavenumber = (value: number): string => `${energy(value, null)} cm⁻¹`;
  return [
    { name: 'C/B where C is not fitted', value: energy(policy.C_over_B, policy.C_over_B_u) },
    ...perIon.map(([ion, { value, u }]) => ({ name: `C/B for ${ion}`, value: energy(value, u) })),
    { name: 'C where spin-flip bands fix it', value: policy.C_fitted === 1 ? 'fitted' : 'assumed all the same' },
    { name: 'Model floor, general', value: wavenumber(policy.floor_general) },
    { name: 'Model floor, spin-flip lines', value: wavenumber(policy.floor_spin_flip) },
    { name: 'Model floor, two-electron bands', value: wavenumber(policy.floor_two_electron) },
    { name: 'Ceiling on u/value of Δ, B, C', value: [policy.ceiling_Delta, policy.ceiling_B, policy.ceiling_C].map(percent).join(', ') },
    { name: 'Differential floor of Δ, B', value: `${wavenumber(policy.differential_Delta)}, ${percent(policy.differential_B)}` },
    { name: 'Free-ion set', value: policy.free_ion_set },
    { name: 'Margin within which a rival reading is near', value: ratio(policy.rival_margin, Number.isInteger(policy.rival_margin) ? 0 : 1) },
    { name: 'u assumed for a maximum, a line', value: `${wavenumber(policy.default_u_maximum)}, ${wavenumber(policy.default_u_line)}` },
  ];
}

export function policyTable({ policy }: CollectionTree): Table {
  return { caption: 'The policy in force', columns: [rowColumn('Choice'), column('Value')], rows: choices(policy).map(({ name, value }): readonly Cell[] => [name, value]) };
}

/** Measurements that override values of the policy in force, with what differs and why. */
export function overrideTable(tree: CollectionTree): Table | null {
  const inForce = new Map(choices(tree.policy).map(({ name, value }) => [name, value]));
  const own = tree.complexes.flatMap((complex) => complex.measurements.filter(({ row }) => row.policy !== tree.policy.id).map((measurement) => ({ complex, measurement })));
  if (own.length === 0) return null;
  return {
    caption: 'Measurements fitted under values of their own',
    columns: [rowColumn('Complex'), column('Measurement'), longColumn('What differs'), longColumn('Why'), column('Policy')],
    rows: own.map(({ complex, measurement: { row } }): readonly Cell[] => {
      const policy = tree.policies.get(row.policy);
      const different = policy === undefined ? [] : choices(policy).filter(({ name, value }) => inForce.get(name) !== value);
      return [
        { parts: complex.formula.parts, path: `${complexPath(complex.row.id)}#${row.id}` }, row.id,
        different.map(({ name, value }) => `${name}: ${value}`).join('; '), row.policy_reason ?? 'no reason recorded', row.policy,
      ];
    }),
  };
}

/** Factor on the model floors that each ion's spare bands suggest; null where no ion has enough of them. */
export function floorFactorTable({ floorFactors }: CollectionTree): Table | null {
  if (floorFactors.length === 0) return null;
  return {
    caption: `Factor on the model floors that spare bands suggest, from ${fewestSpare} spare bands on; never applied`,
    columns: [rowColumn('Ion'), column('Geometry'), { head: [{ text: 'κ', style: 'italic' }], figure: true }, quantity('spare bands', null, true), column('So')],
    rows: floorFactors.map(({ ion, geometry, kappa, u, spare_bands: spare }): readonly Cell[] => [
      { parts: words(ion) }, geometry, concise(kappa, u, 'page'), ratio(spare, 0),
      Math.abs(kappa - 1) <= 2 * u ? 'in keeping with the floors' : kappa > 1 ? 'floors look low' : 'floors look high',
    ]),
  };
}
