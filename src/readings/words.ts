import { formatQuantity } from '../values/format.ts';

/** Figures as they stand in sentences: four significant figures, no idle zeros, a true minus. */
export const volts = (value: number): string => formatQuantity(value, 'V', { trim: true });
export const amperes = (value: number): string => formatQuantity(value, 'A', { trim: true });
export const watts = (value: number): string => formatQuantity(value, 'W', { trim: true });
export const ohms = (value: number): string => formatQuantity(value, 'Ω', { trim: true });
export const celsius = (value: number): string => formatQuantity(value, '°C');

/** `Q1`, `Q1 and Q2`, `Q1, Q2 and Q3`. */
export const listed = (names: readonly string[]): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} and ${names.at(-1) ?? ''}`;
