import type { StateReadings } from '../readings/readings.ts';
import type { SettleSession } from '../readings/session.ts';

/** A value that is being dragged. */
export interface LiveValue {
  /** Id. */
  readonly part: string;
  readonly key: string;
  /** SI. */
  readonly value: number;
}

export interface LiveFrame extends LiveValue {
  readonly readings: StateReadings | null;
  /** Whether the readings are of an earlier value. */
  readonly stale: boolean;
}

/** Newton iterations that a frame has room for. */
const mostIterations = 60;

/**
 * Settles while a value is dragged. What Newton alone does not find within a frame is looked for by every method as
 * soon as the browser is idle, the newest value winning; until then the former readings stand as stale.
 */
export class LiveSettling {
  readonly #listeners = new Set<(frame: LiveFrame | null) => void>();
  #waiting: ReturnType<typeof setTimeout> | undefined;
  #last: StateReadings | null = null;
  #running = false;

  listen(listener: (frame: LiveFrame | null) => void): () => void {
    this.#listeners.add(listener);
    return () => {
      this.#listeners.delete(listener);
    };
  }

  /**
   * @param session undefined where nothing is to be settled
   * @param former readings from before the drag
   */
  set(session: SettleSession | undefined, former: StateReadings | null, live: LiveValue): void {
    this.#wait(undefined);
    if (!this.#running) this.#last = former;
    this.#running = true;
    if (session?.setValue(live.part, live.key, live.value) !== true) {
      this.#tell({ ...live, readings: this.#last, stale: true });
      return;
    }
    const readings = session.settle({ frame: mostIterations });
    if (readings.settled) {
      this.#last = readings;
      this.#tell({ ...live, readings, stale: false });
      return;
    }
    this.#tell({ ...live, readings: this.#last, stale: true });
    this.#wait(() => {
      this.#last = session.settle();
      this.#tell({ ...live, readings: this.#last, stale: false });
    });
  }

  stop(): void {
    this.#wait(undefined);
    if (!this.#running) return;
    this.#running = false;
    this.#tell(null);
  }

  #wait(task: (() => void) | undefined): void {
    clearTimeout(this.#waiting);
    this.#waiting = task === undefined ? undefined : setTimeout(task, 0);
  }

  #tell(frame: LiveFrame | null): void {
    for (const listener of this.#listeners) listener(frame);
  }
}
