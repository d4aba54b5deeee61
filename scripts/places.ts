// Where the commands find and leave things when nothing else is said.

import { createHash } from 'node:crypto';
import { join } from 'node:path';
import { projectFolder } from './publish/pages.ts';

export const places = {
  content: join(projectFolder, 'content'),
  database: join(projectFolder, '.cache', 'collection.sqlite'),
  rebuilt: join(projectFolder, '.cache', 'from-export.sqlite'),
  site: join(projectFolder, 'dist'),
} as const;

/**
 * The cache of readings that belongs to a content folder: one file a folder, so that two collections do not drive each other out.
 * BANDSTEAD_CACHE names another folder for it.
 */
export function cacheFile(content: string): string {
  const folder = process.env['BANDSTEAD_CACHE'] ?? join(projectFolder, '.cache');
  const name = content === places.content ? 'readings' : `readings-${createHash('sha256').update(content).digest('hex').slice(0, 8)}`;
  return join(folder, `${name}.sqlite`);
}
