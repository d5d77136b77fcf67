/** Source ramping: every independent source from nothing to its value, in steps that lengthen as they succeed. */
import { converges, finishes, isSpent, type Effort } from './effort.ts';
import type { Prepared } from './prepared.ts';

const FIRST_STEP = 0.05;
const LEAST_STEP = 1e-7;
const STEP_ITERATIONS = 30;
const EASY_ITERATIONS = 8;

export function settleRamped(prepared: Prepared, effort: Effort): boolean {
  const { x, work } = prepared;
  const { run } = effort;
  run.shunt = null;
  x.fill(0);
  const held = x.slice();
  let reached = 0;
  let step = FIRST_STEP;
  while (!isSpent(effort)) {
    work.sourceScale = Math.min(reached + step, 1);
    const before = run.iterations;
    if (converges(prepared, effort, STEP_ITERATIONS)) {
      reached = work.sourceScale;
      if (reached === 1) return finishes(prepared, effort);
      held.set(x);
      if (run.iterations - before <= EASY_ITERATIONS) step *= 2;
    } else {
      x.set(held);
      step /= 4;
      if (step < LEAST_STEP) break;
    }
  }
  work.sourceScale = 1;
  return false;
}
