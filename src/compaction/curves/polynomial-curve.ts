import { NORMAL_95 } from "../../numerics/distributions";
import { fitPolynomial, gradientsAt, influences, scaled, slopeAt, unscaled, valueAt, type PolynomialFit, type Spread } from "../../numerics/polynomial";
import type { CompactionTest } from "../fit";
import { peakIntervals, peakOf } from "../peak";
import { readingDoubt } from "../scatter";
import type { Curve, FitOptions, FittedCurve, Reckoning } from "./curve";

/** Weights follow the slope of the fitted curve, which follows the weights: two rounds settle to far below the readings. */
const ROUNDS = 2;

/** Fits a polynomial to some points of a test and finds its peak. */
export function fitPolynomialCurve(curve: Curve, test: CompactionTest, used: readonly number[] | undefined, options: FitOptions): FittedCurve | "not-enough" | "no-peak" {
  if (!used) return "not-enough";
  const waters = used.map((i) => test.waters[i]!), dries = used.map((i) => test.dries[i]!), degree = curve.parameters - 1;
  const doubtsOf = (fit: PolynomialFit): number[] => waters.map((water, i) => readingDoubt(water, dries[i]!, slopeAt(fit, scaled(fit, water)) / fit.halfWidth, options.scatter));
  let polynomial = fitPolynomial(waters, dries, degree), weights: number[] | undefined;
  for (let round = 0; options.weigh && round < ROUNDS; round++) {
    weights = doubtsOf(polynomial).map((doubt) => 1 / doubt);
    polynomial = fitPolynomial(waters, dries, degree, weights);
  }
  const fitted = polynomial, top = peakOf(fitted);
  if (top === null) return "no-peak";
  const at = (water: number): number => valueAt(fitted, scaled(fitted, water));
  let reckoned: Reckoning | undefined;
  return {
    curve, used, at, parameters: curve.parameters,
    sumOfSquares: weights ? waters.reduce((sum, water, i) => sum + (dries[i]! - at(water)) ** 2, 0) : fitted.sumOfSquares,
    peak: { water: unscaled(fitted, top), dry: valueAt(fitted, top) },
    reckon: () => reckoned ??= reckon(fitted, top, waters, doubtsOf(fitted), weights),
  };
}

/**
 * The covariance of the coefficients from the doubt of every reading, whatever the weights of the fit were; so the
 * intervals hold although points of a steep leg are in more doubt than others.
 */
function reckon(fit: PolynomialFit, top: number, waters: readonly number[], doubts: readonly number[], weights: readonly number[] | undefined): Reckoning {
  const p = fit.degree + 1, pull = influences(fit, waters, weights), covariance = new Float64Array(p * p);
  let expected = 0;
  waters.forEach((water, i) => {
    const own = gradientsAt(p, scaled(fit, water)).value, weight = weights?.[i] ?? 1;
    let leverage = 0;
    for (let j = 0; j < p; j++) {
      leverage += own[j]! * pull[i * p + j]!;
      for (let k = 0; k < p; k++) covariance[j * p + k]! += pull[i * p + j]! * pull[i * p + k]! * doubts[i]! ** 2;
    }
    expected += (weight * doubts[i]!) ** 2 * (1 - leverage);
  });
  const spare = waters.length - p, widening = spare > 0 ? Math.max(1, Math.sqrt(fit.sumOfSquares / expected)) : 1;
  const k = NORMAL_95 * widening;
  // gᵀCg and its like are themselves polynomials of u: a scan over u then costs three of them a step
  const ofValue = new Float64Array(2 * p - 1), ofSlope = new Float64Array(2 * p - 1), ofBoth = new Float64Array(2 * p - 1);
  for (let i = 0; i < p; i++) for (let j = 0; j < p; j++) {
    const c = covariance[i * p + j]!;
    ofValue[i + j]! += c;
    if (i > 0 && j > 0) ofSlope[i + j - 2]! += i * j * c;
    if (j > 0) ofBoth[i + j - 1]! += j * c;
  }
  const at = (coefficients: Float64Array, u: number): number => {
    let sum = 0;
    for (let k = coefficients.length - 1; k >= 0; k--) sum = sum * u + coefficients[k]!;
    return sum;
  };
  const spread = (u: number): Spread => ({ value: Math.max(0, at(ofValue, u)), slope: Math.max(0, at(ofSlope, u)), both: at(ofBoth, u) });
  return { method: "exact", widening, ...peakIntervals(fit, top, spread, k), halfBand: (water) => k * Math.sqrt(spread(scaled(fit, water)).value) };
}
