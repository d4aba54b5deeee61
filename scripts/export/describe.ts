// Publication and records as citations and metadata need them, from rows.

import { publicationOf } from './metadata/publication.ts';
import type { CitedRecord, Publication } from './metadata/publication.ts';
import { versionCode } from './metadata/publication.ts';
import type { FeedRelease } from './metadata/atom.ts';
import type { JsonObject } from './json.ts';
import type { Row, TableRows } from './tableFiles.ts';

const of = (rows: TableRows, table: string): readonly Row[] => rows[table] ?? [];
const byNumber = (rows: readonly Row[]): Row[] => [...rows].sort((a, b) => Number(a['number']) - Number(b['number']));

export function publicationFromRows(rows: TableRows): Publication {
  return publicationOf({
    meta: new Map(of(rows, 'meta').map(({ key, value }) => [String(key), String(value)])),
    people: byNumber(of(rows, 'person')).map(({ name, orcid }) => ({ name: String(name), orcid: orcid === null ? null : String(orcid) })),
    frozen: byNumber(of(rows, 'frozen_release')).map(({ id, date }) => ({ id: String(id), date: String(date) })),
    changesSince: of(rows, 'change').filter(({ release }) => release === null).length,
  });
}

export function citedRecords(rows: TableRows): readonly CitedRecord[] {
  return of(rows, 'complex').map(({ id, formula, ion, geometry }) => ({ id: String(id), formula: String(formula), ion: String(ion), geometry: String(geometry) }));
}

export function feedReleases(rows: TableRows): readonly FeedRelease[] {
  return byNumber(of(rows, 'frozen_release')).map(({ id, date, who, cause }) => ({
    id: String(id), date: String(date), who: String(who), cause: String(cause),
    changes: byNumber(of(rows, 'change').filter(({ release }) => release === id)).map(({ text }) => String(text)),
  }));
}

const note = 'Energies in cm-1; u is one standard uncertainty. null is withheld or not recorded, never zero. No hazard caution here does not mean no hazard.';

/** What stands in front of collection.json and every record.json. */
export function aboutJson(publication: Publication, address: string): JsonObject {
  return {
    title: publication.title, group: publication.group, address, release: versionCode(publication), released: publication.date, state: publication.state,
    licence: publication.licence, doi: publication.doi, demonstration: publication.demonstration, note,
  };
}
