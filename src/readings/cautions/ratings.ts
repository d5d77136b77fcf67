import { keeps } from '../../../solver/questions/limit.ts';
import type { Caution } from './settled.ts';

/** Every rating that a part passes. */
export const passedRatings: Caution = ({ duties, point }) =>
  [...duties.values()].flatMap(({ part, ratingLimits }) =>
    ratingLimits.flatMap(({ limit, say }) => {
      const quantity = point.measure(limit.element, limit.quantity);
      if (Number.isNaN(quantity) || keeps(limit, quantity)) return [];
      return [
        { code: 'rating-passed', severity: 'stop' as const, parts: [part.name], message: say(quantity) },
      ];
    }),
  );
