import { describe, expect, it } from 'vitest';
import { readdirSync } from 'node:fs';
import { baseName, stateNames } from '../../../src/stage/states.ts';
import { layOut } from '../../../src/stage/layout/layOut.ts';
import type { StageDocument } from '../../../src/stage/schema/stage.ts';
import { crossings, overlaps } from './support/overlaps.ts';
import { amplifierChain, drawn, example, threeParts } from './support/stages.ts';

const tagsOf = (document: StageDocument): readonly string[] =>
  Object.entries(document.parts).flatMap(([id, { kind }]) => (kind === 'tag' ? [id] : []));

const stages: readonly (readonly [string, StageDocument])[] = [
  ['3 parts', threeParts()],
  ['12 parts', example('dual-probe-mirror')],
  ['40 parts', amplifierChain(4)],
];

describe.each(stages)('a stage of %s', (_, document) => {
  const drawing = drawn(document);

  it('has the size that it says', () => {
    const count = Object.keys(document.parts).length;
    expect([3, 12, 40]).toContain(count);
  });

  it('keeps texts, chips, badges, signs, parts and wires clear of one another', () => {
    expect(overlaps(drawing, tagsOf(document))).toEqual([]);
  });

  it('runs every leader to its node and over nothing else', () => {
    expect(crossings(drawing)).toEqual([]);
  });

  it('finds room for every reading', () => {
    expect(drawing.unplaced).toEqual([]);
  });
});

const examples = readdirSync(new URL('../../../examples', import.meta.url))
  .filter((name) => name.endsWith('.stage.json'))
  .map((name) => name.replace('.stage.json', ''));

describe.each(examples)('the example %s', (name) => {
  const document = layOut(example(name));

  it.each(stateNames(document))('is drawn in the state %s with nothing on anything else', (state) => {
    const drawing = drawn(document, { state });
    expect(overlaps(drawing, tagsOf(document))).toEqual([]);
    expect(crossings(drawing)).toEqual([]);
    expect(drawing.unplaced).toEqual([]);
  });

  it('is the same drawing each time', () => {
    const state = baseName(document);
    expect(drawn(document, { state })).toEqual(drawn(document, { state }));
  });
});

describe('the search for overlaps itself', () => {
  it('finds a name that is moved onto a wire', () => {
    const document = threeParts();
    const drawing = drawn(document);
    const primitives = drawing.primitives.map((primitive) =>
      primitive.kind === 'text' && primitive.thing === 'name' && primitive.of === 'p2'
        ? { ...primitive, x: 4 * 12 - 5 }
        : primitive,
    );
    expect(overlaps({ ...drawing, primitives }, [])).not.toEqual([]);
  });
});
