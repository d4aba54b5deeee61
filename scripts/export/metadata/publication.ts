// What is published, by whom, when, under which licence: the one source of every citation and metadata file.

/** A name as typed: "Lind, Tove" says which part is the family's, "Tove Lind" does not, and nothing is guessed. */
export interface Person {
  readonly name: string;
  readonly orcid: string | null;
}

export type PublicationState = 'frozen' | 'changed since' | 'not frozen';

export interface Publication {
  readonly title: string;
  readonly group: string;
  readonly description: string | null;
  readonly contact: string | null;
  readonly people: readonly Person[];
  /** SPDX identifier. */
  readonly licence: string;
  /** Address of the site with its base path and closing slash. */
  readonly address: string;
  readonly release: string;
  /** ISO date of the release; while none was frozen, the day on which the collection was started. */
  readonly date: string;
  /** ISO date on which the collection was started. */
  readonly started: string;
  readonly state: PublicationState;
  readonly doi: string | null;
  readonly demonstration: boolean;
  /** Name and version of the software. */
  readonly software: string;
}

export interface PublicationRows {
  /** Rows of the table meta, by key. */
  readonly meta: ReadonlyMap<string, string>;
  readonly people: readonly Person[];
  /** Rows of frozen_release, oldest first. */
  readonly frozen: readonly { readonly id: string; readonly date: string }[];
  /** How many rows of the table change belong to no release yet. */
  readonly changesSince: number;
}

/**
 * The publication as the database describes it. The date is that of the frozen release of this name; where there is none, of the
 * last frozen release; before the first, the day on which the collection was started.
 */
export function publicationOf({ meta, people, frozen, changesSince }: PublicationRows): Publication {
  const fact = (key: string): string | null => meta.get(`group.${key}`) ?? null;
  const release = fact('release') ?? 'not recorded';
  const started = fact('started') ?? '1970-01-01';
  const own = frozen.find(({ id }) => id === release);
  return {
    title: fact('title') ?? 'Ligand-field parameters',
    group: fact('name') ?? 'not recorded',
    description: fact('description'),
    contact: fact('contact'),
    people: people.map(({ name, orcid }) => ({ name, orcid })),
    licence: fact('licence') ?? 'not recorded',
    address: fact('url') ?? 'https://example.org/',
    release,
    date: own?.date ?? frozen.at(-1)?.date ?? started,
    started,
    state: own === undefined ? 'not frozen' : changesSince > 0 ? 'changed since' : 'frozen',
    doi: fact('doi'),
    demonstration: fact('demonstration') === 'true',
    software: meta.get('software') ?? 'not recorded',
  };
}

/** The version in words: "release 1.1.0, 2026-03-02", with what keeps it from being exactly that. */
export function versionWords({ release, date, state }: Publication): string {
  const words = { frozen: '', 'changed since': ' with later changes', 'not frozen': ' (not frozen)' } as const;
  return `release ${release}${words[state]}, ${date}`;
}

/** The version as one word: "1.1.0", "1.1.0+changed", "0.1.0+unfrozen". */
export function versionCode({ release, state }: Publication): string {
  return state === 'frozen' ? release : `${release}+${state === 'not frozen' ? 'unfrozen' : 'changed'}`;
}

/** Address of the licence's text by its SPDX identifier. */
export function licenceAddress(licence: string): string {
  return `https://spdx.org/licenses/${licence}.html`;
}

/** "10.5555/example.1", or the words that no DOI is assigned yet. */
export function doiWords({ doi }: Publication): string {
  return doi ?? 'not yet assigned';
}

/** What identifies the set on the web: the DOI's address, else the site's. */
export function setIdentifier({ doi, address }: Publication): string {
  return doi === null ? address : `https://doi.org/${doi}`;
}

/** A description of the set that stands alone, whether or not the group wrote one. */
export function descriptionOf(publication: Publication): string {
  const own = publication.description ?? `Band readings of transition-metal complexes, with their assignment and fitted ligand-field parameters, collected by ${publication.group}.`;
  const invented = publication.demonstration && !/invented/i.test(own) ? ' Demonstration: all data are invented.' : '';
  return `${own}${invented}`;
}

/** Family and given name where the comma tells them apart, else null. */
export function nameParts(name: string): { readonly family: string; readonly given: string } | null {
  const [family, given, ...more] = name.split(',').map((part) => part.trim());
  return given === undefined || more.length > 0 || family === '' || given === '' ? null : { family: family!, given };
}

/** One record as a thing that is cited by itself. */
export interface CitedRecord {
  readonly id: string;
  /** Formula as plain text. */
  readonly formula: string;
  readonly ion: string;
  readonly geometry: string;
}

export function recordAddress({ address }: Publication, { id }: Pick<CitedRecord, 'id'>): string {
  return `${address}complexes/${id}/`;
}
