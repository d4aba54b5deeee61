import { elementName, formulaKeys, type FormulaKeys, type SearchedComplex, type SearchedLigand } from '#engine';

type Ligand = Omit<SearchedLigand, 'count'> & { readonly charge: number };

/** Ligands for the search tests. */
export const ligands: Readonly<Record<string, Ligand>> = {
  ammine: { name: 'ammine', formula: 'NH3', abbreviation: null, synonyms: ['ammonia'], donors: ['N'], charge: 0 },
  aqua: { name: 'aqua', formula: 'H2O', abbreviation: null, synonyms: ['water'], donors: ['O'], charge: 0 },
  en: { name: 'ethane-1,2-diamine', formula: 'C2H8N2', abbreviation: 'en', synonyms: ['ethylenediamine'], donors: ['N', 'N'], charge: 0 },
  bpy: { name: "2,2'-bipyridine", formula: 'C10H8N2', abbreviation: 'bpy', synonyms: ['bipy'], donors: ['N', 'N'], charge: 0 },
  ox: { name: 'oxalato', formula: 'C2O4 2-', abbreviation: 'ox', synonyms: ['oxalate', 'ethanedioato'], donors: ['O', 'O'], charge: -2 },
  chlorido: { name: 'chlorido', formula: 'Cl-', abbreviation: null, synonyms: [], donors: ['Cl'], charge: -1 },
  fluorido: { name: 'fluorido', formula: 'F-', abbreviation: null, synonyms: [], donors: ['F'], charge: -1 },
  cyanido: { name: 'cyanido', formula: 'CN-', abbreviation: null, synonyms: [], donors: ['C'], charge: -1 },
  thiocyanato: { name: 'thiocyanato-κN', formula: 'NCS-', abbreviation: null, synonyms: ['isothiocyanato', 'SCN'], donors: ['N'], charge: -1 },
  dmso: { name: 'dimethyl sulfoxide', formula: '(CH3)2SO', abbreviation: 'dmso', synonyms: ['DMSO'], donors: ['O'], charge: 0 },
  carbonyl: { name: 'carbonyl', formula: 'CO', abbreviation: null, synonyms: [], donors: ['C'], charge: 0 },
};

const rows: readonly (readonly [id: string, formula: string, metal: string, oxidation: number, bound: string, isomer?: string])[] = [
  ['cr-am6', '[Cr(NH3)6]3+', 'Cr', 3, 'ammine 6'],
  ['cr-am5cl', '[CrCl(NH3)5]2+', 'Cr', 3, 'chlorido 1, ammine 5'],
  ['cr-aq6', '[Cr(H2O)6]3+', 'Cr', 3, 'aqua 6'],
  ['cr2-aq6', '[Cr(H2O)6]2+', 'Cr', 2, 'aqua 6'],
  ['cr-en3', '[Cr(en)3]3+', 'Cr', 3, 'en 3'],
  ['cr-cis-en2cl2', 'cis-[CrCl2(en)2]+', 'Cr', 3, 'chlorido 2, en 2', 'cis'],
  ['cr-trans-en2cl2', 'trans-[CrCl2(en)2]+', 'Cr', 3, 'chlorido 2, en 2', 'trans'],
  ['cr-ox3', '[Cr(ox)3]3-', 'Cr', 3, 'ox 3'],
  ['cr-cn6', '[Cr(CN)6]3-', 'Cr', 3, 'cyanido 6'],
  ['cr-f6', '[CrF6]3-', 'Cr', 3, 'fluorido 6'],
  ['cr-ncs6', '[Cr(NCS)6]3-', 'Cr', 3, 'thiocyanato 6'],
  ['cr-co6', '[Cr(CO)6]', 'Cr', 0, 'carbonyl 6'],
  ['co-am6', '[Co(NH3)6]3+', 'Co', 3, 'ammine 6'],
  ['co-cl4', '[CoCl4]2-', 'Co', 2, 'chlorido 4'],
  ['fe2-cn6', '[Fe(CN)6]4-', 'Fe', 2, 'cyanido 6'],
  ['fe3-cn6', '[Fe(CN)6]3-', 'Fe', 3, 'cyanido 6'],
  ['ni-aq6', '[Ni(H2O)6]2+', 'Ni', 2, 'aqua 6'],
  ['ni-bpy3', '[Ni(bpy)3]2+', 'Ni', 2, 'bpy 3'],
  ['ni-dmso6', '[Ni(dmso)6]2+', 'Ni', 2, 'dmso 6'],
  ['v-aq6', '[V(H2O)6]3+', 'V', 3, 'aqua 6'],
];

function complex(row: (typeof rows)[number]): SearchedComplex {
  const [, formula, metal, oxidation, bound, isomer = 'none'] = row;
  const list = bound.split(', ').map((one) => {
    const [id = '', count = ''] = one.split(' ');
    const ligand = ligands[id];
    if (!ligand) throw new Error(id);
    return { ...ligand, count: Number(count) };
  });
  const charge = list.reduce((sum, { charge: one, count }) => sum + one * count, oxidation);
  return { formula, charge, isomer, metal, metalName: elementName(metal), oxidation, ligands: list };
}

/** An invented collection: ids with their keys. */
export const collection: readonly { readonly id: string; readonly keys: FormulaKeys }[] = rows.map((row) => ({ id: row[0], keys: formulaKeys(complex(row)) }));
