/** Solves A·x = b again and again for matrices of one pattern. */
import type { SparsePattern } from './pattern.ts';
import { factored, solved, type FactorStatus, type SolveStatus } from './status.ts';

export type { FactorStatus, SolveStatus } from './status.ts';

export interface LinearSystem {
  readonly pattern: SparsePattern;
  /**
   * Length `pattern.entryCount + 1`: the matrix, slot by slot, to be zeroed and stamped by the caller. The last
   * place is the spare slot for entries of the reference node and is not read.
   */
  readonly values: Float64Array;
  /** Factorises the present values: in the known pivot order where that is sound, else with fresh pivots. */
  factorise(): FactorStatus;
  /**
   * Solves A·x = b in place with the last factors. `b` has `size` places, or one more for the reference node,
   * which is left alone. `values` must still be those factorised. Throws when no factors stand.
   */
  solve(b: Float64Array): SolveStatus;
  /** Solves Aᵀ·x = b, likewise. */
  solveTransposed(b: Float64Array): SolveStatus;
  /** Sign of the determinant of the factorised matrix: −1 or 1, and 0 where the matrix was found singular. */
  determinantSign(): -1 | 0 | 1;
  /** Natural logarithm of the determinant's magnitude; −Infinity where the matrix was found singular. */
  logDeterminant(): number;
}

/** A plain dense elimination with partial pivoting stands here until the sparse one is in. */
export function createLinearSystem(pattern: SparsePattern): LinearSystem {
  const { size, entryCount, columnStart, rowIndex } = pattern;
  const values = new Float64Array(entryCount + 1);
  const lu = new Float64Array(size * size);
  const order = new Int32Array(size);
  const work = new Float64Array(size);
  let state: 'none' | 'singular' | 'ready' = 'none';
  let sign: -1 | 1 = 1;

  const check = (b: Float64Array) => {
    if (state !== 'ready') throw new Error('solve: no factors stand; factorise first');
    if (b.length !== size && b.length !== size + 1)
      throw new RangeError(`solve: right-hand side has length ${b.length}, the matrix size ${size}`);
  };

  return {
    pattern,
    values,
    factorise() {
      lu.fill(0);
      for (let c = 0; c < size; c++)
        for (let p = columnStart[c]!; p < columnStart[c + 1]!; p++) lu[rowIndex[p]! * size + c] = values[p]!;
      sign = 1;
      state = 'singular';
      for (let i = 0; i < size; i++) order[i] = i;
      for (let k = 0; k < size; k++) {
        let pivot = k;
        for (let i = k; i < size; i++) {
          const candidate = lu[i * size + k]!;
          if (!Number.isFinite(candidate)) return { kind: 'not-finite', column: k };
          if (Math.abs(candidate) > Math.abs(lu[pivot * size + k]!)) pivot = i;
        }
        if (lu[pivot * size + k] === 0) return { kind: 'singular', column: k };
        if (pivot !== k) {
          for (let j = 0; j < size; j++) {
            const held = lu[k * size + j]!;
            lu[k * size + j] = lu[pivot * size + j]!;
            lu[pivot * size + j] = held;
          }
          const held = order[k]!;
          order[k] = order[pivot]!;
          order[pivot] = held;
          sign = sign === 1 ? -1 : 1;
        }
        const diagonal = lu[k * size + k]!;
        for (let i = k + 1; i < size; i++) {
          const factor = (lu[i * size + k]! /= diagonal);
          if (factor !== 0)
            for (let j = k + 1; j < size; j++) lu[i * size + j]! -= factor * lu[k * size + j]!;
        }
      }
      state = 'ready';
      return factored;
    },
    solve(b) {
      check(b);
      for (let i = 0; i < size; i++) {
        let sum = b[order[i]!]!;
        for (let j = 0; j < i; j++) sum -= lu[i * size + j]! * work[j]!;
        work[i] = sum;
      }
      for (let i = size - 1; i >= 0; i--) {
        let sum = work[i]!;
        for (let j = i + 1; j < size; j++) sum -= lu[i * size + j]! * work[j]!;
        work[i] = sum / lu[i * size + i]!;
      }
      for (let i = 0; i < size; i++) b[i] = work[i]!;
      return solved;
    },
    solveTransposed(b) {
      check(b);
      for (let i = 0; i < size; i++) {
        let sum = b[i]!;
        for (let j = 0; j < i; j++) sum -= lu[j * size + i]! * work[j]!;
        work[i] = sum / lu[i * size + i]!;
      }
      for (let i = size - 1; i >= 0; i--) {
        let sum = work[i]!;
        for (let j = i + 1; j < size; j++) sum -= lu[j * size + i]! * work[j]!;
        work[i] = sum;
      }
      for (let i = 0; i < size; i++) b[order[i]!] = work[i]!;
      return solved;
    },
    determinantSign() {
      if (state !== 'ready') return 0;
      let negative = sign === -1;
      for (let k = 0; k < size; k++) if (lu[k * size + k]! < 0) negative = !negative;
      return negative ? -1 : 1;
    },
    logDeterminant() {
      if (state !== 'ready') return -Infinity;
      let sum = 0;
      for (let k = 0; k < size; k++) sum += Math.log(Math.abs(lu[k * size + k]!));
      return sum;
    },
  };
}
