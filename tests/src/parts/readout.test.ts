/** Expected figures are worked by hand beside each case. */
import { describe, expect, it } from 'vitest';
import type { Device } from '../../../src/parts/devices/device.ts';
import type { PartReadout } from '../../../src/parts/readout.ts';
import { settleParts, sumOfPinCurrents } from './settled.ts';
import type { Placed } from './settled.ts';

const rail = (name: string, voltage: number): Placed => ({
  kind: 'rail',
  name,
  values: { voltage },
  pins: { node: name },
});

const resistor = (name: string, resistance: number | string, a: string, b: string): Placed => ({
  kind: 'resistor',
  name,
  values: { resistance },
  pins: { a, b },
});

const read = (readings: Readonly<Record<string, PartReadout>>, name: string): PartReadout => {
  const found = readings[name];
  if (found === undefined) throw new Error(`no reading of ${name}`);
  return found;
};

const figuresOf = (readings: Readonly<Record<string, PartReadout>>, name: string) =>
  read(readings, name).figures as unknown as Readonly<Record<string, number | string | boolean>>;

const expectFigures = (
  readings: Readonly<Record<string, PartReadout>>,
  name: string,
  expected: Readonly<Record<string, number | string | boolean>>,
) => {
  const figures = figuresOf(readings, name);
  for (const [key, value] of Object.entries(expected)) {
    const found = figures[key];
    if (typeof value !== 'number') expect(found, `${name}.${key}`).toBe(value);
    else {
      const error = Math.abs(Number(found) - value);
      expect(error, `${name}.${key}: ${found}, expected ${value}`).toBeLessThanOrEqual(
        1e-8 * Math.abs(value) + 1e-12,
      );
    }
  }
};

/** Every part of two pins or more: what goes in comes out. */
const expectClosed = (readings: Readonly<Record<string, PartReadout>>) => {
  for (const [name, readout] of Object.entries(readings)) {
    const currents = Object.values(readout.pinCurrents);
    if (currents.length < 2) continue;
    const scale = Math.max(...currents.map(Math.abs));
    expect(Math.abs(sumOfPinCurrents(readout)), `${name} ${JSON.stringify(currents)}`).toBeLessThanOrEqual(
      1e-9 * scale + 1e-15,
    );
  }
};

describe('parts of two pins', () => {
  it('a supply on a resistor: V/R from plus through the circuit, the power that one absorbs the other delivers', () => {
    const readings = settleParts([
      {
        kind: 'supply',
        name: 'BT1',
        values: { voltage: 12, resistance: 1 },
        pins: { plus: 'a', minus: '0' },
      },
      resistor('R1', 11, 'a', '0'),
    ]);
    // I = 12/(1 + 11) = 1 A, V = 11 V.
    expectFigures(readings, 'R1', { voltage: 11, current: 1, power: 11 });
    expectFigures(readings, 'BT1', { voltage: 11, current: -1, power: -11, delivered: 11 });
    expect(read(readings, 'BT1').pinCurrents).toEqual({ plus: -1, minus: 1 });
    expectClosed(readings);
  });

  it('a rail reads the current out of it', () => {
    const readings = settleParts([rail('VA', 5), resistor('R1', '1k', 'VA', '0')]);
    expectFigures(readings, 'VA', { voltage: 5, current: 0.005, power: -0.025, delivered: 0.025 });
    expect(read(readings, 'VA').pinCurrents.node).toBeCloseTo(-0.005, 12);
  });

  it('a rail without a voltage is no source and carries no figure but its own voltage', () => {
    const readings = settleParts([
      rail('VA', 5),
      { kind: 'rail', name: 'VA2', values: {}, pins: { node: 'VA' } },
      resistor('R1', '1k', 'VA', '0'),
    ]);
    expect(read(readings, 'VA2')).toEqual({ shape: 'other', figures: { voltage: 5 }, pinCurrents: {} });
  });

  it('a current source drives its current from `from` to `to` through itself', () => {
    const readings = settleParts([
      { kind: 'current-source', name: 'G1', values: { current: '2m' }, pins: { from: '0', to: 'a' } },
      resistor('R1', '1k', 'a', '0'),
    ]);
    expectFigures(readings, 'G1', { voltage: -2, current: 0.002, power: -0.004, delivered: 0.004 });
    expectFigures(readings, 'R1', { voltage: 2, current: 0.002 });
    expectClosed(readings);
  });

  it('a capacitor is open, an inductor is its winding resistance', () => {
    const readings = settleParts([
      rail('VA', 10),
      resistor('R1', 90, 'VA', 'x'),
      {
        kind: 'inductor',
        name: 'L1',
        values: { inductance: '1m', resistance: 10 },
        pins: { a: 'x', b: '0' },
      },
      { kind: 'capacitor', name: 'C1', values: { capacitance: '1u' }, pins: { a: 'VA', b: 'x' } },
    ]);
    expectFigures(readings, 'L1', { voltage: 1, current: 0.1, power: 0.1 });
    expectFigures(readings, 'C1', { voltage: 9, current: 0, power: 0 });
    expectClosed(readings);
  });

  it('a closed switch is 1 mΩ, an open one passes its stated leakage or nothing', () => {
    const switched = (values: Placed['values']) =>
      settleParts([
        rail('VA', 10),
        { kind: 'switch', name: 'S1', values: values ?? {}, pins: { a: 'VA', b: 'x' } },
        resistor('R1', 1, 'x', '0'),
      ]);
    const closed = switched({ closed: true });
    expectFigures(closed, 'S1', { current: 10 / 1.001, voltage: 0.01 / 1.001 });
    expectClosed(closed);
    expectFigures(switched({ closed: true, onResistance: 4 }), 'S1', { current: 2, voltage: 8 });
    expectFigures(switched({ closed: false }), 'S1', { current: 0, voltage: 10 });
    expectFigures(switched({ closed: false, leakage: '1u' }), 'S1', { current: 1e-6 });
  });

  it('a load is its resistance, with or without an inductance', () => {
    const loaded = (values: Placed['values']) =>
      settleParts([
        rail('VA', 12),
        { kind: 'load', name: 'K1', values: values ?? {}, pins: { a: 'VA', b: '0' } },
      ]);
    for (const values of [{ resistance: 160 }, { resistance: 160, form: 'coil', inductance: '0.3' }]) {
      const readings = loaded(values);
      expectFigures(readings, 'K1', { voltage: 12, current: 0.075, power: 0.9 });
      expectClosed(readings);
    }
  });
});

describe('a potentiometer', () => {
  const potentiometer = (position: number) =>
    settleParts([
      rail('VA', 10),
      {
        kind: 'potentiometer',
        name: 'R1',
        values: { resistance: '10k', position },
        pins: { a: 'VA', b: '0', wiper: 'w' },
      },
      resistor('R2', '10k', 'w', '0'),
    ]);

  it('has position·R between a and the wiper', () => {
    // 4k over 6k ∥ 10k = 3750 Ω: I = 10/7750, wiper 10·3750/7750.
    const readings = potentiometer(0.4);
    const wiper = 37500 / 7750;
    expectFigures(readings, 'R1', {
      voltage: 10,
      wiperVoltage: wiper,
      current: 10 / 7750,
      wiperCurrent: -wiper / 10e3,
      power: 10 * (10 / 7750) - (wiper * wiper) / 10e3,
    });
    expectClosed(readings);
  });

  it('keeps 1 mΩ at either end', () => {
    const atA = potentiometer(0);
    // 1 mΩ over 10k ∥ 10k.
    expectFigures(atA, 'R2', { voltage: (10 * 5000) / 5000.001 });
    const atB = potentiometer(1);
    expectFigures(atB, 'R2', { voltage: (10 * (1e-3 / (1 + 1e-7))) / (10e3 + 1e-3 / (1 + 1e-7)) });
    expectClosed(atA);
    expectClosed(atB);
  });
});

describe('transistors', () => {
  const nChannel: Device = {
    type: 'mosfet',
    channel: 'n',
    build: 'integrated',
    model: { threshold: 1, gainFactor: 2e-3 },
  };
  const pChannel: Device = {
    type: 'mosfet',
    channel: 'p',
    build: 'integrated',
    model: { threshold: -1, gainFactor: 2e-3 },
  };

  it('an n-channel in saturation: I_D = (β/2)(V_GS − V_T)², g_m = β·V_OV, and the unwired body carries nothing', () => {
    const readings = settleParts([
      rail('VD', 5),
      rail('VG', 2),
      { kind: 'mosfet', name: 'Q1', device: nChannel, pins: { gate: 'VG', drain: 'VD', source: '0' } },
    ]);
    const readout = read(readings, 'Q1');
    expect(readout.shape).toBe('mosfet');
    // The declared leak adds 2 · 5e-13 S · 5 V; the junction's 1e-15 A.
    const figures = figuresOf(readings, 'Q1');
    expect(figures.drainCurrent).toBeCloseTo(1e-3, 10);
    expectFigures(readings, 'Q1', {
      region: 'saturation',
      reversed: false,
      gateToSource: 2,
      drainToSource: 5,
      sourceToBody: 0,
      threshold: 1,
      overdrive: 1,
      saturationVoltage: 1,
      transconductance: 2e-3,
    });
    expect(figures).not.toHaveProperty('inversion');
    expect(readout.pinCurrents.body).toBe(0);
    expect(readout.pinCurrents.gate).toBe(0);
    expectClosed(readings);
  });

  it('a p-channel reads its true signs, its drain current positive out of the drain', () => {
    const readings = settleParts([
      rail('VS', 5),
      rail('VG', 3),
      { kind: 'mosfet', name: 'Q1', device: pChannel, pins: { gate: 'VG', drain: '0', source: 'VS' } },
    ]);
    expectFigures(readings, 'Q1', {
      region: 'saturation',
      gateToSource: -2,
      drainToSource: -5,
      threshold: -1,
      overdrive: 1,
    });
    expect(figuresOf(readings, 'Q1').drainCurrent).toBeCloseTo(1e-3, 10);
    expect(read(readings, 'Q1').pinCurrents.drain).toBeCloseTo(-1e-3, 10);
    expectClosed(readings);
  });

  it('a wired body has a current of its own', () => {
    const readings = settleParts([
      rail('VD', 5),
      rail('VG', 2),
      rail('VB', -1),
      {
        kind: 'mosfet',
        name: 'Q1',
        device: nChannel,
        pins: { gate: 'VG', drain: 'VD', source: '0', body: 'VB' },
      },
    ]);
    expectFigures(readings, 'Q1', { sourceToBody: 1 });
    expect(read(readings, 'Q1').pinCurrents.body).toBeLessThan(0);
    expectClosed(readings);
  });

  it('the smooth law says the inversion too', () => {
    const readings = settleParts(
      [
        rail('VD', 5),
        rail('VG', 2),
        { kind: 'mosfet', name: 'Q1', device: nChannel, pins: { gate: 'VG', drain: 'VD', source: '0' } },
      ],
      'smooth',
    );
    expectFigures(readings, 'Q1', { inversion: 'strong' });
    expect(figuresOf(readings, 'Q1').inversionCoefficient).toBeGreaterThan(10);
  });

  it('a transistor of a process has β = k′·W/L', () => {
    const readings = settleParts([
      rail('VD', 5),
      rail('VG', 2),
      {
        kind: 'mosfet',
        name: 'Q1',
        device: {
          type: 'mosfet',
          channel: 'n',
          build: 'integrated',
          model: { threshold: 1, processTransconductance: '100u' },
        },
        values: { width: '20u', length: '1u' },
        pins: { gate: 'VG', drain: 'VD', source: '0' },
      },
    ]);
    expect(figuresOf(readings, 'Q1').drainCurrent).toBeCloseTo(1e-3, 10);
  });

  const bipolarOf = (polarity: 'n-p-n' | 'p-n-p'): Device => ({
    type: 'bipolar',
    polarity,
    model: { saturationCurrent: 1e-14, forwardGain: 100 },
  });

  it('an n-p-n fed 10 µA of base current carries h_FE times that', () => {
    const readings = settleParts([
      rail('VC', 5),
      { kind: 'current-source', name: 'G1', values: { current: '10u' }, pins: { from: '0', to: 'b' } },
      {
        kind: 'bipolar',
        name: 'Q1',
        device: bipolarOf('n-p-n'),
        pins: { base: 'b', collector: 'VC', emitter: '0' },
      },
    ]);
    const figures = figuresOf(readings, 'Q1');
    expect(figures.region).toBe('active');
    expect(figures.baseCurrent).toBeCloseTo(10e-6, 12);
    expect(figures.collectorCurrent).toBeCloseTo(1e-3, 8);
    // V_BE = U_T·ln(1 mA/10 fA + 1), U_T = 25.6926 mV at 25 °C.
    expect(figures.baseToEmitter).toBeCloseTo(0.0256926 * Math.log(1e11), 5);
    expect(figures.transconductance).toBeCloseTo(1e-3 / 0.0256926, 5);
    expectClosed(readings);
  });

  it('a p-n-p reads true voltages and currents positive in its own direction', () => {
    const readings = settleParts([
      rail('VE', 5),
      { kind: 'current-source', name: 'G1', values: { current: '10u' }, pins: { from: 'b', to: '0' } },
      {
        kind: 'bipolar',
        name: 'Q1',
        device: bipolarOf('p-n-p'),
        pins: { base: 'b', collector: '0', emitter: 'VE' },
      },
    ]);
    const figures = figuresOf(readings, 'Q1');
    expect(figures.region).toBe('active');
    expect(figures.collectorCurrent).toBeCloseTo(1e-3, 8);
    expect(figures.baseToEmitter).toBeLessThan(-0.6);
    expect(figures.collectorToEmitter).toBe(-5);
    expectClosed(readings);
  });
});

describe('diodes', () => {
  const forward: Device = { type: 'diode', model: { saturationCurrent: 1e-12 } };
  const zener: Device = {
    type: 'zener',
    model: { breakdownVoltage: 10, breakdownCurrent: '5m', breakdownResistance: 10 },
  };

  it('read conducting, blocking and breakdown, anode to cathode', () => {
    const diode = (name: string, device: Device, current: number): readonly Placed[] => [
      { kind: 'current-source', name: `G${name}`, values: { current }, pins: { from: '0', to: name } },
      resistor(`R${name}`, '1G', name, '0'),
      { kind: 'diode', name, device, pins: { anode: name, cathode: '0' } },
    ];
    const readings = settleParts([
      ...diode('D1', forward, 1e-3),
      ...diode('D2', forward, -1e-8),
      ...diode('VR1', zener, -5e-3),
    ]);
    expectFigures(readings, 'D1', { region: 'conducting' });
    // U_T·ln(1 mA/1 pA + 1)
    expect(figuresOf(readings, 'D1').voltage).toBeCloseTo(0.0256926 * Math.log(1e9), 5);
    expectFigures(readings, 'D2', { region: 'blocking' });
    expectFigures(readings, 'VR1', { region: 'breakdown' });
    expect(figuresOf(readings, 'VR1').voltage).toBeCloseTo(-10, 4);
    expectClosed(readings);
  });

  it('an LED without a stated band gap falls 2 mV/K at 10 mA', () => {
    const led: Device = { type: 'led', model: { saturationCurrent: 1e-18, emissionCoefficient: 2 } };
    const voltageAt = (celsius: number) =>
      Number(
        figuresOf(
          settleParts(
            [
              {
                kind: 'current-source',
                name: 'G1',
                values: { current: '10m' },
                pins: { from: '0', to: 'x' },
              },
              { kind: 'diode', name: 'DS1', device: led, pins: { anode: 'x', cathode: '0' } },
            ],
            'square',
            celsius,
          ),
          'DS1',
        ).voltage,
      );
    expect((voltageAt(75) - voltageAt(25)) / 50).toBeCloseTo(-0.002, 5);
  });
});

describe('amplifiers and outputs', () => {
  it('an amplifier without supplies follows its gain; its output current is all that its pins carry', () => {
    const readings = settleParts([
      rail('VI', 0.5),
      { kind: 'amplifier', name: 'U1', values: { gain: 1e5 }, pins: { plus: 'VI', minus: 'f', out: 'o' } },
      resistor('R1', '9k', 'o', 'f'),
      resistor('R2', '1k', 'f', '0'),
    ]);
    // A/(1 + A/10) with A = 1e5: 10/(1 + 1e-4).
    const output = (0.5 * 10) / (1 + 1e-4);
    expectFigures(readings, 'U1', { output, outputCurrent: output / 10e3, limited: 'none' });
    expect(read(readings, 'U1').pinCurrents.plus).toBe(0);
  });

  it('an amplifier with supplies is held between them, and what its output gives comes out of the high one', () => {
    const readings = settleParts([
      rail('VH', 5),
      rail('VI', 3),
      {
        kind: 'amplifier',
        name: 'U1',
        values: {},
        pins: { plus: 'VI', minus: '0', out: 'o', high: 'VH', low: '0' },
      },
      resistor('R1', '1k', 'o', '0'),
    ]);
    const { output, limited } = figuresOf(readings, 'U1');
    expect(limited).toBe('high');
    expect(output).toBeCloseTo(5, 3);
    expect(read(readings, 'U1').pinCurrents.high).toBeCloseTo(5e-3, 5);
    expectClosed(readings);
  });

  it('a transconductor draws g·(V₊ − V₋) from `from` to `to`', () => {
    const readings = settleParts([
      rail('VI', 2),
      rail('VA', 5),
      {
        kind: 'transconductor',
        name: 'U1',
        values: { transconductance: '1m' },
        pins: { plus: 'VI', minus: '0', from: 'o', to: '0' },
      },
      resistor('R1', '1k', 'VA', 'o'),
    ]);
    // 2 mA through 1 kΩ from 5 V.
    expectFigures(readings, 'U1', { input: 2, voltage: 3, current: 2e-3, power: 6e-3 });
    expectClosed(readings);
  });

  it('a logic output is a resistance to the supply of its level', () => {
    const output = (level: string) =>
      settleParts([
        rail('VH', 3.3),
        {
          kind: 'logic-output',
          name: 'U1',
          values: { level, highResistance: 100, lowResistance: 50 },
          pins: { out: 'o', high: 'VH', low: '0' },
        },
        resistor('R1', 1000, 'o', level === 'low' ? 'VH' : '0'),
      ]);
    const high = output('high');
    expect(figuresOf(high, 'U1').output).toBeCloseTo(3.0, 8);
    expect(figuresOf(high, 'U1').outputCurrent).toBeCloseTo(3e-3, 8);
    const low = output('low');
    expect(figuresOf(low, 'U1').output).toBeCloseTo((3.3 * 50) / 1050, 8);
    const open = output('open');
    expect(figuresOf(open, 'U1').output).toBeCloseTo(0, 6);
    for (const readings of [high, low, open]) expectClosed(readings);
  });

  it('an unpowered open output holds what drives it down by its clamp diode', () => {
    const readings = settleParts([
      rail('VH', 0),
      rail('VA', 5),
      {
        kind: 'logic-output',
        name: 'U1',
        values: { level: 'open' },
        pins: { out: 'o', high: 'VH', low: '0' },
      },
      resistor('R1', '10k', 'VA', 'o'),
    ]);
    const output = Number(figuresOf(readings, 'U1').output);
    // One silicon drop at 0.4 mA: U_T·ln(0.4 mA/1 fA) = 0.686 V.
    expect(output).toBeCloseTo(0.686, 2);
    expectClosed(readings);
  });
});

describe('parts without elements', () => {
  it('ground, tag and test point carry nothing and read at most their voltage', () => {
    const readings = settleParts([
      rail('VA', 5),
      { kind: 'ground', name: 'p2', pins: { node: '0' } },
      { kind: 'tag', name: 'p3', values: { label: 'X' }, pins: { node: 'VA' } },
      { kind: 'test-point', name: 'TP1', pins: { node: 'VA' } },
    ]);
    expect(read(readings, 'p2').figures).toEqual({});
    expect(read(readings, 'p3').figures).toEqual({ voltage: 5 });
    expect(read(readings, 'TP1')).toEqual({
      shape: 'other',
      figures: { voltage: 5 },
      pinCurrents: { node: 0 },
    });
  });
});
