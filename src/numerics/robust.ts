import { fitPolynomial, scaled, valueAt, type PolynomialFit } from "./polynomial";

/** Tukey's bisquare: weight 1 at no residual, none beyond `cut` scales. 4.685 keeps 95 % of the efficiency on normal errors. */
export const BISQUARE_CUT = 4.685;
export const bisquare = (residual: number, scale: number): number => {
  const r = residual / (BISQUARE_CUT * scale);
  return Math.abs(r) >= 1 ? 0 : (1 - r * r) ** 2;
};

/** Median of absolute values over 0.6745: the standard deviation, where the errors are normal. */
export function medianScale(residuals: readonly number[], parameters: number): number {
  // the fit makes as many residuals vanish as it has parameters: they say nothing of the scatter
  const sizes = residuals.map(Math.abs).sort((a, b) => a - b).slice(Math.max(0, parameters - 1));
  const middle = sizes.length / 2;
  const median = sizes.length === 0 ? 0 : sizes.length % 2 === 1 ? sizes[Math.floor(middle)]! : (sizes[middle - 1]! + sizes[middle]!) / 2;
  return median / 0.6745;
}

/**
 * A polynomial that far points do not pull: iteratively reweighted least squares with bisquare weights, begun from least
 * absolute deviations. The scale is the median one, but never below `leastScale`, so that points on a curve by chance do not cast out the rest.
 * Source: Holland and Welsch, Communications in Statistics A6 (1977) 813; Maronna, Martin and Yohai, Robust Statistics (2006), chapter 4.
 */
export function robustPolynomial(x: readonly number[], y: readonly number[], degree: number, leastScale: number): { readonly fit: PolynomialFit; readonly weights: readonly number[] } | null {
  const residualsOf = (fit: PolynomialFit): number[] => x.map((value, i) => y[i]! - valueAt(fit, scaled(fit, value)));
  let fit = fitPolynomial(x, y, degree), weights: number[] = x.map(() => 1);
  const refit = (next: number[]): boolean => {
    const kept = new Set(x.filter((_, i) => next[i]! > 1e-6));
    if (kept.size < degree + 1) return false;
    weights = next;
    fit = fitPolynomial(x, y, degree, next.map((weight) => Math.sqrt(weight)));
    return true;
  };
  for (let round = 0; round < 20; round++) if (!refit(residualsOf(fit).map((r) => 1 / Math.max(Math.abs(r), 0.1 * leastScale)))) return null;
  for (let round = 0; round < 60; round++) {
    const residuals = residualsOf(fit), scale = Math.max(leastScale, medianScale(residuals, degree + 1));
    const before = fit;
    if (!refit(residuals.map((r) => bisquare(r, scale)))) return null;
    if (fit.coefficients.every((c, k) => Math.abs(c - before.coefficients[k]!) <= 1e-10 * Math.abs(fit.coefficients[0]!))) break;
  }
  return { fit, weights };
}
