import { describe, expect, it } from 'vitest';
import { prefixExponents, prefixSymbols } from '../../src/values/prefixes.ts';

/** SI Brochure, 9th edition (BIPM 2019), table 7: SI prefixes. Value from memory. */
const brochure: readonly (readonly [symbol: string, exponent: number])[] = [
  ['T', 12],
  ['G', 9],
  ['M', 6],
  ['k', 3],
  ['m', -3],
  ['µ', -6],
  ['n', -9],
  ['p', -12],
  ['f', -15],
  ['a', -18],
];

describe('prefixes against the SI brochure', () => {
  it.each(brochure)('%s is ten to the power %d, read and written', (symbol, exponent) => {
    expect(prefixExponents[symbol]).toBe(exponent);
    expect(prefixSymbols.get(exponent)).toBe(symbol);
  });
  it('both code points of µ are micro', () => {
    expect(prefixExponents['\u00b5']).toBe(-6);
    expect(prefixExponents['\u03bc']).toBe(-6);
  });
});
