/** The strip along the foot of a plate: what it shows, when, in which state, under which conditions, by which program. */
import { baselineBelowMiddle, textWidth, wrapped } from '../fontMetrics.ts';
import { polyline } from '../paths.ts';
import type { Primitive } from '../primitives.ts';

export interface TitleBlock {
  readonly title: string;
  readonly notes?: string;
  /** Label and text, in order; each text may have several lines. */
  readonly fields: readonly { readonly label: string; readonly lines: readonly string[] }[];
}

const padding = 12;
const labelSize = 11;
const size = 13;
const titleSize = 15;
const lineHeight = 18;

/** @returns the block's primitives and the height it takes. */
export const titleBlockShapes = (
  { title, notes = '', fields }: TitleBlock,
  left: number,
  top: number,
  width: number,
): { readonly shapes: readonly Primitive[]; readonly height: number } => {
  const fieldWidths = fields.map(
    ({ label, lines }) =>
      Math.max(textWidth(label, labelSize, 600), ...lines.map((line) => textWidth(line, size))) + 2 * padding,
  );
  const fieldsWidth = fieldWidths.reduce((sum, one) => sum + one, 0);
  const titleRoom = Math.max(160, width - fieldsWidth - 2 * padding);
  const titleLines = wrapped(title, titleRoom, titleSize, 600);
  const noteLines =
    notes.trim() === '' ? [] : notes.split(/\n+/).flatMap((line) => wrapped(line, titleRoom, 12));
  const most = Math.max(0, ...fields.map(({ lines }) => lines.length));
  const height =
    2 * padding +
    Math.max(
      (most + 1) * lineHeight,
      titleLines.length * 20 + noteLines.length * 16 + (noteLines.length > 0 ? 4 : 0),
    );

  const shapes: Primitive[] = [];
  const text = (id: string, words: string, x: number, middle: number, style: TextStyle): void => {
    shapes.push({
      kind: 'text',
      id: `plate/${id}`,
      layer: 'still',
      thing: 'title',
      text: words,
      x,
      y: middle + baselineBelowMiddle(style.size),
      align: 'left',
      ...style,
    });
  };
  const rule = (id: string, from: readonly [number, number], to: readonly [number, number]): void => {
    shapes.push({
      kind: 'path',
      id: `plate/${id}`,
      layer: 'still',
      thing: 'frame',
      commands: polyline([from, to]),
      stroke: 'line',
      width: 1,
    });
  };

  rule('title-rule', [left, top], [left + width, top]);
  for (const [index, line] of titleLines.entries()) {
    text(`title${index}`, line, left + padding, top + padding + 9 + index * 20, {
      size: titleSize,
      weight: 600,
      role: 'ink',
    });
  }
  for (const [index, line] of noteLines.entries()) {
    const middle = top + padding + titleLines.length * 20 + 12 + index * 16;
    text(`note${index}`, line, left + padding, middle, { size: 12, weight: 400, role: 'soft' });
  }
  let x = left + width - fieldsWidth;
  for (const [index, { label, lines }] of fields.entries()) {
    rule(`field-rule${index}`, [x, top], [x, top + height]);
    text(`label${index}`, label, x + padding, top + padding + 9, {
      size: labelSize,
      weight: 600,
      role: 'soft',
    });
    for (const [row, line] of lines.entries()) {
      const middle = top + padding + 9 + (row + 1) * lineHeight;
      text(`field${index}-${row}`, line, x + padding, middle, { size, weight: 400, role: 'ink' });
    }
    x += fieldWidths[index] ?? 0;
  }
  return { shapes, height };
};

interface TextStyle {
  readonly size: number;
  readonly weight: 400 | 600;
  readonly role: 'ink' | 'soft';
}
