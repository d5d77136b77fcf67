/** What a pointer does on the sheet: choose, frame, move, pan, pinch. One gesture at a time; Escape gives it up. */
import { unit } from '../../symbols/pen.ts';
import type { Desk } from '../desk/desk.ts';
import type { GridPoint } from '../stage/schema/stage.ts';
import { moveChosen, movedPreview } from './commands.ts';
import { hitTest, within, type Hit } from './hitTest.ts';
import type { SheetPicture } from './picture.ts';
import type { SheetView } from './view.ts';
import type { Point } from './viewport.ts';

/** A pointer's event with its place in the sheet's own box. */
export interface Touch {
  readonly id: number;
  readonly at: Point;
  readonly button: number;
  readonly shift: boolean;
  /** Whether it is a finger: one on the bare sheet pans it, since a finger has no other way. */
  readonly finger: boolean;
}

type Gesture =
  | { readonly what: 'pan' }
  | { readonly what: 'pinch' }
  | { readonly what: 'frame'; readonly from: Point; readonly before: ReadonlySet<string> }
  | { readonly what: 'move'; readonly from: Point; readonly hit: Hit; by: GridPoint | null };

/** How far a pointer may tremble and still click, pixels of the screen. */
const trembling = 4;
/** How far beside a thing a pointer finds it, pixels of the screen. */
const reach = 5;
const fingersReach = 12;

export class Gestures {
  readonly #desk: Desk;
  readonly #picture: SheetPicture;
  readonly #view: SheetView;
  readonly #down = new Map<number, Point>();
  #gesture: Gesture | null = null;
  #spaceHeld = false;

  constructor(desk: Desk, picture: SheetPicture, view: SheetView) {
    this.#desk = desk;
    this.#picture = picture;
    this.#view = view;
  }

  /** While the space bar is held any drag pans. */
  holdSpace(held: boolean): void {
    this.#spaceHeld = held;
  }

  press(touch: Touch): void {
    this.#down.set(touch.id, touch.at);
    if (this.#down.size > 1) {
      this.cancel();
      this.#gesture = { what: 'pinch' };
      return;
    }
    this.#gesture = this.#begin(touch);
  }

  move({ id, at }: Touch): void {
    const before = this.#down.get(id);
    if (before === undefined) return;
    this.#down.set(id, at);
    const gesture = this.#gesture;
    switch (gesture?.what) {
      case 'pan':
        this.#view.pan([at[0] - before[0], at[1] - before[1]]);
        return;
      case 'pinch':
        this.#pinch(id, before, at);
        return;
      case 'frame':
        this.#frame(gesture.from, at, gesture.before);
        return;
      case 'move':
        this.#drag(gesture, at);
        return;
      case undefined:
        return;
    }
  }

  release({ id, shift }: Touch): void {
    this.#down.delete(id);
    const gesture = this.#gesture;
    this.#gesture = null;
    if (gesture?.what === 'frame') this.#view.drawFrame(null);
    if (gesture?.what !== 'move') return;
    const { by, hit } = gesture;
    if (by === null) {
      if (hit.what === 'value' && !shift) this.#view.openStrip(hit.part);
      return;
    }
    this.#picture.preview(null);
    moveChosen(this.#desk, by);
  }

  /** @returns whether there was a gesture to give up */
  cancel(): boolean {
    const gesture = this.#gesture;
    this.#gesture = null;
    if (gesture?.what === 'move') this.#picture.preview(null);
    if (gesture?.what === 'frame') {
      this.#view.drawFrame(null);
      this.#desk.select(gesture.before);
    }
    return gesture !== null;
  }

  /** A pointer that the system took away. */
  lose(id: number): void {
    this.#down.delete(id);
    this.cancel();
  }

  #begin({ at, button, shift, finger }: Touch): Gesture | null {
    if (button === 1 || (button === 0 && this.#spaceHeld)) return { what: 'pan' };
    if (button !== 0) return null;
    const { scale } = this.#view.viewport;
    const beside = (finger ? fingersReach : reach) / scale;
    const hit = hitTest(this.#picture.prepared, this.#view.toSheet(at), beside);
    const { selection } = this.#desk.store.getState();
    if (hit === null) {
      if (!shift) this.#desk.select([]);
      return finger ? { what: 'pan' } : { what: 'frame', from: at, before: shift ? selection : new Set() };
    }
    const id = hit.what === 'wire' ? hit.wire : hit.part;
    if (shift) {
      const others = [...selection].filter((one) => one !== id);
      this.#desk.select(selection.has(id) ? others : [...selection, id]);
    } else if (!selection.has(id)) this.#desk.select([id]);
    return hit.what === 'wire' ? null : { what: 'move', from: at, hit, by: null };
  }

  #frame(from: Point, to: Point, before: ReadonlySet<string>): void {
    const [[ax, ay], [bx, by]] = [this.#view.toSheet(from), this.#view.toSheet(to)];
    if (Math.hypot(to[0] - from[0], to[1] - from[1]) < trembling) return;
    const frame = {
      left: Math.min(ax, bx),
      top: Math.min(ay, by),
      right: Math.max(ax, bx),
      bottom: Math.max(ay, by),
    };
    this.#view.drawFrame(frame);
    this.#desk.select([...before, ...within(this.#picture.prepared, frame)]);
  }

  #drag(gesture: Extract<Gesture, { readonly what: 'move' }>, at: Point): void {
    const [dx, dy] = [at[0] - gesture.from[0], at[1] - gesture.from[1]];
    if (gesture.by === null && Math.hypot(dx, dy) < trembling) return;
    const step = unit * this.#view.viewport.scale;
    const by: GridPoint = [Math.round(dx / step), Math.round(dy / step)];
    if (gesture.by !== null && by[0] === gesture.by[0] && by[1] === gesture.by[1]) return;
    gesture.by = by;
    this.#picture.preview(movedPreview(this.#desk, by));
  }

  /** Two fingers: what lies under both stays under both. */
  #pinch(moving: number, before: Point, at: Point): void {
    const still = [...this.#down].find(([id]) => id !== moving)?.[1];
    if (still === undefined) return;
    const apart = (point: Point) => Math.hypot(point[0] - still[0], point[1] - still[1]);
    this.#view.pan([(at[0] - before[0]) / 2, (at[1] - before[1]) / 2]);
    if (apart(before) > 0)
      this.#view.zoom(apart(at) / apart(before), [(at[0] + still[0]) / 2, (at[1] + still[1]) / 2]);
  }
}
