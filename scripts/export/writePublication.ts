import { join } from 'node:path';
import { gonePages } from '../release/goneAddresses.ts';
import { readPublished } from './published.ts';
import { writeDataFiles } from './writeExports.ts';
import { writeRecords } from './writeRecords.ts';
import { writeSiteFiles } from './writeSiteFiles.ts';

/**
 * Writes all that is published beside the drawn pages into the folder of a built site: data/, the files of each complex, the pages of
 * addresses that are gone, sitemap, robots and feed. `content` is the folder that the database was fitted from.
 * @throws Error where a record was changed since, or a published address has no page
 */
export function writePublication(databaseFile: string, content: string, site: string): void {
  const published = readPublished(databaseFile);
  writeDataFiles(published, join(site, 'data'));
  writeRecords(published, content, site);
  writeSiteFiles(published, site, gonePages(published, site));
}
