/** Bounds of the linear solver. */

/** Unit in the last place of 1 in double precision, 2⁻⁵². */
export const epsilon = Number.EPSILON;

/**
 * Fresh pivots: the preferred row is taken when its magnitude is at least this share of its column's largest,
 * else the largest is. 1 would be partial pivoting; 0 would trust the preferred row whatever its size.
 * A tenth is the usual threshold (I. S. Duff, A. M. Erisman and J. K. Reid, "Direct Methods for Sparse
 * Matrices", 1986), and leaves two decades before `refactorThreshold` asks for fresh pivots again.
 */
export const freshThreshold = 0.1;

/** Refactorisation: a pivot below this share of its column's largest means that pivots are chosen anew. */
export const refactorThreshold = 1e-3;

/** Largest backward error of an accepted solution. */
export const backwardErrorBound = 1e-12;

/** Residuals below this are not looked at: near the end of the range of doubles, digits are lost to underflow. */
export const underflowAllowance = 1e-300;

/** Steps of iterative refinement tried where even fresh pivots miss the bound. */
export const refinementSteps = 3;

/** Systems whose elimination takes at most this many multiplications run through a precomputed list. */
export const listedProducts = 20_000;
