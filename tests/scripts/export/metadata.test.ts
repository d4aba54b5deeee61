import { describe, expect, it } from 'vitest';
import { parse } from 'yaml';
import { mainFiles } from '../../../scripts/export/files.ts';
import { changesFeed } from '../../../scripts/export/metadata/atom.ts';
import { citationCff } from '../../../scripts/export/metadata/cff.ts';
import { dataPackage } from '../../../scripts/export/metadata/dataPackage.ts';
import type { WrittenFile } from '../../../scripts/export/metadata/dataPackage.ts';
import { dataciteJson, dataciteXml } from '../../../scripts/export/metadata/datacite.ts';
import { dataCatalog, dataset, recordDataset } from '../../../scripts/export/metadata/jsonLd.ts';
import { licenceAddress, publicationOf } from '../../../scripts/export/metadata/publication.ts';
import { roCrate } from '../../../scripts/export/metadata/roCrate.ts';
import { linkset, recordLinks, setLinks } from '../../../scripts/export/metadata/signposting.ts';
import { robots, sitemap } from '../../../scripts/export/metadata/siteFiles.ts';
import { elementProblems, problemsUnder } from '../../schemas/check.ts';
import { readXml } from '../../schemas/readXml.ts';
import type { XmlElement } from '../../schemas/readXml.ts';
import { awkward, bare, ordinary, publications, record } from './publications.ts';

const formats = ['text/csv', 'application/json'];
const written: readonly WrittenFile[] = mainFiles.slice(0, 3).map((file) => ({ ...file, bytes: 12, sha256: 'ab'.repeat(32) }));
const child = (element: XmlElement, name: string): XmlElement => element.children.find((one) => one.name === name)!;

describe.each(publications)('the metadata of a collection %s', (_, publication) => {
  it('are a CITATION.cff by the kept schema', () => {
    const read = parse(citationCff(publication)) as Record<string, unknown>;
    expect(problemsUnder('cff.json', read)).toEqual([]);
    expect(read).toMatchObject({ title: publication.title, license: publication.licence, url: publication.address, 'date-released': publication.date });
    expect(read['doi']).toBe(publication.doi ?? undefined);
  });

  it('are DataCite metadata as JSON and as XML, with the same facts', () => {
    const json = dataciteJson(publication, formats) as { titles: { title: string }[]; creators: { name: string }[]; doi?: string; rightsList: { rightsIdentifier: string }[]; dates: unknown[] };
    expect(problemsUnder('datacite.json', json)).toEqual([]);
    const xml = readXml(dataciteXml(publication, formats));
    expect(elementProblems('datacite-elements.json', xml)).toEqual([]);
    expect(child(child(xml, 'titles'), 'title').text).toBe(json.titles[0]!.title);
    expect(child(xml, 'creators').children.map((creator) => child(creator, 'creatorName').text)).toEqual(json.creators.map(({ name }) => name));
    expect(child(xml, 'identifier').text).toBe(json.doi ?? '(:tba)');
    expect(json.doi).toBe(publication.doi ?? undefined);
    expect(child(xml, 'dates').children).toHaveLength(json.dates.length);
  });

  it('are an RO-Crate whose every reference leads to an entity', () => {
    const crate = roCrate(publication, written) as { '@graph': Record<string, unknown>[] };
    expect(problemsUnder('ro-crate.json', crate)).toEqual([]);
    const ids = crate['@graph'].map((entity) => entity['@id']);
    expect(new Set(ids).size).toBe(ids.length);
    const references = crate['@graph'].flatMap((entity) => Object.entries(entity).filter(([name]) => name !== 'conformsTo')
      .flatMap(([, value]) => [value].flat()).flatMap((value) => (typeof value === 'object' && value !== null && '@id' in value ? [value['@id']] : [])));
    expect(references.filter((id) => !ids.includes(id))).toEqual([]);
    expect(references.length).toBeGreaterThan(5);
  });

  it('are links by their registered relations, alike in heads and in the link set', () => {
    const set = linkset(publication, [record]) as { linkset: Record<string, unknown>[] };
    expect(problemsUnder('linkset.json', set)).toEqual([]);
    expect(set.linkset.map(({ anchor }) => anchor)).toEqual([`${publication.address}data/`, `${publication.address}complexes/cr-am6/`]);
    for (const links of [setLinks(publication), recordLinks(publication, record)]) {
      for (const rel of ['cite-as', 'type', 'license', 'describedby', 'item']) expect(links.map((link) => link.rel)).toContain(rel);
      for (const { href } of links) expect(URL.canParse(href)).toBe(true);
    }
    const inSet = Object.entries(set.linkset[1]!).filter(([name]) => name !== 'anchor').flatMap(([rel, targets]) => (targets as { href: string }[]).map(({ href }) => `${rel} ${href}`)).sort();
    expect(inSet).toEqual(recordLinks(publication, record).map(({ rel, href }) => `${rel} ${href}`).sort());
  });

  it('name one licence everywhere', () => {
    const xml = readXml(dataciteXml(publication, formats));
    const named = [
      (parse(citationCff(publication)) as { license: string }).license,
      (dataPackage(publication, [], written) as { licenses: { name: string }[] }).licenses[0]!.name,
      (dataciteJson(publication, formats) as { rightsList: { rightsIdentifier: string }[] }).rightsList[0]!.rightsIdentifier,
      child(child(xml, 'rightsList'), 'rights').attributes['rightsIdentifier'],
      (roCrate(publication, written) as { '@graph': { '@id': string; identifier?: string }[] })['@graph'].find((entity) => entity['@id'] === licenceAddress(publication.licence))!.identifier,
    ];
    expect(new Set(named)).toEqual(new Set([publication.licence]));
    const addresses = [dataCatalog(publication)['license'], dataset(publication, mainFiles)['license'], recordDataset(publication, record)['license'], setLinks(publication).find(({ rel }) => rel === 'license')!.href];
    expect(new Set(addresses)).toEqual(new Set([licenceAddress(publication.licence)]));
  });

  it('invent no DOI', () => {
    const all = [citationCff(publication), dataciteXml(publication, formats), JSON.stringify([dataset(publication, mainFiles), dataPackage(publication, [], written), roCrate(publication, written), linkset(publication, [record])])].join('\n');
    const found = [...all.matchAll(/\b10\.\d{4,9}\/[^\s"<]+/g)].map(([doi]) => doi.replace(/\.$/, ''));
    expect(found.filter((doi) => doi !== publication.doi)).toEqual([]);
    expect(found.length > 0).toBe(publication.doi !== null);
    if (publication.doi === null) expect(all).toContain('not yet assigned');
  });
});

describe('the checks themselves', () => {
  it('notice what is wrong', () => {
    const cff = parse(citationCff(ordinary)) as Record<string, unknown>;
    expect(problemsUnder('cff.json', { ...cff, authors: [] })).not.toEqual([]);
    expect(problemsUnder('cff.json', { ...cff, doi: 'not yet assigned' })).not.toEqual([]);
    expect(problemsUnder('cff.json', { ...cff, 'date-released': '2026-02-30' })).not.toEqual([]);
    expect(problemsUnder('cff.json', { ...cff, license: 'CC-BY' })).not.toEqual([]);
    expect(problemsUnder('datacite.json', { ...dataciteJson(ordinary, formats), publicationYear: 2026 })).not.toEqual([]);
    expect(problemsUnder('linkset.json', { linkset: [{ anchor: 'https://example.org/', 'cited-as': [{ href: 'https://example.org/' }] }] })).not.toEqual([]);
    expect(problemsUnder('ro-crate.json', { ...roCrate(ordinary, written), '@graph': [] })).not.toEqual([]);
    const xml = readXml(dataciteXml(ordinary, formats));
    expect(elementProblems('datacite-elements.json', { ...xml, children: xml.children.slice(1) })).toEqual(['resource: no identifier']);
    expect(() => readXml(dataciteXml(ordinary, formats).replace('</titles>', ''))).toThrow();
    expect(() => readXml('<?xml version="1.0" encoding="UTF-8"?>\n<a>b & c</a>')).toThrow('a bare & or >');
  });
});

describe('a record as JSON-LD', () => {
  const value = recordDataset(ordinary, record) as { about: { '@type': string; name: string }[]; variableMeasured: { name: string; value?: number; unitText: string; description: string }[] };
  it('is a Dataset about the complex and the substances that were weighed, each once', () => {
    expect(value.about.map((one) => [one['@type'], one.name])).toEqual([['MolecularEntity', '[Cr(NH3)6]3+'], ['ChemicalSubstance', '[Cr(NH3)6](NO3)3']]);
  });
  it('gives every number with unit, uncertainty and standing, and says why one is withheld', () => {
    expect(value.variableMeasured.map(({ name, value: number, unitText, description }) => [name, number, unitText, description])).toEqual([
      ['Delta (aq-295)', 21550.25, 'cm-1', 'fitted; total standard uncertainty 161.5 cm-1'],
      ['C (aq-295)', undefined, 'cm-1', 'withheld: C is assumed.'],
    ]);
  });
});

describe('dates', () => {
  const rows = { meta: new Map([['group.release', '2'], ['group.started', '2004-09-01']]), people: [], changesSince: 0 };
  it('are those of the frozen release of this name, else of the last one, else the start of the collection', () => {
    const frozen = [{ id: '1', date: '2025-01-05' }, { id: '2', date: '2026-03-02' }];
    expect(publicationOf({ ...rows, frozen })).toMatchObject({ date: '2026-03-02', state: 'frozen' });
    expect(publicationOf({ ...rows, frozen, changesSince: 3 })).toMatchObject({ date: '2026-03-02', state: 'changed since' });
    expect(publicationOf({ ...rows, frozen: frozen.slice(0, 1) })).toMatchObject({ date: '2025-01-05', state: 'not frozen' });
    expect(publicationOf({ ...rows, frozen: [] })).toMatchObject({ date: '2004-09-01', state: 'not frozen' });
  });
});

describe('the feed of changes', () => {
  const releases = [
    { id: '1', date: '2025-01-05', who: 'T. Lind', cause: 'First', changes: [] },
    { id: '2', date: '2026-03-02', who: 'T. Lind', cause: 'New spectra.', changes: ['cr-am6/aq: Delta went from 21 550(160) to 21 600(160) cm⁻¹ (readings).'] },
  ];
  const entries = (feed: XmlElement): XmlElement[] => feed.children.filter(({ name }) => name === 'entry');

  it.each(publications)('of a collection %s is well formed and has what RFC 4287 asks for', (_, publication) => {
    const feed = readXml(changesFeed(publication, releases));
    expect([feed.name, feed.attributes['xmlns']]).toEqual(['feed', 'http://www.w3.org/2005/Atom']);
    for (const element of [feed, ...entries(feed)]) for (const name of ['id', 'title', 'updated']) expect(element.children.filter((one) => one.name === name)).toHaveLength(1);
    expect(child(child(feed, 'author'), 'name').text).toBe(publication.group);
    const ids = entries(feed).map((entry) => child(entry, 'id').text);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it('tells the newest release first, with its changes', () => {
    const feed = readXml(changesFeed(ordinary, releases));
    expect(child(feed, 'updated').text).toBe('2026-03-02T00:00:00Z');
    expect(entries(feed).map((entry) => child(entry, 'content').text)).toEqual([
      'New spectra. Released by T. Lind. cr-am6/aq: Delta went from 21 550(160) to 21 600(160) cm⁻¹ (readings).',
      'First. Released by T. Lind. It is the first release.',
    ]);
  });

  it('says before the first release that the collection was started', () => {
    expect(entries(readXml(changesFeed(bare, []))).map((entry) => [child(entry, 'title').text, child(entry, 'updated').text])).toEqual([['The collection was started', '2004-09-01T00:00:00Z']]);
  });
});

describe('sitemap.xml and robots.txt', () => {
  it('name every page by its whole address, with the date of the release', () => {
    const map = readXml(sitemap(awkward, ['', 'complexes/cr-am6/']));
    expect([map.name, map.attributes['xmlns']]).toEqual(['urlset', 'http://www.sitemaps.org/schemas/sitemap/0.9']);
    expect(map.children.map((url) => [child(url, 'loc').text, child(url, 'lastmod').text])).toEqual([['https://example.org/bands/', '2026-03-02'], ['https://example.org/bands/complexes/cr-am6/', '2026-03-02']]);
    expect(() => sitemap(ordinary, Array.from({ length: 50_001 }, () => ''))).toThrow('at most 50 000');
  });
  it('lead robots to the sitemap', () => {
    expect(robots(ordinary).split('\n')).toEqual(['User-agent: *', 'Allow: /', '', 'Sitemap: https://example.org/bands/sitemap.xml', '']);
  });
});
