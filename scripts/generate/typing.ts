// Numbers and labels as people type them.

import { freeIon, parentOf, readLabel, shownLabel } from '#engine';
import { ionNamed } from './metalIons.ts';
import type { Recipe } from './recipes.ts';
import type { Habits } from './settings.ts';
import type { SeenBand } from './spectrum.ts';
import { multiplicityOf } from './truth.ts';

/** cm-1 an electronvolt (CODATA 2018). */
const perElectronvolt = 8065.543937;

const rounded = (value: number, step: number): number => Math.round(value / step) * step;

/** A position in the person's unit, "21550(60) cm-1", "464(2) nm", "2.67(1) eV". */
export function typedPosition(band: SeenBand, habits: Habits): string {
  const u = readingUncertainty(band);
  const withU = habits.typesUncertainty && (band.kind === 'maximum' || band.kind === 'line' || band.kind === 'component');
  if (habits.unit === 'nm') {
    const wavelength = 1e7 / band.position;
    const places = band.kind === 'line' ? 1 : 0;
    return withPlaces(wavelength, (u * wavelength * wavelength) / 1e7, places, withU, 'nm');
  }
  if (habits.unit === 'eV') return withPlaces(band.position / perElectronvolt, u / perElectronvolt, band.kind === 'line' ? 3 : 2, withU, 'eV');
  if (!withU) return `${rounded(band.position, band.kind === 'line' ? Math.min(habits.step, 10) : habits.step)} cm-1`;
  const step = band.kind === 'line' ? 1 : 10;
  return `${rounded(band.position, step)}(${Math.max(step, rounded(u, step))}) cm-1`;
}

/** What the person takes the standard uncertainty of the reading to be, cm-1. */
function readingUncertainty(band: SeenBand): number {
  return band.kind === 'line' ? 10 : 30 + 0.02 * band.width;
}

/** Concise notation with the uncertainty in units of the last place. */
function withPlaces(value: number, u: number, places: number, withU: boolean, unit: string): string {
  if (!withU) return `${value.toFixed(places)} ${unit}`;
  return `${value.toFixed(places)}(${Math.max(1, Math.round(u * 10 ** places))}) ${unit}`;
}

/** Width at half height, in nanometres for people who read nanometres. */
export function typedWidth(band: SeenBand, habits: Habits): string {
  if (habits.unit !== 'nm' || band.kind === 'line') return `${rounded(band.width, band.kind === 'line' ? 10 : 100)} cm-1`;
  const low = 1e7 / (band.position + band.width / 2);
  const high = 1e7 / (band.position - band.width / 2);
  return `${Math.round(high - low)} nm`;
}

/** Two significant digits. */
export function typedEpsilon(epsilon: number): string {
  return String(Number(epsilon.toPrecision(2)));
}

/** A label as chemists write it: bare, with its free-ion parent where that names one level, else in letter form. */
export function typedTerm(label: string, recipe: Recipe): string {
  const ion = ionNamed(recipe.ion);
  const shown = shownLabel(label, ion.electrons);
  if (shown === label.split('/').map((one) => one.slice(1)).join('/')) return shown;
  // Of a low-spin ion the free-ion parent says nothing that a chemist would write.
  if (recipe.spin === 'low') return label;
  const published = freeIon('published', ion);
  const ratio = published?.racahC0 ? published.racahC0 / published.racahB0 : 4.5;
  const parent = parentOf(label, ion.electrons, ratio);
  if (parent === null || parent.includes(',')) return label;
  const withParent = `${label.slice(1)}(${parent})`;
  const read = readLabel(withParent, { electrons: ion.electrons, geometry: recipe.geometry, multiplicity: multiplicityOf(recipe), ratio });
  return read.ok && read.labels.length === 1 && read.labels[0] === label ? withParent : label;
}
