import { type FieldIon, groundCrossings, levels, parentOf } from '#engine';

export interface CurvePoint { readonly x: number; readonly y: number }

/** One level over the whole field axis; x is Delta/B, y is E/B. */
export interface LevelCurve {
  /** Letter forms of the levels that run together; one but for accidental degeneracies. */
  readonly labels: readonly string[];
  readonly multiplicity: number;
  readonly points: readonly CurvePoint[];
}

export interface GroundRange { readonly from: number; readonly to: number; readonly label: string; readonly multiplicity: number }

export interface LevelDiagram {
  readonly ion: FieldIon;
  readonly cOverB: number;
  readonly reach: number;
  readonly curves: readonly LevelCurve[];
  /** The ground level along the axis, in order; more than one where the ground level changes. */
  readonly grounds: readonly GroundRange[];
  /** Free-ion terms at Delta = 0; `letter` names several where terms coincide, "P,H". */
  readonly terms: readonly { readonly letter: string | null; readonly multiplicity: number; readonly y: number }[];
}

/**
 * Energies E/B of all levels of an ion over Delta/B from 0 to `reach` at a fixed C/B (Tanabe & Sugano, J. Phys. Soc.
 * Jpn. 9, 753 (1954)). The ground level is 0 throughout. Where the ground level changes is a point of every curve,
 * so that the kinks are sharp.
 */
export function levelDiagram(ion: FieldIon, cOverB: number, reach: number, steps = 60): LevelDiagram {
  const at = (x: number) => levels(ion, { delta: x, racahB: 1, racahC: cOverB });
  const crossings = groundCrossings(ion.electrons, ion.geometry, cOverB, reach).filter(({ deltaOverB }) => deltaOverB < reach);
  const grid = Array.from({ length: steps + 1 }, (_, index) => (reach * index) / steps);
  const abscissas = [...grid, ...crossings.map(({ deltaOverB }) => deltaOverB)].sort((a, b) => a - b);
  const edges = [0, ...crossings.map(({ deltaOverB }) => deltaOverB), reach];
  const grounds = edges.slice(1).map((to, index): GroundRange => {
    const { label, multiplicity } = at((edges[index]! + to) / 2)[0]!;
    return { from: edges[index]!, to, label, multiplicity };
  });
  const curves = new Map<string, { multiplicity: number; points: CurvePoint[] }>();
  for (const x of abscissas) {
    for (const level of at(x)) {
      const curve = curves.get(level.label) ?? { multiplicity: level.multiplicity, points: [] };
      curve.points.push({ x, y: level.energy });
      curves.set(level.label, curve);
    }
  }
  return { ion, cOverB, reach, grounds, curves: merged(curves), terms: freeTerms(ion, cOverB) };
}

/** Levels that coincide along the whole axis (4A1g and 4Eg of d5) become one curve with two labels. */
function merged(curves: ReadonlyMap<string, { readonly multiplicity: number; readonly points: readonly CurvePoint[] }>): readonly LevelCurve[] {
  const found: { labels: string[]; multiplicity: number; points: readonly CurvePoint[] }[] = [];
  for (const [label, { multiplicity, points }] of curves) {
    const twin = found.find((curve) => curve.multiplicity === multiplicity
      && curve.points.every((point, index) => Math.abs(point.y - points[index]!.y) < 1e-6));
    if (twin) twin.labels.push(label);
    else found.push({ labels: [label], multiplicity, points });
  }
  return found;
}

function freeTerms(ion: FieldIon, cOverB: number): LevelDiagram['terms'] {
  const terms: { letter: string | null; multiplicity: number; y: number }[] = [];
  for (const { label, multiplicity, energy } of levels(ion, { delta: 0, racahB: 1, racahC: cOverB })) {
    if (terms.some((term) => term.multiplicity === multiplicity && Math.abs(term.y - energy) < 1e-6)) continue;
    terms.push({ letter: parentOf(label, ion.electrons, cOverB)?.replace(', ', ',') ?? null, multiplicity, y: energy });
  }
  return terms;
}

/** A diagram's height holds so many of the steps below which no bend is drawn: a tenth of a pixel. */
export const FINENESS = 5000;

/**
 * The points of a piece that a line through them needs: those left out lie within the tolerance of it (Douglas and Peucker, Cartographica 10,
 * 112 (1973), measured along E/B).
 */
export function thinned(piece: readonly CurvePoint[], tolerance: number): readonly CurvePoint[] {
  const [first, last] = [piece[0], piece.at(-1)];
  if (piece.length < 3 || first === undefined || last === undefined) return piece;
  let [farthest, distance] = [0, 0];
  for (let index = 1; index < piece.length - 1; index++) {
    const { x, y } = piece[index]!;
    const off = Math.abs(y - first.y - ((last.y - first.y) * (x - first.x)) / (last.x - first.x || 1));
    if (off > distance) [farthest, distance] = [index, off];
  }
  return distance <= tolerance ? [first, last] : [...thinned(piece.slice(0, farthest + 1), tolerance).slice(0, -1), ...thinned(piece.slice(farthest), tolerance)];
}

/** The parts of a curve below `ceiling`, cut exactly where it passes through it. */
export function below(points: readonly CurvePoint[], ceiling: number): readonly (readonly CurvePoint[])[] {
  const pieces: CurvePoint[][] = [];
  let piece: CurvePoint[] = [];
  points.forEach((point, index) => {
    const before = points[index - 1];
    if (before && (before.y <= ceiling) !== (point.y <= ceiling)) {
      const share = (ceiling - before.y) / (point.y - before.y);
      const edge = { x: before.x + share * (point.x - before.x), y: ceiling };
      if (point.y > ceiling) {
        piece.push(edge);
        pieces.push(piece);
        piece = [];
      } else piece = [edge];
    }
    if (point.y <= ceiling) piece.push(point);
  });
  if (piece.length > 1) pieces.push(piece);
  return pieces;
}
