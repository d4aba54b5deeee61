/** Text as it stands in XML. Characters that XML does not allow are left out. */
export function xmlText(text: string): string {
  return text
    // biome-ignore lint/suspicious/noControlCharactersInRegex: these are what is taken out
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '')
    .replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}

/** An element with its attributes and, one a line, what it holds. */
export function element(name: string, attributes: Readonly<Record<string, string>>, content: string | readonly string[] | null): string {
  const open = `${name}${Object.entries(attributes).map(([key, value]) => ` ${key}="${xmlText(value)}"`).join('')}`;
  if (content === null) return `<${open}/>`;
  if (typeof content === 'string') return `<${open}>${xmlText(content)}</${name}>`;
  return `<${open}>\n${content.map((line) => line.replace(/^/gm, '  ')).join('\n')}\n</${name}>`;
}

export const xmlStart = '<?xml version="1.0" encoding="UTF-8"?>\n';
