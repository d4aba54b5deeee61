import { defineConfig } from 'astro/config';
import { pageThreads } from './scripts/publish/pageThreads.ts';

// The build and dev commands set these four; each has a default, so that `astro` also runs by itself.
const { BANDSTEAD_SITE, BANDSTEAD_BASE, BANDSTEAD_OUT } = process.env;
const base = BANDSTEAD_BASE ?? '/';

export default defineConfig({
  srcDir: './site',
  publicDir: './site/public',
  outDir: BANDSTEAD_OUT ?? './dist',
  site: BANDSTEAD_SITE ?? 'https://example.org',
  base,
  output: 'static',
  trailingSlash: 'always',
  // A strict content security policy allows no inline style or script: everything becomes a file.
  build: { format: 'directory', inlineStylesheets: 'never', concurrency: 8 },
  integrations: [pageThreads()],
  // A constant of our own: import.meta.env.BASE_URL gives way to a variable of that name in the user's environment.
  vite: { build: { assetsInlineLimit: 0 }, define: { SITE_BASE: JSON.stringify(base) } },
  devToolbar: { enabled: false },
  prefetch: false,
});
