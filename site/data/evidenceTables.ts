import { type Band, type BandKind, absorptivityLimits, bandUncertainty, evidenceHeading, evidenceWeights, usualAbsorptivities, usualBeta, widthLimits } from '#engine';
import { policyOf } from './policy.ts';
import { energy, ratio } from './show.ts';
import { type Cell, type Column, type Table, longColumn, quantity, rowColumn } from './table.ts';
import type { CollectionTree } from './tree.ts';
import { sentenceShown } from './typeset.ts';

const HEADS = { width: 'a transition', allowed: 'a spin-allowed transition', forbidden: 'a transition' } as const;

/** What each kind of evidence adds to the score of a reading, as the engine's search uses it. */
export function evidenceTable(): Table {
  const w = evidenceWeights;
  const { low, high, step } = usualBeta;
  const row = (code: string, label: string, adds: string): readonly Cell[] => [{ parts: sentenceShown(evidenceHeading(code, label)) }, adds];
  return {
    caption: 'Evidence and what it adds to the score',
    columns: [rowColumn('Evidence'), longColumn('Adds')],
    rows: [
      row('misfit', '', 'χ² of the fit, and of bands only compared with it'),
      row('parameters', '', `${w.parameter} each; an assumed B counts as one`),
      row('left over', '', `${w.leftOver} each`),
      row('gap', HEADS.allowed, `${w.gap}; ${w.twoElectronGap} where it moves two electrons`),
      row('unseen', HEADS.allowed, `${w.unseen}; where it moves two electrons ${w.twoElectronUnseen}, once for all of them`),
      row('below', HEADS.allowed, `${w.below}, where nothing was scanned`),
      row('line skipped', 'a spin-flip line', `${w.lineSkipped}`),
      row('beta', '', `the square of (β − edge)/${step}; usual from ${low} to ${ratio(high, 1)}`),
      row('absorptivity', HEADS.width, `${w.absorptivityDecade} × the square of the decades outside the usual range`),
      row('width', HEADS.width, `${w.width}: a line under ${widthLimits.line} cm⁻¹ for a broad transition, or more than ${energy(widthLimits.spinFlip, null)} cm⁻¹ for a spin flip`),
      row('forbidden and broad', HEADS.forbidden, `${w.forbiddenBroad}, where no strength is recorded`),
      row('donors', '', `${w.donors}: the other geometry of a rival`),
    ],
  };
}

/** Usual molar absorption coefficients by geometry and spin. */
export function absorptivityTable(): Table {
  const range = ({ low, high }: { readonly low: number; readonly high: number }): string => low === 0 ? `to ${energy(high, null)}` : `${energy(low, null)} to ${energy(high, null)}`;
  const head = (text: string): Column => quantity(`ε, ${text}`, 'L mol-1 cm-1', true);
  return {
    caption: 'Usual molar absorption coefficients (common practice, no source)',
    columns: [rowColumn('Geometry'), head('spin-allowed'), head('spin-forbidden')],
    rows: [
      ...(['octahedral', 'tetrahedral'] as const).map((geometry): readonly Cell[] => [geometry, range(usualAbsorptivities[geometry].spinAllowed), range(usualAbsorptivities[geometry].spinForbidden)]),
      ['charge transfer', `above ${energy(absorptivityLimits.chargeTransfer, null)}`, ''],
    ],
  };
}

const KINDS: readonly { readonly kind: BandKind; readonly name: string; readonly side?: 'higher'; readonly deconvoluted?: true }[] = [
  { kind: 'maximum', name: 'maximum' }, { kind: 'component', name: 'component' }, { kind: 'component', name: 'component, deconvoluted', deconvoluted: true },
  { kind: 'line', name: 'line, zero-phonon line' }, { kind: 'dip', name: 'dip' }, { kind: 'centroid', name: 'centroid' }, { kind: 'envelope', name: 'envelope' },
  { kind: 'shoulder', name: 'shoulder below a stronger band', side: 'higher' }, { kind: 'shoulder', name: 'shoulder, side not recorded' },
];

const WIDTH = 3000;

/** The standard uncertainty taken where none was typed, under the policy in force, as the engine works it out. */
export function defaultUncertaintyTable(tree: CollectionTree): Table {
  const policy = policyOf(tree.policy);
  const u = (kind: BandKind, width: number | null, side: 'higher' | null, deconvoluted: boolean): string => {
    const band: Band = {
      position: 20000, uMinus: null, uPlus: null, halfDigit: 0, coverageNotStated: false, kind, side, width, epsilon: null, strength: null,
      degeneracy: null, deconvoluted, role: 'transition', terms: [], leftOut: null,
    };
    const { uMinus, uPlus } = bandUncertainty(band, policy);
    return uMinus === uPlus ? energy(uMinus, null) : `${energy(uMinus, null)} down, ${energy(uPlus, null)} up`;
  };
  return {
    caption: 'Standard uncertainty of a position typed without one',
    columns: [rowColumn('Read as'), quantity('u, no width recorded', 'cm-1', true), quantity(`u, width ${energy(WIDTH, null)}`, 'cm-1', true)],
    rows: KINDS.map(({ kind, name, side = null, deconvoluted = false }): readonly Cell[] => [name, u(kind, null, side, deconvoluted), u(kind, WIDTH, side, deconvoluted)]),
  };
}
