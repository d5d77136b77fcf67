/** Where wires run. Everything in whole grid units, and everything a function of the document. */
export type { DrawnEnd, DrawnPart, DrawnStage, DrawnWire } from './document.ts';
export { boxesOverlap, unit, type GridBox, type GridPoint, type Heading, type Polyline } from './grid.ts';
export {
  partBox,
  pinPosition,
  reachOf,
  standPart,
  standParts,
  type StandingPart,
  type StandingPin,
} from './shape.ts';
export { cornersOf, type Routing } from './routing.ts';
export { routeStage, routeWires } from './routeWires.ts';
export { rerouteAfterMove } from './reroute.ts';
export { junctionPoints, linesOf, type Lines, type Stretch } from './lines.ts';
export {
  cutAt,
  draggedRun,
  healedPath,
  insertionInto,
  nearestOnRoute,
  nearestWire,
  type CutRoute,
  type Insertion,
  type OnRoute,
} from './runs.ts';
