import { concise, conciseTwoSided, evidenceWords, partInFit, plain, policyId, shownLabel, significant, spinName, wavelengthShown } from '#engine';
import type { Band, HazardCaution, Parameter, Reading } from '#engine';
import type { ComplexRecord, MeasurementRecord } from '../content/types.ts';
import { aligned } from '../report/columns.ts';
import { stressLines } from './stressLines.ts';

export interface Story {
  readonly complex: ComplexRecord;
  readonly measurement: MeasurementRecord;
  readonly readings: readonly Reading[];
  readonly hazards: readonly HazardCaution[];
}

/** One measurement's story in words: what it is, what was read, how it was fitted, how sure it is, what to watch. */
export function storyLines({ complex, measurement, readings, hazards }: Story): string[] {
  const [reading, ...rivals] = readings;
  if (reading === undefined) throw new Error(`no reading for ${complex.id}/${measurement.id}`);
  const electrons = complex.ion.electrons;
  return [
    `${complex.id}/${measurement.id}: ${complex.formula}`,
    ...hazards.map(({ text, foundIn }) => `  ${text} (Found in ${foundIn}.)`),
    '',
    'What it is',
    ...aligned(identity(complex, measurement, reading)),
    '',
    'What was read',
    ...aligned(measurement.engine.bands.map((band, index) => bandCells(band, index, measurement, reading))),
    ...aligned([
      ...measurement.engine.absent.map(({ low, high }) => ['absent', `${plain(low, 0)} to ${plain(high, 0)} cm-1`, 'looked, saw no band']),
      ...measurement.engine.scanned.map(({ low, high }) => ['scanned', `${plain(low, 0)} to ${plain(high, 0)} cm-1`]),
    ]),
    '',
    `How it was fitted (assignment ${reading.assignment})`,
    ...transitions(reading, electrons),
    ...branches(reading),
    '',
    'What it means',
    ...aligned(reading.parameters.map(parameterCells)),
    ...correlations(reading),
    '',
    verdictLine(reading),
    ...(reading.identifiability?.combination === null || reading.identifiability === null ? [] : [reading.identifiability.combination]),
    ...reading.remarks,
    ...stressLines(reading, electrons),
    ...predictions(reading, electrons),
    ...helpful(reading),
    ...evidence(reading, electrons),
    ...rivalLines(reading, rivals, electrons),
    '',
    reading.cautions.length === 0 ? 'Cautions: none from the spectrum.' : 'Cautions',
    ...aligned(reading.cautions.map(({ code, text }) => [code, text])),
    '',
    `In one sentence: ${reading.sentence}`,
  ];
}

// Many reasons begin with the verdict itself.
function verdictLine({ verdict, reason }: Reading): string {
  return reason.toLowerCase().startsWith(verdict) ? `Verdict: ${reason}` : `Verdict: ${verdict}. ${reason}`;
}

function identity(complex: ComplexRecord, measurement: MeasurementRecord, reading: Reading): string[][] {
  const multiplicity = reading.multiplicity ?? complex.multiplicity;
  const { engine } = measurement;
  const source = measurement.cite === null
    ? [measurement.notebook, measurement.by, measurement.date].filter((part) => part !== null).join('; ')
    : [measurement.cite, measurement.where].filter((part) => part !== null).join(', ');
  return [
    ['ion', `${complex.ion.name}, d${complex.ion.electrons}, ${complex.geometryName}${multiplicity === null ? '' : `, ${spinName(multiplicity)}`}${complex.spinAssumed ? ' (spin assumed)' : ''}`],
    ['sample', measurement.sample ?? 'not recorded'],
    ['conditions', `${engine.phase}, ${measurement.medium ?? 'medium not recorded'}, ${measurement.temperatureTyped ?? 'temperature not recorded'}, ${engine.technique ?? 'technique not recorded'}`],
    ['source', source === '' ? 'not recorded' : source],
    ['policy', `${policyId(measurement.policy)}, free ions ${measurement.policy.freeIons}${measurement.policyReason === null ? '' : ` (own values: ${measurement.policyReason})`}`],
  ];
}

function bandCells(band: Band, index: number, measurement: MeasurementRecord, reading: Reading): string[] {
  const shown = band.uMinus === null || band.uPlus === null
    ? `${plain(band.position, 0)} cm-1` : `${conciseTwoSided(band.position, band.uMinus, band.uPlus)} cm-1`;
  const aside = reading.notFitted.find((entry) => entry.band === index);
  return [
    `band ${index + 1}`, shown, `${wavelengthShown(band.position, band.uPlus)} nm`,
    band.role === 'transition' ? band.kind : `${band.kind}, ${band.role}`,
    `typed ${measurement.bands[index]?.positionTyped ?? ''}${aside === undefined ? '' : `; not fitted: ${aside.reason}`}`,
  ];
}

function transitions(reading: Reading, electrons: number): string[] {
  if (reading.bands.length === 0) return ['  No band is assigned to a transition.'];
  const from = reading.ground === null ? 'ground level' : shownLabel(reading.ground, electrons);
  return aligned([
    ['transition', 'bands', 'observed', 'calculated', 'obs - calc', 'floor', ''],
    ...reading.bands.map((band) => [
      `${from} to ${shownLabel(band.label, electrons)}`,
      band.bands.map((member) => member + 1).join(' + '),
      conciseTwoSided(band.observed, band.uMinus, band.uPlus) + (band.uAssumed ? ' (u assumed)' : ''),
      band.calculated === null ? '-' : plain(band.calculated, 0),
      band.residual === null ? '-' : plain(band.residual, 0),
      plain(band.floor, 0),
      partInFit(band.used, band.calculated !== null, band.bands.length),
    ]),
  ]);
}

function branches(reading: Reading): string[] {
  if (reading.branches.length === 0) return ['  No solution.'];
  const fit = [`chi2 ${reading.chi2 === null ? '-' : misfit(reading.chi2)}, ${reading.bandsUsed} bands used, ${reading.spareBands} spare`];
  if (reading.rmsResidual !== null) fit.push(`rms residual ${plain(reading.rmsResidual, 0)} cm-1`);
  if (reading.ratio !== null) fit.push(`C/B ${concise(reading.ratio.value, reading.ratio.u)} (${reading.ratio.origin})`);
  return [
    `  ${fit.join('; ')}`,
    ...aligned(reading.branches.map((branch, index) => [
      `solution ${index + 1}`, `Delta ${plain(branch.delta, 0)}`, `B ${plain(branch.racahB, 0)}`, `C ${plain(branch.racahC, 0)}`,
      `chi2 ${misfit(branch.chi2)}`, branch.chosen ? 'chosen' : '',
    ])),
  ];
}

// Where nothing is spare chi2 is zero but for rounding.
function misfit(chi2: number): string {
  return chi2 < 1e-6 ? '0' : significant(chi2, 4);
}

function parameterCells(parameter: Parameter): string[] {
  const unit = parameter.name === 'beta' ? '' : ' cm-1';
  if (parameter.value === null) return [parameter.name, 'withheld', parameter.reason ?? 'no reason recorded'];
  const alone = parameter.u === null ? '' : `readings alone ${concise(parameter.value, parameter.u)}; `;
  return [parameter.name, `${concise(parameter.value, parameter.uTotal)}${unit}`, `${alone}${parameter.standing}${parameter.reason === null ? '' : `: ${parameter.reason}`}`];
}

function correlations(reading: Reading): string[] {
  return reading.correlations.map(({ first, second, value }) => `  correlation of ${first} with ${second}: ${plain(value, 2)}`);
}

function predictions(reading: Reading, electrons: number): string[] {
  if (reading.predicted.length === 0) return [];
  const looked = { inside: 'inside what was scanned', outside: 'outside what was scanned', 'not recorded': 'what was scanned is not recorded' } as const;
  return [
    'Bands not assigned, where the fit puts them',
    ...aligned(reading.predicted.map((band) => [
      shownLabel(band.label, electrons), `${concise(band.position, band.u)} cm-1`, band.spinAllowed ? 'spin-allowed' : 'spin-forbidden', looked[band.looked],
    ])),
  ];
}

// The rows of one band differ only in the number that they would help.
function helpful({ helpfulBands }: Reading): string[] {
  return helpfulBands.length === 0 ? [] : ['To measure next, most helpful first', ...[...new Set(helpfulBands.map(({ sentence }) => sentence))].map((sentence) => `  ${sentence}`)];
}

function evidence(reading: Reading, electrons: number): string[] {
  if (reading.evidence.length === 0) return [];
  return [
    `What speaks against this reading (score ${reading.score === null ? '-' : plain(reading.score, 1)}; lower is better)`,
    ...aligned(reading.evidence.map(({ label, ...entry }) => [
      plain(entry.penalty, 1).padStart(6), evidenceWords({ ...entry, label: label === '' ? '' : shownLabel(label, electrons) }),
    ])),
  ];
}

function rivalLines(chosen: Reading, rivals: readonly Reading[], electrons: number): string[] {
  if (rivals.length === 0) return [];
  return [
    'Other readings of these bands',
    ...aligned(rivals.map((rival) => [
      rival.bands.map(({ label }) => shownLabel(label, electrons)).join(', ') + (rival.geometry === chosen.geometry ? '' : ` (${rival.geometry})`),
      ...rival.parameters.slice(0, 2).map(({ name, value, uTotal }) => (value === null ? `${name} withheld` : `${name} ${concise(value, uTotal)}`)),
      rival.verdict,
      rival.ranking ?? '',
    ])),
  ];
}
