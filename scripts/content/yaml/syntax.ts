// Puts what the YAML library complains about into words for a person who types records.

import type { YAMLError } from 'yaml';
import type { Place } from '../node.ts';
import type { Finding } from '../report.ts';

/** The finding for an error of the YAML library. `lines` is the text that it read. */
export function syntaxFinding(error: YAMLError, lines: readonly string[], place: Place): Finding {
  const line = (lines[place.line - 1] ?? '').replace(/\r$/, '');
  const before = lines.slice(0, place.line - 1).findLast((text) => text.trim() !== '' && !text.trim().startsWith('#')) ?? '';
  const found = line.trim() === '' ? 'the end of the text before it' : line.trim();
  const deeper = indentOf(line) > indentOf(before) && /:\s+\S/.test(before);
  const say = (expected: string, mend: string): Finding => ({ code: 'YAML_SYNTAX', found, expected, mend });
  switch (error.code) {
    case 'MISSING_CHAR':
      if (/quote/i.test(error.message)) return say('a closing quote at the end of the text', 'add the closing quote; put " around a text that holds an apostrophe');
      if (/Flow/.test(error.message)) return say('a closing } or ] for each opening one', 'close the braces on the line where they were opened');
      if (/Implicit map key/.test(error.message)) return say('a field as  name: value', 'add the colon and a space behind the name, or put a long text in double quotes');
      break;
    case 'BAD_INDENT':
      if (/[[{]/.test(found) || /Flow/.test(error.message)) return say('a closing } or ] for each opening one', 'close the braces on the line where they were opened');
      return say('fields of one record under each other, indented alike by spaces', 'align this line with the field above that it belongs beside');
    case 'BLOCK_AS_IMPLICIT_KEY':
    case 'MULTILINE_IMPLICIT_KEY':
      if (deeper) return say('fields of one record under each other, indented alike by spaces', 'align this line with the field above it');
      return say('one field on a line, as  name: value', 'put a text that holds a colon in double quotes');
    case 'BAD_DQ_ESCAPE':
      return say('no backslash in double quotes but \\" and \\\\', 'write \\\\ for one backslash, or use single quotes');
    case 'UNEXPECTED_TOKEN':
      return say('nothing behind a closed quote or bracket but a comma or a comment', 'put the whole text in double quotes, with \\" for quotes within it');
    default:
      break;
  }
  return say('a line that YAML can read', 'compare it with the lines above; when in doubt put the text in double quotes');
}

function indentOf(line: string): number {
  return line.length - line.replace(/^[ \-]+/, '').length;
}
