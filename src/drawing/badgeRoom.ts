/**
 * The block of a badge: the frame, the word and the current beside or under it. Places for it round a transistor or
 * a diode, best first.
 */
import type { Box } from '../../symbols/art.ts';
import { badgeClearance } from './badge/badge.ts';
import { badgeSize } from './badge/curves.ts';
import { boxAt, grown, union, type Point } from './boxes.ts';
import { blockBox, type TextBlock, type TextLine } from './lettering/textBlock.ts';
import { facingOf } from './lettering/facing.ts';
import type { ScenePart } from './scene.ts';

export interface BadgePlace {
  readonly corner: Point;
  readonly words: TextBlock;
}

/** From the frame to the word. */
const besideFrame = 11;
const fromBody = 15;
const { width, height } = badgeSize;

/** Boxes a placed badge takes: the frame with what a missed duty draws round it, and the words. */
export const badgeBoxes = ({ corner: [x, y], words }: BadgePlace): readonly Box[] => [
  grown(boxAt(x, y, width, height), badgeClearance - 2),
  blockBox(words),
];

export const badgeBlock = (place: BadgePlace): Box => union(badgeBoxes(place)) ?? boxAt(0, 0, 0, 0);

type Side = 'right' | 'left' | 'under' | 'over';

const block = (corner: Point, lines: readonly TextLine[], words: Side): BadgePlace => {
  const [x, y] = corner;
  const half = ((lines.length - 1) * 16) / 2 + 6;
  const at: Point =
    words === 'right'
      ? [x + width + besideFrame, y + height / 2]
      : words === 'left'
        ? [x - besideFrame, y + height / 2]
        : words === 'under'
          ? [x, y + height + 9 + half]
          : [x, y - 9 - half];
  return { corner, words: { lines, at, align: words === 'left' ? 'right' : 'left', size: 13 } };
};

/** Places round a part, in order of liking. */
export const badgePlaces = (part: ScenePart, lines: readonly TextLine[]): readonly BadgePlace[] => {
  const { body, origin } = part;
  const facing = facingOf(part);
  const right = body.right + fromBody;
  const left = body.left - fromBody - width;
  const level = origin[1] - 16;
  const steps = [0, 6, -6, 12, -12, 18, -18, 24, -24, 36, -36, 48, -48];
  const at = (x: number, words: Side, rows: readonly number[] = steps) =>
    rows.map((step) => block([x, level + step], lines, words));
  const onRight = [...at(right, 'right'), ...at(right, 'under'), ...at(right, 'over')];
  const onLeft = [...at(left, 'left'), ...at(left, 'under'), ...at(left, 'over')];
  const farther = [12, 24, 36, 48, 72, 96].flatMap((way) => [
    ...at(right + way, 'right'),
    ...at(left - way, 'left'),
    ...at(right + way, 'under'),
    ...at(left - way, 'under'),
  ]);
  const columns = [0, 12, -12, 24, -24, 36, -36, 48, -48, 60, -60, 84, -84, 108, -108];
  const overAndUnder = [20, 32, 44, 62, 80].flatMap((way) =>
    columns.flatMap((step) => [
      block([origin[0] - width / 2 + step, body.top - way - height], lines, 'right'),
      block([origin[0] - width / 2 + step, body.bottom + way], lines, 'right'),
    ]),
  );
  const away = facing.form === 'transistor' ? facing.away : facing.form === 'lying' ? 'up' : 'right';
  switch (away) {
    case 'right':
      return [...onRight, ...onLeft, ...farther, ...overAndUnder];
    case 'left':
      return [...onLeft, ...onRight, ...farther, ...overAndUnder];
    case 'up':
    case 'down':
      return [...overAndUnder, ...onRight, ...onLeft, ...farther];
  }
};
