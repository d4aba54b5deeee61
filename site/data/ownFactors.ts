import type { FactorKind } from '#engine';
import { FACTORS, printedBeside } from './factorNames.ts';
import { factorValue, printedNumber } from './factorTables.ts';
import { factorFitOf, geometries } from './seriesFit.ts';
import { ratio } from './show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from './table.ts';
import type { CollectionTree } from './tree.ts';

/** The factors of one ligand or of the states of one ion, for its own page; null where it stands in no fit. */
export function ownFactors(tree: CollectionTree, kind: FactorKind, matches: (name: string) => boolean): Table | null {
  const rows = geometries.flatMap((geometry) => (['Delta', 'beta'] as const).flatMap((parameter) => {
    const fit = factorFitOf(tree, parameter, geometry);
    return fit.factors.filter((factor) => factor.kind === kind && matches(factor.name)).map((factor): readonly Cell[] => {
      const printed = printedBeside(tree, fit, factor);
      return [
        { parts: [{ text: FACTORS[parameter][kind].letter, style: 'italic' }, ...words(kind === 'ion' && parameter === 'Delta' ? ' / cm⁻¹' : '')], path: `series/factors/#${parameter.toLowerCase()}-${geometry}` },
        kind === 'ion' ? factor.name.split(' ').slice(1).join(', ') : geometry, factorValue(factor), ratio(factor.complexes, 0),
        printed === null ? soft('none') : printedNumber(printed), factor.reason ?? '',
      ];
    });
  }));
  if (rows.length === 0) return null;
  return {
    caption: 'Its factors in the collection',
    columns: [rowColumn('Factor'), column(kind === 'ion' ? 'State' : 'Geometry'), quantity('value', null, true), quantity('complexes', null, true), quantity('printed by Jørgensen', null, true), longColumn('Remark')],
    rows,
  };
}
