import { cost } from './costs.ts';
import type { Field } from './field.ts';
import { tidied, type GridBox, type GridPoint, type Heading, type Polyline } from './grid.ts';
import { Heap } from './heap.ts';

/** One end of a wire to be routed. */
export interface Terminal {
  readonly at: GridPoint;
  /** The way its lead points; null for a joint, which has none. */
  readonly heading: Heading | null;
  /** What leaving it otherwise than along its lead costs. */
  readonly sideways: number;
}

export interface Search {
  readonly from: Terminal;
  readonly to: Terminal;
  /** Number of the wire's net. */
  readonly net: number;
  /** A box that holds all lines that the net has on the field already, which cost less to follow; null for none. */
  readonly lines: GridBox | null;
  /** How far beyond the box round both ends to look, grid units. */
  readonly beyond: number;
  /** Let other nets' lines be run over at a high price, to learn which of them stand in the way. */
  readonly trespassing?: boolean;
}

/** Work arrays of a search, one entry a state. */
interface Scratch {
  /** Cheapest cost known to a state (4·point + heading), valid where `seen` holds the present round. */
  reached: Int32Array;
  seen: Int32Array;
  /** State from which it was reached; −1 at the start. */
  before: Int32Array;
  /** Number of the search under way: no two searches have the same. */
  round: number;
  readonly heap: Heap;
}

/**
 * One set of work arrays for all searches: a search runs from its start to its end at once, and what an earlier one
 * left is known by its round. Routing again in every frame of a drag then allocates none.
 */
const scratch: Scratch = {
  reached: new Int32Array(0),
  seen: new Int32Array(0),
  before: new Int32Array(0),
  round: 0,
  heap: new Heap(),
};

/** Makes room for a field, and begins a new round. */
const beginRound = (states: number): void => {
  if (scratch.seen.length < states) {
    scratch.reached = new Int32Array(states);
    scratch.seen = new Int32Array(states);
    scratch.before = new Int32Array(states);
    scratch.round = 0;
  }
  if (scratch.round === 0x7fffffff) {
    scratch.seen.fill(0);
    scratch.round = 0;
  }
  scratch.round++;
  scratch.heap.clear();
};

/**
 * Finds cheapest routes on a field.
 *
 * Shortest path on the grid (Lee, 'An Algorithm for Path Connections and Its Applications', IRE Trans. Electronic
 * Computers EC-10, 1961), led by a lower bound (Hart, Nilsson and Raphael, 'A Formal Basis for the Heuristic
 * Determination of Minimum Cost Paths', IEEE Trans. SSC-4, 1968), over states of point and heading so that bends
 * have a price. Where the net has lines at one end already, the search sets out from all of them at once, so that a
 * long trunk is not searched again for each wire on it.
 */
export class PathFinder {
  private readonly field: Field;
  /** States looked at so far, in all searches: the same on every machine, unlike time. */
  effort = 0;

  // ---- the search under way ----
  private own = 0;
  private goal = -1;
  private goalX = 0;
  private goalY = 0;
  private headingIn: Heading | null = null;
  private sidewaysIn = 0;
  private trespassing = false;
  /** Columns and rows of the field to look at. */
  private lowX = 0;
  private highX = 0;
  private lowY = 0;
  private highY = 0;
  /** The box of the net's lines where they may be met on the way, else null. Columns and rows. */
  private met: GridBox | null = null;
  private goalToMet = 0;

  constructor(field: Field) {
    this.field = field;
  }

  /** The route with both ends; null where there is none within reach. */
  find(search: Search): Polyline | null {
    const { field } = this;
    const start = field.at(search.from.at[0], search.from.at[1]);
    const goal = field.at(search.to.at[0], search.to.at[1]);
    if (start < 0 || goal < 0) return null;
    if (start === goal) return [search.from.at, search.to.at];
    this.own = search.net + 1;
    const hasLines = search.lines !== null;
    if (hasLines && !this.isOnOwnLine(start) && this.isOnOwnLine(goal)) {
      const back = this.search({ ...search, from: search.to, to: search.from }, goal, start, true);
      return back === null ? null : [...back].reverse();
    }
    return this.search(search, start, goal, hasLines && this.isOnOwnLine(start));
  }

  private search(search: Search, start: number, goal: number, fromLines: boolean): Polyline | null {
    this.prepare(search, goal, fromLines);
    const { reached, before, heap } = scratch;
    const { heading: lead, sideways } = search.from;
    const along: number[] = [];
    for (let heading = 0; heading < 4; heading++) {
      const aside = lead !== null && lead !== heading ? sideways : 0;
      const entered = this.advance(start, -1, heading, aside, false);
      if (entered >= 0 && fromLines) along.push(entered);
    }
    // Along the net's own lines first, as far as they go.
    for (const state of along) {
      for (let turn = 0; turn < 3; turn++) {
        const entered = this.turnFrom(state, reached[state] ?? 0, turn, true);
        if (entered >= 0) along.push(entered);
      }
    }
    while (heap.size > 0) {
      const state = heap.pop();
      const spent = heap.poppedTag;
      this.effort++;
      if (spent !== reached[state]) continue;
      if (state >> 2 === goal) return this.traced(state, before, search.from.at);
      for (let turn = 0; turn < 3; turn++) this.turnFrom(state, spent, turn, false);
    }
    return null;
  }

  private prepare(
    { from, to, net, lines, beyond, trespassing }: Search,
    goal: number,
    fromLines: boolean,
  ): void {
    const { left, top, width, height } = this.field;
    this.own = net + 1;
    this.goal = goal;
    this.goalX = to.at[0] - left;
    this.goalY = to.at[1] - top;
    this.headingIn = to.heading;
    this.sidewaysIn = to.sideways;
    this.trespassing = trespassing ?? false;
    const [fromX, fromY] = [from.at[0] - left, from.at[1] - top];
    this.lowX = Math.max(0, Math.min(fromX, this.goalX) - beyond);
    this.highX = Math.min(width - 1, Math.max(fromX, this.goalX) + beyond);
    this.lowY = Math.max(0, Math.min(fromY, this.goalY) - beyond);
    this.highY = Math.min(height - 1, Math.max(fromY, this.goalY) + beyond);
    this.met =
      lines === null || fromLines
        ? null
        : {
            left: lines.left - left,
            right: lines.right - left,
            top: lines.top - top,
            bottom: lines.bottom - top,
          };
    this.goalToMet = this.toMet(this.goalX, this.goalY);
    beginRound(width * height * 4);
  }

  /** Steps on from a state: straight (0), or after a turn to the right (1) or left (2). The state entered, or −1. */
  private turnFrom(state: number, spent: number, turn: number, ownOnly: boolean): number {
    const heading = turn === 0 ? state & 3 : ((state & 3) + (turn === 1 ? 1 : 3)) & 3;
    return this.advance(state >> 2, state, heading, spent + (turn === 0 ? 0 : cost.bend), ownOnly);
  }

  /** One step from a point along a heading: the state entered, −1 where that is not allowed or known to be dearer. */
  private advance(point: number, state: number, heading: number, spent: number, ownOnly: boolean): number {
    const { field, own } = this;
    const { width, across, down } = field;
    const x = (point % width) + (heading === 0 ? 1 : heading === 2 ? -1 : 0);
    const y = Math.floor(point / width) + (heading === 1 ? 1 : heading === 3 ? -1 : 0);
    if (x < this.lowX || x > this.highX || y < this.lowY || y > this.highY) return -1;
    const next = y * width + x;
    const level = heading === 0 || heading === 2;
    const lines = level ? across : down;
    const edge = heading === 0 || heading === 1 ? point : next;
    let price = spent;

    // ---- the line to the next point ----
    const there = lines[edge] ?? 0;
    if (there === own) price += cost.shared;
    else if (ownOnly) return -1;
    else if (there === 0) price += cost.step;
    else if (this.trespassing) price += cost.trespass;
    else return -1;
    const sideStep = level ? width : 1;
    const besideA = lines[edge - sideStep] ?? 0;
    const besideB = lines[edge + sideStep] ?? 0;
    if ((besideA !== 0 && besideA !== own) || (besideB !== 0 && besideB !== own)) price += cost.crowded;

    // ---- the next point ----
    if (next === this.goal) {
      // Arriving in line with the lead is arriving against its heading.
      if (this.headingIn !== null && this.headingIn !== (heading ^ 2)) price += this.sidewaysIn;
    } else {
      if (field.solid[next] === 1) return -1;
      const pin = field.pin[next] ?? 0;
      if (pin !== 0) {
        if (pin !== own) return -1;
        price += cost.overPin;
      }
      const crossings = level ? down : across;
      const crossA = crossings[next] ?? 0;
      const crossB = crossings[level ? next - width : next - 1] ?? 0;
      const foreignA = crossA !== 0 && crossA !== own;
      const foreignB = crossB !== 0 && crossB !== own;
      if (foreignA || foreignB) {
        // Straight over a straight line, whose own run on either side then leaves no room to turn upon it.
        if (crossA === crossB) price += cost.crossing;
        else if (this.trespassing) price += cost.trespass;
        else return -1;
      }
      price += field.toll[next] ?? 0;
    }

    const entered = next * 4 + heading;
    const { reached, seen, before, round, heap } = scratch;
    if (seen[entered] === round && (reached[entered] ?? 0) <= price) return -1;
    seen[entered] = round;
    reached[entered] = price;
    before[entered] = state;
    heap.push(price + this.bound(x, y), entered, price);
    return entered;
  }

  /** What the rest of the way costs at least. */
  private bound(x: number, y: number): number {
    const distanceX = Math.abs(this.goalX - x);
    const distanceY = Math.abs(this.goalY - y);
    const distance = distanceX + distanceY;
    const bend = distanceX > 0 && distanceY > 0 ? cost.bend : 0;
    if (this.met === null) return distance * cost.step + bend;
    // Either all of it is new line, or at least what lies outside the box of the net's own lines is.
    const outside = this.toMet(x, y) + this.goalToMet;
    const inside = Math.max(0, distance - outside);
    return Math.min(distance * cost.step, outside * cost.step + inside * cost.shared) + bend;
  }

  private toMet(x: number, y: number): number {
    const { met } = this;
    if (met === null) return 0;
    return Math.max(met.left - x, 0, x - met.right) + Math.max(met.top - y, 0, y - met.bottom);
  }

  private isOnOwnLine(point: number): boolean {
    const { across, down, width } = this.field;
    const { own } = this;
    return (
      across[point] === own || across[point - 1] === own || down[point] === own || down[point - width] === own
    );
  }

  private traced(last: number, before: Int32Array, from: GridPoint): Polyline {
    const points: GridPoint[] = [];
    for (let state = last; state >= 0; state = before[state] ?? -1)
      points.push(this.field.pointAt(state >> 2));
    points.push(from);
    return tidied(points.reverse());
  }
}
