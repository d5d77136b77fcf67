/**
 * A bound on one quantity of one element, as plain data: what a question evaluates instead of knowing what a circuit
 * is for. Also what crosses to a worker.
 */
export interface Limit {
  /** Index in `Circuit.elements`. */
  readonly element: number;
  /** Name of a quantity of the element's operating point. */
  readonly quantity: string;
  /** `least` and `most` include the bound, `above` and `below` do not. */
  readonly sense: 'least' | 'most' | 'above' | 'below';
  /** SI units of the quantity. */
  readonly bound: number;
}

/** Distance to the bound in the quantity's unit: positive inside, negative outside, zero on it. */
export const margin = (limit: Limit, quantity: number): number =>
  limit.sense === 'least' || limit.sense === 'above' ? quantity - limit.bound : limit.bound - quantity;

/** Whether a quantity keeps its limit; a quantity that is not a number keeps none. */
export const keeps = (limit: Limit, quantity: number): boolean => {
  const distance = margin(limit, quantity);
  return limit.sense === 'above' || limit.sense === 'below' ? distance > 0 : distance >= 0;
};
