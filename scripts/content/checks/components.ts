// Components of one level: together they hold all its states, or none says how many it holds.

import { degeneratePair, shownLabel } from '#engine';
import type { Reporter } from '../report.ts';
import type { TermContext } from './terms.ts';

/** A component that claims a level alone. */
export interface Component {
  /** Path of the band. */
  readonly at: readonly (string | number)[];
  /** As typed. */
  readonly position: string;
  /** null: none was typed. "unread": one was typed and reported. */
  readonly degeneracy: number | null | 'unread';
}

/** Orbital states of a level in letter form: 1, 2 or 3; the d5 pair holds 3. */
function orbitalStates(label: string, { ion, geometry }: TermContext): number {
  if (label === degeneratePair(ion.electrons, geometry)?.label) return 3;
  return label.includes('T') ? 3 : label.includes('E') ? 2 : 1;
}

/**
 * Components without any degeneracy are legal: their order is not decided, and the engine keeps them out of the fit with a caution.
 * Where one has a degeneracy all have, and the sum is that of the level: without it there is no barycentre.
 */
export function checkComponents(components: readonly Component[], label: string, context: TermContext, report: Reporter): void {
  if (components.some(({ degeneracy }) => degeneracy === 'unread')) return;
  const typed = components.filter((one) => one.degeneracy !== null);
  if (typed.length === 0) return;
  const name = shownLabel(label, context.ion.electrons);
  const orbital = orbitalStates(label, context);
  const sum = typed.reduce((total, { degeneracy }) => total + Number(degeneracy), 0);
  const without = components.filter(({ degeneracy }) => degeneracy === null);
  for (const { at } of without) {
    const rest = without.length === 1 && orbital > sum ? ` ${orbital - sum}` : '';
    report.at([...at, 'degeneracy'], {
      code: 'DEGENERACY_MISSING', found: `no degeneracy, where the component at ${typed[0]!.position} has one`,
      expected: `a degeneracy on each component of ${name}, ${orbital} in all, or on none where their order is not decided`,
      mend: rest === '' ? 'add how many states this one holds, or take the degeneracies out' : `add  degeneracy:${rest}`,
    });
  }
  const withSpin = orbital * Number(/[1-6]/.exec(label)?.[0] ?? 1);
  if (without.length > 0 || sum === orbital || sum === withSpin) return;
  report.at([...typed.at(-1)!.at, 'degeneracy'], {
    code: 'DEGENERACY_SUM', found: typed.length === 1 ? `${sum} state${sum === 1 ? '' : 's'}, and no other component` : `${typed.map(({ degeneracy }) => degeneracy).join(' + ')} = ${sum} states`,
    expected: `${orbital} states of ${name}${withSpin === orbital ? '' : `, or ${withSpin} with its spin`}: without all of them there is no barycentre`,
    mend: sum < orbital ? 'type the missing component, or leave those seen out of the fit: left-out: "the other component was not seen"' : 'correct the degeneracies',
  });
}
