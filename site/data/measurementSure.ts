import { energy, figures, nanometres, ratio } from './show.ts';
import { stressOfPairs, stressOfTransitions } from './stress.ts';
import { type Table, column, quantity, rowColumn, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown, termShown } from './typeset.ts';

/** How far the numbers may be trusted: the verdict, what the fit rests on, and what would make it surer. */
export interface MeasurementSure {
  readonly reason: Parts;
  /** Sentences on the ground level and the order of levels, and the combination that is fixed where single numbers are not. */
  readonly remarks: readonly Parts[];
  /** Facts about the fit, name and value. */
  readonly facts: readonly { readonly name: Parts; readonly value: Parts; readonly path?: string }[];
  readonly stress: Table | null;
  readonly pairs: Table | null;
  readonly branches: Table | null;
  readonly predicted: Table | null;
  /** Bands worth looking for, most helpful first. */
  readonly helpful: readonly Parts[];
}

export function measurementSure(measurement: MeasurementNode): MeasurementSure {
  const { row } = measurement.chosen;
  return {
    reason: sentenceShown(row.reason),
    remarks: [...[...(row.combination === null ? [] : [row.combination]), ...(JSON.parse(row.remarks) as string[])].map(sentenceShown), ...correlations(measurement)],
    facts: facts(measurement), stress: stressOfTransitions(measurement), pairs: stressOfPairs(measurement),
    branches: branchTable(measurement), predicted: predictedTable(measurement), helpful: helpful(measurement),
  };
}

const SYMBOL: Readonly<Record<string, string>> = { Delta: 'Δ', B: 'B', C: 'C', beta: 'β' };
const slanted = (text: string): Parts => [{ text, style: 'italic' }];

function facts({ chosen, complex }: MeasurementNode): MeasurementSure['facts'] {
  const { row } = chosen;
  const spare = row.spare_bands > 0;
  return [
    { name: words('Bands in the fit'), value: words(row.bands_used === 0 ? 'none' : `${row.bands_used}, of these ${spare ? row.spare_bands : 'none'} spare`) },
    ...(row.rank === null || complex.ion.electrons === 1 || complex.ion.electrons === 9 ? [] : [{ name: words('Numbers they fix'), value: words(`${row.rank} of Δ, B, C`) }]),
    ...(row.rms_residual === null || !spare ? [] : [{ name: words('Root-mean-square residual'), value: words(`${ratio(row.rms_residual, 0)} cm⁻¹`) }]),
    ...(row.chi2 === null || !spare ? [] : [{ name: words('χ²'), value: words(figures(row.chi2, 3)) }]),
    ...(row.Delta_over_B === null ? [] : [{ name: slanted('Δ/B'), value: words(figures(row.Delta_over_B, 4)) }]),
    ...(row.C_over_B === null ? [] : [{ name: slanted('C/B'), value: words(`${row.C_over_B_u === null || row.C_over_B_u === 0 ? figures(row.C_over_B, 4) : energy(row.C_over_B, row.C_over_B_u)}, ${row.C_over_B_origin === 'fitted' ? 'fitted' : `assumed (${row.C_over_B_origin})`}`) }]),
    { name: words('Free-ion set'), value: words(row.free_ion_set), path: 'methods/#free-ions' },
    { name: words('Policy'), value: words(row.policy), path: 'methods/#policy' },
  ];
}

/** "Correlations: B with C −0.81; Δ with B −0.78." beta is B over a constant and adds none. */
function correlations({ chosen }: MeasurementNode): readonly Parts[] {
  const pairs = chosen.correlations.filter(({ first, second }) => first !== 'beta' && second !== 'beta');
  if (pairs.length === 0) return [];
  return [[...words(pairs.length === 1 ? 'Correlation of ' : 'Correlations of '), ...pairs.flatMap(({ first, second, value }, index): Parts => [
    ...words(index === 0 ? '' : '; '), ...slanted(SYMBOL[first] ?? first), ...words(' with '), ...slanted(SYMBOL[second] ?? second), ...words(`\u00a0${ratio(value, 2)}`),
  ]), ...words('.')]];
}

function branchTable({ chosen }: MeasurementNode): Table | null {
  if (chosen.branches.length < 2) return null;
  return {
    caption: 'Solutions of this assignment', columns: [rowColumn('Solution'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('χ²', null, true)],
    rows: chosen.branches.map((branch) => [branch.chosen === 1 ? 'chosen' : 'other', ratio(branch.Delta, 0), ratio(branch.B, 0), branch.chi2 < 1e-6 ? '0' : figures(branch.chi2, 3)]),
  };
}

/** Low-spin ions have a host of them in the ultraviolet; the database holds all. */
const PREDICTED_AT_MOST = 5;

const LOOKED: Readonly<Record<string, string>> = { inside: 'inside what was scanned', outside: 'outside what was scanned', 'not recorded': 'scanned range not recorded' };

function predictedTable({ chosen, complex }: MeasurementNode): Table | null {
  const all = chosen.predicted.filter((band) => band.spin_allowed === 1);
  const rows = all.slice(0, PREDICTED_AT_MOST);
  if (rows.length === 0) return null;
  return {
    caption: `Further spin-allowed bands that the fit predicts${rows.length < all.length ? `: the lowest ${rows.length} of ${all.length}` : ''}`,
    columns: [rowColumn('To'), quantity('ν̃', 'cm-1'), quantity('λ', 'nm'), column('Range')],
    rows: rows.map((band) => [
      { parts: termShown(band.label, complex.ion.electrons) }, energy(band.position, band.u), nanometres(band.position, band.u), LOOKED[band.looked] ?? band.looked,
    ]),
  };
}

/** One sentence a band; the rows of one band differ only in the number that they would help. */
function helpful({ chosen }: MeasurementNode): readonly Parts[] {
  return [...new Set(chosen.helpful.map(({ sentence }) => sentence))].map(sentenceShown);
}
