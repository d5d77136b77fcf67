/** Parts a matched matrix into blocks that can be solved one after another. */
import type { SparsePattern } from './pattern.ts';
import { rowsOf } from './transpose.ts';

export interface Blocks {
  /** Length `size`: the columns, block by block. */
  readonly columns: Int32Array;
  /** Length `blockCount + 1`: where each block starts in `columns`. */
  readonly start: Int32Array;
}

/**
 * Block lower triangular form: the strongly connected components of the graph in which a column points to
 * the columns its row depends on, found depth first (R. Tarjan, "Depth-first search and linear graph
 * algorithms", SIAM J. Comput. 1, 1972, 146–160; I. S. Duff and J. K. Reid, "An implementation of Tarjan's
 * algorithm for the block triangularization of a matrix", ACM TOMS 4, 1978, 137–147). A component is closed
 * only after everything it depends on, which is the order in which blocks can be solved.
 *
 * @param rowOf the row matched to each column; a complete matching.
 */
export function blocksOf(pattern: SparsePattern, rowOf: Int32Array): Blocks {
  const { size } = pattern;
  const { rowStart, columnIndex } = rowsOf(pattern);
  const columns = new Int32Array(size);
  const starts: number[] = [0];
  let placed = 0;

  const visit = new Int32Array(size).fill(-1); // order of discovery, −1 before it
  const lowest = new Int32Array(size); // lowest discovery known to be reachable
  const open = new Uint8Array(size); // 1 while the column waits on `waiting`
  const waiting = new Int32Array(size);
  const path = new Int32Array(size);
  const next = new Int32Array(size); // the place in its row that each column on the path tries next
  let waitingCount = 0;
  let visitCount = 0;

  const enter = (column: number) => {
    visit[column] = lowest[column] = visitCount++;
    next[column] = rowStart[rowOf[column]!]!;
    waiting[waitingCount++] = column;
    open[column] = 1;
  };

  for (let root = 0; root < size; root++) {
    if (visit[root] !== -1) continue;
    let depth = 0;
    path[0] = root;
    enter(root);
    while (depth >= 0) {
      const column = path[depth]!;
      if (next[column]! < rowStart[rowOf[column]! + 1]!) {
        const other = columnIndex[next[column]!++]!;
        if (visit[other] === -1) {
          path[++depth] = other;
          enter(other);
        } else if (open[other] === 1 && visit[other]! < lowest[column]!) lowest[column] = visit[other]!;
        continue;
      }
      if (lowest[column] === visit[column]) {
        let member: number;
        do {
          member = waiting[--waitingCount]!;
          open[member] = 0;
          columns[placed++] = member;
        } while (member !== column);
        starts.push(placed);
      }
      depth--;
      if (depth >= 0 && lowest[column]! < lowest[path[depth]!]!) lowest[path[depth]!] = lowest[column]!;
    }
  }
  return { columns, start: Int32Array.from(starts) };
}
