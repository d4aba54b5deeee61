import { describe, expect, it } from 'vitest';
import { bibtexText } from '../../../scripts/export/metadata/bibtex.ts';
import { citationBibtex, citationRis, citationText } from '../../../scripts/export/metadata/cite.ts';
import { sourcesBib } from '../../../scripts/export/metadata/sources.ts';
import { awkward, bare, ordinary, publications, record } from './publications.ts';

/** Reads BibTeX entries back: braces balanced, fields by name. An independent reader of what the writer gives. */
function readBibtex(text: string): { type: string; key: string; fields: Record<string, string> }[] {
  const entries: { type: string; key: string; fields: Record<string, string> }[] = [];
  for (const [, type = '', key = '', body = ''] of text.matchAll(/@(\w+)\{([^,\s]+),\n([\s\S]*?)\n\}\n/g)) {
    const fields: Record<string, string> = {};
    for (const line of body.split(/,\n/)) {
      const [, name = '', value = ''] = /^ {2}(\w+) = \{([\s\S]*)\}$/.exec(line) ?? [];
      let depth = 0;
      for (const [index, character] of [...value].entries()) {
        if (value[index - 1] === '\\') continue;
        depth += character === '{' ? 1 : character === '}' ? -1 : 0;
        if (depth < 0) throw new Error(`unbalanced braces in ${name}`);
      }
      if (name === '' || depth !== 0) throw new Error(`no field in "${line}"`);
      fields[name] = value;
    }
    entries.push({ type, key, fields });
  }
  return entries;
}

/** Reads RIS back as pairs of tag and value. */
function readRis(text: string): [string, string][] {
  const lines = text.split('\r\n');
  expect(lines.at(-1)).toBe('');
  return lines.slice(0, -1).map((line) => {
    const found = /^([A-Z][A-Z0-9]) {2}- (.*)$/.exec(line);
    if (found === null) throw new Error(`no RIS line: "${line}"`);
    return [found[1]!, found[2]!];
  });
}

describe.each(publications)('a citation of a collection %s', (_, publication) => {
  it.each([['the set', null], ['one record', record]] as const)('of %s names version, date, address and what stands for the DOI, alike in text, BibTeX and RIS', (what, cited) => {
    const text = citationText(publication, cited);
    const [entry, ...more] = readBibtex(citationBibtex(publication, cited));
    const ris = readRis(citationRis(publication, cited));
    const tag = (name: string): string | undefined => ris.find(([one]) => one === name)?.[1];
    const doi = publication.doi ?? 'not yet assigned';
    const address = what === 'the set' ? publication.address : `${publication.address}complexes/cr-am6/`;
    expect(more).toEqual([]);
    for (const part of [`release ${publication.release}`, publication.date, address, `DOI: ${doi}`]) expect(text).toContain(part);
    expect(entry!.fields).toMatchObject({ year: publication.date.slice(0, 4), url: address });
    expect(entry!.fields['note']).toContain(`Release ${publication.release}`);
    expect(entry!.fields['note']).toContain(publication.date);
    expect(entry!.fields['note']).toContain(doi);
    expect(entry!.fields['doi']).toBe(publication.doi ?? undefined);
    expect([tag('TY'), tag('PY'), tag('DA'), tag('UR'), tag('DO')]).toEqual(['DATA', publication.date.slice(0, 4), publication.date.replaceAll('-', '/'), address, publication.doi ?? undefined]);
    expect(tag('N1')).toContain(`DOI: ${doi}`);
    expect(ris.at(-1)).toEqual(['ER', '']);
    if (cited !== null) for (const one of [text, entry!.fields['title']!, tag('TI')!]) expect(one).toContain('record cr-am6');
  });
});

describe('a citation', () => {
  it('says what keeps the numbers from being those of the release', () => {
    expect(citationText(ordinary)).toContain('release 1.1.0, 2026-03-02.');
    expect(citationText({ ...ordinary, state: 'changed since' })).toContain('release 1.1.0 with later changes, 2026-03-02.');
    expect(citationText(bare)).toContain('release 1.1.0 (not frozen), 2004-09-01.');
    expect(citationText(bare)).toContain('Invented demonstration data');
    expect([ordinary, bare, awkward].map((one) => readBibtex(citationBibtex(one))[0]!.fields['version'])).toEqual(['1.1.0', '1.1.0+unfrozen', '1.1.0+changed']);
  });

  it('names the people, or the group where nobody is named', () => {
    expect(citationText(ordinary)).toMatch(/^Lind, Tove, Odo Marrenfeld: .* An invented group\. https:/);
    expect(citationText(bare)).toMatch(/^Coordination chemistry, An invented university: /);
    expect(readBibtex(citationBibtex(ordinary))[0]!.fields['author']).toBe('Lind, Tove and Odo Marrenfeld');
    expect(readBibtex(citationBibtex(bare))[0]!.fields['author']).toBe('{Coordination chemistry, An invented university}');
    expect(readRis(citationRis(ordinary)).filter(([tag]) => tag === 'AU').map(([, name]) => name)).toEqual(['Lind, Tove', 'Odo Marrenfeld']);
  });
});

describe('BibTeX', () => {
  it('writes as text what TeX would take for a command', () => {
    expect(bibtexText('50 % & $C_2$ #1 {a} ~ ^ \\')).toBe('50 \\% \\& \\$C\\_2\\$ \\#1 \\{a\\} \\textasciitilde{} \\textasciicircum{} \\textbackslash{}');
  });

  it('holds every source under its record id', () => {
    const source = { id: 'author-1999', reference: 'A. Author, J. Invented Chem. 12, 345 (1999)', authors: '["A. Author","B. Author"]', title: 'Spectra & amines', journal: 'J. Invented Chem.', year: '1999', volume: '12', pages: '345-350', doi: '10.5555/ex_1', url: null };
    const thesis = { ...source, id: 'thesis', journal: null, authors: '[]', doi: null, pages: null };
    expect(readBibtex(sourcesBib([source, thesis]))).toEqual([
      { type: 'article', key: 'author-1999', fields: { author: 'A. Author and B. Author', title: 'Spectra \\& amines', journal: 'J. Invented Chem.', year: '1999', volume: '12', pages: '345--350', doi: '10.5555/ex_1', note: 'A. Author, J. Invented Chem. 12, 345 (1999)' } },
      { type: 'misc', key: 'thesis', fields: { title: 'Spectra \\& amines', year: '1999', volume: '12', note: 'A. Author, J. Invented Chem. 12, 345 (1999)' } },
    ]);
    expect(sourcesBib([])).toMatch(/^% /);
  });
});
