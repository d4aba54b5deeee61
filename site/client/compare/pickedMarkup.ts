import { type DifferenceBasis, type Policy, type SeriesParameter, difference, distinguishableAbove, ionWords } from '#engine';
import { alignedStrips } from '../../charts/alignedStrips.ts';
import { levelColumns } from '../../charts/levelColumns.ts';
import { complexPath } from '../../data/paths.ts';
import { type Cell, type Table, column, quantity, rowColumn, words } from '../../data/table.ts';
import type { FormulaShown, Parts } from '../../data/typeset.ts';
import { figureMarkup, paragraph, tableMarkup } from '../page/markup.ts';
import type { ComparedMeasurement } from './compareData.ts';
import { type SolvedReading, commonReach, levelColumn } from './levelsShown.ts';
import { differenceCell, numberCell, verdictCell, zCell } from './numbers.ts';

/** A measurement that was picked, with its key letter. */
export interface Picked {
  readonly key: string;
  readonly formula: FormulaShown;
  readonly measurement: ComparedMeasurement;
}

/** Everything that is said of two to six picked measurements. */
export function pickedMarkup(picked: readonly Picked[], floor: Policy['differentialFloor']): string {
  return [
    tableMarkup(valueTable(picked)), strips(picked),
    ...(picked.length < 2 ? [paragraph(words('Pick another measurement to see the differences.'), 'note')] : [
      tableMarkup(differenceTable(picked, 'Delta', floor)), tableMarkup(differenceTable(picked, 'beta', floor)),
      paragraph(words(`First less second, with one standard uncertainty. They differ where |z| is above ${distinguishableAbove}. Which uncertainty a difference carries hangs on how alike the two are: ${Object.values(BASIS).join('; ')}.`), 'note soft'),
    ]),
    levelFigure(picked),
  ].join('');
}

/** Name of a measurement under figures: key, formula. */
const named = ({ key, formula }: Picked): Parts => [{ text: key, style: 'italic' }, ...words('  '), ...formula.parts];

function valueTable(picked: readonly Picked[]): Table {
  return {
    caption: 'Picked measurements', columns: [column('Key'), rowColumn('Complex'), column('Kind'), column('Conditions'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('C', 'cm-1'), quantity('β', null), column('Verdict')],
    rows: picked.map(({ key, formula, measurement: { id, result, conditions } }): readonly Cell[] => [
      { parts: [{ text: key, style: 'italic' }] }, { parts: formula.parts, path: `${complexPath(result.complex.id)}#${id}` }, ionWords(result.complex), conditions,
      numberCell(result.parameters.Delta), numberCell(result.parameters.B), numberCell(result.parameters.C), numberCell(result.parameters.beta), result.verdict,
    ]),
  };
}

const BASIS: Readonly<Record<DifferenceBasis, string>> = {
  readings: 'one complex, that of the readings', 'readings and differential floor': 'like readings, that of the readings and the policy’s floor on differences', total: 'all others, the total one',
};
const BASIS_SHORT: Readonly<Record<DifferenceBasis, string>> = { readings: 'one complex', 'readings and differential floor': 'like readings', total: 'total' };

function differenceTable(picked: readonly Picked[], parameter: SeriesParameter, floor: Policy['differentialFloor']): Table {
  const pairs = picked.flatMap((first, place) => picked.slice(place + 1).map((second) => [first, second] as const));
  const symbol = parameter === 'Delta' ? 'Δ' : 'β';
  return {
    caption: `Differences in ${symbol}`,
    columns: [rowColumn('Pair'), quantity('difference', parameter === 'Delta' ? 'cm-1' : null, true), quantity('z', null), column('Verdict'), column('Uncertainty')],
    rows: pairs.map(([first, second]): readonly Cell[] => {
      const found = difference(first.measurement.result, second.measurement.result, parameter, floor);
      return [
        { parts: [{ text: `${first.key} − ${second.key}`, style: 'italic' }, ...words('  '), ...first.formula.parts, ...words(' − '), ...second.formula.parts] },
        differenceCell(found), zCell(found), verdictCell(found), found === null ? '' : BASIS_SHORT[found.basis],
      ];
    }),
  };
}

function strips(picked: readonly Picked[]): string {
  const title = 'Band strips on one axis.';
  const svg = alignedStrips(picked.map((one) => ({ name: [...named(one), ...words(`, ${one.measurement.conditions}`)], row: one.measurement.strip })), {
    id: 'picked-strips', title, description: picked.map(({ key, formula, measurement }) => `${key}, ${formula.text}: ${measurement.stripTitle}.`).join(' '),
  });
  return figureMarkup(svg, words(title), words('Solid line: scanned; dotted line: not scanned or not recorded.'));
}

/** What the levels of a measurement are drawn from; null where it has no Delta and B. */
export function solvedReading({ result: { complex }, solution, ground, transitions }: ComparedMeasurement): SolvedReading | null {
  const { ion: { electrons }, geometry, multiplicity } = complex;
  return geometry === null || multiplicity === null || solution === null || ground === null || electrons < 1 || electrons > 9 ? null : { electrons, geometry, multiplicity, ground, solution, transitions };
}

function levelFigure(picked: readonly Picked[]): string {
  const solved = picked.flatMap((one) => { const reading = solvedReading(one.measurement); return reading === null ? [] : [{ one, reading }]; });
  const without = picked.filter(({ measurement }) => solvedReading(measurement) === null);
  if (solved.length === 0) return paragraph(words('None of them has both Δ and B, so no levels are drawn.'), 'note');
  const reach = commonReach(solved.map(({ reading }) => reading));
  const title = 'Levels side by side at the fitted parameters.';
  const svg = levelColumns(solved.map(({ one, reading }) => levelColumn(named(one), reading, reach)), { id: 'picked-levels', title, description: `Levels of ${solved.map(({ one }) => one.formula.text).join(', ')}, ground level at 0.` });
  const left = without.length === 0 ? [] : [...words(' Not drawn, without both Δ and B: '), ...without.flatMap((one, place) => [...words(place > 0 ? ', ' : ''), ...named(one)]), ...words('.')];
  return figureMarkup(svg, words(title), [...words('Full strokes: same multiplicity as the ground level; dashed: others, where assigned or few. Dots: observed bands, open where only compared.'), ...left]);
}
