/** Measurements of tests/cases/cautions by code: one that carries the caution, and those that come near and do not. */
export const complexCases: Readonly<Record<string, { readonly raise: string; readonly spare: readonly string[] }>> = {
  TRIGONAL_FIELD: { raise: 'cr-en3/first', spare: ['cr-en2-cl2-cis/first', 'cr-am6/warm'] },
  MEASUREMENTS_DISAGREE: { raise: 'cr-en3/again', spare: ['cr-en2-cl2-cis/first', 'cr-en2-cl2-cis/again', 'cr-am6/warm', 'cr-am6/cold'] },
  CONDITIONS_DIFFER: { raise: 'cr-am6/warm', spare: ['cr-en3/first', 'cr-en2-cl2-cis/again'] },
  QUOTED_VALUE_DISAGREES: { raise: 'cr-am6/cold', spare: ['cr-am6/warm'] },
};
