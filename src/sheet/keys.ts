/** The keys of the sheet, active while it has the focus. */
import type { Desk } from '../desk/desk.ts';
import { mainValueOf } from '../desk/partValue.ts';
import type { GridPoint } from '../stage/schema/stage.ts';
import { deleteChosen, mirrorChosen, moveChosen, selectAll, turnChosen } from './commands.ts';
import type { SheetPicture } from './picture.ts';
import { neighbourIn, readingOrder } from './readingOrder.ts';
import type { SheetView } from './view.ts';

export interface Key {
  readonly key: string;
  readonly shiftKey: boolean;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly altKey: boolean;
}

interface Surroundings {
  readonly desk: Desk;
  readonly picture: SheetPicture;
  readonly view: SheetView;
}

const arrows: Readonly<Record<string, GridPoint>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** @returns whether the key meant something here; any other is left to the browser. */
export const pressKey = (key: Key, around: Surroundings): boolean => {
  if (key.altKey) return false;
  return key.ctrlKey || key.metaKey ? pressWithControl(key, around) : pressAlone(key, around);
};

const pressWithControl = ({ key, shiftKey }: Key, { desk }: Surroundings): boolean => {
  switch (key.toLowerCase()) {
    case 'z':
      if (shiftKey) desk.redo();
      else desk.undo();
      return true;
    case 'y':
      desk.redo();
      return true;
    case 'a':
      selectAll(desk);
      return true;
    default:
      return false;
  }
};

const pressAlone = ({ key, shiftKey }: Key, { desk, picture, view }: Surroundings): boolean => {
  const arrow = arrows[key];
  const { selection } = desk.store.getState();
  if (arrow !== undefined) {
    const steps = shiftKey ? 5 : 1;
    const by: GridPoint = [arrow[0] * steps, arrow[1] * steps];
    if (selection.size > 0) moveChosen(desk, by);
    else view.pan([-by[0] * 24, -by[1] * 24]);
    return true;
  }
  switch (key) {
    case ',':
      turnChosen(desk, 'left');
      return true;
    case '.':
      turnChosen(desk, 'right');
      return true;
    case '/':
      mirrorChosen(desk);
      return true;
    case 'Delete':
    case 'Backspace':
      deleteChosen(desk);
      return true;
    case 'Escape':
      desk.select([]);
      return true;
    case 'Tab':
      return walk(desk, picture, shiftKey ? -1 : 1);
    case 'Enter': {
      const [part] = selection;
      if (part === undefined || mainValueOf(desk.document, desk.store.getState().state, part) === undefined)
        return false;
      view.openStrip(part);
      return true;
    }
    default:
      return false;
  }
};

/** To the next part in reading order. Past the last one the key goes on to the rest of the page: the sheet is no trap. */
const walk = (desk: Desk, picture: SheetPicture, way: 1 | -1): boolean => {
  const order = readingOrder(picture.prepared.scene.parts);
  const last = [...desk.store.getState().selection].at(-1);
  const next = neighbourIn(order, last, way);
  // Backwards from no part is the way back into the page, not to the last part.
  if (next === undefined || (last === undefined && way === -1)) {
    desk.select([]);
    return false;
  }
  desk.select([next]);
  return true;
};
