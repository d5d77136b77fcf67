/** How high everything stands: the level of each net and the middle of each part, by least distances and wishes. */
import type { Cell } from './cells.ts';
import { isListener, listeners, pinPointing, type Net, type Unit } from './circuit.ts';
import { Constraints } from './constraints.ts';
import type { Twins } from './pairs.ts';
import { spacing } from './spacing.ts';

export interface Rows {
  readonly levels: ReadonlyMap<Net, number>;
  readonly middles: ReadonlyMap<Unit, number>;
}

/** A part is lined up with one that stands already when that moves it no farther than this. */
const lineUp = 8;

/** `lowered` gives transistors that are to hang so much lower than they need. */
export const rowsOf = (
  cells: readonly Cell[],
  twins: readonly Twins[],
  leftPin: ReadonlyMap<Unit, 0 | 1>,
  lowered: ReadonlyMap<Unit, number> = new Map(),
): Rows => {
  const system = new Constraints();
  const levels = new Map<Net, number>();
  const middles = new Map<Unit, number>();
  const levelOf = (net: Net): number => entered(levels, net, system);
  const middleOf = (unit: Unit): number => entered(middles, unit, system);

  // ---- what must be ----
  for (const { units, column } of cells) {
    for (const unit of units) system.require(0, middleOf(unit), spacing.half);
    // Said apart from the nets between them, which say nothing for a part with both pins on one net.
    for (const [index, { unit }] of column.entries()) {
      const next = column[index + 1];
      if (next !== undefined)
        system.require(middleOf(unit), middleOf(next.unit), 2 * spacing.half + spacing.power);
    }
  }
  for (const { column } of cells) {
    for (const { unit, upper, lower } of column) {
      const middle = middleOf(unit);
      if (upper !== undefined) {
        const above = unit.role === 'stack' ? spacing.aboveStack : spacing.abovePin;
        const gap = upper.power === null ? above : spacing.power;
        system.require(levelOf(upper), middle, spacing.half + gap + (lowered.get(unit) ?? 0));
      }
      if (lower !== undefined) {
        const gap = lower.power === null ? spacing.belowPin : spacing.power;
        system.require(middle, levelOf(lower), spacing.half + gap);
      }
    }
  }

  // ---- what should be ----
  for (const { first, second } of twins) system.equal(middleOf(first), middleOf(second));
  for (const { column } of cells) {
    for (const { unit, upper, lower } of column) {
      const gate = unit.nets.get(pinPointing(unit, 2) ?? '');
      const steers = unit.role === 'stack' && gate?.power === null;
      if (steers && gate !== upper && gate !== lower) system.equal(levelOf(gate), middleOf(unit));
      const tap = unit.role === 'tapped' ? unit.nets.get(pinPointing(unit, 1) ?? '') : undefined;
      if (tap?.power === null) system.equal(levelOf(tap), middleOf(unit));
    }
  }
  const couplings = cells.flatMap(({ lying }) => {
    if (lying === undefined) return [];
    const [a, b] = lying.nets;
    const [from, to] = leftPin.get(lying.unit) === 1 ? [b, a] : [a, b];
    return [{ unit: lying.unit, from, to, driver: stackOn(from, false), listener: stackOn(to, true) }];
  });
  // Stages that a part couples stand side by side, not as stairs.
  for (const { driver, listener } of couplings) {
    if (driver !== undefined && listener !== undefined) system.equal(middleOf(driver), middleOf(listener));
  }
  for (const { unit, from, to, driver } of couplings) {
    // Level with the net that drives it; what it drives comes to it.
    for (const net of driver === undefined ? [to, from] : [from, to]) {
      if (net?.power === null) system.equal(middleOf(unit), levelOf(net));
    }
  }
  for (const { form, units } of cells) {
    for (const unit of units) {
      if (form === 'block') {
        for (const [pin, net] of unit.nets) {
          if (net.power !== null) continue;
          const offset = unit.art.pins[pin]?.[1] ?? 0;
          if (unit.headings.get(pin) === 0 || listeners(unit).includes(pin)) {
            system.equal(middleOf(unit), levelOf(net), offset);
          }
        }
      }
      if (form === 'symbol') for (const net of unit.nets.values()) system.equal(middleOf(unit), levelOf(net));
    }
  }

  // ---- what stays open, the tightest first ----
  system.limit(system.extent());
  const rowsUsed: number[] = [];
  const settle = (index: number, wish: (low: number, high: number) => number): number => {
    const low = system.low(index);
    const high = Math.max(low, system.high(index));
    const value = Math.min(Math.max(wish(low, high), low), high);
    system.fix(index, value);
    return value;
  };
  const slack = (unit: Unit): number => system.high(middleOf(unit)) - system.low(middleOf(unit));
  const uprights = cells
    .flatMap(({ column }) => column)
    .map((upright) => ({ upright, slack: slack(upright.unit) }));
  const tightest = (a: (typeof uprights)[number], b: (typeof uprights)[number]): number =>
    a.slack - b.slack || a.upright.unit.rank - b.upright.unit.rank;
  for (const { upright } of uprights
    .filter(({ upright: { unit } }) => unit.role === 'stack')
    .sort(tightest)) {
    settle(middleOf(upright.unit), (low) => low);
  }
  for (const { upright } of uprights
    .filter(({ upright: { unit } }) => unit.role !== 'stack')
    .sort(tightest)) {
    const { unit, upper, lower } = upright;
    const hangsFromOwnRail = upper?.power === 'top' && isPrivate(upper) && lower?.power === null;
    const row = settle(middleOf(unit), (low, high) => {
      const wish = hangsFromOwnRail ? high : low;
      const near = rowsUsed
        .filter((used) => used >= low && used <= high && Math.abs(used - wish) <= lineUp)
        .sort((a, b) => Math.abs(a - wish) - Math.abs(b - wish))[0];
      return near ?? wish;
    });
    rowsUsed.push(row);
  }
  for (const [net, index] of levels) settle(index, (low, high) => (net.power === 'top' ? high : low));
  for (const index of middles.values()) settle(index, (low) => low);

  const valued = <Key>(map: ReadonlyMap<Key, number>): Map<Key, number> =>
    new Map([...map].map(([key, index]) => [key, system.low(index)]));
  return { levels: valued(levels), middles: valued(middles) };
};

const entered = <Key>(map: Map<Key, number>, key: Key, system: Constraints): number => {
  const known = map.get(key);
  if (known !== undefined) return known;
  const index = system.add();
  map.set(key, index);
  return index;
};

/** The first transistor that listens to a net, or that carries it. */
const stackOn = (net: Net | undefined, listening: boolean): Unit | undefined =>
  net?.power === null
    ? net.members.find((member) => member.unit.role === 'stack' && isListener(member) === listening)?.unit
    : undefined;

/** Whether a power net holds one part and its rail alone, so that the rail can come down to the part. */
const isPrivate = (net: Net): boolean => net.members.filter(({ unit }) => unit.role !== 'rail').length <= 1;
