import { coordinate } from './text.ts';

/** The wavenumber axis that all band strips share, cm-1, so that strips compare down a page. */
export const STRIP_DOMAIN: readonly [number, number] = [4000, 44000];

/** Linear map from wavenumber to pixels. */
export interface EnergyScale {
  readonly domain: readonly [number, number];
  readonly range: readonly [number, number];
  readonly at: (wavenumber: number) => number;
  readonly holds: (wavenumber: number) => boolean;
}

export function energyScale(range: readonly [number, number], domain: readonly [number, number] = STRIP_DOMAIN): EnergyScale {
  const slope = (range[1] - range[0]) / (domain[1] - domain[0]);
  return {
    domain, range,
    at: (wavenumber) => range[0] + slope * (wavenumber - domain[0]),
    holds: (wavenumber) => wavenumber >= domain[0] && wavenumber <= domain[1],
  };
}

/** Colours that the eye sees, by wavelength in nm; the ends fade into the page. */
const VISIBLE: readonly { readonly nm: number; readonly colour: string; readonly strength: number }[] = [
  { nm: 770, colour: '#b3261a', strength: 0 },
  { nm: 700, colour: '#c0281a', strength: 0.75 },
  { nm: 630, colour: '#e2491c', strength: 1 },
  { nm: 595, colour: '#f39a1e', strength: 1 },
  { nm: 575, colour: '#f2d022', strength: 1 },
  { nm: 530, colour: '#5fb336', strength: 1 },
  { nm: 495, colour: '#35a7a0', strength: 1 },
  { nm: 465, colour: '#3878c4', strength: 1 },
  { nm: 430, colour: '#4b4bb8', strength: 1 },
  { nm: 400, colour: '#6a3fa8', strength: 0.75 },
  { nm: 375, colour: '#6a3a98', strength: 0 },
];

/** Ends of the visible range, cm-1. */
export const VISIBLE_RANGE: readonly [number, number] = [1e7 / VISIBLE[0]!.nm, 1e7 / VISIBLE.at(-1)!.nm];

/** The visible colours as an SVG gradient that runs over `VISIBLE_RANGE`, left to right. */
export function visibleGradient(id: string): string {
  const [low, high] = VISIBLE_RANGE;
  const stops = VISIBLE.map(({ nm, colour, strength }) =>
    `<stop offset="${coordinate((100 * (1e7 / nm - low)) / (high - low))}%" stop-color="${colour}" stop-opacity="${strength}"/>`);
  return `<linearGradient id="${id}">${stops.join('')}</linearGradient>`;
}

/** Every multiple of `step` within the domain. */
export function energyTicks(step: number, domain: readonly [number, number] = STRIP_DOMAIN): readonly number[] {
  const first = Math.ceil(domain[0] / step);
  const last = Math.floor(domain[1] / step);
  return Array.from({ length: last - first + 1 }, (_, index) => (first + index) * step);
}
