// What a column's header seems to say: the field, a unit, which band, a term. Guesses that a person confirms.

import { plainCharacters } from '#engine';
import { unitTyped } from './cells.ts';
import { isField } from './fields.ts';

export interface HeaderGuess {
  /** null: nothing is known about such a header. */
  readonly field: string | null;
  readonly unit: string | null;
  readonly number: number | null;
  readonly term: string | null;
  readonly brackets: 'uncertainty' | 'epsilon';
}

/** Words by field, in lower case; where capitals matter (B, C, T) they stand in `exact`. */
const words: Readonly<Record<string, string>> = {
  id: 'id, record, code',
  formula: 'formula, complex, compound, complex ion, species, substance, komplex, verbindung, formel',
  name: 'name',
  ion: 'ion, metal ion, metal, central ion, zentralion, metallion',
  geometry: 'geometry, coordination, coordination geometry, shape, geometrie',
  isomer: 'isomer',
  ligands: 'ligands, ligand, liganden',
  spin: 'spin, spin state',
  sample: 'sample, salt, probe, salz',
  phase: 'phase, state',
  medium: 'medium, solvent, matrix, lösungsmittel, solvens',
  host: 'host, host lattice',
  temperature: 'temperature, temp, temp., temperatur',
  technique: 'technique, method, methode',
  scanned: 'scanned, range, scan, spectral range',
  concentration: 'concentration, conc, conc., konzentration',
  'path-length': 'path length, path, cell, pathlength',
  batch: 'batch, charge no.',
  'raw.file': 'file, raw file, spectrum file, filename, datei',
  'magnetic-moment': 'magnetic moment, moment, µeff, µ_eff, mu_eff, µ eff',
  'source.notebook': 'notebook, lab book, labbook, notebook page, laborbuch, journal page',
  'source.by': 'by, initials, measured by, person, who, student',
  'source.date': 'date, datum, day, measured on',
  'source.cite': 'cite, source, reference, ref, ref., literature, lit., quelle, literatur',
  'source.where': 'where, table, page in source',
  position: 'position, band, bands, λ, lambda, wavelength, wavenumber, wave number, ν, nu, nu bar, energy, max, maximum, absorption, abs., peak, bande, wellenzahl, wellenlänge',
  'position.u': 'uncertainty, error, err, err., sigma, σ, ±, u(ν), u(λ), u(position), fehler, unsicherheit, std, esd',
  kind: 'kind, type, band type, art',
  side: 'side',
  width: 'width, fwhm, half-width, half width, halfwidth, δν1/2, δν, bandwidth, halbwertsbreite',
  epsilon: 'epsilon, ε, eps, eps., molar absorptivity, absorptivity, molar absorption coefficient, extinction coefficient, extinction, molar extinction',
  strength: 'strength, intensity, int., int',
  term: 'term, assignment, transition, assigned to, zuordnung, übergang',
  'left-out': 'left out, reason',
  absent: 'absent, no band in',
  'quoted.Dq': 'dq',
  'quoted.Delta': '10dq, 10 dq, δ, δo, δ_o, δoct, delta, delta_o, δt',
  'quoted.beta': 'β, beta, nephelauxetic ratio',
  'band.notes': 'notes, note, remarks, remark, comment, comments, bemerkung, bemerkungen',
};

const exact: Readonly<Record<string, string>> = {
  T: 'temperature', c: 'concentration', d: 'path-length', l: 'path-length', B: 'quoted.B', C: 'quoted.C', g: 'epr-g', u: 'position.u', v: 'position', E: 'position',
};

const byWord: ReadonlyMap<string, string> = new Map(Object.entries(words).flatMap(([field, list]) => list.split(', ').map((word) => [word, field] as const)));

const unitPattern = String.raw`(?:10\^?3 ?|k ?|1000 ?)?cm\^?-1|1\/cm|kK|nm|µm|um|meV|eV|°C|K|BM|µB|%|mol\/L|mmol\/L|mol L-1|mM|M|cm|mm|(?:L|l|dm\^?3|M\^?-1) ?(?:mol\^?-1 )?cm\^?-1|M\^?-1 ?cm\^?-1|L\/\(mol cm\)`;
const termPattern = /^(?:[a-c])?[1-6](?:A[12]|E|T[12])g?(?:\([A-Z]\))?$/;

/** Reads one header. A header that is a field's own name, with a number behind it where a row has several, is taken as that. */
export function readHeader(header: string): HeaderGuess {
  // A tilde above the letter says wavenumber; the letter says enough.
  const plain = plainCharacters(header).normalize('NFKC').replace(/\u0303/g, '').replace(/[₀-₉]/g, (digit) => String('₀₁₂₃₄₅₆₇₈₉'.indexOf(digit)));
  const withoutEpsilon = plain.replace(/\((?:ε|eps|epsilon)[^)]*\)/i, '').trim();
  const brackets = withoutEpsilon === plain ? 'uncertainty' : 'epsilon';
  const unit = unitOf(withoutEpsilon);
  const bare = withoutUnit(withoutEpsilon);
  if (termPattern.test(bare)) return { field: 'position', unit, number: null, term: bare, brackets };
  for (const [name, number] of [[bare, null], ...numbered(bare), ...ofMaximum(bare)] as const) {
    const field = isField(name) ? name : (exact[name] ?? byWord.get(name.toLowerCase()) ?? null);
    if (field !== null) return { field, unit: takesUnit(field) ? unit : null, number, term: null, brackets: field === 'position' ? brackets : 'uncertainty' };
  }
  return { field: null, unit: null, number: null, term: null, brackets: 'uncertainty' };
}

function takesUnit(field: string): boolean {
  return !['epsilon', 'quoted.beta', 'epr-g', 'position.u'].includes(field);
}

/** "ν1", "band 2", "ε_3", "quoted.Dq 2" as the word and its number. */
function numbered(text: string): (readonly [string, number])[] {
  const found = /^(.*?)[ _.-]?(\d{1,2})(?:[ _]?max)?$/.exec(text);
  return found === null || found[1] === '' ? [] : [[found[1]!.trim(), Number(found[2])]];
}

/** "λmax", "ν_max", "λ(max)" as the bare word. */
function ofMaximum(text: string): (readonly [string, null])[] {
  const found = /^(.+?)[ _]?\(?max\.?\)?$/i.exec(text);
  return found === null ? [] : [[found[1]!.trim(), null]];
}

function unitOf(plain: string): string | null {
  const found = new RegExp(String.raw`(?:[([]|\/ ?|, | in | )\(?(${unitPattern})\)?[)\]]?\s*$`).exec(plain);
  return found === null ? null : unitTyped(found[1]!);
}

function withoutUnit(plain: string): string {
  return plain.replace(new RegExp(String.raw`(?:\s*[([]|\s*\/ ?|,? | in )\(?(?:${unitPattern})\)?[)\]]?\s*$`), '').replace(/,$/, '').trim();
}
