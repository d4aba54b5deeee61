type Field =
  | readonly [name: string, value: string | null]
  | readonly [name: string, value: readonly string[], kind: 'people' | 'group'];

/** One BibTeX entry; a field without a value is left out. A group's name is kept whole by braces. */
export function bibtexEntry(type: string, key: string, fields: readonly Field[]): string {
  const lines = fields.flatMap((field) => {
    const [name, value] = field;
    if (value === null || (typeof value !== 'string' && value.length === 0)) return [];
    const text = typeof value === 'string' ? bibtexText(value) : value.map((one) => (field[2] === 'group' ? `{${bibtexText(one)}}` : bibtexText(one))).join(' and ');
    // Addresses and DOIs are read as they stand by the packages that print them.
    return [`  ${name} = {${name === 'url' || name === 'doi' ? String(value) : text}}`];
  });
  return `@${type}{${key},\n${lines.join(',\n')}\n}\n`;
}

const escapes: Readonly<Record<string, string>> = {
  '\\': '\\textbackslash{}', '{': '\\{', '}': '\\}', '&': '\\&', '%': '\\%', '$': '\\$', '#': '\\#', '_': '\\_', '~': '\\textasciitilde{}', '^': '\\textasciicircum{}',
};

/** Text with the characters that TeX takes for commands written as such. */
export function bibtexText(text: string): string {
  return text.replace(/[\\{}&%$#_~^]/g, (character) => escapes[character]!).replace(/\s+/g, ' ');
}
