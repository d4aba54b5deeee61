// What a spectrum shows of the true transitions: which bands are seen, as what, how wide and how strong.

import { ligandEntry } from './ligands.ts';
import { ionNamed, metalEntry } from './metalIons.ts';
import { randomFrom } from './random.ts';
import type { Random } from './random.ts';
import type { Recipe } from './recipes.ts';
import { isCold } from './settings.ts';
import type { Setting } from './settings.ts';
import { componentsOf } from './splitting.ts';
import type { Transition, Truth } from './truth.ts';

export interface SeenBand {
  /** Letter form; null for charge transfer. */
  readonly label: string | null;
  /** As read, cm-1, not yet rounded. */
  readonly position: number;
  readonly kind: 'maximum' | 'shoulder' | 'line' | 'component' | 'envelope';
  readonly side: 'higher' | 'lower' | null;
  readonly width: number;
  readonly epsilon: number;
  readonly degeneracy: number | null;
}

interface Candidate {
  readonly transition: Transition;
  readonly position: number;
  readonly width: number;
  readonly epsilon: number;
}

/** Foot of the lowest charge transfer of a complex, cm-1. */
export function chargeTransferEdge(recipe: Recipe): number {
  const metal = metalEntry(recipe.ion, recipe.spin);
  return Math.min(...recipe.ligands.map(([id]) => {
    const ligand = ligandEntry(id);
    return ligand.acceptor ? metal.donorEdge : ligand.edge + metal.acceptorShift;
  }));
}

/**
 * The bands of one measurement as a person would read them, ascending.
 *
 * A band is seen inside the scan and below the foot of charge transfer; near that foot, or beside a stronger band, it is a shoulder
 * displaced towards the stronger one by U(0, 0.3) widths. Maxima are read with N(0, 30 + 0.02 width), lines with N(0, 10).
 * Cold samples have narrower bands that lie about 0.8 % higher.
 */
export function spectrumOf(recipe: Recipe, truth: Truth, setting: Setting, seed: number): SeenBand[] {
  const random = randomFrom(seed, `spectrum ${recipe.id} ${setting.id}`);
  const edge = chargeTransferEdge(recipe);
  const shift = Math.exp(random.normal(isCold(setting) ? 0.008 : 0, 0.004));
  const all = truth.transitions.map((transition) => candidateOf(transition, recipe, setting, shift, random));
  const broad = all.filter((one) => !one.transition.narrow && isOpen(one, setting, edge - 600) && isNoticed(one, recipe, random));
  const narrow = all.filter((one) => one.transition.narrow && isOpen(one, setting, edge - 2500) && standsClear(one, broad, setting) && random.chance(isCold(setting) ? 0.9 : 0.6));
  const read = broad.map((one) => asRead(one, broad, edge, recipe, truth, random)).filter((parts) => parts.every((part) => isScanned(part, setting)));
  const seen = [...read.flat(), ...narrow.map((one) => asLine(one, random))];
  const transfer = chargeTransferBand(edge, setting, random);
  return [...seen, ...(transfer ? [transfer] : [])].sort((a, b) => a.position - b.position);
}

function candidateOf(transition: Transition, recipe: Recipe, setting: Setting, shift: number, random: Random): Candidate {
  const broadWidth = recipe.geometry === 'tetrahedral' ? random.between(1500, 2500) : random.between(2500, 3800);
  const width = (transition.narrow ? random.between(100, 300) : broadWidth) * (isCold(setting) ? 0.75 : 1);
  return { transition, width, position: transition.position * (transition.narrow ? 1 : shift), epsilon: absorptivity(transition, recipe, random) };
}

/** Molar absorption coefficient, L mol-1 cm-1, by class of ligand, geometry and transition. */
function absorptivity(transition: Transition, recipe: Recipe, random: Random): number {
  const { electrons } = ionNamed(recipe.ion);
  const halfFilled = electrons === 5 && recipe.spin !== 'low';
  if (halfFilled) return random.logBetween(0.01, 0.1) * (recipe.ion === 'Fe(III)' ? 5 : 1) * (recipe.geometry === 'tetrahedral' ? 20 : 1);
  if (transition.narrow) return random.logBetween(0.05, 2);
  if (recipe.geometry === 'tetrahedral') return random.logBetween(50, 600);
  const classes = recipe.ligands.map(([id]) => ligandEntry(id).absorption);
  const range = classes.includes('strong') ? [50, 200] as const : classes.includes('middle') ? [20, 80] as const : [3, 15] as const;
  const weakened = transition.twoElectron ? 0.15 : transition.spinAllowed ? 1 : 0.015;
  return random.logBetween(range[0], range[1]) * weakened;
}

function isOpen(one: Candidate, setting: Setting, upper: number): boolean {
  const low = (setting.scan?.low ?? 9000) + 200;
  const high = Math.min((setting.scan?.high ?? 33000) - 200, upper);
  return one.position > low && one.position < high;
}

/** Whether a part of a band still lies in the scan, after splitting and reading. */
const isScanned = ({ position }: SeenBand, { scan }: Setting): boolean => scan === null || (position > scan.low && position < scan.high);

/** Weak broad bands are not always noted. */
function isNoticed(one: Candidate, recipe: Recipe, random: Random): boolean {
  const { electrons } = ionNamed(recipe.ion);
  if (one.transition.twoElectron && electrons !== 3) return random.chance(electrons === 2 ? 0.25 : 0.5);
  if (!one.transition.spinAllowed && electrons !== 5) return random.chance(0.35);
  return true;
}

function standsClear(one: Candidate, broad: readonly Candidate[], setting: Setting): boolean {
  const share = isCold(setting) ? 0.45 : 0.7;
  return broad.every((other) => Math.abs(other.position - one.position) > share * other.width);
}

function asLine(one: Candidate, random: Random): SeenBand {
  return {
    label: one.transition.label, position: one.position + random.normal(0, 10), kind: 'line', side: null,
    width: one.width, epsilon: one.epsilon, degeneracy: null,
  };
}

function asRead(one: Candidate, broad: readonly Candidate[], edge: number, recipe: Recipe, truth: Truth, random: Random): SeenBand[] {
  const stronger = broad.find((other) => other !== one && other.epsilon > one.epsilon && Math.abs(other.position - one.position) < 0.8 * other.width);
  // A weak band right under a strong one is not seen.
  if (stronger && Math.abs(stronger.position - one.position) < 0.35 * stronger.width) return [];
  const side = stronger ? (stronger.position > one.position ? 'higher' : 'lower') : one.position > edge - 2200 ? 'higher' : null;
  const common = { label: one.transition.label, width: one.width, epsilon: one.epsilon };
  if (side) {
    const moved = random.between(0, 0.3) * one.width * (side === 'higher' ? 1 : -1);
    return [{ ...common, position: one.position + moved, kind: 'shoulder', side, degeneracy: null }];
  }
  const read = (centre: number): number => centre + random.normal(0, 30 + 0.02 * one.width);
  const parts = componentsOf(one.transition, recipe, truth, random);
  if (parts === 'envelope') return [{ ...common, position: read(one.position), width: one.width * 1.4, kind: 'envelope', side: null, degeneracy: null }];
  if (parts.length > 0) {
    return parts.map((part) => ({
      ...common, position: read(one.position + part.offset), width: one.width * random.between(0.7, 0.9), epsilon: one.epsilon * random.between(0.6, 1.1), kind: 'component' as const, side: null, degeneracy: part.degeneracy,
    }));
  }
  return [{ ...common, position: read(one.position), kind: 'maximum', side: null, degeneracy: null }];
}

function chargeTransferBand(edge: number, setting: Setting, random: Random): SeenBand | null {
  const position = edge + random.between(3000, 5500);
  if (setting.scan === null || position > setting.scan.high - 500 || position < setting.scan.low + 500 || !random.chance(0.6)) return null;
  return { label: null, position, kind: 'maximum', side: null, width: random.between(4000, 6000), epsilon: random.logBetween(1500, 20000), degeneracy: null };
}
