import type { CollectionTree } from './tree.ts';

/** A function of the collection and a key that is worked out once for each. */
export function oncePerCollection<Result>(work: (tree: CollectionTree, key: string) => Result): (tree: CollectionTree, key?: string) => Result {
  const made = new WeakMap<CollectionTree, Map<string, Result>>();
  return (tree, key = '') => {
    const results = made.get(tree) ?? new Map<string, Result>();
    made.set(tree, results);
    const known = results.get(key);
    if (known !== undefined) return known;
    const result = work(tree, key);
    results.set(key, result);
    return result;
  };
}
