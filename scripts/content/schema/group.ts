// The file group.yaml: whose collection it is, and how it is published.

import { z } from 'zod';
import { flag, text } from './leaves.ts';
import { date, doi, licence, orcid, webAddress } from './references.ts';

export const groupSchema = z.strictObject({
  title: text().meta({ description: 'title of the collection', examples: ['"Spectra of amine complexes"'] }),
  group: text().meta({ description: 'name of the group', examples: ['"Coordination chemistry group"'] }),
  description: text().optional().meta({ description: 'a sentence or two for the first page', examples: ['"Readings since 2004."'] }),
  contact: text().optional().meta({ description: 'address for questions and mistakes', examples: ['bands@example.org'] }),
  people: z.array(z.strictObject({
    name: text().meta({ description: 'name', examples: ['Tove Lind'] }),
    initials: text().optional().meta({ description: 'as in by: of a measurement', examples: ['TL'] }),
    orcid: orcid().optional().meta({ description: 'ORCID identifier', examples: ['0000-0002-1825-0097'] }),
  })).max(500).optional().meta({ description: 'who measured and keeps the collection', examples: ['[{ name: Tove Lind, initials: TL }]'] }),
  licence: licence().meta({ description: 'SPDX identifier of the licence of the content', examples: ['CC-BY-4.0'] }),
  url: webAddress().meta({ description: 'address of the published site with its base path', examples: ['https://example.org/bands/'] }),
  release: text().meta({ description: 'name of this release', examples: ['2026.1'] }),
  started: date().meta({ description: 'day on which the collection was started', examples: ['2004-09-01'] }),
  doi: doi().optional().meta({ description: 'DOI of the published set', examples: ['10.5555/example.1'] }),
  demonstration: flag().optional().meta({ description: 'true puts a banner on every page: these data are invented', examples: ['true'] }),
});
