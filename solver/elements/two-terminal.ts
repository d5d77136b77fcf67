/** What two-terminal elements read: voltage first less second, current first to second through the element. */
import { absorbedPower, type LocalEntry, type ReadingPoint } from './law.ts';

export interface TwoTerminalOperating {
  /** First terminal less second, V. */
  readonly voltage: number;
  /** From the first terminal through the element to the second, A. */
  readonly current: number;
  /** Absorbed, W. */
  readonly power: number;
}

export const readTwoTerminal = (at: ReadingPoint): TwoTerminalOperating => ({
  voltage: at.unknowns[0]! - at.unknowns[1]!,
  current: at.currents[0]!,
  power: absorbedPower(at),
});

/** Pattern of a conductance between local unknowns 0 and 1. */
export const conductancePattern: readonly LocalEntry[] = [
  [0, 0],
  [0, 1],
  [1, 0],
  [1, 1],
];
