import type { Policy } from '#engine';
import type { PolicyRow } from './rows.ts';

/** A policy of the database as the engine takes it. */
export function policyOf(row: PolicyRow): Policy {
  return {
    name: row.name,
    cOverB: { general: { value: row.C_over_B, u: row.C_over_B_u }, perIon: JSON.parse(row.C_over_B_per_ion) as Policy['cOverB']['perIon'] },
    cFitted: row.C_fitted === 1,
    floors: { general: row.floor_general, spinFlip: row.floor_spin_flip, twoElectron: row.floor_two_electron },
    ceilings: { delta: row.ceiling_Delta, racahB: row.ceiling_B, racahC: row.ceiling_C },
    differentialFloor: { delta: row.differential_Delta, racahB: row.differential_B },
    freeIons: row.free_ion_set as Policy['freeIons'], rivalMargin: row.rival_margin,
    defaultUncertainties: { maximum: row.default_u_maximum, line: row.default_u_line },
  };
}
