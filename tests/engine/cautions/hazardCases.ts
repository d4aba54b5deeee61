import type { HazardSubject } from '#engine';
import { ionNamed } from '../measurement/sample.ts';

export const sample = (text: string): Partial<HazardSubject> => ({ measurements: [{ id: 'm', sample: text, medium: null, host: null }] });
const medium = (text: string): Partial<HazardSubject> => ({ measurements: [{ id: 'm', sample: null, medium: text, host: null }] });
const host = (text: string): Partial<HazardSubject> => ({ measurements: [{ id: 'm', sample: null, medium: null, host: text }] });
export const ligand = (id: string, formula: string, name = id): Partial<HazardSubject> =>
  ({ ligands: [{ id, name, formula, abbreviation: null, synonyms: [] }] });
const formula = (text: string, of = 'Cr(III)'): Partial<HazardSubject> => ({ formula: text, ion: ionNamed(of) });

/** For each code: records that must raise it, and records that look alike and must not. */
export const hazardCases: Readonly<Record<string, { readonly raise: readonly Partial<HazardSubject>[]; readonly spare: readonly Partial<HazardSubject>[] }>> = {
  PERCHLORATE: {
    raise: [sample('[Cr(NH3)6](ClO4)3'), sample('[Cr(NH₃)₆](ClO₄)₃'), medium('0.1 M HClO4'), medium('dilute perchloric acid'), sample('the perchlorate')],
    spare: [sample('[Cr(NH3)6]Cl3'), medium('0.1 M HCl'), sample('[Cr(NH3)5(ClO3)](NO3)2')],
  },
  CHLORATE: {
    raise: [sample('[Cr(NH3)6](ClO3)3'), medium('potassium chlorate')],
    spare: [sample('[Cr(NH3)6](ClO4)3'), sample('perchlorate salt'), medium('chloride')],
  },
  PICRATE: {
    raise: [sample('picrate salt'), medium('picric acid')],
    spare: [sample('sulfate salt'), ligand('pic', 'C6H4NO2', 'picolinato'), ligand('picoline', 'C6H7N', '4-picoline')],
  },
  PEROXO: {
    raise: [formula('[Cr(O2)2(NH3)3]', 'Cr(IV)'), ligand('peroxido', 'O2'), medium('3 % H2O2'), sample('peroxido complex')],
    spare: [formula('[CrO2Cl2]', 'Cr(VI)'), medium('water, O2 excluded'), sample('superoxide salt'), medium('peroxide-free dioxane')],
  },
  AZIDE: {
    raise: [formula('[Cr(N3)6]3-'), ligand('azido', 'N3', 'azido'), medium('1 M NaN3')],
    spare: [ligand('dien', 'C4H13N3', 'diethylenetriamine'), formula('[Cr(NH3)3Cl3]'), ligand('hydrazido', 'N2H3', 'hydrazido')],
  },
  CYANIDE: {
    raise: [formula('[Cr(CN)6]3-'), sample('K3[Cr(CN)6]'), medium('1 M KCN'), ligand('cyanido', 'CN'), formula('[Cr(NH3)5CN]2+'), sample('potassium hexacyanidochromate(III)')],
    spare: [formula('[Cr(NCS)6]3-'), formula('[Cr(SCN)6]3-'), medium('CH3CN'), medium('MeCN'), ligand('ncs', 'NCS', 'isothiocyanato'), medium('acetonitrile'), ligand('ocn', 'OCN', 'cyanato')],
  },
  NICKEL_CARBONYL: {
    raise: [formula('[Ni(CO)4]', 'Ni(0)'), medium('nickel carbonyl')],
    spare: [formula('[Ni(CO3)(NH3)4]', 'Ni(II)'), formula('[Cr(CO)6]', 'Cr(0)')],
  },
  CARBONYL: {
    raise: [formula('[Cr(CO)6]', 'Cr(0)'), ligand('carbonyl', 'CO'), formula('[Ni(CO)4]', 'Ni(0)')],
    spare: [formula('[Cr(CO3)3]3-'), ligand('oxalato', 'C2O4'), medium('CO2 atmosphere'), sample('[Co(NH3)6]Cl3')],
  },
  TOXIC_ELEMENT: {
    raise: [formula('[HgI4]2-', 'Hg(II)'), sample('Tl3[CrCl6]'), host('CdS'), host('K2BeF4'), sample('(AsPh4)2[CoCl4]'), host('CsSbF6'), medium('mercury pool')],
    spare: [sample('As prepared'), medium('In ethanol'), sample('Be careful'), host('CaS')],
  },
  OSMIUM_TETROXIDE: {
    raise: [formula('[OsO4]', 'Os(VIII)'), medium('trace of OsO4')],
    spare: [formula('[OsCl6]2-', 'Os(IV)'), formula('[OsO2Cl4]2-', 'Os(VI)')],
  },
  PHOSPHINE: {
    raise: [ligand('pme3', 'PMe3', 'trimethylphosphine'), ligand('ph3', 'PH3', 'phosphane')],
    spare: [ligand('po4', 'PO4', 'phosphato'), medium('phosphate buffer')],
  },
  CARCINOGENIC_METAL: {
    raise: [formula('[CrO4]2-', 'Cr(VI)'), formula('[Ni(NH3)6]2+', 'Ni(II)'), formula('[CoCl4]2-', 'Co(II)'), host('KNiF3'), medium('K2CrO4'), sample('potassium dichromate')],
    spare: [formula('[Cr(NH3)6]3+'), formula('[Cr(CO)6]', 'Cr(0)'), sample('potassium hexacyanidochromate(III)'), formula('[Cu(NH3)4]2+', 'Cu(II)')],
  },
  FLUORIDE: {
    raise: [formula('[CrF6]3-'), sample('[Cr(NH3)6](BF4)3'), sample('[Cr(bpy)3](PF6)3'), host('KMgF3'), ligand('fluorido', 'F'), medium('hydrofluoric acid')],
    spare: [sample('[Cr(NH3)6](CF3SO3)3'), ligand('hfac', 'C5HF6O2', 'hexafluoroacetylacetonato'), medium('trifluoroethanol'), formula('[Fe(H2O)6]2+', 'Fe(II)')],
  },
  HYDRAZINE: {
    raise: [ligand('n2h4', 'N2H4', 'hydrazine'), formula('[Cr(N2H4)6]3+'), medium('hydrazine hydrate')],
    spare: [ligand('en', 'C2H8N2', 'ethane-1,2-diamine'), ligand('hydrazone', 'C7H8N2', 'benzaldehyde hydrazone')],
  },
  PEROXIDE_FORMER: {
    raise: [medium('THF'), medium('diethyl ether'), medium('1,4-dioxane'), medium('EPA'), medium('2-MeTHF')],
    spare: [medium('petroleum ether'), medium('ethanol'), sample('recrystallised from ether'), medium('ethers excluded')],
  },
  RADIOACTIVE: {
    raise: [formula('[TcCl6]2-', 'Tc(IV)'), host('UO2F2'), host('ThO2'), medium('uranyl nitrate')],
    spare: [medium('UV grade ethanol'), sample('Thin film'), medium('Tris buffer'), formula('[ReCl6]2-', 'Re(IV)')],
  },
};
