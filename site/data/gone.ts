import type { CollectionTree } from './tree.ts';

/** The page of a published address whose record was taken away or renamed. */
export interface GonePage {
  readonly address: string;
  readonly heading: string;
  readonly reason: string | null;
  readonly target: { readonly path: string; readonly words: string; readonly rel: 'canonical' | 'successor-version' } | null;
  /** Takes the reader to the target at once. */
  readonly redirects: boolean;
}

/** Pages of gone addresses. A place within a page stays on that page; a corrected record keeps its own. */
export function gonePages({ history }: CollectionTree): readonly GonePage[] {
  return history.gone.filter(({ address, kind }) => address.endsWith('/') && kind !== 'corrected').map(({ address, kind, target, reason }) => {
    const redirects = kind === 'redirect' && target !== null;
    return {
      address, reason, redirects, heading: redirects ? 'This page has a new address' : 'This page was taken away',
      target: target === null ? null : { path: target, words: redirects ? 'It is now' : 'Its place is taken by', rel: redirects ? 'canonical' : 'successor-version' },
    };
  });
}
