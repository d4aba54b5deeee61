// Collects the faults of one file, each with its place.

import { fieldName, placeOf } from './node.ts';
import type { ContentNode, Path, Place } from './node.ts';
import type { FaultCode } from './codes.ts';
import type { Fault } from './types.ts';

/** What a check has to say; the file, the place and the field are added by the reporter. */
export interface Finding {
  readonly code: FaultCode;
  readonly found: string;
  readonly expected: string;
  readonly mend: string;
}

export interface Reporter {
  readonly file: string;
  /** Reports at the value of a path, or at the nearest value around it where it is absent; under the name of another field where one is given. */
  at(path: Path, finding: Finding, field?: Path): void;
  /** Reports at a place that is known already. */
  atPlace(place: Place, path: Path, finding: Finding): void;
  readonly faults: readonly Fault[];
}

/** A reporter for one file. `root` is null where nothing of the file could be read. */
export function createReporter(file: string, root: ContentNode | null): Reporter {
  const faults: Fault[] = [];
  const atPlace = (place: Place, path: Path, finding: Finding): void => {
    faults.push({ file, line: place.line, column: place.column, field: printable(fieldName(path)), ...shortened(finding) });
  };
  return {
    file,
    faults,
    atPlace,
    at: (path, finding, field = path) => atPlace(root === null ? { line: 1, column: 1 } : placeOf(root, path), field, finding),
  };
}

/** What was typed, in quotes: descriptions of what was found stand without them. */
export function typedText(text: string): string {
  return `"${text}"`;
}

/** The longest text that a message repeats. */
const longestFound = 300;

/** One line without characters that would steer a terminal: half letters, and those that turn the direction of what follows, are shown as a mark. */
function printable(text: string): string {
  return text.replace(/[\u0000-\u001f\u007f-\u009f\u2028\u2029]+/g, ' ').replace(/[\ud800-\udfff\u202a-\u202e\u2066-\u2069]/gu, '\ufffd');
}

function shortened(finding: Finding): Finding {
  const clip = (text: string) => {
    const oneLine = printable(text);
    return oneLine.length <= longestFound ? oneLine : `${oneLine.slice(0, longestFound)} ...`;
  };
  return { code: finding.code, found: clip(finding.found), expected: clip(finding.expected), mend: clip(finding.mend) };
}

const byCodeUnit = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

/** Faults by file, line, column, then code: the order of every report. */
export function sortedFaults(faults: readonly Fault[]): Fault[] {
  return [...faults].sort((a, b) =>
    byCodeUnit(a.file, b.file) || a.line - b.line || a.column - b.column || byCodeUnit(a.code, b.code) || byCodeUnit(a.field, b.field));
}
