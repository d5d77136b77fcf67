import { parseValue } from './parse.ts';
import { wordsOf } from './quantities.ts';
import type { QuantityName } from './quantities.ts';
import { describeFound } from './found.ts';
import { failure, success } from './result.ts';
import type { Fault, Result } from './result.ts';
import type { ResolvedValue } from './value-spec.ts';

const spreadKeys = new Set(['value', 'tolerance', 'low', 'high', 'sigma']);

/** Checks a value without spread of unknown origin. Faults carry no path where the value itself is meant. */
export function checkPlain(value: unknown, quantity: QuantityName): Result<number> {
  if (typeof value !== 'number' && typeof value !== 'string') {
    return failure({
      code: 'wrong-type',
      message: `A value of ${wordsOf(quantity)} is a number, or text such as "4.7 m".`,
      found: describeFound(value),
      allowed: 'a number in SI base units, or text',
    });
  }
  return parseValue(value, quantity);
}

const at = (key: string, faults: readonly Fault[]): readonly Fault[] =>
  faults.map((fault) => ({ ...fault, path: key }));

/**
 * Checks a value of unknown origin: a number, text, or an object with `value` and either `tolerance` or `low`
 * and `high`, optionally `sigma`. The path of a fault is the key inside the object, none for the value itself.
 */
export function checkValue(spec: unknown, quantity: QuantityName): Result<ResolvedValue> {
  if (typeof spec !== 'object' || spec === null || Array.isArray(spec)) {
    const plain = checkPlain(spec, quantity);
    if (plain.ok) return success({ nominal: plain.value, low: plain.value, high: plain.value });
    return plain;
  }
  return checkSpread(spec as Readonly<Record<string, unknown>>, quantity);
}

function checkSpread(spec: Readonly<Record<string, unknown>>, quantity: QuantityName): Result<ResolvedValue> {
  const faults: Fault[] = [];
  for (const key of Object.keys(spec)) {
    if (spreadKeys.has(key)) continue;
    faults.push({
      code: 'unknown-key',
      message: `A value has no key "${key}".`,
      path: key,
      found: `"${key}"`,
      allowed: 'value with tolerance, or value with low and high; optionally sigma',
    });
  }
  const has = (key: string) => Object.hasOwn(spec, key);
  const withTolerance = has('tolerance');
  const withLimits = has('low') || has('high');
  if (!has('value') || withTolerance === withLimits || (withLimits && has('low') !== has('high'))) {
    faults.push({
      code: 'spread-shape',
      message: 'A value with a spread states its value and either a tolerance or both low and high.',
      found: `an object with ${Object.keys(spec).join(', ') || 'no keys'}`,
      allowed: '{ value, tolerance } or { value, low, high }, optionally sigma',
    });
    return failure(...faults);
  }

  const read = (key: string, of: QuantityName): number => {
    const result = checkPlain(spec[key], of);
    if (result.ok) return result.value;
    faults.push(...at(key, result.faults));
    return Number.NaN;
  };
  const nominal = read('value', quantity);
  const tolerance = withTolerance ? checkTolerance(spec.tolerance, faults) : undefined;
  const low = tolerance === undefined ? read('low', quantity) : nominal - Math.abs(nominal) * tolerance;
  const high = tolerance === undefined ? read('high', quantity) : nominal + Math.abs(nominal) * tolerance;
  const sigma = has('sigma') ? checkSigma(spec.sigma, quantity, faults) : undefined;
  if (low > nominal || high < nominal) {
    faults.push({
      code: 'spread-order',
      message: 'Low, value and high must stand in that order: low ≤ value ≤ high.',
      path: low > nominal ? 'low' : 'high',
      found: `low ${String(low)}, value ${String(nominal)}, high ${String(high)}`,
      allowed: 'low ≤ value ≤ high',
    });
  }
  if (faults.length > 0) return failure(...faults);
  return success({
    nominal,
    low,
    high,
    ...(sigma === undefined ? {} : { sigma }),
    ...(tolerance === undefined ? {} : { tolerance }),
  });
}

/** In a file a tolerance is a plain fraction: 0.05 says ±5 %. */
function checkTolerance(tolerance: unknown, faults: Fault[]): number {
  if (typeof tolerance === 'number') {
    const result = parseValue(tolerance, 'tolerance');
    if (result.ok) return result.value;
    faults.push(...at('tolerance', result.faults));
  } else {
    faults.push({
      code: 'wrong-type',
      message: 'A tolerance is a fraction: 0.05 says ±5 %.',
      path: 'tolerance',
      found: describeFound(tolerance),
      allowed: 'a number, 0 to 0.99',
    });
  }
  return Number.NaN;
}

/** A standard deviation: the quantity's unit, but above zero, whatever the quantity's own range. */
function checkSigma(sigma: unknown, quantity: QuantityName, faults: Fault[]): number {
  const plain: Result<number> =
    typeof sigma === 'number' || typeof sigma === 'string'
      ? parseValue(sigma, quantity, { low: Number.MIN_VALUE, high: Number.MAX_VALUE })
      : checkPlain(sigma, quantity);
  if (plain.ok) return plain.value;
  faults.push(...at('sigma', plain.faults));
  return Number.NaN;
}
