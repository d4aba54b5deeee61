import { concise } from '#engine';
import { aligned } from './columns.ts';

export interface ReviewRow {
  readonly number: number;
  readonly kind: string;
  readonly complex: string;
  readonly measurement: string;
  readonly text: string;
}

export interface FloorFactorRow {
  readonly ion: string;
  readonly geometry: string;
  readonly kappa: number;
  readonly u: number;
  readonly spareBands: number;
}

/** The review list for a terminal: by kind, then what each ion's records suggest for the policy's floors. */
export function reviewLines(review: readonly ReviewRow[], floorFactors: readonly FloorFactorRow[]): string[] {
  const kinds = [...new Set(review.map(({ kind }) => kind))];
  const lists = kinds.flatMap((kind) => {
    const rows = review.filter((row) => row.kind === kind);
    return [`${kind} (${rows.length})`, ...aligned(rows.map(({ complex, measurement, text }) => [`${complex}/${measurement}`, text])), ''];
  });
  const head = review.length === 0 ? ['Nothing needs a person: no refused or strained reading, no near rival, no disagreement.', ''] : lists;
  const factors = floorFactors.length === 0
    ? ['No ion has the eight spare bands from which its floors can be judged.']
    : ['Factor on the model floors that each ion\'s spare bands suggest; shown, never applied:', ...aligned(floorFactors.map(({ ion, geometry, kappa, u, spareBands }) => [ion, geometry, concise(kappa, u), `${spareBands} spare bands`]))];
  return [...head, ...factors];
}
