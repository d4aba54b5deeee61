import { type PublishedFigure, drawingSize, platePath } from './figure.ts';

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
  return { title, image: platePath(id), ...drawingSize(svg), caption: `n = ${count}.`, page: `${page}#${id}`, pageName };
}
