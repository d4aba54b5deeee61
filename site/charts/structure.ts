import { type Dress, svgElement } from './svg.ts';
import { type TextPart, coordinate as c, spans } from './text.ts';

/** A structural formula laid out: atoms and bonds, places in bond lengths, y down the page. */
export interface StructureDrawn {
  readonly atoms: readonly { readonly symbol: string; readonly x: number; readonly y: number; readonly charge: number; readonly hydrogens: number; readonly mass: number | null }[];
  readonly bonds: readonly { readonly from: number; readonly to: number; readonly order: 0 | 1 | 2 | 3; readonly side: -1 | 0 | 1; readonly wedge: 'up' | 'down' | null }[];
}

interface Point { readonly x: number; readonly y: number }

const BOND = 26;
const SIZE = 14;
const GAP = 3.1;
const CAPITAL = 0.36 * SIZE;

/**
 * A skeletal formula in ink: carbon atoms are corners unless they carry a charge, stand alone, are of a named isotope or stand between two double bonds; hydrogen atoms
 * stand with the others on the side that is free.
 */
export function structureFigure({ atoms, bonds }: StructureDrawn, dress: Dress): string {
  const degree = atoms.map((_, atom) => bonds.filter(({ from, to }) => from === atom || to === atom).length);
  const doubles = (atom: number): number => bonds.filter(({ from, to, order }) => order === 2 && (from === atom || to === atom)).length;
  const lettered = atoms.map(({ symbol, charge, mass }, atom) => symbol !== 'C' || charge !== 0 || mass !== null || degree[atom] === 0 || doubles(atom) === 2);
  const neighbours = (atom: number): Point[] => bonds.flatMap(({ from, to }) => (from === atom ? [atoms[to]!] : to === atom ? [atoms[from]!] : []));
  const labels = atoms.map((atom, index) => (lettered[index] ? atomLabel(atom, neighbours(index)) : null));
  const around = atoms.map(({ x, y }, index) => labels[index]?.box ?? { left: x * BOND, right: x * BOND, top: y * BOND, bottom: y * BOND });
  const [left, top] = [Math.min(...around.map((box) => box.left)) - 4, Math.min(...around.map((box) => box.top)) - 4];
  const [right, bottom] = [Math.max(...around.map((box) => box.right)) + 4, Math.max(...around.map((box) => box.bottom)) + 4];
  const lines = bonds.map((bond) => bondLines(bond, atoms, lettered));
  const path = lines.map(({ path: line }) => line).join('');
  const wedges = lines.map(({ wedge }) => wedge).filter((line) => line !== '').map((line) => `<path class="wedge" d="${line}"/>`).join('');
  const content = `<g transform="translate(${c(-left)} ${c(-top)})">${path === '' ? '' : `<path class="bond" d="${path}"/>`}${wedges}${labels.map((label) => label?.markup ?? '').join('')}</g>`;
  return svgElement(dress, Math.ceil(right - left), Math.ceil(bottom - top), content);
}

interface AtomLabel {
  readonly markup: string;
  readonly box: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number };
}

function atomLabel({ symbol, x, y, charge, hydrogens, mass }: StructureDrawn['atoms'][number], neighbours: readonly Point[]): AtomLabel {
  const [px, py] = [x * BOND, y * BOND];
  const half = CAPITAL + (symbol.length - 1) * 0.26 * SIZE;
  const free = freeSide(x, y, neighbours);
  // Water and the hydrogen halides are written from the left.
  const place = neighbours.length === 0 && /^(?:O|S|F|Cl|Br|I)$/.test(symbol) && hydrogens > 0 ? 'left' : free;
  const core: TextPart[] = [...(mass === null ? [] : [{ text: String(mass), style: 'super' as const }]), { text: symbol, style: 'plain' }];
  const hydrogen: TextPart[] = hydrogens === 0 ? [] : [{ text: 'H', style: 'plain' }, ...(hydrogens > 1 ? [{ text: String(hydrogens), style: 'sub' as const }] : [])];
  const sign: TextPart[] = charge === 0 ? [] : [{ text: `${Math.abs(charge) === 1 ? '' : Math.abs(charge)}${charge > 0 ? '+' : '−'}`, style: 'super' }];
  const reach = hydrogens === 0 ? 0 : 0.78 * SIZE + (hydrogens > 1 ? 0.42 * SIZE : 0);
  const signed = sign.length === 0 ? 0 : 0.55 * SIZE;
  const text = (at: number, baseline: number, anchor: 'start' | 'middle' | 'end', parts: readonly TextPart[]): string =>
    `<text x="${c(at)}" y="${c(baseline)}"${anchor === 'start' ? '' : ` text-anchor="${anchor}"`} font-size="${SIZE}">${spans(parts, SIZE)}</text>`;
  const baseline = py + 0.33 * SIZE;
  const own = { left: px - half - 1, right: px + half, top: py - 0.62 * SIZE, bottom: py + 0.5 * SIZE };
  if (place === 'right') return { markup: text(px - half, baseline, 'start', [...core, ...hydrogen, ...sign]), box: { ...own, right: own.right + reach + signed } };
  // A charge stands on the free side too.
  if (place === 'left') return { markup: text(px + half, baseline, 'end', neighbours.length === 0 ? [...hydrogen, ...core, ...sign] : [...sign, ...hydrogen, ...core]), box: { ...own, left: own.left - reach - signed } };
  // Above or below: the hydrogen there, the charge in the open angle on the other side, or in its stead.
  const up = place === 'above';
  const stacked = hydrogens > 0 ? text(px - half, baseline + (up ? -0.92 : 0.95) * SIZE, 'start', hydrogen) : '';
  const signBelow = up === hydrogens > 0;
  const charged = sign.length === 0 ? '' : text(px, baseline + (signBelow ? 1.15 : -0.42) * SIZE, 'middle', sign);
  return {
    markup: text(px - half, baseline, 'start', core) + stacked + charged,
    box: { ...own, top: own.top - SIZE * Math.max(up && hydrogens > 0 ? 0.92 : 0, charge !== 0 && !signBelow ? 0.6 : 0), bottom: own.bottom + SIZE * Math.max(!up && hydrogens > 0 ? 0.95 : 0, charge !== 0 && signBelow ? 0.6 : 0), right: Math.max(own.right, own.left + reach) },
  };
}

/** Where no bond is: right unless bonds go there, then left; above or below where they go to both sides. */
function freeSide(x: number, y: number, neighbours: readonly Point[]): 'right' | 'left' | 'above' | 'below' {
  const across = neighbours.map((other) => other.x - x);
  const rightward = across.some((dx) => dx > 0.2);
  if (!rightward) return 'right';
  if (!across.some((dx) => dx < -0.2)) return 'left';
  return neighbours.every((other) => other.y > y - 0.1) ? 'above' : neighbours.every((other) => other.y < y + 0.1) ? 'below' : 'right';
}

function bondLines({ from, to, order, side, wedge }: StructureDrawn['bonds'][number], atoms: StructureDrawn['atoms'], lettered: readonly boolean[]): { readonly path: string; readonly wedge: string } {
  const [a, b] = [atoms[from]!, atoms[to]!].map(({ x, y }) => ({ x: x * BOND, y: y * BOND })) as [Point, Point];
  const length = Math.hypot(b.x - a.x, b.y - a.y) || 1;
  const along = { x: (b.x - a.x) / length, y: (b.y - a.y) / length };
  const across = { x: -along.y, y: along.x };
  const clear = (atom: number): number => (lettered[atom] ? SIZE * (0.5 + 0.16 * Math.abs(along.x) + 0.26 * (atoms[atom]!.symbol.length - 1) * Math.abs(along.x)) : 0);
  const [start, end] = [clear(from), length - clear(to)];
  const at = (distance: number, offset: number): string => `${c(a.x + along.x * distance + across.x * offset)} ${c(a.y + along.y * distance + across.y * offset)}`;
  const line = (offset: number, inset = 0): string => `M${at(Math.max(start, inset), offset)}L${at(Math.min(end, length - inset), offset)}`;
  if (wedge === 'up') return { path: '', wedge: `M${at(start, 0)}L${at(end, 3.4)}L${at(end, -3.4)}Z` };
  if (wedge === 'down') {
    const rungs = Array.from({ length: 6 }, (_, rung) => (rung + 1) / 6);
    return { path: rungs.map((share) => `M${at(start + share * (end - start), 3.4 * share)}L${at(start + share * (end - start), -3.4 * share)}`).join(''), wedge: '' };
  }
  if (order === 3) return { path: line(0) + line(GAP) + line(-GAP), wedge: '' };
  if (order === 2) return { path: side === 0 ? line(GAP / 2) + line(-GAP / 2) : line(0) + line(1.15 * GAP * side, 0.14 * BOND), wedge: '' };
  return { path: line(0), wedge: '' };
}
