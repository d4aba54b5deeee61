// What beginning a collection says it did.

import { counted } from '../report/columns.ts';
import type { BeginPlan } from './plan.ts';
import { exampleId } from './example.ts';
import { placeholderStart, placeholderUrl } from './settings.ts';
import type { NewGroup } from './settings.ts';

export interface BeginCircumstances {
  /** The content folder as the user sees it. */
  readonly content: string;
  /** false where only the plan is shown. */
  readonly done: boolean;
  readonly group: NewGroup;
  /** true where the content folder is that of a project under git. */
  readonly tracked: boolean;
}

export function beginFacts({ remove, keep, write }: BeginPlan, { content, done, group }: BeginCircumstances) {
  return {
    ok: true, done, content, group, removed: remove, kept: keep,
    written: write.map(({ path }) => path), oldTexts: write.flatMap(({ oldTextTo }) => oldTextTo ?? []),
  };
}

export function beginLines({ remove, keep, write }: BeginPlan, { content, done, group, tracked }: BeginCircumstances): string[] {
  const verb = (past: string, future: string): string => (done ? past : future);
  const old = write.filter(({ oldTextTo }) => oldTextTo !== null);
  return [
    done ? `The collection of ${group.group} has begun in ${content}/.` : 'Nothing was changed. This would be done:',
    ...(remove.length === 0 ? ['Nothing of the demonstration was left to remove.'] : [
      `${verb('Removed', 'Remove')} the demonstration, ${counted(remove.length, 'file')}:`,
      ...wrapped(remove),
      ...(done ? [tracked ? `It stays in the history: "git checkout HEAD -- ${content}" brings it back until you commit.` : 'A fresh copy of the project has it still.'] : []),
    ]),
    ...(keep.length === 0 ? [] : [`${verb('Kept', 'Keep')}, because they are not the demonstration as it came, or are cited by such a record:`, ...wrapped(keep)]),
    `${verb('Wrote', 'Write')} ${write.length === 0 ? 'nothing' : write.map(({ path }) => path).join(', ')}.`,
    ...old.map(({ path, oldTextTo }) => `The old ${path} ${verb('is kept', 'would be kept')} as ${oldTextTo}.`),
    `Settings: licence ${group.licence}, started ${group.started}${group.started === placeholderStart ? ' (stands for the day; type yours in group.yaml)' : ''}, address ${group.url}${group.url === placeholderUrl ? ' (change it in group.yaml before you publish)' : ''}.`,
    ...(done ? [
      `Next: copy ${content}/complexes/${exampleId}.yaml, an example with invented readings, to ID.yaml and type your first record over it;`,
      'delete the example and change the description in group.yaml, which speaks of it; then "npm run check", and "npm run dev" for the page.',
    ] : []),
  ];
}

/** Names in lines of at most 110 characters. */
function wrapped(names: readonly string[]): string[] {
  const lines: string[] = [];
  for (const name of names) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + name.length < 108) lines[lines.length - 1] = `${last}, ${name}`;
    else lines.push(`  ${name}`);
  }
  return lines;
}
