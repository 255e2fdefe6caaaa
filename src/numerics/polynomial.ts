/**
 * A polynomial fitted by least squares in u = (x − centre) / halfWidth, so that the data lie in [−1, 1] and powers stay apart.
 * Solved by Householder QR, never by normal equations, which lose twice the digits.
 */
export interface PolynomialFit {
  readonly degree: number;
  readonly points: number;
  readonly centre: number;
  readonly halfWidth: number;
  /** of 1, u, u², … */
  readonly coefficients: Float64Array;
  readonly sumOfSquares: number;
  /** the triangular factor R, row by row: the unscaled covariance of the coefficients is (RᵀR)⁻¹ */
  readonly triangle: Float64Array;
}

/**
 * `weights` multiply the residuals (the inverse of each point's standard deviation); a point of weight 0 is left out.
 * The sum of squares is the weighted one.
 * @throws Error where there are fewer points, or fewer different x, than coefficients: the caller checks that first.
 */
export function fitPolynomial(x: readonly number[], y: readonly number[], degree: number, weights?: readonly number[]): PolynomialFit {
  const n = x.length, p = degree + 1;
  if (n < p) throw new Error(`${p} coefficients need at least ${p} points, not ${n}`);
  let least = Infinity, most = -Infinity;
  for (const value of x) {
    if (value < least) least = value;
    if (value > most) most = value;
  }
  const centre = (least + most) / 2, halfWidth = (most - least) / 2 || 1;

  // column by column: a[k * n + i] is u_i to the power k
  const a = new Float64Array(n * p), b = Float64Array.from(y), triangle = new Float64Array(p * p), coefficients = new Float64Array(p);
  for (let i = 0; i < n; i++) {
    const u = (x[i]! - centre) / halfWidth;
    let power = 1;
    if (weights) {
      power = weights[i]!;
      b[i]! *= power;
    }
    for (let k = 0; k < p; k++) {
      a[k * n + i] = power;
      power *= u;
    }
  }
  const size = weights ? Math.sqrt(weights.reduce((sum, weight) => sum + weight * weight, 0)) : Math.sqrt(n);
  for (let k = 0; k < p; k++) {
    const column = k * n;
    let norm = 0;
    for (let i = k; i < n; i++) norm += a[column + i]! * a[column + i]!;
    norm = Math.sqrt(norm);
    if (norm < 1e-13 * size) throw new Error(`${p} coefficients need at least ${p} different x`);
    const pivot = a[column + k]!, alpha = pivot > 0 ? -norm : norm;
    // v = column − alpha e_k, H = I − v vᵀ / (alpha (alpha − pivot))
    a[column + k] = pivot - alpha;
    const divisor = alpha * (alpha - pivot);
    for (let j = k + 1; j < p; j++) {
      const other = j * n;
      let dot = 0;
      for (let i = k; i < n; i++) dot += a[column + i]! * a[other + i]!;
      dot /= divisor;
      for (let i = k; i < n; i++) a[other + i]! -= dot * a[column + i]!;
      triangle[k * p + j] = a[other + k]!;
    }
    let dot = 0;
    for (let i = k; i < n; i++) dot += a[column + i]! * b[i]!;
    dot /= divisor;
    for (let i = k; i < n; i++) b[i]! -= dot * a[column + i]!;
    triangle[k * p + k] = alpha;
  }
  for (let k = p - 1; k >= 0; k--) {
    let sum = b[k]!;
    for (let j = k + 1; j < p; j++) sum -= triangle[k * p + j]! * coefficients[j]!;
    coefficients[k] = sum / triangle[k * p + k]!;
  }
  let sumOfSquares = 0;
  for (let i = p; i < n; i++) sumOfSquares += b[i]! * b[i]!;
  return { degree, points: n, centre, halfWidth, coefficients, sumOfSquares, triangle };
}

export const scaled = ({ centre, halfWidth }: PolynomialFit, x: number): number => (x - centre) / halfWidth;
export const unscaled = ({ centre, halfWidth }: PolynomialFit, u: number): number => centre + u * halfWidth;

/** Value at u. */
export function valueAt({ coefficients }: PolynomialFit, u: number): number {
  let sum = 0;
  for (let k = coefficients.length - 1; k >= 0; k--) sum = sum * u + coefficients[k]!;
  return sum;
}

/** Derivative by u. */
export function slopeAt({ coefficients }: PolynomialFit, u: number): number {
  let sum = 0;
  for (let k = coefficients.length - 1; k >= 1; k--) sum = sum * u + k * coefficients[k]!;
  return sum;
}

/** Second derivative by u. */
export function curvatureAt({ coefficients }: PolynomialFit, u: number): number {
  let sum = 0;
  for (let k = coefficients.length - 1; k >= 2; k--) sum = sum * u + k * (k - 1) * coefficients[k]!;
  return sum;
}

/** Unscaled variances of value and slope at u, and their covariance: times the error variance they are the real ones. */
export interface Spread { readonly value: number; readonly slope: number; readonly both: number }

export function spreadAt({ triangle, degree }: PolynomialFit, u: number): Spread {
  // solves Rᵀ z = g for the two gradients (1, u, u², …) and (0, 1, 2u, …) at once
  const p = degree + 1;
  const z0 = new Array<number>(p), z1 = new Array<number>(p);
  let value = 0, slope = 0, both = 0, power = 1, lower = 0;
  for (let k = 0; k < p; k++) {
    let a = power, b = k * lower;
    for (let j = 0; j < k; j++) {
      const r = triangle[j * p + k]!;
      a -= r * z0[j]!;
      b -= r * z1[j]!;
    }
    const r = triangle[k * p + k]!;
    z0[k] = a /= r;
    z1[k] = b /= r;
    value += a * a;
    slope += b * b;
    both += a * b;
    lower = power;
    power *= u;
  }
  return { value, slope, both };
}

/** Derivatives of value and slope at u by the coefficients: (1, u, u², …) and (0, 1, 2u, …). */
export function gradientsAt(coefficients: number, u: number): { readonly value: Float64Array; readonly slope: Float64Array } {
  const value = new Float64Array(coefficients), slope = new Float64Array(coefficients);
  let power = 1, lower = 0;
  for (let k = 0; k < coefficients; k++) {
    value[k] = power;
    slope[k] = k * lower;
    lower = power;
    power *= u;
  }
  return { value, slope };
}

/** How the coefficients move with each point's y, one row a point: w² (XᵀW²X)⁻¹ (1, u, u², …). */
export function influences(fit: PolynomialFit, x: readonly number[], weights?: readonly number[]): Float64Array {
  const { triangle, degree } = fit, p = degree + 1, out = new Float64Array(x.length * p);
  x.forEach((value, i) => {
    const g = gradientsAt(p, scaled(fit, value)).value, row = i * p, weight = weights ? weights[i]! ** 2 : 1;
    for (let k = 0; k < p; k++) {
      let sum = g[k]! * weight;
      for (let j = 0; j < k; j++) sum -= triangle[j * p + k]! * out[row + j]!;
      out[row + k] = sum / triangle[k * p + k]!;
    }
    for (let k = p - 1; k >= 0; k--) {
      let sum = out[row + k]!;
      for (let j = k + 1; j < p; j++) sum -= triangle[k * p + j]! * out[row + j]!;
      out[row + k] = sum / triangle[k * p + k]!;
    }
  });
  return out;
}
