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

/** By how much a step on the way of another method may be larger than the last step of all. */
const LOOSE = 1000;
/** A step this many times larger than the last of all, about 1 mV, has come close enough to look at the rows. */
const CLOSE = 1e6;

/** Iterates from the point at hand until every row holds and the step is small. */
export function newton(prepared: Prepared, run: NewtonRun): NewtonOutcome {
  const { work, system } = prepared;
  const enough = run.by === 'rows' ? 1 : LOOSE;
  work.phase = run.first;
  let size = Infinity; // of the last step, in units of the last step allowed
  for (let iteration = 0; ; iteration++) {
    loadElements(prepared);
    assembleResidual(prepared);
    if (run.shunt) addShunt(prepared, run.shunt, false);
    if (size <= CLOSE && !work.limited && rowsHold(prepared, run)) {
      if (size <= enough) return 'accepted';
      // The step from here, by the factors at hand: near enough to tell whether it would be small.
      if (solveStep(prepared, run) && stepSize(prepared) <= enough) return 'accepted';
    }
    if (iteration >= run.maxIterations) return 'iterations';
    assembleMatrix(prepared);
    if (run.shunt) addShunt(prepared, run.shunt, true);
    const status = system.factorise();
    if (status.kind === 'singular' || status.kind === 'not-finite') {
      run.singularAt = status.column;
      return 'singular';
    }
    if (!solveStep(prepared, run)) return 'singular';
    run.iterations++;
    size = work.limited ? Infinity : stepSize(prepared);
    takeStep(prepared);
    work.phase = Phase.limit;
  }
}

/** One more whole step from an accepted point, kept where the rows hold better for it: the digits are worth it. */
export function polish(prepared: Prepared, run: NewtonRun): void {
  const { work, system, x, step, size } = prepared;
  const before = run.residual.ratio;
  const { amperes } = run.residual;
  work.phase = Phase.exact;
  assembleMatrix(prepared);
  const { kind } = system.factorise();
  if (kind === 'singular' || kind === 'not-finite' || !solveStep(prepared, run)) return;
  for (let k = 0; k < size; k++) x[k] = at(x, k) + at(step, k);
  loadElements(prepared);
  assembleResidual(prepared);
  measureRows(prepared, run.residual);
  if (run.residual.ratio <= before) return;
  for (let k = 0; k < size; k++) x[k] = at(x, k) - at(step, k);
  loadElements(prepared);
  assembleResidual(prepared);
  run.residual.ratio = before;
  run.residual.amperes = amperes;
}

function rowsHold(prepared: Prepared, { by, residual }: NewtonRun): boolean {
  if (by === 'step') return true;
  measureRows(prepared, residual);
  return residual.ratio <= 1;
}

/** Solves for the step with the factors at hand; false where they turn out to be none. */
function solveStep({ residual, step, size, system }: Prepared, run: NewtonRun): boolean {
  for (let row = 0; row < size; row++) step[row] = -at(residual, row);
  const status = system.solve(step);
  if (status.kind !== 'singular' && status.kind !== 'not-finite') return true;
  run.singularAt = status.column;
  return false;
}

/** The whole step's largest part, in units of 1e-9 of the unknown + 1e-9 V (+ 1e-12 A for branches). */
function stepSize({ x, step, size, kinds }: Prepared): number {
  let largest = 0;
  for (let k = 0; k < size; k++) {
    const floor = codeAt(kinds, k) === UnknownKind.branch ? STEP_FLOOR_AMPERES : STEP_FLOOR_VOLTS;
    const part = Math.abs(at(step, k)) / (STEP_PART * Math.abs(at(x, k)) + floor);
    if (Number.isNaN(part)) return Infinity;
    if (part > largest) largest = part;
  }
  return largest;
}

/** Moves the unknowns by the step, limited. */
function takeStep({ x, step, size, kinds, hull }: Prepared): void {
  for (let k = 0; k < size; k++) {
    const from = at(x, k);
    const wanted = at(step, k);
    const kind = codeAt(kinds, k);
    if (kind === UnknownKind.bound) {
      const to = from + Math.min(Math.max(wanted, -NODE_STEP), NODE_STEP);
      x[k] = Math.min(Math.max(to, hull.low), hull.high);
    } else if (kind === UnknownKind.loose) {
      const cap = Math.max(NODE_STEP, Math.abs(from));
      x[k] = from + Math.min(Math.max(wanted, -cap), cap);
    } else x[k] = from + wanted;
  }
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
