import { expect, test } from 'vitest';
import { levels } from '#engine';
import type { FieldIon } from '#engine';
import { energyAbove } from './levelEnergy.ts';
import { checkTable, reportStandings } from './table.ts';
import type { Row } from './table.ts';

reportStandings('crossings and strong-field forms');

const octahedral = (electrons: number): FieldIon => ({ electrons, geometry: 'octahedral' });

/** Delta/B between 1 and 60 at which two levels of an octahedral ion cross, by halving to 1e-12. Throws where they do not. */
function crossing(electrons: number, cOverB: number, upper: string, lower: string): number {
  const gap = (delta: number) => energyAbove(octahedral(electrons), { delta, racahB: 1, racahC: cOverB }, upper, lower);
  let [below, above] = [1, 60];
  if (Math.sign(gap(below)) === Math.sign(gap(above))) throw new Error(`d${electrons}: ${upper} and ${lower} do not cross at C/B ${cOverB}`);
  const side = Math.sign(gap(below));
  while (above - below > 1e-12 * above) {
    const middle = (below + above) / 2;
    if (middle === below || middle === above) break;
    if (Math.sign(gap(middle)) === side) below = middle;
    else above = middle;
  }
  return (below + above) / 2;
}

const independent = 'independent full-configuration program';
// Diagrams are read by eye from the print: half a unit of Delta/B, one where the print gives a range.
const diagrams = 'Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 766 (1954), diagrams read by eye';

test('the ground term changes where it should', () => {
  const d4 = crossing(4, 4.61, '5E', '3T1');
  const d5 = crossing(5, 4.477, '6A1', '2T2');
  const d6 = crossing(6, 4.8, '5T2', '1A1');
  const d7 = crossing(7, 4.63, '4T1', '2E');
  checkTable([
    { name: 'd4 5E/3T1 at C/B 4.61', got: d4, expected: 27.34, tolerance: 0.005, standing: 'computed', source: independent },
    { name: 'd5 6A1/2T2 at C/B 4.477', got: d5, expected: 28.29, tolerance: 0.005, standing: 'computed', source: independent },
    { name: 'd4 diagram', got: d4, expected: 27, tolerance: 0.5, standing: 'memory', source: diagrams },
    { name: 'd5 diagram', got: d5, expected: 28, tolerance: 0.5, standing: 'memory', source: diagrams },
    { name: 'd6 diagram, C/B 4.8', got: d6, expected: 20, tolerance: 0.5, standing: 'memory', source: diagrams },
    { name: 'd7 diagram, C/B 4.63', got: d7, expected: 21.5, tolerance: 1, standing: 'memory', source: diagrams },
  ]);
});

test('on either side of the crossing the named level is the ground level of the whole ion', () => {
  for (const [electrons, cOverB, high, low] of [[4, 4.61, '5Eg', '3T1g'], [5, 4.477, '6A1g', '2T2g'], [6, 4.8, '5T2g', '1A1g'], [7, 4.63, '4T1g', '2Eg']] as const) {
    const at = crossing(electrons, cOverB, high.replace('g', ''), low.replace('g', ''));
    const ground = (delta: number) => levels(octahedral(electrons), { delta, racahB: 1, racahC: cOverB })[0]?.label.slice(1);
    expect(ground(at - 0.01), `d${electrons} below`).toBe(high);
    expect(ground(at + 0.01), `d${electrons} above`).toBe(low);
  }
});

test('2E and 4T2 of d3, A2 and T1(P) of d2 cross where an independent program says', () => {
  const row = (name: string, got: number, expected: number, tolerance: number): Row => ({ name, got, expected, tolerance, standing: 'computed', source: independent });
  checkTable([
    row('d3 2E = 4T2 at C/B 4', crossing(3, 4, '2E', '4T2'), 19.15, 0.005),
    row('d3 2E = 4T2 at C/B 5', crossing(3, 5, '2E', '4T2'), 22.32, 0.005),
    row('d2 A2 = T1(P), exact', crossing(2, 4, '3A2', '3T1 2'), 13.5, 1e-9),
    row('d2 A2 = T1(P) does not feel C', crossing(2, 6, '3A2', '3T1 2'), 13.5, 1e-9),
  ]);
});

// The printed strong-field forms are tested for how far off they are; nothing is ever fitted with them.
const forms = 'Y. Tanabe and S. Sugano, J. Phys. Soc. Jpn. 9, 766 (1954), strong-field forms';

test('low-spin d6: the printed forms lie 400 to 800 cm-1 too high at Delta/B 37', () => {
  const rows: Row[] = [];
  for (const cOverB of [4, 4.4, 4.81]) {
    const [b, c, d] = [620, 620 * cOverB, 620 * 37];
    const exact = (level: string) => energyAbove(octahedral(6), { delta: d, racahB: b, racahC: c }, level, '1A1 1');
    const row = (name: string, got: number): Row => ({ name: `${name} at C/B ${cOverB}`, got, expected: 600, tolerance: 200, standing: 'computed', source: independent });
    rows.push(
      row('1T1 form above exact', d - c + (86 * b * b) / d - exact('1T1 1')),
      row('1T2 form above exact', d + 16 * b - c + (2 * b * b) / d - exact('1T2 1')),
    );
  }
  checkTable(rows);
});

test('low-spin d6: as Delta grows the second-order terms become exactly 86 and 2 B^2/Delta at C = 4B', () => {
  const d = 1e5;
  const exact = (level: string) => energyAbove(octahedral(6), { delta: d, racahB: 1, racahC: 4 }, level, '1A1 1');
  checkTable([
    { name: '1T1: (E - D + C) D/B^2', got: (exact('1T1 1') - d + 4) * d, expected: 86, tolerance: 0.05, standing: 'memory', source: forms },
    { name: '1T2: (E - D - 16B + C) D/B^2', got: (exact('1T2 1') - d - 16 + 4) * d, expected: 2, tolerance: 0.05, standing: 'memory', source: forms },
  ]);
});

test('d3: 9B + 3C - 50B^2/D gives 2E to a quarter of B from Delta/B 30 to 60', () => {
  const rows: Row[] = [];
  for (const cOverB of [4, 4.5, 5]) {
    for (const d of [30, 37, 45, 60]) {
      const exact = energyAbove(octahedral(3), { delta: d, racahB: 1, racahC: cOverB }, '2E 1', '4A2');
      rows.push({ name: `2E at Delta/B ${d}, C/B ${cOverB}`, got: exact, expected: 9 + 3 * cOverB - 50 / d, tolerance: 0.25, standing: 'memory', source: forms });
    }
  }
  checkTable(rows);
});
