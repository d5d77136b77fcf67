import { evaluateArithmetic, looksLikeArithmetic } from './arithmetic.ts';
import { describeFound, shorten } from './found.ts';
import { formatRange } from './format.ts';
import { readMarkingCode } from './marking-code.ts';
import { prefixExponents } from './prefixes.ts';
import { quantityOf, wordsOf } from './quantities.ts';
import type { Quantity, QuantityName } from './quantities.ts';
import { failure, success } from './result.ts';
import type { Result } from './result.ts';

/** No one types more; a damaged file may hold more. */
const longestText = 200;

const numberPattern = /^([+\-\u2212]?)(\d+\.?\d*|\.\d+)(?:[eE]([+\-\u2212]?\d+))?/;

interface Limits {
  readonly low: number;
  readonly high: number;
}

/**
 * Reads a value of a quantity, in SI base units (°C for temperatures): a number, or text holding a number with
 * an optional SI prefix and unit, a marking code of IEC 60062, or arithmetic of plain numbers.
 * Arithmetic needs `prepareArithmetic()` to have finished once; without it the fault is `arithmetic-not-ready`.
 */
export function parseValue(value: number | string, quantity: QuantityName, limits?: Limits): Result<number> {
  const what = quantityOf(quantity);
  const number = typeof value === 'number' ? success(value) : readText(value, quantity, what);
  if (!number.ok) return number;
  const [low, high] = limits === undefined ? what.range : [limits.low, limits.high];
  if (!Number.isFinite(number.value)) {
    return failure({
      code: 'not-finite',
      message: `The value of ${wordsOf(quantity)} must be a finite number.`,
      found: describeFound(value),
      allowed: formatRange(low, high, what),
    });
  }
  if (number.value < low || number.value > high) {
    const allowed = formatRange(low, high, what);
    return failure({
      code: 'out-of-range',
      message: `This value of ${wordsOf(quantity)} is outside what is allowed: ${allowed}.`,
      found: describeFound(value),
      allowed,
    });
  }
  return success(number.value);
}

function readText(text: string, name: QuantityName, quantity: Quantity): Result<number> {
  const trimmed = text.trim();
  const refuse = (code: string, message: string) =>
    failure({ code, message, found: describeFound(text), allowed: allowedText(quantity) });

  if (trimmed === '') return refuse('not-a-value', `A value of ${wordsOf(name)} is missing here.`);
  if (trimmed.length > longestText) {
    return refuse(
      'not-a-value',
      `This text is too long for ${wordsOf(name)}: at most ${longestText} characters.`,
    );
  }
  if (/\d\s*,\s*\d/.test(trimmed)) {
    return refuse('decimal-comma', 'Write the decimal sign as a point: 4.7, not 4,7.');
  }
  const direct = readDirectly(trimmed, quantity);
  if (direct !== undefined) return success(direct);
  if (looksLikeArithmetic(trimmed) && !onlyAUnitIsWrong(trimmed)) return evaluateArithmetic(trimmed);
  return refuse(...explain(trimmed, name, quantity));
}

/** Text that is neither arithmetic nor wrong: a number with prefix and unit, or a marking code. */
const readDirectly = (text: string, quantity: Quantity): number | undefined =>
  readNumberWithUnit(text, quantity) ?? readCodeWithUnit(text, quantity);

/** Whether text of a quantity is worked out rather than read: `12/3`, but not `5 mA/V²`. */
export const isArithmetic = (text: string, quantity: QuantityName): boolean =>
  looksLikeArithmetic(text) && readDirectly(text.trim(), quantityOf(quantity)) === undefined;

/** `5 A/W`: one number and a unit that is not the quantity's, not arithmetic. */
const onlyAUnitIsWrong = (text: string): boolean =>
  numberPattern.test(text) && /^\s*\p{L}[^\d()+*]*[\d²]?$/u.test(text.replace(numberPattern, ''));

const ownUnit = (unit: string, quantity: Quantity): number | undefined => {
  if (unit === '' || unit === quantity.unit) return 1;
  return quantity.aliases !== undefined && Object.hasOwn(quantity.aliases, unit)
    ? quantity.aliases[unit]
    : undefined;
};

function readNumberWithUnit(text: string, quantity: Quantity): number | undefined {
  const match = numberPattern.exec(text);
  if (match === null) return undefined;
  const [head, sign = '', mantissa = '', exponentText = '0'] = match;
  const exponent = Number(exponentText.replace('\u2212', '-'));
  const rest = text.slice(head.length).trim();
  // One conversion of the whole decimal, so that "4.7 n" is the very double that 4.7e-9 is.
  const scaled = (power: number) => Number(`${sign === '' || sign === '+' ? '' : '-'}${mantissa}e${power}`);

  const first = rest.slice(0, 1);
  if (Object.hasOwn(prefixExponents, first)) {
    const prefix = prefixExponents[first] ?? 0;
    const factor = ownUnit(rest.slice(1).trim(), quantity);
    if (factor !== undefined) return scaled(exponent + prefix) * factor;
  }
  const factor = ownUnit(rest, quantity);
  return factor === undefined ? undefined : applyFactor(scaled, exponent, factor);
}

/** A factor that is a power of ten moves the exponent, which keeps the decimal exact. */
function applyFactor(scaled: (power: number) => number, exponent: number, factor: number): number {
  const power = Math.round(Math.log10(factor));
  return Number(`1e${power}`) === factor ? scaled(exponent + power) : scaled(exponent) * factor;
}

function readCodeWithUnit(text: string, quantity: Quantity): number | undefined {
  if (quantity.code === undefined) return undefined;
  const [code = '', unit = '', ...more] = text.split(/\s+/);
  if (more.length > 0 || ownUnit(unit, quantity) !== 1) return undefined;
  const direct = readMarkingCode(code, quantity.code);
  if (direct !== undefined || unit !== '') return direct;
  const glued = quantity.unit !== '' && code.endsWith(quantity.unit) ? quantity.unit.length : 0;
  return glued > 0 ? readMarkingCode(code.slice(0, -glued), quantity.code) : undefined;
}

function allowedText(quantity: Quantity): string {
  const unit = quantity.unit === '' ? '' : ` and the unit ${quantity.unit}`;
  const code = quantity.code === undefined ? '' : `, or a code such as ${exampleCode[quantity.code]}`;
  return `a number with an optional SI prefix${unit}${code}, or arithmetic of numbers`;
}

const exampleCode = { resistance: '4k7', capacitance: '4n7' } as const;

/** Says what is wrong with text that is no value, with the hint that fits. */
function explain(
  text: string,
  name: QuantityName,
  quantity: Quantity,
): readonly [code: string, message: string] {
  const said = `"${shorten(text)}"`;
  const what = wordsOf(name);
  const rest = text.replace(numberPattern, '').trim();
  if (!numberPattern.test(text) || rest === '') return ['not-a-value', `${said} is not a value of ${what}.`];
  if (quantity.code === 'resistance' && /^m\d+$/.test(rest)) {
    return ['not-a-value', `${said} is not a resistance: m is milli and M is mega; 2M2 is 2.2 MΩ.`];
  }
  if (rest.startsWith('K')) return ['not-a-value', `${said} is not understood: kilo is a small k.`];
  if (/^\p{L}\d+$/u.test(rest)) {
    const unit = quantity.unit === '' ? '' : ` and its unit, ${quantity.unit}`;
    return ['not-a-value', `${said} is not a code for ${what}: write it with a decimal point${unit}.`];
  }
  if (/^\d/.test(rest))
    return ['not-a-value', `${said} is not one number: write it without spaces or marks.`];
  return [
    'wrong-unit',
    quantity.unit === ''
      ? `"${shorten(rest)}" is not understood: ${what} is a pure number.`
      : `"${shorten(rest)}" is not a unit of ${what}: its unit is ${quantity.unit}.`,
  ];
}
