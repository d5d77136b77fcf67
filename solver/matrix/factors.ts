/** The places of a factorisation: where every entry of L, of U and between the blocks stands. */
import type { EliminationOrder } from './order.ts';
import type { SparsePattern } from './pattern.ts';
import { choosePivots, type ColumnArithmetic, type PivotChoice, type PivotFailure } from './pivots.ts';

/**
 * The matrix with its rows and columns in pivot order is block lower triangular. Each diagonal block is L·U,
 * L with a unit diagonal; below the diagonal blocks stand entries of the matrix itself, which act on unknowns
 * already solved. All are kept column by column, rows ascending:
 *
 *     start[k]  U above the diagonal  diagonal[k]  L below it in the block  outer[k]  later blocks  start[k + 1]
 */
export interface FactorPlaces {
  readonly size: number;
  /** Length `size`: the column of the original matrix at each position. */
  readonly columns: Int32Array;
  /** Length `size`: the row of the original matrix at each position. */
  readonly rows: Int32Array;
  /** Length `blockCount + 1`. */
  readonly blockStart: Int32Array;
  /** Length `size + 1`. */
  readonly start: Int32Array;
  /** Length `size`: the place of each pivot. */
  readonly diagonal: Int32Array;
  /** Length `size`: where the entries in later blocks begin. */
  readonly outer: Int32Array;
  /** Length `start[size]`: the row position of each place. */
  readonly position: Int32Array;
  /** Length `entryCount`: the place of each slot of the pattern. */
  readonly placeOfSlot: Int32Array;
  /** Places that are in no slot of the pattern: fill. */
  readonly fill: Int32Array;
  /**
   * Length `size`: how many columns of L from this one on, itself included, are nested: each has the rows of
   * the one before but for its own. They can act on a later column together.
   */
  readonly nested: Int32Array;
  /** Parity of the row permutation times that of the column permutation. */
  readonly permutationSign: -1 | 1;
}

/** Chooses pivots for the values behind `arithmetic` and lays out the factors' places for them. */
export function placesFor(
  pattern: SparsePattern,
  order: EliminationOrder,
  arithmetic: ColumnArithmetic,
): FactorPlaces | PivotFailure {
  const choice = choosePivots(pattern, order, arithmetic);
  return choice.kind === 'chosen' ? layOut(pattern, order, choice) : choice;
}

/** Sorts the entries of every column by dealing them out to rows and then back to columns. */
function layOut(pattern: SparsePattern, order: EliminationOrder, choice: PivotChoice): FactorPlaces {
  const { size, entryCount, columnStart, rowIndex } = pattern;
  const { columns, blockStart } = order;
  const { positionOf } = choice;
  const blockEnd = new Int32Array(size);
  for (let block = 0; block + 1 < blockStart.length; block++)
    blockEnd.fill(blockStart[block + 1]!, blockStart[block], blockStart[block + 1]);

  const eachEntry = (visit: (position: number, k: number) => void) => {
    for (let k = 0; k < size; k++) {
      for (let p = choice.upperStart[k]!; p < choice.upperStart[k + 1]!; p++)
        visit(choice.upperPosition[p]!, k);
      visit(k, k);
      for (let p = choice.lowerStart[k]!; p < choice.lowerStart[k + 1]!; p++)
        visit(positionOf[choice.lowerRow[p]!]!, k);
      for (let slot = columnStart[columns[k]!]!; slot < columnStart[columns[k]! + 1]!; slot++)
        if (positionOf[rowIndex[slot]!]! >= blockEnd[k]!) visit(positionOf[rowIndex[slot]!]!, k);
    }
  };

  const rowStart = new Int32Array(size + 1);
  const start = new Int32Array(size + 1);
  eachEntry((position, k) => {
    rowStart[position + 1]!++;
    start[k + 1]!++;
  });
  for (let k = 0; k < size; k++) {
    rowStart[k + 1]! += rowStart[k]!;
    start[k + 1]! += start[k]!;
  }
  const total = start[size]!;
  const byRow = new Int32Array(total);
  const nextInRow = rowStart.slice(0, size);
  eachEntry((position, k) => (byRow[nextInRow[position]!++] = k));
  const position = new Int32Array(total);
  const nextInColumn = start.slice(0, size);
  for (let row = 0; row < size; row++)
    for (let p = rowStart[row]!; p < rowStart[row + 1]!; p++) position[nextInColumn[byRow[p]!]!++] = row;

  const diagonal = new Int32Array(size);
  const outer = new Int32Array(size);
  const placeOfSlot = new Int32Array(entryCount);
  const isFill = new Uint8Array(total).fill(1);
  const placeAt = new Int32Array(size); // of each position, within the column on hand
  for (let k = 0; k < size; k++) {
    outer[k] = start[k + 1]!;
    for (let p = start[k + 1]! - 1; p >= start[k]!; p--) {
      placeAt[position[p]!] = p;
      if (position[p]! >= blockEnd[k]!) outer[k] = p;
    }
    diagonal[k] = placeAt[k]!;
    for (let slot = columnStart[columns[k]!]!; slot < columnStart[columns[k]! + 1]!; slot++) {
      const place = placeAt[positionOf[rowIndex[slot]!]!]!;
      placeOfSlot[slot] = place;
      isFill[place] = 0;
    }
  }
  const fill: number[] = [];
  for (let place = 0; place < total; place++) if (isFill[place] === 1) fill.push(place);

  return {
    size,
    columns,
    rows: choice.rows,
    blockStart,
    start,
    diagonal,
    outer,
    position,
    placeOfSlot,
    fill: Int32Array.from(fill),
    nested: nestedRuns(diagonal, outer, position),
    permutationSign: parity(choice.rows) === parity(columns) ? 1 : -1,
  };
}

function nestedRuns(diagonal: Int32Array, outer: Int32Array, position: Int32Array): Int32Array {
  const size = diagonal.length;
  const nested = new Int32Array(size).fill(1);
  for (let k = size - 2; k >= 0; k--) {
    const first = diagonal[k]! + 1;
    const length = outer[k]! - first;
    const next = diagonal[k + 1]!;
    if (length !== outer[k + 1]! - next) continue;
    let same = true;
    for (let offset = 0; same && offset < length; offset++)
      same = position[first + offset] === position[next + offset];
    if (same && length > 0) nested[k] = nested[k + 1]! + 1;
  }
  return nested;
}

/** Parity of a permutation by its cycles: each cycle of even length changes the sign. */
export function parity(permutation: Int32Array): -1 | 1 {
  const seen = new Uint8Array(permutation.length);
  let odd = false;
  for (let from = 0; from < permutation.length; from++) {
    if (seen[from] === 1) continue;
    let length = 0;
    for (let at = from; seen[at] === 0; at = permutation[at]!) {
      seen[at] = 1;
      length++;
    }
    if (length % 2 === 0) odd = !odd;
  }
  return odd ? -1 : 1;
}
