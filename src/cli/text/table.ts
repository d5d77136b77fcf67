import { widthOf } from './width.ts';

/** Plain tables for a terminal: columns as wide as their widest cell, figures to the right, words to the left. */
export interface Column {
  readonly title: string;
  readonly align: 'left' | 'right';
}

const padded = (text: string, width: number, align: 'left' | 'right'): string => {
  const space = ' '.repeat(Math.max(0, width - widthOf(text)));
  return align === 'left' ? text + space : space + text;
};

/**
 * @param rows as many cells as there are columns
 * @param indent spaces before every line
 * @returns a line of titles and a line a row, two spaces between columns, no trailing spaces
 */
export const table = (
  columns: readonly Column[],
  rows: readonly (readonly string[])[],
  indent = 2,
): readonly string[] => {
  const all = [columns.map((column) => column.title), ...rows];
  const widths = columns.map((_, index) => Math.max(...all.map((row) => widthOf(row[index] ?? ''))));
  return all.map((row) =>
    (
      ' '.repeat(indent) +
      columns.map((column, index) => padded(row[index] ?? '', widths[index] ?? 0, column.align)).join('  ')
    ).trimEnd(),
  );
};
