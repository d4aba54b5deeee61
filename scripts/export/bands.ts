// bands.csv of one complex: every band as it was read, with what the chosen reading makes of it.

import { csvText } from './csv.ts';
import type { Cell, Row, TableRows } from './tableFiles.ts';

const header = [
  'complex', 'formula', 'measurement', 'band', 'position_typed', 'position_cm-1', 'u_minus_cm-1', 'u_plus_cm-1', 'kind', 'width_cm-1', 'epsilon_L_mol-1_cm-1',
  'role', 'terms_typed', 'transition', 'used', 'calculated_cm-1', 'residual_cm-1', 'not_fitted', 'verdict', 'hazards',
] as const;

/** Rows of the tables by complex: what `bandsCsv` needs. */
export interface BandTables {
  readonly complex: Row;
  readonly find: (table: keyof TableRows & string, key: string) => readonly Row[];
}

export function bandsCsv({ complex, find }: BandTables): string {
  const id = String(complex['id']);
  const hazards = find('caution', id).filter(({ subject }) => subject === 'hazard').map(({ text }) => text).join(' ');
  const measurements = [...find('measurement', id)].sort((a, b) => Number(a['number']) - Number(b['number']));
  return csvText(header, measurements.flatMap((measurement) => {
    const key = `${id}/${measurement['id']}`;
    const chosen = find('reading', key).find((reading) => reading['chosen'] === 1)!;
    const reading = `${key}/${chosen['number']}`;
    return find('band', key).map((band): Cell[] => {
      const member = find('reading_band_member', reading).find((one) => one['band'] === band['number']);
      const transition = member === undefined ? undefined : find('reading_band', reading).find(({ number }) => number === member['reading_band']);
      const left = find('not_fitted', reading).find((one) => one['band'] === band['number']);
      const of = (row: Row | undefined, column: string): Cell => row?.[column] ?? null;
      return [
        id, of(complex, 'formula'), of(measurement, 'id'), of(band, 'number'), of(band, 'position_typed'), of(band, 'position'), of(band, 'u_minus'), of(band, 'u_plus'),
        of(band, 'kind'), of(band, 'width'), of(band, 'epsilon'), of(band, 'role'), (JSON.parse(String(band['terms'])) as string[]).join(' '),
        of(transition, 'label'), of(transition, 'used'), of(transition, 'calculated'), of(transition, 'residual'), of(left, 'reason'),
        of(chosen, 'verdict'), hazards,
      ];
    });
  }));
}
