import { describe, expect, it } from 'vitest';
import { neighbourIn, readingOrder } from '../../../src/sheet/readingOrder.ts';
import { preparedDivider } from './stage.ts';

describe('the reading order', () => {
  it('goes line by line from the top, each from the left, past what has nothing to say', async () => {
    const { scene } = await preparedDivider();
    // VBAT, R1, TP1 in the line of the joint, R2; not the ground.
    expect(readingOrder(scene.parts)).toEqual(['p1', 'p2', 'p5', 'p3']);
  });

  it('ends at both ends, so that the focus can leave', () => {
    const order = ['a', 'b', 'c'];
    expect(neighbourIn(order, undefined, 1)).toBe('a');
    expect(neighbourIn(order, 'a', 1)).toBe('b');
    expect(neighbourIn(order, 'c', 1)).toBeUndefined();
    expect(neighbourIn(order, 'a', -1)).toBeUndefined();
    expect(neighbourIn([], undefined, 1)).toBeUndefined();
  });
});
