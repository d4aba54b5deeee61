// What the table command says.

import { aligned, counted } from '../report/columns.ts';
import { faultReport } from '../report/faults.ts';
import { notTaken } from './fields.ts';
import type { GivenOut } from './giveOut.ts';
import { columnLetter } from './mapping.ts';
import type { Mapping } from './mapping.ts';
import { missingFields } from './mappingText.ts';
import type { TableNames } from './places.ts';
import type { TakenIn } from './takeIn.ts';

export function takenInFacts({ mapping, guessed, rows, records, faults, written, unchanged, done }: TakenIn, names: TableNames) {
  return {
    ok: faults.length === 0, done, mapping: { file: names.mapping, guessed, confirmed: mapping?.confirmed ?? false },
    rows, records: records.map(({ id, assembled }) => ({ id, formula: assembled.complex.formula, rows: assembled.rows, measurements: assembled.complex.measurements?.length ?? 0 })),
    written: done ? written : [], unchanged, faults,
  };
}

export function takenInText(taken: TakenIn, names: TableNames, contentName: string, partly: boolean): string {
  const { mapping, guessed, rows, records, faults, written, unchanged, done } = taken;
  if (mapping === null) return faultReport(faults, '');
  const measurements = records.flatMap(({ assembled }) => assembled.complex.measurements ?? []);
  const read = `${counted(rows, 'row')} of ${names.table}: ${counted(records.length, 'complex', 'complexes')}, ${counted(measurements.length, 'spectrum', 'spectra')}, ${counted(measurements.reduce((sum, { bands }) => sum + (bands?.length ?? 0), 0), 'band')}.`;
  const report = faults.length === 0 ? [] : [faultReport(faults, '').trimEnd(), ''];
  if (!mapping.confirmed) {
    return [
      ...mappingLines(mapping), '',
      ...report,
      `${read} Nothing was written into ${contentName}/.`,
      `${guessed ? `The mapping above was guessed and stands in ${names.mapping}` : `${names.mapping} says  confirmed: no`}: look it through, mend it, write  confirmed: yes  and run this command again.`, '',
    ].join('\n');
  }
  const wrote = done ? `Wrote ${counted(written.length, 'record')} into ${contentName}/complexes/${written.length === 0 ? '' : `: ${listed(written)}`}.` : `Nothing was written into ${contentName}/.`;
  return [
    ...report,
    read,
    ...(unchanged.length === 0 ? [] : [`${counted(unchanged.length, 'record stands', 'records stand')} there already, word for word.`]),
    wrote,
    ...(faults.length > 0 && !partly && written.length > 0 ? [`${counted(written.length, 'record has', 'records have')} no fault: --partly writes ${written.length === 1 ? 'it' : 'them'} and leaves out the others.`] : []),
    ...(done && written.length > 0 ? ['Next: "npm run check", then "npm run refit" or "npm run dev".'] : []), '',
  ].join('\n');
}

/** The first twenty of some names. */
function listed(names: readonly string[]): string {
  return names.length <= 20 ? names.join(', ') : `${names.slice(0, 20).join(', ')} and ${names.length - 20} more`;
}

function mappingLines(mapping: Mapping): string[] {
  const { rows, separator, decimal, encoding, missing, columns } = mapping;
  const taken = columns.map(({ index, header, field, unit, number, term, brackets }) => [
    columnLetter(index), header === '' ? '(no header)' : header.replace(/\s+/g, ' '), field === notTaken ? 'not taken over' : `-> ${field}`,
    [unit === null ? null : `in ${unit}`, number === null ? null : `number ${number}`, term === null ? null : `term ${term}`, brackets === 'epsilon' ? 'epsilon in brackets' : null].flatMap((part) => part ?? []).join(', '),
  ]);
  const lacking = missingFields(mapping);
  return [
    `One row a ${rows === 'band' ? 'band' : 'spectrum'}; cells separated by ${separator}; decimal ${decimal}; ${encoding}${missing.length === 0 ? '' : `; nothing known: ${missing.join('  ')}`}.`,
    ...aligned(taken),
    ...(lacking.length === 0 ? [] : [`No column gives ${lacking.map((line) => line.replace(/: .*/, '')).join(', ')}: see every-row at the end of the mapping.`]),
  ];
}

export function givenOutText({ complexes, rows, columns, lost }: GivenOut, name: string, like: string | null): string {
  return [
    `Wrote ${name}: ${counted(complexes, 'complex', 'complexes')}, ${counted(rows, 'row')}, ${counted(columns, 'column')}${like === null ? '' : `, in the form that ${like} describes`}.`,
    ...(lost.size === 0 ? ['It holds every field of the records: "npm run table -- in" gives them back.'] : [
      `It does not hold everything that the records say. Not in it: ${[...lost].map(([field, count]) => `${field} (${counted(count, 'text')})`).join(', ')}.`,
    ]), '',
  ].join('\n');
}
