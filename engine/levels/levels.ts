import type { Geometry } from '../ions/types.ts';
import { blockDegeneracy, shellBlocks } from '../shell/blocks.ts';
import type { Block } from '../shell/blocks.ts';
import { blockParents } from './parents.ts';
import { solveBlock } from './solve.ts';

/** A d^n configuration in a cubic field. */
export interface FieldIon {
  /** Number of d electrons, 1 to 9. */
  readonly electrons: number;
  readonly geometry: Geometry;
}

/** Parameters of the ligand field in cm-1; `delta` is Delta_o or Delta_t, positive in both geometries. */
export interface FieldParameters {
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
}

export interface Gradient {
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
}

/** One level of the ion in the field. */
export interface Level {
  /** Letter form: letter, multiplicity, irreducible representation, "a4T1g". */
  readonly label: string;
  readonly multiplicity: number;
  /** "T1g"; "T1" in a tetrahedral field. */
  readonly irrep: string;
  /** Place in its block, counted from 1 at the lowest, the ground level included. */
  readonly index: number;
  /** Free-ion term letter at Delta -> 0 at the given C/B, primes by energy; null where terms coincide. */
  readonly parent: string | null;
  /** cm-1 above the lowest level. */
  readonly energy: number;
  /** Exact derivatives of `energy`, the transition energy. */
  readonly gradient: Gradient;
  /** Mean number of electrons in e orbitals. */
  readonly eElectrons: number;
  /** Number of states: spin times irreducible representation. */
  readonly degeneracy: number;
}

/** +1 octahedral, -1 tetrahedral: the sign with which Delta enters. */
export const fieldSign = (geometry: Geometry): 1 | -1 => (geometry === 'octahedral' ? 1 : -1);

/** "T1g" in an octahedral field, "T1" in a tetrahedral one. */
export const irrepName = (irrep: string, geometry: Geometry): string => (geometry === 'octahedral' ? `${irrep}g` : irrep);

/** Letter form of the level with the given place (from 1) in its block. */
export function levelLabel(block: Pick<Block, 'multiplicity' | 'irrep'>, index: number, geometry: Geometry): string {
  return `${String.fromCharCode(96 + index)}${block.multiplicity}${irrepName(block.irrep, geometry)}`;
}

function requireParameter(name: string, value: number): void {
  if (!Number.isFinite(value) || value < 0) throw new RangeError(`${name}: ${value} is not a finite number of at least 0`);
}

/**
 * All levels of a d^n ion in an octahedral or tetrahedral field, ascending from the lowest at 0.
 *
 * H = Delta * H_field + B * H_B + C * H_C on the whole configuration; the symmetry blocks are derived from
 * determinants (engine/shell). No spin-orbit coupling, no lower symmetry.
 *
 * @param ion number of d electrons (1 to 9) and geometry
 * @param parameters Delta, B and C in cm-1, finite and at least 0
 * @returns one entry a level, degenerate components counted once; energies good to 1e-12 of the highest
 * @throws RangeError for parameters or electron numbers outside their range
 */
export function levels(ion: FieldIon, parameters: FieldParameters): readonly Level[] {
  const { electrons, geometry } = ion;
  const { delta, racahB, racahC } = parameters;
  requireParameter('delta', delta);
  requireParameter('racahB', racahB);
  requireParameter('racahC', racahC);
  const sign = fieldSign(geometry);
  const repulsion = racahB + racahC;
  const found = shellBlocks(electrons).flatMap((block) => {
    const solution = solveBlock(block, sign, delta, racahB, racahC);
    const parents = repulsion > 0 ? blockParents(block, racahB / repulsion, racahC / repulsion, 1e-9) : null;
    return Array.from({ length: block.size }, (_, i) => {
      const letters = parents?.[i]?.letters ?? [];
      return {
        label: levelLabel(block, i + 1, geometry),
        multiplicity: block.multiplicity,
        irrep: irrepName(block.irrep, geometry),
        index: i + 1,
        parent: letters.length === 1 ? letters[0]! : null,
        absolute: solution.energy[i]!,
        gradient: { delta: solution.field[i]!, racahB: solution.racahB[i]!, racahC: solution.racahC[i]! },
        eElectrons: 0.4 * electrons + sign * solution.field[i]!,
        degeneracy: blockDegeneracy(block),
      };
    });
  });
  found.sort((a, b) => a.absolute - b.absolute);
  const lowest = found[0]!;
  return found.map(({ absolute, gradient, ...level }) => ({
    ...level,
    energy: absolute - lowest.absolute,
    gradient: {
      delta: gradient.delta - lowest.gradient.delta,
      racahB: gradient.racahB - lowest.gradient.racahB,
      racahC: gradient.racahC - lowest.gradient.racahC,
    },
  }));
}
