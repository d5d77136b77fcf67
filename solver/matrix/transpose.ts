/** A pattern's rows: the compressed columns turned into compressed rows. */
import type { SparsePattern } from './pattern.ts';

export interface PatternRows {
  /** Length `size + 1`: row `r` holds the places from `rowStart[r]` up to but not `rowStart[r + 1]`. */
  readonly rowStart: Int32Array;
  /** Length `entryCount`: the column of each place, ascending within a row. */
  readonly columnIndex: Int32Array;
  /** Length `entryCount`: the slot of each place. */
  readonly slot: Int32Array;
}

/** Counts each row's entries, then deals the columns out in order: linear in the number of entries. */
export function rowsOf(pattern: SparsePattern): PatternRows {
  const { size, entryCount, columnStart, rowIndex } = pattern;
  const rowStart = new Int32Array(size + 1);
  for (let slot = 0; slot < entryCount; slot++) rowStart[rowIndex[slot]! + 1]!++;
  for (let row = 0; row < size; row++) rowStart[row + 1]! += rowStart[row]!;
  const next = rowStart.slice(0, size);
  const columnIndex = new Int32Array(entryCount);
  const slotOfPlace = new Int32Array(entryCount);
  for (let column = 0; column < size; column++)
    for (let slot = columnStart[column]!; slot < columnStart[column + 1]!; slot++) {
      const place = next[rowIndex[slot]!]!++;
      columnIndex[place] = column;
      slotOfPlace[place] = slot;
    }
  return { rowStart, columnIndex, slot: slotOfPlace };
}
