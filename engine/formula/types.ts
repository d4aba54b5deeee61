/** A piece of typeset text. A page turns "sub" and "super" into real sub- and superscripts. */
export interface TextPart {
  readonly text: string;
  readonly style: 'plain' | 'sub' | 'super' | 'italic';
}

/** A piece of a formula with how many times it stands there. */
export type FormulaNode =
  | { readonly kind: 'element'; readonly symbol: string; readonly count: number }
  /** An organic group with a symbol of its own: Me, Ph. */
  | { readonly kind: 'residue'; readonly symbol: string; readonly count: number }
  /** A ligand by its abbreviation: en, ox. */
  | { readonly kind: 'ligand'; readonly symbol: string; readonly count: number }
  | { readonly kind: 'group'; readonly bracket: '(' | '[' | '{'; readonly nodes: readonly FormulaNode[]; readonly count: number }
  /** A mark that counts nothing, such as the "μ-" of a bridging ligand. */
  | { readonly kind: 'mark'; readonly text: string };

/** One of the compounds that a dot joins: the salt, its water of crystallisation. */
export interface FormulaPart {
  /** How many of it; null where it was typed as n or x. */
  readonly multiplier: number | null;
  readonly nodes: readonly FormulaNode[];
}

export interface Formula {
  /** "cis", "trans", "fac", "mer", ... where one was typed before the formula. */
  readonly isomer: string | null;
  readonly parts: readonly FormulaPart[];
  /** Charge number typed at the end; null: none typed. */
  readonly charge: number | null;
}

/** The closed set of reasons for which a formula is refused. The codes last. */
export type FormulaCode =
  | 'EMPTY' | 'TOO_LONG' | 'UNEXPECTED' | 'UNKNOWN_SYMBOL' | 'BRACKET' | 'COUNT' | 'CHARGE' | 'CHARGE_AMBIGUOUS' | 'NO_CONTENT';

export interface FormulaFault {
  readonly ok: false;
  readonly code: FormulaCode;
  /** Index of the first character at fault in the text as typed. */
  readonly position: number;
  readonly found: string;
  readonly expected: string;
  readonly mend: string;
  /** The whole formula as it should be typed, or null where only the person can know it. */
  readonly corrected: string | null;
}
