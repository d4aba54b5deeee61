import type { Geometry } from '../ions/types.ts';

/** A ratio of two spin-allowed bands that the model confines, whatever Delta and B are. Labels in letter form. */
export interface RatioWindow {
  readonly upper: string;
  readonly lower: string;
  /** null: not confined on that side. */
  readonly least: number | null;
  readonly most: number | null;
}

/** The A2-ground window: nu2/nu1 up to 1.8 (weak field), nu3/nu1 down to 2 (strong field). */
function ofA2Ground(spin: number, g: string): readonly RatioWindow[] {
  return [
    { upper: `a${spin}T1${g}`, lower: `a${spin}T2${g}`, least: 1, most: 1.8 },
    { upper: `b${spin}T1${g}`, lower: `a${spin}T2${g}`, least: 2, most: null },
  ];
}

/** The T1-ground window: E(A2)/E(T2) from 2 (strong field) to 2.25 (weak field), E(T1 P)/E(T2) down to 1. */
function ofT1Ground(spin: number, g: string): readonly RatioWindow[] {
  return [
    { upper: `a${spin}A2${g}`, lower: `a${spin}T2${g}`, least: 2, most: 2.25 },
    { upper: `b${spin}T1${g}`, lower: `a${spin}T2${g}`, least: 1, most: null },
  ];
}

/**
 * The windows of high-spin d2, d3, d7 and d8; none for other ions. They follow from the spin-allowed blocks alone: their limits are
 * those of the closed forms for Delta/B to 0 and to infinity.
 */
export function ratioWindows({ electrons, geometry, multiplicity }: { readonly electrons: number; readonly geometry: Geometry; readonly multiplicity: number }): readonly RatioWindow[] {
  const spin = Math.min(electrons, 10 - electrons) + 1;
  if (![2, 3, 7, 8].includes(electrons) || multiplicity !== spin) return [];
  const g = geometry === 'octahedral' ? 'g' : '';
  // An octahedral d3 or d8 ion and a tetrahedral d2 or d7 ion have an A2 ground level; the others have T1.
  const hasA2Ground = (electrons === 3 || electrons === 8) === (geometry === 'octahedral');
  return hasA2Ground ? ofA2Ground(spin, g) : ofT1Ground(spin, g);
}

/** Whether a ratio lies outside its window. */
export function isOutside({ least, most }: RatioWindow, ratio: number): boolean {
  return (least !== null && ratio < least) || (most !== null && ratio > most);
}
