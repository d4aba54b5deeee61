import { UsageError } from './runCommand.ts';

/** A port number as typed, or the default. Throws UsageError where it is none; 0 lets the system choose. */
export function portOf(typed: string | null, otherwise: number): number {
  if (typed === null) return otherwise;
  if (!/^\d{1,5}$/.test(typed) || Number(typed) > 65535) throw new UsageError(`--port takes a whole number from 0 to 65535, not "${typed}".`);
  return Number(typed);
}
