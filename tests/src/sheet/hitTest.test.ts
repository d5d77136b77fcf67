import { describe, expect, it } from 'vitest';
import { boundsOf } from '../../../src/drawing/bounds.ts';
import { middle } from '../../../src/drawing/boxes.ts';
import { hitTest, within } from '../../../src/sheet/hitTest.ts';
import { preparedDivider } from './stage.ts';

describe('the hit test', () => {
  it('finds a part by its body and by its leads', async () => {
    const prepared = await preparedDivider();
    // R1 stands at grid (10, 6), its pins three units above and below.
    expect(hitTest(prepared, [120, 72], 5)).toEqual({ what: 'part', part: 'p2' });
    expect(hitTest(prepared, [120, 72 + 30], 5)).toEqual({ what: 'part', part: 'p2' });
  });

  it('tells a value from a name', async () => {
    const prepared = await preparedDivider();
    const at = (thing: string) => {
      const text = prepared.still.find((primitive) => primitive.of === 'p2' && primitive.thing === thing);
      if (text === undefined) throw new Error(`R1 has no ${thing}`);
      return middle(boundsOf(text));
    };
    expect(hitTest(prepared, at('value'), 5)).toEqual({ what: 'value', part: 'p2' });
    expect(hitTest(prepared, at('name'), 5)).toEqual({ what: 'part', part: 'p2' });
  });

  it('finds a wire within its reach and not beyond', async () => {
    const prepared = await preparedDivider();
    const wire = prepared.scene.wires.find(({ id }) => id === 'w5');
    const [[x, y] = [0, 0]] = wire?.points ?? [];
    expect(hitTest(prepared, [x + 30, y + 4], 5)).toEqual({ what: 'wire', wire: 'w5' });
    expect(hitTest(prepared, [x + 30, y + 6], 5)).toBeNull();
  });

  it('finds nothing on the bare sheet', async () => {
    expect(hitTest(await preparedDivider(), [-200, -200], 5)).toBeNull();
  });
});

describe('the selection frame', () => {
  it('takes parts that it touches and wires that it holds whole', async () => {
    const prepared = await preparedDivider();
    const frame = { left: 60, top: 60, right: 180, bottom: 200 };
    expect([...within(prepared, frame)].sort()).toEqual(['p2', 'p3', 'w2', 'w3']);
    expect(within(prepared, { left: -90, top: -90, right: -80, bottom: -80 })).toEqual([]);
  });
});
