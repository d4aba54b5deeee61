// Puts what the YAML library complains about into words for a person who types records.

import type { YAMLError } from 'yaml';
import type { Place } from '../node.ts';
import { typedText } from '../report.ts';
import type { Finding } from '../report.ts';

interface SyntaxFault {
  readonly place: Place;
  readonly finding: Finding;
}

/** The fault for an error of the YAML library at a place. `lines` is the text that it read. */
export function syntaxFault(error: YAMLError, lines: readonly string[], place: Place): SyntaxFault {
  const line = lineAt(lines, place.line);
  const say = (expected: string, mend: string): SyntaxFault => ({ place, finding: { code: 'YAML_SYNTAX', found: line.trim() === '' ? 'the end of the text before it' : typedText(line.trim()), expected, mend } });
  switch (error.code) {
    case 'MISSING_CHAR':
      if (/Flow/.test(error.message)) return say(braces.expected, braces.mend);
      if (/Implicit map key/.test(error.message)) return say('a field as  name: value', 'add the colon and a space behind the name, or put a long text in double quotes');
      if (/Sequence item/.test(error.message)) return say(indented, 'align this line with the fields above that it belongs beside');
      break;
    case 'BLOCK_IN_FLOW':
      return say('a comma between the fields inside { }', 'add the missing comma');
    case 'BAD_INDENT':
      return /Flow/.test(error.message) ? say(braces.expected, braces.mend) : say(indented, 'align this line with the field above that it belongs beside');
    case 'BLOCK_AS_IMPLICIT_KEY':
    case 'MULTILINE_IMPLICIT_KEY': {
      const deeper = deeperNeighbour(lines, place.line);
      if (deeper !== null) {
        const column = indentOf(lineAt(lines, deeper)) + 1;
        return { place: { line: deeper, column }, finding: { code: 'YAML_SYNTAX', found: typedText(lineAt(lines, deeper).trim()), expected: indented, mend: 'align this line with the field above it' } };
      }
      return say('one field on a line, as  name: value', 'put a text that holds a colon in double quotes');
    }
    case 'BAD_DQ_ESCAPE':
      return say('no backslash in double quotes but \\" and \\\\', 'write \\\\ for one backslash, or use single quotes');
    case 'UNEXPECTED_TOKEN':
      if (place.column === indentOf(line) + 1) return say(indented, 'align this line with the fields that it belongs beside');
      return say('nothing behind a closed quote or bracket but a comma or a comment', 'put the whole text in double quotes, with \\" for quotes within it');
    default:
      break;
  }
  return say('a line that YAML can read', 'compare it with the lines above; when in doubt put the text in double quotes');
}

/** The finding for a quote that nothing closes, at the place where it was opened. */
export function unclosedQuote(lines: readonly string[], { line }: Place): Finding {
  return { code: 'YAML_SYNTAX', found: typedText(lineAt(lines, line).trim()), expected: 'a closing quote at the end of the text', mend: 'add the closing quote; a text that holds an apostrophe goes in double quotes' };
}

const indented = 'fields of one record under each other, indented alike by spaces';
const braces = { expected: 'a closing } or ] for each opening one', mend: 'close the braces on the line where they were opened' };

function lineAt(lines: readonly string[], number: number): string {
  return (lines[number - 1] ?? '').replace(/\r$/, '');
}

/** Of a line and the next one with text, the one that stands deeper than the field before it; null where none does. */
function deeperNeighbour(lines: readonly string[], number: number): number | null {
  const texts = lines.map((line, index) => ({ line: line.replace(/\r$/, ''), number: index + 1 })).filter(({ line }) => line.trim() !== '' && !line.trim().startsWith('#'));
  const here = texts.findIndex((text) => text.number === number);
  for (const index of [here, here + 1]) {
    const [before, text] = [texts[index - 1], texts[index]];
    if (here >= 0 && before !== undefined && text !== undefined && indentOf(text.line) > indentOf(before.line) && /:\s+\S/.test(before.line)) return text.number;
  }
  return null;
}

function indentOf(line: string): number {
  return line.length - line.replace(/^[ -]+/, '').length;
}
