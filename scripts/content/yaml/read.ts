// Reads one YAML text into texts, lists and maps with their places. Every scalar stays as it was typed.

import { isAlias, isMap, isScalar, isSeq, LineCounter, parseAllDocuments } from 'yaml';
import type { ParsedNode, YAMLError } from 'yaml';
import type { ContentNode, MapEntry, Place } from '../node.ts';
import type { Finding } from '../report.ts';
import { scanTraps } from './traps.ts';
import type { Trap } from './traps.ts';
import { syntaxFinding } from './syntax.ts';

/** How deep lists and braces may nest. The deepest record of the format needs 7. */
export const deepestNesting = 12;

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
  const report = (offset: number, finding: Finding) => faults.push({ place: placeAt(offset), finding });

  const first = documents[0];
  if (first === undefined) return { root: null, faults };
  const errors: YAMLError[] = first.errors.filter((error) => error.code !== 'MULTIPLE_DOCS');
  if (errors.length > 0 && !scanned.indentationUnknown) {
    // One slip makes YAML stumble several times: only the first of its complaints says something.
    const error = errors[0]!;
    const place = placeAt(error.pos[0]);
    faults.push({ place, finding: syntaxFinding(error, scanned.text.split('\n'), place) });
  }
  const second = documents[1];
  if (second !== undefined) {
    report(second.range[0], { code: 'YAML_FEATURE', found: 'a second document behind ---', expected: 'one record in a file', mend: 'move the second record to a file of its own' });
  }
  if (first.directives.yaml.explicit === true || Object.keys(first.directives.tags).length > 1) {
    report(0, { code: 'YAML_FEATURE', found: 'a directive that starts with %', expected: 'a record without YAML directives', mend: 'delete the lines from % to ---' });
  }
  if (errors.length > 0 || scanned.indentationUnknown) {
    // A tree that YAML guessed at would only give misleading faults.
    return { root: null, faults: faults.length > 0 ? faults : [{ place: { line: 1, column: 1 }, finding: tooDeep }] };
  }
  return { root: first.contents === null ? null : contentNode(first.contents as ParsedNode, placeAt, report, 0), faults };
}

const tooDeep: Finding = {
  code: 'TOO_DEEP', found: 'lists or braces nested too deep', expected: `at most ${deepestNesting} levels`, mend: 'compare with the example record of content/README.md',
};

function contentNode(node: ParsedNode | null, placeAt: (offset: number) => Place, report: (offset: number, finding: Finding) => void, fallback: number): ContentNode {
  if (node === null) return { kind: 'text', text: '', quoted: false, ...placeAt(fallback) };
  const start = node.range[0];
  const place = placeAt(start);
  if (isAlias(node)) {
    report(start, feature(`*${node.source}`, 'an alias', 'type the value again; a text that starts with * goes in double quotes'));
    return { kind: 'text', text: `*${node.source}`, quoted: false, ...place };
  }
  if (node.anchor !== undefined) report(start, feature(`&${node.anchor}`, 'an anchor', 'leave the anchor out; a text that starts with & goes in double quotes'));
  if (node.tag !== undefined && !standardTags.has(node.tag)) report(start, feature(node.tag, 'a tag', 'leave the tag out; a text that starts with ! goes in double quotes'));
  if (isScalar(node)) {
    const quoted = node.type === 'QUOTE_DOUBLE' || node.type === 'QUOTE_SINGLE';
    return { kind: 'text', text: typeof node.value === 'string' ? node.value : '', quoted, ...place };
  }
  if (isSeq(node)) {
    return { kind: 'list', items: node.items.map((item) => contentNode(item as ParsedNode | null, placeAt, report, start)), ...place };
  }
  const entries: MapEntry[] = [];
  for (const pair of isMap(node) ? node.items : []) {
    const key = pair.key as ParsedNode | null;
    const keyStart = key === null ? start : key.range[0];
    if (key === null || !isScalar(key)) {
      report(keyStart, { code: 'YAML_FEATURE', found: 'a field whose name is a list, a map or empty', expected: 'a word as the name of a field', mend: 'write  name: value  on one line' });
      continue;
    }
    const name = String(key.value);
    const keyPlace = placeAt(keyStart);
    if (key.anchor !== undefined || key.tag !== undefined && !standardTags.has(key.tag)) report(keyStart, feature(name, 'an anchor or tag', 'write the name of the field alone'));
    if (name === '<<') {
      report(keyStart, feature('<<', 'a merge key', 'type the fields themselves'));
      continue;
    }
    const earlier = entries.find((entry) => entry.key === name);
    if (earlier !== undefined) {
      report(keyStart, { code: 'DUPLICATE_KEY', found: `"${name}" a second time`, expected: `"${name}" once; it stands in line ${earlier.keyPlace.line} already`, mend: 'keep one of the two and delete the other' });
      continue;
    }
    entries.push({ key: name, keyPlace, value: contentNode(pair.value as ParsedNode | null, placeAt, report, key.range[1]) });
  }
  return { kind: 'map', entries, ...place };
}

const standardTags = new Set(['tag:yaml.org,2002:str', 'tag:yaml.org,2002:seq', 'tag:yaml.org,2002:map']);

function feature(found: string, what: string, mend: string): Finding {
  return { code: 'YAML_FEATURE', found: `${found} (${what})`, expected: 'plain fields, lists and texts', mend };
}
