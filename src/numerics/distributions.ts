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

/** What Stirling's formula lacks: log Γ(x) − ((x − ½) log x − x + ½ log 2π), for x ≥ 8. Source: Abramowitz and Stegun, 6.1.41. */
function stirlingRest(x: number): number {
  const t = 1 / (x * x);
  return (1 / 12 + t * (-1 / 360 + t * (1 / 1260 + t * (-1 / 1680 + t * (1 / 1188 + t * (-691 / 360360 + t / 156)))))) / x;
}

/** log Γ(large + small) − log Γ(large) for large ≥ 8, without the cancellation of two great numbers. */
const logGammaStep = (large: number, small: number): number =>
  (large - 0.5) * Math.log1p(small / large) + small * (Math.log(large + small) - 1) + stirlingRest(large + small) - stirlingRest(large);

/** log of a number that is known with its complement to 1 */
const logOf = (x: number, rest: number): number => rest < 0.5 ? Math.log1p(-rest) : Math.log(x);

/** log of x^a (1 − x)^b / B(a, b). Source of the form for large a and b: Didonato and Morris, ACM TOMS 18 (1992) 360. */
function logBetaTerm(x: number, rest: number, a: number, b: number): number {
  const least = Math.min(a, b), most = Math.max(a, b);
  if (least >= 8) {
    // distances from the mean, so that two great logarithms need not cancel
    const lambda = a > b ? (a + b) * rest - b : a - (a + b) * x;
    // log(1 + e) from the ratio itself where e is far from nothing
    const fall = (e: number, ratio: number): number => e - (Math.abs(e) < 0.5 ? Math.log1p(e) : Math.log(ratio));
    return -(a * fall(-lambda / a, (a + b) * x / a) + b * fall(lambda / b, (a + b) * rest / b)) + 0.5 * Math.log(a * b / (a + b) / (2 * Math.PI)) + stirlingRest(a + b) - stirlingRest(a) - stirlingRest(b);
  }
  const step = most >= 8 ? logGammaStep(most, least) - logGamma(least) : logGamma(a + b) - logGamma(a) - logGamma(b);
  return a * logOf(x, rest) + b * logOf(rest, x) + step;
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
  const front = Math.exp(logBetaTerm(x, rest, a, b)) / a;
  const TINY = 1e-300;
  let c = 1, d = 1 - (a + b) * x / (a + 1);
  d = 1 / (Math.abs(d) < TINY ? TINY : d);
  let fraction = d;
  for (let m = 1; m < 2000; m++) {
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

/** Beyond this many scales a Student tail is its power law to the last digit, and its square would overflow. */
const FAR = 1e9;

/** Probability that a Student variable lies above t (t ≥ 0). */
function studentTail(t: number, degrees: number): number {
  const r = t / Math.sqrt(degrees);
  if (r > FAR) return 0.5 * Math.exp(-degrees * Math.log(r) + (degrees >= 16 ? logGammaStep(degrees / 2, 0.5) : logGamma(degrees / 2 + 0.5) - logGamma(degrees / 2)) - 0.5 * Math.log(Math.PI)) / (degrees / 2);
  const square = r * r;
  return 0.5 * incompleteBeta(1 / (1 + square), degrees / 2, 0.5, square / (1 + square));
}

export function studentCdf(t: number, degrees: number): number {
  return t >= 0 ? 1 - studentTail(t, degrees) : studentTail(-t, degrees);
}

/** log of the density at t */
function logStudentDensity(t: number, degrees: number): number {
  const step = degrees >= 16 ? logGammaStep(degrees / 2, 0.5) : logGamma(degrees / 2 + 0.5) - logGamma(degrees / 2), r = Math.abs(t) / Math.sqrt(degrees);
  return step - (degrees + 1) / 2 * (r > FAR ? 2 * Math.log(r) : Math.log1p(r * r)) - 0.5 * Math.log(degrees * Math.PI);
}

const quantiles = new Map<string, number>();

/** The value that a Student variable exceeds with the probability `above` (0 < above ≤ 0.5): 2.776 for 0.025 and 4 degrees. */
export function studentQuantile(above: number, degrees: number): number {
  const key = `${above}/${degrees}`;
  const known = quantiles.get(key);
  if (known !== undefined) return known;
  let low = 0, high = 1;
  while (studentTail(high, degrees) > above) {
    low = high;
    high = high > 1e3 ? Math.min(high * high, Number.MAX_VALUE) : 2 * high;
  }
  // bracketed Newton; far out on the logarithms of both, which lie on a line there
  let t = low > 0 ? Math.sqrt(low) * Math.sqrt(high) : high / 2;
  for (let round = 0; round < 200; round++) {
    const tail = studentTail(t, degrees);
    if (tail > above) low = t; else high = t;
    const slope = Math.exp(logStudentDensity(t, degrees) - Math.log(tail));
    const gap = Math.log(tail / above);
    const next = t > 1 ? t * Math.exp(gap / (slope * t)) : t + gap / slope;
    const better = next > low && next < high ? next : low > 1e3 ? Math.sqrt(low) * Math.sqrt(high) : (low + high) / 2;
    if (Math.abs(better - t) <= 2e-16 * Math.abs(better)) { t = better; break; }
    t = better;
  }
  if (quantiles.size < 1000) quantiles.set(key, t);
  return t;
}

/** The normal deviate of a two-sided 95 % interval, to double precision (standard tables: 1.96). */
export const NORMAL_95 = 1.959963984540054;
