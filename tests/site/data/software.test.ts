import { readFileSync } from 'node:fs';
import { expect, test } from 'vitest';
import { projectFolder } from '../../../scripts/publish/pages.ts';
import { software } from '../../../site/data/software.ts';

const read = (file: string): Readonly<Record<string, unknown>> => JSON.parse(readFileSync(`${projectFolder}/${file}`, 'utf8')) as Readonly<Record<string, unknown>>;

test('the packages that make the site are listed with the version and licence of each one’s own manifest, and what it is for', () => {
  const { packages, name, licence } = software();
  expect([name, licence]).toEqual([read('package.json')['name'], read('package.json')['license']]);
  expect(packages.rows.map(([one]) => one)).toEqual(Object.keys(read('package.json')['dependencies'] as object));
  for (const [one, version, license, purpose] of packages.rows) {
    const own = read(`node_modules/${String(one)}/package.json`);
    expect([version, license], String(one)).toEqual([own['version'], own['license']]);
    expect(purpose, String(one)).toMatch(/^[a-z].{3,}/);
  }
});

test('the licences of all others are counted, none is unknown, and the counts add up', () => {
  const { more } = software();
  const [, total] = /^They need (\d+) packages more: /.exec(more)!;
  const counts = [...more.matchAll(/([\w.-]+(?: \w+ [\w.-]+)*) (\d+)(?=[,.]| and)/g)].map(([, , count]) => Number(count));
  expect(more).not.toContain('not said');
  expect(counts.reduce((sum, count) => sum + count, 0)).toBe(Number(total));
  expect(Number(total)).toBeGreaterThan(50);
});
