/** One donor atom's place among the others: which ligand it belongs to and what is alike with it. */
export interface Donor {
  /** Donors of equal kind are alike: same ligand record, same element. */
  readonly kind: string;
  /** Which single ligand it is part of; donors of one ligand follow one another. */
  readonly ligand: number;
}

export type Isomer = 'cis' | 'trans' | 'fac' | 'mer' | 'none';

/** Corners of the octahedron: 0 above, 1 below, 2 to 5 around; 0-1, 2-4 and 3-5 are opposite. */
export const OPPOSITE = [1, 0, 4, 5, 2, 3] as const;

/**
 * The arrangement of six donors around a metal: for each corner the donor in it. null where the donors and the isomer leave more than one
 * arrangement open, mirror images aside: a drawing would then say more than the record. Neighbouring donors of one ligand are cis.
 */
export function octahedralArrangement(donors: readonly Donor[], isomer: Isomer): readonly number[] | null {
  if (donors.length !== 6) return null;
  const found = new Map<string, readonly number[]>();
  const tried = new Set<string>();
  for (const corners of placements(donors)) {
    const pattern = patternOf(corners, donors);
    if (tried.has(pattern)) continue;
    tried.add(pattern);
    if (!isIsomer(corners, donors, isomer)) continue;
    const key = SYMMETRIES.map((turn) => patternOf(turn.map((corner) => corners[corner]!), donors)).sort()[0]!;
    const better = found.get(key);
    if (better === undefined || pleasing(corners, donors) > pleasing(better, donors)) found.set(key, corners);
  }
  return found.size === 1 ? [...found.values()][0]! : null;
}

/** Every way to put the donors into the corners that keeps neighbours of one ligand cis; each result is the donor of each corner. */
function placements(donors: readonly Donor[]): readonly (readonly number[])[] {
  const results: number[][] = [];
  const corners: number[] = new Array<number>(6).fill(-1);
  const place = (donor: number, before: number): void => {
    if (donor === donors.length) {
      results.push([...corners]);
      return;
    }
    for (let corner = 0; corner < 6; corner++) {
      const chained = donor > 0 && donors[donor]!.ligand === donors[donor - 1]!.ligand;
      if (corners[corner] !== -1 || (chained && OPPOSITE[before] === corner)) continue;
      corners[corner] = donor;
      place(donor + 1, corner);
      corners[corner] = -1;
    }
  };
  place(0, -1);
  return results;
}

/** Kinds by corner and which corners a ligand joins: equal for arrangements that look alike. */
function patternOf(corners: readonly number[], donors: readonly Donor[]): string {
  const joined: string[] = [];
  for (let a = 0; a < 6; a++) for (let b = 0; b < 6; b++) {
    if (corners[b] === corners[a]! + 1 && donors[corners[a]!]!.ligand === donors[corners[b]!]!.ligand) joined.push(a < b ? `${a}${b}` : `${b}${a}`);
  }
  return `${corners.map((donor) => donors[donor]!.kind).join(' ')}|${joined.sort().join(' ')}`;
}

/** Turns and mirrors of the octahedron: corners that are opposite stay opposite. */
const SYMMETRIES: readonly (readonly number[])[] = symmetries();

function symmetries(): (readonly number[])[] {
  const axes = [[0, 1], [2, 4], [3, 5]] as const;
  const orders = [[0, 1, 2], [0, 2, 1], [1, 0, 2], [1, 2, 0], [2, 0, 1], [2, 1, 0]] as const;
  return orders.flatMap((order) => Array.from({ length: 8 }, (_, flips) => {
    const turn = new Array<number>(6).fill(0);
    order.forEach((from, axis) => {
      const flipped = (flips >> axis) & 1;
      turn[axes[axis]![0]] = axes[from]![flipped ? 1 : 0];
      turn[axes[axis]![1]] = axes[from]![flipped ? 0 : 1];
    });
    return turn;
  }));
}

function isIsomer(corners: readonly number[], donors: readonly Donor[], isomer: Isomer): boolean {
  if (isomer === 'none') return true;
  const groups = telling(donors, isomer === 'cis' || isomer === 'trans' ? 2 : 3);
  return groups.length > 0 && groups.every((group) => {
    const places = group.map((donor) => corners.indexOf(donor));
    const opposite = places.some((place) => places.includes(OPPOSITE[place]!));
    return isomer === 'trans' || isomer === 'mer' ? opposite : !opposite;
  });
}

/** The donors that cis and trans (two alike) or fac and mer (three alike) speak of: of single ligands where there are any, else of chelates. */
function telling(donors: readonly Donor[], size: number): readonly (readonly number[])[] {
  const kinds = [...new Set(donors.map(({ kind }) => kind))].map((kind) => donors.flatMap((donor, index) => (donor.kind === kind ? [index] : []))).filter((group) => group.length === size);
  const single = kinds.filter((group) => group.every((index) => donors.filter(({ ligand }) => ligand === donors[index]!.ligand).length === 1));
  const one = kinds.filter((group) => new Set(group.map((index) => donors[index]!.ligand)).size === 1);
  if (single.length > 0) return single;
  // Two different single ligands among donors that come in numbers: cis and trans speak of those two.
  const unlike = donors.flatMap((donor, index) => (donors.filter(({ kind, ligand }) => kind === donor.kind || ligand === donor.ligand).length === 1 ? [index] : []));
  if (size === 2 && unlike.length === 2) return [unlike];
  return one.length > 0 ? one : kinds;
}

/** Of arrangements that are alike by turning, the one that reads best: rare donors above and below, chelates where their arcs part. */
function pleasing(corners: readonly number[], donors: readonly Donor[]): number {
  const rarity = (corner: number): number => -donors.filter(({ kind }) => kind === donors[corners[corner]!]!.kind).length;
  const joined = (a: number, b: number): number => Number(donors[corners[a]!]!.ligand === donors[corners[b]!]!.ligand);
  return 8 * (rarity(0) + rarity(1)) + 0.5 * rarity(0) + 0.2 * rarity(3) + 6 * (joined(3, 2) + joined(4, 5) + joined(0, 2) + joined(1, 4)) - 3 * (joined(3, 4) + joined(2, 5));
}
