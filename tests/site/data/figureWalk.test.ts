import { readFileSync } from 'node:fs';
import { parseHTML } from 'linkedom';
import { beforeAll, describe, expect, test } from 'vitest';
import { type ComplexPage, complexPage } from '../../../site/data/complex.ts';
import { readRows } from '../../../site/data/database.ts';
import type { FigureShown } from '../../../site/data/figure.ts';
import { keptFigure, picture } from '../../../site/data/figureFile.ts';
import { numberFiles, pictures, publishedFigures } from '../../../site/data/figures.ts';
import { SHEETS, ownFigure, ownFigureIds, ownSheet } from '../../../site/data/ownFigures.ts';
import { pngOf } from '../../../site/data/png.ts';
import { type CollectionTree, collectionTree } from '../../../site/data/tree.ts';
import { refittedDemonstration } from '../demonstration.ts';
import { collisions, textBoxes } from '../charts/textBoxes.ts';
import { characters } from './fontCharacters.ts';

let tree: CollectionTree;
let pages: readonly ComplexPage[];
beforeAll(async () => {
  tree = collectionTree(readRows(await refittedDemonstration()));
  pages = tree.complexes.map((complex) => complexPage(tree, complex));
});

/** Figures of a page with the tables that stand on it under an id. */
function ownFigures(page: ComplexPage): readonly { readonly figure: FigureShown; readonly rows: number }[] {
  return page.measurements.flatMap(({ read, meaning, rivals }) => [
    ...(read.strip ? [{ figure: read.strip, rows: read.bands.rows.length }] : []),
    ...(meaning.scheme ? [{ figure: meaning.scheme, rows: meaning.scheme.table!.rows.length }] : []),
    ...(rivals ? [{ figure: rivals.figure, rows: rivals.table.rows.length }] : []),
  ]);
}

const textOf = (svg: string): string => [...parseHTML(`<!doctype html><html><body>${svg}</body></html>`).document.querySelectorAll('text')].map((text) => text.textContent).join('');
const size = (png: Uint8Array): readonly number[] => [16, 20].map((at) => Buffer.from(png).readUInt32BE(at));

describe('every figure of the demonstration', () => {
  test('of the collection: title, caption with n, source, table, SVG, PNG and CSV', () => {
    const figures = publishedFigures(tree);
    expect(figures.length).toBeGreaterThan(60);
    const csv = new Map(numberFiles(tree).map(({ id, csv: text }) => [`figures/${id}.csv`, text]));
    for (const { id, title, caption, source, table, files } of figures) {
      expect(title, id).toMatch(/^\S.{8,}\.$/);
      expect(caption.join(' '), id).toMatch(/n = \d|No complex of the collection/);
      expect(source.length, id).toBeGreaterThan(20);
      expect(table, id).not.toBeNull();
      expect(files.map(({ name }) => name), id).toEqual(['SVG', 'PNG', 'CSV']);
      expect(csv.get(files[2]!.path)?.split('\r\n').length, id).toBeGreaterThan(2);
    }
  });

  test('of each complex: title, caption with n and conditions, source, table, SVG, PNG and CSV, in files that are made', () => {
    let walked = 0;
    tree.complexes.forEach((complex, index) => {
      const page = pages[index]!;
      const shown = ownFigures(page);
      const made = ownFigureIds(tree, complex);
      const linked = [...shown.map(({ figure }) => figure.files), ...(page.diagram ? [page.diagram.files] : [])].map((files) => files[1]!);
      expect(linked.map(({ madeHere }) => madeHere), page.id).toEqual(made);
      for (const { path, madeHere } of linked) {
        const sheet = SHEETS.find((one) => path === `complexes/${page.id}/${one}.svg`)!;
        expect(ownSheet(tree, complex, sheet), page.id).toContain(`<svg id="${madeHere}" y=`);
      }
      for (const { figure, rows } of shown) {
        walked++;
        expect(figure.title, figure.id).toMatch(/\.$/);
        expect(figure.caption.join(' '), `${page.id} ${figure.id}`).toMatch(/^n = \d+; .+/);
        expect(figure.source.length, figure.id).toBeGreaterThan(15);
        expect(rows, figure.id).toBeGreaterThan(0);
        expect((figure.table === null) !== (figure.numbersIn === undefined), figure.id).toBe(true);
        expect(figure.files.map(({ name, madeHere }) => [name, madeHere !== undefined]), figure.id).toEqual([['SVG', false], ['PNG', true], ['CSV', false]]);
      }
      if (page.diagram) {
        expect(page.diagram.caption).toMatch(/^n = \d/);
        expect(page.diagram.table.rows.length).toBeGreaterThan(0);
      }
    });
    expect(walked).toBeGreaterThan(250);
  });

  test('saved as SVG holds no variable, no class without its rule, and only characters of the face of the PNG', () => {
    const has = characters('site/fonts/FigureSerif-Regular.ttf');
    const slanted = characters('site/fonts/FigureSerif-Italic.ttf');
    const svgs = [...publishedFigures(tree).map(({ svg }) => svg), ...tree.complexes.slice(0, 40).flatMap((complex) => ownFigureIds(tree, complex).map((id) => ownFigure(tree, complex, id).svg))];
    for (const svg of svgs) {
      const kept = keptFigure(svg);
      expect(/var\(|undefined|NaN/.exec(kept)?.[0] ?? null, svg.slice(0, 120)).toBeNull();
      if (kept.includes('url(#')) expect(kept).toContain('<linearGradient id="visible-colours"');
      const missing = [...new Set(textOf(svg))].filter((sign) => !has.has(sign.codePointAt(0)!) || !slanted.has(sign.codePointAt(0)!));
      expect(missing, svg.slice(0, 200)).toEqual([]);
    }
    for (const { svg } of pictures(tree)) expect(picture(svg)).toContain('prefers-color-scheme: dark');
  });

  test('has no text on another', () => {
    const drawn = [...publishedFigures(tree), ...tree.complexes.flatMap((complex) => ownFigureIds(tree, complex).map((name) => ({ id: `${complex.row.id} ${name}`, svg: ownFigure(tree, complex, name).svg })))];
    const touching = drawn.flatMap(({ id, svg }) => collisions(textBoxes(svg), 0.6).map((pair) => `${id}: ${pair}`));
    expect(touching).toEqual([]);
  });

  test('the rules that a saved figure carries are those its marks need', () => {
    const kept = keptFigure('<svg class="drawing" viewBox="0 0 10 10"><path class="axis" d="M0 0h9"/></svg>');
    expect(kept).toMatch(/\.drawing \.axis/);
    expect(kept).toMatch(/stroke: #1b1a18/);
    expect(kept).not.toMatch(/figcaption|\.bracket|min-width/);
  });

  test('as PNG is twice its size, holds its text, and has the same bytes each time', () => {
    const figures = publishedFigures(tree);
    for (const { svg } of [figures[0]!, figures.find(({ id }) => id.startsWith('factors-'))!]) {
      const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg)!;
      const kept = keptFigure(svg);
      const png = pngOf(kept);
      expect(size(png)).toEqual([2 * Number(width), 2 * Number(height)]);
      expect(Buffer.from(pngOf(kept)).equals(Buffer.from(png))).toBe(true);
      // The drawing without its text is another picture: the face was found.
      expect(Buffer.from(pngOf(kept.replaceAll(/<text[\s\S]*?<\/text>/g, ''))).equals(Buffer.from(png))).toBe(false);
    }
  });
});

test('the face of the figures stands with its licence', () => {
  expect(readFileSync('site/fonts/OFL.txt', 'utf8')).toContain('SIL Open Font License, Version 1.1');
});
