/**
 * Complex numbers, just enough to differentiate by complex step: f′(x) = Im f(x + ih)/h, free of cancellation, so exact
 * to rounding with h = 1e-30 (Squire and Trapp 1998, SIAM Review 40, 110).
 */
export class Complex {
  constructor(
    readonly re: number,
    readonly im = 0,
  ) {}

  add(b: Complex | number): Complex {
    const { re, im } = of(b);
    return new Complex(this.re + re, this.im + im);
  }

  sub(b: Complex | number): Complex {
    const { re, im } = of(b);
    return new Complex(this.re - re, this.im - im);
  }

  mul(b: Complex | number): Complex {
    const { re, im } = of(b);
    return new Complex(this.re * re - this.im * im, this.re * im + this.im * re);
  }

  div(b: Complex | number): Complex {
    const { re, im } = of(b);
    const size = re * re + im * im;
    return new Complex((this.re * re + this.im * im) / size, (this.im * re - this.re * im) / size);
  }

  exp(): Complex {
    const size = Math.exp(this.re);
    return new Complex(size * Math.cos(this.im), size * Math.sin(this.im));
  }

  /** e^z − 1, with its digits near 0; the imaginary part is a step, so sin and cos are its own. */
  expm1(): Complex {
    return new Complex(Math.expm1(this.re), Math.exp(this.re) * Math.sin(this.im));
  }

  log(): Complex {
    return new Complex(Math.log(Math.hypot(this.re, this.im)), Math.atan2(this.im, this.re));
  }

  /** ln(1 + z), with its digits near 0. */
  log1p(): Complex {
    return new Complex(Math.log1p(this.re), Math.atan2(this.im, 1 + this.re));
  }

  sqrt(): Complex {
    const root = Math.sqrt(this.re);
    return new Complex(root, this.im / (2 * root));
  }
}

const of = (b: Complex | number): Complex => (typeof b === 'number' ? new Complex(b) : b);

const STEP = 1e-30;

/** Gradient of a function of several variables by complex step, and its value. */
export function complexStep(
  f: (x: readonly Complex[]) => Complex,
  x: readonly number[],
): { readonly value: number; readonly gradient: number[] } {
  const gradient = x.map((_, moved) => f(x.map((v, k) => new Complex(v, k === moved ? STEP : 0))).im / STEP);
  return { value: f(x.map((v) => new Complex(v))).re, gradient };
}
