/**
 * The independent hand: closed forms and bracketed roots worked with mathjs BigNumber at 64 digits. Nothing in
 * here comes from solver/, so that no expected figure can be made by what it checks.
 */
import { all, create, type BigNumber } from 'mathjs';

export const decimal = create(all ?? {}, {
  number: 'BigNumber',
  precision: 64,
  // By default what lies below 1e-15 counts as zero in comparisons, pivots included, whatever the precision.
  relTol: 1e-60,
  absTol: 1e-60,
});

export type Decimal = BigNumber;

export const d = (value: number | string): Decimal => decimal.bignumber(value);

/** Boltzmann's constant over the elementary charge times the temperature: kT/q in volts (SI, exact since 2019). */
export const thermalVoltage = (kelvin: number | string): Decimal =>
  d('1.380649e-23').times(kelvin).div('1.602176634e-19');

/**
 * The root of a continuous function that changes sign between `low` and `high`, by bisection to 50 digits.
 * @throws RangeError where the signs at both ends agree.
 */
export function root(f: (x: Decimal) => Decimal, low: number | string, high: number | string): Decimal {
  let a = d(low);
  let b = d(high);
  const signAtA = f(a).isNegative();
  if (signAtA === f(b).isNegative()) throw new RangeError(`no change of sign between ${low} and ${high}`);
  for (let k = 0; k < 170; k++) {
    const middle = a.plus(b).div(2);
    if (f(middle).isNegative() === signAtA) a = middle;
    else b = middle;
  }
  return a.plus(b).div(2);
}

/** The principal branch of Lambert's W for a positive argument, by Newton's method on w·eʷ = z. */
export function lambertW(z: Decimal): Decimal {
  let w = z.plus(1).ln();
  for (let k = 0; k < 60; k++) {
    const e = w.exp();
    w = w.minus(
      w
        .times(e)
        .minus(z)
        .div(e.times(w.plus(1))),
    );
  }
  return w;
}
