/**
 * Root of a function known to change sign between two ends: regula falsi with the Illinois weighting (Dowell and
 * Jarratt 1971), which also closes on a jump.
 *
 * @param f the function; what is not a number counts as no answer and ends the search
 * @param low and `high` ends, with the function's values there, of different sign
 * @param tolerance width at which the search ends
 * @returns the root, or null where the function gave no number
 */
export const bracketedRoot = (
  f: (x: number) => number,
  low: { readonly x: number; readonly y: number },
  high: { readonly x: number; readonly y: number },
  tolerance: number,
): number | null => {
  let { x: a, y: fa } = low;
  let { x: b, y: fb } = high;
  let side = 0;
  for (let step = 0; step < 200; step++) {
    if (fa === 0) return a;
    if (fb === 0) return b;
    if (Math.abs(b - a) <= tolerance) break;
    // A bisection every fourth step bounds the work where the function is steep at one end.
    const x = step % 4 === 3 ? (a + b) / 2 : (a * fb - b * fa) / (fb - fa);
    const y = f(x);
    if (Number.isNaN(y)) return null;
    if (y > 0 === fb > 0) {
      b = x;
      fb = y;
      if (side === 1) fa /= 2;
      side = 1;
    } else {
      a = x;
      fa = y;
      if (side === -1) fb /= 2;
      side = -1;
    }
  }
  return Math.abs(fa) < Math.abs(fb) ? a : b;
};
