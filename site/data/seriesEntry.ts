import { type PublishedFigure, plateId } from './figure.ts';

/** A figure as a page of series shows it: a picture file, with the page that holds it in full. */
export interface SeriesEntry {
  readonly title: string;
  readonly image: string;
  readonly width: number;
  readonly height: number;
  readonly caption: string;
  readonly page: string;
  readonly pageName: string;
}

export function pictureEntry({ id, title, svg }: PublishedFigure, count: number, page: string, pageName: string): SeriesEntry {
  const [, width, height] = /viewBox="0 0 ([\d.]+) ([\d.]+)"/.exec(svg) ?? [];
  return { title, image: `figures/${plateId(id)}.svg`, width: Number(width), height: Number(height), caption: `n = ${count}.`, page: `${page}#${id}`, pageName };
}
