/** Solves, checks the backward error, and does more only where the check fails. */
import { solved, type FactorStatus, type SolveStatus } from './status.ts';
import { backwardErrorBound, refinementSteps } from './tolerances.ts';

/** What one kind of system (real, transposed, complex) does; vectors are of the length given below. */
export interface SolveOperations {
  /** `answer` = the solution for `right` with the present factors. */
  apply(right: Float64Array, answer: Float64Array): void;
  /** Whether the answer's backward error is within the bound at first sight. */
  isWithin(bound: number, answer: Float64Array, given: Float64Array): boolean;
  /** The backward error; `residual` receives what is left over. */
  backwardError(answer: Float64Array, given: Float64Array, residual: Float64Array): number;
  /** Whether the present factors' pivots were chosen for the present values. */
  pivotsAreFresh(): boolean;
  chooseAnew(): FactorStatus;
}

/**
 * @param length of the vectors; a complex vector is its real parts followed by its imaginary parts.
 * @returns a function that fills `answer` for `given`. It allocates nothing as long as the check holds. After
 *   `singular` and `not-finite` the answer is of no use.
 */
export function createAcceptedSolve(
  length: number,
  size: number,
  operations: SolveOperations,
): (given: Float64Array, answer: Float64Array) => SolveStatus {
  const residual = new Float64Array(length);
  const before = new Float64Array(length);

  /** Iterative refinement: solves for what is left over and adds it, as long as that helps. */
  const refine = (given: Float64Array, answer: Float64Array, found: number): number => {
    let error = found;
    for (let step = 0; step < refinementSteps && error > backwardErrorBound; step++) {
      before.set(answer);
      operations.apply(residual, answer);
      for (let k = 0; k < length; k++) answer[k]! += before[k]!;
      const refined = operations.backwardError(answer, given, residual);
      if (!(refined < error)) {
        answer.set(before);
        break;
      }
      error = refined;
    }
    return error;
  };

  const improve = (given: Float64Array, answer: Float64Array): SolveStatus => {
    let error = operations.backwardError(answer, given, residual);
    if (error > backwardErrorBound && !operations.pivotsAreFresh()) {
      const status = operations.chooseAnew();
      if (status.kind === 'singular' || status.kind === 'not-finite') return status;
      operations.apply(given, answer);
      error = operations.backwardError(answer, given, residual);
    }
    if (error > backwardErrorBound) error = refine(given, answer, error);
    const odd = answer.findIndex((x) => !Number.isFinite(x));
    if (odd >= 0) return { kind: 'not-finite', column: odd % size };
    return error <= backwardErrorBound ? solved : { kind: 'inaccurate', backwardError: error };
  };

  return (given, answer) => {
    operations.apply(given, answer);
    return operations.isWithin(backwardErrorBound, answer, given) ? solved : improve(given, answer);
  };
}

/** Refuses a right-hand side of the wrong length, with both lengths. */
export function checkLength(b: Float64Array, size: number): void {
  if (b.length !== size && b.length !== size + 1)
    throw new RangeError(`solve: right-hand side has length ${b.length}, the matrix size ${size}`);
}
