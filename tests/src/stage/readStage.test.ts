import { beforeAll, describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../../src/values/arithmetic.ts';
import { readStage, readStageAtOnce } from '../../../src/stage/readStage.ts';
import { beaconText, beaconWith } from './beacon.ts';

beforeAll(() => prepareArithmetic());

const faultsOf = (text: string) => {
  const result = readStageAtOnce(text);
  return result.ok ? [] : result.faults;
};
const places = (text: string) => faultsOf(text).map(({ code, path }) => `${code} at ${path ?? '?'}`);

/** One thing put wrong in the worked example, and the one fault that must come of it. */
const refusals: readonly (readonly [
  what: string,
  changes: Readonly<Record<string, unknown>>,
  fault: string,
])[] = [
  ['another format', { format: 'other' }, 'wrong-format at format'],
  ['a newer version', { version: 2 }, 'newer-version at version'],
  ['a version that is no number', { version: '1' }, 'wrong-version at version'],
  ['a version before the first', { version: 0 }, 'wrong-version at version'],
  ['an unknown key at the top', { extra: 1 }, 'unknown-key at extra'],
  ['an unknown key of a part', { 'parts/p2/colour': 'red' }, 'unknown-key at parts.p2.colour'],
  ['an unknown value of a kind', { 'parts/p2/values/voltage': 1 }, 'unknown-key at parts.p2.values.voltage'],
  ['a device where the kind takes none', { 'parts/p2/device': 'd1' }, 'unknown-key at parts.p2.device'],
  ['a duty where the kind has none', { 'parts/p2/duty': 'conduct' }, 'unknown-key at parts.p2.duty'],
  [
    'a label in the values of a rail',
    { 'parts/p1/values/label': '+12V' },
    'unknown-key at parts.p1.values.label',
  ],
  ['an unknown kind', { 'parts/p2/kind': 'lamp' }, 'unknown-choice at parts.p2.kind'],
  [
    'a kind named like a property of every object',
    { 'parts/p2/kind': 'constructor' },
    'unknown-choice at parts.p2.kind',
  ],
  ['a part without a kind', { 'parts/p2/kind': undefined }, 'missing-key at parts.p2.kind'],
  [
    'a part without the value it needs',
    { 'parts/p2/values/resistance': undefined },
    'missing-key at parts.p2.values.resistance',
  ],
  ['a part without its values', { 'parts/p2/values': undefined }, 'missing-key at parts.p2.values'],
  ['a transistor without a device', { 'parts/p3/device': undefined }, 'missing-key at parts.p3.device'],
  ['a part without a name', { 'parts/p2/name': undefined }, 'missing-key at parts.p2.name'],
  ['an id of no id’s form', { 'parts/P9': { kind: 'ground' } }, 'wrong-key at parts.P9'],
  ['an id that counts from nought', { 'parts/p0': { kind: 'ground' } }, 'wrong-key at parts.p0'],
  ['a name of no name’s form', { 'parts/p2/name': '1DS' }, 'wrong-name at parts.p2.name'],
  ['a name used twice', { 'parts/p4/name': 'DS1' }, 'name-used-twice at parts.p4.name'],
  ['a part of a rail’s name', { 'parts/p4/name': 'VBAT' }, 'name-used-twice at parts.p4.name'],
  ['the reserved name all', { 'parts/p4/name': 'all' }, 'reserved-name at parts.p4.name'],
  ['the base state’s name for a part', { 'parts/p4/name': 'on' }, 'reserved-name at parts.p4.name'],
  ['the base state’s name for a state', { 'states/on': {} }, 'reserved-name at states.on'],
  ['the reserved name for a state', { 'states/all': {} }, 'reserved-name at states.all'],
  ['the reserved name for the base state', { base: 'all' }, 'reserved-name at base'],
  [
    'a resistance out of range',
    { 'parts/p2/values/resistance': 0 },
    'out-of-range at parts.p2.values.resistance',
  ],
  [
    'a decimal comma',
    { 'parts/p2/values/resistance': '4,7k' },
    'decimal-comma at parts.p2.values.resistance',
  ],
  ['another unit', { 'parts/p2/values/resistance': '240 V' }, 'wrong-unit at parts.p2.values.resistance'],
  [
    'arithmetic without an end',
    { 'parts/p2/values/resistance': '1/0' },
    'not-finite at parts.p2.values.resistance',
  ],
  [
    'a value below its low',
    { 'parts/p1/values/voltage': { low: 13, value: 12, high: 14 } },
    'spread-order at parts.p1.values.voltage.low',
  ],
  [
    'a tolerance of everything',
    { 'parts/p4/values/resistance': { value: 1, tolerance: 1 } },
    'out-of-range at parts.p4.values.resistance.tolerance',
  ],
  [
    'an unknown key in a value',
    { 'parts/p4/values/resistance': { value: 1, tolerance: 0.1, unit: 'Ω' } },
    'unknown-key at parts.p4.values.resistance.unit',
  ],
  ['an unknown choice', { 'parts/p2/values/form': 'candle' }, 'unknown-choice at parts.p2.values.form'],
  ['a place off the grid', { 'parts/p2/place': [1.5, 2] }, 'wrong-type at parts.p2.place[0]'],
  ['a place out of all reach', { 'parts/p2/place': [1e6, 2] }, 'out-of-range at parts.p2.place[0]'],
  ['half a quarter turn', { 'parts/p2/turn': 45 }, 'unknown-choice at parts.p2.turn'],
  ['a device that is not there', { 'parts/p3/device': 'd7' }, 'no-such-device at parts.p3.device'],
  [
    'a device that does not fit',
    { 'devices/d1': { type: 'led', model: { saturationCurrent: 1e-15 } } },
    'device-does-not-fit at parts.p3.device',
  ],
  ['an unknown type of device', { 'devices/d1/type': 'valve' }, 'unknown-choice at devices.d1.type'],
  [
    'an unknown parameter of a model',
    { 'devices/d1/model/height': 1 },
    'unknown-key at devices.d1.model.height',
  ],
  [
    'a model and facts',
    { 'devices/d1/facts': { gateThreshold: [{ high: 2 }] } },
    'model-and-facts at devices.d1',
  ],
  [
    'a surface potential out of range',
    { 'devices/d1/model/surfacePotential': 5 },
    'out-of-range at devices.d1.model.surfacePotential',
  ],
  [
    'a wire from a part that is not there',
    {
      'wires/w1': {
        ends: [
          ['p9', 'a'],
          ['p2', 'a'],
        ],
      },
    },
    'no-such-part at wires.w1.ends[0][0]',
  ],
  [
    'a wire to a pin that is not there',
    {
      'wires/w1': {
        ends: [
          ['p1', 'node'],
          ['p2', 'drain'],
        ],
      },
    },
    'no-such-pin at wires.w1.ends[1][1]',
  ],
  [
    'a wire to a joint that is not there',
    { 'wires/w1': { ends: [['p1', 'node'], ['j1']] } },
    'no-such-joint at wires.w1.ends[1][0]',
  ],
  [
    'a wire to itself',
    {
      'wires/w1': {
        ends: [
          ['p1', 'node'],
          ['p1', 'node'],
        ],
      },
    },
    'wire-to-itself at wires.w1.ends',
  ],
  [
    'a wire of three ends',
    {
      'wires/w1': {
        ends: [
          ['p1', 'node'],
          ['p2', 'a'],
          ['p2', 'b'],
        ],
      },
    },
    'out-of-range at wires.w1.ends',
  ],
  ['two voltages of one rail', { 'parts/p5/name': 'VBAT' }, 'two-voltages at parts.p5.values.voltage'],
  [
    'a state that sets a part that is not there',
    { 'states/off/set': { 'p9.voltage': 0 } },
    'no-such-part at states.off.set["p9.voltage"]',
  ],
  [
    'a state that sets a value that is not there',
    { 'states/off/set': { 'p5.resistance': 1 } },
    'no-such-value at states.off.set["p5.resistance"]',
  ],
  [
    'a state that sets no value at all',
    { 'states/off/set': { p5: 1 } },
    'no-such-value at states.off.set.p5',
  ],
  [
    'a state that sets a value out of range',
    { 'states/off/set': { 'p5.voltage': 1e9 } },
    'out-of-range at states.off.set["p5.voltage"]',
  ],
  [
    'a duty in a state for what has none',
    { 'states/off/duties': { p2: 'block' } },
    'no-duty at states.off.duties.p2',
  ],
  ['an unknown duty', { 'parts/p3/duty': 'shine' }, 'unknown-choice at parts.p3.duty'],
  [
    'a limit of another duty',
    { 'parts/p3/duty': { kind: 'conduct', leakLimit: 1e-6 } },
    'unknown-key at parts.p3.duty.leakLimit',
  ],
  [
    'a limit of another device',
    { 'parts/p3/duty': { kind: 'conduct', forcedGain: 10 } },
    'limit-does-not-fit at parts.p3.duty.forcedGain',
  ],
  [
    'a window upside down',
    { 'parts/p3/duty': { kind: 'amplify', currentWindow: { low: 2, high: 1 } } },
    'spread-order at parts.p3.duty.currentWindow',
  ],
  ['a mismatch without a lot', { 'parts/p3/mismatch': 0.01 }, 'mismatch-without-lot at parts.p3.mismatch'],
  ['an ambient out of range', { 'conditions/ambient': 400 }, 'out-of-range at conditions.ambient'],
  ['an unknown law', { 'conditions/law': 'cubic' }, 'unknown-choice at conditions.law'],
  ['an unknown question', { 'questions/riddle': {} }, 'unknown-key at questions.riddle'],
  ['an alternate that is not there', { alternates: { p3: ['d2'] } }, 'no-such-device at alternates.p3[0]'],
  ['a list where an object belongs', { parts: [] }, 'wrong-type at parts'],
];

describe('a stage file is refused for', () => {
  it.each(refusals)('%s', (_, changes, fault) => {
    expect(places(beaconWith(changes))).toEqual([fault]);
  });

  it('a value in a state for a second rail of one name', () => {
    const text = beaconWith({ 'parts/p5': { kind: 'rail', name: 'VBAT', place: [14, 16] } });
    expect(places(text)).toEqual(['two-voltages at states.off.set["p5.voltage"]']);
  });

  it('a size that the device on chip asks for', () => {
    const model = { threshold: 0.7, processTransconductance: '100u' };
    const text = beaconWith({ 'devices/d1/model': model });
    expect(faultsOf(text).map(({ path }) => path)).toEqual([
      'parts.p3.values.width',
      'parts.p3.values.length',
    ]);
  });

  it('a key said twice, with line and column', () => {
    const text = '{\n  "format": "restpoint-stage",\n  "format": "restpoint-stage", "version": 1 }';
    expect(faultsOf(text)).toEqual([
      {
        code: 'repeated-key',
        message: 'This key stands twice in one object: keep one of them.',
        path: 'format',
        line: 3,
        column: 3,
        found: '"format"',
        allowed: 'each key once',
      },
    ]);
  });

  it('__proto__ wherever it stands', () => {
    const text = beaconText.replace('"form": "lamp"', '"__proto__": { "form": "lamp" }');
    expect(places(text)).toEqual(['forbidden-key at parts.p2.values.__proto__']);
  });

  it('a number past all numbers', () => {
    const text = beaconText.replace('240', '1e400');
    expect(places(text)).toEqual(['not-finite at parts.p2.values.resistance']);
  });

  it('broken JSON, with line and column', () => {
    const text = beaconText.replace('"resistance": 240,', '"resistance": 240');
    const [fault] = faultsOf(text);
    expect(fault).toMatchObject({ code: 'broken-json', path: 'parts.p2.values' });
    const line = text.split('\n')[(fault?.line ?? 0) - 1] ?? '';
    expect(line.slice((fault?.column ?? 0) - 1)).toMatch(/^"form"/);
  });

  it.each([
    '',
    ' ',
    'null',
    '[]',
    '"restpoint-stage"',
    '7',
    '{}',
    '{"format":"restpoint-stage"}',
    '\u0000',
    '<html>',
  ])('being no stage file at all: %j', (text) => {
    expect(faultsOf(text)).toHaveLength(1);
  });

  it('nesting past all reason, without a crash', () => {
    expect(places('['.repeat(1_000_000))[0]).toMatch(/^too-deep/);
    expect(places(`${'{"a":'.repeat(200_000)}1${'}'.repeat(200_000)}`)[0]).toMatch(/^too-deep/);
  });

  it('a size past all reason', () => {
    expect(places(' '.repeat(16_000_001))).toEqual(['too-long at $']);
  });

  it('everything that is wrong at once, the first fifty told', () => {
    const parts = Object.fromEntries(
      Array.from({ length: 200 }, (_, index) => [`p${index + 1}`, { kind: 'oak' }]),
    );
    const faults = faultsOf(JSON.stringify({ format: 'restpoint-stage', version: 1, parts }));
    expect(faults).toHaveLength(51);
    expect(faults.at(-1)).toMatchObject({
      code: 'more-faults',
      message: '150 more things are wrong in this file.',
    });
  });
});

describe('a fault says what was found and what is allowed', () => {
  it('of a choice', () => {
    expect(faultsOf(beaconWith({ 'conditions/law': 'cubic' }))).toEqual([
      {
        code: 'unknown-choice',
        message: 'Choose one of: square, smooth.',
        path: 'conditions.law',
        found: '"cubic"',
        allowed: 'square, smooth',
      },
    ]);
  });
  it('of a key', () => {
    expect(faultsOf(beaconWith({ 'parts/p6/values': { voltage: 1 } }))).toMatchObject([
      { code: 'unknown-key', path: 'parts.p6.values.voltage', found: '"voltage"' },
    ]);
    expect(faultsOf(beaconWith({ 'states/off/sets': {} }))[0]?.allowed).toBe('set, duties, conditions');
  });
  it('of a kind, all kinds', () => {
    expect(faultsOf(beaconWith({ 'parts/p2/kind': 'lamp' }))[0]?.allowed).toContain(
      'resistor, potentiometer',
    );
  });
});

describe('a stage file may', () => {
  const accepted = (changes: Readonly<Record<string, unknown>>) => places(beaconWith(changes));
  it('leave sections out, which are empty then', () => {
    const result = readStageAtOnce('{"format":"restpoint-stage","version":1}');
    expect(result).toMatchObject({ ok: true, value: { title: '', parts: {}, wires: {}, states: {} } });
  });
  it('repeat the names of rails and of tags', () => {
    expect(
      accepted({
        'parts/p7': { kind: 'rail', name: 'VBAT' },
        'parts/p8': { kind: 'tag', name: 'T1', values: { label: 'VBAT' } },
        'parts/p9': { kind: 'tag', name: 'T1', values: { label: 'OUT' } },
      }),
    ).toEqual([]);
  });
  it('leave names out of grounds and tags, and places out of parts', () => {
    expect(
      accepted({ 'parts/p7': { kind: 'tag', values: { label: 'X' } }, 'parts/p2/place': undefined }),
    ).toEqual([]);
  });
  it('name its base state', () => {
    expect(accepted({ base: 'awake', 'states/on': { set: { 'p1.voltage': 11 } } })).toEqual([]);
  });
  it('begin with a byte order mark', () => {
    expect(places(`\ufeff${beaconText}`)).toEqual([]);
  });
});

describe('readStage', () => {
  it('reads a file with arithmetic, loading what works it out', async () => {
    const result = await readStage(beaconWith({ 'parts/p2/values/resistance': '2*120' }));
    expect(result).toMatchObject({ ok: true, value: { parts: { p2: { values: { resistance: '2*120' } } } } });
  });
});
