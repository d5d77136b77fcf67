/** Gives every column a row of its own in which it has an entry, as far as that is possible. */
import type { SparsePattern } from './pattern.ts';

/** A row no column took, or a column that found no row. */
export const unmatched = -1;

/**
 * Maximum matching of columns to rows by augmenting paths, the diagonal first and then any free row
 * (I. S. Duff, "On algorithms for obtaining a maximum transversal", ACM TOMS 7, 1981, 315–330).
 * In nodal analysis the rows and columns of voltage sources have no diagonal entry; the matching pairs them
 * with rows and columns of nodes.
 *
 * @returns length `size`: the row of each column, or −1. A column at −1 means that the matrix is singular
 *   whatever its values are.
 */
export function matchColumns(pattern: SparsePattern): Int32Array {
  const { size, columnStart, rowIndex } = pattern;
  const rowOf = new Int32Array(size).fill(unmatched);
  const columnOf = new Int32Array(size).fill(unmatched);
  takeDiagonals(pattern, rowOf, columnOf);

  const visitedFor = new Int32Array(size).fill(-1); // per row: the start column of the search that saw it last
  const pathColumn = new Int32Array(size);
  const pathSlot = new Int32Array(size); // the slot being tried in each column of the path
  for (let start = 0; start < size; start++) {
    if (rowOf[start] !== unmatched) continue;
    let depth = 0;
    pathColumn[0] = start;
    pathSlot[0] = columnStart[start]!;
    while (depth >= 0) {
      const column = pathColumn[depth]!;
      if (pathSlot[depth]! >= columnStart[column + 1]!) {
        depth--;
        if (depth >= 0) pathSlot[depth]!++;
        continue;
      }
      const row = rowIndex[pathSlot[depth]!]!;
      if (visitedFor[row] === start) {
        pathSlot[depth]!++;
        continue;
      }
      visitedFor[row] = start;
      const owner = columnOf[row]!;
      if (owner === unmatched) {
        // A free row ends the path: every column on it moves to the row it was trying.
        for (; depth >= 0; depth--) {
          const taken = rowIndex[pathSlot[depth]!]!;
          rowOf[pathColumn[depth]!] = taken;
          columnOf[taken] = pathColumn[depth]!;
        }
        break;
      }
      depth++;
      pathColumn[depth] = owner;
      pathSlot[depth] = columnStart[owner]!;
    }
  }
  return rowOf;
}

function takeDiagonals(pattern: SparsePattern, rowOf: Int32Array, columnOf: Int32Array): void {
  const { size, columnStart, rowIndex } = pattern;
  for (let column = 0; column < size; column++)
    for (let slot = columnStart[column]!; slot < columnStart[column + 1]!; slot++)
      if (rowIndex[slot] === column) {
        rowOf[column] = column;
        columnOf[column] = column;
      }
}
