/** Factors that can be refilled and solved with, in whichever of the two forms suits their size. */
import type { FactorPlaces } from './factors.ts';
import { numbersFor, refactor } from './refactor.ts';
import { entriesFor, runElimination, runSolve } from './runSteps.ts';
import { solve } from './solve.ts';
import { countProducts, listSteps } from './steps.ts';
import { listedProducts } from './tolerances.ts';
import { transposeSolve } from './transposeSolve.ts';

export interface Factorisation {
  readonly places: FactorPlaces;
  /** Length `size`: one over each pivot. */
  readonly inversePivot: Float64Array;
  /** As `refactor`; `values` has the spare slot at its end. */
  refactor(values: Float64Array): number;
  /** As `solve`. */
  solve(y: Float64Array): void;
  /** As `transposeSolve`. */
  solveTransposed(y: Float64Array): void;
}

export function createFactorisation(places: FactorPlaces): Factorisation {
  return countProducts(places) <= listedProducts ? byListedSteps(places) : byColumns(places);
}

export function byListedSteps(places: FactorPlaces): Factorisation {
  const steps = listSteps(places);
  const entries = entriesFor(steps);
  const inversePivot = new Float64Array(places.size);
  return {
    places,
    inversePivot,
    refactor: (values) => runElimination(steps, values, entries, inversePivot),
    solve: (y) => runSolve(steps.forward, entries, inversePivot, y),
    solveTransposed: (y) => runSolve(steps.transposed, entries, inversePivot, y),
  };
}

export function byColumns(places: FactorPlaces): Factorisation {
  const numbers = numbersFor(places);
  return {
    places,
    inversePivot: numbers.inversePivot,
    refactor: (values) => refactor(places, values, numbers),
    solve: (y) => solve(places, numbers, y),
    solveTransposed: (y) => transposeSolve(places, numbers, y),
  };
}
