/** The element symbols of the IUPAC periodic table of 2016, with D for deuterium. */
export const elementSymbols: ReadonlySet<string> = new Set((
  'H He Li Be B C N O F Ne Na Mg Al Si P S Cl Ar K Ca Sc Ti V Cr Mn Fe Co Ni Cu Zn Ga Ge As Se Br Kr Rb Sr Y Zr Nb Mo Tc Ru Rh Pd Ag Cd In Sn Sb Te I Xe '
  + 'Cs Ba La Ce Pr Nd Pm Sm Eu Gd Tb Dy Ho Er Tm Yb Lu Hf Ta W Re Os Ir Pt Au Hg Tl Pb Bi Po At Rn Fr Ra Ac Th Pa U Np Pu Am Cm Bk Cf Es Fm Md No Lr '
  + 'Rf Db Sg Bh Hs Mt Ds Rg Cn Nh Fl Mc Lv Ts Og D'
).split(' '));

/** Organic groups with a symbol of their own. Ac is read as acetyl, never as actinium. */
export const residueSymbols: ReadonlySet<string> = new Set(['Me', 'Et', 'Bu', 'Ph', 'Cp', 'Bz', 'Ac']);

const nonMetals: ReadonlySet<string> = new Set('H D He B C N O F Ne Si P S Cl Ar Ge As Se Br Kr Te I Xe At Rn Ts Og'.split(' '));

/** true for the symbol of a metal; half-metals count as non-metals. */
export function isMetal(symbol: string): boolean {
  return elementSymbols.has(symbol) && !nonMetals.has(symbol);
}
