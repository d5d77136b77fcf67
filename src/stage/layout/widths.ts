/** How much room each cell takes to its left and right, and at what heights. */
import type { GridBox } from '../routing/grid.ts';
import { kindNamed } from '../../parts/catalogue.ts';
import type { Cell } from './cells.ts';
import type { Net, Unit } from './circuit.ts';
import type { Flow } from './order.ts';
import { isLeftTag } from './places.ts';
import type { Rows } from './rows.ts';
import { spacing } from './spacing.ts';

/** Width of one letter at most, grid units. */
const letter = 0.65;

/** Boxes about a cell's own axis: x from the axis, y on the sheet. */
export const roomOf = (
  cell: Cell,
  rows: Rows,
  flow: Flow,
  order: readonly Cell[],
  symbols: ReadonlyMap<Unit, { readonly cell: Cell; readonly net: Net }>,
): readonly GridBox[] => {
  const boxes: GridBox[] = [];
  for (const unit of cell.units)
    boxes.push(...unitRoom(cell, unit, rows.middles.get(unit) ?? 0, flow, order));
  let top = Infinity;
  let bottom = -Infinity;
  for (const { upper, lower } of cell.column) {
    for (const net of [upper, lower]) {
      const level = net === undefined ? undefined : rows.levels.get(net);
      if (level === undefined) continue;
      top = Math.min(top, level);
      bottom = Math.max(bottom, level);
    }
  }
  if (top < bottom) boxes.push({ left: -0.5, right: 0.5, top, bottom });
  for (const [unit, { cell: host, net }] of symbols) {
    if (host !== cell) continue;
    const level = rows.levels.get(net) ?? 0;
    const half = Math.max(1.5, ((unit.label?.length ?? 0) + 7) * letter * 0.5);
    if (unit.role === 'rail') {
      const above = net.power === 'top';
      boxes.push({
        left: -half,
        right: half,
        top: above ? level - 3.5 : level,
        bottom: above ? level : level + 3.5,
      });
    }
    if (unit.role === 'ground') boxes.push({ left: -1.2, right: 1.2, top: level, bottom: level + 3 });
  }
  return boxes;
};

/** Width of what is written at a part. */
export const letteringWidth = (unit: Unit): number => {
  const kind = kindNamed(unit.kind);
  const context = { name: unit.part.name ?? unit.id, values: unit.part.values ?? {}, wired: unit.wired };
  // What a device is called is not written at the part.
  const lines = kind === undefined || unit.part.device !== undefined ? [] : kind.text(context);
  const longest = Math.max(unit.part.name?.length ?? 0, ...lines.map((line) => line.length));
  return 1.25 + Math.max(longest * letter, spacing.lettering - 1.25);
};

const unitRoom = (
  cell: Cell,
  unit: Unit,
  y: number,
  flow: Flow,
  order: readonly Cell[],
): readonly GridBox[] => {
  const { half } = spacing;
  if (unit.role === 'stack') {
    const away = flow.facing.has(unit) ? -1 : 1;
    const bodyWired = [...unit.nets.keys()].some((pin) => unit.headings.get(pin) === 0);
    const box = (near: number, far: number, top: number, bottom: number): GridBox => ({
      left: Math.min(near * away, far * away),
      right: Math.max(near * away, far * away),
      top,
      bottom,
    });
    const boxes = [box(-half, spacing.badge, y - half - 0.5, y + half)];
    if (bodyWired) boxes.push(box(0, 8, y - 1, y + 6));
    return boxes;
  }
  if (unit.role === 'two-pin' && cell.form === 'column') {
    return [{ left: -1.8, right: letteringWidth(unit), top: y - half, bottom: y + half }];
  }
  if (unit.role === 'tapped')
    return [{ left: -letteringWidth(unit), right: half, top: y - half, bottom: y + half }];
  if (unit.role === 'two-pin') return [{ left: -half, right: half, top: y - 3, bottom: y + 1.2 }];
  if (unit.role === 'block') return [{ left: -half, right: half + 2, top: y - 4, bottom: y + half }];
  if (unit.role === 'rail') return [{ left: -half, right: half, top: y - 3.5, bottom: y }];
  const length = (unit.label?.length ?? 3) * letter + 2;
  return [
    isLeftTag(cell, order)
      ? { left: -length, right: 0, top: y - 1, bottom: y + 1 }
      : { left: 0, right: length, top: y - 1, bottom: y + 1 },
  ];
};
