import { type Measurement, type ReadMeasurement, type Reading, type ReadingBand, concise, conciseTwoSided, partInFit, plain } from '#engine';
import type { StripRow } from '../../charts/strip.ts';
import { stripFigure } from '../../charts/stripFigure.ts';
import { difference, energy, energyTwoSided, listed, nanometres, plainNumber, ratio } from '../../data/show.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from '../../data/table.ts';
import { type Parts, sentenceShown, termShown } from '../../data/typeset.ts';
import { figureMarkup, paragraph, tableMarkup } from '../page/markup.ts';
import type { ComparedMeasurement } from './compareData.ts';
import { numberCell, numberOrReason } from './numbers.ts';

/** A reading of the typed bands, with the published one beside it where there is one. */
export function readingMarkup({ chosen, rivals }: ReadMeasurement, measurement: Measurement, published: ComparedMeasurement | null): string {
  const { electrons } = measurement.ion;
  const predicted = predictedTable(chosen, electrons);
  return [
    paragraph(sentenceShown(chosen.reason), 'verdict'),
    published === null ? '' : publishedWords(published, electrons),
    strip(chosen, measurement),
    '<div class="columns">', tableMarkup(parameterTable(chosen, published)),
    chosen.bands.length === 0 ? '' : tableMarkup(transitionTable(chosen, electrons)), '</div>',
    predicted === null ? '' : tableMarkup(predicted),
    chosen.measureNext === null ? '' : paragraph([...words('What would help most: '), ...sentenceShown(chosen.measureNext)]),
    ...chosen.remarks.map((remark) => paragraph(sentenceShown(remark))),
    rivals.length === 0 ? '' : tableMarkup(rivalTable(rivals, chosen, electrons)),
    cautionList(chosen.cautions),
    paragraph([...words('In words: '), ...sentenceShown(chosen.sentence)]),
  ].join('');
}

export function cautionList(cautions: readonly { readonly code: string; readonly text: string }[]): string {
  return cautions.map(({ text, code }) => paragraph([...sentenceShown(text), ...words(` ${code}`)], 'note')).join('');
}

function assignment(transitions: readonly { readonly label: string; readonly observed: number }[], electrons: number): Parts {
  return transitions.flatMap(({ label, observed }, index) => [...(index > 0 ? words(', ') : []), ...termShown(label, electrons), ...words(` ${energy(observed, null)}`)]);
}

function publishedWords({ result, transitions, reason }: ComparedMeasurement, electrons: number): string {
  const id = `${result.complex.id}/${result.measurement}`;
  return paragraph([
    ...words(`Published reading of ${id}: `), ...(transitions.length === 0 ? words('no assignment stands') : assignment(transitions, electrons)), ...words('. '), ...sentenceShown(reason),
  ], 'note');
}

function strip({ bands, predicted }: Reading, measurement: Measurement): string {
  const { electrons } = measurement.ion;
  const fitted = new Set(bands.flatMap((band) => band.bands));
  const row: StripRow = {
    bands: measurement.bands.map(({ position, kind, side, width }, index) => ({ position, kind, side, width, fitted: fitted.has(index) })), absent: measurement.absent, scanned: measurement.scanned,
  };
  const calculated = [...bands.flatMap((band) => band.calculated ?? []), ...predicted.filter(({ spinAllowed }) => spinAllowed).map(({ position }) => position)];
  const names = bands.map(({ observed, label }) => ({ position: observed, parts: termShown(label, electrons) }));
  const description = `Bands at ${listed(measurement.bands.map(({ position }) => plain(position, 0)))} cm⁻¹.`;
  return figureMarkup(stripFigure(row, names, calculated, { id: 'typed-strip', title: 'Band strip of the typed bands.', description }), words('Band strip of the typed bands.'),
    words('Triangles under the line: spin-allowed and assigned transitions as the fit puts them. Dotted stem: kept, not fitted.'));
}

const SYMBOLS = { Delta: 'Δ', B: 'B', C: 'C', beta: 'β' } as const;

function parameterTable({ parameters }: Reading, published: ComparedMeasurement | null): Table {
  return {
    caption: 'Parameters',
    columns: [rowColumn('Quantity / unit'), { ...column('with total u'), figure: true }, { ...column('with u of the readings'), figure: true }, column('Standing'), ...(published === null ? [] : [{ ...column('Published'), figure: true }])],
    rows: parameters.map((one): readonly Cell[] => [
      { parts: [{ text: SYMBOLS[one.name], style: 'italic' }, ...(one.name === 'beta' ? [] : [...words(' / cm'), { text: '−1', style: 'super' as const }])] },
      ...(one.limits === null ? [numberOrReason(one)] : [limited(one.value!, one.limits)]),
      one.value === null || one.u === null ? soft('') : numberCell({ value: one.value, uTotal: one.u }),
      one.standing, ...(published === null ? [] : [numberCell(published.result.parameters[one.name])]),
    ]),
  };
}

/** With a limit for each side, where the curve of chi-square is not parabolic. */
const limited = (value: number, { low, high }: { readonly low: number; readonly high: number }): Cell =>
  value > low && high > value ? conciseTwoSided(value, value - low, high - value, 'page') : plainNumber(value, 0);

function transitionTable({ bands }: Reading, electrons: number): Table {
  return {
    caption: 'Transitions, observed against calculated',
    columns: [rowColumn('To'), quantity('observed', 'cm-1', true), quantity('calculated', 'cm-1', true), quantity('obs. − calc.', 'cm-1', true), column('In fit')],
    rows: bands.map((band): readonly Cell[] => [
      { parts: termShown(band.label, electrons) }, energyTwoSided(band.observed, band.uMinus, band.uPlus),
      band.calculated === null ? soft('no fit') : energy(band.calculated, null), band.residual === null ? soft('no fit') : difference(band.residual), inFit(band),
    ]),
  };
}

const inFit = ({ used, calculated, bands }: ReadingBand): string => [...(used ? ['yes'] : []), partInFit(used, calculated !== null, bands.length)].filter((text) => text !== '').join(', ');

function predictedTable({ predicted }: Reading, electrons: number): Table | null {
  const rows = predicted.filter(({ spinAllowed }) => spinAllowed);
  return rows.length === 0 ? null : {
    caption: 'Spin-allowed bands that the fit predicts and no reading takes', columns: [rowColumn('To'), quantity('ν̃', 'cm-1'), quantity('λ', 'nm'), column('Range')],
    rows: rows.map(({ label, position, u, looked }) => [
      { parts: termShown(label, electrons) }, energy(position, u), nanometres(position, u),
      looked === 'inside' ? 'inside what was scanned' : looked === 'outside' ? 'outside what was scanned' : 'scanned range not given',
    ]),
  };
}

function rivalTable(rivals: readonly Reading[], chosen: Reading, electrons: number): Table {
  const rounded = (value: number | null): Cell => value === null ? soft('withheld') : ratio(Math.round(value / 10) * 10, 0);
  return {
    caption: 'Other readings of these bands', columns: [rowColumn('Assignment'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), longColumn('Where it ranks')],
    rows: rivals.map((rival): readonly Cell[] => [
      { parts: [
        ...assignment(rival.bands, electrons),
        ...(rival.geometry !== null && rival.geometry !== chosen.geometry ? words(` (${rival.geometry})`) : []),
        ...(rival.multiplicity !== null && rival.multiplicity !== chosen.multiplicity ? words(` (multiplicity ${rival.multiplicity})`) : []),
      ] },
      rounded(rival.parameters[0]!.value), rounded(rival.parameters[1]!.value), { parts: sentenceShown(rival.ranking ?? 'not ranked') },
    ]),
  };
}

/** Verdict and numbers in one line, for those who hear the page. */
export function readingStatus({ verdict, parameters }: Reading): string {
  const numbers = parameters.flatMap(({ name, value, uTotal }) => value === null ? [] : [`${SYMBOLS[name]} ${concise(value, uTotal, 'page')}${name === 'beta' ? '' : ' cm⁻¹'}`]);
  return `Read as you type, ${verdict}${numbers.length === 0 ? '' : `: ${numbers.join(', ')}`}.`;
}
