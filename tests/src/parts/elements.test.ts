import { describe, expect, it } from 'vitest';
import { catalogue } from '../../../src/parts/catalogue.ts';
import type { Device } from '../../../src/parts/devices/device.ts';
import type { Draw, Figures, Law, PartContext, PartKind, Variant } from '../../../src/parts/kind.ts';
import { contextOf, kindOf, nominal } from './settled.ts';
import type { Placed } from './settled.ts';

const contextOfVariant = (variant: Variant): PartContext => ({
  name: 'X1',
  values: variant.values,
  ...(variant.device === undefined ? {} : { device: variant.device }),
  wired: new Set(variant.wired ?? []),
});

const drawsOf = (kind: PartKind, context: PartContext, law: Law = 'square'): readonly Draw[] => {
  const draws = kind.draws(context, law);
  if (!draws.ok) throw new Error(draws.faults[0]?.message);
  return draws.value;
};

const figuresAt = (draws: readonly Draw[], at: (draw: Draw) => number): Figures =>
  Object.fromEntries(draws.map((draw) => [draw.key, at(draw)]));

/** Nodes numbered in the order of the pins, from 1. */
const elementsOf = (kind: PartKind, context: PartContext, figures: Figures, law: Law = 'square') => {
  const pins = Object.keys(kind.pins(context));
  return kind.elements({ ...context, law, figures, node: (pin) => 1 + pins.indexOf(pin) });
};

const cells = catalogue.flatMap((kind) =>
  kind.variants.map((variant) => [variant.key, kind, variant] as const),
);

describe('elements', () => {
  it.each(cells)(
    '%s keeps number, laws and nodes when its figures change, and only its values differ',
    (_, kind, variant) => {
      const context = contextOfVariant(variant);
      const draws = drawsOf(kind, context);
      for (const law of ['square', 'smooth'] as const) {
        const first = elementsOf(
          kind,
          context,
          figuresAt(draws, ({ value }) => value),
          law,
        );
        const second = elementsOf(
          kind,
          context,
          figuresAt(draws, ({ value }) => value * 1.1),
          law,
        );
        expect(second.map(({ name, nodes, law: { name: lawName } }) => [name, nodes, lawName])).toEqual(
          first.map(({ name, nodes, law: { name: lawName } }) => [name, nodes, lawName]),
        );
        second.forEach((element, index) => {
          expect(element.law).toBe(first[index]?.law);
          expect(element.values).not.toBe(first[index]?.values);
        });
        const nodes = first.flatMap((element) => [...element.nodes]);
        for (const node of nodes) expect(node).toBeGreaterThanOrEqual(0);
      }
    },
  );

  it.each(cells)('%s has its own law at the place it says', (_, kind, variant) => {
    const context = contextOfVariant(variant);
    const elements = elementsOf(
      kind,
      context,
      figuresAt(drawsOf(kind, context), ({ value }) => value),
    );
    if (kind.principal === null) expect(elements).toEqual([]);
    else expect(elements[kind.principal]?.name).toBe('X1');
  });

  it('a rail stands against the reference where it holds a voltage, and is nothing where it does not', () => {
    const rail = kindOf('rail');
    const of = (values: Placed['values']) => {
      const placed: Placed = { kind: 'rail', name: 'VA', pins: {}, ...(values ? { values } : {}) };
      return elementsOf(rail, contextOf(placed), nominal(placed));
    };
    expect(of({ voltage: 12 })[0]?.nodes).toEqual([1, 0]);
    expect(of({})).toEqual([]);
  });

  it('an unwired body is the source', () => {
    const mosfet = kindOf('mosfet');
    const device: Device = { type: 'mosfet', channel: 'n', model: { threshold: 1, gainFactor: 1 } };
    const bodyOf = (pins: Placed['pins']) => {
      const placed: Placed = { kind: 'mosfet', name: 'Q1', device, pins };
      const [element] = elementsOf(mosfet, contextOf(placed), nominal(placed));
      return element?.nodes;
    };
    // Pins in the order gate 1, drain 2, source 3, body 4; terminals drain, gate, source, body.
    expect(bodyOf({})).toEqual([2, 1, 3, 3]);
    expect(bodyOf({ body: 'x' })).toEqual([2, 1, 3, 4]);
  });

  it('an amplifier takes its supplies where either is wired', () => {
    const amplifier = kindOf('amplifier');
    const terminals = (pins: Placed['pins']) => {
      const placed: Placed = { kind: 'amplifier', name: 'U1', pins };
      return elementsOf(amplifier, contextOf(placed), nominal(placed))[0]?.nodes.length;
    };
    expect(terminals({})).toBe(3);
    expect(terminals({ high: 'x' })).toBe(5);
    expect(terminals({ high: 'x', low: 'y' })).toBe(5);
  });
});

describe('draws', () => {
  const draw = (kind: string, values: Placed['values'], key: string, device?: Device) => {
    const placed: Placed = {
      kind,
      name: 'X1',
      pins: {},
      ...(values ? { values } : {}),
      ...(device ? { device } : {}),
    };
    return drawsOf(kindOf(kind), contextOf(placed)).find((entry) => entry.key === key);
  };

  it('a tolerance becomes hard limits, a default varies with nothing', () => {
    expect(draw('resistor', { resistance: { value: '1k', tolerance: 0.05 } }, 'resistance')).toEqual({
      key: 'resistance',
      quantity: 'resistance',
      value: 1000,
      low: 950,
      high: 1050,
      stated: true,
    });
    expect(draw('resistor', { resistance: 1000 }, 'temperatureCoefficient')).toMatchObject({
      value: 0,
      low: 0,
      high: 0,
      stated: false,
    });
  });

  it('what does not move the operating point is no draw', () => {
    expect(draw('resistor', { resistance: 1000, rating: 0.25 }, 'rating')).toBeUndefined();
    expect(draw('supply', { voltage: 0, signal: 1 }, 'signal')).toBeUndefined();
    expect(draw('load', { resistance: 1, coldResistance: 0.1 }, 'coldResistance')).toBeUndefined();
  });

  it.each([
    ['n', 'discrete', -0.004, -0.006, -0.002],
    ['p', 'discrete', 0.004, 0.002, 0.006],
    ['n', 'integrated', -0.002, -0.002, -0.002],
    ['p', 'integrated', 0.002, 0.002, 0.002],
  ] as const)(
    'the threshold of a %s-channel %s device that states no coefficient moves by %d V/K (common practice)',
    (channel, build, value, low, high) => {
      const device: Device = { type: 'mosfet', channel, build, model: { threshold: 1, gainFactor: 1 } };
      expect(draw('mosfet', {}, 'thresholdTemperatureCoefficient', device)).toMatchObject({
        value,
        low,
        high,
        stated: false,
      });
      const assumptions = kindOf('mosfet').assumptions(
        contextOf({ kind: 'mosfet', name: 'Q1', device, pins: {} }),
        'square',
      );
      expect(assumptions.join('; ')).toMatch(build === 'discrete' ? /4 mV\/K, 2 to 6/ : /2 mV\/K/);
    },
  );

  it('defaults of a MOSFET are those of the plan, and a stated one is no assumption', () => {
    const device: Device = { type: 'mosfet', channel: 'n', model: { threshold: 1, gainFactor: 1 } };
    const value = (key: string) => draw('mosfet', {}, key, device)?.value;
    expect(value('lengthModulation')).toBe(0);
    expect(value('bodyFactor')).toBe(0);
    expect(value('surfacePotential')).toBe(0.7);
    expect(value('slopeFactor')).toBe(1.3);
    expect(value('bodyDiode.saturationCurrent')).toBe(1e-12);
    const chip: Device = { ...device, build: 'integrated' };
    expect(draw('mosfet', {}, 'bodyDiode.saturationCurrent', chip)?.value).toBe(1e-15);

    const clauses = (of: Device) =>
      kindOf('mosfet').assumptions(contextOf({ kind: 'mosfet', name: 'Q1', device: of, pins: {} }), 'square');
    expect(clauses(device)).toContain('length modulation 0 (not stated)');
    const statedOne: Device = {
      ...device,
      model: { threshold: 1, gainFactor: 1, lengthModulation: 0.02 },
    };
    expect(clauses(statedOne).join('; ')).not.toContain('length modulation');
  });
});

describe('what a kind checks beyond its schema', () => {
  const check = (model: object, values: object) => {
    const device = { type: 'mosfet', channel: 'n', model } as unknown as Device;
    return kindOf('mosfet')
      .check(contextOf({ kind: 'mosfet', name: 'Q1', device, values: { ...values }, pins: {} }))
      .map(({ code, path }) => [code, path]);
  };

  it('a device that is a process needs a width and a length', () => {
    const process = { threshold: 1, processTransconductance: 1e-4 };
    expect(check(process, { width: 1e-5 })).toEqual([['missing-size', 'values.length']]);
    expect(check(process, { width: 1e-5, length: 1e-6 })).toEqual([]);
  });

  it('a device that is a whole transistor has none', () => {
    expect(check({ threshold: 1, gainFactor: 1 }, { width: 1e-5 })).toEqual([
      ['size-without-process', 'values.width'],
    ]);
  });
});
