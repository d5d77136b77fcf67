/**
 * Facts of a data sheet as the fits take them: magnitudes in SI units, temperatures in kelvin, each figure low, typical
 * or high as stated.
 */

export interface Fact<Condition extends string = never> {
  readonly low?: number;
  readonly typical?: number;
  readonly high?: number;
  /** The conditions that are stated; the temperature (K) always. */
  readonly at: Readonly<Partial<Record<Condition, number>>> & { readonly temperature: number };
}

/**
 * Which part of the lot: its principal fact (V_GS(th), V_F, V_Z, h_FE) at its minimum, typical, or at its maximum. A
 * figure that goes against the principal fact (g_fs against V_GS(th)) takes part with its other end.
 */
export type Grade = 'low' | 'typical' | 'high';
export const grades: readonly Grade[] = ['low', 'typical', 'high'];

export type Bound = 'equal' | 'at-most' | 'at-least';

/** One stated figure beside what the fitted model gives for it. */
export interface Comparison {
  /** Key of the fact: `onResistance`. */
  readonly fact: string;
  /** Its place in the list of that fact. */
  readonly index: number;
  readonly figure: Grade;
  /** The part that was fitted to the figure. */
  readonly grade: Grade;
  readonly bound: Bound;
  readonly stated: number;
  readonly fitted: number;
  /** (fitted − stated)/stated, percent; 0 where the figure is a bound that holds. */
  readonly misfit: number;
}

/** A parameter that the facts leave open, and what stands in. */
export interface FreeParameter {
  readonly parameter: string;
  readonly grade: Grade;
  readonly value: number;
  readonly reason: string;
}

/** Facts that no one part can have together. */
export interface Conflict {
  readonly facts: readonly string[];
  readonly grade: Grade;
  readonly reason: string;
}

/** A fact that the fit has no use for, and why. */
export interface UnusedFact {
  readonly fact: string;
  readonly index: number;
  readonly reason: string;
}

export interface FitReport {
  readonly comparisons: readonly Comparison[];
  readonly free: readonly FreeParameter[];
  readonly conflicts: readonly Conflict[];
  readonly unused: readonly UnusedFact[];
}

export type FitResult<Fit> =
  | { readonly ok: true; readonly fit: Fit }
  /** What the facts do not say, in sentences. */
  | { readonly ok: false; readonly reasons: readonly string[] };

/** The other end. */
export const opposite = (grade: Grade): Grade => {
  if (grade === 'typical') return 'typical';
  return grade === 'low' ? 'high' : 'low';
};

/** Misfit in percent: how far the fitted figure is past what was stated. */
export const misfitOf = (bound: Bound, stated: number, fitted: number): number => {
  const percent = stated === 0 ? (fitted === 0 ? 0 : Infinity) : ((fitted - stated) / Math.abs(stated)) * 100;
  if (bound === 'at-most') return Math.max(percent, 0);
  if (bound === 'at-least') return Math.min(percent, 0);
  return percent;
};

/** As a data sheet heads its columns. */
export const gradeWord = (grade: Grade): string =>
  ({ low: 'minimum', typical: 'typical', high: 'maximum' })[grade];
