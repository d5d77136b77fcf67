/** Vertices kept by degree, so that one of the least degree is at hand. */

export interface DegreeLists {
  enter(vertex: number, degree: number): void;
  /** Takes out a vertex that was entered. */
  leave(vertex: number): void;
  /** Takes out and returns a vertex of the least degree, the last entered first; −1 when none is left. */
  takeLeast(): number;
}

/** Doubly linked lists, one a degree; for `size` vertices of degrees 0 … `size`. */
export function createDegreeLists(size: number): DegreeLists {
  const head = new Int32Array(size + 1).fill(-1);
  const next = new Int32Array(size).fill(-1);
  const previous = new Int32Array(size).fill(-1);
  const degreeOf = new Int32Array(size);
  let least = size + 1;

  const leave = (vertex: number) => {
    const before = previous[vertex]!;
    const after = next[vertex]!;
    if (before === -1) head[degreeOf[vertex]!] = after;
    else next[before] = after;
    if (after !== -1) previous[after] = before;
  };

  return {
    enter(vertex, degree) {
      const first = head[degree]!;
      degreeOf[vertex] = degree;
      next[vertex] = first;
      previous[vertex] = -1;
      if (first !== -1) previous[first] = vertex;
      head[degree] = vertex;
      if (degree < least) least = degree;
    },
    leave,
    takeLeast() {
      while (least <= size && head[least] === -1) least++;
      if (least > size) return -1;
      const vertex = head[least]!;
      leave(vertex);
      return vertex;
    },
  };
}
