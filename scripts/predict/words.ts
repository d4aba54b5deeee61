import { defaultPolicy, plain, shownLabel, significant, spinName, wavelengthShown } from '#engine';
import type { Geometry, Ion } from '#engine';
import { aligned } from '../report/columns.ts';
import type { PredictedTransition, Prediction } from './prediction.ts';

/** What was asked, for the answer's first lines. Energies in cm-1. */
export interface Asked {
  readonly ion: Ion;
  readonly geometry: Geometry;
  readonly delta: number;
  readonly racahB: number;
  readonly racahC: number;
  /** What was not given and taken for granted. */
  readonly assumed: readonly string[];
}

/** The prediction as lines for a person. */
export function predictionLines(asked: Asked, prediction: Prediction): string[] {
  const { ion, geometry, delta, racahB, racahC, assumed } = asked;
  const { electrons } = ion;
  const allowed = prediction.transitions.filter(({ spinAllowed }) => spinAllowed);
  const forbidden = prediction.transitions.filter(({ spinAllowed }) => !spinAllowed);
  const block = (title: string, rows: readonly PredictedTransition[]): string[] =>
    rows.length === 0 ? [`${title}: none`] : [title, ...aligned(rows.map((row) => cells(row, electrons)))];
  return [
    `${ion.name}, d${electrons}, ${geometry}: Delta ${plain(delta, 0)}, B ${plain(racahB, 0)}, C ${plain(racahC, 0)} cm-1` +
      (racahB > 0 ? `; Delta/B ${significant(delta / racahB, 4)}` : ''),
    `Ground level ${shownLabel(prediction.ground, electrons)} (${spinName(prediction.multiplicity)})`,
    `Assumed: ${assumed.length === 0 ? 'nothing' : assumed.join('; ')}`,
    ...(prediction.lowest === prediction.ground ? [] : [
      `Note: at these parameters ${shownLabel(prediction.lowest, electrons)} lies below the declared ground level.`,
    ]),
    '',
    ...block('Spin-allowed bands', allowed),
    ...block('Spin-forbidden bands', forbidden),
    '',
    `Vertical transitions in a cubic field, without spin-orbit coupling. Real bands lie within about ${defaultPolicy.floors.general} cm-1 of such a model,`,
    `spin-flip lines within ${defaultPolicy.floors.spinFlip}, two-electron bands within ${defaultPolicy.floors.twoElectron} (one standard uncertainty each).`,
  ];
}

/** The same facts for a program. Nothing is rounded. */
export function predictionFacts({ ion, geometry, delta, racahB, racahC, assumed }: Asked, prediction: Prediction) {
  return {
    ok: true, ion: ion.name, electrons: ion.electrons, geometry, Delta: delta, B: racahB, C: racahC, assumed,
    ground: prediction.ground, multiplicity: prediction.multiplicity, lowest: prediction.lowest,
    bands: prediction.transitions.map(({ label, parent, position, spinAllowed, gradient }) => ({
      label, parent, position, spinAllowed, gradient: { Delta: gradient.delta, B: gradient.racahB, C: gradient.racahC },
    })),
  };
}

function cells(row: PredictedTransition, electrons: number): string[] {
  const parent = row.parent === null ? '' : `(${row.parent})`;
  const nanometres = row.position >= 1 ? `${wavelengthShown(row.position, null)} nm` : '-';
  return [shownLabel(row.label, electrons), parent, `${plain(row.position, 0).padStart(6)} cm-1`, nanometres.padStart(8)];
}
