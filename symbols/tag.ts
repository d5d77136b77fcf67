import type { SymbolArt } from './art.ts';
import { line, polygon } from './pen.ts';

const lead = 6;
const point = 8;
const halfHeight = 10;

/** Room a tag's outline needs round a label of `labelWidth` pixels, and where the label's centre comes. */
export const tagLabelCentre = (labelWidth: number, upright: boolean): readonly [number, number] =>
  upright ? [0, lead + point + halfHeight - 2] : [lead + point + labelWidth / 2 + 2, 0];

/**
 * A flag that points at its wire. Its label is never turned, so where the tag stands upright (turned a quarter)
 * the outline is another one, given as it comes *before* turning: as wide across the wire as the label is long.
 */
export const tagArt = (labelWidth: number, upright = false): SymbolArt => {
  const pins = { node: [0, 0] } as const;
  if (upright) {
    const half = labelWidth / 2 + 7;
    const end = lead + point + 2 * halfHeight - 4;
    return {
      pins,
      shapes: [
        line([0, 0], [lead, 0]),
        polygon('paper', [lead, 0], [lead + point, -half], [end, -half], [end, half], [lead + point, half]),
      ],
      body: { left: 0, top: -half, right: end, bottom: half },
    };
  }
  const end = lead + point + labelWidth + 8;
  return {
    pins,
    shapes: [
      line([0, 0], [lead, 0]),
      polygon(
        'paper',
        [lead, 0],
        [lead + point, -halfHeight],
        [end, -halfHeight],
        [end, halfHeight],
        [lead + point, halfHeight],
      ),
    ],
    body: { left: 0, top: -halfHeight, right: end, bottom: halfHeight },
  };
};

/** As it stands in a drawer, before it has a label. */
export const tag: SymbolArt = tagArt(22);
