/** A run of text in one style, as the engine's typesetting functions return it. */
export interface TextPart {
  readonly text: string;
  readonly style: 'plain' | 'sub' | 'super' | 'italic';
}

/** Text safe inside SVG and HTML elements and double-quoted attributes. */
export function escapeText(text: string): string {
  // Most texts hold none of the four, and a site holds millions of them.
  if (!/[&<>"]/.test(text)) return text;
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');
}

/** A coordinate with at most two decimals, so that files stay small and equal on every machine. */
export function coordinate(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`coordinate must be finite, found ${value}`);
  const rounded = Math.round(value * 100) / 100;
  return String(Object.is(rounded, -0) ? 0 : rounded);
}

const SHIFT = { sub: 0.22, super: -0.36 } as const;

/**
 * Parts as `<tspan>` elements with raised and lowered runs. Each shift is undone by the next run, because
 * `baseline-shift` is not drawn by every browser.
 */
export function spans(parts: readonly TextPart[], fontSize: number): string {
  let level = 0;
  let markup = '';
  for (const part of parts) {
    const wanted = part.style === 'sub' || part.style === 'super' ? SHIFT[part.style] * fontSize : 0;
    const attributes: string[] = [];
    if (Math.abs(wanted - level) > 1e-9) attributes.push(`dy="${coordinate(wanted - level)}"`);
    if (wanted !== 0) attributes.push(`font-size="${coordinate(fontSize * 0.72)}"`);
    if (part.style === 'italic') attributes.push('font-style="italic"');
    const text = escapeText(part.text);
    markup += attributes.length === 0 ? text : `<tspan ${attributes.join(' ')}>${text}</tspan>`;
    level = wanted;
  }
  return markup;
}

/** Width in pixels that the parts take in a book face, near enough to keep labels apart. */
export function textWidth(parts: readonly TextPart[], fontSize: number): number {
  return parts.reduce((sum, { text, style }) => {
    const size = style === 'sub' || style === 'super' ? fontSize * 0.72 : fontSize;
    return sum + [...text].length * size * 0.56;
  }, 0);
}
