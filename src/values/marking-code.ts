/**
 * The marking code of IEC 60062 for resistances and capacitances: a letter stands for the decimal point and
 * says the multiplier (`4K7`, `R47`, `4n7`). The small `k` printed in drawings is read like the code's `K`;
 * `u` is read like µ. Letter table: value from memory.
 */
const letters: Readonly<Record<'resistance' | 'capacitance', Readonly<Record<string, number>>>> = {
  resistance: { L: -3, R: 0, K: 3, k: 3, M: 6, G: 9, T: 12 },
  capacitance: { p: -12, n: -9, u: -6, '\u00b5': -6, '\u03bc': -6, m: -3, F: 0 },
};

const pattern = /^(\d*)(\p{L})(\d*)$/u;

/** The number a code stands for, in ohms or farads; undefined where the text is no such code. */
export function readMarkingCode(text: string, code: 'resistance' | 'capacitance'): number | undefined {
  const match = pattern.exec(text);
  if (match === null) return undefined;
  const [, whole = '', letter = '', part = ''] = match;
  const exponent = letters[code][letter];
  if (exponent === undefined || whole + part === '') return undefined;
  // One conversion of the whole decimal, so that 4n7 is the very double that 4.7e-9 is.
  return Number(`${whole === '' ? '0' : whole}.${part === '' ? '0' : part}e${exponent}`);
}
