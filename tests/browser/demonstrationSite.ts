import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { writeExports } from '../../scripts/export/writeExports.ts';
import { buildPages } from '../../scripts/publish/pages.ts';
import { createSiteServer } from '../../scripts/publish/staticServer.ts';
import { type Refitted, refittedDemonstration } from '../site/demonstration.ts';
import type { ServedSite } from './site.ts';

/** The demonstration collection, refitted, built and served: the page against what the commands say of the same database. */
export async function servedDemonstration(base: string): Promise<ServedSite & { readonly refitted: Refitted }> {
  const refitted = refittedDemonstration();
  const folder = join(refitted.folder, 'dist');
  await buildPages(refitted.database, { origin: 'https://example.org', base }, folder);
  writeExports(refitted.database, join(folder, 'data'));
  const server = createSiteServer(folder, base);
  await new Promise<void>((done) => { server.listen(0, '127.0.0.1', done); });
  return {
    refitted, folder, address: `http://127.0.0.1:${(server.address() as AddressInfo).port}${base}`,
    close: async () => {
      await new Promise((done) => { server.close(done); server.closeAllConnections(); });
      refitted.remove();
    },
  };
}
