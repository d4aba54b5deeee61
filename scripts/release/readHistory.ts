// Reads content/releases/: the frozen releases (JSON, written by the release command) and gone.yaml (typed).

import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { z } from 'zod';
import { readDraft } from '../content/draft.ts';
import { createReporter } from '../content/report.ts';
import { goneSchema } from '../content/schema/gone.ts';
import type { Fault } from '../content/types.ts';
import { readYaml } from '../content/yaml/read.ts';
import { firstReleases } from './rows.ts';
import type { FrozenRelease, Gone, History } from './types.ts';

/** Folder of the releases within a content folder. */
export const releaseFolder = 'releases';

const number = z.number().nullable();
const frozenNumber = z.strictObject({ value: number, u: number, u_total: number, standing: z.string() });
const releaseSchema = z.strictObject({
  release: z.string().min(1), number: z.int().min(1), date: z.iso.date(), who: z.string().min(1), cause: z.string().min(1), code_version: z.string().nullable(),
  software: z.string(), engine: z.string(), licence: z.string(), doi: z.string().nullable(),
  complexes: z.array(z.strictObject({
    id: z.string(), formula: z.string(), ion: z.string(), geometry: z.string(), isomer: z.string(),
    measurements: z.array(z.strictObject({
      id: z.string(), verdict: z.string(), readings: z.string(), policy: z.string(), free_ion: z.string(),
      numbers: z.strictObject({ Delta: frozenNumber, B: frozenNumber, C: frozenNumber, beta: frozenNumber }),
    })),
  })),
  addresses: z.array(z.string()),
});

export interface ReadHistory {
  readonly history: History;
  readonly faults: readonly Fault[];
}

/** The history of a content folder; without a folder of releases an empty one. `file` of a fault is the path within the content. */
export function readHistory(content: string): ReadHistory {
  const faults: Fault[] = [];
  const read = namesIn(join(content, releaseFolder)).filter((name) => name.endsWith('.json')).flatMap((name) => readRelease(content, name, faults));
  const releases = [...read].sort((a, b) => a.number - b.number);
  releases.forEach((release, index) => {
    if (release.number === index + 1 && releases.every((other) => other === release || other.release !== release.release)) return;
    faults.push(releaseFault(`${release.release}.json`, `number ${release.number}`, `number ${index + 1}: releases are counted without gaps, each name once`));
  });
  const gone = readGone(content, firstReleases(releases), faults);
  return { history: { releases, gone }, faults };
}

function readRelease(content: string, name: string, faults: Fault[]): FrozenRelease[] {
  try {
    const parsed = releaseSchema.safeParse(JSON.parse(readFileSync(join(content, releaseFolder, name), 'utf8')));
    if (!parsed.success) {
      const issue = parsed.error.issues[0]!;
      faults.push(releaseFault(name, `at "${issue.path.join('.')}": ${issue.message}`, 'a frozen release as it was written'));
      return [];
    }
    if (`${parsed.data.release}.json` === name) return [parsed.data];
    faults.push(releaseFault(name, `the release ${parsed.data.release}`, 'a file of the release\'s own name'));
  } catch (error) {
    faults.push(releaseFault(name, error instanceof SyntaxError ? 'text that is no JSON' : 'a file that cannot be opened', 'a frozen release as it was written'));
  }
  return [];
}

function releaseFault(name: string, found: string, expected: string): Fault {
  return {
    file: `${releaseFolder}/${name}`, line: 1, column: 1, field: '', code: 'RELEASE_FILE', found, expected,
    mend: 'take the file back from version control: frozen releases are written by the release command alone',
  };
}

function readGone(content: string, published: ReadonlyMap<string, string>, faults: Fault[]): Gone[] {
  const file = `${releaseFolder}/gone.yaml`;
  let text: string;
  try {
    text = readFileSync(join(content, file), 'utf8');
  } catch {
    return [];
  }
  const { root, faults: syntax } = readYaml(text);
  const report = createReporter(file, root);
  for (const { place, finding, path } of syntax) report.atPlace(place, path ?? [], finding);
  const draft = root === null || syntax.length > 0 ? undefined : readDraft(goneSchema, root, report);
  const gone = (draft?.gone ?? []).flatMap((entry, index): Gone[] => {
    const at = ['gone', index, 'address'] as const;
    if (entry?.address === undefined) return [];
    const { address, reason, successor, now, corrected } = entry;
    const say = (found: string, expected: string, mend: string) => report.at(at, { code: 'GONE_ADDRESS', found, expected, mend });
    if (!published.has(address)) say(`"${address}"`, 'an address that a release published', 'copy the address from the release file; one that no release had needs no entry');
    if ([reason, now, corrected].filter((field) => field !== undefined).length !== 1) {
      say(`"${address}" with ${reason === undefined ? 'no reason' : 'a reason'}`, 'one of reason (taken away), now (renamed) or corrected', 'keep the one that applies');
      return [];
    }
    if (now !== undefined) return [{ address, kind: 'redirect', target: now, reason: null }];
    if (corrected !== undefined) return [{ address, kind: 'corrected', target: null, reason: corrected }];
    return [{ address, kind: 'tombstone', target: successor ?? null, reason: reason! }];
  });
  faults.push(...report.faults);
  return gone;
}

/** Names in a folder in code-unit order; none where there is no such folder. */
function namesIn(folder: string): string[] {
  try {
    return readdirSync(folder).filter((name) => !name.startsWith('.')).sort();
  } catch {
    return [];
  }
}
