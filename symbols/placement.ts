import type { Box } from './art.ts';

export type Turn = 0 | 90 | 180 | 270;

/** How a symbol stands: mirrored first (x → −x), then turned clockwise. */
export interface Stance {
  readonly mirror: boolean;
  readonly turn: Turn;
}

export const asDrawn: Stance = { mirror: false, turn: 0 };

const without = (value: number): number => (value === 0 ? 0 : value);

/** Where an offset from a symbol's origin comes to lie. Exact for whole numbers; no negative zero. */
export const standing = (
  [x, y]: readonly [number, number],
  { mirror, turn }: Stance,
): readonly [number, number] => {
  const across = mirror ? -x : x;
  switch (turn) {
    case 0:
      return [without(across), without(y)];
    case 90:
      return [without(-y), without(across)];
    case 180:
      return [without(-across), without(-y)];
    case 270:
      return [without(y), without(-across)];
  }
};

/** The box that holds a symbol's box once it is mirrored and turned. */
export const standingBox = (box: Box, stance: Stance): Box => {
  const [ax, ay] = standing([box.left, box.top], stance);
  const [bx, by] = standing([box.right, box.bottom], stance);
  return { left: Math.min(ax, bx), top: Math.min(ay, by), right: Math.max(ax, bx), bottom: Math.max(ay, by) };
};
