/**
 * The smooth law of the MOSFET channel, one expression for all levels of inversion, voltages to the bulk
 * (Enz, Krummenacher and Vittoz 1995): I = 2nβU_T²·[F((V_P − V_S)/U_T) − F((V_P − V_D)/U_T)]·(1 + λV_DS),
 * F(v) = ln²(1 + e^{v/2}). The difference of the two is worked out as (l₁ − l₂)(l₁ + l₂).
 */
import {
  bodyThreshold,
  BODY_FACTOR,
  channelResult,
  GAIN_FACTOR,
  LENGTH_MODULATION,
  ROOT_SURFACE_POTENTIAL,
  SLOPE_FACTOR,
  SURFACE_POTENTIAL,
  THERMAL_VOLTAGE,
  THRESHOLD,
  type Channel,
} from './mosfet-channel.ts';

/** Pinch-off voltage worked out last: V_P (V), ∂V_P/∂V_GB, n, ∂n/∂V_GB (1/V). */
const pinch = new Float64Array(4);

/** ln(1 + eˣ), never by that formula where it would lose digits or overflow. */
const softplus = (x: number): number => (x > 0 ? x + Math.log1p(Math.exp(-x)) : Math.log1p(Math.exp(x)));

/** 1/(1 + e^−x), the slope of softplus. */
const logistic = (x: number): number => {
  if (x >= 0) return 1 / (1 + Math.exp(-x));
  const e = Math.exp(x);
  return e / (1 + e);
};

function pinchOff(derived: Float64Array, at: number, vgb: number): void {
  const gamma = derived[at + BODY_FACTOR]!;
  const threshold = derived[at + THRESHOLD]!;
  if (gamma === 0) {
    const n = derived[at + SLOPE_FACTOR]!;
    pinch[0] = (vgb - threshold) / n;
    pinch[1] = 1 / n;
    pinch[2] = n;
    pinch[3] = 0;
    return;
  }
  const ut = derived[at + THERMAL_VOLTAGE]!;
  const surface = derived[at + SURFACE_POTENTIAL]!;
  const vg = vgb - threshold + surface + gamma * derived[at + ROOT_SURFACE_POTENTIAL]!; // V_G′
  const vgPlus = ut * softplus(vg / ut);
  const vgSlope = logistic(vg / ut);
  const root = Math.sqrt(vgPlus + (gamma * gamma) / 4);
  const vp = vgPlus - surface - gamma * (root - gamma / 2);
  const vpSlope = vgSlope * (1 - gamma / (2 * root));
  const vpPlus = ut * softplus(vp / ut);
  const bulkRoot = Math.sqrt(surface + vpPlus);
  pinch[0] = vp;
  pinch[1] = vpSlope;
  pinch[2] = 1 + gamma / (2 * bulkRoot);
  pinch[3] = (-gamma / (4 * bulkRoot * bulkRoot * bulkRoot)) * logistic(vp / ut) * vpSlope;
}

const isZero = (value: number): boolean => value === 0;

/** Below this i_f the channel counts as cut off. */
const CUTOFF_INVERSION = 1e-4;

export const smoothChannel: Channel = {
  evaluate(derived, at, vgs, vds, vsb) {
    const ut = derived[at + THERMAL_VOLTAGE]!;
    const lambda = derived[at + LENGTH_MODULATION]!;
    pinchOff(derived, at, vgs + vsb);
    const n = pinch[2]!;
    const forward = (pinch[0]! - vsb) / (2 * ut);
    const reverse = (pinch[0]! - vsb - vds) / (2 * ut);
    const lf = softplus(forward);
    const lr = softplus(reverse);
    const sf = logistic(forward);
    const sr = logistic(reverse);
    const specific = 2 * n * derived[at + GAIN_FACTOR]! * ut * ut; // I_spec, A
    const modulation = 1 + lambda * vds;
    // l₁ − l₂ = ln(1 + σ(reverse)·(e^{V_DS/2U_T} − 1)), free of cancellation for small V_DS.
    const half = vds / (2 * ut);
    const difference = half < 1 ? Math.log1p(sr * Math.expm1(half)) : lf - lr;
    const core = specific * difference * (lf + lr); // A, without length modulation
    const byPinch = (specific * (lf * sf - lr * sr)) / ut; // ∂core/∂V_P, with F′ = 2·l·σ/2 = l·σ
    const toGate = (byPinch * pinch[1]! + (core / n) * pinch[3]!) * modulation; // ∂I/∂V_GB
    channelResult[0] = core * modulation;
    channelResult[1] = toGate;
    const byReverse = (specific * lr * sr) / ut; // ∂core/∂V_D = −∂/∂V_P of the reverse term
    channelResult[2] = byReverse * modulation + core * lambda;
    // At constant V_GS and V_DS a step of V_SB moves V_GB, V_S and V_D together.
    channelResult[3] = toGate - byPinch * modulation;
  },

  state(derived, at, vgs, vsb) {
    const ut = derived[at + THERMAL_VOLTAGE]!;
    pinchOff(derived, at, vgs + vsb);
    const inversionCoefficient = softplus((pinch[0]! - vsb) / (2 * ut)) ** 2;
    const threshold = isZero(derived[at + BODY_FACTOR]!)
      ? derived[at + THRESHOLD]! + (derived[at + SLOPE_FACTOR]! - 1) * vsb // where V_P = V_S
      : bodyThreshold(derived, at, vsb);
    return {
      threshold,
      saturationVoltage: ut * (2 * Math.sqrt(inversionCoefficient + 0.25) + 3),
      cutoff: inversionCoefficient < CUTOFF_INVERSION,
      inversion: inversionCoefficient < 0.1 ? 'weak' : inversionCoefficient <= 10 ? 'moderate' : 'strong',
      inversionCoefficient,
    };
  },
};
