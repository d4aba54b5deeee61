import { createReadStream, statSync } from 'node:fs';
import { createServer } from 'node:http';
import type { IncomingMessage, Server, ServerResponse } from 'node:http';
import { extname, join, sep } from 'node:path';

const types: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json; charset=utf-8',
  '.csv': 'text/csv; charset=utf-8',
  '.svg': 'image/svg+xml; charset=utf-8',
  '.png': 'image/png',
  '.txt': 'text/plain; charset=utf-8',
  '.xml': 'application/xml; charset=utf-8',
  '.sqlite': 'application/vnd.sqlite3',
};

/** A small server of a folder under a base path ("/bands/"): folder indexes, the site's own page for what is not there, nothing outside the folder. */
export function createSiteServer(folder: string, base: string): Server {
  return createServer((request, response) => answer(folder, base, request, response));
}

function answer(folder: string, base: string, request: IncomingMessage, response: ServerResponse): void {
  if (request.method !== 'GET' && request.method !== 'HEAD') {
    response.writeHead(405, { Allow: 'GET, HEAD' }).end();
    return;
  }
  const path = pathOf(request.url ?? '/');
  if (path === null) {
    response.writeHead(400).end();
    return;
  }
  const query = /\?.*$/.exec(request.url ?? '')?.[0] ?? '';
  if (`${path}/` === base || (path === '/' && base !== '/')) {
    response.writeHead(302, { Location: base + query }).end();
    return;
  }
  const within = path.startsWith(base) ? path.slice(base.length) : null;
  const file = within === null ? null : join(folder, ...within.split('/'));
  const kind = file === null ? null : kindOf(folder, file);
  if (kind === 'folder' && !path.endsWith('/')) {
    // The path is built anew from its decoded parts, so that it cannot name another host.
    response.writeHead(302, { Location: `${base}${(within ?? '').split('/').map(encodeURIComponent).join('/')}/${query}` }).end();
    return;
  }
  const served = kind === 'folder' ? join(file ?? folder, 'index.html') : file;
  if (served !== null && !(kind === 'file' && path.endsWith('/')) && kindOf(folder, served) === 'file') send(request, response, 200, served);
  else sendMissing(folder, request, response);
}

function pathOf(url: string): string | null {
  try {
    const path = decodeURIComponent(url.replace(/[?#].*$/, ''));
    return path.startsWith('/') && !/[\0\\]/.test(path) && !path.split('/').includes('..') ? path : null;
  } catch {
    return null;
  }
}

function kindOf(folder: string, path: string): 'file' | 'folder' | null {
  if (path !== folder && !path.startsWith(folder.endsWith(sep) ? folder : folder + sep)) return null;
  try {
    const found = statSync(path);
    return found.isDirectory() ? 'folder' : found.isFile() ? 'file' : null;
  } catch {
    return null;
  }
}

function sendMissing(folder: string, request: IncomingMessage, response: ServerResponse): void {
  const page = join(folder, '404.html');
  if (kindOf(folder, page) === 'file') send(request, response, 404, page);
  else response.writeHead(404, { 'Content-Type': 'text/plain; charset=utf-8' }).end('There is no such page.\n');
}

function send(request: IncomingMessage, response: ServerResponse, status: number, path: string): void {
  response.writeHead(status, {
    'Content-Type': types[extname(path).toLowerCase()] ?? 'application/octet-stream',
    'Content-Length': statSync(path).size,
    'X-Content-Type-Options': 'nosniff',
    'Cache-Control': 'no-cache',
  });
  if (request.method === 'HEAD') response.end();
  else createReadStream(path).on('error', () => response.destroy()).pipe(response);
}
