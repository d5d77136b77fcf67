import { determinant, Matrix, solve as denseSolve } from 'ml-matrix';
import { all, complex, create, type BigNumber, type Complex } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { createComplexSystem } from '../../../solver/matrix/complex.ts';
import { createLinearSystem } from '../../../solver/matrix/linearSystem.ts';
import {
  caseOfDense,
  circuitCase,
  relativeDifference,
  transposedDense,
  vectorOf,
  type CircuitShape,
  type MatrixCase,
} from '../../solver/matrix/cases.ts';
import { decimal } from '../decimal.ts';

/**
 * The sparse system held against the general-purpose libraries of the registry: mathjs (`lusolve`, `det`, in doubles,
 * in complex numbers and at 64 digits) and ml-matrix (`solve`, `determinant`). Matrices are those of random circuits,
 * seeds fixed: voltage sources leave zeros on the diagonal, transconductances make them unsymmetric.
 */
const math = create(all ?? {});

const mildShapes: readonly CircuitShape[] = [
  { nodes: 1, sources: 1, transconductances: 0, decades: 2 },
  { nodes: 4, sources: 1, transconductances: 1, decades: 3 },
  { nodes: 12, sources: 2, transconductances: 4, decades: 3 },
  { nodes: 40, sources: 3, transconductances: 12, decades: 3 },
];
const mild = mildShapes.flatMap((shape) => [1, 2, 3, 4, 5].map((seed) => [seed, shape] as const));

const systemOf = ({ pattern, values }: MatrixCase) => {
  const system = createLinearSystem(pattern);
  system.values.set(values);
  return system;
};

const solved = (which: MatrixCase, b: Float64Array, transposed = false): Float64Array => {
  const system = systemOf(which);
  expect(system.factorise().kind).toBe('factored');
  const x = b.slice();
  expect((transposed ? system.solveTransposed(x) : system.solve(x)).kind).toBe('solved');
  return x;
};

const rowsOf = (dense: MatrixCase['dense']): number[][] => dense.map((row) => [...row]);
const flat = (answer: unknown): number[] => (answer as number[][]).map(([value = Number.NaN]) => value);

describe('the sparse linear system', () => {
  it.each(mild)('seed %i, %o: agrees with lusolve of mathjs and solve of ml-matrix', (seed, shape) => {
    const which = circuitCase(seed, shape);
    const b = vectorOf(seed, which.dense.length);
    const x = solved(which, b);
    const byMathjs = flat(math.lusolve(rowsOf(which.dense), [...b]));
    const byMlMatrix = denseSolve(new Matrix(rowsOf(which.dense)), Matrix.columnVector([...b])).to1DArray();
    expect(relativeDifference(x, byMathjs)).toBeLessThanOrEqual(1e-9);
    expect(relativeDifference(x, byMlMatrix)).toBeLessThanOrEqual(1e-9);
  });

  it.each(mild)('seed %i, %o: solves the transpose as lusolve solves it', (seed, shape) => {
    const which = circuitCase(seed, shape);
    const b = vectorOf(seed, which.dense.length);
    const byMathjs = flat(math.lusolve(transposedDense(which.dense), [...b]));
    expect(relativeDifference(solved(which, b, true), byMathjs)).toBeLessThanOrEqual(1e-9);
  });

  it.each(mild)(
    'seed %i, %o: has the determinant of ml-matrix, and of mathjs at 64 digits',
    (seed, shape) => {
      const which = circuitCase(seed, shape);
      const system = systemOf(which);
      system.factorise();
      // In doubles mathjs takes pivots below 1e-15 for zero, which these have: so at 64 digits.
      const byMathjs = decimal.det(which.dense.map((row) => row.map((value) => decimal.bignumber(value))));
      for (const expected of [math.number(byMathjs), determinant(new Matrix(rowsOf(which.dense)))]) {
        expect(system.determinantSign()).toBe(Math.sign(expected));
        expect(Math.abs(system.logDeterminant() - Math.log(Math.abs(expected)))).toBeLessThanOrEqual(1e-9);
      }
    },
  );

  it.each([1, 2, 3, 4, 5, 6])(
    'seed %i: conductances over twelve decades, within what lusolve finds at 64 digits for a change of 1e-12 in the matrix',
    (seed) => {
      // A backward error of 1e-12 is what the solver promises: the bound is how far such a change moves the answer,
      // from the inverse worked at 64 digits: |Δx| ≤ |A⁻¹|·(|A|·|x| + |b|)·1e-12 (Oettli and Prager 1964).
      const which = circuitCase(seed, { nodes: 10, sources: 2, transconductances: 3, decades: 12 });
      const b = vectorOf(seed, which.dense.length);
      const x = solved(which, b);
      const big = (value: number): BigNumber => decimal.bignumber(value);
      const matrix = which.dense.map((row) => row.map(big));
      const exact = (decimal.lusolve(matrix, [...b].map(big)) as unknown as BigNumber[][]).map(([value]) =>
        Number(value),
      );
      const inverse = decimal.inv(matrix).map((row) => row.map(Number));
      const measure = which.dense.map((row, r) =>
        row.reduce((sum, a, c) => sum + Math.abs(a * (exact[c] ?? Number.NaN)), Math.abs(b[r] ?? Number.NaN)),
      );
      exact.forEach((value, k) => {
        const bound = (inverse[k] ?? []).reduce(
          (sum, entry, r) => sum + Math.abs(entry) * (measure[r] ?? Number.NaN),
          0,
        );
        expect(Math.abs((x[k] ?? Number.NaN) - value)).toBeLessThanOrEqual(1e-12 * bound);
      });
    },
  );

  it('names a matrix singular where both libraries find none of full rank', () => {
    // Two nodes joined to each other and to nothing else: the rows are opposite.
    const rows = [
      [1, -1, 0],
      [-1, 1, 0],
      [0, 0, 2],
    ];
    expect(math.det(rows)).toBe(0);
    expect(determinant(new Matrix(rows))).toBe(0);
    const system = systemOf(caseOfDense(rows));
    expect(system.factorise().kind).toBe('singular');
    expect(system.determinantSign()).toBe(0);
  });

  it('solves again with other values in the same pattern as lusolve does', () => {
    const shape = { nodes: 12, sources: 2, transconductances: 4, decades: 3 };
    const which = circuitCase(9, shape);
    const system = systemOf(which);
    system.factorise();
    for (const factor of [0.5, 2, 10]) {
      const changed = which.values.map((value, slot) => (slot % 3 === 0 ? value * factor : value));
      const dense = rowsOf(which.dense);
      const { columnStart, rowIndex, size } = which.pattern;
      for (let column = 0; column < size; column++)
        for (let slot = columnStart[column] ?? 0; slot < (columnStart[column + 1] ?? 0); slot++) {
          const row = dense[rowIndex[slot] ?? 0];
          if (row !== undefined) row[column] = changed[slot] ?? Number.NaN;
        }
      system.values.set(changed);
      expect(['refactored', 'factored']).toContain(system.factorise().kind);
      const b = vectorOf(9, size);
      const expected = flat(math.lusolve(dense, [...b]));
      system.solve(b);
      expect(relativeDifference(b, expected)).toBeLessThanOrEqual(1e-9);
    }
  });
});

describe('the complex system', () => {
  it.each(mild)('seed %i, %o: agrees with lusolve of mathjs in complex numbers', (seed, shape) => {
    const which = circuitCase(seed, shape);
    const size = which.dense.length;
    // Every entry turned by an angle of its own, as capacitances turn conductances.
    const turn = vectorOf(seed + 1, which.values.length);
    const system = createComplexSystem(which.pattern);
    const { real: re, imaginary: im } = system.values;
    which.values.forEach((value, slot) => {
      re[slot] = value * Math.cos(turn[slot] ?? 0);
      im[slot] = value * Math.sin(turn[slot] ?? 0);
    });
    const dense: Complex[][] = Array.from({ length: size }, () =>
      Array.from({ length: size }, () => complex(0, 0)),
    );
    const { columnStart, rowIndex } = which.pattern;
    for (let column = 0; column < size; column++)
      for (let slot = columnStart[column] ?? 0; slot < (columnStart[column + 1] ?? 0); slot++) {
        const row = dense[rowIndex[slot] ?? 0];
        if (row !== undefined) row[column] = complex(re[slot] ?? Number.NaN, im[slot] ?? Number.NaN);
      }
    const b = { real: vectorOf(seed + 2, size), imaginary: vectorOf(seed + 3, size) };
    const right = Array.from(b.real, (part, k) => complex(part, b.imaginary[k] ?? Number.NaN));
    const expected = (math.lusolve(dense, right) as unknown as Complex[][]).map(([value]) => value);
    expect(system.factorise().kind).toBe('factored');
    expect(system.solve(b).kind).toBe('solved');
    const real = expected.map((value) => value?.re ?? Number.NaN);
    const imaginary = expected.map((value) => value?.im ?? Number.NaN);
    const largest = Math.max(...[...real, ...imaginary].map(Math.abs));
    real.forEach((value, k) => {
      expect(Math.abs((b.real[k] ?? Number.NaN) - value)).toBeLessThanOrEqual(1e-9 * largest);
    });
    imaginary.forEach((value, k) => {
      expect(Math.abs((b.imaginary[k] ?? Number.NaN) - value)).toBeLessThanOrEqual(1e-9 * largest);
    });
  });
});
