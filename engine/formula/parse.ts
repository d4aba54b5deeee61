import { elementSymbols, isMetal } from './elements.ts';
import { type Token, tokenise } from './tokens.ts';
import type { Formula, FormulaCode, FormulaFault, FormulaNode, FormulaPart } from './types.ts';

export interface FormulaOptions {
  /** Ligand abbreviations of the collection; needed for those in capitals or with digits, "DMSO". */
  readonly abbreviations?: readonly string[];
}

const longest = 200;
const deepest = 20;

/** Carries a fault out of the recursion; never leaves this file. */
class Stop {
  readonly fault: FormulaFault;
  constructor(fault: FormulaFault) {
    this.fault = fault;
  }
}

const pairs: Readonly<Record<string, string>> = { '(': ')', '[': ']', '{': '}' };
const anything = 'a formula such as [Cr(NH3)6]3+ or [CrCl2(en)2]+';

function read(text: string, tokens: readonly Token[]): Formula {
  let next = 0;

  const peek = (ahead = 0): Token | undefined => tokens[next + ahead];

  function stop(code: FormulaCode, token: Token | undefined, expected: string, mend: string, corrected: string | null = null): never {
    const found = token === undefined ? 'the end' : text.slice(token.at, token.end);
    throw new Stop({ ok: false, code, position: token?.at ?? text.length, found, expected, mend, corrected });
  }

  const skipSpaces = (): void => {
    while (peek()?.kind === 'space') next += 1;
  };

  const spliced = (at: number, insert: string): string => text.slice(0, at) + insert + text.slice(at);

  /** true where digits and a sign in plain type end the formula as its charge: "]3+", "Cr3+". Stops where they can be read in two ways. */
  function startsCharge(before: FormulaNode, alone: boolean): boolean {
    const digits = peek();
    if (digits?.kind !== 'digits' || peek(1)?.kind !== 'sign') return false;
    if (digits.text.length > 1) {
      const at = digits.end - 1;
      stop('CHARGE_AMBIGUOUS', digits, 'a count and a charge that can be told apart', `write ${spliced(at, '^')}`, spliced(at, '^'));
    }
    if (before.kind === 'group' && before.bracket === '[') return true;
    if (before.kind !== 'element' || !alone) return false;
    if (isMetal(before.symbol)) return true;
    const sign = peek(1)?.text ?? '';
    const symbol = before.symbol;
    return stop('CHARGE_AMBIGUOUS', digits, 'a count and a charge that can be told apart', `write ${symbol}${digits.text}^${sign} or ${symbol}^${digits.text}${sign}`);
  }

  function count(before: FormulaNode, alone: boolean): number {
    const token = peek();
    if (token === undefined || (token.kind !== 'digits' && token.kind !== 'low') || startsCharge(before, alone)) return 1;
    next += 1;
    const value = Number(token.text);
    if (!(value >= 1 && value <= 999) || token.text.startsWith('0')) stop('COUNT', token, 'a count from 1 to 999', 'write how many there are, without zeros before the number');
    return value;
  }

  function group(open: Token, depth: number): FormulaNode {
    if (depth > deepest) stop('BRACKET', open, `at most ${deepest} brackets within each other`, 'take out brackets');
    const nodes = series(depth + 1);
    const close = peek();
    const wanted = pairs[open.text] ?? '';
    if (close?.text !== wanted) {
      if (close === undefined) stop('BRACKET', undefined, `"${wanted}" for the "${open.text}" at character ${open.at + 1}`, `close the bracket with ${wanted}`);
      stop('BRACKET', close, `"${wanted}" for the "${open.text}" at character ${open.at + 1}`, `close the bracket with ${wanted}`);
    }
    if (nodes.length === 0) stop('NO_CONTENT', close, 'something between the brackets', 'write the ligand between the brackets, or take them out');
    next += 1;
    return { kind: 'group', bracket: open.text as '(' | '[' | '{', nodes, count: 1 };
  }

  function unknown(token: Token): never {
    if (/^[A-Z]/.test(token.text)) {
      // "CR" for Cr: the letter before and this one make a symbol together.
      const joined = text.charAt(token.at - 1) + token.text.toLowerCase();
      const corrected = elementSymbols.has(joined) ? text.slice(0, token.at) + token.text.toLowerCase() + text.slice(token.end) : null;
      const mend = corrected === null ? "write an element symbol, or give the abbreviation in the ligand's record" : `write ${corrected}`;
      stop('UNKNOWN_SYMBOL', token, 'an element symbol, or an abbreviation that a ligand record gives', mend, corrected);
    }
    return stop('UNEXPECTED', token, anything, 'take this character out');
  }

  function node(token: Token, depth: number): FormulaNode {
    next += 1;
    if (token.kind === 'element' || token.kind === 'residue') return { kind: token.kind, symbol: token.text, count: 1 };
    if (token.kind === 'mark') return { kind: 'mark', text: token.text };
    if (token.kind === 'open') return group(token, depth);
    const capital = token.text.charAt(0).toUpperCase() + token.text.slice(1);
    const before = tokens[next - 2];
    if (elementSymbols.has(capital) && (before === undefined || before.text === '[')) {
      const corrected = text.slice(0, token.at) + capital + text.slice(token.end);
      stop('UNKNOWN_SYMBOL', token, 'an element symbol, which begins with a capital', `write ${corrected}`, corrected);
    }
    return { kind: 'ligand', symbol: token.text, count: 1 };
  }

  function series(depth: number): readonly FormulaNode[] {
    const nodes: FormulaNode[] = [];
    for (;;) {
      if (depth > 0) skipSpaces();
      const token = peek();
      if (token === undefined) return nodes;
      if (token.kind === 'unknown') unknown(token);
      if (!['element', 'residue', 'ligand', 'mark', 'open'].includes(token.kind)) return nodes;
      const one = node(token, depth);
      const alone = depth === 0 && nodes.length === 0;
      nodes.push(one.kind === 'mark' ? one : { ...one, count: count(one, alone) });
      // A space between pieces is harmless; one before a charge or a dot is left for the caller.
      if (depth === 0 && peek()?.kind === 'space' && ['element', 'residue', 'ligand', 'open'].includes(peek(1)?.kind ?? '')) next += 1;
    }
  }

  function part(): FormulaPart {
    skipSpaces();
    let multiplier: number | null = 1;
    const lead = peek();
    if (lead?.kind === 'multiplier') {
      next += 1;
      multiplier = /[nx]/.test(lead.text) ? null : lead.text === '½' ? 0.5 : Number(lead.text);
      if (multiplier === 0) stop('COUNT', lead, 'a number above 0', 'write how many there are');
      skipSpaces();
    }
    const nodes = series(0);
    const token = peek();
    if (token?.kind === 'close') stop('BRACKET', token, `no "${token.text}" without a bracket that it closes`, 'take this bracket out or open it before');
    if (!nodes.some((one) => one.kind !== 'mark')) stop(token === undefined ? 'NO_CONTENT' : 'UNEXPECTED', token, 'an element, a ligand or a bracket', 'write the formula from its first element or bracket on');
    return { multiplier, nodes };
  }

  function charge(): number | null {
    skipSpaces();
    const first = peek();
    if (first === undefined) return null;
    if (!['charge', 'sign', 'digits'].includes(first.kind)) return stop('UNEXPECTED', first, 'the charge or the end of the formula', 'take out what stands here');
    next += 1;
    let typed = first.text;
    if (first.kind === 'digits') {
      const sign = peek();
      if (sign?.kind !== 'sign') stop('CHARGE', first, 'a charge with its sign, such as 3+', 'write the sign behind the number');
      typed += sign.text;
      next += 1;
    }
    skipSpaces();
    const extra = peek();
    if (extra !== undefined) {
      const doubled = /^[+-]*$/.test(text.slice(first.at).replace(/[−–]/g, '-')) ? text.slice(first.at).length : Number(/^[+−–-](\d)$/.exec(text.slice(first.at))?.[1] ?? 0);
      const corrected = doubled > 0 && first.kind === 'sign' ? `${text.slice(0, first.at)}${text.charAt(first.at - 1) === ']' ? '' : '^'}${doubled}${first.text}` : null;
      stop('CHARGE', extra, 'nothing behind the charge', corrected ? `write ${corrected}` : 'write the charge once, at the end: 3+', corrected);
    }
    const size = typed.replace(/[+-]/, '');
    const value = size === '' ? 1 : Number(size);
    if (value > 20 || (value === 0 && typed !== '0')) stop('CHARGE', first, 'a charge from 1 to 20 with its sign', 'write the charge such as 3+, or nothing where there is none');
    return typed.endsWith('-') ? -value : value;
  }

  skipSpaces();
  const lead = peek();
  if (lead?.kind === 'isomer') next += 1;
  const parts = [part()];
  for (;;) {
    const spaces = peek()?.kind === 'space' ? 1 : 0;
    if (peek(spaces)?.kind !== 'dot') break;
    next += spaces + 1;
    parts.push(part());
  }
  const typedCharge = charge();
  const [only, ...more] = parts[0]?.nodes ?? [];
  if (typedCharge === null && parts.length === 1 && more.length === 0 && only?.kind === 'group' && only.bracket === '[' && only.count > 1) {
    stop('CHARGE', undefined, `a sign behind the ${only.count}: a lone entity is not counted`, `write ${text}+ or ${text}-`);
  }
  return { isomer: lead?.kind === 'isomer' ? lead.text : null, parts, charge: typedCharge };
}

/**
 * Reads a chemical formula with the charge at its end: `[Cr(NH3)6]3+`, `cis-[CrCl2(en)2]+`, `[Cr(en)₃]³⁺`, `[Cr(en)_3]^{3+}`, `C2O4 2-`, `NH4+`,
 * `K3[Cr(CN)6]`, `[Ni(H2O)6](ClO4)2.6H2O`. Words in small letters are ligand abbreviations. Digits and a sign behind "]" or behind a lone
 * metal are the charge; where digits could be count or charge (`C2O42-`, `N3-`) the formula is refused and both spellings are shown.
 * @returns the formula as a tree, or a fault with its place; never throws.
 * Not checked: whether the charge fits, whether abbreviations are known.
 */
export function parseFormula(text: string, options: FormulaOptions = {}): { readonly ok: true; readonly formula: Formula } | FormulaFault {
  if (text.trim() === '') return { ok: false, code: 'EMPTY', position: 0, found: '', expected: anything, mend: 'write the formula', corrected: null };
  if (text.length > longest) {
    return { ok: false, code: 'TOO_LONG', position: longest, found: `${text.length} characters`, expected: `at most ${longest} characters`, mend: 'write a shorter formula, with abbreviations of the ligands', corrected: null };
  }
  try {
    return { ok: true, formula: read(text.trim(), tokenise(text.trim(), new Set(options.abbreviations))) };
  } catch (error) {
    // Places were counted behind the spaces at the start.
    if (error instanceof Stop) return { ...error.fault, position: error.fault.position + text.length - text.trimStart().length };
    throw error;
  }
}
