/** Which nets are held at the top and at the bottom of the drawing, and which rails only carry a signal. */
import {
  blocksDirectCurrent,
  carryingPins,
  isListener,
  isSource,
  listeners,
  resistanceOf,
  voltageOf,
  type Circuit,
  type Net,
  type Unit,
} from './circuit.ts';

/** A resistor to a gate is a series gate resistor, not half of a divider, below this part of the one to ground. */
const seriesRatio = 0.2;

/**
 * Marks the nets of grounds, of supply rails and of batteries.
 *
 * A rail feeds, and belongs at the top, when current from it reaches a transistor's channel, a load or a divider. One
 * that only drives gates through series parts is a signal: it stands at the left, like a generator. Negative rails
 * go to the bottom. The units that carry a signal in are returned.
 */
export const markPower = (circuit: Circuit): ReadonlySet<Unit> => {
  for (const unit of circuit.units) {
    if (unit.role !== 'ground') continue;
    for (const net of unit.nets.values()) net.power = 'bottom';
  }
  // A block without inputs (the last stage of a logic circuit) is where a signal comes from.
  const signals = new Set(
    circuit.units.filter((unit) => unit.role === 'block' && listeners(unit).length === 0),
  );
  const rails = new Map<string, Unit[]>();
  for (const unit of circuit.units) {
    if (unit.role !== 'rail') continue;
    const label = unit.part.name ?? unit.id;
    rails.set(label, [...(rails.get(label) ?? []), unit]);
  }
  for (const group of rails.values()) {
    const level = group.map(voltageOf).find((voltage) => voltage !== undefined) ?? 0;
    const feeding = group.some((unit) => [...unit.nets.values()].some((net) => feeds(net, unit)));
    for (const unit of group) {
      if (!feeding) signals.add(unit);
      else for (const net of unit.nets.values()) net.power ??= level < 0 ? 'bottom' : 'top';
    }
  }
  // A source from ground to a net that feeds holds that net up as a rail does; so does one between two such.
  for (const unit of circuit.units) {
    if (!isSource(unit)) continue;
    const [plus, minus] = (carryingPins(unit) ?? []).map((pin) => unit.nets.get(pin));
    if (plus === undefined || minus === undefined) continue;
    if (minus.power === 'bottom' && plus.power === null) {
      if (feeds(plus, unit)) plus.power = 'top';
      else signals.add(unit);
    } else if (plus.power === 'bottom' && minus.power === null && feeds(minus, unit)) minus.power = 'bottom';
  }
  return signals;
};

/** Whether direct current out of a net does some work before it comes to a rail or ground. */
const feeds = (start: Net, source: Unit): boolean => {
  const seen = new Set<Net>([start]);
  const queue: Net[] = [start];
  let listens = false;
  let onlyBlocked = false;
  let others = false;
  for (const net of queue) {
    for (const member of net.members) {
      const { unit } = member;
      if (unit === source) continue;
      if (isListener(member)) {
        listens = true;
        continue;
      }
      if (unit.role === 'stack' || unit.role === 'block' || isWorking(unit)) return true;
      if (carryingPins(unit) === undefined || isSource(unit)) continue;
      if (blocksDirectCurrent(unit)) {
        onlyBlocked = true;
        continue;
      }
      if (isDivider(unit, net)) return true;
      others = true;
      // What lies beyond a gate's own net is the gate's business: a clamp, a pull-down.
      if (net !== start && net.members.some(isListener)) continue;
      for (const other of unit.nets.values()) {
        if (other === net || seen.has(other) || other.power !== null) continue;
        seen.add(other);
        queue.push(other);
      }
    }
  }
  return others && !listens && !onlyBlocked;
};

/** A part that is there to do something with the current. */
const isWorking = (unit: Unit): boolean =>
  unit.kind === 'load' || unit.kind === 'inductor' || unit.role === 'tapped';

/** Whether a unit that hangs on a net is the upper half of a divider: another of like size goes on to the bottom. */
const isDivider = (unit: Unit, net: Net): boolean => {
  for (const middle of unit.nets.values()) {
    if (middle === net) continue;
    for (const { unit: other } of middle.members) {
      if (other === unit || other.role !== 'two-pin' || blocksDirectCurrent(other) || isSource(other))
        continue;
      if (![...other.nets.values()].some((below) => below.power === 'bottom')) continue;
      const series = resistanceOf(unit) ?? 0;
      const down = resistanceOf(other) ?? 0;
      if (series > seriesRatio * down) return true;
    }
  }
  return false;
};
