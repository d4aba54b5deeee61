import { join } from 'node:path';
import { refit } from '../../scripts/database/refit.ts';
import { places } from '../../scripts/places.ts';
import { sharedFolder } from '../run/shared.ts';

/** The demonstration collection refitted without a cache, once a run: the path of its database, to be read only. */
export async function refittedDemonstration(): Promise<string> {
  const folder = await sharedFolder('demonstration', (made) => {
    const done = refit({ content: places.content, database: join(made, 'collection.sqlite'), cache: null });
    if (!done.ok) throw new Error(JSON.stringify(done.faults));
  });
  return join(folder, 'collection.sqlite');
}
