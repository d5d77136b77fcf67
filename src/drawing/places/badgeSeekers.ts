import { badgeBoxes, badgePlaces, type BadgePlace } from '../badgeRoom.ts';
import { union, type Point } from '../boxes.ts';
import type { Occupancy } from '../occupancy.ts';
import { badgeLines } from '../shapes/badges.ts';
import type { WantedBadge } from '../wanted/wanted.ts';
import type { Place, Seeker } from './solve.ts';

export type SoughtBadge = Place & BadgePlace;

/** Clear paper round the words. */
const clearanceWanted = 10;

/** So many places close by are choice enough. */
const enough = 24;

export const badgeSeeker = (
  badge: WantedBadge,
  occupancy: Occupancy,
  dragged: Point | undefined,
): Seeker<SoughtBadge> => {
  const lines = badgeLines(badge, false);
  const near = badgePlaces(badge.part, lines, 'near');
  const [first] = near;
  if (dragged !== undefined && first !== undefined) {
    return { id: badge.id, places: [movedTo(first, dragged)], fixed: true };
  }
  const free = (places: readonly BadgePlace[]): SoughtBadge[] =>
    places.flatMap((place): SoughtBadge[] => {
      const boxes = badgeBoxes(place);
      if (!boxes.every((box) => occupancy.isFree(box))) return [];
      const whole = union(boxes) ?? { left: 0, top: 0, right: 0, bottom: 0 };
      const room = occupancy.clearance(whole, clearanceWanted);
      return [{ ...place, boxes, shares: [], cost: place.cost + (clearanceWanted - room) * 0.4 }];
    });
  const close = free(near);
  const places = close.length >= enough ? close : free(badgePlaces(badge.part, lines, 'anywhere'));
  return { id: badge.id, places: places.sort((a, b) => a.cost - b.cost) };
};

const movedTo = (place: BadgePlace, corner: Point): SoughtBadge => {
  const shift = [corner[0] - place.corner[0], corner[1] - place.corner[1]] as const;
  const { words } = place;
  const moved = {
    ...place,
    corner,
    words: { ...words, at: [words.at[0] + shift[0], words.at[1] + shift[1]] as const },
  };
  return { ...moved, boxes: badgeBoxes(moved), shares: [], cost: 0 };
};
