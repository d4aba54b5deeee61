import { evidenceHeading, shownLabel } from '#engine';
import { type ReadingLine, readingsFigure } from '../charts/readingsFigure.ts';
import { conditions } from './conditions.ts';
import { type FigureShown, ownFigureFiles } from './figure.ts';
import { counted, energy, parameterShown, ratio } from './show.ts';
import { stripRowOf } from './strip.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode, ReadingNode } from './tree.ts';
import { type Parts, sentenceShown, termShown } from './typeset.ts';

/** The chosen reading beside its rivals: what each makes of the bands, and what speaks against it. */
export interface Rivals {
  readonly figure: FigureShown;
  readonly table: Table;
  readonly evidence: Table | null;
}

export function measurementRivals(measurement: MeasurementNode, id: string): Rivals | null {
  if (measurement.rivals.length === 0) return null;
  return { figure: figure(measurement, id), table: table(measurement), evidence: evidence(measurement) };
}

const readings = ({ chosen, rivals }: MeasurementNode): readonly { readonly name: string; readonly reading: ReadingNode }[] =>
  [{ name: 'chosen', reading: chosen }, ...rivals.map((reading, index) => ({ name: `rival ${index + 1}`, reading }))];

function line(measurement: MeasurementNode, name: string, { transitions, predicted }: ReadingNode): ReadingLine {
  const { electrons } = measurement.complex.ion;
  return {
    name, strip: stripRowOf(measurement, transitions.flatMap(({ bands }) => bands.map(({ number }) => number))),
    named: transitions.map(({ row }) => ({ position: row.observed, parts: termShown(row.label, electrons) })),
    calculated: transitions.map(({ row }) => row.calculated).filter((value) => value !== null),
    expected: predicted.filter((band) => band.spin_allowed === 1).map((band) => ({ position: band.position, parts: termShown(band.label, electrons) })),
  };
}

function figure(measurement: MeasurementNode, id: string): FigureShown {
  const { complex, rivals } = measurement;
  const title = `Readings of the bands of ${complex.formula.text}, one under the other.`;
  return {
    id: `${id}-readings`, title, titleParts: [...words('Readings of the bands of '), ...complex.formula.parts, ...words(', one under the other.')],
    svg: readingsFigure(readings(measurement).map(({ name, reading }) => line(measurement, name, reading)), {
      id: `${id}-readings`, title, description: `The chosen reading and ${counted(rivals.length, 'rival')}; the table below names each assignment.`,
    }),
    caption: [`n = ${measurement.bands.length}; ${conditions(measurement)}.`, 'Above the line: the name each band has in that reading; dotted stem: not assigned. Full triangles: assigned transitions where the fit puts them; open ones: further spin-allowed transitions it predicts.'],
    source: `Bands as read; each reading fitted under policy ${measurement.chosen.row.policy}.`, table: null, numbersIn: `${id}-readings-table`, files: ownFigureFiles(complex.row.id, `${id}-readings`),
  };
}

function table(measurement: MeasurementNode): Table {
  const { chosen } = measurement;
  return {
    caption: 'The chosen reading and its rivals; a lower score is better',
    columns: [rowColumn('Reading'), longColumn('Assignment'), quantity('Δ', 'cm-1'), quantity('B', 'cm-1'), quantity('β', null), quantity('score', null, true), longColumn('Where it ranks')],
    rows: readings(measurement).map(({ name, reading }): readonly Cell[] => {
      const number = (parameter: 'Delta' | 'B' | 'beta'): Cell => parameterShown(reading.parameters[parameter]).total.text ?? soft('withheld');
      return [
        name, { parts: assignment(reading, chosen, measurement.complex.ion.electrons) }, number('Delta'), number('B'), number('beta'),
        reading.row.score === null ? soft('no fit') : ratio(reading.row.score, 1),
        reading === chosen ? { parts: sentenceShown(chosenPlace(measurement)) } : { parts: sentenceShown(reading.row.ranking ?? 'Not ranked.') },
      ];
    }),
  };
}

function chosenPlace({ chosen, rivals }: MeasurementNode): string {
  const better = rivals.filter(({ row }) => row.score !== null && chosen.row.score !== null && row.score < chosen.row.score).length;
  const why = chosen.row.assignment === 'typed' ? 'Chosen because the record types it' : 'Chosen because it scores best';
  return better === 0 ? `${why}${chosen.row.assignment === 'typed' && chosen.row.score !== null ? '; no rival scores better' : ''}.` : `${why}; ${better === 1 ? 'one rival scores' : `${better} rivals score`} better.`;
}

const unbroken = (text: string): string => text.replaceAll('\u2009', '\u202f').replaceAll(' ', '\u00a0');

/** Assignment of a reading; geometry and multiplicity where they are not those of the chosen one. */
function assignment({ row, transitions }: ReadingNode, chosen: ReadingNode, electrons: number): Parts {
  const other = [
    row.geometry !== null && row.geometry !== chosen.row.geometry ? row.geometry : null,
    row.multiplicity !== null && row.multiplicity !== chosen.row.multiplicity ? `multiplicity ${row.multiplicity}` : null,
  ].filter((text) => text !== null);
  if (transitions.length === 0) return words('none');
  return [
    ...transitions.flatMap(({ row: one }, index) => [...(index > 0 ? words(', ') : []), ...termShown(one.label, electrons), ...words(unbroken(` ${energy(one.observed, null)}`))]),
    ...(other.length > 0 ? words(` (${other.join(', ')})`) : []),
  ];
}

/** Every entry of evidence in one row, a column a reading. */
function evidence(measurement: MeasurementNode): Table | null {
  const shown = readings(measurement).filter(({ reading }) => reading.evidence.length > 0);
  if (shown.length === 0) return null;
  const { electrons } = measurement.complex.ion;
  const heading = (code: string, label: string | null): string => evidenceHeading(code, label === null ? '' : shownLabel(label, electrons));
  const heads = [...new Set(shown.flatMap(({ reading }) => reading.evidence.map(({ code, label }) => heading(code, label))))];
  const sum = (reading: ReadingNode, head: string): number => reading.evidence.filter(({ code, label }) => heading(code, label) === head).reduce((total, { penalty }) => total + penalty, 0);
  return {
    caption: 'What speaks against each reading, on the scale of χ²; the sum is its score',
    columns: [rowColumn('Evidence'), ...shown.map(({ name }) => ({ ...column(name), figure: true }))],
    rows: [
      ...heads.map((head): readonly Cell[] => [{ parts: sentenceShown(head) }, ...shown.map(({ reading }): Cell => sum(reading, head) < 0.05 ? soft('0') : ratio(sum(reading, head), 1))]),
      ['score', ...shown.map(({ reading }): Cell => reading.row.score === null ? soft('no fit') : ratio(reading.row.score, 1))],
    ],
  };
}
