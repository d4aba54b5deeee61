const spaces = /[\s\u00a0\u2000-\u200a\u202f\u205f\u3000]+/g;
const invisible = /[\u200b-\u200d\u2060\ufeff]/g;
const dashes = /[\u2010-\u2015\u2212\ufe63\uff0d\u207b]/g;
const raised = '⁰¹²³⁴⁵⁶⁷⁸⁹';

/**
 * Brings the many spellings of one character together: every space to one plain space, every dash and minus sign to "-",
 * superscript digits to plain ones, both micro signs to "µ", "+-" and "+/-" to "±". Nothing else changes.
 */
export function plainCharacters(text: string): string {
  return text
    .replace(invisible, '')
    .replace(spaces, ' ')
    .replace(dashes, '-')
    .replace(/[⁰¹²³⁴⁵⁶⁷⁸⁹]/g, (digit) => String(raised.indexOf(digit)))
    .replace(/\u03bc/g, 'µ')
    .replace(/℃/g, '°C')
    .replace(/[º˚]/g, '°')
    .replace(/[∕⁄]/g, '/')
    .replace(/\+ ?\/ ?-|\+-/g, '±')
    .trim();
}
