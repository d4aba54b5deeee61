import type { DescribedRecord } from '../../../scripts/export/metadata/jsonLd.ts';
import type { Publication } from '../../../scripts/export/metadata/publication.ts';
import { recordFiles } from '../../../scripts/export/files.ts';

/** Invented publications: an ordinary one with a DOI, one without people or DOI, one whose every text is awkward. */
export const ordinary: Publication = {
  title: 'Bands of an invented group', group: 'An invented group', description: 'Readings since 2004, all invented for tests of citations and metadata.', contact: 'bands@example.org',
  people: [{ name: 'Lind, Tove', orcid: '0000-0002-1825-0097' }, { name: 'Odo Marrenfeld', orcid: null }],
  licence: 'CC-BY-4.0', address: 'https://example.org/bands/', release: '1.1.0', date: '2026-03-02', started: '2004-09-01', state: 'frozen', doi: '10.5555/example.1',
  demonstration: false, software: 'bandstead 0.1.0',
};

export const bare: Publication = { ...ordinary, group: 'Coordination chemistry, An invented university', people: [], doi: null, description: null, contact: null, state: 'not frozen', date: '2004-09-01', demonstration: true };

export const awkward: Publication = {
  ...ordinary, title: 'A & B: 100 % of <script>alert("x")</script> {braces} \\ $C_2$ #1', group: 'Ünïcode & Söhne', state: 'changed since',
  description: 'Two lines:\nthe second has ]]> and "quotes" and – dashes.', people: [{ name: 'O\'Brien-Åse, X.', orcid: null }],
};

export const publications = [['with people and a DOI', ordinary], ['without people and DOI', bare], ['with awkward texts', awkward]] as const;

export const record: DescribedRecord = {
  id: 'cr-am6', formula: '[Cr(NH3)6]3+', ion: 'Cr(III)', geometry: 'octahedral', names: ['hexaamminechromium(III)'], samples: ['[Cr(NH3)6](NO3)3', '[Cr(NH3)6](NO3)3'],
  numbers: [
    { measurement: 'aq-295', name: 'Delta', value: 21550.25, uTotal: 161.5, unit: 'cm-1', standing: 'fitted', reason: null },
    { measurement: 'aq-295', name: 'C', value: null, uTotal: null, unit: 'cm-1', standing: 'withheld', reason: 'C is assumed.' },
  ],
  files: recordFiles,
};
