import { elementSymbols, residueSymbols } from '../formula/elements.ts';

/** The atoms written directly within one pair of brackets, or outside all of them. What stands in inner brackets is a group of its own. */
export interface FormulaGroup {
  /** Atoms by element symbol. */
  readonly atoms: ReadonlyMap<string, number>;
  /** true where an organic abbreviation (Me, Ph, en, bpy) stands among the atoms. */
  readonly organic: boolean;
}

// Words of capitals such as UV and PVC are no formulas; these few are.
const capitalFormulas = new Set(['CO', 'HCN', 'KCN', 'HF', 'KF']);

/** The pieces of a text that may be formulas: hydrate dots, commas and slashes part them like spaces. */
export function formulaWords(text: string): readonly string[] {
  return text.normalize('NFKC').split(/[\s,;·•*/]+|\.(?=\d*[A-Z[(])/).filter((word) => word !== '');
}

/**
 * The groups of one formula, or null where the word is none. Tolerant: charges, counts, prefixes such as cis- and
 * abbreviations of ligands are passed over. It serves to look for hazards, not to check a formula.
 */
export function formulaGroups(word: string): readonly FormulaGroup[] | null {
  const text = word.replace(/^(?:cis|trans|fac|mer|rac)-/, '');
  const groups: FormulaGroup[] = [];
  const open = [startGroup()];
  let rest = text;
  while (rest !== '') {
    const current = open.at(-1);
    if (current === undefined) return null;
    const piece = /^(?:[[({]|[\])}]|\^?\{?\d*[+-]\}?$|[_^]?\{?\d+(?:\.\d+)?\}?|[A-Z][a-z]?|[a-z]{2,})/.exec(rest)?.[0];
    if (piece === undefined) return null;
    rest = rest.slice(piece.length);
    if (/^[[({]$/.test(piece)) open.push(startGroup());
    else if (/^[\])}]$/.test(piece)) groups.push(endGroup(open));
    else if (/^[a-z]/.test(piece)) current.organic = true;
    else if (/^[A-Z]/.test(piece)) {
      const symbol = symbolOf(piece);
      if (symbol === null) {
        // Within brackets an unknown capital stands for a ligand ("L"); elsewhere the word is no formula.
        if (open.length === 1) return null;
        current.organic = true;
        rest = piece.slice(1) + rest;
        continue;
      }
      // The second letter may begin an abbreviation: "Cren" is Cr and en, "Nbpy" is N and bpy.
      rest = piece.slice(symbol.length) + rest;
      const count = /^_?\{?(\d+)\}?(?![+-]$)/.exec(rest)?.[1];
      if (residueSymbols.has(symbol)) current.organic = true;
      else current.atoms.set(symbol, (current.atoms.get(symbol) ?? 0) + Number(count ?? 1));
    }
  }
  if (open.length !== 1) return null;
  groups.push(endGroup(open));
  return groups;
}

/** The groups of every formula in free text. A word without digits and brackets counts only where it holds two elements or more. */
export function formulaGroupsInProse(text: string): readonly FormulaGroup[] {
  return formulaWords(text).flatMap((word) => {
    if (!/[\d[(]/.test(word)) {
      if (/^[A-Z]+$/.test(word) && !capitalFormulas.has(word)) return [];
      const groups = formulaGroups(word);
      return groups?.some(({ atoms }) => atoms.size > 1) === true ? groups : [];
    }
    return formulaGroups(word) ?? [];
  });
}

function symbolOf(piece: string): string | null {
  for (const symbol of [piece, piece.charAt(0)]) if (elementSymbols.has(symbol) || residueSymbols.has(symbol)) return symbol;
  return null;
}

interface OpenGroup {
  readonly atoms: Map<string, number>;
  organic: boolean;
}

function startGroup(): OpenGroup {
  return { atoms: new Map(), organic: false };
}

function endGroup(open: OpenGroup[]): FormulaGroup {
  return open.pop() ?? startGroup();
}
