import { isMetal } from './elements.ts';
import type { Formula, FormulaNode, FormulaPart, TextPart } from './types.ts';

const closing: Readonly<Record<string, string>> = { '(': ')', '[': ']', '{': '}' };
const minus = '\u2212';

function counted(parts: readonly TextPart[], count: number): readonly TextPart[] {
  return count === 1 ? parts : [...parts, { text: String(count), style: 'sub' }];
}

function nodeParts(node: FormulaNode): readonly TextPart[] {
  if (node.kind === 'mark') return [{ text: node.text, style: 'plain' }];
  if (node.kind !== 'group') return counted([{ text: node.symbol, style: 'plain' }], node.count);
  const inside = node.nodes.flatMap(nodeParts);
  return counted([{ text: node.bracket, style: 'plain' }, ...inside, { text: closing[node.bracket] ?? '', style: 'plain' }], node.count);
}

function multiplierText(multiplier: number | null): string {
  return multiplier === null ? 'n' : multiplier === 1 ? '' : String(multiplier);
}

function joined(parts: readonly TextPart[]): readonly TextPart[] {
  const merged: TextPart[] = [];
  for (const part of parts) {
    const last = merged.at(-1);
    if (last && last.style === part.style) merged[merged.length - 1] = { ...last, text: last.text + part.text };
    else if (part.text !== '') merged.push(part);
  }
  return merged;
}

function chargeText(charge: number, sign: string): string {
  const size = Math.abs(charge);
  return (size === 1 ? '' : String(size)) + (charge > 0 ? '+' : sign);
}

/** A charge as a superscript prints it: "3+", "2−", "+"; "" for none or zero. */
export function chargeShown(charge: number | null): string {
  return charge === null || charge === 0 ? '' : chargeText(charge, minus);
}

/** A formula as typeset pieces: counts low, the charge high with a real minus sign, cis and trans in italics. */
export function formulaParts(formula: Formula): readonly TextPart[] {
  const parts: TextPart[] = [];
  if (formula.isomer !== null) parts.push({ text: formula.isomer, style: 'italic' }, { text: '-', style: 'plain' });
  formula.parts.forEach((part, index) => {
    parts.push({ text: (index > 0 ? '·' : '') + multiplierText(part.multiplier), style: 'plain' }, ...part.nodes.flatMap(nodeParts));
  });
  parts.push({ text: chargeShown(formula.charge), style: 'super' });
  return joined(parts.filter((part) => part.text !== ''));
}

function plainPart(part: FormulaPart): string {
  return multiplierText(part.multiplier) + part.nodes.flatMap(nodeParts).map(({ text }) => text).join('');
}

/**
 * A formula as plain text for the clipboard and for files, "[Cr(NH3)6]3+", "[Ni(H2O)6](ClO4)2·6H2O", "C2O4 2-". Plain digits and
 * "-" only; a space stands before the charge where its digit could be taken for a count. `parseFormula` reads it back alike.
 */
export function plainFormula(formula: Formula): string {
  const body = (formula.isomer === null ? '' : `${formula.isomer}-`) + formula.parts.map(plainPart).join('·');
  const { charge } = formula;
  if (charge === null) return body;
  if (charge === 0) return `${body}^0`;
  const nodes = formula.parts.at(-1)?.nodes ?? [];
  const [last] = nodes.slice(-1);
  const alone = nodes.length === 1 && last?.kind === 'element' && last.count === 1;
  const glued = (last?.kind === 'group' && last.bracket === '[' && last.count === 1)
    || (alone && isMetal(last.symbol))
    || (Math.abs(charge) === 1 && last?.kind !== 'mark' && (last?.count === 1 || (nodes.length > 1 && (last?.count ?? 10) < 10 && last?.kind !== 'group')));
  return `${body}${glued ? '' : ' '}${chargeText(charge, '-')}`;
}
