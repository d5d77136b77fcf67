/**
 * The device laws written down a second time, from the published formulas and over complex numbers, to check
 * values and derivatives of the solver's own against. n-channel and n-p-n; the tests mirror them.
 */
import { Complex } from './complex.ts';

const k = 1.380649e-23; // J/K, SI 2019
const q = 1.602176634e-19; // C, SI 2019
export const T0 = 298.15; // K
export const thermal = (temperature: number): number => (k * temperature) / q; // V

export interface ChannelFigures {
  readonly threshold: number;
  readonly gainFactor: number;
  readonly lengthModulation: number;
  readonly bodyFactor: number;
  readonly surfacePotential: number;
  readonly slopeFactor: number;
}

/** V_T0 + γ(√(2φ_F + V_SB) − √(2φ_F)), the root continued by its tangent below V_SB = −φ_F. */
export function thresholdOf(p: ChannelFigures, vsb: Complex): Complex {
  const edge = -p.surfacePotential / 2;
  const root =
    vsb.re >= edge
      ? vsb.add(p.surfacePotential).sqrt()
      : vsb
          .sub(edge)
          .div(2 * Math.sqrt(p.surfacePotential / 2))
          .add(Math.sqrt(p.surfacePotential / 2));
  return root.sub(Math.sqrt(p.surfacePotential)).mul(p.bodyFactor).add(p.threshold);
}

/** Square law (Shichman and Hodges 1968): drain, gate, source, body voltages to drain current, V_DS ≥ 0. */
export function squareCurrent(p: ChannelFigures, [d, g, s, b]: readonly Complex[]): Complex {
  if (!d || !g || !s || !b) throw new Error('four voltages');
  const vds = d.sub(s);
  const vov = g.sub(s).sub(thresholdOf(p, s.sub(b)));
  if (vov.re <= 0) return new Complex(0);
  const core =
    vds.re < vov.re
      ? vov.mul(vds).sub(vds.mul(vds).div(2)).mul(p.gainFactor)
      : vov.mul(vov).mul(p.gainFactor / 2);
  return core.mul(vds.mul(p.lengthModulation).add(1));
}

const softplus = (z: Complex): Complex => (z.re > 0 ? z.mul(-1).exp().log1p().add(z) : z.exp().log1p());

/** Smooth law (Enz, Krummenacher and Vittoz 1995): the same, V_DS ≥ 0. */
export function smoothCurrent(
  p: ChannelFigures,
  temperature: number,
  [d, g, s, b]: readonly Complex[],
): Complex {
  if (!d || !g || !s || !b) throw new Error('four voltages');
  const ut = thermal(temperature);
  const vgb = g.sub(b);
  let vp = vgb.sub(p.threshold).div(p.slopeFactor);
  let n = new Complex(p.slopeFactor);
  const gamma = p.bodyFactor;
  const surface = p.surfacePotential;
  if (gamma > 0) {
    const prime = vgb.sub(p.threshold).add(surface + gamma * Math.sqrt(surface));
    const plus = softplus(prime.div(ut)).mul(ut);
    vp = plus.sub(surface).sub(
      plus
        .add((gamma * gamma) / 4)
        .sqrt()
        .sub(gamma / 2)
        .mul(gamma),
    );
    const vpPlus = softplus(vp.div(ut)).mul(ut);
    n = new Complex(gamma / 2).div(vpPlus.add(surface).sqrt()).add(1);
  }
  const f = (v: Complex): Complex => {
    const l = softplus(v.div(2 * ut));
    return l.mul(l);
  };
  const specific = n.mul(2 * p.gainFactor * ut * ut);
  return specific
    .mul(f(vp.sub(s.sub(b))).sub(f(vp.sub(d.sub(b)))))
    .mul(d.sub(s).mul(p.lengthModulation).add(1));
}

/** I_S(T) = I_S·(T/T0)^(3/n)·exp(−(E_g/nk)(1/T − 1/T0)). */
export const saturationAt = (is: number, n: number, gap: number, temperature: number): number =>
  is * (temperature / T0) ** (3 / n) * Math.exp(((-gap * q) / (n * k)) * (1 / temperature - 1 / T0));

/** Shockley's diode with series resistance, by Newton's method on i = I_S(e^{(v − iR)/nU_T} − 1); plain where R is 0. */
export function diodeCurrent(is: number, scale: number, resistance: number, v: Complex): Complex {
  if (resistance === 0) return v.div(scale).expm1().mul(is);
  // From above the root the logarithmic form converges without fail: v = nU_T·ln(1 + i/I_S) + iR.
  let i = new Complex(Math.max(v.re, 1e-3) / resistance);
  for (let pass = 0; pass < 200; pass++) {
    const f = i.div(is).log1p().mul(scale).add(i.mul(resistance)).sub(v);
    const slope = new Complex(scale).div(i.add(is)).add(resistance);
    const step = f.div(slope);
    let next = i.sub(step);
    if (next.re <= -is) next = new Complex((i.re - is) / 2, next.im);
    const done = Math.abs(next.re - i.re) <= 1e-16 * Math.abs(next.re) && pass > 60;
    i = next;
    if (done) break;
  }
  return i;
}
