import { curvatureAt, slopeAt, spreadAt, unscaled, valueAt, type PolynomialFit } from "../numerics/polynomial";
import type { PeakFigure } from "./fit";

/** Where a fitted polynomial stands highest, in its own u from −1 (driest point) to 1 (wettest point). */
export function peakOf(fit: PolynomialFit): number | null {
  const [, b, c, d = 0] = fit.coefficients as unknown as [number, number, number, number?];
  const discriminant = c * c - 3 * b * d;
  if (!(discriminant > 0)) return null;
  const root = Math.sqrt(discriminant);
  // of the two forms of the root where the curve is concave, the one without cancellation
  const u = c < 0 ? b / (root - c) : (-c - root) / (3 * d);
  if (!(u > -1 && u < 1) || !(curvatureAt(fit, u) < 0)) return null;
  const top = valueAt(fit, u);
  // a cubic may climb higher at an end of the data than on its own summit: that summit is not the test's peak
  return top >= valueAt(fit, -1) && top >= valueAt(fit, 1) ? u : null;
}

const SCAN = 64;

/**
 * 95 % intervals of the peak, exact for normal errors.
 *
 * Optimum: the water contents at which the hypothesis "the slope is zero here" is not refused, |f′(u)| ≤ k·se(f′(u)),
 * where k is the quantile (Student or normal). For a parabola this is Fieller's interval.
 * Peak density: the profile of the same test joined with "and the density here is m". For each u not refused, with
 * z = f′(u)/se, m may lie within sqrt(k² − z²) conditional standard errors of the density that a zero slope at u implies.
 *
 * An end that runs past the data is null: the data do not bound it. Source: Fieller, Journal of the Royal Statistical
 * Society B 16 (1954) 175; profile likelihood as in Bates and Watts, Nonlinear Regression Analysis, chapter 6.
 *
 * @param k quantile times the standard deviation of a point's error
 */
export function peakIntervals(fit: PolynomialFit, peak: number, k: number): { maxDryDensity: PeakFigure; optimumWater: PeakFigure } {
  const refused = (u: number): boolean => slopeAt(fit, u) ** 2 > k * k * spreadAt(fit, u).slope;
  const end = (side: -1 | 1): number | null => {
    let inside = peak;
    for (let step = 1; step <= SCAN; step++) {
      const u = peak + (side - peak) * step / SCAN;
      if (!refused(u)) {
        inside = u;
        continue;
      }
      let outside = u;
      for (let round = 0; round < 50 && Math.abs(outside - inside) > 1e-13; round++) {
        const middle = (inside + outside) / 2;
        if (refused(middle)) outside = middle; else inside = middle;
      }
      return inside;
    }
    return null;
  };
  const low = end(-1), high = end(1);

  const reach = (u: number, side: -1 | 1): number => {
    const { value, slope, both } = spreadAt(fit, u);
    const tilt = slopeAt(fit, u), beta = both / slope;
    const left = Math.max(0, k * k - tilt * tilt / slope);
    return valueAt(fit, u) - beta * tilt + side * Math.sqrt(left * Math.max(0, value - both * beta));
  };
  const from = low ?? -1, to = high ?? 1;
  const extreme = (side: -1 | 1): number => {
    let best = reach(peak, side), at = peak;
    const width = (to - from) / SCAN;
    for (let step = 0; step <= SCAN; step++) {
      const u = from + width * step, value = reach(u, side);
      if (side * (value - best) > 0) { best = value; at = u; }
    }
    // golden section about the best of the scan
    let a = Math.max(from, at - width), b = Math.min(to, at + width);
    for (let round = 0; round < 30; round++) {
      const c = b - 0.6180339887498949 * (b - a), d = a + 0.6180339887498949 * (b - a);
      if (side * (reach(c, side) - reach(d, side)) > 0) b = d; else a = c;
    }
    const refined = reach((a + b) / 2, side);
    return side * (refined - best) > 0 ? refined : best;
  };

  return {
    optimumWater: { value: unscaled(fit, peak), low: low === null ? null : unscaled(fit, low), high: high === null ? null : unscaled(fit, high) },
    // where the optimum may lie outside the data, so may a greater density
    maxDryDensity: { value: valueAt(fit, peak), low: extreme(-1), high: low === null || high === null ? null : extreme(1) },
  };
}
