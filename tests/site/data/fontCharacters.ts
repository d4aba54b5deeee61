import { readFileSync } from 'node:fs';

/** Code points that a TrueType file draws, from its character map of format 4 (OpenType specification, cmap). */
export function characters(file: string): ReadonlySet<number> {
  const font = readFileSync(file);
  const tables = Array.from({ length: font.readUInt16BE(4) }, (_, index) => 12 + 16 * index);
  const cmap = font.readUInt32BE(tables.find((at) => font.toString('latin1', at, at + 4) === 'cmap')! + 8);
  const found = new Set<number>();
  for (let index = 0; index < font.readUInt16BE(cmap + 2); index++) {
    const table = cmap + font.readUInt32BE(cmap + 4 + 8 * index + 4);
    if (font.readUInt16BE(table) !== 4) continue;
    const segments = font.readUInt16BE(table + 6) / 2;
    for (let segment = 0; segment < segments; segment++) {
      const [end, start, delta] = [14, 16 + 2 * segments, 16 + 4 * segments].map((offset) => font.readUInt16BE(table + offset + 2 * segment)) as [number, number, number];
      const place = table + 16 + 6 * segments + 2 * segment;
      const range = font.readUInt16BE(place);
      for (let code = start; code <= end && code < 0xffff; code++) {
        const glyph = range === 0 ? (code + delta) & 0xffff : font.readUInt16BE(place + range + 2 * (code - start));
        if (glyph !== 0) found.add(code);
      }
    }
  }
  return found;
}
