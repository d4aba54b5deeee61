import type { Fault } from '../content/types.ts';
import { exitCodes } from '../exitCodes.ts';
import { faultReport, folderName } from './faults.ts';

/** Says that faults in the content stopped a command and what was left as it was; returns the exit code for that. */
export function stoppedByFaults(faults: readonly Fault[], content: string, left: string, json: boolean): number {
  if (json) process.stdout.write(`${JSON.stringify({ ok: false, faults })}\n`);
  else process.stderr.write(`${faultReport(faults, folderName(content))}${left}\n`);
  return exitCodes.faults;
}
