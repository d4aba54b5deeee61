/** One free-ion term: "2D'" is the second 2D from below; energy above the ground term, in cm-1. */
export interface Term {
  readonly term: string;
  readonly energy: number;
}

/** The terms of one spectrum: "Ti III" is the spectrum of Ti(II). A list may be incomplete. */
export interface TermTable {
  readonly spectrum: string;
  readonly ion: string;
  readonly electrons: number;
  readonly terms: readonly Term[];
}

/** Where all tables of this file come from. */
export const termSource = 'Energy levels of the NIST Atomic Spectra Database (issues of 2013 to 2016), '
  + 'averaged over J with weight 2J + 1 and given above the ground term';

/**
 * J-weighted barycentres of the d^n terms of free ions, spectrum by spectrum, in cm-1 above the ground term.
 * Source: `termSource`. The averaging is `barycentre`; tests/engine/ions/barycentre.test.ts repeats it from raw levels.
 */
export const termTables: readonly TermTable[] = [
  spectrum('Ti III', 'Ti(II)', 2,
    "3F 0.0; 1D 8231.7; 3P 10419.9; 1G 14155.8; 1S 32233.7"),
  spectrum('V III', 'V(II)', 3,
    "4F 0.0; 4P 11330.5; 2G 11751.7; 2P 15222.9; 2D 16019.8; 2H 16564.6; 2F 27441.5; 2D' 41971.7"),
  spectrum('V IV', 'V(III)', 2,
    "3F 0.0; 1D 10536.0; 3P 12924.7"),
  spectrum('Cr III', 'Cr(II)', 4,
    "5D 0.0; 3H 17064.7; 3P 17152.3; 3F 18176.7; 3G 20521.2; 1G 24787.5; 3D 25417.7; 1I 25663.6; 1S 27021.0; 1D 31800.7; 1F 36653.8; 3F' 42951.5; 3P' 43326.6; 1G' 49417.3; 1D' 65411.9"),
  spectrum('Cr IV', 'Cr(III)', 3,
    "4F 0.0; 4P 13757.7; 2G 14699.9; 2P 18919.0; 2D 20112.2; 2H 20658.0; 2F 33899.3; 2D' 52495.8"),
  spectrum('Mn III', 'Mn(II)', 5,
    "6S 0.0; 4G 26845.3; 4P 29193.2; 4D 32351.9; 2I 39175.5; 2D 41370.8; 2F 42820.3; 4F 43616.6; 2H 46600.3; 2G 47932.7; 2F' 51035.3; 2S 55677.7; 2D' 61594.4; 2G' 68896.0; 2P 83193.7; 2D'' 89515.1"),
  spectrum('Mn IV', 'Mn(III)', 4,
    "5D 0.0; 3H 20959.7; 3P 21247.7; 3F 22344.1; 3G 25152.6; 3D 30911.0; 3F' 52705.9"),
  spectrum('Mn V', 'Mn(IV)', 3,
    "4F 0.0; 4P 15974.9; 2G 17353.8; 2P 22153.2; 2D 23826.3; 2H 24350.7; 2F 39725.0; 2D' 61886.4"),
  spectrum('Fe III', 'Fe(II)', 6,
    "5D 0.0; 3P 19610.2; 3H 19828.9; 3F 21212.6; 3G 24414.6; 1I 29933.3; 3D 30361.3; 1G 30463.5; 1S 34389.5; 1D 35380.8; 1F 42474.0; 3P' 49570.5; 3F' 49837.9; 1G' 56798.8"),
  spectrum('Fe IV', 'Fe(III)', 5,
    "6S 0.0; 4G 32281.3; 4P 35305.8; 4D 38869.6; 2I 47085.0; 2D 49745.5; 2F 51725.3; 4F 52719.5; 2H 56227.7; 2G 57582.0; 2F' 61212.4; 2S 66720.1; 2D' 74118.5; 2G' 82896.0; 2P 100120.7; 2D'' 108248.6"),
  spectrum('Co III', 'Co(II)', 7,
    "4F 0.0; 4P 14560.9; 2G 16510.1; 2P 19618.1; 2H 22226.8; 2D 22712.0; 2F 36371.8"),
  spectrum('Ni III', 'Ni(II)', 8,
    "3F 0.0; 1D 13037.7; 3P 15836.3; 1G 22114.8; 1S 51538.1"),
  spectrum('Ni IV', 'Ni(III)', 7,
    "4F 0.0; 4P 17189.3; 2G 19174.5; 2P 22831.0; 2H 25964.6; 2D 26616.9; 2F 42526.1; 2D' 66585.8"),
];

function spectrum(name: string, ion: string, electrons: number, list: string): TermTable {
  const terms = list.split('; ').map((entry) => {
    const [term = '', energy = ''] = entry.split(' ');
    return { term, energy: Number(energy) };
  });
  return { spectrum: name, ion, electrons, terms };
}
