import type { FactorComplex, FactorFit, FactorKind } from './factorTypes.ts';
import { donorAtoms, ionKey, onlyLigand } from './identity.ts';
import { possiblePrediction, predictFromFactors } from './predictFromFactors.ts';
import type { Predicted } from './predictFromFactors.ts';
import type { ComplexIdentity } from './types.ts';

/** What a collection says of one ion with one kind of ligand alone. */
export interface MapCell {
  /** As `ionKey` gives it. */
  readonly ion: string;
  readonly ligand: string;
  /** The complex of the fit that has this ligand alone; null where there is none. */
  readonly found: FactorComplex | null;
  /** From all complexes but that one, or the reason why there is no prediction. */
  readonly predicted: Predicted;
}

/** Ions against ligands, each in the order of its factors; those without a value stand last. */
export interface FactorMap {
  readonly ions: readonly string[];
  readonly ligands: readonly string[];
  /** One row for each ion, one cell for each ligand. */
  readonly rows: readonly (readonly MapCell[])[];
}

const noOther: Predicted = { reason: 'without its own data nothing fixes its factors' };

/** Every ion of a fit with every ligand of it alone: what was found, and what the factors of the other complexes predict. */
export function factorMap(fit: FactorFit): FactorMap {
  const complexOf = new Map(fit.complexes.map(({ result: { complex } }) => [ionKey(complex), complex]));
  const found = new Map(fit.complexes.flatMap((one) => {
    const ligand = onlyLigand(one.result.complex);
    return ligand === null ? [] : [[`${ionKey(one.result.complex)} | ${ligand}`, one] as const];
  }));
  const [ions, ligands] = [namesInOrder(fit, 'ion'), namesInOrder(fit, 'ligand')];
  return {
    ions, ligands,
    rows: ions.map((ion) => ligands.map((ligand): MapCell => {
      const own = found.get(`${ion} | ${ligand}`) ?? null;
      return { ion, ligand, found: own, predicted: own === null ? predictFromFactors(fit, withOnly(complexOf.get(ion)!, ligand)) : own.leftOut === null ? noOther : possiblePrediction(fit.parameter, own.leftOut) };
    })),
  };
}

function namesInOrder(fit: FactorFit, kind: FactorKind): readonly string[] {
  const last = Number.MAX_VALUE;
  return fit.factors.filter((one) => one.kind === kind)
    .sort((a, b) => (a.value ?? last) - (b.value ?? last) || (a.name < b.name ? -1 : 1)).map(({ name }) => name);
}

/** The same ion with one kind of ligand at all its places. The rule knows shares alone, so one donor atom each will do. */
function withOnly(complex: ComplexIdentity, ligand: string): ComplexIdentity {
  const atoms = complex.ligands.reduce((sum, one) => sum + donorAtoms(one), 0);
  return { ...complex, id: '', formula: '', isomer: 'none', ligands: [{ ligand, count: atoms, bound: 1 }] };
}
