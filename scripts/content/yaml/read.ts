// Reads one YAML text into texts, lists and maps with their places. Every scalar stays as it was typed.

import { isAlias, isMap, isScalar, isSeq, LineCounter, parseAllDocuments } from 'yaml';
import type { ParsedNode, YAMLError } from 'yaml';
import type { ContentNode, MapEntry, Path, Place } from '../node.ts';
import type { Finding } from '../report.ts';
import { scanTraps } from './traps.ts';
import type { Trap } from './traps.ts';
import { syntaxFault, unclosedQuote } from './syntax.ts';

/** How deep lists and braces may nest. The deepest record of the format needs 7. */
export const deepestNesting = 12;

/** Most fields in one place, and most items in one list. */
const mostFields = 300;
const mostItems = 1000;

export interface ReadYaml {
  /** null where the text holds nothing that can be read. */
  readonly root: ContentNode | null;
  readonly faults: readonly Trap[];
}

/** Reads a whole file. Never throws. */
export function readYaml(text: string): ReadYaml {
  const scanned = scanTraps(text);
  const faults: Trap[] = [...scanned.traps];
  if (scanned.depth > deepestNesting) {
    faults.push({ place: { line: 1, column: 1 }, finding: tooDeep });
    return { root: null, faults };
  }
  const counter = new LineCounter();
  // The failsafe schema keeps 36.0, no, 1E3 and 2024-03-11 as the text that was typed.
  const parsed = parseAllDocuments(scanned.text, { schema: 'failsafe', merge: false, uniqueKeys: false, prettyErrors: false, lineCounter: counter });
  const documents = Array.isArray(parsed) ? parsed : [];
  const placeAt = (offset: number): Place => {
    const { line, col } = counter.linePos(offset);
    return { line: Math.max(line, 1), column: Math.max(col, 1) };
  };
  const report: Report = (offset, finding, path) => faults.push({ place: placeAt(offset), finding, ...(path === undefined ? {} : { path }) });

  const first = documents[0];
  if (first === undefined) return { root: null, faults };
  const errors: YAMLError[] = first.errors.filter((error) => error.code !== 'MULTIPLE_DOCS');
  if (scanned.openQuote !== null) {
    faults.push({ place: scanned.openQuote, finding: unclosedQuote(scanned.text.split('\n'), scanned.openQuote) });
  } else if (errors.length > 0 && !scanned.indentationUnknown) {
    // One slip makes YAML stumble several times: only the first of its complaints says something.
    const error = errors[0]!;
    faults.push(syntaxFault(error, scanned.text.split('\n'), placeAt(error.pos[0])));
  }
  const second = documents[1];
  if (second !== undefined) {
    report(second.range[0], { code: 'YAML_FEATURE', found: 'a second document behind ---', expected: 'one record in a file', mend: 'move the second record to a file of its own' });
  }
  if (first.directives.yaml.explicit === true || Object.keys(first.directives.tags).length > 1) {
    report(0, { code: 'YAML_FEATURE', found: 'a directive that starts with %', expected: 'a record without YAML directives', mend: 'delete the lines from % to ---' });
  }
  if (errors.length > 0 || scanned.indentationUnknown || scanned.openQuote !== null) {
    // A tree that YAML guessed at would only give misleading faults.
    return { root: null, faults: faults.length > 0 ? faults : [{ place: { line: 1, column: 1 }, finding: tooDeep }] };
  }
  return { root: first.contents === null ? null : contentNode(first.contents as ParsedNode, [], placeAt, report, 0), faults };
}

const tooDeep: Finding = {
  code: 'TOO_DEEP', found: 'lists or braces nested too deep', expected: `at most ${deepestNesting} levels`, mend: 'compare with the example record of content/README.md',
};

type Report = (offset: number, finding: Finding, path?: Path) => void;

function contentNode(node: ParsedNode | null, path: Path, placeAt: (offset: number) => Place, report: Report, fallback: number): ContentNode {
  if (node === null) return { kind: 'text', text: '', quoted: false, ...placeAt(fallback) };
  const start = node.range[0];
  const place = placeAt(start);
  if (isAlias(node)) {
    report(start, feature(`*${node.source}`, 'an alias', 'type the value again; a text that starts with * goes in double quotes'), path);
    return { kind: 'text', text: `*${node.source}`, quoted: false, ...place };
  }
  if (node.anchor !== undefined) report(start, feature(`&${node.anchor}`, 'an anchor', 'leave the anchor out; a text that starts with & goes in double quotes'), path);
  if (node.tag !== undefined && !standardTags.has(node.tag)) report(start, feature(node.tag, 'a tag', 'leave the tag out; a text that starts with ! goes in double quotes'), path);
  if (isScalar(node)) {
    const quoted = node.type === 'QUOTE_DOUBLE' || node.type === 'QUOTE_SINGLE';
    return { kind: 'text', text: typeof node.value === 'string' ? node.value : '', quoted, ...place };
  }
  if (isSeq(node)) {
    if (node.items.length > mostItems) report(start, tooMany(`${node.items.length} items`, mostItems), path);
    return { kind: 'list', items: node.items.slice(0, mostItems).map((item, index) => contentNode(item as ParsedNode | null, [...path, index], placeAt, report, start)), ...place };
  }
  const entries = new Map<string, MapEntry>();
  const pairs = isMap(node) ? node.items : [];
  if (pairs.length > mostFields) report(start, tooMany(`${pairs.length} fields`, mostFields), path);
  for (const pair of pairs.slice(0, mostFields)) {
    const key = pair.key as ParsedNode | null;
    const keyStart = key === null ? start : key.range[0];
    if (key === null || !isScalar(key)) {
      report(keyStart, { code: 'YAML_FEATURE', found: 'a field whose name is a list, a map or empty', expected: 'a word as the name of a field', mend: 'write  name: value  on one line' });
      continue;
    }
    const name = String(key.value);
    const keyPlace = placeAt(keyStart);
    if (key.anchor !== undefined || key.tag !== undefined && !standardTags.has(key.tag)) report(keyStart, feature(name, 'an anchor or tag', 'write the name of the field alone'), [...path, name]);
    if (name === '<<') {
      report(keyStart, feature('<<', 'a merge key', 'type the fields themselves'), path);
      continue;
    }
    const earlier = entries.get(name);
    if (earlier !== undefined) {
      report(keyStart, { code: 'DUPLICATE_KEY', found: `"${name}" a second time`, expected: `"${name}" once; it stands in line ${earlier.keyPlace.line} already`, mend: 'keep one of the two and delete the other' }, [...path, name]);
      continue;
    }
    entries.set(name, { key: name, keyPlace, value: contentNode(pair.value as ParsedNode | null, [...path, name], placeAt, report, key.range[1]) });
  }
  return { kind: 'map', entries: [...entries.values()], ...place };
}

function tooMany(found: string, most: number): Finding {
  return { code: 'TOO_MANY', found, expected: `at most ${most}`, mend: 'split the record, or leave out what is not needed' };
}

const standardTags = new Set(['tag:yaml.org,2002:str', 'tag:yaml.org,2002:seq', 'tag:yaml.org,2002:map']);

function feature(found: string, what: string, mend: string): Finding {
  return { code: 'YAML_FEATURE', found: `${found} (${what})`, expected: 'plain fields, lists and texts', mend };
}
