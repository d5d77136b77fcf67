/** What keys and pointers do on the sheet, as commands of the desk. */
import type { Desk } from '../desk/desk.ts';
import { remove } from '../desk/edits/remove.ts';
import { mirrorParts, moveParts, turnParts } from '../desk/edits/standParts.ts';
import { edit, type Edit } from '../stage/history.ts';
import { rerouteAfterMove } from '../stage/routing/index.ts';
import type { GridPoint, StageDocument } from '../stage/schema/stage.ts';
import type { Preview } from './picture.ts';

/** Parts by their names, for the title of a step: "R1, R2". */
const named = (document: StageDocument, ids: Iterable<string>): string =>
  [...ids].map((id) => document.parts[id]?.name ?? document.parts[id]?.kind ?? 'wire').join(', ');

const chosenParts = (desk: Desk): ReadonlySet<string> =>
  new Set([...desk.store.getState().selection].filter((id) => Object.hasOwn(desk.document.parts, id)));

const onParts = (desk: Desk, verb: string, change: (ids: ReadonlySet<string>) => Edit<undefined>): void => {
  const ids = chosenParts(desk);
  if (ids.size > 0) desk.edit(`${verb} ${named(desk.document, ids)}`, change(ids));
};

export const moveChosen = (desk: Desk, by: GridPoint): void =>
  onParts(desk, 'Move', (ids) => moveParts(ids, by));
export const turnChosen = (desk: Desk, way: 'left' | 'right'): void =>
  onParts(desk, 'Turn', (ids) => turnParts(ids, way));
export const mirrorChosen = (desk: Desk): void => onParts(desk, 'Mirror', mirrorParts);

export const deleteChosen = (desk: Desk): void => {
  const { selection } = desk.store.getState();
  if (selection.size > 0) desk.edit(`Delete ${named(desk.document, selection)}`, remove(selection));
};

export const selectAll = (desk: Desk): void =>
  desk.select([...Object.keys(desk.document.parts), ...Object.keys(desk.document.wires)]);

/** The drawing with the chosen parts elsewhere, their wires laid anew: what a drag shows before it is done. */
export const movedPreview = (desk: Desk, by: GridPoint): Preview | null => {
  const { history, routing } = desk.store.getState();
  const moved = edit(history, 'Move', moveParts(chosenParts(desk), by));
  if (!moved.ok || moved.value.history === history) return null;
  const { document } = moved.value.history;
  return { document, routing: rerouteAfterMove(document, routing) };
};
