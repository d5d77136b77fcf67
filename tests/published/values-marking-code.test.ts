import { describe, expect, it } from 'vitest';
import { parseValue } from '../../src/values/parse.ts';

/** IEC 60062, marking codes for resistors and capacitors: examples of the standard's tables. Value from memory. */
const resistances: readonly (readonly [code: string, ohms: number])[] = [
  ['R10', 0.1],
  ['R15', 0.15],
  ['R332', 0.332],
  ['R47', 0.47],
  ['1R0', 1],
  ['3R32', 3.32],
  ['10R', 10],
  ['59R04', 59.04],
  ['590R4', 590.4],
  ['100R', 100],
  ['1K0', 1e3],
  ['3K32', 3.32e3],
  ['4K7', 4.7e3],
  ['5K904', 5.904e3],
  ['10K', 10e3],
  ['33K2', 33.2e3],
  ['150K', 150e3],
  ['332K', 332e3],
  ['1M0', 1e6],
  ['2M2', 2.2e6],
  ['3M32', 3.32e6],
  ['10M', 10e6],
  ['1G0', 1e9],
  ['10G', 10e9],
];
const capacitances: readonly (readonly [code: string, farads: number])[] = [
  ['p10', 0.1e-12],
  ['p332', 0.332e-12],
  ['1p0', 1e-12],
  ['3p32', 3.32e-12],
  ['10p', 10e-12],
  ['33p2', 33.2e-12],
  ['590p4', 590.4e-12],
  ['n15', 0.15e-9],
  ['1n0', 1e-9],
  ['4n7', 4.7e-9],
  ['33n2', 33.2e-9],
  ['100n', 100e-9],
  ['1µ0', 1e-6],
  ['4\u00b57', 4.7e-6],
  ['4\u03bc7', 4.7e-6],
  ['4u7', 4.7e-6],
  ['332µ', 332e-6],
  ['1m0', 1e-3],
  ['10m', 10e-3],
];

describe('values against the marking codes of IEC 60062', () => {
  it.each(resistances)('%s is a resistance of %d Ω', (code, ohms) => {
    expect(parseValue(code, 'resistance')).toEqual({ ok: true, value: ohms });
  });
  it.each(capacitances)('%s is a capacitance of %d F', (code, farads) => {
    expect(parseValue(code, 'capacitance')).toEqual({ ok: true, value: farads });
  });
});
