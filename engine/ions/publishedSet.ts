import type { FreeIon } from './types.ts';

const tableOfB = 'B0: C. K. Jørgensen, as printed in W. L. Jolly, Modern Inorganic Chemistry, table of Racah B';
const memoryOfB = 'B0: from memory, print not seen';
const memoryOfHeavy = 'B0: from memory, print not seen, good to about 10 %';
const ratios = 'C0 = B0 x C0/B0 of Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 766 (1954), from memory';
const ratioOfHeavy = 'C0 = 4 B0, from memory, a round ratio';
const noRatio = 'no C0';

/** Ion, B0 in cm-1, C0/B0 or null, where B0 comes from, where the ratio comes from. */
type Row = readonly [ion: string, racahB0: number, ratio: number | null, sourceOfB: string, sourceOfRatio: string];

const rows: readonly Row[] = [
  ['Ti(II)', 695, 4.19, tableOfB, ratios],
  ['V(II)', 755, 4.31, tableOfB, ratios],
  ['V(III)', 861, 4.42, tableOfB, ratios],
  ['Cr(II)', 810, 4.40, tableOfB, ratios],
  ['Cr(III)', 918, 4.50, tableOfB, ratios],
  ['Mn(II)', 860, 4.48, tableOfB, ratios],
  ['Mn(III)', 965, 4.61, tableOfB, ratios],
  ['Mn(IV)', 1064, 4.62, memoryOfB, ratios],
  ['Fe(II)', 917, 4.41, tableOfB, ratios],
  ['Fe(III)', 1015, 4.73, tableOfB, ratios],
  ['Co(II)', 971, 4.63, tableOfB, ratios],
  ['Co(III)', 1065, 4.81, tableOfB, ratios],
  ['Ni(II)', 1030, 4.71, tableOfB, ratios],
  ['Ni(III)', 1115, 4.89, tableOfB, ratios],
  ['Cu(II)', 1240, null, memoryOfB, noRatio],
  ['Mo(III)', 610, 4, memoryOfHeavy, ratioOfHeavy],
  ['Tc(IV)', 700, 4, memoryOfHeavy, ratioOfHeavy],
  ['Ru(II)', 620, 4, memoryOfHeavy, ratioOfHeavy],
  ['Rh(III)', 720, 4, memoryOfHeavy, ratioOfHeavy],
  ['Re(IV)', 650, 4, memoryOfHeavy, ratioOfHeavy],
  ['Ir(III)', 660, 4, memoryOfHeavy, ratioOfHeavy],
  ['Pt(IV)', 720, 4, memoryOfHeavy, ratioOfHeavy],
];

/** The set `published`: free-ion B0 as printed, in cm-1; C0 to whole cm-1 from the printed ratio. Each row names its source. */
export const publishedSet: readonly FreeIon[] = rows.map(([ion, racahB0, ratio, sourceOfB, sourceOfRatio]) => ({
  set: 'published',
  ion,
  racahB0,
  racahC0: ratio === null ? null : Math.round(racahB0 * ratio),
  kind: 'as printed',
  source: `${sourceOfB}; ${sourceOfRatio}`,
}));
