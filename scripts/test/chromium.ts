import { accessSync, constants } from 'node:fs';

/** The browser for tests/browser: CHROME_PATH where it is set, else Debian's place; null where neither can be run. */
export function findChromium(environment: NodeJS.ProcessEnv = process.env): string | null {
  const named = environment['CHROME_PATH'];
  const path = named === undefined || named === '' ? '/usr/bin/chromium' : named;
  try {
    accessSync(path, constants.X_OK);
    return path;
  } catch {
    return null;
  }
}
