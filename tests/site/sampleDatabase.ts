import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readFileSync, rmSync } from 'node:fs';
import { dirname, resolve } from 'node:path';
import Database from 'better-sqlite3';
import { type Geometry, levels } from '#engine';
import { putDetails } from './sampleDetails.ts';

/** One invented measurement of the sample; bands are made from the parameters and lie `shift` above the calculated levels. */
interface Sample {
  readonly id: string; readonly formula: string; readonly ion: string; readonly electrons: number; readonly geometry: Geometry; readonly spin: string;
  readonly multiplicity: number; readonly ground: string; readonly ligands: Readonly<Record<string, number>>;
  readonly delta: number; readonly racahB: number; readonly labels: readonly string[]; readonly shift: readonly number[];
  readonly withheldB?: string; readonly hazard?: readonly [string, string]; readonly verdict?: string; readonly sample?: string; readonly charge: number;
  readonly id2?: string;
}

const QUARTET = { electrons: 3, geometry: 'octahedral', spin: 'quartet', multiplicity: 4, ground: 'a4A2g', ion: 'Cr(III)' } as const;
const TRIPLET = { electrons: 8, geometry: 'octahedral', spin: 'triplet', multiplicity: 3, ground: 'a3A2g', ion: 'Ni(II)' } as const;

export const SAMPLES: readonly Sample[] = [
  { id: 'cr-aq6', formula: '[Cr(H2O)6]3+', ...QUARTET, ligands: { aqua: 6 }, delta: 17310, racahB: 712, labels: ['a4T2g', 'a4T1g'], shift: [12, -20], charge: 3, id2: 'solid-77' },
  { id: 'cr-am6', formula: '[Cr(NH3)6]3+', ...QUARTET, ligands: { ammine: 6 }, delta: 21560, racahB: 652, labels: ['a4T2g', 'a4T1g', 'a2Eg'], shift: [-15, 30, -210], charge: 3, verdict: 'untested', sample: '[Cr(NH3)6](ClO4)3', hazard: ['PERCHLORATE', 'Caution: perchlorate. Perchlorate salts of complexes with organic or nitrogen ligands may explode when dry or heated. This page is a data record, not a preparation. Before handling, consult the safety data sheet and your local rules, and make your own risk assessment with a qualified person.'] },
  { id: 'cr-en3', formula: '[Cr(en)3]3+', ...QUARTET, ligands: { en: 3 }, delta: 21900, racahB: 635, labels: ['a4T2g', 'a4T1g'], shift: [5, 8], charge: 3 },
  { id: 'cr-cl2-en2', formula: 'cis-[CrCl2(en)2]+', ...QUARTET, ligands: { chlorido: 2, en: 2 }, delta: 18600, racahB: 640, labels: ['a4T2g', 'a4T1g', 'b4T1g'], shift: [60, -140, -900], charge: 1, verdict: 'strained' },
  { id: 'ni-aq6', formula: '[Ni(H2O)6]2+', ...TRIPLET, ligands: { aqua: 6 }, delta: 8500, racahB: 930, labels: ['a3T2g', 'a3T1g', 'b3T1g'], shift: [-40, 60, 20], charge: 2, verdict: 'tested' },
  { id: 'ni-am6', formula: '[Ni(NH3)6]2+', ...TRIPLET, ligands: { ammine: 6 }, delta: 10800, racahB: 890, labels: ['a3T2g', 'a3T1g', 'b3T1g'], shift: [20, -30, 10], charge: 2, verdict: 'tested' },
  { id: 'co-cl4', formula: '[CoCl4]2-', electrons: 7, geometry: 'tetrahedral', spin: 'quartet', multiplicity: 4, ground: 'a4A2', ion: 'Co(II)', ligands: { chlorido: 4 }, delta: 3250, racahB: 705, labels: ['a4T1', 'b4T1'], shift: [30, -10], charge: -2 },
  { id: 'ti-aq6', formula: '[Ti(H2O)6]3+', electrons: 1, geometry: 'octahedral', spin: 'doublet', multiplicity: 2, ground: 'a2T2g', ion: 'Ti(III)', ligands: { aqua: 6 }, delta: 20200, racahB: 700, labels: ['a2Eg'], shift: [0], charge: 3, withheldB: 'One d electron: no repulsion parameter enters.' },
];

const LIGANDS = [
  ['ammine', 'ammine', 'NH3', null, ['ammonia'], 0, 1, ['N']], ['aqua', 'aqua', 'H2O', null, ['water'], 0, 1, ['O']],
  ['chlorido', 'chlorido', 'Cl-', null, ['chloro', 'chloride'], -1, 1, ['Cl']], ['en', 'ethane-1,2-diamine', 'C2H8N2', 'en', ['ethylenediamine'], 0, 2, ['N', 'N']],
] as const;

/** The text that stands for the typed record of a complex of the sample; its hash is in the database. */
export const sampleRecordText = (id: string): string => `# ${id}: the sample is written as rows, not typed\n`;

/** Writes a small invented collection under the real schema, for tests of the site alone. */
export function writeSampleDatabase(file: string, options: { readonly complexes?: boolean; readonly hostile?: string } = {}): string {
  mkdirSync(dirname(file), { recursive: true });
  if (existsSync(file)) rmSync(file);
  const database = new Database(file);
  database.exec(readFileSync(resolve('scripts/database/schema.sql'), 'utf8'));
  const put = (table: string, given: Readonly<Record<string, unknown>>): void => {
    const row = { ...neutralValues(database, table), ...given };
    const keys = Object.keys(row);
    database.prepare(`INSERT INTO ${table} (${keys.join(', ')}) VALUES (${keys.map(() => '?').join(', ')})`).run(...Object.values(row));
  };
  const hostile = options.hostile ?? null;
  const meta = {
    schema: '1', 'group.title': hostile ?? 'Sample bands', 'group.name': 'The invented sample group', 'group.licence': 'CC-BY-4.0', 'group.url': 'https://example.org/bands/',
    'group.release': '2026.1', 'group.started': '2026-01-01', 'group.demonstration': 'true', 'group.contact': 'steward@example.org',
  };
  for (const [key, value] of Object.entries(meta)) put('meta', { key, value });
  put('person', { number: 1, name: hostile ?? 'T. Linde', orcid: null, initials: 'TL' });
  put('policy', {
    id: 'sample-0123abcd', name: 'sample', in_force: 1, C_over_B: 4.5, C_over_B_u: 0.9, C_over_B_per_ion: '{}', floor_general: 150, floor_spin_flip: 250, floor_two_electron: 600,
    ceiling_Delta: 0.1, ceiling_B: 0.15, ceiling_C: 0.15, differential_Delta: 50, differential_B: 0.015, free_ion_set: 'published', rival_margin: 4, default_u_maximum: 80, default_u_line: 15,
  });
  put('source', { id: 'sample-1998', file: 'sources/sample-1998.yaml', reference: hostile ?? 'A. Sample, Invented J. 1998, 1, 1-9.', authors: '["A. Sample"]', title: 'Invented', journal: 'Invented J.', year: '1998', volume: '1', pages: '1-9', doi: null, url: null });
  for (const [id, name, formula, abbreviation, synonyms, charge, denticity, donors] of LIGANDS)
    put('ligand', { id, file: `ligands/${id}.yaml`, name: hostile ?? name, formula, abbreviation, synonyms: JSON.stringify(synonyms), charge, denticity, donors: JSON.stringify(donors), smiles: null, notes: hostile });
  const ions = [['Cr(III)', 'Cr', 3, 3, 918], ['Ni(II)', 'Ni', 2, 8, 1030], ['Co(II)', 'Co', 2, 7, 971], ['Ti(III)', 'Ti', 3, 1, null]] as const;
  for (const [name, metal, oxidation, electrons, B0] of options.complexes === false ? [] : ions) {
    put('ion', { name, metal, oxidation, electrons, shell: '3d' });
    if (B0 !== null) put('free_ion', { set_name: 'published', ion: name, B0, C0: 4.5 * B0, kind: 'as printed', source: 'Joergensen via Jolly, Modern Inorganic Chemistry' });
  }
  for (const sample of options.complexes === false ? [] : SAMPLES) putComplex(put, sample, hostile);
  if (options.complexes !== false) putDetails(put, (sql) => { database.exec(sql); });
  put('release', { id: '2026.1', doi: null, licence: 'CC-BY-4.0', policy: 'sample-0123abcd', complexes: SAMPLES.length, measurements: SAMPLES.length + 1 });
  database.close();
  return file;
}

/** 0 or empty text for columns that must hold something: what a test does not speak of need not be written in it. */
function neutralValues(database: Database.Database, table: string): Readonly<Record<string, unknown>> {
  const columns = database.prepare<[], { name: string; type: string; notnull: number; pk: number }>(`PRAGMA table_info(${table})`).all();
  const { sql } = database.prepare<[string], { sql: string }>('SELECT sql FROM sqlite_schema WHERE name = ?').get(table)!;
  return Object.fromEntries(columns.filter(({ notnull, pk }) => notnull === 1 && pk === 0)
    .map(({ name, type }) => [name, type !== 'TEXT' ? 0 : sql.includes(`json_valid(${name})`) ? '[]' : '']));
}

function putComplex(put: (table: string, row: Readonly<Record<string, unknown>>) => void, sample: Sample, hostile: string | null): void {
  const { id, ion, geometry } = sample;
  put('complex', {
    id, file: `complexes/${id}.yaml`, hash: createHash('sha256').update(sampleRecordText(id)).digest('hex'), formula: sample.formula, name: hostile, charge: sample.charge, ion, geometry, fitted: 1, isomer: id.includes('cl2') ? 'cis' : 'none',
    spin: sample.spin, multiplicity: sample.multiplicity, spin_typed: sample.spin, spin_assumed: 0, notes: hostile,
  });
  Object.entries(sample.ligands).forEach(([ligand, count], index) => put('complex_ligand', { complex: id, ligand, number: index + 1, count, bound: ligand === 'en' ? 2 : 1 }));
  let cautions = 0;
  if (sample.hazard) put('caution', { complex: id, number: ++cautions, subject: 'hazard', measurement: null, reading: null, code: sample.hazard[0], found_in: `the sample of ${id}/aq-295`, text: sample.hazard[1] });
  const measurements = sample.id2 ? ['aq-295', sample.id2] : ['aq-295'];
  for (const [index, measurement] of measurements.entries()) {
    const solution = index === 0;
    put('measurement', {
      complex: id, id: measurement, number: index + 1, sample: hostile ?? sample.sample ?? null, phase: solution ? 'solution' : 'crystal', medium: solution ? hostile ?? 'water' : null, host: null,
      temperature_K: solution ? 295 : 77, temperature_u_K: solution ? 5 : 1, temperature_typed: solution ? 'room' : '77(1) K', temperature_assumed: solution ? 1 : 0,
      technique: 'absorption', scanned_typed: '300 - 1100 nm', notebook: hostile ?? '17, p. 42', measured_by: 'TL', measured_on: '2024-03-11', source: null, source_place: null,
      concentration: null, path_length: null, batch: null, raw_file: 'spectra/x.csv', raw_hash: 'cd'.repeat(32), magnetic_moment: null, epr_g: null, innocence_doubtful: 0, nuclearity: 1,
      policy: 'sample-0123abcd', policy_reason: null, notes: hostile,
    });
    put('observed_range', { complex: id, measurement, kind: 'scanned', number: 1, low: 9090.9, high: 33333.3 });
    if (id === 'cr-aq6') put('observed_range', { complex: id, measurement, kind: 'absent', number: 1, low: 28600, high: 33300 });
    const shift = index * 120;
    const delta = sample.delta + shift;
    const field = levels({ electrons: sample.electrons, geometry }, { delta, racahB: sample.racahB, racahC: 4.5 * sample.racahB });
    const reading = { complex: id, measurement, reading: 1 };
    put('reading', {
      complex: id, measurement, number: 1, chosen: 1, verdict: sample.withheldB ? 'untested' : sample.verdict ?? 'untested', reason: hostile ?? 'No spare band: no test possible.', assignment: 'typed',
      geometry, multiplicity: sample.multiplicity, ground: sample.ground, Delta_over_B: sample.withheldB ? null : delta / sample.racahB, chi2: 0.31, bands_used: sample.labels.length,
      spare_bands: Math.max(0, sample.labels.length - 2), rms_residual: 41.2, C_over_B: sample.withheldB ? null : 4.5, C_over_B_u: sample.withheldB ? null : 0.9, C_over_B_origin: sample.withheldB ? null : 'policy', free_ion_set: 'published',
      policy: 'sample-0123abcd', measure_next: sample.labels.length < 3 ? 'The third band, expected at 36 000 to 40 000 cm-1, would cut u(B) most.' : null,
    });
    sample.labels.forEach((label, place) => {
      const number = place + 1;
      const calculated = field.find((level) => level.label === label)!.energy;
      const observed = 10 * Math.round((calculated + sample.shift[place]!) / 10);
      const inNanometres = place === 1;
      const line = label === 'a2Eg';
      put('band', {
        complex: id, measurement, number, position_typed: hostile ?? (inNanometres ? `${(1e7 / observed).toFixed(1)} nm` : `${observed}(60) cm-1`), position: observed, u_minus: inNanometres ? null : 60, u_plus: inNanometres ? null : 60, half_digit: 5,
        coverage_not_stated: 0, kind: line ? 'line' : place === 2 ? 'shoulder' : 'maximum', side: place === 2 && !line ? 'higher' : null, width_typed: null, width: line ? null : 3100, epsilon: line ? 0.5 : 36, strength: null, degeneracy: null,
        deconvoluted: 0, role: 'transition', terms: JSON.stringify([label.slice(1)]), left_out: null, notes: null,
      });
      put('reading_band', {
        ...reading, number, label, observed, u_minus: 60, u_plus: 60, u_assumed: inNanometres ? 1 : 0, floor: 150, used: line ? 0 : 1, calculated, residual: observed - calculated,
        gradient_Delta: 1, gradient_B: 0, gradient_C: 0,
      });
      put('reading_band_member', { ...reading, reading_band: number, band: number });
    });
    const next = sample.labels.length + 1;
    put('band', { complex: id, measurement, number: next, position_typed: '42000 cm-1', position: 42000, u_minus: null, u_plus: null, half_digit: 500, coverage_not_stated: 0, kind: 'shoulder', side: 'higher', width_typed: null, width: null, epsilon: 9000, strength: null, degeneracy: null, deconvoluted: 0, role: 'CT', terms: '[]', left_out: null, notes: null });
    put('not_fitted', { ...reading, band: next, reason: hostile ?? 'charge transfer' });
    const b0 = ion === 'Cr(III)' ? 918 : ion === 'Ni(II)' ? 1030 : 971;
    const withheld = sample.withheldB ? { value: null, u: null, u_total: null, standing: 'withheld', reason: sample.withheldB } : null;
    put('parameter', { ...reading, name: 'Delta', value: delta, u: 58, u_total: 162, standing: 'fitted', reason: null });
    put('parameter', { ...reading, name: 'B', ...(withheld ?? { value: sample.racahB, u: 12, u_total: 31, standing: 'fitted', reason: null }) });
    put('parameter', { ...reading, name: 'C', value: null, u: null, u_total: null, standing: 'withheld', reason: 'C is assumed from C/B, not fitted.' });
    put('parameter', { ...reading, name: 'beta', ...(withheld ?? { value: sample.racahB / b0, u: 12 / b0, u_total: 31 / b0, standing: 'fitted', reason: null }) });
    if (!sample.withheldB) put('correlation', { ...reading, first: 'Delta', second: 'B', value: -0.62 });
    put('branch', { ...reading, number: 1, Delta: delta, B: sample.racahB, C: 4.5 * sample.racahB, chi2: 0.31, chosen: 1 });
    for (const level of field.filter((one) => one.multiplicity === sample.multiplicity && one.energy > 0 && !sample.labels.includes(one.label)).slice(0, 3))
      put('predicted_band', { ...reading, label: level.label, position: level.energy, u: 310, spin_allowed: 1, looked: level.energy > 33333 ? 'outside' : 'inside' });
    if (sample.verdict === 'strained') put('caution', { complex: id, number: ++cautions, subject: 'spectral', measurement, reading: 1, code: 'TWO_ELECTRON_BAND', found_in: null, text: 'The third band moves two electrons; it lies 700 to 1050 below the prediction from the other two.' });
  }
  if (id === 'cr-en3') put('quoted', { complex: id, measurement: 'aq-295', number: 1, parameter: 'Delta', value: 21850, typed: '21850 cm-1', source: 'sample-1998', source_place: 'p. 12' });
}
