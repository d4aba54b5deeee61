// npm run predict: where an ion's bands lie for given parameters.

import { defaultPolicy, parseIon, parseQuantity, toWavenumber } from '#engine';
import type { Geometry, Ion } from '#engine';
import { readArguments } from './arguments.ts';
import type { Arguments, CommandTable } from './arguments.ts';
import { hasSpinChoice, resolvedSpin } from './content/spin.ts';
import { spinNames } from './content/vocabulary.ts';
import { exitCodes } from './exitCodes.ts';
import { predict } from './predict/prediction.ts';
import { predictionFacts, predictionLines } from './predict/words.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'predict',
  summary: 'Band positions of an ion for given parameters, spin-allowed bands first, and what was assumed.',
  values: [{ name: 'ION', help: 'the metal ion, for example "Co(II)"' }],
  options: [
    { name: 'Delta', value: 'CM-1', help: 'ligand-field splitting, cm-1' },
    { name: 'B', value: 'CM-1', help: 'Racah B, cm-1' },
    { name: 'C', value: 'CM-1', help: 'Racah C, cm-1' },
    { name: 'C/B', value: 'RATIO', help: `instead of C: its ratio to B (${defaultPolicy.cOverB.general.value})` },
    { name: 'geometry', value: 'NAME', help: 'octahedral (default) or tetrahedral' },
    { name: 'spin', value: 'NAME', help: 'high, low or a multiplicity (quartet); else that of the lowest level at these parameters' },
    { name: 'json', help: 'print everything as JSON' },
  ],
  examples: ['"Co(II)" --Delta 9200 --B 850', '"Fe(II)" --Delta 33000 --B 420 --C/B 4.5 --spin low'],
};

await runCommand(table.name, () => {
  const given = readArguments(table);
  const ion = ionOf(given.values[0] ?? '');
  const assumed: string[] = [];
  const geometry = geometryOf(given, assumed);
  const delta = energyOf(given, 'Delta');
  const racahB = energyOf(given, 'B');
  if (delta === null || racahB === null) throw new UsageError(`--${delta === null ? 'Delta' : 'B'} is missing: give it in cm-1.`);
  const racahC = racahCOf(given, racahB, assumed);
  const multiplicity = multiplicityOf(given, ion, geometry, assumed);
  const prediction = predict({ electrons: ion.electrons, geometry, multiplicity, delta, racahB, racahC });
  const order = { ion, geometry, delta, racahB, racahC, assumed };
  process.stdout.write(given.has('json')
    ? `${JSON.stringify(predictionFacts(order, prediction))}\n` : `${predictionLines(order, prediction).join('\n')}\n`);
  return exitCodes.good;
});

function ionOf(typed: string): Ion {
  const { ion, reason, near } = parseIon(typed);
  if (ion === null) throw new UsageError(`"${typed}": ${reason}.${near.length === 0 ? '' : ` Did you mean ${near.join(' or ')}?`}`);
  if (ion.electrons < 1 || ion.electrons > 9) throw new UsageError(`${ion.name} is d${ion.electrons}: it has no d-d bands.`);
  return ion;
}

function geometryOf(given: Arguments, assumed: string[]): Geometry {
  const typed = given.text('geometry');
  if (typed === null) assumed.push('octahedral');
  else if (typed !== 'octahedral' && typed !== 'tetrahedral') throw new UsageError(`--geometry takes octahedral or tetrahedral, not "${typed}".`);
  return typed ?? 'octahedral';
}

function energyOf(given: Arguments, name: string): number | null {
  const typed = given.text(name);
  if (typed === null) return null;
  const parsed = parseQuantity(/^[\d. ]+$/.test(typed) ? `${typed} cm-1` : typed, 'energy');
  if (!parsed.ok) throw new UsageError(`--${name}: found ${parsed.found}, expected ${parsed.expected}; ${parsed.mend}.`);
  return toWavenumber(parsed.quantity).position;
}

function racahCOf(given: Arguments, racahB: number, assumed: string[]): number {
  const racahC = energyOf(given, 'C');
  const typed = given.text('C/B');
  if (racahC !== null && typed !== null) throw new UsageError('Give --C or --C/B, not both.');
  if (racahC !== null) return racahC;
  if (typed === null) {
    const { value } = defaultPolicy.cOverB.general;
    assumed.push(`C/B ${value}`);
    return value * racahB;
  }
  const parsed = parseQuantity(typed, 'number');
  if (!parsed.ok) throw new UsageError(`--C/B: found ${parsed.found}, expected ${parsed.expected}; ${parsed.mend}.`);
  return parsed.quantity.value * racahB;
}

function multiplicityOf(given: Arguments, ion: Ion, geometry: Geometry, assumed: string[]): number | null {
  const typed = given.text('spin');
  if (typed === null) {
    if (hasSpinChoice(ion.electrons, geometry)) assumed.push('the spin of the lowest level at these parameters');
    return null;
  }
  const name = spinNames.find((one) => one === typed);
  if (name === undefined) throw new UsageError(`--spin takes ${spinNames.join(', ')}, not "${typed}".`);
  const { multiplicity, possible } = resolvedSpin(ion.electrons, geometry, name);
  if (multiplicity === null) throw new UsageError(`${ion.name}, ${geometry}, cannot be "${typed}": it may be ${possible.join(', ')}.`);
  return multiplicity;
}
