/** Finds places for parts whose neighbours stand already: each the nearest free one to the pins it is wired to. */
import type { DrawnEnd, DrawnStage } from '../routing/document.ts';
import { boxesOverlap, type GridBox, type GridPoint } from '../routing/grid.ts';
import { letteringOf } from '../routing/lettering.ts';
import { endKey } from '../routing/nets.ts';
import { reachOf, type StandingPart } from '../routing/shape.ts';
import type { Net, Unit } from './circuit.ts';
import { standingOf } from './columns.ts';
import { stanceOf, standUnit, type Place } from './places.ts';
import { spacing } from './spacing.ts';

/** How far round its neighbours a place is looked for, grid units, ring by ring. */
const reaches = [14, 28, 56, 112];

/** Room kept round a body where there is any. */
const clear = 1.5;

/**
 * Places for the parts of a group that have none. The part with most wires to what stands is next; the answer depends
 * on the document alone.
 */
export const fitIn = (
  document: DrawnStage,
  group: readonly Unit[],
  fixed: ReadonlyMap<Unit, Place>,
  heights: ReadonlyMap<Net, number>,
  signals: ReadonlySet<Unit>,
): ReadonlyMap<Unit, Place> => {
  const stances = stancesOf(group, heights, signals);
  const standing = new Map<Unit, StandingPart>(
    [...fixed].map(([unit, place]) => [unit, standUnit(unit, place)]),
  );
  const found = new Map<Unit, Place>();
  const wires = wiresAt(document);
  const joints = jointsWithPlaces(document, group);
  const open = new Set(group.filter((unit) => !fixed.has(unit)));
  const taken: GridBox[] = [...standing.values()].flatMap(roomOf);
  for (const [x, y] of Object.values(document.joints))
    taken.push(grown({ left: x, right: x, top: y, bottom: y }, 0.5));
  while (open.size > 0) {
    const links = new Map([...open].map((unit) => [unit, linksOf(unit, wires, joints, standing)]));
    const count = (unit: Unit): number => links.get(unit)?.length ?? 0;
    const [unit] = [...open].sort((a, b) => count(b) - count(a) || a.rank - b.rank);
    if (unit === undefined) break;
    open.delete(unit);
    const stance = stances.get(unit) ?? { turn: 0, mirror: false };
    const place = placeFor(unit, stance, links.get(unit) ?? [], taken);
    found.set(unit, place);
    const part = standUnit(unit, place);
    standing.set(unit, part);
    taken.push(...roomOf(part));
  }
  return found;
};

type Stance = Pick<Place, 'turn' | 'mirror'>;

const stancesOf = (
  group: readonly Unit[],
  heights: ReadonlyMap<Net, number>,
  signals: ReadonlySet<Unit>,
): ReadonlyMap<Unit, Stance> => {
  const stances = new Map<Unit, Stance>();
  for (const column of standingOf(group, heights, signals).columns) {
    for (const upright of column) stances.set(upright.unit, stanceOf(upright, false));
  }
  return stances;
};

const grown = ({ left, top, right, bottom }: GridBox, by: number): GridBox => ({
  left: left - by,
  top: top - by,
  right: right + by,
  bottom: bottom + by,
});

const roomOf = (part: StandingPart): GridBox[] => [grown(reachOf(part), clear), ...letteringOf(part)];

interface Link {
  readonly pin: string;
  readonly to: GridPoint;
}

/** For each end of a wire, `part.pin` or a joint, the ends that wires join it with. */
const wiresAt = (document: DrawnStage): ReadonlyMap<string, readonly DrawnEnd[]> => {
  const wires = new Map<string, DrawnEnd[]>();
  for (const { ends } of Object.values(document.wires)) {
    for (const [one, other] of [ends, [ends[1], ends[0]]] as const) {
      wires.set(endKey(one), [...(wires.get(endKey(one)) ?? []), other]);
    }
  }
  return wires;
};

/** Joints whose place counts: those of a net on which something stands. */
const jointsWithPlaces = (document: DrawnStage, group: readonly Unit[]): ReadonlyMap<string, GridPoint> => {
  const joints = new Map<string, GridPoint>();
  for (const net of new Set(group.flatMap(({ nets }) => [...nets.values()]))) {
    for (const joint of net.joints) {
      const at = document.joints[joint];
      if (at !== undefined) joints.set(joint, at);
    }
  }
  return joints;
};

/** Where the wires of a unit lead: what they end on, or what else stands on the net where that has no place yet. */
const linksOf = (
  unit: Unit,
  wires: ReadonlyMap<string, readonly DrawnEnd[]>,
  joints: ReadonlyMap<string, GridPoint>,
  standing: ReadonlyMap<Unit, StandingPart>,
): readonly Link[] => {
  const byId = new Map([...standing].map(([one, part]) => [one.id, part]));
  const links: Link[] = [];
  for (const [pin, net] of unit.nets) {
    const direct = (wires.get(endKey([unit.id, pin])) ?? []).flatMap(([id, theirs]) => {
      const at = theirs === undefined ? joints.get(id) : byId.get(id)?.pins.get(theirs)?.at;
      return at === undefined ? [] : [{ pin, to: at }];
    });
    links.push(...direct);
    if (direct.length > 0) continue;
    for (const { unit: other, pin: theirs } of net.members) {
      const at = other === unit ? undefined : standing.get(other)?.pins.get(theirs)?.at;
      if (at !== undefined) links.push({ pin, to: at });
    }
  }
  return links;
};

const placeFor = (unit: Unit, stance: Stance, links: readonly Link[], taken: readonly GridBox[]): Place => {
  const here = standUnit(unit, { at: [0, 0], ...stance });
  const rooms = roomOf(here);
  const bare = [reachOf(here)];
  const middle = middleOf(links.map(({ to }) => to));
  // Without any room for its text a part still finds one for itself: the last ring is wider than all that stands.
  for (const room of [rooms, bare]) {
    for (const reach of reaches) {
      const place = nearest(middle, reach, (x, y) => {
        if (room.some((box) => taken.some((other) => boxesOverlap(shifted(box, x, y), other))))
          return Infinity;
        return priceAt(here, links, x, y);
      });
      if (place !== undefined) return { at: place, ...stance };
    }
  }
  const right = Math.max(0, ...taken.map((box) => box.right));
  return { at: [Math.ceil(right) + spacing.groups, middle[1]], ...stance };
};

const nearest = (
  [middleX, middleY]: GridPoint,
  reach: number,
  price: (x: number, y: number) => number,
): GridPoint | undefined => {
  let best: GridPoint | undefined;
  let least = Infinity;
  for (let y = middleY - reach; y <= middleY + reach; y++) {
    for (let x = middleX - reach; x <= middleX + reach; x++) {
      const here = price(x, y);
      if (here >= least) continue;
      least = here;
      best = [x, y];
    }
  }
  return best;
};

/** Length of the wires to its neighbours, with what a bend costs and what leaving a pin the wrong way costs. */
const priceAt = (here: StandingPart, links: readonly Link[], x: number, y: number): number => {
  let price = links.length === 0 ? Math.abs(x) + Math.abs(y) : 0;
  for (const { pin, to } of links) {
    const own = here.pins.get(pin);
    if (own === undefined) continue;
    const dx = to[0] - (own.at[0] + x);
    const dy = to[1] - (own.at[1] + y);
    const ahead = [dx, dy, -dx, -dy][own.heading] ?? 0;
    price +=
      Math.abs(dx) +
      Math.abs(dy) +
      (dx !== 0 && dy !== 0 ? 4 : 0) +
      (ahead <= 0 ? 12 : ahead < spacing.power ? 4 : 0);
  }
  return price;
};

const middleOf = (points: readonly GridPoint[]): GridPoint => {
  const median = (values: readonly number[]): number =>
    [...values].sort((a, b) => a - b)[values.length >> 1] ?? 0;
  return [median(points.map(([x]) => x)), median(points.map(([, y]) => y))];
};

const shifted = ({ left, top, right, bottom }: GridBox, x: number, y: number): GridBox => ({
  left: left + x,
  top: top + y,
  right: right + x,
  bottom: bottom + y,
});
