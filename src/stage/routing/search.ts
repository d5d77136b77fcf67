import { cost } from './costs.ts';
import type { Field } from './field.ts';
import { tidied, type GridPoint, type Heading, type Polyline } from './grid.ts';
import { Heap } from './heap.ts';

/** One end of a wire to be routed. */
export interface Terminal {
  readonly at: GridPoint;
  /** The way its lead points; null for a joint, which has none. */
  readonly heading: Heading | null;
}

export interface Search {
  readonly from: Terminal;
  readonly to: Terminal;
  /** Number of the wire's net. */
  readonly net: number;
  /** Whether the net has lines on the field already, which cost less to follow. */
  readonly hasLines: boolean;
  /** How far beyond the box round both ends to look, grid units. */
  readonly beyond: number;
  /** Let other nets' lines be run over at a high price, to learn which of them stand in the way. */
  readonly trespassing?: boolean;
}

/**
 * Finds cheapest routes on a field.
 *
 * Shortest path on the grid (Lee, 'An Algorithm for Path Connections and Its Applications', IRE Trans. Electronic
 * Computers EC-10, 1961), led by a lower bound (Hart, Nilsson and Raphael, 'A Formal Basis for the Heuristic
 * Determination of Minimum Cost Paths', IEEE Trans. SSC-4, 1968), over states of point and heading so that bends
 * have a price. Work arrays are kept between searches.
 */
export class PathFinder {
  private readonly field: Field;
  /** Cheapest cost known to a state (4·point + heading), valid where `seen` holds the present round. */
  private readonly reached: Int32Array;
  private readonly seen: Int32Array;
  /** State from which it was reached; −1 at the start. */
  private readonly before: Int32Array;
  private readonly heap = new Heap();
  private round = 0;

  constructor(field: Field) {
    this.field = field;
    const states = field.width * field.height * 4;
    this.reached = new Int32Array(states);
    this.seen = new Int32Array(states);
    this.before = new Int32Array(states);
  }

  /** The route with both ends; null where there is none within reach. */
  find(search: Search): Polyline | null {
    const { field } = this;
    const { from, to, beyond } = search;
    const start = field.at(from.at[0], from.at[1]);
    const goal = field.at(to.at[0], to.at[1]);
    if (start < 0 || goal < 0) return null;
    if (start === goal) return [from.at, to.at];

    // ---- the part of the field to look at, and the bound ----
    const { width, height } = field;
    const fromX = from.at[0] - field.left;
    const fromY = from.at[1] - field.top;
    const goalX = to.at[0] - field.left;
    const goalY = to.at[1] - field.top;
    const lowX = Math.max(0, Math.min(fromX, goalX) - beyond);
    const highX = Math.min(width - 1, Math.max(fromX, goalX) + beyond);
    const lowY = Math.max(0, Math.min(fromY, goalY) - beyond);
    const highY = Math.min(height - 1, Math.max(fromY, goalY) + beyond);
    const least = search.hasLines ? cost.shared : cost.step;
    const bound = (x: number, y: number): number => {
      const distanceX = Math.abs(goalX - x);
      const distanceY = Math.abs(goalY - y);
      return (distanceX + distanceY) * least + (distanceX > 0 && distanceY > 0 ? cost.bend : 0);
    };

    // ---- the search ----
    const { reached, seen, before, heap } = this;
    const round = ++this.round;
    heap.clear();
    const enter = (state: number, previous: number, spent: number, x: number, y: number): void => {
      if (seen[state] === round && (reached[state] ?? 0) <= spent) return;
      seen[state] = round;
      reached[state] = spent;
      before[state] = previous;
      heap.push(spent + bound(x, y), state, spent);
    };

    for (let heading = 0; heading < 4; heading++) {
      const aside = from.heading !== null && from.heading !== heading;
      this.advance(
        search,
        start,
        -1,
        heading,
        aside ? cost.sideways : 0,
        goal,
        lowX,
        highX,
        lowY,
        highY,
        enter,
      );
    }
    while (heap.size > 0) {
      const state = heap.pop();
      const spent = heap.poppedTag;
      if (spent !== reached[state]) continue;
      const point = state >> 2;
      const heading = state & 3;
      if (point === goal) return this.traced(state, from.at);
      // On another net's line there is no turning: that would look like a connection.
      const straightOnly = !search.trespassing && this.isCrossed(point, search.net + 1);
      for (let turn = 0; turn < 3; turn++) {
        if (turn > 0 && straightOnly) break;
        const next = turn === 0 ? heading : turn === 1 ? (heading + 1) & 3 : (heading + 3) & 3;
        const spentHere = spent + (turn === 0 ? 0 : cost.bend);
        this.advance(search, point, state, next, spentHere, goal, lowX, highX, lowY, highY, enter);
      }
    }
    return null;
  }

  /** One step from a point along a heading, entered where it is allowed. */
  private advance(
    search: Search,
    point: number,
    state: number,
    heading: number,
    spent: number,
    goal: number,
    lowX: number,
    highX: number,
    lowY: number,
    highY: number,
    enter: (state: number, previous: number, spent: number, x: number, y: number) => void,
  ): void {
    const { field } = this;
    const { width, across, down } = field;
    const x = (point % width) + (heading === 0 ? 1 : heading === 2 ? -1 : 0);
    const y = Math.floor(point / width) + (heading === 1 ? 1 : heading === 3 ? -1 : 0);
    if (x < lowX || x > highX || y < lowY || y > highY) return;
    const next = y * width + x;
    const own = search.net + 1;
    const level = heading === 0 || heading === 2;
    const lines = level ? across : down;
    const sideStep = level ? width : 1;
    const edge = heading === 0 || heading === 1 ? point : next;
    let price = spent;

    // ---- the line to the next point ----
    const there = lines[edge] ?? 0;
    if (there === own) price += cost.shared;
    else if (there === 0) price += cost.step;
    else if (search.trespassing) price += cost.trespass;
    else return;
    const besideA = lines[edge - sideStep] ?? 0;
    const besideB = lines[edge + sideStep] ?? 0;
    if ((besideA !== 0 && besideA !== own) || (besideB !== 0 && besideB !== own)) price += cost.crowded;

    // ---- the next point ----
    if (next === goal) {
      const headingIn = search.to.heading;
      // Arriving in line with the lead is arriving against its heading.
      if (headingIn !== null && headingIn !== (heading ^ 2)) price += cost.sideways;
    } else {
      if (field.solid[next] === 1) return;
      const pin = field.pin[next] ?? 0;
      if (pin !== 0) {
        if (pin !== own) return;
        price += cost.overPin;
      }
      const crossings = level ? down : across;
      const crossA = crossings[next] ?? 0;
      const crossB = crossings[level ? next - width : next - 1] ?? 0;
      const foreignA = crossA !== 0 && crossA !== own;
      const foreignB = crossB !== 0 && crossB !== own;
      if (foreignA || foreignB) {
        if (crossA === crossB) price += cost.crossing;
        else if (search.trespassing) price += cost.trespass;
        else return;
      }
      price += field.toll[next] ?? 0;
    }
    enter(next * 4 + heading, state, price, x, y);
  }

  /** Whether a line of another net touches a point. */
  private isCrossed(point: number, own: number): boolean {
    const { across, down, width } = this.field;
    const right = across[point] ?? 0;
    const left = across[point - 1] ?? 0;
    const below = down[point] ?? 0;
    const above = down[point - width] ?? 0;
    return (
      (right !== 0 && right !== own) ||
      (left !== 0 && left !== own) ||
      (below !== 0 && below !== own) ||
      (above !== 0 && above !== own)
    );
  }

  private traced(last: number, from: GridPoint): Polyline {
    const points: GridPoint[] = [];
    for (let state = last; state >= 0; state = this.before[state] ?? -1)
      points.push(this.field.pointAt(state >> 2));
    points.push(from);
    return tidied(points.reverse());
  }
}
