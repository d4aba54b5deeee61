import { defaultPolicy, spinName } from '#engine';
import type { Prediction, PredictedTransition } from '../../../scripts/predict/prediction.ts';
import { diagramCeiling } from '../../charts/diagramParts.ts';
import { levelDiagram } from '../../charts/levelCurves.ts';
import { liveLevelDiagram } from '../../charts/levelDiagramLive.ts';
import { stripFigure } from '../../charts/stripFigure.ts';
import { energy, figures, listed, nanometres, ratio } from '../../data/show.ts';
import { type Table, column, quantity, rowColumn, soft, words } from '../../data/table.ts';
import { type Parts, configuration, sentenceShown, termShown } from '../../data/typeset.ts';
import { figureMarkup, paragraph, tableMarkup } from '../page/markup.ts';
import type { Asked } from './asked.ts';

/** The answer of the predict page: sentences, strip, tables, diagram. */
export function predictionMarkup(asked: Asked, prediction: Prediction): string {
  const allowed = prediction.transitions.filter(({ spinAllowed }) => spinAllowed);
  const forbidden = prediction.transitions.filter(({ spinAllowed }) => !spinAllowed);
  return [
    summary(asked, prediction), strip(asked, allowed, forbidden),
    '<div class="columns">',
    tableMarkup(bandTable('Spin-allowed bands', allowed, asked)), tableMarkup(bandTable('Spin-forbidden bands', forbidden, asked)),
    '</div>',
    diagram(asked, prediction),
  ].join('');
}

function summary({ ion, delta, racahB, racahC, geometry, assumed }: Asked, { ground, lowest, multiplicity }: Prediction): string {
  const { electrons } = ion;
  const head: Parts = [
    ...words(`${ion.name}, `), ...configuration(electrons), ...words(`, ${geometry}: `),
    ...symbol('Δ'), ...words(` ${energy(delta, null)}, `), ...symbol('B'), ...words(` ${energy(racahB, null)}, `), ...symbol('C'), ...words(` ${energy(racahC, null)} cm⁻¹`),
    ...(racahB > 0 ? [...words('; '), ...symbol('Δ/B'), ...words(` ${figures(delta / racahB, 4)}`)] : []),
    ...words('. Ground level '), ...termShown(ground, electrons), ...words(` (${spinName(multiplicity)}).`),
  ];
  return paragraph(head)
    + paragraph(sentenceShown(`Assumed: ${assumed.length === 0 ? 'nothing' : assumed.join('; ')}.`), 'note')
    + (lowest === ground ? '' : paragraph([...termShown(lowest, electrons), ...words(' lies below the declared ground level at these parameters.')], 'caution'));
}

const symbol = (text: string): Parts => [{ text, style: 'italic' }];

function strip({ ion: { name, electrons } }: Asked, allowed: readonly PredictedTransition[], forbidden: readonly PredictedTransition[]): string {
  const band = (kind: 'maximum' | 'line') => ({ position }: PredictedTransition) => ({ position, kind, side: null, width: null, fitted: true });
  const title = `Predicted bands of ${name}.`;
  const row = { bands: [...forbidden.map(band('line')), ...allowed.map(band('maximum'))], absent: [], scanned: [] };
  const names = allowed.map(({ label, position }) => ({ position, parts: termShown(label, electrons) }));
  const description = `Spin-allowed bands at ${listed(allowed.map(({ position }) => energy(position, null)))} cm⁻¹; ${forbidden.length} spin-forbidden.`;
  return figureMarkup(stripFigure(row, names, [], { id: 'predicted-strip', title, description }), words(title),
    words('Full strokes: spin-allowed, named. Thin strokes with a dot: spin-forbidden. Bands outside the axis are arrowheads at its ends. The line is dotted: nothing was measured.'));
}

function bandTable(caption: string, rows: readonly PredictedTransition[], { ion: { electrons } }: Asked): Table {
  return {
    caption: rows.length === 0 ? `${caption}: none` : caption,
    columns: [rowColumn('To'), column('Free-ion term'), quantity('ν̃', 'cm-1'), quantity('λ', 'nm')],
    rows: rows.map(({ label, parent, position }) => [
      { parts: termShown(label, electrons) }, parent ?? soft('mixed'), energy(position, null), position >= 1 ? nanometres(position, null) : soft('none'),
    ]),
  };
}

/** Beyond this Delta/B the diagram has nothing left to show. */
const furthest = 80;

function diagram({ ion, geometry, delta, racahB, racahC }: Asked, { transitions }: Prediction): string {
  const x = racahB > 0 ? delta / racahB : Number.POSITIVE_INFINITY;
  if (x > furthest) return paragraph(words(`The diagram ends at Δ/B = ${furthest}; these parameters lie beyond it.`), 'note');
  const reach = Math.max(geometry === 'octahedral' ? 40 : 20, 5 * Math.ceil((1.1 * x) / 5));
  const mark = { key: '', x, bands: transitions.map(({ position, spinAllowed }) => ({ y: position / racahB, used: spinAllowed })) };
  const ceiling = diagramCeiling(reach, [{ ...mark, bands: mark.bands.filter(({ used }) => used) }]);
  const inside = { ...mark, bands: mark.bands.filter(({ y }) => y <= ceiling) };
  const cOverB = racahC / racahB;
  const title = `Energy levels of ${geometry} ${ion.name}.`;
  const svg = liveLevelDiagram(cached(ion.electrons, geometry, cOverB, reach), ceiling, [inside], {
    id: 'predicted-levels', title, description: `Tanabe-Sugano diagram; upright at Δ/B = ${figures(x, 4)}.`,
  });
  return figureMarkup(svg, words(title), sentenceShown(`E/B against Δ/B at C/B = ${ratio(cOverB, 2)}. Solid: the ground level’s multiplicity; thin and dashed: others. Upright at Δ/B = ${figures(x, 4)}: full dots spin-allowed, open dots spin-forbidden.`));
}

let last: { readonly key: string; readonly diagram: ReturnType<typeof levelDiagram> } | null = null;

/** The curves of one ion at one C/B, kept while Delta and B are stepped. */
function cached(electrons: number, geometry: Asked['geometry'], cOverB: number, reach: number): ReturnType<typeof levelDiagram> {
  const key = [electrons, geometry, cOverB.toFixed(6), reach].join(' ');
  if (last?.key !== key) last = { key, diagram: levelDiagram({ electrons, geometry }, Number(cOverB.toFixed(6)), reach) };
  return last.diagram;
}

/** The words that stand under every prediction. */
export const predictionNote = `Vertical transitions in a cubic field, without spin-orbit coupling. Real bands lie within about ${defaultPolicy.floors.general} cm⁻¹ of such a model, spin-flip lines within ${defaultPolicy.floors.spinFlip}, two-electron bands within ${defaultPolicy.floors.twoElectron} (one standard uncertainty each).`;
