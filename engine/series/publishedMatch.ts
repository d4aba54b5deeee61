import { elementCounts } from '../formula/composition.ts';
import { parseFormula } from '../formula/parse.ts';
import type { Factor } from './factorTypes.ts';
import { publishedIons, publishedLigands } from './published.ts';
import type { PublishedIon, PublishedLigand } from './published.ts';
import { ionKey } from './identity.ts';
import type { SeriesLigand, SeriesParameter } from './types.ts';

type Recognised = Pick<SeriesLigand, 'formula' | 'donors'>;

/** Elements in alphabetical order with their numbers, "C2 H8 N2"; null where the formula cannot be read. */
function compositionText(formula: string): string | null {
  const parsed = parseFormula(formula);
  if (!parsed.ok) return null;
  return [...elementCounts(parsed.formula)].map(([symbol, count]) => (count === 1 ? symbol : `${symbol}${count}`)).join(' ');
}

/** The printed factors of a ligand, known by its composition and donor atoms; null where none are printed. */
export function publishedLigandOf({ formula, donors }: Recognised): PublishedLigand | null {
  const atoms = [...donors].sort().join(' ');
  const candidates = publishedLigands.filter((one) => one.donors === atoms);
  if (candidates.length === 0) return null;
  const text = compositionText(formula);
  return candidates.find(({ composition }) => composition === text) ?? null;
}

/** The printed factors of an ion in an octahedral complex of a spin state; null where none are printed. */
export function publishedIonOf(name: string, multiplicity: number | null): PublishedIon | null {
  return publishedIons.find((one) => one.ion === name && one.multiplicity === multiplicity) ?? null;
}

/** Id of the ligand that is water bound by oxygen, to which f = h = 1 belongs; null where the collection has none. */
export function aquaLigand(ligands: readonly SeriesLigand[]): string | null {
  return ligands.find((one) => publishedLigandOf(one)?.name === 'water')?.id ?? null;
}

/** The printed factor that stands beside one of the group's own in an octahedral fit; null where none is printed. g in cm-1. */
export function publishedFactor(factor: Pick<Factor, 'kind' | 'name'>, parameter: SeriesParameter, ligands: readonly SeriesLigand[]): number | null {
  if (factor.kind === 'ligand') {
    const record = ligands.find(({ id }) => id === factor.name);
    const printed = record === undefined ? null : publishedLigandOf(record);
    return (parameter === 'Delta' ? printed?.f : printed?.h) ?? null;
  }
  const printed = publishedIons.find((one) => factor.name === ionKey({ ion: { name: one.ion }, geometryName: 'octahedral', multiplicity: one.multiplicity }));
  return (parameter === 'Delta' ? printed?.g : printed?.k) ?? null;
}
