// npm test: types, form and all tests; the last line is "N passed, N failed".

import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { exitCodes } from './exitCodes.ts';
import { runCommand } from './runCommand.ts';
import { findChromium } from './test/chromium.ts';
import { testsLeftOut } from './test/demonstrationTests.ts';
import { runCheck, runTests } from './test/steps.ts';
import type { Score } from './test/steps.ts';

const table: CommandTable = {
  name: 'test',
  summary: 'Checks types and form of the code and runs all tests. With a value, runs only the tests whose path holds it.',
  values: [{ name: 'PATTERN', help: 'part of a test file\'s path, for example tests/engine', optional: true }],
  options: [],
  examples: ['tests/engine/quantity'],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const say = (line: string): void => {
    process.stdout.write(`${line}\n`);
  };
  const scores: Score[] = [];
  if (given.values.length === 0) {
    scores.push(...await Promise.all([
      runCheck('types of the project, pages included', 'astro', ['check'], say),
      runCheck('types of the engine, without Node or a browser', 'tsc', ['--noEmit', '-p', 'engine/tsconfig.json'], say),
      runCheck('form of the code', 'biome', ['check', '--config-path=tests/biome.json', '.'], say),
    ]));
  }
  const browser = findChromium();
  scores.push(await runTests(given.values, browser !== null));
  if (browser === null) {
    say('Not run: tests/browser, for no Chromium was found. Install it (apt-get install chromium) or set CHROME_PATH to one.');
    if (process.env['BANDSTEAD_REQUIRE_BROWSER'] === '1') scores.push({ passed: 0, failed: 1 });
  }
  const left = testsLeftOut();
  if (left.length > 0) say(`Not run: ${left.length} files of tests that speak of the demonstration's records, which are no longer in content/ (scripts/test/demonstrationTests.ts names them).`);
  const passed = scores.reduce((sum, score) => sum + score.passed, 0);
  const failed = scores.reduce((sum, score) => sum + score.failed, 0);
  say(`${passed} passed, ${failed} failed`);
  return failed === 0 ? exitCodes.good : exitCodes.faults;
});
