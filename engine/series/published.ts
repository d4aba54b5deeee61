// Jorgensen's printed factors. Drawn beside the group's own, never mixed into a fit.

/** A printed ligand factor pair. `composition` and `donors` recognise the ligand: elements in alphabetical order with their numbers. */
export interface PublishedLigand {
  readonly name: string;
  readonly composition: string;
  /** Donor atoms in alphabetical order. */
  readonly donors: string;
  readonly f: number | null;
  readonly h: number | null;
}

/** A printed ion. g in cm-1. The print names no spin state; `multiplicity` is that of its octahedral complexes with water or halides. */
export interface PublishedIon {
  readonly ion: string;
  readonly multiplicity: number;
  readonly g: number | null;
  readonly k: number | null;
}

/** Where the factors are printed; seen in a web copy. */
export const publishedFactorsSource = 'C. K. Jørgensen, Modern Aspects of Ligand Field Theory (1971), pp. 347–348, and Absorption Spectra and Chemical Bonding (1962), p. 113';

/** What is not from that print: recalled, the page not seen. */
export const publishedFactorsFromMemory = 'h of iodide and of dimethylformamide, and the spin states of the ions, are from memory';

const ligand = (name: string, composition: string, donors: string, f: number | null, h: number | null = null): PublishedLigand => ({ name, composition, donors, f, h });

/** In the order of f as printed; where f is not printed, at the end. */
export const publishedLigands: readonly PublishedLigand[] = [
  ligand('bromide', 'Br', 'Br', 0.72, 2.3), ligand('thiocyanate, S bound', 'C N S', 'S', 0.75), ligand('chloride', 'Cl', 'Cl', 0.78, 2),
  ligand('phosphoryl chloride', 'Cl3 O P', 'O', 0.82), ligand('azide', 'N3', 'N', 0.83), ligand('fluoride', 'F', 'F', 0.9, 0.8),
  ligand('dimethyl sulfoxide, O bound', 'C2 H6 O S', 'O', 0.91), ligand('acetone', 'C3 H6 O', 'O', 0.92, 1.2), ligand('ethanol', 'C2 H6 O', 'O', 0.97),
  ligand('dimethylformamide', 'C3 H7 N O', 'O', 0.98, 1.2), ligand('oxalate', 'C2 O4', 'O O', 0.99, 1.5), ligand('water', 'H2 O', 'O', 1, 1),
  ligand('thiourea', 'C H4 N2 S', 'S', 1.01), ligand('thiocyanate, N bound', 'C N S', 'N', 1.02), ligand('selenocyanate, N bound', 'C N Se', 'N', 1.03),
  ligand('glycinate', 'C2 H4 N O2', 'N O', 1.18), ligand('sulfite', 'O3 S', 'S', 1.2), ligand('acetonitrile', 'C2 H3 N', 'N', 1.22),
  ligand('pyridine', 'C5 H5 N', 'N', 1.23), ligand('ammonia', 'H3 N', 'N', 1.25, 1.4), ligand('ethylenediamine', 'C2 H8 N2', 'N N', 1.28, 1.5),
  ligand('o-phenylenebis(dimethylarsine)', 'As2 C10 H16', 'As As', 1.33), ligand('2,2′-bipyridine', 'C10 H8 N2', 'N N', 1.33),
  ligand('nitrite, N bound', 'N O2', 'N', 1.4), ligand('cyanide', 'C N', 'C', 1.7, 2),
  ligand('urea', 'C H4 N2 O', 'O', null, 1.2), ligand('iodide', 'I', 'I', null, 2.7),
];

const ion = (name: string, multiplicity: number, g: number | null, k: number | null = null): PublishedIon => ({ ion: name, multiplicity, g, k });

/** In the order of g as printed. */
export const publishedIons: readonly PublishedIon[] = [
  ion('Mn(II)', 6, 8000, 0.07), ion('Fe(II)', 5, 8500, 0.08), ion('Ni(II)', 3, 8700, 0.12), ion('Co(II)', 4, 9000, 0.09), ion('V(II)', 4, 12000, 0.08),
  ion('Fe(III)', 6, 14000, 0.24), ion('Cu(III)', 3, 15700), ion('Cr(III)', 4, 17400, 0.21), ion('Co(III)', 1, 18200, 0.35), ion('Ru(II)', 1, 20000),
  ion('Ag(III)', 3, 20400), ion('Ni(IV)', 1, 22000), ion('Mn(IV)', 4, 24000, 0.5), ion('Mo(III)', 4, 24600, 0.15), ion('Rh(III)', 1, 27000, 0.3),
  ion('Pd(IV)', 1, 29000), ion('Tc(IV)', 4, 31000), ion('Ir(III)', 1, 32000, 0.3), ion('Pt(IV)', 1, 36000, 0.5),
];
