import { stripFigure } from '../charts/stripFigure.ts';
import { type FigureShown, ownFigureFiles } from './figure.ts';
import { conditions, writtenDown } from './conditions.ts';
import { energy, figures, listed, nanometres } from './show.ts';
import { stripRow, stripTitle } from './strip.ts';
import { type Cell, type Table, column, longColumn, quantity, rowColumn, soft, words } from './table.ts';
import type { MeasurementNode } from './tree.ts';
import { termShown } from './typeset.ts';

/** What was read from one spectrum: the strip and the bands as typed. */
export interface MeasurementRead {
  readonly strip: FigureShown | null;
  readonly bands: Table;
  /** Ranges looked at, and ranges seen empty, in words. */
  readonly ranges: readonly string[];
}

export function measurementRead(measurement: MeasurementNode, id: string): MeasurementRead {
  return { strip: stripOf(measurement, id), bands: bandTable(measurement), ranges: ranges(measurement) };
}

/** The large strip; null without a band. */
export function stripOf(measurement: MeasurementNode, id: string): FigureShown | null {
  if (measurement.bands.length === 0) return null;
  const { chosen, complex } = measurement;
  const title = `Band strip of ${complex.formula.text}.`;
  const names = chosen.transitions.map(({ row }) => ({ position: row.observed, parts: termShown(row.label, complex.ion.electrons) }));
  const calculated = [...chosen.transitions.map(({ row }) => row.calculated).filter((value) => value !== null), ...chosen.predicted.filter((band) => band.spin_allowed === 1).map((band) => band.position)];
  const kept = chosen.notFitted.size > 0 ? ' Dotted stem: kept, not fitted.' : '';
  return {
    id: `${id}-strip`, title, titleParts: [...words('Band strip of '), ...complex.formula.parts, ...words('.')],
    svg: stripFigure(stripRow(measurement), names, calculated, { id: `${id}-strip`, title, description: `${stripTitle(measurement)}.` }),
    caption: [`n = ${measurement.bands.length}; ${conditions(measurement)}.`, calculated.length > 0 ? `Triangles under the line: spin-allowed and assigned transitions as the fit puts them.${kept}` : kept.trim()],
    source: `Positions as read, ${writtenDown(measurement)}.`, table: null, numbersIn: `${id}-bands`, files: ownFigureFiles(complex.row.id, `${id}-strip`),
  };
}

function bandTable(measurement: MeasurementNode): Table {
  const { bands, chosen, complex } = measurement;
  return {
    caption: 'Bands as read',
    columns: [rowColumn('As typed'), quantity('ν̃', 'cm-1'), quantity('λ', 'nm'), quantity('width', 'cm-1', true), quantity('ε', 'L mol-1 cm-1'), column('Read as'), longColumn('Assigned to')],
    rows: bands.map((band): readonly Cell[] => {
      const transition = chosen.transitions.find((one) => one.bands.some((member) => member.number === band.number));
      const u = band.u_minus !== null && band.u_plus !== null ? Math.max(band.u_minus, band.u_plus) : null;
      const position = u === null && transition?.bands.length === 1 ? Math.max(transition.row.u_minus, transition.row.u_plus) : u;
      const kind = [band.kind, band.side ? `of a stronger band at ${band.side} wavenumber` : null, band.strength, band.deconvoluted ? 'deconvoluted' : null].filter(Boolean).join(', ');
      return [
        band.position_typed,
        `${energy(band.position, position)}${u === null && position !== null ? ' *' : ''}`,
        nanometres(band.position, position),
        band.width === null ? soft('not recorded') : energy(band.width, null),
        band.epsilon === null ? soft('not recorded') : figures(band.epsilon, 6),
        kind,
        transition ? { parts: termShown(transition.row.label, complex.ion.electrons) } : soft(band.left_out ?? chosen.notFitted.get(band.number) ?? 'not assigned'),
      ];
    }),
  };
}

function ranges({ row, scanned, absent, bands, chosen }: MeasurementNode): readonly string[] {
  const spans = (list: readonly { readonly low: number; readonly high: number }[]): string =>
    listed(list.map(({ low, high }) => `${energy(low, null)} to ${energy(high, null)} cm⁻¹ (${nanometres(high, null)} to ${nanometres(low, null)} nm)`));
  const assumed = bands.some((band) => band.u_minus === null) && chosen.transitions.some((transition) => transition.row.u_assumed === 1);
  return [
    scanned.length > 0 ? `Scanned: ${spans(scanned)}${row.scanned_typed ? `, typed as “${row.scanned_typed}”` : ''}.` : 'Scanned range: not recorded.',
    ...(absent.length > 0 ? [`Looked, and saw no band: ${spans(absent)}.`] : []),
    ...(assumed ? ['* No uncertainty was typed; the policy’s default is assumed.'] : []),
  ];
}
