/** The circuit as a graph of ways for direct current, in node numbers; internal nodes are numbered after the nodes. */
import type { Circuit, Element } from '../circuit.ts';
import type { Path } from '../elements/law.ts';

export interface Edge {
  readonly element: Element;
  readonly path: Path;
  readonly from: number;
  readonly to: number;
}

export interface Graph {
  /** Nodes and internal nodes. */
  readonly size: number;
  readonly edges: readonly Edge[];
}

/** Every path of every element at its present values. */
export function graphOf(circuit: Circuit): Graph {
  const edges: Edge[] = [];
  let size = circuit.nodes.length;
  for (const element of circuit.elements) {
    const { law, nodes } = element;
    const internal = size;
    size += law.internals.length;
    const nodeOf = (local: number): number =>
      local < 0 ? 0 : (nodes[local] ?? internal + local - nodes.length);
    for (const path of law.paths(element.values))
      edges.push({ element, path, from: nodeOf(path.from), to: nodeOf(path.to) });
  }
  return { size, edges };
}

/** Disjoint sets with path halving (Tarjan and van Leeuwen 1984). */
export class DisjointSets {
  readonly #parent: number[];

  constructor(size: number) {
    this.#parent = Array.from({ length: size }, (_, index) => index);
  }

  find(member: number): number {
    let at = member;
    for (let up = this.#up(at); up !== at; at = up, up = this.#up(at)) this.#parent[at] = up = this.#up(up);
    return at;
  }

  /** Joins two sets; false where they were one already. */
  join(a: number, b: number): boolean {
    const rootA = this.find(a);
    const rootB = this.find(b);
    this.#parent[rootA] = rootB;
    return rootA !== rootB;
  }

  #up(at: number): number {
    return this.#parent[at] ?? at;
  }
}
