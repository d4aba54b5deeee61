import { spawnSync } from 'node:child_process';
import { projectFolder } from '../../../scripts/publish/pages.ts';

export interface Outcome {
  readonly code: number | null;
  readonly stdout: string;
  readonly stderr: string;
}

/** The environment without what the test runner adds to it, which would change how pages are made. */
export function plainEnvironment(settings: Readonly<Record<string, string>> = {}): NodeJS.ProcessEnv {
  const added = /^(?:VITEST|NODE_ENV$|TEST$|MODE$|DEV$|PROD$|SSR$|BASE_URL$)/;
  return { ...Object.fromEntries(Object.entries(process.env).filter(([name]) => !added.test(name))), NO_COLOR: '1', ...settings };
}

/** Runs a command as npm runs it, with settings added to the environment. */
export function runScript(name: string, words: readonly string[], settings: Readonly<Record<string, string>> = {}): Outcome {
  const { status, stdout, stderr } = spawnSync(process.execPath, ['scripts/require-node.mjs', `scripts/${name}.ts`, ...words], {
    cwd: projectFolder, encoding: 'utf8', env: plainEnvironment(settings),
  });
  return { code: status, stdout, stderr };
}
