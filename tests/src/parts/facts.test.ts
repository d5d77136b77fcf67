/** A device entered by facts, measured in the circuit the data sheet measures it in, must read its own facts. */
import { describe, expect, it } from 'vitest';
import type { Device } from '../../../src/parts/devices/device.ts';
import { fitReportsOf } from '../../../src/parts/devices/fitting.ts';
import type { Draw, Figures, Law } from '../../../src/parts/kind.ts';
import { contextOf, kindOf, settleParts } from './settled.ts';
import type { Placed } from './settled.ts';

const facts = {
  gateThreshold: [{ low: 1, typical: 1.6, high: 2.5, at: { drainCurrent: '250u' } }],
  onResistance: [
    { typical: '10m', high: '13m', at: { gateToSource: 10, drainCurrent: 20 } },
    { typical: '14m', high: '19m', at: { gateToSource: 4.5, drainCurrent: 15 } },
  ],
  gateLeakage: [{ high: '100n', at: { gateToSource: 20 } }],
  bodyDiodeForward: [{ typical: 0.85, at: { current: 10 } }],
};
const deviceOf = (channel: 'n' | 'p'): Device => ({ type: 'mosfet', channel, facts });

const drawsOf = (kind: string, device: Device, law: Law = 'square'): readonly Draw[] => {
  const draws = kindOf(kind).draws(contextOf({ kind, name: 'X1', device, pins: {} }), law);
  if (!draws.ok) throw new Error(draws.faults[0]?.message);
  return draws.value;
};

const figure = (readings: ReturnType<typeof settleParts>, name: string, key: string): number =>
  Number((readings[name]?.figures as unknown as Record<string, unknown>)[key]);

const source = (name: string, current: number, from: string, to: string): Placed => ({
  kind: 'current-source',
  name,
  values: { current },
  pins: { from, to },
});

/** For p everything is turned about. */
const gateThreshold = (channel: 'n' | 'p', law: Law, figures: Figures = {}) => {
  const [into, out] = channel === 'n' ? ['0', 'd'] : ['d', '0'];
  const readings = settleParts(
    [
      source('G1', 250e-6, into, out),
      {
        kind: 'mosfet',
        name: 'Q1',
        device: deviceOf(channel),
        pins: { gate: 'd', drain: 'd', source: '0' },
        figures,
      },
    ],
    law,
  );
  return figure(readings, 'Q1', 'gateToSource');
};

const onResistance = (channel: 'n' | 'p', law: Law, gate: number, current: number, figures: Figures = {}) => {
  const sign = channel === 'n' ? 1 : -1;
  const [into, out] = channel === 'n' ? ['0', 'd'] : ['d', '0'];
  const readings = settleParts(
    [
      { kind: 'rail', name: 'VG', values: { voltage: sign * gate }, pins: { node: 'g' } },
      source('G1', current, into, out),
      {
        kind: 'mosfet',
        name: 'Q1',
        device: deviceOf(channel),
        pins: { gate: 'g', drain: 'd', source: '0' },
        figures,
      },
    ],
    law,
  );
  return Math.abs(figure(readings, 'Q1', 'drainToSource')) / current;
};

describe.each([
  ['n', 'square'],
  ['p', 'square'],
  ['n', 'smooth'],
  ['p', 'smooth'],
] as const)('a %s-channel device entered by facts, %s law', (channel, law) => {
  const sign = channel === 'n' ? 1 : -1;

  it('has its gate threshold at the test current, typical and at both ends', () => {
    expect(gateThreshold(channel, law) * sign).toBeCloseTo(1.6, 6);
    expect(gateThreshold(channel, law, { grade: -1 }) * sign).toBeCloseTo(1, 6);
    expect(gateThreshold(channel, law, { grade: 1 }) * sign).toBeCloseTo(2.5, 6);
  });

  it('has its on-resistances, the maximum with the maximum threshold', () => {
    expect(onResistance(channel, law, 10, 20) / 10e-3).toBeCloseTo(1, 5);
    expect(onResistance(channel, law, 4.5, 15) / 14e-3).toBeCloseTo(1, 5);
    expect(onResistance(channel, law, 10, 20, { grade: 1 }) / 13e-3).toBeCloseTo(1, 5);
    expect(onResistance(channel, law, 4.5, 15, { grade: 1 }) / 19e-3).toBeCloseTo(1, 5);
    // The minimum threshold goes with the typical on-resistance.
    expect(onResistance(channel, law, 10, 20, { grade: -1 }) / 10e-3).toBeCloseTo(1, 5);
  });

  it('lies between the ends for a grade between them', () => {
    const between = onResistance(channel, law, 4.5, 15, { grade: 0.5 });
    expect(between).toBeGreaterThan(14e-3);
    expect(between).toBeLessThan(19e-3);
  });
});

describe('the draws of a fitted device', () => {
  it('are one grade for all that the facts spread, and the gate leakage either way', () => {
    const draws = drawsOf('mosfet', deviceOf('n'));
    const spread = draws.filter(({ low, high }) => low < high).map(({ key }) => key);
    expect(spread.toSorted()).toEqual(['gateLeakage', 'grade', 'thresholdTemperatureCoefficient']);
    expect(draws.find(({ key }) => key === 'grade')).toMatchObject({ value: 0, low: -1, high: 1 });
    expect(draws.find(({ key }) => key === 'gateLeakage')).toMatchObject({
      value: 0,
      low: -100e-9,
      high: 100e-9,
    });
  });

  it('still move on their own: a gain a tenth higher than fitted', () => {
    const gain = drawsOf('mosfet', deviceOf('n')).find(({ key }) => key === 'gainFactor');
    const raised = onResistance('n', 'square', 4.5, 15, { gainFactor: (gain?.value ?? 0) * 1.1 });
    expect(raised).toBeLessThan(14e-3);
    expect(raised).toBeGreaterThan(12e-3);
  });

  it('let a leakage flow from gate to source and count it into the pins', () => {
    const readings = settleParts([
      { kind: 'rail', name: 'VG', values: { voltage: 5 }, pins: { node: 'g' } },
      {
        kind: 'mosfet',
        name: 'Q1',
        device: deviceOf('n'),
        pins: { gate: 'g', drain: '0', source: '0' },
        figures: { gateLeakage: 100e-9 },
      },
    ]);
    expect(readings.Q1?.pinCurrents.gate).toBeCloseTo(100e-9, 12);
    expect(readings.Q1?.pinCurrents.source).toBeCloseTo(-100e-9, 10);
  });

  it('follow the stated coefficient of the threshold', () => {
    const device: Device = {
      type: 'mosfet',
      channel: 'n',
      facts: { ...facts, thresholdTemperatureCoefficient: [{ low: '-6m', typical: '-5m', high: '-3m' }] },
    };
    expect(
      drawsOf('mosfet', device).find(({ key }) => key === 'thresholdTemperatureCoefficient'),
    ).toMatchObject({ value: -0.005, low: -0.006, high: -0.003, stated: true });
  });
});

describe('what a fit left open', () => {
  it('is among the assumptions, and every misfit is in the report', () => {
    const context = contextOf({ kind: 'mosfet', name: 'Q1', device: deviceOf('n'), pins: {} });
    const assumptions = kindOf('mosfet').assumptions(context, 'square');
    expect(assumptions).toContain('length modulation: no fact determines it: a default is taken');
    const reports = fitReportsOf(deviceOf('n'), 'square');
    expect(reports[0]?.comparisons.length).toBe(8);
    for (const { misfit } of reports[0]?.comparisons ?? []) expect(Math.abs(misfit)).toBeLessThan(1e-3);
  });

  it('a device whose facts determine nothing is refused with a fault that says what is missing', () => {
    const device: Device = {
      type: 'mosfet',
      channel: 'n',
      facts: { onResistance: [{ high: 1, at: { gateToSource: 10 } }] },
    };
    const draws = kindOf('mosfet').draws(
      contextOf({ kind: 'mosfet', name: 'Q1', device, pins: {} }),
      'square',
    );
    expect(draws.ok).toBe(false);
    if (!draws.ok) expect(draws.faults[0]).toMatchObject({ code: 'facts-too-few', path: 'facts' });
  });
});

describe('diodes and bipolar transistors entered by facts', () => {
  const voltageOf = (device: Device, current: number, figures: Figures = {}, celsius = 25) =>
    figure(
      settleParts(
        [
          source('G1', current, '0', 'x'),
          { kind: 'diode', name: 'D1', device, pins: { anode: 'x', cathode: '0' }, figures },
        ],
        'square',
        celsius,
      ),
      'D1',
      'voltage',
    );

  it('a diode has its forward voltages', () => {
    const device: Device = {
      type: 'diode',
      facts: {
        forwardVoltage: [
          { typical: 0.62, high: 0.72, at: { current: '1m' } },
          { typical: 0.82, high: 1, at: { current: '50m' } },
        ],
      },
    };
    expect(voltageOf(device, 1e-3)).toBeCloseTo(0.62, 6);
    expect(voltageOf(device, 50e-3)).toBeCloseTo(0.82, 6);
    expect(voltageOf(device, 50e-3, { grade: 1 })).toBeCloseTo(1, 6);
  });

  it('an LED falls by its stated coefficient, at the current of its forward voltage', () => {
    const device: Device = {
      type: 'led',
      facts: {
        forwardVoltage: [{ typical: 2, at: { current: '20m' } }],
        forwardTemperatureCoefficient: [{ typical: '-3m' }],
      },
    };
    expect(voltageOf(device, 20e-3)).toBeCloseTo(2, 6);
    expect(voltageOf(device, 20e-3, {}, 75)).toBeCloseTo(2 - 0.15, 4);
  });

  it('a Zener has its breakdown voltage and slope', () => {
    const device: Device = {
      type: 'zener',
      facts: {
        breakdownVoltage: [{ low: 9.4, typical: 10, high: 10.6, at: { current: '5m' } }],
        dynamicResistance: [{ typical: 8, at: { current: '5m' } }],
      },
    };
    expect(voltageOf(device, -5e-3)).toBeCloseTo(-10, 6);
    // A small step of current rises by the impedance.
    expect((voltageOf(device, -5e-3) - voltageOf(device, -5.01e-3)) / 1e-5).toBeCloseTo(8, 1);
    const breakdown = drawsOf('diode', device).find(({ key }) => key === 'breakdownVoltage');
    expect(breakdown).toMatchObject({ value: 10, low: 9.4, high: 10.6 });
  });

  it('a bipolar transistor has its gain and base voltage', () => {
    const device: Device = {
      type: 'bipolar',
      polarity: 'n-p-n',
      facts: {
        currentGain: [{ low: 100, typical: 200, at: { collectorCurrent: '2m', collectorToEmitter: 5 } }],
        baseToEmitter: [{ typical: 0.66, at: { collectorCurrent: '2m' } }],
      },
    };
    const readings = settleParts([
      { kind: 'rail', name: 'VC', values: { voltage: 5 }, pins: { node: 'c' } },
      source('G1', 10e-6, '0', 'b'),
      {
        kind: 'bipolar',
        name: 'Q1',
        device,
        pins: { base: 'b', collector: 'c', emitter: '0' },
      },
    ]);
    expect(figure(readings, 'Q1', 'collectorCurrent')).toBeCloseTo(2e-3, 7);
    expect(figure(readings, 'Q1', 'baseToEmitter')).toBeCloseTo(0.66, 5);
  });
});
