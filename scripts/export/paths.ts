// Addresses from the site's root that are published for good: a form below is never changed without redirects. The site's own pages are held to them by a test.

export const complexPath = (id: string): string => `complexes/${id}/`;
export const measurementPath = (complex: string, measurement: string): string => `complexes/${complex}/#${measurement}`;
export const ligandPath = (id: string): string => `ligands/${id}/`;
export const ionPath = (ion: string): string => `ions/${ion.toLowerCase().replace(/[-−](?=[ivx0])/, 'minus-').replace(/[^a-z0-9]+/g, '-').replace(/^-|-$/g, '')}/`;

/** Pages that every collection has. */
export const fixedPages: readonly string[] = ['', 'ions/', 'ligands/', 'series/', 'methods/', 'data/', 'data/dictionary/', 'changes/'];
