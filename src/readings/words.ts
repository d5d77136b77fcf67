import { formatQuantity } from '../values/format.ts';

/** A figure as it stands in a sentence: four significant figures, no idle zeros, a true minus. */
const inUnit = (unit: string) => (value: number) =>
  Number.isFinite(value) ? formatQuantity(value, unit, { trim: true }) : 'no figure';

export const volts = inUnit('V');
export const amperes = inUnit('A');
export const watts = inUnit('W');
export const ohms = inUnit('Ω');
export const celsius = inUnit('°C');
export const pureNumber = inUnit('');

/** `Q1`, `Q1 and Q2`, `Q1, Q2 and Q3`. */
export const listed = (names: readonly string[]): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
