import { join } from 'node:path';
import type { Plugin, ViteDevServer } from 'vite';
import type { Address } from './address.ts';
import { misleading, projectFolder, siteSettings } from './pages.ts';

/** The site served live: pages are drawn when they are asked for. */
export interface LiveSite {
  readonly url: string;
  /** Lets every page be drawn anew from the database, and open browsers load again. */
  readonly reload: () => void;
  readonly stop: () => Promise<void>;
}

/** Starts the live site over a database file. Throws where the port cannot be had. */
export async function startLiveSite(databaseFile: string, address: Address, port: number): Promise<LiveSite> {
  // The site's settings travel by the environment, as in a build.
  setEnvironment(siteSettings(databaseFile, address, 'dist'));
  const { dev } = await import('astro');
  let server: ViteDevServer | null = null;
  const keepServer: Plugin = {
    name: 'bandstead-live',
    configureServer: (started) => {
      server = started;
    },
  };
  const site = await dev({ root: projectFolder, logLevel: 'warn', server: { port, host: '127.0.0.1' }, vite: { plugins: [keepServer] } });
  return {
    url: `http://127.0.0.1:${site.address.port}${address.base}`,
    reload: () => {
      if (server !== null) reloadAll(server);
    },
    stop: () => site.stop(),
  };
}

function setEnvironment(settings: Readonly<Record<string, string>>): void {
  for (const name of misleading) delete process.env[name];
  Object.assign(process.env, settings);
}

// The site's own modules keep what they made of the database: forgetting them makes the next page read it anew. The engine and the
// libraries keep nothing of it, and loading them again would take most of the time.
function reloadAll(server: ViteDevServer): void {
  const own = join(projectFolder, 'site');
  for (const environment of Object.values(server.environments)) {
    for (const module of environment.moduleGraph.idToModuleMap.values()) if (module.file?.startsWith(own) !== false) environment.moduleGraph.invalidateModule(module);
    environment.hot.send({ type: 'full-reload', path: '*' });
  }
}
