/** Settles again from the point at hand, by Newton alone: for sweeps, trials and drags. Allocates nothing. */
import { Phase } from '../elements/law.ts';
import { DIRECT_BUDGET } from './limits.ts';
import { newton, type NewtonRun } from './newton.ts';
import type { Prepared } from './prepared.ts';
import { refresh, wholeLeak } from './refresh.ts';
import type { Surroundings } from './surroundings.ts';

const run: NewtonRun = {
  first: Phase.adopt,
  maxIterations: DIRECT_BUDGET,
  shunt: null,
  by: 'rows',
  iterations: 0,
  residual: { amperes: 0, ratio: 0 },
  singularAt: -1,
};

/**
 * Iterates from `prepared.x` at the present values of the elements. True where every row held and the last step was
 * small; `prepared.x` (V, A) and the elements' places in `prepared.work` then hold the point. The caller answers
 * for the hull and for currents beyond sense, and settles anew where this fails.
 */
export function resettle(
  prepared: Prepared,
  surroundings: Surroundings,
  maxIterations: number = DIRECT_BUDGET,
): boolean {
  if (refresh(prepared, surroundings, wholeLeak) !== null) return false;
  run.iterations = 0;
  run.maxIterations = maxIterations;
  return newton(prepared, run) === 'accepted';
}
