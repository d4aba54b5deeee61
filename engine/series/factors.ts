// The group's own f, g, h and k.

import type { Geometry } from '../ions/types.ts';
import { combinationShown, factorReason } from '../words/factors.ts';
import { zOf } from './difference.ts';
import { factorModel, fromModelScale, toModelScale, compositionOfComplex } from './factorModel.ts';
import type { Composition, PlacedComposition } from './factorModel.ts';
import { factorRows } from './factorRows.ts';
import type { Factor, FactorComplex, FactorFit, FactorIsland, FactorKind } from './factorTypes.ts';
import { identifiable, isFixed } from './identifiable.ts';
import type { Identifiable } from './identifiable.ts';
import { donorAtoms } from './identity.ts';
import { islandsOf } from './islands.ts';
import { fullLeverage, scatterWithout } from './leaveOneOut.ts';
import { isLoose } from './looseness.ts';
import { normalEquations, solveIsland } from './normalEquations.ts';
import { fitWithScatter } from './scatter.ts';
import type { ScatterFit, WeighedIsland } from './scatter.ts';
import { normalOfStudent } from './student.ts';
import type { SeriesParameter, SeriesResult } from './types.ts';

export interface FactorOrder {
  readonly parameter: SeriesParameter;
  readonly geometry: Geometry;
  /** Id of the policy in force: results of another one stay out. */
  readonly policy: string;
  /** Ligand id of water, whose f and h are 1; null where the collection has none. */
  readonly aqua: string | null;
}

interface Island extends WeighedIsland {
  readonly rows: readonly SeriesResult[];
  readonly compositions: readonly Composition[];
  readonly gauge: string;
  readonly ions: readonly string[];
  readonly ligands: readonly string[];
  readonly names: readonly { readonly kind: FactorKind; readonly name: string }[];
  readonly start: Float64Array;
}

/**
 * Factors of ions and ligands by weighted least squares over the collection, with the residual scatter, for Delta (f, g) or beta (h, k).
 *
 * ln Delta = ln g + ln(sum n f/sum n) or beta = 1 - k sum n h/sum n, n the donor atoms of a ligand (rule of average environment),
 * weights 1/(u^2 + s^2). Islands of ions and ligands that no complex links are fitted apart, each with one ligand set to 1: water
 * where the island has it, else the ligand in most of its complexes. What an island's complexes do not fix has no value.
 */
export function fitFactors(results: readonly SeriesResult[], order: FactorOrder): FactorFit {
  const { members, leftOut } = factorRows(results, order.parameter, order.geometry, order.policy);
  const compositions = members.map(({ complex }) => compositionOfComplex(complex));
  const numbers = islandsOf(compositions.map(({ ion, shares }) => [`ion ${ion}`, ...shares.map(({ ligand }) => `ligand ${ligand}`)]));
  const islands = Array.from({ length: numbers.reduce((most, number) => Math.max(most, number + 1), 0) }, (_, number) => {
    const own = members.flatMap((row, i) => (numbers[i] === number ? [{ row, composition: compositions[i]! }] : []));
    return makeIsland(own.map(({ row }) => row), own.map(({ composition }) => composition), order);
  });
  const equal = islands.map((island) => solveIsland(island.data, new Float64Array(island.rows.length).fill(1), island.start).unknowns);
  const spare = islands.reduce((sum, island, i) =>
    sum + island.rows.length - rankOf(island, equal[i]!, new Float64Array(island.rows.length).fill(1)).rank, 0);
  const fit = fitWithScatter(islands, equal, order.parameter, spare);
  const ranks = islands.map((island, i) => rankOf(island, fit.unknowns[i]!, fit.weights[i]!));
  const complexes = islands.map((island, i) => island.rows.map((_, row) => complexInFit(island, i, row, fit, ranks[i]!)));
  const byMember = new Map(complexes.flat().map((one) => [one.result, one]));
  return {
    parameter: order.parameter, geometry: order.geometry, policy: order.policy, scatter: fit.scatter,
    islands: islands.map((island, i) => shownIsland(island, i, fit, ranks[i]!, order)),
    factors: islands.flatMap((island, i) => factorsOf(island, i, fit.unknowns[i]!, ranks[i]!, complexes[i]!, order))
      .sort((a, b) => (a.kind !== b.kind ? (a.kind === 'ion' ? -1 : 1) : a.name < b.name ? -1 : 1)),
    complexes: members.map((row) => byMember.get(row)!),
    leftOut,
  };
}

function makeIsland(rows: readonly SeriesResult[], compositions: readonly Composition[], { parameter, aqua }: FactorOrder): Island {
  const ions = [...new Set(compositions.map(({ ion }) => ion))].sort();
  const ligands = [...new Set(compositions.flatMap(({ shares }) => shares.map(({ ligand }) => ligand)))].sort();
  const gauge = aqua !== null && ligands.includes(aqua) ? aqua : mostConnected(ligands, compositions);
  const free = ligands.filter((ligand) => ligand !== gauge);
  const names = [...ions.map((name) => ({ kind: 'ion' as const, name })), ...free.map((name) => ({ kind: 'ligand' as const, name }))];
  const ionPlaces = new Map(ions.map((name, i) => [name, i]));
  const ligandPlaces = new Map(free.map((name, i) => [name, ions.length + i]));
  const placed = compositions.map(({ ion, shares }): PlacedComposition => ({
    ion: ionPlaces.get(ion)!, ligands: Int32Array.from(shares, ({ ligand }) => ligandPlaces.get(ligand) ?? -1), shares: Float64Array.from(shares, ({ share }) => share),
  }));
  const scaled = rows.map(({ parameters }) => toModelScale(parameter, parameters[parameter].value!, parameters[parameter].uTotal!));
  const found = Float64Array.from(scaled, ({ value }) => value);
  return {
    rows, compositions, gauge, ions, ligands, names, start: startOf(parameter, placed, found, ions.length, names.length),
    data: { parameter, compositions: placed, found, size: names.length }, u: Float64Array.from(scaled, ({ u }) => u),
  };
}

/** Every ligand like the one set to 1; every ion then by the mean of its complexes. */
function startOf(parameter: SeriesParameter, placed: readonly PlacedComposition[], found: Float64Array, ions: number, size: number): Float64Array {
  const start = new Float64Array(size).fill(parameter === 'Delta' ? 0 : 1);
  const [sums, counts] = [new Float64Array(ions), new Float64Array(ions)];
  placed.forEach(({ ion }, i) => {
    sums[ion]! += parameter === 'Delta' ? found[i]! : 1 - found[i]!;
    counts[ion]! += 1;
  });
  for (let i = 0; i < ions; i++) start[i] = sums[i]! / counts[i]!;
  return start;
}

function mostConnected(ligands: readonly string[], compositions: readonly Composition[]): string {
  const counts = new Map(ligands.map((ligand) => [ligand, 0]));
  for (const { shares } of compositions) for (const { ligand } of shares) counts.set(ligand, counts.get(ligand)! + 1);
  return ligands.reduce((best, ligand) => (counts.get(ligand)! > counts.get(best)! ? ligand : best));
}

function rankOf({ data }: Island, unknowns: Float64Array, weights: Float64Array): Identifiable {
  return identifiable(normalEquations(data, weights, unknowns).matrix, data.size);
}

function complexInFit(island: Island, number: number, row: number, fit: ScatterFit, { covariance }: Identifiable): FactorComplex {
  const { parameter } = island.data;
  const { value, places, derivatives } = factorModel(parameter, island.data.compositions[row]!, fit.unknowns[number]!);
  const weight = fit.weights[number]![row]!;
  let variance = 0;
  for (let a = 0; a < places.length; a++) for (let b = 0; b < places.length; b++) variance += derivatives[a]! * derivatives[b]! * covariance[places[a]!]![places[b]!]!;
  const leverage = Math.min(1, weight * variance);
  const residual = island.data.found[row]! - value;
  const common = { result: island.rows[row]!, island: number + 1, fitted: fromModelScale(parameter, value, 0).value, residual, leverage };
  if (1 - leverage < fullLeverage) return { ...common, leftOut: null };
  const rest = scatterWithout(fit, (weight * residual ** 2) / (1 - leverage));
  const u = Math.sqrt((rest.factor * variance) / (1 - leverage) + rest.scatter ** 2);
  if (isLoose(parameter, 'prediction', u)) return { ...common, leftOut: null };
  const deleted = residual / (1 - leverage);
  const predicted = fromModelScale(parameter, island.data.found[row]! - deleted, u);
  const z = normalOfStudent(zOf(deleted, Math.hypot(u, island.u[row]!)), rest.degrees);
  return { ...common, leftOut: { predicted: predicted.value, u: predicted.u, degrees: rest.degrees, z } };
}

function shownIsland(island: Island, number: number, fit: ScatterFit, rank: Identifiable, { aqua }: FactorOrder): FactorIsland {
  return {
    number: number + 1, gauge: island.gauge, gaugeIsAqua: island.gauge === aqua, ions: island.ions, ligands: island.ligands,
    complexes: island.rows.length, rank: rank.rank, spare: island.rows.length - rank.rank,
    solution: { names: island.names, values: [...fit.unknowns[number]!], covariance: rank.covariance, open: rank.open, scale: rank.scale },
  };
}

function factorsOf(
  island: Island, number: number, unknowns: Float64Array, rank: Identifiable, complexes: readonly FactorComplex[], { parameter, aqua }: FactorOrder,
): Factor[] {
  const gauge = { kind: 'ligand' as const, name: island.gauge };
  return [...island.names, gauge].map(({ kind, name }): Factor => {
    const behind = complexes.filter((_, i) => holds(island.compositions[i]!, kind, name));
    const tested = behind.some(({ leverage }) => 1 - leverage >= fullLeverage);
    const isGauge = kind === 'ligand' && name === island.gauge;
    const place = island.names.findIndex((one) => one.kind === kind && one.name === name);
    const fixed = isGauge || isFixed(island.names.map((_, j) => (j === place ? 1 : 0)), rank);
    const u = isGauge || !fixed ? 0 : Math.sqrt(rank.covariance[place]![place]!);
    const loose = isLoose(parameter, kind, u);
    const combinations = fixed ? null : fixedCombinations(behind, parameter);
    const reason = factorReason({ gauge: isGauge, gaugeIsAqua: island.gauge === aqua, complexes: behind.length, tested, combinations, loose });
    const common = { kind, name, complexes: behind.length, island: number + 1, gauge: isGauge, tested, reason };
    if (isGauge) return { ...common, value: 1, u: 0 };
    if (!fixed || loose) return { ...common, value: null, u: null };
    return { ...common, ...fromModelScale(parameter, unknowns[place]!, u) };
  });
}

const holds = ({ ion, shares }: Composition, kind: FactorKind, name: string): boolean => (kind === 'ion' ? ion === name : shares.some(({ ligand }) => ligand === name));

/** At most this many combinations are named. */
const combinationsNamed = 3;

/** What is fixed where a factor itself is not: what each complex that holds it says of the product. */
function fixedCombinations(behind: readonly FactorComplex[], parameter: SeriesParameter): readonly string[] {
  const symbols = parameter === 'Delta' ? (['g', 'f'] as const) : (['k', 'h'] as const);
  const shown = behind.map(({ result: { complex } }) =>
    combinationShown(symbols, compositionOfComplex(complex).ion, complex.ligands.map((ligand) => ({ name: ligand.ligand, atoms: donorAtoms(ligand) }))));
  return [...new Set(shown)].slice(0, combinationsNamed);
}
