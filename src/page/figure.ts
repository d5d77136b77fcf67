import type { Figure } from '../readings/readings.ts';
import { formatQuantity } from '../values/format.ts';

/** A settled figure as it stands on the page; words where the drawing does not set it. */
export const figureText = (figure: Figure | undefined, unit: string): string =>
  figure === null || figure === undefined ? 'not fixed' : formatQuantity(figure, unit);

/** A code of the readings in words: `body-diode`, `at-risk`. */
export const inWords = (code: string): string => code.replaceAll('-', ' ');
