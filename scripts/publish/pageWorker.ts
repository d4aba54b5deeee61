// One of the threads of pageThreads.ts: draws pages from the bundle that the page builder made.

import { parentPort, workerData } from 'node:worker_threads';
import type { PageAsked, PageDrawn, ThreadOrder } from './pageThreads.ts';

/** The part of the bundle's application that is used here. */
interface PageApp {
  readonly manifest: { readonly routes: readonly { readonly routeData: { readonly route: string; readonly component: string } }[] };
  setInternals(internals: unknown): void;
  setOptions(options: unknown): void;
  render(request: Request, options: { readonly routeData: unknown }): Promise<Response>;
}

const { entry, styles } = workerData as ThreadOrder;

async function load(): Promise<PageApp> {
  const { app } = (await import(entry)) as { readonly app: PageApp };
  app.setInternals({ pagesByKeys: new Map(styles.map(([key, sheets]) => [key, { styles: sheets }])), entrySpecifierToBundleMap: new Map() });
  app.setOptions({ settings: { scripts: [] }, logger: { options: { destination: { write: () => true } } } });
  return app;
}

const loading = load();

async function draw({ number, url, route, component }: PageAsked): Promise<PageDrawn> {
  try {
    const app = await loading;
    const found = app.manifest.routes.find(({ routeData }) => routeData.route === route && routeData.component === component);
    if (found === undefined) throw new Error(`the bundle has no page ${route}`);
    const response = await app.render(new Request(url), { routeData: found.routeData });
    return { number, body: new Uint8Array(await response.arrayBuffer()), status: response.status, headers: [...response.headers], failure: null };
  } catch (error) {
    return { number, body: new Uint8Array(), status: 500, headers: [], failure: error instanceof Error ? error.message : String(error) };
  }
}

parentPort!.on('message', async (asked: PageAsked) => {
  const drawn = await draw(asked);
  parentPort!.postMessage(drawn, [drawn.body.buffer as ArrayBuffer]);
});
