/**
 * Faults of a drawing, found from its lines and boxes alone: nothing here knows of the grid on which routes are
 * searched. Each answer is a list of sentences, empty where all is well.
 */
import type { DrawnStage } from '../../../../src/stage/routing/document.ts';
import type { GridPoint, Polyline } from '../../../../src/stage/routing/grid.ts';
import { endKey, netsOf } from '../../../../src/stage/routing/nets.ts';
import type { Routing } from '../../../../src/stage/routing/routing.ts';
import { standParts } from '../../../../src/stage/routing/shape.ts';

interface Segment {
  readonly wire: string;
  readonly net: number;
  readonly from: GridPoint;
  readonly to: GridPoint;
}

const segmentsOf = (document: DrawnStage, { paths, blocked }: Routing): Segment[] => {
  const nets = netsOf(document);
  const segments: Segment[] = [];
  for (const [wire, line] of paths) {
    if (blocked.has(wire)) continue;
    for (let index = 1; index < line.length; index++) {
      const [from, to] = [line[index - 1], line[index]];
      if (from !== undefined && to !== undefined)
        segments.push({ wire, net: nets.ofWire.get(wire) ?? -1, from, to });
    }
  }
  return segments;
};

const low = (a: number, b: number): number => Math.min(a, b);
const high = (a: number, b: number): number => Math.max(a, b);

/** Lines that are neither level nor upright, and routes that double back on themselves. */
export const slanted = (paths: ReadonlyMap<string, Polyline>): string[] => {
  const faults: string[] = [];
  for (const [wire, line] of paths) {
    for (let index = 1; index < line.length; index++) {
      const [a, b, c] = [line[index - 1], line[index], line[index + 1]];
      if (a === undefined || b === undefined) continue;
      if (a[0] !== b[0] && a[1] !== b[1]) faults.push(`${wire} is slanted from ${a.join()} to ${b.join()}`);
      if (c === undefined) continue;
      const onward = (c[0] - b[0]) * (b[0] - a[0]) + (c[1] - b[1]) * (b[1] - a[1]);
      if (onward !== 0) faults.push(`${wire} does not turn at ${b.join()}`);
    }
  }
  return faults;
};

/** Wires whose ends are not where the pin or joint is, and wires that are missing. */
export const looseEnds = (document: DrawnStage, paths: ReadonlyMap<string, Polyline>): string[] => {
  const parts = standParts(document);
  return Object.entries(document.wires).flatMap(([wire, { ends }]) => {
    const line = paths.get(wire);
    if (line === undefined) return [`${wire} is not drawn`];
    return ends.flatMap(([id, pin], index) => {
      const at = pin === undefined ? document.joints[id] : parts.get(id)?.pins.get(pin)?.at;
      const end = index === 0 ? line[0] : line.at(-1);
      return at?.join() === end?.join()
        ? []
        : [`${wire} ends at ${end?.join() ?? '–'}, not at ${id}.${pin ?? ''}`];
    });
  });
};

/** Lines that pass through a part's body. A line may run along a body's edge only where a pin lies on that edge. */
export const throughBodies = (document: DrawnStage, routing: Routing): string[] => {
  const faults: string[] = [];
  const parts = standParts(document);
  for (const { wire, from, to } of segmentsOf(document, routing)) {
    for (const [id, { body }] of parts) {
      const inside =
        high(low(from[0], to[0]), body.left) < low(high(from[0], to[0]), body.right) ||
        (from[0] === to[0] && from[0] > body.left && from[0] < body.right);
      const insideDown =
        high(low(from[1], to[1]), body.top) < low(high(from[1], to[1]), body.bottom) ||
        (from[1] === to[1] && from[1] > body.top && from[1] < body.bottom);
      if (inside && insideDown) faults.push(`${wire} passes through ${id}`);
    }
  }
  return faults;
};

const on = ([x, y]: GridPoint, { from, to }: Segment): boolean =>
  x >= low(from[0], to[0]) &&
  x <= high(from[0], to[0]) &&
  y >= low(from[1], to[1]) &&
  y <= high(from[1], to[1]);

/** Lines that touch a pin or a joint of another net. */
export const overForeignPins = (document: DrawnStage, routing: Routing): string[] => {
  const nets = netsOf(document);
  const segments = segmentsOf(document, routing);
  const faults: string[] = [];
  const check = (key: string, at: GridPoint): void => {
    for (const segment of segments) {
      if (nets.ofEnd.get(key) !== segment.net && on(at, segment))
        faults.push(`${segment.wire} touches ${key}`);
    }
  };
  for (const [id, part] of standParts(document)) {
    for (const [pin, { at, drawn }] of part.pins) if (drawn) check(endKey([id, pin]), at);
  }
  for (const [joint, at] of Object.entries(document.joints)) check(joint, at);
  return faults;
};

/** Lines of two nets that run along each other, or touch other than by crossing in the middle of both. */
export const confusions = (document: DrawnStage, routing: Routing): string[] => {
  const segments = segmentsOf(document, routing);
  const faults: string[] = [];
  for (const [index, a] of segments.entries()) {
    for (const b of segments.slice(index + 1)) {
      if (a.net === b.net) continue;
      const left = high(low(a.from[0], a.to[0]), low(b.from[0], b.to[0]));
      const right = low(high(a.from[0], a.to[0]), high(b.from[0], b.to[0]));
      const top = high(low(a.from[1], a.to[1]), low(b.from[1], b.to[1]));
      const bottom = low(high(a.from[1], a.to[1]), high(b.from[1], b.to[1]));
      if (left > right || top > bottom) continue;
      const meet: GridPoint = [left, top];
      const isEnd = ({ from, to }: Segment): boolean =>
        from.join() === meet.join() || to.join() === meet.join();
      if (left < right || top < bottom) faults.push(`${a.wire} and ${b.wire} run along each other`);
      else if (isEnd(a) || isEnd(b)) faults.push(`${a.wire} and ${b.wire} touch at ${meet.join()}`);
    }
  }
  return faults;
};

export const faultsOf = (document: DrawnStage, routing: Routing): string[] => [
  ...slanted(routing.paths),
  ...looseEnds(document, routing.paths),
  ...throughBodies(document, routing),
  ...overForeignPins(document, routing),
  ...confusions(document, routing),
];
