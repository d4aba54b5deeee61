import { coordinate as c } from './text.ts';

const WIDTH = 84;
const HEIGHT = 14;
const MIDDLE = WIDTH / 2;

/**
 * A residual as a bar from zero, for a table cell beside its number: to the right where the band was observed above the fit.
 * The bracket spans one combined standard uncertainty to both sides. Hidden from screen readers, because the number is there.
 * @param reach the largest value that any bar or bracket of the table must hold
 */
export function residualBar(residual: number, u: number, reach: number): string {
  const scale = (MIDDLE - 2) / reach;
  const tip = MIDDLE + scale * residual;
  const [low, high] = [MIDDLE - scale * u, MIDDLE + scale * u];
  return `<svg class="drawing residual" aria-hidden="true" viewBox="0 0 ${WIDTH} ${HEIGHT}" width="${WIDTH}" height="${HEIGHT}">`
    + `<path class="leader" d="M${c(low)} 2v10M${c(high)} 2v10M${c(low)} 7H${c(high)}"/>`
    + `<rect class="point" x="${c(Math.min(MIDDLE, tip))}" y="4.5" width="${c(Math.abs(tip - MIDDLE))}" height="5"/>`
    + `<path class="axis" d="M${MIDDLE} 1v12"/></svg>`;
}
