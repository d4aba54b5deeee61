/** Whole wavenumbers for sentences, grouped by thin spaces from five digits on. */
export function wholeNumber(value: number): string {
  const text = Math.abs(Math.round(value)).toString();
  const grouped = text.length < 5 ? text : text.replaceAll(/\B(?=(\d{3})+$)/g, '\u2009');
  return (Math.round(value) < 0 ? '\u2212' : '') + grouped;
}

/** A fraction as whole per cent, one decimal below ten. */
export function perCent(fraction: number): string {
  const value = 100 * fraction;
  return `${value < 10 ? value.toFixed(1) : Math.round(value)} %`;
}

/** "a, b and c". */
export function listed(items: readonly string[]): string {
  return items.length < 2 ? (items[0] ?? '') : `${items.slice(0, -1).join(', ')} and ${items.at(-1)}`;
}
