/** One RIS entry: tag, two spaces, hyphen, space, value; CRLF line ends. A tag without a value is left out. */
export function risEntry(type: string, fields: readonly (readonly [tag: string, value: string | null])[]): string {
  const lines = fields.flatMap(([tag, value]) => (value === null ? [] : [`${tag}  - ${value.replace(/\s+/g, ' ')}`]));
  return [`TY  - ${type}`, ...lines, 'ER  - ', ''].join('\r\n');
}
