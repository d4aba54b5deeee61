import { spawn } from 'node:child_process';
import { cpSync, mkdirSync, readdirSync, renameSync, rmSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { dirname, isAbsolute, join, relative } from 'node:path';
import { besideTarget, removeLitter } from '../litter.ts';
import type { Address } from './address.ts';

/** The folder of the software itself: where the site's sources and its page builder are found, wherever the user stands. */
export const projectFolder = fileURLToPath(new URL('../..', import.meta.url));

/** What the site is told: the database it reads, where it will stand, where its pages go. */
export function siteSettings(databaseFile: string, { origin, base }: Address, out: string): Readonly<Record<string, string>> {
  return {
    BANDSTEAD_DATABASE: databaseFile,
    BANDSTEAD_SITE: origin,
    BANDSTEAD_BASE: base,
    BANDSTEAD_OUT: out,
    ASTRO_TELEMETRY_DISABLED: '1',
    NO_COLOR: '1',
  };
}

/**
 * Builds the pages into `out`. Throws with what the page builder said where it fails.
 *
 * The page builder keeps its bundles within a target inside the project, and in one common place for every target outside it, where
 * two builds at once would mix: a target outside is made inside first and then moved.
 */
export async function buildPages(databaseFile: string, address: Address, out: string): Promise<void> {
  const away = relative(projectFolder, out);
  if (!away.startsWith('..') && !isAbsolute(away)) return buildInside(databaseFile, address, out);
  const target = join(projectFolder, '.cache', 'pages');
  mkdirSync(dirname(target), { recursive: true });
  removeLitter(target);
  const made = besideTarget(target, 'new');
  try {
    await buildInside(databaseFile, address, made);
    move(made, out);
  } finally {
    rmSync(made, { recursive: true, force: true });
  }
}

async function buildInside(databaseFile: string, address: Address, out: string): Promise<void> {
  const { code, said } = await run(['build', '--silent'], siteSettings(databaseFile, address, out));
  if (code !== 0) throw new Error(`the pages could not be built:\n${said.trim() === '' ? `the page builder ended with code ${code}` : said.trim()}`);
}

/** A rename, or a copy where the two folders are on different disks. */
function move(from: string, to: string): void {
  try {
    renameSync(from, to);
  } catch (error) {
    if (!(error instanceof Error && 'code' in error && error.code === 'EXDEV')) throw error;
    cpSync(from, to, { recursive: true });
  }
}

/** How many pages (HTML files) a folder holds. */
export function countPages(folder: string): number {
  return readdirSync(folder, { recursive: true, encoding: 'utf8' }).filter((name) => name.endsWith('.html')).length;
}

/** Environment variables that the page builder mixes into what the pages see of their own address and mode. */
export const misleading: readonly string[] = ['BASE_URL', 'SITE', 'ASSETS_PREFIX', 'MODE', 'DEV', 'PROD', 'SSR'];

function cleanEnvironment(): NodeJS.ProcessEnv {
  const kept = Object.entries(process.env).filter(([name]) => !misleading.includes(name));
  return { ...Object.fromEntries(kept), NODE_ENV: 'production' };
}

function run(words: readonly string[], settings: Readonly<Record<string, string>>): Promise<{ code: number; said: string }> {
  return new Promise((resolve, reject) => {
    const builder = join(projectFolder, 'node_modules', 'astro', 'bin', 'astro.mjs');
    const child = spawn(process.execPath, [builder, ...words], {
      cwd: projectFolder, env: { ...cleanEnvironment(), ...settings }, stdio: ['ignore', 'pipe', 'pipe'],
    });
    let said = '';
    for (const stream of [child.stdout, child.stderr]) stream.setEncoding('utf8').on('data', (text: string) => { said += text; });
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, said }));
  });
}
