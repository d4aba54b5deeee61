import { evidenceWords, shownLabel } from '#engine';
import type { Reading } from '#engine';
import type { Row, Tables } from './row.ts';

/** Rows of what tests a reading: evidence, bands worth looking for, pairs alone, bands left out. */
export function detailRows(key: Row, reading: Reading, electrons: number): Tables {
  return {
    evidence: reading.evidence.map(({ code, label, penalty, value }, index) => ({
      ...key, number: index + 1, code, label: label === '' ? null : label, penalty,
      text: evidenceWords({ code, penalty, value, label: label === '' ? '' : shownLabel(label, electrons) }),
    })),
    helpful_band: reading.helpfulBands.flatMap(({ label, low, high, gains, sentence }, index) =>
      gains.map(({ parameter, uNow, uThen }) => ({ ...key, number: index + 1, parameter, label, low, high, u_now: uNow, u_then: uThen, sentence }))),
    stress_pair: (reading.stress?.pairs ?? []).map(({ labels: [first, second], bands: [one, other], at }) => ({
      ...key, first_number: one + 1, second_number: other + 1, first, second, Delta: at?.delta ?? null, B: at?.racahB ?? null,
    })),
    stress_left_out: (reading.stress?.leftOut ?? []).map(({ label, band, at, predicted, z }) => ({
      ...key, number: band + 1, label, Delta: at?.delta ?? null, B: at?.racahB ?? null, C: at?.racahC ?? null, predicted, z,
    })),
  };
}
