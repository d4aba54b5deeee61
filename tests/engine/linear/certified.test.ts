// Least squares through the engine's normal equations against certified results of the Statistical Reference Datasets of the National
// Institute of Standards and Technology (linear regression: Norris, lower difficulty; Longley, higher difficulty).
// Data and certified values: seen in published regression tests of other libraries that quote the files Norris.dat and Longley.dat.

import { CholeskyDecomposition, Matrix } from 'ml-matrix';
import { describe, expect, test } from 'vitest';
import { inversePositive } from '../../../engine/linear/solveSymmetric.ts';
import { diagonalScale, scaledMatrix } from '../../../engine/series/normalEquations.ts';

interface Problem {
  /** One row an observation: the response, then the predictors; the constant is put in front of them. */
  readonly rows: readonly (readonly number[])[];
  readonly estimates: readonly number[];
  readonly deviations: readonly number[];
  /** Digits that must agree. Normal equations square the condition number of the scaled columns, for Longley some 4e4: of 15.9 digits some 6.7 are left. */
  readonly digits: number;
}

const norris: Problem = {
  rows: [
    [0.1, 0.2], [338.8, 337.4], [118.1, 118.2], [888.0, 884.6], [9.2, 10.1], [228.1, 226.5], [668.5, 666.3], [998.5, 996.3], [449.1, 448.6], [778.9, 777.0], [559.2, 558.2], [0.3, 0.4],
    [0.1, 0.6], [778.1, 775.5], [668.8, 666.9], [339.3, 338.0], [448.9, 447.5], [10.8, 11.6], [557.7, 556.0], [228.3, 228.1], [998.0, 995.8], [888.8, 887.6], [119.6, 120.2], [0.3, 0.3],
    [0.6, 0.3], [557.6, 556.8], [339.3, 339.1], [888.0, 887.2], [998.5, 999.0], [778.9, 779.0], [10.2, 11.1], [117.6, 118.3], [228.9, 229.2], [668.4, 669.1], [449.2, 448.9], [0.2, 0.5],
  ],
  estimates: [-0.262323073774029, 1.00211681802045],
  deviations: [0.232818234301152, 0.429796848199937e-3],
  digits: 12,
};

const longley: Problem = {
  rows: [
    [60323, 83.0, 234289, 2356, 1590, 107608, 1947], [61122, 88.5, 259426, 2325, 1456, 108632, 1948], [60171, 88.2, 258054, 3682, 1616, 109773, 1949], [61187, 89.5, 284599, 3351, 1650, 110929, 1950],
    [63221, 96.2, 328975, 2099, 3099, 112075, 1951], [63639, 98.1, 346999, 1932, 3594, 113270, 1952], [64989, 99.0, 365385, 1870, 3547, 115094, 1953], [63761, 100.0, 363112, 3578, 3350, 116219, 1954],
    [66019, 101.2, 397469, 2904, 3048, 117388, 1955], [67857, 104.6, 419180, 2822, 2857, 118734, 1956], [68169, 108.4, 442769, 2936, 2798, 120445, 1957], [66513, 110.8, 444546, 4681, 2637, 121950, 1958],
    [68655, 112.6, 482704, 3813, 2552, 123366, 1959], [69564, 114.2, 502601, 3931, 2514, 125368, 1960], [69331, 115.7, 518173, 4806, 2572, 127852, 1961], [70551, 116.9, 554894, 4007, 2827, 130081, 1962],
  ],
  estimates: [-3482258.63459582, 15.0618722713733, -0.0358191792925910, -2.02022980381683, -1.03322686717359, -0.0511041056535807, 1829.15146461355],
  deviations: [890420.383607373, 84.9149257747669, 0.0334910077722432, 0.488399681651699, 0.214274163161675, 0.226073200069370, 455.478499142212],
  digits: 6,
};

/** Sums of products of the problem's columns, brought to a common scale as the engine brings them. */
function equationsOf({ rows }: Problem): { readonly scaled: Matrix; readonly scale: Float64Array; readonly right: number[] } {
  const lines = rows.map(([, ...predictors]) => [1, ...predictors]);
  const size = lines[0]!.length;
  const sum = (term: (line: readonly number[], i: number) => number): number => lines.reduce((total, line, i) => total + term(line, i), 0);
  const matrix = Float64Array.from({ length: size * size }, (_, at) => sum((line) => line[Math.floor(at / size)]! * line[at % size]!));
  const scale = diagonalScale(matrix, size);
  return { scaled: scaledMatrix(matrix, scale), scale, right: Array.from(scale, (one, j) => one * sum((line, i) => line[j]! * rows[i]![0]!)) };
}

type Solver = (matrix: Matrix) => { readonly solution: (right: readonly number[]) => number[]; readonly inverse: number[][] };

const byInverse: Solver = (matrix) => {
  const inverse = inversePositive(matrix.to2DArray())!;
  return { inverse, solution: (right) => inverse.map((row) => row.reduce((total, value, j) => total + value * right[j]!, 0)) };
};

const byCholesky: Solver = (matrix) => {
  const decomposition = new CholeskyDecomposition(matrix);
  return { inverse: decomposition.solve(Matrix.eye(matrix.rows)).to2DArray(), solution: (right) => decomposition.solve(Matrix.columnVector([...right])).to1DArray() };
};

/** The fewest decimal digits in which two lists agree. */
const agreement = (found: readonly number[], certified: readonly number[]): number =>
  Math.min(...found.map((value, i) => (value === certified[i] ? 15 : -Math.log10(Math.abs(value / certified[i]! - 1)))));

describe.each([['Norris', norris], ['Longley', longley]] as const)('certified results of %s', (name, problem) => {
  test.each([['small systems', byInverse], ['series factors', byCholesky]] as const)('as the engine solves %s', (how, solver) => {
    const { scaled, scale, right } = equationsOf(problem);
    const { solution, inverse } = solver(scaled);
    const estimates = solution(right).map((value, j) => value * scale[j]!);
    const squares = problem.rows.reduce((total, [y, ...predictors]) => total + (y! - [1, ...predictors].reduce((sum, x, j) => sum + x * estimates[j]!, 0)) ** 2, 0);
    const variance = squares / (problem.rows.length - estimates.length);
    const deviations = inverse.map((row, j) => Math.sqrt(variance * row[j]!) * scale[j]!);
    const digits = { estimates: agreement(estimates, problem.estimates), deviations: agreement(deviations, problem.deviations) };
    process.stdout.write(`${name}, ${how}: ${digits.estimates.toFixed(1)} digits of the estimates, ${digits.deviations.toFixed(1)} of their deviations\n`);
    expect(digits.estimates).toBeGreaterThan(problem.digits);
    expect(digits.deviations).toBeGreaterThan(problem.digits);
  });
});
