import type { Box } from '../../symbols/art.ts';
import { distance, overlap } from './boxes.ts';

export interface Occupant {
  readonly box: Box;
  /** Who takes the room: `part/p3`, `line/3`, `name/p3`, `chip/3`. */
  readonly owner: string;
}

const cell = 48;

/** What room on the sheet is taken, kept by square cells so that asking is cheap. */
export class Occupancy {
  readonly #cells = new Map<string, Occupant[]>();
  readonly #owned = new Map<string, Occupant[]>();

  add(box: Box, owner: string): void {
    const occupant = { box, owner };
    for (const key of keysOf(box)) {
      const list = this.#cells.get(key);
      if (list === undefined) this.#cells.set(key, [occupant]);
      else list.push(occupant);
    }
    const owned = this.#owned.get(owner);
    if (owned === undefined) this.#owned.set(owner, [occupant]);
    else owned.push(occupant);
  }

  remove(owner: string): void {
    for (const { box } of this.#owned.get(owner) ?? []) {
      for (const key of keysOf(box)) {
        const list = this.#cells.get(key);
        if (list !== undefined) {
          this.#cells.set(
            key,
            list.filter((occupant) => occupant.owner !== owner),
          );
        }
      }
    }
    this.#owned.delete(owner);
  }

  /** Everything that overlaps a box; an occupant may come more than once. */
  *hits(box: Box): Generator<Occupant> {
    for (const key of keysOf(box)) {
      for (const occupant of this.#cells.get(key) ?? []) if (overlap(occupant.box, box)) yield occupant;
    }
  }

  isFree(box: Box, besides?: (owner: string) => boolean): boolean {
    for (const { owner } of this.hits(box)) if (besides?.(owner) !== true) return false;
    return true;
  }

  /** Room round a box, pixels, at most `reach`; 0 where it is not free. */
  clearance(box: Box, reach: number): number {
    const wide = {
      left: box.left - reach,
      top: box.top - reach,
      right: box.right + reach,
      bottom: box.bottom + reach,
    };
    let least = reach;
    for (const occupant of this.hits(wide)) least = Math.min(least, distance(occupant.box, box));
    return least;
  }
}

const keysOf = function* ({ left, top, right, bottom }: Box): Generator<string> {
  for (let column = Math.floor(left / cell); column <= Math.floor(right / cell); column++) {
    for (let row = Math.floor(top / cell); row <= Math.floor(bottom / cell); row++) yield `${column},${row}`;
  }
};
