// Typed records of a table checked like any other record; every fault told at the cell that it comes from.

import { recordText } from '#engine';
import { checkComplex } from '../content/checks/complex.ts';
import type { KnownRecords } from '../content/checks/complex.ts';
import { readDraft } from '../content/draft.ts';
import type { FaultCode } from '../content/codes.ts';
import { badId } from '../content/ids.ts';
import { createReporter } from '../content/report.ts';
import { complexSchema } from '../content/schema/complex.ts';
import type { Collection, Fault } from '../content/types.ts';
import { readYaml } from '../content/yaml/read.ts';
import type { Assembled } from './assemble.ts';
import { tableFault } from './places.ts';
import type { TableNames, TablePlace } from './places.ts';

export interface Judged {
  readonly id: string;
  /** The text of complexes/ID.yaml. */
  readonly text: string;
  readonly assembled: Assembled;
  readonly faults: readonly Fault[];
}

export function knownRecords({ ligands, sources }: Collection): KnownRecords {
  return { ligands: new Map(ligands.map((ligand) => [ligand.id, ligand])), ligandIds: new Set(ligands.map(({ id }) => id)), sourceIds: new Set(sources.map(({ id }) => id)) };
}

/** Checks one record against the collection's ligands and sources. */
export function judge(assembled: Assembled, known: KnownRecords, names: TableNames): Judged {
  const { id, complex, origin, findings, rows } = assembled;
  const faults: Fault[] = findings.map(({ place, finding }) => tableFault(place, finding, names));
  const text = recordText(complex, { heading: [headingOf(assembled, names.table)] });
  const { root, faults: slips } = readYaml(text);
  const report = createReporter(id, root);
  for (const { place, finding } of slips) report.atPlace(place, [], finding);
  if (root !== null) checkComplex(readDraft(complexSchema, root, report), report, known);
  const wrongId = badId(id, 'an id');
  const idPlace = origin.get('id') ?? { row: rows[0]!, column: null, header: '' };
  if (wrongId !== null) faults.push(tableFault(idPlace, { ...wrongId, found: `"${wrongId.found}"` }, names, 'id'));
  const badFormula = report.faults.some(({ code }) => code === 'BAD_FORMULA');
  for (const fault of report.faults) {
    const ofFormula = fault.code === 'MISSING_FIELD' && (fault.field === 'ion' || fault.field === 'ligands');
    // What a formula that cannot be read does not tell is no second fault.
    if (ofFormula && badFormula) continue;
    const { place, exact } = placeOf(fault.field, origin);
    const found = ofFormula ? `${fault.found}, and the formula does not tell: it needs a charge, one metal, and ligands with one record each in ligands/` : fault.found;
    faults.push(tableFault(place, { ...fault, code: fault.code as FaultCode, found, mend: tableAdvice(fault) }, names, exact ? '' : fault.field));
  }
  return { id, text, assembled, faults };
}

/** Advice for a record, for a table. */
function tableAdvice({ code, field, mend }: Fault): string {
  if (code !== 'MISSING_FIELD') return mend;
  if (field.endsWith('.source')) return 'add a column for source.notebook or source.cite, or write  source.notebook: "old table, sheet 1"  under every-row in the mapping';
  if (field === 'ligands') return 'add a column such as  5 ammine + 1 chlorido, or the missing record in ligands/';
  if (/\.(bands|position)$/.test(field)) return 'add a column for position, or fill in the cell';
  return `${mend.replace(/^add a line such as +/, 'add a column, or write  ')}  under every-row in the mapping`;
}

function headingOf({ rows, fromFormula }: Assembled, table: string): string {
  const first = rows[0]!;
  const last = rows.at(-1)!;
  const name = table.split('/').at(-1)!;
  return `From ${name}, ${first === last ? `row ${first}` : `rows ${first} to ${last}`}.${fromFormula ? ' Ion and ligands were taken from the formula.' : ''}`;
}

/** The cell of a field, or of the nearest field around it. */
function placeOf(field: string, origin: ReadonlyMap<string, TablePlace>): { readonly place: TablePlace; readonly exact: boolean } {
  let name = field;
  for (;;) {
    const place = origin.get(name);
    if (place !== undefined) return { place, exact: 'line' in place || place.column !== null };
    if (name === '') throw new RangeError('a record of a table has no first row');
    name = name.replace(/(?:\[\d+\]|\.?[^.[\]]+)$/, '');
  }
}

/** Faults that repeat row after row, because a column is missing, as one. */
export function gathered(faults: readonly Fault[]): Fault[] {
  const groups = new Map<string, Fault[]>();
  for (const fault of faults) {
    const key = [fault.code, fault.file, fault.field.replace(/\d+/g, ''), fault.found, fault.code === 'MISSING_FIELD' ? '' : `${fault.line}:${fault.column}`].join('|');
    groups.set(key, [...(groups.get(key) ?? []), fault]);
  }
  return [...groups.values()].map((group) => (group.length === 1 ? group[0]! : { ...group[0]!, found: `${group[0]!.found} (and so in ${group.length - 1} more)` }));
}
