import { all, create } from 'mathjs';
import { describe, expect, it } from 'vitest';
import { blocksOf } from '../../../solver/matrix/blocks.ts';
import { eliminationOrder } from '../../../solver/matrix/order.ts';
import { matchColumns } from '../../../solver/matrix/matching.ts';
import { createPattern, type EntryPlace, type SparsePattern } from '../../../solver/matrix/pattern.ts';
import { circuitCase, randomNumbers } from './cases.ts';

const math = create(all ?? {});

function randomPattern(seed: number, size: number, share: number): SparsePattern {
  const random = randomNumbers(seed);
  const places: EntryPlace[] = [];
  for (let row = 0; row < size; row++)
    for (let column = 0; column < size; column++) if (random() < share) places.push([row, column]);
  return createPattern(size, places);
}

const has = (pattern: SparsePattern, row: number, column: number): boolean =>
  pattern.rowIndex.subarray(pattern.columnStart[column], pattern.columnStart[column + 1]).includes(row);

/** The largest matching by trying every subset of rows, column by column: exact, for small sizes. */
function exhaustiveMatching(pattern: SparsePattern): number {
  let best = new Map<number, number>([[0, 0]]); // set of rows taken → columns matched
  for (let column = 0; column < pattern.size; column++) {
    const next = new Map(best);
    for (const [taken, count] of best)
      for (let row = 0; row < pattern.size; row++) {
        if ((taken & (1 << row)) !== 0 || !has(pattern, row, column)) continue;
        const key = taken | (1 << row);
        next.set(key, Math.max(next.get(key) ?? 0, count + 1));
      }
    best = next;
  }
  return Math.max(...best.values());
}

describe('matchColumns', () => {
  it('matches as many columns as any assignment can, each to a row of its own in which it has an entry', () => {
    for (let seed = 1; seed <= 150; seed++) {
      const size = 1 + (seed % 8);
      const pattern = randomPattern(seed, size, 0.28);
      const rowOf = Array.from(matchColumns(pattern));
      const matched = rowOf.filter((row) => row >= 0);
      expect(new Set(matched).size).toBe(matched.length);
      rowOf.forEach((row, column) => {
        if (row >= 0) expect(has(pattern, row, column)).toBe(true);
      });
      expect(matched.length, `seed ${seed}`).toBe(exhaustiveMatching(pattern));
    }
  });

  it('keeps the diagonal where it is complete', () => {
    const pattern = createPattern(3, [[0, 0], [1, 1], [2, 2], [0, 1], [1, 2], [2, 0]]); // prettier-ignore
    expect(Array.from(matchColumns(pattern))).toEqual([0, 1, 2]);
  });
});

describe('blocksOf', () => {
  it('leaves nothing above the diagonal blocks, and every block strongly connected', () => {
    let several = 0;
    for (let seed = 1; seed <= 120; seed++) {
      const size = 2 + (seed % 9);
      const pattern = randomPattern(seed, size, 0.3);
      const rowOf = matchColumns(pattern);
      if (rowOf.includes(-1)) continue;
      const { columns, start } = blocksOf(pattern, rowOf);
      expect(Array.from(columns).sort((a, b) => a - b)).toEqual(Array.from({ length: size }, (_, i) => i));
      if (start.length > 2) several++;
      const blockAt = (place: number) => start.findLastIndex((first) => first <= place);
      // Reachability by Warshall's closure, place to place: the row matched to one depends on the other.
      const reaches = Array.from({ length: size }, (_, a) =>
        Array.from({ length: size }, (_, b) => has(pattern, rowOf[columns[a] ?? 0] ?? 0, columns[b] ?? 0)),
      );
      reaches.forEach((row, a) => {
        row.forEach((depends, b) => {
          if (depends) expect(blockAt(b), `seed ${seed}`).toBeLessThanOrEqual(blockAt(a));
        });
      });
      for (let via = 0; via < size; via++)
        for (const row of reaches)
          if (row[via]) row.forEach((r, b) => (row[b] = r || reaches[via]?.[b] === true));
      for (let a = 0; a < size; a++)
        for (let b = 0; b < size; b++)
          if (a !== b && blockAt(a) === blockAt(b)) expect(reaches[a]?.[b]).toBe(true);
    }
    expect(several).toBeGreaterThan(10);
  });

  it('solves a node held by a source before the rest and the current of the source after it', () => {
    // Node 0 held by branch 2; node 1 hangs on node 0: blocks {node 0}, {node 1}, {branch current}.
    const pattern = createPattern(3, [[0, 0], [0, 1], [1, 0], [1, 1], [0, 2], [2, 0]]); // prettier-ignore
    const order = eliminationOrder(pattern);
    expect(Array.from(order.columns)).toEqual([0, 1, 2]);
    expect(Array.from(order.rows)).toEqual([2, 1, 0]);
    expect(Array.from(order.blockStart)).toEqual([0, 1, 2, 3]);
  });
});

/** Edges of the elimination graph as vertices go one by one: the entries of L, counted plainly with sets. */
function fillOf(pattern: SparsePattern, order: Int32Array): number {
  const neighbours = Array.from({ length: pattern.size }, () => new Set<number>());
  for (let column = 0; column < pattern.size; column++)
    for (const row of pattern.rowIndex.subarray(pattern.columnStart[column], pattern.columnStart[column + 1]))
      if (row !== column) {
        neighbours[row]?.add(column);
        neighbours[column]?.add(row);
      }
  let entries = 0;
  for (const vertex of order) {
    const left = neighbours[vertex] ?? new Set();
    entries += left.size;
    for (const a of left) {
      neighbours[a]?.delete(vertex);
      for (const b of left) if (a !== b) neighbours[a]?.add(b);
    }
  }
  return entries;
}

function symmetricPattern(size: number, edges: readonly EntryPlace[]): SparsePattern {
  const places: EntryPlace[] = edges.flatMap(([a, b]): EntryPlace[] => [[a, b], [b, a]]); // prettier-ignore
  for (let vertex = 0; vertex < size; vertex++) places.push([vertex, vertex]);
  return createPattern(size, places);
}

function gridPattern(width: number): SparsePattern {
  const edges: EntryPlace[] = [];
  for (let y = 0; y < width; y++)
    for (let x = 0; x < width; x++) {
      if (x + 1 < width) edges.push([y * width + x, y * width + x + 1]);
      if (y + 1 < width) edges.push([y * width + x, (y + 1) * width + x]);
    }
  return symmetricPattern(width * width, edges);
}

describe('eliminationOrder', () => {
  it('is a permutation, with the matched row of each column beside it', () => {
    for (let seed = 1; seed <= 60; seed++) {
      const { pattern } = circuitCase(seed, {
        nodes: 3 + seed,
        sources: seed % 4,
        transconductances: 5,
        decades: 2,
      });
      const { columns, rows, blockStart } = eliminationOrder(pattern);
      const everyIndex = Array.from({ length: pattern.size }, (_, i) => i);
      expect(Array.from(columns).sort((a, b) => a - b)).toEqual(everyIndex);
      expect(Array.from(rows).sort((a, b) => a - b)).toEqual(everyIndex);
      expect(blockStart[blockStart.length - 1]).toBe(pattern.size);
      columns.forEach((column, k) => expect(has(pattern, rows[k] ?? -1, column)).toBe(true));
    }
  });

  it('makes no fill on a tree', () => {
    for (let seed = 1; seed <= 20; seed++) {
      const random = randomNumbers(seed);
      const size = 200;
      const edges = Array.from({ length: size - 1 }, (_, i): EntryPlace => [
        i + 1,
        Math.floor(random() * (i + 1)),
      ]);
      const pattern = symmetricPattern(size, edges);
      expect(fillOf(pattern, eliminationOrder(pattern).columns)).toBe(size - 1);
    }
  });

  it('leaves a node that meets nearly all others to the end', () => {
    const size = 400;
    const pattern = symmetricPattern(
      size,
      Array.from({ length: size - 1 }, (_, i): EntryPlace => [0, i + 1]),
    );
    const { columns } = eliminationOrder(pattern);
    expect(columns[size - 1]).toBe(0);
    expect(fillOf(pattern, columns)).toBe(size - 1);
  });

  it('fills grids no more than 5 % beyond the minimum-degree order of mathjs', () => {
    for (const width of [8, 15, 24]) {
      const pattern = gridPattern(width);
      const matrix = math.sparse(math.zeros(pattern.size, pattern.size));
      for (let column = 0; column < pattern.size; column++)
        for (const row of pattern.rowIndex.subarray(
          pattern.columnStart[column],
          pattern.columnStart[column + 1],
        ))
          matrix.set([row, column], row === column ? 10 : -1);
      const { q } = math.slu(matrix, 1, 0.001) as unknown as { q: number[] };
      const theirs = fillOf(pattern, Int32Array.from(q));
      const ours = fillOf(pattern, eliminationOrder(pattern).columns);
      expect(ours, `width ${width}: ${ours} against ${theirs}`).toBeLessThanOrEqual(1.05 * theirs);
    }
  });

  it('names a column that cannot have a pivot whatever the values are', () => {
    // Columns 0 and 1 both have their only entry in row 0.
    const pattern = createPattern(3, [[0, 0], [0, 1], [1, 2], [2, 2]]); // prettier-ignore
    expect(eliminationOrder(pattern).deficientColumn).toBe(1);
  });
});
