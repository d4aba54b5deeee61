import { readComment } from './dictionary/comment.ts';
import type { ColumnEntry, ColumnType, TableEntry } from './dictionary/types.ts';

/** One column of results.csv and results.json. */
export interface Column extends ColumnEntry {
  /** UCUM code; "1" for a pure number; null for text. */
  readonly unit: string | null;
}

/** `said` is written as the comments of schema.sql are: [unit, range] meaning. */
function column(name: string, type: ColumnType, said: string, more: Partial<Pick<ColumnEntry, 'required' | 'values'>> = {}): Column {
  const { units, limits, meaning } = readComment(said);
  return { name, type, required: false, values: null, ...more, units, limits, meaning, unit: units[0] ?? null };
}

const always = { required: true } as const;
const verdicts = ['refused', 'not determinable', 'strained', 'assumed', 'untested', 'tested'] as const;
const standing = { required: true, values: ['measured', 'fitted', 'assumed', 'predicted', 'quoted', 'withheld'] } as const;

/**
 * The columns of the results, in order: those of the database's `result` view with the formula put in, then what a reader of the
 * one wide file needs beside them.
 */
export const resultColumns: readonly Column[] = [
  column('complex', 'text', 'id of the complex', always),
  column('measurement', 'text', 'id of the measurement within the complex', always),
  column('formula', 'text', 'formula as typed', always),
  column('ion', 'text', 'metal ion', always),
  column('geometry', 'text', 'geometry', always),
  column('spin', 'text', 'multiplicity of the ground level, as a word'),
  column('phase', 'text', 'phase of the sample', { required: true, values: ['solution', 'solid', 'crystal', 'glass', 'film'] }),
  column('temperature_K', 'real', '[K, > 0] temperature; empty: not recorded'),
  column('verdict', 'text', 'refused, not determinable, strained, assumed, untested or tested', { required: true, values: verdicts }),
  column('Delta', 'real', '[cm-1, > 0] ligand-field splitting; empty: withheld'),
  column('Delta_u', 'real', '[cm-1, >= 0] standard uncertainty of Delta from the readings alone'),
  column('Delta_u_total', 'real', '[cm-1, >= 0] standard uncertainty of Delta with the model floor and an assumed C/B'),
  column('Delta_standing', 'text', 'fitted, assumed or withheld', standing),
  column('B', 'real', '[cm-1, > 0] Racah B; empty: withheld'),
  column('B_u', 'real', '[cm-1, >= 0] standard uncertainty of B from the readings alone'),
  column('B_u_total', 'real', '[cm-1, >= 0] standard uncertainty of B with the model floor and an assumed C/B'),
  column('B_standing', 'text', 'fitted, assumed or withheld', standing),
  column('C', 'real', '[cm-1, > 0] Racah C; empty: withheld'),
  column('C_u', 'real', '[cm-1, >= 0] standard uncertainty of C from the readings alone'),
  column('C_u_total', 'real', '[cm-1, >= 0] standard uncertainty of C with the model floor'),
  column('C_standing', 'text', 'fitted, assumed or withheld', standing),
  column('beta', 'real', '[1, > 0] B over B0 of the free ion; empty: withheld'),
  column('beta_u_total', 'real', '[1, >= 0] standard uncertainty of beta from that of B; B0 is taken as exact'),
  column('beta_standing', 'text', 'fitted, assumed or withheld', standing),
  column('corr_Delta_B', 'real', '[1, -1 to 1] correlation of Delta with B, from the total covariance'),
  column('Delta_over_B', 'real', '[1, >= 0] Delta over B'),
  column('bands_used', 'integer', '[1, >= 0] bands that the fit used', always),
  column('spare_bands', 'integer', '[1, >= 0] bands used beyond the number of free parameters', always),
  column('rms_residual', 'real', '[cm-1, >= 0] root mean square of observed minus calculated'),
  column('free_ion_set', 'text', 'named set that B0 is taken from', always),
  column('policy', 'text', 'id of the fitting policy', always),
  column('cautions', 'text', 'codes of all cautions, hazards first, separated by spaces', always),
  column('hazards', 'text', 'hazard cautions in words; empty does not mean that there is no hazard', always),
  column('beta_u', 'real', '[1, >= 0] standard uncertainty of beta from the readings alone'),
  column('corr_Delta_C', 'real', '[1, -1 to 1] correlation of Delta with C; empty: C is not fitted'),
  column('corr_B_C', 'real', '[1, -1 to 1] correlation of B with C; empty: C is not fitted'),
  column('reason', 'text', 'one sentence: why this verdict', always),
  column('Delta_reason', 'text', 'why Delta is withheld or assumed'),
  column('B_reason', 'text', 'why B is withheld or assumed'),
  column('C_reason', 'text', 'why C is withheld or assumed'),
  column('beta_reason', 'text', 'why beta is withheld or assumed'),
  column('isomer', 'text', 'cis, trans, fac, mer or none', always),
  column('charge', 'integer', '[1] charge of the complex', always),
  column('ligands', 'text', 'ids of the ligands with their numbers: "aqua:1 ammine:5"', always),
  column('medium', 'text', 'solvent or matrix'),
  column('technique', 'text', 'how the spectrum was taken', { values: ['absorption', 'diffuse reflectance', 'excitation', 'emission', 'MCD'] }),
  column('source', 'text', 'id of the publication that the readings come from; empty: the group\'s own notebook'),
  column('address', 'text', 'address of the measurement on the site', always),
];

/** The results as a table of the data dictionary. */
export const resultTable: TableEntry = {
  name: 'results',
  meaning: 'One row for each measurement\'s chosen reading: the flat file. A withheld number is empty and its standing says so.',
  columns: resultColumns,
  key: ['complex', 'measurement'],
  references: [
    { columns: ['complex', 'measurement'], table: 'measurement', targets: ['complex', 'id'] },
    { columns: ['source'], table: 'source', targets: ['id'] },
  ],
};
