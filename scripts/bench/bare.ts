import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { projectFolder } from '../publish/pages.ts';
import { runWatched } from './process.ts';
import type { Ran } from './process.ts';

/** The page builder by itself: so many pages that hold nothing but a heading and a table of eight rows. What no site of as many pages can go below. */
export async function buildBarePages(pages: number): Promise<Ran> {
  // Within the project, for the page builder finds its own packages from there.
  mkdirSync(join(projectFolder, '.cache'), { recursive: true });
  const folder = mkdtempSync(join(projectFolder, '.cache', 'bare-'));
  try {
    mkdirSync(join(folder, 'src', 'pages'), { recursive: true });
    writeFileSync(join(folder, 'astro.config.mjs'), "export default { output: 'static', trailingSlash: 'always', build: { format: 'directory', concurrency: 4 }, devToolbar: { enabled: false } };\n");
    writeFileSync(join(folder, 'src', 'pages', '[id].astro'), page(pages));
    return await runWatched([join(projectFolder, 'node_modules', 'astro', 'bin', 'astro.mjs'), 'build', '--silent', '--root', folder], { ASTRO_TELEMETRY_DISABLED: '1', NODE_ENV: 'production' });
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

const page = (pages: number): string => `---
export const getStaticPaths = () => Array.from({ length: ${pages} }, (_, number) => ({ params: { id: 'page-' + number } }));
const { id } = Astro.params;
const rows = Array.from({ length: 8 }, (_, row) => [id, String(10000 + row), String(row / 7)]);
---
<!doctype html>
<html lang="en"><head><meta charset="utf-8" /><title>{id}</title></head>
<body><h1>{id}</h1><table><tbody>{rows.map((row) => <tr>{row.map((cell) => <td>{cell}</td>)}</tr>)}</tbody></table></body></html>
`;
