import { formatQuantity } from '../../values/format.ts';
import type { Figure } from '../../readings/readings.ts';

/** A reading in a table; what the drawing does not set has words, not a number. */
export const figure = (value: Figure | undefined, unit: string): string => {
  if (value === undefined) return '';
  return value === null ? 'not set' : formatQuantity(value, unit);
};

/** As `figure`, for a reading that may not apply: a dash in place of null. */
export const figureOrDash = (value: Figure | undefined, unit: string): string =>
  value === null ? '–' : figure(value, unit);
