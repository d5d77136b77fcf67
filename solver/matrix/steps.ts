/** The same elimination as a plain list of its steps, which is quicker to run for small systems. */
import type { FactorPlaces } from './factors.ts';

/**
 * For a system of a few dozen unknowns most columns hold two to five entries, and the loops that go from
 * column to column cost more than the arithmetic. Here every step `target −= entry · factor` is written out
 * once as three indices, and running them is one loop. Entries are numbered by the pattern's slots with the
 * fill behind them, so that loading a matrix is one block copy.
 */
export interface EliminationSteps {
  readonly size: number;
  /** Number of slots, and of entries altogether with the fill. */
  readonly slotCount: number;
  readonly entryCount: number;
  /** Length `size`: the entry of each pivot. */
  readonly pivotEntry: Int32Array;
  /** The entries of L, column by column, and where each column's end. */
  readonly lowerEntry: Int32Array;
  readonly lowerEnd: Int32Array;
  /** Entries (target, L, U) three by three, and where those before each pivot end. */
  readonly products: Int32Array;
  readonly productsEnd: Int32Array;
  readonly forward: SolveSteps;
  readonly transposed: SolveSteps;
}

/** Steps of a solve: subtract up to `end[s]`, multiply unknown `scaled[s]` by its inverse pivot, and so on. */
export interface SolveSteps {
  /** (target unknown, entry, source unknown) three by three. */
  readonly products: Int32Array;
  /** Length `size`. */
  readonly scaled: Int32Array;
  /** Length `size + 1`; the last ends the steps after the last scaling. */
  readonly end: Int32Array;
}

/** Number of multiplications in one elimination with these places. */
export function countProducts(places: FactorPlaces): number {
  let count = 0;
  for (let k = 0; k < places.size; k++)
    for (let p = places.start[k]!; p < places.diagonal[k]!; p++) {
      const earlier = places.position[p]!;
      count += places.outer[earlier]! - places.diagonal[earlier]! - 1;
    }
  return count;
}

export function listSteps(places: FactorPlaces): EliminationSteps {
  const { size, start, diagonal, outer, position, placeOfSlot, fill } = places;
  const slotCount = placeOfSlot.length;
  const entryOf = new Int32Array(position.length);
  for (let slot = 0; slot < slotCount; slot++) entryOf[placeOfSlot[slot]!] = slot;
  for (let f = 0; f < fill.length; f++) entryOf[fill[f]!] = slotCount + f;

  const products = new Int32Array(3 * countProducts(places));
  const productsEnd = new Int32Array(size);
  const pivotEntry = new Int32Array(size);
  const lowerEnd = new Int32Array(size);
  const lowerEntry: number[] = [];
  const entryAt = new Int32Array(size); // of each row position, within the column on hand
  let at = 0;
  for (let k = 0; k < size; k++) {
    for (let p = start[k]!; p < outer[k]!; p++) entryAt[position[p]!] = entryOf[p]!;
    for (let p = start[k]!; p < diagonal[k]!; p++) {
      const earlier = position[p]!;
      for (let q = diagonal[earlier]! + 1; q < outer[earlier]!; q++) {
        products[at++] = entryAt[position[q]!]!;
        products[at++] = entryOf[q]!;
        products[at++] = entryOf[p]!;
      }
    }
    productsEnd[k] = at;
    pivotEntry[k] = entryOf[diagonal[k]!]!;
    for (let p = diagonal[k]! + 1; p < outer[k]!; p++) lowerEntry.push(entryOf[p]!);
    lowerEnd[k] = lowerEntry.length;
  }
  return {
    size,
    slotCount,
    entryCount: position.length,
    pivotEntry,
    lowerEntry: Int32Array.from(lowerEntry),
    lowerEnd,
    products,
    productsEnd,
    forward: solveSteps(places, entryOf),
    transposed: transposedSteps(places, entryOf),
  };
}

/** The steps of `solve`. */
function solveSteps(places: FactorPlaces, entryOf: Int32Array): SolveSteps {
  const { blockStart, start, diagonal, outer, position } = places;
  const list = createSolveList(places);
  for (let block = 0; block + 1 < blockStart.length; block++) {
    const first = blockStart[block]!;
    const end = blockStart[block + 1]!;
    for (let k = first; k < end; k++)
      for (let p = diagonal[k]! + 1; p < outer[k]!; p++) list.subtract(position[p]!, entryOf[p]!, k);
    for (let k = end - 1; k >= first; k--) {
      list.scale(k);
      for (let p = start[k]!; p < diagonal[k]!; p++) list.subtract(position[p]!, entryOf[p]!, k);
      for (let p = outer[k]!; p < start[k + 1]!; p++) list.subtract(position[p]!, entryOf[p]!, k);
    }
  }
  return list.finished();
}

/** The steps of `transposeSolve`. */
function transposedSteps(places: FactorPlaces, entryOf: Int32Array): SolveSteps {
  const { blockStart, start, diagonal, outer, position } = places;
  const list = createSolveList(places);
  for (let block = blockStart.length - 2; block >= 0; block--) {
    const first = blockStart[block]!;
    const end = blockStart[block + 1]!;
    for (let k = first; k < end; k++) {
      for (let p = outer[k]!; p < start[k + 1]!; p++) list.subtract(k, entryOf[p]!, position[p]!);
      for (let p = start[k]!; p < diagonal[k]!; p++) list.subtract(k, entryOf[p]!, position[p]!);
      list.scale(k);
    }
    for (let k = end - 1; k >= first; k--)
      for (let p = diagonal[k]! + 1; p < outer[k]!; p++) list.subtract(k, entryOf[p]!, position[p]!);
  }
  return list.finished();
}

function createSolveList(places: FactorPlaces) {
  const products = new Int32Array(3 * (places.position.length - places.size));
  const scaled = new Int32Array(places.size);
  const end = new Int32Array(places.size + 1);
  let at = 0;
  let scalings = 0;
  return {
    subtract(target: number, entry: number, source: number) {
      products[at++] = target;
      products[at++] = entry;
      products[at++] = source;
    },
    scale(unknown: number) {
      end[scalings] = at;
      scaled[scalings++] = unknown;
    },
    finished(): SolveSteps {
      end[scalings] = at;
      return { products, scaled, end };
    },
  };
}
