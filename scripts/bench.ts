// npm run bench: rates and ratios of this machine. Nothing here is a test.

import { mkdirSync, mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { significant } from '#engine';
import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { measurePages, measureRefit, prepareCollection } from './bench/collection.ts';
import { measureCompare } from './bench/compare.ts';
import { measureBlocks, measureReadings } from './bench/engine.ts';
import { measureKeystroke } from './bench/keystroke.ts';
import { measureLighthouse } from './bench/lighthouse.ts';
import { measureLive } from './bench/live.ts';
import { measureShares } from './bench/parts.ts';
import { measureSlowest, measureThreads } from './bench/records.ts';
import { measureScale } from './bench/scale.ts';
import { measureSeries } from './bench/series.ts';
import { measureStartUp } from './bench/startUp.ts';
import type { Measured } from './bench/stopwatch.ts';
import { readCollection } from './content/readCollection.ts';
import type { Collection } from './content/types.ts';
import { exitCodes } from './exitCodes.ts';
import { places } from './places.ts';
import { addressOf } from './publish/address.ts';
import { aligned } from './report/columns.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'bench',
  summary: 'Measures how fast the engine, the refit and the pages are here, over generated records.',
  options: [
    { name: 'records', value: 'NUMBER', help: 'how many complexes to generate (1000)' },
    { name: 'complexes', value: 'NUMBER', help: 'only the commands at scale: refit, one record changed, build, each in its own process with its memory, and the growth from a tenth of so many' },
    { name: 'lighthouse', help: 'only the scores of Lighthouse for five pages of the collection in content/' },
    { name: 'without-pages', help: 'leave out the pages, which take longest' },
    { name: 'json', help: 'print the numbers as JSON' },
  ],
};

/** Complexes that are read on threads: they have about 10 000 measurements. */
const complexesOnThreads = 7_600;

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const records = wholeNumber('records', given.text('records') ?? '1000');
  const typed = given.text('complexes');
  const complexes = typed === null ? null : wholeNumber('complexes', typed);
  const pages = !given.has('without-pages');
  const json = given.has('json');
  const lines: Measured[] = [];
  const add = (more: readonly Measured[]): void => {
    lines.push(...more);
    if (!json) process.stdout.write(`${aligned(more.map(cells), '').join('\n')}\n`);
  };
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-bench-'));
  try {
    if (given.has('lighthouse')) await measureLighthouse(folder, own().group.url, add);
    else if (complexes !== null) await measureScale(folder, complexes, pages, add);
    else await measureParts(folder, records, pages, add);
  } finally {
    rmSync(folder, { recursive: true, force: true });
  }
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, node: process.versions.node, measured: lines })}\n`);
  return exitCodes.good;
});

/** The parts of the tool, one by one. */
async function measureParts(folder: string, records: number, pages: boolean, add: (lines: readonly Measured[]) => void): Promise<void> {
  add(await measureBlocks());
  const prepared = await prepareCollection(folder, records);
  add(prepared.lines);
  add(measureShares(folder));
  add(await measureReadings(prepared.collection));
  const many = join(folder, 'many');
  mkdirSync(many);
  add(await measureThreads((await prepareCollection(many, complexesOnThreads)).collection));
  add(await measureSlowest(own()));
  add(await measureSeries());
  add(await measureRefit(folder));
  add(await measureCompare(folder, records));
  if (pages) {
    add(await measurePages(folder, prepared.collection));
    add(await measureKeystroke(folder, addressOf(prepared.collection.group.url).base));
  }
  if (pages) add(await measureLive(folder, records));
  add(await measureStartUp());
}

/** The group's own collection. */
function own(): Collection {
  const { collection, faults } = readCollection(places.content);
  if (collection === null) throw new Error(`the collection in ${places.content} has ${faults.length} faults: run "npm run check"`);
  return collection;
}

function wholeNumber(option: string, typed: string): number {
  if (!/^[1-9]\d{0,5}$/.test(typed)) throw new UsageError(`--${option} takes a whole number from 1 to 999999, not "${typed}".`);
  return Number(typed);
}

function cells({ name, value, unit, over }: Measured): string[] {
  return [name.padEnd(28), significant(value, 3).padStart(8), unit.padEnd(14), over];
}
