import {
  type BandKind, disagreesFrom, distinguishableAbove, equalWithin, fewestSpare, freeIonSets, publishedFactorsFromMemory, publishedFactorsSource, reviewAbove, roomTemperature,
  strainedBelow, temperatureReach, termSource,
} from '#engine';
import { bandStrip } from '../charts/strip.ts';
import { absorptivityTable, defaultUncertaintyTable, evidenceTable } from './evidenceTables.ts';
import { floorFactorTable, overrideTable, policyTable } from './policyTables.ts';
import { energy, ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree } from './tree.ts';

export interface MethodsPage {
  readonly policyName: string;
  readonly policyId: string;
  readonly policy: Table;
  readonly overrides: Table | null;
  readonly floors: Table | null;
  readonly fewestSpare: number;
  readonly evidence: Table;
  readonly absorptivity: Table;
  readonly defaults: Table;
  /** Limits that sentences name, as the engine has them. */
  readonly limits: Readonly<Record<'strained' | 'equal' | 'distinguishable' | 'disagrees' | 'review' | 'temperature' | 'room' | 'margin', string>>;
  readonly freeIonSets: readonly { readonly name: string; readonly version: string; readonly description: string; readonly sources: readonly string[]; readonly inUse: boolean }[];
  readonly freeIons: Table;
  readonly strips: readonly { readonly name: string; readonly svg: string }[];
  readonly factors: { readonly source: string; readonly memory: string };
  readonly sources: readonly { readonly what: string; readonly source: string }[];
}

export function methodsPage(tree: CollectionTree): MethodsPage {
  return {
    policyName: tree.policy.name, policyId: tree.policy.id, policy: policyTable(tree), overrides: overrideTable(tree), floors: floorFactorTable(tree), fewestSpare,
    evidence: evidenceTable(), absorptivity: absorptivityTable(), defaults: defaultUncertaintyTable(tree),
    limits: {
      strained: String(strainedBelow), equal: ratio(equalWithin, 0), distinguishable: COUNT[distinguishableAbove] ?? String(distinguishableAbove), disagrees: COUNT[disagreesFrom] ?? String(disagreesFrom),
      review: COUNT[reviewAbove] ?? String(reviewAbove), temperature: `${temperatureReach} K`, room: `${roomTemperature} K`, margin: ratio(tree.policy.rival_margin, 0),
    },
    freeIonSets: freeIonSets.map((set) => ({ ...set, inUse: set.name === tree.policy.free_ion_set })), freeIons: freeIonTable(tree),
    strips: stripLegend(), factors: { source: publishedFactorsSource, memory: publishedFactorsFromMemory }, sources: SOURCES,
  };
}

const COUNT: Readonly<Record<number, string>> = { 1: 'one', 2: 'two', 3: 'three' };

const SOURCES: MethodsPage['sources'] = [
  { what: 'Two-electron integrals and Racah’s A, B, C', source: 'G. Racah, Phys. Rev. 62, 438 (1942); E. U. Condon and G. H. Shortley, The Theory of Atomic Spectra' },
  { what: 'Printed matrices, held against the derived blocks', source: 'Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 753 and 766 (1954)' },
  { what: 'Free-ion terms of the set “atomic-levels”', source: termSource },
  { what: 'Average environment, f, g, h and k', source: publishedFactorsSource },
  { what: 'Uncertainties and their notation', source: 'JCGM 100:2008 (GUM), 4.3.7 (rounded readings), 5.1 and 5.2 (propagation), 7.2.2 and 7.2.6 (concise notation)' },
  { what: 'Formulas and names', source: 'IUPAC, Nomenclature of Inorganic Chemistry, Recommendations 2005' },
  { what: 'Default uncertainties, usual absorption coefficients and widths, hazard classes, directions of trends', source: 'common practice, no source' },
  { what: 'Model floors, evidence weights, ceilings', source: 'our own choice; the floors from fits to published spectra (computed for this project)' },
];

function freeIonTable(tree: CollectionTree): Table {
  return {
    caption: 'Free ions of this collection',
    columns: [rowColumn('Ion'), column('Set'), quantity('B₀', 'cm-1'), quantity('C₀', 'cm-1'), longColumn('How obtained')],
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
