import { roomTemperature } from './comparable.ts';
import { ionKey, ionWords, measurementId } from './identity.ts';
import { reviewAbove } from './memberPlacement.ts';
import type { PlacedPrediction } from './memberPlacement.ts';
import { placingCautionText as text } from '../words/placing.ts';
import type { EarlierMeasurement, PlacingCaution, PlacingGround } from './placeTypes.ts';
import type { PlaceInSeries } from './placeInSeries.ts';
import type { SeriesResult } from './types.ts';

interface PlacingFacts {
  readonly result: SeriesResult;
  readonly ground: PlacingGround;
  readonly earlier: readonly EarlierMeasurement[];
  readonly places: readonly PlaceInSeries[];
  readonly predictions: readonly PlacedPrediction[];
}

/** What can and cannot be concluded from a placement, in a fixed order. */
export function placingCautions({ result, ground, earlier, places, predictions }: PlacingFacts): readonly PlacingCaution[] {
  const { complex } = result;
  const { others, collection, fits } = ground;
  const found: PlacingCaution[] = [];
  const add = (applies: boolean, code: string, words: () => string): void => {
    if (applies) found.push({ code, text: words() });
  };
  const likeIon = others.filter((one) => ionKey(one.complex) === ionKey(complex));
  const ofIon = places.filter(({ subject }) => subject === 'ion');
  const unseen = complex.ligands.map(({ ligand }) => ligand).filter((ligand) =>
    !others.some((one) => one.complex.geometryName === complex.geometryName && one.complex.ligands.some((other) => other.ligand === ligand)));
  const island = fits?.Delta.islands.find(({ ions }) => ions.includes(ionKey(complex)));
  const disagreeing = earlier.filter(({ differences }) => [differences.Delta, differences.beta].some((one) => one?.distinguishable)).map((one) => measurementId(one.result));
  add(ground.storedAs !== null, 'ALREADY_THERE', () => text.alreadyThere(ground.storedAs!));
  add(ground.idTaken, 'ID_TAKEN', () => text.idTaken(complex.id));
  add(likeIon.length === 0, 'NO_OTHER_RECORD', () => text.noOtherRecord(ionWords(complex)));
  add(ofIon.some(({ members, withheld }) => members === 1 && !withheld), 'SERIES_OF_ONE', () => text.onlyOne(ionWords(complex)));
  add(unseen.length > 0, 'LIGAND_NEVER_SEEN', () => text.ligandsNeverSeen(unseen));
  add(island !== undefined && island.ions.length === 1 && (fits?.Delta.islands.length ?? 0) > 1, 'ISLAND_OF_ITS_OWN', () => text.singleIsland(ionWords(complex)));
  add(result.policy !== collection.policy.id, 'OTHER_POLICY', () => text.otherPolicy);
  add(result.temperature === null, 'TEMPERATURE_NOT_RECORDED', () => text.temperatureMissing(roomTemperature));
  add(result.temperature !== null && places.some(({ widened }) => widened === 'temperature'), 'TEMPERATURES_MIXED', () => text.widenedTemperature);
  add(places.some(({ widened }) => widened === 'phase'), 'PHASES_MIXED', () => text.widenedPhase);
  add(disagreeing.length > 0, 'EARLIER_DISAGREES', () => text.earlierDisagrees(disagreeing));
  for (const { parameter, method, z } of predictions)
    add(z !== null && Math.abs(z) > reviewAbove, 'FAR_FROM_PREDICTION', () => text.farFromPrediction(parameter, method, Math.abs(z!).toFixed(1)));
  add(predictions.some(({ predicted }) => predicted !== null) && fits !== null && fits.Delta.scatter.standing === 'assumed', 'SCATTER_ASSUMED', () => text.scatterAssumed);
  return found;
}
