/** SI prefixes by symbol, as powers of ten. `m` is milli and `M` is mega, always. */
export const prefixExponents: Readonly<Record<string, number>> = {
  a: -18,
  f: -15,
  p: -12,
  n: -9,
  u: -6,
  '\u00b5': -6, // the micro sign
  '\u03bc': -6, // the Greek letter
  m: -3,
  k: 3,
  M: 6,
  G: 9,
  T: 12,
};

/** The prefix that is written for a power of ten. */
export const prefixSymbols: ReadonlyMap<number, string> = new Map([
  [-18, 'a'],
  [-15, 'f'],
  [-12, 'p'],
  [-9, 'n'],
  [-6, 'µ'],
  [-3, 'm'],
  [0, ''],
  [3, 'k'],
  [6, 'M'],
  [9, 'G'],
  [12, 'T'],
]);
