/** Chooses the pivot row of every column: the search half of a full factorisation. */
import type { EliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import { createReach } from './reach.ts';
import { epsilon, freshThreshold } from './tolerances.ts';

/**
 * The arithmetic of one dense column, real or complex. Rows are those of the original matrix; places number
 * the entries of L in the order in which they are kept.
 */
export interface ColumnArithmetic {
  /** Adds the matrix's entry in `slot` to the column at `row`. */
  load(slot: number, row: number): void;
  /** Subtracts the column's entry at `pivotRow` times each of L's entries in [from, to) from the column. */
  eliminate(pivotRow: number, rows: Int32Array, from: number, to: number): void;
  /** Magnitude of the column's entry at `row`. */
  magnitude(row: number): number;
  /** Magnitude of the largest term that went into the entry at `row`: its rounding is relative to this. */
  largestTerm(row: number): number;
  /** Keeps the column's entry at `row`, divided by that at `pivotRow`, as L's entry at `place`. */
  keep(row: number, pivotRow: number, place: number): void;
  /** Sets the column's entry at `row` to zero. */
  clear(row: number): void;
  /** Makes room for at least `places` entries of L. */
  reserve(places: number): void;
}

/** L and U as rows of the original matrix, column by column, in no order within a column. */
export interface PivotChoice {
  readonly kind: 'chosen';
  /** Length `size`: the pivot row at each position. */
  readonly rows: Int32Array;
  /** Length `size`: the position of each row. */
  readonly positionOf: Int32Array;
  /** Length `size + 1`, and the row of each entry: L below its unit diagonal. */
  readonly lowerStart: Int32Array;
  readonly lowerRow: Int32Array;
  /** Length `size + 1`, and the position of each entry: U above its diagonal. */
  readonly upperStart: Int32Array;
  readonly upperPosition: Int32Array;
}

export interface PivotFailure {
  readonly kind: 'singular' | 'not-finite';
  readonly column: number;
}

/**
 * Left-looking elimination, a column at a time and within its diagonal block, with threshold partial pivoting
 * (Gilbert and Peierls 1988). A pivot no larger than the rounding of the terms it is left over from is taken
 * for zero.
 */
export function choosePivots(
  pattern: SparsePattern,
  order: EliminationOrder,
  arithmetic: ColumnArithmetic,
): PivotChoice | PivotFailure {
  const { size, columnStart, rowIndex } = pattern;
  if (order.deficientColumn >= 0) return { kind: 'singular', column: order.deficientColumn };

  const rows = new Int32Array(size);
  const positionOf = new Int32Array(size).fill(-1);
  const blockOf = blockOfRows(order);
  const room = 4 * pattern.entryCount + size;
  const lower = { start: new Int32Array(size + 1), row: roomFor(room) };
  const upper = { start: new Int32Array(size + 1), position: roomFor(room) };
  const reach = createReach(size, lower, positionOf);
  arithmetic.reserve(lower.row.length);
  let lowerCount = 0;
  let upperCount = 0;
  let block = 0;

  for (let k = 0; k < size; k++) {
    const column = order.columns[k]!;
    while (k >= order.blockStart[block + 1]!) block++;

    // ---- where the column has entries, in the order in which they must be worked out --------------------
    reach.begin();
    for (let slot = columnStart[column]!; slot < columnStart[column + 1]!; slot++) {
      const row = rowIndex[slot]!;
      if (blockOf[row] !== block) continue;
      reach.follow(row);
      arithmetic.load(slot, row);
    }
    const candidateCount = reach.candidateCount();
    lower.row = withRoom(lower.row, lowerCount + candidateCount);
    upper.position = withRoom(upper.position, upperCount + size - reach.pivotTop());
    arithmetic.reserve(lower.row.length);

    // ---- the column of U, eliminating as it goes --------------------------------------------------------
    let finite = true;
    for (let p = reach.pivotTop(); p < size; p++) {
      const pivot = reach.pivots[p]!;
      const pivotRow = rows[pivot]!;
      finite &&= arithmetic.magnitude(pivotRow) <= Number.MAX_VALUE;
      arithmetic.eliminate(pivotRow, lower.row, lower.start[pivot]!, lower.start[pivot + 1]!);
      arithmetic.clear(pivotRow);
      upper.position[upperCount++] = pivot;
    }
    upper.start[k + 1] = upperCount;

    // ---- the pivot --------------------------------------------------------------------------------------
    let pivotRow = -1;
    let largest = -1;
    let largestTerm = 0;
    for (let p = 0; p < candidateCount; p++) {
      const row = reach.candidates[p]!;
      const magnitude = arithmetic.magnitude(row);
      finite &&= magnitude <= Number.MAX_VALUE;
      largestTerm = Math.max(largestTerm, arithmetic.largestTerm(row));
      if (magnitude > largest) {
        largest = magnitude;
        pivotRow = row;
      }
    }
    if (!finite) return { kind: 'not-finite', column };
    if (pivotRow < 0 || largest <= epsilon * largestTerm || 1 / largest === Infinity)
      return { kind: 'singular', column };
    const preferred = order.rows[k]!;
    if (positionOf[preferred]! < 0 && arithmetic.magnitude(preferred) >= freshThreshold * largest)
      pivotRow = preferred;

    // ---- the column of L --------------------------------------------------------------------------------
    for (let p = 0; p < candidateCount; p++) {
      const row = reach.candidates[p]!;
      if (row === pivotRow) continue;
      arithmetic.keep(row, pivotRow, lowerCount);
      lower.row[lowerCount++] = row;
    }
    for (let p = 0; p < candidateCount; p++) arithmetic.clear(reach.candidates[p]!);
    lower.start[k + 1] = lowerCount;
    rows[k] = pivotRow;
    positionOf[pivotRow] = k;
  }
  return {
    kind: 'chosen',
    rows,
    positionOf,
    lowerStart: lower.start,
    lowerRow: lower.row,
    upperStart: upper.start,
    upperPosition: upper.position,
  };
}

function blockOfRows(order: EliminationOrder): Int32Array {
  const blockOf = new Int32Array(order.rows.length);
  for (let block = 0; block + 1 < order.blockStart.length; block++)
    for (let k = order.blockStart[block]!; k < order.blockStart[block + 1]!; k++)
      blockOf[order.rows[k]!] = block;
  return blockOf;
}

const roomFor = (length: number): Int32Array => new Int32Array(length);

function withRoom(array: Int32Array, length: number): Int32Array {
  if (array.length >= length) return array;
  const longer = new Int32Array(Math.max(length, 2 * array.length));
  longer.set(array);
  return longer;
}
