/**
 * The solver's only input: nodes and elements. Node 0 is the reference. SI units; temperatures in kelvin.
 * A circuit's structure (nodes, elements, laws) is fixed once prepared; parameter values are free to change.
 */
import type { ElementLaw } from './elements/law.ts';

export interface Element<Operating = unknown> {
  /** How messages name it. */
  readonly name: string;
  readonly law: ElementLaw<Operating>;
  /** Node of each terminal, in the order of `law.terminals`. */
  readonly nodes: readonly number[];
  /** Parameters in SI units, in the order of `law.parameters`. */
  readonly values: Float64Array;
}

export interface Circuit {
  /** Names of the nodes, for messages; index 0 is the reference. */
  readonly nodes: readonly string[];
  readonly elements: readonly Element[];
}
