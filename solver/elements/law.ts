/**
 * What a device law states of itself: terminals, unknowns, pattern, paths for the structure checks, and how it
 * is loaded and read. An element refers to its law, so a new law touches no other file.
 *
 * An element's local unknowns are its terminals, then its internal nodes, then its branch currents. Rows of
 * terminals and internal nodes are currents out of the node into the element (A); rows of branches are volts.
 */

export interface ElementLaw<Operating = unknown> {
  /** Kebab case, for messages: `resistor`, `mosfet`. */
  readonly name: string;
  readonly terminals: readonly string[];
  /** Names of the entries of `Element.values`. */
  readonly parameters: readonly string[];
  /** Internal nodes: unknown voltages of the element's own. */
  readonly internals: readonly string[];
  /**
   * The terminal that each internal node stands behind, reached through a conductance alone. A small resistance turns
   * the last digit of a voltage into a current: what is left over in the internal node's row is that rounding, and
   * belongs to the terminal's current.
   */
  readonly behind?: readonly number[];
  /** Branches: unknown currents of the element's own, each with a row in volts. */
  readonly branches: readonly string[];
  /** Local (row, column) of every Jacobian entry that may ever be other than zero; the order of the slots. */
  readonly pattern: readonly LocalEntry[];
  /** Terminals that sense a potential and take no direct current: gates, amplifier inputs. */
  readonly senses: readonly number[];
  /**
   * Outputs with a pole of their own, as the pattern's (branch row, output) entry: in a pseudo-transient the row
   * gains a lag on that output. Absent where there is none.
   */
  readonly lags?: readonly LocalEntry[];
  /** True where the Jacobian depends on `derived` alone; `load` may then leave it when `linearKnown` is set. */
  readonly linear?: boolean;
  /** Places in `Workspace.derived`: what `derive` works out once per settle. */
  readonly derivedSize: number;
  /** Places in `Workspace.memory`: what limiting remembers from one evaluation to the next. */
  readonly memorySize: number;

  /** How direct current can pass, at the present values; for the structure checks and the hull of the rails. */
  paths(values: Float64Array): readonly Path[];
  /** Places in `values` on which `paths` depends otherwise than by a source's voltage; absent where on none. */
  readonly pathValues?: readonly number[];

  /** Works out what depends on values and temperature only, into `derived` from index `at`. */
  derive(values: Float64Array, conditions: Conditions, derived: Float64Array, at: number): void;

  /**
   * Writes the batch's residuals and Jacobian entries, every one of them, into the places of its elements. Currents
   * are the element's own, worked out from its own voltages. Allocates nothing.
   */
  load(work: Workspace, batch: Batch): void;

  /** The operating point in words and figures, from voltages and currents that hold. Not in the inner loop. */
  read(at: ReadingPoint): Operating;
}

export type LocalEntry = readonly [row: number, column: number];

/** In place of a local terminal: the reference node. */
export const REFERENCE = -1;

/** A way for direct current between two local terminals (internal nodes allowed; `REFERENCE` for node 0). */
export type Path =
  /** Resistor, closed contact, winding: conducts whatever the voltages are. */
  | { readonly kind: 'passive'; readonly from: number; readonly to: number }
  /** Channel of a transistor, collector to emitter: passive, but conducts only when it is on. */
  | { readonly kind: 'channel'; readonly from: number; readonly to: number }
  /** A junction, `from` anode `to` cathode. Passive. */
  | { readonly kind: 'junction'; readonly from: number; readonly to: number }
  /** Voltage source, plus `from`, minus `to`; `voltage` is the place in `values`; `ideal` where nothing is in series. */
  | {
      readonly kind: 'source';
      readonly from: number;
      readonly to: number;
      readonly voltage: number;
      readonly ideal: boolean;
    }
  /** An output whose potential other nodes decide: carries direct current, but is not held to the rails. */
  | { readonly kind: 'driven'; readonly from: number; readonly to: number; readonly ideal: boolean }
  /** A current that is forced, fixed or controlled: no path for any other current. */
  | { readonly kind: 'current'; readonly from: number; readonly to: number };

export interface Conditions {
  /** Of this element, K. */
  readonly temperature: number;
  /** Of each junction and channel of this element, S. */
  readonly leak: number;
}

/** Elements of one law lie one after another in the workspace; a law loads them in one loop. */
export interface Batch {
  readonly count: number;
  /** First place in `x` and `residual`; each element takes terminals + internals + branches places. */
  readonly unknown: number;
  /** First place in `jacobian`; each element takes `pattern.length` places. */
  readonly slot: number;
  /** First place in `derived`. */
  readonly derived: number;
  /** First place in `memory`. */
  readonly memory: number;
}

/** How non-linear laws treat the voltages at hand. */
export const Phase = {
  /** Evaluate at the voltages as they are; leave the memory alone. */
  exact: 0,
  /** First evaluation of a cold start: evaluate at the law's own starting point and remember it. */
  start: 1,
  /** Limit the step from the remembered point, evaluate there, remember it; set `limited` where that acted. */
  limit: 2,
  /** Evaluate at the voltages as they are and remember them: a warm start. */
  adopt: 3,
} as const;
export type Phase = (typeof Phase)[keyof typeof Phase];

/**
 * What the laws read and write, element by element: every element has places of its own, and knows nothing of the
 * nodes they are joined at. Gathering the voltages and assembling rows and matrix is not the laws' business.
 */
export interface Workspace {
  /** Local unknowns of every element: terminal and internal voltages (V), branch currents (A). */
  readonly x: Float64Array;
  /** Current into the element at each terminal and internal node (A); branch rows (V). */
  readonly residual: Float64Array;
  /** Derivatives of `residual` against `x`, in the order of each law's pattern. */
  readonly jacobian: Float64Array;
  readonly derived: Float64Array;
  readonly memory: Float64Array;
  phase: Phase;
  /** Set where the Jacobian entries of linear laws stand from an earlier load. */
  linearKnown: boolean;
  /** Set by a law that evaluated elsewhere than at `x`. */
  limited: boolean;
  /** Factor on every independent source: 1, save while sources are ramped. */
  sourceScale: number;
  /** Factor on the gain of amplifiers: 1, save on a homotopy. */
  gainScale: number;
}

/** What a law reads its operating point from. */
export interface ReadingPoint {
  /** Local unknowns: V of terminals and internal nodes, A of branches. */
  readonly unknowns: Float64Array;
  /** Current into the element at each terminal, A. */
  readonly currents: Float64Array;
  readonly values: Float64Array;
  /** What `derive` gave, from index 0. */
  readonly derived: Float64Array;
  readonly temperature: number;
}

/** Power absorbed, W: the sum of terminal voltage times current into the terminal. */
export function absorbedPower(at: ReadingPoint): number {
  let power = 0;
  for (let terminal = 0; terminal < at.currents.length; terminal++)
    power += at.unknowns[terminal]! * at.currents[terminal]!;
  return power;
}
