import { fitAssignment, freeIon, levels, ratioFor, readWithRivals, significant } from '#engine';
import type { Assigned, Geometry, Reading } from '#engine';
import type { Collection, MeasurementRecord } from '../content/types.ts';
import { measureFloor } from './floor.ts';
import { median, timed } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

/**
 * What deriving the symmetry blocks of each d^n costs: the first call of `levels` less a later one. It must run before anything
 * else has asked for levels in this process.
 */
export async function measureBlocks(): Promise<Measured[]> {
  const lines: Measured[] = [];
  for (let electrons = 1; electrons <= 9; electrons += 1) {
    const call = () => timed(() => levels({ electrons, geometry: 'octahedral' }, { delta: 15000, racahB: 800, racahC: 3600 }));
    const first = (await call()).milliseconds;
    const later = median([(await call()).milliseconds, (await call()).milliseconds, (await call()).milliseconds]);
    lines.push({ name: `blocks of d${electrons}`, value: Math.max(0, first - later), unit: 'ms', over: 'first call of levels less a later one' });
  }
  return lines;
}

/** Complete fits and complete readings a second on one core, once the level tables stand, and what the first pass costs on top. */
export async function measureReadings(collection: Collection): Promise<Measured[]> {
  const records = collection.complexes.flatMap(({ measurements }) => measurements);
  if (records.length === 0) return [];
  const first = await timed(() => records.map(read));
  const tasks = records.flatMap((record, index) => taskOf(record, first.value[index]!.chosen));
  const fits = await rate(tasks.length, () => tasks.forEach(fit));
  const readings = await rate(records.length, () => records.forEach(read));
  const kinds = new Set(tasks.map(({ ion }) => `${ion.electrons} ${ion.geometry} ${ion.multiplicity}`)).size;
  const allThree = tasks.filter(({ fitted }) => fitted).length;
  return [
    ...(await measureFloor(tasks)),
    { name: 'fits', value: fits, unit: 'a second', over: `${tasks.length} assignments of ${kinds} kinds of ion (${allThree} with C free): all branches and covariance, tables standing` },
    { name: 'readings', value: readings, unit: 'a second', over: `${records.length} measurements: search for rivals, every fit, limits, predictions, words` },
    {
      name: 'first pass', value: first.milliseconds / (1000 * records.length / readings), unit: 'times',
      over: `against a later one: what level tables and the compiler's warming up cost, ${significant(first.milliseconds - 1000 * records.length / readings, 3)} ms in all`,
    },
  ];
}

/** The chosen assignment of a measurement. */
export interface Task {
  readonly ion: { readonly electrons: number; readonly geometry: Geometry; readonly multiplicity: number };
  readonly assigned: readonly Assigned[];
  readonly record: MeasurementRecord;
  /** C was fitted. */
  readonly fitted: boolean;
}

const read = ({ engine, policy }: MeasurementRecord) => readWithRivals(engine, policy, freeIon(policy.freeIons, engine.ion));

function fit({ ion, assigned, record: { engine, policy } }: Task): void {
  fitAssignment(ion, assigned, policy, ratioFor(policy, engine.ion.name), freeIon(policy.freeIons, engine.ion));
}

// The chosen assignment of a measurement, to be fitted alone.
function taskOf(record: MeasurementRecord, { geometry, multiplicity, bands, ratio }: Reading): Task[] {
  if (geometry === null || multiplicity === null || bands.length === 0) return [];
  const assigned = bands.map(({ label, observed, uMinus, uPlus, uAssumed, bands: members }) => ({
    label, observation: { bands: members, position: observed, uMinus, uPlus, uAssumed },
  }));
  return [{ ion: { electrons: record.engine.ion.electrons, geometry, multiplicity }, assigned, record, fitted: ratio?.origin === 'fitted' }];
}

// Passes for two seconds or so, and the middle one of them, so that the rate is not that of a cold compiler.
async function rate(count: number, work: () => void): Promise<number> {
  const passes: number[] = [];
  while (passes.length < 3 || (passes.reduce((a, b) => a + b) < 2000 && passes.length < 200)) passes.push((await timed(work)).milliseconds);
  return (1000 * count) / median(passes);
}
