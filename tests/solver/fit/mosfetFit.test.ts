/**
 * Facts are made by closed forms of the laws, written out here from their papers (Shichman and Hodges 1968; Enz,
 * Krummenacher and Vittoz 1995) for a device that is chosen; the fit has to find that device again.
 */
import { describe, expect, it } from 'vitest';
import { fitMosfet } from '../../../solver/fit/index.ts';
import type { Fact, MosfetDefaults, MosfetFacts, MosfetFit } from '../../../solver/fit/index.ts';

const T0 = 298.15;

const defaults: MosfetDefaults = {
  gainFactor: 0.1,
  lengthModulation: 0,
  slopeFactor: 1.3,
  thresholdTemperatureCoefficient: -0.004,
  bodyDiode: {
    saturationCurrent: 1e-12,
    emissionCoefficient: 1,
    seriesResistance: 0,
    bandGap: 1.12,
    emissionRange: [1, 2],
  },
};

const nothing: MosfetFacts = {
  mode: 'enhancement',
  gateThreshold: [],
  onResistance: [],
  forwardTransconductance: [],
  zeroBiasCurrent: [],
  bodyDiodeForward: [],
  hotOnResistanceRatio: [],
};

interface Device {
  readonly threshold: number;
  readonly gain: number;
  readonly drain?: number;
  readonly source?: number;
}

/** Square law, gate tied to the drain: V = V_T0 + √(2I/β), the source's own drop on top. */
const thresholdFact = ({ threshold, gain, source = 0 }: Device, current: number) =>
  threshold + Math.sqrt((2 * current) / gain) + current * source;

/** Square law: V_DS from I = β(V_OV·V − V²/2), over I, with what is in series. */
const onResistanceFact = (
  { threshold, gain, drain = 0, source = 0 }: Device,
  gate: number,
  current: number,
) => {
  const overdrive = gate - current * source - threshold;
  return (overdrive - Math.sqrt(overdrive * overdrive - (2 * current) / gain)) / current + drain + source;
};

/** Square law: g_m = √(2βI), taken down by the source resistance. */
const transconductanceFact = ({ gain, source = 0 }: Device, current: number) => {
  const inner = Math.sqrt(2 * gain * current);
  return inner / (1 + inner * source);
};

const at = <At extends object>(conditions: At, temperature = T0) => ({ ...conditions, temperature });

const typical = <Condition extends string>(value: number, conditions: Fact<Condition>['at']) => ({
  typical: value,
  at: conditions,
});

const fitted = (facts: Partial<MosfetFacts>, law: 'square' | 'smooth' = 'square'): MosfetFit => {
  const result = fitMosfet({ ...nothing, ...facts }, law, defaults);
  if (!result.ok) throw new Error(result.reasons.join('; '));
  return result.fit;
};

const misfitsOf = ({ report }: MosfetFit) => report.comparisons.map(({ misfit }) => Math.abs(misfit));

describe('fitMosfet, square law', () => {
  it('finds the device behind a threshold and an on-resistance', () => {
    const device = { threshold: 1.5, gain: 2 };
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(onResistanceFact(device, 10, 3), at({ gateToSource: 10, drainCurrent: 3 }))],
    });
    expect(fit.parts.typical.threshold).toBeCloseTo(1.5, 9);
    expect(fit.parts.typical.gainFactor).toBeCloseTo(2, 9);
    expect(fit.parts.typical.drainResistance).toBe(0);
    for (const misfit of misfitsOf(fit)) expect(misfit).toBeLessThan(1e-8);
    const free = fit.report.free.map(({ parameter }) => parameter);
    expect(free).toContain('drainResistance');
    expect(free).toContain('lengthModulation');
  });

  it('never confuses V_GS(th), which is at a test current, with V_T0', () => {
    const fit = fitted({
      gateThreshold: [typical(2, at({ drainCurrent: 1e-3 }))],
      onResistance: [typical(2, at({ gateToSource: 10, drainCurrent: 0.2 }))],
    });
    const { threshold, gainFactor } = fit.parts.typical;
    expect(threshold + Math.sqrt(2e-3 / gainFactor)).toBeCloseTo(2, 10);
    expect(threshold).toBeLessThan(1.99);
  });

  it('tells the channel from its series resistance by two on-resistances', () => {
    const device = { threshold: 1.5, gain: 60, drain: 7e-3, source: 1e-3 };
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [
        typical(onResistanceFact(device, 10, 20), at({ gateToSource: 10, drainCurrent: 20 })),
        typical(onResistanceFact(device, 4.5, 15), at({ gateToSource: 4.5, drainCurrent: 15 })),
      ],
    });
    const { threshold, gainFactor, drainResistance, sourceResistance } = fit.parts.typical;
    expect(threshold).toBeCloseTo(1.5, 7);
    expect(gainFactor / 60).toBeCloseTo(1, 6);
    expect(drainResistance).toBeCloseTo(7e-3, 9);
    expect(sourceResistance).toBe(1e-3);
    expect(fit.report.conflicts).toEqual([]);
  });

  it('tells them apart by on-resistance and transconductance too', () => {
    const device = { threshold: 2, gain: 20, drain: 5e-3, source: 1e-3 };
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(onResistanceFact(device, 10, 10), at({ gateToSource: 10, drainCurrent: 10 }))],
      forwardTransconductance: [
        typical(transconductanceFact(device, 20), at({ drainToSource: 10, drainCurrent: 20 })),
      ],
    });
    expect(fit.parts.typical.gainFactor / 20).toBeCloseTo(1, 6);
    expect(fit.parts.typical.drainResistance).toBeCloseTo(5e-3, 8);
  });

  it('pairs the maximum on-resistance with the maximum threshold, the minimum threshold with the typical one', () => {
    const weak = { threshold: 2.4, gain: 1.5 };
    const usual = { threshold: 1.6, gain: 2 };
    const fit = fitted({
      gateThreshold: [
        {
          low: 1,
          typical: thresholdFact(usual, 250e-6),
          high: thresholdFact(weak, 250e-6),
          at: at({ drainCurrent: 250e-6 }),
        },
      ],
      onResistance: [
        {
          typical: onResistanceFact(usual, 4.5, 1),
          high: onResistanceFact(weak, 4.5, 1),
          at: at({ gateToSource: 4.5, drainCurrent: 1 }),
        },
      ],
    });
    expect(fit.parts.high.threshold).toBeCloseTo(2.4, 8);
    expect(fit.parts.high.gainFactor).toBeCloseTo(1.5, 8);
    expect(fit.parts.typical.gainFactor).toBeCloseTo(2, 8);
    // The part of minimum threshold has the typical on-resistance: with more overdrive it has less gain.
    const { threshold, gainFactor } = fit.parts.low;
    expect(onResistanceFact({ threshold, gain: gainFactor }, 4.5, 1)).toBeCloseTo(
      onResistanceFact(usual, 4.5, 1),
      10,
    );
    expect(threshold + Math.sqrt(500e-6 / gainFactor)).toBeCloseTo(1, 10);
  });

  it('takes the gain of the maximum part where only maxima are stated, and says so', () => {
    const weak = { threshold: 2.4, gain: 1.5 };
    const fit = fitted({
      gateThreshold: [{ low: 1, high: thresholdFact(weak, 250e-6), at: at({ drainCurrent: 250e-6 }) }],
      onResistance: [
        { high: onResistanceFact(weak, 4.5, 1), at: at({ gateToSource: 4.5, drainCurrent: 1 }) },
      ],
    });
    expect(fit.parts.high.gainFactor).toBeCloseTo(1.5, 8);
    expect(fit.parts.typical.gainFactor).toBeCloseTo(1.5, 8);
    expect(fit.parts.low.gainFactor).toBeCloseTo(1.5, 8);
    const borrowed = fit.report.free.filter(({ parameter }) => parameter === 'gainFactor');
    expect(borrowed.map(({ grade }) => grade).toSorted()).toEqual(['low', 'typical']);
    // The threshold of the typical part is the middle of the two ends.
    const { threshold, gainFactor } = fit.parts.typical;
    expect(threshold + Math.sqrt(500e-6 / gainFactor)).toBeCloseTo((1 + thresholdFact(weak, 250e-6)) / 2, 8);
  });

  it('takes a transconductance stated only as a minimum for a bound: met, it changes nothing', () => {
    const device = { threshold: 1.5, gain: 2 };
    const facts: Partial<MosfetFacts> = {
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(onResistanceFact(device, 10, 3), at({ gateToSource: 10, drainCurrent: 3 }))],
    };
    const fit = fitted({
      ...facts,
      forwardTransconductance: [{ low: 0.5, at: at({ drainToSource: 10, drainCurrent: 1 }) }],
    });
    expect(fit.parts.typical.gainFactor).toBeCloseTo(2, 9);
    const entry = fit.report.comparisons.find(({ fact }) => fact === 'forwardTransconductance');
    expect(entry).toMatchObject({ bound: 'at-least', stated: 0.5, misfit: 0 });
    // g_m = √(2βI) = 2 S at 1 A.
    expect(entry?.fitted).toBeCloseTo(2, 8);
  });

  it('says which facts no one device can have', () => {
    const device = { threshold: 1.5, gain: 2 };
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(onResistanceFact(device, 10, 3), at({ gateToSource: 10, drainCurrent: 3 }))],
      // Half of what a channel of this on-resistance has at the least.
      forwardTransconductance: [
        typical(transconductanceFact(device, 1) / 2, at({ drainToSource: 10, drainCurrent: 1 })),
      ],
    });
    const [conflict] = fit.report.conflicts.filter(({ grade }) => grade === 'typical');
    expect(conflict?.facts.toSorted()).toEqual(['forwardTransconductance', 'onResistance']);
  });

  it('finds a depletion device by its cut-off voltage and its current at zero bias', () => {
    // I = (β/2)·V_T0² with V_T0 = −2 V, β = 4 mA/V²: 8 mA; 10 µA at V_GS = −2 + √(2·10 µA/4 mA) V.
    const fit = fitted({
      mode: 'depletion',
      gateThreshold: [typical(2 - Math.sqrt(20e-6 / 4e-3), at({ drainCurrent: 10e-6 }))],
      zeroBiasCurrent: [typical(8e-3, at({ drainToSource: 15 }))],
    });
    expect(fit.parts.typical.threshold).toBeCloseTo(-2, 8);
    expect(fit.parts.typical.gainFactor).toBeCloseTo(4e-3, 10);
  });

  it('takes facts at the temperature they hold at', () => {
    // V_T0 falls 4 mV/K and β goes with (T/T0)^−1.5: at 125 °C a device of 1.5 V, 2 A/V² has 1.1 V and less gain.
    const hot = T0 + 100;
    const cold = { threshold: 1.5, gain: 2 };
    const warm = { threshold: 1.1, gain: 2 * (hot / T0) ** -1.5 };
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(cold, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(onResistanceFact(warm, 10, 3), at({ gateToSource: 10, drainCurrent: 3 }, hot))],
    });
    expect(fit.parts.typical.gainFactor).toBeCloseTo(2, 8);
  });

  it('gives the series resistance the share that a hot on-resistance ratio asks for', () => {
    const device = { threshold: 1.5, gain: 60, drain: 7e-3, source: 1e-3 };
    const hot = 423.15;
    const rise = (hot / T0) ** 2.3;
    const warm = {
      threshold: 1.5 - 0.004 * 125,
      gain: 60 * (hot / T0) ** -1.5,
      drain: 7e-3 * rise,
      source: 1e-3 * rise,
    };
    const cold = onResistanceFact(device, 10, 20);
    const fit = fitted({
      gateThreshold: [typical(thresholdFact(device, 250e-6), at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(cold, at({ gateToSource: 10, drainCurrent: 20 }))],
      hotOnResistanceRatio: [typical(onResistanceFact(warm, 10, 20) / cold, at({}, hot))],
    });
    expect(fit.parts.typical.drainResistance).toBeCloseTo(7e-3, 7);
    expect(fit.hotOnResistanceRatio).toBeCloseTo(onResistanceFact(warm, 10, 20) / cold, 7);
  });

  it('refuses facts without a threshold', () => {
    const result = fitMosfet(nothing, 'square', defaults);
    expect(result.ok).toBe(false);
    if (!result.ok) expect(result.reasons[0]).toContain('gateThreshold');
  });

  it('says which facts it has no use for', () => {
    const fit = fitted({
      gateThreshold: [typical(2, at({ drainCurrent: 1e-3 }))],
      onResistance: [typical(2, at({ drainCurrent: 0.2 }))],
      zeroBiasCurrent: [typical(1e-6, at({ drainToSource: 10 }))],
      bodyDiodeForward: [{ high: 1.2, at: at({}) }],
    });
    expect(fit.report.unused.map(({ fact }) => fact)).toEqual([
      'onResistance',
      'zeroBiasCurrent',
      'bodyDiodeForward',
    ]);
    // Nothing else decides the gain: the default stands, and is named.
    expect(fit.parts.typical.gainFactor).toBeCloseTo(0.1, 10);
    expect(fit.report.free.some(({ parameter }) => parameter === 'gainFactor')).toBe(true);
  });

  it('fits the body diode to its typical voltage, and takes a sole maximum for a bound', () => {
    const facts: Partial<MosfetFacts> = {
      gateThreshold: [typical(2, at({ drainCurrent: 1e-3 }))],
      onResistance: [typical(2, at({ gateToSource: 10, drainCurrent: 0.2 }))],
    };
    const thermal = (1.380649e-23 * T0) / 1.602176634e-19;
    const stated = fitted({ ...facts, bodyDiodeForward: [typical(0.8, at({ current: 0.5 }))] });
    expect(stated.parts.typical.bodyDiode.saturationCurrent / (0.5 / Math.expm1(0.8 / thermal))).toBeCloseTo(
      1,
      8,
    );
    const bound = fitted({ ...facts, bodyDiodeForward: [{ high: 1.2, at: at({ current: 0.5 }) }] });
    for (const part of Object.values(bound.parts)) {
      expect(part.bodyDiode.saturationCurrent / 1e-12).toBeCloseTo(1, 9);
    }
  });
});

describe('fitMosfet, smooth law', () => {
  const thermal = (1.380649e-23 * T0) / 1.602176634e-19;
  const slope = 1.3;
  const forward = (v: number) => Math.log1p(Math.exp(v / (2 * thermal))) ** 2;
  const current = ({ threshold, gain }: Device, gate: number, drain: number) => {
    const pinch = (gate - threshold) / slope;
    return 2 * slope * gain * thermal * thermal * (forward(pinch) - forward(pinch - drain));
  };
  /** By halving, for want of a closed form. */
  const solved = (f: (x: number) => number, low: number, high: number) => {
    let [a, b] = [low, high];
    for (let pass = 0; pass < 200; pass++) {
      const middle = (a + b) / 2;
      if (f(middle) < 0) a = middle;
      else b = middle;
    }
    return (a + b) / 2;
  };

  it('finds the device behind a threshold in weak inversion and an on-resistance in strong inversion', () => {
    const device = { threshold: 1.7, gain: 5 };
    const gate = solved((v) => current(device, v, v) - 250e-6, 0, 5);
    const drop = solved((v) => current(device, 10, v) - 3, 0, 5);
    const fit = fitted(
      {
        gateThreshold: [typical(gate, at({ drainCurrent: 250e-6 }))],
        onResistance: [typical(drop / 3, at({ gateToSource: 10, drainCurrent: 3 }))],
      },
      'smooth',
    );
    expect(fit.parts.typical.threshold).toBeCloseTo(1.7, 8);
    expect(fit.parts.typical.gainFactor).toBeCloseTo(5, 7);
  });

  it('comes to other parameters than the square law from the same facts', () => {
    const facts: Partial<MosfetFacts> = {
      gateThreshold: [typical(1.6, at({ drainCurrent: 250e-6 }))],
      onResistance: [typical(0.1, at({ gateToSource: 10, drainCurrent: 3 }))],
    };
    const square = fitted(facts).parts.typical;
    const smooth = fitted(facts, 'smooth').parts.typical;
    expect(Math.abs(square.threshold - smooth.threshold)).toBeGreaterThan(0.02);
    expect(Math.abs(square.gainFactor - smooth.gainFactor)).toBeGreaterThan(0.01);
  });
});
