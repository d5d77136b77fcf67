/** Facts are made by closed forms written out here; the fits have to find the device again. */
import { describe, expect, it } from 'vitest';
import { fitBipolar, fitBreakdown, fitDiode } from '../../../solver/fit/index.ts';
import type { BipolarFacts, JunctionDefaults } from '../../../solver/fit/index.ts';

const T0 = 298.15;
const thermal = (1.380649e-23 * T0) / 1.602176634e-19;
const at = <At extends object>(conditions: At, temperature = T0) => ({ ...conditions, temperature });

const defaults: JunctionDefaults = {
  saturationCurrent: 1e-9,
  emissionCoefficient: 1.8,
  seriesResistance: 0,
  bandGap: 1.12,
  emissionRange: [1, 2.5],
};

/** Shockley 1949 with a series resistance. */
const forward = (saturation: number, emission: number, series: number, current: number) =>
  emission * thermal * Math.log1p(current / saturation) + current * series;

const diode = (facts: Parameters<typeof fitDiode>[0]['forwardVoltage']) => {
  const result = fitDiode({ forwardVoltage: facts, reverseCurrent: [] }, defaults);
  if (!result.ok) throw new Error(result.reasons.join('; '));
  return result.fit;
};

describe('fitDiode', () => {
  it('finds the saturation current from one voltage, with the default emission coefficient', () => {
    const fit = diode([{ typical: forward(2e-9, 1.8, 0, 10e-3), at: at({ current: 10e-3 }) }]);
    expect(fit.parts.typical.saturationCurrent / 2e-9).toBeCloseTo(1, 9);
    expect(fit.parts.typical.emissionCoefficient).toBe(1.8);
    expect(fit.report.free.map(({ parameter }) => parameter)).toEqual([
      'emissionCoefficient',
      'seriesResistance',
    ]);
  });

  it('finds the emission coefficient from two', () => {
    const fit = diode(
      [1e-3, 100e-3].map((current) => ({
        typical: forward(5e-10, 1.6, 0, current),
        at: at({ current }),
      })),
    );
    expect(fit.parts.typical.emissionCoefficient).toBeCloseTo(1.6, 8);
    expect(fit.parts.typical.saturationCurrent / 5e-10).toBeCloseTo(1, 6);
    expect(fit.parts.typical.seriesResistance).toBe(0);
  });

  it('finds the series resistance from three', () => {
    const fit = diode(
      [1e-3, 10e-3, 200e-3].map((current) => ({
        typical: forward(5e-10, 1.6, 0.8, current),
        at: at({ current }),
      })),
    );
    expect(fit.parts.typical.emissionCoefficient).toBeCloseTo(1.6, 6);
    expect(fit.parts.typical.seriesResistance).toBeCloseTo(0.8, 6);
    expect(fit.report.conflicts).toEqual([]);
  });

  it('frees the series resistance where no emission coefficient within its limits explains two voltages', () => {
    // 0.3 V from 1 mA to 10 mA would need an emission coefficient of 5.
    const fit = diode([
      { typical: 0.6, at: at({ current: 1e-3 }) },
      { typical: 0.9, at: at({ current: 10e-3 }) },
    ]);
    const { emissionCoefficient, seriesResistance, saturationCurrent } = fit.parts.typical;
    expect(emissionCoefficient).toBeLessThanOrEqual(2.5);
    expect(seriesResistance).toBeGreaterThan(10);
    expect(forward(saturationCurrent, emissionCoefficient, seriesResistance, 1e-3)).toBeCloseTo(0.6, 8);
    expect(forward(saturationCurrent, emissionCoefficient, seriesResistance, 10e-3)).toBeCloseTo(0.9, 8);
  });

  it('fits the extreme parts to the extreme figures', () => {
    const fit = diode([{ low: 0.6, typical: 0.7, high: 0.8, at: at({ current: 10e-3 }) }]);
    expect(forward(fit.parts.low.saturationCurrent, 1.8, 0, 10e-3)).toBeCloseTo(0.6, 9);
    expect(forward(fit.parts.high.saturationCurrent, 1.8, 0, 10e-3)).toBeCloseTo(0.8, 9);
    expect(fit.report.comparisons.map(({ figure }) => figure)).toEqual(['low', 'typical', 'high']);
  });

  it('refuses facts without a forward voltage at a current', () => {
    expect(
      fitDiode({ forwardVoltage: [{ typical: 0.7, at: at({}) }], reverseCurrent: [] }, defaults).ok,
    ).toBe(false);
  });
});

describe('fitBreakdown', () => {
  const fitted = (facts: Parameters<typeof fitBreakdown>[0]) => {
    const result = fitBreakdown(facts);
    if (!result.ok) throw new Error(result.reasons.join('; '));
    return result.fit;
  };
  const nominal = [{ low: 9.4, typical: 10, high: 10.6, at: at({ current: 5e-3 }) }];

  it('takes the voltage of each part and the slope of a typical impedance, moved to the same current', () => {
    // The law's slope is inverse to the current: 40 Ω at 1 mA is 8 Ω at 5 mA.
    const fit = fitted({
      breakdownVoltage: nominal,
      dynamicResistance: [{ typical: 40, at: at({ current: 1e-3 }) }],
    });
    expect(fit.voltage).toEqual({ low: 9.4, typical: 10, high: 10.6 });
    expect(fit.current).toBe(5e-3);
    expect(fit.resistance).toBeCloseTo(8, 12);
    expect(fit.report.conflicts).toEqual([]);
  });

  it('takes a maximum impedance for a bound, never for a negative resistance', () => {
    const fit = fitted({
      breakdownVoltage: nominal,
      dynamicResistance: [{ high: 20, at: at({ current: 5e-3 }) }],
    });
    expect(fit.resistance).toBeGreaterThan(0);
    expect(fit.resistance).toBeLessThanOrEqual(20);
    expect(fit.report.free.map(({ parameter }) => parameter)).toEqual(['breakdownResistance']);
  });

  it('finds the slope from voltages at two currents', () => {
    // 10 V at 5 mA, 10.05 V at 20 mA: I·Z = 0.05/ln 4.
    const fit = fitted({
      breakdownVoltage: [...nominal, { typical: 10.05, at: at({ current: 20e-3 }) }],
      dynamicResistance: [],
    });
    expect(fit.resistance).toBeCloseTo(0.05 / Math.log(4) / 5e-3, 10);
  });

  it('leaves out a voltage that falls as the current rises, and says that it conflicts', () => {
    const fit = fitted({
      breakdownVoltage: [...nominal, { typical: 9.9, at: at({ current: 20e-3 }) }],
      dynamicResistance: [],
    });
    expect(fit.resistance).toBeGreaterThan(0);
    expect(fit.report.conflicts.some(({ facts }) => facts.includes('breakdownVoltage'))).toBe(true);
  });
});

describe('fitBipolar', () => {
  const nothing: BipolarFacts = {
    currentGain: [],
    baseToEmitter: [],
    saturationVoltage: [],
    outputConductance: [],
  };
  const fitted = (facts: Partial<BipolarFacts>) => {
    const result = fitBipolar(
      { ...nothing, ...facts },
      { saturationCurrent: 1e-14, reverseGain: 1, gainTemperatureCoefficient: 0.006 },
    );
    if (!result.ok) throw new Error(result.reasons.join('; '));
    return result.fit;
  };
  const gain = [{ low: 100, typical: 200, high: 300, at: at({ collectorCurrent: 1e-3 }) }];

  it('takes gains as they are, and I_S from V_BE', () => {
    const fit = fitted({
      currentGain: gain,
      baseToEmitter: [{ low: 0.6, typical: 0.65, high: 0.7, at: at({ collectorCurrent: 1e-3 }) }],
    });
    expect(fit.forwardGain.low).toBeCloseTo(100, 10);
    expect(fit.forwardGain.high).toBeCloseTo(300, 10);
    expect(fit.saturationCurrent.typical / (1e-3 / Math.expm1(0.65 / thermal))).toBeCloseTo(1, 10);
    // A high V_BE is a low saturation current.
    expect(fit.saturationCurrent.low / (1e-3 / Math.expm1(0.7 / thermal))).toBeCloseTo(1, 10);
    for (const { misfit } of fit.report.comparisons) expect(Math.abs(misfit)).toBeLessThan(1e-9);
  });

  it('finds the Early voltage from the output conductance, and takes its share out of the gain', () => {
    const fit = fitted({
      currentGain: [{ typical: 210, at: at({ collectorCurrent: 1e-3, collectorToEmitter: 5 }) }],
      outputConductance: [{ typical: 10e-6, at: at({ collectorCurrent: 1e-3 }) }],
    });
    expect(fit.earlyVoltage).toBeCloseTo(100, 10);
    expect(fit.forwardGain.typical).toBeCloseTo(200, 10);
  });

  it('finds the reverse gain from a typical saturation voltage (Ebers and Moll 1954)', () => {
    const stated = thermal * Math.log((1 + 11 / 0.2) / (1 - 10 / 200));
    const fit = fitted({
      currentGain: gain,
      saturationVoltage: [{ typical: stated, at: at({ collectorCurrent: 10e-3, baseCurrent: 1e-3 }) }],
    });
    expect(fit.reverseGain).toBeCloseTo(0.2, 10);
  });

  it('takes a maximum saturation voltage for a bound', () => {
    const loose = fitted({
      currentGain: gain,
      saturationVoltage: [{ high: 0.3, at: at({ collectorCurrent: 10e-3, baseCurrent: 1e-3 }) }],
    });
    expect(loose.reverseGain).toBe(1);
    // 60 mV is below what a reverse gain of 1 leaves: U_T·ln(12/0.95) = 65 mV.
    const tight = fitted({
      currentGain: gain,
      saturationVoltage: [{ high: 0.06, at: at({ collectorCurrent: 10e-3, baseCurrent: 1e-3 }) }],
    });
    expect(tight.reverseGain).toBeGreaterThan(1);
    expect(thermal * Math.log((1 + 11 / tight.reverseGain) / 0.95)).toBeCloseTo(0.06, 10);
  });

  it('refuses facts without a gain', () => {
    expect(
      fitBipolar(nothing, { saturationCurrent: 1e-14, reverseGain: 1, gainTemperatureCoefficient: 0 }).ok,
    ).toBe(false);
  });
});
