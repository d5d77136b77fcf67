import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { sideOf, stripAt, stripSize } from '../../../src/sheet/strip/place.ts';
import {
  allowedNear,
  axisAbout,
  namedOn,
  nextValue,
  placeOf,
  ticksOf,
  valueAt,
} from '../../../src/sheet/strip/scale.ts';

const e24 = { stocked: true, series: 'E24' } as const;
const free = { stocked: false, series: 'E24' } as const;

describe('the slider’s axis', () => {
  it('runs two decades about the value, which stands in its middle', () => {
    const axis = axisAbout(4700, 'resistance');
    expect(axis).toEqual({ low: 470, high: 47_000 });
    expect(placeOf(axis, 4700)).toBeCloseTo(0.5, 12);
    // Logarithmic: a decade from 470 Ω is half way.
    expect(placeOf(axis, 470)).toBe(0);
    expect(placeOf(axis, 47_000)).toBe(1);
  });

  it('does not leave the range of the quantity', () => {
    expect(axisAbout(50e9, 'resistance').high).toBe(100e9);
    expect(axisAbout(0.005, 'resistance').low).toBe(1e-3);
  });

  it('gives a place back for each value and the value for each place', () => {
    const axis = axisAbout(4700, 'resistance');
    fc.assert(
      fc.property(fc.double({ min: 0, max: 1, noNaN: true }), (place) => {
        expect(placeOf(axis, valueAt(axis, place))).toBeCloseTo(place, 9);
      }),
      { seed: 7 },
    );
  });

  it('has a tick for each value of E24, longest for E6, and names those of E3 (IEC 60063)', () => {
    const axis = axisAbout(1000, 'resistance');
    const ticks = ticksOf(axis);
    // Two decades, both ends included: 2 · 24 + 1, 2 · 6 + 1 of them long, 2 · 12 + 1 long or middling.
    expect(ticks).toHaveLength(49);
    expect(ticks.filter(({ length }) => length === 13)).toHaveLength(13);
    expect(ticks.filter(({ length }) => length >= 8)).toHaveLength(25);
    expect(namedOn(axis)).toEqual([100, 220, 470, 1000, 2200, 4700, 10_000]);
  });

  it('stops at stocked values, or at three figures where any will do, never outside', () => {
    const axis = axisAbout(4700, 'resistance');
    expect(allowedNear(axis, 4980, e24)).toBe(5100);
    expect(allowedNear(axis, 4983.7, free)).toBe(4980);
    const odd = axisAbout(4990, 'resistance');
    for (const stock of [e24, free, { stocked: true, series: 'E96' } as const]) {
      for (const end of [odd.low, odd.high]) {
        const value = allowedNear(odd, end, stock);
        expect(value).toBeGreaterThanOrEqual(odd.low * (1 - 1e-9));
        expect(value).toBeLessThanOrEqual(odd.high * (1 + 1e-9));
      }
    }
  });

  it('goes to the next stocked value by key, and no further than its ends', () => {
    const axis = axisAbout(4700, 'resistance');
    expect(nextValue(axis, 4700, 'up', e24)).toBe(5100);
    expect(nextValue(axis, 4700, 'down', e24)).toBe(4300);
    expect(nextValue(axis, 47_000, 'up', e24)).toBe(47_000);
    expect(nextValue(axis, 470, 'down', e24)).toBe(470);
    expect(nextValue(axis, 1000, 'up', free)).toBe(1010);
  });
});

describe('the place of the value strip', () => {
  const around = (left: number, top: number) => ({
    wash: { left, top, right: left + 60, bottom: top + 60 },
    lead: left + 15,
    viewport: { scale: 1, x: 0, y: 0 },
    sheet: { width: 1000, height: 600 },
  });

  it('is under the part and right of its lead where nothing lies', () => {
    const here = around(300, 200);
    const side = sideOf(here, []);
    expect(side).toEqual({ below: true, right: true });
    expect(stripAt(here, side)).toMatchObject({ left: 329, top: 274 });
  });

  it('gives way to what it would cover', () => {
    const here = around(500, 250);
    const side = sideOf(here, [{ left: 540, top: 330, right: 700, bottom: 400 }]);
    expect(side).toEqual({ below: true, right: false });
  });

  it('is whole on the sheet and off its part, wherever the part is', () => {
    const places = fc.tuple(fc.integer({ min: 0, max: 940 }), fc.integer({ min: 0, max: 540 }));
    fc.assert(
      fc.property(places, ([x, y]) => {
        const here = around(x, y);
        const { left, top } = stripAt(here, sideOf(here, []));
        expect(left).toBeGreaterThanOrEqual(8);
        expect(left + stripSize.width).toBeLessThanOrEqual(992);
        expect(top >= here.wash.bottom || top + stripSize.height <= here.wash.top).toBe(true);
      }),
      { seed: 11 },
    );
  });
});
