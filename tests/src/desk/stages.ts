import { readFileSync } from 'node:fs';
import { readStage } from '../../../src/stage/readStage.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';

/** A kept example, as the page opens it. */
export const example = async (name: string): Promise<StageDocument> => {
  const text = readFileSync(new URL(`../../../examples/${name}.stage.json`, import.meta.url), 'utf8');
  const opened = await readStage(text);
  if (!opened.ok) throw new Error(opened.faults.map(({ message }) => message).join(' '));
  return opened.value;
};

/** 10 V over two resistors of 1 kΩ: what stands between them is worked by hand, 10 V · lower / (upper + lower). */
export const divider = async (): Promise<StageDocument> => {
  const resistor = (name: string, place: readonly number[]) => ({
    kind: 'resistor',
    name,
    place,
    turn: 90,
    values: { resistance: { value: '1k', tolerance: 0.01 } },
  });
  const opened = await readStage(
    JSON.stringify({
      format: 'restpoint-stage',
      version: 1,
      title: 'Divider',
      conditions: {},
      devices: {},
      parts: {
        p1: { kind: 'rail', name: 'VBAT', place: [10, 0], values: { voltage: 10 } },
        p2: resistor('R1', [10, 6]),
        p3: resistor('R2', [10, 16]),
        p4: { kind: 'ground', place: [10, 22] },
        p5: { kind: 'test-point', name: 'TP1', place: [20, 11] },
      },
      joints: { j1: [10, 11] },
      wires: {
        w1: {
          ends: [
            ['p1', 'node'],
            ['p2', 'a'],
          ],
        },
        w2: { ends: [['p2', 'b'], ['j1']] },
        w3: { ends: [['j1'], ['p3', 'a']] },
        w4: {
          ends: [
            ['p3', 'b'],
            ['p4', 'node'],
          ],
        },
        w5: { ends: [['j1'], ['p5', 'node']] },
      },
      states: { asleep: { set: { 'p1.voltage': 4 } } },
      questions: {},
    }),
  );
  if (!opened.ok) throw new Error(opened.faults.map(({ path, message }) => `${path} ${message}`).join(' '));
  return opened.value;
};
