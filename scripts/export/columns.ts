/** One column of results.csv and results.json. */
export interface Column {
  readonly name: string;
  /** UCUM code; "1" for a pure number; null for text. */
  readonly unit: string | null;
  readonly meaning: string;
}

/** The columns of the results, in order: those of the database's `result` view, with formula and hazards added. */
export const resultColumns: readonly Column[] = [
  { name: 'complex', unit: null, meaning: 'id of the complex' },
  { name: 'measurement', unit: null, meaning: 'id of the measurement within the complex' },
  { name: 'formula', unit: null, meaning: 'formula as typed' },
  { name: 'ion', unit: null, meaning: 'metal ion' },
  { name: 'geometry', unit: null, meaning: 'geometry' },
  { name: 'spin', unit: null, meaning: 'multiplicity of the ground level, as a word' },
  { name: 'phase', unit: null, meaning: 'phase of the sample' },
  { name: 'temperature_K', unit: 'K', meaning: 'temperature; empty: not recorded' },
  { name: 'verdict', unit: null, meaning: 'refused, not determinable, strained, assumed, untested or tested' },
  { name: 'Delta', unit: 'cm-1', meaning: 'ligand-field splitting; empty: withheld' },
  { name: 'Delta_u', unit: 'cm-1', meaning: 'standard uncertainty of Delta from the readings alone' },
  { name: 'Delta_u_total', unit: 'cm-1', meaning: 'standard uncertainty of Delta with the model floor and an assumed C/B' },
  { name: 'Delta_standing', unit: null, meaning: 'fitted, assumed or withheld' },
  { name: 'B', unit: 'cm-1', meaning: 'Racah B; empty: withheld' },
  { name: 'B_u', unit: 'cm-1', meaning: 'standard uncertainty of B from the readings alone' },
  { name: 'B_u_total', unit: 'cm-1', meaning: 'standard uncertainty of B with the model floor and an assumed C/B' },
  { name: 'B_standing', unit: null, meaning: 'fitted, assumed or withheld' },
  { name: 'C', unit: 'cm-1', meaning: 'Racah C; empty: withheld' },
  { name: 'C_u', unit: 'cm-1', meaning: 'standard uncertainty of C from the readings alone' },
  { name: 'C_u_total', unit: 'cm-1', meaning: 'standard uncertainty of C with the model floor' },
  { name: 'C_standing', unit: null, meaning: 'fitted, assumed or withheld' },
  { name: 'beta', unit: '1', meaning: 'B over B0 of the free ion; empty: withheld' },
  { name: 'beta_u_total', unit: '1', meaning: 'standard uncertainty of beta from that of B; B0 is taken as exact' },
  { name: 'beta_standing', unit: null, meaning: 'fitted, assumed or withheld' },
  { name: 'corr_Delta_B', unit: '1', meaning: 'correlation of Delta with B, from the total covariance' },
  { name: 'Delta_over_B', unit: '1', meaning: 'Delta over B' },
  { name: 'bands_used', unit: '1', meaning: 'bands that the fit used' },
  { name: 'spare_bands', unit: '1', meaning: 'bands used beyond the number of free parameters' },
  { name: 'rms_residual', unit: 'cm-1', meaning: 'root mean square of observed minus calculated' },
  { name: 'free_ion_set', unit: null, meaning: 'named set that B0 is taken from' },
  { name: 'policy', unit: null, meaning: 'id of the fitting policy' },
  { name: 'cautions', unit: null, meaning: 'codes of all cautions, hazards first, separated by spaces' },
  { name: 'hazards', unit: null, meaning: 'hazard cautions in words; empty does not mean that there is no hazard' },
];
