import { describe, expect, it } from 'vitest';
import { currentSource, mosfet, resistor, voltageSource } from '../../../solver/index.ts';
import { expectNear, solve } from '../circuit.ts';
import { d, root } from '../decimal.ts';

type Node = (name: string) => number;
const n = { polarity: 1, law: 'square' } as const;
const p = { polarity: -1, law: 'square' } as const;

describe('the complementary pair with a load of 10 kΩ', () => {
  // Sedra and Smith, Microelectronic Circuits, 6th ed., example 5.8: ±2.5 V, V_tn = −V_tp = 1 V, 1 mA/V² each.
  // Values from memory.
  const pair = (input: number) => {
    const make = (node: Node) => ({
      upper: mosfet('QP', [node('out'), node('in'), node('plus'), node('plus')], {
        ...p,
        threshold: -1,
        gainFactor: 1e-3,
      }),
      lower: mosfet('QN', [node('out'), node('in'), node('minus'), node('minus')], {
        ...n,
        threshold: 1,
        gainFactor: 1e-3,
      }),
    });
    let both: ReturnType<typeof make> | undefined;
    const solved = solve((node) => {
      both = make(node);
      return [
        voltageSource('VDD', [node('plus'), 0], { voltage: 2.5 }),
        voltageSource('VSS', [node('minus'), 0], { voltage: -2.5 }),
        voltageSource('VI', [node('in'), 0], { voltage: input }),
        resistor('RL', [node('out'), 0], { resistance: 10e3 }),
        both.upper,
        both.lower,
      ];
    });
    if (both === undefined) throw new Error('not built');
    return { out: solved.volts('out'), upper: solved.read(both.upper), lower: solved.read(both.lower) };
  };

  it('carries 1.125 mA in each at rest, with the output at 0 V', () => {
    const { out, upper, lower } = pair(0);
    expectNear(upper.drainCurrent, 1.125e-3, 1e-7);
    expectNear(lower.drainCurrent, 1.125e-3, 1e-7);
    expect(Math.abs(out)).toBeLessThan(1e-6);
  });

  it('pulls the output to −2.44 V with 0.244 mA when the input is at +2.5 V', () => {
    const { out, upper, lower } = pair(2.5);
    expectNear(out, -2.44, 2e-3);
    expectNear(lower.drainCurrent, 0.244e-3, 2e-3);
    expect(upper.region).toBe('cutoff');
    expect(lower.region).toBe('triode');
    // Exactly, in v = V_DS: (2.5 − v)/10 = 4v − v²/2, or 5v² − 41v + 2.5 = 0.
    const v = d(41).minus(d(1681).minus(50).sqrt()).div(10);
    expectNear(out, v.minus('2.5').toNumber(), 1e-7);
  });

  it('pushes it to +2.44 V when the input is at −2.5 V', () => {
    const { out, upper, lower } = pair(-2.5);
    expectNear(out, 2.44, 2e-3);
    expect(lower.region).toBe('cutoff');
    expect(upper.region).toBe('triode');
  });
});

describe('the current mirror', () => {
  // Sedra and Smith, 6th ed., example 7.1: 3 V, V_t = 0.7 V, 200 µA/V² × 10, I_REF = 100 µA, V_A = 20 V: V_OV =
  // 0.316 V, R ≈ 20 kΩ, r_o = 200 kΩ, so that a volt more at the output adds 5 µA. Values from memory.
  const mirror = (output: number, lambda: number) => {
    const device = { ...n, threshold: 0.7, gainFactor: 2e-3, lengthModulation: lambda };
    const make = (node: Node) => ({
      q1: mosfet('Q1', [node('ref'), node('ref'), 0, 0], device),
      q2: mosfet('Q2', [node('out'), node('ref'), 0, 0], device),
    });
    let both: ReturnType<typeof make> | undefined;
    const solved = solve((node) => {
      both = make(node);
      return [
        currentSource('IREF', [0, node('ref')], { current: 100e-6 }),
        voltageSource('VO', [node('out'), 0], { voltage: output }),
        both.q1,
        both.q2,
      ];
    });
    if (both === undefined) throw new Error('not built');
    return { reference: solved.volts('ref'), q1: solved.read(both.q1), q2: solved.read(both.q2) };
  };

  it('without λ copies 100 µA with an overdrive of 0.316 V', () => {
    const { q1, q2 } = mirror(1.5, 0);
    expectNear(q1.overdrive, 0.316, 1e-3);
    expectNear(q1.overdrive, d('0.1').sqrt().toNumber(), 1e-6);
    expectNear(q2.drainCurrent, 100e-6, 1e-6);
  });

  it('with λ = 0.05 1/V passes 5 µA more for a volt more at its output', () => {
    const atReference = mirror(1, 0.05).reference;
    const equal = mirror(atReference, 0.05);
    const above = mirror(atReference + 1, 0.05);
    expectNear(equal.q2.drainCurrent, 100e-6, 1e-6);
    expectNear(above.q2.drainCurrent - equal.q2.drainCurrent, 5e-6, 6e-2);
    // Exactly: the ratio of the two currents is (1 + λV_O)/(1 + λV_GS), V_GS the root of ½β x²(1 + λ(x + V_T)) = I.
    const v = root(
      (x) =>
        d('1e-3')
          .times(x.minus('0.7').pow(2))
          .times(d(1).plus(x.times('0.05')))
          .minus('100e-6'),
      '0.8',
      '1.2',
    );
    expectNear(atReference, v.toNumber(), 1e-7);
    const ratio = d(1)
      .plus(v.plus(1).times('0.05'))
      .div(d(1).plus(v.times('0.05')));
    expectNear(above.q2.drainCurrent / equal.q2.drainCurrent, ratio.toNumber(), 1e-7);
  });
});

describe('the differential pair', () => {
  // Large-signal equation of the square-law pair (Gray and Meyer, Analysis and Design of Analog Integrated Circuits;
  // the form is common to all texts): ΔI = (β/2)·v·√(4I/β − v²) for |v| ≤ √(2I/β). Value from memory.
  const tail = 1e-3;
  const beta = 4e-3;
  const pair = (difference: number) => {
    const device = { ...n, threshold: 1, gainFactor: beta };
    const make = (node: Node) => ({
      q1: mosfet('Q1', [node('d1'), node('g1'), node('s'), node('s')], device),
      q2: mosfet('Q2', [node('d2'), node('g2'), node('s'), node('s')], device),
    });
    let both: ReturnType<typeof make> | undefined;
    const solved = solve((node) => {
      both = make(node);
      return [
        voltageSource('VDD', [node('plus'), 0], { voltage: 12 }),
        voltageSource('V1', [node('g1'), 0], { voltage: 5 + difference / 2 }),
        voltageSource('V2', [node('g2'), 0], { voltage: 5 - difference / 2 }),
        resistor('R1', [node('plus'), node('d1')], { resistance: 4e3 }),
        resistor('R2', [node('plus'), node('d2')], { resistance: 4e3 }),
        currentSource('IT', [node('s'), 0], { current: tail }),
        both.q1,
        both.q2,
      ];
    });
    if (both === undefined) throw new Error('not built');
    return { q1: solved.read(both.q1), q2: solved.read(both.q2) };
  };

  for (const difference of [-0.6, -0.25, 0.05, 0.1, 0.3, 0.5, 0.7]) {
    it(`divides its tail current by the large-signal equation at ${difference} V`, () => {
      const { q1, q2 } = pair(difference);
      const v = d(difference);
      const expected = d(beta)
        .div(2)
        .times(v)
        .times(d(4).times(tail).div(beta).minus(v.pow(2)).sqrt());
      expectNear(q1.drainCurrent - q2.drainCurrent, expected.toNumber(), 1e-6);
    });
  }

  it('passes all of it through one side beyond √(2I/β) = 0.707 V', () => {
    const { q1, q2 } = pair(0.72);
    expectNear(q1.drainCurrent, tail, 1e-6);
    expect(q2.region).toBe('cutoff');
  });
});

describe('loads that are transistors', () => {
  it('an enhancement load passes what its driver passes, so that the output is a straight line in the input', () => {
    // Neamen, Microelectronics, section 3.3: with both in saturation V_O = V_DD − V_TL − √(K_D/K_L)(V_I − V_TD).
    // Value from memory; the line itself is exact.
    const out = (input: number) =>
      solve((node) => [
        voltageSource('VDD', [node('plus'), 0], { voltage: 5 }),
        voltageSource('VI', [node('in'), 0], { voltage: input }),
        mosfet('QL', [node('plus'), node('plus'), node('out'), node('out')], {
          ...n,
          threshold: 1,
          gainFactor: 20e-6,
        }),
        mosfet('QD', [node('out'), node('in'), 0, 0], { ...n, threshold: 1, gainFactor: 100e-6 }),
      ]).volts('out');
    for (const input of [1.2, 1.5, 1.8, 2.1]) {
      expectNear(
        out(input),
        d(4)
          .minus(d(5).sqrt().times(d(input).minus(1)))
          .toNumber(),
        1e-6,
      );
    }
  });

  it('a depletion load holds its current ½βV_T² until it leaves saturation', () => {
    // Neamen, Microelectronics, section 3.3 (depletion load): load with V_TNL = −2 V, gate on its source. The driver
    // in triode at V_I = 5 V: ½β_L·4 = β_D(4v − v²/2); with β_D/β_L = 5: 2 = 20v − 2.5v². Worked here.
    const make = (node: Node) => ({
      load: mosfet('QL', [node('plus'), node('out'), node('out'), node('out')], {
        ...n,
        threshold: -2,
        gainFactor: 20e-6,
      }),
      driver: mosfet('QD', [node('out'), node('in'), 0, 0], { ...n, threshold: 1, gainFactor: 100e-6 }),
    });
    let both: ReturnType<typeof make> | undefined;
    const solved = solve((node) => {
      both = make(node);
      return [
        voltageSource('VDD', [node('plus'), 0], { voltage: 5 }),
        voltageSource('VI', [node('in'), 0], { voltage: 5 }),
        both.load,
        both.driver,
      ];
    });
    if (both === undefined) throw new Error('not built');
    const v = d(20).minus(d(400).minus(20).sqrt()).div(5);
    expectNear(solved.volts('out'), v.toNumber(), 1e-6);
    expectNear(solved.read(both.load).drainCurrent, 40e-6, 1e-6);
    expect(solved.read(both.load).region).toBe('saturation');
    expect(solved.read(both.driver).region).toBe('triode');
  });
});
