import { noLimits } from './types.ts';
import type { Limits } from './types.ts';

export interface ColumnComment {
  readonly units: readonly string[];
  readonly limits: Limits;
  readonly meaning: string;
}

/**
 * Reads the comment behind a column: "[cm-1, > 0] position", "[cm-1|1] value", "[>= 1] place", "name as typed".
 * In the brackets a range stands last; what stands before it are UCUM codes.
 */
export function readComment(text: string): ColumnComment {
  const found = /^\[([^\]]+)\]\s+(.*)$/.exec(text.trim());
  if (found === null) return { units: [], limits: noLimits, meaning: text.trim() };
  const parts = found[1]!.split(/,\s*/);
  const limits = readLimits(parts.at(-1)!);
  const units = (limits === null ? parts : parts.slice(0, -1)).flatMap((part) => part.split('|'));
  return { units, limits: limits ?? noLimits, meaning: found[2]! };
}

function readLimits(text: string): Limits | null {
  const between = /^(-?[\d.]+) to (-?[\d.]+)$/.exec(text);
  if (between !== null) return { above: null, least: Number(between[1]), most: Number(between[2]) };
  const from = /^(>=?) (-?[\d.]+)$/.exec(text);
  if (from === null) return null;
  const limit = Number(from[2]);
  return from[1] === '>' ? { above: limit, least: null, most: null } : { above: null, least: limit, most: null };
}
