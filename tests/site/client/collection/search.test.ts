import { beforeAll, describe, expect, test } from 'vitest';
import { normaliseQuery, searchMatch } from '#engine';
import { type FoundCollection, type PackedSearch, unpackSearch } from '../../../../site/client/collection/packed.ts';
import { readQuery } from '../../../../site/client/collection/query.ts';
import { matches, search } from '../../../../site/client/collection/search.ts';
import { type SearchIndex, buildIndex } from '../../../../site/client/collection/searchIndex.ts';
import { readRows } from '../../../../site/data/database.ts';
import { searchData } from '../../../../site/data/search.ts';
import { collectionTree } from '../../../../site/data/tree.ts';
import { refittedDemonstration } from '../../demonstration.ts';

let collection: FoundCollection;
let index: SearchIndex;
beforeAll(async () => {
  collection = unpackSearch(JSON.parse(JSON.stringify(searchData(collectionTree(readRows(await refittedDemonstration()))))) as PackedSearch);
  index = await buildIndex(collection, async () => {});
});

const idOf = (row: number): string => collection.complexes[collection.rows[row]!.complex]!.id;
const found = (query: string) => search(collection, index, query);
const ids = (query: string): readonly string[] => [...new Set(found(query).hits.map(({ row }) => idOf(row)))];
const why = (query: string): string => found(query).hits[0]?.why() ?? 'nothing';

/** Query, the complex that must come first, and how the table says it was found. */
const QUERIES: readonly (readonly [query: string, first: string, why: string])[] = [
  // Formulas in every usual spelling.
  ['Cr(NH3)6', 'cr-am6', 'formula'], ['[Cr(NH3)6]3+', 'cr-am6', 'formula'], ['[Cr(NH₃)₆]³⁺', 'cr-am6', 'formula'], ['[Cr(NH3)6]^3+', 'cr-am6', 'formula'], ['[Cr(NH_3)_6]^{3+}', 'cr-am6', 'formula'],
  ['[Cr(NH<sub>3</sub>)<sub>6</sub>]<sup>3+</sup>', 'cr-am6', 'formula'], ['cr nh3 6', 'cr-am6', 'formula'], ['CR(NH3)6', 'cr-am6', 'formula'], ['[Cr(NH3)6](NO3)3', 'cr-am6', 'formula'], ['[Cr(NH3)6]Cl3', 'cr-am6', 'formula'],
  ['[Cr(en)₃]³⁺', 'cr-en3', 'formula'], ['Cren3', 'cr-en3', 'formula'], ['cr en 3', 'cr-en3', 'formula'], ['Cr(C2H8N2)3', 'cr-en3', 'formula'], ['Cr(OH2)6', 'cr2-aq6', 'ion and ligands'], ['[Cr(H2O)6]2+', 'cr2-aq6', 'formula'],
  ['[Cr(H2O)6]3+', 'cr-aq6', 'formula'], ['Cr(C2O4)3', 'cr-ox3', 'formula'], ['K3[Cr(C2O4)3]·3H2O', 'cr-ox3', 'formula'], ['Cr(CN)63-', 'cr-cn6', 'formula'], ['K3[Fe(CN)6]', 'fe3-cn6', 'formula'], ['K4[Fe(CN)6]', 'fe2-cn6', 'formula'],
  ['[Fe(CN)6]3-', 'fe3-cn6', 'formula'], ['[Fe(CN)6] 4-', 'fe2-cn6', 'formula'], ['CoCl4', 'co2-cl4', 'formula'], ['[CoCl4]2-', 'co2-cl4', 'formula'], ['Ni(bipy)3', 'ni-bpy3', 'formula'], ["[Ni(2,2'-bpy)3]2+", 'ni-bpy3', 'ion and ligands'],
  ['Cr(NCS)6', 'cr-ncs6', 'formula'], ['CrF6 3-', 'cr-f6', 'formula'], ['Cr(NH3)5Cl', 'cr-am5-cl', 'formula'], ['[CrCl(NH3)5]2+', 'cr-am5-cl', 'formula'], ['[Co(NO2)6]3-', 'co3-nitro6', 'formula'], ['Co(gly)3', 'co3-gly3-mer', 'formula'],
  // Isomers.
  ['trans-[CrCl2(en)2]+', 'cr-en2-cl2-trans', 'formula'], ['cis-[CrCl2(en)2]+', 'cr-en2-cl2-cis', 'formula'], ['trans-Co(en)2Cl2', 'co3-en2-cl2-trans', 'formula'], ['fac-Co(gly)3', 'co3-gly3-fac', 'formula'], ['mer-Cr(NH3)3Cl3', 'cr-am3-cl3-mer', 'formula'],
  ['fac', 'cr-am3-aq3-fac', 'name or ligand'], ['mer cobalt', 'co3-gly3-mer', 'name or ligand'],
  // Donor atoms and pieces.
  ['CrN6', 'cr2-bpy3', 'donor atoms'], ['CrO6', 'cr2-aq6', 'donor atoms'], ['CoN5Cl', 'co3-am5-cl', 'donor atoms'], ['NiN4Cl2', 'ni-py4-cl2-trans', 'donor atoms'], ['Cr(NH3)5', 'cr-am5-cl', 'ion and ligands'],
  // Names old and new.
  ['hexaamminechromium(III)', 'cr-am6', 'name'], ['hexaammine chromium', 'cr-am6', 'start of a name'], ['tris(ethane-1,2-diamine)chromium(III)', 'cr-en3', 'name'], ['tris(ethylenediamine)cobalt(III)', 'co3-en3', 'name'],
  ['tris(ethane-1,2-diamine)', 'v2-en3', 'start of a name'], ['hexacyanoferrate(II)', 'fe2-cn6', 'name'], ['hexacyanidoferrate(III)', 'fe3-cn6', 'name'], ['tetrachlorocobaltate(II)', 'co2-cl4', 'name'], ['tetrabromidonickelate(II)', 'ni-br4', 'name'],
  ['trioxalatochromate(III)', 'cr-ox3', 'name'], ['hexafluorochromate', 'cr-f6', 'start of a name'], ['chromium oxalate', 'cr-ox3', 'name or ligand'], ['nickel pyridine', 'ni-py4-cl2-trans', 'name or ligand'], ['chromium ammine', 'cr-am3-cl3-mer', 'name or ligand'],
  // Ligands with their synonyms.
  ['bipyridyl', 'v2-bpy3', 'name or ligand'], ['phenanthroline', 'co2-phen3', 'name or ligand'], ['isothiocyanato', 'cr-ncs6', 'name or ligand'], ['azide', 'cr-azide6', 'name or ligand'], ['dmso', 'v3-dmso6', 'name or ligand'], ['glycinate', 'cr-gly3-fac', 'name or ligand'],
  // Ions and d counts.
  ['Cr(III)', 'cr-cl6', 'ion'], ['chromium(III)', 'cr-cl6', 'ion'], ['Cr3+', 'cr-cl6', 'ion'], ['Cr³⁺', 'cr-cl6', 'ion'], ['Mn(II)', 'mn2-f6', 'ion'], ['manganese(4+)', 'mn4-f6', 'ion'], ['Zn', 'zn-cl4', 'ion and ligands'], ['ruthenium', 'ru-am6', 'name or ligand'],
  ['d3', 'v2-aq6', 'd3'], ['d⁷', 'co2-aq6', 'd7'], ['d10', 'zn-cl4', 'd10'], ['d^9', 'cu-aq6', 'd9'],
  // Geometry, spin, phase, medium, verdict, and words together.
  ['square planar', 'ni-cn4', 'geometry square planar'], ['tetrahedral nickel', 'ni-br4', 'geometry tetrahedral'], ['low spin iron', 'fe2-cn6', 'spin singlet, low spin'], ['Co(III) low spin', 'co3-aq6', 'spin singlet, low spin, Co(III)'],
  ['perchloric acid', 'v3-aq6', 'medium perchloric acid, 1 mol L-1'], ['Cr3+ crystal', 'cr-f6', 'phase crystal, Cr(III)'], ['refused', 'v3-dmso6', 'verdict refused'], ['Co2+ dmso', 'co2-dmso6', 'name or ligand, Co(II)'],
  // Record ids.
  ['cr-am6', 'cr-am6', 'record id'], ['CR-AM6/crystal-80', 'cr-am6', 'record id'], ['co3-gly3-mer', 'co3-gly3-mer', 'record id'],
  // Bands and ranges.
  ['22140 cm-1', 'cr-am6', 'band near 22 150 cm⁻¹'], ['22140(50) cm-1', 'cr-am6', 'band near 22 150 cm⁻¹'], ['22 140 cm⁻¹', 'cr-am6', 'band near 22 150 cm⁻¹'], ['451.7 nm', 'cr-am6', 'band near 22 150 cm⁻¹'], ['22.14 kK', 'cr-am6', 'band near 22 150 cm⁻¹'], ['2.745 eV', 'cr-am6', 'band near 22 150 cm⁻¹'],
  ['22100-22180 cm-1', 'cr-am6', 'band near 22 150 cm⁻¹'], ['Cr(III) 22140 cm-1', 'cr-am6', 'ion, band near 22 150 cm⁻¹'], ['Delta 22000-23000', 'cr-am6', 'Δ 22 130 cm⁻¹'], ['Δ=22130', 'cr-am6', 'Δ 22 130 cm⁻¹'], ['Dq 2213', 'cr-am6', 'Δ 22 130 cm⁻¹'],
  ['Delta > 33000', 'rh-en3', 'Δ 33 500 cm⁻¹'], ['beta 0.35-0.41', 'co3-cn6', 'β 0.4'], ['Mn(II) Delta 7000-8000', 'mn2-f6', 'ion, Δ 7720 cm⁻¹'],
];

describe(`the first hit of ${QUERIES.length} queries, and why it was found`, () => {
  test.each(QUERIES)('%s', (query, first, reason) => {
    const { hits, nearest } = found(query);
    const shown = (hits[0]?.why() ?? '').replaceAll(/[\u2009\u202f]/g, ' ');
    expect([nearest, hits[0] === undefined ? null : idOf(hits[0].row), shown]).toEqual([false, first, reason]);
  });
});

describe('what is not asked is not found', () => {
  test('a metal alone finds its own complexes, an ion its own oxidation state', () => {
    expect(ids('Co(III)').every((id) => id.startsWith('co3-'))).toBe(true);
    expect(ids('Cr(II)').toSorted()).toEqual(['cr2-aq6', 'cr2-bpy3']);
    expect(ids('nickel').every((id) => id.startsWith('ni-'))).toBe(true);
  });

  test('every number that was asked for is in every row found', () => {
    for (const row of found('Delta 15000-18000').hits) expect(collection.rows[row.row]!.delta).toSatisfy((delta: number) => delta >= 15000 && delta <= 18000);
    for (const row of found('465 nm').hits) expect(collection.rows[row.row]!.bands.some((band) => Math.abs(band - 1e7 / 465) <= 300)).toBe(true);
  });

  test('an exact formula stands before all that merely begin with it', () => {
    const all = ids('Cr(NH3)5');
    expect(all.length).toBeGreaterThan(2);
    expect(ids('Cr(NH3)6')).toEqual(['cr-am6']);
  });
});

describe('nothing found gives the nearest', () => {
  test.each([['hexaaminechromium', 'cr-am6'], ['nickle', 'ni-'], ['Cr(NH3)7', 'cr-am6'], ['acetylacetonate', 'acac'], ['cr-amm6', 'cr-am6'], ['99000 cm-1', 'co3-cn6'], ['Delta 90000-95000', 'rh-'], ['Fe(II) 50000 cm-1', 'fe2-']])('%s', (query, near) => {
    const { hits, nearest } = found(query);
    expect(nearest).toBe(true);
    expect(hits.length).toBeLessThanOrEqual(5);
    expect(idOf(hits[0]!.row)).toContain(near);
  });

  test('and nonsense gives nothing', () => {
    expect(found('xyzzy').hits).toEqual([]);
    expect(found('"><script>').hits.length).toBeLessThan(6);
  });
});

test('the index finds what the engine’s own comparison finds, with the same scores', () => {
  for (const [query] of QUERIES) {
    const normal = normaliseQuery(readQuery(query).text);
    const quick = matches(index, normal);
    for (const [place, keys] of index.keys.entries()) {
      const slow = searchMatch(normal, keys);
      // Pieces of formulas and names are looked for only where nothing better is there.
      if (slow?.kind === 'part of a formula or name' && quick.size > 0 && !quick.has(place)) continue;
      // A short beginning of a formula counts as little as loose words: a name may then say more.
      if (slow !== null && quick.get(place)?.kind === 'start of a name' && slow.kind === 'start of the formula') continue;
      expect(quick.get(place) ?? null, `${query} ${collection.complexes[place]!.id}`).toEqual(slow);
    }
  }
});

test('a query is taken apart into numbers, d count, ion and the rest', () => {
  expect(readQuery('Cr(III) d3 21500 cm-1 Delta 20 000 - 23 000 water')).toEqual({
    text: 'water', ion: 'Cr(III)', electrons: 3,
    numbers: [{ kind: 'Delta', low: 20000, high: 23000 }, { kind: 'band', low: 21200, high: 21800, centre: 21500 }],
  });
  expect(readQuery('B(NH3)')).toMatchObject({ text: 'B(NH3)', numbers: [] });
  expect(readQuery('Dq 2150').numbers).toEqual([{ kind: 'Delta', low: 21500 * 0.95, high: 21500 * 1.05 }]);
});

test('says why for each', () => {
  expect(why('beta 0.9')).toMatch(/^β 0\.\d/);
});
