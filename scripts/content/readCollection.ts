// Reads a content folder into a collection, or into every fault that stands in it.

import { policyId } from '#engine';
import type { z } from 'zod';
import { checkComplex } from './checks/complex.ts';
import type { KnownRecords } from './checks/complex.ts';
import { checkLigand } from './checks/ligand.ts';
import { readDraft } from './draft.ts';
import type { Draft } from './draft.ts';
import { fileFault, findContent, openFile } from './files.ts';
import type { FoundFile, OpenedFile } from './files.ts';
import { pathAt } from './node.ts';
import { complexRecord } from './records/complex.ts';
import { policyOf } from './records/policy.ts';
import { groupOf, ligandRecord, sourceRecord } from './records/small.ts';
import { createReporter, sortedFaults } from './report.ts';
import type { Reporter } from './report.ts';
import { complexSchema } from './schema/complex.ts';
import { groupSchema } from './schema/group.ts';
import { ligandSchema } from './schema/ligand.ts';
import { policySchema } from './schema/policy.ts';
import { sourceSchema } from './schema/source.ts';
import type { Collection, ComplexRecord, Fault, LigandRecord, ReadResult } from './types.ts';
import { readYaml } from './yaml/read.ts';

type RecordSchema = typeof complexSchema | typeof ligandSchema | typeof sourceSchema | typeof groupSchema | typeof policySchema;

interface ReadFile<S extends RecordSchema> {
  readonly found: FoundFile;
  /** null: the file cannot be opened. */
  readonly opened: OpenedFile | null;
  readonly draft: Draft<S>;
  readonly report: Reporter;
}

/** What a content folder holds beside its complexes. */
export interface Surroundings {
  readonly directory: string;
  /** null where any of these files has a fault. */
  readonly frame: Omit<Collection, 'complexes'> | null;
  readonly faults: readonly Fault[];
  readonly filesRead: number;
  /** Files of complexes, ascending by id; not opened yet. */
  readonly complexes: readonly FoundFile[];
  readonly known: KnownRecords;
}

/** Reads and checks everything of a content folder but its complexes. Never throws for what stands in the folder. */
export function readSurroundings(directory: string): Surroundings {
  const content = findContent(directory);
  const faults: Fault[] = [...content.faults];
  const ligands = content.records.ligands.map((found) => readFile(directory, ligandSchema, found));
  const sources = content.records.sources.map((found) => readFile(directory, sourceSchema, found));
  const group = content.group === null ? null : readFile(directory, groupSchema, content.group);
  const policyFile = content.policy === null ? null : readFile(directory, policySchema, content.policy);
  if (group === null && content.present) faults.push(noGroup);

  for (const { draft, report } of ligands) checkLigand(draft, report);
  const ligandById = new Map<string, LigandRecord>();
  for (const read of ligands) {
    if (read.report.faults.length === 0) ligandById.set(read.found.id, ligandRecord(read.opened!, whole(read)));
  }
  const files = [...ligands, ...sources, ...(group === null ? [] : [group]), ...(policyFile === null ? [] : [policyFile])];
  for (const { report } of files) faults.push(...firstFaults(report));
  const policy = faults.length > 0 ? null : policyOf(policyFile === null ? {} : whole(policyFile));
  return {
    directory,
    frame: policy === null || group === null ? null : {
      group: groupOf(whole(group)),
      policy,
      policyId: policyId(policy),
      ligands: [...ligandById.values()],
      sources: sources.map((read) => sourceRecord(read.opened!, whole(read))),
    },
    faults,
    filesRead: files.filter(({ opened }) => opened !== null).length,
    complexes: content.records.complexes,
    known: { ligands: ligandById, ligandIds: idsOf(ligands), sourceIds: idsOf(sources) },
  };
}

/** The record of a complex; null where it, or what surrounds it, has faults. Those of its own file come with it. */
export interface ReadComplex {
  readonly record: ComplexRecord | null;
  readonly faults: readonly Fault[];
}

/** Reads and checks one complex. */
export function readComplex(opened: OpenedFile, { frame, known }: Surroundings): ReadComplex {
  const read: ReadFile<typeof complexSchema> = { found: opened, opened, ...readOpened(complexSchema, opened) };
  checkComplex(read.draft, read.report, known);
  const faults = firstFaults(read.report);
  return { faults, record: faults.length > 0 || frame === null ? null : complexRecord(opened, whole(read), known.ligands, frame.policy) };
}

/**
 * Reads every file of a content folder and checks all records.
 * A collection without complexes is legal. Never throws for what stands in the folder.
 * @param directory the content folder; `file` of a fault is the path within it
 * @returns the collection where there is no fault, else all faults by file, line and column
 */
export function readCollection(directory: string): ReadResult {
  const surroundings = readSurroundings(directory);
  const faults = [...surroundings.faults];
  const complexes: ComplexRecord[] = [];
  let { filesRead } = surroundings;
  for (const found of surroundings.complexes) {
    const opened = openFile(directory, found);
    if ('code' in opened) {
      faults.push(fileFault(found.file, opened));
      continue;
    }
    filesRead += 1;
    const read = readComplex(opened, surroundings);
    faults.push(...read.faults);
    if (read.record !== null) complexes.push(read.record);
  }
  const { frame } = surroundings;
  if (faults.length > 0 || frame === null) return { collection: null, faults: sortedFaults(faults), filesRead };
  return { collection: { ...frame, complexes }, faults: [], filesRead };
}

const noGroup: Fault = {
  file: 'group.yaml', line: 1, column: 1, field: '', code: 'MISSING_FIELD',
  found: 'no file group.yaml', expected: 'group.yaml with title, group, licence, url, release and started', mend: 'copy the example of content/README.md into group.yaml',
};

/** Most faults that one file is reported with. */
const mostFaults = 100;

function firstFaults({ faults }: Reporter): readonly Fault[] {
  if (faults.length <= mostFaults) return faults;
  const sorted = sortedFaults(faults);
  const rest = sorted[mostFaults]!;
  return [...sorted.slice(0, mostFaults), {
    ...rest, code: 'MORE_FAULTS', found: 'further faults in this file', expected: `at most ${mostFaults} in a report`, mend: 'mend those above and check again',
  }];
}

/** A draft without faults is a whole record: every required field is there and every value was read. */
function whole<S extends RecordSchema>(read: ReadFile<S>): z.output<S> {
  return read.draft as unknown as z.output<S>;
}

function idsOf(files: readonly ReadFile<RecordSchema>[]): ReadonlySet<string> {
  return new Set(files.filter(({ opened }) => opened !== null).map(({ found }) => found.id));
}

function readFile<S extends RecordSchema>(directory: string, schema: S, found: FoundFile): ReadFile<S> {
  const opened = openFile(directory, found);
  if (!('code' in opened)) return { found, opened, ...readOpened(schema, opened) };
  const report = createReporter(found.file, null);
  report.at([], opened);
  return { found, opened: null, draft: undefined as unknown as Draft<S>, report };
}

function readOpened<S extends RecordSchema>(schema: S, { file, text }: OpenedFile): { readonly draft: Draft<S>; readonly report: Reporter } {
  const { root, faults } = readYaml(text);
  const report = createReporter(file, root);
  for (const { place, finding, path } of faults.slice(0, mostFaults + 1)) report.atPlace(place, path ?? (root === null ? [] : pathAt(root, place)), finding);
  if (root === null) {
    if (faults.length === 0) report.at([], { code: 'FILE_EMPTY', found: 'a file without any field', expected: 'a record', mend: 'type the record, or delete the file' });
    return { draft: undefined as unknown as Draft<S>, report };
  }
  return { draft: readDraft(schema, root, report) as unknown as Draft<S>, report };
}
