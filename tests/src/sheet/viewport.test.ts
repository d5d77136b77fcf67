import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  apply,
  fitted,
  invert,
  largestScale,
  panned,
  smallestScale,
  zoomedAt,
  type Viewport,
} from '../../../src/sheet/viewport.ts';

const finite = (limit: number) => fc.double({ min: -limit, max: limit, noNaN: true });
const viewports: fc.Arbitrary<Viewport> = fc.record({
  scale: fc.double({ min: smallestScale, max: largestScale, noNaN: true }),
  x: finite(1e4),
  y: finite(1e4),
});

describe('the viewport', () => {
  it('invert undoes apply', () => {
    fc.assert(
      fc.property(viewports, finite(1e4), finite(1e4), (viewport, x, y) => {
        const [backX, backY] = invert(viewport, apply(viewport, [x, y]));
        expect(backX).toBeCloseTo(x, 6);
        expect(backY).toBeCloseTo(y, 6);
      }),
      { seed: 1 },
    );
  });

  it('zooming keeps what lies under the pointer under the pointer, and stays between 10 % and 800 %', () => {
    fc.assert(
      fc.property(
        viewports,
        finite(2e3),
        finite(2e3),
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        (viewport, x, y, factor) => {
          const zoomed = zoomedAt(viewport, [x, y], factor);
          expect(zoomed.scale).toBeGreaterThanOrEqual(smallestScale);
          expect(zoomed.scale).toBeLessThanOrEqual(largestScale);
          const [sheetX, sheetY] = invert(viewport, [x, y]);
          const [screenX, screenY] = apply(zoomed, [sheetX, sheetY]);
          expect(screenX).toBeCloseTo(x, 5);
          expect(screenY).toBeCloseTo(y, 5);
        },
      ),
      { seed: 2 },
    );
  });

  it('panning moves every point by the same step', () => {
    expect(apply(panned({ scale: 2, x: 5, y: 6 }, [10, -4]), [1, 1])).toEqual([17, 4]);
  });

  it('fit shows the whole drawing, in the middle', () => {
    const bounds = { left: -200, top: 100, right: 1800, bottom: 900 };
    const size = { width: 900, height: 600 };
    const viewport = fitted(bounds, size);
    const [left, top] = apply(viewport, [bounds.left, bounds.top]);
    const [right, bottom] = apply(viewport, [bounds.right, bounds.bottom]);
    expect(left).toBeGreaterThanOrEqual(31);
    expect(right).toBeLessThanOrEqual(869);
    expect(top).toBeGreaterThanOrEqual(31);
    expect(bottom).toBeLessThanOrEqual(569);
    expect(Math.abs((left + right) / 2 - 450)).toBeLessThanOrEqual(1);
    expect(Math.abs((top + bottom) / 2 - 300)).toBeLessThanOrEqual(1);
  });

  it('fit never enlarges a small drawing beyond 100 %', () => {
    expect(fitted({ left: 0, top: 0, right: 50, bottom: 50 }, { width: 900, height: 600 }).scale).toBe(1);
  });
});
