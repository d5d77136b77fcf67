/** How high everything stands: the level of each net and the middle of each part, by least distances and wishes. */
import type { Cell } from './cells.ts';
import { listeners, pinPointing, type Net, type Unit } from './circuit.ts';
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
  lowered: ReadonlyMap<Unit, number> = new Map(),
): Rows => {
  const system = new Constraints();
  const levels = new Map<Net, number>();
  const middles = new Map<Unit, number>();
  const levelOf = (net: Net): number => entered(levels, net, system);
  const middleOf = (unit: Unit): number => entered(middles, unit, system);

  // ---- what must be ----
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
  // Without a net that joins two parts of a column above and below, nothing above would keep a lone part off the top.
  for (const { units } of cells) for (const unit of units) system.require(0, middleOf(unit), spacing.half);

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
  for (const { form, units, lying } of cells) {
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
    for (const net of lying?.nets ?? []) {
      if (lying !== undefined && net?.power === null) system.equal(middleOf(lying.unit), levelOf(net));
    }
  }

  // ---- what stays open, the tightest first ----
  const limit = system.extent();
  const rowsUsed: number[] = [];
  const settle = (index: number, wish: (low: number, high: number) => number): number => {
    const low = system.low(index);
    const high = Math.max(low, system.highs(limit)[index] ?? low);
    const value = Math.min(Math.max(wish(low, high), low), high);
    system.fix(index, value);
    return value;
  };
  const slack = (unit: Unit): number => {
    const index = middleOf(unit);
    return (system.highs(limit)[index] ?? 0) - system.low(index);
  };
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

/** Whether a power net holds one part and its rail alone, so that the rail can come down to the part. */
const isPrivate = (net: Net): boolean => net.members.filter(({ unit }) => unit.role !== 'rail').length <= 1;
