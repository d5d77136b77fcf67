/** What the sheet shows and how: no part of the document, and gone with the page. */
import { createStore, type StoreApi } from 'zustand/vanilla';
import type { Box } from '../../symbols/art.ts';
import {
  fitted,
  identity,
  invert,
  panned,
  zoomedAt,
  type Bounds,
  type Point,
  type Size,
  type Viewport,
} from './viewport.ts';

export interface View {
  readonly viewport: Viewport;
  readonly size: Size;
  /** Id of the part whose value strip is open. */
  readonly strip: string | null;
  /** The selection frame while it is drawn, sheet pixels. */
  readonly frame: Box | null;
}

/** Room round a drawing that is fitted in: the ticks, and the switches in the corners. */
export const fitMargin = 40;

export class SheetView {
  readonly store: StoreApi<View> = createStore<View>(() => ({
    viewport: identity,
    size: { width: 0, height: 0 },
    strip: null,
    frame: null,
  }));

  #fitted: Viewport | undefined;
  #stripHeld = false;

  get viewport(): Viewport {
    return this.store.getState().viewport;
  }

  toSheet(screen: Point): Point {
    return invert(this.viewport, screen);
  }

  /** A drawing that was fitted in and not moved since is fitted in anew. */
  resize(size: Size, bounds: Bounds): void {
    this.store.setState({ size });
    if (this.#fitted === undefined || this.#fitted === this.viewport) this.fit(bounds);
  }

  pan(by: Point): void {
    this.store.setState({ viewport: panned(this.viewport, by) });
  }

  zoom(factor: number, at: Point = this.#middle()): void {
    this.store.setState({ viewport: zoomedAt(this.viewport, at, factor) });
  }

  zoomTo(scale: number): void {
    this.zoom(scale / this.viewport.scale);
  }

  fit(bounds: Bounds): void {
    this.#fitted = fitted(bounds, this.store.getState().size, fitMargin);
    this.store.setState({ viewport: this.#fitted });
  }

  /** Keeps the strip from giving way to another, because of what was typed in it and refused. */
  holdStrip(held: boolean): void {
    this.#stripHeld = held;
  }

  openStrip(part: string): void {
    if (!this.#stripHeld) this.store.setState({ strip: part });
  }

  /** As happens by the way: a strip that is held stays. */
  leaveStrip(): void {
    if (!this.#stripHeld) this.store.setState({ strip: null });
  }

  /** As a person wants it, whatever stands in the field. */
  closeStrip(): void {
    this.#stripHeld = false;
    this.store.setState({ strip: null });
  }

  drawFrame(frame: Box | null): void {
    this.store.setState({ frame });
  }

  #middle(): Point {
    const { width, height } = this.store.getState().size;
    return [width / 2, height / 2];
  }
}
