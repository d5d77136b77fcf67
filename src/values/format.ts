import { prefixSymbols } from './prefixes.ts';
import { quantities } from './quantities.ts';
import type { Quantity, QuantityName } from './quantities.ts';

export const trueMinus = '\u2212';

/** Puts the true minus in the place of each hyphen that signs a number. */
export const withTrueMinus = (text: string): string => text.replaceAll('-', trueMinus);

export interface FormatOptions {
  /** Significant figures; 4 where left out. */
  readonly figures?: number;
  /** Leaves zeros at the end away: `12 V` in place of `12.00 V`. */
  readonly trim?: boolean;
}

const isName = (text: string): text is QuantityName => Object.hasOwn(quantities, text);

/** Units before which no SI prefix is put. */
const bare = new Set(['', '°C', 'K', 'K/W', '1/K', '1/V', '√V', '%', 'ppm/K']);

/**
 * A reading as it stands on the screen and in a record: four significant figures, SI prefix, a space before
 * the unit, a true minus. Temperatures in °C are given to a tenth at most. A value that is not a number is a
 * programmer's mistake: what is not set has no figure.
 * @param of the name of a quantity, or a unit
 */
export function formatQuantity(
  value: number,
  of: QuantityName | (string & {}),
  options: FormatOptions = {},
): string {
  if (!Number.isFinite(value)) throw new RangeError(`no figure for ${value}`);
  const unit = isName(of) ? quantities[of].unit : of;
  const tail = unit === '' ? '' : ` ${unit}`;
  if (value === 0) return `0${tail}`;
  if (unit === '°C') return withTrueMinus(`${trimZeros(noNegativeZero(value.toFixed(1)))}${tail}`);
  if (unit === '1/K') return formatQuantity(value * 1e6, 'ppm/K', options);
  const { digits, exponent } = engineering(value, options.figures ?? 4, !bare.has(unit));
  const number = options.trim === true ? trimZeros(digits) : digits;
  const prefix = prefixSymbols.get(exponent);
  // Outside the prefixes the power of ten is written out.
  if (prefix === undefined) return withTrueMinus(`${value.toExponential((options.figures ?? 4) - 1)}${tail}`);
  return withTrueMinus(prefix === '' ? `${number}${tail}` : `${number} ${prefix}${unit}`);
}

/** A fraction in percent: 0.05 is `5 %`. */
export function formatPercent(fraction: number, figures = 3): string {
  return withTrueMinus(`${trimZeros(noNegativeZero(plain((fraction * 100).toPrecision(figures))))} %`);
}

/** What lies between two limits, both included: `1 mΩ to 100 GΩ`. */
export function formatRange(low: number, high: number, quantity: Quantity): string {
  const unit = quantity.prefixed || bare.has(quantity.unit) ? quantity.unit : '';
  if (low === Number.MIN_VALUE) return 'above 0';
  return `${formatLimit(low, unit)} to ${formatLimit(high, unit)}`;
}

const formatLimit = (value: number, unit: string) => {
  const tail = unit === '' ? '' : ` ${unit}`;
  if (unit === '°C' || bare.has(unit)) return withTrueMinus(`${value}${tail}`);
  return formatQuantity(value, unit, { trim: true });
};

/** A number's significant digits with the power of ten that an SI prefix carries, rounding carried over. */
export function engineering(
  value: number,
  figures: number,
  prefixed: boolean,
): { readonly digits: string; readonly exponent: number } {
  // The rounded number decides: 999.96 m is 1.000, not 1000 m.
  const [mantissa = '0', power = '0'] = value.toExponential(figures - 1).split('e');
  const exponent = prefixed ? Math.floor(Number(power) / 3) * 3 : 0;
  const shift = Number(power) - exponent;
  const decimals = Math.max(0, figures - 1 - shift);
  const digits = Number(`${mantissa}e${shift}`).toFixed(Math.min(decimals, 100));
  return { digits, exponent };
}

const plain = (text: string) => (text.includes('e') ? String(Number(text)) : text);
const noNegativeZero = (text: string) => (Number(text) === 0 ? text.replace('-', '') : text);

/** `12.00` is `12`, `4.70` is `4.7`, `100` stays. */
export const trimZeros = (text: string): string =>
  text.includes('.') && !text.includes('e') ? text.replace(/\.?0+$/, '') : text;
