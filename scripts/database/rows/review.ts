import { floorFactor } from '#engine';
import type { Caution, Reading } from '#engine';
import type { ComplexRecord } from '../../content/types.ts';
import { disagreements } from './complexFacts.ts';
import type { ReadRecord } from './complexFacts.ts';
import type { Row, Tables } from './row.ts';

/** One complex with what was read of it. */
export interface ReviewedComplex {
  readonly complex: ComplexRecord;
  readonly records: readonly ReadRecord[];
  readonly cautions: ReadonlyMap<string, readonly Caution[]>;
}

/** Kinds of the review list, most pressing first. */
const kinds = ['refused', 'better rival', 'strained', 'quoted value', 'repeats disagree', 'near rival'] as const;

type Kind = (typeof kinds)[number];

function concerns({ chosen }: ReadRecord): [Kind, string][] {
  const has = (code: string): string | undefined => chosen.cautions.find((caution) => caution.code === code)?.text;
  const found: [Kind, string][] = [];
  if (chosen.verdict === 'refused') found.push(['refused', chosen.reason]);
  if (chosen.verdict === 'strained') found.push(['strained', chosen.reason]);
  const better = has('BETTER_RIVAL');
  const near = has('NEAR_RIVAL');
  if (better !== undefined) found.push(['better rival', better]);
  if (near !== undefined) found.push(['near rival', near]);
  return found;
}

/** What needs a person, most pressing first, then by complex and measurement. */
export function reviewRows(reviewed: readonly ReviewedComplex[]): Row[] {
  const found = reviewed.flatMap(({ complex, records, cautions }) => records.flatMap((record) => {
    const id = record.measurement.id;
    const quoted = disagreements(record).map((text): [Kind, string] => ['quoted value', `${text}.`]);
    const repeats = (cautions.get(id) ?? []).filter(({ code }) => code === 'MEASUREMENTS_DISAGREE').map(({ text }): [Kind, string] => ['repeats disagree', text]);
    return [...concerns(record), ...quoted, ...repeats].map(([kind, text]) => ({ kind, complex: complex.id, measurement: id, text }));
  }));
  found.sort((a, b) => kinds.indexOf(a.kind) - kinds.indexOf(b.kind));
  return found.map((row, index) => ({ number: index + 1, ...row }));
}

/** The factor on the floors that each ion's tested records suggest. */
export function floorFactorRows(reviewed: readonly ReviewedComplex[]): Tables {
  const groups = new Map<string, { ion: string; geometry: string; readings: Reading[] }>();
  for (const { complex, records } of reviewed)
    for (const { chosen } of records) {
      if (chosen.spareBands < 1 || complex.geometry === null) continue;
      const key = `${complex.ion.name} ${complex.geometry}`;
      const group = groups.get(key) ?? { ion: complex.ion.name, geometry: complex.geometry, readings: [] };
      group.readings.push(chosen);
      groups.set(key, group);
    }
  return {
    floor_factor: [...groups.values()].flatMap(({ ion, geometry, readings }) => {
      const rows = readings.flatMap(({ bands }) => bands.filter(({ used }) => used).map(({ residual, uMinus, uPlus, floor }) => ({
        residual: residual!, u: Math.sqrt((uMinus ** 2 + uPlus ** 2) / 2), floor,
      })));
      const factor = floorFactor(rows, readings.reduce((sum, { spareBands }) => sum + spareBands, 0));
      return factor === null ? [] : [{ ion, geometry, kappa: factor.kappa, u: factor.u, spare_bands: factor.spareBands }];
    }),
  };
}
