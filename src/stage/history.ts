/**
 * The history of a document: every change is an edit, a gesture is one step, a step keeps its patches and their
 * inverse. A history is a value; editing, undoing and redoing give a new one.
 */
import { applyPatches, enablePatches, produceWithPatches } from 'immer';
import type { Draft, Patch } from 'immer';
import type { Fault, Result } from '../values/result.ts';
import { failure, success } from '../values/result.ts';
import { checkStage } from './checks/checkStage.ts';
import { keyOrders, withKeyOrders } from './keyOrder.ts';
import type { KeyOrder } from './keyOrder.ts';
import type { StageDocument } from './schema/stage.ts';

enablePatches();

export type StageDraft = Draft<StageDocument>;

/**
 * A change of a draft. One that fails may leave the draft as it likes: it is thrown away. What an edit cannot
 * see by itself (a name used twice, a device that does not fit) is found when the step is finished.
 */
export type Edit<Value> = (draft: StageDraft) => Result<Value>;

export interface Step {
  /** What a person did, for the undo button: "Move R1". */
  readonly title: string;
  readonly patches: readonly Patch[];
  readonly inverse: readonly Patch[];
  /** Patches do not keep the order of keys, and the file does: orders to restore going back and forth. */
  readonly orders: { readonly before: readonly KeyOrder[]; readonly after: readonly KeyOrder[] };
}

export interface History {
  readonly document: StageDocument;
  /** Done, oldest first. */
  readonly past: readonly Step[];
  /** Undone, next first. */
  readonly future: readonly Step[];
}

export const beginHistory = (document: StageDocument): History => ({ document, past: [], future: [] });

export interface Edited<Value> {
  readonly history: History;
  readonly value: Value;
}

/**
 * The document after an edit, the edit being one step. A gesture of many edits is one step where they are made in
 * one call. An edit that changes nothing adds no step; one that fails, or that would leave a document the reader
 * would refuse, changes nothing and says why.
 */
export function edit<Value>(history: History, title: string, change: Edit<Value>): Result<Edited<Value>> {
  let outcome: Result<Value> | undefined;
  const [document, patches, inverse] = produceWithPatches(history.document, (draft) => {
    outcome = change(draft);
  });
  if (outcome === undefined) throw new Error('the edit did not run');
  if (!outcome.ok) return outcome;
  if (patches.length === 0 || document === history.document)
    return success({ history, value: outcome.value });
  const faults: readonly Fault[] = checkStage(document);
  if (faults.length > 0) return failure(...faults);
  const step: Step = { title, patches, inverse, orders: keyOrders(history.document, document, patches) };
  return success({
    history: { document, past: [...history.past, step], future: [] },
    value: outcome.value,
  });
}

export const canUndo = ({ past }: History): boolean => past.length > 0;
export const canRedo = ({ future }: History): boolean => future.length > 0;

/** One step back; the same history where there is none. */
export function undo(history: History): History {
  const step = history.past.at(-1);
  if (step === undefined) return history;
  return {
    document: apply(history.document, step.inverse, step.orders.before),
    past: history.past.slice(0, -1),
    future: [step, ...history.future],
  };
}

/** One step forth again; the same history where there is none. */
export function redo(history: History): History {
  const [step, ...future] = history.future;
  if (step === undefined) return history;
  return {
    document: apply(history.document, step.patches, step.orders.after),
    past: [...history.past, step],
    future,
  };
}

const apply = (
  document: StageDocument,
  patches: readonly Patch[],
  orders: readonly KeyOrder[],
): StageDocument => withKeyOrders(applyPatches(document, [...patches]), orders);
