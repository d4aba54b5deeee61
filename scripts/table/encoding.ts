// The bytes of a table's file as text.

export const encodings = ['utf-8', 'utf-16', 'windows-1252'] as const;
export type Encoding = (typeof encodings)[number];

/** The encoding that the bytes show: by byte order mark, else UTF-8 where they are that, else the old one of Western spreadsheets. */
export function guessedEncoding(bytes: Uint8Array): Encoding {
  if ((bytes[0] === 0xff && bytes[1] === 0xfe) || (bytes[0] === 0xfe && bytes[1] === 0xff)) return 'utf-16';
  return decoded(bytes, 'utf-8') === null ? 'windows-1252' : 'utf-8';
}

/** The text without its byte order mark, or null where the bytes are not in this encoding. */
export function decoded(bytes: Uint8Array, encoding: Encoding): string | null {
  const name = encoding === 'utf-16' ? (bytes[0] === 0xfe && bytes[1] === 0xff ? 'utf-16be' : 'utf-16le') : encoding;
  try {
    return new TextDecoder(name, { fatal: true, ignoreBOM: false }).decode(bytes);
  } catch {
    return null;
  }
}
