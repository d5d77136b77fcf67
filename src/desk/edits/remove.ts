import type { Edit, StageDraft } from '../../stage/history.ts';
import { splitSetKey } from '../../stage/states.ts';
import { success } from '../../values/result.ts';

const drop = (record: object, keys: Iterable<string>): void => {
  for (const key of keys) Reflect.deleteProperty(record, key);
};

/** Takes parts and wires away, with whatever in the document speaks of them, and joints on which nothing hangs now. */
export const remove =
  (ids: ReadonlySet<string>): Edit<undefined> =>
  (draft) => {
    const names = new Set([...ids].flatMap((id) => draft.parts[id]?.name ?? []));
    drop(draft.parts, ids);
    drop(
      draft.wires,
      Object.entries(draft.wires)
        .filter(([id, { ends }]) => ids.has(id) || ends.some(([end]) => ids.has(end)))
        .map(([id]) => id),
    );
    tidyJoints(draft);
    for (const state of Object.values(draft.states)) {
      if (state.set !== undefined)
        drop(
          state.set,
          Object.keys(state.set).filter((key) => ids.has(splitSetKey(key)[0])),
        );
      if (state.duties !== undefined) drop(state.duties, ids);
    }
    if (draft.alternates !== undefined) drop(draft.alternates, ids);
    const chips = draft.view?.chips;
    if (chips !== undefined)
      drop(
        chips,
        Object.keys(chips).filter((key) => names.has(key.split('.')[0] ?? '')),
      );
    return success(undefined);
  };

/** A joint with one wire is a loose end: both go, and so on along the line. */
const tidyJoints = (draft: StageDraft): void => {
  for (;;) {
    const wiresOf = (joint: string) =>
      Object.entries(draft.wires).filter(([, { ends }]) => ends.some(([end]) => end === joint));
    const loose = Object.keys(draft.joints).filter((joint) => wiresOf(joint).length < 2);
    if (loose.length === 0) return;
    for (const joint of loose)
      drop(
        draft.wires,
        wiresOf(joint).map(([id]) => id),
      );
    drop(draft.joints, loose);
  }
};
