/**
 * The block of a badge: the frame, with the word and the current beside, under or over it. Places for it round a
 * transistor or a diode.
 */
import type { Box } from '../../symbols/art.ts';
import { badgeSize } from './badge/curves.ts';
import { boxAt, grown, union, type Point } from './boxes.ts';
import { facingOf } from './lettering/facing.ts';
import { blockBox, type TextBlock, type TextLine } from './lettering/textBlock.ts';
import type { ScenePart } from './scene.ts';

export interface BadgePlace {
  readonly corner: Point;
  readonly words: TextBlock;
  /** Less is better. */
  readonly cost: number;
}

/** From the frame to the word. */
const besideFrame = 11;
const fromBody = 15;
/** The second frame of a missed duty, and a little air. */
const frameReach = 5;
const { width, height } = badgeSize;

/** Boxes a placed badge takes: the frame with what a missed duty draws round it, and the words. */
export const badgeBoxes = ({ corner: [x, y], words }: BadgePlace): readonly Box[] => [
  grown(boxAt(x, y, width, height), frameReach),
  grown(blockBox(words), 2.5),
];

export const badgeBlock = (place: BadgePlace): Box => union(badgeBoxes(place)) ?? boxAt(0, 0, 0, 0);

type Words = 'right' | 'left' | 'under';

const block = (corner: Point, lines: readonly TextLine[], side: Words, cost: number): BadgePlace => {
  const [x, y] = corner;
  const size = 13;
  switch (side) {
    case 'right':
      return {
        corner,
        cost,
        words: { lines, at: [x + width + besideFrame, y + height / 2], align: 'left', size },
      };
    case 'left':
      return { corner, cost, words: { lines, at: [x - besideFrame, y + height / 2], align: 'right', size } };
    case 'under':
      // A stack takes more height but is no wider than its words.
      return {
        corner,
        cost: cost + 6,
        words: { lines, at: [x, y + height + 15 + ((lines.length - 1) * 16) / 2], align: 'left', size },
      };
  }
};

/** Shifts along the side of the part, and steps away from it. Farther off, nobody could tell whose badge it is. */
const along = [0, 6, -6, 12, -12, 18, -18, 24, -24, 36, -36];
const away = [0, 6, 12, 24, 36];

type Side = 'left' | 'right' | 'up' | 'down';

/** What each side costs by the side that the part likes best: the opposite one is better than going round a corner. */
const dislike = (side: Side, liked: Side): number => {
  if (side === liked) return 0;
  const isLevel = (one: Side) => one === 'left' || one === 'right';
  if (isLevel(side) !== isLevel(liked)) return isLevel(liked) ? 16 : 9;
  return isLevel(liked) ? 12 : 3;
};

/** How far round a part a place for its badge is looked for. */
export type Reach = 'near' | 'anywhere';

/** Best first. `near` keeps to the side that the part likes best. */
export const badgePlaces = (
  part: ScenePart,
  lines: readonly TextLine[],
  reach: Reach,
): readonly BadgePlace[] => {
  const { body, origin } = part;
  const facing = facingOf(part);
  const liked: Side = facing.form === 'transistor' ? facing.away : facing.form === 'lying' ? 'up' : 'right';
  // A diode's name is at its side; a transistor's is over the badge.
  const level = origin[1] - (facing.form === 'transistor' ? 16 : 20);
  const sides: readonly Side[] = reach === 'near' ? [liked] : ['right', 'left', 'up', 'down'];
  const places: BadgePlace[] = [];
  for (const way of reach === 'near' ? away.slice(0, 3) : away) {
    for (const shift of along) {
      const cost = way * 0.35 + Math.abs(shift) * 0.3;
      for (const side of sides) {
        const worth = cost + dislike(side, liked);
        if (side === 'right' || side === 'left') {
          const x = side === 'right' ? body.right + fromBody + way : body.left - fromBody - width - way;
          places.push(block([x, level + shift], lines, side, worth));
          places.push(block([x, level + shift], lines, 'under', worth));
        } else {
          const y = side === 'up' ? body.top - 20 - way - height : body.bottom + 20 + way;
          for (const column of [-60, -30, 0]) {
            const corner = [origin[0] + column + shift, y] as const;
            places.push(block(corner, lines, 'right', worth + (column === -30 ? 0 : 1)));
          }
        }
      }
    }
  }
  return places.sort((a, b) => a.cost - b.cost);
};
