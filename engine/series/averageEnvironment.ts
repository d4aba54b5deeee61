import { averageEnvironmentReason } from '../words/factors.ts';
import { compositionOfComplex } from './factorModel.ts';
import { donorAtoms, ionKey, onlyLigand } from './identity.ts';
import type { Predicted } from './predictFromFactors.ts';
import type { FactorScatter } from './factorTypes.ts';
import { effectiveDegrees } from './student.ts';
import type { ComplexIdentity, SeriesParameter, SeriesResult } from './types.ts';

/** Complexes with one kind of ligand, by ion in its spin state, ligand and donor atoms. */
export type Parents = ReadonlyMap<string, SeriesResult>;

const parentKey = (ion: string, ligand: string, atoms: number): string => `${ion} | ${ligand} | ${atoms}`;

/**
 * The complexes from which averages can be taken.
 *
 * @param members results that may be compared, one for each complex
 */
export function parentsOf(members: readonly SeriesResult[]): Parents {
  return new Map(members.flatMap((member) => {
    const ligand = onlyLigand(member.complex);
    return ligand === null ? [] : [[parentKey(ionKey(member.complex), ligand, donorAtoms(member.complex.ligands[0]!)), member] as const];
  }));
}

/**
 * Delta or beta of a complex with several kinds of ligand from the measured complexes of the same ion with one kind each: the average
 * over the donor atoms (rule of average environment; C. K. Jorgensen, Absorption Spectra and Chemical Bonding (1962)). Its uncertainty is
 * theirs and the residual scatter of the factor fit, which follows the same rule.
 *
 * @returns the reason in words where the complex has one kind of ligand alone, or where one of the parents is not measured
 */
export function averageEnvironment(complex: ComplexIdentity, parameter: SeriesParameter, parents: Parents, scatter: FactorScatter): Predicted {
  if (complex.ligands.length === 1) return { reason: averageEnvironmentReason.oneLigand };
  const atoms = complex.ligands.reduce((sum, ligand) => sum + donorAtoms(ligand), 0);
  const each = compositionOfComplex(complex).shares.map(({ ligand, share }) => ({ ligand, share, found: parents.get(parentKey(ionKey(complex), ligand, atoms)) }));
  const missing = each.filter(({ found }) => found === undefined).map(({ ligand }) => ligand);
  if (missing.length > 0) return { reason: averageEnvironmentReason.noParent(complex.ion.name, missing) };
  const predicted = each.reduce((sum, { share, found }) => sum + share * found!.parameters[parameter].value!, 0);
  const own = Math.hypot(...each.map(({ share, found }) => share * found!.parameters[parameter].uTotal!));
  const spread = scatter.value * (parameter === 'Delta' ? predicted : 1);
  const degrees = scatter.standing === 'fitted' && spread > 0 ? effectiveDegrees(spread ** 2 / (spread ** 2 + own ** 2), scatter.spare) : null;
  return { predicted, u: Math.hypot(own, spread), degrees };
}
