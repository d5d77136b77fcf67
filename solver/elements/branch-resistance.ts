/**
 * A resistance whose current is an unknown of its own: V_a − V_b − R·I = 0. For resistances so small that a
 * current worked out as G·V would lose its digits beside the node voltages (Ho, Ruehli and Brennan 1975).
 */
import type { Batch, LocalEntry, Workspace } from './law.ts';

/** Terminals 0 and 1, branch current 2. */
export const branchPattern: readonly LocalEntry[] = [
  [0, 2],
  [1, 2],
  [2, 0],
  [2, 1],
  [2, 2],
];

/** Loads elements of two terminals and one branch, whose one derived value is the resistance, Ω. */
export function loadBranchResistances(work: Workspace, batch: Batch): void {
  const { x, residual, jacobian, derived, linearKnown } = work;
  for (let k = 0, u = batch.unknown, s = batch.slot; k < batch.count; k++, u += 3, s += 5) {
    const resistance = derived[batch.derived + k]!;
    const current = x[u + 2]!;
    residual[u] = current;
    residual[u + 1] = -current;
    residual[u + 2] = x[u]! - x[u + 1]! - resistance * current;
    if (linearKnown) continue;
    jacobian[s] = jacobian[s + 2] = 1;
    jacobian[s + 1] = jacobian[s + 3] = -1;
    jacobian[s + 4] = -resistance;
  }
}
