import { copyFileSync, existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import Database from 'better-sqlite3';
import { afterAll, describe, expect, it } from 'vitest';
import { freeIon, readWithRivals } from '#engine';
import { readCollection } from '../../../scripts/content/readCollection.ts';
import { engineHash } from '../../../scripts/database/fingerprint.ts';
import { refit } from '../../../scripts/database/refit.ts';
import { runScript } from '../commands/runScript.ts';
import { sampleContent, sampleFile, temporaryFolder, writeSample } from '../commands/sampleContent.ts';

const folders: { remove: () => void }[] = [];
function folder(): string {
  const made = temporaryFolder();
  folders.push(made);
  return made.path;
}
afterAll(() => {
  for (const made of folders) made.remove();
});

function refitted(content: string, database: string, cache: string | null = null) {
  const result = refit({ content, database, cache });
  if (!result.ok) throw new Error(JSON.stringify(result.faults, null, 1));
  return result.refit;
}

function results(database: string): Record<string, unknown>[] {
  const opened = new Database(database, { readonly: true });
  try {
    return opened.prepare('SELECT * FROM result ORDER BY complex, measurement').all() as Record<string, unknown>[];
  } finally {
    opened.close();
  }
}

describe('a refit', () => {
  it('writes one result for each measurement, with the fit\'s own numbers', () => {
    const content = sampleContent();
    const database = join(folder(), 'a.sqlite');
    const done = refitted(content, database);
    const rows = results(database);
    const measurements = new Map(readCollection(content).collection!.complexes.flatMap((complex) => complex.measurements.map((one) => [`${complex.id}/${one.id}`, one])));
    expect(rows.map(({ complex, measurement }) => `${complex}/${measurement}`)).toEqual(['co2-cl4/one-band', 'co2-cl4/solid', 'co3-am6/aq', 'cr-am6/aq-295']);
    for (const row of rows) {
      const { engine, policy } = measurements.get(`${row['complex']}/${row['measurement']}`)!;
      const { chosen: reading } = readWithRivals(engine, policy, freeIon(policy.freeIons, engine.ion));
      const [delta, racahB] = reading.parameters;
      expect([row['verdict'], row['Delta'], row['Delta_u_total'], row['B'], row['B_standing']])
        .toEqual([reading.verdict, delta!.value, delta!.uTotal, racahB!.value, racahB!.standing]);
    }
    expect(Object.values(done.verdicts).reduce((sum, count) => sum + count, 0)).toBe(4);
    // nu1 of an A2-ground ion is Delta itself; a fit without a spare spin-allowed band stays close to it.
    expect(Math.abs((rows[3]!['Delta'] as number) - 21550)).toBeLessThan(200);
  });

  it('gives the same bytes again, in another folder, time zone and locale', () => {
    const [first, second] = [folder(), folder()];
    const [here, there] = [join(first, 'content'), join(second, 'a rather longer name for it')];
    writeSample(here);
    writeSample(there);
    const settings = [
      { TZ: 'UTC', LC_ALL: 'C', LANG: 'C', BANDSTEAD_CACHE: first },
      { TZ: 'Pacific/Kiritimati', LC_ALL: 'tr_TR.UTF-8', LANG: 'sv_SE.UTF-8', BANDSTEAD_CACHE: second },
    ];
    const bytes = [[here, first], [there, second]].map(([content, place], i) => {
      const database = join(place!, 'made', 'x.sqlite');
      expect(runScript('refit', ['--content', content!, '--database', database], settings[i]!)).toMatchObject({ code: 0, stderr: '' });
      return readFileSync(database);
    });
    expect(bytes[0]!.length).toBeGreaterThan(10_000);
    expect(bytes[0]!.equals(bytes[1]!)).toBe(true);
  });

  it('from the cache equals a cold one, and fits only what changed', () => {
    const content = sampleContent();
    const place = folder();
    const [database, cold, cache] = [join(place, 'a.sqlite'), join(place, 'cold.sqlite'), join(place, 'cache.sqlite')];
    expect(refitted(content, database, cache).refitted).toBe(4);
    expect(refitted(content, database, cache).refitted).toBe(0);
    refitted(content, cold);
    expect(readFileSync(database).equals(readFileSync(cold))).toBe(true);

    writeSample(content, { 'complexes/co3-am6.yaml': sampleFile('complexes/co3-am6.yaml').replace('21050', '21080') });
    expect(refitted(content, database, cache).refitted).toBe(1);
    refitted(content, cold);
    expect(readFileSync(database).equals(readFileSync(cold))).toBe(true);

    writeSample(content, { 'policy.yaml': 'name: house\nC/B: 4.2(5)\n' });
    expect(refitted(content, database, cache).refitted).toBe(4);
  });

  it('fits nothing anew for a change that no result hangs on', () => {
    const content = sampleContent();
    const place = folder();
    const cache = join(place, 'cache.sqlite');
    refitted(content, join(place, 'a.sqlite'), cache);
    writeSample(content, { 'complexes/co3-am6.yaml': sampleFile('complexes/co3-am6.yaml').replace('notebook: "3"', 'notebook: "33"') });
    expect(refitted(content, join(place, 'a.sqlite'), cache).refitted).toBe(0);
  });

  it('gives a measurement the same digits when all other records are gone', () => {
    const place = folder();
    refitted(sampleContent(), join(place, 'all.sqlite'));
    const all = results(join(place, 'all.sqlite'));
    for (const kept of ['co2-cl4', 'co3-am6', 'cr-am6']) {
      const others = ['co2-cl4', 'co3-am6', 'cr-am6'].filter((id) => id !== kept).map((id) => [`complexes/${id}.yaml`, null] as const);
      refitted(sampleContent(Object.fromEntries(others)), join(place, `${kept}.sqlite`));
      expect(results(join(place, `${kept}.sqlite`))).toEqual(all.filter(({ complex }) => complex === kept));
    }
  });

  it('with a fault in the content leaves the old file as it was', () => {
    const content = sampleContent();
    const database = join(folder(), 'a.sqlite');
    refitted(content, database);
    const before = readFileSync(database);
    writeSample(content, { 'complexes/co3-am6.yaml': sampleFile('complexes/co3-am6.yaml').replace('21050(60) cm-1', '21050') });
    const result = refit({ content, database, cache: null });
    expect(result.ok ? [] : result.faults.map(({ file, code }) => [file, code])).toEqual([['complexes/co3-am6.yaml', expect.any(String)]]);
    expect(readFileSync(database).equals(before)).toBe(true);
  });

  it('of a collection without complexes writes a database without results', () => {
    const content = sampleContent({ 'complexes/co2-cl4.yaml': null, 'complexes/co3-am6.yaml': null, 'complexes/cr-am6.yaml': null });
    const database = join(folder(), 'a.sqlite');
    expect(refitted(content, database).measurements).toBe(0);
    expect(results(database)).toEqual([]);
  });
});

describe('the hash of the engine', () => {
  it('changes with any source file and with nothing else', () => {
    const place = folder();
    writeFileSync(join(place, 'a.ts'), 'one');
    const before = engineHash(place);
    writeFileSync(join(place, 'notes.txt'), 'x');
    expect(engineHash(place)).toBe(before);
    writeFileSync(join(place, 'a.ts'), 'two');
    expect(engineHash(place)).not.toBe(before);
    copyFileSync(join(place, 'a.ts'), join(place, 'b.ts'));
    expect(existsSync(join(place, 'b.ts'))).toBe(true);
    expect(new Set([before, engineHash(place), engineHash()]).size).toBe(3);
  });
});
