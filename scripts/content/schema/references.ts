// Leaves for names, dates and identifiers: record ids, ISO dates, ORCID, DOI, SPDX licence, web address.

import { leaf, text } from './leaves.ts';
import { badId } from '../ids.ts';

/** An id as a file name or a measurement carries it. */
export const id = () =>
  leaf<string>((typed) => {
    const finding = badId(typed, 'an id');
    return finding ?? { value: typed };
  });

/** A reference to a record; whether the record is there is checked against the collection. */
export const reference = () => text();

/** A day of the calendar, "2024-03-11". */
export const date = () =>
  leaf<string>((typed) => {
    const value = typed.trim();
    const found = /^(\d{4})-(\d{2})-(\d{2})$/.exec(value);
    if (found !== null && isCalendarDay(Number(found[1]), Number(found[2]), Number(found[3]))) return { value };
    return { code: 'BAD_DATE', found: typed, expected: 'a date as year-month-day, e.g. 2024-03-11', mend: dateAdvice(value) };
  });

function isCalendarDay(year: number, month: number, day: number): boolean {
  const days = [31, (year % 4 === 0 && year % 100 !== 0) || year % 400 === 0 ? 29 : 28, 31, 30, 31, 30, 31, 31, 30, 31, 30, 31];
  return year >= 1800 && month >= 1 && month <= 12 && day >= 1 && day <= days[month - 1]!;
}

function dateAdvice(typed: string): string {
  const dayFirst = /^(\d{1,2})[./](\d{1,2})[./](\d{4})$/.exec(typed);
  if (dayFirst !== null) {
    const [day, month] = [dayFirst[1]!.padStart(2, '0'), dayFirst[2]!.padStart(2, '0')];
    if (isCalendarDay(Number(dayFirst[3]), Number(month), Number(day))) return `write ${dayFirst[3]}-${month}-${day} if the day was typed first`;
  }
  const short = /^(\d{4})[-/.](\d{1,2})[-/.](\d{1,2})$/.exec(typed);
  if (short !== null) {
    const [month, day] = [short[2]!.padStart(2, '0'), short[3]!.padStart(2, '0')];
    if (isCalendarDay(Number(short[1]), Number(month), Number(day))) return `write ${short[1]}-${month}-${day}`;
    return 'check the month and the day: the calendar has no such date';
  }
  return 'write year, month and day with hyphens; leave the field out where the day is not known';
}

/** An ORCID identifier, bare or as its web address; the last character is the ISO 7064 MOD 11-2 check of the others. */
export const orcid = () =>
  leaf<string>((typed) => {
    const value = typed.trim().replace(/^https:\/\/orcid\.org\//, '');
    if (!/^\d{4}-\d{4}-\d{4}-\d{3}[\dX]$/.test(value)) {
      return { code: 'BAD_ORCID', found: typed, expected: 'four groups of four digits, e.g. 0000-0002-1825-0097', mend: 'copy the identifier from orcid.org, or leave the field out' };
    }
    const digits = value.replaceAll('-', '');
    let total = 0;
    for (const digit of digits.slice(0, 15)) total = (total + Number(digit)) * 2;
    const check = (12 - (total % 11)) % 11;
    if ((check === 10 ? 'X' : String(check)) === digits[15]) return { value };
    return { code: 'BAD_ORCID', found: typed, expected: 'an ORCID identifier whose check digit fits', mend: 'one digit is wrong: copy the identifier from orcid.org again' };
  });

/** A DOI without its resolver: "10.5555/example.12". */
export const doi = () =>
  leaf<string>((typed) => {
    const value = typed.trim().replace(/^(https?:\/\/(dx\.)?doi\.org\/|doi:\s*)/i, '');
    if (/^10\.\d{4,9}\/[^\s"<>]{1,200}$/.test(value)) return { value };
    return { code: 'BAD_DOI', found: typed, expected: 'a DOI, e.g. 10.5555/example.12', mend: 'copy the DOI from the page that gives it: it starts with 10.' };
  });

/** An SPDX licence identifier by its shape. Whether SPDX lists it is not checked. */
export const licence = () =>
  leaf<string>((typed) => {
    const value = typed.trim();
    if (/^[A-Za-z0-9][A-Za-z0-9.+-]{1,60}$/.test(value) && /[A-Za-z]/.test(value)) return { value };
    const guess = /^cc[ -]*by[ -]*(sa|nc)?[ -]*(\d\.\d)?$/i.exec(value);
    const mend = guess === null ? 'write the SPDX identifier of the licence, CC-BY-4.0 for instance' : `write CC-BY-${guess[1] ? `${guess[1].toUpperCase()}-` : ''}${guess[2] ?? '4.0'}`;
    return { code: 'BAD_LICENCE', found: typed, expected: 'an SPDX licence identifier, one word without spaces, e.g. CC-BY-4.0', mend };
  });

/** A web address with http or https. */
export const webAddress = () =>
  leaf<string>((typed) => {
    const value = typed.trim();
    const address = URL.canParse(value) ? new URL(value) : null;
    if (address !== null && /^https?:$/.test(address.protocol) && /^https?:\/\//.test(value) && !/["<>\s]/.test(value)) return { value };
    return { code: 'BAD_ADDRESS', found: typed, expected: 'a web address, e.g. https://example.org/bands/', mend: 'write the whole address with https://' };
  });

/** A SHA-256 sum: 64 hexadecimal digits. */
export const sha256 = () =>
  leaf<string>((typed) => {
    const value = typed.trim().toLowerCase();
    if (/^[0-9a-f]{64}$/.test(value)) return { value };
    return { code: 'BAD_HASH', found: typed, expected: '64 hexadecimal digits, the SHA-256 sum of the raw file', mend: 'run  sha256sum FILE  and copy the first word' };
  });
