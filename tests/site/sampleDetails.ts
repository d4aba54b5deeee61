/** Rows of one table, keyed by column; what is not named is neutral. */
type Put = (table: string, row: Readonly<Record<string, unknown>>) => void;

const RIVALLED = { complex: 'cr-am6', measurement: 'aq-295' } as const;

/**
 * What stands behind the chosen readings of the sample: a rival with its evidence, stress, advice, an audit, placements, floors and
 * the review list. All invented; called once the complexes are there.
 */
export function putDetails(put: Put, change: (sql: string) => void): void {
  putRival(put);
  const chosen = { ...RIVALLED, reading: 1 };
  put('evidence', { ...chosen, number: 1, code: 'misfit', penalty: 0.31, text: 'misfit, chi-square 0.3' });
  put('evidence', { ...chosen, number: 2, code: 'parameters', penalty: 4, text: '2 fitted parameters' });
  change(`UPDATE reading SET score = 4.31, rank = 2, remarks = '["The field lowers the ground level 4A2g by 1.20 Delta."]', sentence = 'The bands at 21\u2009560\u2009cm⁻¹ (4T2g) give Delta = 21\u2009560(160) cm⁻¹ and B = 652(31) cm⁻¹.' WHERE complex = 'cr-am6' AND number = 1`);
  change(`UPDATE reading_band SET leverage = 0.5, gradient_Delta = 1, gradient_B = 7.25 WHERE complex = 'cr-am6' AND reading = 1 AND used = 1`);
  change(`UPDATE parameter SET low = 610.2, high = 689.7 WHERE complex = 'cr-am6' AND reading = 1 AND name = 'B'`);
  for (const [parameter, then] of [['B', 16], ['C', 90]] as const)
    put('helpful_band', { ...chosen, number: 1, parameter, label: 'b4T1g', low: 44000, high: 48000, u_now: parameter === 'B' ? 31 : null, u_then: then, sentence: 'b4T1g, expected 44\u2009000 to 48\u2009000 cm⁻¹, would cut u(B) from 31 to 16 cm⁻¹ and fix C to about ±90 cm⁻¹.' });
  put('stress_pair', { ...chosen, first_number: 1, second_number: 2, first: 'a4T2g', second: 'a4T1g', Delta: 21550, B: 655.4 });
  put('stress_pair', { ...chosen, first_number: 1, second_number: 3, first: 'a4T2g', second: 'a2Eg', Delta: null, B: null });
  put('stress_pair', { ...chosen, first_number: 2, second_number: 3, first: 'a4T1g', second: 'a2Eg', Delta: 21590, B: 648 });
  put('stress_left_out', { ...chosen, number: 1, label: 'a4T2g', Delta: 21700, B: 640, C: 2900, predicted: 21700, z: -0.8 });
  put('quoted', { complex: 'ni-am6', measurement: 'aq-295', number: 1, parameter: 'Delta', value: 1080, typed: '1080 cm-1', source: 'sample-1998', source_place: null });
  put('audit', { complex: 'ni-am6', measurement: 'aq-295', number: 1, parameter: 'Delta', quoted: 1080, refitted: 10800, u_total: 162, difference: -9720, z: -60, cause: 'Likely Dq was printed as Delta.' });
  put('audit', { complex: 'cr-en3', measurement: 'aq-295', number: 1, parameter: 'Delta', quoted: 21850, refitted: 21900, u_total: 162, difference: -50, z: -0.3, cause: null });
  const placed = { complex: 'cr-cl2-en2', measurement: 'aq-295' };
  put('placement', { ...placed, parameter: 'Delta', method: 'average environment', predicted: 18500, u: 900, z: 0.1 });
  put('placement', { ...placed, parameter: 'Delta', method: 'factors', predicted: null, u: null, z: null, reason: 'no factor of chlorido: no complex with it is in the fit' });
  put('placement', { ...placed, parameter: 'beta', method: 'factors', predicted: null, u: null, z: null, reason: 'no factor of chlorido: no complex with it is in the fit' });
  put('placement', { complex: 'cr-aq6', measurement: 'aq-295', parameter: 'Delta', method: 'factors', predicted: 15000, u: 500, z: 4.2 });
  put('floor_factor', { ion: 'Cr(III)', geometry: 'octahedral', kappa: 2.46, u: 0.33, spare_bands: 28 });
  put('review', { number: 1, kind: 'strained', complex: 'cr-cl2-en2', measurement: 'aq-295', text: 'Strained: 3 bands with 1 spare disagree.' });
  put('review', { number: 2, kind: 'near rival', ...RIVALLED, text: 'Another reading fits these bands as well: a4T1g 27\u2009000.' });
}

function putRival(put: Put): void {
  const reading = { ...RIVALLED, reading: 2 };
  put('reading', {
    ...RIVALLED, number: 2, chosen: 0, verdict: 'untested', reason: 'Untested.', assignment: 'proposed', geometry: 'tetrahedral', multiplicity: 4, ground: 'a4T1', bands_used: 1, spare_bands: 0,
    free_ion_set: 'published', policy: 'sample-0123abcd', score: 13.4, ranking: 'Ranks lower by 9.1; against it: one band is left unexplained.',
  });
  put('reading_band', { ...reading, number: 1, label: 'a4T2', observed: 21550, u_minus: 60, u_plus: 60, u_assumed: 0, floor: 150, used: 1, calculated: 21550, residual: 0, leverage: 1, gradient_Delta: 1, gradient_B: 0, gradient_C: 0 });
  put('reading_band_member', { ...reading, reading_band: 1, band: 1 });
  put('predicted_band', { ...reading, label: 'a4A2', position: 38000, u: 900, spin_allowed: 1, looked: 'outside' });
  put('parameter', { ...reading, name: 'Delta', value: 24000, u: 90, u_total: 1900, standing: 'assumed', reason: 'beta = 0.75(12) was assumed' });
  for (const name of ['B', 'C', 'beta']) put('parameter', { ...reading, name, value: null, u: null, u_total: null, standing: 'withheld', reason: 'one band fixes one number' });
  put('evidence', { ...reading, number: 1, code: 'parameters', penalty: 4.4, text: '2 fitted parameters' });
  put('evidence', { ...reading, number: 2, code: 'left over', penalty: 9, text: 'one band is left unexplained' });
}
