// npm run begin: takes the demonstration out of the content folder and leaves a group's own beginning.

import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { readArguments } from './arguments.ts';
import type { Arguments, CommandTable } from './arguments.ts';
import { carryOut } from './begin/carryOut.ts';
import { readManifest } from './begin/demonstration.ts';
import { exampleId, exampleLigand, exampleText } from './begin/example.ts';
import { manualWithoutDemonstration } from './begin/manual.ts';
import { isDemonstration, planBegin } from './begin/plan.ts';
import { groupText, placeholderStart, placeholderUrl, policyText } from './begin/settings.ts';
import type { NewGroup } from './begin/settings.ts';
import { beginFacts, beginLines } from './begin/words.ts';
import { readCollection } from './content/readCollection.ts';
import { date, licence, webAddress } from './content/schema/references.ts';
import { exitCodes } from './exitCodes.ts';
import { whileLocked } from './lock.ts';
import { places } from './places.ts';
import { projectFolder } from './publish/pages.ts';
import { folderName } from './report/faults.ts';
import { stoppedByFaults } from './report/stoppedByFaults.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'begin',
  summary: 'Takes the demonstration out of the content folder and leaves the beginning of your own collection: group.yaml, policy.yaml and one example record to type over. Ligand records and your own records stay.',
  options: [
    { name: 'group', value: 'NAME', help: 'name of your group (needed)' },
    { name: 'title', value: 'TEXT', help: 'title of the collection ("Spectra of GROUP")' },
    { name: 'person', value: 'NAME', help: 'who keeps the collection' },
    { name: 'contact', value: 'ADDRESS', help: 'where readers report mistakes' },
    { name: 'licence', value: 'SPDX', help: 'licence of your records (CC-BY-4.0)' },
    { name: 'url', value: 'ADDRESS', help: `where the site will stand, with its base path (${placeholderUrl})` },
    { name: 'started', value: 'DATE', help: `day on which the collection was started, year-month-day (${placeholderStart}, to be typed later)` },
    { name: 'content', value: 'DIR', help: 'folder of the records (content)' },
    { name: 'show', help: 'say what would be done, and change nothing' },
    { name: 'again', help: 'begin although group.yaml is no longer that of the demonstration; the old settings are kept beside the new ones' },
    { name: 'json', help: 'print what was done as JSON' },
  ],
  examples: ['--group "Coordination chemistry, Example University"', '--group "Our group" --person "Your Name" --url https://example.org/bands/ --show'],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const content = given.path('content', places.content);
  const group = newGroup(given);
  if (!isDemonstration(content) && !given.has('again')) {
    throw new UsageError(`${folderName(content)}/group.yaml ${existsSync(join(content, 'group.yaml')) ? 'does not say "demonstration: true": this collection has begun' : 'is not there'}. Nothing was changed.\n`
      + 'With --again your records stay, what is left of the demonstration goes, and group.yaml and policy.yaml are written anew (the old ones are kept as group.yaml.before and policy.yaml.before).');
  }
  const plan = planBegin(content, readManifest(), newFiles(content, group));
  const json = given.has('json');
  const done = !given.has('show');
  if (done) await whileLocked(table.name, [content], () => carryOut(content, plan));
  const words = { content: folderName(content), done, group, tracked: content === places.content && existsSync(join(projectFolder, '.git')) };
  const { faults } = done ? readCollection(content) : { faults: [] };
  if (faults.length > 0) return stoppedByFaults(faults, content, 'The collection has begun; the faults above stand in records that were there before.', json);
  process.stdout.write(json ? `${JSON.stringify(beginFacts(plan, words))}\n` : `${beginLines(plan, words).join('\n')}\n`);
  return exitCodes.good;
});

function newGroup(given: Arguments): NewGroup {
  const group = given.text('group')?.trim() ?? '';
  if (group === '') throw new UsageError('--group is missing: give the name of your group.');
  return {
    group,
    title: given.text('title')?.trim() ?? `Spectra of ${group}`,
    licence: checked('licence', licence(), given.text('licence') ?? 'CC-BY-4.0'),
    url: checked('url', webAddress(), given.text('url') ?? placeholderUrl),
    started: checked('started', date(), given.text('started') ?? placeholderStart),
    contact: given.text('contact')?.trim() ?? null,
    person: given.text('person')?.trim() ?? null,
  };
}

/** An option's value as the record format reads it. */
function checked(option: string, reader: ReturnType<typeof licence>, typed: string): string {
  const read = reader.safeParse(typed);
  if (read.success) return read.data;
  const [issue] = read.error.issues;
  throw new UsageError(`--${option}: found "${typed}", expected ${issue?.message ?? 'another value'}.`);
}

function newFiles(content: string, group: NewGroup): Record<string, string> {
  const manual = join(content, 'README.md');
  return {
    'group.yaml': groupText(group),
    'policy.yaml': policyText(group.started),
    [`complexes/${exampleId}.yaml`]: exampleText(),
    [exampleLigand.path]: exampleLigand.text,
    ...(existsSync(manual) ? { 'README.md': manualWithoutDemonstration(readFileSync(manual, 'utf8')) } : {}),
  };
}
