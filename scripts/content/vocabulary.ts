// Closed lists of the record format: geometries with their number of donor atoms, spins.

/** Number of donor atoms by geometry; null where it is open. Octahedral and tetrahedral complexes are fitted. */
export const geometries = {
  octahedral: 6,
  tetrahedral: 4,
  linear: 2,
  'trigonal planar': 3,
  'square planar': 4,
  'square pyramidal': 5,
  'trigonal bipyramidal': 5,
  'trigonal prismatic': 6,
  'pentagonal bipyramidal': 7,
  'square antiprismatic': 8,
  dodecahedral: 8,
  cubic: 8,
  other: null,
} as const satisfies Readonly<Record<string, number | null>>;

export type GeometryName = keyof typeof geometries;

export const geometryNames = Object.keys(geometries) as [GeometryName, ...GeometryName[]];

/** Multiplicities by their names. */
export const multiplicities = { singlet: 1, doublet: 2, triplet: 3, quartet: 4, quintet: 5, sextet: 6 } as const;

export const spinNames = ['high', 'low', 'intermediate', 'singlet', 'doublet', 'triplet', 'quartet', 'quintet', 'sextet'] as const;

export type SpinName = (typeof spinNames)[number];
