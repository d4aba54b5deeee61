import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { refit } from '../../../scripts/database/refit.ts';
import { readPublished } from '../../../scripts/export/published.ts';
import { writeExports } from '../../../scripts/export/writeExports.ts';

/** A content folder fitted and exported, in a temporary place. */
export function exported(content: string) {
  const folder = mkdtempSync(join(tmpdir(), 'bandstead-export-'));
  const database = join(folder, 'a.sqlite');
  const result = refit({ content, database, cache: null });
  if (!result.ok) throw new Error(`the content has faults: ${result.faults.map(({ file, found }) => `${file}: ${found}`).join('; ')}`);
  const data = join(folder, 'data');
  const files = writeExports(database, data);
  const published = readPublished(database);
  return {
    folder, database, data, files, published, ...published,
    read: (name: string): string => readFileSync(join(data, name), 'utf8'),
    json: (name: string): unknown => JSON.parse(readFileSync(join(data, name), 'utf8')),
    remove: () => rmSync(folder, { recursive: true, force: true }),
  };
}
