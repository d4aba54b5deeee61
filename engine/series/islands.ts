/**
 * Islands of a graph given by sets of nodes that hang together: connected components by union and find.
 *
 * @param sets each a list of node names; sets that share a name belong to one island
 * @returns for each set the number of its island, from 0; the island with most sets first, where equal the one with the lowest name
 */
export function islandsOf(sets: readonly (readonly string[])[]): readonly number[] {
  const parent = new Map<string, string>();
  const root = (name: string): string => {
    let at = name;
    while (parent.get(at) !== at) {
      const above = parent.get(parent.get(at)!)!;
      parent.set(at, above);
      at = above;
    }
    return at;
  };
  for (const set of sets)
    for (const name of set) {
      if (!parent.has(name)) parent.set(name, name);
      // The lower name becomes the root, so that the result does not hang on the order.
      const [low, high] = [root(set[0]!), root(name)].sort() as [string, string];
      if (low !== high) parent.set(high, low);
    }
  const roots = sets.map((set) => root(set[0]!));
  const sizes = new Map<string, number>();
  for (const one of roots) sizes.set(one, (sizes.get(one) ?? 0) + 1);
  const order = [...sizes].sort(([a, m], [b, n]) => n - m || (a < b ? -1 : 1)).map(([name]) => name);
  const numbers = new Map(order.map((name, i) => [name, i]));
  return roots.map((one) => numbers.get(one)!);
}
