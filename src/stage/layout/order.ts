/** Who stands left of whom: signals run from left to right. */
import type { Cell } from './cells.ts';
import { isListener, type Member, type Net, type Unit } from './circuit.ts';
import { listenerIn } from './cells.ts';
import type { Twins } from './pairs.ts';

export interface Flow {
  /** For each cell those that should stand right of it. */
  readonly after: ReadonlyMap<Cell, ReadonlySet<Cell>>;
  /** The left one of a lying part's two nets is the first (0) or the second (1) of its pins. */
  readonly leftPin: ReadonlyMap<Unit, 0 | 1>;
  /** Tags at which a signal leaves. */
  readonly outputs: ReadonlySet<Unit>;
  /** Transistors whose gate faces right. */
  readonly facing: ReadonlySet<Unit>;
  /** What stands under the tail of a pair, and the two columns between which it belongs. */
  readonly between: ReadonlyMap<Cell, readonly [Cell, Cell]>;
}

export const flowOf = (cells: readonly Cell[], twins: readonly Twins[], signals: ReadonlySet<Unit>): Flow => {
  const on = new Map<Net, Cell[]>();
  for (const cell of cells) for (const net of cell.nets) on.set(net, [...(on.get(net) ?? []), cell]);
  const outputs = outputsOf(cells);
  const stages = stagesOf(cells, on, signals, outputs);
  const facing = new Set(twins.map(({ form, first, second }) => (form === 'pair' ? second : first)));

  const after = new Map<Cell, Set<Cell>>(cells.map((cell) => [cell, new Set<Cell>()]));
  const put = (left: Cell, right: Cell): void => {
    if (left !== right && after.get(right)?.has(left) !== true) after.get(left)?.add(right);
  };
  const cellOf = new Map(cells.flatMap((cell) => cell.units.map((unit) => [unit, cell] as const)));

  const between = new Map<Cell, readonly [Cell, Cell]>();
  for (const { first, second, form, tail } of twins) {
    const [a, b] = [cellOf.get(first), cellOf.get(second)];
    if (a === undefined || b === undefined) continue;
    put(a, b);
    if (form !== 'pair' || tail === undefined) continue;
    for (const cell of on.get(tail) ?? []) {
      if (cell === a || cell === b || cell.form !== 'column') continue;
      put(a, cell);
      put(cell, b);
      if (!between.has(cell)) between.set(cell, [a, b]);
    }
  }
  const leftPin = new Map<Unit, 0 | 1>();
  for (const cell of cells) {
    const { lying } = cell;
    if (lying === undefined) continue;
    const [a, b] = lying.nets;
    const left = leftOf(a, b, stages, on);
    leftPin.set(lying.unit, left);
    const [from, to] = left === 0 ? [a, b] : [b, a];
    for (const other of on.get(from ?? noNet) ?? []) if (!other.hears.has(from ?? noNet)) put(other, cell);
    for (const other of on.get(to ?? noNet) ?? []) put(cell, other);
  }
  for (const [net, touching] of on) {
    for (const cell of touching) {
      const tag = cell.form === 'symbol' ? cell.units[0] : undefined;
      if (tag !== undefined) {
        for (const other of touching)
          if (outputs.has(tag)) put(other, cell);
          else put(cell, other);
      }
      if (!cell.hears.has(net)) continue;
      const listener = listenerIn(cell, net);
      const right = listener !== undefined && facing.has(listener);
      for (const other of touching) {
        if (other.hears.has(net)) continue;
        if (right) put(cell, other);
        else put(other, cell);
      }
    }
  }
  return { after, leftPin, outputs, facing, between };
};

const noNet: Net = { index: -1, members: [], joints: [], power: null };

/** A tag is an output where, by wires and two-pin parts, the nearest thing that drives is no farther than one that listens. */
const outputsOf = (cells: readonly Cell[]): ReadonlySet<Unit> => {
  const outputs = new Set<Unit>();
  for (const { form, units } of cells) {
    const [unit] = units;
    if (form === 'symbol' && unit?.role === 'tag' && [...unit.nets.values()].every(isDriven))
      outputs.add(unit);
  }
  return outputs;
};

const isDriven = (start: Net): boolean => {
  const seen = new Set([start]);
  let ring = [start];
  while (ring.length > 0) {
    const members = ring.flatMap((net) => net.members);
    if (members.some(drives)) return true;
    if (members.some(isListener)) return false;
    const next = members.flatMap(({ unit }) => (unit.role === 'two-pin' ? [...unit.nets.values()] : []));
    ring = [...new Set(next)].filter((net) => net.power === null && !seen.has(net));
    for (const net of ring) seen.add(net);
  }
  return true;
};

/** A pin at which a unit gives a level of its own: a channel's ends, a tap, the output of a block. */
const drives = (member: Member): boolean =>
  !isListener(member) &&
  (member.unit.role === 'stack' ||
    member.unit.role === 'tapped' ||
    (member.unit.role === 'block' && member.unit.headings.get(member.pin) === 0));

/** How many steps a net is from where the signals come in. */
const stagesOf = (
  cells: readonly Cell[],
  on: ReadonlyMap<Net, readonly Cell[]>,
  signals: ReadonlySet<Unit>,
  outputs: ReadonlySet<Unit>,
): ReadonlyMap<Net, number> => {
  const stages = new Map<Net, number>();
  const queue: Net[] = [];
  const enter = (net: Net | undefined, stage: number): void => {
    if (net?.power !== null || stages.has(net)) return;
    stages.set(net, stage);
    queue.push(net);
  };
  const spread = (): void => {
    for (let net = queue.shift(); net !== undefined; net = queue.shift()) {
      const stage = stages.get(net) ?? 0;
      for (const member of net.members) {
        const passes = isListener(member) || member.unit.role === 'two-pin' || member.unit.role === 'tapped';
        if (passes) for (const other of member.unit.nets.values()) enter(other, stage + 1);
      }
    }
  };
  for (const { units } of cells) {
    for (const unit of units) {
      const enters = signals.has(unit) || (unit.role === 'tag' && !outputs.has(unit));
      if (enters) for (const net of unit.nets.values()) enter(net, 0);
    }
  }
  spread();
  // Gates that nothing but bias hangs on, where no signal comes in at all.
  for (const [net, touching] of on) {
    const carried = touching.some(
      (cell) =>
        !cell.hears.has(net) &&
        cell.units.some((unit) => unit.role === 'stack' && [...unit.nets.values()].includes(net)),
    );
    if (!carried && touching.some((cell) => cell.hears.has(net))) enter(net, 0);
  }
  spread();
  return stages;
};

/** Which of a lying part's nets goes left. */
const leftOf = (
  a: Net | undefined,
  b: Net | undefined,
  stages: ReadonlyMap<Net, number>,
  on: ReadonlyMap<Net, readonly Cell[]>,
): 0 | 1 => {
  if (a === undefined) return 1;
  if (b === undefined) return 0;
  const [first, second] = [stages.get(a) ?? Infinity, stages.get(b) ?? Infinity];
  if (first !== second) return first < second ? 0 : 1;
  const heard = (net: Net): boolean => (on.get(net) ?? []).some((cell) => cell.hears.has(net));
  return heard(a) && !heard(b) ? 1 : 0;
};

/**
 * A first order: each cell once those left of it are there, the one that shares most nets with what stands already
 * first. A ring of wishes is broken at its first cell in the document.
 */
export const firstOrder = (cells: readonly Cell[], { after }: Flow): readonly Cell[] => {
  const waiting = new Map<Cell, number>(cells.map((cell) => [cell, 0]));
  for (const right of after.values())
    for (const cell of right) waiting.set(cell, (waiting.get(cell) ?? 0) + 1);
  const tied = (cell: Cell): boolean => (after.get(cell)?.size ?? 0) > 0 || (waiting.get(cell) ?? 0) > 0;
  const loose = cells.filter((cell) => !tied(cell));
  const open = new Set(cells.filter(tied));
  const order: Cell[] = [];
  const placed = new Set<Net>();
  while (open.size > 0) {
    const ready = [...open].filter((cell) => (waiting.get(cell) ?? 0) <= 0);
    const known = (cell: Cell): number => [...cell.nets].filter((net) => placed.has(net)).length;
    const [next] = (ready.length > 0 ? ready : [...open]).sort(
      (a, b) => known(b) - known(a) || a.rank - b.rank,
    );
    if (next === undefined) break;
    open.delete(next);
    order.push(next);
    for (const net of next.nets) placed.add(net);
    for (const cell of after.get(next) ?? []) waiting.set(cell, (waiting.get(cell) ?? 0) - 1);
  }
  // A part beside another, with no say in the flow, goes right of the one it shares most with.
  for (const cell of loose) {
    const shared = (other: Cell): number => [...other.nets].filter((net) => cell.nets.has(net)).length;
    const most = Math.max(0, ...order.map(shared));
    const beside = order.findLastIndex((other) => shared(other) === most);
    order.splice(beside + 1, 0, cell);
  }
  return order;
};
