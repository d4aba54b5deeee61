// The command line of every command: one table gives what is accepted and what --help prints.

import { isAbsolute, resolve } from 'node:path';
import { parseArgs } from 'node:util';
import { exitCodes } from './exitCodes.ts';

export interface OptionRow {
  /** Name without dashes: "content". */
  readonly name: string;
  /** Placeholder of its value, "DIR"; absent: a switch. */
  readonly value?: string;
  readonly help: string;
}

export interface CommandTable {
  /** As it is typed behind "npm run". */
  readonly name: string;
  /** One or two sentences: what the command does. */
  readonly summary: string;
  /** Values without a name, in their order. */
  readonly values?: readonly { readonly name: string; readonly help: string; readonly optional?: boolean; /** Of the last one: it may be given several times. */ readonly many?: boolean }[];
  readonly options: readonly OptionRow[];
  /** Example lines, without "npm run NAME --". */
  readonly examples?: readonly string[];
}

export interface Arguments {
  /** true where the switch was given. */
  has(name: string): boolean;
  /** The typed value of an option, or null. */
  text(name: string): string | null;
  /** A file or folder, taken from where the user stands; the default from the project's folder. */
  path(name: string, otherwise: string): string;
  readonly values: readonly string[];
}

const helpRow: OptionRow = { name: 'help', help: 'print this text' };

/** Reads the arguments, or says what is wrong with them. Prints nothing. */
export function parseCommandLine(table: CommandTable, typed: readonly string[]): Arguments | { readonly wrong: string } | { readonly help: string } {
  const rows = [...table.options, helpRow];
  const wanted = table.values ?? [];
  let parsed: { values: Record<string, string | boolean | (string | boolean)[] | undefined>; positionals: string[] };
  try {
    parsed = parseArgs({
      args: [...typed],
      options: Object.fromEntries(rows.map((row) => [row.name, { type: row.value === undefined ? 'boolean' : 'string' } as const])),
      allowPositionals: true,
      strict: true,
    });
  } catch (error) {
    return { wrong: plainReason(error, rows) };
  }
  if (parsed.values['help'] === true) return { help: helpText(table) };
  const needed = wanted.filter((value) => value.optional !== true);
  if (parsed.positionals.length < needed.length) return { wrong: `${needed[parsed.positionals.length]!.name} is missing: ${needed[parsed.positionals.length]!.help}` };
  if (parsed.positionals.length > wanted.length && wanted.at(-1)?.many !== true) {
    return { wrong: wanted.length === 0 ? `"${parsed.positionals[0]}" is not understood: options start with two dashes` : `"${parsed.positionals[wanted.length]}" is one value too many` };
  }
  const text = (name: string): string | null => {
    const value = parsed.values[name];
    return typeof value === 'string' ? value : null;
  };
  return {
    has: (name) => parsed.values[name] === true,
    text,
    path: (name, otherwise) => {
      const value = text(name);
      return value === null ? resolve(otherwise) : fromUser(value);
    },
    values: parsed.positionals,
  };
}

/** Reads the arguments of this process; on --help or wrong usage prints the text and ends the process (0 or 2). */
export function readArguments(table: CommandTable, typed: readonly string[] = process.argv.slice(2)): Arguments {
  const result = parseCommandLine(table, typed);
  if ('help' in result) {
    process.stdout.write(result.help);
    process.exit(exitCodes.good);
  }
  if ('wrong' in result) {
    process.stderr.write(`${result.wrong}\nSee  npm run ${table.name} -- --help\n`);
    process.exit(exitCodes.usage);
  }
  return result;
}

/** A path as the user means it: npm runs scripts in the project's folder and names the user's own in INIT_CWD. */
export function fromUser(path: string): string {
  return isAbsolute(path) ? path : resolve(process.env['INIT_CWD'] ?? process.cwd(), path);
}

/** The text of --help, made from the table. */
export function helpText(table: CommandTable): string {
  const values = table.values ?? [];
  const rows = [
    ...values.map((value) => [value.name, value.help] as const),
    ...[...table.options, helpRow].map((row) => [row.value === undefined ? `--${row.name}` : `--${row.name} ${row.value}`, row.help] as const),
  ];
  const width = Math.max(...rows.map(([left]) => left.length));
  const usage = ['npm run', table.name, '--', ...values.flatMap((value) => [value.optional === true ? `[${value.name}]` : value.name, ...(value.many === true ? [`[${value.name} ...]`] : [])]), '[options]'].join(' ');
  const examples = (table.examples ?? []).map((example) => `  npm run ${table.name} -- ${example}`);
  return [
    table.summary, '', `  ${usage}`, '',
    ...rows.map(([left, right]) => `  ${left.padEnd(width)}  ${right}`),
    ...(examples.length > 0 ? ['', 'For example', ...examples] : []),
    '', 'Exit codes: 0 good, 1 faults in the content, 2 wrong usage, 3 failed otherwise.', '',
  ].join('\n');
}

function plainReason(error: unknown, rows: readonly OptionRow[]): string {
  const message = error instanceof Error ? error.message : String(error);
  const unknown = /Unknown option '([^']+)'/.exec(message);
  if (unknown !== null) return `${unknown[1]} is not an option here. There are ${rows.map((row) => `--${row.name}`).join(', ')}.`;
  const missing = /Option '(?:-\w, )?(--[\w/-]+)(?: <value>)?' (argument missing|argument is ambiguous)/.exec(message);
  if (missing !== null) return `${missing[1]} needs a value behind it.`;
  const switchOnly = /Option '(?:-\w, )?(--[\w/-]+)' does not take an argument/.exec(message);
  if (switchOnly !== null) return `${switchOnly[1]} takes no value.`;
  return message.split('\n')[0]!;
}
