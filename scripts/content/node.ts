// What a content file holds once it is read: texts, lists and maps, each with its place in the file.

/** Line and column count from 1. */
export interface Place {
  readonly line: number;
  readonly column: number;
}

/** A value exactly as it was typed. Quotes, where there were any, are taken off and remembered. */
export interface TextNode extends Place {
  readonly kind: 'text';
  readonly text: string;
  readonly quoted: boolean;
}

export interface ListNode extends Place {
  readonly kind: 'list';
  readonly items: readonly ContentNode[];
}

export interface MapNode extends Place {
  readonly kind: 'map';
  readonly entries: readonly MapEntry[];
}

export interface MapEntry {
  readonly key: string;
  readonly keyPlace: Place;
  readonly value: ContentNode;
}

export type ContentNode = TextNode | ListNode | MapNode;

/** Names and list indices from the top of a record to a field. */
export type Path = readonly (string | number)[];

/** "measurements[0].bands[1].position" for ['measurements', 0, 'bands', 1, 'position']; "" for the whole file. */
export function fieldName(path: Path): string {
  return path
    .map((step, index) => (typeof step === 'number' ? `[${step}]` : index === 0 ? step : `.${step}`))
    .join('');
}

/** The value at a path, or null where the path leads nowhere. */
export function nodeAt(root: ContentNode, path: Path): ContentNode | null {
  let node: ContentNode | undefined = root;
  for (const step of path) {
    if (node === undefined) return null;
    if (typeof step === 'number') node = node.kind === 'list' ? node.items[step] : undefined;
    else node = node.kind === 'map' ? node.entries.find((entry) => entry.key === step)?.value : undefined;
  }
  return node ?? null;
}

/** The place of the value at a path; where it is absent, of the nearest value around it. */
export function placeOf(root: ContentNode, path: Path): Place {
  for (let length = path.length; length > 0; length -= 1) {
    const node = nodeAt(root, path.slice(0, length));
    if (node !== null) return { line: node.line, column: node.column };
  }
  return { line: root.line, column: root.column };
}

/** Texts, arrays and objects without places. */
export function plainValue(node: ContentNode): unknown {
  if (node.kind === 'text') return node.text;
  if (node.kind === 'list') return node.items.map(plainValue);
  return Object.fromEntries(node.entries.map((entry) => [entry.key, plainValue(entry.value)]));
}

/** The path of the field that a place in the file belongs to: the last that starts on its line at or before its column; [] where none does. */
export function pathAt(root: ContentNode, place: Place): Path {
  let best: { readonly path: Path; readonly column: number } = { path: [], column: 0 };
  const visit = (node: ContentNode, path: Path): void => {
    if (node.kind === 'text') return;
    const parts = node.kind === 'list'
      ? node.items.map((item, index) => ({ step: index, at: item as Place, value: item }))
      : node.entries.map(({ key, keyPlace, value }) => ({ step: key, at: keyPlace, value }));
    for (const { step, at, value } of parts) {
      if (at.line === place.line && at.column <= place.column && at.column >= best.column) best = { path: [...path, step], column: at.column };
      visit(value, [...path, step]);
    }
  };
  visit(root, []);
  return best.path;
}
