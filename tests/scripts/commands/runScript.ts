import { spawnSync } from 'node:child_process';
import { projectFolder } from '../../../scripts/publish/pages.ts';

export interface Outcome {
  readonly code: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** Runs a command as npm runs it, with settings added to the environment. */
export function runScript(name: string, words: readonly string[], settings: Readonly<Record<string, string>> = {}): Outcome {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['scripts/require-node.mjs', `scripts/${name}.ts`, ...words], {
    cwd: projectFolder, encoding: 'utf8', env: { ...process.env, NO_COLOR: '1', ...settings },
  });
  return { code: status, stdout, stderr };
}
