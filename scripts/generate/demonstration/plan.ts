// The complexes of the demonstration and how each was measured.

import type { Recipe } from '../recipes.ts';
import type { Spin } from '../metalIons.ts';
import { scans } from '../settings.ts';
import { crystal, doped, glass, powder, solution } from './conditions.ts';
import type { Planned } from './conditions.ts';

export interface PlannedComplex {
  readonly recipe: Recipe;
  /** Ion that the salt is made with; "" for a neutral complex. */
  readonly counter: string;
  /** Water of crystallisation. */
  readonly water: number;
  readonly measurements: readonly Planned[];
}

interface Particulars {
  readonly spin?: Spin;
  readonly geometry?: Recipe['geometry'];
  readonly isomer?: Recipe['isomer'];
  readonly water?: number;
}

function complex(id: string, ion: string, ligands: Readonly<Record<string, number>>, counter: string, measurements: readonly Planned[], particulars: Particulars = {}): PlannedComplex {
  const { spin = null, geometry = 'octahedral', isomer = 'none', water = 0 } = particulars;
  return { recipe: { id, ion, geometry, spin, ligands: Object.entries(ligands), isomer }, counter, water, measurements };
}

const high = { spin: 'high' } as const;
const low = { spin: 'low' } as const;
const tetrahedral = { geometry: 'tetrahedral' } as const;
const cis = { isomer: 'cis' } as const;
const trans = { isomer: 'trans' } as const;
const dilute = 'perchloric acid, 0.1 mol L-1';

const early: readonly PlannedComplex[] = [
  complex('ti-aq6', 'Ti(III)', { aqua: 6 }, 'Cl', [solution('TL', 'hydrochloric acid, 0.1 mol L-1'), crystal('SQ', 80)]),
  complex('ti-urea6', 'Ti(III)', { urea: 6 }, 'I', [powder('SQ')]),
  complex('ti-f6', 'Ti(III)', { fluorido: 6 }, 'K', [powder('BR')]),
  complex('v4-cl4', 'V(IV)', { chlorido: 4 }, '', [solution('EV', 'hexane', scans.red)], tetrahedral),
  complex('v3-aq6', 'V(III)', { aqua: 6 }, 'Br', [solution('TL', 'perchloric acid, 1 mol L-1'), crystal('TL', 80)]),
  complex('v3-urea6', 'V(III)', { urea: 6 }, 'I', [powder('OM')]),
  complex('v3-ox3', 'V(III)', { oxalato: 3 }, 'K', [solution('OM', 'water'), crystal('EV', 20)], { water: 3 }),
  complex('v3-f6', 'V(III)', { fluorido: 6 }, 'K', [powder('SQ')]),
  complex('v3-cl6', 'V(III)', { chlorido: 6 }, 'Cs', [powder('SQ')]),
  complex('v3-acac3', 'V(III)', { acac: 3 }, '', [solution('BR', 'toluene')]),
  complex('v3-cl4', 'V(III)', { chlorido: 4 }, 'PPh4', [solution('EV', 'dichloromethane', scans.wide)], tetrahedral),
  complex('v2-aq6', 'V(II)', { aqua: 6 }, 'SO4', [solution('TL', 'sulfuric acid, 0.5 mol L-1')]),
  complex('v2-en3', 'V(II)', { en: 3 }, 'Br', [solution('OM', 'ethane-1,2-diamine')]),
  complex('v2-bpy3', 'V(II)', { bpy: 3 }, 'I', [solution('SQ', 'methanol')]),
];

const chromium: readonly PlannedComplex[] = [
  complex('cr-aq6', 'Cr(III)', { aqua: 6 }, 'NO3', [solution('TL', dilute, scans.ultraviolet), crystal('EV', 20), solution('BR', 'nitric acid, 0.1 mol L-1', scans.usual, { id: 'aq-295-later' })], { water: 3 }),
  complex('cr-am6', 'Cr(III)', { ammine: 6 }, 'NO3', [solution('TL', 'water'), crystal('TL', 80)]),
  complex('cr-en3', 'Cr(III)', { en: 3 }, 'Cl', [solution('OM', 'water'), crystal('EV', 80)], { water: 3 }),
  complex('cr-ox3', 'Cr(III)', { oxalato: 3 }, 'K', [solution('TL', 'water'), doped('SQ', 'K3[Al(C2O4)3].3H2O', 80)], { water: 3 }),
  complex('cr-cn6', 'Cr(III)', { cyanido: 6 }, 'K', [solution('OM', 'water', scans.ultraviolet)]),
  complex('cr-f6', 'Cr(III)', { fluorido: 6 }, 'K', [powder('SQ'), doped('EV', 'K2NaAlF6', 80)]),
  complex('cr-cl6', 'Cr(III)', { chlorido: 6 }, 'Cs', [powder('BR')]),
  complex('cr-urea6', 'Cr(III)', { urea: 6 }, 'I', [solution('OM', 'water saturated with urea'), crystal('TL', 80)]),
  complex('cr-dmso6', 'Cr(III)', { 'dmso-o': 6 }, 'ClO4', [solution('SQ', 'dimethyl sulfoxide')]),
  complex('cr-ncs6', 'Cr(III)', { 'thiocyanato-n': 6 }, 'K', [solution('OM', 'water')], { water: 4 }),
  complex('cr-azide6', 'Cr(III)', { azido: 6 }, 'PPh4', [solution('EV', 'acetonitrile')]),
  complex('cr-acac3', 'Cr(III)', { acac: 3 }, '', [solution('BR', 'trichloromethane')]),
  complex('cr-gly3-fac', 'Cr(III)', { glycinato: 3 }, '', [powder('SQ', scans.usual)], { isomer: 'fac' }),
  complex('cr-bpy3', 'Cr(III)', { bpy: 3 }, 'ClO4', [solution('EV', 'water')]),
  complex('cr-am5-aq', 'Cr(III)', { ammine: 5, aqua: 1 }, 'NO3', [solution('TL', 'water')]),
  complex('cr-am5-cl', 'Cr(III)', { ammine: 5, chlorido: 1 }, 'Cl', [solution('TL', 'water')]),
  complex('cr-am5-f', 'Cr(III)', { ammine: 5, fluorido: 1 }, 'NO3', [solution('SQ', 'water')]),
  complex('cr-am3-aq3-fac', 'Cr(III)', { ammine: 3, aqua: 3 }, 'NO3', [solution('OM', 'water')], { isomer: 'fac' }),
  complex('cr-am3-aq3-mer', 'Cr(III)', { ammine: 3, aqua: 3 }, 'NO3', [solution('OM', 'water')], { isomer: 'mer' }),
  complex('cr-en2-cl2-cis', 'Cr(III)', { en: 2, chlorido: 2 }, 'Cl', [solution('TL', 'methanol')], cis),
  complex('cr-en2-cl2-trans', 'Cr(III)', { en: 2, chlorido: 2 }, 'Cl', [solution('TL', 'methanol')], trans),
  complex('cr-en2-f2-trans', 'Cr(III)', { en: 2, fluorido: 2 }, 'BF4', [solution('EV', 'water')], trans),
  complex('cr-am2-ncs4-trans', 'Cr(III)', { ammine: 2, 'thiocyanato-n': 4 }, 'NH4', [solution('OM', 'water')], { isomer: 'trans', water: 1 }),
  complex('cr2-aq6', 'Cr(II)', { aqua: 6 }, 'SO4', [solution('TL', 'sulfuric acid, 0.5 mol L-1')], high),
  complex('mo3-cl6', 'Mo(III)', { chlorido: 6 }, 'K', [powder('EV')]),
];

const manganeseAndIron: readonly PlannedComplex[] = [
  complex('mn4-f6', 'Mn(IV)', { fluorido: 6 }, 'K', [doped('EV', 'K2SiF6', 80), powder('SQ')]),
  complex('mn3-aq6', 'Mn(III)', { aqua: 6 }, 'SO4', [solution('TL', 'sulfuric acid, 5 mol L-1')], high),
  complex('mn3-ox3', 'Mn(III)', { oxalato: 3 }, 'K', [powder('OM')], { spin: 'high', water: 3 }),
  complex('mn2-aq6', 'Mn(II)', { aqua: 6 }, 'ClO4', [solution('TL', 'water'), crystal('SQ', 80)], high),
  complex('mn2-f6', 'Mn(II)', { fluorido: 6 }, '', [doped('EV', 'KMgF3', 20), doped('SQ', 'TlMgF3', 80)], high),
  complex('mn2-cl4', 'Mn(II)', { chlorido: 4 }, 'NEt4', [powder('OM')], { ...high, ...tetrahedral }),
  complex('mn2-br4', 'Mn(II)', { bromido: 4 }, 'NEt4', [powder('OM'), crystal('EV', 80)], { ...high, ...tetrahedral }),
  complex('fe3-aq6', 'Fe(III)', { aqua: 6 }, 'ClO4', [solution('TL', 'perchloric acid, 2 mol L-1'), crystal('SQ', 80)], high),
  complex('fe3-ox3', 'Fe(III)', { oxalato: 3 }, 'K', [crystal('OM', 295)], { spin: 'high', water: 3 }),
  complex('fe3-f6', 'Fe(III)', { fluorido: 6 }, 'K', [powder('BR')], high),
  complex('fe3-cl4', 'Fe(III)', { chlorido: 4 }, 'NEt4', [crystal('EV', 80)], { ...high, ...tetrahedral }),
  complex('fe2-aq6', 'Fe(II)', { aqua: 6 }, 'SO4', [solution('TL', 'sulfuric acid, 0.1 mol L-1', scans.wide), crystal('SQ', 80)], high),
  complex('fe2-mecn6', 'Fe(II)', { acetonitrile: 6 }, 'BF4', [solution('EV', 'acetonitrile', scans.wide)], high),
  complex('fe2-cn6', 'Fe(II)', { cyanido: 6 }, 'K', [solution('OM', 'water', scans.ultraviolet)], { spin: 'low', water: 3 }),
];

const cobaltThree: readonly PlannedComplex[] = [
  complex('co3-aq6', 'Co(III)', { aqua: 6 }, 'ClO4', [solution('TL', 'perchloric acid, 4 mol L-1')], low),
  complex('co3-am6', 'Co(III)', { ammine: 6 }, 'Cl', [solution('TL', 'water', scans.ultraviolet), crystal('EV', 80)], low),
  complex('co3-en3', 'Co(III)', { en: 3 }, 'Cl', [solution('OM', 'water'), crystal('TL', 80)], low),
  complex('co3-ox3', 'Co(III)', { oxalato: 3 }, 'K', [solution('OM', 'water'), doped('SQ', 'K3[Al(C2O4)3].3H2O', 80)], { spin: 'low', water: 3 }),
  complex('co3-cn6', 'Co(III)', { cyanido: 6 }, 'K', [solution('SQ', 'water', scans.ultraviolet)], low),
  complex('co3-f6', 'Co(III)', { fluorido: 6 }, 'K', [powder('BR')], high),
  complex('co3-gly3-fac', 'Co(III)', { glycinato: 3 }, '', [solution('SQ', 'sulfuric acid, 1 mol L-1')], { spin: 'low', isomer: 'fac' }),
  complex('co3-gly3-mer', 'Co(III)', { glycinato: 3 }, '', [solution('SQ', 'water')], { spin: 'low', isomer: 'mer' }),
  complex('co3-am5-cl', 'Co(III)', { ammine: 5, chlorido: 1 }, 'Cl', [solution('TL', 'water')], low),
  complex('co3-am5-azide', 'Co(III)', { ammine: 5, azido: 1 }, 'ClO4', [solution('EV', 'water')], low),
  complex('co3-en2-cl2-trans', 'Co(III)', { en: 2, chlorido: 2 }, 'Cl', [solution('TL', 'methanol')], { spin: 'low', isomer: 'trans' }),
  complex('co3-en2-cl2-cis', 'Co(III)', { en: 2, chlorido: 2 }, 'Cl', [solution('TL', 'methanol')], { spin: 'low', isomer: 'cis' }),
  complex('co3-nitro6', 'Co(III)', { 'nitrito-n': 6 }, 'Na', [solution('OM', 'water')], low),
  complex('rh-aq6', 'Rh(III)', { aqua: 6 }, 'ClO4', [solution('EV', 'perchloric acid, 1 mol L-1', scans.ultraviolet)], low),
  complex('rh-am6', 'Rh(III)', { ammine: 6 }, 'NO3', [solution('SQ', 'water', scans.ultraviolet)], low),
  complex('rh-en3', 'Rh(III)', { en: 3 }, 'Cl', [solution('SQ', 'water', scans.ultraviolet)], low),
  complex('rh-cl6', 'Rh(III)', { chlorido: 6 }, 'K', [solution('EV', 'hydrochloric acid, 6 mol L-1')], low),
  complex('ru-am6', 'Ru(II)', { ammine: 6 }, 'Cl', [solution('EV', 'water', scans.ultraviolet)], low),
];

const lateDivalent: readonly PlannedComplex[] = [
  complex('co2-aq6', 'Co(II)', { aqua: 6 }, 'NO3', [solution('TL', 'water', scans.wide), crystal('TL', 80)], high),
  complex('co2-am6', 'Co(II)', { ammine: 6 }, 'Cl', [powder('OM')], high),
  complex('co2-mecn6', 'Co(II)', { acetonitrile: 6 }, 'BF4', [solution('SQ', 'acetonitrile', scans.wide)], high),
  complex('co2-dmso6', 'Co(II)', { 'dmso-o': 6 }, 'ClO4', [solution('EV', 'dimethyl sulfoxide', scans.red)], high),
  complex('co2-cl4', 'Co(II)', { chlorido: 4 }, 'NEt4', [solution('TL', 'acetonitrile', scans.red), crystal('EV', 80)], tetrahedralHigh()),
  complex('co2-br4', 'Co(II)', { bromido: 4 }, 'NEt4', [solution('OM', 'nitromethane', scans.red)], tetrahedralHigh()),
  complex('co2-i4', 'Co(II)', { iodido: 4 }, 'NEt4', [solution('SQ', 'dichloromethane', scans.red)], tetrahedralHigh()),
  complex('co2-ncs4', 'Co(II)', { 'thiocyanato-n': 4 }, 'NEt4', [solution('BR', 'acetone', scans.red)], tetrahedralHigh()),
  complex('ni-aq6', 'Ni(II)', { aqua: 6 }, 'SO4', [solution('TL', 'water', scans.wide), crystal('TL', 80)]),
  complex('ni-am6', 'Ni(II)', { ammine: 6 }, 'Cl', [solution('OM', 'aqueous ammonia, 10 mol L-1'), powder('SQ')]),
  complex('ni-en3', 'Ni(II)', { en: 3 }, 'NO3', [solution('TL', 'water', scans.wide), crystal('EV', 80)]),
  complex('ni-gly3', 'Ni(II)', { glycinato: 3 }, 'Na', [solution('BR', 'water')]),
  complex('ni-mecn6', 'Ni(II)', { acetonitrile: 6 }, 'BF4', [solution('SQ', 'acetonitrile', scans.wide)]),
  complex('ni-dmso6', 'Ni(II)', { 'dmso-o': 6 }, 'ClO4', [solution('EV', 'dimethyl sulfoxide', scans.wide)]),
  complex('ni-im6', 'Ni(II)', { imidazole: 6 }, 'NO3', [powder('BR')]),
  complex('ni-bpy3', 'Ni(II)', { bpy: 3 }, 'ClO4', [solution('OM', 'water')]),
  complex('ni-phen3', 'Ni(II)', { phen: 3 }, 'Cl', [solution('EV', 'water'), glass('EV', 'ethanol and methanol, 4 to 1', 80)]),
  complex('ni-en2-aq2-trans', 'Ni(II)', { en: 2, aqua: 2 }, 'Cl', [solution('BR', 'water', scans.wide)], trans),
  complex('ni-py4-cl2-trans', 'Ni(II)', { pyridine: 4, chlorido: 2 }, '', [powder('SQ')], trans),
  complex('ni-cl4', 'Ni(II)', { chlorido: 4 }, 'NEt4', [solution('SQ', 'nitromethane', scans.red)], tetrahedral),
  complex('ni-br4', 'Ni(II)', { bromido: 4 }, 'NEt4', [solution('OM', 'dichloromethane', scans.red)], tetrahedral),
  complex('cu-aq6', 'Cu(II)', { aqua: 6 }, 'ClO4', [solution('TL', 'water'), crystal('SQ', 80)]),
  complex('cu-en3', 'Cu(II)', { en: 3 }, 'SO4', [powder('OM')]),
  complex('cu-cl4', 'Cu(II)', { chlorido: 4 }, 'Cs', [powder('SQ')], tetrahedral),
];

function tetrahedralHigh(): Particulars {
  return { ...high, ...tetrahedral };
}

export const plan: readonly PlannedComplex[] = [...early, ...chromium, ...manganeseAndIron, ...cobaltThree, ...lateDivalent];
