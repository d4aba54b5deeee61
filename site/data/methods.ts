import { type BandKind, freeIonSets, hazardCodes } from '#engine';
import { bandStrip } from '../charts/strip.ts';
import { sentenceShown } from './typeset.ts';
import { energy, ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree } from './tree.ts';

export interface MethodsPage {
  readonly policyName: string;
  readonly policyId: string;
  readonly policy: Table;
  readonly freeIonSets: readonly { readonly name: string; readonly version: string; readonly description: string; readonly sources: readonly string[]; readonly inUse: boolean }[];
  readonly freeIons: Table;
  readonly strips: readonly { readonly name: string; readonly svg: string }[];
  readonly hazardCodes: readonly string[];
  readonly cautionsMet: Table;
}

export function methodsPage(tree: CollectionTree): MethodsPage {
  return {
    policyName: tree.policy.name, policyId: tree.policy.id, policy: policyTable(tree),
    freeIonSets: freeIonSets.map((set) => ({ ...set, inUse: set.name === tree.policy.free_ion_set })), freeIons: freeIonTable(tree),
    strips: stripLegend(), hazardCodes, cautionsMet: cautionTable(tree),
  };
}

function policyTable({ policy }: CollectionTree): Table {
  const perIon = Object.entries(JSON.parse(policy.C_over_B_per_ion) as Record<string, { value: number; u: number }>);
  const percent = (fraction: number): string => `${ratio(100 * fraction, Number.isInteger(100 * fraction) ? 0 : 1)} %`;
  const row = (name: string, value: string): readonly Cell[] => [name, value];
  return {
    caption: 'The policy in force', columns: [rowColumn('Choice'), column('Value')],
    rows: [
      row('C/B where C is not fitted', energy(policy.C_over_B, policy.C_over_B_u)),
      ...perIon.map(([ion, { value, u }]) => row(`C/B for ${ion}`, energy(value, u))),
      row('Model floor, general', `${energy(policy.floor_general, null)} cm⁻¹`), row('Model floor, spin-flip lines', `${energy(policy.floor_spin_flip, null)} cm⁻¹`),
      row('Model floor, two-electron bands', `${energy(policy.floor_two_electron, null)} cm⁻¹`),
      row('Ceiling on u/value of Δ, B, C', [policy.ceiling_Delta, policy.ceiling_B, policy.ceiling_C].map(percent).join(', ')),
      row('Differential floor of Δ, B', `${energy(policy.differential_Delta, null)} cm⁻¹, ${percent(policy.differential_B)}`),
      row('Free-ion set', policy.free_ion_set), row('Margin within which a rival reading is near', ratio(policy.rival_margin, 0)),
      row('u assumed for a maximum, a line', `${energy(policy.default_u_maximum, null)} cm⁻¹, ${energy(policy.default_u_line, null)} cm⁻¹`),
    ],
  };
}

function freeIonTable(tree: CollectionTree): Table {
  return {
    caption: 'Free ions of this collection',
    columns: [rowColumn('Ion'), column('Set'), quantity('B₀', 'cm-1'), quantity('C₀', 'cm-1'), column('How obtained')],
    rows: tree.ions.flatMap(({ name }) => tree.freeIons.filter((row) => row.ion === name)).map((row): readonly Cell[] => [
      row.ion, row.set_name, energy(row.B0, null), row.C0 === null ? soft('none in this set') : energy(row.C0, null), row.kind,
    ]),
  };
}

const LEGEND: readonly { readonly name: string; readonly kind: BandKind; readonly side?: 'higher' | 'lower'; readonly fitted?: false }[] = [
  { name: 'maximum', kind: 'maximum' }, { name: 'shoulder, leaning towards the stronger band', kind: 'shoulder', side: 'higher' }, { name: 'sharp line', kind: 'line' },
  { name: 'zero-phonon line', kind: 'zero-phonon' }, { name: 'dip', kind: 'dip' }, { name: 'component of a split band', kind: 'component' },
  { name: 'centroid', kind: 'centroid' }, { name: 'envelope', kind: 'envelope' }, { name: 'kept, not fitted (dotted)', kind: 'maximum', fitted: false },
];

function stripLegend(): MethodsPage['strips'] {
  const base = { absent: [], scanned: [{ low: 12000, high: 36000 }] };
  return [
    ...LEGEND.map(({ name, kind, side, fitted }, index) => ({
      name, svg: bandStrip({ ...base, bands: [{ position: 20000, kind, side: side ?? null, width: null, fitted: fitted ?? true }] }, name, `legend-${index}`),
    })),
    { name: 'solid line: scanned; dotted line: not looked at; open bar: looked, and no band', svg: bandStrip({ bands: [], scanned: base.scanned, absent: [{ low: 27000, high: 33000 }] }, 'scanned, not looked at, and empty ranges', 'legend-ranges') },
  ];
}

/** Spectral cautions that occur in the collection, with how often. */
function cautionTable(tree: CollectionTree): Table {
  const met = new Map<string, { count: number; text: string }>();
  for (const complex of tree.complexes) for (const measurement of complex.measurements) for (const { code, text } of measurement.chosen.cautions) {
    met.set(code, { count: (met.get(code)?.count ?? 0) + 1, text: met.get(code)?.text ?? text });
  }
  return {
    caption: 'Spectral cautions met in this collection, each with one wording',
    columns: [rowColumn('Code'), quantity('measurements', null, true), longColumn('As worded once')],
    rows: [...met].sort(([a], [b]) => (a < b ? -1 : 1)).map(([code, { count, text }]) => [code, ratio(count, 0), { parts: sentenceShown(text) }]),
  };
}
