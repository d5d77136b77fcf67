/**
 * The state of the screen: the document with its history, what is chosen, and what was settled. Knows nothing of how
 * any of it is shown. Commands are the methods; whoever shows something subscribes to `store`.
 */
import { createStore, type StoreApi } from 'zustand/vanilla';
import type { Density } from '../drawing/drawStage.ts';
import type { StateReadings } from '../readings/readings.ts';
import { SettleSession, type SettleConditions } from '../readings/session.ts';
import { beginHistory, edit, redo, undo, type Edit, type History, type Step } from '../stage/history.ts';
import { layOut } from '../stage/layout/layOut.ts';
import { routeStage, type Routing } from '../stage/routing/index.ts';
import type { StageDocument } from '../stage/schema/stage.ts';
import { baseName, stateNames } from '../stage/states.ts';
import type { Result } from '../values/result.ts';
import type { SeriesName } from '../values/series.ts';
import type { ValueSpec } from '../values/value-spec.ts';
import { setValue, type ValuePlace } from './edits/setValue.ts';
import { LiveSettling, type LiveFrame } from './live.ts';
import { Routes } from './routes.ts';
import { sameCircuit } from './sameCircuit.ts';

export interface DeskState {
  readonly history: History;
  /** Where the wires run; follows from the document and from where they ran before. */
  readonly routing: Routing;
  /** Name of the state that is shown. */
  readonly state: string;
  /** What holds in place of the document's own conditions. */
  readonly conditions: SettleConditions;
  /** Ids of parts and wires, in the order in which they were chosen. */
  readonly selection: ReadonlySet<string>;
  readonly density: Density;
  /** Whether every change is settled at once. */
  readonly keepSettled: boolean;
  /** Null where nothing was settled yet. */
  readonly readings: StateReadings | null;
  /** Whether anything changed since the readings were settled. */
  readonly stale: boolean;
  /** Which values a slider offers: any, or those that are stocked. */
  readonly stock: Stock;
}

export interface Stock {
  readonly stocked: boolean;
  readonly series: SeriesName;
}

const nothing: ReadonlySet<string> = new Set();

const opened = (given: StageDocument): Omit<DeskState, 'density' | 'keepSettled' | 'stock'> => {
  // Parts without a place get one before anything is done, so that all of them can be moved.
  const document = layOut(given);
  return {
    history: beginHistory(document),
    routing: routeStage(document),
    state: baseName(document),
    conditions: {},
    selection: nothing,
    readings: null,
    stale: true,
  };
};

export class Desk {
  readonly store: StoreApi<DeskState>;
  readonly #routes = new Routes();
  readonly #live = new LiveSettling();
  #session: SettleSession | undefined;

  constructor(document: StageDocument) {
    this.store = createStore<DeskState>(() => ({
      ...opened(document),
      density: document.view?.density ?? 'all',
      keepSettled: true,
      stock: { stocked: true, series: 'E24' },
    }));
    this.settle();
  }

  get document(): StageDocument {
    return this.store.getState().history.document;
  }

  /** Another document, with a history of its own. */
  open(document: StageDocument): void {
    this.#forget();
    this.store.setState({ ...opened(document), density: document.view?.density ?? 'all' });
    this.#settleIfKept();
  }

  /** One step of history; faults change nothing. */
  edit<Value>(title: string, change: Edit<Value>): Result<Value> {
    const { history, routing } = this.store.getState();
    const result = edit(history, title, change);
    if (!result.ok) return result;
    const next = result.value.history;
    if (next !== history) {
      const after = this.#routes.after(next.past.at(-1), history.document, next.document, routing);
      this.#stand(next, after);
    }
    return { ok: true, value: result.value.value };
  }

  undo(): void {
    const { history, routing } = this.store.getState();
    const step: Step | undefined = history.past.at(-1);
    if (step !== undefined) this.#stand(undo(history), this.#routes.undone(step, routing));
  }

  redo(): void {
    const { history, routing } = this.store.getState();
    const step: Step | undefined = history.future[0];
    if (step !== undefined) this.#stand(redo(history), this.#routes.redone(step, routing));
  }

  chooseState(state: string): void {
    const now = this.store.getState();
    if (state === now.state || !stateNames(now.history.document).includes(state)) return;
    this.#forget();
    // Readings of one state say nothing of another.
    this.store.setState({ state, readings: null, stale: true });
    this.#settleIfKept();
  }

  setConditions(conditions: SettleConditions): void {
    this.#forget();
    this.store.setState({ conditions, stale: true });
    this.#settleIfKept();
  }

  select(ids: Iterable<string>): void {
    const selection = new Set(ids);
    const before = this.store.getState().selection;
    if (selection.size === before.size && [...selection].every((id) => before.has(id))) return;
    this.store.setState({ selection });
  }

  setDensity(density: Density): void {
    this.store.setState({ density });
  }

  setStock(stock: Stock): void {
    this.store.setState({ stock });
  }

  setKeepSettled(keepSettled: boolean): void {
    this.store.setState({ keepSettled });
    if (keepSettled && this.store.getState().stale) this.settle();
  }

  /** Settles the document as it stands, by every method there is. */
  settle(): void {
    this.#live.stop();
    this.store.setState({ readings: this.#readySession()?.settle() ?? null, stale: false });
  }

  /**
   * A value while it is dragged: settled and told to the listeners, the store and the document left alone.
   * @param value SI
   */
  setLive(part: string, key: string, value: number): void {
    const { keepSettled, readings } = this.store.getState();
    this.#live.set(keepSettled ? this.#readySession() : undefined, readings, { part, key, value });
  }

  /** Tells of every frame of a drag; of its end by null. The call it returns takes the listener off. */
  onLive(listener: (frame: LiveFrame | null) => void): () => void {
    return this.#live.listen(listener);
  }

  /** The end of a drag: the value becomes the document's, in one step. Without one, all is as it was before. */
  commitLive(place: ValuePlace, spec: ValueSpec): Result<undefined> {
    this.#forget();
    const { parts } = this.document;
    const name = parts[place.part]?.name ?? place.part;
    return this.edit(`Set ${name}`, setValue(place, spec, this.store.getState().state));
  }

  /** Gives a drag up. */
  cancelLive(): void {
    this.#forget();
  }

  /** Figures that were dragged about are in the session: it goes with them. */
  #forget(): void {
    this.#live.stop();
    this.#session = undefined;
  }

  #readySession(): SettleSession | undefined {
    const { history, state, conditions } = this.store.getState();
    this.#session ??= SettleSession.open(history.document, state, conditions);
    return this.#session;
  }

  #settleIfKept(): void {
    if (this.store.getState().keepSettled) this.settle();
  }

  #stand(history: History, routing: Routing): void {
    const before = this.store.getState();
    const { document } = history;
    const isThere = (id: string) => Object.hasOwn(document.parts, id) || Object.hasOwn(document.wires, id);
    const kept = [...before.selection].filter(isThere);
    const selection = kept.length === before.selection.size ? before.selection : new Set(kept);
    if (sameCircuit(before.history.document, document)) {
      this.store.setState({ history, routing, selection });
      return;
    }
    this.#forget();
    const state = stateNames(document).includes(before.state) ? before.state : baseName(document);
    // One change of the store for the edit and its readings, so that no view shows the one without the other.
    const settled = before.keepSettled
      ? {
          readings: SettleSession.open(document, state, before.conditions)?.settle() ?? null,
          stale: false,
        }
      : { stale: true };
    this.store.setState({ history, routing, selection, state, ...settled });
  }
}
