import { hazardClasses } from './hazardClasses.ts';

/** Where a caution belongs: to the substance, to a reading, to a complex with its other measurements, or to a comparison being made. */
export type CautionSubject = 'hazard' | 'reading' | 'complex' | 'comparison';

/** One code with its general meaning; on a record the text names the bands and numbers it speaks of. */
export interface CautionMeaning {
  readonly code: string;
  readonly subject: CautionSubject;
  readonly meaning: string;
}

const ofReading: Readonly<Record<string, string>> = {
  SPIN_CONTRADICTS_FIT: 'The fitted parameters put another spin state lowest than the one declared.',
  SPIN_NEAR_CROSSING: 'The declared spin state is the ground state only within the range of an assumed value.',
  BETTER_RIVAL: 'Another reading of the same bands scores better than the chosen one by more than the policy’s margin.',
  NEAR_RIVAL: 'Another reading of the same bands scores as well as the chosen one, within the policy’s margin.',
  GEOMETRY_RIVAL: 'Within that margin the other geometry fits the bands as well.',
  SECOND_SOLUTION: 'The same assignment has another pair of Delta and B that fits as well; both are listed.',
  WEAK_FOR_SPIN_ALLOWED: 'A band as weak as a spin-forbidden one is used as spin-allowed.',
  STRONG_AS_CHARGE_TRANSFER: 'A band as strong as charge transfer is used as a d-d band.',
  BAND_RATIO_AT_EDGE: 'The ratio of two bands lies at the edge of what the model allows, where B falls to zero; B is withheld.',
  BAND_RATIO_OUTSIDE: 'The ratio of two bands lies outside what the model allows at any Delta and B.',
  TWO_ELECTRON_BAND: 'A transition that moves two electrons is in the fit; a model with one B places it several hundred cm⁻¹ wrong, which its larger floor allows for.',
  LOOSE_B: 'The uncertainty of B exceeds a tenth of its value.',
  SPARSE_LOW_SPIN: 'B is published of a low-spin d4, d5 or d7 ion, where several transitions lie under each band.',
  COVERAGE_NOT_STATED: 'An uncertainty was typed as plain plus-minus; it is taken as one standard uncertainty.',
  SINGLET_NEAR_TRIPLET: 'Octahedral Ni(II): 1Eg lies within reach of 3T1g and mixes with it, so neither hump need be the spin-allowed band itself.',
  COBALT_GROUND_TERM: 'Octahedral Co(II): the ground term is split by spin–orbit coupling, so bands read from its lowest level lie several hundred cm⁻¹ high.',
  HEAVY_METAL: 'A 4d or 5d ion: its spin–orbit coupling is not in the model.',
  JAHN_TELLER_ENVELOPE: 'One band stands for a transition that a Jahn–Teller distortion splits: Delta is apparent and kept out of series.',
  TETRAHEDRON_DISTORTS: 'A tetrahedral d4 or d9 ion is seldom undistorted, and Delta is then not that of a tetrahedron.',
  COMPONENTS_AVERAGED: 'Components of one term enter as their barycentre weighted by degeneracy, never as their plain mean.',
  COMPONENT_ORDER_OPEN: 'The order of components is not decided, so they have no barycentre and stay out of the fit.',
  ROUGH_BAND_CARRIES_FIT: 'More than half of the fit hangs on a band read as a shoulder or envelope, or on a rounded position.',
  DIP_READ_AS_TWO_BANDS: 'A dip lies between two fitted maxima: an interference dip cuts one band in two, and neither edge is a band.',
  SOLVENT_OVERTONE_NEARBY: 'A fitted band lies where the solvent itself absorbs in the near infrared.',
  ORIGIN_MIXED_WITH_MAXIMA: 'A zero-phonon position of a broad band is fitted together with absorption maxima, which lie higher.',
  LIGAND_INNOCENCE: 'The oxidation state is in doubt, so beta is withheld.',
  MORE_THAN_ONE_METAL: 'The complex holds more than one metal centre; the model holds one.',
  EMISSION: 'Positions were read from an emission spectrum; a maximum on a wavelength scale needs the λ² correction of the intensity first.',
  C_ASSUMED: 'C was not fitted: it follows from the policy’s C/B, and a published number moves with it.',
  B_ASSUMED: 'Delta rests on an assumed beta; it is kept out of factor fits.',
  BETA_ABOVE_ONE: 'beta exceeds 1 by more than twice its uncertainty.',
  BETA_VERY_LOW: 'beta lies below 0.3, which calls for another assignment.',
  STRONG_BAND_NOT_SCANNED: 'The fit predicts a spin-allowed band where nothing was scanned.',
};

const ofComplex: Readonly<Record<string, string>> = {
  TRIGONAL_FIELD: 'Three chelate rings give a trigonal field, which is not in the model.',
  MEASUREMENTS_DISAGREE: 'Two measurements of one complex under like conditions differ by more than twice the uncertainty of their readings.',
  CONDITIONS_DIFFER: 'Another measurement of the same complex was made in another phase or far away in temperature: compare with care.',
  QUOTED_VALUE_DISAGREES: 'A value printed elsewhere differs from the refitted one by more than twice the combined uncertainty.',
};

const ofComparison: Readonly<Record<string, string>> = {
  ALREADY_THERE: 'The collection holds this complex already; it is placed against all others.',
  ID_TAKEN: 'The collection holds another complex under this id.',
  NO_OTHER_RECORD: 'No other record of this ion, geometry and spin is in the collection.',
  SERIES_OF_ONE: 'Only one other complex can be compared: above, below or alike is all that can be said.',
  LIGAND_NEVER_SEEN: 'A ligand is in no other complex of this geometry: nothing predicts what it does.',
  ISLAND_OF_ITS_OWN: 'No shared ligand links the ion to the other ions: its factors stand alone and test nothing.',
  OTHER_POLICY: 'It was fitted under values of its own, so every difference carries total uncertainties.',
  TEMPERATURE_NOT_RECORDED: 'Its temperature is not recorded; it is compared as if measured near room temperature.',
  TEMPERATURES_MIXED: 'Results without a recorded temperature were let into the comparison.',
  PHASES_MIXED: 'Results of other phases were let into the comparison.',
  EARLIER_DISAGREES: 'It disagrees with an earlier measurement of the same complex by more than two standard uncertainties.',
  FAR_FROM_PREDICTION: 'A number lies more than three standard uncertainties from what the rest of the collection predicts.',
  SCATTER_ASSUMED: 'The collection is too small to say how far complexes scatter about the rule of average environment; a scatter was assumed.',
};

function meanings(subject: CautionSubject, texts: Readonly<Record<string, string>>): readonly CautionMeaning[] {
  return Object.entries(texts).map(([code, meaning]) => ({ code, subject, meaning }));
}

/** Every caution that the engine may raise, hazards first, each with its lasting code. */
export const cautionMeanings: readonly CautionMeaning[] = [
  ...hazardClasses.map(({ code, text }): CautionMeaning => ({ code, subject: 'hazard', meaning: `${text[0]!.toUpperCase()}${text.slice(1)}` })),
  ...meanings('reading', ofReading), ...meanings('complex', ofComplex), ...meanings('comparison', ofComparison),
];
