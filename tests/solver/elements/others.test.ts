import { describe, expect, it } from 'vitest';
import {
  amplifier,
  capacitor,
  contact,
  currentSource,
  inductor,
  logicOutput,
  mosfet,
  potentiometer,
  resistor,
  transconductor,
  voltageSource,
  zener,
  type Element,
} from '../../../solver/index.ts';
import { randomStream } from '../../properties/solver-random-circuits.ts';
import { evaluateElement, readElement } from './local.ts';

describe('linear elements, by hand', () => {
  it('resistor: 2 V across 1 kΩ drives 2 mA; +0.4 %/K makes it 1.2 kΩ at 75 °C', () => {
    const r = resistor('R1', [1, 2], { resistance: 1000, temperatureCoefficient: 0.004 });
    expect(Array.from(evaluateElement(r, [3, 1]).residual)).toEqual([2e-3, -2e-3]);
    expect(evaluateElement(r, [3, 1], 348.15).residual[0]).toBeCloseTo(2 / 1200, 15);
    expect(readElement(r, [3, 1])).toEqual({ voltage: 2, current: 2e-3, power: 4e-3 });
  });

  it('resistor below 1 Ω carries its current as an unknown, and none goes below 1 mΩ', () => {
    const r = resistor('R1', [1, 2], { resistance: 1e-6 });
    // V_a − V_b − R·I with R at the floor: 2e-3 − 1e-3·2 = 0
    expect(evaluateElement(r, [1.002, 1, 2]).residual[2]).toBeCloseTo(0, 15);
    expect(readElement(r, [1.002, 1, 2]).current).toBe(2);
  });

  it('voltage source: 12 V behind 0.5 Ω delivers 2 A at 11 V', () => {
    const s = voltageSource('BT1', [1, 2], { voltage: 12, resistance: 0.5 });
    expect(evaluateElement(s, [11, 0, -2]).residual[2]).toBe(0);
    expect(readElement(s, [11, 0, -2])).toEqual({ voltage: 11, current: -2, power: -22, delivered: 22 });
  });

  it('current source: from the first terminal through the source to the second', () => {
    const s = currentSource('I1', [1, 2], { current: 1e-3 });
    expect(readElement(s, [0, 5])).toEqual({ voltage: -5, current: 1e-3, power: -5e-3, delivered: 5e-3 });
  });

  it('capacitor is open and inductor is its winding', () => {
    expect(
      Array.from(evaluateElement(capacitor('C1', [1, 2], { capacitance: 1e-6 }), [5, 0]).residual),
    ).toEqual([0, 0]);
    const l = inductor('L1', [1, 2], { inductance: 1, resistance: 40 });
    expect(evaluateElement(l, [12, 0, 0.3]).residual[2]).toBeCloseTo(0, 15);
  });

  it('switch: 1 mΩ closed, nothing open, a leakage where one is stated', () => {
    expect(evaluateElement(contact('S1', [1, 2], { closed: true }), [1.001, 1, 1]).residual[2]).toBeCloseTo(
      0,
      15,
    );
    expect(evaluateElement(contact('S1', [1, 2], { closed: false }), [12, 0, 0]).residual[2]).toBeCloseTo(
      0,
      15,
    );
    const leaky = contact('S1', [1, 2], { closed: false, leakage: 1e-6 });
    expect(evaluateElement(leaky, [12, 0, 1e-6]).residual[2]).toBeCloseTo(0, 9);
    expect(evaluateElement(leaky, [0, 0, 0]).residual[2]).toBeCloseTo(0, 15);
  });

  it('potentiometer: 10 kΩ at 0.3 is 3 kΩ and 7 kΩ; at an end one side is 1 mΩ', () => {
    const p = potentiometer('RP1', [1, 2, 3], { resistance: 1e4, position: 0.3 });
    expect(Array.from(evaluateElement(p, [10, 0, 7, 1e-3, 1e-3]).residual.slice(3))).toEqual([0, 0]);
    const end = potentiometer('RP1', [1, 2, 3], { resistance: 1e4, position: 0 });
    expect(evaluateElement(end, [1.001, 0, 1, 1, 1e-4]).residual[3]).toBeCloseTo(0, 15);
  });

  it('transconductor: 2 mS times plus less minus, from `from` to `to`', () => {
    const t = transconductor('G1', [1, 2, 3, 4], { transconductance: 2e-3 });
    expect(Array.from(evaluateElement(t, [1.5, 1, 0, 0]).residual)).toEqual([0, 0, 1e-3, -1e-3]);
  });
});

describe('amplifier', () => {
  it('without supplies: gain times the input and the offset', () => {
    const u = amplifier('U1', [1, 2, 3], { gain: 1000, offset: 2e-3 });
    // 1000·(0.003 + 0.002) = 5 V
    expect(evaluateElement(u, [0.003, 0, 5, 0]).residual[3]).toBeCloseTo(0, 12);
  });

  it('with supplies stays between them less its margin, follows the gain to 98 % of that, and draws its output from them', () => {
    const u = amplifier('U1', [1, 2, 3, 4, 5], { gain: 1000, outputMargin: 0.5 });
    const output = (input: number) => -(evaluateElement(u, [input, 0, 0, 10, 0, 0]).residual[5] ?? NaN);
    expect(output(0)).toBe(5); // middle of 0 and 10 V
    expect(output(2e-3)).toBeCloseTo(7, 12);
    expect(output(1)).toBeGreaterThan(9.49);
    expect(output(1)).toBeLessThan(9.5);
    expect(output(-1)).toBeGreaterThan(0.5);
    // Taking 3 mA out of the output (−3 mA into it) brings it in at `high`.
    const given = evaluateElement(u, [0, 0, 5, 10, 0, -3e-3]).residual;
    expect(given[3]).toBeCloseTo(3e-3, 8);
    expect(given[4]).toBeCloseTo(0, 8);
    const taken = evaluateElement(u, [0, 0, 5, 10, 0, 3e-3]).residual;
    expect(taken[3]).toBeCloseTo(0, 8);
    expect(taken[4]).toBeCloseTo(-3e-3, 8);
    expect(readElement(u, [1, 0, 9.49, 10, 0, 0]).limited).toBe('high');
    expect(readElement(u, [1e-3, 0, 6, 10, 0, 0]).limited).toBe('none');
  });
});

describe('logic output', () => {
  it('high: 40 Ω to `high`; low: 25 Ω to `low`; open: nothing but clamps', () => {
    const at = (level: 'high' | 'low' | 'open', out: number) =>
      readElement(logicOutput('U1', [1, 2, 3], { level, highResistance: 40, lowResistance: 25 }), [
        out,
        5,
        0,
      ]);
    expect(at('high', 4.8).outputCurrent).toBeCloseTo(5e-3, 9);
    expect(at('low', 0.1).outputCurrent).toBeCloseTo(-4e-3, 9);
    expect(Math.abs(at('open', 2.5).outputCurrent)).toBeLessThan(1e-11);
    expect(at('open', 5.7).highClampCurrent).toBeGreaterThan(1e-4);
    expect(at('open', -0.7).lowClampCurrent).toBeGreaterThan(1e-4);
  });
});

describe('every law', () => {
  const channel = { threshold: 1, gainFactor: 0.01, lengthModulation: 0.05, bodyFactor: 0.6 };
  const laws: [string, Element, number][] = [
    ['resistor', resistor('R', [1, 2], { resistance: 47 }), 5],
    ['small resistor', resistor('R', [1, 2], { resistance: 0.1 }), 5],
    ['open switch with leakage', contact('S', [1, 2], { closed: false, leakage: 1e-6 }), 0.2],
    ['potentiometer', potentiometer('P', [1, 2, 3], { resistance: 100, position: 0.3 }), 5],
    ['amplifier', amplifier('U', [1, 2, 3], { gain: 100, offset: 1e-3 }), 2],
    ['amplifier with supplies', amplifier('U', [1, 2, 3, 4, 5], { gain: 3, outputMargin: 0.1 }), 2],
    ['transconductor', transconductor('G', [1, 2, 3, 4], { transconductance: 1e-3 }), 2],
    ['logic output', logicOutput('L', [1, 2, 3], { level: 'open' }), 0.8],
    [
      'mosfet with series resistances',
      mosfet('Q', [1, 2, 3, 4], {
        polarity: -1,
        law: 'square',
        ...channel,
        threshold: -1,
        drainResistance: 2,
        sourceResistance: 3,
      }),
      2,
    ],
    [
      'smooth mosfet with series resistances',
      mosfet('Q', [1, 2, 3, 4], {
        polarity: 1,
        law: 'smooth',
        ...channel,
        drainResistance: 2,
        sourceResistance: 3,
      }),
      2,
    ],
    [
      'zener',
      zener('Z', [1, 2], {
        saturationCurrent: 1e-12,
        seriesResistance: 0.3,
        breakdownVoltage: 1,
        breakdownCurrent: 1e-3,
        breakdownResistance: 20,
      }),
      1,
    ],
  ];

  it.each(laws)(
    '%s: slopes agree with central differences, and terminal currents sum to zero',
    (_, element, span) => {
      const { law } = element;
      const width = law.terminals.length + law.internals.length + law.branches.length;
      const random = randomStream(23);
      const step = 1e-6;
      for (let k = 0; k < 100; k++) {
        const x = Array.from({ length: width }, () => span * (random() - 0.3));
        const { residual, jacobian } = evaluateElement(element, x);
        for (let column = 0; column < width; column++) {
          const moved = (by: number) =>
            evaluateElement(
              element,
              x.map((v, at) => (at === column ? v + by : v)),
            ).residual;
          const up = moved(step);
          const down = moved(-step);
          jacobian.forEach((row, index) => {
            const difference = ((up[index] ?? NaN) - (down[index] ?? NaN)) / (2 * step);
            const scale = Math.max(...row.map(Math.abs), Math.abs(difference));
            expect(Math.abs((row[column] ?? NaN) - difference)).toBeLessThanOrEqual(2e-5 * scale + 1e-9);
          });
        }
        if (law.name === 'amplifier' && law.terminals.length === 3) continue; // its output returns through the reference
        const currents = residual.slice(0, law.terminals.length + law.internals.length);
        const size = Math.max(...currents.map(Math.abs));
        expect(Math.abs(currents.reduce((sum, i) => sum + i, 0))).toBeLessThanOrEqual(1e-14 * size + 1e-25);
      }
    },
  );

  it.each(laws)('%s: declares as many terminals, parameters and places as it uses', (_, element) => {
    const { law } = element;
    expect(element.nodes).toHaveLength(law.terminals.length);
    expect(element.values).toHaveLength(law.parameters.length);
    const width = law.terminals.length + law.internals.length + law.branches.length;
    for (const [row, column] of law.pattern) {
      expect(row).toBeLessThan(width);
      expect(column).toBeLessThan(width);
    }
    // Every Jacobian entry is written, and nothing beyond (local.ts fills with NaN).
    const { work } = evaluateElement(element, new Array<number>(width).fill(0.1));
    expect(work.jacobian.every(Number.isFinite)).toBe(true);
  });
});
