import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { resolve } from 'node:path';
import type { TestProject } from 'vitest/node';

declare module 'vitest' {
  interface ProvidedContext { readonly runFolder: string }
}

/** Gives the run a folder for what several test files read, inside the project, where the page builder may write, and takes it away at the end. */
export default function setup(project: TestProject): () => void {
  mkdirSync(resolve('.cache'), { recursive: true });
  const folder = mkdtempSync(resolve('.cache', 'test-'));
  project.provide('runFolder', folder);
  return () => rmSync(folder, { recursive: true, force: true });
}
