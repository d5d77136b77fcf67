/** Solves A·x = b again and again for matrices of one pattern. */
import { checkLength, createAcceptedSolve, type SolveOperations } from './acceptedSolve.ts';
import {
  backwardError,
  equationsOf,
  isWithin,
  transposedEquationsOf,
  type Equations,
} from './backwardError.ts';
import { determinantSign, logDeterminant } from './determinantSign.ts';
import { factor } from './factor.ts';
import { createFactorisation, type Factorisation } from './factorisation.ts';
import { eliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import { sound } from './refactor.ts';
import { factored, refactored, type FactorStatus, type SolveStatus } from './status.ts';

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
   * which is left alone. `values` must still be those factorised. Where the backward error exceeds 1e-12, pivots
   * are chosen anew and the answer refined. Throws when no factors stand.
   */
  solve(b: Float64Array): SolveStatus;
  /** Solves Aᵀ·x = b, likewise. */
  solveTransposed(b: Float64Array): SolveStatus;
  /** Sign of the determinant of the factorised matrix: −1 or 1, and 0 where the matrix was found singular. */
  determinantSign(): -1 | 0 | 1;
  /** Natural logarithm of the determinant's magnitude; −Infinity where the matrix was found singular. */
  logDeterminant(): number;
}

/** The column order is found here, once; after the first factorisation the steady state allocates nothing. */
export function createLinearSystem(pattern: SparsePattern): LinearSystem {
  const { size } = pattern;
  const values = new Float64Array(pattern.entryCount + 1);
  const order = eliminationOrder(pattern);
  const given = new Float64Array(size);
  const answer = new Float64Array(size);
  const work = new Float64Array(size);
  let factors: Factorisation | undefined;
  let state: 'unfactorised' | 'ready' | 'singular' = 'unfactorised';
  let pivotsAreFresh = false;

  const chooseAnew = (): FactorStatus => {
    state = 'singular';
    const places = factor(pattern, order, values);
    if ('kind' in places) return places;
    factors = createFactorisation(places);
    const objection = factors.refactor(values);
    if (objection !== sound) return { kind: 'singular', column: places.columns[objection]! };
    pivotsAreFresh = true;
    state = 'ready';
    return factored;
  };

  const operations = (equations: Equations, transposed: boolean): SolveOperations => ({
    apply(right, solution) {
      const { places } = factors!;
      const from = transposed ? places.columns : places.rows;
      const to = transposed ? places.rows : places.columns;
      for (let k = 0; k < size; k++) work[k] = right[from[k]!]!;
      if (transposed) factors!.solveTransposed(work);
      else factors!.solve(work);
      for (let k = 0; k < size; k++) solution[to[k]!] = work[k]!;
    },
    isWithin: (bound, x, b) => isWithin(bound, equations, values, x, b),
    backwardError: (x, b, residual) => backwardError(equations, values, x, b, residual),
    pivotsAreFresh: () => pivotsAreFresh,
    chooseAnew,
  });
  const accepted = createAcceptedSolve(size, size, operations(equationsOf(pattern), false));
  const acceptedTransposed = createAcceptedSolve(
    size,
    size,
    operations(transposedEquationsOf(pattern), true),
  );

  const solveInPlace = (b: Float64Array, transposed: boolean): SolveStatus => {
    if (state !== 'ready') throw new Error('solve: no factors stand; factorise first');
    checkLength(b, size);
    for (let k = 0; k < size; k++) given[k] = b[k]!;
    const status = transposed ? acceptedTransposed(given, answer) : accepted(given, answer);
    if (status.kind === 'solved' || status.kind === 'inaccurate')
      for (let k = 0; k < size; k++) b[k] = answer[k]!;
    return status;
  };

  return {
    pattern,
    values,
    factorise() {
      if (factors?.refactor(values) !== sound) return chooseAnew();
      pivotsAreFresh = false;
      state = 'ready';
      return refactored;
    },
    solve: (b) => solveInPlace(b, false),
    solveTransposed: (b) => solveInPlace(b, true),
    determinantSign: () => (state === 'ready' ? determinantSign(factors!.places, factors!.inversePivot) : 0),
    logDeterminant: () => (state === 'ready' ? logDeterminant(factors!.inversePivot) : -Infinity),
  };
}
