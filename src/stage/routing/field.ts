import { cost } from './costs.ts';
import { headingBetween, pointsAlong, type GridBox, type GridPoint, type Polyline } from './grid.ts';
import { letteringOf } from './lettering.ts';
import { reachOf, type StandingPart } from './shape.ts';

/** Room left round everything, so that a wire can go round the outermost part. */
const margin = 6;

/** A line keeps this far from a body's outline at least, grid units: nearer, the two would read as one. */
const clearance = 0.4;

/** A pin that no wire ends on, or where pins of two nets lie on one another: nothing may pass. */
const nobody = -1;

/**
 * The sheet as seen by the search for a route: one entry a grid point, row by row.
 *
 * Nets are written as their number plus one, so that 0 stands for none. `across[v]` is the net whose line runs from
 * point v to the point right of it, `down[v]` from v to the point below.
 */
export class Field {
  readonly left: number;
  readonly top: number;
  readonly width: number;
  readonly height: number;
  /** 1 where a body or a lead lies. */
  readonly solid: Uint8Array;
  /** The net of the pin or joint at a point, `nobody` where none may pass. */
  readonly pin: Int32Array;
  /** What stepping on a point costs beside its length. */
  readonly toll: Uint8Array;
  readonly across: Int32Array;
  readonly down: Int32Array;

  constructor(bounds: GridBox) {
    this.left = Math.floor(bounds.left) - margin;
    this.top = Math.floor(bounds.top) - margin;
    this.width = Math.ceil(bounds.right) + margin - this.left + 1;
    this.height = Math.ceil(bounds.bottom) + margin - this.top + 1;
    const size = this.width * this.height;
    this.solid = new Uint8Array(size);
    this.pin = new Int32Array(size);
    this.toll = new Uint8Array(size);
    this.across = new Int32Array(size);
    this.down = new Int32Array(size);
  }

  /** Index of a grid point; −1 off the field. */
  at(x: number, y: number): number {
    const column = x - this.left;
    const row = y - this.top;
    if (column < 0 || row < 0 || column >= this.width || row >= this.height) return -1;
    return row * this.width + column;
  }

  pointAt(index: number): GridPoint {
    return [this.left + (index % this.width), this.top + Math.floor(index / this.width)];
  }

  /** Stands a part on the field: nothing passes its body and leads, and passing close by or over its text is dear. */
  addPart(part: StandingPart): void {
    for (const box of letteringOf(part)) this.addToll(box, cost.lettering);
    const { body } = part;
    this.addToll(grown(reachOf(part), 1), cost.beside);
    // A pin at the very edge of a body (a rail's, a tag's) leaves that edge free, so that a trunk can run through it.
    const pins = [...part.pins.values()].filter((pin) => pin.drawn);
    const open = (side: 'left' | 'right' | 'top' | 'bottom'): boolean =>
      pins.some(({ at }) => at[side === 'left' || side === 'right' ? 0 : 1] === body[side]);
    const firstX = open('left') ? Math.floor(body.left) + 1 : Math.ceil(body.left - clearance);
    const lastX = open('right') ? Math.ceil(body.right) - 1 : Math.floor(body.right + clearance);
    const firstY = open('top') ? Math.floor(body.top) + 1 : Math.ceil(body.top - clearance);
    const lastY = open('bottom') ? Math.ceil(body.bottom) - 1 : Math.floor(body.bottom + clearance);
    for (let y = firstY; y <= lastY; y++) for (let x = firstX; x <= lastX; x++) this.setSolid(x, y);
    for (const { at } of pins) {
      const [x, y] = at;
      const nearX = Math.min(Math.max(x, body.left), body.right);
      const nearY = Math.min(Math.max(y, body.top), body.bottom);
      // Leads run level or upright; the point of the pin itself is the pin's.
      for (
        let step = Math.sign(nearX - x);
        step !== 0 && Math.abs(step) <= Math.abs(nearX - x);
        step += Math.sign(step)
      )
        this.setSolid(x + step, y);
      for (
        let step = Math.sign(nearY - y);
        step !== 0 && Math.abs(step) <= Math.abs(nearY - y);
        step += Math.sign(step)
      )
        this.setSolid(x, y + step);
    }
  }

  /** Marks a pin or joint of a net; without a net, a pin that nothing may touch. */
  addPin([x, y]: GridPoint, net: number | undefined): void {
    const index = this.at(x, y);
    if (index < 0) return;
    const mark = net === undefined ? nobody : net + 1;
    const there = this.pin[index] ?? 0;
    this.pin[index] = there === 0 || there === mark ? mark : nobody;
  }

  /** Writes a net's line into the field; `net` −1 wipes it. */
  draw(line: Polyline, net: number): void {
    for (let index = 1; index < line.length; index++) {
      const from = line[index - 1];
      const to = line[index];
      if (from === undefined || to === undefined) continue;
      const heading = headingBetween(from, to);
      if (heading === null) continue;
      const level = heading === 0 || heading === 2;
      const lines = level ? this.across : this.down;
      const step = level ? 1 : this.width;
      const [low, high] = heading < 2 ? [from, to] : [to, from];
      const end = this.at(high[0], high[1]);
      for (let at = this.at(low[0], low[1]); at < end; at += step) lines[at] = net + 1;
    }
  }

  /** Numbers of the other nets whose lines a line crosses or runs along, once for each point at which it does. */
  foreignAlong(line: Polyline, net: number): number[] {
    const found: number[] = [];
    const note = (mark: number | undefined): void => {
      if (mark !== undefined && mark > 0 && mark !== net + 1) found.push(mark - 1);
    };
    for (const [x, y] of pointsAlong(line)) {
      const index = this.at(x, y);
      if (index < 0) continue;
      const right = this.across[index];
      const below = this.down[index];
      const left = this.across[index - 1];
      const above = this.down[index - this.width];
      note(right);
      if (left !== right) note(left);
      note(below);
      if (above !== below) note(above);
    }
    return found;
  }

  private setSolid(x: number, y: number): void {
    const index = this.at(x, y);
    if (index >= 0) this.solid[index] = 1;
  }

  private addToll(box: GridBox, toll: number): void {
    const lastX = Math.floor(box.right);
    const lastY = Math.floor(box.bottom);
    for (let y = Math.ceil(box.top); y <= lastY; y++) {
      for (let x = Math.ceil(box.left); x <= lastX; x++) {
        const index = this.at(x, y);
        if (index >= 0) this.toll[index] = Math.min(255, (this.toll[index] ?? 0) + toll);
      }
    }
  }
}

const grown = ({ left, top, right, bottom }: GridBox, by: number): GridBox => ({
  left: left - by,
  top: top - by,
  right: right + by,
  bottom: bottom + by,
});
