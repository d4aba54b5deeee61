// A record that is not in the collection, read and checked like any other.

import { createHash } from 'node:crypto';
import { existsSync, readFileSync, statSync } from 'node:fs';
import { basename } from 'node:path';
import type { Policy } from '#engine';
import type { z } from 'zod';
import { checkComplex } from '../content/checks/complex.ts';
import type { KnownRecords } from '../content/checks/complex.ts';
import { checkLigand } from '../content/checks/ligand.ts';
import { readDraft } from '../content/draft.ts';
import type { Draft } from '../content/draft.ts';
import { findContent, largestFile, openFile } from '../content/files.ts';
import type { OpenedFile } from '../content/files.ts';
import { badId } from '../content/ids.ts';
import { pathAt } from '../content/node.ts';
import { complexRecord } from '../content/records/complex.ts';
import { ligandRecord } from '../content/records/small.ts';
import { createReporter, sortedFaults, typedText } from '../content/report.ts';
import type { Finding, Reporter } from '../content/report.ts';
import { complexSchema } from '../content/schema/complex.ts';
import { ligandSchema } from '../content/schema/ligand.ts';
import type { ComplexRecord, Fault, LigandRecord } from '../content/types.ts';
import { readYaml } from '../content/yaml/read.ts';
import { UsageError } from '../runCommand.ts';
import type { StoredCollection } from './collection.ts';

/** What a new record may refer to. */
export interface Referable extends KnownRecords {
  /** Faults of ligand records by ligand id: told only where a new record needs the ligand. */
  readonly ligandFaults: ReadonlyMap<string, readonly Fault[]>;
}

/** Ligands and sources of the database and of the content folder; a record of the folder, being newer, wins. */
export function referable(content: string, stored: StoredCollection): Referable {
  const ligands = new Map(stored.ligands.map((ligand) => [ligand.id, ligand]));
  const ligandFaults = new Map<string, readonly Fault[]>();
  const sourceIds = new Set(stored.sources);
  if (existsSync(content)) {
    const { records } = findContent(content);
    for (const { id } of records.sources) sourceIds.add(id);
    for (const found of records.ligands) {
      const opened = openFile(content, found);
      if ('code' in opened) continue;
      const { record, faults } = readLigand(opened);
      if (record !== null) ligands.set(opened.id, record);
      else {
        ligands.delete(opened.id);
        ligandFaults.set(opened.id, faults);
      }
    }
  }
  return { ligands, ligandIds: new Set([...ligands.keys(), ...ligandFaults.keys()]), sourceIds, ligandFaults };
}

export type NewRecord = { readonly ok: true; readonly record: ComplexRecord } | { readonly ok: false; readonly faults: readonly Fault[] };

/**
 * Reads and checks the record of a complex.
 *
 * @param path absolute; `shown` is the name that faults carry
 * @throws UsageError where there is no such file
 */
export function readNewRecord(path: string, shown: string, known: Referable, policy: Policy): NewRecord {
  if (statSync(path, { throwIfNoEntry: false })?.isFile() !== true) throw new UsageError(`There is no file ${shown}.`);
  const bytes = readFileSync(path);
  const report = createReporter(shown, null);
  const opened = openedFile(bytes, shown, path, report);
  if (opened === null) return { ok: false, faults: report.faults };
  const { reporter, draft } = readRecord(complexSchema, opened);
  checkComplex(draft, reporter, known);
  const typed = draft?.ligands ?? {};
  const faults = [...report.faults, ...reporter.faults, ...Object.keys(typed).flatMap((id) => known.ligandFaults.get(id) ?? [])];
  if (faults.length > 0) return { ok: false, faults: sortedFaults(faults) };
  // A draft without faults is a whole record.
  return { ok: true, record: complexRecord(opened, draft as unknown as z.output<typeof complexSchema>, known.ligands, policy) };
}

function openedFile(bytes: Uint8Array, file: string, path: string, report: Reporter): OpenedFile | null {
  const id = basename(path).replace(/\.ya?ml$/i, '');
  const say = (finding: Finding): null => {
    report.at([], finding);
    return null;
  };
  if (!path.endsWith('.yaml')) say({ code: 'FILE_NAME', found: typedText(basename(path)), expected: 'a file name that ends in .yaml', mend: `rename it to ${id}.yaml` });
  const bad = badId(id, 'a file name');
  if (bad !== null) say({ ...bad, code: 'FILE_NAME', found: typedText(bad.found) });
  if (bytes.length > largestFile) return say({ code: 'FILE_TOO_LARGE', found: `${bytes.length} bytes`, expected: `at most ${largestFile} bytes`, mend: 'keep raw data in files of their own and name them by raw:' });
  try {
    const text = new TextDecoder('utf-8', { fatal: true }).decode(bytes);
    return { file, id, text, hash: createHash('sha256').update(bytes).digest('hex') };
  } catch {
    return say({ code: 'NOT_UTF8', found: 'bytes that are not UTF-8 text', expected: 'a text file in UTF-8', mend: 'save the file again with the encoding UTF-8' });
  }
}

function readLigand(opened: OpenedFile): { readonly record: LigandRecord | null; readonly faults: readonly Fault[] } {
  const { reporter, draft } = readRecord(ligandSchema, opened);
  checkLigand(draft, reporter);
  return { record: reporter.faults.length > 0 ? null : ligandRecord(opened, draft as unknown as z.output<typeof ligandSchema>), faults: reporter.faults };
}

function readRecord<S extends typeof complexSchema | typeof ligandSchema>(schema: S, { file, text }: OpenedFile): { readonly reporter: Reporter; readonly draft: Draft<S> | undefined } {
  const { root, faults } = readYaml(text);
  const reporter = createReporter(file, root);
  for (const { place, finding, path } of faults) reporter.atPlace(place, path ?? (root === null ? [] : pathAt(root, place)), finding);
  if (root === null && faults.length === 0) reporter.at([], { code: 'FILE_EMPTY', found: 'a file without any field', expected: 'a record', mend: 'type the record, or delete the file' });
  return { reporter, draft: (root === null ? undefined : readDraft(schema, root, reporter)) as Draft<S> | undefined };
}
