// Text as YAML takes it without changing it.

/** Safe without quotes anywhere: a letter, digit or bracket first, no mark that YAML or a person could read as something else. */
const plain = /^[\p{L}\p{N}(](?:[\p{L}\p{N} ()./+\-%°±=_;]*[\p{L}\p{N}()./+\-%°±=_;])?$/u;

const escapes: Readonly<Record<string, string>> = { '"': '\\"', '\\': '\\\\', '\n': '\\n', '\t': '\\t', '\r': '\\r' };

/** Characters that end a line, hide themselves or are forbidden in a YAML file. */
const unseen = /["\\\u0000-\u001f\u007f-\u00a0\u2000-\u200f\u2028-\u202f\u205f-\u2064\u3000\ufeff]/g;

/** Text in double quotes, on one line; what cannot be seen is written by its number. */
export function quotedText(text: string): string {
  const escaped = text.replace(unseen, (letter) => escapes[letter] ?? `\\u${letter.charCodeAt(0).toString(16).padStart(4, '0')}`);
  return `"${escaped}"`;
}

/** Text without quotes where nothing in it could be misread, else in double quotes. Fits on a line of its own and inside braces. */
export function typedText(text: string): string {
  return plain.test(text) ? text : quotedText(text);
}
