import { conditionWords } from '../words/series.ts';
import { placeSentence } from '../words/placing.ts';
import { temperatureReach } from './comparable.ts';
import type { Frame } from './comparable.ts';
import { ionWords } from './identity.ts';
import type { PlaceInSeries } from './placeInSeries.ts';
import type { SeriesResult } from './types.ts';

/** A place in a series as page and terminal say it. */
export interface PlaceShown {
  /** "Cr(III), octahedral, quartet" or "6 ammine, octahedral". */
  readonly series: string;
  /** One sentence. */
  readonly sentence: string;
  /** "solution, within 50 K of 295 K". */
  readonly conditions: string;
}

/**
 * The words for a result's place in a series.
 *
 * @param name how a complex is named, for instance by its formula
 */
export function placeWords(place: PlaceInSeries, result: SeriesResult, name: (result: SeriesResult) => string = ({ complex }) => complex.formula): PlaceShown {
  const { complex } = result;
  const series = place.subject === 'ion'
    ? ionWords(complex)
    : `${complex.ligands.map(({ ligand, count }) => `${count} ${ligand}`).join(', ')}, ${complex.geometryName}`;
  return {
    series, conditions: frameConditions(place.frame),
    sentence: placeSentence({
      parameter: place.parameter, series, members: place.members,
      above: place.above === null ? null : name(place.above.result), aboveCount: place.aboveCount,
      below: place.below === null ? null : name(place.below.result), belowCount: place.belowCount,
      alike: place.alike.map((one) => name(one.result)),
      withheld: place.withheld ? (result.parameters[place.parameter].reason ?? 'withheld') : null,
    }),
  };
}

/** What the members of a frame share beside its subject, in words. */
export function frameConditions({ phase, temperature }: Pick<Frame, 'phase' | 'temperature'>): string {
  return conditionWords(phase, temperature.near, temperatureReach, temperature.orNotRecorded);
}
