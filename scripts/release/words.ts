// Changes in sentences: the changes page, the feed, a record's history and the terminal all print these.

import { concise } from '#engine';
import type { ParameterName } from '#engine';
import type { FrozenNumber } from './types.ts';

export function addedWords(id: string): string {
  return `${id} was added.`;
}

export function removedWords(id: string): string {
  return `${id} was taken away.`;
}

export function verdictWords(id: string, before: string, after: string, cause: string): string {
  return `${id}: the verdict went from ${before} to ${after}${because(cause)}`;
}

/** "cr-am6/aq-295: Delta went from 22130(170) to 22150(170) cm⁻¹ (readings)." */
export function numberWords(id: string, parameter: ParameterName, before: FrozenNumber, after: FrozenNumber, cause: string): string {
  const unit = parameter === 'beta' ? '' : ' cm⁻¹';
  const [old, now] = [shown(before), shown(after)];
  if (old === null) return `${id}: ${parameter} was withheld and is now ${now}${unit}${because(cause)}`;
  if (now === null) return `${id}: ${parameter} was ${old}${unit} and is now withheld${because(cause)}`;
  if (old !== now) return `${id}: ${parameter} went from ${old} to ${now}${unit}${because(cause)}`;
  if (before.standing !== after.standing) return `${id}: ${parameter} ${now}${unit} was ${before.standing} and is now ${after.standing}${because(cause)}`;
  return `${id}: ${parameter} ${now}${unit} changed by less than is printed${because(cause)}`;
}

function shown({ value, u_total }: FrozenNumber): string | null {
  return value === null ? null : concise(value, u_total, 'page');
}

function because(cause: string): string {
  return ` (${cause}).`;
}
