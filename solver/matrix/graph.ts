/** The undirected graph of one block: which of its unknowns meet in an equation. */
import type { Blocks } from './blocks.ts';
import type { SparsePattern } from './pattern.ts';

export interface Graph {
  readonly size: number;
  /** Length `size + 1`. */
  readonly start: Int32Array;
  /** Neighbours of each vertex, without the vertex itself and without repeats. */
  readonly neighbour: Int32Array;
}

/**
 * The graph of B + Bᵀ, where B is the block `index` with the matched row of each column moved onto the
 * diagonal. Vertices are numbered as the block's columns stand in `blocks.columns`.
 *
 * @param columnOf the column matched to each row.
 * @param place the place of each column in `blocks.columns`.
 */
export function blockGraph(
  pattern: SparsePattern,
  blocks: Blocks,
  index: number,
  columnOf: Int32Array,
  place: Int32Array,
): Graph {
  const { columnStart, rowIndex } = pattern;
  const first = blocks.start[index]!;
  const size = blocks.start[index + 1]! - first;
  const eachPair = (visit: (row: number, column: number) => void) => {
    for (let column = 0; column < size; column++) {
      const original = blocks.columns[first + column]!;
      for (let slot = columnStart[original]!; slot < columnStart[original + 1]!; slot++) {
        const row = place[columnOf[rowIndex[slot]!]!]! - first;
        if (row >= 0 && row < size && row !== column) visit(row, column);
      }
    }
  };

  // Both directions are dealt out with repeats, then each list is thinned in place.
  const roomy = new Int32Array(size + 1);
  eachPair((row, column) => {
    roomy[row + 1]!++;
    roomy[column + 1]!++;
  });
  for (let vertex = 0; vertex < size; vertex++) roomy[vertex + 1]! += roomy[vertex]!;
  const next = roomy.slice(0, size);
  const neighbour = new Int32Array(roomy[size]!);
  eachPair((row, column) => {
    neighbour[next[row]!++] = column;
    neighbour[next[column]!++] = row;
  });

  const start = new Int32Array(size + 1);
  const seenFrom = new Int32Array(size).fill(-1);
  let kept = 0;
  for (let vertex = 0; vertex < size; vertex++) {
    start[vertex] = kept;
    for (let p = roomy[vertex]!; p < roomy[vertex + 1]!; p++) {
      const other = neighbour[p]!;
      if (seenFrom[other] === vertex) continue;
      seenFrom[other] = vertex;
      neighbour[kept++] = other;
    }
  }
  start[size] = kept;
  return { size, start, neighbour: neighbour.slice(0, kept) };
}
