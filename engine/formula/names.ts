/** A ligand of a complex as its record describes it. */
export interface LigandName {
  readonly name: string;
  readonly count: number;
}

const anions: Readonly<Record<string, string>> = Object.fromEntries((
  'Sc scandate, Ti titanate, V vanadate, Cr chromate, Mn manganate, Fe ferrate, Co cobaltate, Ni nickelate, Cu cuprate, Zn zincate, '
  + 'Y yttrate, Zr zirconate, Nb niobate, Mo molybdate, Tc technetate, Ru ruthenate, Rh rhodate, Pd palladate, Ag argentate, Cd cadmate, '
  + 'La lanthanate, Hf hafnate, Ta tantalate, W tungstate, Re rhenate, Os osmate, Ir iridate, Pt platinate, Au aurate, Hg mercurate'
).split(', ').map((entry) => entry.split(' ') as [string, string]));

const simple = ['', '', 'di', 'tri', 'tetra', 'penta', 'hexa', 'hepta', 'octa'];
const complicated = ['', '', 'bis', 'tris', 'tetrakis', 'pentakis', 'hexakis', 'heptakis', 'octakis'];

/** Names that begin with a number word, hold locants or are made of several words take bis, tris and brackets. */
function isComplicated(name: string): boolean {
  return /[\d\s(),-]|^(di|tri|tetra|penta|hexa|bis|tris)|^(urea|pyridine|thiourea)$|(amine|ol|one|azole|ine)$/.test(name) && !/^(ammine|aqua)$/.test(name);
}

function numbered({ name, count }: LigandName): string {
  if (isComplicated(name)) return count === 1 ? (/[\d\s,-]/.test(name) ? `(${name})` : name) : `${complicated[count] ?? count}(${name})`;
  return (simple[count] ?? String(count)) + name;
}

/**
 * Additive name of a complex, "hexaamminechromium(III)", "tris(ethane-1,2-diamine)cobalt(III)", "tetrachloridocobaltate(II)": ligands in
 * alphabetical order of their names whatever their number, then the metal, as -ate in an anion, with its oxidation number. Nomenclature of
 * Inorganic Chemistry, IUPAC Recommendations 2005 (Red Book), IR-9.2.2. No configuration, no linkage, one metal.
 * @param metal element symbol of a d-block metal
 * @param metalName its English name
 * @param oxidation the Roman numeral, "III"
 */
export function additiveName(metal: string, metalName: string, oxidation: string, ligands: readonly LigandName[], charge: number): string {
  const sorted = [...ligands].sort((a, b) => (a.name < b.name ? -1 : a.name > b.name ? 1 : 0));
  const centre = charge < 0 ? (anions[metal] ?? `${metalName}ate`) : metalName;
  return `${sorted.map(numbered).join('')}${centre}(${oxidation})`;
}

// Red Book 2005, IR-9.2.2.3: anionic ligands end in -ido; the older -o names are still what most people type.
const older: readonly (readonly [string, string])[] = [
  ['fluorido', 'fluoro'], ['chlorido', 'chloro'], ['bromido', 'bromo'], ['iodido', 'iodo'], ['cyanido', 'cyano'],
  ['hydroxido', 'hydroxo'], ['oxido', 'oxo'], ['aqua', 'aquo'], ['aqua', 'water'], ['ammine', 'ammonia'],
  ['fluorido', 'fluoride'], ['chlorido', 'chloride'], ['bromido', 'bromide'], ['iodido', 'iodide'], ['cyanido', 'cyanide'], ['oxido', 'oxide'],
  ['oxalato', 'oxalate'], ['ethane-1,2-diamine', 'ethylenediamine'], ["2,2'-bipyridine", 'bipyridyl'], ["2,2'-bipyridine", 'bipy'], ["2,2'-bipyridine", 'dipy'],
];

/** Other names under which a ligand of this name may be looked for. */
export function otherLigandNames(name: string): readonly string[] {
  return older.filter(([now]) => now === name).map(([, then]) => then);
}
