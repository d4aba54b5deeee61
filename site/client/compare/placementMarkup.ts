import { type PlaceShown, type Placement, type SeriesResult, concise, ionWords, measurementId, placeWords } from '#engine';
import { complexPath } from '../../data/paths.ts';
import { energy, figures, plainNumber, temperature } from '../../data/show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from '../../data/table.ts';
import { type Parts, formulaShown, sentenceShown } from '../../data/typeset.ts';
import { paragraph, tableMarkup } from '../page/markup.ts';
import { differenceCell, verdictCell, zCell } from './numbers.ts';
import { cautionList } from './readingMarkup.ts';

/** Where the typed complex stands against the collection. */
export function placementMarkup(placement: Placement, abbreviations: readonly string[]): string {
  return [
    ...placement.places.map((place) => {
      const { sentence, conditions } = typesetSentence(abbreviations, (name) => placeWords(place, placement.result, name));
      const out = place.leftOut.map(({ words: text }) => text);
      const note = place.members === 0 && out.length === 0 ? '' : ` (${conditions}${out.length === 0 ? '' : `; left out: ${out.join(', ')}`})`;
      return paragraph([...sentence, ...words(note)]);
    }),
    placement.earlier.length === 0 ? '' : tableMarkup(earlierTable(placement)),
    placement.predictions.length === 0 ? paragraph(words('This geometry is not fitted, so nothing is predicted.'), 'note') : tableMarkup(predictionTable(placement)),
    placement.nearest.complexes.length === 0 ? '' : tableMarkup(nearestTable(placement, abbreviations)),
    placement.nearest.reason === null ? '' : paragraph(sentenceShown(`Nearest complexes: ${placement.nearest.reason}.`), 'note'),
    cautionList(placement.cautions),
  ].join('');
}

/** The words for a place with the formulas in them typeset: while the sentence is made each complex has a mark for its name. */
function typesetSentence(abbreviations: readonly string[], say: (name: (result: SeriesResult) => string) => PlaceShown): { readonly sentence: Parts; readonly conditions: string } {
  const named: SeriesResult[] = [];
  const { sentence, conditions } = say((result) => `\u0001${named.push(result) - 1}\u0001`);
  const parts = sentence.split('\u0001').flatMap((piece, index): Parts => {
    if (index % 2 === 0) return sentenceShown(piece);
    const { formula, isomer } = named[Number(piece)]!.complex;
    return formulaShown(formula, isomer, abbreviations).parts;
  });
  return { sentence: parts, conditions };
}

function earlierTable({ earlier }: Placement): Table {
  return {
    caption: 'Other measurements of this complex, new less earlier',
    columns: [rowColumn('Measurement'), column('Conditions'), quantity('ΔΔ', 'cm-1'), quantity('z', null), column('Verdict'), quantity('Δβ', null), quantity('z', null), column('Verdict')],
    rows: earlier.map(({ result, differences: { Delta, beta } }): readonly Cell[] => [
      { parts: words(measurementId(result)), path: `${complexPath(result.complex.id)}#${result.measurement}` }, `${result.phase}, ${temperature(result.temperature, null)}`,
      differenceCell(Delta), zCell(Delta), verdictCell(Delta), differenceCell(beta), zCell(beta), verdictCell(beta),
    ]),
  };
}

function predictionTable({ predictions }: Placement): Table {
  return {
    caption: 'What the rest of the collection predicts', columns: [rowColumn('Quantity'), column('From'), { ...column('Predicted'), figure: true }, quantity('z', null), longColumn('Remark')],
    rows: predictions.map(({ parameter, method, predicted, u, z, reason }): readonly Cell[] => [
      { parts: parameter === 'Delta' ? [{ text: 'Δ', style: 'italic' }, ...words(' / cm'), { text: '−1', style: 'super' }] : [{ text: 'β', style: 'italic' }] },
      method === 'factors' ? 'factors' : 'average environment', predicted === null ? soft('nothing') : parameter === 'Delta' ? energy(predicted, u) : concise(predicted, u, 'page'),
      zCell({ z }), reason === null ? (z === null ? 'nothing to compare it with' : '') : { parts: sentenceShown(reason) },
    ]),
  };
}

function nearestTable({ nearest }: Placement, abbreviations: readonly string[]): Table {
  return {
    caption: 'Nearest earlier complexes in Δ/g and β', columns: [rowColumn('Complex'), column('Kind'), quantity('Δ/g', null), quantity('β', null), longColumn('What differs')],
    rows: nearest.complexes.map(({ result, deltaOverG, beta, differs }): readonly Cell[] => [
      { parts: formulaShown(result.complex.formula, result.complex.isomer, abbreviations).parts, path: `${complexPath(result.complex.id)}#${result.measurement}` }, ionWords(result.complex),
      figures(deltaOverG, 3), beta === null ? soft('withheld') : plainNumber(beta, 2), differs.join('; '),
    ]),
  };
}
