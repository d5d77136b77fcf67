/** Where the value strip stands: at its part, on the side on which it covers least of the circuit. */
import type { Box } from '../../../symbols/art.ts';
import { boxAt } from '../../drawing/boxes.ts';
import { apply, type Point, type Size, type Viewport } from '../viewport.ts';

export const stripSize: Size = { width: 348, height: 113 };
/** Room between wash and strip for the notch, and beside the lead, screen pixels. */
const gap = 14;
/** Room to the sheet's edges. */
const edge = 8;

export interface Side {
  readonly below: boolean;
  readonly right: boolean;
}

/** In order of preference. */
const sides: readonly Side[] = [
  { below: true, right: true },
  { below: true, right: false },
  { below: false, right: true },
  { below: false, right: false },
];

export interface StripAt {
  readonly left: number;
  readonly top: number;
  /** Where the notch is, from the strip's left. */
  readonly notch: number;
}

interface Surroundings {
  /** The wash behind the part, and the height of its lead, sheet pixels. */
  readonly wash: Box;
  readonly lead: number;
  readonly viewport: Viewport;
  readonly sheet: Size;
}

const clamp = (at: number, most: number): number => Math.min(Math.max(at, edge), Math.max(edge, most - edge));

/** Beside the part's lead on a side of it; always whole on the sheet. */
export const stripAt = ({ wash, lead, viewport, sheet }: Surroundings, { below, right }: Side): StripAt => {
  const [leadX, bottom] = apply(viewport, [lead, wash.bottom]);
  const [washRight, top] = apply(viewport, [wash.right, wash.top]);
  const [washLeft] = apply(viewport, [wash.left, 0]);
  const left = clamp(right ? leadX + gap : leadX - gap - stripSize.width, sheet.width - stripSize.width);
  const wanted = below ? bottom + gap : top - gap - stripSize.height;
  const middle = (Math.max(washLeft, left) + Math.min(washRight, left + stripSize.width)) / 2;
  return {
    left: Math.round(left),
    top: Math.round(clamp(wanted, sheet.height - stripSize.height)),
    notch: Math.round(Math.min(Math.max(middle - left, 16), stripSize.width - 16)),
  };
};

/** The side on which the strip covers least, the wash itself counting most. */
export const sideOf = (around: Surroundings, things: readonly Box[]): Side => {
  const { wash, viewport } = around;
  const onScreen = (box: Box): Box => {
    const corner = (at: Point) => apply(viewport, at);
    const [left, top] = corner([box.left, box.top]);
    const [right, bottom] = corner([box.right, box.bottom]);
    return { left, top, right, bottom };
  };
  const boxes = things.map(onScreen);
  const own = onScreen(wash);
  let best: { readonly side: Side; readonly covered: number } | undefined;
  for (const side of sides) {
    const { left, top } = stripAt(around, side);
    const strip = boxAt(left, top, stripSize.width, stripSize.height);
    let covered = 100 * shared(strip, own);
    for (const box of boxes) covered += shared(strip, box);
    if (best === undefined || covered < best.covered) best = { side, covered };
  }
  return best?.side ?? { below: true, right: true };
};

const shared = (a: Box, b: Box): number =>
  Math.max(0, Math.min(a.right, b.right) - Math.max(a.left, b.left)) *
  Math.max(0, Math.min(a.bottom, b.bottom) - Math.max(a.top, b.top));
