// npm run preview: serves the built site on this machine.

import { existsSync } from 'node:fs';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { readArguments } from './arguments.ts';
import type { CommandTable } from './arguments.ts';
import { exportNames } from './export/writeExports.ts';
import { readResults } from './export/results.ts';
import { places } from './places.ts';
import { portOf } from './port.ts';
import { addressOf } from './publish/address.ts';
import { createSiteServer } from './publish/staticServer.ts';
import { runCommand, UsageError } from './runCommand.ts';

const table: CommandTable = {
  name: 'preview',
  summary: 'Serves the built site on this machine, under the base path that it will have in the end, until Ctrl-C.',
  options: [
    { name: 'site', value: 'DIR', help: 'folder of the built site (dist)' },
    { name: 'port', value: 'NUMBER', help: 'port to listen on (4321); 0: any that is free' },
  ],
};

await runCommand(table.name, async () => {
  const given = readArguments(table);
  const folder = given.path('site', places.site);
  const port = portOf(given.text('port'), 4321);
  const database = join(folder, 'data', exportNames.database);
  if (!existsSync(database)) throw new UsageError(`There is no built site in ${folder}. Run "npm run build" first.`);
  const { base } = addressOf(readResults(database).meta['group.url'] ?? 'https://example.org/');
  const server = createSiteServer(folder, base);
  await listen(server, port);
  process.stdout.write(`The site is at http://127.0.0.1:${(server.address() as AddressInfo).port}${base}  (Ctrl-C ends)\n`);
  return new Promise<number>((resolve) => {
    const stop = (): void => {
      server.closeAllConnections();
      server.close(() => resolve(0));
    };
    process.once('SIGINT', stop).once('SIGTERM', stop);
  });
});

function listen(server: Server, port: number): Promise<void> {
  return new Promise((resolve, reject) => {
    server.once('error', reject).listen(port, '127.0.0.1', resolve);
  });
}
