// The clock and version control: the release command is the only one that asks them, and only here.

import { spawnSync } from 'node:child_process';

/** Today's ISO date, in the time zone of the machine. */
export function today(): string {
  const now = new Date();
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${now.getFullYear()}-${two(now.getMonth() + 1)}-${two(now.getDate())}`;
}

/** The revision under version control that a folder stands at, with a remark where files were changed since; null where there is none. */
export function revisionOf(folder: string): string | null {
  const revision = asked(folder, ['rev-parse', 'HEAD']);
  if (revision === null) return null;
  return asked(folder, ['status', '--porcelain', '--', '.']) === '' ? revision : `${revision} with changes`;
}

/** The name that version control knows the user by, or null. */
export function userName(folder: string): string | null {
  return asked(folder, ['config', 'user.name']) || null;
}

function asked(folder: string, words: readonly string[]): string | null {
  const { status, stdout } = spawnSync('git', ['-C', folder, ...words], { encoding: 'utf8', stdio: ['ignore', 'pipe', 'ignore'] });
  return status === 0 ? stdout.trim() : null;
}
