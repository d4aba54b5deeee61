// npm run bench: rates and ratios of this machine. Nothing here is a test.

import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { significant } from '#engine';
import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { measurePages, measureRefit, prepareCollection } from './bench/collection.ts';
import { measureBlocks, measureReadings } from './bench/engine.ts';
import { measureSeries } from './bench/series.ts';
import { measureStartUp } from './bench/startUp.ts';
import type { Measured } from './bench/stopwatch.ts';
import { exitCodes } from './exitCodes.ts';
import { aligned } from './report/columns.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'bench',
  summary: 'Measures how fast the engine, the refit and the pages are here, over generated records.',
  options: [
    { name: 'records', value: 'NUMBER', help: 'how many complexes to generate (1000)' },
    { name: 'without-pages', help: 'leave out the pages, which take longest' },
    { name: 'json', help: 'print the numbers as JSON' },
  ],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const typed = given.text('records') ?? '1000';
  if (!/^[1-9]\d{0,5}$/.test(typed)) throw new UsageError(`--records takes a whole number from 1 to 999999, not "${typed}".`);
  const json = given.has('json');
  const lines: Measured[] = [];
  const add = (more: readonly Measured[]): void => {
    lines.push(...more);
    if (!json) process.stdout.write(`${aligned(more.map(cells), '').join('\n')}\n`);
  };
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-bench-'));
  try {
    add(await measureBlocks());
    const prepared = await prepareCollection(folder, Number(typed));
    add(prepared.lines);
    add(await measureReadings(prepared.collection));
    add(await measureSeries());
    add(await measureRefit(folder));
    if (!given.has('without-pages')) add(await measurePages(folder, prepared.collection));
    add(await measureStartUp());
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, node: process.versions.node, measured: lines })}\n`);
  return exitCodes.good;
});

function cells({ name, value, unit, over }: Measured): string[] {
  return [name.padEnd(28), significant(value, 3).padStart(8), unit.padEnd(14), over];
}
