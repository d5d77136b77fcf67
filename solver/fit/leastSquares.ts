/**
 * Least squares in a box: Levenberg's and Marquardt's method (Marquardt 1963) with central differences, unknowns that
 * press against a bound held there. For the few unknowns and residuals of a fit.
 */
export interface Box {
  readonly low: readonly number[];
  readonly high: readonly number[];
}

export interface LeastSquares {
  readonly x: readonly number[];
  /** Half the sum of squares. */
  readonly cost: number;
}

const passes = 100;

export function leastSquares(
  residuals: (x: readonly number[]) => readonly number[],
  start: readonly number[],
  box: Box,
): LeastSquares {
  const inside = (x: readonly number[]) =>
    x.map((value, i) => Math.min(Math.max(value, box.low[i] ?? -Infinity), box.high[i] ?? Infinity));
  const costOf = (r: readonly number[]) => r.reduce((sum, value) => sum + value * value, 0) / 2;

  let x = inside(start);
  let r = residuals(x);
  let cost = costOf(r);
  let damping = 1e-3;
  for (let pass = 0; pass < passes && cost > 0; pass++) {
    const slopes = x.map((_, i) => slopesAt(residuals, x, i, box));
    const gradient = slopes.map((slope) => dot(slope, r));
    const free = x
      .map((_, i) => i)
      .filter((i) => {
        const [at = 0, g = 0] = [x[i], gradient[i]];
        return !(at <= (box.low[i] ?? -Infinity) && g > 0) && !(at >= (box.high[i] ?? Infinity) && g < 0);
      });
    if (free.length === 0) break;
    let moved = false;
    while (damping < 1e12) {
      const normal = free.map((i) =>
        free.map((j) => {
          const product = dot(slopes[i] ?? [], slopes[j] ?? []);
          return i === j ? product * (1 + damping) + Number.MIN_VALUE : product;
        }),
      );
      const step = solveDense(
        normal,
        free.map((i) => -(gradient[i] ?? 0)),
      );
      const tried = [...x];
      free.forEach((i, k) => (tried[i] = (tried[i] ?? 0) + (step[k] ?? 0)));
      const next = inside(tried);
      const nextResiduals = residuals(next);
      const nextCost = costOf(nextResiduals);
      if (nextCost < cost) {
        moved = next.some((value, i) => Math.abs(value - (x[i] ?? 0)) > 1e-15 * (1 + Math.abs(value)));
        x = next;
        r = nextResiduals;
        cost = nextCost;
        damping = Math.max(damping / 10, 1e-14);
        break;
      }
      damping *= 10;
    }
    if (!moved) break;
    damping = Math.min(damping, 1);
  }
  return { x, cost };
}

const dot = (a: readonly number[], b: readonly number[]) =>
  a.reduce((sum, value, i) => sum + value * (b[i] ?? 0), 0);

/** ∂r/∂x_i by a central difference, one-sided at a bound. */
function slopesAt(
  residuals: (x: readonly number[]) => readonly number[],
  x: readonly number[],
  i: number,
  box: Box,
): readonly number[] {
  const at = x[i] ?? 0;
  const step = 1e-6 * Math.max(Math.abs(at), 1e-2);
  const up = Math.min(at + step, box.high[i] ?? Infinity);
  const down = Math.max(at - step, box.low[i] ?? -Infinity);
  const above = residuals(x.map((value, k) => (k === i ? up : value)));
  const below = residuals(x.map((value, k) => (k === i ? down : value)));
  return above.map((value, k) => (value - (below[k] ?? 0)) / (up - down));
}

/** Gaussian elimination for two or three unknowns; no pivoting, the matrix being symmetric and positive definite. */
function solveDense(matrix: readonly (readonly number[])[], right: readonly number[]): readonly number[] {
  const rows = matrix.map((row, i) => [...row, right[i] ?? 0]);
  const n = rows.length;
  rows.forEach((pivot, k) => {
    for (const row of rows.slice(k + 1)) {
      const factor = (row[k] ?? 0) / (pivot[k] ?? 1);
      for (let j = k; j <= n; j++) row[j] = (row[j] ?? 0) - factor * (pivot[j] ?? 0);
    }
  });
  const x = new Array<number>(n).fill(0);
  for (let k = n - 1; k >= 0; k--) {
    const row = rows[k] ?? [];
    let sum = row[n] ?? 0;
    for (let j = k + 1; j < n; j++) sum -= (row[j] ?? 0) * (x[j] ?? 0);
    x[k] = sum / (row[k] ?? 1);
  }
  return x;
}
