import type { SymbolArt } from '../../../symbols/art.ts';
import { standing, standingBox } from '../../../symbols/placement.ts';
import { tagArt } from '../../../symbols/tag.ts';
import type { PartContext } from '../../parts/kind.ts';
import { kindNamed } from '../../parts/catalogue.ts';
import type { DrawnPart, DrawnStage } from './document.ts';
import { headings, unit, type GridBox, type GridPoint, type Heading } from './grid.ts';

/** A pin where it comes to lie on the sheet. */
export interface StandingPin {
  readonly at: GridPoint;
  /** The way a wire leaves it when it goes on in line with the pin's lead. */
  readonly heading: Heading;
  /** False for a pin that is drawn only once a wire ends on it: an amplifier's supplies, a transistor's body. */
  readonly drawn: boolean;
}

/** A part as it stands on the sheet, grid units. */
export interface StandingPart {
  readonly id: string;
  readonly origin: GridPoint;
  readonly pins: ReadonlyMap<string, StandingPin>;
  /** The symbol's body, leads left out. */
  readonly body: GridBox;
}

/** Widest letter of a name at 13 px, nearly. */
const letterWidth = 8;

const noPins: ReadonlySet<string> = new Set();

/** For each part the pins on which a wire ends. */
export const wiredPins = (document: DrawnStage): ReadonlyMap<string, ReadonlySet<string>> => {
  const wired = new Map<string, Set<string>>();
  for (const { ends } of Object.values(document.wires)) {
    for (const [part, pin] of ends) {
      if (pin === undefined) continue;
      const pins = wired.get(part);
      if (pins === undefined) wired.set(part, new Set([pin]));
      else pins.add(pin);
    }
  }
  return wired;
};

/** A part's symbol, unturned; undefined for a kind that nobody knows. */
export const artOf = (
  document: DrawnStage,
  id: string,
  part: DrawnPart,
  wired: ReadonlySet<string> = noPins,
): SymbolArt | undefined => {
  const device = part.device === undefined ? undefined : document.devices[part.device];
  const context: PartContext = {
    name: part.name ?? id,
    ...(part.label === undefined ? {} : { label: part.label }),
    values: part.values ?? {},
    ...(device === undefined ? {} : { device }),
    wired,
  };
  const kind = kindNamed(part.kind);
  if (kind?.joins !== 'label') return kind?.symbol(context);
  // A tag is as long as its label. Here a letter's width at most will do: this is room, not ink.
  const label = kind.text(context)[0] ?? '';
  return tagArt(label.length * letterWidth, part.turn === 90 || part.turn === 270);
};

/** The heading from the nearest side of a body to a pin outside it, or away from the body's middle for one at its edge. */
const headingOut = ([x, y]: readonly [number, number], body: SymbolArt['body']): Heading => {
  const right = x * unit - body.right;
  const left = body.left - x * unit;
  const down = y * unit - body.bottom;
  const up = body.top - y * unit;
  const most = Math.max(right, down, left, up);
  if (most > 0) return most === right ? 0 : most === down ? 1 : most === left ? 2 : 3;
  const fromMiddleX = x * unit - (body.left + body.right) / 2;
  const fromMiddleY = y * unit - (body.top + body.bottom) / 2;
  // A pin at the edge of its body: the side on which the body does not lie.
  if (most === down && fromMiddleY > 0) return 1;
  if (most === up && fromMiddleY < 0) return 3;
  if (most === right && fromMiddleX > 0) return 0;
  if (most === left && fromMiddleX < 0) return 2;
  return fromMiddleY >= 0 ? 1 : 3;
};

const headingNamed = ([x, y]: readonly [number, number]): Heading => {
  const found = headings.findIndex(([hx, hy]) => hx === x && hy === y);
  return found === 1 ? 1 : found === 2 ? 2 : found === 3 ? 3 : 0;
};

/** A symbol put down at a place, as it is mirrored and turned. */
export const standArt = (
  id: string,
  art: SymbolArt,
  kind: string,
  place: GridPoint,
  stance: { readonly mirror: boolean; readonly turn: 0 | 90 | 180 | 270 },
  wired: ReadonlySet<string>,
): StandingPart => {
  const pins = new Map<string, StandingPin>();
  for (const [name, offset] of Object.entries(art.pins)) {
    const [x, y] = standing(offset, stance);
    const hidden = art.whenWired?.[name] !== undefined || (kind === 'mosfet' && name === 'body');
    pins.set(name, {
      at: [place[0] + x, place[1] + y],
      heading: headingNamed(standing(headings[headingOut(offset, art.body)] ?? [1, 0], stance)),
      drawn: !hidden || wired.has(name),
    });
  }
  const box = standingBox(art.body, stance);
  return {
    id,
    origin: place,
    pins,
    body: {
      left: place[0] + box.left / unit,
      top: place[1] + box.top / unit,
      right: place[0] + box.right / unit,
      bottom: place[1] + box.bottom / unit,
    },
  };
};

/** A part as it stands; undefined where it has no place yet or is of a kind that nobody knows. */
export const standPart = (
  document: DrawnStage,
  id: string,
  wired: ReadonlySet<string> = wiredPins(document).get(id) ?? noPins,
): StandingPart | undefined => {
  const part = document.parts[id];
  if (part?.place === undefined) return undefined;
  const art = artOf(document, id, part, wired);
  if (art === undefined) return undefined;
  const stance = { mirror: part.mirror ?? false, turn: part.turn ?? 0 };
  return standArt(id, art, part.kind, part.place, stance, wired);
};

/** Every part that has a place, by id, in the order of the document. */
export const standParts = (document: DrawnStage): ReadonlyMap<string, StandingPart> => {
  const wired = wiredPins(document);
  const parts = new Map<string, StandingPart>();
  for (const id of Object.keys(document.parts)) {
    const part = standPart(document, id, wired.get(id) ?? noPins);
    if (part !== undefined) parts.set(id, part);
  }
  return parts;
};

/** Where a pin lies on the sheet; undefined for a part without a place and for a pin that it does not have. */
export const pinPosition = (document: DrawnStage, part: string, pin: string): GridPoint | undefined =>
  standPart(document, part)?.pins.get(pin)?.at;

/** The box of a part's body, leads left out; undefined for a part without a place. */
export const partBox = (document: DrawnStage, part: string): GridBox | undefined =>
  standPart(document, part)?.body;

/** The box that holds a part's body and all its drawn pins. */
export const reachOf = (part: StandingPart): GridBox => {
  let { left, top, right, bottom } = part.body;
  for (const { at, drawn } of part.pins.values()) {
    if (!drawn) continue;
    left = Math.min(left, at[0]);
    right = Math.max(right, at[0]);
    top = Math.min(top, at[1]);
    bottom = Math.max(bottom, at[1]);
  }
  return { left, top, right, bottom };
};
