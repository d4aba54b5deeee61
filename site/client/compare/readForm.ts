import {
  type Band, type BandKind, type BandRole, type BoundLigand, type ComplexIdentity, type Ion, type Measurement, type QuantityFault, type Range,
  complexCharge, couldBeSeen, donorCount, parseIon, parseQuantity, parseRanges, toKelvin, toWavenumber, widthToWavenumber,
} from '#engine';
import { fittedGeometry, hasSpinChoice, resolvedSpin } from '../../../scripts/content/spin.ts';
import { type GeometryName, geometries, spinNames } from '../../../scripts/content/vocabulary.ts';
import type { FieldFault } from '../page/faults.ts';
import type { OfferedLigand } from './compareData.ts';
import { composedFormula } from '../page/composedFormula.ts';
import { ROLES, readTerms } from './readTerms.ts';
import { type BandFields, type TypedForm, filledBands, filledLigands, strengthOf, termsOf } from './typedForm.ts';

/** What the form needs to know of the collection. */
export interface KnownCollection {
  readonly ligands: readonly OfferedLigand[];
  readonly parentRatios: Readonly<Record<string, number>>;
}

/** The form as the engine takes it, as far as it could be read. */
export interface ReadForm {
  readonly faults: readonly FieldFault[];
  /** null: something that a reading needs is missing or wrong. */
  readonly measurement: Measurement | null;
  /** null: ligands are missing or do not fit, so there is no complex to place. */
  readonly identity: ComplexIdentity | null;
  /** The formula typed, or the one that ion and ligands make; null where neither is there. */
  readonly formula: string | null;
}

/** Reads the form by the rules of a record. What is empty and needed is waited for without a fault. */
export function readForm(form: TypedForm, known: KnownCollection): ReadForm {
  const faults: FieldFault[] = [];
  const say = (field: string, text: string): null => { faults.push({ field, text }); return null; };
  const ion = readIon(form.ion, say);
  const geometry = fittedGeometry(form.geometry);
  const spin = ion === null ? null : readSpin(form, ion, say);
  const temperature = readTemperature(form.temperature, say);
  const scanned = readRanges('scanned', form.scanned, say);
  const absent = readRanges('absent', form.absent, say);
  const filled = filledBands(form);
  const bands = filled.map(({ band, place }) => readBand(band, `bands.${place}`, say));
  const whole = bands.every((band) => band !== null) ? bands as readonly Band[] : null;
  if (ion !== null && geometry !== null && spin !== null && whole !== null) {
    readTerms(whole, filled.map(({ place }) => place), { ion, geometry, multiplicity: spin.multiplicity, ratio: known.parentRatios[ion.name] ?? null }, say);
  }
  if (whole !== null && absent !== null) checkAbsent(whole, absent, say);
  if (whole !== null && scanned !== null) checkScanned(whole, filled.map(({ place }) => place), scanned, say);
  // A reading does not wait for ligands that are half typed.
  const spectrumStands = faults.length === 0;
  const held = readLigands(form, ion, known, say);
  const nuclearity = Number(form.nuclearity || 1);
  const measurement: Measurement | null = !spectrumStands || ion === null || spin === null || whole === null || absent === null || scanned === null || whole.length + absent.length === 0 ? null : {
    ion, geometry, geometryName: form.geometry, multiplicity: form.spin === '' ? null : spin.multiplicity, phase: form.phase as Measurement['phase'],
    medium: form.medium.trim() === '' ? null : form.medium.trim(), temperature, technique: form.technique === '' ? null : form.technique as Measurement['technique'],
    bands: whole, absent, scanned, innocenceDoubtful: form.innocence === 'doubtful', nuclearity, donors: held === null || nuclearity > 1 ? null : donorCount(held),
  };
  const formula = form.formula.trim() !== '' ? form.formula.trim() : ion === null || held === null ? null : composedFormula(ion.metal, ion.oxidation, held.map(({ ligand, count }) => ({ ...known.ligands.find(({ id }) => id === ligand)!, count })), nuclearity);
  const identity: ComplexIdentity | null = ion === null || held === null || formula === null || spin === null ? null : {
    id: '', formula, ion, geometry, geometryName: form.geometry, multiplicity: spin.multiplicity, isomer: form.isomer, ligands: held,
  };
  return { faults, measurement, identity, formula };
}

type Say = (field: string, text: string) => null;

const told = ({ expected, mend }: QuantityFault): string => `expected ${expected}; ${mend}`;

function readIon(typed: string, say: Say): Ion | null {
  if (typed.trim() === '') return null;
  const { ion, reason, near } = parseIon(typed.trim());
  return ion ?? say('ion', `${reason}${near.length === 0 ? '' : `: write ${near.join(' or ')}`}`);
}

function readSpin({ spin, geometry }: TypedForm, ion: Ion, say: Say): { readonly multiplicity: number | null } | null {
  const typed = spinNames.find((name) => name === spin) ?? null;
  const fitted = fittedGeometry(geometry);
  const { multiplicity, possible } = resolvedSpin(ion.electrons, geometry, typed);
  if (possible.length > 0) return say('spin', `${geometry} ${ion.name}, d${ion.electrons}, may be ${possible.join(', ')}`);
  if (typed === null && fitted === 'octahedral' && hasSpinChoice(ion.electrons, fitted)) return say('spin', `octahedral ${ion.name}, d${ion.electrons}, is high or low spin: choose one`);
  return { multiplicity };
}

function readTemperature(typed: string, say: Say): number | null {
  if (typed.trim() === '') return null;
  if (/^(room|room temperature|rt)$/i.test(typed.trim())) return 295;
  const parsed = parseQuantity(typed, 'temperature');
  return parsed.ok ? toKelvin(parsed.quantity).value : say('temperature', `${told(parsed)}, or the word room`);
}

function readRanges(field: string, typed: string, say: Say): readonly Range[] | null {
  if (typed.trim() === '') return [];
  const parsed = parseRanges(typed);
  return parsed.ok ? parsed.ranges : say(field, told(parsed));
}

/** Limits of a band position, cm-1. */
const [lowest, highest] = [1000, 100_000];

function readBand(typed: BandFields, at: string, say: Say): Band | null {
  const parsed = parseQuantity(typed.position, 'energy');
  if (!parsed.ok) return say(`${at}.position`, told(parsed));
  const { position, uMinus, uPlus, halfDigit } = toWavenumber(parsed.quantity);
  if (position < lowest || position > highest) return say(`${at}.position`, `expected a position from 1000 to 100 000 cm-1 (100 to 10 000 nm); check the unit: numbers of three digits are often nm`);
  const width = typed.width.trim() === '' ? null : parseQuantity(typed.width, 'energy');
  if (width !== null && !width.ok) return say(`${at}.width`, told(width));
  const fullWidth = width === null ? null : widthToWavenumber(position, width.quantity);
  if (width !== null && (fullWidth === null || fullWidth >= position)) return say(`${at}.width`, 'expected a width smaller than the position; check the number and its unit');
  const strength = strengthOf(typed.epsilon);
  const epsilon = typed.epsilon.trim() === '' || strength !== null ? null : parseQuantity(typed.epsilon, 'absorption-coefficient');
  if (epsilon !== null && !epsilon.ok) return say(`${at}.epsilon`, `${told(epsilon)}, or one of the words strong, medium, weak`);
  const component = typed.kind === 'component';
  const states = /^[1-6]$/.test(typed.degeneracy.trim()) ? Number(typed.degeneracy) : null;
  if (component && states === null && typed.degeneracy.trim() !== '') return say(`${at}.degeneracy`, 'expected a whole number of states from 1 to 6');
  const terms = termsOf(typed.term);
  const role = terms.length === 1 && ROLES.includes(terms[0]!) ? terms[0] as BandRole : 'transition';
  return {
    position, uMinus, uPlus, halfDigit, coverageNotStated: parsed.quantity.coverage === 'plus-minus', kind: typed.kind as BandKind,
    side: typed.kind === 'shoulder' && (typed.side === 'higher' || typed.side === 'lower') ? typed.side : null,
    width: fullWidth, epsilon: epsilon === null ? null : epsilon.quantity.value, strength, degeneracy: component ? states : null, deconvoluted: typed.deconvoluted === 'true',
    role, terms: role === 'transition' ? terms : [], leftOut: typed.leftOut.trim() === '' ? null : typed.leftOut.trim(),
  };
}

function checkAbsent(bands: readonly Band[], absent: readonly Range[], say: Say): void {
  const inside = absent.flatMap(({ low, high }) => bands.filter(({ position, width }) => position + (width ?? 0) / 2 > low && position - (width ?? 0) / 2 < high));
  if (inside.length > 0) say('absent', `a range without any band, ended before a band rises to half its height; it reaches the band at ${inside[0]!.position.toFixed(0)} cm-1`);
}

function checkScanned(bands: readonly Band[], places: readonly number[], scanned: readonly Range[], say: Say): void {
  if (scanned.length === 0) return;
  bands.forEach(({ position, width, role, leftOut }, k) => {
    if (role === 'transition' && leftOut === null && !couldBeSeen(position, width, scanned)) say(`bands.${places[k]}.position`, 'expected a position inside what was scanned; correct the one or the other');
  });
}

/** The ligands, where all are known, donor atoms and charge add up. */
function readLigands(form: TypedForm, ion: Ion | null, known: KnownCollection, say: Say): readonly BoundLigand[] | null {
  const filled = filledLigands(form);
  if (filled.length === 0) return null;
  const held = filled.map(({ ligand: { ligand: id, count: typed, bound: typedBound }, place }): BoundLigand | null => {
    const ligand = known.ligands.find((one) => one.id === id);
    const whole = (text: string): number | null => /^([1-9]|1[0-2])$/.test(text.trim()) ? Number(text) : null;
    if (id === '') return say(`ligands.${place}.ligand`, 'choose the ligand');
    if (ligand === undefined) return say(`ligands.${place}.ligand`, 'no ligand of the collection has this id');
    if (typed.trim() === '') return null;
    const count = whole(typed);
    if (count === null) return say(`ligands.${place}.count`, 'expected a whole number from 1 to 12');
    const bound = typedBound.trim() === '' ? ligand.denticity : whole(typedBound);
    return bound === null || bound > ligand.denticity ? say(`ligands.${place}.bound`, `expected a whole number from 1 to ${ligand.denticity}`) : { ligand: id, count, bound };
  });
  if (!held.every((one) => one !== null)) return null;
  if (new Set(held.map(({ ligand }) => ligand)).size < held.length) return say(`ligands.${filled.at(-1)!.place}.ligand`, 'this ligand stands here twice: write one count');
  const wanted = geometries[form.geometry as GeometryName] ?? null;
  const donors = donorCount(held);
  if (wanted !== null && donors !== wanted * Number(form.nuclearity || 1) && Number(form.nuclearity || 1) === 1) return say(`ligands.${filled.at(-1)!.place}.count`, `these bind with ${donors} donor atoms; ${form.geometry} needs ${wanted}`);
  return ion === null || chargeAgrees(form, ion, held, known, say) ? held : null;
}

/** true where the charge at the end of a typed formula is that of ion and ligands, or none is typed. */
function chargeAgrees(form: TypedForm, ion: Ion, held: readonly BoundLigand[], known: KnownCollection, say: Say): boolean {
  const ending = /[\])]\s*\^?[{(]?(\d*)([+\-−])[)}]?\s*$/.exec(form.formula);
  if (form.formula.trim() === '') return true;
  const typed = ending === null ? 0 : (ending[1] === '' ? 1 : Number(ending[1])) * (ending[2] === '+' ? 1 : -1);
  const charge = complexCharge(ion.oxidation, held.map(({ ligand, count }) => ({ charge: known.ligands.find(({ id }) => id === ligand)!.charge, count })), Number(form.nuclearity || 1));
  if (typed === charge) return true;
  say('formula', `ion and ligands make the charge ${charge > 0 ? '+' : ''}${charge}, not ${typed > 0 ? '+' : ''}${typed}: correct one of them, or leave the formula out`);
  return false;
}
