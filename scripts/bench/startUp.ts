import { spawnSync } from 'node:child_process';
import { join } from 'node:path';
import { projectFolder } from '../publish/pages.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

const commands = ['check', 'refit', 'build', 'dev', 'preview', 'predict', 'compare', 'test', 'bench'];

/** How long each command takes to say its help: the middle of three. */
export async function measureStartUp(): Promise<Measured[]> {
  const lines: Measured[] = [];
  for (const name of commands) {
    const times: number[] = [];
    for (let i = 0; i < 3; i += 1) times.push((await timed(() => start(name))).milliseconds);
    lines.push({ name: `start of ${name}`, value: median(times) / 1000, unit: 's', over: 'the middle of three, with --help, without npm' });
  }
  return lines;
}

function start(name: string): void {
  const words = [join('scripts', 'require-node.mjs'), join('scripts', `${name}.ts`), '--help'];
  const { status, stderr } = spawnSync(process.execPath, words, { cwd: projectFolder, encoding: 'utf8' });
  if (status !== 0) throw new Error(`npm run ${name} -- --help ended with code ${status}: ${stderr}`);
}
