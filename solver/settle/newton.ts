/**
 * Newton's method in correction form, J·dx = −F(x), with device-wise limits; node steps clipped to the hull of the
 * rails and capped. Allocates nothing.
 */
import { at, codeAt, indexAt } from '../elements/at.ts';
import { Phase } from '../elements/law.ts';
import { measureRows, type Residual } from './accept.ts';
import { assembleMatrix, assembleResidual, loadElements } from './evaluate.ts';
import { NODE_STEP, STEP_FLOOR_AMPERES, STEP_FLOOR_VOLTS, STEP_PART } from './limits.ts';
import { UnknownKind, type Prepared } from './prepared.ts';

export type NewtonOutcome = 'accepted' | 'iterations' | 'singular';

/** What another method adds to the equations of the free nodes: G·(x − anchor), A. */
export interface Shunt {
  /** S; 0 where nothing is added. */
  conductance: number;
  /** V; length `size`. */
  readonly anchor: Float64Array;
  /** Weight of the same on amplifier outputs, V/V. */
  lag: number;
}

export interface NewtonRun {
  /** How non-linear laws begin: `Phase.start` cold, `Phase.adopt` from the point at hand. */
  first: Phase;
  maxIterations: number;
  shunt: Shunt | null;
  /** Accept by rows and step, or, on the way of another method, by a step below 1e-6 alone. */
  by: 'rows' | 'step';
  /** Counted up by one for each linear solution. */
  iterations: number;
  readonly residual: Residual;
  /** Unknown in which the matrix was singular, or −1. */
  singularAt: number;
}

/** Iterates from the point at hand until every row holds and the last step was small. */
export function newton(prepared: Prepared, run: NewtonRun): NewtonOutcome {
  const { work, residual, system, size } = prepared;
  work.phase = run.first;
  let settledStep = false;
  for (let iteration = 0; ; iteration++) {
    loadElements(prepared);
    assembleResidual(prepared);
    if (run.shunt) addShunt(prepared, run.shunt, false);
    if (settledStep && !work.limited) {
      if (run.by === 'step') return 'accepted';
      measureRows(prepared, run.residual);
      if (run.residual.ratio <= 1) return 'accepted';
    }
    if (iteration >= run.maxIterations) return 'iterations';
    assembleMatrix(prepared);
    if (run.shunt) addShunt(prepared, run.shunt, true);
    const status = system.factorise();
    if (status.kind === 'singular' || status.kind === 'not-finite') {
      run.singularAt = status.column;
      return 'singular';
    }
    for (let row = 0; row < size; row++) residual[row] = -at(residual, row);
    const solved = system.solve(residual);
    if (solved.kind === 'singular' || solved.kind === 'not-finite') {
      run.singularAt = solved.column;
      return 'singular';
    }
    run.iterations++;
    settledStep = takeStep(prepared, run.by === 'rows' ? 1 : LOOSE) && !work.limited;
    work.phase = Phase.limit;
  }
}

/** By how much a step on the way of another method may be larger than the last step of all. */
const LOOSE = 1000;

/** Moves the unknowns by the step in `residual`, limited. True where the whole step was small. */
function takeStep({ x, residual, size, kinds, hull }: Prepared, loose: number): boolean {
  let small = true;
  for (let k = 0; k < size; k++) {
    const from = at(x, k);
    const kind = codeAt(kinds, k);
    const floor = kind === UnknownKind.branch ? STEP_FLOOR_AMPERES : STEP_FLOOR_VOLTS;
    let step = at(residual, k);
    if (!(Math.abs(step) <= loose * (STEP_PART * Math.abs(from) + floor))) small = false;
    if (kind === UnknownKind.bound) {
      step = Math.min(Math.max(step, -NODE_STEP), NODE_STEP);
      step = Math.min(Math.max(from + step, hull.low), hull.high) - from;
    } else if (kind === UnknownKind.loose) {
      const cap = Math.max(NODE_STEP, Math.abs(from));
      step = Math.min(Math.max(step, -cap), cap);
    }
    x[k] = from + step;
  }
  return small;
}

/** Adds the shunt to the free nodes' rows, or to their diagonals. */
export function addShunt(prepared: Prepared, { conductance, anchor, lag }: Shunt, toMatrix: boolean): void {
  const { x, residual, diagonal, size, kinds, system, lags } = prepared;
  for (let k = 0; k < size; k++) {
    if (codeAt(kinds, k) < UnknownKind.bound) continue;
    if (toMatrix) {
      const slot = indexAt(diagonal, k);
      system.values[slot] = at(system.values, slot) + conductance;
    } else residual[k] = at(residual, k) + conductance * (at(x, k) - at(anchor, k));
  }
  if (lag > 0)
    for (const { row, output, slot } of lags) {
      if (toMatrix) system.values[slot] = at(system.values, slot) + lag;
      else residual[row] = at(residual, row) + lag * (at(x, output) - at(anchor, output));
    }
}
