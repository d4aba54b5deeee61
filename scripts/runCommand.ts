// Runs the body of a command: its answer is the exit code, and a failure becomes one plain message.

import { exitCodes } from './exitCodes.ts';

/** A mistake in how a command was called that only its body can see: an unknown id, a value that is no number. */
export class UsageError extends Error {}

/** Runs a command's body and sets the process's exit code: the body's own, 2 for a UsageError, 3 for any other failure. */
export async function runCommand(name: string, body: () => number | Promise<number>): Promise<void> {
  // A reader that closes early (| head) is no failure.
  process.stdout.on('error', (error: NodeJS.ErrnoException) => {
    if (error.code === 'EPIPE') process.exit(exitCodes.good);
    throw error;
  });
  try {
    process.exitCode = await body();
  } catch (error) {
    const usage = error instanceof UsageError;
    process.stderr.write(usage ? `${error.message}\nSee  npm run ${name} -- --help\n` : `npm run ${name} failed: ${plainReason(error)}\n`);
    process.exitCode = usage ? exitCodes.usage : exitCodes.failed;
  }
}

const reasons: Readonly<Record<string, string>> = {
  ENOSPC: 'the disk is full',
  EFBIG: 'the system does not let the file grow so large',
  EDQUOT: 'the quota of the disk is used up',
  EACCES: 'there is no right to write there',
  EPERM: 'the system does not allow it',
  EROFS: 'the disk can only be read',
  EADDRINUSE: 'the port is in use; choose another with --port',
  ENOTDIR: 'a part of the path is a file, not a folder',
  EEXIST: 'a part of the path is a file, not a folder',
  EISDIR: 'there is a folder where a file should be',
};

function plainReason(error: unknown): string {
  if (!(error instanceof Error)) return String(error);
  const { code, path } = error as NodeJS.ErrnoException;
  const reason = code === undefined ? undefined : reasons[code];
  if (reason === undefined) return error.message;
  return path === undefined ? reason : `${reason}: ${path}`;
}
