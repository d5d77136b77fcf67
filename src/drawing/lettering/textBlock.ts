import type { Box } from '../../../symbols/art.ts';
import { union, type Point } from '../boxes.ts';
import { baselineBelowMiddle, textBox, textWidth } from '../fontMetrics.ts';
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

/** The box of a block, tails included. */
export const blockBox = (block: TextBlock): Box =>
  union(
    placedRuns(block).map(({ run, x, y }) => textBox({ ...run, x, y, size: block.size, align: 'left' })),
  ) ?? { left: block.at[0], top: block.at[1], right: block.at[0], bottom: block.at[1] };

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
