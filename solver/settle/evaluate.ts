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
export function assembleMatrix({ work, slots, system }: Prepared): void {
  const { values } = system;
  values.fill(0);
  const local = work.jacobian;
  for (let k = 0; k < local.length; k++) {
    const slot = indexAt(slots, k);
    values[slot] = at(values, slot) + at(local, k);
  }
}

/** Sums what the rows' bounds of acceptance are made of; on the accepting evaluation only. */
export function assembleMagnitudes(prepared: Prepared): void {
  const { work, gather, x, magnitude, rounding, entryRows, entryColumns } = prepared;
  magnitude.fill(0);
  rounding.fill(0);
  const { residual, jacobian } = work;
  for (let k = 0; k < residual.length; k++) {
    const row = indexAt(gather, k);
    magnitude[row] = at(magnitude, row) + Math.abs(at(residual, k));
  }
  for (let k = 0; k < jacobian.length; k++) {
    const row = indexAt(entryRows, k);
    rounding[row] = at(rounding, row) + Math.abs(at(jacobian, k) * at(x, indexAt(entryColumns, k)));
  }
}
