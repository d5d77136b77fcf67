/**
 * Root of a continuous function between two ends of different sign: regula falsi with the Illinois correction
 * (Dowell and Jarratt 1971), a bisection wherever that is slow. To the last digits of `x`.
 */
export function findRoot(f: (x: number) => number, low: number, high: number): number | undefined {
  let [a, b] = [low, high];
  let [fa, fb] = [f(a), f(b)];
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (Number.isNaN(fa) || Number.isNaN(fb) || fa > 0 === fb > 0) return undefined;
  let side = 0;
  for (let pass = 0; pass < 300; pass++) {
    const span = Math.abs(b - a);
    if (span <= 2 * Number.EPSILON * Math.max(Math.abs(a), Math.abs(b))) break;
    let c = (a * fb - b * fa) / (fb - fa);
    // Every third pass halves the bracket, whatever the function does.
    if (pass % 3 === 2 || !Number.isFinite(c) || c <= Math.min(a, b) || c >= Math.max(a, b))
      c = a + (b - a) / 2;
    const fc = f(c);
    if (fc === 0) return c;
    if (fc > 0 === fa > 0) {
      a = c;
      fa = fc;
      if (side === -1) fb /= 2;
      side = -1;
    } else {
      b = c;
      fb = fc;
      if (side === 1) fa /= 2;
      side = 1;
    }
  }
  return a + (b - a) / 2;
}
