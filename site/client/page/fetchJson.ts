import { url } from '../../url.ts';

/** A data file of this site. @throws Error with the file's name where it cannot be had */
export async function fetchJson<T>(path: string): Promise<T> {
  const answer = await fetch(url(path));
  if (!answer.ok) throw new Error(`${path} answered ${answer.status}`);
  return await answer.json() as T;
}
