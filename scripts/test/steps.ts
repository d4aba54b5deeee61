import { spawn } from 'node:child_process';
import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { projectFolder } from '../publish/pages.ts';

/** How many checks of a step held and how many did not. */
export interface Score {
  readonly passed: number;
  readonly failed: number;
}

/** Runs a command of the project whose success is one check. What it says is shown where it fails. */
export async function runCheck(name: string, program: string, words: readonly string[], say: (line: string) => void): Promise<Score> {
  const { code, said } = await run(program, words, 'collect');
  say(`${code === 0 ? 'passed' : 'FAILED'}  ${name}`);
  if (code === 0) return { passed: 1, failed: 0 };
  say(said.trimEnd());
  return { passed: 0, failed: 1 };
}

/** Runs the tests, all or those whose path holds one of `patterns`, and counts them. A file that cannot be loaded is one failure. */
export async function runTests(patterns: readonly string[], withBrowser: boolean): Promise<Score> {
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-test-'));
  try {
    const report = join(folder, 'report.json');
    const words = ['run', '--config', 'tests/vitest.config.ts', '--reporter=default', '--reporter=json', `--outputFile.json=${report}`, ...patterns];
    const { code } = await run('vitest', words, 'show', withBrowser ? {} : { BANDSTEAD_WITHOUT_BROWSER: '1' });
    const score = readReport(report);
    // A run that ends badly without a failed test (an error between tests, no report, no test found) is a failure all the same.
    return code !== 0 && score.failed === 0 ? { passed: score.passed, failed: 1 } : score;
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
}

interface Report {
  readonly numPassedTests: number;
  readonly numFailedTests: number;
  readonly testResults: readonly { readonly status: string; readonly assertionResults: readonly unknown[] }[];
}

function readReport(path: string): Score {
  let report: Report;
  try {
    report = JSON.parse(readFileSync(path, 'utf8')) as Report;
  } catch {
    return { passed: 0, failed: 1 };
  }
  const unloaded = report.testResults.filter(({ status, assertionResults }) => status === 'failed' && assertionResults.length === 0).length;
  return { passed: report.numPassedTests, failed: report.numFailedTests + unloaded };
}

function run(
  program: string, words: readonly string[], output: 'show' | 'collect', settings: Readonly<Record<string, string>> = {},
): Promise<{ code: number; said: string }> {
  return new Promise((resolve, reject) => {
    const child = spawn(join(projectFolder, 'node_modules', '.bin', program), words, {
      cwd: projectFolder,
      env: { ...process.env, ASTRO_TELEMETRY_DISABLED: '1', ...settings },
      stdio: output === 'show' ? ['ignore', 'inherit', 'inherit'] : ['ignore', 'pipe', 'pipe'],
    });
    let said = '';
    for (const stream of [child.stdout, child.stderr]) stream?.setEncoding('utf8').on('data', (text: string) => { said += text; });
    child.on('error', reject);
    child.on('close', (code) => resolve({ code: code ?? 1, said }));
  });
}
