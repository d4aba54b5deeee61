import { perCent } from '../words/numbers.ts';
import { otherNames } from '../words/remarks.ts';
import type { Caution } from './types.ts';

/**
 * What the spectral cautions are decided on: facts of one reading, gathered by the reader. Each trigger is
 * one line of `spectralCautions`, so that the list of codes can be read in one place.
 */
export interface SpectralFacts {
  readonly electrons: number;
  readonly octahedral: boolean;
  readonly row: '3d' | '4d' | '5d';
  /** The ground level is orbitally degenerate in e (strong Jahn-Teller) and one band stands for the split transition. */
  readonly jahnTellerEnvelope: boolean;
  /** A tetrahedral ion with a T2 ground level (d4, d9), whose one band is taken for that of an undistorted site. */
  readonly tetrahedronDistorts: boolean;
  readonly twoElectronBandUsed: string | null;
  /** u(B, total)/B where B is published. */
  readonly relativeUB: number | null;
  readonly coverageNotStated: boolean;
  readonly componentsMerged: boolean;
  readonly componentWithoutDegeneracy: boolean;
  readonly mixesOriginsAndMaxima: boolean;
  readonly innocenceDoubtful: boolean;
  readonly nuclearity: number;
  readonly emission: boolean;
  readonly ratioAssumed: string | null;
  readonly betaAssumed: string | null;
  readonly beta: number | null;
  readonly uBeta: number | null;
  readonly groundNearCrossing: boolean;
  readonly ratioAtEdge: boolean;
  /** Ratios of spin-allowed bands that no Delta and B give, as printed: "4A2g/4T2g = 1.98 (2.00 to 2.25)". */
  readonly ratiosOutside: readonly string[];
  /** B is published of octahedral low-spin d4, d5 or d7. */
  readonly sparseLowSpin: boolean;
  /** 3T1 and 1E of octahedral Ni(II) closer than this reading can tell, cm-1 apart; null where not octahedral d8. */
  readonly singletGap: number | null;
  readonly octahedralCobaltTwo: boolean;
  /** Spin-allowed bands predicted where nothing was scanned, as printed. */
  readonly notScanned: readonly string[];
  readonly equallyGoodBranch: boolean;
  readonly groundContradicted: boolean;
  readonly rival: 'near' | 'better' | null;
  readonly rivalGeometry: boolean;
  /** true where it gives the same Delta and B. */
  readonly rivalSameNumbers: boolean;
  /** The best rival in words. */
  readonly rivalWords: string;
  /** Bands whose strength is not that of the transition they are assigned to, as printed. */
  readonly forbiddenUsedAsAllowed: readonly string[];
  readonly chargeTransferUsed: readonly string[];
  /** A dip lies between two fitted maxima. */
  readonly dipBetweenMaxima: boolean;
  /** A band on which more than half of the fit hangs was read as a shoulder or rounded to 100 cm-1 or more. */
  readonly roughBandCarriesFit: string | null;
  /** A fitted band lies where the solvent itself absorbs in the near infrared. */
  readonly nearSolventOvertone: { readonly band: number; readonly solvent: string } | null;
}

/** 1E and 3T1 mix strongly when they lie closer than this. */
const singletReach = 1500;

/** Spectral cautions of one reading, in a fixed order. */
export function spectralCautions(facts: SpectralFacts): readonly Caution[] {
  const found: Caution[] = [];
  const add = (applies: boolean, code: string, text: string): void => {
    if (applies) found.push({ code, text });
  };
  add(facts.groundContradicted, 'SPIN_CONTRADICTS_FIT', 'The fitted parameters put another spin state lowest than the one declared.');
  add(facts.rival === 'better', 'BETTER_RIVAL', `Another reading fits these bands clearly better than the chosen one: ${facts.rivalWords}.`);
  add(facts.rival === 'near', 'NEAR_RIVAL', `${facts.rivalSameNumbers ? otherNames : 'Another reading fits these bands as well as the chosen one'}, within the policy’s margin: ${facts.rivalWords}.`);
  add(facts.rival !== null && facts.rivalGeometry, 'GEOMETRY_RIVAL', 'The other geometry fits these bands as well.');
  add(facts.forbiddenUsedAsAllowed.length > 0, 'WEAK_FOR_SPIN_ALLOWED', `Weak as a spin-forbidden band, yet used as spin-allowed: ${facts.forbiddenUsedAsAllowed.join(', ')}.`);
  add(facts.chargeTransferUsed.length > 0, 'STRONG_AS_CHARGE_TRANSFER', `As strong as charge transfer, yet used as a d-d band: ${facts.chargeTransferUsed.join(', ')}.`);
  add(facts.groundNearCrossing, 'SPIN_NEAR_CROSSING', 'At these parameters the declared spin state is the ground state only within the range of an assumed value.');
  add(facts.equallyGoodBranch, 'SECOND_SOLUTION', 'Another pair of Delta and B fits these bands as well; both are listed.');
  add(facts.ratioAtEdge, 'BAND_RATIO_AT_EDGE', 'The ratio of the bands lies at the edge of what the model allows: B would fall to zero, so it is withheld.');
  add(facts.ratiosOutside.length > 0, 'BAND_RATIO_OUTSIDE', `The ratio of these bands lies outside what the model allows at any Delta and B: ${facts.ratiosOutside.join('; ')}.`);
  add(facts.twoElectronBandUsed !== null, 'TWO_ELECTRON_BAND', `${facts.twoElectronBandUsed} is a two-electron band: a model with one B places it several hundred cm⁻¹ wrong, which its larger floor allows for.`);
  add(facts.relativeUB !== null && facts.relativeUB > 0.1, 'LOOSE_B', `B is loose: its uncertainty is ${perCent(facts.relativeUB ?? 0)} of its value.`);
  add(facts.sparseLowSpin, 'SPARSE_LOW_SPIN', 'Several transitions of a low-spin d4, d5 or d7 ion lie under each band: B rests on which one each was taken for.');
  add(facts.coverageNotStated, 'COVERAGE_NOT_STATED', 'An uncertainty was typed as plain plus-minus; it is taken as one standard uncertainty.');
  add(facts.singletGap !== null && Math.abs(facts.singletGap) < singletReach, 'SINGLET_NEAR_TRIPLET', '1Eg lies within reach of 3T1g: spin–orbit coupling mixes them, and neither hump need be the spin-allowed band itself.');
  add(facts.octahedralCobaltTwo, 'COBALT_GROUND_TERM', 'The ground term of octahedral Co(II) is split by spin–orbit coupling: bands read from its lowest level lie several hundred cm⁻¹ high.');
  add(facts.row !== '3d', 'HEAVY_METAL', `Spin–orbit coupling of a ${facts.row} ion is not in this model.`);
  add(facts.jahnTellerEnvelope, 'JAHN_TELLER_ENVELOPE', 'One band stands for a transition that a Jahn–Teller distortion splits: Delta is apparent and kept out of series.');
  add(facts.tetrahedronDistorts, 'TETRAHEDRON_DISTORTS', 'A tetrahedral d4 or d9 ion is seldom undistorted: its site is mostly flattened, and Delta is then not that of a tetrahedron.');
  add(facts.componentsMerged, 'COMPONENTS_AVERAGED', 'Components of one term enter as their barycentre weighted by degeneracy.');
  add(facts.componentWithoutDegeneracy, 'COMPONENT_ORDER_OPEN', 'The order of the components is not decided, so they have no barycentre and stay out of the fit.');
  add(facts.roughBandCarriesFit !== null, 'ROUGH_BAND_CARRIES_FIT', `More than half of the fit hangs on ${facts.roughBandCarriesFit}, which was read as a shoulder or envelope or was rounded.`);
  add(facts.dipBetweenMaxima, 'DIP_READ_AS_TWO_BANDS', 'A dip lies between two fitted maxima: an interference dip cuts one band in two, and neither edge is a band.');
  add(facts.nearSolventOvertone !== null, 'SOLVENT_OVERTONE_NEARBY', `The solvent (${facts.nearSolventOvertone?.solvent ?? ''}) absorbs near the band at ${facts.nearSolventOvertone?.band ?? ''} cm⁻¹.`);
  add(facts.mixesOriginsAndMaxima, 'ORIGIN_MIXED_WITH_MAXIMA', 'A zero-phonon position of a broad band is fitted together with absorption maxima, which lie higher by the vibrational spread.');
  add(facts.innocenceDoubtful, 'LIGAND_INNOCENCE', 'The oxidation state is in doubt (ligand innocence), so beta is withheld.');
  add(facts.nuclearity > 1, 'MORE_THAN_ONE_METAL', `The complex holds ${facts.nuclearity} metal centres; the model holds one.`);
  add(facts.emission, 'EMISSION', 'Positions were read from an emission spectrum; a maximum on a wavelength scale needs the λ² correction of the intensity first.');
  add(facts.ratioAssumed !== null, 'C_ASSUMED', `C is not fitted: C/B = ${facts.ratioAssumed} is the policy's.`);
  add(facts.betaAssumed !== null, 'B_ASSUMED', `Delta rests on an assumed beta of ${facts.betaAssumed}.`);
  const high = facts.beta !== null && facts.uBeta !== null && facts.beta - 2 * facts.uBeta > 1;
  add(high, 'BETA_ABOVE_ONE', 'beta exceeds 1 by more than twice its uncertainty: B cannot well exceed that of the free ion.');
  add(facts.beta !== null && facts.beta < 0.3, 'BETA_VERY_LOW', 'beta is below 0.3: look for another assignment.');
  add(facts.notScanned.length > 0, 'STRONG_BAND_NOT_SCANNED', `Nothing was scanned where ${facts.notScanned.join(' and ')} ${facts.notScanned.length === 1 ? 'is' : 'are'} predicted.`);
  return found;
}
