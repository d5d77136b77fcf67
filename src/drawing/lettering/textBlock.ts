import type { Box } from '../../../symbols/art.ts';
import type { Point } from '../boxes.ts';
import { ascent, baselineBelowMiddle, descent, textWidth } from '../fontMetrics.ts';
import type { Belonging, Primitive, Role, TextPrimitive } from '../primitives.ts';

/** A piece of a line in one weight. */
export interface TextRun {
  readonly text: string;
  readonly weight: 400 | 600;
  readonly role: Role;
  readonly thing: Belonging['thing'];
}

export type TextLine = readonly TextRun[];

/** Lines of text put somewhere: `at` is the left end, middle or right end of the block, half way down it. */
export interface TextBlock {
  readonly lines: readonly TextLine[];
  readonly at: Point;
  readonly align: 'left' | 'centre' | 'right';
  readonly size: number;
}

/** From one baseline to the next. */
export const lineHeight = 16;

const space = (size: number, weight: 400 | 600): number => textWidth(' ', size, weight);

const lineWidth = (line: TextLine, size: number): number =>
  line.reduce(
    (sum, { text, weight }, index) =>
      sum + textWidth(text, size, weight) + (index === 0 ? 0 : space(size, weight)),
    0,
  );

interface PlacedRun {
  readonly run: TextRun;
  readonly x: number;
  readonly y: number;
}

const placedRuns = ({ lines, at: [x, y], align, size }: TextBlock): readonly PlacedRun[] =>
  lines.flatMap((line, row) => {
    const width = lineWidth(line, size);
    let left = align === 'left' ? x : align === 'right' ? x - width : x - width / 2;
    const baseline = y + (row - (lines.length - 1) / 2) * lineHeight + baselineBelowMiddle(size);
    return line.map((run, index) => {
      if (index > 0) left += space(size, run.weight);
      const placed = { run, x: left, y: baseline };
      left += textWidth(run.text, size, run.weight);
      return placed;
    });
  });

/** Width and height of a block, tails and tall letters included. */
export const blockExtent = (
  lines: readonly TextLine[],
  size: number,
): { readonly width: number; readonly above: number; readonly below: number } => {
  let width = 0;
  for (const line of lines) width = Math.max(width, lineWidth(line, size));
  const half = ((lines.length - 1) / 2) * lineHeight;
  const baseline = baselineBelowMiddle(size);
  return { width, above: half + ascent * size - baseline, below: half + descent * size + baseline };
};

/** The box of a block, tails included. */
export const blockBox = ({ lines, at: [x, y], align, size }: TextBlock): Box => {
  const { width, above, below } = blockExtent(lines, size);
  const left = align === 'left' ? x : align === 'right' ? x - width : x - width / 2;
  return { left, top: y - above, right: left + width, bottom: y + below };
};

/** Room of a block of so many lines above and below its middle. */
export const blockHeight = (lines: number, size: number): number => (lines - 1) * lineHeight + size;

export const blockTexts = (
  block: TextBlock,
  id: string,
  of: string,
  layer: Belonging['layer'],
  struck = false,
): readonly Primitive[] =>
  placedRuns(block).map(({ run, x, y }, index): TextPrimitive => ({
    kind: 'text',
    id: `${id}/${run.thing}${index}`,
    of,
    layer,
    thing: run.thing,
    text: run.text,
    x,
    y,
    size: block.size,
    weight: run.weight,
    align: 'left',
    role: run.role,
    ...(struck ? { struck } : {}),
  }));
