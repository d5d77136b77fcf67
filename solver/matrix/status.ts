/** What a factorisation and a solution can report, as values. */

export type FactorStatus =
  /** Factorised in the pivot order found before. */
  | { readonly kind: 'refactored' }
  /** Factorised with pivots chosen anew. */
  | { readonly kind: 'factored' }
  /** No usable pivot is left for this column (0-based, as in the pattern); no factors stand. */
  | { readonly kind: 'singular'; readonly column: number }
  /** A value is infinite or not a number, or became so, at this column; no factors stand. */
  | { readonly kind: 'not-finite'; readonly column: number };

export type SolveStatus =
  /** The backward error is within its bound. */
  | { readonly kind: 'solved' }
  /** The best answer found, with fresh pivots and refinement, is still beyond the bound. */
  | { readonly kind: 'inaccurate'; readonly backwardError: number }
  /** Fresh pivots were needed and found the matrix singular; the right-hand side is left as given. */
  | { readonly kind: 'singular'; readonly column: number }
  /** The answer, or a value of the matrix, is infinite or not a number; the right-hand side is left as given. */
  | { readonly kind: 'not-finite'; readonly column: number };

// Shared, so that the steady state allocates nothing.
export const refactored: FactorStatus = { kind: 'refactored' };
export const factored: FactorStatus = { kind: 'factored' };
export const solved: SolveStatus = { kind: 'solved' };
