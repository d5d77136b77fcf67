/** Evaluates all elements at the point at hand and assembles rows and matrix. The inner loop: allocates nothing. */
import { at, indexAt } from '../elements/at.ts';
import type { Prepared } from './prepared.ts';

/** Gathers `x` to the elements and loads every law, by the phase set in the workspace. */
export function loadElements(prepared: Prepared): void {
  const { work, gather, x, batches } = prepared;
  const local = work.x;
  for (let k = 0; k < local.length; k++) local[k] = at(x, indexAt(gather, k));
  work.limited = false;
  for (const { law, batch } of batches) law.load(work, batch);
  if (work.linearKnown) return;
  prepared.linearMatrix.fill(0);
  addEntries(prepared, prepared.linearMatrix, 0, prepared.linearEntries);
  work.linearKnown = true;
}

/** Sums the elements' currents and branch voltages into `residual`. */
export function assembleResidual({ work, gather, residual }: Prepared): void {
  residual.fill(0);
  const local = work.residual;
  for (let k = 0; k < local.length; k++) {
    const row = indexAt(gather, k);
    residual[row] = at(residual, row) + at(local, k);
  }
}

/** Sums the elements' derivatives into the matrix. */
export function assembleMatrix(prepared: Prepared): void {
  const { work, system, linearMatrix, linearEntries } = prepared;
  system.values.set(linearMatrix);
  addEntries(prepared, system.values, linearEntries, work.jacobian.length);
}

function addEntries({ work, slots }: Prepared, values: Float64Array, from: number, to: number): void {
  const local = work.jacobian;
  for (let k = from; k < to; k++) {
    const slot = indexAt(slots, k);
    values[slot] = at(values, slot) + at(local, k);
  }
}

/** Sums what the rows' bounds of acceptance are made of; on the accepting evaluation only. */
export function assembleMagnitudes(prepared: Prepared): void {
  const { work, gather, x, magnitude, rounding, entryRows, entryColumns, inner } = prepared;
  magnitude.fill(0);
  rounding.fill(0);
  const { residual, jacobian } = work;
  for (let k = 0; k < residual.length; k++) {
    const row = indexAt(gather, k);
    magnitude[row] = at(magnitude, row) + Math.abs(at(residual, k));
  }
  // An internal node is its element's alone, whose sum there is nothing but what is left over: what flows is what
  // comes through from the terminal, and goes on.
  for (const { row, node, terminal, entry } of inner)
    magnitude[row] = 2 * Math.abs(at(jacobian, entry) * (at(work.x, node) - at(work.x, terminal)));
  for (let k = 0; k < jacobian.length; k++) {
    const row = indexAt(entryRows, k);
    rounding[row] = at(rounding, row) + Math.abs(at(jacobian, k) * at(x, indexAt(entryColumns, k)));
  }
}
