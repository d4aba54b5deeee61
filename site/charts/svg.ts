import { escapeText } from './text.ts';

export interface Dress {
  /** Unique on its page; the ids of title and description begin with it. */
  readonly id: string;
  readonly title: string;
  readonly description: string;
  /** A further class, where the page sets it in its own way. */
  readonly kind?: string;
  /** Hand-made SVG drawn under and over what Plot drew. */
  readonly under?: string;
  readonly over?: string;
}

/** An SVG element with role, name and description around hand-made or dressed content. */
export function svgElement({ id, title, description, kind }: Dress, width: number, height: number, content: string): string {
  return `<svg class="drawing${kind === undefined ? '' : ` ${kind}`}${width > 600 ? ' broad-drawing' : width > 400 ? ' middle-drawing' : ''}" role="img" aria-labelledby="${id}-title" aria-describedby="${id}-desc" viewBox="0 0 ${width} ${height}" width="${width}" height="${height}">`
    + `<title id="${id}-title">${escapeText(title)}</title><desc id="${id}-desc">${escapeText(description)}</desc>${content}</svg>`;
}
