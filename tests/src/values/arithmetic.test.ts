import { describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../../src/values/arithmetic.ts';
import { parseValue } from '../../../src/values/parse.ts';

describe('arithmetic', () => {
  it('says so where it is not loaded yet, and reads the same text once it is', async () => {
    const before = parseValue('12/3', 'resistance');
    expect(before.ok ? [] : before.faults.map((fault) => fault.code)).toEqual(['arithmetic-not-ready']);
    // Whatever needs no arithmetic is read at once.
    expect(parseValue('5 mA/V²', 'gainFactor')).toEqual({ ok: true, value: 0.005 });
    await prepareArithmetic();
    expect(parseValue('12/3', 'resistance')).toEqual({ ok: true, value: 4 });
  });
});
