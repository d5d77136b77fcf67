/**
 * Least distances between positions along one axis, x_j − x_i ≥ c, and where they leave each position room to be.
 *
 * A system of difference constraints is solved by longest paths from a common start (Bellman, 'On a Routing Problem',
 * Quarterly of Applied Mathematics 16, 1958); it has no solution exactly where a cycle of positive length appears.
 * Lows and highs are kept up to date as constraints are taken: only what changes is looked at again.
 */
export class Constraints {
  /** For each position the arcs that leave it: to which, and how far beyond at least. */
  private readonly onward: Arc[][] = [[]];
  /** For each position the arcs that come to it. */
  private readonly back: Arc[][] = [[]];
  private lows = [0];
  private highs: number[] | null = null;

  /** A new position, at or beyond the origin, which is number 0. */
  add(): number {
    this.onward.push([]);
    this.back.push([]);
    return this.lows.push(0) - 1;
  }

  /** Takes the constraint `to` − `from` ≥ `least` if all still fits together. */
  require(from: number, to: number, least: number): boolean {
    return this.takeAll([{ from, to, least }]);
  }

  /** Takes `b` = `a` + `apart` if all still fits together. */
  equal(a: number, b: number, apart = 0): boolean {
    return this.takeAll([
      { from: a, to: b, least: apart },
      { from: b, to: a, least: -apart },
    ]);
  }

  fix(index: number, value: number): boolean {
    return this.equal(0, index, value);
  }

  /** How far the system reaches at least. */
  extent(): number {
    return Math.max(...this.lows);
  }

  low(index: number): number {
    return this.lows[index] ?? 0;
  }

  /** The highest value of a position where none passes the limit; without a limit set, infinite. */
  high(index: number): number {
    return this.highs?.[index] ?? Infinity;
  }

  /** From now on no position passes `limit`, which must be the extent at least. */
  limit(limit: number): void {
    const highs = this.lows.map((_, index) => (index === 0 ? 0 : limit));
    this.highs = highs;
    settle(
      this.back,
      highs,
      [...highs.keys()],
      (arc) => arc.from,
      (value, arc) => value - arc.least,
      (a, b) => a < b,
    );
  }

  private takeAll(arcs: readonly Arc[]): boolean {
    for (const arc of arcs) {
      this.onward[arc.from]?.push(arc);
      this.back[arc.to]?.push(arc);
    }
    const lows = [...this.lows];
    const changed = arcs.map(({ from }) => from);
    const fits = settle(
      this.onward,
      lows,
      changed,
      (arc) => arc.to,
      (value, arc) => value + arc.least,
      (a, b) => a > b,
    );
    const highs = this.highs === null ? null : [...this.highs];
    const fitsBelow =
      highs === null ||
      settle(
        this.back,
        highs,
        arcs.map(({ to }) => to),
        (arc) => arc.from,
        (value, arc) => value - arc.least,
        (a, b) => a < b,
      );
    if (fits && fitsBelow) {
      this.lows = lows;
      this.highs = highs;
      return true;
    }
    for (const arc of arcs) {
      this.onward[arc.from]?.pop();
      this.back[arc.to]?.pop();
    }
    return false;
  }
}

interface Arc {
  readonly from: number;
  readonly to: number;
  readonly least: number;
}

/** Carries changed values along the arcs until nothing changes; false where that never ends or moves the origin. */
const settle = (
  arcsOf: readonly (readonly Arc[])[],
  values: number[],
  changed: readonly number[],
  next: (arc: Arc) => number,
  carried: (value: number, arc: Arc) => number,
  beats: (a: number, b: number) => boolean,
): boolean => {
  const times = new Uint32Array(values.length);
  const queue = [...changed];
  for (const index of queue) {
    for (const arc of arcsOf[index] ?? []) {
      const to = next(arc);
      const bound = carried(values[index] ?? 0, arc);
      if (!beats(bound, values[to] ?? 0)) continue;
      // The longest path without a ring visits each position once.
      const visits = (times[to] ?? 0) + 1;
      if (to === 0 || visits > values.length) return false;
      times[to] = visits;
      values[to] = bound;
      queue.push(to);
    }
  }
  return true;
};
