import { expect, test } from 'vitest';
import { complexPage } from '../../../site/data/complex.ts';
import type { Cell, Table } from '../../../site/data/table.ts';
import { sampleTree } from '../sample.ts';

const tree = sampleTree();
const page = (id: string) => complexPage(tree, tree.complexes.find(({ row }) => row.id === id)!);
const text = (cell: Cell | undefined): string => typeof cell === 'string' ? cell : (cell?.parts ?? []).map((part) => part.text).join('');
const rows = (table: Table | null): readonly (readonly string[])[] => table!.rows.map((row) => row.map(text));
const heads = (table: Table | null): readonly string[] => table!.columns.map(({ head }) => text({ parts: head }));
const rivalled = page('cr-am6').measurements[0]!;

test('the result in one sentence is set for the page and clean for the clipboard', () => {
  const { parts, text: plain } = rivalled.meaning.sentence!;
  expect(plain).toBe('The bands at 21 560 cm⁻¹ (4T2g) give Δ = 21 560(160) cm⁻¹ and B = 652(31) cm⁻¹.');
  expect(parts).toContainEqual({ text: '4', style: 'super' });
  expect(parts).toContainEqual({ text: 'B', style: 'italic' });
  expect(page('cr-en3').measurements[0]!.meaning.sentence).toBeNull();
});

test('a residual has a bar beside its number, as long as the number is large', () => {
  const bars = rivalled.meaning.transitions!.rows.map((row) => row[3] as { readonly drawing: string; readonly parts: never });
  const widths = bars.map(({ drawing }) => Number(/<rect class="point"[^>]* width="([\d.]+)"/.exec(drawing)![1]));
  const residuals = bars.map((bar) => Math.abs(Number(text(bar).replace('\u2212', '-'))));
  expect(residuals.indexOf(Math.max(...residuals))).toBe(widths.indexOf(Math.max(...widths)));
  expect(Math.max(...widths)).toBeGreaterThan(10);
});

test('limits from the profile stand beside the number that has them, and nothing is said of the others', () => {
  const [delta, racahB] = rivalled.meaning.parameters;
  expect(racahB!.limits).toBe('610 to 690');
  expect(delta!.limits).toBeNull();
  expect(rivalled.rivals!.table.rows).toHaveLength(2);
});

test('rivals stand beside the chosen reading with their score and why they rank there', () => {
  expect(rows(rivalled.rivals!.table).map(([name, assignment, delta, racahB, , score]) => [name, assignment, delta, racahB, score])).toEqual([
    ['chosen', expect.stringContaining('4T2g\u00a021'), '21\u2009560(160)', '650(30)', '4.3'],
    ['rival 1', '4T2\u00a021\u202f550 (tetrahedral)', '24\u2009000(1900)', 'withheld', '13.4'],
  ]);
  expect(rows(rivalled.rivals!.table)[0]!.at(-1)).toBe('Chosen because the record types it; no rival scores better.');
  expect(rows(rivalled.rivals!.table)[1]!.at(-1)).toContain('one band is left unexplained');
  expect(page('cr-en3').measurements[0]!.rivals).toBeNull();
});

test('the evidence of all readings stands in one table whose columns sum to the scores', () => {
  const { evidence } = rivalled.rivals!;
  expect(heads(evidence)).toEqual(['Evidence', 'chosen', 'rival 1']);
  expect(rows(evidence)).toEqual([['misfit, chi-square', '0.3', '0'], ['fitted parameters', '4.0', '4.4'], ['bands left unexplained', '0', '9.0'], ['score', '4.3', '13.4']]);
});

test('each reading is drawn with its own names, its own triangles and dotted stems for what it leaves over', () => {
  const { svg } = rivalled.rivals!.figure;
  expect(svg.match(/>chosen<|>rival 1</g)).toEqual(['>chosen<', '>rival 1<']);
  const [, , below = ''] = svg.split(/>chosen<|>rival 1</);
  expect(below.match(/class="tick left-out/g)!.length).toBe(3);
  expect(below).toContain('class="calculated"');
});

test('stress: leverage and sensitivities of each band in the fit, the fit without it, and every pair alone', () => {
  expect(heads(rivalled.sure.stress)).toEqual(['To', 'leverage', '∂ν̃/∂Δ', '∂ν̃/∂B', 'Δ without / cm−1', 'B without / cm−1', 'put at / cm−1', 'z']);
  expect(rows(rivalled.sure.stress)).toEqual([['4T2g', '0.50', '1.00', '7.3', '21\u2009700', '640', '21\u2009700', '\u22120.8'], ['a4T1g', '0.50', '1.00', '7.3', 'none', 'none', 'none', 'none']]);
  expect(rows(rivalled.sure.pairs)).toEqual([['4T2g', '21\u2009550; 655', 'none'], ['a4T1g', '', '21\u2009590; 648']]);
});

test('what to measure next is said once a band', () => {
  expect(rivalled.sure.helpful.map((parts) => text({ parts }))).toEqual(['b4T1g, expected 44\u202f000 to 48\u202f000\u00a0cm⁻¹, would cut u(B) from 31 to 16\u00a0cm⁻¹ and fix C to about ±90\u00a0cm⁻¹.']);
});

test('remarks end with the correlations, and beta adds none', () => {
  expect(rivalled.sure.remarks.map((parts) => text({ parts }))).toEqual(['The field lowers the ground level 4A2g by 1.20 Δ.', 'Correlation of Δ with B\u00a0\u22120.62.']);
});

test('a quoted value stands with difference, z and a likely cause', () => {
  expect(page('ni-am6').quotes).toEqual([expect.objectContaining({ typed: '1080 cm-1', difference: '\u22129720', z: '\u221260.0', source: 'A. Sample, Invented J. 1998, 1, 1-9.' })]);
  expect(text({ parts: page('ni-am6').quotes[0]!.cause! })).toBe('Likely Dq was printed as Δ.');
  expect(page('cr-en3').quotes[0]).toMatchObject({ z: '\u22120.3', cause: null, source: 'A. Sample, Invented J. 1998, 1, 1-9, p. 12' });
});

test('predictions from the rest of the collection carry z and what follows; one reason is said once', () => {
  const { table, reasons } = page('cr-cl2-en2').placements;
  expect(rows(table)).toEqual([['Δ / cm⁻¹', 'average environment', '18\u2009500(900)', '18\u2009600(160)', '0.1', 'not distinguishable']]);
  expect(reasons.map((parts) => text({ parts }))).toEqual(['Factors predict no Δ and β: no factor of chlorido: no complex with it is in the fit.']);
  expect(rows(page('cr-aq6').placements.table).map((row) => [row[0], row.at(-1)])).toEqual([['aq-295', 'apart: put up for review']]);
  expect(page('cr-am6').placements).toEqual({ table: null, reasons: [] });
});

test('every measurement can be read otherwise', () => {
  expect(rivalled.otherwise).toBe('compare/?otherwise=cr-am6/aq-295');
});

test('cautions lead to their page of the index', () => {
  expect(page('cr-cl2-en2').cautions.map(({ code, path }) => [code, path])).toEqual([['TWO_ELECTRON_BAND', 'cautions/two-electron-band/']]);
  expect(page('cr-am6').hazards[0]!.path).toBe('cautions/perchlorate/');
});
