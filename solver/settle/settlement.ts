/** What preparing and settling give back, as values. SI units; node 0 is the reference. */
import type { Element } from '../circuit.ts';
import type { Surroundings } from './surroundings.ts';

/**
 * How the point was reached: Newton alone; by a pseudo-transient; with the sources ramped; by arc-length
 * homotopy.
 */
export type Method = 'direct' | 'timed' | 'ramped' | 'traced';

/** What the drawing does not set. */
export interface Unset {
  /** Nodes whose voltage against the reference is not set. */
  readonly nodes: readonly number[];
  /** Elements with a voltage between two terminals that is not set. */
  readonly elements: readonly Element[];
}

export interface Settlement {
  readonly settled: true;
  readonly method: Method;
  /** Newton iterations, over all methods tried. */
  readonly iterations: number;
  /** Worst current row in amperes, and the worst row's ratio to its bound of acceptance (at most 1). */
  readonly residual: { readonly amperes: number; readonly ratio: number };
  /** V by node against the reference. */
  readonly voltages: Float64Array;
  /** Currents into the element, A, in the order of its terminals. */
  terminalCurrents(element: Element): Float64Array;
  /** The element's operating point, as its law states it. */
  operating<Operating>(element: Element<Operating>): Operating;
  /** What only the declared leak decides; empty where that was not asked for. */
  readonly unset: Unset;
  /** Elements with a junction that lies straight across voltage sources: only its guard resistance limits it. */
  readonly straightAcross: readonly Element[];
  /** All unknowns: a start for settling again. */
  readonly state: Float64Array;
}

export type UnsettledReason =
  /** No method found a point within its budget. */
  | 'budget'
  | 'cancelled'
  /** A parameter is not a finite number, or the temperature is not above 0 K. */
  | 'parameter'
  /** The equations have no single answer at these values. */
  | 'singular'
  /** An output that nothing limits drives itself off without end. */
  | 'runaway'
  /** The point found lies outside the rails, or carries more than 1 MA: no reading. */
  | 'beyond-rails'
  | 'over-current';

export interface Unsettled {
  readonly settled: false;
  readonly reason: UnsettledReason;
  /** A sentence a person can act on. */
  readonly message: string;
  /** Names of the nodes and of the elements concerned, the worst first. */
  readonly nodes: readonly string[];
  readonly elements: readonly string[];
  readonly iterations: number;
}

export type SettleResult = Settlement | Unsettled;

export interface SettleOptions extends Surroundings {
  /** `state` of an earlier settlement of the same prepared circuit: a warm start. */
  readonly start?: Float64Array;
  /** Most iterations of each method; `direct` alone where `methods` says so. */
  readonly budget?: Budget;
  /** Methods to try, in this order; all four. */
  readonly methods?: readonly Method[];
  /** Find what only the declared leak decides; true. */
  readonly findUnset?: boolean;
  readonly signal?: AbortSignal;
}

export interface Budget {
  /** Newton alone; 200. */
  readonly direct?: number;
  /** Newton iterations of each of the other methods; 5000. */
  readonly other?: number;
  /** ms for everything; 5000. */
  readonly time?: number;
}

/** A fault of the drawing that no arithmetic can mend. */
export interface StructureFault {
  readonly code:
    | 'no-ground'
    | 'no-path-to-ground'
    | 'floating-gate'
    | 'voltage-loop'
    | 'shorted-source'
    | 'current-cut-set';
  /** A sentence a person can act on. */
  readonly message: string;
  readonly nodes: readonly string[];
  readonly elements: readonly string[];
}
