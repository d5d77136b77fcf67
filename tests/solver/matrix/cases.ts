/** Matrices for the tests: seeded, shaped like the equations of circuits, with a dense copy beside each. */
import { createPattern, type EntryPlace, type SparsePattern } from '../../../solver/matrix/pattern.ts';

export interface MatrixCase {
  readonly pattern: SparsePattern;
  /** Length `entryCount + 1`, slot by slot. */
  readonly values: Float64Array;
  readonly dense: readonly (readonly number[])[];
}

/** A seeded generator of numbers in [0, 1): Marsaglia's xorshift with 32 bits. */
export function randomNumbers(seed: number): () => number {
  let state = (seed * 2654435761 + 1) >>> 0 || 1;
  return () => {
    state ^= state << 13;
    state ^= state >>> 17;
    state ^= state << 5;
    state >>>= 0;
    return state / 2 ** 32;
  };
}

/** Sums stamps (row, column, value) into a case; places may repeat. */
export function caseOf(size: number, stamps: readonly (readonly [number, number, number])[]): MatrixCase {
  const pattern = createPattern(
    size,
    stamps.map(([row, column]): EntryPlace => [row, column]),
  );
  const values = new Float64Array(pattern.entryCount + 1);
  for (const [row, column, value] of stamps) {
    const slot = pattern.slotOf(row, column);
    values[slot] = (values[slot] ?? 0) + value;
  }
  return { pattern, values, dense: denseOf(pattern, values) };
}

export function caseOfDense(rows: readonly (readonly number[])[]): MatrixCase {
  return caseOf(
    rows.length,
    rows.flatMap((row, r) =>
      row.flatMap((value, c): [number, number, number][] => (value === 0 ? [] : [[r, c, value]])),
    ),
  );
}

export function denseOf(pattern: SparsePattern, values: Float64Array): number[][] {
  const { size, columnStart, rowIndex } = pattern;
  const dense = Array.from({ length: size }, () => new Array<number>(size).fill(0));
  for (let column = 0; column < size; column++)
    for (let slot = columnStart[column] ?? 0; slot < (columnStart[column + 1] ?? 0); slot++) {
      const row = dense[rowIndex[slot] ?? 0];
      if (row) row[column] = values[slot] ?? 0;
    }
  return dense;
}

export interface CircuitShape {
  readonly nodes: number;
  /** Voltage sources: each adds a row and a column without a diagonal entry. */
  readonly sources: number;
  /** Voltage-controlled currents: entries on one side of the diagonal only. */
  readonly transconductances: number;
  /** Conductances are drawn over this many decades below 1 S. */
  readonly decades: number;
}

/**
 * The nodal equations of a random circuit: a tree of conductances that reaches every node, as many again between
 * any nodes, transconductances, and voltage sources of which the first is from node 0 to the reference.
 */
export function circuitCase(seed: number, shape: CircuitShape): MatrixCase {
  const random = randomNumbers(seed);
  const { nodes, sources, transconductances, decades } = shape;
  const node = () => Math.floor(random() * (nodes + 1)) - 1;
  const conductance = () => 10 ** (-decades * random());
  const stamps: [number, number, number][] = [];
  const between = (a: number, b: number, g: number) =>
    stamps.push([a, a, g], [b, b, g], [a, b, -g], [b, a, -g]);
  for (let a = 0; a < nodes; a++) between(a, Math.floor(random() * (a + 1)) - 1, conductance());
  for (let i = 0; i < nodes; i++) between(node(), node(), conductance());
  for (let i = 0; i < transconductances; i++) {
    const [out, back, plus, minus, g] = [node(), node(), node(), node(), conductance()];
    stamps.push([out, plus, g], [back, plus, -g], [out, minus, -g], [back, minus, g]);
  }
  const reached = Array.from({ length: nodes + 1 }, (_, i) => i); // nodes tied together by sources, reference 0
  for (let s = 0; s < sources; s++) {
    const [a, b] = s === 0 ? [0, -1] : [node(), node()];
    const [groupA, groupB] = [reached[a + 1] ?? 0, reached[b + 1] ?? 0];
    const branch = nodes + s;
    if (groupA === groupB) {
      stamps.push([branch, branch, 1]); // it would close a loop of sources: a plain unknown instead
      continue;
    }
    for (let i = 0; i <= nodes; i++) if (reached[i] === groupB) reached[i] = groupA;
    stamps.push([a, branch, 1], [branch, a, 1], [b, branch, -1], [branch, b, -1]);
  }
  return caseOf(
    nodes + sources,
    stamps.filter(([row, column]) => row >= 0 && column >= 0),
  );
}

export function vectorOf(seed: number, size: number): Float64Array {
  const random = randomNumbers(seed + 77);
  return Float64Array.from({ length: size }, () => 2 * random() - 1);
}

/**
 * The scaled residual: the largest over the rows of |b − A·x| / (|A|·|x| + |b|), from the dense copy. A row
 * whose measure is 0 has a residual of 0.
 */
export function scaledResidual(
  dense: readonly (readonly number[])[],
  x: ArrayLike<number>,
  b: ArrayLike<number>,
): number {
  let worst = 0;
  dense.forEach((row, r) => {
    let residual = b[r] ?? NaN;
    let measure = Math.abs(residual);
    row.forEach((coefficient, c) => {
      residual -= coefficient * (x[c] ?? NaN);
      measure += Math.abs(coefficient * (x[c] ?? NaN));
    });
    const scaled = residual === 0 ? 0 : Math.abs(residual) / measure;
    worst = Number.isNaN(scaled) ? Infinity : Math.max(worst, scaled);
  });
  return worst;
}

export const transposedDense = (dense: readonly (readonly number[])[]): number[][] =>
  dense.map((_, column) => dense.map((row) => row[column] ?? 0));

/** The largest difference between two vectors, relative to the largest magnitude of the second. */
export function relativeDifference(found: ArrayLike<number>, expected: ArrayLike<number>): number {
  let [difference, largest] = [0, 0];
  for (let i = 0; i < expected.length; i++) {
    difference = Math.max(difference, Math.abs((found[i] ?? NaN) - (expected[i] ?? NaN)));
    largest = Math.max(largest, Math.abs(expected[i] ?? NaN));
  }
  return difference === 0 ? 0 : difference / largest;
}
