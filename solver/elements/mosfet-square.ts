/** The square law of the MOSFET channel with body effect and length modulation (Shichman and Hodges 1968). */
import {
  bodyRootSlope,
  bodyThreshold,
  BODY_FACTOR,
  channelResult,
  GAIN_FACTOR,
  LENGTH_MODULATION,
  SURFACE_POTENTIAL,
  type Channel,
} from './mosfet-channel.ts';

export const squareChannel: Channel = {
  evaluate(derived, at, vgs, vds, vsb) {
    const overdrive = vgs - bodyThreshold(derived, at, vsb);
    if (overdrive <= 0) {
      channelResult.fill(0);
      return;
    }
    const beta = derived[at + GAIN_FACTOR]!;
    const lambda = derived[at + LENGTH_MODULATION]!;
    const modulation = 1 + lambda * vds;
    if (vds < overdrive) {
      const core = beta * (overdrive - vds / 2) * vds; // β(V_OV·V_DS − V_DS²/2)
      channelResult[0] = core * modulation;
      channelResult[1] = beta * vds * modulation;
      channelResult[2] = beta * (overdrive - vds) * modulation + core * lambda;
    } else {
      const core = (beta / 2) * overdrive * overdrive; // (β/2)V_OV²
      channelResult[0] = core * modulation;
      channelResult[1] = beta * overdrive * modulation;
      channelResult[2] = core * lambda;
    }
    const bodyFactor = derived[at + BODY_FACTOR]!;
    // ∂I/∂V_SB = −g_m·∂V_T/∂V_SB
    channelResult[3] =
      bodyFactor === 0
        ? 0
        : -channelResult[1] * bodyFactor * bodyRootSlope(derived[at + SURFACE_POTENTIAL]!, vsb);
  },

  state(derived, at, vgs, vsb) {
    const threshold = bodyThreshold(derived, at, vsb);
    const overdrive = vgs - threshold;
    return { threshold, saturationVoltage: Math.max(overdrive, 0), cutoff: overdrive <= 0 };
  },
};
