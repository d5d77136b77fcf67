/** Where each cell's axis stands from left to right, given the order. */
import type { GridBox } from '../routing/grid.ts';
import type { Cell } from './cells.ts';
import type { Flow } from './order.ts';
import { spacing } from './spacing.ts';

/** From a cell's axis to that of one to its right where neither stands in the other's way. */
const leastStep = 3;

const sweeps = 4;

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
  const arcs: Arc[] = [];
  for (const [index, left] of order.entries()) {
    for (const right of order.slice(index + 1)) {
      const apart = distance(room.get(left) ?? [], room.get(right) ?? [], spacing.beside + stretch);
      const flows = flow.after.get(left)?.has(right) === true;
      const wired = left.form === 'lying' || right.form === 'lying' ? spacing.half + leastStep : leastStep;
      const least = Math.max(apart, flows ? wired : -Infinity);
      if (least > -Infinity) arcs.push({ left, right, least: Math.ceil(least) });
    }
  }
  const before = new Map<Cell, Arc[]>(order.map((cell) => [cell, []]));
  const beyond = new Map<Cell, Arc[]>(order.map((cell) => [cell, []]));
  for (const arc of arcs) {
    before.get(arc.right)?.push(arc);
    beyond.get(arc.left)?.push(arc);
  }

  // As far left as they go, in order; then each toward the middle of its neighbours, there and back.
  const axes = new Map<Cell, number>();
  const low = (cell: Cell): number =>
    Math.max(0, ...(before.get(cell) ?? []).map(({ left, least }) => (axes.get(left) ?? 0) + least));
  const high = (cell: Cell): number =>
    Math.min(...(beyond.get(cell) ?? []).map(({ right, least }) => (axes.get(right) ?? 0) - least));
  for (const cell of order) axes.set(cell, low(cell));
  const neighbours = new Map<Cell, readonly Cell[]>(
    order.map((cell) => [
      cell,
      flow.between.get(cell) ?? order.filter((other) => other !== cell && sharesNet(cell, other)),
    ]),
  );
  const settle = (cell: Cell): void => {
    const near = neighbours.get(cell) ?? [];
    if (near.length === 0) return;
    const wish = near.reduce((sum, other) => sum + (axes.get(other) ?? 0), 0) / near.length;
    axes.set(cell, Math.max(low(cell), Math.min(high(cell), Math.round(wish))));
  };
  for (let sweep = 0; sweep < sweeps; sweep++) {
    for (const cell of order.toReversed()) settle(cell);
    for (const cell of order) settle(cell);
  }
  return axes;
};

interface Arc {
  readonly left: Cell;
  readonly right: Cell;
  readonly least: number;
}

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
