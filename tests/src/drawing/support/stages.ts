import { readFileSync } from 'node:fs';
import { settleStage } from '../../../../src/readings/settleStage.ts';
import type { StateReadings } from '../../../../src/readings/readings.ts';
import { drawStage, type DrawOptions, type StageDrawing } from '../../../../src/drawing/drawStage.ts';
import { readStageAtOnce } from '../../../../src/stage/readStage.ts';
import { baseName } from '../../../../src/stage/states.ts';
import type { StageDocument } from '../../../../src/stage/schema/stage.ts';
import { routeWires } from '../../../../src/stage/routing/index.ts';

export const documentOf = (text: string): StageDocument => {
  const read = readStageAtOnce(text);
  if (!read.ok)
    throw new Error(read.faults.map(({ path, message }) => `${path ?? ''}: ${message}`).join('\n'));
  return read.value;
};

export const example = (name: string): StageDocument =>
  documentOf(readFileSync(new URL(`../../../../examples/${name}.stage.json`, import.meta.url), 'utf8'));

const stage = (parts: object, wires: object, joints: object, devices: object = {}): StageDocument =>
  documentOf(
    JSON.stringify({
      format: 'restpoint-stage',
      version: 1,
      title: 'Bench stage',
      conditions: { ambient: 25, law: 'square' },
      devices,
      parts,
      joints,
      wires,
      states: {},
      questions: {},
    }),
  );

/** A rail, a resistor, a ground. */
export const threeParts = (): StageDocument =>
  stage(
    {
      p1: { kind: 'rail', name: 'VBAT', place: [4, 2], values: { voltage: 12 } },
      p2: { kind: 'resistor', name: 'R1', place: [4, 8], turn: 90, values: { resistance: '4k7' } },
      p3: { kind: 'ground', place: [4, 14] },
    },
    {
      w1: {
        ends: [
          ['p1', 'node'],
          ['p2', 'a'],
        ],
      },
      w2: {
        ends: [
          ['p2', 'b'],
          ['p3', 'node'],
        ],
      },
    },
    {},
  );

const device = {
  type: 'mosfet',
  channel: 'n',
  title: 'small n-channel',
  model: { threshold: 1.6, gainFactor: 0.004, lengthModulation: 0.01 },
};

/** Amplifier cells in a row, each coupled to the next: nine parts a cell, and four more at the ends. */
export const amplifierChain = (cells: number, pitch = 24): StageDocument => {
  const parts: Record<string, object> = {};
  const wires: Record<string, object> = {};
  const joints: Record<string, object> = {};
  let wireCount = 0;
  const wire = (from: readonly string[], to: readonly string[]) => {
    wires[`w${++wireCount}`] = { ends: [from, to] };
  };
  let partCount = 0;
  const part = (entry: object): string => {
    const id = `p${++partCount}`;
    parts[id] = entry;
    return id;
  };
  const resistor = (name: string, x: number, y: number, resistance: string) =>
    part({ kind: 'resistor', name, place: [x, y], turn: 90, values: { resistance } });

  const signal = part({
    kind: 'supply',
    name: 'G1',
    place: [-12, 24],
    turn: 90,
    values: { voltage: 0, signal: '5m' },
  });
  const signalGround = part({ kind: 'ground', place: [-12, 32] });
  wire([signal, 'minus'], [signalGround, 'node']);
  let from: readonly string[] = [signal, 'plus'];
  for (let cell = 0; cell < cells; cell++) {
    const x = cell * pitch;
    const n = cell * 10;
    const rail = part({
      kind: 'rail',
      name: 'VBAT',
      place: [x + 4, 1],
      ...(cell === 0 ? { values: { voltage: 12 } } : { values: {} }),
    });
    const upper = resistor(`R${n + 1}`, x, 8, '1M');
    const load = resistor(`R${n + 2}`, x + 8, 8, '4k7');
    const q = part({
      kind: 'mosfet',
      name: `Q${cell + 1}`,
      place: [x + 8, 18],
      device: 'd1',
      duty: 'amplify',
    });
    const lower = resistor(`R${n + 3}`, x, 26, '470k');
    const source = resistor(`R${n + 4}`, x + 8, 26, '1k');
    const left = part({ kind: 'ground', place: [x, 32] });
    const right = part({ kind: 'ground', place: [x + 8, 32] });
    const coupling = part({
      kind: 'capacitor',
      name: `C${cell + 1}`,
      place: [x - 6, 18],
      values: { capacitance: '100n' },
    });
    const [top, gate, drain] = [`j${n + 1}`, `j${n + 2}`, `j${n + 3}`];
    joints[top] = [x + 4, 3];
    joints[gate] = [x, 18];
    joints[drain] = [x + 8, 13];
    wire([rail, 'node'], [top]);
    wire([top], [upper, 'a']);
    wire([top], [load, 'a']);
    wire([upper, 'b'], [gate]);
    wire([gate], [q, 'gate']);
    wire([gate], [lower, 'a']);
    wire([load, 'b'], [drain]);
    wire([drain], [q, 'drain']);
    wire([q, 'source'], [source, 'a']);
    wire([lower, 'b'], [left, 'node']);
    wire([source, 'b'], [right, 'node']);
    wire(from, [coupling, 'a']);
    wire([coupling, 'b'], [gate]);
    from = [drain];
  }
  const end = cells * pitch;
  const out = part({ kind: 'tag', place: [end, 13], values: { label: 'OUT' } });
  const probe = part({ kind: 'test-point', name: 'TP1', place: [end - 5, 11] });
  joints.j900 = [end - 5, 13];
  wire(from, ['j900']);
  wire(['j900'], [out, 'node']);
  wire(['j900'], [probe, 'node']);
  return stage(parts, wires, joints, { d1: device });
};

export const settled = (document: StageDocument, state = baseName(document)): StateReadings => {
  const readings = settleStage(document, { states: [state] }).states[state];
  if (readings === undefined) throw new Error(`no state ${state}`);
  return readings;
};

export const drawn = (
  document: StageDocument,
  options: Partial<Omit<DrawOptions, 'routes'>> = {},
  readings: StateReadings | null = settled(document, options.state),
): StageDrawing =>
  drawStage(document, readings, { density: 'all', ...options, routes: routeWires(document) });
