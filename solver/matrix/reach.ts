/** Which pivots a column meets on its way through the columns already factorised. */

export interface LowerColumns {
  /** Length `size + 1`: column `k` of L holds the places from `start[k]` up to but not `start[k + 1]`. */
  readonly start: Int32Array;
  /** The row (of the original matrix) of each place. Replaced by a longer one as L grows. */
  row: Int32Array;
}

export interface Reach {
  /**
   * Follows one entry of the column on hand. Rows are noted once a column; call `begin` before the first.
   */
  follow(row: number): void;
  begin(): void;
  /** Positions of the pivots met, in topological order: from `pivotTop` to the array's end. */
  readonly pivots: Int32Array;
  pivotTop(): number;
  /** Rows met that have no position yet: the first `candidateCount()` of these. */
  readonly candidates: Int32Array;
  candidateCount(): number;
}

/**
 * The nonzero pattern of L⁻¹a as the set of rows reachable from the entries of a in the graph of L, found
 * depth first in time proportional to the arithmetic it stands for (J. R. Gilbert and T. Peierls, "Sparse
 * partial pivoting in time proportional to arithmetic operations", SIAM J. Sci. Stat. Comput. 9, 1988,
 * 862–874). It is structural: an entry that happens to be zero is followed like any other.
 *
 * @param positionOf the position of each row among the pivots, −1 before it is chosen.
 */
export function createReach(size: number, lower: LowerColumns, positionOf: Int32Array): Reach {
  const pivots = new Int32Array(size);
  const candidates = new Int32Array(size);
  const seen = new Int32Array(size).fill(-1); // per row: the last column that met it
  const path = new Int32Array(size);
  const next = new Int32Array(size);
  let column = -1;
  let top = size;
  let candidateCount = 0;

  const note = (row: number) => {
    seen[row] = column;
    if (positionOf[row]! < 0) candidates[candidateCount++] = row;
  };

  return {
    pivots,
    candidates,
    pivotTop: () => top,
    candidateCount: () => candidateCount,
    begin() {
      column++;
      top = size;
      candidateCount = 0;
    },
    follow(row) {
      if (seen[row] === column) return;
      note(row);
      if (positionOf[row]! < 0) return;
      let depth = 0;
      path[0] = positionOf[row]!;
      next[0] = lower.start[path[0]]!;
      while (depth >= 0) {
        const pivot = path[depth]!;
        if (next[depth]! >= lower.start[pivot + 1]!) {
          pivots[--top] = pivot;
          depth--;
          continue;
        }
        const met = lower.row[next[depth]!++]!;
        if (seen[met] === column) continue;
        note(met);
        if (positionOf[met]! < 0) continue;
        path[++depth] = positionOf[met]!;
        next[depth] = lower.start[path[depth]!]!;
      }
    },
  };
}
