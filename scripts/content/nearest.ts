// Offers the names that a mistyped name is likely to mean.

/** Number of single-letter insertions, deletions, replacements and neighbour swaps between two words (restricted Damerau-Levenshtein). */
export function editDistance(a: string, b: string): number {
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i += 1) {
    const row = [i];
    for (let j = 1; j <= b.length; j += 1) {
      const replaced = last[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1);
      let best = Math.min(last[j]! + 1, row[j - 1]! + 1, replaced);
      if (i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]) best = Math.min(best, beforeLast[j - 2]! + 1);
      row.push(best);
    }
    beforeLast = last;
    last = row;
  }
  return last[b.length]!;
}

/**
 * The known names nearest to a typed one, at most `most`, best first; none where nothing is near.
 * Near is: at most a third of the letters differ (at least one may), capitals aside, or one name holds the other.
 */
export function nearNames(typed: string, known: Iterable<string>, most = 3): string[] {
  if (typed.length > 60) return [];
  const wanted = typed.toLowerCase();
  const reach = Math.max(1, Math.floor(wanted.length / 3));
  const scored: { name: string; score: number }[] = [];
  for (const name of known) {
    const other = name.toLowerCase();
    if (Math.abs(other.length - wanted.length) <= reach) {
      const distance = editDistance(wanted, other);
      if (distance <= reach) {
        scored.push({ name, score: distance });
        continue;
      }
    }
    if (wanted.length >= 3 && other.length >= 3 && (other.includes(wanted) || wanted.includes(other))) {
      scored.push({ name, score: reach + 1 });
    }
  }
  scored.sort((a, b) => a.score - b.score || (a.name < b.name ? -1 : a.name > b.name ? 1 : 0));
  return scored.slice(0, most).map((entry) => entry.name);
}

/** "a", "a or b", "a, b or c". */
export function orList(names: readonly string[]): string {
  return joined(names, 'or');
}

/** "a", "a and b", "a, b and c". */
export function andList(names: readonly string[]): string {
  return joined(names, 'and');
}

function joined(names: readonly string[], word: string): string {
  return names.length < 2 ? names.join('') : `${names.slice(0, -1).join(', ')} ${word} ${names[names.length - 1]}`;
}
