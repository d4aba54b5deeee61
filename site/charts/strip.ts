import type { BandKind } from '#engine';
import { type EnergyScale, VISIBLE_RANGE, energyScale, energyTicks } from './energyAxis.ts';
import { coordinate as c, escapeText } from './text.ts';

/** One band as the strip draws it. Positions and widths in cm-1. */
export interface StripBand {
  readonly position: number;
  readonly kind: BandKind;
  readonly side: 'higher' | 'lower' | null;
  readonly width: number | null;
  /** false: kept but not fitted; the stem is dotted. */
  readonly fitted: boolean;
}

export interface StripRange { readonly low: number; readonly high: number }

export interface StripRow {
  readonly bands: readonly StripBand[];
  readonly absent: readonly StripRange[];
  readonly scanned: readonly StripRange[];
}

export interface StripPlace {
  readonly scale: EnergyScale;
  readonly baseline: number;
  readonly top: number;
  readonly bottom: number;
}

/** Id of the gradient of visible colours that a page with strips holds once. */
export const GRADIENT_ID = 'visible-colours';

/**
 * The small band strip of one measurement, for a table row: the line of ink is solid where the group looked, dotted where
 * it did not; shapes tell how each position was read.
 * @param title what a screen reader says and a pointer shows
 * @param id unique on the page
 */
export function bandStrip(row: StripRow, title: string, id: string, width = 240, height = 26): string {
  const place: StripPlace = { scale: energyScale([3, width - 3]), baseline: height - 6, top: 3, bottom: height };
  return `<svg class="strip" role="img" aria-labelledby="${id}" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}">`
    + `<title id="${id}">${escapeText(title)}</title>${stripInk(row, place)}</svg>`;
}

/** Colours, line, absent ranges and ticks, without axes: the part that both sizes of the strip share. */
export function stripInk(row: StripRow, place: StripPlace): string {
  return [
    visibleColours(place), groundLine(row.scanned, place),
    ...row.absent.map((range) => absentRange(range, place)),
    ...row.bands.map((band) => bandTick(band, place)),
  ].join('');
}

function visibleColours({ scale, baseline, top }: StripPlace): string {
  const [low, high] = VISIBLE_RANGE.map(scale.at) as [number, number];
  return `<rect class="visible" x="${c(low)}" y="${c(top)}" width="${c(high - low)}" height="${c(baseline - top)}" fill="url(#${GRADIENT_ID})"/>`;
}

function groundLine(scanned: readonly StripRange[], { scale, baseline }: StripPlace): string {
  const [left, right] = scale.range;
  const seen = scanned.map(({ low, high }) => [Math.max(left, scale.at(low)), Math.min(right, scale.at(high))] as const)
    .filter(([from, to]) => to > from).sort(([a], [b]) => a - b);
  const gaps: [number, number][] = [];
  let reached = left;
  for (const [from, to] of seen) {
    if (from > reached) gaps.push([reached, from]);
    reached = Math.max(reached, to);
  }
  if (reached < right) gaps.push([reached, right]);
  const pieces = (spans: readonly (readonly [number, number])[]): string => spans.map(([from, to]) => `M${c(from)} ${c(baseline)}H${c(to)}`).join('');
  return (gaps.length === 0 ? '' : `<path class="unseen" d="${pieces(gaps)}"/>`) + (seen.length === 0 ? '' : `<path class="seen" d="${pieces(seen)}"/>`);
}

function absentRange({ low, high }: StripRange, { scale, baseline }: StripPlace): string {
  const from = Math.max(scale.range[0], scale.at(low));
  const to = Math.min(scale.range[1], scale.at(high));
  if (to <= from) return '';
  return `<rect class="absent" x="${c(from)}" y="${c(baseline - 2.5)}" width="${c(to - from)}" height="5"/>`;
}

/** One band's tick; outside the axis it becomes an arrowhead at the end that points to it. */
export function bandTick(band: StripBand, { scale, baseline, top }: StripPlace): string {
  const height = baseline - top;
  const cls = band.fitted ? 'tick' : 'tick left-out';
  if (!scale.holds(band.position)) {
    const right = band.position > scale.domain[1];
    const x = right ? scale.range[1] : scale.range[0];
    const back = right ? -4 : 4;
    return `<path class="${cls}" d="M${c(x + back)} ${c(baseline - height * 0.5 - 3)}L${c(x)} ${c(baseline - height * 0.5)}L${c(x + back)} ${c(baseline - height * 0.5 + 3)}"/>`;
  }
  const x = scale.at(band.position);
  const stem = `M${c(x)} ${c(baseline)}V`;
  switch (band.kind) {
    case 'maximum':
      return `<path class="${cls} broad" d="${stem}${c(top)}"/>`;
    case 'shoulder': {
      // The stem leans towards the stronger band; without a side it stays upright and short.
      const lean = band.side === 'higher' ? 1 : band.side === 'lower' ? -1 : 0;
      const knee = baseline - height * 0.45;
      return `<path class="${cls} broad" d="${stem}${c(knee)}${lean === 0 ? '' : `l${c(lean * height * 0.28)} ${c(-height * 0.28)}`}"/>`;
    }
    case 'line':
      return `<path class="${cls}" d="${stem}${c(top + 3)}"/><circle class="dot" cx="${c(x)}" cy="${c(top + 1.8)}" r="1.8"/>`;
    case 'zero-phonon':
      return `<path class="${cls}" d="${stem}${c(top + 4)}"/><circle class="ring" cx="${c(x)}" cy="${c(top + 2)}" r="2"/>`;
    case 'dip':
      return `<path class="${cls} broad" d="M${c(x)} ${c(top)}V${c(baseline - height * 0.4)}"/>`;
    case 'component':
      return `<path class="${cls} broad" d="${stem}${c(top + 1)}m-3 0h6"/>`;
    case 'centroid':
      return `<path class="${cls}" d="${stem}${c(baseline - height * 0.5 + 2.6)}M${c(x)} ${c(baseline - height * 0.5 - 2.6)}V${c(top)}"/>`
        + `<circle class="ring" cx="${c(x)}" cy="${c(baseline - height * 0.5)}" r="2.6"/>`;
    case 'envelope': {
      const half = Math.max(4, (scale.at((band.width ?? 3000)) - scale.at(0)) / 2);
      return `<path class="${cls}" d="M${c(x - half)} ${c(baseline)}Q${c(x)} ${c(2 * top - baseline + height * 0.2)} ${c(x + half)} ${c(baseline)}"/>`;
    }
  }
}

/** The strips' shared axis for a table's head: a tick every 10 000 cm-1, figures in thousands. */
export function stripAxis(width = 240): string {
  const height = 30;
  const scale = energyScale([3, width - 3]);
  const ticks = energyTicks(10000).map((wavenumber) =>
    `<path class="axis" d="M${c(scale.at(wavenumber))} ${height}v-4"/><text x="${c(scale.at(wavenumber))}" y="${height - 7}" text-anchor="middle" font-size="12">${wavenumber / 1000}</text>`);
  return `<svg class="drawing strip" aria-hidden="true" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}">`
    + `<text x="0" y="9" font-size="12"><tspan font-style="italic">ν̃</tspan> / 10³ cm⁻¹</text>${ticks.join('')}</svg>`;
}
