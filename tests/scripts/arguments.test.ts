import { resolve } from 'node:path';
import { afterEach, describe, expect, test, vi } from 'vitest';
import { fromUser, helpText, parseCommandLine } from '../../scripts/arguments.ts';
import type { CommandTable } from '../../scripts/arguments.ts';

const table: CommandTable = {
  name: 'try',
  summary: 'Tries arguments.',
  values: [{ name: 'FILE', help: 'a record' }, { name: 'SECOND', help: 'another', optional: true }],
  options: [{ name: 'content', value: 'DIR', help: 'the folder' }, { name: 'json', help: 'as JSON' }],
  examples: ['a.yaml --json'],
};

afterEach(() => vi.unstubAllEnvs());

function good(...typed: string[]) {
  const result = parseCommandLine(table, typed);
  if ('wrong' in result || 'help' in result) throw new Error(JSON.stringify(result));
  return result;
}

const wrong = (...typed: string[]) => {
  const result = parseCommandLine(table, typed);
  return 'wrong' in result ? result.wrong : null;
};

describe('what is typed is read by the table', () => {
  test('options, switches and values', () => {
    const given = good('a.yaml', '--content', 'x', '--json');
    expect([given.text('content'), given.has('json'), given.has('content'), given.values]).toEqual(['x', true, false, ['a.yaml']]);
    expect([good('a.yaml').text('content'), good('a.yaml').has('json')]).toEqual([null, false]);
  });

  test('a path is taken from where the user stands, a default from the project', () => {
    vi.stubEnv('INIT_CWD', '/desk/records');
    expect(good('a.yaml', '--content', '../ours').path('content', 'content')).toBe('/desk/ours');
    expect(good('a.yaml').path('content', 'content')).toBe(resolve('content'));
    expect(fromUser('/srv/a')).toBe('/srv/a');
  });
});

describe('wrong usage is named', () => {
  test.each([
    [['a', '--contnt', 'x'], /--contnt is not an option here\. There are --content, --json, --help/],
    [['a', '--content'], /--content needs a value/],
    [['a', '--json=1'], /--json takes no value/],
    [[], /FILE is missing: a record/],
    [['a', 'b', 'c'], /"c" is one value too many/],
  ])('%j', (typed, message) => {
    expect(wrong(...typed)).toMatch(message);
  });
});

test('--help wins over everything else and lists every option', () => {
  const result = parseCommandLine(table, ['--help']);
  expect(result).toEqual({ help: helpText(table) });
  for (const text of ['Tries arguments.', 'npm run try -- FILE [SECOND] [options]', '--content DIR  the folder', '--json', '--help', 'npm run try -- a.yaml --json', 'Exit codes']) expect(helpText(table)).toContain(text);
});
