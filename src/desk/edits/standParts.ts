/** Parts moved, turned and mirrored. Wires keep their ends; a stated path that no longer leads to them is given up. */
import type { Edit, StageDraft } from '../../stage/history.ts';
import type { GridPoint } from '../../stage/schema/stage.ts';
import { success } from '../../values/result.ts';
import { jointsBetween } from './jointsBetween.ts';

const shifted = ([x, y]: GridPoint, [dx, dy]: GridPoint): [number, number] => [x + dx, y + dy];

/** Moves parts by whole grid units, with the joints that hang on nothing else. */
export const moveParts =
  (ids: ReadonlySet<string>, by: GridPoint): Edit<undefined> =>
  (draft) => {
    if (by[0] === 0 && by[1] === 0) return success(undefined);
    for (const id of ids) {
      const part = draft.parts[id];
      if (part?.place !== undefined) part.place = shifted(part.place, by);
    }
    const joints = jointsBetween(draft, ids);
    for (const id of joints) {
      const joint = draft.joints[id];
      if (joint !== undefined) draft.joints[id] = shifted(joint, by);
    }
    const moves = (end: string) => ids.has(end) || joints.has(end);
    for (const wire of Object.values(draft.wires)) {
      const moving = wire.ends.filter(([end]) => moves(end)).length;
      if (wire.path === undefined || moving === 0) continue;
      if (moving === 2) wire.path = wire.path.map((point) => shifted(point, by));
      else delete wire.path;
    }
    return success(undefined);
  };

const givePathsUp = (draft: StageDraft, ids: ReadonlySet<string>): void => {
  for (const wire of Object.values(draft.wires))
    if (wire.ends.some(([end]) => ids.has(end))) delete wire.path;
};

/** Turns each part about its own place by a quarter, to the right or to the left. */
export const turnParts =
  (ids: ReadonlySet<string>, way: 'left' | 'right'): Edit<undefined> =>
  (draft) => {
    for (const id of ids) {
      const part = draft.parts[id];
      if (part === undefined) continue;
      const turn = (((part.turn ?? 0) + (way === 'right' ? 90 : 270)) % 360) as 0 | 90 | 180 | 270;
      if (turn === 0) delete part.turn;
      else part.turn = turn;
    }
    givePathsUp(draft, ids);
    return success(undefined);
  };

/** Mirrors each part in its own upright axis, as it stands. */
export const mirrorParts =
  (ids: ReadonlySet<string>): Edit<undefined> =>
  (draft) => {
    for (const id of ids) {
      const part = draft.parts[id];
      if (part === undefined) continue;
      // A part is mirrored before it is turned: of one that lies, the mirror image seen is also turned half round.
      if (part.turn === 90) part.turn = 270;
      else if (part.turn === 270) part.turn = 90;
      if (part.mirror === true) delete part.mirror;
      else part.mirror = true;
    }
    givePathsUp(draft, ids);
    return success(undefined);
  };
