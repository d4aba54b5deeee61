import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { Worker } from 'node:worker_threads';
import type { AstroIntegration, AstroPrerenderer } from 'astro';
import { threadsFor } from '../threads.ts';

/** What a thread needs to draw pages as the page builder itself would. */
export interface ThreadOrder {
  /** URL of the bundled pages. */
  readonly entry: string;
  /** Style sheets by page, as the page builder found them. */
  readonly styles: readonly (readonly [string, unknown])[];
}

export interface PageAsked { readonly number: number; readonly url: string; readonly route: string; readonly component: string }
export interface PageDrawn { readonly number: number; readonly body: Uint8Array; readonly status: number; readonly headers: readonly [string, string][]; readonly failure: string | null }

/** Fewer pages than this of one kind are drawn sooner than a thread has started. */
const worthThreads = 400;
/** Pages that wait at a thread, so that it never stands idle while the main thread draws one of its own. */
const waiting = 3;

/**
 * Draws the pages of records on as many threads as the machine has. The page builder draws on one; here it hands pages of which there
 * are many to threads that have loaded the same bundle, draws the rest itself, and writes every file. The bytes are the same on any number of threads.
 */
export function pageThreads(): AstroIntegration {
  let entry: string | null = null;
  return {
    name: 'bandstead-page-threads',
    hooks: {
      'astro:config:setup': ({ updateConfig }) => {
        updateConfig({ vite: { plugins: [{
          name: 'bandstead-page-entry',
          writeBundle(options, bundle) {
            if (this.environment.name !== 'prerender' || options.dir === undefined) return;
            const name = Object.keys(bundle).find((file) => /^prerender-entry\..*mjs$/.test(file));
            if (name !== undefined) entry = pathToFileURL(join(options.dir, name)).href;
          },
        }] } });
      },
      'astro:build:start': ({ setPrerenderer }) => setPrerenderer((own) => onThreads(own, () => entry)),
    },
  };
}

function onThreads(own: AstroPrerenderer, entry: () => string | null): AstroPrerenderer {
  let threads: PageThread[] = [];
  let many: ReadonlySet<string> = new Set();
  return {
    ...own,
    getStaticPaths: async () => {
      const paths = await own.getStaticPaths();
      const counts = new Map<string, number>();
      for (const { route } of paths) counts.set(route.component, (counts.get(route.component) ?? 0) + 1);
      many = new Set([...counts].filter(([, count]) => threadsFor(count, worthThreads) > 1).map(([component]) => component));
      const order = threadOrder(own, entry());
      if (many.size > 0 && order !== null) threads = Array.from({ length: threadsFor(paths.length, worthThreads) - 1 }, () => new PageThread(order));
      return paths;
    },
    render: (request, options) => {
      const { route, component } = options.routeData;
      const free = many.has(component) ? threads.find((thread) => thread.asked < waiting) : undefined;
      return free === undefined ? own.render(request, options) : free.draw(request.url, route, component);
    },
    teardown: async () => {
      await Promise.all(threads.map((thread) => thread.end()));
      await own.teardown?.();
    },
  };
}

// The page builder's own application carries what it found out about the pages. Where it does not, one thread draws all.
function threadOrder(own: AstroPrerenderer, entry: string | null): ThreadOrder | null {
  const { app } = own as { readonly app?: { readonly getOptions?: () => { readonly allPages: Readonly<Record<string, { readonly key: string; readonly styles: unknown }>> } } };
  const pages = app?.getOptions?.().allPages;
  return entry === null || pages === undefined ? null : { entry, styles: Object.values(pages).map(({ key, styles }) => [key, styles]) };
}

class PageThread {
  readonly #worker: Worker;
  readonly #open = new Map<number, { readonly done: (response: Response) => void; readonly failed: (error: Error) => void }>();
  #count = 0;

  constructor(order: ThreadOrder) {
    this.#worker = new Worker(new URL('./pageWorker.ts', import.meta.url), { workerData: order });
    this.#worker.on('message', ({ number, body, status, headers, failure }: PageDrawn) => {
      const { done, failed } = this.#open.get(number)!;
      this.#open.delete(number);
      if (failure === null) done(new Response(body as Uint8Array<ArrayBuffer>, { status, headers: headers as [string, string][] }));
      else failed(new Error(failure));
    });
    this.#worker.on('error', (error: Error) => {
      for (const { failed } of this.#open.values()) failed(error);
    });
  }

  /** Pages that are not drawn yet. */
  get asked(): number {
    return this.#open.size;
  }

  draw(url: string, route: string, component: string): Promise<Response> {
    this.#count += 1;
    const asked: PageAsked = { number: this.#count, url, route, component };
    return new Promise((done, failed) => {
      this.#open.set(asked.number, { done, failed });
      this.#worker.postMessage(asked);
    });
  }

  async end(): Promise<void> {
    await this.#worker.terminate();
  }
}
