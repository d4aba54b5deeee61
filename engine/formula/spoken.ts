import type { Formula, FormulaNode } from './types.ts';

const words = ['zero', 'one', 'two', 'three', 'four', 'five', 'six', 'seven', 'eight', 'nine', 'ten', 'eleven', 'twelve'];

function inWords(count: number): string {
  return words[count] ?? String(count);
}

function sayCharge(charge: number | null): string {
  if (charge === null || charge === 0) return '';
  return `, charge ${inWords(Math.abs(charge))} ${charge > 0 ? 'plus' : 'minus'}`;
}

/** Letters apart, so that "Cl" and "NO" are read as symbols; a symbol of two letters stays one word. */
function letters(nodes: readonly FormulaNode[]): string {
  return nodes.map((node) => {
    if (node.kind === 'mark') return node.text.replace(/[μµ]-/, 'mu').replace(/-$/, '');
    const said = node.kind === 'group' ? letters(node.nodes) : node.symbol;
    if (node.count === 1) return said;
    return node.kind === 'group' ? `${said} ${inWords(node.count)} times` : `${said} ${node.count}`;
  }).join(' ');
}

function sayNode(node: FormulaNode): string {
  if (node.kind === 'group' && node.bracket === '[') {
    const inside = node.nodes.map(sayNode).join(', ');
    return node.count === 1 ? inside : `${inside}, all ${inWords(node.count)} times`;
  }
  return letters([node]);
}

/**
 * A formula as a screen reader should say it: "Cr, N H 3 six times, charge three plus"; "K 3, Cr, C N six times"; simple formulas in one
 * breath, "C 2 O 4, charge two minus".
 */
export function spokenFormula(formula: Formula): string {
  const parts = formula.parts.map(({ multiplier, nodes }, index) => {
    const simple = !nodes.some((node) => node.kind === 'group');
    const said = simple ? letters(nodes) : nodes.map(sayNode).join(', ');
    const many = multiplier === 1 ? '' : `${multiplier === null ? 'n' : inWords(multiplier)} `;
    return index === 0 ? many + said : `with ${many}${said}`;
  });
  return (formula.isomer === null ? '' : `${formula.isomer}, `) + parts.join(', ') + sayCharge(formula.charge);
}
