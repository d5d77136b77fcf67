/** The order in which columns are eliminated, found once per pattern. */
import { blocksOf } from './blocks.ts';
import { blockGraph } from './graph.ts';
import { matchColumns, unmatched } from './matching.ts';
import { minimumDegreeOrder } from './minimumDegree.ts';
import type { SparsePattern } from './pattern.ts';

export interface EliminationOrder {
  /** Length `size`: the column eliminated at each position. */
  readonly columns: Int32Array;
  /** Length `size`: the row preferred as pivot at each position, the one matched to that column. */
  readonly rows: Int32Array;
  /** Length `blockCount + 1`: the positions at which the diagonal blocks start. */
  readonly blockStart: Int32Array;
  /** A column that can have no pivot whatever the values are, or −1; the other fields are then empty. */
  readonly deficientColumn: number;
}

/**
 * Rows are matched to columns, the matrix is parted into blocks that are solved one after another, and
 * within each block the columns are put in order of minimum degree on B + Bᵀ.
 */
export function eliminationOrder(pattern: SparsePattern): EliminationOrder {
  const { size } = pattern;
  const rowOf = matchColumns(pattern);
  const deficientColumn = rowOf.indexOf(unmatched);
  if (deficientColumn >= 0) {
    const nothing = new Int32Array(0);
    return { columns: nothing, rows: nothing, blockStart: Int32Array.of(0), deficientColumn };
  }
  const blocks = blocksOf(pattern, rowOf);
  const columnOf = new Int32Array(size);
  const place = new Int32Array(size);
  for (let column = 0; column < size; column++) columnOf[rowOf[column]!] = column;
  for (let position = 0; position < size; position++) place[blocks.columns[position]!] = position;

  const columns = new Int32Array(size);
  for (let index = 0; index + 1 < blocks.start.length; index++) {
    const first = blocks.start[index]!;
    const order =
      blocks.start[index + 1]! - first === 1
        ? [0]
        : minimumDegreeOrder(blockGraph(pattern, blocks, index, columnOf, place));
    for (let k = 0; k < order.length; k++) columns[first + k] = blocks.columns[first + order[k]!]!;
  }
  return {
    columns,
    rows: columns.map((column) => rowOf[column]!),
    blockStart: blocks.start,
    deficientColumn,
  };
}
