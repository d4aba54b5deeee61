import type { TextPart } from './types.ts';

const pattern = /^([a-j])?(\d)(A1|A2|E|T1|T2|[SPDFGHI]'{0,2})([gu])?(\([^()]*\))?$/;
const multiplicities = ['', 'singlet', 'doublet', 'triplet', 'quartet', 'quintet', 'sextet', 'septet'];

interface TermPieces {
  readonly letter: string;
  readonly multiplicity: string;
  readonly irrep: string;
  readonly below: string;
  readonly parent: string;
}

function pieces(label: string): TermPieces | null {
  const found = pattern.exec(label.trim());
  if (!found) return null;
  const [, letter = '', multiplicity = '', name = '', parity = '', parent = ''] = found;
  const irrep = /^[AT]/.test(name) ? name.charAt(0) : name;
  return { letter, multiplicity, irrep, below: name.slice(irrep.length) + parity, parent: parent.slice(1, -1) };
}

/**
 * A term label as typeset pieces: "b4T1g" is an italic b, a high 4, T and a low 1g; a parent follows in brackets; the two names of a
 * pair, "4A1g/4Eg", are set with a comma. Free-ion terms, "4F", and words that are no term are set too.
 */
export function termParts(label: string): readonly TextPart[] {
  return label.split('/').flatMap((one, index): readonly TextPart[] => {
    const term = pieces(one);
    const comma: readonly TextPart[] = index === 0 ? [] : [{ text: ', ', style: 'plain' }];
    if (term === null) return [...comma, { text: one, style: 'plain' }];
    const parts: readonly TextPart[] = [
      ...comma,
      { text: term.letter, style: 'italic' },
      { text: term.multiplicity, style: 'super' },
      { text: term.irrep, style: 'plain' },
      { text: term.below, style: 'sub' },
      { text: term.parent === '' ? '' : `(${term.parent})`, style: 'plain' },
    ];
    return parts.filter((part) => part.text !== '');
  });
}

/** A term label as it is said: "b quartet T 1 g", "quartet T 1 g from P", "quartet A 1 g and quartet E g". */
export function spokenTerm(label: string): string {
  return label.split('/').map((one) => {
    const term = pieces(one);
    if (term === null) return one;
    const multiplicity = multiplicities[Number(term.multiplicity)] ?? `multiplicity ${term.multiplicity}`;
    const said = [term.letter, multiplicity, term.irrep.replace(/'/g, ' prime'), ...term.below].filter((piece) => piece !== '').join(' ');
    return term.parent === '' ? said : `${said} from ${term.parent}`;
  }).join(' and ');
}
