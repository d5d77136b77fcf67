import fc from 'fast-check';
import { beforeAll, describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../../src/values/arithmetic.ts';
import { formatPercent, formatQuantity } from '../../../src/values/format.ts';
import { parseValue } from '../../../src/values/parse.ts';
import { formatSpread, formatStated } from '../../../src/values/value-text.ts';
import type { QuantityName } from '../../../src/values/quantities.ts';
import type { ValueSpec } from '../../../src/values/value-spec.ts';

beforeAll(() => prepareArithmetic());

describe('formatQuantity writes readings', () => {
  it.each<[number, string, string]>([
    [0, 'A', '0 A'],
    [-0, 'V', '0 V'],
    [12, 'V', '12.00 V'],
    [1.412e-3, 'A', '1.412 mA'],
    [3.837, 'V', '3.837 V'],
    [-0.1, 'V', '\u2212100.0 mV'],
    [0.0055804, 'W', '5.580 mW'],
    [0.99996, 'A', '1.000 A'],
    [999.96, 'V', '1.000 kV'],
    [4700, 'resistance', '4.700 kΩ'],
    [1e-13, 'F', '100.0 fF'],
    [4.2e-6, 'A', '4.200 µA'],
    [27.04, '°C', '27 °C'],
    [-20.25, 'temperature', '\u221220.3 °C'],
    [357, 'K/W', '357.0 K/W'],
    [1e-4, 'temperatureCoefficient', '100.0 ppm/K'],
    [2.5, 'slopeFactor', '2.500'],
    [1e-21, 'A', '1.000e\u221221 A'],
  ])('%d of %s as %s', (value, of, text) => {
    expect(formatQuantity(value, of)).toBe(text);
  });

  it('takes fewer figures, and leaves zeros away when asked', () => {
    expect(formatQuantity(8.94, 'V', { figures: 2 })).toBe('8.9 V');
    expect(formatQuantity(12, 'V', { trim: true })).toBe('12 V');
    expect(formatQuantity(100, 'V', { trim: true })).toBe('100 V');
  });

  it('has no figure for what is not a number', () => {
    expect(() => formatQuantity(Number.NaN, 'V')).toThrow(RangeError);
  });

  it('writes what is read back to four figures', () => {
    fc.assert(
      fc.property(fc.double({ min: 1e-15, max: 1e4, noNaN: true }), fc.boolean(), (size, negative) => {
        const value = negative ? -size : size;
        const back = parseValue(formatQuantity(value, 'current'), 'current');
        expect(back.ok && Math.abs(back.value - value) <= 0.5001e-3 * size).toBe(true);
      }),
      { seed: 60062, numRuns: 2000 },
    );
  });
});

describe('formatPercent', () => {
  it.each([
    [0.05, '5 %'],
    [0.012, '1.2 %'],
    [1, '100 %'],
    [-0.19, '\u221219 %'],
    [12.34, '1230 %'],
    [0, '0 %'],
  ])('%d is %s', (fraction, text) => {
    expect(formatPercent(fraction)).toBe(text);
  });
});

describe('formatStated writes a value as it stands beside its part', () => {
  it.each<[ValueSpec, QuantityName, string]>([
    ['4k7', 'resistance', '4k7'],
    ['4K7', 'resistance', '4K7'],
    ['3.3 kΩ', 'resistance', '3.3 kΩ'],
    ['100', 'resistance', '100 Ω'],
    ['12/3', 'resistance', '4 Ω'],
    ['80 mA/V²', 'gainFactor', '80 mA/V²'],
    [240, 'resistance', '240 Ω'],
    [4700, 'resistance', '4k7'],
    [1e6, 'resistance', '1M'],
    [0.47, 'resistance', '470 mΩ'],
    [1e-7, 'capacitance', '100n'],
    [4.7e-6, 'capacitance', '4µ7'],
    [0.01, 'inductance', '10 mH'],
    [12, 'voltage', '12 V'],
    [-5, 'voltage', '\u22125 V'],
    [0.25, 'fraction', '0.25'],
    [{ value: '100', tolerance: 0.05 }, 'resistance', '100 Ω'],
  ])('%j of %s as %s', (spec, quantity, text) => {
    expect(formatStated(spec, quantity)).toBe(text);
  });

  it('gives the spread beside it', () => {
    expect(formatSpread({ value: '100', tolerance: 0.05 }, 'resistance')).toBe('±5 %');
    expect(formatSpread({ value: 12, low: 10.5, high: 14.4 }, 'voltage')).toBe('10.5 V … 14.4 V');
    expect(formatSpread(12, 'voltage')).toBeUndefined();
  });
});
