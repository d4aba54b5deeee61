import type { Ion } from '../ions/types.ts';
import type { FormulaGroup } from './formulaGroups.ts';

/** One class of hazard with all that raises it. The table is common practice, written from memory; no source. */
export interface HazardClass {
  /** Lasting code. */
  readonly code: string;
  /** What it is and why it matters; completes "Caution: ...". */
  readonly text: string;
  /** Raised by words or formula fragments in any text; matched in the text as typed. */
  readonly words?: RegExp;
  /** Raised by words in media only. */
  readonly mediumWords?: RegExp;
  /** Raised by a group of atoms in any formula. */
  readonly group?: (group: FormulaGroup) => boolean;
  /** As `group`, for ligand records and bracketed groups only: in free text the same letters mean something harmless. */
  readonly ligandGroup?: (group: FormulaGroup) => boolean;
  /** Raised by the metal ion. */
  readonly ion?: (ion: Ion) => boolean;
}

/** true where the atoms, metals and at most one hydrogen apart, are exactly these. */
function isJust(group: FormulaGroup, wanted: Readonly<Record<string, number>>): boolean {
  if (group.organic) return false;
  const rest = [...group.atoms].filter(([symbol, count]) => nonmetals.has(symbol) && !(symbol === 'H' && count === 1 && !('H' in wanted)));
  return rest.length === Object.keys(wanted).length && rest.every(([symbol, count]) => wanted[symbol] === count);
}

/** true where one C stands with one N (or O) and no further atom but metals, halogens and at most one hydrogen. */
function isTriplyBound(group: FormulaGroup, partner: 'N' | 'O'): boolean {
  const atoms = new Map([...group.atoms].filter(([symbol]) => !halogens.has(symbol)));
  return isJust({ atoms, organic: group.organic }, { C: 1, [partner]: 1 });
}

function hasElement(symbols: ReadonlySet<string>): (group: FormulaGroup) => boolean {
  return ({ atoms }) => [...atoms.keys()].some((symbol) => symbols.has(symbol));
}

const nonmetals = new Set(['H', 'D', 'B', 'C', 'N', 'O', 'F', 'Si', 'P', 'S', 'Cl', 'Se', 'Br', 'Te', 'I']);
const halogens = new Set(['F', 'Cl', 'Br', 'I']);
const toxicElements = new Set(['Tl', 'Be', 'Cd', 'Hg', 'As', 'Sb']);
const radioactiveElements = new Set(['Tc', 'Pm', 'Po', 'Ra', 'Th', 'Pa', 'U', 'Np', 'Pu', 'Am', 'Cm']);
const sensitisingMetals = new Set(['Ni', 'Co']);

export const hazardClasses: readonly HazardClass[] = [
  {
    code: 'PERCHLORATE',
    text: 'perchlorate. Perchlorate salts of metal complexes may explode when dry, heated, ground or struck.',
    words: /ClO_?\{?4(?!\d)|perchlor/i,
  },
  {
    code: 'CHLORATE',
    text: 'chlorate. Chlorates are strong oxidants and may explode with anything that burns.',
    words: /ClO_?\{?3(?!\d)|\bchlorates?\b|\bchloric acid/i,
  },
  {
    code: 'PICRATE',
    text: 'picrate. Picrates of metals may explode when dry, heated or struck.',
    words: /\bpicr(?:ate|ic|ato)|C6H2\(NO2\)3O|C6H2N3O7|C6H3N3O7|trinitrophenol/i,
  },
  {
    code: 'PEROXO',
    text: 'peroxo compound or peroxide. It may explode when dry, heated or in contact with anything that burns.',
    words: /(?<!su)peroxid[eo](?![- ]f)|(?<!su)peroxo|(?<![A-Za-z\d)])H2O2(?!\d)/i,
    ligandGroup: (group) => isJust(group, { O: 2 }),
  },
  {
    code: 'AZIDE',
    text: 'azide. Azides of heavy metals are explosive; azides are very toxic, and acids set free hydrazoic acid.',
    words: /(?<!hydr|carb)azid[eo]|hydrazoic/i,
    group: (group) => isJust(group, { N: 3 }),
  },
  {
    code: 'CYANIDE',
    text: 'cyanide. Cyanides are very toxic; acids set free hydrogen cyanide, a very toxic gas.',
    words: /(?<!thio|seleno|iso)cyan(?:id[eo]|o(?=[ ,;)]|$|chrom|mangan|ferr|cobalt|nickel|cupr|molybd|metall?ate))/i,
    group: (group) => isTriplyBound(group, 'N'),
  },
  {
    code: 'NICKEL_CARBONYL',
    text: 'nickel with carbon monoxide. Nickel carbonyl is volatile and extremely toxic.',
    words: /nickel (?:tetra)?carbonyl|Ni\(CO\)_?4/i,
  },
  {
    code: 'CARBONYL',
    text: 'metal carbonyl. Metal carbonyls are very toxic, many are volatile, and they set free carbon monoxide.',
    words: /(?<!di|organo)carbonyl(?! group)|carbon monoxide/i,
    group: (group) => isTriplyBound(group, 'O'),
  },
  {
    code: 'TOXIC_ELEMENT',
    text: 'thallium, beryllium, cadmium, mercury, arsenic or antimony. Compounds of these elements are very toxic.',
    words: /thall(?:ium|ous)|beryllium|cadmium|mercur(?:y(?! lamp)|ic|ous)|\barsen|\barsin|antimon|stibin/i,
    group: hasElement(toxicElements),
  },
  {
    code: 'OSMIUM_TETROXIDE',
    text: 'osmium tetroxide. It is volatile and extremely toxic, and it damages the eyes.',
    words: /OsO_?\{?4(?!\d)|osmium tetr?oxide|osmium\(VIII\)/i,
    ion: (ion) => ion.metal === 'Os' && ion.oxidation === 8,
  },
  {
    code: 'PHOSPHINE',
    text: 'phosphine. Phosphines are toxic, the small ones very toxic, and some ignite in air.',
    words: /phosph(?:ine|ane)s?\b|phosphin[eo]\b/i,
    group: (group) => isJust(group, { P: 1, H: 3 }),
  },
  {
    code: 'CARCINOGENIC_METAL',
    text: 'chromium(VI), nickel or cobalt. Compounds of these may cause cancer and allergies of the skin and lungs.',
    words: /CrO_?\{?[34](?!\d)|Cr2O7|\b(?:di)?chromates?\b(?!\()|chromic acid|chromium trioxide|chromium\(VI\)/i,
    group: hasElement(sensitisingMetals),
    ion: (ion) => sensitisingMetals.has(ion.metal) || (ion.metal === 'Cr' && ion.oxidation === 6),
  },
  {
    code: 'FLUORIDE',
    text: 'fluoride, tetrafluoroborate or hexafluorophosphate. Water or acid may set free hydrogen fluoride, which is very toxic and burns deeply.',
    words: /(?:BF_?4|PF_?6|SbF_?6|AsF_?6|SiF_?6)(?!\d)|fluorid[eo]|\bfluoro\b|fluoro(?:borate|phosphate|antimonate|arsenate|silicate|metall?ate)|hydrofluoric/i,
    group: ({ atoms, organic }) => atoms.has('F') && !atoms.has('C') && !organic,
  },
  {
    code: 'HYDRAZINE',
    text: 'hydrazine. Hydrazine is very toxic and may cause cancer; its metal salts may explode.',
    words: /hydrazin|(?<![A-Za-z\d])N2H[45](?!\d)|\(N2H[45]\)|NH2NH2/i,
  },
  {
    code: 'PEROXIDE_FORMER',
    text: 'solvent that forms peroxides. Old or evaporated ethers may hold explosive peroxides.',
    mediumWords: /(?<!petroleum |petrol |crown |crown-)\bether\b|\b(?:2-?)?(?:me-?)?thf\b|tetrahydrofuran|\bdioxane?\b|dimethoxyethane|\bdme\b|glyme|\bepa\b/i,
  },
  {
    code: 'RADIOACTIVE',
    text: 'radioactive element. Handle it only where the law and your local rules allow.',
    words: /\buran|thorium|techneti|pertechnet|plutoni|neptuni|americi/i,
    group: hasElement(radioactiveElements),
    ion: (ion) => radioactiveElements.has(ion.metal),
  },
];
