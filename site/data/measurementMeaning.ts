import { levels } from '#engine';
import { levelScheme } from '../charts/levelScheme.ts';
import type { FigureShown } from './figure.ts';
import { type ParameterShown, difference, energy, energyTwoSided, figures, nanometres, parameterShown, ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown, termShown } from './typeset.ts';

/** What the readings mean: the assignment against the fit, the parameters, and how far they may be trusted. */
export interface MeasurementMeaning {
  readonly ground: Parts | null;
  readonly assignment: string;
  readonly transitions: Table | null;
  readonly parameters: readonly ParameterShown[];
  /** The one reason where every number is withheld for it; the table of numbers then says nothing more. */
  readonly allWithheld: Parts | null;
  readonly scheme: FigureShown | null;
  readonly reason: Parts;
  readonly measureNext: Parts | null;
  /** Facts about the fit, name and value. */
  readonly facts: readonly { readonly name: Parts; readonly value: string }[];
  readonly branches: Table | null;
  readonly predicted: Table | null;
  /** Sentences on the ground level and the order of levels. */
  readonly remarks: readonly Parts[];
  readonly leftOut: Table | null;
  readonly rivals: Table | null;
  /** The result as one would write it. */
  readonly sentence: Parts;
}

const ASSIGNMENT: Readonly<Record<string, string>> = {
  typed: 'The assignment is the one typed in the record.', proposed: 'No assignment was typed; the engine proposes this one.', none: 'No assignment stands.',
};

export function measurementMeaning(measurement: MeasurementNode, id: string): MeasurementMeaning {
  const { chosen, complex } = measurement;
  const { row } = chosen;
  const { electrons } = complex.ion;
  return {
    ground: row.ground === null ? null : termShown(row.ground, electrons),
    assignment: ASSIGNMENT[row.assignment] ?? row.assignment,
    transitions: transitionTable(measurement),
    parameters: (['Delta', 'B', 'C', 'beta'] as const).map((name) => parameterShown(chosen.parameters[name])),
    allWithheld: allWithheld(measurement), scheme: scheme(measurement, id),
    reason: sentenceShown(row.reason), measureNext: row.measure_next === null ? null : sentenceShown(row.measure_next),
    facts: facts(measurement), branches: branchTable(measurement), predicted: predictedTable(measurement),
    remarks: (JSON.parse(row.remarks) as string[]).map(sentenceShown), leftOut: leftOutTable(measurement), rivals: rivalTable(measurement),
    sentence: sentenceShown(row.sentence),
  };
}

function allWithheld({ chosen }: MeasurementNode): Parts | null {
  const reasons = new Set(Object.values(chosen.parameters).map(({ reason, value }) => value === null ? reason : null));
  const [reason] = reasons;
  return reasons.size === 1 && reason != null ? sentenceShown(`Delta, B, C and beta are withheld: ${reason}.`) : null;
}

function transitionTable({ chosen, complex }: MeasurementNode): Table | null {
  if (chosen.transitions.length === 0) return null;
  const none = soft('no fit');
  return {
    caption: 'Transitions, observed against calculated',
    columns: [rowColumn('To'), quantity('observed', 'cm-1', true), quantity('calculated', 'cm-1', true), quantity('obs. − calc.', 'cm-1', true), quantity('floor', 'cm-1', true), column('In fit')],
    rows: chosen.transitions.map(({ row, bands }): readonly Cell[] => [
      { parts: termShown(row.label, complex.ion.electrons) },
      energyTwoSided(row.observed, row.u_minus, row.u_plus),
      row.calculated === null ? none : energy(row.calculated, null),
      row.residual === null ? none : difference(row.residual),
      energy(row.floor, null),
      `${row.used === 1 ? 'yes' : 'compared only'}${bands.length > 1 ? `, barycentre of ${bands.length} components` : ''}`,
    ]),
  };
}

function scheme(measurement: MeasurementNode, id: string): FigureShown | null {
  const { chosen, complex } = measurement;
  const branch = chosen.branches.find((one) => one.chosen === 1);
  const { electrons } = complex.ion;
  const { geometry, multiplicity, ground } = chosen.row;
  if (branch === undefined || chosen.parameters.B.value === null || electrons < 1 || electrons > 9 || (geometry !== 'octahedral' && geometry !== 'tetrahedral') || chosen.transitions.length === 0) return null;
  const all = levels({ electrons, geometry }, { delta: branch.Delta, racahB: branch.B, racahC: branch.C });
  const origin = all.find((level) => level.label === ground)?.energy ?? 0;
  const assigned = new Set(chosen.transitions.flatMap(({ row }) => row.label.split('/')));
  const limit = 1.15 * Math.max(...chosen.transitions.map(({ row }) => row.observed));
  const inReach = all.map((level) => ({ ...level, energy: level.energy - origin })).filter((level) => level.energy >= 0 && (level.energy <= limit || assigned.has(level.label)));
  const few = inReach.length <= 22 ? inReach : inReach.filter((level) => level.multiplicity === multiplicity || assigned.has(level.label));
  const title = `Levels of ${complex.formula.text} at the fitted parameters.`;
  return {
    id: `${id}-levels`, title, titleParts: [...words('Levels of '), ...complex.formula.parts, ...words(' at the fitted parameters.')],
    svg: levelScheme(few.map((level) => ({ energy: level.energy, parts: termShown(level.label, electrons), spinAllowed: level.multiplicity === multiplicity })),
      chosen.transitions.map(({ row }) => ({ observed: row.observed, used: row.used === 1 })),
      { id: `${id}-levels`, title, description: `${few.length} levels; arrows end at the observed bands.` }),
    caption: ['Arrows end at the observed bands. Full strokes: same multiplicity as the ground level; dashed: others.', few.length < inReach.length ? 'Unassigned levels of other multiplicities are left out.' : ''],
    source: 'Computed at the chosen solution.', table: null, files: [],
  };
}

function facts({ chosen }: MeasurementNode): MeasurementMeaning['facts'] {
  const { row } = chosen;
  const slanted = (text: string): Parts => [{ text, style: 'italic' }];
  const correlation = chosen.correlations.find((one) => one.first === 'Delta' && one.second === 'B');
  return [
    { name: words('Bands in the fit'), value: row.bands_used === 0 ? 'none' : `${row.bands_used}, of these ${row.spare_bands === 0 ? 'none' : row.spare_bands} spare` },
    ...(row.rms_residual === null || row.spare_bands === 0 ? [] : [{ name: words('Root-mean-square residual'), value: `${ratio(row.rms_residual, 0)} cm⁻¹` }]),
    ...(row.chi2 === null || row.spare_bands === 0 ? [] : [{ name: words('χ²'), value: figures(row.chi2, 3) }]),
    ...(correlation === undefined ? [] : [{ name: words('Correlation of Δ with B'), value: ratio(correlation.value, 2) }]),
    ...(row.Delta_over_B === null ? [] : [{ name: slanted('Δ/B'), value: figures(row.Delta_over_B, 4) }]),
    ...(row.C_over_B === null ? [] : [{ name: slanted('C/B'), value: `${row.C_over_B_u === null || row.C_over_B_u === 0 ? figures(row.C_over_B, 4) : energyRatio(row.C_over_B, row.C_over_B_u)}, ${row.C_over_B_origin === 'fitted' ? 'fitted' : `assumed (${row.C_over_B_origin})`}` }]),
    { name: words('Free-ion set'), value: row.free_ion_set },
    { name: words('Policy'), value: row.policy },
  ];
}

const energyRatio = (value: number, u: number): string => energy(value, u);

function branchTable({ chosen }: MeasurementNode): Table | null {
  if (chosen.branches.length < 2) return null;
  return {
    caption: 'Solutions of this assignment', columns: [column('Solution'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('χ²', null, true)],
    rows: chosen.branches.map((branch) => [branch.chosen === 1 ? 'chosen' : 'other', ratio(branch.Delta, 0), ratio(branch.B, 0), figures(branch.chi2, 3)]),
  };
}

function predictedTable({ chosen, complex }: MeasurementNode): Table | null {
  const rows = chosen.predicted.filter((band) => band.spin_allowed === 1);
  if (rows.length === 0) return null;
  return {
    caption: 'Spin-allowed bands that the fit predicts and no reading takes',
    columns: [rowColumn('To'), quantity('ν̃', 'cm-1'), quantity('λ', 'nm'), column('Range')],
    rows: rows.map((band) => [
      { parts: termShown(band.label, complex.ion.electrons) }, energy(band.position, band.u), nanometres(band.position, band.u),
      band.looked === 'inside' ? 'inside what was scanned' : band.looked === 'outside' ? 'outside what was scanned' : 'scanned range not recorded',
    ]),
  };
}

function leftOutTable({ chosen, complex }: MeasurementNode): Table | null {
  const rows = chosen.leftOut.filter((row) => row.Delta !== null || row.predicted !== null);
  if (rows.length === 0) return null;
  const none = soft('not fixed');
  return {
    caption: 'Each band left out: what the others give, and where they put it',
    columns: [rowColumn('Without'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('predicted', 'cm-1', true), quantity('z', null)],
    rows: rows.map((row) => [
      { parts: termShown(row.label, complex.ion.electrons) }, row.Delta === null ? none : ratio(row.Delta, 0), row.B === null ? none : ratio(row.B, 0),
      row.predicted === null ? none : energy(row.predicted, null), row.z === null ? none : ratio(row.z, 1),
    ]),
  };
}

function rivalTable({ rivals, complex, chosen }: MeasurementNode): Table | null {
  if (rivals.length === 0) return null;
  return {
    caption: 'Other readings of these bands',
    columns: [rowColumn('Assignment'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), longColumn('Where it ranks')],
    rows: rivals.map(({ row, transitions, parameters }): readonly Cell[] => [
      { parts: [
        ...transitions.flatMap((transition, index) => [...(index > 0 ? words(', ') : []), ...termShown(transition.row.label, complex.ion.electrons), ...words(` ${energy(transition.row.observed, null)}`)]),
        ...(row.geometry !== null && row.geometry !== chosen.row.geometry ? words(` (${row.geometry})`) : []),
        ...(row.multiplicity !== null && row.multiplicity !== chosen.row.multiplicity ? words(` (multiplicity ${row.multiplicity})`) : []),
      ] },
      rounded(parameters.Delta.value), rounded(parameters.B.value), { parts: sentenceShown(row.ranking ?? 'not ranked') },
    ]),
  };
}

const rounded = (value: number | null): Cell => value === null ? soft('withheld') : ratio(Math.round(value / 10) * 10, 0);
