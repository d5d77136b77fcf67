/** Which pieces of wiring are one node: by tags of one label, rails of one name, and the reference. */
import type { Scene, ScenePart } from '../scene.ts';
import type { Piece } from '../wireGraph.ts';

export interface SceneNode {
  readonly pieces: readonly Piece[];
  readonly pins: readonly { readonly part: ScenePart; readonly pin: string }[];
  /** The drawing itself says what the voltage is: the reference, or a rail with its voltage written at it. */
  readonly stated: boolean;
}

/** Nodes that have at least one line, in the order of the document. */
export const nodesOf = (scene: Scene, wiring: readonly Piece[]): readonly SceneNode[] => {
  const nodes: { pieces: Piece[]; pins: SceneNode['pins'][number][]; names: Set<string> }[] = [];
  const order = new Map(scene.parts.map((part, index) => [part.id, index]));
  for (const piece of wiring) {
    const pins = piece.vertices.flatMap((vertex) => vertex.pins);
    const names = new Set(pins.flatMap(({ part }) => nodeNames(part)));
    const node = { pieces: [piece], pins: [...pins], names };
    // A piece can bring together nodes that were apart until now.
    for (const other of nodes.filter((known) => [...names].some((name) => known.names.has(name)))) {
      nodes.splice(nodes.indexOf(other), 1);
      node.pieces.unshift(...other.pieces);
      node.pins.unshift(...other.pins);
      for (const name of other.names) node.names.add(name);
    }
    nodes.push(node);
  }
  const statedNames = new Set(
    scene.parts
      .filter(({ joins, lines }) => joins === 'name' && lines.length > 0)
      .flatMap((part) => nodeNames(part)),
  );
  return nodes.map(({ pieces, pins, names }) => ({
    pieces,
    pins: pins.sort((a, b) => (order.get(a.part.id) ?? 0) - (order.get(b.part.id) ?? 0)),
    stated: [...names].some((name) => name === reference || statedNames.has(name)),
  }));
};

const reference = 'reference';

/** A tag joins the rail of its label: both give the node one name. */
const nodeNames = (part: ScenePart): readonly string[] => {
  switch (part.joins) {
    case 'nothing':
      return [];
    case 'reference':
      return [reference];
    case 'label':
      return [`name ${part.lines[0] ?? part.key}`];
    case 'name':
      return [`name ${part.key}`];
  }
};
