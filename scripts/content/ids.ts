// The rule for ids: of files (complexes, ligands, sources) and of measurements.

import type { Finding } from './report.ts';

/** Names that YAML 1.1 readers or Windows take for something else. */
const reservedIds = ['no', 'yes', 'on', 'off', 'null', 'true', 'false', 'con', 'nul', 'aux', 'prn'];

/** Why a text is no id, or null where it is one. `what` names the thing: "an id", "a file name". */
export function badId(typed: string, what: string): Finding | null {
  if (reservedIds.includes(typed)) {
    return { code: 'BAD_ID', found: typed, expected: `${what} that is not a reserved word (${reservedIds.join(', ')})`, mend: `write ${typed}-1, for instance` };
  }
  if (/^[a-z][a-z0-9-]{1,40}$/.test(typed)) return null;
  const suggestion = typed.toLowerCase().replace(/[^a-z0-9]+/g, '-').replace(/^[^a-z]+|-+$/g, '').slice(0, 41);
  return {
    code: 'BAD_ID', found: typed,
    expected: `${what} of 2 to 41 small letters, digits and hyphens that starts with a letter`,
    mend: /^[a-z][a-z0-9-]{1,40}$/.test(suggestion) && !reservedIds.includes(suggestion) ? `write ${suggestion}` : 'choose a name such as cr-am6',
  };
}
