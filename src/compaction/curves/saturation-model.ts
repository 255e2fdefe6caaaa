import { fitNonlinear, type LeastSquaresFit, type LeastSquaresModel } from "../../numerics/nonlinear-least-squares";

/**
 * A compaction curve from how saturation grows with water: it follows a line of constant saturation on the wet side and
 * therefore never crosses the zero-air-voids line.
 * Source: Li and Sego, "Equation for complete compaction curve of fine-grained soils and its applications", in
 * Constructing and Controlling Compaction of Earth Fills, ASTM STP 1384 (2000); form from memory, its boundary values checked.
 *
 * Saturation, with x = (wm − w)/wm and q = p/wm:  S = Sm (1 − xⁿ⁺¹ (1 + qⁿ)/(xⁿ + qⁿ)) up to wm, S = Sm beyond.
 */
export interface SaturationParameters {
  /** greatest degree of saturation, a fraction up to 1 */
  readonly mostSaturation: number;
  /** water content, percent, at which it is reached */
  readonly waterThere: number;
  /** sharpness of the turn near the top */
  readonly sharpness: number;
  /** shape of the dry leg, as a share of the water content above */
  readonly dryShape: number;
}

export type Vector = readonly [mostSaturation: number, waterThere: number, sharpness: number, dryShape: number];

export const asParameters = ([mostSaturation, waterThere, sharpness, dryShape]: ArrayLike<number> & Iterable<number>): SaturationParameters =>
  ({ mostSaturation: mostSaturation!, waterThere: waterThere!, sharpness: sharpness!, dryShape: dryShape! });

/**
 * The form with one set of parameters: what does not change from point to point is worked out once.
 * `at` gives the degree of saturation as a fraction; `slopesAt` its derivatives by the four parameters beside it.
 */
class Saturation {
  private readonly qn: number;
  private readonly logQ: number;

  constructor(private readonly most: number, private readonly there: number, private readonly sharpness: number, private readonly shape: number) {
    this.logQ = Math.log(shape);
    this.qn = Math.exp(sharpness * this.logQ);
  }

  at(water: number): number {
    const { there, most, qn } = this;
    if (water >= there) return most;
    const x = (there - water) / there, xn = Math.exp(this.sharpness * Math.log(x));
    return most * (1 - x * xn * (1 + qn) / (xn + qn));
  }

  slopesAt(water: number, slopes: Float64Array): number {
    const { there, most, sharpness, shape, qn, logQ } = this;
    if (water >= there) {
      slopes[0] = 1;
      slopes[1] = slopes[2] = slopes[3] = 0;
      return most;
    }
    const x = (there - water) / there, logX = Math.log(x), xn = Math.exp(sharpness * logX), sum = xn + qn, lacking = x * xn * (1 + qn) / sum;
    slopes[0] = 1 - lacking;
    slopes[1] = -most * lacking * ((sharpness + 1) - sharpness * xn / sum) / x * water / (there * there);
    slopes[2] = -most * lacking * (logX + qn * logQ / (1 + qn) - (xn * logX + qn * logQ) / sum);
    slopes[3] = -most * lacking * sharpness * qn / shape * (1 / (1 + qn) - 1 / sum);
    return most * (1 - lacking);
  }
}

/** Dry density on the curve, in the unit of the density of water. */
export function saturationCurve(water: number, { mostSaturation, waterThere, sharpness, dryShape }: SaturationParameters, specificGravity: number, waterDensity: number): number {
  const s = new Saturation(mostSaturation, waterThere, sharpness, dryShape).at(water);
  return s > 0 ? waterDensity / (1 / specificGravity + water / 100 / s) : limitAtNoWater(waterThere, sharpness, dryShape, mostSaturation, specificGravity, waterDensity);
}

/** Towards no water both water and saturation vanish; their ratio does not. */
function limitAtNoWater(there: number, sharpness: number, shape: number, most: number, specificGravity: number, waterDensity: number): number {
  const qn = shape ** sharpness;
  const growth = most * ((sharpness + 1) - sharpness / (1 + qn)) / there;
  return waterDensity / (1 / specificGravity + 1 / 100 / growth);
}

/** Bounds that keep four points from asking for a shape no soil has. Common practice, no published source. */
const LOW: Vector = [0.5, 0, 0.5, 0.02], HIGH: Vector = [1, 0, 25, 5];

/** Where the search begins: the turn as a multiple of the water content of the highest point, sharpness, dry shape. Tried by measuring on 200 seeded curves. */
const STARTS = [[1.2, 4, 0.3], [1.3, 6, 0.55], [1.5, 7.5, 0.58], [1.1, 8, 0.25], [1.4, 2, 0.6]] as const;
const EXACT = 1e-6, FINE = 5e-4, ROUGH = 1e-3, SAME_VALLEY = 1e-3;

export interface SaturationFit extends LeastSquaresFit { readonly shape: SaturationParameters }

export interface SaturationPoints {
  readonly waters: readonly number[];
  readonly dries: readonly number[];
  readonly specificGravity: number;
  readonly waterDensity: number;
  /** multiply the residuals; 1 where none are given */
  readonly weights?: readonly number[] | undefined;
}

/** The model for a least-squares fit; `pull`, where given, adds one more residual with its derivatives. */
export function saturationModel({ waters, dries, specificGravity, waterDensity, weights }: SaturationPoints, pull?: (at: Vector, slopes: Float64Array | null) => number): LeastSquaresModel {
  const slopes = new Float64Array(4), n = waters.length;
  return {
    points: pull ? n + 1 : n,
    parameters: 4,
    evaluate(at, residuals, jacobian) {
      const form = new Saturation(at[0]!, at[1]!, at[2]!, at[3]!), solids = 1 / specificGravity;
      for (let i = 0; i < n; i++) {
        const w = waters[i]! / 100, weight = weights ? weights[i]! : 1;
        const s = jacobian ? form.slopesAt(waters[i]!, slopes) : form.at(waters[i]!);
        const dry = waterDensity / (solids + w / s);
        residuals[i] = weight * (dry - dries[i]!);
        if (jacobian) {
          const bySaturation = weight * dry * dry / waterDensity * w / (s * s), row = 4 * i;
          jacobian[row] = bySaturation * slopes[0]!;
          jacobian[row + 1] = bySaturation * slopes[1]!;
          jacobian[row + 2] = bySaturation * slopes[2]!;
          jacobian[row + 3] = bySaturation * slopes[3]!;
        }
      }
      if (pull) {
        residuals[n] = pull(at as unknown as Vector, jacobian ? slopes : null);
        if (jacobian) for (let j = 0; j < 4; j++) jacobian[4 * n + j] = slopes[j]!;
      }
    },
  };
}

/** Bounds of the parameters for a set of water contents: the turn lies between the driest point and twice the wettest. */
export function saturationBounds(waters: readonly number[]): { low: number[]; high: number[] } {
  return { low: [LOW[0], Math.min(...waters), LOW[2], LOW[3]], high: [HIGH[0], 2 * Math.max(...waters), HIGH[2], HIGH[3]] };
}

/**
 * Fits the curve to a test.
 * Starts from several turns of the curve and keeps the best: the sum of squares can have more than one valley. A start that is given is the only one.
 */
export function fitSaturation(points: SaturationPoints, start?: readonly number[], tolerance = 1e-8): SaturationFit {
  const { waters, dries, specificGravity, waterDensity } = points;
  const model = saturationModel(points), options = { ...saturationBounds(waters), tolerance, maxEvaluations: 600 };
  if (start) return withShape(fitNonlinear(model, start, options));
  const highest = dries.indexOf(Math.max(...dries));
  const saturations = waters.map((w, i) => Math.min(1, w / 100 / (waterDensity / dries[i]! - 1 / specificGravity)));
  const most = Math.min(0.995, Math.max(0.55, ...saturations.filter((s) => s > 0)));
  const residuals = new Float64Array(waters.length);
  const starts = STARTS.map(([turn, sharpness, shape]) => {
    const at = Float64Array.of(most, Math.min(turn * waters[highest]!, options.high[1]!), sharpness, shape);
    model.evaluate(at, residuals, null);
    return { at, sum: residuals.reduce((sum, r) => sum + r * r, 0) };
  }).sort((a, b) => a.sum - b.sum);
  // less than this no readings scatter
  const noise = waters.length * (FINE * dries[highest]!) ** 2;
  let best: LeastSquaresFit | undefined;
  for (const { at } of starts) {
    const before = best, exact = !best || best.sumOfSquares < noise;
    let fit = fitNonlinear(model, [...at], exact ? options : { ...options, tolerance: ROUGH });
    // a better valley, found roughly: to its floor
    if (!exact && fit.sumOfSquares < best!.sumOfSquares * (1 - SAME_VALLEY)) fit = fitNonlinear(model, [...fit.parameters], options);
    if (!best || fit.sumOfSquares < best.sumOfSquares * (1 - 1e-9)) best = fit;
    // points that lie on the curve to far more than they were measured, or two ways to the same valley: there is no better to look for
    if (best.sumOfSquares < waters.length * (EXACT * dries[highest]!) ** 2) break;
    if (before && best.sumOfSquares > noise && Math.abs(fit.sumOfSquares - before.sumOfSquares) <= SAME_VALLEY * before.sumOfSquares) break;
  }
  return withShape(best!);
}

const withShape = (fit: LeastSquaresFit): SaturationFit => ({ ...fit, shape: asParameters(fit.parameters) });

/** How saturation lacks at x = (wm − w)/wm, as a share of its most: value, and first and second derivative by x. */
class Lack {
  value = 0;
  first = 0;
  second = 0;
  private readonly qn: number;

  constructor(private readonly sharpness: number, shape: number) { this.qn = Math.exp(sharpness * Math.log(shape)); }

  at(x: number): this {
    const { sharpness, qn } = this, xn = Math.exp(sharpness * Math.log(x)), share = sharpness * xn / (xn + qn);
    // logarithmic derivative times x, and how it changes
    const r = sharpness + 1 - share, change = -(sharpness + 1) - share * (sharpness - 1 - share);
    this.value = x * xn * (1 + qn) / (xn + qn);
    this.first = this.value * r / x;
    this.second = this.value * (r * r + change) / (x * x);
    return this;
  }

  /** vanishes at the summit: dry density is greatest where w/S is least */
  excess(x: number): number {
    this.at(x);
    return 1 - this.value - (1 - x) * this.first;
  }
}

/**
 * Where the curve stands highest, as x = (wm − w)/wm: where 1 − g = (1 − x) g′ with g the lack of saturation.
 * Null where the curve falls from the dry end on. The excess starts at 1 and vanishes at x = 1 anyhow; a summit is where it crosses before.
 */
function summitOf(lack: Lack): number | null {
  let low = 0, high = 1, x = 0.2;
  for (let round = 0; round < 60; round++) {
    const at = lack.excess(x);
    if (at > 0) low = x; else high = x;
    const next = x + at / ((1 - x) * lack.second), better = lack.second > 0 && next > low && next < high ? next : (low + high) / 2;
    if (better > 0.999) return null;
    if (Math.abs(better - x) < 1e-13) return better;
    x = better;
  }
  return x;
}

export interface Summit { readonly water: number; readonly dry: number }

/** The peak, and (where asked for) the derivatives of its water content and its density by the four parameters. */
export function summitWithSlopes([most, there, sharpness, shape]: Vector, specificGravity: number, waterDensity: number, byWater: Float64Array | null, byDry: Float64Array | null): Summit | null {
  const lack = new Lack(sharpness, shape), x = summitOf(lack);
  if (x === null) return null;
  const { value, second } = lack.at(x);
  const water = there * (1 - x), s = most * (1 - value), dry = waterDensity / (1 / specificGravity + water / 100 / s);
  if (byWater) {
    // the condition of the summit as the shape moves: dx = -(∂h/∂shape)/(∂h/∂x)
    const h = lack.excess(x), along = -(1 - x) * second, dn = 1e-6 * sharpness, dq = 1e-6 * shape;
    byWater[0] = 0;
    byWater[1] = 1 - x;
    byWater[2] = there * (new Lack(sharpness + dn, shape).excess(x) - h) / dn / along;
    byWater[3] = there * (new Lack(sharpness, shape + dq).excess(x) - h) / dq / along;
  }
  if (byDry) {
    // at the summit the density does not change along the curve, so only its change at that water content counts
    new Saturation(most, there, sharpness, shape).slopesAt(water, byDry);
    const factor = dry * dry / waterDensity * water / 100 / (s * s);
    for (let j = 0; j < 4; j++) byDry[j]! *= factor;
  }
  return { water, dry };
}
