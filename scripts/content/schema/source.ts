// The record of a published source: content/sources/ID.yaml.

import { z } from 'zod';
import { leaf, text } from './leaves.ts';
import { doi, webAddress } from './references.ts';

const year = () =>
  leaf<string>((typed) => {
    const value = typed.trim();
    if (/^(18|19|20)\d{2}$/.test(value)) return { value };
    return { code: 'BAD_DATE', found: typed, expected: 'a year of four digits, e.g. 1961', mend: 'write the year alone' };
  }).meta({ bare: 'number' });

export const sourceSchema = z.strictObject({
  reference: text().meta({ description: 'the reference as it is printed', examples: ['"A. Author, J. Invented Chem. 12, 345 (1999)"'] }),
  authors: z.array(text()).max(200).optional().meta({ description: 'authors, one an item', examples: ['[A. Author, B. Author]'] }),
  title: text().optional().meta({ description: 'title', examples: ['"Spectra of amines"'] }),
  journal: text().optional().meta({ description: 'journal or publisher', examples: ['J. Invented Chem.'] }),
  year: year().optional().meta({ description: 'year', examples: ['1999'] }),
  volume: text().optional().meta({ description: 'volume', examples: ['12'] }),
  pages: text().optional().meta({ description: 'pages or article number', examples: ['345-350'] }),
  doi: doi().optional().meta({ description: 'DOI', examples: ['10.5555/example.12'] }),
  url: webAddress().optional().meta({ description: 'web address where there is no DOI', examples: ['https://example.org/thesis.pdf'] }),
});
