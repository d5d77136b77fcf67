import { describe, expect, it } from 'vitest';
import { checkValue } from '../../../src/values/check-value.ts';
import { resolveValue } from '../../../src/values/value-spec.ts';

const faults = (spec: unknown) => {
  const result = checkValue(spec, 'voltage');
  return result.ok ? 'accepted' : result.faults.map((fault) => `${fault.code} ${fault.path ?? ''}`.trim());
};

describe('a value with a spread', () => {
  it('a tolerance is a fraction of the size, whichever the sign', () => {
    expect(resolveValue({ value: '4k7', tolerance: 0.1 }, 'resistance')).toEqual({
      nominal: 4700,
      low: 4230,
      high: 5170,
      tolerance: 0.1,
    });
    expect(resolveValue({ value: -10, tolerance: 0.1 }, 'voltage')).toMatchObject({ low: -11, high: -9 });
  });
  it('limits are taken as stated, in any way of writing, with a sigma', () => {
    expect(resolveValue({ low: '10.5 V', value: 12, high: '14.4', sigma: '500 mV' }, 'voltage')).toEqual({
      nominal: 12,
      low: 10.5,
      high: 14.4,
      sigma: 0.5,
    });
  });
  it('without a spread low, nominal and high are one', () => {
    expect(resolveValue('3.3 V', 'voltage')).toEqual({ nominal: 3.3, low: 3.3, high: 3.3 });
  });
  it.each<[unknown, string[]]>([
    [{ value: 12 }, ['spread-shape']],
    [{ tolerance: 0.1 }, ['spread-shape']],
    [{ value: 12, low: 10 }, ['spread-shape']],
    [{ value: 12, low: 10, high: 14, tolerance: 0.1 }, ['spread-shape']],
    [{}, ['spread-shape']],
    [{ value: 12, low: 13, high: 14 }, ['spread-order low']],
    [{ value: 12, low: 10, high: 11 }, ['spread-order high']],
    [{ value: 12, tolerance: 1 }, ['out-of-range tolerance']],
    [{ value: 12, tolerance: '5%' }, ['wrong-type tolerance']],
    [{ value: 12, tolerance: 0.1, extra: 1 }, ['unknown-key extra']],
    [{ value: 12, low: 10, high: 14, sigma: 0 }, ['out-of-range sigma']],
    [{ value: 12, low: 10, high: 14, sigma: -1 }, ['out-of-range sigma']],
    [{ value: null, low: 10, high: 14 }, ['wrong-type value']],
    [{ value: { value: 1 }, tolerance: 0.1 }, ['wrong-type value']],
    [{ value: 12, low: 10, high: 10001 }, ['out-of-range high']],
    [[12], ['wrong-type']],
    [null, ['wrong-type']],
    [true, ['wrong-type']],
    [undefined, ['wrong-type']],
  ])('%j is refused', (spec, expected) => {
    expect(faults(spec)).toEqual(expected);
  });
});
