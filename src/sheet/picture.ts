/**
 * What the painters paint, kept ready: made anew when the document changes, and its readings alone at every frame of
 * a drag. Nothing here is React's.
 */
import type { Desk, DeskState } from '../desk/desk.ts';
import type { LiveFrame } from '../desk/live.ts';
import { mainValueOf } from '../desk/partValue.ts';
import { drawReadings, type Placement } from '../drawing/drawStage.ts';
import { prepareStage, type PreparedStage } from '../drawing/prepare.ts';
import type { Drawing, Primitive } from '../drawing/primitives.ts';
import type { Routing } from '../stage/routing/index.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { formatCoded, formatStated } from '../values/value-text.ts';

/** A document that is shown for the time of a drag and may never be. */
export interface Preview {
  readonly document: StageDocument;
  readonly routing: Routing;
}

export class SheetPicture {
  prepared: PreparedStage;
  still: readonly Primitive[] = [];
  readings: readonly Primitive[] = [];
  bounds: Drawing['bounds'];
  unplaced: readonly string[] = [];
  readonly #desk: Desk;
  readonly #listeners = new Set<() => void>();
  #placement: Placement | undefined;
  #preview: Preview | null = null;
  #shown: DeskState | undefined;

  constructor(desk: Desk) {
    this.#desk = desk;
    this.prepared = this.#prepare();
    this.bounds = this.#draw();
  }

  /** Follows the desk until the call it returns. */
  connect(): () => void {
    // What changed before anyone followed.
    if (this.#shown !== this.#desk.store.getState()) {
      this.prepared = this.#prepare();
      this.bounds = this.#draw();
    }
    const offStore = this.#desk.store.subscribe((now, before) => {
      const redrawn =
        now.history.document !== before.history.document ||
        now.routing !== before.routing ||
        now.state !== before.state;
      const reread =
        now.readings !== before.readings || now.stale !== before.stale || now.density !== before.density;
      if (redrawn) this.prepared = this.#prepare();
      if (redrawn || reread) this.bounds = this.#draw();
      if (redrawn || reread) this.#tell();
    });
    const offLive = this.#desk.onLive((frame) => {
      if (frame === null) this.bounds = this.#draw();
      else this.#drawFrame(frame);
      this.#tell();
    });
    return () => {
      offStore();
      offLive();
    };
  }

  onChange(listener: () => void): () => void {
    this.#listeners.add(listener);
    return () => {
      this.#listeners.delete(listener);
    };
  }

  /** Shows another document in place of the desk's; null ends it. */
  preview(preview: Preview | null): void {
    if (preview === this.#preview) return;
    this.#preview = preview;
    this.prepared = this.#prepare();
    this.bounds = this.#draw();
    this.#tell();
  }

  #tell(): void {
    for (const listener of this.#listeners) listener();
  }

  #prepare(): PreparedStage {
    const { history, routing, state } = this.#desk.store.getState();
    const shown = this.#preview ?? { document: history.document, routing };
    return prepareStage(shown.document, shown.routing.paths, state);
  }

  #draw(): Drawing['bounds'] {
    const shown = this.#desk.store.getState();
    this.#shown = shown;
    const { readings, density, stale } = shown;
    const drawing = drawReadings(this.prepared, readings, { density, stale });
    this.#placement = drawing.placement;
    this.still = this.prepared.still;
    this.readings = drawing.primitives.slice(this.still.length);
    this.unplaced = drawing.unplaced;
    return drawing.bounds;
  }

  /** Every reading where it was, with its new figure; the value that is dragged as it now reads. */
  #drawFrame({ part, key, value, readings, stale }: LiveFrame): void {
    const { density, history, state } = this.#desk.store.getState();
    const keep = this.#placement;
    const drawing = drawReadings(this.prepared, readings, {
      density,
      stale,
      ...(keep === undefined ? {} : { keep }),
    });
    this.readings = drawing.primitives.slice(this.prepared.still.length);
    const stated = mainValueOf(history.document, state, part);
    if (stated?.key !== key) return;
    const before = formatStated(stated.spec, stated.quantity);
    const now = formatCoded(value, stated.quantity);
    this.still = this.prepared.still.map((primitive) =>
      primitive.kind === 'text' && primitive.of === part && primitive.text === before
        ? { ...primitive, text: now }
        : primitive,
    );
  }
}
