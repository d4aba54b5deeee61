import {
  type ComplexIdentity, type Difference, type Geometry, type SeriesNumber, type SeriesParameter, type SeriesResult, type Subject, type UnlikeKind,
  comparisonCautions, conditionWords, difference, ionKey, ionSubject, ionWords, ligandSubject, parametersByName, temperatureReach, usedTransitions, usualSeries,
} from '#engine';
import { groupBy } from './group.ts';
import { oncePerCollection } from './memo.ts';
import type { ParameterRow } from './rows.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';

/** A measurement with its chosen reading as the engine compares it. */
export interface Compared {
  readonly node: MeasurementNode;
  readonly result: SeriesResult;
}

/** Measurements that may stand in one series, what they share, and what was left out of it and why. */
export interface Series {
  readonly members: readonly MeasurementNode[];
  readonly leftOut: readonly { readonly measurement: MeasurementNode; readonly kind: UnlikeKind; readonly reason: string }[];
  readonly conditions: string;
}

/** Every measurement of the collection, ready to be compared. */
const comparedResults = oncePerCollection((tree): ReadonlyMap<MeasurementNode, SeriesResult> =>
  new Map(tree.complexes.flatMap((complex) => complex.measurements).map((node) => [node, seriesResultOf(node)])));

function seriesResultOf(node: MeasurementNode): SeriesResult {
  const { row, chosen, complex } = node;
  return {
    complex: identity(complex), measurement: row.id, phase: row.phase as SeriesResult['phase'], temperature: row.temperature_K, policy: row.policy,
    verdict: chosen.row.verdict as SeriesResult['verdict'],
    parameters: parametersByName(Object.values(chosen.parameters).map(numberOf)),
    correlation: chosen.correlations.find(({ first, second }) => first === 'Delta' && second === 'B')?.value ?? null,
    transitions: usedTransitions(chosen.transitions.map(({ row: { label, used } }) => ({ label, used: used === 1 }))),
    cautions: comparisonCautions(chosen.cautions.map(({ code }) => code)),
  };
}

function numberOf({ name, value, u, u_total, standing, reason }: ParameterRow): SeriesNumber & { readonly name: ParameterRow['name'] } {
  return { name, value, u, uTotal: u_total, standing: standing as SeriesNumber['standing'], reason };
}

function identity({ row, ion, ligands, measurements }: ComplexNode): ComplexIdentity {
  return {
    id: row.id, formula: row.formula, geometry: row.fitted === 1 ? row.geometry as Geometry : null, geometryName: row.geometry, isomer: row.isomer,
    // A complex has one spin state: where none was typed, that of its first measurement's reading.
    multiplicity: row.multiplicity ?? measurements[0]?.chosen.row.multiplicity ?? null,
    ion: { name: ion.name, metal: ion.metal, oxidation: ion.oxidation, electrons: ion.electrons, row: ion.shell as '3d' | '4d' | '5d' },
    ligands: ligands.map(({ row: { ligand, count, bound } }) => ({ ligand, count, bound })),
  };
}

function series(tree: CollectionTree, nodes: readonly MeasurementNode[], parameter: SeriesParameter, subject: Subject): Series {
  const known = comparedResults(tree);
  const byResult = new Map(nodes.map((node) => [known.get(node)!, node]));
  const { members, leftOut, frame } = usualSeries([...byResult.keys()], parameter, subject);
  return {
    members: members.map((result) => byResult.get(result)!),
    leftOut: leftOut.map(({ result, kind, reason }) => ({ measurement: byResult.get(result)!, kind, reason })),
    conditions: conditionWords(frame.phase, frame.temperature.near, temperatureReach, frame.temperature.orNotRecorded),
  };
}

/** Measurements of one ion in one geometry and spin state. */
export interface Kind {
  /** As the addresses of figures use it, "cr-iii-octahedral-quartet". */
  readonly key: string;
  /** "Cr(III), octahedral, quartet" */
  readonly words: string;
  readonly ion: string;
  readonly measurements: readonly MeasurementNode[];
}

/** Every ion of the collection in each fitted geometry and spin state. */
export const kinds = oncePerCollection((tree): readonly Kind[] => {
  const fitted = tree.complexes.filter(({ row }) => row.fitted === 1).flatMap((complex) => complex.measurements);
  return [...groupBy(fitted, ({ complex }) => ionKey(identity(complex)))].map(([key, measurements]) => ({
    key, words: ionWords(identity(measurements[0]!.complex)), ion: measurements[0]!.complex.ion.name, measurements,
  }));
});

export const kindOf = (tree: CollectionTree, complex: ComplexNode): Kind | undefined => kinds(tree).find(({ key }) => key === ionKey(identity(complex)));

/** The usual series by ligand set of one kind; the engine decides what is like. */
export function seriesOfKind(tree: CollectionTree, { measurements }: Kind, parameter: SeriesParameter): Series {
  return series(tree, measurements, parameter, ionSubject(identity(measurements[0]!.complex), tree.policy.id));
}

/** The usual series by metal of complexes that hold the same ligands in one geometry. */
export function seriesByMetal(tree: CollectionTree, complexes: readonly ComplexNode[], parameter: SeriesParameter): Series {
  return series(tree, complexes.flatMap((complex) => complex.measurements), parameter, ligandSubject(identity(complexes[0]!), tree.policy.id));
}

/** A measurement's chosen reading as the engine compares it. */
export const resultOf = (tree: CollectionTree, node: MeasurementNode): SeriesResult => comparedResults(tree).get(node)!;

/** First less second, with the uncertainty that belongs to it; null where one is withheld. */
export function differenceOf(tree: CollectionTree, first: MeasurementNode, second: MeasurementNode, parameter: SeriesParameter): Difference | null {
  const known = comparedResults(tree);
  return difference(known.get(first)!, known.get(second)!, parameter, { delta: tree.policy.differential_Delta, racahB: tree.policy.differential_B });
}
