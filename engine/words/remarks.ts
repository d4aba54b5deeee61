import { concise } from '../quantity/print.ts';
import { wholeNumber } from './numbers.ts';

/** What is said of the ground level: stabilisation and distance from the spin crossing. */
export function groundSentence(facts: { crossing: number | null; deltaOverB: number | null; stabilisationInDelta: number; stabilisation: number; ground: string }): string {
  const { crossing, deltaOverB, stabilisationInDelta, stabilisation, ground } = facts;
  const sign = stabilisationInDelta <= 0 ? '−' : '+';
  const field = Math.abs(stabilisationInDelta) < 0.005 ? `The field leaves the ground level ${ground} where it is` : `The field ${stabilisation <= 0 ? 'lowers' : 'raises'} the ground level ${ground} by ${Math.abs(stabilisationInDelta).toFixed(2)} Delta, ${sign}${wholeNumber(Math.abs(stabilisation))} cm⁻¹`;
  if (crossing === null || deltaOverB === null) return `${field}.`;
  return `${field}; Delta/B = ${deltaOverB.toFixed(1)} against ${crossing.toFixed(1)} where the ground spin changes.`;
}

/** Order of 2Eg and 4T2g of octahedral d3. */
export function doubletSentence(order: { gap: number; u: number; decidable: boolean }): string {
  if (!order.decidable) return 'Whether 2Eg or 4T2g lies lower is not decidable here: C is assumed.';
  const lower = order.gap > 0 ? '2Eg lies below 4T2g' : '4T2g lies below 2Eg';
  const size = concise(Math.abs(order.gap), order.u, 'page');
  const sure = Math.abs(order.gap) > 2 * order.u ? '' : ', which is within its uncertainty';
  return `${lower} by ${size} cm⁻¹${sure}: vertical, not thermal energies.`;
}

/** What is said where bands may be read in more ways than are tried. */
export const searchStopped = 'Not every way to read these bands was tried: better readings may exist. Type terms or candidates for some.';

/** Of a rival that has the Delta and B of the chosen reading. */
export const otherNames = 'Other names for these bands fit as well and leave Delta and B as they are';

/** What the verdict adds where a rival or a second solution stands beside the chosen reading. */
export function rivalSentence(rival: { readonly best: 'near' | 'better' | null; readonly sameNumbers: boolean }, secondSolution: boolean): string {
  const near = rival.sameNumbers ? otherNames : 'Another reading fits these bands as well';
  const parts = [
    rival.best === 'better' ? ' Another reading fits these bands clearly better: see the rivals.' : '',
    rival.best === 'near' ? ` ${near}: see the rivals.` : '',
    secondSolution ? ' Two solutions of this reading fit equally well; both are listed.' : '',
  ];
  return parts.join('');
}
