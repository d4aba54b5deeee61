/** What the table of bands under stress shows: `tried` where each band was also left out. */
export function stressCaption(tried: boolean): string {
  return tried ? 'Each band under stress: its weight in the fit, then the fit without it and where that puts it' : 'Each band’s weight in the fit';
}

/** What the table of pairs shows. */
export const pairsCaption = 'Each pair alone: Δ; B, in cm⁻¹';
