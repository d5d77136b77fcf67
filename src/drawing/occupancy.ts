import type { Box } from '../../symbols/art.ts';
import { distance, overlap } from './boxes.ts';

export interface Occupant {
  readonly box: Box;
  /** Who takes the room: `part/p3`, `line/3`, `name/p3`, `chip/Q1.drain`. */
  readonly owner: string;
}

const cell = 64;
/** Columns are numbered this far apart, so that one number names a cell. */
const stride = 2 ** 20;
const none: readonly Occupant[] = [];

/** What room on the sheet is taken, kept by square cells so that asking is cheap. */
export class Occupancy {
  readonly #cells = new Map<number, Occupant[]>();
  readonly #owned = new Map<string, Occupant[]>();

  add(box: Box, owner: string): void {
    const occupant = { box, owner };
    for (const key of cellsOf(box)) {
      const list = this.#cells.get(key);
      if (list === undefined) this.#cells.set(key, [occupant]);
      else list.push(occupant);
    }
    const owned = this.#owned.get(owner);
    if (owned === undefined) this.#owned.set(owner, [occupant]);
    else owned.push(occupant);
  }

  /** The same room, to be filled on without touching this one. */
  copy(): Occupancy {
    const copy = new Occupancy();
    for (const [key, list] of this.#cells) copy.#cells.set(key, [...list]);
    for (const [owner, list] of this.#owned) copy.#owned.set(owner, [...list]);
    return copy;
  }

  remove(owner: string): void {
    for (const occupant of this.#owned.get(owner) ?? none) {
      for (const key of cellsOf(occupant.box)) {
        const list = this.#cells.get(key);
        if (list !== undefined) list.splice(list.indexOf(occupant), 1);
      }
    }
    this.#owned.delete(owner);
  }

  /** Everything that overlaps a box; an occupant may come more than once. */
  hits(box: Box): readonly Occupant[] {
    const found: Occupant[] = [];
    this.#some(box, (occupant) => {
      found.push(occupant);
      return false;
    });
    return found;
  }

  /** Whether nothing overlaps a box, apart from what `shares` allows. */
  isFree(box: Box, shares?: (owner: string) => boolean): boolean {
    return !this.#some(box, shares === undefined ? anyone : ({ owner }) => !shares(owner));
  }

  /** Room round a box, pixels, at most `reach`; 0 where it is not free. */
  clearance(box: Box, reach: number): number {
    const { left, top, right, bottom } = box;
    let least = reach;
    this.#some(
      { left: left - reach, top: top - reach, right: right + reach, bottom: bottom + reach },
      (occupant) => {
        least = Math.min(least, distance(occupant.box, box));
        return least === 0;
      },
    );
    return least;
  }

  /** Whether something holds of one of the occupants that overlap a box. */
  #some(box: Box, test: (occupant: Occupant) => boolean): boolean {
    const lastColumn = Math.floor(box.right / cell);
    const lastRow = Math.floor(box.bottom / cell);
    for (let column = Math.floor(box.left / cell); column <= lastColumn; column++) {
      for (let row = Math.floor(box.top / cell); row <= lastRow; row++) {
        for (const occupant of this.#cells.get(column * stride + row) ?? none) {
          if (overlap(occupant.box, box) && test(occupant)) return true;
        }
      }
    }
    return false;
  }
}

const anyone = (): boolean => true;

const cellsOf = ({ left, top, right, bottom }: Box): readonly number[] => {
  const cells: number[] = [];
  for (let column = Math.floor(left / cell); column <= Math.floor(right / cell); column++) {
    for (let row = Math.floor(top / cell); row <= Math.floor(bottom / cell); row++) {
      cells.push(column * stride + row);
    }
  }
  return cells;
};
