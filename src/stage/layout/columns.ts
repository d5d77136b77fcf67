/** Which parts stand upright, which lie, and which of the upright ones stand on one another in a column. */
import {
  blocksDirectCurrent,
  carryingPins,
  isSource,
  pinPointing,
  type Circuit,
  type Net,
  type Unit,
} from './circuit.ts';

/** An upright part: current comes in above and goes out below. A pin without a wire has no net. */
export interface Upright {
  readonly unit: Unit;
  readonly upperPin: string;
  readonly lowerPin: string;
  readonly upper: Net | undefined;
  readonly lower: Net | undefined;
}

/** A part between two nets side by side. Which of its pins is drawn left is settled when the order is. */
export interface Lying {
  readonly unit: Unit;
  readonly pins: readonly [string, string];
  readonly nets: readonly [Net | undefined, Net | undefined];
}

/** Parts one under the other, top to bottom, each sharing a net with the next. */
export type Column = readonly Upright[];

export interface Standing {
  readonly columns: readonly Column[];
  readonly lying: readonly Lying[];
  readonly blocks: readonly Unit[];
}

/** Two heights nearer than this are level: no current flows between them. */
const level = 1e-6;

export const standingOf = (
  units: readonly Unit[],
  heights: ReadonlyMap<Net, number>,
  signals: ReadonlySet<Unit>,
): Standing => {
  const uprights: Upright[] = [];
  const lying: Lying[] = [];
  const blocks: Unit[] = [];
  for (const unit of units) {
    if (unit.role === 'block') blocks.push(unit);
    const carrying = carryingPins(unit);
    if (carrying === undefined) continue;
    const [a, b] = carrying;
    const nets = [unit.nets.get(a), unit.nets.get(b)] as const;
    const up =
      unit.role === 'two-pin' ? upperOfTwo(unit, nets, heights, signals) : upperOfMany(unit, nets, heights);
    if (up === null) lying.push({ unit, pins: carrying, nets });
    else {
      const [upperPin, lowerPin] = up === 0 ? [a, b] : [b, a];
      uprights.push({ unit, upperPin, lowerPin, upper: nets[up], lower: nets[1 - up] });
    }
  }
  return { columns: columnsOf(uprights), lying, blocks };
};

type Pair = readonly [Net | undefined, Net | undefined];

const drop = ([a, b]: Pair, heights: ReadonlyMap<Net, number>): number =>
  a === undefined || b === undefined ? 0 : (heights.get(a) ?? 0) - (heights.get(b) ?? 0);

/** Index of the pin to be drawn up; null for a part that lies. */
const upperOfTwo = (
  unit: Unit,
  nets: Pair,
  heights: ReadonlyMap<Net, number>,
  signals: ReadonlySet<Unit>,
): 0 | 1 | null => {
  const [a, b] = nets;
  const byPower = upperByPower(nets);
  if (isSource(unit)) return byPower === null && drop(nets, heights) < -level ? 1 : 0;
  if (blocksDirectCurrent(unit)) return byPower;
  const carriesSignal = (net: Net | undefined): boolean =>
    net?.power === null && net.members.some((member) => signals.has(member.unit));
  const endsFree = a?.power == null && b?.power == null;
  if (endsFree && (carriesSignal(a) || carriesSignal(b))) return null;
  const fall = drop(nets, heights);
  if (fall > level) return 0;
  if (fall < -level) return 1;
  return byPower;
};

/** A transistor or a potentiometer always stands; where nothing says which end is up, as its symbol is drawn. */
const upperOfMany = (_unit: Unit, nets: Pair, heights: ReadonlyMap<Net, number>): 0 | 1 =>
  drop(nets, heights) < -level || (Math.abs(drop(nets, heights)) <= level && upperByPower(nets) === 1)
    ? 1
    : 0;

const upperByPower = ([a, b]: Pair): 0 | 1 | null => {
  if (a?.power === 'top' || b?.power === 'bottom') return 0;
  if (b?.power === 'top' || a?.power === 'bottom') return 1;
  return null;
};

// ---- columns ----

/** What goes on a column first where several parts could: channels before what they feed, capacitors last. */
const precedence = ({ unit }: Upright): number =>
  unit.role === 'stack'
    ? 0
    : unit.kind === 'resistor' || unit.kind === 'load' || unit.kind === 'current-source'
      ? 1
      : blocksDirectCurrent(unit)
        ? 3
        : 2;

const byPrecedence = (a: Upright, b: Upright): number =>
  precedence(a) - precedence(b) || a.unit.rank - b.unit.rank;

/**
 * Columns by growing the longest ones from the transistors up and down, then from what is left. A net on which two
 * alike transistors stand (the tail of a pair) ends both their columns: what follows stands between them.
 */
const columnsOf = (uprights: readonly Upright[]): Column[] => {
  const below = new Map<Net, Upright[]>();
  const above = new Map<Net, Upright[]>();
  const note = (map: Map<Net, Upright[]>, net: Net | undefined, upright: Upright): void => {
    if (net?.power !== null) return;
    map.set(net, [...(map.get(net) ?? []), upright]);
  };
  const ordered = [...uprights].sort(byPrecedence);
  for (const upright of ordered) {
    note(below, upright.upper, upright);
    note(above, upright.lower, upright);
  }
  const isFork = (list: readonly Upright[] | undefined): boolean =>
    (list?.filter(({ unit }) => unit.role === 'stack').length ?? 0) > 1;

  const used = new Set<Upright>();
  const columns: Column[] = [];
  for (const start of ordered) {
    if (used.has(start)) continue;
    used.add(start);
    const column = [start];
    const grow = (down: boolean): void => {
      for (;;) {
        const end = down ? column.at(-1) : column[0];
        const net = down ? end?.lower : end?.upper;
        if (net === undefined || isFork(below.get(net)) || isFork(above.get(net))) return;
        const next = (down ? below : above).get(net)?.find((upright) => !used.has(upright));
        if (next === undefined) return;
        used.add(next);
        if (down) column.push(next);
        else column.unshift(next);
      }
    };
    grow(false);
    grow(true);
    columns.push(column);
  }
  return columns;
};

/** The units of a circuit that hang together by wires, each group in the order of the document. */
export const groupsOf = (circuit: Circuit): readonly (readonly Unit[])[] => {
  const groups: Unit[][] = [];
  const seen = new Set<Unit>();
  for (const first of circuit.units) {
    if (seen.has(first)) continue;
    seen.add(first);
    const group = [first];
    for (const unit of group) {
      for (const net of unit.nets.values()) {
        for (const { unit: other } of net.members) {
          if (seen.has(other)) continue;
          seen.add(other);
          group.push(other);
        }
      }
    }
    groups.push(group.sort((a, b) => a.rank - b.rank));
  }
  return groups;
};

/** Whether the upper pin of an upright is the one its symbol has on top (or left, for a part that is drawn lying). */
export const standsAsDrawn = ({ unit, upperPin }: Upright): boolean =>
  pinPointing(unit, unit.role === 'stack' ? 3 : 2) === upperPin;
