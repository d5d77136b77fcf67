/** The structural pattern of a square sparse matrix: which entries may ever be other than zero. */

/**
 * A square pattern in compressed columns. It is made from the structure alone and never read off values, so
 * that an entry which happens to be zero at one operating point still has its place.
 *
 * A row or column of −1 stands for the reference node: what is stamped there goes to the spare slot at the
 * end of the values and is read by nobody, so stamping needs no case for ground.
 */
export interface SparsePattern {
  /** Number of rows, and of columns. */
  readonly size: number;
  /** Number of structural entries; also the index of the spare slot. */
  readonly entryCount: number;
  /** Length `size + 1`: column `c` holds the slots from `columnStart[c]` up to but not `columnStart[c + 1]`. */
  readonly columnStart: Int32Array;
  /** Length `entryCount`: the row of each slot, ascending within a column, no row twice. */
  readonly rowIndex: Int32Array;
  /** The slot of an entry; the spare slot where row or column is −1. Throws where the entry is not in the pattern. */
  slotOf(row: number, column: number): number;
}

export type EntryPlace = readonly [row: number, column: number];

/**
 * Builds the pattern of a `size` by `size` matrix. Pairs may repeat and come in any order; pairs with a −1 are
 * passed over. Throws a RangeError for a place outside the matrix.
 */
export function createPattern(size: number, places: Iterable<EntryPlace>): SparsePattern {
  if (!Number.isInteger(size) || size < 0)
    throw new RangeError(`pattern size must be 0 or more, got ${size}`);
  const keys: number[] = [];
  for (const [row, column] of places) {
    checkPlace(size, row, column);
    if (row >= 0 && column >= 0) keys.push(column * size + row);
  }
  const sorted = Float64Array.from(keys).sort();
  const columnStart = new Int32Array(size + 1);
  const rowIndex = new Int32Array(sorted.length);
  let entryCount = 0;
  let previous = -1;
  for (const key of sorted) {
    if (key === previous) continue;
    previous = key;
    const column = Math.floor(key / size);
    rowIndex[entryCount++] = key - column * size;
    columnStart[column + 1]!++;
  }
  for (let column = 0; column < size; column++) columnStart[column + 1]! += columnStart[column]!;
  return patternOf(size, columnStart, rowIndex.slice(0, entryCount));
}

function patternOf(size: number, columnStart: Int32Array, rowIndex: Int32Array): SparsePattern {
  const entryCount = rowIndex.length;
  return {
    size,
    entryCount,
    columnStart,
    rowIndex,
    slotOf(row, column) {
      checkPlace(size, row, column);
      if (row < 0 || column < 0) return entryCount;
      let low = columnStart[column]!;
      let high = columnStart[column + 1]! - 1;
      while (low <= high) {
        const middle = (low + high) >> 1;
        const found = rowIndex[middle]!;
        if (found === row) return middle;
        if (found < row) low = middle + 1;
        else high = middle - 1;
      }
      throw new RangeError(`entry (${row}, ${column}) is not in the pattern`);
    },
  };
}

function checkPlace(size: number, row: number, column: number): void {
  const outside = (index: number) => !Number.isInteger(index) || index < -1 || index >= size;
  if (outside(row) || outside(column))
    throw new RangeError(`entry (${row}, ${column}) is outside a matrix of size ${size}`);
}
