import type { CollectionTree, ComplexNode, MeasurementNode, ReadingNode } from './tree.ts';
import { groupBy } from './group.ts';

/** Complexes of one ion, geometry and spin, or what was left out of them and why. */
export interface Series {
  readonly members: readonly MeasurementNode[];
  readonly leftOut: readonly { readonly measurement: MeasurementNode; readonly reason: string }[];
  /** What the members share, in words. */
  readonly conditions: string;
}

const ROOM = 295;
const REACH = 50;

/**
 * The measurements that may stand in one series: one number a complex, under the policy in force, in one phase class and
 * within 50 K of room temperature. The phase class with more complexes is taken (solution where equal). Of several
 * measurements of a complex the one with the smallest total uncertainty stands for it.
 * @param candidates measurements of like ion, geometry and spin
 */
export function seriesOf(tree: CollectionTree, candidates: readonly MeasurementNode[], parameter: 'Delta' | 'beta'): Series {
  const leftOut: { measurement: MeasurementNode; reason: string }[] = [];
  const keep = (rest: readonly MeasurementNode[], holds: (m: MeasurementNode) => boolean, reason: (m: MeasurementNode) => string): readonly MeasurementNode[] =>
    rest.filter((measurement) => {
      const kept = holds(measurement);
      if (!kept) leftOut.push({ measurement, reason: reason(measurement) });
      return kept;
    });
  const value = (measurement: MeasurementNode) => measurement.chosen.parameters[parameter];
  let rest = keep(candidates, (m) => value(m).value !== null, (m) => value(m).reason ?? 'withheld');
  rest = keep(rest, (m) => m.row.policy === tree.policy.id, (m) => `fitted under another policy: ${m.row.policy_reason ?? m.row.policy}`);
  rest = keep(rest, (m) => m.chosen.row.verdict !== 'refused', () => 'the reading is refused');
  rest = keep(rest, (m) => !m.chosen.cautions.some((caution) => caution.code === 'JAHN_TELLER_ENVELOPE'), () => 'one envelope stands for a transition that a Jahn–Teller distortion splits');
  const inSolution = new Set(rest.filter((m) => m.row.phase === 'solution').map((m) => m.complex.row.id));
  const inSolid = new Set(rest.filter((m) => m.row.phase !== 'solution').map((m) => m.complex.row.id));
  const solution = inSolution.size >= inSolid.size;
  rest = keep(rest, (m) => (m.row.phase === 'solution') === solution, (m) => `other phase: ${m.row.phase}`);
  rest = keep(rest, (m) => m.row.temperature_K !== null && Math.abs(m.row.temperature_K - ROOM) <= REACH,
    (m) => m.row.temperature_K === null ? 'temperature not recorded' : 'more than 50 K from room temperature');
  const best = new Map<string, MeasurementNode>();
  for (const measurement of rest) {
    const rival = best.get(measurement.complex.row.id);
    if (rival === undefined || (value(measurement).u_total ?? Infinity) < (value(rival).u_total ?? Infinity)) best.set(measurement.complex.row.id, measurement);
  }
  rest = keep(rest, (m) => best.get(m.complex.row.id) === m, () => 'another measurement of the complex is better determined');
  const members = [...rest].sort((a, b) => value(a).value! - value(b).value! || (a.complex.row.id < b.complex.row.id ? -1 : 1));
  return { members, leftOut, conditions: `${solution ? 'solution' : 'solid'}, within 50 K of room temperature` };
}

/**
 * Standard uncertainty of a difference of two like results. The model's error is common to results from the same transitions
 * with the same standing of C, so it drops out there and the policy's differential floor stands in for what remains;
 * elsewhere total uncertainties are taken.
 */
export function differenceU(tree: CollectionTree, a: ReadingNode, b: ReadingNode, parameter: 'Delta' | 'beta'): number | null {
  const [first, second] = [a.parameters[parameter], b.parameters[parameter]];
  if (first.value === null || second.value === null) return null;
  const like = transitionsOf(a) === transitionsOf(b) && a.parameters.C.standing === b.parameters.C.standing;
  if (like && first.u !== null && second.u !== null) {
    const floor = parameter === 'Delta' ? tree.policy.differential_Delta : tree.policy.differential_B * (first.value + second.value) / 2;
    return Math.hypot(first.u, second.u, floor);
  }
  return first.u_total === null || second.u_total === null ? null : Math.hypot(first.u_total, second.u_total);
}

function transitionsOf(reading: ReadingNode): string {
  return reading.transitions.filter((transition) => transition.row.used === 1).map((transition) => transition.row.label).sort().join(' ');
}

/** Measurements of one ion, geometry and spin. */
export interface Kind { readonly ion: string; readonly geometry: string; readonly spin: string | null; readonly measurements: readonly MeasurementNode[] }

/** What complexes of one kind share, as a key. */
export const kindKey = ({ row }: ComplexNode): string => `${row.ion}|${row.geometry}|${row.spin ?? ''}`;

export function kinds(measurements: readonly MeasurementNode[]): readonly Kind[] {
  const groups = groupBy(measurements.filter((m) => m.complex.row.fitted === 1), ({ complex }) => kindKey(complex));
  return [...groups.values()].map((members) => {
    const { ion, geometry, spin } = members[0]!.complex.row;
    return { ion, geometry, spin, measurements: members };
  });
}
