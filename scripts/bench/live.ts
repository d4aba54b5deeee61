import { spawn } from 'node:child_process';
import { once } from 'node:events';
import { readFileSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { setTimeout as wait } from 'node:timers/promises';
import { projectFolder } from '../publish/pages.ts';
import { changeOne } from './scale.ts';
import { median } from './stopwatch.ts';
import type { Measured } from './stopwatch.ts';

/** From the saving of a changed record to its page with the new number in hand, under the development server over a content folder. */
export async function measureLive(folder: string, complexes: number): Promise<Measured[]> {
  const content = join(folder, 'content');
  const words = [join('scripts', 'require-node.mjs'), join('scripts', 'dev.ts'), '--content', content, '--database', join(folder, 'live.sqlite'), '--port', '0'];
  const server = spawn(process.execPath, words, { cwd: projectFolder, env: { ...process.env, BANDSTEAD_CACHE: folder }, stdio: ['ignore', 'pipe', 'inherit'] });
  let said = '';
  server.stdout.setEncoding('utf8').on('data', (text: string) => { said += text; });
  const heard = async (what: RegExp, from = 0): Promise<string> => {
    for (let i = 0; i < 60_000; i += 1) {
      const found = what.exec(said.slice(from));
      if (found !== null) return found[1] ?? '';
      if (server.exitCode !== null) break;
      await wait(5);
    }
    throw new Error(`the development server did not answer:\n${said}`);
  };
  try {
    const address = await heard(/The site is at (http:\S+)/);
    await heard(/Watching (.+)\n/);
    const name = readdirSync(join(content, 'complexes')).sort()[0]!;
    const page = `${address}complexes/${name.replace('.yaml', '')}/`;
    await (await fetch(page)).text();
    const times: number[] = [];
    for (let i = 0; i < 5; i += 1) {
      changeOne(content);
      const position = /position: (\d+)/.exec(readFileSync(join(content, 'complexes', name), 'utf8'))![1]!;
      const [started, before] = [performance.now(), said.length];
      await heard(/fitted now/, before);
      while (!(await (await fetch(page)).text()).includes(position)) await wait(5);
      times.push(performance.now() - started);
    }
    return [{ name: 'changed record on its page', value: median(times) / 1000, unit: 's', over: `the middle of five under npm run dev, ${complexes} complexes: saved, fitted, page drawn` }];
  } finally {
    server.kill('SIGINT');
    if (server.exitCode === null) await once(server, 'exit');
  }
}
