import { measurementId, placeWords } from '#engine';
import type { NearComplex, PlaceInSeries, Placement, SeriesNeighbour, SeriesResult } from '#engine';
import type { StoredCollection } from './collection.ts';
import type { PlacedMeasurement, PlacedRecord } from './place.ts';

/** The answer for a program. Nothing is rounded; energies in cm-1. */
export function compareFacts(records: readonly PlacedRecord[], { compared, complexes, otherEngine }: StoredCollection) {
  return {
    ok: true,
    collection: { complexes, measurements: compared.results.length, policy: compared.policy.id, otherEngine },
    records: records.map(({ record, measurements }) => ({
      id: record.id, formula: record.formula, ion: record.ion.name, geometry: record.geometryName,
      multiplicity: measurements[0]?.placement.result.complex.multiplicity ?? record.multiplicity, measurements: measurements.map(measurementFacts),
    })),
  };
}

function measurementFacts({ measurement, reading, placement }: PlacedMeasurement) {
  const { verdict, reason, parameters, correlations, bands, predicted, cautions } = reading;
  return {
    id: measurement.id,
    reading: { verdict, reason, parameters, correlations, bands, predicted, cautions },
    earlier: placement.earlier.map(({ result, differences }) => ({ ...named(result), differences })),
    places: placement.places.map((place) => placeFacts(place, placement)),
    predictions: placement.predictions,
    nearest: { ...placement.nearest, complexes: placement.nearest.complexes.map(nearFacts) },
    cautions: placement.cautions,
  };
}

const named = (result: SeriesResult) => ({ measurement: measurementId(result), formula: result.complex.formula });
const neighbour = (one: SeriesNeighbour) => ({ ...named(one.result), difference: one.difference });

function placeFacts(place: PlaceInSeries, { result }: Placement) {
  const { subject, parameter, frame, widened, members, aboveCount, belowCount, leftOut } = place;
  return {
    subject, parameter, ...placeWords(place, result), frame, widened, members,
    above: place.above === null ? null : neighbour(place.above), aboveCount,
    notDistinguishableFrom: place.alike.map(neighbour),
    below: place.below === null ? null : neighbour(place.below), belowCount, leftOut,
  };
}

function nearFacts({ result, deltaOverG, beta, distance, differs }: NearComplex) {
  return { ...named(result), deltaOverG, beta, distance, differs };
}
