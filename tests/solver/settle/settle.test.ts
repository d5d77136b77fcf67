import { describe, expect, it } from 'vitest';
import {
  amplifier,
  contact,
  currentSource,
  diode,
  mosfet,
  potentiometer,
  prepare,
  resistor,
  settle,
  thermalVoltage,
  voltageSource,
  type Element,
  type Prepared,
  type SettleOptions,
  type Settlement,
} from '../../../solver/index.ts';

const warm = { temperature: 298.15 };

function prepared(nodes: string[], elements: Element[]): Prepared {
  const preparation = prepare({ nodes: ['ground', ...nodes], elements });
  if (!preparation.ok) throw new Error(preparation.faults.map(({ message }) => message).join('; '));
  return preparation.value;
}

function settled(ready: Prepared, options: Partial<SettleOptions> = {}): Settlement {
  const result = settle(ready, { ...warm, ...options });
  if (!result.settled) throw new Error(result.message);
  return result;
}

const rail = (voltage: number, node = 1, name = 'VBAT') => voltageSource(name, [node, 0], { voltage });
const n = { polarity: 1, law: 'square', threshold: 1, gainFactor: 0.01 } as const;

describe('settle', () => {
  it('puts the beacon lamp driver at its operating point: 49.226 mA, 0.18572 V (solved by hand as a quadratic with λ)', () => {
    // β = 0.08 A/V², V_OV = 3.4 V, λ = 0.01: (12 − V)/240 = 0.08·(3.4V − V²/2)(1 + 0.01V) gives V = 0.185715 V
    const lamp = resistor('DS1', [1, 2], { resistance: 240 });
    const q = mosfet('Q1', [2, 4, 0, 0], { ...n, threshold: 1.6, gainFactor: 0.08, lengthModulation: 0.01 });
    const ready = prepared(
      ['vbat', 'drain', 'drive', 'gate'],
      [rail(12), lamp, q, rail(5, 3, 'DRIVE'), resistor('R1', [3, 4], { resistance: 100 })],
    );
    const point = settled(ready);
    expect(point.method).toBe('direct');
    expect(point.residual.ratio).toBeLessThanOrEqual(1);
    expect(point.voltages[2]).toBeCloseTo(0.185715, 6);
    expect(point.operating(q).drainCurrent).toBeCloseTo(0.0492262, 7);
    expect(point.operating(lamp).power).toBeCloseTo(0.58157, 4);
    expect(point.operating(q).region).toBe('triode');
    expect(point.terminalCurrents(q)[1]).toBe(0);
  });

  it('agrees with a hand-worked divider, bridge and loaded potentiometer', () => {
    const pot = potentiometer('RP1', [1, 0, 2], { resistance: 10e3, position: 0.25 });
    const ready = prepared(['vcc', 'wiper'], [rail(10), pot, resistor('RL', [2, 0], { resistance: 7.5e3 })]);
    // 2.5 kΩ above 7.5 kΩ ∥ 7.5 kΩ = 3.75 kΩ: 10·3.75/6.25 = 6 V
    expect(settled(ready).voltages[2]).toBeCloseTo(6, 12);
  });

  it('settles a diode and resistor as Lambert W says: V = 5 V, 1 kΩ, I_S = 1e-12 A', () => {
    const ready = prepared(
      ['v', 'd'],
      [
        rail(5),
        resistor('R1', [1, 2], { resistance: 1e3 }),
        diode('D1', [2, 0], { saturationCurrent: 1e-12 }),
      ],
    );
    const point = settled(ready);
    // U_T·ln(1 + I/I_S) + I·R = 5 V by bisection; the leak of 5e-13 S is nothing beside 4.4 mA.
    const ut = thermalVoltage(298.15);
    let low = 0;
    let high = 5e-3;
    for (let k = 0; k < 100; k++) {
      const current = (low + high) / 2;
      if (ut * Math.log1p(current / 1e-12) + 1e3 * current > 5) high = current;
      else low = current;
    }
    expect(point.voltages[2]).toBeCloseTo(5 - 1e3 * low, 9);
  });

  it('takes changed values without preparing again, from a warm start as from a cold one', () => {
    const r = resistor('R1', [1, 2], { resistance: 1e3 });
    const q = mosfet('Q1', [2, 1, 0, 0], n);
    const ready = prepared(['vcc', 'drain'], [rail(5), r, q]);
    const first = settled(ready);
    r.values[0] = 2e3;
    const again = settled(ready, { start: first.state });
    const fresh = settled(
      prepared(['vcc', 'drain'], [rail(5), resistor('R1', [1, 2], { resistance: 2e3 }), q]),
    );
    expect(again.voltages[2]).toBeCloseTo(fresh.voltages[2] ?? NaN, 9);
    expect(again.iterations).toBeLessThanOrEqual(fresh.iterations);
    // The first settlement is a snapshot: it still reads as it did.
    expect(first.operating(r).current).toBeCloseTo((5 - (first.voltages[2] ?? NaN)) / 1e3, 12);
  });

  it('holds each element at a temperature of its own where temperatures are given', () => {
    const r1 = resistor('R1', [1, 2], { resistance: 1e3, temperatureCoefficient: 0.01 });
    const r2 = resistor('R2', [2, 0], { resistance: 1e3, temperatureCoefficient: 0.01 });
    const ready = prepared(['vcc', 'mid'], [rail(10), r1, r2]);
    // 1 kΩ over 1.5 kΩ
    const point = settled(ready, { temperatures: Float64Array.of(298.15, 298.15, 348.15) });
    expect(point.voltages[2]).toBeCloseTo(6, 12);
  });

  it.each(['direct', 'timed', 'ramped', 'traced'] as const)(
    'reaches the same point by the method "%s" alone',
    (method) => {
      const q = mosfet('Q1', [2, 3, 4, 4], { ...n, lengthModulation: 0.02 });
      const ready = prepared(
        ['vcc', 'drain', 'gate', 'source'],
        [
          rail(15),
          resistor('R1', [1, 3], { resistance: 1e6 }),
          resistor('R2', [3, 0], { resistance: 470e3 }),
          resistor('RD', [1, 2], { resistance: 2200 }),
          resistor('RS', [4, 0], { resistance: 1000 }),
          q,
        ],
      );
      const point = settled(ready, { methods: [method] });
      expect(point.method).toBe(method);
      expect(point.voltages[2]).toBeCloseTo(settled(ready).voltages[2] ?? NaN, 8);
    },
  );

  it('names its failure: budget spent, cancelled, value that is no number', () => {
    const q = mosfet('Q1', [2, 1, 0, 0], n);
    const ready = prepared(['vcc', 'drain'], [rail(5), resistor('R1', [1, 2], { resistance: 1e3 }), q]);
    expect(settle(ready, { ...warm, methods: ['direct'], budget: { direct: 1 } })).toMatchObject({
      settled: false,
      reason: 'budget',
    });
    expect(settle(ready, { ...warm, signal: AbortSignal.abort() })).toMatchObject({
      settled: false,
      reason: 'cancelled',
    });
    expect(settle(ready, { temperature: 0 })).toMatchObject({ settled: false, reason: 'parameter' });
    q.values[1] = NaN;
    expect(settle(ready, warm)).toMatchObject({ settled: false, reason: 'parameter', elements: ['Q1'] });
    q.values[1] = 1;
    expect(settle(ready, warm).settled).toBe(true);
  });

  it('finds the one balance of an ideal amplifier with positive feedback, unstable as it is', () => {
    const ready = prepared(
      ['in', 'out'],
      [
        amplifier('U1', [1, 0, 2], { gain: 1e5, offset: 1e-3 }),
        resistor('R1', [2, 1], { resistance: 1e3 }),
        resistor('R2', [1, 0], { resistance: 1e3 }),
      ],
    );
    const result = settle(ready, warm);
    // It does balance, at V_out = −offset/(1/2 − 1/A), and nowhere else: a rest point, though no stable one.
    if (!result.settled) throw new Error(result.message);
    expect(result.voltages[2]).toBeCloseTo(-1e-3 / (0.5 - 1e-5), 9);
  });

  it('never takes more than 1 MA for a reading, and names the junction straight across a source', () => {
    const reversed = mosfet('Q1', [1, 0, 0, 0], n);
    const big = settle(prepared(['vbat'], [rail(-20e3), reversed]), warm);
    expect(big).toMatchObject({ settled: false, reason: 'over-current', elements: ['VBAT', 'Q1'] });
    const twelve = settled(prepared(['vbat'], [rail(-12), reversed]));
    expect(twelve.straightAcross).toEqual([reversed]);
  });

  it('opens and closes a switch by its value', () => {
    const s = contact('S1', [1, 2], { closed: true });
    const ready = prepared(['vbat', 'lamp'], [rail(12), s, resistor('DS1', [2, 0], { resistance: 240 })]);
    expect(settled(ready).voltages[2]).toBeCloseTo(12, 3);
    s.values[0] = 0;
    expect(settled(ready).voltages[2]).toBeCloseTo(0, 12);
  });

  it('takes a forced current into a high resistance as far as it goes: 1 mA into 1 MΩ is 1000 V', () => {
    const ready = prepared(
      ['a'],
      [currentSource('I1', [0, 1], { current: 1e-3 }), resistor('R1', [1, 0], { resistance: 1e6 })],
    );
    expect(settled(ready).voltages[1]).toBeCloseTo(1000, 6);
  });

  it('gives wrong elements a clear exception: a programmer’s mistake', () => {
    const point = settled(prepared(['a'], [rail(5)]));
    expect(() => point.terminalCurrents(rail(5, 1, 'OTHER'))).toThrow(
      'OTHER is not an element of the circuit',
    );
  });
});

describe('what the drawing does not set', () => {
  const unset = (nodes: string[], elements: Element[]) => {
    const found = settled(prepared(nodes, elements)).unset;
    return { nodes: found.nodes, elements: found.elements.map(({ name }) => name) };
  };

  it('is the drain between two transistors that are off, also where their leaks are equal', () => {
    const stack = (body: number) => [
      rail(12),
      mosfet('Q1', [1, 0, 2, body], n),
      mosfet('Q2', [2, 0, 0, 0], n),
    ];
    expect(unset(['vcc', 'mid'], stack(2))).toEqual({ nodes: [2], elements: ['Q1', 'Q2'] });
    expect(unset(['vcc', 'mid'], stack(0))).toEqual({ nodes: [2], elements: ['Q1', 'Q2'] });
  });

  it('is the source of a follower that drives nothing, wherever its body is', () => {
    const follower = (body: number) => [rail(12), rail(5, 3, 'VG'), mosfet('Q1', [1, 3, 2, body], n)];
    expect(unset(['vcc', 'source', 'gate'], follower(0)).elements).toEqual(['Q1']);
    expect(unset(['vcc', 'source', 'gate'], follower(2)).elements).toEqual(['Q1']);
  });

  it('is a node between two channels in saturation that nothing but the leak tells apart', () => {
    // Equal currents, no length modulation: the output of the pair has no slope of its own.
    const pair = [
      rail(10),
      rail(3, 3, 'VN'),
      rail(7, 4, 'VP'),
      mosfet('Q1', [2, 3, 0, 0], n),
      mosfet('Q2', [2, 4, 1, 1], { ...n, polarity: -1, threshold: -1 }),
    ];
    expect(unset(['vcc', 'out', 'gn', 'gp'], pair).nodes).toEqual([2]);
  });

  it('is not what a resistor of 100 GΩ sets, nor a conducting follower, nor an off drain with its load', () => {
    expect(
      unset(
        ['vcc', 'mid'],
        [
          rail(12),
          resistor('R1', [1, 2], { resistance: 100e9 }),
          resistor('R2', [2, 0], { resistance: 100e9 }),
        ],
      ).nodes,
    ).toEqual([]);
    expect(
      unset(
        ['vcc', 'drain'],
        [rail(12), resistor('R1', [1, 2], { resistance: 1e6 }), mosfet('Q1', [2, 0, 0, 0], n)],
      ).nodes,
    ).toEqual([]);
    expect(
      unset(
        ['vcc', 's'],
        [rail(12), mosfet('Q1', [1, 1, 2, 0], n), resistor('R1', [2, 0], { resistance: 10e6 })],
      ).nodes,
    ).toEqual([]);
  });

  it('is not looked for where that was not asked', () => {
    const ready = prepared(
      ['vcc', 'mid'],
      [rail(12), mosfet('Q1', [1, 0, 2, 2], n), mosfet('Q2', [2, 0, 0, 0], n)],
    );
    expect(settled(ready, { findUnset: false }).unset.nodes).toEqual([]);
  });
});
