import type { GridPoint, Polyline } from './grid.ts';

/** Where every wire of a stage runs. */
export interface Routing {
  /** By wire id, both ends included: level and upright lines only. A wire with an end that has no place is left out. */
  readonly paths: ReadonlyMap<string, Polyline>;
  /** Wires for which there was no way round the parts and other nets: drawn as an L that goes through something. */
  readonly blocked: ReadonlySet<string>;
}

/** Corners of a route, as a wire's `path` states them. */
export const cornersOf = (line: Polyline): readonly GridPoint[] => line.slice(1, -1);
