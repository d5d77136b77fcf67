/**
 * The drawn lines of each connected piece of wiring as a graph: points where lines meet, turn or end, and the
 * straight stretches between them. Two wires that run over one another for a while are one stretch.
 */
import type { Point } from './boxes.ts';
import type { Scene, ScenePart } from './scene.ts';

export interface Vertex {
  readonly at: Point;
  /** Pins that lie here. */
  readonly pins: readonly { readonly part: ScenePart; readonly pin: string }[];
  /** Indices into the piece's `stretches`. */
  readonly stretches: readonly number[];
}

export interface Stretch {
  /** Indices into the piece's `vertices`. */
  readonly from: number;
  readonly to: number;
  /** A wire that runs here; the first where there are several. */
  readonly wire: string;
}

export interface Piece {
  readonly index: number;
  readonly vertices: readonly Vertex[];
  readonly stretches: readonly Stretch[];
  readonly wires: readonly string[];
}

/** Pieces of wiring in the order of the document. A pin on which no wire ends belongs to none. */
export const wiringOf = (scene: Scene): readonly Piece[] => groupsOf(scene).map(pieceOf);

interface Group {
  readonly index: number;
  readonly wires: readonly Scene['wires'][number][];
  readonly parts: Scene['partOf'];
}

const groupsOf = (scene: Scene): readonly Group[] => {
  const parent = new Map<string, string>();
  const rootOf = (key: string): string => {
    let root = key;
    for (let next = parent.get(root); next !== undefined; next = parent.get(root)) root = next;
    return root;
  };
  for (const { ends } of scene.wires) {
    const [a, b] = [rootOf(ends[0].key), rootOf(ends[1].key)];
    if (a !== b) parent.set(b, a);
  }
  const groups = new Map<string, Scene['wires'][number][]>();
  for (const wire of scene.wires) {
    const root = rootOf(wire.ends[0].key);
    const group = groups.get(root);
    if (group === undefined) groups.set(root, [wire]);
    else group.push(wire);
  }
  return [...groups.values()].map((wires, index) => ({ index, wires, parts: scene.partOf }));
};

const keyOf = ([x, y]: Point): string => `${x},${y}`;

const pieceOf = ({ index, wires, parts }: Group): Piece => {
  const vertices = new Map<
    string,
    { at: Point; pins: Map<string, Vertex['pins'][number]>; stretches: number[] }
  >();
  const vertexAt = (at: Point) => {
    const key = keyOf(at);
    const known = vertices.get(key);
    if (known !== undefined) return known;
    const vertex = { at, pins: new Map<string, Vertex['pins'][number]>(), stretches: [] };
    vertices.set(key, vertex);
    return vertex;
  };
  for (const wire of wires) {
    for (const point of wire.points) vertexAt(point);
    for (const { key, at } of wire.ends) {
      const [id = '', pin] = key.split('.');
      const part = parts.get(id);
      if (part !== undefined && pin !== undefined) vertexAt(at).pins.set(key, { part, pin });
    }
  }

  const order = new Map([...vertices.keys()].map((key, place) => [key, place]));
  const stretches = new Map<string, Stretch>();
  const points = [...vertices.values()].map(({ at }) => at);
  for (const wire of wires) {
    for (let next = 1; next < wire.points.length; next++) {
      const [start, end] = [wire.points[next - 1], wire.points[next]];
      if (start === undefined || end === undefined) continue;
      const stops = points.filter((point) => isBetween(start, point, end)).sort(byDistanceFrom(start));
      for (let stop = 1; stop < stops.length; stop++) {
        const [a, b] = [stops[stop - 1], stops[stop]].map((point) =>
          point === undefined ? undefined : order.get(keyOf(point)),
        );
        if (a === undefined || b === undefined) continue;
        const key = a < b ? `${a}-${b}` : `${b}-${a}`;
        if (!stretches.has(key)) stretches.set(key, { from: a, to: b, wire: wire.id });
      }
    }
  }

  const list = [...stretches.values()];
  const members = [...vertices.values()];
  for (const [number, { from, to }] of list.entries()) {
    members[from]?.stretches.push(number);
    members[to]?.stretches.push(number);
  }
  return {
    index,
    vertices: members.map(({ at, pins, stretches: at2 }) => ({
      at,
      pins: [...pins.values()],
      stretches: at2,
    })),
    stretches: list,
    wires: wires.map(({ id }) => id),
  };
};

const byDistanceFrom =
  ([x, y]: Point) =>
  (a: Point, b: Point): number =>
    Math.hypot(a[0] - x, a[1] - y) - Math.hypot(b[0] - x, b[1] - y);

/** Whether a point lies on the straight line between two others, ends included. */
const isBetween = ([ax, ay]: Point, [x, y]: Point, [bx, by]: Point): boolean =>
  (bx - ax) * (y - ay) === (by - ay) * (x - ax) &&
  x >= Math.min(ax, bx) &&
  x <= Math.max(ax, bx) &&
  y >= Math.min(ay, by) &&
  y <= Math.max(ay, by);

/** Unit directions in which drawn lines leave a vertex: its stretches, and the leads of its parts. */
const directionsAt = (piece: Piece, vertex: Vertex): ReadonlySet<string> => {
  const directions = new Set<string>();
  const towards = ([x, y]: Point): void => {
    directions.add(`${Math.sign(x - vertex.at[0])},${Math.sign(y - vertex.at[1])}`);
  };
  for (const number of vertex.stretches) {
    const stretch = piece.stretches[number];
    const other = stretch === undefined ? undefined : piece.vertices[stretch.from];
    const far = other === vertex && stretch !== undefined ? piece.vertices[stretch.to] : other;
    if (far !== undefined) towards(far.at);
  }
  for (const { part, pin } of vertex.pins) {
    const lead = leadDirection(part, pin);
    if (lead !== undefined) directions.add(`${lead[0]},${lead[1]}`);
  }
  return directions;
};

/** The direction from a pin into its part: along the lead. */
export const leadDirection = (part: ScenePart, pin: string): Point | undefined => {
  const at = part.pins.get(pin);
  if (at === undefined) return undefined;
  const { left, top, right, bottom } = part.body;
  const across = at[0] <= left ? left - at[0] : at[0] >= right ? right - at[0] : 0;
  const down = at[1] <= top ? top - at[1] : at[1] >= bottom ? bottom - at[1] : 0;
  if (across === 0 && down === 0) {
    // A pin at the edge of its body: towards the body's middle, along the longer way.
    const [x, y] = [(left + right) / 2 - at[0], (top + bottom) / 2 - at[1]];
    return Math.abs(x) > Math.abs(y) ? [Math.sign(x), 0] : [0, Math.sign(y)];
  }
  return Math.abs(across) > Math.abs(down) ? [Math.sign(across), 0] : [0, Math.sign(down)];
};

/** Points at which three or more lines meet: these get a dot. */
export const junctionsOf = (piece: Piece): readonly Point[] =>
  piece.vertices.filter((vertex) => directionsAt(piece, vertex).size >= 3).map(({ at }) => at);
