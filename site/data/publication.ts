import { citationBibtex, citationRis, citationText } from '../../scripts/export/metadata/cite.ts';
import { type CitedRecord, type Publication, publicationOf } from '../../scripts/export/metadata/publication.ts';
import { oncePerCollection } from './memo.ts';
import { words } from './table.ts';
import type { CollectionTree, ComplexNode } from './tree.ts';
import type { Parts } from './typeset.ts';

/** What is published, as every citation and metadata file of the exports reads it. */
export const publication = oncePerCollection((tree): Publication => publicationOf({
  meta: tree.meta, people: tree.people, frozen: [...tree.history.releases].sort((a, b) => a.number - b.number),
  changesSince: tree.history.changes.filter(({ release }) => release === null).length,
}));

export const citedRecord = ({ row }: ComplexNode): CitedRecord => ({ id: row.id, formula: row.formula, ion: row.ion, geometry: row.geometry });

/** A citation in its three forms, as it goes to the clipboard, and the files that hold two of them. */
export interface Citation {
  readonly text: string;
  /** The same words with the formula typeset. */
  readonly parts: Parts;
  readonly bibtex: string;
  readonly ris: string;
  readonly files: readonly { readonly name: string; readonly path: string }[];
}

/** How to cite the set, or one record of it. */
export function citation(tree: CollectionTree, complex: ComplexNode | null = null): Citation {
  const [about, record] = [publication(tree), complex === null ? null : citedRecord(complex)];
  const text = citationText(about, record);
  const folder = complex === null ? 'data/' : `complexes/${complex.row.id}/`;
  return {
    text, parts: complex === null ? words(text) : withFormula(text, complex), bibtex: citationBibtex(about, record), ris: citationRis(about, record),
    files: [{ name: 'BibTeX', path: `${folder}cite.bib` }, { name: 'RIS', path: `${folder}cite.ris` }],
  };
}

function withFormula(text: string, { row, formula }: ComplexNode): Parts {
  const at = text.indexOf(`${row.formula}, record ${row.id}`);
  return at < 0 ? words(text) : [...words(text.slice(0, at)), ...formula.parts, ...words(text.slice(at + row.formula.length))];
}
