// Reads a content folder into a collection, or into every fault that stands in it.

import { policyId } from '#engine';
import type { z } from 'zod';
import { checkComplex } from './checks/complex.ts';
import { checkLigand } from './checks/ligand.ts';
import { readDraft } from './draft.ts';
import type { Draft } from './draft.ts';
import { openContent } from './files.ts';
import type { OpenedFile } from './files.ts';
import { pathAt } from './node.ts';
import type { ContentNode } from './node.ts';
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
import type { Fault, LigandRecord, ReadResult } from './types.ts';
import { readYaml } from './yaml/read.ts';

type RecordSchema = typeof complexSchema | typeof ligandSchema | typeof sourceSchema | typeof groupSchema | typeof policySchema;

interface ReadFile<S extends RecordSchema> {
  readonly opened: OpenedFile;
  readonly draft: Draft<S>;
  readonly report: Reporter;
}

/** Files that were read without a fault, by path: a file that has not changed since is not read again. */
export type ReadMemory = Map<string, { readonly hash: string; readonly schema: RecordSchema; readonly root: ContentNode; readonly draft: unknown }>;

/**
 * Reads every file of a content folder and checks all records.
 * A collection without complexes is legal. Never throws for what stands in the folder.
 * @param directory the content folder; `file` of a fault is the path within it
 * @param memory what earlier calls in this process read, for a command that reads the same folder again and again
 * @returns the collection where there is no fault, else all faults by file, line and column
 */
export function readCollection(directory: string, memory: ReadMemory | null = null): ReadResult {
  const content = openContent(directory);
  const faults: Fault[] = [...content.faults];
  const ligands = content.records.ligands.map((opened) => readFile(ligandSchema, opened, memory));
  const sources = content.records.sources.map((opened) => readFile(sourceSchema, opened, memory));
  const complexes = content.records.complexes.map((opened) => readFile(complexSchema, opened, memory));
  const group = content.group === null ? null : readFile(groupSchema, content.group, memory);
  const policyFile = content.policy === null ? null : readFile(policySchema, content.policy, memory);
  if (group === null && content.present && !faults.some((fault) => fault.file === 'group.yaml')) faults.push(noGroup);

  for (const { draft, report } of ligands) checkLigand(draft, report);
  const ligandById = new Map<string, LigandRecord>();
  for (const read of ligands) {
    if (read.report.faults.length === 0) ligandById.set(read.opened.id, ligandRecord(read.opened, whole(read)));
  }
  const known = {
    ligands: ligandById,
    ligandIds: new Set(content.records.ligands.map(({ id }) => id)),
    sourceIds: new Set(content.records.sources.map(({ id }) => id)),
  };
  for (const { draft, report } of complexes) checkComplex(draft, report, known);

  const files = [...ligands, ...sources, ...complexes, ...(group === null ? [] : [group]), ...(policyFile === null ? [] : [policyFile])];
  for (const { report } of files) faults.push(...firstFaults(report));
  if (faults.length > 0 || group === null) return { collection: null, faults: sortedFaults(faults), filesRead: files.length };

  const policy = policyOf(policyFile === null ? {} : whole(policyFile));
  const collection = {
    group: groupOf(whole(group)),
    policy,
    policyId: policyId(policy),
    ligands: [...ligandById.values()],
    sources: sources.map((read) => sourceRecord(read.opened, whole(read))),
    complexes: complexes.map((read) => complexRecord(read.opened, whole(read), ligandById, policy)),
  };
  return { collection, faults: [], filesRead: files.length };
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

function readFile<S extends RecordSchema>(schema: S, opened: OpenedFile, memory: ReadMemory | null): ReadFile<S> {
  const known = memory?.get(opened.file);
  if (known?.hash === opened.hash && known.schema === schema) return { opened, draft: known.draft as Draft<S>, report: createReporter(opened.file, known.root) };
  const { root, faults } = readYaml(opened.text);
  const report = createReporter(opened.file, root);
  for (const { place, finding, path } of faults.slice(0, mostFaults + 1)) report.atPlace(place, path ?? (root === null ? [] : pathAt(root, place)), finding);
  if (root === null) {
    if (faults.length === 0) report.at([], { code: 'FILE_EMPTY', found: 'a file without any field', expected: 'a record', mend: 'type the record, or delete the file' });
    return { opened, draft: undefined as unknown as Draft<S>, report };
  }
  const draft = readDraft(schema, root, report) as unknown as Draft<S>;
  if (report.faults.length === 0) memory?.set(opened.file, { hash: opened.hash, schema, root, draft });
  return { opened, draft, report };
}
