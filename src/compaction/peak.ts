import { curvatureAt, slopeAt, unscaled, valueAt, type PolynomialFit, type Spread } from "../numerics/polynomial";
import type { PeakInterval } from "./fit";

/** Where a fitted polynomial stands highest, in its own u from −1 (driest point) to 1 (wettest point). */
export function peakOf(fit: PolynomialFit): number | null {
  const u = fit.degree <= 3 ? summitOfCubic(fit) : highestSummit(fit);
  if (u === null || !(u > -1 && u < 1) || !(curvatureAt(fit, u) < 0)) return null;
  const top = valueAt(fit, u);
  // the curve may climb higher at an end of the data than on its own summit: that summit is not the test's peak
  return top >= valueAt(fit, -1) && top >= valueAt(fit, 1) ? u : null;
}

function summitOfCubic({ coefficients }: PolynomialFit): number | null {
  const [, b, c, d = 0] = coefficients as unknown as [number, number, number, number?];
  const discriminant = c * c - 3 * b * d;
  if (!(discriminant > 0)) return null;
  const root = Math.sqrt(discriminant);
  // of the two forms of the root where the curve is concave, the one without cancellation
  return c < 0 ? b / (root - c) : (-c - root) / (3 * d);
}

const SUMMIT_STEPS = 48;

/** The slope of a quartic may vanish three times; of its summits inside the data the highest counts. */
function highestSummit(fit: PolynomialFit): number | null {
  let best: number | null = null;
  for (let step = 0; step < SUMMIT_STEPS; step++) {
    let low = -1 + 2 * step / SUMMIT_STEPS, high = low + 2 / SUMMIT_STEPS;
    if (!(slopeAt(fit, low) > 0 && slopeAt(fit, high) <= 0)) continue;
    for (let round = 0; round < 60 && high - low > 1e-15; round++) {
      const middle = (low + high) / 2;
      if (slopeAt(fit, middle) > 0) low = middle; else high = middle;
    }
    const u = (low + high) / 2;
    if (best === null || valueAt(fit, u) > valueAt(fit, best)) best = u;
  }
  return best;
}

const SCAN = 64;

/**
 * 95 % intervals of the peak, exact for normal errors.
 *
 * Optimum: the water contents at which the hypothesis "the slope is zero here" is not refused, |f′(u)| ≤ k·se(f′(u)),
 * where k is the normal quantile, widened. For a parabola this is Fieller's interval.
 * Peak density: the profile of the same test joined with "and the density here is m". For each u not refused, with
 * z = f′(u)/se, m may lie within sqrt(k² − z²) conditional standard errors of the density that a zero slope at u implies.
 *
 * An end that runs past the data is null: the data do not bound it. Source: Fieller, Journal of the Royal Statistical
 * Society B 16 (1954) 175; profile likelihood as in Bates and Watts, Nonlinear Regression Analysis, chapter 6.
 *
 * @param spreadAt variances of value and slope at u, and their covariance
 */
export function peakIntervals(fit: PolynomialFit, peak: number, spreadAt: (u: number) => Spread, k: number): { maxDryDensity: PeakInterval; optimumWater: PeakInterval } {
  const refused = (u: number): boolean => slopeAt(fit, u) ** 2 > k * k * spreadAt(u).slope;
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
    const { value, slope, both } = spreadAt(u);
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
    optimumWater: { low: low === null ? null : unscaled(fit, low), high: high === null ? null : unscaled(fit, high) },
    // where the optimum may lie outside the data, so may a greater density
    maxDryDensity: { low: extreme(-1), high: low === null || high === null ? null : extreme(1) },
  };
}
