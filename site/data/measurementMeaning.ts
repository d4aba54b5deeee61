import { levels, partInFit } from '#engine';
import { levelScheme } from '../charts/levelScheme.ts';
import { residualBar } from '../charts/residualBar.ts';
import { conditions } from './conditions.ts';
import { type FigureShown, ownFigureFiles } from './figure.ts';
import { type ParameterShown, difference, energy, energyTwoSided, parameterShown } from './show.ts';
import { type Cell, type Table, column, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { type Parts, sentenceShown, sentenceText, termShown } from './typeset.ts';

/** What the readings mean: the assignment against the fit, the parameters, and the result in one sentence. */
export interface MeasurementMeaning {
  readonly ground: Parts | null;
  readonly assignment: string;
  readonly transitions: Table | null;
  readonly parameters: readonly ParameterShown[];
  /** The one reason where every number is withheld for it; the table of numbers then says nothing more. */
  readonly allWithheld: Parts | null;
  readonly scheme: FigureShown | null;
  /** The result as one would write it, and the same as plain text for the clipboard. */
  readonly sentence: { readonly parts: Parts; readonly text: string } | null;
}

const ASSIGNMENT: Readonly<Record<string, string>> = {
  typed: 'The assignment is the one typed in the record.', proposed: 'No assignment was typed; the engine proposes this one.', none: 'No assignment stands.',
};

export function measurementMeaning(measurement: MeasurementNode, id: string): MeasurementMeaning {
  const { chosen, complex } = measurement;
  const { row } = chosen;
  return {
    ground: row.ground === null ? null : termShown(row.ground, complex.ion.electrons),
    assignment: ASSIGNMENT[row.assignment] ?? row.assignment,
    transitions: transitionTable(measurement),
    parameters: (['Delta', 'B', 'C', 'beta'] as const).map((name) => parameterShown(chosen.parameters[name])),
    allWithheld: allWithheld(measurement), scheme: levelFigure(measurement, id),
    sentence: row.sentence === '' ? null : { parts: sentenceShown(row.sentence), text: sentenceText(row.sentence) },
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
  const combined = chosen.transitions.map(({ row }) => Math.hypot(Math.max(row.u_minus, row.u_plus), row.floor));
  const reach = Math.max(1, ...combined, ...chosen.transitions.map(({ row }) => Math.abs(row.residual ?? 0)));
  const fitted = chosen.transitions.some(({ row }) => row.residual !== null);
  const remarks = chosen.transitions.map(({ row, bands }) => partInFit(row.used === 1, row.calculated !== null, bands.length));
  return {
    caption: `Transitions, observed against calculated${fitted ? '; brackets span one standard uncertainty of reading and floor' : ''}`,
    columns: [rowColumn('To'), quantity('observed', 'cm-1', true), quantity('calculated', 'cm-1', true), quantity('obs. − calc.', 'cm-1', true), quantity('floor', 'cm-1', true), ...(remarks.every((text) => text === '') ? [] : [column('In the fit')])],
    rows: chosen.transitions.map(({ row }, index): readonly Cell[] => [
      { parts: termShown(row.label, complex.ion.electrons) },
      energyTwoSided(row.observed, row.u_minus, row.u_plus),
      row.calculated === null ? none : energy(row.calculated, null),
      row.residual === null ? none : { parts: words(difference(row.residual)), drawing: residualBar(row.residual, combined[index]!, reach) },
      energy(row.floor, null),
      ...(remarks.every((text) => text === '') ? [] : [remarks[index] === '' ? 'yes' : remarks[index]!]),
    ]),
  };
}

/** Whether there are fitted parameters and assigned bands to draw levels at. */
export function hasScheme({ chosen, complex }: MeasurementNode): boolean {
  const { electrons } = complex.ion;
  const { geometry } = chosen.row;
  return chosen.branches.some((one) => one.chosen === 1) && chosen.parameters.B.value !== null && electrons >= 1 && electrons <= 9
    && (geometry === 'octahedral' || geometry === 'tetrahedral') && chosen.transitions.length > 0;
}

/** The levels at the chosen solution with the observed bands; null without one. */
export function levelFigure(measurement: MeasurementNode, id: string): FigureShown | null {
  const { chosen, complex } = measurement;
  const branch = chosen.branches.find((one) => one.chosen === 1);
  const { electrons } = complex.ion;
  const { geometry, multiplicity, ground } = chosen.row;
  if (branch === undefined || !hasScheme(measurement) || (geometry !== 'octahedral' && geometry !== 'tetrahedral')) return null;
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
    caption: [`n = ${chosen.transitions.length}; ${conditions(measurement)}.`, 'Arrows end at the observed bands. Full strokes: same multiplicity as the ground level; dashed: others.', few.length < inReach.length ? 'Unassigned levels of other multiplicities are left out.' : ''],
    source: `Levels computed at the chosen solution, policy ${chosen.row.policy}.`, table: schemeTable(measurement, few), files: ownFigureFiles(complex.row.id, `${id}-levels`),
  };
}

function schemeTable({ chosen, complex }: MeasurementNode, shown: readonly { readonly label: string; readonly energy: number }[]): Table {
  const observed = new Map(chosen.transitions.flatMap(({ row }) => row.label.split('/').map((label) => [label, row.observed] as const)));
  return {
    caption: 'Levels of the figure, with the bands assigned to them',
    columns: [rowColumn('Level'), quantity('E', 'cm-1'), quantity('observed', 'cm-1', true)],
    rows: shown.map(({ label, energy: height }): readonly Cell[] => [{ parts: termShown(label, complex.ion.electrons) }, energy(height, null), observed.has(label) ? energy(observed.get(label)!, null) : soft('none')]),
  };
}
