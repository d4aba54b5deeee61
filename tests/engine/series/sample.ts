import { parseIon } from '#engine';
import type { ComplexIdentity, Ion, SeriesNumber, SeriesResult } from '#engine';

/** Invented results for tests of series: only what a test names matters, the rest is usual. */
export interface Invented {
  readonly id?: string;
  readonly measurement?: string;
  readonly ion?: string;
  readonly multiplicity?: number | null;
  readonly geometry?: 'octahedral' | 'tetrahedral' | null;
  readonly isomer?: string;
  /** Number of monodentate ligands by id. */
  readonly ligands: Readonly<Record<string, number>>;
  readonly delta?: number | null;
  readonly uDelta?: number;
  readonly uDeltaTotal?: number;
  readonly beta?: number | null;
  readonly uBeta?: number;
  readonly uBetaTotal?: number;
  readonly phase?: SeriesResult['phase'];
  readonly temperature?: number | null;
  readonly policy?: string;
  readonly transitions?: readonly string[];
  readonly cautions?: readonly string[];
  readonly cFitted?: boolean;
  readonly correlation?: number | null;
}

export const testPolicy = 'house-00000001';
export const testFloor = { delta: 50, racahB: 0.015 };

const ions = new Map<string, Ion>();

export function ion(name: string): Ion {
  const known = ions.get(name);
  if (known) return known;
  const parsed = parseIon(name);
  if (parsed.ion === null) throw new Error(parsed.reason);
  ions.set(name, parsed.ion);
  return parsed.ion;
}

const number = (value: number | null, u: number, uTotal: number): SeriesNumber =>
  value === null
    ? { value: null, u: null, uTotal: null, standing: 'withheld', reason: 'these bands do not fix it' }
    : { value, u, uTotal, standing: 'fitted', reason: null };

export function identity(one: Invented): ComplexIdentity {
  const ligands = Object.entries(one.ligands).map(([ligand, count]) => ({ ligand, count, bound: 1 }));
  const name = one.ion ?? 'Cr(III)';
  const geometry = one.geometry === undefined ? 'octahedral' : one.geometry;
  return {
    id: one.id ?? [name, one.isomer ?? '', ...ligands.map(({ ligand, count }) => `${ligand}${count}`)].join('-').toLowerCase().replaceAll(/[()]/g, ''),
    formula: `[${name} ${ligands.map(({ ligand, count }) => `(${ligand})${count}`).join('')}]`,
    ion: ion(name), geometry, geometryName: geometry ?? 'square planar',
    multiplicity: one.multiplicity === undefined ? 4 : one.multiplicity, isomer: one.isomer ?? 'none', ligands,
  };
}

export function result(one: Invented): SeriesResult {
  const delta = one.delta === undefined ? 20000 : one.delta;
  const beta = one.beta === undefined ? 0.75 : one.beta;
  const [uDelta, uBeta] = [one.uDelta ?? 60, one.uBeta ?? 0.01];
  return {
    complex: identity(one), measurement: one.measurement ?? 'aq', phase: one.phase ?? 'solution',
    temperature: one.temperature === undefined ? 295 : one.temperature, policy: one.policy ?? testPolicy, verdict: 'untested',
    parameters: {
      Delta: number(delta, uDelta, one.uDeltaTotal ?? 160),
      B: number(beta === null ? null : 918 * beta, 918 * uBeta, 918 * (one.uBetaTotal ?? 0.03)),
      C: number(one.cFitted ? 3200 : null, 40, 120),
      beta: number(beta, uBeta, one.uBetaTotal ?? 0.03),
    },
    correlation: one.correlation === undefined ? (delta === null || beta === null ? null : -0.6) : one.correlation,
    transitions: one.transitions ?? ['a4T1g', 'a4T2g'], cautions: one.cautions ?? [],
  };
}
