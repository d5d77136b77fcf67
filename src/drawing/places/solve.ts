/**
 * Gives each reading a place of its own. The ones with the fewest places left choose first; one that finds nothing
 * free may ask those in its way to move; then each looks once more for something better. No chance anywhere: the same
 * drawing always comes out the same.
 */
import type { Box } from '../../../symbols/art.ts';
import type { Occupancy } from '../occupancy.ts';

export interface Place {
  readonly boxes: readonly Box[];
  /** Less is better. */
  readonly cost: number;
  /** Owners of room that this place may share: the line on which it sits. */
  readonly shares: readonly string[];
}

export interface Seeker<Where extends Place> {
  readonly id: string;
  /** Best first. */
  readonly places: readonly Where[];
  /** Put here by a person: the only place, and taken whatever stands there. */
  readonly fixed?: boolean;
}

/** How many ways of asking others to move are tried for one reading. */
const attempts = 80;
const rounds = 2;

/** The place of each seeker by its id; those for which there is none are left out. Takes the room it gives. */
export const solvePlaces = <Where extends Place>(
  seekers: readonly Seeker<Where>[],
  occupancy: Occupancy,
): ReadonlyMap<string, Where> => {
  const given = new Map<string, Where>();

  const isFree = ({ boxes, shares }: Where): boolean =>
    boxes.every((box) => occupancy.isFree(box, (owner) => shares.includes(owner)));
  const give = (id: string, place: Where): void => {
    given.set(id, place);
    for (const box of place.boxes) occupancy.add(box, id);
  };
  const take = (id: string): Where | undefined => {
    const place = given.get(id);
    given.delete(id);
    occupancy.remove(id);
    return place;
  };

  for (const { id, places, fixed } of seekers) {
    const [place] = places;
    if (fixed === true && place !== undefined) give(id, place);
  }
  const free = seekers.filter(({ fixed }) => fixed !== true);
  const owners = new Set(free.map(({ id }) => id));
  const open = free.map(({ id, places }) => ({ id, places: places.filter(isFree) }));
  const placesOf = new Map(open.map(({ id, places }) => [id, places]));
  const inOrder = [...open].sort((a, b) => a.places.length - b.places.length);

  for (const { id, places } of inOrder) {
    const place = places.find(isFree);
    if (place !== undefined) give(id, place);
    else makeRoom(id, places);
  }
  for (let round = 0; round < rounds; round++) {
    for (const { id, places } of inOrder) {
      const former = take(id);
      const place = places.find(isFree);
      if (place !== undefined) give(id, place);
      else if (former !== undefined) give(id, former);
      else makeRoom(id, places);
    }
  }
  return given;

  /** Tries the places that only other readings stand in: each of these must find another. */
  function makeRoom(id: string, places: readonly Where[]): void {
    let tried = 0;
    for (const place of places) {
      const inTheWay = blockers(place);
      if (inTheWay === undefined || inTheWay.length > 2) continue;
      if (++tried > attempts) return;
      const former = inTheWay.map((other) => [other, take(other)] as const);
      give(id, place);
      const moved = inTheWay.every((other) => {
        const elsewhere = placesOf.get(other)?.find(isFree);
        if (elsewhere !== undefined) give(other, elsewhere);
        return elsewhere !== undefined;
      });
      if (moved) return;
      take(id);
      for (const [other, was] of former) {
        take(other);
        if (was !== undefined) give(other, was);
      }
    }
  }

  /** The readings that stand in a place; undefined where something stands there that cannot move. */
  function blockers({ boxes, shares }: Where): readonly string[] | undefined {
    const found = new Set<string>();
    for (const box of boxes) {
      for (const { owner } of occupancy.hits(box)) {
        if (shares.includes(owner)) continue;
        if (!owners.has(owner)) return undefined;
        found.add(owner);
      }
    }
    return [...found].sort();
  }
};
