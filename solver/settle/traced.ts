/**
 * Arc-length homotopy (Melville, Trajković, Fang and Watson 1993): H(x, λ) = F(x) + g(λ)·(x − a) on the nodes that no
 * source pins, gains of amplifiers scaled by λ, g falling from a short at λ = 0 to nothing at λ = 1. The path is
 * followed by arc length through its folds; its direction is the sign of det J, so that it cannot run back.
 */
import { at, codeAt } from '../elements/at.ts';
import { Phase } from '../elements/law.ts';
import { converges, finishes, isSpent, type Effort } from './effort.ts';
import { assembleMatrix, assembleResidual, loadElements } from './evaluate.ts';
import { addShunt, type Shunt } from './newton.ts';
import { UnknownKind, type Prepared } from './prepared.ts';

/** g(λ) = SCALE·(e^{RATE·(1 − λ)} − 1), S: 72 S at the start. */
const SCALE = 1e-12;
const RATE = 32;
const conductanceAt = (lambda: number): number => SCALE * Math.expm1(RATE * (1 - lambda));
const conductanceSlope = (lambda: number): number => -SCALE * RATE * Math.exp(RATE * (1 - lambda));

/** Length of arc in which λ counts as this many volts. */
const LAMBDA_VOLTS = 20;
const FIRST_STEP = 0.1;
const LEAST_STEP = 1e-9;
const GREATEST_STEP = 4;
const CORRECTIONS = 8;
/** A corrector has converged below this, V. */
const CLOSE = 1e-7;

export function settleTraced(prepared: Prepared, effort: Effort): boolean {
  const reached = trace(prepared, effort);
  prepared.work.gainScale = 1;
  return reached && finishes(prepared, effort);
}

function trace(prepared: Prepared, effort: Effort): boolean {
  const { x, size, work, system, kinds } = prepared;
  const { run } = effort;
  const shunt: Shunt = { conductance: conductanceAt(0), anchor: new Float64Array(size), lag: 0 };
  // An anchor off every symmetry, inside the rails.
  const { low, high } = prepared.hull;
  for (let k = 0; k < size; k++)
    if (codeAt(kinds, k) !== UnknownKind.branch)
      shunt.anchor[k] = low + (high - low) * (0.3 + 0.4 * ((k * 0.6180339887498949) % 1));
  x.set(shunt.anchor);
  work.gainScale = 0;
  run.shunt = shunt;
  if (!converges(prepared, effort, 100)) return false;

  let lambda = 0;
  const tangent = new Float64Array(size + 1);
  let tangentLambda = 0; // in LAMBDA_VOLTS
  const byLambda = new Float64Array(size + 1);
  const correction = new Float64Array(size + 1);
  const held = x.slice();
  let orientation = 0;
  let step = FIRST_STEP;

  /** Evaluates H and its matrix; false where that is singular. */
  const linearise = (): boolean => {
    shunt.conductance = conductanceAt(lambda);
    work.gainScale = lambda;
    work.phase = Phase.exact;
    loadElements(prepared);
    assembleResidual(prepared);
    addShunt(prepared, shunt, false);
    assembleMatrix(prepared);
    addShunt(prepared, shunt, true);
    run.iterations++;
    const { kind } = system.factorise();
    return kind === 'factored' || kind === 'refactored';
  };

  /** −∂H/∂λ into `byLambda`, for one volt's worth of λ; the gains' part by a difference. */
  const slopeByLambda = (): void => {
    const small = 1e-6;
    const here = prepared.residual.slice();
    work.gainScale = lambda + small;
    loadElements(prepared);
    assembleResidual(prepared);
    addShunt(prepared, shunt, false);
    for (let k = 0; k < size; k++) byLambda[k] = -(at(prepared.residual, k) - at(here, k)) / small;
    work.gainScale = lambda;
    const slope = conductanceSlope(lambda);
    for (let k = 0; k < size; k++)
      if (codeAt(kinds, k) >= UnknownKind.bound)
        byLambda[k] = at(byLambda, k) - slope * (at(x, k) - at(shunt.anchor, k));
    prepared.residual.set(here);
    for (let k = 0; k < size; k++) byLambda[k] = at(byLambda, k) / LAMBDA_VOLTS;
  };
  const solve = (b: Float64Array): boolean => {
    const { kind } = system.solve(b);
    return kind === 'solved' || kind === 'inaccurate';
  };

  while (!isSpent(effort)) {
    // --- Tangent at the point on the path ---
    if (!linearise()) return false;
    slopeByLambda();
    if (!solve(byLambda)) return false;
    const sign = system.determinantSign();
    orientation ||= sign;
    let length = 1;
    for (let k = 0; k < size; k++)
      if (codeAt(kinds, k) !== UnknownKind.branch) length += at(byLambda, k) ** 2;
    tangentLambda = (sign * orientation) / Math.sqrt(length);
    for (let k = 0; k < size; k++) tangent[k] = tangentLambda * at(byLambda, k);
    held.set(x);
    const heldLambda = lambda;

    // --- A step along it, and back to the path at right angles to it ---
    let corrected = false;
    while (!corrected) {
      if (isSpent(effort)) return false;
      const ahead = heldLambda + (step * tangentLambda) / LAMBDA_VOLTS;
      const last = ahead >= 1;
      const length = last ? (step * (1 - heldLambda)) / (ahead - heldLambda) : step;
      for (let k = 0; k < size; k++) x[k] = at(held, k) + length * at(tangent, k);
      lambda = last ? 1 : ahead;
      const before = run.iterations;
      corrected = correct(last);
      if (corrected && last) return true;
      if (corrected && run.iterations - before <= 4) step = Math.min(step * 2, GREATEST_STEP);
      if (!corrected) {
        x.set(held);
        lambda = heldLambda;
        step /= 4;
        if (step < LEAST_STEP) return false;
      }
    }
  }
  return false;

  /** Newton on H = 0 at right angles to the tangent; at the end of the path with λ held. */
  function correct(lambdaHeld: boolean): boolean {
    for (let pass = 0; pass < CORRECTIONS; pass++) {
      if (!linearise()) return false;
      slopeByLambda();
      for (let k = 0; k < size; k++) correction[k] = -at(prepared.residual, k);
      if (!solve(correction)) return false;
      let change = 0;
      if (!lambdaHeld) {
        if (!solve(byLambda)) return false;
        let along = 0;
        let across = tangentLambda;
        for (let k = 0; k < size; k++) {
          if (codeAt(kinds, k) === UnknownKind.branch) continue;
          along += at(tangent, k) * at(correction, k);
          across += at(tangent, k) * at(byLambda, k);
        }
        change = -along / across; // of λ, in LAMBDA_VOLTS
      }
      let largest = Math.abs(change);
      for (let k = 0; k < size; k++) {
        const move = at(correction, k) + change * at(byLambda, k);
        x[k] = at(x, k) + move;
        if (codeAt(kinds, k) !== UnknownKind.branch) largest = Math.max(largest, Math.abs(move));
      }
      lambda += change / LAMBDA_VOLTS;
      if (!(largest < 1e3)) return false;
      if (largest < CLOSE) return true;
    }
    return false;
  }
}
