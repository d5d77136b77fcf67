import { describe, expect, it } from 'vitest';
import { mosfet, resistor, voltageSource } from '../../../solver/index.ts';
import { expectNear, solve } from '../circuit.ts';
import { d } from '../decimal.ts';

/**
 * The stage that every textbook of microelectronics biases: divider on the gate, resistors in drain and source.
 * Figures in the sources are rounded to two or three places; the closed forms beside them are worked at 64 digits.
 */
const stage = (
  supply: number,
  [upper, lower, inDrain, inSource]: readonly [number, number, number, number],
  threshold: number,
  gainFactor: number,
) => {
  const transistor = (node: (name: string) => number) =>
    mosfet('Q1', [node('drain'), node('gate'), node('source'), node('source')], {
      polarity: 1,
      law: 'square',
      threshold,
      gainFactor,
    });
  let q1: ReturnType<typeof transistor> | undefined;
  const solved = solve((node) => {
    q1 = transistor(node);
    return [
      voltageSource('VDD', [node('supply'), 0], { voltage: supply }),
      resistor('RG1', [node('supply'), node('gate')], { resistance: upper }),
      resistor('RG2', [node('gate'), 0], { resistance: lower }),
      resistor('RD', [node('supply'), node('drain')], { resistance: inDrain }),
      inSource > 0
        ? resistor('RS', [node('source'), 0], { resistance: inSource })
        : voltageSource('short', [node('source'), 0], { voltage: 0 }),
      q1,
    ];
  });
  if (q1 === undefined) throw new Error('not built');
  return { ...solved, q1: solved.read(q1) };
};

/**
 * Saturation with a source resistor: ½β(V_G − V_T − R_S·I)² = I, in x = V_OV: (βR_S/2)x² + x − (V_G − V_T) = 0.
 */
function drainCurrent(
  supply: number,
  upper: number,
  lower: number,
  inSource: number,
  threshold: number,
  beta: number,
) {
  const gate = d(supply).times(lower).div(d(upper).plus(lower));
  const drive = gate.minus(threshold);
  const a = d(beta).times(inSource).div(2);
  const overdrive = a.isZero() ? drive : d(1).plus(a.times(drive).times(4)).sqrt().minus(1).div(a.times(2));
  return d(beta).div(2).times(overdrive.pow(2)).toNumber();
}

describe('four-resistor bias', () => {
  it('10 V, 10 MΩ/10 MΩ, 6 kΩ/6 kΩ rests at 0.5 mA, 5 V, 3 V and 7 V', () => {
    // Sedra and Smith, Microelectronic Circuits, 6th ed., example 5.6: V_t = 1 V, k_n'W/L = 1 mA/V². Value from memory.
    const { volts, q1 } = stage(10, [10e6, 10e6, 6e3, 6e3], 1, 1e-3);
    expect(q1.region).toBe('saturation');
    expectNear(q1.drainCurrent, 0.5e-3, 5e-3);
    expectNear(volts('gate'), 5, 1e-6);
    expectNear(volts('source'), 3, 5e-3);
    expectNear(volts('drain'), 7, 5e-3);
    expectNear(q1.drainCurrent, drainCurrent(10, 10e6, 10e6, 6e3, 1, 1e-3), 1e-7);
  });

  it('15 V, 8 MΩ/7 MΩ, 10 kΩ/10 kΩ moves from 0.5 mA to 0.455 mA when the threshold rises from 1 V to 1.5 V', () => {
    // Sedra and Smith, 6th ed., example 5.12 (bias stability): k_n'W/L = 1 mA/V². Value from memory.
    const before = stage(15, [8e6, 7e6, 10e3, 10e3], 1, 1e-3);
    const after = stage(15, [8e6, 7e6, 10e3, 10e3], 1.5, 1e-3);
    expectNear(before.q1.drainCurrent, 0.5e-3, 5e-3);
    expectNear(before.volts('drain'), 10, 5e-3);
    expectNear(before.volts('source'), 5, 5e-3);
    expectNear(after.q1.drainCurrent, 0.455e-3, 5e-3);
    expectNear(after.q1.drainCurrent, drainCurrent(15, 8e6, 7e6, 10e3, 1.5, 1e-3), 1e-7);
  });

  it('5 V, 30 kΩ/20 kΩ, 20 kΩ in the drain, source grounded rests at 0.1 mA and 3 V', () => {
    // Neamen, Microelectronics: Circuit Analysis and Design, example 3.3: V_TN = 1 V, K_n = 0.1 mA/V² with
    // I = K_n(V_GS − V_TN)², so β = 0.2 mA/V². Value from memory.
    const { volts, q1 } = stage(5, [30e3, 20e3, 20e3, 0], 1, 0.2e-3);
    expectNear(q1.gateToSource, 2, 1e-6);
    expectNear(q1.drainCurrent, 0.1e-3, 1e-6);
    expectNear(volts('drain'), 3, 1e-6);
    expect(q1.region).toBe('saturation');
  });

  it('p-channel, 5 V, 50 kΩ/50 kΩ, 7.5 kΩ in the drain rests in triode at 0.515 mA and 1.14 V', () => {
    // Neamen, example 3.4: V_TP = −0.8 V, K_p = 0.2 mA/V² (β = 0.4 mA/V²). Value from memory.
    const q1 = (node: (name: string) => number) =>
      mosfet('Q1', [node('drain'), node('gate'), node('supply'), node('supply')], {
        polarity: -1,
        law: 'square',
        threshold: -0.8,
        gainFactor: 0.4e-3,
      });
    let element: ReturnType<typeof q1> | undefined;
    const solved = solve((node) => {
      element = q1(node);
      return [
        voltageSource('VDD', [node('supply'), 0], { voltage: 5 }),
        resistor('R1', [node('supply'), node('gate')], { resistance: 50e3 }),
        resistor('R2', [node('gate'), 0], { resistance: 50e3 }),
        resistor('RD', [node('drain'), 0], { resistance: 7.5e3 }),
        element,
      ];
    });
    if (element === undefined) throw new Error('not built');
    const reading = solved.read(element);
    expect(reading.region).toBe('triode');
    expectNear(reading.drainCurrent, 0.515e-3, 5e-3);
    expectNear(-reading.drainToSource, 1.14, 5e-3);
    // Exactly: 5 − v = R_D·β(1.7v − v²/2), with R_D·β = 3 V⁻¹: 1.5v² − 6.1v + 5 = 0.
    const v = d('6.1').minus(d('6.1').pow(2).minus(30).sqrt()).div(3);
    expectNear(-reading.drainToSource, v.toNumber(), 1e-7);
  });
});
