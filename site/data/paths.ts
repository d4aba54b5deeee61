/** Addresses of pages and figures, from the site's root. Ids are permanent, so these are too. */
export const complexPath = (id: string): string => `complexes/${id}/`;
export const ligandPath = (id: string): string => `ligands/${id}/`;
export const ionPath = (ion: string): string => `ions/${ionSlug(ion)}/`;
/** Page of one caution with the records that carry it. */
export const cautionPath = (code: string, page = 1): string => `cautions/${cautionSlug(code)}/${page === 1 ? '' : `page/${page}/`}`;
export const cautionSlug = (code: string): string => code.toLowerCase().replaceAll('_', '-');
export const reviewPath = (page: number): string => page === 1 ? 'review/' : `review/page/${page}/`;
export const changesPath = (page: number): string => page === 1 ? 'changes/' : `changes/page/${page}/`;
/** The compare page, opened with the bands of one measurement. */
export const otherwisePath = (complex: string, measurement: string): string => `compare/?otherwise=${complex}/${measurement}`;
export const collectionPath = (page: number): string => page === 1 ? '' : `page/${page}/`;

/** "Cr(III)" as "cr-iii", "Fe(-I)" as "fe-minus-i". */
export function ionSlug(ion: string): string {
  return ion.toLowerCase().replace(/[-−](?=[ivx0])/, 'minus-').replace(/[^a-z0-9]+/g, '-').replace(/^-|-$/g, '');
}
