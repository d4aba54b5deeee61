import type { Verdict } from '#engine';
import type { Refit } from '../database/refit.ts';
import { verdicts } from '../database/refit.ts';
import { aligned, counted } from './columns.ts';

const meanings: Readonly<Record<Verdict, string>> = {
  tested: 'spare bands agree',
  untested: 'no spare band, no test possible',
  assumed: 'a published number hangs on an assumed value',
  strained: 'spare bands disagree',
  'not determinable': 'the bands cannot fix any parameter',
  refused: 'no parameters reproduce the assignment',
};

/** "0.4 s", "12 s", "2 min 5 s". */
export function duration(milliseconds: number): string {
  const seconds = milliseconds / 1000;
  if (seconds < 10) return `${seconds.toFixed(1)} s`;
  if (seconds < 60) return `${Math.round(seconds)} s`;
  const whole = Math.round(seconds);
  return `${Math.floor(whole / 60)} min ${whole % 60} s`;
}

/** What a refit did, as lines for a person: records, measurements, verdicts. An empty collection gets the next step. */
export function refitLines(refit: Refit): string[] {
  const { records, complexes, measurements, refitted } = refit;
  if (complexes === 0) {
    return [
      `Read ${counted(records, 'record')}. The collection has no complexes yet.`,
      'Next: write content/complexes/my-first.yaml (content/README.md has an example to copy), then run "npm run check".',
    ];
  }
  const kept = measurements - refitted;
  return [
    `Read ${counted(records, 'record')}: ${counted(complexes, 'complex', 'complexes')} with ${counted(measurements, 'measurement')}` +
      ` (${refitted} fitted now, ${kept} unchanged).`,
    ...aligned(verdicts.map((verdict) => [String(refit.verdicts[verdict]).padStart(6), verdict, meanings[verdict]])),
  ];
}

/** The same facts for a program. */
export function refitFacts(refit: Refit): Readonly<Record<string, unknown>> {
  return {
    records: refit.records,
    complexes: refit.complexes,
    measurements: refit.measurements,
    fitted: refit.refitted,
    verdicts: refit.verdicts,
    policy: refit.frame.policyId,
  };
}
