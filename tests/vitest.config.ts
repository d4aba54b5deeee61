import { availableParallelism } from 'node:os';
import { fileURLToPath } from 'node:url';
import { configDefaults, defineConfig } from 'vitest/config';
import { testsLeftOut } from '../scripts/test/demonstrationTests.ts';

// scripts/test.ts sets this where there is no browser to run tests/browser in.
const withoutBrowser = process.env['BANDSTEAD_WITHOUT_BROWSER'] === '1';

export default defineConfig({
  root: fileURLToPath(new URL('..', import.meta.url)),
  test: {
    include: ['tests/**/*.test.ts'],
    exclude: [...configDefaults.exclude, ...testsLeftOut(), ...(withoutBrowser ? ['tests/browser/**'] : [])],
    // A test left focused would hide the others.
    allowOnly: false,
    globalSetup: ['tests/run/folder.ts'],
    // By itself the runner would leave one processor idle; one worker more than processors works while others wait for a process or a page.
    maxWorkers: availableParallelism() + 1,
    // Modules are evaluated once a worker: half the time, and a test that leaves something behind in a module shows up.
    isolate: false,
    testTimeout: 120_000,
    hookTimeout: 180_000,
    // What a page shows after scripts are fetched may take long on a busy machine.
    expect: { poll: { timeout: 20_000 } },
  },
});
