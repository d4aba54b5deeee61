import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { loadedEngineHash, softwareName } from '../database/fingerprint.ts';
import { refitCollection } from '../database/refit.ts';
import type { RefitOrder } from '../database/refit.ts';
import { replaceFile } from '../database/writeFile.ts';
import type { Fault } from '../content/types.ts';
import { placeholderStart } from '../begin/settings.ts';
import { changesBetween } from './changes.ts';
import { readContent } from './readContent.ts';
import { releaseFolder } from './readHistory.ts';
import { snapshotOf } from './snapshot.ts';
import type { Change, FrozenRelease } from './types.ts';

export interface FreezeOrder extends Pick<RefitOrder, 'content' | 'cache' | 'progress'> {
  readonly release: string;
  /** ISO date. */
  readonly date: string;
  readonly who: string;
  readonly cause: string;
  readonly codeVersion: string | null;
}

export type Freeze =
  | { readonly kind: 'frozen'; readonly file: string; readonly release: FrozenRelease; readonly changes: readonly Change[]; readonly first: boolean }
  | { readonly kind: 'faults'; readonly faults: readonly Fault[] }
  /** What is wrong with the order, in words. */
  | { readonly kind: 'refused'; readonly reason: string };

/**
 * Freezes a release: fits the collection, writes content/releases/NAME.json, and puts the name into group.yaml. A release that was
 * frozen is never written again. Nothing is written where the content has faults or the order is refused.
 */
export function freeze({ content, cache, progress, release, date, who, cause, codeVersion }: FreezeOrder): Freeze {
  const { collection, history, faults } = readContent(content);
  if (collection === null) return { kind: 'faults', faults };
  const last = history.releases.at(-1);
  if (history.releases.some((one) => one.release === release)) return { kind: 'refused', reason: `release ${release} is frozen already, and a frozen release does not change: choose another name` };
  if (date < (last?.date ?? collection.group.started)) return { kind: 'refused', reason: `the date ${date} lies before ${last === undefined ? 'the collection was started' : `release ${last.release}`}` };
  if (collection.group.started === placeholderStart) return { kind: 'refused', reason: `started: in group.yaml is still ${placeholderStart}, which stands for a day that was not typed: type the day on which the collection was started` };
  const group = readFileSync(join(content, 'group.yaml'), 'utf8');
  const renamed = withRelease(group, release);
  if (renamed === null) return { kind: 'refused', reason: 'group.yaml has not exactly one line that starts with "release:"' };

  const named = { ...collection, group: { ...collection.group, release } };
  const { facts } = refitCollection(named, history, 0, { cache, ...(progress === undefined ? {} : { progress }) });
  const snapshot = snapshotOf(named, facts.map((complex) => complex.frozen), { engine: loadedEngineHash(), software: softwareName() });
  const frozen: FrozenRelease = { release, number: history.releases.length + 1, date, who, cause, code_version: codeVersion, ...snapshot };
  const file = join(releaseFolder, `${release}.json`);
  replaceFile(join(content, file), Buffer.from(releaseText(frozen), 'utf8'));
  replaceFile(join(content, 'group.yaml'), Buffer.from(renamed, 'utf8'));
  return { kind: 'frozen', file, release: frozen, changes: last === undefined ? [] : changesBetween(last, snapshot), first: last === undefined };
}

/** The text of group.yaml with another release; comments and everything else stay. null where there is not exactly one such line. */
export function withRelease(group: string, release: string): string | null {
  const lines = group.match(/^release:.*$/gm);
  return lines?.length === 1 ? group.replace(/^release:[^#\r\n]*?(\s+#.*)?(\r?)$/m, (_, comment = '', end = '') => `release: "${release}"${comment}${end}`) : null;
}

/** The text of a release file: one complex and one address a line, so that two releases can be compared by eye. */
export function releaseText({ complexes, addresses, ...head }: FrozenRelease): string {
  const lines = (list: readonly unknown[]): string => (list.length === 0 ? '[]' : `[\n${list.map((item) => `  ${JSON.stringify(item)}`).join(',\n')}\n ]`);
  const start = Object.entries(head).map(([name, value]) => ` ${JSON.stringify(name)}: ${JSON.stringify(value)},\n`).join('');
  return `{\n${start} "complexes": ${lines(complexes)},\n "addresses": ${lines(addresses)}\n}\n`;
}
