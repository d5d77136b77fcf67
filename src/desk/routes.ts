import type { Step } from '../stage/history.ts';
import { rerouteAfterMove, type Routing } from '../stage/routing/index.ts';
import type { StageDocument } from '../stage/schema/stage.ts';

/**
 * The lines of the wires before and after each step, so that undoing a step shows the very drawing that was there:
 * routes follow from the document and from where wires ran before.
 */
export class Routes {
  readonly #of = new WeakMap<Step, { readonly before: Routing; readonly after: Routing }>();

  /** Wires after a new step; where there was none, those that were. */
  after(step: Step | undefined, from: StageDocument, to: StageDocument, before: Routing): Routing {
    if (step === undefined) return before;
    const after = standsAlike(from, to) ? before : rerouteAfterMove(to, before);
    this.#of.set(step, { before, after });
    return after;
  }

  undone(step: Step, now: Routing): Routing {
    return this.#of.get(step)?.before ?? now;
  }

  redone(step: Step, now: Routing): Routing {
    return this.#of.get(step)?.after ?? now;
  }
}

/** Whether nothing changed that a wire goes by. A tag is as long as its label, which is a value. */
const standsAlike = (from: StageDocument, to: StageDocument): boolean => {
  if (from.joints !== to.joints || from.wires !== to.wires || from.devices !== to.devices) return false;
  const ids = Object.keys(from.parts);
  return (
    ids.length === Object.keys(to.parts).length &&
    ids.every((id) => {
      const [one, other] = [from.parts[id], to.parts[id]];
      if (one === other) return true;
      return (
        one !== undefined &&
        other !== undefined &&
        one.place === other.place &&
        one.turn === other.turn &&
        one.mirror === other.mirror &&
        one.device === other.device &&
        one.values?.label === other.values?.label
      );
    })
  );
};
