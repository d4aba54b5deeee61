import { expect, test } from 'vitest';
import { noStress, pairAlone, stressTable } from '#engine';

const first = { label: 'a4T2g', leverage: 0.5, by: [1, 0, 0], without: { delta: 21_700.4, racahB: 640, predicted: 21_700.4, z: -0.84 } } as const;
const second = { label: 'a4T1g', leverage: 1, by: [1.1, 7.3, null], without: { delta: null, racahB: null, predicted: null, z: null } } as const;
const compared = { label: 'a2Eg', leverage: null, by: [0, 9, 3], without: null } as const;

test('a table of bands under stress: what the fit used, without numbers where the others give none', () => {
  const table = stressTable([compared, first, second], 'text')!;
  expect(table.caption).toBe('Each band under stress: its weight in the fit, then the fit without it and where that puts it');
  expect(table.columns).toEqual(['leverage', 'by Delta', 'by B', 'Delta without', 'B without', 'put at', 'z']);
  expect(table.rows).toEqual([
    { label: 'a4T2g', cells: ['0.50', '1.00', '0.0', '21700', '640', '21700', '\u22120.8'] },
    { label: 'a4T1g', cells: ['1.00', '1.10', '7.3', noStress, noStress, noStress, noStress] },
  ]);
});

test('the page has the same table with thin spaces', () => {
  const plain = (form: 'text' | 'page') => stressTable([first, second], form)!.rows.map(({ cells }) => cells.map((cell) => cell.replaceAll('\u2009', '')));
  expect(plain('page')).toEqual(plain('text'));
  expect(stressTable([first], 'page')!.rows[0]!.cells[3]).toBe('21\u2009700');
});

test('columns that would say nothing are left out: C where no band moves with it, the others where no band was left out', () => {
  const alone = (racahC: number) => stressTable([{ ...first, by: [1, 0, racahC], without: null }], 'text')!;
  expect(alone(3)).toMatchObject({ caption: 'Each band’s weight in the fit', columns: ['leverage', 'by Delta', 'by B', 'by C'] });
  expect(alone(1e-4).columns).toEqual(['leverage', 'by Delta', 'by B']);
  expect(stressTable([compared], 'text')).toBeNull();
});

test('a pair alone gives Delta and B, or none', () => {
  expect([pairAlone({ delta: 21_550, racahB: 654.6 }, 'text'), pairAlone({ delta: 21_550, racahB: 654.6 }, 'page'), pairAlone(null, 'page')]).toEqual(['21550; 655', '21\u2009550; 655', 'none']);
});
