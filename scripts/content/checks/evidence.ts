// The declared spin against what else the record says of it: magnetic moment, EPR spectrum, the terms of the bands.

import { typedText } from '../report.ts';
import type { Reporter } from '../report.ts';
import { bandRoles } from '../records/measurement.ts';
import { fittedGeometry, lowSpinMultiplicity, possibleMultiplicities } from '../spin.ts';
import type { ComplexDraft, MeasurementDraft } from './complex.ts';
import { checkTerm } from './terms.ts';

type At = readonly (string | number)[];

/** A moment in Bohr magnetons: "3.85(5) BM", "3.8 μB". Others are kept and not judged. */
const bohrMagnetons = /^(\d+(?:\.\d+)?)\s*(?:\([\d.]+\))?\s*(?:B\.?\s?M\.?|[µμ]_?B)$/i;

/** How far a moment may lie outside the range of the declared spin, and of another one that it is said to show instead. */
const reachOfDeclared = 0.5;
const reachOfOther = 0.2;

/**
 * Whether a 3d ion with so many unpaired electrons may show a moment, Bohr magnetons: from the spin-only sqrt(n(n + 2)) to
 * sqrt(n(n + 2) + L(L + 1)), with L = 2 for one and four, 3 for two and three and 0 for five unpaired electrons, and `reach` on both
 * sides. Up to 1 goes with none (temperature-independent paramagnetism). Limits: common practice, no source.
 */
function mayShow(unpaired: number, moment: number, reach: number): boolean {
  if (unpaired === 0) return moment <= 1;
  const orbital = [0, 2, 3, 3, 2, 0][unpaired]!;
  const spinOnly = unpaired * (unpaired + 2);
  return moment >= Math.sqrt(spinOnly) - reach && moment <= Math.sqrt(spinOnly + orbital * (orbital + 1)) + reach;
}

/**
 * Faults where a moment does not go with the declared multiplicity and goes with another one of the ion: in between nothing is said.
 * Heavier ions, several metals and doubtful ligands have moments of their own kind.
 */
function checkMoment({ ion, nuclearity, innocence }: ComplexDraft, typed: string, at: At, multiplicity: number, report: Reporter): void {
  const found = bohrMagnetons.exec(typed.trim());
  if (found === null || ion === undefined || ion.row !== '3d' || (nuclearity ?? 1) > 1 || innocence !== undefined) return;
  const moment = Number(found[1]);
  const unpaired = multiplicity - 1;
  const others = possibleMultiplicities(ion.electrons).filter((other) => other !== multiplicity && mayShow(other - 1, moment, reachOfOther));
  if (others.length === 0 || mayShow(unpaired, moment, reachOfDeclared)) return;
  report.at(at, {
    code: 'SPIN_EVIDENCE', found: `${typedText(typed)} beside a ground state of multiplicity ${multiplicity}`,
    expected: unpaired === 0 ? 'a moment near 0: no electron is unpaired' : `about ${Math.sqrt(unpaired * (unpaired + 2)).toFixed(1)} BM or somewhat more: ${unpaired} unpaired electron${unpaired === 1 ? '' : 's'}`,
    mend: `correct the moment, the ion or the spin: this moment goes with multiplicity ${others.join(' or ')}`,
  });
}

function checkResonance(typed: string, at: At, multiplicity: number, report: Reporter): void {
  if (multiplicity !== 1 || !/\d/.test(typed)) return;
  report.at(at, {
    code: 'SPIN_EVIDENCE', found: `${typedText(typed)} beside a ground state of multiplicity 1`, expected: 'no g value: a singlet shows no electron paramagnetic resonance',
    mend: 'correct the spin or the ion, or put what an impurity shows into notes',
  });
}

/** Multiplicities of the ground state that a geometry leaves an ion: high and low spin. */
function groundMultiplicities(electrons: number, geometry: 'octahedral' | 'tetrahedral'): readonly number[] {
  return [possibleMultiplicities(electrons)[0]!, lowSpinMultiplicity(electrons, geometry)].filter((one) => one !== null);
}

/** Faults where every broad band is typed as a transition within the other spin state. */
function checkTermsOfSpin(complex: ComplexDraft, { bands }: MeasurementDraft, path: At, multiplicity: number, report: Reporter): void {
  const geometry = fittedGeometry(complex.geometry ?? '');
  const { ion } = complex;
  if (geometry === null || ion === undefined) return;
  const claimed = (bands ?? []).flatMap((band, index) => {
    if (band === undefined || !('position' in band) || typeof band.term !== 'string' || bandRoles.includes(band.term) || band['left-out'] !== undefined) return [];
    const weak = band.strength === 'weak' || (band.epsilon !== undefined && band.epsilon.value < 1);
    if (weak || band.kind === 'line' || band.kind === 'dip' || band.kind === 'zero-phonon') return [];
    const read = checkTerm(band.term, { ion, geometry, multiplicity });
    return 'labels' in read ? [{ typed: band.term, multiplicity: Number(/[1-6]/.exec(read.labels[0]!)?.[0]), at: [...path, 'bands', index, 'term'] }] : [];
  });
  const [first] = claimed;
  if (first === undefined || first.multiplicity === multiplicity || claimed.some((one) => one.multiplicity !== first.multiplicity)) return;
  if (!groundMultiplicities(ion.electrons, geometry).includes(first.multiplicity)) return;
  report.at(first.at, {
    code: 'SPIN_EVIDENCE', found: `${claimed.map(({ typed }) => typedText(typed)).join(', ')} beside a ground state of multiplicity ${multiplicity}`,
    expected: `spin-allowed terms of multiplicity ${multiplicity} among the broad bands`,
    mend: `correct the terms, or the spin of the complex: these terms go with a ground state of multiplicity ${first.multiplicity}`,
  });
}

/** Reports evidence of one measurement that contradicts the declared ground multiplicity; null: none is known. */
export function checkEvidence(complex: ComplexDraft, measurement: MeasurementDraft, path: At, declared: number | null, report: Reporter): void {
  const { ion } = complex;
  if (ion === undefined || ion.electrons < 1 || ion.electrons > 9) return;
  const fitted = fittedGeometry(complex.geometry ?? '') !== null;
  const multiplicity = declared ?? (fitted ? possibleMultiplicities(ion.electrons)[0]! : null);
  if (multiplicity === null) return;
  const moment = measurement['magnetic-moment'];
  const resonance = measurement['epr-g'];
  if (moment !== undefined) checkMoment(complex, moment, [...path, 'magnetic-moment'], multiplicity, report);
  if (resonance !== undefined) checkResonance(resonance, [...path, 'epr-g'], multiplicity, report);
  checkTermsOfSpin(complex, measurement, path, multiplicity, report);
}
