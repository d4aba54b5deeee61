import { parseHTML } from 'linkedom';

/** The ink of one run of a text: a capital or figure stands 0.7 of its size above the line, a descender 0.22 below. */
export interface TextBox { readonly text: string; readonly whole: string; readonly owner: number; readonly size: number; readonly left: number; readonly right: number; readonly top: number; readonly bottom: number }

const WIDTH = 0.5;
/** Marks that stand over a letter take no room. */
const letters = (text: string): number => [...text.replaceAll(/[\u0300-\u036f]/g, '')].length;
const number = (element: Element, name: string, fallback: number): number => (element.hasAttribute(name) ? Number(element.getAttribute(name)!.replace('em', '')) * (element.getAttribute(name)!.endsWith('em') ? 12.5 : 1) : fallback);

/** Boxes of every run of every text of a drawing, turned texts too. Widths are those of a book face, 0.5 of the size a letter. */
export function textBoxes(svg: string): readonly TextBox[] {
  const { document } = parseHTML(`<!doctype html><html><body>${svg}</body></html>`);
  return [...document.querySelectorAll('text')].flatMap((text, owner) => {
    const size = number(text, 'font-size', 12.5);
    const runs = [...text.childNodes].map((node) => {
      const element = node.nodeType === 1 ? node as unknown as Element : null;
      return { text: node.textContent ?? '', size: element ? number(element, 'font-size', size) : size, dy: element ? number(element, 'dy', 0) : 0 };
    });
    const total = runs.reduce((sum, run) => sum + letters(run.text) * WIDTH * run.size, 0);
    const anchor = text.getAttribute('text-anchor') ?? text.parentElement?.closest('[text-anchor]')?.getAttribute('text-anchor') ?? 'start';
    let x = number(text, 'x', 0) - (anchor === 'middle' ? total / 2 : anchor === 'end' ? total : 0);
    let y = number(text, 'y', 0);
    return runs.map((run): TextBox => {
      y += run.dy;
      const box = { left: x, right: x + letters(run.text) * WIDTH * run.size, top: y - 0.7 * run.size, bottom: y + (/[gjpqy(),]/.test(run.text) ? 0.22 : 0.02) * run.size };
      x = box.right;
      return { text: run.text, whole: text.textContent ?? '', owner, size: run.size, ...placed(text, box) };
    });
  });
}

/** A box under the shifts of its text and of the groups around it, and the text's own quarter turn. */
function placed(text: Element, box: { left: number; right: number; top: number; bottom: number }): { left: number; right: number; top: number; bottom: number } {
  let result = box;
  for (let element: Element | null = text; element !== null; element = element.parentElement) {
    const transform = element.getAttribute('transform') ?? '';
    if (transform.includes('rotate(-90)')) result = { left: result.top, right: result.bottom, top: -result.right, bottom: -result.left };
    const [, x = '0', y = '0'] = /translate\(([-\d.]+)[ ,]([-\d.]+)\)/.exec(transform) ?? [];
    result = { left: result.left + Number(x), right: result.right + Number(x), top: result.top + Number(y), bottom: result.bottom + Number(y) };
  }
  return result;
}

/** Pairs of texts whose ink would overlap by more than `slack`. */
export function collisions(boxes: readonly TextBox[], slack = 0.3): readonly string[] {
  const found = new Set<string>();
  boxes.forEach((one, index) => {
    for (const other of boxes.slice(index + 1)) {
      if (other.owner === one.owner) continue;
      if (Math.min(one.right, other.right) - Math.max(one.left, other.left) > slack && Math.min(one.bottom, other.bottom) - Math.max(one.top, other.top) > slack) found.add(`${one.whole} on ${other.whole}`);
    }
  });
  return [...found];
}
