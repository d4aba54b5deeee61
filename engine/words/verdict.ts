import { listed, perCent } from './numbers.ts';
import type { ParameterName, Verdict } from './types.ts';

/** What a verdict sentence needs to know. */
export interface VerdictFacts {
  readonly verdict: Verdict;
  readonly bandsUsed: number;
  readonly spareBands: number;
  readonly chi2: number | null;
  /** Upper-tail probability of chi2; null without a spare band. */
  readonly probability: number | null;
  /** Why no fit stands; null where one does. */
  readonly reason: string | null;
  /** Numbers that rest on an assumed value. */
  readonly resting: readonly ParameterName[];
  /** What they rest on: "C/B = 4.5(9)", "beta = 0.75(12)". */
  readonly assumed: string | null;
}

const bandCount = (n: number): string => (n === 1 ? 'one band' : `${n} bands`);

/** One sentence that says why a reading has its verdict. */
export function verdictSentence(facts: VerdictFacts): string {
  const { verdict, bandsUsed, spareBands } = facts;
  switch (verdict) {
    case 'refused':
      return `Refused: ${facts.reason}.`;
    case 'not determinable':
      return `Not determinable: ${facts.reason}.`;
    case 'strained':
      return `Strained: ${bandCount(bandsUsed)} with ${spareBands} spare disagree by more than readings and model allow (chi-square ${facts.chi2!.toFixed(1)}, probability ${probabilityShown(facts.probability!)}).`;
    case 'assumed':
      return `Assumed: ${listed(facts.resting)} ${facts.resting.length === 1 ? 'moves' : 'move'} with ${facts.assumed} by more than the readings are uncertain.`;
    case 'untested':
      return `Untested: ${bandsUsed === 1 ? 'one band fixes one number' : `${bandsUsed} bands fix as many numbers`} and none is spare, so no test of the reading is possible.`;
    case 'tested':
      return `Tested: ${bandCount(bandsUsed)} with ${spareBands} spare agree (chi-square ${facts.chi2!.toFixed(1)}, probability ${probabilityShown(facts.probability!)}).`;
  }
}

// Below 0.01 a reading is strained: what lies there is cut, not rounded up to a figure that would be no strain.
function probabilityShown(p: number): string {
  if (p < 0.001) return 'below 0.001';
  return p < 0.01 ? (Math.floor(p * 1e4) / 1e4).toFixed(4) : p.toFixed(p < 0.1 ? 3 : 2);
}

/** Why a parameter stays above its ceiling. */
export function aboveCeiling(name: ParameterName, relative: number, ceiling: number): string {
  return `its uncertainty would be ${perCent(relative)}, above the policy's ceiling of ${perCent(ceiling)}; these bands hardly move with ${name}`;
}
