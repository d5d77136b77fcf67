import type { DrawnStage } from './document.ts';
import { headingBetween, pointsAlong, type GridPoint, type Polyline } from './grid.ts';
import { endKey, netsOf } from './nets.ts';
import { standParts, type StandingPart } from './shape.ts';

/** A straight stretch of one net's lines between two points at which it ends, bends, or meets others. */
export interface Stretch {
  readonly net: number;
  readonly from: GridPoint;
  readonly to: GridPoint;
  /** The wires that run here, in the order of the document: more than one on a shared trunk. */
  readonly wires: readonly string[];
}

/** All that the routes amount to once lines drawn on one another are one line. */
export interface Lines {
  readonly stretches: readonly Stretch[];
  /** Where three or more ways of one net meet (lines and pins' leads): drawn with a dot. */
  readonly junctions: readonly GridPoint[];
  /** Where lines of two nets pass straight over one another: drawn without one. */
  readonly crossings: readonly GridPoint[];
}

interface Node {
  readonly at: GridPoint;
  readonly net: number;
  /** Wires leaving by each heading. */
  readonly ways: [Set<string>, Set<string>, Set<string>, Set<string>];
  /** Pins of the net that lie here. */
  pins: number;
}

const key = ([x, y]: GridPoint, net: number): string => `${net}:${x},${y}`;

/** The lines of a stage, its junctions and its crossings, from its routes. */
export const linesOf = (
  document: DrawnStage,
  paths: ReadonlyMap<string, Polyline>,
  parts: ReadonlyMap<string, StandingPart> = standParts(document),
): Lines => {
  const nets = netsOf(document);
  const nodes = nodesAlong(paths, nets.ofWire);
  for (const [id, part] of parts) {
    for (const [name, { at }] of part.pins) {
      const net = nets.ofEnd.get(endKey([id, name]));
      const node = net === undefined ? undefined : nodes.get(key(at, net));
      if (node !== undefined) node.pins++;
    }
  }

  const junctions = new Map<string, GridPoint>();
  const netsAt = new Map<string, Node[]>();
  for (const node of nodes.values()) {
    const place = node.at.join();
    const meeting = node.ways.filter((wires) => wires.size > 0).length + node.pins;
    if (meeting >= 3) junctions.set(place, node.at);
    netsAt.set(place, [...(netsAt.get(place) ?? []), node]);
  }
  const crossings = [...netsAt.values()]
    .filter((met) => met.length > 1)
    .flatMap(([node]) => (node === undefined ? [] : [node.at]));
  return { stretches: stretchesOf(nodes), junctions: [...junctions.values()], crossings };
};

/** Where three or more ways of one net meet: the dots. */
export const junctionPoints = (
  document: DrawnStage,
  paths: ReadonlyMap<string, Polyline>,
): readonly GridPoint[] => linesOf(document, paths).junctions;

const nodesAlong = (
  paths: ReadonlyMap<string, Polyline>,
  netOfWire: ReadonlyMap<string, number>,
): ReadonlyMap<string, Node> => {
  const nodes = new Map<string, Node>();
  for (const [wire, line] of paths) {
    const net = netOfWire.get(wire) ?? -1;
    let last: Node | undefined;
    for (const at of pointsAlong(line)) {
      const node: Node = nodes.get(key(at, net)) ?? {
        at,
        net,
        ways: [new Set(), new Set(), new Set(), new Set()],
        pins: 0,
      };
      nodes.set(key(at, net), node);
      const heading = last === undefined ? null : headingBetween(last.at, at);
      if (last !== undefined && heading !== null) {
        last.ways[heading].add(wire);
        node.ways[((heading + 2) & 3) as 0 | 1 | 2 | 3].add(wire);
      }
      last = node;
    }
  }
  return nodes;
};

/** Joins unit steps to stretches. A stretch goes on through a point where nothing but itself passes. */
const stretchesOf = (nodes: ReadonlyMap<string, Node>): Stretch[] => {
  const stretches: Stretch[] = [];
  const passes = (node: Node, heading: 0 | 1): boolean => {
    const [right, down, left, up] = node.ways;
    const [on, back, asideA, asideB] = heading === 0 ? [right, left, down, up] : [down, up, right, left];
    return node.pins === 0 && asideA.size + asideB.size === 0 && sameMembers(on, back);
  };
  for (const heading of [0, 1] as const) {
    for (const node of nodes.values()) {
      if (node.ways[heading].size === 0 || passes(node, heading)) continue;
      const wires = [...node.ways[heading]];
      const stepX = heading === 0 ? 1 : 0;
      let next: Node | undefined;
      let to = node.at;
      do {
        to = [to[0] + stepX, to[1] + 1 - stepX];
        next = nodes.get(key(to, node.net));
      } while (next !== undefined && passes(next, heading));
      stretches.push({ net: node.net, from: node.at, to, wires });
    }
  }
  return stretches;
};

const sameMembers = (a: ReadonlySet<string>, b: ReadonlySet<string>): boolean =>
  a.size === b.size && [...a].every((member) => b.has(member));
