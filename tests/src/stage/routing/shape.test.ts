import { describe, expect, it } from 'vitest';
import { partBox, pinPosition, standPart } from '../../../../src/stage/routing/shape.ts';
import { ground, mosfet, rail, resistor, stage, wire } from './hand.ts';

// Pin offsets are those of the stage file's table of kinds; mirror first (x → −x), then turn clockwise.
describe('pins on the sheet', () => {
  it('stand at the table’s offsets from the place', () => {
    const document = stage(
      { p1: mosfet('n', [30, 16]), p2: mosfet('p', [10, 10]), p3: resistor([5, 5]) },
      [],
    );
    expect(pinPosition(document, 'p1', 'gate')).toEqual([27, 16]);
    expect(pinPosition(document, 'p1', 'drain')).toEqual([30, 13]);
    expect(pinPosition(document, 'p1', 'source')).toEqual([30, 19]);
    expect(pinPosition(document, 'p2', 'source')).toEqual([10, 7]);
    expect(pinPosition(document, 'p3', 'b')).toEqual([8, 5]);
  });

  it('are mirrored first and then turned clockwise', () => {
    const turned = { ...mosfet('n', [0, 0], true), turn: 90 } as const;
    // Mirrored the gate is at (3, 0); a quarter turn clockwise brings it to (0, 3).
    expect(pinPosition(stage({ p1: turned }, []), 'p1', 'gate')).toEqual([0, 3]);
    expect(pinPosition(stage({ p1: turned }, []), 'p1', 'drain')).toEqual([3, 0]);
    expect(pinPosition(stage({ p1: resistor([4, 4], 90) }, []), 'p1', 'a')).toEqual([4, 1]);
  });

  it('are nowhere for a part without a place, an unknown pin and an unknown part', () => {
    const document = stage({ p1: resistor(), p2: resistor([0, 0]) }, []);
    expect(pinPosition(document, 'p1', 'a')).toBeUndefined();
    expect(pinPosition(document, 'p2', 'gate')).toBeUndefined();
    expect(pinPosition(document, 'p9', 'a')).toBeUndefined();
    expect(partBox(document, 'p1')).toBeUndefined();
  });

  it('point away from the body, turned with it', () => {
    const document = stage(
      { p1: mosfet('n', [0, 0]), p2: rail('VBAT', [9, 9]), p3: ground([20, 9]), p4: resistor([0, 30], 90) },
      [],
    );
    const heading = (id: string, pin: string) => standPart(document, id)?.pins.get(pin)?.heading;
    expect([heading('p1', 'gate'), heading('p1', 'drain'), heading('p1', 'source')]).toEqual([2, 3, 1]);
    // A rail stands above its wire, a ground hangs below.
    expect([heading('p2', 'node'), heading('p3', 'node')]).toEqual([1, 3]);
    expect([heading('p4', 'a'), heading('p4', 'b')]).toEqual([3, 1]);
  });

  it('of a body that is not brought out are not drawn until a wire ends on them', () => {
    const parts = { p1: mosfet('n', [0, 0]), p2: ground([8, 3]) };
    const drawn = (document: ReturnType<typeof stage>) => standPart(document, 'p1')?.pins.get('body')?.drawn;
    expect(drawn(stage(parts, []))).toBe(false);
    expect(drawn(stage(parts, [wire('p1.body', 'p2.node')]))).toBe(true);
  });
});

it('partBox gives the body without its leads in grid units', () => {
  // A resistor’s body is 36 × 14 px, 12 px to a unit.
  const box = partBox(stage({ p1: resistor([10, 10], 90) }, []), 'p1');
  expect(box?.left).toBeCloseTo(10 - 7 / 12, 12);
  expect(box?.right).toBeCloseTo(10 + 7 / 12, 12);
  expect(box?.top).toBeCloseTo(8.5, 12);
  expect(box?.bottom).toBeCloseTo(11.5, 12);
});
