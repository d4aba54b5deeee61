/** Addresses of pages and figures, from the site's root. Ids are permanent, so these are too. */
export const complexPath = (id: string): string => `complexes/${id}/`;
export const ligandPath = (id: string): string => `ligands/${id}/`;
export const ionPath = (ion: string): string => `ions/${ionSlug(ion)}/`;
export const collectionPath = (page: number): string => page === 1 ? '' : `page/${page}/`;

/** "Cr(III)" as "cr-iii", "Fe(-I)" as "fe-minus-i". */
export function ionSlug(ion: string): string {
  return ion.toLowerCase().replace(/[-−](?=[ivx0])/, 'minus-').replace(/[^a-z0-9]+/g, '-').replace(/^-|-$/g, '');
}
