import { listed } from './numbers.ts';

/** What is not the same between two complexes that lie near one another. */
export const whatDiffers = {
  ion: (ion: string): string => `another ion: ${ion}`,
  ligands: 'other ligands',
  isomer: (isomer: string): string => (isomer === 'none' ? 'no isomer is named' : `another isomer: ${isomer}`),
  phase: (phase: string): string => `another phase: ${phase}`,
  transitions: 'read from other transitions',
} as const;

/** Why no nearest complexes are named. */
export const nearestReason = {
  geometry: 'the geometry is not fitted',
  withheld: 'Delta is withheld',
  noFactor: (ion: string): string => `the other complexes give no g of ${ion}, so Delta cannot be set against that of other ions`,
  nothing: 'no other complex of the same island can be compared',
  withoutBeta: 'beta is withheld: compared by Delta/g alone',
} as const;

/** What a person should know before reading a placement. */
export const placingCautionText = {
  alreadyThere: (id: string): string => `The collection holds this complex already, as ${id}. It is placed against all others; earlier measurements of it are listed apart.`,
  idTaken: (id: string): string => `The collection holds a complex with another ion, geometry, spin, isomer or ligands under the id ${id}. Choose a new file name before you add this one; if this is that record, corrected, its old version is among those compared.`,
  noOtherRecord: (ion: string): string => `No other record of ${ion} is in the collection: there is no series of it to stand in.`,
  onlyOne: (ion: string): string => `Only one other complex of ${ion} can be compared: above, below or alike is all that can be said.`,
  ligandsNeverSeen: (ligands: readonly string[]): string => `${listed(ligands)} ${ligands.length === 1 ? 'is' : 'are'} in no other complex of this geometry: nothing predicts what ${ligands.length === 1 ? 'it does' : 'they do'}.`,
  singleIsland: (ion: string): string => `${ion} is linked by no shared ligand to the other ions: its factors stand alone and test nothing.`,
  otherPolicy: 'It was fitted under values of its own, not under the policy in force: every difference carries total uncertainties.',
  temperatureMissing: (room: number): string => `Its temperature is not recorded: it is compared as if measured near ${room} K.`,
  widenedTemperature: 'Nothing with a recorded temperature near its own can be compared; results without a recorded temperature were let in.',
  widenedPhase: 'Nothing in its phase can be compared; results of other phases were let in.',
  earlierDisagrees: (names: readonly string[]): string => `It disagrees with the ${names.length === 1 ? 'measurement' : 'measurements'} ${listed(names)} of the same complex by more than two standard uncertainties.`,
  farFromPrediction: (parameter: string, method: string, z: string): string => `${parameter} lies ${z} standard uncertainties from what ${method === 'factors' ? 'the factors predict' : 'the average environment predicts'}: look at the assignment, or there is something new.`,
  scatterAssumed: 'The collection is too small to say how far complexes scatter about the rule of average environment: 3 % in Delta and 0.03 in beta were assumed.',
} as const;

/** What a place in a series says, for people. Names are formulas. */
export interface PlaceFacts {
  readonly parameter: 'Delta' | 'beta';
  /** "Cr(III), octahedral, quartet" or "6 ammine". */
  readonly series: string;
  readonly members: number;
  readonly above: string | null;
  readonly aboveCount: number;
  readonly below: string | null;
  readonly belowCount: number;
  readonly alike: readonly string[];
  /** Why the new number is not there; null where it is. */
  readonly withheld: string | null;
}

const alikeNamed = 4;

/** "Delta, among 12 of Cr(III), octahedral, quartet: above [CrF6]3- and 4 more; not distinguishable from A and B; below C." */
export function placeSentence(facts: PlaceFacts): string {
  const head = `${facts.parameter}, ${facts.members === 1 ? 'against the one comparable complex' : `among ${facts.members} comparable complexes`} of ${facts.series}`;
  if (facts.withheld !== null) return `${facts.parameter} is withheld (${facts.withheld}), so it stands nowhere in the series of ${facts.series}.`;
  if (facts.members === 0) return `${facts.parameter}: no complex of ${facts.series} can be compared.`;
  const more = (name: string, count: number): string => (count === 1 ? name : `${name} and ${count - 1} more`);
  const shown = facts.alike.length > alikeNamed ? [...facts.alike.slice(0, alikeNamed - 1), `${facts.alike.length - alikeNamed + 1} more`] : facts.alike;
  const parts = [
    ...(facts.above === null ? [] : [`above ${more(facts.above, facts.aboveCount)}`]),
    ...(facts.alike.length === 0 ? [] : [`not distinguishable from ${listed(shown)}`]),
    ...(facts.below === null ? [] : [`below ${more(facts.below, facts.belowCount)}`]),
  ];
  return `${head}: ${parts.join('; ')}.`;
}
