import { join } from 'node:path';
import { writePublication } from '../../scripts/export/writePublication.ts';
import { places } from '../../scripts/places.ts';
import { buildPages } from '../../scripts/publish/pages.ts';
import { sharedFolder } from '../run/shared.ts';
import { refittedDemonstration } from '../site/demonstration.ts';
import { type ServedSite, serve } from './site.ts';

/** The demonstration collection, refitted, built and served: the page against what the commands say of the same database. */
export async function servedDemonstration(base: string): Promise<ServedSite & { readonly database: string }> {
  const database = await refittedDemonstration();
  const folder = await sharedFolder(`demonstration-${base.replaceAll('/', '') || 'root'}`, async (made) => {
    await buildPages(database, { origin: 'https://example.org', base }, join(made, 'dist'));
    writePublication(database, places.content, join(made, 'dist'));
  });
  return { ...(await serve(folder, base)), database };
}
