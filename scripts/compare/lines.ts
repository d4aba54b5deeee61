import { concise, ionWords, measurementId, placeWords, plain, significant } from '#engine';
import type { Difference, EarlierMeasurement, NearComplex, Parameter, PlacedPrediction, Placement, Reading, SeriesParameter } from '#engine';
import { aligned, counted } from '../report/columns.ts';
import type { StoredCollection } from './collection.ts';
import type { PlacedMeasurement, PlacedRecord } from './place.ts';

/** What the records were placed against, in one line or two. */
export function groundLines({ compared, complexes, otherEngine }: StoredCollection): string[] {
  return [
    `Placed against ${counted(complexes, 'complex', 'complexes')} with ${counted(compared.results.length, 'measurement')}, policy ${compared.policy.id}. Nothing was added.`,
    ...(otherEngine ? ['The database was fitted by another version of the engine: run "npm run refit" before you rely on a comparison.'] : []),
  ];
}

/** A placed record as lines for a person. */
export function recordLines({ record, measurements }: PlacedRecord): string[] {
  const [first] = measurements;
  const words = first === undefined ? `${record.ion.name}, ${record.geometryName}` : ionWords(first.placement.result.complex);
  return [
    `${record.formula}  (${record.id})  ${words}`,
    ...(measurements.length === 0 ? ['  No measurement is in this record yet.'] : measurements.flatMap((one) => ['', ...measurementLines(one)])),
  ];
}

function measurementLines({ reading, placement }: PlacedMeasurement): string[] {
  const { result } = placement;
  return [
    measurementId(result),
    `  ${verdictText(reading)}`,
    ...aligned(reading.parameters.map(parameterCells)),
    ...section('Other measurements of this complex', earlierLines(placement.earlier)),
    ...section('Where it stands', placeLines(placement)),
    ...section('What the rest of the collection predicts', placement.predictions.length === 0 ? ['nothing: this geometry is not fitted'] : aligned(placement.predictions.map(predictionCells), '')),
    ...section('Nearest earlier complexes in (Delta/g, beta)', nearestLines(placement)),
    ...section('Cautions', [
      ...placement.cautions.map(({ text }) => text),
      ...reading.cautions.map(({ text }) => `Of the reading: ${text}`),
      ...(placement.cautions.length + reading.cautions.length === 0 ? ['none'] : []),
    ]),
  ];
}

const section = (title: string, lines: readonly string[]): string[] => [`  ${title}`, ...lines.map((line) => `    ${line}`)];

function verdictText({ verdict, reason }: Reading): string {
  return reason.toLowerCase().startsWith(verdict) ? `Verdict: ${reason}` : `Verdict: ${verdict}. ${reason}`;
}

const unitOf = (parameter: string): string => (parameter === 'beta' ? '' : ' cm-1');

function parameterCells(parameter: Parameter): string[] {
  if (parameter.value === null) return [`  ${parameter.name}`, 'withheld', parameter.reason ?? ''];
  const alone = parameter.u === null ? '' : `readings alone ${concise(parameter.value, parameter.u)}; `;
  return [`  ${parameter.name}`, `${concise(parameter.value, parameter.uTotal)}${unitOf(parameter.name)}`, `${alone}${parameter.standing}${parameter.reason === null ? '' : `: ${parameter.reason}`}`];
}

const signed = (value: number, decimals: number): string => `${value > 0 ? '+' : ''}${plain(value, decimals)}`;

/** "Delta +120(85) cm-1, z +1.4: not distinguishable". */
export function differenceText(parameter: SeriesParameter, found: Difference | null): string {
  if (found === null) return `${parameter} withheld`;
  const sign = found.value > 0 ? '+' : '';
  return `${parameter} ${sign}${concise(found.value, found.u)}${unitOf(parameter)}, z ${signed(found.z, 1)}: ${found.distinguishable ? 'differs' : 'not distinguishable'}`;
}

function earlierLines(earlier: readonly EarlierMeasurement[]): string[] {
  if (earlier.length === 0) return ['none'];
  return aligned(earlier.map(({ result, differences }) => [
    measurementId(result), `${result.phase}, ${result.temperature === null ? 'temperature not recorded' : `${plain(result.temperature, 0)} K`}`,
    differenceText('Delta', differences.Delta), differenceText('beta', differences.beta),
  ]), '');
}

function placeLines({ places, result }: Placement): string[] {
  return places.flatMap((place) => {
    const { sentence, conditions } = placeWords(place, result);
    const out = place.leftOut.map(({ words }) => words);
    return [sentence, ...(place.members === 0 && out.length === 0 ? [] : [`  (${conditions}${out.length === 0 ? '' : `; left out: ${out.join(', ')}`})`])];
  });
}

function predictionCells({ parameter, method, predicted, u, z, reason }: PlacedPrediction): string[] {
  const name = method === 'factors' ? 'factors' : 'average environment';
  if (predicted === null) return [parameter, name, 'nothing', reason ?? ''];
  return [parameter, name, `${concise(predicted, u)}${unitOf(parameter)}`, z === null ? 'nothing to compare it with' : `z ${signed(z, 1)}`];
}

function nearestLines({ nearest }: Placement): string[] {
  return [
    ...aligned(nearest.complexes.map(nearCells), ''),
    ...(nearest.reason === null ? [] : [nearest.complexes.length === 0 ? `none: ${nearest.reason}` : nearest.reason]),
  ];
}

function nearCells({ result, deltaOverG, beta, differs }: NearComplex): string[] {
  return [result.complex.formula, measurementId(result), `Delta/g ${significant(deltaOverG, 3)}`, beta === null ? 'beta withheld' : `beta ${significant(beta, 3)}`, differs.join('; ')];
}
