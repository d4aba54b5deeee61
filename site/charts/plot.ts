import * as Plot from '@observablehq/plot';
import { parseHTML } from 'linkedom';
import { type Dress, svgElement } from './svg.ts';

/** A Plot drawing with its scales, before it is dressed for the page. */
export interface Drawing {
  readonly svg: SVGSVGElement;
  readonly x: (value: number) => number;
  readonly y: (value: number | string) => number;
}

/** An empty page to draw in; Plot asks for a whole document. */
export function newDocument(): Document {
  return parseHTML('<!doctype html><html><body></body></html>').document as unknown as Document;
}

/** Draws with Plot and hands back the drawing and its scales. @throws Error where Plot warns or has no linear x and y */
export function drawPlot(document: Document, options: Plot.PlotOptions): Drawing {
  const svg = Plot.plot({ ...options, document }) as SVGSVGElement & Plot.Plot;
  const x = svg.scale('x');
  const y = svg.scale('y');
  if (!x || !y) throw new Error('a figure needs both an x and a y scale');
  return { svg, x: x.apply.bind(x), y: y.apply.bind(y) };
}

/**
 * The drawing as an SVG string for the page: no style element or attributes of Plot's own (the content security policy
 * blocks them), a name and a description for those who do not see it, and coordinates of two decimals, so that the bytes
 * do not hang on the machine.
 */
export function dressed({ svg }: Drawing, dress: Dress): string {
  const [, , width = '', height = ''] = (svg.getAttribute('viewBox') ?? '').split(' ');
  svg.querySelector('style')?.remove();
  for (const element of svg.querySelectorAll('[aria-label], [aria-hidden], [style]')) {
    for (const attribute of ['aria-label', 'aria-hidden', 'style']) element.removeAttribute(attribute);
  }
  const inner = svg.innerHTML.replace(/\d+\.\d{3,}/g, (digits) => String(Math.round(Number(digits) * 100) / 100));
  return svgElement(dress, Number(width), Number(height), `${dress.under ?? ''}<g class="plot" font-size="12.5" text-anchor="middle" fill="currentColor">${inner}</g>${dress.over ?? ''}`);
}
