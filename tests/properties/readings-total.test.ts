import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { drawPlate } from '../../src/drawing/plate/plate.ts';
import { toSvg } from '../../src/drawing/svg.ts';
import { themes } from '../../src/drawing/themes.ts';
import type { StateReadings } from '../../src/readings/readings.ts';
import { settleStage } from '../../src/readings/settleStage.ts';
import { layOut } from '../../src/stage/layout/layOut.ts';
import { readStageAtOnce } from '../../src/stage/readStage.ts';
import { routeWires } from '../../src/stage/routing/index.ts';
import { prepareArithmetic } from '../../src/values/arithmetic.ts';
import { soaking, stageFile } from './stageDocuments.ts';

beforeAll(() => prepareArithmetic());

const numRuns = soaking ? 3000 : 120;

/** Every number in a value, however deep. */
function* numbersIn(value: unknown): Generator<number> {
  if (typeof value === 'number') yield value;
  else if (typeof value === 'object' && value !== null) {
    for (const inner of Object.values(value)) yield* numbersIn(inner);
  }
}

const expectAnswer = (state: StateReadings): void => {
  if (state.settled) {
    for (const number of numbersIn(state)) expect(Number.isFinite(number)).toBe(true);
    expect(state.residual.ratio).toBeLessThanOrEqual(1);
  } else {
    expect(state.reason.length).toBeGreaterThan(5);
    expect(state.concerns.length + state.snags.length).toBeGreaterThan(0);
  }
};

describe('any sound stage file', () => {
  it('is settled with finite figures, or not settled with a reason and the parts concerned; never a crash', () => {
    fc.assert(
      fc.property(stageFile(8), (file) => {
        const read = readStageAtOnce(JSON.stringify(file));
        if (!read.ok) return;
        for (const state of Object.values(settleStage(read.value).states)) expectAnswer(state);
      }),
      { seed: 41, numRuns },
    );
  });

  it('is drawn, settled or not', () => {
    fc.assert(
      fc.property(stageFile(8), (file) => {
        const read = readStageAtOnce(JSON.stringify(file));
        if (!read.ok) return;
        const placed = layOut(read.value);
        const [first] = Object.entries(settleStage(read.value).states);
        if (first === undefined) throw new Error('no state');
        const [state, readings] = first;
        const drawing = drawPlate(placed, readings, {
          routes: routeWires(placed),
          state,
          density: 'all',
          date: '2026-01-31',
          program: 'Restpoint',
        });
        expect(toSvg(drawing, themes.light)).not.toMatch(/NaN|undefined|Infinity/);
      }),
      { seed: 42, numRuns: Math.ceil(numRuns / 4) },
    );
  });
});
