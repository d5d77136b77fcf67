import type { Inversion, Verdict } from '../../readings/readings.ts';
import type { BadgeRegion, Family } from './curves.ts';

/** What a badge says of a device. */
export interface BadgeSign {
  readonly family: Family;
  readonly region: BadgeRegion;
  readonly reversed: boolean;
  /** Strong inversion carries no mark. */
  readonly inversion?: Inversion;
  readonly verdict: Verdict;
  /** Drawn in grey with a line through it: the values have changed since. */
  readonly stale?: boolean;
}
