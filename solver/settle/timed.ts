/**
 * Pseudo-transient continuation (Kelley and Keyes 1998): the circuit is let go from a start with a capacitance at
 * every node that no source pins, by implicit Euler steps that lengthen as they succeed, C/Δt → 0.
 */
import { at, codeAt } from '../elements/at.ts';
import { converges, finishes, isSpent, type Effort } from './effort.ts';
import type { Shunt } from './newton.ts';
import { UnknownKind, type Prepared } from './prepared.ts';

/** C/Δt of the first step, S, and that at which the rest is left to Newton. */
const FIRST_CONDUCTANCE = 1;
const LAST_CONDUCTANCE = 1e-13;
/** τ/Δt of an amplifier's output for each siemens of C/Δt: slow beside every gain at first, then at rest before the nodes. */
const OUTPUT_LAG = 1e9;
/** A voltage that no drawing means, V. */
const RUNAWAY_VOLTAGE = 1e12;
/** Newton iterations of one time step. */
const STEP_ITERATIONS = 30;
/** A step that took no more than this is followed by a longer one. */
const EASY_ITERATIONS = 8;

export function settleTimed(prepared: Prepared, effort: Effort): boolean {
  const { x, size } = prepared;
  const shunt: Shunt = { conductance: FIRST_CONDUCTANCE, anchor: x.slice(0, size), lag: 0 };
  const { run } = effort;
  while (!isSpent(effort)) {
    run.shunt = shunt;
    shunt.lag = shunt.conductance * OUTPUT_LAG;
    const before = run.iterations;
    if (converges(prepared, effort, STEP_ITERATIONS)) {
      if (shunt.conductance <= LAST_CONDUCTANCE) {
        if (finishes(prepared, effort)) return true;
        // Go on resting from here, with shorter steps.
        shunt.conductance = 1e-6;
      } else shunt.conductance /= run.iterations - before <= EASY_ITERATIONS ? 10 : 2;
      shunt.anchor.set(x.subarray(0, size));
      effort.ranAway = runningAway(prepared);
      if (effort.ranAway >= 0) return false;
    } else {
      x.set(shunt.anchor);
      shunt.conductance *= 8;
      if (shunt.conductance > 1e6) return false;
    }
  }
  return false;
}

/** The unknown that has gone beyond any voltage of a board and may go on, or −1. */
function runningAway({ x, size, kinds }: Prepared): number {
  for (let k = 0; k < size; k++)
    if (codeAt(kinds, k) === UnknownKind.loose && Math.abs(at(x, k)) > RUNAWAY_VOLTAGE) return k;
  return -1;
}
