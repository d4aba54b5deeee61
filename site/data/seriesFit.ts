import { type FactorFit, type Geometry, type Policy, type SeriesLigand, type SeriesParameter, type SeriesResult, aquaLigand, fitFactors } from '#engine';
import { resultOf } from './comparable.ts';
import { oncePerCollection } from './memo.ts';
import type { LigandRow } from './rows.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';

const nodes = oncePerCollection((tree): ReadonlyMap<SeriesResult, MeasurementNode> =>
  new Map(tree.complexes.flatMap(({ measurements }) => measurements).map((node) => [resultOf(tree, node), node])));

/** The measurement that an engine's result was made of. */
export const nodeOf = (tree: CollectionTree, result: SeriesResult): MeasurementNode => nodes(tree).get(result)!;

/** The policy's floor on differences of like results. */
export const floorOf = ({ policy }: CollectionTree): Policy['differentialFloor'] => ({ delta: policy.differential_Delta, racahB: policy.differential_B });

/** A ligand as the engine recognises it. */
export const seriesLigand = ({ id, name, formula, charge, donors }: LigandRow): SeriesLigand => ({ id, name, formula, charge, donors: JSON.parse(donors) as string[] });

const fits = oncePerCollection((tree, key): FactorFit => {
  const [parameter, geometry] = key.split(' ') as [SeriesParameter, Geometry];
  const results = [...nodes(tree).keys()].filter(({ complex }) => complex.geometry === geometry);
  return fitFactors(results, { parameter, geometry, policy: tree.policy.id, aqua: aquaLigand(tree.ligands.map(seriesLigand)) });
});

/**
 * The factors of the collection, fitted by the same function and from the same results as those of the database, which keeps no
 * covariance. A test holds the two against each other.
 */
export const factorFitOf = (tree: CollectionTree, parameter: SeriesParameter, geometry: Geometry): FactorFit => fits(tree, `${parameter} ${geometry}`);

/** Geometries in the order of the book. */
export const geometries: readonly Geometry[] = ['octahedral', 'tetrahedral'];
