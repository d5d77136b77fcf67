/**
 * Least distances between positions along one axis, x_j − x_i ≥ c, and where they leave each position room to be.
 *
 * A system of difference constraints is solved by longest paths from a common start (Bellman, 'On a Routing Problem',
 * Quarterly of Applied Mathematics 16, 1958); it has no solution exactly where a cycle of positive length appears.
 */
export class Constraints {
  private readonly from: number[] = [];
  private readonly to: number[] = [];
  private readonly least: number[] = [];
  /** Number of positions; number 0 is the fixed origin. */
  private count = 1;
  /** The lowest value of each position. Kept up to date by every constraint that is taken. */
  private lows = [0];

  /** A new position, at or beyond the origin. */
  add(): number {
    const index = this.count++;
    this.lows.push(0);
    return index;
  }

  /** Takes the constraint `to` − `from` ≥ `least` if all still fits together. */
  require(from: number, to: number, least: number): boolean {
    return this.takeAll([[from, to, least]]);
  }

  /** Takes `b` = `a` + `apart` if all still fits together. */
  equal(a: number, b: number, apart = 0): boolean {
    return this.takeAll([
      [a, b, apart],
      [b, a, -apart],
    ]);
  }

  fix(index: number, value: number): boolean {
    return this.equal(0, index, value);
  }

  low(index: number): number {
    return this.lows[index] ?? 0;
  }

  /** The highest value of each position where none may pass `limit`. */
  highs(limit: number): number[] {
    const highs = new Array<number>(this.count).fill(limit);
    highs[0] = 0;
    for (let pass = 0; pass <= this.count; pass++) {
      let changed = false;
      for (let arc = 0; arc < this.from.length; arc++) {
        const from = this.from[arc] ?? 0;
        const bound = (highs[this.to[arc] ?? 0] ?? 0) - (this.least[arc] ?? 0);
        if (from !== 0 && bound < (highs[from] ?? 0)) {
          highs[from] = bound;
          changed = true;
        }
      }
      if (!changed) break;
    }
    return highs;
  }

  /** The highest low value there is: how far the system reaches at least. */
  extent(): number {
    return Math.max(...this.lows);
  }

  private takeAll(arcs: readonly (readonly [number, number, number])[]): boolean {
    const before = this.lows;
    const length = this.from.length;
    for (const [from, to, least] of arcs) {
      this.from.push(from);
      this.to.push(to);
      this.least.push(least);
    }
    const lows = [...before];
    for (let pass = 0; pass <= this.count; pass++) {
      let changed = false;
      for (let arc = 0; arc < this.from.length; arc++) {
        const to = this.to[arc] ?? 0;
        const bound = (lows[this.from[arc] ?? 0] ?? 0) + (this.least[arc] ?? 0);
        if (bound > (lows[to] ?? 0)) {
          lows[to] = bound;
          changed = true;
        }
      }
      if ((lows[0] ?? 0) > 0) break;
      if (!changed) {
        this.lows = lows;
        return true;
      }
    }
    this.from.length = length;
    this.to.length = length;
    this.least.length = length;
    return false;
  }
}
