// The text of a complex record, as a person would type it.

import { complexExplanations, measurementExplanations } from './explanations.ts';
import { flowText, noOthers, valueText } from './fields.ts';
import type { TypedValue } from './fields.ts';
import { bandFields, complexFields, measurementFields, quotedFields } from './order.ts';
import { typedText } from './quote.ts';
import type { TypedBand, TypedComplex, TypedMeasurement, TypedQuoted } from './types.ts';

export interface RecordTextOptions {
  /** Lines of comment above the record, without "#". */
  readonly heading?: readonly string[];
  /** true puts a comment behind each field that says what belongs there. */
  readonly explained?: boolean;
}

/** Where comments start, counted from 0, unless the field is longer. */
const commentColumn = 41;

/**
 * The text of content/complexes/ID.yaml for a typed complex: fields in the order of the manual, bands one a line in braces,
 * quotes where YAML would read something else. Read back, every field holds the text that was given, but for blanks at its ends;
 * blank texts and empty lists are left out, as absent ones are.
 * @throws RangeError for a field that the record format has not
 * Not checked: whether the values are right; halves of surrogate pairs, which no file can hold.
 */
export function recordText(complex: TypedComplex, options: RecordTextOptions = {}): string {
  noOthers(complex, complexFields);
  const explained = options.explained ?? false;
  const heading = (options.heading ?? []).map((line) => (line.trim() === '' ? '#' : `# ${commentText(line)}`));
  const fields = complexFields.filter((field) => field !== 'measurements').flatMap((field) => fieldLine(field, complex[field] as TypedValue, '', explained ? complexExplanations[field] : undefined));
  const measurements = complex.measurements ?? [];
  const list = measurements.length === 0 ? [] : [withComment('measurements:', explained ? complexExplanations['measurements'] : undefined)];
  return [...heading, ...fields, ...list, ...measurements.flatMap((one, index) => measurementLines(one, explained && index === 0)), ''].join('\n');
}

function measurementLines(measurement: TypedMeasurement, explained: boolean): string[] {
  noOthers(measurement, measurementFields);
  const lines = measurementFields.flatMap((field) => {
    const comment = explained ? measurementExplanations[field] : undefined;
    if (field === 'bands') return listLines(field, (measurement.bands ?? []).map((band) => itemText(band, bandFields)), comment);
    if (field === 'quoted') return listLines(field, (measurement.quoted ?? []).map((quoted) => itemText(quoted, quotedFields)), comment);
    return fieldLine(field, measurement[field] as TypedValue, '    ', comment);
  });
  const [first = '    id:', ...others] = lines;
  return [`  - ${first.trimStart()}`, ...others];
}

function itemText(item: TypedBand | TypedQuoted, order: readonly string[]): string | null {
  return flowText(item as Readonly<Record<string, TypedValue>>, order);
}

function listLines(field: string, items: readonly (string | null)[], comment: string | undefined): string[] {
  const typed = items.filter((item) => item !== null);
  return typed.length === 0 ? [] : [withComment(`    ${field}:`, comment), ...typed.map((item) => `      - ${item}`)];
}

function fieldLine(field: string, value: TypedValue, indent: string, comment: string | undefined): string[] {
  const text = valueText(field, value);
  return text === null ? [] : [withComment(`${indent}${typedText(field)}: ${text}`, comment)];
}

function withComment(line: string, comment: string | undefined): string {
  return comment === undefined ? line : `${line.length < commentColumn ? line.padEnd(commentColumn) : `${line} `}# ${comment}`;
}

/** A comment stays on its line. */
function commentText(text: string): string {
  return text.replace(/[\u0000-\u001f\u007f-\u009f\u2028\u2029]+/g, ' ').trim();
}
