// Finds tabs, which YAML does not take where a person means spaces.

import type { Edit } from './edits.ts';
import { skipQuoted } from './line.ts';

/** Tabs outside quotes and comments: one finding a line, from its first tab to its last. */
export function findTabs(line: string, edits: Edit[]): void {
  if (!line.includes('\t')) return;
  let first = -1;
  let last = -1;
  let at = 0;
  while (at < line.length) {
    const letter = line[at]!;
    if (letter === '#' && (at === 0 || /\s/.test(line[at - 1]!))) break;
    if ((letter === '"' || letter === "'") && /[\s:,[{]/.test(line[at - 1] ?? ' ')) {
      at = skipQuoted(line, at + 1, letter) ?? line.length;
      continue;
    }
    if (letter === '\t') {
      if (first < 0) first = at;
      last = at;
    }
    at += 1;
  }
  if (first < 0) return;
  const indentation = line.slice(0, first).trim() === '';
  const replacement = line.slice(first, last + 1).replaceAll('\t', indentation ? '  ' : ' ');
  edits.push({
    start: first, end: last + 1, replacement, shown: replacement,
    finding: { code: 'TAB', found: 'a tab', expected: 'spaces: YAML takes no tabs', mend: '' },
  });
}
