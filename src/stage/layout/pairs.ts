/**
 * Transistors that belong side by side: the two of a pair on one tail, those of a mirror on one gate line, and two that
 * steer each other.
 */
import { carryingPins, pinPointing, type Net, type Unit } from './circuit.ts';
import type { Cell } from './cells.ts';
import type { Upright } from './columns.ts';

export interface Twins {
  /** Stand in the same row. The gate of the second faces right for a pair, otherwise that of the first. */
  readonly first: Unit;
  readonly second: Unit;
  readonly form: 'pair' | 'mirror' | 'crossed';
  /** The net that the two of a pair share. */
  readonly tail: Net | undefined;
}

const gateOf = (unit: Unit): Net | undefined => unit.nets.get(pinPointing(unit, 2) ?? '');

const sharedEnd = (a: Upright, b: Upright): Net | undefined => {
  for (const [one, other] of [
    [a.lower, b.lower],
    [a.upper, b.upper],
  ] as const) {
    if (one !== undefined && one === other && one.power === null) return one;
  }
  return undefined;
};

/** Whether current passes two transistors in the same sense: both n or both p, as they stand. */
const alike = (a: Upright, b: Upright): boolean =>
  a.unit.kind === b.unit.kind &&
  pinPointing(a.unit, 3) === pinPointing(b.unit, 3) &&
  a.upperPin === b.upperPin;

export const twinsOf = (cells: readonly Cell[]): readonly Twins[] => {
  const stacks = cells.flatMap((cell) =>
    cell.column.filter(({ unit }) => unit.role === 'stack').map((upright) => ({ cell, upright })),
  );
  const taken = new Set<Unit>();
  const twins: Twins[] = [];
  for (const [index, a] of stacks.entries()) {
    for (const b of stacks.slice(index + 1)) {
      const [one, two] = [a.upright.unit, b.upright.unit];
      if (a.cell === b.cell || !alike(a.upright, b.upright) || taken.has(two)) continue;
      const gates = [gateOf(one), gateOf(two)];
      if (!taken.has(one) && carries(one, gates[1]) && carries(two, gates[0])) {
        taken.add(one).add(two);
        twins.push({ first: one, second: two, form: 'crossed', tail: undefined });
        continue;
      }
      const tail = sharedEnd(a.upright, b.upright);
      if (tail !== undefined && gates[0] !== gates[1] && !taken.has(one)) {
        taken.add(one).add(two);
        twins.push({ first: one, second: two, form: 'pair', tail });
      } else if (gates[0] !== undefined && gates[0] === gates[1] && gates[0].power === null) {
        // The one tied to its own gate leads.
        const leader = isTied(one) ? one : isTied(two) ? two : undefined;
        const follower = leader === one ? two : one;
        if (leader === undefined || taken.has(follower)) continue;
        taken.add(follower);
        twins.push({ first: leader, second: follower, form: 'mirror', tail: undefined });
      }
    }
  }
  return twins;
};

/** Whether a transistor's gate is wired to one of the pins between which it carries. */
const isTied = (unit: Unit): boolean => carries(unit, gateOf(unit));

const carries = (unit: Unit, net: Net | undefined): boolean =>
  net?.power === null && (carryingPins(unit) ?? []).some((pin) => unit.nets.get(pin) === net);
