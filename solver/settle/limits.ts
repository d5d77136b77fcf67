/** Step limits, tolerances and budgets of settling, each with its meaning. */

/** Acceptance of a current row: this part of the sum of the magnitudes of its currents … */
export const CURRENT_PART = 1e-9;
/** … plus this part of the sum of |G|·|V|, the rounding beside large conductances … */
export const ROUNDING_PART = 1e-15;
/** … plus this, A. */
export const CURRENT_FLOOR = 1e-15;
/** Acceptance of a branch row: this part of the largest voltage, plus this, V. */
export const VOLTAGE_PART = 1e-9;
export const VOLTAGE_FLOOR = 1e-9;
/** The last step: below this part of the unknown, plus this in V, or plus that in A for branch currents. */
export const STEP_PART = 1e-9;
export const STEP_FLOOR_VOLTS = 1e-9;
export const STEP_FLOOR_AMPERES = 1e-12;

/** Most a node moves in one iteration, V. */
export const NODE_STEP = 2;

/** No current above this is ever a reading, A. */
export const GREATEST_CURRENT = 1e6;
/** How far outside the hull of the rails a node may lie by rounding, V. */
export const HULL_MARGIN = 1e-9;

/** A reading that moves by more than this with the leak at a hundredth is not set by the drawing, V. */
export const UNSET_MOVE = 1e-3;
/** A junction or channel of less conductance than this does not set the voltage of a node, S. */
export const UNSET_CONDUCTANCE = 1e-9;
/** A junction across voltage sources that carries more than this has nothing that limits it, A. */
export const STRAIGHT_CURRENT = 2.5;

/** Newton iterations, and time for everything, ms. */
export const DIRECT_BUDGET = 200;
export const OTHER_BUDGET = 5000;
export const TIME_BUDGET = 5000;
