/** What settling may still spend, and how a method behind Newton goes about one Newton run. */
import { Phase } from '../elements/law.ts';
import { newton, type NewtonRun } from './newton.ts';
import type { Prepared } from './prepared.ts';

export interface Effort {
  readonly run: NewtonRun;
  /** Iterations at which the present method must stop. */
  stopAt: number;
  /** `performance.now()` at which everything must stop. */
  readonly deadline: number;
  readonly signal: AbortSignal | undefined;
  /** Unknown that a pseudo-transient saw run off without end, or −1. */
  ranAway: number;
}

/** True when the method must give up: iterations or time spent, or cancelled. */
export const isSpent = ({ run, stopAt, deadline, signal }: Effort): boolean =>
  run.iterations >= stopAt || performance.now() > deadline || (signal?.aborted ?? false);

/** One Newton run on the way, from the point at hand; true where it converged. */
export function converges(prepared: Prepared, { run, stopAt }: Effort, maxIterations: number): boolean {
  run.first = Phase.adopt;
  run.by = 'step';
  run.maxIterations = Math.min(maxIterations, stopAt - run.iterations);
  return newton(prepared, run) === 'accepted';
}

/** The last Newton run of a method, to acceptance by rows. */
export function finishes(prepared: Prepared, { run }: Effort): boolean {
  run.first = Phase.adopt;
  run.by = 'rows';
  run.shunt = null;
  run.maxIterations = 60;
  return newton(prepared, run) === 'accepted';
}
