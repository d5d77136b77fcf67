/** From rows and axes to places on the sheet: parts with their turn, then the symbols at rails and ground. */
import type { Turn } from '../../../symbols/placement.ts';
import type { GridBox, GridPoint } from '../routing/grid.ts';
import { boxesOverlap } from '../routing/grid.ts';
import { reachOf, standArt, type StandingPart } from '../routing/shape.ts';
import type { Cell } from './cells.ts';
import { stepOf, type Net, type Unit } from './circuit.ts';
import { standsAsDrawn, type Upright } from './columns.ts';
import type { Flow } from './order.ts';
import type { Rows } from './rows.ts';
import { spacing } from './spacing.ts';

export interface Place {
  readonly at: GridPoint;
  readonly turn: Turn;
  readonly mirror: boolean;
}

/** Rails and grounds that stand at the head or the foot of a column. */
export type Hosted = ReadonlyMap<Unit, { readonly cell: Cell; readonly net: Net }>;

/** Gives each rail and ground on a net that a column begins or ends with one of those columns, transistors' first. */
export const hostsOf = (cells: readonly Cell[], symbols: readonly Unit[]): Hosted => {
  const hosted = new Map<Unit, { cell: Cell; net: Net }>();
  const used = new Set<string>();
  for (const unit of symbols) {
    for (const net of unit.nets.values()) {
      const ends = cells.filter(({ column }) =>
        net.power === 'top' ? column[0]?.upper === net : column.at(-1)?.lower === net,
      );
      const stacked = ends.filter(({ column }) => column.some((upright) => upright.unit.role === 'stack'));
      const cell = [...stacked, ...ends].find(({ rank }) => !used.has(`${net.index} ${rank}`));
      if (cell === undefined) continue;
      used.add(`${net.index} ${cell.rank}`);
      hosted.set(unit, { cell, net });
    }
  }
  return hosted;
};

export const stanceOf = (
  upright: Upright,
  facesRight: boolean,
): { readonly turn: Turn; readonly mirror: boolean } => {
  const asDrawn = standsAsDrawn(upright);
  switch (upright.unit.role) {
    case 'stack':
      // Upside down is half a turn; the mirror then brings the gate back to its side.
      return asDrawn ? { turn: 0, mirror: facesRight } : { turn: 180, mirror: !facesRight };
    case 'tapped':
      // The tap comes out on the right.
      return { turn: 270, mirror: asDrawn };
    default:
      return { turn: asDrawn ? 90 : 270, mirror: false };
  }
};

/** Places of all units of the cells, and of the symbols that a column hosts. */
export const cellPlaces = (
  axes: ReadonlyMap<Cell, number>,
  rows: Rows,
  flow: Flow,
  hosted: Hosted,
): Map<Unit, Place> => {
  const places = new Map<Unit, Place>();
  for (const [cell, x] of axes) {
    for (const upright of cell.column) {
      const stance = stanceOf(upright, flow.facing.has(upright.unit));
      places.set(upright.unit, { at: [x, rows.middles.get(upright.unit) ?? 0], ...stance });
    }
    for (const unit of cell.column.length > 0 ? [] : cell.units) {
      const y = rows.middles.get(unit) ?? 0;
      const right = (cell.form === 'lying' && flow.leftPin.get(unit) === 1) || false;
      places.set(unit, { at: [x, y], turn: right ? 180 : 0, mirror: isLeftTag(cell, axes.keys()) });
    }
  }
  for (const [unit, { cell, net }] of hosted) {
    const level = rows.levels.get(net) ?? 0;
    // Joints of the net take its level; the symbol then stands clear of them.
    const clear = net.joints.length > 0 ? spacing.power : 0;
    const above = net.power === 'top';
    const end = above ? cell.column[0] : cell.column.at(-1);
    const middle = end === undefined ? undefined : rows.middles.get(end.unit);
    // Wishes at odds (a part with both pins on one net) can leave the level on the wrong side of the column's end.
    if (middle === undefined || (above ? middle - level : level - middle) <= spacing.half) continue;
    places.set(unit, {
      at: [axes.get(cell) ?? 0, above ? level - clear : level + clear],
      turn: hangs(unit) ? 180 : 0,
      mirror: false,
    });
  }
  return places;
};

/** Whether a tag stands left of most of what it is wired to, so that it points to the right. */
export const isLeftTag = (tag: Cell, order: Iterable<Cell>): boolean => {
  if (tag.units[0]?.role !== 'tag') return false;
  let balance = 0;
  let passed = false;
  for (const cell of order) {
    if (cell === tag) passed = true;
    else if ([...cell.nets].some((net) => tag.nets.has(net))) balance += passed ? 1 : -1;
  }
  return balance > 0;
};

/** A unit as it stands at a place. */
export const standUnit = (unit: Unit, { at, turn, mirror }: Place): StandingPart =>
  standArt(unit.id, unit.art, unit.kind, at, { turn, mirror }, unit.wired);

/**
 * Places for what hangs on a single pin somewhere: grounds and rails that no column hosts, and test points. Each takes
 * the nearest place to its pin that is free.
 */
export const attach = (units: readonly Unit[], places: Map<Unit, Place>, rows: Rows): void => {
  const taken: GridBox[] = [...places].map(([unit, place]) => reachOf(standUnit(unit, place)));
  for (const unit of units) {
    if (places.has(unit)) continue;
    const place = nearestFree(unit, places, rows, taken);
    places.set(unit, place);
    taken.push(reachOf(standUnit(unit, place)));
  }
};

const nearestFree = (
  unit: Unit,
  places: ReadonlyMap<Unit, Place>,
  rows: Rows,
  taken: readonly GridBox[],
): Place => {
  const anchors = anchorsOf(unit, places, rows);
  let best: { place: Place; price: number } | undefined;
  for (const { at: anchor, toward } of anchors) {
    for (let dx = -16; dx <= 16; dx++) {
      for (let dy = -12; dy <= 12; dy++) {
        const place: Place = {
          at: [anchor[0] + dx, anchor[1] + dy],
          turn: hangs(unit) ? 180 : 0,
          mirror: false,
        };
        const price = priceOf(unit, dx, dy, toward);
        if (best !== undefined && price >= best.price) continue;
        const reach = reachOf(standUnit(unit, place));
        const room = {
          left: reach.left - 1.5,
          right: reach.right + 1.5,
          top: reach.top - 1.5,
          bottom: reach.bottom + 1.5,
        };
        if (taken.some((box) => boxesOverlap(box, room))) continue;
        best = { place, price };
      }
    }
  }
  return best?.place ?? { at: anchors[0]?.at ?? [0, 0], turn: 0, mirror: false };
};

/** A negative rail stands below its wire, upside down. */
const hangs = (unit: Unit): boolean =>
  unit.role === 'rail' && [...unit.nets.values()].some((net) => net.power === 'bottom');

/** Straight in line is best; a rail likes to be above its pin, a ground below, a test point beside. */
const priceOf = (unit: Unit, dx: number, dy: number, [tx, ty]: readonly [number, number]): number => {
  const along = dx * tx + dy * ty;
  const below = unit.role === 'ground' || hangs(unit);
  const liked = below ? 3 : unit.role === 'rail' ? -3 : 0;
  const bends = (dx !== 0 && dy !== 0 ? 3 : 0) + (along <= 0 ? 6 : 0);
  const far = unit.role === 'probe' ? Math.abs(Math.abs(dx) - 4) : Math.abs(dx);
  return far + Math.abs(dy - liked) * 1.5 + bends;
};

interface Anchor {
  readonly at: GridPoint;
  /** The way to leave it. */
  readonly toward: readonly [number, number];
}

/** Pins that a symbol could hang on, the joints of its net at their level. */
const anchorsOf = (unit: Unit, places: ReadonlyMap<Unit, Place>, rows: Rows): readonly Anchor[] => {
  const anchors: Anchor[] = [];
  for (const net of unit.nets.values()) {
    for (const { unit: other, pin } of net.members) {
      const place = places.get(other);
      const standing =
        other === unit || place === undefined ? undefined : standUnit(other, place).pins.get(pin);
      if (standing === undefined) continue;
      const upright = standing.heading === 1 || standing.heading === 3;
      const level = rows.levels.get(net);
      if (unit.role === 'probe' && upright && level !== undefined) {
        anchors.push(
          { at: [standing.at[0], level], toward: [-1, 0] },
          { at: [standing.at[0], level], toward: [1, 0] },
        );
      } else anchors.push({ at: standing.at, toward: stepOf(standing.heading) });
    }
  }
  return anchors;
};

/** Where the joints of a net go: at its level, on the axes of the columns that it links, one after another. */
export const jointPlaces = (
  nets: Iterable<Net>,
  neighbours: ReadonlyMap<string, readonly string[]>,
  places: ReadonlyMap<Unit, Place>,
  rows: Rows,
): ReadonlyMap<string, GridPoint> => {
  const joints = new Map<string, GridPoint>();
  for (const net of nets) {
    const used = new Set<string>();
    for (const joint of net.joints) {
      const ends = new Set(neighbours.get(joint) ?? []);
      const pins = net.members.flatMap(({ unit, pin }) => {
        const place = places.get(unit);
        const standing = place === undefined ? undefined : standUnit(unit, place).pins.get(pin);
        return standing === undefined ? [] : [{ standing, near: ends.has(`${unit.id}.${pin}`) }];
      });
      const near = pins.filter((pin) => pin.near);
      const choice = near.length > 0 ? near : pins;
      const upright = choice.filter(({ standing }) => standing.heading === 1 || standing.heading === 3);
      const ys = choice.map(({ standing }) => standing.at[1]).sort((a, b) => a - b);
      const y = rows.levels.get(net) ?? ys[ys.length >> 1] ?? 0;
      const xs = (upright.length > 0 ? upright : choice)
        .map(({ standing }) => standing.at[0])
        .sort((a, b) => a - b);
      let x = mostOften(xs) ?? 0;
      while (used.has(`${x},${y}`)) x++;
      used.add(`${x},${y}`);
      joints.set(joint, [x, y]);
    }
  }
  return joints;
};

const mostOften = (values: readonly number[]): number | undefined => {
  const counts = new Map<number, number>();
  for (const value of values) counts.set(value, (counts.get(value) ?? 0) + 1);
  return [...counts].sort((a, b) => b[1] - a[1])[0]?.[0] ?? values[0];
};
