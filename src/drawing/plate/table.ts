/** A table as primitives: columns as wide as their text, the last one taking what is left and breaking its lines. */
import { baselineBelowMiddle, textWidth, wrapped } from '../fontMetrics.ts';
import { polyline } from '../paths.ts';
import type { Primitive, Role } from '../primitives.ts';

export interface Cell {
  readonly text: string;
  readonly role?: Role;
  readonly weight?: 400 | 600;
  readonly align?: 'left' | 'right';
}

export interface Table {
  /** Column headings, in the order of the cells. */
  readonly headings: readonly string[];
  readonly rows: readonly (readonly Cell[])[];
}

const size = 13;
const headingSize = 11;
const lineHeight = 18;
const gap = 22;
const rowPadding = 3;

/** @returns the table's primitives and the height it takes. */
export const tableShapes = (
  id: string,
  table: Table,
  left: number,
  top: number,
  width: number,
): { readonly shapes: readonly Primitive[]; readonly height: number } => {
  const widths = columnWidths(table, width);
  const starts = widths.map((_, column) =>
    widths.slice(0, column).reduce((sum, other) => sum + other + gap, left),
  );
  const shapes: Primitive[] = table.headings.map((text, column) => {
    const isRight = table.rows[0]?.[column]?.align === 'right';
    return {
      kind: 'text',
      id: `${id}/heading${column}`,
      layer: 'still',
      thing: 'title',
      text,
      x: (starts[column] ?? left) + (isRight ? (widths[column] ?? 0) : 0),
      y: top + lineHeight / 2 + baselineBelowMiddle(headingSize),
      size: headingSize,
      weight: 600,
      align: isRight ? 'right' : 'left',
      role: 'soft',
    };
  });
  let y = top + lineHeight + 2;
  for (const [row, cells] of table.rows.entries()) {
    shapes.push({
      kind: 'path',
      id: `${id}/rule${row}`,
      layer: 'still',
      thing: 'frame',
      commands: polyline([
        [left, y],
        [left + width, y],
      ]),
      stroke: 'hair',
      width: 1,
    });
    const columns = cells.map((cell, column) =>
      wrapped(cell.text, widths[column] ?? width, size, cell.weight),
    );
    for (const [column, lines] of columns.entries()) {
      const { role = 'ink', weight = 400, align = 'left' } = cells[column] ?? {};
      for (const [line, text] of lines.entries()) {
        if (text === '') continue;
        shapes.push({
          kind: 'text',
          id: `${id}/cell${row}-${column}-${line}`,
          layer: 'still',
          thing: 'title',
          text,
          x: (starts[column] ?? left) + (align === 'right' ? (widths[column] ?? 0) : 0),
          y: y + rowPadding + (line + 0.5) * lineHeight + baselineBelowMiddle(size),
          size,
          weight,
          align,
          role,
        });
      }
    }
    y += 2 * rowPadding + lineHeight * Math.max(1, ...columns.map(({ length }) => length));
  }
  return { shapes, height: y - top };
};

/** Every column but the last is as wide as its widest text. */
const columnWidths = ({ headings, rows }: Table, width: number): readonly number[] => {
  const natural = headings.map((heading, column) =>
    Math.max(
      textWidth(heading, headingSize, 600),
      ...rows.map((cells) => {
        const cell = cells[column];
        return cell === undefined ? 0 : textWidth(cell.text, size, cell.weight ?? 400);
      }),
    ),
  );
  const before = natural.slice(0, -1).reduce((sum, one) => sum + one + gap, 0);
  return [...natural.slice(0, -1), Math.max(80, width - before)];
};
