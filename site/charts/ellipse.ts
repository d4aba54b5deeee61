import { coordinate as c } from './text.ts';

/** Two numbers with their standard uncertainties and their correlation. */
export interface Ellipse {
  readonly x: number;
  readonly y: number;
  readonly ux: number;
  readonly uy: number;
  /** From -1 to 1. */
  readonly correlation: number;
}

/** Four cubic pieces follow a circle to 0.03 % of its radius with their inner points at this share of it. */
const HANDLE = (4 / 3) * (Math.SQRT2 - 1);

/**
 * The ellipse of one standard uncertainty: its shadow on each axis is the value with its u. Points (cos t, rho cos t + sqrt(1 - rho^2) sin t).
 * The scales must be linear.
 * @param scale from data to drawing
 */
export function ellipsePath({ x, y, ux, uy, correlation }: Ellipse, scale: { readonly x: (value: number) => number; readonly y: (value: number) => number }): string {
  const across = Math.sqrt(Math.max(0, 1 - correlation ** 2));
  // A point of the unit circle carried to the ellipse; inner points go with it, because the map is linear.
  const at = (a: number, b: number): string => `${c(scale.x(x + ux * a))} ${c(scale.y(y + uy * (correlation * a + across * b)))}`;
  const piece = ([a, b]: readonly [number, number]): string => `C${at(a - HANDLE * b, b + HANDLE * a)} ${at(HANDLE * a - b, HANDLE * b + a)} ${at(-b, a)}`;
  return `M${at(1, 0)}${([[1, 0], [0, 1], [-1, 0], [0, -1]] as const).map(piece).join('')}Z`;
}

/** Where the letter of a point stands; far ones want a line to their point. */
export interface KeyPlace {
  readonly x: number;
  readonly y: number;
  readonly far: boolean;
}

const DIRECTIONS = Array.from({ length: 8 }, (_, step) => -Math.PI / 4 + (step * Math.PI) / 4);

/**
 * Places for letters beside points so that none lies on a point or on another letter: the nearest free place of eight directions and
 * growing distance. null: no letter, or no room.
 */
export function keyPlaces(
  points: readonly { readonly x: number; readonly y: number }[], keys: readonly string[], frame: { readonly left: number; readonly right: number; readonly top: number; readonly bottom: number },
): readonly (KeyPlace | null)[] {
  const taken: { readonly x: number; readonly y: number }[] = [];
  return points.map((point, index) => {
    const key = keys[index]!;
    if (key === '') return null;
    const half = 4 + 3.2 * key.length;
    for (const distance of [11, 16, 24, 34, 46]) for (const direction of DIRECTIONS) {
      const [x, y] = [point.x + distance * Math.cos(direction), point.y + distance * Math.sin(direction)];
      const inside = x - half > frame.left && x + half < frame.right && y - 7 > frame.top && y + 7 < frame.bottom;
      const free = points.every((other) => Math.abs(other.x - x) > half + 2 || Math.abs(other.y - y) > 9) && taken.every((other) => Math.abs(other.x - x) > 2 * half || Math.abs(other.y - y) > 12);
      if (!inside || !free) continue;
      taken.push({ x, y });
      return { x, y, far: distance > 16 };
    }
    return null;
  });
}
