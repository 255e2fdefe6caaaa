/** Normal and Student distributions: what intervals and outlier limits need. */

// Lanczos approximation, g = 607/128, coefficients by Godfrey (2001); relative error below 1e-14
const LANCZOS = [
  0.99999999999999709182, 57.156235665862923517, -59.597960355475491248, 14.136097974741747174, -0.49191381609762019978,
  0.33994649984811888699e-4, 0.46523628927048575665e-4, -0.98374475304879564677e-4, 0.15808870322491248884e-3, -0.21026444172410488319e-3,
  0.2174396181152126432e-3, -0.16431810653676389022e-3, 0.84418223983852743293e-4, -0.2619083840158140867e-4, 0.36899182659531622704e-5,
];

/** Logarithm of the gamma function for x > 0. */
export function logGamma(x: number): number {
  const t = x + 607 / 128 + 0.5;
  let sum = LANCZOS[0]!;
  for (let k = 1; k < LANCZOS.length; k++) sum += LANCZOS[k]! / (x + k);
  return (x + 0.5) * Math.log(t) - t + Math.log(2.5066282746310005 * sum / x);
}

/**
 * Regularised incomplete beta function I_x(a, b), by its continued fraction (modified Lentz).
 * Where x is close to 1, a caller that knows 1 − x better than the subtraction gives it hands it in.
 */
export function incompleteBeta(x: number, a: number, b: number, rest = 1 - x): number {
  if (x <= 0) return 0;
  if (rest <= 0) return 1;
  // the fraction converges fast on this side of the mean
  if (x > (a + 1) / (a + b + 2)) return 1 - incompleteBeta(rest, b, a, x);
  const front = Math.exp(a * Math.log(x) + b * Math.log(rest) + logGamma(a + b) - logGamma(a) - logGamma(b)) / a;
  const TINY = 1e-300;
  let c = 1, d = 1 - (a + b) * x / (a + 1);
  d = 1 / (Math.abs(d) < TINY ? TINY : d);
  let fraction = d;
  for (let m = 1; m < 500; m++) {
    const even = m * (b - m) * x / ((a + 2 * m - 1) * (a + 2 * m));
    d = 1 + even * d;
    c = 1 + even / c;
    d = 1 / (Math.abs(d) < TINY ? TINY : d);
    c = Math.abs(c) < TINY ? TINY : c;
    fraction *= d * c;
    const odd = -(a + m) * (a + b + m) * x / ((a + 2 * m) * (a + 2 * m + 1));
    d = 1 + odd * d;
    c = 1 + odd / c;
    d = 1 / (Math.abs(d) < TINY ? TINY : d);
    c = Math.abs(c) < TINY ? TINY : c;
    const factor = d * c;
    fraction *= factor;
    if (Math.abs(factor - 1) < 1e-16) break;
  }
  return front * fraction;
}

/** Probability that a Student variable lies above t (t ≥ 0). */
function studentTail(t: number, degrees: number): number {
  const sum = degrees + t * t;
  return 0.5 * incompleteBeta(degrees / sum, degrees / 2, 0.5, t * t / sum);
}

export function studentCdf(t: number, degrees: number): number {
  return t >= 0 ? 1 - studentTail(t, degrees) : studentTail(-t, degrees);
}

const studentDensity = (t: number, degrees: number): number =>
  Math.exp(logGamma((degrees + 1) / 2) - logGamma(degrees / 2) - (degrees + 1) / 2 * Math.log1p(t * t / degrees)) / Math.sqrt(degrees * Math.PI);

const quantiles = new Map<string, number>();

/** The value that a Student variable exceeds with the probability `above` (0 < above ≤ 0.5): 2.776 for 0.025 and 4 degrees. */
export function studentQuantile(above: number, degrees: number): number {
  const key = `${above}/${degrees}`;
  const known = quantiles.get(key);
  if (known !== undefined) return known;
  // bracketed Newton on the logarithm of the tail, which is nearly straight far out
  let low = 0, high = 1;
  while (studentTail(high, degrees) > above) {
    low = high;
    high *= 2;
  }
  let t = (low + high) / 2;
  for (let round = 0; round < 100; round++) {
    const tail = studentTail(t, degrees);
    if (tail > above) low = t; else high = t;
    const next = t + Math.log(tail / above) * tail / studentDensity(t, degrees);
    const better = next > low && next < high ? next : (low + high) / 2;
    if (Math.abs(better - t) <= 1e-15 * Math.abs(better)) { t = better; break; }
    t = better;
  }
  if (quantiles.size < 1000) quantiles.set(key, t);
  return t;
}

/** The normal deviate of a two-sided 95 % interval, to double precision (standard tables: 1.96). */
export const NORMAL_95 = 1.959963984540054;
