import { beforeAll, describe, expect, it } from 'vitest';
import { prepareArithmetic } from '../../../src/values/arithmetic.ts';
import { parseValue } from '../../../src/values/parse.ts';
import type { QuantityName } from '../../../src/values/quantities.ts';

beforeAll(() => prepareArithmetic());

const value = (text: number | string, quantity: QuantityName = 'resistance') => {
  const result = parseValue(text, quantity);
  return result.ok ? result.value : `refused: ${result.faults.map((fault) => fault.code).join(', ')}`;
};
const message = (text: number | string, quantity: QuantityName = 'resistance') => {
  const result = parseValue(text, quantity);
  return result.ok ? 'accepted' : (result.faults[0]?.message ?? '');
};

describe('parseValue reads what a person types', () => {
  it.each<[string, QuantityName, number]>([
    ['240', 'resistance', 240],
    ['240 Ω', 'resistance', 240],
    ['240 \u2126', 'resistance', 240],
    ['3.3 kΩ', 'resistance', 3300],
    ['3.3kohm', 'resistance', 3300],
    ['4.7 k', 'resistance', 4700],
    ['4k7', 'resistance', 4700],
    ['4k7 Ω', 'resistance', 4700],
    ['4k7Ω', 'resistance', 4700],
    ['100 m', 'resistance', 0.1],
    ['1 M', 'resistance', 1e6],
    ['1e3', 'resistance', 1000],
    ['1.5E-3k', 'resistance', 1.5],
    ['.5', 'resistance', 0.5],
    ['5.', 'resistance', 5],
    ['4.7 nF', 'capacitance', 4.7e-9],
    ['10 µF', 'capacitance', 1e-5],
    ['10 \u03bcF', 'capacitance', 1e-5],
    ['10 uF', 'capacitance', 1e-5],
    ['4u7', 'inductance', 4.7e-6],
    ['\u22123.3 V', 'voltage', -3.3],
    ['-3.3', 'voltage', -3.3],
    ['+5V', 'voltage', 5],
    ['25 °C', 'temperature', 25],
    ['80 mA/V²', 'gainFactor', 0.08],
    ['80 mA/V^2', 'gainFactor', 0.08],
    ['\u22124 mV/K', 'voltageTemperatureCoefficient', -0.004],
    ['100 ppm/K', 'temperatureCoefficient', 1e-4],
    ['5 %', 'tolerance', 0.05],
    ['10 m', 'length', 0.01],
    ['0.35 um', 'length', 0.35e-6],
  ])('%s as a %s is %d', (text, quantity, expected) => {
    expect(value(text, quantity)).toBe(expected);
  });

  it('m is milli and M is mega, always', () => {
    expect(value('5 mV', 'voltage')).toBe(0.005);
    expect(value('5 mΩ')).toBe(0.005);
    expect(value('5 MΩ')).toBe(5e6);
    expect(value('2m2')).toBe('refused: not-a-value');
    expect(message('2m2')).toContain('m is milli and M is mega');
    expect(value('4M7', 'capacitance')).toBe('refused: not-a-value');
  });
});

describe('parseValue works arithmetic out', () => {
  it.each([
    ['12/3', 4],
    ['12÷3', 4],
    ['2+3*4', 14],
    ['2 + 3 × 4', 14],
    ['(2+3)*4', 20],
    ['10 \u2212 2.5', 7.5],
    ['10-2-3', 5],
    ['16/4/2', 2],
    ['-(2-7)', 5],
    ['2--3', 5],
    ['1e3/2', 500],
  ])('%s is %d', (text, expected) => {
    expect(value(text)).toBe(expected);
  });

  it.each([
    '2*4k7',
    '2(3)',
    '2 3+1',
    '(2+3',
    '2+',
    '*2',
    '1/2/',
    'pi*2',
    'sqrt(4)',
    '2^3',
    '2%3',
    '()',
    '1;2',
  ])('%s is refused', (text) => {
    expect(value(text)).toMatch(/^refused: (not-arithmetic|not-a-value|wrong-unit)$/);
  });

  it('a division by zero is not finite, not a value', () => {
    expect(value('1/0')).toBe('refused: not-finite');
    expect(value('0/0')).toBe('refused: not-arithmetic');
  });

  it('brackets nested past all reason are refused without a crash', () => {
    expect(value(`${'('.repeat(90)}1${')'.repeat(90)}`)).toBe(1);
    expect(value(`${'('.repeat(5000)}1${')'.repeat(5000)}`)).toBe('refused: not-a-value');
  });
});

describe('parseValue refuses, and says why', () => {
  it('a decimal comma, with the hint', () => {
    expect(value('4,7')).toBe('refused: decimal-comma');
    expect(message('4,7 k')).toContain('point');
    expect(value('4,7/2')).toBe('refused: decimal-comma');
  });
  it("another quantity's unit", () => {
    expect(value('5 V')).toBe('refused: wrong-unit');
    expect(message('5 A/W')).toBe('"A/W" is not a unit of resistance: its unit is Ω.');
    expect(value('5 Ω', 'slopeFactor')).toBe('refused: wrong-unit');
  });
  it.each([
    '',
    ' ',
    'x',
    'k',
    'R',
    '4k7k',
    '1 000',
    '3V3',
    'NaN',
    'Infinity',
    '0x10',
    '1__proto__',
    '5 constructor',
  ])('text that is no value: "%s"', (text) => {
    expect(typeof value(text)).toBe('string');
  });
  it('what is not finite', () => {
    expect(value(Number.NaN)).toBe('refused: not-finite');
    expect(value(Number.POSITIVE_INFINITY)).toBe('refused: not-finite');
    expect(value('1e999')).toBe('refused: not-finite');
  });
  it('a value of any length of text without a crash', () => {
    expect(value('9'.repeat(1_000_000))).toBe('refused: not-a-value');
  });
});

/** The ranges of the stage file's contract, both ends included. */
describe('parseValue keeps to the ranges', () => {
  it.each<[QuantityName, number, number]>([
    ['resistance', 1e-3, 100e9],
    ['capacitance', 1e-15, 10],
    ['inductance', 1e-9, 1000],
    ['voltage', -10e3, 10e3],
    ['current', -10e3, 10e3],
    ['temperature', -100, 300],
    ['tolerance', 0, 0.99],
    ['gainFactor', 1e-12, 1e4],
    ['threshold', -100, 100],
    ['lengthModulation', 0, 1],
    ['bodyFactor', 0, 10],
    ['surfacePotential', 0.1, 2],
    ['slopeFactor', 1, 3],
  ])('%s from %d to %d', (quantity, low, high) => {
    expect(value(low, quantity)).toBe(low);
    expect(value(high, quantity)).toBe(high);
    const below = low === 0 ? -1e-12 : low - Math.abs(low) * 1e-9;
    expect(value(below, quantity)).toBe('refused: out-of-range');
    expect(value(high * (1 + 1e-9), quantity)).toBe('refused: out-of-range');
  });
  it('and says what is allowed', () => {
    expect(message('0')).toBe('This value of resistance is outside what is allowed: 1 mΩ to 100 GΩ.');
  });
});
