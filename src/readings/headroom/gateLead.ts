import { bracketedRoot } from './bracketedRoot.ts';

/** The stage settled again with a voltage in series with one gate lead. */
export interface GateLeadPoint {
  /** Distance to the limit, positive inside; NaN where the stage does not settle. */
  readonly margin: number;
  /** V; negative once the channel is off. */
  readonly overdrive: number;
}

/** V: beyond this no drive is looked for. */
const furthest = 1000;

/**
 * The voltage against the drive, in series with the gate lead, that brings a switch to its limit; negative where the
 * limit is passed already and more drive brings it back. Steps outward from nothing until the limit lies between two
 * steps, so that the point is followed as the drive is taken away.
 *
 * @param at settles the stage with a voltage (V) against the drive in the lead
 * @param now the point without one
 * @returns V, to 1e-10 of itself; null where no drive gets there
 */
export const gateLeadHeadroom = (
  at: (against: number) => GateLeadPoint,
  now: GateLeadPoint,
): number | null => {
  if (Number.isNaN(now.margin)) return null;
  if (now.margin === 0) return 0;
  const inside = now.margin > 0;
  const direction = inside ? 1 : -1;
  let step = Math.max(Math.abs(now.overdrive), 0.1) / 2;
  let last = { x: 0, y: now.margin };
  while (Math.abs(last.x) < furthest) {
    const x = last.x + direction * step;
    const point = at(x);
    if (Number.isNaN(point.margin)) return null;
    if (point.margin > 0 !== inside) {
      const tolerance = 1e-10 * Math.max(Math.abs(x), 1e-3);
      return bracketedRoot((against) => at(against).margin, last, { x, y: point.margin }, tolerance);
    }
    // Once the channel is off, taking more drive away changes nothing.
    if (inside && point.overdrive <= 0) return null;
    last = { x, y: point.margin };
    step *= 2;
  }
  return null;
};
