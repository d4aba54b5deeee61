// ro-crate-metadata.json: RO-Crate 1.2 description of the folder data/.

import type { Json, JsonObject } from '../json.ts';
import { keywords } from './cff.ts';
import type { WrittenFile } from './dataPackage.ts';
import { descriptionOf, doiWords, licenceAddress, setIdentifier, versionCode } from './publication.ts';
import type { Publication } from './publication.ts';

/** The crate: its descriptor, the folder, the files, the people, the group and the licence, each an entity of the graph. */
export function roCrate(publication: Publication, files: readonly WrittenFile[]): JsonObject {
  const { people, group, licence, title, date, address } = publication;
  const personIds = people.map(({ orcid }, index) => (orcid === null ? `#person-${index + 1}` : `https://orcid.org/${orcid}`));
  const licenceId = licenceAddress(licence);
  const to = (id: string): Json => ({ '@id': id });
  return {
    '@context': 'https://w3id.org/ro/crate/1.2/context',
    '@graph': [
      { '@id': 'ro-crate-metadata.json', '@type': 'CreativeWork', about: to('./'), conformsTo: to('https://w3id.org/ro/crate/1.2') },
      {
        '@id': './', '@type': 'Dataset', name: title, description: `${descriptionOf(publication)} DOI: ${doiWords(publication)}.`, datePublished: date,
        license: to(licenceId), identifier: setIdentifier(publication), url: address, version: versionCode(publication), keywords: [...keywords],
        author: people.length === 0 ? [to('#group')] : personIds.map(to), publisher: to('#group'), hasPart: files.map(({ name }) => to(name)),
      },
      ...files.map(({ name, mediaType, about, bytes, sha256 }) => ({
        '@id': name, '@type': 'File', name, description: about, encodingFormat: mediaType, contentSize: String(bytes), sha256,
      })),
      { '@id': licenceId, '@type': 'CreativeWork', name: licence, identifier: licence },
      { '@id': '#group', '@type': 'Organization', name: group },
      ...people.map(({ name }, index) => ({ '@id': personIds[index]!, '@type': 'Person', name, affiliation: to('#group') })),
    ],
  };
}
