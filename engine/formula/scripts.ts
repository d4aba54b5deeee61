/** Digits set low or high, in Unicode, braces or HTML, as patterns. */
export const lowDigits = /(?:<sub>|_\{?)(\d+)\}?(?:<\/sub>)?|([₀-₉]+)/y;
export const highCharge = /(?:<sup>|\^[{(]?)(\d*)\s?([+\-−–])[})]?(?:<\/sup>)?|([⁰¹²³⁴-⁹]*)([⁺⁻])/y;

const low = '₀₁₂₃₄₅₆₇₈₉';
const high = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/** Low and high Unicode digits as plain ones. */
export function plainDigits(text: string): string {
  return text.replace(/[₀-₉]/g, (digit) => String(low.indexOf(digit))).replace(/[⁰¹²³⁴-⁹]/g, (digit) => String(high.indexOf(digit)));
}
