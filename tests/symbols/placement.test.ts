import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { standing, standingBox, type Stance, type Turn } from '../../symbols/placement.ts';

const stance = fc.record({ mirror: fc.boolean(), turn: fc.constantFrom<Turn>(0, 90, 180, 270) });
const whole = fc.integer({ min: -50, max: 50 });

describe('standing', () => {
  // Clockwise as seen on a sheet whose y runs down: what points right points down after a quarter turn.
  it.each<[Turn, readonly [number, number]]>([
    [0, [3, 0]],
    [90, [0, 3]],
    [180, [-3, 0]],
    [270, [0, -3]],
  ])('turns a pin on the right clockwise by %s', (turn, expected) => {
    expect(standing([3, 0], { mirror: false, turn })).toEqual(expected);
  });

  it('mirrors first and turns afterwards', () => {
    expect(standing([3, 1], { mirror: true, turn: 90 })).toEqual([-1, -3]);
  });

  it('agrees with the rotation matrix of the same angle', () => {
    fc.assert(
      fc.property(whole, whole, stance, (x, y, { mirror, turn }) => {
        const angle = (turn * Math.PI) / 180;
        const across = mirror ? -x : x;
        const [a, b] = standing([x, y], { mirror, turn });
        expect(a).toBeCloseTo(across * Math.cos(angle) - y * Math.sin(angle), 9);
        expect(b).toBeCloseTo(across * Math.sin(angle) + y * Math.cos(angle), 9);
      }),
      { seed: 20, numRuns: 200 },
    );
  });

  it('never gives a negative zero', () => {
    fc.assert(
      fc.property(stance, (how: Stance) => standing([0, 0], how).every((value) => Object.is(value, 0))),
      { seed: 21 },
    );
  });
});

describe('standingBox', () => {
  it('holds exactly the corners of the box that was turned', () => {
    fc.assert(
      fc.property(whole, whole, fc.nat(40), fc.nat(40), stance, (left, top, width, height, how) => {
        const box = { left, top, right: left + width, bottom: top + height };
        const turned = standingBox(box, how);
        const corners = [
          [box.left, box.top],
          [box.right, box.top],
          [box.right, box.bottom],
          [box.left, box.bottom],
        ] as const;
        const places = corners.map((corner) => standing(corner, how));
        expect(turned.left).toBe(Math.min(...places.map(([x]) => x)));
        expect(turned.right).toBe(Math.max(...places.map(([x]) => x)));
        expect(turned.top).toBe(Math.min(...places.map(([, y]) => y)));
        expect(turned.bottom).toBe(Math.max(...places.map(([, y]) => y)));
      }),
      { seed: 22, numRuns: 200 },
    );
  });
});
