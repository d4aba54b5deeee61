import { resultRowOf, orderedResults } from './collection.ts';
import { type ListPage, listPage, mapped, seriesOnPage } from './listPages.ts';
import { oncePerCollection } from './memo.ts';
import { ownFactors } from './ownFactors.ts';
import type { ResultRow } from '../components/resultRow.ts';
import { ligandPath } from './paths.ts';
import { counted, listed, ratio } from './show.ts';
import { type SeriesShown, ligandSeries } from './seriesFigures.ts';
import type { LigandRow } from './rows.ts';
import { ligandStructure, tellingStructure } from './structure.ts';
import { type Cell, type Table, column, quantity, rowColumn } from './table.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import { type FormulaShown, formulaShown } from './typeset.ts';

export interface LigandPage {
  readonly id: string;
  readonly name: string;
  readonly formula: FormulaShown;
  readonly description: string;
  /** Its structural formula; null without a SMILES that can be drawn. */
  readonly structure: string | null;
  readonly facts: readonly { readonly name: string; readonly value: string }[];
  readonly notes: string | null;
  readonly sentence: string;
  /** f and h. */
  readonly factors: Table | null;
  readonly series: readonly SeriesShown[];
  readonly list: ListPage<ResultRow>;
}

const list = (json: string): readonly string[] => JSON.parse(json) as readonly string[];

/** Results with one ligand in the order of the book. */
export const ligandResults = oncePerCollection((tree, id): readonly MeasurementNode[] => orderedResults(tree).filter(({ complex }) => complex.ligands.some(({ ligand }) => ligand.id === id)));

/** What belongs to the ligand as a whole stands on its first page; further pages go on with its complexes and series. */
export function ligandPage(tree: CollectionTree, id: string, number = 1): LigandPage {
  const row = tree.ligands.find((ligand) => ligand.id === id)!;
  const results = ligandResults(tree, id);
  const complexes = new Set(results.map((measurement) => measurement.complex.row.id)).size;
  const synonyms = list(row.synonyms);
  return {
    id, name: row.name, formula: formulaShown(row.formula, 'none', tree.abbreviations), notes: row.notes,
    description: `${row.name}: complexes of the collection with this ligand, and their series by metal.`,
    structure: number === 1 ? ligandStructure(tree, id) : null,
    facts: [
      { name: 'Symbol in formulas', value: row.abbreviation ?? 'none' },
      { name: 'Other names', value: synonyms.length === 0 ? 'none recorded' : synonyms.join(', ') },
      { name: 'Charge', value: ratio(row.charge, 0) },
      { name: 'Donor atoms', value: donors(row) },
      { name: 'SMILES', value: row.smiles ?? 'not recorded: no structure is drawn' },
      { name: 'Record', value: row.id },
    ],
    sentence: results.length === 0 ? 'No complex of the collection holds this ligand.' : `${counted(complexes, 'complex', 'complexes')}, ${counted(results.length, 'measurement')}.`,
    factors: number === 1 ? ownFactors(tree, 'ligand', (factor) => factor === id) : null,
    series: seriesOnPage(ligandSeries(tree, id), number), list: mapped(listPage(results, ligandSeries(tree, id), number, ligandPath(id)), resultRowOf),
  };
}

function donors(row: LigandRow): string {
  const atoms = list(row.donors);
  return `${listed(atoms)}${atoms.length === 1 ? ', one donor' : `, ${atoms.length} donors`}`;
}

/** Every ligand of the collection. */
export function ligandList(tree: CollectionTree): Table {
  const counts = new Map<string, number>();
  for (const complex of tree.complexes) for (const { ligand } of complex.ligands) counts.set(ligand.id, (counts.get(ligand.id) ?? 0) + 1);
  return {
    caption: 'Ligands of the collection',
    columns: [rowColumn('Ligand'), column('Structure'), column('Formula'), column('Symbol'), column('Donor atoms'), quantity('charge', null, true), quantity('complexes', null, true)],
    rows: [...tree.ligands].sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0)).map((row): readonly Cell[] => [
      { parts: [{ text: row.name, style: 'plain' }], path: ligandPath(row.id) }, { parts: [], drawing: tellingStructure(tree, row.id) ?? '' }, { parts: formulaShown(row.formula, 'none', tree.abbreviations).parts },
      row.abbreviation ?? '', list(row.donors).join(', '), ratio(row.charge, 0), ratio(counts.get(row.id) ?? 0, 0),
    ]),
  };
}
