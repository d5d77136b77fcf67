/**
 * A stage made ready for drawing: parts as they stand, lines as they run, in pixels. Everything after this file works
 * on the scene and knows nothing of the stage file.
 */
import type { Box, SymbolArt } from '../../symbols/art.ts';
import { standing, standingBox, type Stance } from '../../symbols/placement.ts';
import { unit } from '../../symbols/pen.ts';
import { tagArt } from '../../symbols/tag.ts';
import { kindNamed } from '../parts/catalogue.ts';
import type { PartContext, PartKind } from '../parts/kind.ts';
import type { DrawnEnd, DrawnPart, DrawnStage } from '../stage/routing/document.ts';
import { artOf, wiredPins } from '../stage/routing/shape.ts';
import { moved, type Point } from './boxes.ts';
import { textWidth } from './fontMetrics.ts';

export interface ScenePart {
  readonly id: string;
  readonly kind: string;
  /** What is written at the part; none for a ground. */
  readonly label: string | undefined;
  /** What the readings call it: its name, or its id where it has none. */
  readonly key: string;
  readonly origin: Point;
  readonly stance: Stance;
  readonly art: SymbolArt;
  readonly pins: ReadonlyMap<string, Point>;
  /** Symbol's body as it stands, leads left out. */
  readonly body: Box;
  /** Values as a person stated them, a line each. */
  readonly lines: readonly string[];
  readonly wired: ReadonlySet<string>;
  /** How the part's node is known beside its wires: the reference, a label, a rail's name. */
  readonly joins: PartKind['joins'];
}

/** Where a wire ends: a pin of a part, or a joint. */
export interface SceneEnd {
  readonly at: Point;
  /** `p3.drain` or `j1`. */
  readonly key: string;
}

export interface SceneWire {
  readonly id: string;
  readonly ends: readonly [SceneEnd, SceneEnd];
  readonly points: readonly Point[];
}

export interface Scene {
  readonly parts: readonly ScenePart[];
  readonly wires: readonly SceneWire[];
  /** Every part by its id. */
  readonly partOf: ReadonlyMap<string, ScenePart>;
}

/** Lines of wires in grid units, both ends included, as the router gives them. */
export type Routes = ReadonlyMap<string, readonly Point[]>;

/** As much of the stage document as is drawn. */
export interface DrawableStage extends DrawnStage {
  readonly parts: Readonly<Record<string, DrawnPart & { readonly label?: string | undefined }>>;
}

export const sceneOf = (document: DrawableStage, routes: Routes): Scene => {
  const wired = wiredPins(document);
  const parts = Object.entries(document.parts).flatMap(([id, part]) => {
    const standingOne = scenePart(document, id, part, wired.get(id) ?? new Set());
    return standingOne === undefined ? [] : [standingOne];
  });
  const partOf = new Map(parts.map((part) => [part.id, part]));

  const endOf = (end: DrawnEnd): SceneEnd | undefined => {
    const [first, pin] = end;
    if (pin !== undefined) {
      const at = partOf.get(first)?.pins.get(pin);
      return at === undefined ? undefined : { at, key: `${first}.${pin}` };
    }
    const joint = document.joints[first];
    return joint === undefined ? undefined : { at: toPixels(joint), key: first };
  };
  const wires = Object.entries(document.wires).flatMap(([id, wire]): SceneWire[] => {
    const [from, to] = [endOf(wire.ends[0]), endOf(wire.ends[1])];
    if (from === undefined || to === undefined) return [];
    const points = routes.get(id)?.map(toPixels) ?? [from.at, to.at];
    return [{ id, ends: [from, to], points }];
  });
  return { parts, wires, partOf };
};

const toPixels = ([x, y]: Point): Point => [x * unit, y * unit];

const scenePart = (
  document: DrawableStage,
  id: string,
  part: DrawableStage['parts'][string],
  wired: ReadonlySet<string>,
): ScenePart | undefined => {
  const kind = kindNamed(part.kind);
  const stated = artOf(document, id, part, wired);
  if (part.place === undefined || stated === undefined) return undefined;
  const device = part.device === undefined ? undefined : document.devices[part.device];
  const context: PartContext = {
    name: part.name ?? id,
    ...(part.label === undefined ? {} : { label: part.label }),
    values: part.values ?? {},
    ...(device === undefined ? {} : { device }),
    wired,
  };
  // A device's title is long and the same for all its like: the ledger and the plate's table give it.
  const title = (device as { readonly title?: unknown } | undefined)?.title;
  const label = part.label ?? part.name;
  const lines =
    kind?.text(context).filter((line) => line !== '' && line !== title && line !== part.label) ?? [];
  const stance: Stance = { mirror: part.mirror ?? false, turn: part.turn ?? 0 };
  const joins = kind?.joins ?? 'nothing';
  const art = joins === 'label' ? tagFor(lines[0] ?? part.name ?? '', stance) : stated;
  const origin = toPixels(part.place);
  const pins = new Map(
    Object.entries(art.pins).map(([pin, offset]): [string, Point] => {
      const [x, y] = toPixels(standing(offset, stance));
      return [pin, [origin[0] + x, origin[1] + y]];
    }),
  );
  return {
    id,
    kind: part.kind,
    label,
    key: part.name ?? id,
    origin,
    stance,
    art,
    pins,
    body: moved(standingBox(art.body, stance), origin),
    lines,
    wired,
    joins,
  };
};

/** A tag's outline is as long as its label, measured. */
const tagFor = (label: string, { turn }: Stance): SymbolArt =>
  tagArt(textWidth(label, 13, 600), turn === 90 || turn === 270);
