// Ligand, source and group records turned from what was typed into what the rest of the project reads.

import type { z } from 'zod';
import type { groupSchema } from '../schema/group.ts';
import type { ligandSchema } from '../schema/ligand.ts';
import type { sourceSchema } from '../schema/source.ts';
import type { Group, LigandRecord, SourceRecord } from '../types.ts';
import type { OpenedFile } from '../files.ts';

export function ligandRecord({ id, file }: OpenedFile, typed: z.output<typeof ligandSchema>): LigandRecord {
  return {
    id, file,
    name: typed.name,
    formula: typed.formula,
    abbreviation: typed.abbreviation ?? null,
    synonyms: typed.synonyms ?? [],
    charge: typed.charge,
    denticity: typed.denticity,
    donors: typed.donors.flat(),
    smiles: typed.smiles ?? null,
    notes: typed.notes ?? null,
  };
}

export function sourceRecord({ id, file }: OpenedFile, typed: z.output<typeof sourceSchema>): SourceRecord {
  return {
    id, file,
    reference: typed.reference,
    authors: typed.authors ?? [],
    title: typed.title ?? null,
    journal: typed.journal ?? null,
    year: typed.year ?? null,
    volume: typed.volume ?? null,
    pages: typed.pages ?? null,
    doi: typed.doi ?? null,
    url: typed.url ?? null,
  };
}

export function groupOf(typed: z.output<typeof groupSchema>): Group {
  return {
    title: typed.title,
    name: typed.group,
    description: typed.description ?? null,
    contact: typed.contact ?? null,
    people: (typed.people ?? []).map((person) => ({ name: person.name, orcid: person.orcid ?? null, initials: person.initials ?? null })),
    licence: typed.licence,
    url: typed.url.endsWith('/') ? typed.url : `${typed.url}/`,
    release: typed.release,
    started: typed.started,
    doi: typed.doi ?? null,
    demonstration: typed.demonstration ?? false,
  };
}
