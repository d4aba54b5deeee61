/** A coded warning that travels with a number to every page and export. */
export interface Caution {
  /** Lasting code, "LOOSE_B". */
  readonly code: string;
  readonly text: string;
}
