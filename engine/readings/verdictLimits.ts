/** Spare bands that disagree with a probability below this make a reading strained. */
export const strainedBelow = 0.01;

/** Two solutions whose chi2 differ by less fit equally well. */
export const equalWithin = 1;
