import { incompleteBeta, logGamma, studentCdf } from "./distributions";
import { rootBetween } from "./root";

/** Probability that a standard normal variable lies below z. */
export function normalCdf(z: number): number {
  return z < 0 ? normalTail(-z) : 1 - normalTail(z);
}

/** Probability above z ≥ 0. Series to 3, beyond it the continued fraction. Source: Abramowitz and Stegun, 26.2.11 and 26.2.14. */
function normalTail(z: number): number {
  const density = Math.exp(-z * z / 2) / Math.sqrt(2 * Math.PI);
  if (z < 3) {
    let term = z, sum = z;
    for (let k = 1; term > 1e-18 * sum; k++) sum += term *= z * z / (2 * k + 1);
    return 0.5 - density * sum;
  }
  let fraction = 0;
  for (let k = 120; k >= 1; k--) fraction = k / (z + fraction);
  return density / (z + fraction);
}

/**
 * Non-central Student distribution: probability that (Z + shift)/√(χ²/degrees) lies below t.
 * Series in incomplete beta functions, begun at its greatest term so that a large shift does not underflow.
 * Source: Lenth, Applied Statistics 38 (1989) 185, algorithm AS 243.
 */
export function noncentralStudentCdf(t: number, degrees: number, shift: number): number {
  if (shift === 0) return studentCdf(t, degrees);
  if (t < 0) return 1 - noncentralStudentCdf(-t, degrees, -shift);
  const half = shift * shift / 2, share = t * t / (degrees + t * t), rest = degrees / (degrees + t * t);
  const term = (j: number): number => {
    const log = -half + j * Math.log(half);
    const even = Math.exp(log - logGamma(j + 1)) * incompleteBeta(share, j + 0.5, degrees / 2, rest);
    const odd = Math.sign(shift) * Math.exp(log + Math.log(Math.abs(shift) / Math.SQRT2) - logGamma(j + 1.5)) * incompleteBeta(share, j + 1, degrees / 2, rest);
    return even + odd;
  };
  const middle = Math.floor(half);
  let sum = 0, size = 0;
  for (let j = middle; j < middle + 10_000; j++) {
    const one = term(j);
    sum += one;
    size += Math.abs(one);
    if (j > middle + 5 && Math.abs(one) <= 1e-17 * size) break;
  }
  for (let j = middle - 1; j >= 0; j--) {
    const one = term(j);
    sum += one;
    size += Math.abs(one);
    if (Math.abs(one) <= 1e-17 * size) break;
  }
  return Math.min(1, Math.max(0, normalCdf(-shift) + sum / 2));
}

/** The value below which a non-central Student variable lies with a probability strictly between 0 and 1. */
export function noncentralStudentQuantile(below: number, degrees: number, shift: number): number {
  const excess = (t: number): number => noncentralStudentCdf(t, degrees, shift) - below;
  let low = shift - 1, high = shift + 1;
  for (let step = 1; excess(low) > 0 && step < 1e6; step *= 2) low -= step;
  for (let step = 1; excess(high) < 0 && step < 1e6; step *= 2) high += step;
  return rootBetween(excess, low, high, 1e-11 * Math.max(1, Math.abs(shift)));
}
