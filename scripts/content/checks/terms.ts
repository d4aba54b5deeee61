// The terms that bands claim: each is a level of the ion that its band can reach, and no two bands claim one level.

import { degeneratePair, freeIon, levelNames, readLabel, shownLabel } from '#engine';
import type { Geometry, Ion } from '#engine';
import { andList, nearNames, orList } from '../nearest.ts';
import { bandRoles } from '../records/measurement.ts';
import { typedText } from '../report.ts';
import type { Finding, Reporter } from '../report.ts';
import { fittedGeometry, possibleMultiplicities } from '../spin.ts';
import type { ComplexDraft, MeasurementDraft } from './complex.ts';
import { checkComponents } from './components.ts';
import type { Component } from './components.ts';

/** C/B by which parents are told apart where the free-ion set has no C0 for an ion: the middle of fitted values. */
const usualRatio = 4.5;

export interface TermContext {
  readonly ion: Ion;
  readonly geometry: Geometry;
  readonly multiplicity: number | null;
}

/** The levels that a typed label may mean, in letter form, or what is wrong with it. */
export function checkTerm(typed: string, { ion, geometry, multiplicity }: TermContext): { readonly labels: readonly string[] } | Finding {
  if (ion.electrons < 1 || ion.electrons > 9) {
    return { code: 'TERM_UNKNOWN', found: typedText(typed), expected: `no term: ${ion.name} is d${ion.electrons} and has no d-d transition`, mend: 'write CT, ligand, vibration or impurity, or check the ion' };
  }
  const free = freeIon('published', ion);
  const ratio = free === null || free.racahC0 === null ? usualRatio : free.racahC0 / free.racahB0;
  const reading = readLabel(typed, { electrons: ion.electrons, geometry, multiplicity, ratio });
  if (reading.ok) return { labels: reading.labels };
  return { code: reading.code, found: typedText(typed), expected: reading.expected, mend: reading.code === 'TERM_UNREADABLE' ? nearTerm(typed, ion, geometry) ?? reading.mend : reading.mend };
}

function nearTerm(typed: string, ion: Ion, geometry: Geometry): string | null {
  if (/charge.?transfer|lmct|mlct/i.test(typed)) return 'write CT';
  const names = [...bandRoles, ...new Set(levelNames(ion.electrons, geometry).flatMap((name) => [name.slice(1), name]))];
  const exact = names.find((name) => name.toLowerCase() === typed.toLowerCase());
  const near = exact === undefined ? nearNames(typed, names, 2) : [exact];
  return near.length > 0 ? `write ${orList(near)}` : null;
}

/** Multiplicity of a level in letter form. */
const multiplicityOf = (label: string): number => Number(/[1-6]/.exec(label)?.[0]);

/** A dip is where a narrow spin-forbidden line interferes with a broad band; no spin-allowed transition looks like that. */
function dipFinding(typed: string, labels: readonly string[], { ion, multiplicity }: TermContext): Finding | null {
  const ground = multiplicity ?? possibleMultiplicities(ion.electrons)[0]!;
  if (!labels.some((label) => multiplicityOf(label) === ground)) return null;
  return {
    code: 'DIP_TERM', found: `${typedText(typed)} of a dip`, expected: `a spin-forbidden level, of another multiplicity than the ground level's ${ground}: a dip is a narrow line that interferes with a broad band`,
    mend: 'give the level of the narrow line, or write kind: maximum where this is a band of its own',
  };
}

/** Checks the terms of one measurement. Geometries that are not fitted keep whatever label is typed. */
export function checkTerms(complex: ComplexDraft, { bands }: MeasurementDraft, path: readonly (string | number)[], multiplicity: number | null, report: Reporter): void {
  const geometry = fittedGeometry(complex.geometry ?? '');
  const { ion } = complex;
  if (geometry === null || ion === undefined) return;
  const context: TermContext = { ion, geometry, multiplicity };
  const claims = new Map<string, Claim[]>();
  bands?.forEach((band, index) => {
    if (band === undefined || !('position' in band) || band.term === undefined) return;
    const listed = typeof band.term !== 'string';
    const terms = [band.term].flat();
    terms.forEach((term, place) => {
      if (term === undefined || bandRoles.includes(term)) return;
      const at = [...path, 'bands', index, 'term', ...(listed ? [place] : [])];
      const read = checkTerm(term, context);
      const dip = 'labels' in read && band.kind === 'dip' ? dipFinding(term, read.labels, context) : null;
      if (!('labels' in read)) report.at(at, read);
      else if (dip !== null) report.at(at, dip);
      else if (terms.length === 1 && read.labels.length === 1 && band['left-out'] === undefined) {
        const label = read.labels[0]!;
        const degeneracy = band.degeneracy ?? (Object.hasOwn(band, 'degeneracy') ? 'unread' : null);
        claims.set(label, [...(claims.get(label) ?? []), {
          at: [...path, 'bands', index], atTerm: at, typed: term, component: band.kind === 'component', position: band.position?.typed ?? `band ${index + 1}`, degeneracy,
        }]);
      }
    });
  });
  const pair = degeneratePair(ion.electrons, geometry)?.label ?? null;
  for (const [label, claimants] of claims) {
    const components = claimants.every(({ component }) => component);
    // Two levels fall together in the pair; a level has at most three states.
    const most = label === pair ? 2 : components ? 3 : 1;
    if (claimants.length <= most) {
      if (components) checkComponents(claimants, label, context, report);
      continue;
    }
    const last = claimants[most]!;
    report.at(last.atTerm, {
      code: 'TERM_TWICE', found: `${typedText(last.typed)}, claimed by ${andList(claimants.map(({ position }) => position))}`,
      expected: label === pair ? `at most two bands for the pair ${shownLabel(label, ion.electrons)}`
        : components ? `at most three components of one level, ${shownLabel(label, ion.electrons)}`
        : `one band for the level ${shownLabel(label, ion.electrons)}; only components share a term`,
      mend: components || label === pair ? 'give one of them another term, or leave it out with a reason' : 'give one of the two another term, leave one out with a reason, or write kind: component on both',
    });
  }
}

/** One band that claims a level alone, a component or not. */
interface Claim extends Component {
  readonly atTerm: readonly (string | number)[];
  readonly typed: string;
  readonly component: boolean;
}
