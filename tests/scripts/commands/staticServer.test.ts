import { mkdirSync, writeFileSync } from 'node:fs';
import { request } from 'node:http';
import type { Server } from 'node:http';
import type { AddressInfo } from 'node:net';
import { join } from 'node:path';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { createSiteServer } from '../../../scripts/publish/staticServer.ts';
import { temporaryFolder } from './sampleContent.ts';

const place = temporaryFolder();
const site = join(place.path, 'site');
let server: Server;

beforeAll(async () => {
  mkdirSync(join(site, 'complexes'), { recursive: true });
  writeFileSync(join(site, 'index.html'), 'home');
  writeFileSync(join(site, '404.html'), 'not here');
  writeFileSync(join(site, 'complexes', 'index.html'), 'list');
  writeFileSync(join(site, 'results.csv'), 'a,b');
  writeFileSync(join(place.path, 'secret.txt'), 'secret');
  mkdirSync(join(place.path, 'site-beside'));
  writeFileSync(join(place.path, 'site-beside', 'secret.txt'), 'secret');
  server = createSiteServer(site, '/group/');
  await new Promise<void>((resolve) => {
    server.listen(0, '127.0.0.1', resolve);
  });
});
afterAll(() => {
  server.close();
  place.remove();
});

function ask(path: string, method = 'GET'): Promise<{ status: number; location: string | undefined; type: string | undefined; body: string }> {
  return new Promise((resolve, reject) => {
    request({ port: (server.address() as AddressInfo).port, host: '127.0.0.1', path, method }, (response) => {
      let body = '';
      response.setEncoding('utf8').on('data', (text: string) => { body += text; });
      response.on('end', () => resolve({ status: response.statusCode ?? 0, location: response.headers.location, type: response.headers['content-type'], body }));
    }).on('error', reject).end();
  });
}

describe('the preview', () => {
  it('serves folder indexes and files under the base path', async () => {
    expect(await ask('/group/')).toMatchObject({ status: 200, body: 'home', type: 'text/html; charset=utf-8' });
    expect(await ask('/group/complexes/')).toMatchObject({ status: 200, body: 'list' });
    expect(await ask('/group/results.csv')).toMatchObject({ status: 200, body: 'a,b', type: 'text/csv; charset=utf-8' });
    expect(await ask('/group/complexes/?q=Cr')).toMatchObject({ status: 200, body: 'list' });
  });

  it('leads to the base path and to the closing slash, keeping the query', async () => {
    expect(await ask('/')).toMatchObject({ status: 302, location: '/group/' });
    expect(await ask('/group?q=1')).toMatchObject({ status: 302, location: '/group/?q=1' });
    expect(await ask('/group/complexes?q=1')).toMatchObject({ status: 302, location: '/group/complexes/?q=1' });
  });

  it('answers what is not there with the site\'s own page', async () => {
    for (const path of ['/group/nothing', '/group/results.csv/', '/group/nothing/', '/other', '/complexes/']) {
      expect(await ask(path)).toMatchObject({ status: 404, body: 'not here' });
    }
  });

  it('gives nothing from outside the folder', async () => {
    for (const path of ['/group/../secret.txt', '/group/..%2fsecret.txt', '/group/%2e%2e/secret.txt', '/group/..\\secret.txt', '/group/%00', '/group/%ff', '/group/../site-beside/secret.txt', '//secret.txt', `/group/${'a'.repeat(3000)}`]) {
      const answer = await ask(path);
      expect([path.slice(0, 40), answer.status]).toEqual([path.slice(0, 40), expect.toSatisfy((status: number) => status === 400 || status === 404)]);
      expect(answer.body).not.toContain('secret');
    }
  });

  it('never leads to another host', async () => {
    expect((await ask('/group//example.org')).location).toBeUndefined();
    expect((await ask('//example.org/..')).location).toBeUndefined();
  });

  it('sends no body for HEAD and takes no other method', async () => {
    expect(await ask('/group/', 'HEAD')).toMatchObject({ status: 200, body: '' });
    expect(await ask('/group/', 'POST')).toMatchObject({ status: 405 });
  });
});
