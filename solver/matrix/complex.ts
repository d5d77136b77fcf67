/** Solves complex systems of one pattern, as a frequency response needs them: (G + jωC)·x = b. */
import { checkLength, createAcceptedSolve } from './acceptedSolve.ts';
import { equationsOf } from './backwardError.ts';
import { complexBackwardError, complexIsWithin } from './complexBackwardError.ts';
import {
  complexArray,
  complexFactor,
  complexNumbersFor,
  complexRefactor,
  type ComplexArray,
  type ComplexNumbers,
} from './complexFactor.ts';
import { complexSolve } from './complexSolve.ts';
import type { FactorPlaces } from './factors.ts';
import { eliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import { sound } from './refactor.ts';
import { factored, refactored, type FactorStatus, type SolveStatus } from './status.ts';

export interface ComplexSystem {
  readonly pattern: SparsePattern;
  /** Each part of length `pattern.entryCount + 1`, slot by slot, the spare slot last and not read. */
  readonly values: ComplexArray;
  /** As for a real system. */
  factorise(): FactorStatus;
  /** Solves A·x = b in place; each part of `b` has `size` places, or one more that is left alone. */
  solve(b: ComplexArray): SolveStatus;
}

/** The complex counterpart of `createLinearSystem`; after the first factorisation it allocates nothing. */
export function createComplexSystem(pattern: SparsePattern): ComplexSystem {
  const { size } = pattern;
  const values = complexArray(pattern.entryCount + 1);
  const order = eliminationOrder(pattern);
  const equations = equationsOf(pattern);
  const given = new Float64Array(2 * size);
  const answer = new Float64Array(2 * size);
  const work = complexArray(size);
  let places: FactorPlaces | undefined;
  let numbers: ComplexNumbers | undefined;
  let ready = false;
  let pivotsAreFresh = false;

  const chooseAnew = (): FactorStatus => {
    ready = false;
    const found = complexFactor(pattern, order, values);
    if ('kind' in found) return found;
    places = found;
    numbers = complexNumbersFor(found);
    const objection = complexRefactor(found, values, numbers);
    if (objection !== sound) return { kind: 'singular', column: found.columns[objection]! };
    pivotsAreFresh = true;
    ready = true;
    return factored;
  };

  const accepted = createAcceptedSolve(2 * size, size, {
    apply(right, solution) {
      const { rows, columns } = places!;
      for (let k = 0; k < size; k++) {
        work.real[k] = right[rows[k]!]!;
        work.imaginary[k] = right[size + rows[k]!]!;
      }
      complexSolve(places!, numbers!, work);
      for (let k = 0; k < size; k++) {
        solution[columns[k]!] = work.real[k]!;
        solution[size + columns[k]!] = work.imaginary[k]!;
      }
    },
    isWithin: (bound, x, b) => complexIsWithin(bound, equations, values, x, b),
    backwardError: (x, b, residual) => complexBackwardError(equations, values, x, b, residual),
    pivotsAreFresh: () => pivotsAreFresh,
    chooseAnew,
  });

  return {
    pattern,
    values,
    factorise() {
      if (places === undefined || numbers === undefined) return chooseAnew();
      if (complexRefactor(places, values, numbers) !== sound) return chooseAnew();
      pivotsAreFresh = false;
      ready = true;
      return refactored;
    },
    solve({ real, imaginary }) {
      if (!ready) throw new Error('solve: no factors stand; factorise first');
      checkLength(real, size);
      checkLength(imaginary, size);
      for (let k = 0; k < size; k++) {
        given[k] = real[k]!;
        given[size + k] = imaginary[k]!;
      }
      const status = accepted(given, answer);
      if (status.kind === 'solved' || status.kind === 'inaccurate')
        for (let k = 0; k < size; k++) {
          real[k] = answer[k]!;
          imaginary[k] = answer[size + k]!;
        }
      return status;
    },
  };
}
