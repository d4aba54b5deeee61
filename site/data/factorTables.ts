import type { Factor, FactorFit, FactorSeries } from '#engine';
import { csvText } from '../../scripts/export/csv.ts';
import { FACTORS, factorLabel, printedBeside } from './factorNames.ts';
import { ionPath, ligandPath } from './paths.ts';
import { energy, plainNumber, ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** Factors with the printed ones beside, their brackets, and what must be known of them. */
export function factorTable(tree: CollectionTree, fit: FactorFit, factors: readonly Factor[], letters: readonly string[]): Table {
  const kind = factors[0]!.kind;
  const printed = factors.some((factor) => printedBeside(tree, fit, factor) !== null);
  return {
    caption: 'Factors in the figure, lowest first',
    columns: [
      rowColumn(kind === 'ligand' ? 'Ligand' : 'Ion'), FACTORS[fit.parameter][kind].head, quantity('n', null),
      ...(printed ? [quantity('printed', null, true), quantity('from the printed', null, true)] : []), column('Bracket'), longColumn('Remark'),
    ],
    rows: factors.map((factor, place): readonly Cell[] => {
      const beside = printedBeside(tree, fit, factor);
      return [
        { parts: factorLabel(tree, factor, fit.geometry), path: factorPath(factor) }, factorValue(factor), ratio(factor.complexes, 0),
        ...(printed ? [beside === null ? soft('not printed') : printedNumber(beside), beside === null || factor.gauge ? soft('none') : departure(factor.value! / beside - 1)] : []),
        letters[place] || soft('none'), factor.reason ?? '',
      ];
    }),
  };
}

/** "17 400(300)", or that a factor has no value; the one that is set to 1 is exact. */
export const factorValue = (factor: Factor): Cell => (factor.value === null ? soft('none') : factor.gauge ? '1, exact' : energy(factor.value, factor.u));

export const printedNumber = (value: number): string => (value >= 100 ? energy(value, null) : plainNumber(value, 2));

/** A relative difference in per cent with its sign. */
export function departure(fraction: number): string {
  const text = plainNumber(100 * fraction, Math.abs(fraction) < 0.0995 ? 1 : 0);
  return `${/^[\u2212]|^0(\.0)?$/.test(text) ? '' : '+'}${text} %`;
}

export const factorPath = ({ kind, name }: Factor): string => (kind === 'ligand' ? ligandPath(name) : ionPath(name.split(' ')[0]!));

/** The factors of one kind and island in full precision; those without a value stand at the end with the reason. */
export function factorCsv(tree: CollectionTree, fit: FactorFit, { kind, island, factors }: FactorSeries, letters: readonly string[]): string {
  const without = fit.factors.filter((one) => one.kind === kind && one.island === island && one.value === null);
  return csvText(['parameter', 'geometry', 'kind', 'name', 'value', 'u', 'complexes', 'island', 'set_to_1', 'tested', 'bracket', 'printed', 'remark'], [...factors, ...without].map((factor, place) => [
    fit.parameter, fit.geometry, kind, factor.name, factor.value, factor.u, factor.complexes, island, factor.gauge ? 1 : 0, factor.tested ? 1 : 0,
    letters[place] || null, printedBeside(tree, fit, factor), factor.reason,
  ]));
}
