/**
 * Wright's omega function of a real argument: the y > 0 with y + ln y = z.
 * Iteration of Fritsch, Shafer and Crowley (1973, ACM Algorithm 443), of fourth order; starting values after
 * Lawrence, Corless and Jeffrey (2012, ACM Algorithm 917).
 */
export function wrightOmega(z: number): number {
  if (z < -50) return Math.exp(z); // y = eᶻ(1 − eᶻ + …): the next term is below rounding
  let y = z < 1 ? Math.exp(z) / (1 + 0.6 * Math.exp(Math.min(z, 0))) : z - Math.log(z);
  for (let pass = 0; pass < 3; pass++) {
    const error = z - y - Math.log(y);
    if (Math.abs(error) <= 1e-16 * Math.abs(z)) break;
    const a = 1 + y;
    const b = a + (2 / 3) * error;
    y *= 1 + (error / a) * ((2 * a * b - error) / (2 * a * b - 2 * error));
  }
  return y;
}
