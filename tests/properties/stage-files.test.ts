import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../src/values/arithmetic.ts';
import { readStageAtOnce } from '../../src/stage/readStage.ts';
import type { StageDocument } from '../../src/stage/schema/stage.ts';
import { writeStage } from '../../src/stage/writeStage.ts';
import { stageDocument } from './stageDocuments.ts';

beforeAll(() => prepareArithmetic());

const runs = { seed: 1, numRuns: 300 };

const read = (text: string): StageDocument => {
  const result = readStageAtOnce(text);
  if (!result.ok) throw new Error(JSON.stringify(result.faults));
  return result.value;
};

describe('a stage file', () => {
  it('that is written and read again is the same document, keys in their order', () => {
    fc.assert(
      fc.property(stageDocument(), (document) => {
        const back = read(writeStage(document));
        expect(back).toStrictEqual(document);
        expect(JSON.stringify(back)).toBe(JSON.stringify(document));
      }),
      runs,
    );
  });

  it('has one canonical text: writing what was read from it changes nothing', () => {
    fc.assert(
      fc.property(stageDocument(), (document) => {
        const text = writeStage(document);
        expect(writeStage(read(text))).toBe(text);
        // However the same JSON is laid out, and whatever was left out of it that says nothing.
        expect(writeStage(read(JSON.stringify(document)))).toBe(text);
      }),
      runs,
    );
  });

  it('says in its canonical text what it says as JSON', () => {
    fc.assert(
      fc.property(stageDocument(), (document) => {
        expect(JSON.parse(writeStage(document))).toStrictEqual(JSON.parse(JSON.stringify(document)));
      }),
      runs,
    );
  });
});
