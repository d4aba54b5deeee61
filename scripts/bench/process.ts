import { spawn } from 'node:child_process';
import { readFileSync, readdirSync } from 'node:fs';
import { projectFolder } from '../publish/pages.ts';

/** What a command took. */
export interface Ran {
  readonly seconds: number;
  /** Most memory that the command and all processes it started held at once, bytes; null where the system has no /proc. Pages that processes share count for each. */
  readonly memory: number | null;
  readonly said: string;
}

/** How often memory is looked at, ms. */
const every = 50;

/** Runs a program of Node's in the project's folder and watches what it takes. Throws with what it said where it fails. */
export function runWatched(words: readonly string[], environment: Readonly<Record<string, string>>): Promise<Ran> {
  return new Promise((resolve, reject) => {
    const started = performance.now();
    const child = spawn(process.execPath, words, { cwd: projectFolder, env: { ...process.env, ...environment }, stdio: ['ignore', 'pipe', 'pipe'] });
    let said = '';
    let complaint = '';
    let memory: number | null = null;
    child.stdout.setEncoding('utf8').on('data', (text: string) => { said += text; });
    child.stderr.setEncoding('utf8').on('data', (text: string) => { complaint += text; });
    const watch = setInterval(() => {
      const now = child.pid === undefined ? null : treeMemory(child.pid);
      if (now !== null) memory = Math.max(memory ?? 0, now);
    }, every);
    child.on('error', reject);
    child.on('close', (code) => {
      clearInterval(watch);
      if (code === 0) resolve({ seconds: (performance.now() - started) / 1000, memory, said });
      else reject(new Error(`${words.join(' ')} ended with code ${code}:\n${complaint}${said}`));
    });
  });
}

/** Resident memory of a process and all below it, bytes. */
function treeMemory(top: number): number | null {
  const parents = new Map<number, number>();
  const resident = new Map<number, number>();
  try {
    for (const name of readdirSync('/proc')) {
      if (!/^\d+$/.test(name)) continue;
      const status = statusOf(Number(name));
      if (status === null) continue;
      parents.set(Number(name), status.parent);
      resident.set(Number(name), status.resident);
    }
  } catch {
    return null;
  }
  let sum = 0;
  for (const [process, bytes] of resident) if (isBelow(process, top, parents)) sum += bytes;
  return sum === 0 ? null : sum;
}

function isBelow(process: number, top: number, parents: ReadonlyMap<number, number>): boolean {
  for (let at: number | undefined = process; at !== undefined && at !== 0; at = parents.get(at)) if (at === top) return true;
  return false;
}

function statusOf(process: number): { readonly parent: number; readonly resident: number } | null {
  try {
    const status = readFileSync(`/proc/${process}/status`, 'utf8');
    return { parent: Number(/^PPid:\s*(\d+)/m.exec(status)?.[1] ?? 0), resident: 1024 * Number(/^VmRSS:\s*(\d+)/m.exec(status)?.[1] ?? 0) };
  } catch {
    // It has ended meanwhile.
    return null;
  }
}
