import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type {
  MosfetReading,
  SettledState,
  StateReadings,
  TwoPinReading,
} from '../../../src/readings/readings.ts';
import { settleStage, type SettleStageOptions } from '../../../src/readings/settleStage.ts';
import { readStage } from '../../../src/stage/readStage.ts';

const beacon = readFileSync(new URL('../stage/kept/version-1.stage.json', import.meta.url), 'utf8');

const settled = async (
  text: string,
  state: string,
  options: SettleStageOptions = {},
): Promise<StateReadings> => {
  const read = await readStage(text);
  if (!read.ok)
    throw new Error(read.faults.map((fault) => `${fault.path ?? ''} ${fault.message}`).join('\n'));
  const found = settleStage(read.value, options).states[state];
  if (found === undefined) throw new Error(`no state ${state}`);
  return found;
};

const settledWell = async (...call: Parameters<typeof settled>): Promise<SettledState> => {
  const state = await settled(...call);
  if (!state.settled) throw new Error(state.reason);
  return state;
};

/** A stage of a few parts, written short. */
const stage = (parts: object, wires: readonly (readonly [string, string])[], more: object = {}): string =>
  JSON.stringify({
    format: 'restpoint-stage',
    version: 1,
    title: 'Trial',
    conditions: {},
    devices: {},
    parts,
    joints: {},
    wires: Object.fromEntries(
      wires.map((ends, index) => [`w${index + 1}`, { ends: ends.map((end) => end.split('.')) }]),
    ),
    states: {},
    questions: {},
    ...more,
  });

const rail = (voltage: number) => ({ kind: 'rail', name: 'VA', values: { voltage } });
const resistor = (name: string, resistance: number) => ({ kind: 'resistor', name, values: { resistance } });
const nChannel = { d1: { type: 'mosfet', channel: 'n', model: { threshold: 1, gainFactor: 0.001 } } };

describe('the worked example of the stage file', () => {
  // Figures worked by hand to five places; they stand in the contract itself.
  it('reads Q1 and DS1 as stated', async () => {
    const { pins, pinCurrents, parts } = await settledWell(beacon, 'on');
    expect(pins).toMatchObject({ 'DS1.a': 12, 'Q1.gate': 5, 'Q1.source': 0, 'Q1.body': 0 });
    expect(pins['DS1.b']).toBeCloseTo(0.18572, 5);
    expect(pins['Q1.drain']).toBeCloseTo(0.18572, 5);
    expect(pinCurrents['DS1.a']).toBeCloseTo(0.049226, 6);
    expect(pinCurrents['DS1.b']).toBeCloseTo(-0.049226, 6);
    expect(pinCurrents['Q1.drain']).toBeCloseTo(0.049226, 6);
    expect(pinCurrents['Q1.source']).toBeCloseTo(-0.049226, 6);
    expect(pinCurrents['Q1.gate']).toBe(0);
    expect(pinCurrents['Q1.body']).toBe(0);
    const lamp = parts.DS1 as TwoPinReading;
    expect(lamp).toMatchObject({ id: 'p2', kind: 'load' });
    expect(lamp.voltage).toBeCloseTo(11.8143, 4);
    expect(lamp.current).toBeCloseTo(0.049226, 6);
    expect(lamp.power).toBeCloseTo(0.58157, 5);
    const q1 = parts.Q1 as MosfetReading;
    expect(q1).toMatchObject({
      id: 'p3',
      kind: 'mosfet',
      region: 'triode',
      reversed: false,
      gateToSource: 5,
      sourceToBody: 0,
      threshold: 1.6,
      saturationVoltage: 3.4,
      bodyTransconductance: 0,
      junctionTemperature: null,
      duty: 'conduct',
      verdict: 'held',
    });
    expect(q1.overdrive).toBeCloseTo(3.4, 12);
    expect(q1.drainToSource).toBeCloseTo(0.18572, 5);
    expect(q1.drainCurrent).toBeCloseTo(0.049226, 6);
    expect(q1.transconductance).toBeCloseTo(0.014885, 6);
    expect(q1.outputConductance).toBeCloseTo(0.25811, 5);
    expect(q1.power).toBeCloseTo(0.0091421, 7);
    expect(q1.headroom).toBeCloseTo(1.958, 3);
    expect(q1.reasons).toEqual(['entered by model: no data-sheet fact behind it', 'nominal only']);
  });

  it('blocks in state off', async () => {
    const { parts } = await settledWell(beacon, 'off');
    expect(parts.Q1).toMatchObject({ region: 'cutoff', duty: 'block', verdict: 'held' });
  });

  it('settles only the states that are named', async () => {
    const read = await readStage(beacon);
    if (!read.ok) throw new Error('refused');
    expect(Object.keys(settleStage(read.value).states)).toEqual(['on', 'off']);
    expect(Object.keys(settleStage(read.value, { states: ['off'] }).states)).toEqual(['off']);
  });

  it('has a lower threshold in the heat, by its stated coefficient', async () => {
    // −4 mV/K over 35 K.
    const { parts } = await settledWell(beacon, 'on', { ambient: 60 });
    expect((parts.Q1 as MosfetReading).threshold).toBeCloseTo(1.6 - 0.14, 9);
  });
});

describe('what a drawing leaves open', () => {
  it('a part that is wired to nothing is left out with a snag, whatever its kind', async () => {
    const parts = {
      p1: rail(5),
      p2: resistor('R1', 1000),
      p3: { kind: 'ground' },
      p4: { kind: 'mosfet', name: 'Q9', device: 'd1' },
      p5: { kind: 'amplifier', name: 'U9', values: { gain: 1e5 } },
      p6: resistor('R9', 10),
    };
    const state = await settledWell(
      stage(
        parts,
        [
          ['p1.node', 'p2.a'],
          ['p2.b', 'p3.node'],
        ],
        { devices: nChannel },
      ),
      'on',
    );
    expect(state.parts.R1).toMatchObject({ voltage: 5 });
    expect(state.parts).not.toHaveProperty('Q9');
    expect(state.pins['U9.out']).toBeNull();
    const named = state.snags.filter((snag) => snag.code === 'unwired').flatMap((snag) => snag.parts);
    expect(named).toEqual(expect.arrayContaining(['Q9', 'U9', 'R9']));
  });

  it('a node between two transistors that are off is null with a snag, never a figure', async () => {
    const parts = {
      p1: rail(10),
      p2: { kind: 'mosfet', name: 'Q1', device: 'd1', duty: 'block' },
      p3: { kind: 'mosfet', name: 'Q2', device: 'd1', duty: 'block' },
      p4: { kind: 'ground' },
    };
    const state = await settledWell(
      stage(
        parts,
        [
          ['p1.node', 'p2.drain'],
          ['p2.source', 'p3.drain'],
          ['p3.source', 'p4.node'],
          ['p2.gate', 'p4.node'],
          ['p3.gate', 'p4.node'],
        ],
        { devices: nChannel },
      ),
      'on',
    );
    expect(state.pins['Q2.drain']).toBeNull();
    expect(state.snags.map((snag) => snag.code)).toContain('not-set');
  });

  it('a floating gate is named, and nothing is settled', async () => {
    const parts = {
      p1: rail(10),
      p2: resistor('R1', 1000),
      p3: { kind: 'mosfet', name: 'Q1', device: 'd1' },
      p4: { kind: 'ground' },
      p5: { kind: 'capacitor', name: 'C1', values: { capacitance: 1e-9 } },
    };
    const state = await settled(
      stage(
        parts,
        [
          ['p1.node', 'p2.a'],
          ['p2.b', 'p3.drain'],
          ['p3.source', 'p4.node'],
          ['p5.a', 'p3.gate'],
          ['p5.b', 'p4.node'],
        ],
        { devices: nChannel },
      ),
      'on',
    );
    expect(JSON.stringify(state)).toMatch(/Q1/);
    expect(state.snags.map((snag) => snag.code)).toContain('floating-gate');
  });

  it('a supply shorted upon itself is named, and nothing is settled', async () => {
    const parts = { p1: { kind: 'supply', name: 'PS1', values: { voltage: 5 } }, p2: { kind: 'ground' } };
    const state = await settled(
      stage(parts, [
        ['p1.plus', 'p2.node'],
        ['p1.minus', 'p2.node'],
      ]),
      'on',
    );
    expect(state.settled).toBe(false);
    expect(JSON.stringify(state)).toMatch(/PS1/);
  });

  it('a body diode straight across a reversed battery is the snag, never a reading of kiloamperes', async () => {
    const parts = {
      p1: { kind: 'supply', name: 'BT1', values: { voltage: -12, form: 'battery' } },
      p2: { kind: 'mosfet', name: 'Q1', device: 'd1', duty: 'block' },
      p3: { kind: 'ground' },
      // Drives the gate alone, and is not named.
      p4: { kind: 'rail', name: 'DRIVE', values: { voltage: 0 } },
    };
    const wires = [
      ['p1.plus', 'p2.drain'],
      ['p2.source', 'p3.node'],
      ['p2.gate', 'p4.node'],
      ['p1.minus', 'p3.node'],
    ] as const;
    const state = await settled(stage(parts, wires, { devices: nChannel }), 'on');
    if (state.settled) throw new Error('settled');
    expect(state.reason).toContain('a junction of Q1 lies straight across BT1');
    expect(state.concerns).toEqual(['Q1', 'BT1']);
    expect(state.snags[0]).toMatchObject({ code: 'straight-across', severity: 'stop', parts: ['Q1', 'BT1'] });
    // With the battery's own resistance stated there is something that limits the current, and so a reading.
    const limited = { ...parts, p1: { ...parts.p1, values: { ...parts.p1.values, resistance: 1 } } };
    expect((await settled(stage(limited, wires, { devices: nChannel }), 'on')).settled).toBe(true);
  });

  it('no figure is ever NaN or infinite', async () => {
    const text = JSON.stringify(await settled(beacon, 'on'));
    expect(text).not.toMatch(/NaN|Infinity/);
  });
});
