/** What a number is. */
export type Standing = 'measured' | 'fitted' | 'assumed' | 'predicted' | 'quoted' | 'withheld';

/** What a reading is worth, the first that applies. */
export type Verdict = 'refused' | 'not determinable' | 'strained' | 'assumed' | 'untested' | 'tested';

export type ParameterName = 'Delta' | 'B' | 'C' | 'beta';
