import { floorFactor } from '#engine';
import type { Caution } from '#engine';
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

/** Something that needs a person, of one complex. */
export interface ReviewItem {
  readonly kind: Kind;
  readonly complex: string;
  readonly measurement: string;
  readonly text: string;
}

/** A reading with spare bands, as far as the factor on the floors needs it. */
export interface SpareReading {
  readonly ion: string;
  readonly geometry: string;
  readonly spareBands: number;
  readonly residuals: readonly { readonly residual: number; readonly u: number; readonly floor: number }[];
}

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

/** What of one complex needs a person, by measurement. */
export function reviewItems({ complex, records, cautions }: ReviewedComplex): ReviewItem[] {
  return records.flatMap((record) => {
    const id = record.measurement.id;
    const quoted = disagreements(record).map((text): [Kind, string] => ['quoted value', `${text}.`]);
    const repeats = (cautions.get(id) ?? []).filter(({ code }) => code === 'MEASUREMENTS_DISAGREE').map(({ text }): [Kind, string] => ['repeats disagree', text]);
    return [...concerns(record), ...quoted, ...repeats].map(([kind, text]) => ({ kind, complex: complex.id, measurement: id, text }));
  });
}

/** The review list: most pressing first, then by complex and measurement, as the items come. */
export function reviewRows(items: readonly ReviewItem[]): Row[] {
  return [...items].sort((a, b) => kinds.indexOf(a.kind) - kinds.indexOf(b.kind)).map((item, index) => ({ number: index + 1, ...item }));
}

/** The readings of one complex that have spare bands. */
export function spareReadings({ complex: { ion, geometry }, records }: ReviewedComplex): SpareReading[] {
  if (geometry === null) return [];
  return records.filter(({ chosen }) => chosen.spareBands >= 1).map(({ chosen: { bands, spareBands } }) => ({
    ion: ion.name, geometry, spareBands,
    residuals: bands.filter(({ used }) => used).map(({ residual, uMinus, uPlus, floor }) => ({ residual: residual!, u: Math.sqrt((uMinus ** 2 + uPlus ** 2) / 2), floor })),
  }));
}

/** The factor on the floors that each ion's tested records suggest. */
export function floorFactorRows(spare: readonly SpareReading[]): Tables {
  const groups = new Map<string, SpareReading[]>();
  for (const reading of spare) {
    const key = `${reading.ion} ${reading.geometry}`;
    const group = groups.get(key);
    if (group === undefined) groups.set(key, [reading]);
    else group.push(reading);
  }
  return {
    floor_factor: [...groups.values()].flatMap((readings) => {
      const { ion, geometry } = readings[0]!;
      const factor = floorFactor(readings.flatMap(({ residuals }) => residuals), readings.reduce((sum, { spareBands }) => sum + spareBands, 0));
      return factor === null ? [] : [{ ion, geometry, kappa: factor.kappa, u: factor.u, spare_bands: factor.spareBands }];
    }),
  };
}
