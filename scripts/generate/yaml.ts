// Lines of YAML as a person would type them.

/** Key and value as they will stand, in order; a value that is null is left out. */
export type Fields = readonly (readonly [key: string, value: string | null])[];

const safeInBlock = /^[A-Za-z0-9(][^#:]*[^\s:]$|^[A-Za-z0-9]$/;
const safeInFlow = /^[A-Za-z0-9(][^#:,[\]{}]*[^\s:,[\]{}]$|^[A-Za-z0-9]$/;

function quoted(text: string): string {
  return `"${text.replaceAll('\\', '\\\\').replaceAll('"', '\\"')}"`;
}

/** Text after a key on a line of its own; quoted where YAML would read it as something else. */
export function blockText(text: string): string {
  return safeInBlock.test(text) ? text : quoted(text);
}

/** Text inside braces or brackets. */
export function flowText(text: string): string {
  return safeInFlow.test(text) ? text : quoted(text);
}

/** "{ position: 21550(60) cm-1, kind: maximum }". */
export function flowMap(fields: Fields): string {
  const parts = fields.flatMap(([key, value]) => (value === null ? [] : [`${key}: ${value}`]));
  return parts.length === 0 ? '{}' : `{ ${parts.join(', ')} }`;
}

/** "[N, N]". */
export function flowList(items: readonly string[]): string {
  return `[${items.map(flowText).join(', ')}]`;
}

/** One "key: value" a line, each behind the indent. */
export function blockLines(fields: Fields, indent = ''): string[] {
  return fields.flatMap(([key, value]) => (value === null ? [] : [`${indent}${key}: ${value}`]));
}
