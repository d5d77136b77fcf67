import { describe, expect, it } from 'vitest';
import { deviceSchema } from '../../../src/parts/devices/device.ts';
import { mosfetFactFigures } from '../../../src/parts/devices/fitting.ts';
import { ratingsOf } from '../../../src/parts/devices/ratings.ts';

const faults = (device: unknown): readonly string[] => {
  const result = deviceSchema.safeParse(device);
  return result.success
    ? []
    : result.error.issues.map(({ path, message }) => `${path.join('.')}: ${message}`);
};

const model = { threshold: 1.6, gainFactor: 0.08 };
const mosfet = { type: 'mosfet', channel: 'n', model };

describe('a device', () => {
  it('holds a model or facts, never both, never neither', () => {
    expect(faults(mosfet)).toEqual([]);
    const facts = { gateThreshold: [{ typical: 2, at: { drainCurrent: '250u' } }] };
    expect(faults({ type: 'mosfet', channel: 'n', facts })).toEqual([]);
    expect(faults({ ...mosfet, facts })).toEqual([': A device holds either a model or facts.']);
    expect(faults({ type: 'mosfet', channel: 'n' })).toEqual([': A device holds either a model or facts.']);
  });

  it('of a MOSFET states its gain once', () => {
    const said = 'model: A MOSFET model states either its gain factor or its process transconductance.';
    expect(faults({ ...mosfet, model: { threshold: 1 } })).toEqual([said]);
    expect(faults({ ...mosfet, model: { ...model, processTransconductance: 1e-4 } })).toEqual([said]);
  });

  it.each([
    ['an unknown type', { type: 'valve', model }],
    ['an unknown key', { ...mosfet, colour: 'red' }],
    ['an unknown key of the model', { ...mosfet, model: { ...model, magic: 1 } }],
    ['an unknown key of the body diode', { ...mosfet, model: { ...model, bodyDiode: { magic: 1 } } }],
    ['an unknown fact', { type: 'mosfet', channel: 'n', facts: { luck: [{ typical: 1 }] } }],
    [
      'a condition that the fact does not have',
      { type: 'mosfet', channel: 'n', facts: { gateThreshold: [{ typical: 1, at: { current: 1 } }] } },
    ],
    ['a rating of another type', { ...mosfet, ratings: { collectorCurrent: 1 } }],
    ['a gain factor outside its range', { ...mosfet, model: { threshold: 1, gainFactor: 0 } }],
    ['a threshold outside its range', { ...mosfet, model: { ...model, threshold: 101 } }],
    ['a channel that is neither n nor p', { ...mosfet, channel: 'x' }],
    ['a Zener without its voltage', { type: 'zener', model: { breakdownCurrent: 1e-3 } }],
    [
      'a fact without a figure',
      { type: 'mosfet', channel: 'n', facts: { gateThreshold: [{ at: { drainCurrent: 1e-4 } }] } },
    ],
    [
      'a fact whose figures are out of order',
      { type: 'mosfet', channel: 'n', facts: { gateThreshold: [{ low: 3, typical: 2 }] } },
    ],
    ['an empty list of facts', { type: 'mosfet', channel: 'n', facts: { gateThreshold: [] } }],
    [
      'a dissipation at two temperatures',
      { ...mosfet, ratings: { dissipation: { value: 1, ambient: 25, case: 25 } } },
    ],
  ])('is refused with %s', (_, device) => {
    expect(faults(device)).not.toEqual([]);
  });
});

describe('facts in numbers', () => {
  it('are SI, at 25 °C unless said', () => {
    const device = deviceSchema.parse({
      type: 'mosfet',
      channel: 'n',
      facts: {
        onResistance: [{ high: '5', at: { gateToSource: '10 V', drainCurrent: '500m', temperature: 125 } }],
        gateThreshold: [{ low: 1, high: 3, at: { drainCurrent: '250u' }, source: 'sheet 3' }],
      },
    });
    if (device.type !== 'mosfet') throw new Error('not a MOSFET');
    const figures = mosfetFactFigures(device);
    expect(figures.onResistance).toEqual([
      { high: 5, at: { gateToSource: 10, drainCurrent: 0.5, temperature: 125 } },
    ]);
    expect(figures.gateThreshold).toEqual([
      { low: 1, high: 3, at: { drainCurrent: 250e-6, temperature: 25 }, source: 'sheet 3' },
    ]);
    expect(figures.gateLeakage).toEqual([]);
  });
});

describe('ratings in numbers', () => {
  const ratings = (stated: object) => ratingsOf(deviceSchema.parse({ ...mosfet, ratings: stated }));

  it('a plain dissipation holds up to 25 °C ambient, by the convention of data sheets', () => {
    expect(ratings({ dissipation: '350m' }).dissipation).toEqual({
      value: 0.35,
      upTo: 25,
      of: 'ambient',
      conditionStated: false,
    });
    expect(ratings({ dissipation: { value: 40, case: 100 } }).dissipation).toEqual({
      value: 40,
      upTo: 100,
      of: 'case',
      conditionStated: true,
    });
  });

  it('a thermal resistance to the ambient keeps its mounting', () => {
    expect(ratings({ junctionToAmbient: 357 }).junctionToAmbient).toEqual({ value: 357 });
    expect(
      ratings({ junctionToAmbient: { value: 60, mounting: '6 cm² of copper' } }).junctionToAmbient,
    ).toEqual({ value: 60, mounting: '6 cm² of copper' });
  });

  it('what is not stated is not there', () => {
    expect(ratings({ drainToSource: 60 })).toEqual({ drainToSource: 60 });
  });
});
