/** Lays out one group of parts that hang together by wires. */
import { boxAround, type GridBox, type GridPoint, type Polyline } from '../routing/grid.ts';
import type { DrawnStage } from '../routing/document.ts';
import { lengthOf } from '../routing/grid.ts';
import { routeIn } from '../routing/routeWires.ts';
import { Session } from '../routing/session.ts';
import { reachOf, type StandingPart } from '../routing/shape.ts';
import { axesOf } from './across.ts';
import { cellsOf, isSignalRail, type Cell } from './cells.ts';
import type { Net, Unit } from './circuit.ts';
import { standingOf } from './columns.ts';
import { firstOrder, flowOf, type Flow } from './order.ts';
import { twinsOf } from './pairs.ts';
import { attach, cellPlaces, hostsOf, jointPlaces, standUnit, type Place } from './places.ts';
import { rowsOf, type Rows } from './rows.ts';
import { roomOf } from './widths.ts';

export interface Arrangement {
  readonly places: ReadonlyMap<Unit, Place>;
  readonly joints: ReadonlyMap<string, GridPoint>;
  /** Everything with its lettering. */
  readonly bounds: GridBox;
}

/** How many arrangements are tried at most, and how much work on routes goes into it (states and grid points). */
const mostTrials = 160;
const mostEffort = 800_000;

/** By how much a transistor is hung lower at a time. */
const lowering = 3;

/** What a fault of a drawing weighs against a grid unit of wire. */
const weights = { blocked: 500, crossing: 30, bend: 3, against: 20, length: 0.4, size: 0.35 } as const;

export const arrange = (
  document: DrawnStage,
  group: readonly Unit[],
  heights: ReadonlyMap<Net, number>,
  signals: ReadonlySet<Unit>,
): Arrangement => {
  const nets = new Set(group.flatMap((unit) => [...unit.nets.values()]));
  const own = restricted(document, group, nets);
  const neighbours = neighboursOf(own);
  const cells = cellsOf(standingOf(group, heights, signals), group, signals);
  const twins = twinsOf(cells);
  const flow = flowOf(cells, twins, signals);
  const symbols = group.filter(
    (unit) => unit.role === 'ground' || (unit.role === 'rail' && !isSignalRail(unit, signals)),
  );
  const hosted = hostsOf(cells, symbols);
  const loose = group.filter((unit) => unit.role === 'probe' || symbols.includes(unit));

  const rowsFor = new Map<Choice['lowered'], Rows>();
  const build = ({ order, facing, lowered, stretch }: Choice): Arrangement => {
    const rows = rowsFor.get(lowered) ?? rowsOf(cells, twins, flow.leftPin, lowered);
    rowsFor.set(lowered, rows);
    const turned: Flow = { ...flow, facing };
    const room = new Map(order.map((cell) => [cell, roomOf(cell, rows, turned, order, hosted)]));
    const axes = axesOf(order, turned, room, stretch);
    const places = cellPlaces(axes, rows, turned, hosted);
    attach(loose, places, rows);
    const joints = jointPlaces(nets, neighbours, places, rows);
    const boxes = [...axes].flatMap(([cell, x]) =>
      (room.get(cell) ?? []).map((box) => ({ ...box, left: box.left + x, right: box.right + x })),
    );
    for (const unit of loose) {
      const place = places.get(unit);
      if (place !== undefined) boxes.push(reachOf(standUnit(unit, place)));
    }
    return { places, joints, bounds: boxAround(boxes) ?? { left: 0, right: 0, top: 0, bottom: 0 } };
  };
  let effort = 0;
  const judge = ({ order }: Choice, arrangement: Arrangement): number => {
    const placed = withPlaces(own, arrangement);
    const parts = new Map<string, StandingPart>(
      [...arrangement.places].map(([unit, place]) => [unit.id, standUnit(unit, place)]),
    );
    const session = new Session(placed, parts);
    const { paths, blocked } = routeIn(session, placed);
    effort += session.effort + session.field.solid.length;
    const { bounds } = arrangement;
    return (
      blocked.size * weights.blocked +
      session.crossings() * weights.crossing +
      bendsIn(paths) * weights.bend +
      against(order, flow) * weights.against +
      [...paths.values()].reduce((sum, line) => sum + lengthOf(line), 0) * weights.length +
      (bounds.right - bounds.left + bounds.bottom - bounds.top) * weights.size
    );
  };
  const first: Choice = {
    order: firstOrder(cells, flow),
    facing: flow.facing,
    lowered: new Map(),
    stretch: 0,
  };
  return better(first, build, judge, (trials) => trials < mostTrials && effort < mostEffort);
};

/** What is left open once rows and flow are known, and decided by trying. */
interface Choice {
  readonly order: readonly Cell[];
  /** Transistors whose gate faces right. */
  readonly facing: ReadonlySet<Unit>;
  /** Transistors that hang lower than they need, and by how much. */
  readonly lowered: ReadonlyMap<Unit, number>;
  /** Room added between neighbours. */
  readonly stretch: number;
}

/**
 * Betters a choice by moving one cell at a time, by turning transistors' gates about and by hanging them lower, as
 * long as the routed drawing gains by it: crossing reduction as in layered drawing (Sugiyama, Tagawa and Toda,
 * 'Methods for Visual Understanding of Hierarchical System Structures', IEEE Trans. SMC-11, 1981), judged on the real
 * wires.
 */
const better = (
  first: Choice,
  build: (choice: Choice) => Arrangement,
  judge: (choice: Choice, arrangement: Arrangement) => number,
  goesOn: (trials: number) => boolean,
): Arrangement => {
  let choice = first;
  let best = build(choice);
  let price = judge(choice, best);
  let trials = 0;
  const attempt = (change: Partial<Choice>): boolean => {
    const next = { ...choice, ...change };
    const arrangement = build(next);
    const nextPrice = judge(next, arrangement);
    trials++;
    if (nextPrice >= price - 1e-9) return false;
    [choice, best, price] = [next, arrangement, nextPrice];
    return true;
  };
  const tryIf = (change: Partial<Choice>): boolean => goesOn(trials) && attempt(change);
  const stacks = first.order.flatMap(({ units }) => units.filter(({ role }) => role === 'stack'));
  for (let gained = true; gained && goesOn(trials);) {
    gained = false;
    const flips = first.order.map(({ units }) => units.filter(({ role }) => role === 'stack'));
    for (const flip of [...flips, ...stacks.map((unit) => [unit])]) {
      if (flip.length > 0) gained = tryIf({ facing: flipped(choice.facing, flip) }) || gained;
    }
    for (const cell of first.order)
      gained = moved(cell, choice.order).some((order) => tryIf({ order })) || gained;
    for (const unit of stacks) {
      const lower = (choice.lowered.get(unit) ?? 0) + lowering;
      gained = tryIf({ lowered: new Map([...choice.lowered, [unit, lower]]) }) || gained;
    }
  }
  // More room is the last resort, for a wire that found no way.
  for (const stretch of [3, 6, 12]) {
    if (price >= weights.blocked) attempt({ stretch });
  }
  return best;
};

const flipped = (facing: ReadonlySet<Unit>, units: readonly Unit[]): ReadonlySet<Unit> => {
  const next = new Set(facing);
  for (const unit of units) if (!next.delete(unit)) next.add(unit);
  return next;
};

/** The orders in which one cell has changed places, the nearest first. */
const moved = (cell: Cell, order: readonly Cell[]): readonly (readonly Cell[])[] => {
  const from = order.indexOf(cell);
  const others = order.filter((other) => other !== cell);
  return [-1, 1, -2, 2, -3, 3]
    .map((by) => from + by)
    .filter((to) => to >= 0 && to < order.length)
    .map((to) => others.toSpliced(to, 0, cell));
};

const bendsIn = (paths: ReadonlyMap<string, Polyline>): number => {
  let bends = 0;
  for (const line of paths.values()) bends += Math.max(0, line.length - 2);
  return bends;
};

/** Pairs that stand the wrong way round for the flow of the signal. */
const against = (order: readonly Cell[], { after }: Flow): number => {
  let count = 0;
  const seen = new Set<Cell>();
  for (const cell of order) {
    for (const right of after.get(cell) ?? []) if (seen.has(right)) count++;
    seen.add(cell);
  }
  return count;
};

/** The group as a document of its own: its parts, its joints, its wires, without stated paths. */
const restricted = (document: DrawnStage, group: readonly Unit[], nets: ReadonlySet<Net>): DrawnStage => {
  const parts = Object.fromEntries(group.map((unit) => [unit.id, unit.part]));
  const named = [...nets].flatMap((net) => net.joints);
  const joints = Object.fromEntries(named.map((joint): [string, GridPoint] => [joint, [0, 0]]));
  const wires = Object.entries(document.wires)
    .filter(([, { ends }]) => ends.every(([id]) => id in parts || id in joints))
    .map(([id, { ends }]) => [id, { ends }] as const);
  return { devices: document.devices, parts, joints, wires: Object.fromEntries(wires) };
};

/** For each joint the pins that a wire joins it with, `part.pin`. */
const neighboursOf = (document: DrawnStage): ReadonlyMap<string, readonly string[]> => {
  const neighbours = new Map<string, string[]>();
  for (const { ends } of Object.values(document.wires)) {
    for (const [one, other] of [ends, [ends[1], ends[0]]] as const) {
      if (one.length !== 1 || other.length !== 2) continue;
      neighbours.set(one[0], [...(neighbours.get(one[0]) ?? []), other.join('.')]);
    }
  }
  return neighbours;
};

export const withPlaces = (document: DrawnStage, { places, joints }: Arrangement): DrawnStage => ({
  ...document,
  parts: {
    ...document.parts,
    ...Object.fromEntries(
      [...places].map(([unit, { at, turn, mirror }]) => [unit.id, { ...unit.part, place: at, turn, mirror }]),
    ),
  },
  joints: { ...document.joints, ...Object.fromEntries(joints) },
});
