// The declared fitting choices: their defaults, and the id that is printed with every result.

import type { Policy } from './types.ts';

/**
 * The policy that holds where a group declares nothing. Energies in cm-1, ceilings as fractions.
 * C/B 4.5(9): fitted values scatter from 3.2 to 6.4 (computed for this project). Floors: a cubic model with one B misses
 * real bands by more than they can be read, most of all two-electron bands (computed; see the methods page).
 */
export const defaultPolicy: Policy = {
  name: 'default',
  cOverB: { general: { value: 4.5, u: 0.9 }, perIon: {} },
  floors: { general: 150, spinFlip: 250, twoElectron: 600 },
  ceilings: { delta: 0.1, racahB: 0.15, racahC: 0.15 },
  differentialFloor: { delta: 50, racahB: 0.015 },
  freeIons: 'published',
  cFitted: true,
  rivalMargin: 4,
  defaultUncertainties: { maximum: 80, line: 15 },
};

/**
 * The policy's id: its name, a hyphen and eight hexadecimal digits of its content ("house-2026-1f00c3aa").
 * Two policies of one content have one id whatever the order in which their values were written.
 * The name is not part of the digits, so that a renamed policy shows the same digits.
 */
export function policyId(policy: Policy): string {
  let id = known.get(policy);
  if (id === undefined) {
    const { name, ...content } = policy;
    id = `${name}-${fnv1a(stableText(content)).toString(16).padStart(8, '0')}`;
    known.set(policy, id);
  }
  return id;
}

/** Policies are never changed in place, and every reading names the same one or two. */
const known = new WeakMap<Policy, string>();

/** JSON with the keys of every object in code-unit order. */
function stableText(value: unknown): string {
  if (typeof value !== 'object' || value === null) return JSON.stringify(value);
  if (Array.isArray(value)) return `[${value.map(stableText).join(',')}]`;
  const entries = Object.entries(value).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return `{${entries.map(([key, item]) => `${JSON.stringify(key)}:${stableText(item)}`).join(',')}}`;
}

/** FNV-1a over UTF-16 code units, 32 bits (Fowler, Noll and Vo; the offset basis and prime of the published algorithm). */
function fnv1a(text: string): number {
  let hash = 0x811c9dc5;
  for (let index = 0; index < text.length; index += 1) {
    hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193);
  }
  return hash >>> 0;
}
