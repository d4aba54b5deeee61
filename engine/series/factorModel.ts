import { donorAtoms, ionKey } from './identity.ts';
import type { ComplexIdentity, SeriesParameter } from './types.ts';

/** A complex as the rule of average environment sees it: one ion, and each ligand's share of the donor atoms. */
export interface Composition {
  readonly ion: string;
  readonly shares: readonly { readonly ligand: string; readonly share: number }[];
}

/** The composition of a complex; shares add up to 1. */
export function compositionOfComplex(complex: ComplexIdentity): Composition {
  const atoms = complex.ligands.reduce((sum, ligand) => sum + donorAtoms(ligand), 0);
  return { ion: ionKey(complex), shares: complex.ligands.map((ligand) => ({ ligand: ligand.ligand, share: donorAtoms(ligand) / atoms })) };
}

/** The same with places of the unknowns; -1 is the ligand that is set to 1. */
export interface PlacedComposition {
  readonly ion: number;
  readonly ligands: Int32Array;
  readonly shares: Float64Array;
}

export interface ModelValue {
  /** ln Delta, or beta. */
  value: number;
  readonly places: number[];
  readonly derivatives: number[];
}

/**
 * Delta = g * sum(n f)/sum(n), in its logarithm with unknowns ln g and ln f; or beta = 1 - k * sum(n h)/sum(n), in beta itself with
 * unknowns k and h, so that a beta of 1 or more is a datum like any other. With exact derivatives.
 * Rule of average environment and factors: C. K. Jorgensen, Absorption Spectra and Chemical Bonding (1962), chapter 7 (chapter from memory).
 */
export function factorModel(parameter: SeriesParameter, at: PlacedComposition, unknowns: Float64Array): ModelValue {
  return parameter === 'Delta' ? logDelta(at, unknowns) : betaValue(at, unknowns);
}

function logDelta({ ion, ligands, shares }: PlacedComposition, unknowns: Float64Array): ModelValue {
  const places = [ion];
  const derivatives = [1];
  let average = 0;
  for (let i = 0; i < ligands.length; i++) average += shares[i]! * (ligands[i] === -1 ? 1 : Math.exp(unknowns[ligands[i]!]!));
  for (let i = 0; i < ligands.length; i++) {
    if (ligands[i] === -1) continue;
    places.push(ligands[i]!);
    derivatives.push((shares[i]! * Math.exp(unknowns[ligands[i]!]!)) / average);
  }
  return { value: unknowns[ion]! + Math.log(average), places, derivatives };
}

function betaValue({ ion, ligands, shares }: PlacedComposition, unknowns: Float64Array): ModelValue {
  const k = unknowns[ion]!;
  const places = [ion];
  let average = 0;
  for (let i = 0; i < ligands.length; i++) average += shares[i]! * (ligands[i] === -1 ? 1 : unknowns[ligands[i]!]!);
  const derivatives = [-average];
  for (let i = 0; i < ligands.length; i++) {
    if (ligands[i] === -1) continue;
    places.push(ligands[i]!);
    derivatives.push(-k * shares[i]!);
  }
  return { value: 1 - k * average, places, derivatives };
}

/** A number and its uncertainty in the scale of the model. */
export function toModelScale(parameter: SeriesParameter, value: number, u: number): { readonly value: number; readonly u: number } {
  return parameter === 'Delta' ? { value: Math.log(value), u: u / value } : { value, u };
}

/** Back from the scale of the model: Delta in cm-1, or beta. */
export function fromModelScale(parameter: SeriesParameter, value: number, u: number): { readonly value: number; readonly u: number } {
  return parameter === 'Delta' ? { value: Math.exp(value), u: Math.exp(value) * u } : { value, u };
}
