/** Where each cell's axis stands from left to right, given the order. */
import type { GridBox } from '../routing/grid.ts';
import type { Cell } from './cells.ts';
import { Constraints } from './constraints.ts';
import type { Flow } from './order.ts';
import { spacing } from './spacing.ts';

/** From a cell's axis to that of one to its right where neither stands in the other's way. */
const leastStep = 3;

/**
 * Axes by cell. Cells at the same heights keep their distance in the order given; a signal goes right in any case;
 * what room is left over is used to bring each cell near those it is wired to.
 */
export const axesOf = (
  order: readonly Cell[],
  flow: Flow,
  room: ReadonlyMap<Cell, readonly GridBox[]>,
  stretch: number,
): ReadonlyMap<Cell, number> => {
  const system = new Constraints();
  const axes = new Map<Cell, number>(order.map((cell) => [cell, system.add()]));
  const axisOf = (cell: Cell): number => axes.get(cell) ?? 0;
  for (const [index, left] of order.entries()) {
    for (const right of order.slice(index + 1)) {
      const apart = distance(room.get(left) ?? [], room.get(right) ?? [], spacing.beside + stretch);
      const flows = flow.after.get(left)?.has(right) === true;
      const wired = left.form === 'lying' || right.form === 'lying' ? spacing.half + leastStep : leastStep;
      const least = Math.max(apart, flows ? wired : -Infinity);
      if (least > -Infinity) system.require(axisOf(left), axisOf(right), Math.ceil(least));
    }
  }

  const limit = system.extent();
  const settled = new Map<Cell, number>();
  const bySlack = (): readonly Cell[] => {
    const highs = system.highs(limit);
    const slack = (cell: Cell): number => (highs[axisOf(cell)] ?? 0) - system.low(axisOf(cell));
    return [...order].sort((a, b) => slack(a) - slack(b));
  };
  for (const cell of bySlack()) {
    const axis = axisOf(cell);
    const low = system.low(axis);
    const high = Math.max(low, system.highs(limit)[axis] ?? low);
    const near = order
      .filter((other) => settled.has(other) && sharesNet(cell, other))
      .map((other) => settled.get(other) ?? 0);
    const wish = near.length === 0 ? low : near.reduce((sum, x) => sum + x, 0) / near.length;
    const value = Math.min(Math.max(Math.round(wish), low), high);
    system.fix(axis, value);
    settled.set(cell, value);
  }
  return settled;
};

/** Least distance of two axes so that no boxes come nearer than `gap`; −∞ where they are at different heights. */
const distance = (left: readonly GridBox[], right: readonly GridBox[], gap: number): number => {
  let least = -Infinity;
  for (const a of left) {
    for (const b of right) {
      if (a.top >= b.bottom + 1 || b.top >= a.bottom + 1) continue;
      least = Math.max(least, a.right + gap - b.left);
    }
  }
  return least;
};

const sharesNet = (a: Cell, b: Cell): boolean => [...a.nets].some((net) => b.nets.has(net));
