/** Text as it stands in XML. Characters that XML does not allow are left out. */
export function xmlText(text: string): string {
  return text
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '')
    .replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}

/** An element with its attributes and, one a line, what it holds. Line ends within a text become spaces. */
export function element(name: string, attributes: Readonly<Record<string, string>>, content: string | readonly string[] | null): string {
  const open = `${name}${Object.entries(attributes).map(([key, value]) => ` ${key}="${xmlText(value)}"`).join('')}`;
  if (content === null) return `<${open}/>`;
  if (typeof content === 'string') return `<${open}>${xmlText(content.replace(/\s+/g, ' '))}</${name}>`;
  return `<${open}>\n${content.map((line) => line.replace(/^/gm, '  ')).join('\n')}\n</${name}>`;
}

export const xmlStart = '<?xml version="1.0" encoding="UTF-8"?>\n';
