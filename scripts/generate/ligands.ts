// The ligands of the generator: real chemistry, invented factors.

/** How strongly bands absorb: weak (oxygen and fluorine donors), middle (nitrogen donors, halides), strong (pi acceptors). */
export type AbsorptionClass = 'weak' | 'middle' | 'strong';

export interface LigandEntry {
  /** Record id. */
  readonly id: string;
  /** Short form in record ids, "am". */
  readonly key: string;
  /** Symbol in a formula of the complex, "NH3", "en". */
  readonly symbol: string;
  readonly name: string;
  readonly formula: string;
  readonly abbreviation: string | null;
  readonly synonyms: readonly string[];
  readonly charge: number;
  readonly donors: readonly string[];
  readonly smiles: string;
  /** Invented f and h; 1 for aqua by the choice of gauge. */
  readonly f: number;
  readonly h: number;
  /** Foot of charge transfer on Cr(III), cm-1. */
  readonly edge: number;
  /** true where charge transfer goes to the ligand and its foot hangs on the metal alone. */
  readonly acceptor: boolean;
  readonly absorption: AbsorptionClass;
  /** A usual solvent of its complexes, and a usual ion to go with a cation of them. */
  readonly solvents: readonly string[];
}

type Chemistry = Pick<LigandEntry, 'id' | 'key' | 'symbol' | 'name' | 'formula' | 'charge' | 'smiles'> & { donors: string; abbreviation?: string; synonyms?: readonly string[] };
type Invented = Pick<LigandEntry, 'f' | 'h' | 'edge' | 'absorption'> & { solvents: readonly string[]; acceptor?: true };

function entry(chemistry: Chemistry, invented: Invented): LigandEntry {
  return {
    ...chemistry, ...invented,
    donors: chemistry.donors.split(' '),
    abbreviation: chemistry.abbreviation ?? null,
    synonyms: chemistry.synonyms ?? [],
    acceptor: invented.acceptor ?? false,
  };
}

const water = ['water'];
const organic = ['acetonitrile', 'methanol', 'dichloromethane'];

/**
 * f and h are invented: near the printed ones (C. K. Jorgensen, Absorption Spectra and Chemical Bonding, 1962, p. 113; Modern
 * Aspects of Ligand Field Theory, 1971) and on purpose not equal to them. Names: IUPAC Recommendations 2005.
 */
export const ligandEntries: readonly LigandEntry[] = [
  entry({ id: 'aqua', key: 'aq', symbol: 'H2O', name: 'aqua', formula: 'H2O', charge: 0, donors: 'O', smiles: 'O', synonyms: ['water', 'aquo'] },
    { f: 1, h: 1, edge: 41000, absorption: 'weak', solvents: water }),
  entry({ id: 'ammine', key: 'am', symbol: 'NH3', name: 'ammine', formula: 'NH3', charge: 0, donors: 'N', smiles: 'N', synonyms: ['ammonia'] },
    { f: 1.23, h: 1.36, edge: 41000, absorption: 'middle', solvents: water }),
  entry({ id: 'en', key: 'en', symbol: 'en', name: 'ethane-1,2-diamine', formula: 'C2H8N2', abbreviation: 'en', charge: 0, donors: 'N N', smiles: 'NCCN', synonyms: ['ethylenediamine', '1,2-diaminoethane'] },
    { f: 1.265, h: 1.45, edge: 41000, absorption: 'middle', solvents: water }),
  entry({ id: 'oxalato', key: 'ox', symbol: 'ox', name: 'ethanedioato', formula: 'C2O4 2-', abbreviation: 'ox', charge: -2, donors: 'O O', smiles: 'C(=O)(C(=O)[O-])[O-]', synonyms: ['oxalato', 'oxalate'] },
    { f: 1.01, h: 1.43, edge: 36500, absorption: 'middle', solvents: water }),
  entry({ id: 'glycinato', key: 'gly', symbol: 'gly', name: 'glycinato', formula: 'C2H4NO2-', abbreviation: 'gly', charge: -1, donors: 'N O', smiles: 'NCC(=O)[O-]', synonyms: ['aminoacetato', 'glycinate'] },
    { f: 1.15, h: 1.47, edge: 38500, absorption: 'middle', solvents: water }),
  entry({ id: 'acac', key: 'acac', symbol: 'acac', name: '2,4-dioxopentan-3-ido', formula: 'C5H7O2-', abbreviation: 'acac', charge: -1, donors: 'O O', smiles: 'CC(=O)[CH-]C(C)=O', synonyms: ['acetylacetonato', 'pentane-2,4-dionato'] },
    { f: 1.035, h: 1.75, edge: 25500, absorption: 'middle', solvents: ['trichloromethane', 'toluene', 'acetonitrile'] }),
  entry({ id: 'fluorido', key: 'f', symbol: 'F', name: 'fluorido', formula: 'F-', charge: -1, donors: 'F', smiles: '[F-]', synonyms: ['fluoro', 'fluoride'] },
    { f: 0.875, h: 0.84, edge: 44000, absorption: 'weak', solvents: ['hydrofluoric acid, 1 mol L-1'] }),
  entry({ id: 'chlorido', key: 'cl', symbol: 'Cl', name: 'chlorido', formula: 'Cl-', charge: -1, donors: 'Cl', smiles: '[Cl-]', synonyms: ['chloro', 'chloride'] },
    { f: 0.765, h: 1.9, edge: 28500, absorption: 'middle', solvents: ['acetonitrile', 'dichloromethane', 'nitromethane'] }),
  entry({ id: 'bromido', key: 'br', symbol: 'Br', name: 'bromido', formula: 'Br-', charge: -1, donors: 'Br', smiles: '[Br-]', synonyms: ['bromo', 'bromide'] },
    { f: 0.7, h: 2.2, edge: 24000, absorption: 'middle', solvents: ['dichloromethane', 'nitromethane'] }),
  entry({ id: 'iodido', key: 'i', symbol: 'I', name: 'iodido', formula: 'I-', charge: -1, donors: 'I', smiles: '[I-]', synonyms: ['iodo', 'iodide'] },
    { f: 0.65, h: 2.6, edge: 18500, absorption: 'middle', solvents: ['dichloromethane'] }),
  entry({ id: 'cyanido', key: 'cn', symbol: 'CN', name: 'cyanido', formula: 'CN-', charge: -1, donors: 'C', smiles: '[C-]#N', synonyms: ['cyano', 'cyanide'] },
    { f: 1.61, h: 2.1, edge: 43000, absorption: 'middle', solvents: water }),
  entry({ id: 'thiocyanato-n', key: 'ncs', symbol: 'NCS', name: 'thiocyanato-κN', formula: 'NCS-', charge: -1, donors: 'N', smiles: '[N-]=C=S', synonyms: ['isothiocyanato', 'thiocyanate, bound by nitrogen'] },
    { f: 1.045, h: 1.72, edge: 29500, absorption: 'middle', solvents: ['acetonitrile', 'acetone'] }),
  entry({ id: 'azido', key: 'azide', symbol: 'N3', name: 'azido', formula: 'N3^-', charge: -1, donors: 'N', smiles: '[N-]=[N+]=[N-]', synonyms: ['azide'] },
    { f: 0.86, h: 1.85, edge: 27000, absorption: 'middle', solvents: water }),
  entry({ id: 'nitrito-n', key: 'nitro', symbol: 'NO2', name: 'nitrito-κN', formula: 'NO2-', charge: -1, donors: 'N', smiles: '[O-]N=O', synonyms: ['nitro', 'nitrite, bound by nitrogen'] },
    { f: 1.43, h: 1.65, edge: 31000, absorption: 'middle', solvents: water }),
  entry({ id: 'acetonitrile', key: 'mecn', symbol: 'MeCN', name: 'acetonitrile', formula: 'C2H3N', abbreviation: 'MeCN', charge: 0, donors: 'N', smiles: 'CC#N', synonyms: ['ethanenitrile', 'methyl cyanide'] },
    { f: 1.19, h: 1.42, edge: 40000, absorption: 'weak', solvents: ['acetonitrile'] }),
  entry({ id: 'dmso-o', key: 'dmso', symbol: 'dmso', name: '(methanesulfinyl)methane-κO', formula: 'C2H6OS', abbreviation: 'dmso', charge: 0, donors: 'O', smiles: 'CS(C)=O', synonyms: ['dimethyl sulfoxide', 'DMSO, bound by oxygen'] },
    { f: 0.93, h: 1.22, edge: 37500, absorption: 'weak', solvents: ['dimethyl sulfoxide'] }),
  entry({ id: 'urea', key: 'urea', symbol: 'urea', name: 'urea', formula: 'CH4N2O', abbreviation: 'ur', charge: 0, donors: 'O', smiles: 'NC(N)=O', synonyms: ['carbonic diamide', 'carbamide'] },
    { f: 0.92, h: 1.17, edge: 38500, absorption: 'weak', solvents: ['water saturated with urea'] }),
  entry({ id: 'pyridine', key: 'py', symbol: 'py', name: 'pyridine', formula: 'C5H5N', abbreviation: 'py', charge: 0, donors: 'N', smiles: 'c1ccncc1', synonyms: ['azabenzene'] },
    { f: 1.2, h: 1.48, edge: 31500, absorption: 'middle', solvents: ['pyridine', 'trichloromethane'] }),
  entry({ id: 'imidazole', key: 'im', symbol: 'Him', name: '1H-imidazole', formula: 'C3H4N2', abbreviation: 'Him', charge: 0, donors: 'N', smiles: 'c1c[nH]cn1', synonyms: ['imidazole', '1,3-diazole'] },
    { f: 1.13, h: 1.41, edge: 37000, absorption: 'middle', solvents: ['methanol', 'water'] }),
  entry({ id: 'bpy', key: 'bpy', symbol: 'bpy', name: "2,2'-bipyridine", formula: 'C10H8N2', abbreviation: 'bpy', charge: 0, donors: 'N N', smiles: 'c1ccnc(c1)c1ccccn1', synonyms: ['bipyridyl', "2,2'-dipyridyl"] },
    { f: 1.38, h: 2, edge: 27500, absorption: 'strong', acceptor: true, solvents: ['water', ...organic] }),
  entry({ id: 'phen', key: 'phen', symbol: 'phen', name: '1,10-phenanthroline', formula: 'C12H8N2', abbreviation: 'phen', charge: 0, donors: 'N N', smiles: 'c1cc2ccc3cccnc3c2nc1', synonyms: ['o-phenanthroline', '4,5-diazaphenanthrene'] },
    { f: 1.39, h: 1.95, edge: 27500, absorption: 'strong', acceptor: true, solvents: ['water', ...organic] }),
];

const byId = new Map(ligandEntries.map((one) => [one.id, one]));

/** The ligand by its record id. Throws RangeError where there is none. */
export function ligandEntry(id: string): LigandEntry {
  const found = byId.get(id);
  if (!found) throw new RangeError(`ligandEntry: no ligand "${id}"`);
  return found;
}
