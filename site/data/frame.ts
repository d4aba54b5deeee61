import { hazardFooter } from '#engine';
import { citation } from './publication.ts';
import type { CollectionTree } from './tree.ts';

/** What every page of the site shows around its content. */
export interface Frame {
  readonly title: string;
  readonly group: string;
  /** Sentence that stands above every page of an invented collection; null otherwise. */
  readonly banner: string | null;
  readonly licence: string;
  readonly policy: string;
  readonly colophon: string;
  /** How to cite the set, as it goes to the clipboard. */
  readonly citation: string;
  readonly hazardNote: string;
  readonly sections: readonly { readonly text: string; readonly path: string }[];
}

export function frame(tree: CollectionTree): Frame {
  const title = tree.meta.get('group.title') ?? 'Ligand-field parameters';
  const group = tree.meta.get('group.name') ?? 'the group';
  return {
    title, group,
    banner: tree.meta.get('group.demonstration') === 'true'
      ? 'Demonstration: the group, its people and every reading on this site are invented. Do not cite or use these numbers.'
      : null,
    licence: tree.meta.get('group.licence') ?? 'licence not recorded',
    policy: tree.policy.id,
    colophon: `${title}, ${group}, release ${tree.meta.get('group.release') ?? 'not recorded'}.`,
    citation: citation(tree).text,
    hazardNote: hazardFooter,
    sections: [
      { text: 'Collection', path: '' }, { text: 'Ions', path: 'ions/' }, { text: 'Ligands', path: 'ligands/' },
      { text: 'Series', path: 'series/' },
      { text: 'Compare', path: 'compare/' }, { text: 'Predict', path: 'predict/' }, { text: 'Methods', path: 'methods/' }, { text: 'Data', path: 'data/' },
    ],
  };
}
