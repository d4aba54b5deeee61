// Faults as a terminal shows them and as --json gives them.

import { isAbsolute, join, relative, sep } from 'node:path';
import type { Fault } from '../content/types.ts';

/** The name of a content folder in messages, such that an editor can follow it: as seen from where the user stands where that is near, else whole. */
export function folderName(directory: string, standing: string = process.env['INIT_CWD'] ?? process.cwd()): string {
  const seen = relative(standing, directory);
  if (seen === '') return '.';
  return seen.startsWith(join('..', '..')) || isAbsolute(seen) ? directory : seen.split(sep).join('/');
}

/** One fault in four lines: place, field and code; found; expected; to mend. `folder` is put before the file's name. */
export function faultText(fault: Fault, folder: string): string {
  const file = [folder, fault.file].filter((part) => part !== '' && part !== '.').join('/') || '.';
  const place = fault.file === '' ? file : `${file}:${fault.line}:${fault.column}`;
  const head = [place, fault.field === '' ? (isOfFile(fault) ? 'whole file' : 'this line') : fault.field, fault.code].join('  ');
  return [
    head,
    `  found     ${fault.found}`,
    `  expected  ${fault.expected}`,
    `  to mend   ${fault.mend}`,
  ].join('\n');
}

/** All faults, one after the other, and their count. */
export function faultReport(faults: readonly Fault[], folder: string): string {
  const files = new Set(faults.map((fault) => fault.file)).size;
  const count = `${faults.length} ${faults.length === 1 ? 'fault' : 'faults'} in ${files} ${files === 1 ? 'file' : 'files'}`;
  return `${[...faults.map((fault) => faultText(fault, folder)), count].join('\n\n')}\n`;
}

function isOfFile({ line, column }: Fault): boolean {
  return line === 1 && column === 1;
}
