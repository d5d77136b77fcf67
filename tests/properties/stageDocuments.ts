/** Random stage documents, valid by construction and varied in every section of the file. */
import fc from 'fast-check';
import { catalogue } from '../../src/parts/catalogue.ts';
import type { Device } from '../../src/parts/devices/device.ts';
import type { Field } from '../../src/parts/field.ts';
import type { PartKind } from '../../src/parts/kind.ts';
import { checkDocument } from '../../src/stage/readStage.ts';
import type { JsonObject } from '../../src/stage/json/json.ts';
import type { StageDocument } from '../../src/stage/schema/stage.ts';
import { quantityOf } from '../../src/values/quantities.ts';
import type { QuantityName } from '../../src/values/quantities.ts';

/** Counts for checks that run in full only when asked for: `RESTPOINT_SOAK=1`. */
export const soaking = process.env.RESTPOINT_SOAK === '1';

const coordinate = fc.integer({ min: -200, max: 200 });
const point = fc.tuple(coordinate, coordinate);
const title = fc.string({ unit: 'grapheme', maxLength: 40 });
const word = fc.stringMatching(/^[A-Za-z][A-Za-z0-9_]{0,8}$/);

/** A number well inside what the quantity allows, of three figures. */
function numberOf(name: QuantityName): fc.Arbitrary<number> {
  const [low, high] = quantityOf(name).range;
  const rounded = (value: number) => Number(value.toPrecision(3));
  if (low <= 0) {
    const reach = Math.min(high, 50);
    return fc.double({ min: low === 0 ? 0 : -reach, max: reach, noNaN: true }).map(rounded);
  }
  return fc
    .double({ min: Math.log10(low), max: Math.log10(high), noNaN: true })
    .map((power) => rounded(Math.min(high, Math.max(low, 10 ** power))));
}

/** The same number in the ways a person writes it. */
const typed = (name: QuantityName, value: number): fc.Arbitrary<number | string> => {
  const { unit } = quantityOf(name);
  const text = String(value);
  return fc.constantFrom<number | string>(
    value,
    value,
    text,
    unit === '' ? ` ${text} ` : `${text} ${unit}`,
    // A unit that begins with a figure cannot follow a number without a space.
    `${text.replace('-', '\u2212')}${unit.startsWith('1') ? '' : unit}`,
    value < 0 ? text : `(${text}\u00d72)/2`,
  );
};

const plainValue = (name: QuantityName) => numberOf(name).chain((value) => typed(name, value));

const spreadValue = (name: QuantityName): fc.Arbitrary<unknown> =>
  fc.oneof(
    { weight: 3, arbitrary: plainValue(name) },
    {
      weight: 1,
      // Limits that are sure to hold their value: the value itself twice, or a tolerance that leaves the range alone.
      arbitrary: numberOf(name).chain((value) =>
        fc.record({ value: typed(name, value), tolerance: fc.constantFrom(0, 0.01, 0.05, 0.99) }),
      ),
    },
    {
      weight: 1,
      arbitrary: fc.tuple(numberOf(name), numberOf(name), numberOf(name)).chain((three) => {
        const [low = 0, value = 0, high = 0] = [...three].sort((a, b) => a - b);
        return fc.record(
          {
            low: typed(name, low),
            value: typed(name, value),
            high: typed(name, high),
            sigma: fc.constant('1'),
          },
          { requiredKeys: ['low', 'value', 'high'] },
        );
      }),
    },
  );

function fieldValue(field: Field): fc.Arbitrary<unknown> {
  switch (field.form) {
    case 'quantity':
      return field.spread ? spreadValue(field.quantity) : plainValue(field.quantity);
    case 'choice':
      return fc.constantFrom(...field.choices.map(({ value }) => value));
    case 'yes-no':
      return fc.boolean();
    case 'text':
      return fc.constantFrom('OUT', 'SENSE', 'VBAT', 'µ-probe');
  }
}

/** A kind's `values`: what must be stated, and some of what may be. Sizes on chip go with a device that asks for them. */
const valuesOf = (kind: PartKind): fc.Arbitrary<Record<string, unknown>> => {
  const fields = kind.kind === 'mosfet' ? [] : kind.fields;
  return fc.record(Object.fromEntries(fields.map((field) => [field.key, fieldValue(field)])), {
    requiredKeys: fields.filter((field) => !field.optional).map((field) => field.key),
  });
};

const mosfetByFacts: JsonObject = {
  type: 'mosfet',
  channel: 'n',
  title: 'by its data sheet',
  facts: {
    mode: 'enhancement',
    gateThreshold: [
      { low: 0.8, typical: '1.6 V', high: 2.4, at: { drainCurrent: '250 µA' }, source: 'page 3' },
    ],
    onResistance: [{ high: 3.5, at: { gateToSource: 4.5, drainCurrent: 0.2, temperature: 25 } }],
  },
  ratings: { drainToSource: 60, dissipation: { value: 0.35, ambient: 25 } },
};
const mosfetOnChip: JsonObject = {
  type: 'mosfet',
  channel: 'p',
  build: 'integrated',
  model: { threshold: { value: -0.7, tolerance: 0.1 }, processTransconductance: '50 µA/V²' },
};

const catalogueDevices = catalogue.flatMap(({ variants }) =>
  variants.flatMap(({ device }) => (device === undefined ? [] : [device])),
);
const deviceArbitrary = fc.constantFrom<Device>(
  ...catalogueDevices,
  mosfetByFacts as unknown as Device,
  mosfetOnChip as unknown as Device,
);

const dutyArbitrary = fc.constantFrom<unknown>(
  'amplify',
  'conduct',
  'block',
  'none',
  { kind: 'amplify', signalPeak: '500 mV', currentWindow: { low: '150u', high: 3e-4 } },
  { kind: 'conduct' },
  { kind: 'block', leakLimit: '10u' },
);

interface Seeds {
  readonly kinds: readonly PartKind[];
  readonly random: () => number;
  readonly draw: <Value>(arbitrary: fc.Arbitrary<Value>) => Value;
}

/** One of a list; the list must not be empty. */
function pick<Value>(seeds: Seeds, from: readonly Value[]): Value {
  const value = from[Math.floor(seeds.random() * from.length)];
  if (value === undefined) throw new RangeError('nothing to pick from');
  return value;
}

const maybe = (seeds: Seeds, chance: number) => seeds.random() < chance;

function randomParts(seeds: Seeds, devices: Readonly<Record<string, Device>>) {
  const parts: Record<string, Record<string, unknown>> = {};
  const railNames = new Set<string>();
  seeds.kinds.forEach((kind, index) => {
    const id = `p${index + 1}`;
    const values = seeds.draw(valuesOf(kind));
    const part: Record<string, unknown> = { kind: kind.kind };
    if (kind.joins === 'name') {
      const name = pick(seeds, ['VBAT', 'VREF', 'DRIVE']);
      part.name = name;
      if (railNames.has(name)) delete values.voltage;
      if (values.voltage !== undefined) railNames.add(name);
      if (maybe(seeds, 0.3)) part.label = '+12V';
    } else if (kind.nameNeeded || (kind.joins !== 'label' && maybe(seeds, 0.2))) {
      part.name = `X${index + 1}`;
    }
    if (maybe(seeds, 0.8)) part.place = seeds.draw(point);
    if (maybe(seeds, 0.4)) part.turn = pick(seeds, [0, 90, 180, 270]);
    if (maybe(seeds, 0.2)) part.mirror = maybe(seeds, 0.7);
    if (kind.deviceTypes.length > 0) {
      const fitting = Object.entries(devices).filter(([, device]) => kind.deviceTypes.includes(device.type));
      const [chosen, device] = pick(seeds, fitting);
      part.device = chosen;
      if (
        (device as { model?: object }).model !== undefined &&
        'processTransconductance' in (device as { model: object }).model
      ) {
        Object.assign(values, { width: '20u', length: 2e-6 });
      }
      if (maybe(seeds, 0.3)) Object.assign(part, { lot: 'pair', mismatch: 0.005 });
    }
    if (kind.takesDuty && maybe(seeds, 0.8)) part.duty = seeds.draw(dutyArbitrary);
    if (Object.keys(values).length > 0 || !kind.values.safeParse({}).success) part.values = values;
    parts[id] = part;
  });
  return parts;
}

const nameless = (seeds: Seeds, parts: Readonly<Record<string, Record<string, unknown>>>) => {
  const set: Record<string, unknown> = {};
  const duties: Record<string, unknown> = {};
  seeds.kinds.forEach((kind, index) => {
    const id = `p${index + 1}`;
    const field = kind.fields[0];
    const states = parts[id]?.values as Record<string, unknown> | undefined;
    // A rail is given a voltage in a state only where it has one, and a label is the same in every state.
    const settable = field !== undefined && field.key !== 'label' && kind.kind !== 'mosfet';
    if (settable && states?.[field.key] !== undefined && maybe(seeds, 0.3)) {
      set[`${id}.${field.key}`] = seeds.draw(fieldValue(field));
    }
    if (kind.takesDuty && maybe(seeds, 0.5)) duties[id] = seeds.draw(dutyArbitrary);
  });
  return {
    ...(maybe(seeds, 0.8) ? { set } : {}),
    ...(maybe(seeds, 0.8) ? { duties } : {}),
    ...(maybe(seeds, 0.3) ? { conditions: { ambient: seeds.draw(spreadValue('temperature')) } } : {}),
  };
};

function randomDocument(seeds: Seeds): JsonObject {
  const devices: Record<string, Device> = {};
  // Every type that a part of these kinds may ask for is there.
  const needed = new Set(seeds.kinds.flatMap(({ deviceTypes }) => deviceTypes));
  for (const type of needed) {
    const device = catalogueDevices.find((candidate) => candidate.type === type);
    if (device !== undefined) devices[`d${Object.keys(devices).length + 1}`] = device;
  }
  for (let more = Math.floor(seeds.random() * 3); more > 0; more -= 1) {
    devices[`d${Object.keys(devices).length + 1}`] = seeds.draw(deviceArbitrary);
  }
  const parts = randomParts(seeds, devices);
  const joints: Record<string, readonly number[]> = {};
  for (let count = Math.floor(seeds.random() * 4); count > 0; count -= 1) {
    joints[`j${count}`] = seeds.draw(point);
  }
  const ends: readonly (readonly string[])[] = [
    ...Object.keys(joints).map((id) => [id]),
    ...seeds.kinds.flatMap((kind, index) => {
      const id = `p${index + 1}`;
      const device = devices[String(parts[id]?.device)];
      const context = {
        name: id,
        values: {},
        wired: new Set<string>(),
        ...(device === undefined ? {} : { device }),
      };
      return Object.keys(kind.pins(context)).map((pin) => [id, pin]);
    }),
  ];
  const wires: Record<string, JsonObject> = {};
  for (let count = 0; count < seeds.kinds.length * 1.3 && ends.length > 1; count += 1) {
    const from = pick(seeds, ends);
    const to = pick(seeds, ends);
    if (from === to) continue;
    wires[`w${count + 1}`] = {
      ends: [from, to],
      ...(maybe(seeds, 0.2) ? { path: seeds.draw(fc.array(point, { maxLength: 4 })) } : {}),
    };
  }
  const transistors = Object.entries(parts).filter(([, part]) => part.device !== undefined);
  const whole: Record<string, unknown> = {
    format: 'restpoint-stage',
    version: 1,
    title: seeds.draw(title),
    ...(maybe(seeds, 0.3) ? { author: seeds.draw(title), date: '2031-04-02' } : {}),
    ...(maybe(seeds, 0.3) ? { notes: seeds.draw(title) } : {}),
    ...(maybe(seeds, 0.5) ? { base: 'awake' } : {}),
    conditions: {
      ...(maybe(seeds, 0.6) ? { ambient: seeds.draw(spreadValue('temperature')) } : {}),
      ...(maybe(seeds, 0.5) ? { law: pick(seeds, ['square', 'smooth']) } : {}),
      ...(maybe(seeds, 0.2) ? { selfHeating: true } : {}),
    },
    devices,
    parts,
    joints,
    wires,
    states: maybe(seeds, 0.6) ? { asleep: nameless(seeds, parts), lampOn: nameless(seeds, parts) } : {},
    questions: maybe(seeds, 0.3)
      ? { sweep: { vary: 'X1.resistance', from: 1, points: [1, 2], log: false } }
      : {},
    ...(maybe(seeds, 0.3)
      ? {
          view: { density: 'key', chips: { 'p1.a': [1.5, -2] } },
          marks: { m1: { readings: { 'X1.current': null } } },
        }
      : {}),
    ...(maybe(seeds, 0.3)
      ? { alternates: Object.fromEntries(transistors.map(([id, part]) => [id, [part.device]])) }
      : {}),
  };
  return whole as JsonObject;
}

/** Plain data of a valid file. A generator that goes wrong fails here, by name, and not in some property. */
export const stageFile = (most = 12): fc.Arbitrary<JsonObject> =>
  fc
    .tuple(fc.array(fc.constantFrom(...catalogue), { maxLength: most }), fc.gen(), word)
    .map(([kinds, gen]) => {
      const random = () => gen(fc.double, { min: 0, max: 1, maxExcluded: true, noNaN: true });
      const file = randomDocument({ kinds, random, draw: (arbitrary) => gen(() => arbitrary) });
      return JSON.parse(JSON.stringify(file)) as JsonObject;
    });

export const stageDocument = (most = 12): fc.Arbitrary<StageDocument> =>
  stageFile(most).map((file) => {
    const result = checkDocument(file);
    if (!result.ok) throw new Error(`the generator made a wrong file: ${JSON.stringify(result.faults)}`);
    return result.value;
  });
