import type { Placement } from '#engine';
import { place, planted, regular } from '../series/plantedSeries.ts';
import { result } from '../series/sample.ts';
import type { Invented } from '../series/sample.ts';

const mixed = planted('Cr(III)', { ammine: 3, chlorido: 3 });
const at = (delta: number, more: Partial<Invented> = {}) => planted('Cr(III)', { ammine: 3, chlorido: 3 }, { delta, ...more });
const ownDelta = mixed.parameters.Delta.value!;
const earlier = (away: number) => [...regular, at(ownDelta - away, { id: 'old-name', measurement: 'aq-1998' })];
const withoutTemperature = (kept: number) => regular.map((one, i) => (i === kept ? one : { ...one, temperature: null }));
const manganese = { ion: 'Mn(IV)', ligands: { thiourea: 6 }, delta: 16000 };

/** Placements by the code of a caution: one that raises it, and one that comes near and does not. */
export const placingCases: Readonly<Record<string, readonly [trigger: () => Placement, nearMiss: () => Placement]>> = {
  ALREADY_THERE: [() => place(mixed, [...regular, mixed]), () => place(mixed, [...regular, planted('Cr(III)', { ammine: 4, chlorido: 2 })])],
  ID_TAKEN: [() => place({ ...mixed, complex: { ...mixed.complex, id: 'criii--aqua6' } }), () => place({ ...mixed, complex: { ...mixed.complex, id: 'criii--aqua5' } })],
  NO_OTHER_RECORD: [() => place(result({ ion: 'Mn(IV)', ligands: { ammine: 6 }, delta: 30000 })), () => place(result({ ion: 'Mn(IV)', ligands: { ammine: 6 }, delta: 30000 }), [...regular, result(manganese)])],
  SERIES_OF_ONE: [() => place(mixed, [planted('Cr(III)', { aqua: 6 })]), () => place(mixed, [planted('Cr(III)', { aqua: 6 }), planted('Cr(III)', { cyanido: 6 })])],
  LIGAND_NEVER_SEEN: [() => place(result({ ligands: { thiourea: 6 }, delta: 17000 })), () => place(result({ ligands: { thiourea: 6 }, delta: 17000 }), [...regular, result(manganese)])],
  ISLAND_OF_ITS_OWN: [() => place(result({ ...manganese, ligands: { thiourea: 5, urea: 1 } }), [...regular, result(manganese)]), () => place(result({ ...manganese, ligands: { thiourea: 5, aqua: 1 } }), [...regular, result(manganese), result({ ...manganese, ligands: { aqua: 6 } })])],
  OTHER_POLICY: [() => place({ ...mixed, policy: 'own-1' }), () => place(mixed)],
  TEMPERATURE_NOT_RECORDED: [() => place({ ...mixed, temperature: null }), () => place(mixed)],
  TEMPERATURES_MIXED: [() => place(mixed, withoutTemperature(-1)), () => place(mixed, withoutTemperature(regular.findIndex(({ complex }) => complex.ion.name === 'Cr(III)')).filter(({ complex }) => complex.ion.name === 'Cr(III)'))],
  PHASES_MIXED: [() => place({ ...mixed, phase: 'crystal' }), () => place(mixed)],
  EARLIER_DISAGREES: [() => place(mixed, earlier(400)), () => place(mixed, earlier(100))],
  FAR_FROM_PREDICTION: [() => place(at(1.3 * ownDelta)), () => place(at(1.03 * ownDelta))],
  SCATTER_ASSUMED: [() => place(mixed, regular.slice(0, 6)), () => place(mixed)],
};
