import { freeIon } from '#engine';
import type { ComplexRecord } from '../content/types.ts';
import { noCache, openCache } from './cache.ts';
import { readingKey } from './fingerprint.ts';
import type { Basis, FittedComplex } from './fitComplex.ts';
import { fitPool } from './fitPool.ts';

export interface FitOrder {
  readonly basis: Basis;
  /** Hash of the engine's sources. */
  readonly engine: string;
  /** File of the cache of readings; null: none is read or kept. */
  readonly cache: string | null;
  /** About how many complexes will come. */
  readonly expected: number;
  /** Called with how many measurements are done, of how many that came so far. */
  readonly progress: ((done: number, of: number) => void) | undefined;
  /** Gets each complex once it is fitted, in any order, with the keys of its readings. */
  readonly take: (fitted: FittedComplex, keys: readonly string[]) => void;
}

export interface ComplexFits {
  readonly add: (complex: ComplexRecord) => void;
  /** Waits for all. Keeps the readings of these complexes and of `others`, by key, and no more. Returns how many measurements were fitted now. */
  readonly finish: (others: Iterable<string>) => number;
  readonly close: () => void;
}

/** Fits complexes one after the other as they come; measurements that the cache knows are not fitted again. */
export function complexFits({ basis, engine, cache: file, expected, progress, take }: FitOrder): ComplexFits {
  const cache = file === null ? noCache : openCache(file);
  const waiting = new Map<string, readonly string[]>();
  const current = new Set<string>();
  let [came, done, fitted] = [0, 0, 0];
  const pool = fitPool(basis, expected, (one) => {
    const keys = waiting.get(one.id)!;
    waiting.delete(one.id);
    one.fresh.forEach((json, index) => {
      if (json === null) return;
      fitted += 1;
      if (file !== null) cache.put(keys[index]!, json);
    });
    done += one.fresh.length;
    progress?.(done, came);
    take(one, keys);
  });
  return {
    add: (complex) => {
      const keys = file === null ? [] : complex.measurements.map(({ engine: measurement, policy }) => readingKey(measurement, policy, freeIon(policy.freeIons, measurement.ion), engine));
      for (const key of keys) current.add(key);
      waiting.set(complex.id, keys);
      came += complex.measurements.length;
      pool.add({ complex, known: complex.measurements.map((_, index) => (keys[index] === undefined ? null : cache.get(keys[index]))) });
    },
    finish: (others) => {
      pool.finish();
      for (const key of others) current.add(key);
      cache.keepOnly(current);
      return fitted;
    },
    close: () => {
      pool.close();
      cache.close();
    },
  };
}
