import { readFileSync } from 'node:fs';
import { resolve } from 'node:path';
import { visibleGradient } from '../charts/energyAxis.ts';
import { GRADIENT_ID } from '../charts/strip.ts';
import { drawingSize } from './figure.ts';

// Pages are bundled elsewhere, so the working folder counts.
const [colours, figureStyles] = ['colours.css', 'figures.css'].map((name) => readFileSync(resolve(process.cwd(), 'site', 'styles', name), 'utf8')) as [string, string];

/**
 * A figure as a file to keep: ink on white paper, with the rules that it needs and every colour written out, because most drawing programs
 * know no variables.
 */
export function keptFigure(svg: string): string {
  const { width, height } = drawingSize(svg);
  return standalone(svg, resolved(rulesFor(svg)), `<rect width="${width}" height="${height}" fill="${DAY.get('--paper')}"/>`);
}

/** A figure as a picture for a page: nothing behind it, colours by the reader's theme. */
export function picture(svg: string): string {
  return standalone(svg, `${colours}\n${rulesFor(svg)}`, '');
}

/** The colours and faces by day. */
const DAY: ReadonlyMap<string, string> = new Map([...(/:root \{([^}]*)\}/.exec(colours)?.[1] ?? '').matchAll(/(--[a-z]+):\s*([^;]+);/g)].map(([, name, value]) => [name!, value!]));

const resolved = (rules: string): string => rules.replaceAll(/var\((--[a-z]+)\)/g, (_, name: string) => DAY.get(name)!);

/** Every rule as its selectors and its declarations. Widths that only a page asks for stay there. */
const RULES = [...figureStyles.replaceAll(/\/\*[\s\S]*?\*\//g, '').matchAll(/([^{}]+)\{([^{}]*)\}/g)]
  .map(([, selectors, declarations]) => ({ selectors: selectors!.split(',').map((one) => one.trim()), declarations: declarations!.trim() }))
  .filter(({ selectors, declarations }) => !/^min-width:[^;]*;?$/.test(declarations) && !selectors.every((one) => /^(?:figure|figcaption|\.keys)/.test(one)));

function rulesFor(svg: string): string {
  const worn = new Set([...svg.matchAll(/class="([^"]*)"/g)].flatMap(([, names]) => names!.split(' ')));
  return RULES.flatMap(({ selectors, declarations }) => {
    const used = selectors.filter((selector) => (selector.match(/\.[\w-]+/g) ?? []).every((name) => worn.has(name.slice(1))));
    return used.length === 0 ? [] : [`${used.join(', ')} { ${declarations} }`];
  }).join('\n');
}

function standalone(svg: string, rules: string, ground: string): string {
  const colour = svg.includes(`url(#${GRADIENT_ID})`) ? `<defs>${visibleGradient(GRADIENT_ID)}</defs>` : '';
  const styled = svg.replace('<svg ', '<svg xmlns="http://www.w3.org/2000/svg" ').replace('>', () => `><style>${rules}</style>${colour}${ground}`);
  return `<?xml version="1.0" encoding="UTF-8"?>\n${styled}\n`;
}
