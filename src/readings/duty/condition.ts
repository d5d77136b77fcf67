import { keeps } from '../../../solver/questions/limit.ts';
import type { Limit } from '../../../solver/questions/limit.ts';
import type { Verdict } from '../readings.ts';

/** One thing a duty asks: a limit as plain data, what its loss does to the verdict, and the words for it. */
export interface Condition {
  readonly limit: Limit;
  readonly loses: 'missed' | 'at-risk';
  /** A duty cannot rest on what the drawing does not set; a rating is not passed by it. */
  readonly whenNotSet: 'lost' | 'kept';
  /** Why it is lost, in words with figures. */
  readonly say: (quantity: number) => readonly string[];
}

/** What a duty comes to as plain data, before any point is known. */
export interface DutyConditions {
  readonly conditions: readonly Condition[];
  /** What a verdict that is not missed has to say of itself: `region only`, that no fact stands behind it. */
  readonly remarks: readonly string[];
}

export interface Judgement {
  readonly verdict: Verdict;
  readonly reasons: readonly string[];
}

/** Gives an element's quantity by name, SI. */
export type Measure = (element: number, quantity: string) => number;

const notSet = 'what the duty asks is not set by the drawing';

/** Evaluates the conditions at one point. A quantity that the drawing does not set is NaN. */
export const judge = ({ conditions, remarks }: DutyConditions, measure: Measure): Judgement => {
  const lost = conditions.flatMap((condition) => {
    const quantity = measure(condition.limit.element, condition.limit.quantity);
    if (keeps(condition.limit, quantity)) return [];
    if (Number.isNaN(quantity) && condition.whenNotSet === 'kept') return [];
    // What only the declared leak decides has no figure, and no duty rests on it.
    const reasons = Number.isNaN(quantity) ? [notSet] : condition.say(quantity);
    return [{ condition, reasons }];
  });
  const missed = lost.filter(({ condition }) => condition.loses === 'missed');
  if (missed.length > 0)
    return { verdict: 'missed', reasons: [...new Set(missed.flatMap((entry) => entry.reasons))] };
  return {
    verdict: lost.length > 0 ? 'at-risk' : 'held',
    reasons: [...new Set([...lost.flatMap((entry) => entry.reasons), ...remarks])],
  };
};
