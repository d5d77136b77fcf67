/**
 * What a route pays, in tenths of a grid unit of plain wire. Only the ratios matter: a bend is worth a detour of
 * three units, a crossing one of seven, and so on. Chosen by looking at drawings; common drafting practice asks for
 * few bends, then few crossings, then short lines.
 */
export const cost = {
  /** A unit of new line. */
  step: 10,
  /** A unit along a line that the same net has already: a shared trunk costs little ink. */
  shared: 4,
  bend: 30,
  /** Passing straight over another net's line. */
  crossing: 70,
  /** Leaving a pin otherwise than in line with its lead. */
  sideways: 25,
  /** The same at a rail, a ground or a test point, which a trunk often runs through. */
  sidewaysOfSymbol: 8,
  /** A unit beside another net's line one unit away. */
  crowded: 4,
  /** A grid point right beside a body or a lead. */
  beside: 6,
  /** A grid point where a part's name and value or a transistor's badge is likely to stand. */
  lettering: 4,
  /** Running over a pin of the same net on the way to another. */
  overPin: 10,
  /** A unit over another net's line, only while looking for the lines that stand in the way. */
  trespass: 400,
} as const;
