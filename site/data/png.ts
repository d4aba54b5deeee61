import { createHash } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { Resvg } from '@resvg/resvg-js';
import { keptBytes } from '../../scripts/keptBytes.ts';

/** Pixels for each unit of a drawing. */
export const PNG_ZOOM = 2;

const FONTS = ['FigureSerif-Regular.ttf', 'FigureSerif-Italic.ttf'].map((name) => resolve(process.cwd(), 'site', 'fonts', name));

let maker: string | null = null;

/** All that the bytes hang on besides the drawing. */
const makerName = (): string => (maker ??= `resvg-js 2.6.2, zoom ${PNG_ZOOM}, ${FONTS.map((file) => createHash('sha256').update(readFileSync(file)).digest('hex')).join(' ')}`);

/**
 * A figure that is kept as a file, as PNG of twice its size with the face of site/fonts, drawn once and kept by its content.
 * @param svg with every colour written out, `keptFigure`
 */
export function pngOf(svg: string): Uint8Array {
  return keptBytes('png', `${makerName()}\n${svg}`, () => new Resvg(svg, {
    fitTo: { mode: 'zoom', value: PNG_ZOOM },
    // The machine's own faces would give other bytes on another machine.
    font: { loadSystemFonts: false, fontFiles: FONTS, defaultFontFamily: 'Figure Serif', serifFamily: 'Figure Serif' },
  }).render().asPng());
}
