import { listed, wholeNumber } from './numbers.ts';

/** One entry of evidence as words need it. */
export interface EvidenceFacts {
  readonly code: string;
  readonly penalty: number;
  /** As printed; "" where it concerns the whole reading. */
  readonly label: string;
  readonly value: number | null;
}

/** What one entry of evidence says against a reading. */
export function evidenceWords({ code, penalty, label, value }: EvidenceFacts): string {
  const cost = penalty < 10 ? penalty.toFixed(1) : penalty.toFixed(0);
  switch (code) {
    case 'misfit':
      return `misfit, chi-square ${cost}`;
    case 'parameters':
      return `${Math.round(penalty / 2)} fitted parameter${penalty === 2 ? '' : 's'}`;
    case 'left over':
      return `${value === 1 ? 'one band is' : `${value} bands are`} left unexplained`;
    case 'gap':
      return `${label} predicted at ${wholeNumber(value!)} cm⁻¹, between assigned bands, and not seen`;
    case 'unseen':
      return `${label} predicted at ${wholeNumber(value!)} cm⁻¹, inside what was scanned, and not seen`;
    case 'below':
      return `${label} predicted at ${wholeNumber(value!)} cm⁻¹, below the lowest assigned band, outside what was scanned`;
    case 'line skipped':
      return `${label} predicted at ${wholeNumber(value!)} cm⁻¹, below an assigned line, and not seen`;
    case 'beta':
      return value === null ? 'beta out of range' : `beta would be ${value.toFixed(2)}, outside 0.5 to 1.0`;
    case 'absorptivity':
      return `ε = ${value} L mol⁻¹ cm⁻¹ is not usual for ${label}`;
    case 'width':
      return value === null ? `the band's shape is not usual for ${label}` : `a width of ${wholeNumber(value)} cm⁻¹ is not usual for ${label}`;
    case 'forbidden and broad':
      return `${label} is spin-forbidden, yet the band is broad`;
    case 'donors':
      return `the record has ${value} donor atoms`;
    default:
      return code;
  }
}

/**
 * One kind of evidence as the head of a row in which readings stand side by side: without numbers, which differ between them.
 * @param label as printed; "" where it concerns the whole reading
 */
export function evidenceHeading(code: string, label: string): string {
  switch (code) {
    case 'misfit':
      return 'misfit, chi-square';
    case 'parameters':
      return 'fitted parameters';
    case 'left over':
      return 'bands left unexplained';
    case 'gap':
      return `${label} expected between assigned bands, not seen`;
    case 'unseen':
      return `${label} expected inside what was scanned, not seen`;
    case 'below':
      return `${label} expected below the lowest assigned band`;
    case 'line skipped':
      return `${label} expected below an assigned line, not seen`;
    case 'beta':
      return 'beta outside its usual range';
    case 'absorptivity':
      return `absorption coefficient not usual for ${label}`;
    case 'width':
      return `width not usual for ${label}`;
    case 'forbidden and broad':
      return `${label} spin-forbidden, yet the band is broad`;
    case 'donors':
      return 'donor atoms of the record do not make this geometry';
    default:
      return code;
  }
}

/** Differences of evidence worth naming. */
const worthNaming = 0.5;
const namedAtMost = 3;

/**
 * Why a rival ranks where it does against the chosen reading, in one sentence.
 *
 * @param difference score of the rival minus score of the chosen reading; null where the chosen one has no fit
 */
export function rankingSentence(rival: readonly EvidenceFacts[], chosen: readonly EvidenceFacts[], difference: number | null, margin: number): string {
  const against = (own: readonly EvidenceFacts[], other: readonly EvidenceFacts[]): string[] => {
    const same = (a: EvidenceFacts, b: EvidenceFacts): boolean => a.code === b.code && a.label === b.label;
    return own
      .map((one) => ({ one, more: one.penalty - (other.find((entry) => same(entry, one))?.penalty ?? 0) }))
      .filter(({ more }) => more > worthNaming)
      .sort((a, b) => b.more - a.more)
      .slice(0, namedAtMost)
      .map(({ one }) => evidenceWords(one));
  };
  if (difference === null) return 'Gives numbers, which the chosen reading does not.';
  const worse = against(rival, chosen);
  const better = against(chosen, rival);
  const place =
    difference < -margin ? `Scores better by ${(-difference).toFixed(1)}` : difference <= margin ? `Scores as well within the margin of ${margin}` : `Ranks lower by ${difference.toFixed(1)}`;
  const speaksAgainst = worse.length > 0 ? `; against it: ${listed(worse)}` : '';
  const speaksFor = better.length > 0 ? `; against the chosen reading: ${listed(better)}` : '';
  return `${place}${speaksAgainst}${speaksFor}.`;
}
