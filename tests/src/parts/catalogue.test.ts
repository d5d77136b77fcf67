import { describe, expect, it } from 'vitest';
import { catalogue, kindNamed } from '../../../src/parts/catalogue.ts';
import { deviceSchema } from '../../../src/parts/devices/device.ts';
import type { PartContext, PartKind, Variant } from '../../../src/parts/kind.ts';

type Offsets = Readonly<Record<string, readonly [number, number]>>;

const inLine = (first: string, second: string): Offsets => ({ [first]: [-3, 0], [second]: [3, 0] });
const single: Offsets = { node: [0, 0] };

/** Pins of the stage file's contract, version 1: turn 0, not mirrored. */
const pins: Readonly<Record<string, Offsets>> = {
  resistor: inLine('a', 'b'),
  potentiometer: { ...inLine('a', 'b'), wiper: [0, 3] },
  capacitor: inLine('a', 'b'),
  inductor: inLine('a', 'b'),
  supply: inLine('plus', 'minus'),
  rail: single,
  'current-source': inLine('from', 'to'),
  ground: single,
  tag: single,
  'test-point': single,
  mosfet: { gate: [-3, 0], drain: [0, -3], source: [0, 3], body: [3, 0] },
  bipolar: { base: [-3, 0], collector: [0, -3], emitter: [0, 3] },
  diode: inLine('anode', 'cathode'),
  switch: inLine('a', 'b'),
  load: inLine('a', 'b'),
  amplifier: { plus: [-3, -1], minus: [-3, 1], out: [3, 0], high: [0, -3], low: [0, 3] },
  transconductor: { plus: [-3, -1], minus: [-3, 1], from: [3, -1], to: [3, 1] },
  'logic-output': { out: [3, 0], high: [0, -3], low: [0, 3] },
};

/** p-channel and p-n-p stand with what is positive above. */
const turnedPins: Readonly<Record<string, Offsets>> = {
  mosfet: { gate: [-3, 0], source: [0, -3], drain: [0, 3], body: [3, 0] },
  bipolar: { base: [-3, 0], emitter: [0, -3], collector: [0, 3] },
};

const contextOf = (variant: Variant): PartContext => ({
  name: 'X1',
  values: variant.values,
  ...(variant.device === undefined ? {} : { device: variant.device }),
  wired: new Set(variant.wired ?? []),
});

const isTurned = ({ device }: Variant) =>
  (device?.type === 'mosfet' && device.channel === 'p') ||
  (device?.type === 'bipolar' && device.polarity === 'p-n-p');

const cells = catalogue.flatMap((kind) =>
  kind.variants.map((variant) => [variant.key, kind, variant] as const),
);

describe('the catalogue', () => {
  it('holds every kind of the stage file, each once, and no other', () => {
    expect(catalogue.map(({ kind }) => kind).toSorted()).toEqual(Object.keys(pins).toSorted());
    for (const kind of Object.keys(pins)) expect(kindNamed(kind)?.kind).toBe(kind);
    expect(kindNamed('valve')).toBeUndefined();
    expect(kindNamed('constructor')).toBeUndefined();
  });

  it('gives every cell of the drawers a key of its own', () => {
    const keys = cells.map(([key]) => key);
    expect(new Set(keys).size).toBe(keys.length);
    for (const key of keys) expect(key).toMatch(/^[a-z]+(-[a-z]+)*$/);
  });

  it('fills each of the eight drawers', () => {
    expect([...new Set(catalogue.map(({ family }) => family))].toSorted()).toEqual(
      [
        'diodes',
        'loads',
        'resistors',
        'sources',
        'stores',
        'test points',
        'transistors',
        'wiring',
      ].toSorted(),
    );
  });

  it.each(cells)('%s has its pins at the offsets of the contract', (_, kind, variant) => {
    const expected = isTurned(variant) ? turnedPins[kind.kind] : pins[kind.kind];
    expect(kind.pins(contextOf(variant))).toEqual(expected);
    expect(kind.symbol(contextOf(variant)).pins).toEqual(expected);
  });

  it.each(cells)('%s starts with values and a device that its own schemas accept', (_, kind, variant) => {
    expect(kind.values.safeParse(variant.values).error).toBeUndefined();
    expect(variant.device === undefined).toBe(kind.deviceTypes.length === 0);
    if (variant.device !== undefined) {
      expect(deviceSchema.safeParse(variant.device).error).toBeUndefined();
      expect(kind.deviceTypes).toContain(variant.device.type);
    }
    expect(kind.check(contextOf(variant))).toEqual([]);
  });

  it.each(catalogue.map((kind) => [kind.kind, kind] as const))(
    '%s has a field for each key of its schema, and refuses any other key',
    (_, kind: PartKind) => {
      expect(kind.fields.map(({ key }) => key)).toEqual(Object.keys(kind.values.shape));
      const values = { ...kind.variants[0]?.values, colour: 'red' };
      expect(kind.values.safeParse(values).success).toBe(false);
    },
  );
});

describe('reference designators (letters of IEEE Std 315-1975, from memory)', () => {
  const letters: Readonly<Record<string, string>> = {
    resistor: 'R',
    potentiometer: 'R',
    capacitor: 'C',
    inductor: 'L',
    supply: 'PS',
    battery: 'BT',
    'signal-source': 'G',
    'current-source': 'G',
    'mosfet-n': 'Q',
    'mosfet-p-body': 'Q',
    'bipolar-npn': 'Q',
    diode: 'D',
    led: 'DS',
    zener: 'VR',
    'switch-open': 'S',
    load: 'A',
    lamp: 'DS',
    coil: 'K',
    motor: 'B',
    heater: 'HR',
    amplifier: 'U',
    transconductor: 'U',
    'logic-output': 'U',
    'test-point': 'TP',
  };

  it.each(Object.entries(letters))('%s is %s', (key, expected) => {
    const cell = cells.find(([of]) => of === key);
    expect(cell).toBeDefined();
    if (cell !== undefined) expect(cell[1].designator(contextOf(cell[2]))).toBe(expected);
  });
});
