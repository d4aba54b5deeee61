import { execFileSync, spawnSync } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join, resolve } from 'node:path';
import { describe, expect, test } from 'vitest';

const guard = resolve(import.meta.dirname, '../../scripts/require-node.mjs');

describe('the guard in front of every command', () => {
  test('runs the named script with its own arguments', () => {
    const folder = mkdtempSync(join(tmpdir(), 'guard-'));
    try {
      writeFileSync(join(folder, 'show.ts'), 'const given: string[] = process.argv.slice(2); console.log(JSON.stringify(given));');
      expect(execFileSync(process.execPath, [guard, join(folder, 'show.ts'), 'a', '--b=c'], { encoding: 'utf8' }).trim()).toBe('["a","--b=c"]');
    } finally {
      rmSync(folder, { recursive: true });
    }
  });

  test('says what is missing under an older Node and ends with 3', () => {
    // The same file with a version that no Node has yet.
    const folder = mkdtempSync(join(tmpdir(), 'guard-'));
    try {
      const file = join(folder, 'require-node.mjs');
      writeFileSync(file, readFileSync(guard, 'utf8').replace('[22, 12]', '[999, 1]'));
      const { status, stderr } = spawnSync(process.execPath, [file, 'nothing.ts'], { encoding: 'utf8' });
      expect(status).toBe(3);
      expect(stderr).toMatch(/^Bandstead needs Node 999\.1 or newer; found \d+\.\d+\.\n/);
      expect(stderr).not.toMatch(/ at .*:\d+/);
    } finally {
      rmSync(folder, { recursive: true });
    }
  });
});
