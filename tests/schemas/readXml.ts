/** An element of an XML text. */
export interface XmlElement {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly XmlElement[];
  /** Text directly within it, without the spaces around. */
  readonly text: string;
}

const entities: Readonly<Record<string, string>> = { amp: '&', lt: '<', gt: '>', quot: '"', apos: "'" };

/** Reads an XML text without comments, CDATA or doctype. Throws where it is not well formed: a strict reader, for tests. */
export function readXml(text: string): XmlElement {
  const start = /^<\?xml version="1\.0" encoding="UTF-8"\?>\n/.exec(text);
  if (start === null) throw new Error('no XML declaration');
  let at = start[0].length;
  const root = readElement();
  if (text.slice(at).trim() !== '') throw new Error('text behind the root element');
  return root;

  function readElement(): XmlElement {
    const open = /^<([A-Za-z][\w:-]*)((?:\s+[A-Za-z][\w:-]*="[^"<]*")*)\s*(\/?)>/.exec(text.slice(at));
    if (open === null) throw new Error(`no element at "${text.slice(at, at + 40)}"`);
    at += open[0].length;
    const [, name = '', attributeText = '', empty = ''] = open;
    const attributes: Record<string, string> = {};
    for (const [, key = '', value = ''] of attributeText.matchAll(/([\w:-]+)="([^"]*)"/g)) {
      if (key in attributes) throw new Error(`the attribute ${key} twice`);
      attributes[key] = decoded(value);
    }
    const children: XmlElement[] = [];
    let inner = '';
    if (empty === '/') return { name, attributes, children, text: '' };
    for (;;) {
      const next = text.indexOf('<', at);
      if (next < 0) throw new Error(`${name} is not closed`);
      inner += decoded(text.slice(at, next));
      at = next;
      if (!text.startsWith('</', at)) children.push(readElement());
      else {
        if (!text.startsWith(`</${name}>`, at)) throw new Error(`${name} is closed by "${text.slice(at, at + 20)}"`);
        at += name.length + 3;
        return { name, attributes, children, text: inner.trim() };
      }
    }
  }
}

function decoded(text: string): string {
  if (/&(?!(?:amp|lt|gt|quot|apos);)|>/.test(text)) throw new Error(`a bare & or > in "${text}"`);
  return text.replace(/&(\w+);/g, (_, name: string) => entities[name]!);
}
