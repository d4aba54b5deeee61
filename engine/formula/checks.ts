/**
 * Charge of a complex: oxidation number of its metal ion (times the number of metals) plus the charges of its ligands.
 * @throws RangeError where a number is not whole or a count is below 1
 */
export function complexCharge(oxidation: number, ligands: readonly { readonly charge: number; readonly count: number }[], metals = 1): number {
  if (!Number.isInteger(oxidation)) throw new RangeError(`oxidation must be a whole number, got ${oxidation}`);
  return ligands.reduce((sum, { charge, count }) => sum + whole(charge, 'charge') * positive(count), oxidation * positive(metals));
}

/**
 * Number of donor atoms bound: for each ligand its count times the donors it binds with.
 * @throws RangeError where a number is not whole or below 1
 */
export function donorCount(ligands: readonly { readonly bound: number; readonly count: number }[]): number {
  return ligands.reduce((sum, { bound, count }) => sum + positive(bound) * positive(count), 0);
}

function whole(value: number, name: string): number {
  if (!Number.isInteger(value)) throw new RangeError(`${name} must be a whole number, got ${value}`);
  return value;
}

function positive(value: number): number {
  if (!(Number.isInteger(value) && value >= 1)) throw new RangeError(`a count must be a whole number from 1 on, got ${value}`);
  return value;
}
