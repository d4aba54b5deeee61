import { type Ion, aquaLigand, freeIonsIn } from '#engine';
import { type ComparedComplex, type ComparedMeasurement, type PackedCollection, packResults } from '../client/compare/compareData.ts';
import { resultOf } from './comparable.ts';
import { conditions } from './conditions.ts';
import { policyOf } from './policy.ts';
import { stripRow, stripTitle } from './strip.ts';
import type { CollectionTree, ComplexNode, MeasurementNode } from './tree.ts';
import { typedRecord } from './typedRecord.ts';

/** The whole collection for placing a new complex, file data/compare.json. */
export function comparedCollection(tree: CollectionTree): PackedCollection {
  const policy = policyOf(tree.policy);
  const ions = tree.ions.map(({ shell, ...ion }): Ion => ({ ...ion, row: shell as Ion['row'] }));
  const ligands = tree.ligands.map(({ id, name, formula, abbreviation, charge, denticity, donors }) => ({ id, name, formula, abbreviation, charge, denticity, donors: JSON.parse(donors) as string[] }));
  const results = tree.complexes.flatMap(({ measurements }) => measurements).map((node) => resultOf(tree, node));
  return {
    policy, policyId: tree.policy.id, aqua: aquaLigand(ligands), freeIons: freeIonsIn(policy.freeIons),
    parentRatios: Object.fromEntries(freeIonsIn('published').flatMap(({ ion, racahB0, racahC0 }) => racahC0 === null ? [] : [[ion, racahC0 / racahB0]])),
    ligands, ions, sources: [...tree.sources.keys()], ...packResults(results, ligands, ions),
  };
}

/** One complex for the compare page, file data/compare/ID.json. */
export function comparedComplex(tree: CollectionTree, complex: ComplexNode): ComparedComplex {
  return {
    formula: complex.formula,
    typed: complex.measurements.map(typedRecord),
    measurements: complex.measurements.map((node) => comparedMeasurement(tree, node)),
  };
}

function comparedMeasurement(tree: CollectionTree, node: MeasurementNode): ComparedMeasurement {
  const { chosen, row } = node;
  const branch = chosen.branches.find((one) => one.chosen === 1);
  return {
    id: row.id, conditions: conditions(node), result: resultOf(tree, node), strip: stripRow(node), stripTitle: stripTitle(node),
    solution: branch === undefined || chosen.parameters.B.value === null ? null : { delta: branch.Delta, racahB: branch.B, racahC: branch.C },
    ground: chosen.row.ground,
    transitions: chosen.transitions.map((one) => ({ label: one.row.label, observed: one.row.observed, used: one.row.used === 1 })),
    reason: chosen.row.reason,
  };
}
