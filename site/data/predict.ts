import { plain } from '#engine';
import { predictionNote } from '../client/predict/shown.ts';
import { spinNames } from '../../scripts/content/vocabulary.ts';
import { orderedResults } from './collection.ts';
import { complexPath } from './paths.ts';
import type { CollectionTree, MeasurementNode } from './tree.ts';
import type { Parts } from './typeset.ts';

export interface PredictPage {
  readonly ions: readonly string[];
  readonly spins: readonly string[];
  /** A fit of the collection to start from; null where it has none. */
  readonly start: { readonly ion: string; readonly geometry: string; readonly Delta: string; readonly B: string; readonly formula: Parts; readonly path: string } | null;
  readonly note: string;
}

export function predictPage(tree: CollectionTree): PredictPage {
  const known = orderedResults(tree).filter(hasBoth);
  const first = known.find(({ chosen }) => chosen.row.verdict === 'tested') ?? known[0];
  return { ions: tree.ions.filter(({ electrons }) => electrons > 0 && electrons < 10).map(({ name }) => name), spins: spinNames, start: first === undefined ? null : startOf(first), note: predictionNote };
}

const hasBoth = ({ chosen: { parameters: { Delta, B } } }: MeasurementNode): boolean => Delta.value !== null && B.value !== null;

function startOf({ complex, chosen: { parameters } }: MeasurementNode): PredictPage['start'] {
  return {
    ion: complex.ion.name, geometry: complex.row.geometry, Delta: plain(parameters.Delta.value!, -1), B: plain(parameters.B.value!, 0),
    formula: complex.formula.parts, path: complexPath(complex.row.id),
  };
}
