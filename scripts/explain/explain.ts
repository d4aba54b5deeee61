import { freeIon, hazardCautions, readWithRivals } from '#engine';
import { nearNames } from '../content/nearest.ts';
import { readCollection } from '../content/readCollection.ts';
import type { Collection, ComplexRecord } from '../content/types.ts';
import { hazardSubject } from '../database/rows/hazardSubject.ts';
import { exitCodes } from '../exitCodes.ts';
import { stoppedByFaults } from '../report/stoppedByFaults.ts';
import { UsageError } from '../runCommand.ts';
import { storyLines } from './storyLines.ts';
import type { Story } from './storyLines.ts';

/** Prints the story of one measurement, or of every measurement of a complex; returns the exit code. */
export function explain(content: string, id: string, json: boolean): number {
  const { collection, faults } = readCollection(content);
  if (collection === null) return stoppedByFaults(faults, content, 'No story can be told before these are mended.', json);
  const stories = storiesOf(collection, id);
  if (json) process.stdout.write(`${JSON.stringify({ ok: true, stories: stories.map(storyFacts) })}\n`);
  else process.stdout.write(`${stories.map((story) => storyLines(story).join('\n')).join('\n\n')}\n`);
  return exitCodes.good;
}

function storiesOf(collection: Collection, id: string): readonly Story[] {
  const complex = collection.complexes.find((one) => id === one.id || id.startsWith(`${one.id}/`));
  const wanted = complex?.measurements.filter((one) => id === complex.id || id === `${complex.id}/${one.id}`) ?? [];
  if (complex === undefined || wanted.length === 0) throw new UsageError(unknownId(collection, complex, id));
  const hazards = hazardCautions(hazardSubject(complex, collection.ligands));
  return wanted.map((measurement) => {
    const { chosen, rivals } = readWithRivals(measurement.engine, measurement.policy, freeIon(measurement.policy.freeIons, complex.ion));
    return { complex, measurement, hazards, readings: [chosen, ...rivals] };
  });
}

function unknownId(collection: Collection, complex: ComplexRecord | undefined, id: string): string {
  if (complex !== undefined) {
    const names = complex.measurements.map((one) => `${complex.id}/${one.id}`);
    return names.length === 0 ? `${complex.id} has no measurement yet.` : `"${id}" is no measurement of ${complex.id}. There are ${names.join(', ')}.`;
  }
  const near = nearNames(id.split('/')[0] ?? id, collection.complexes.map((one) => one.id));
  return `There is no complex "${id}" in the collection.${near.length === 0 ? '' : ` Did you mean ${near.join(' or ')}?`}`;
}

function storyFacts({ complex, measurement, readings, hazards }: Story) {
  return { complex: complex.id, measurement: measurement.id, formula: complex.formula, hazards, readings };
}
