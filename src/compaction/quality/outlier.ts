import { rule } from "../../findings/finding";
import { studentQuantile } from "../../numerics/distributions";
import { fitPolynomial, scaled, spreadAt, unscaled, valueAt } from "../../numerics/polynomial";
import { robustPolynomial } from "../../numerics/robust";
import { peakOf } from "../peak";
import { curveScatter } from "../scatter";
import type { CurveSubject } from "./subject";
import { OUTLIER_CHANCE, STRAY } from "./thresholds";

/**
 * A point that the others do not expect.
 * Where points are left over: externally studentised residual against a Student limit shared out over all points; the worst
 * is set aside and the rest judged again, since one stray point hides another. In a smaller test the scatter cannot be told
 * from the points, and the stated one is taken. Beside it stands the peak of a fit that stray points do not pull.
 */
export const outlier = rule<CurveSubject>()({
  id: "outlier",
  source: { title: "Cook and Weisberg, Residuals and Influence in Regression (1982)", clause: "outlier test by externally studentised residual" },
  says: "dry density {dry} at {water} % stands {off} {side} the curve through the other points, {times} {measure}: look at this reading.{robust}",
  *look({ test: { waters, dries }, fit, scatter }) {
    // a curve of another form is judged by the polynomial with as many parameters
    const degree = fit && fit.parameters >= 3 && fit.parameters <= 5 ? fit.parameters - 1 : 2, p = degree + 1;
    if (fit?.curve === "top three" || fit?.curve === "smooth") return;
    const stated = curveScatter(dries, scatter);
    let robust: string | undefined;
    const told = (): string => robust ??= robustPeak(waters, dries, degree, stated);
    let kept = waters.map((_, i) => i);
    if (kept.length < p + 3) {
      if (kept.length < p + 1 || new Set(waters).size <= p) return;
      const { index, times, off } = worst(waters, dries, kept, degree, () => stated);
      if (times > STRAY) yield { place: { at: "point", index }, severity: "doubtful", evidence: evidence(waters, dries, index, off, times, "times the stated scatter of a point", told()) };
      return;
    }
    const least = Math.max(p + 3, Math.ceil(kept.length * 0.75));
    while (kept.length >= least && new Set(kept.map((i) => waters[i])).size > p) {
      const spareLess = kept.length - p - 1;
      // a set that is exact but for one point has no scatter at all to measure by
      const { index, times, off } = worst(waters, dries, kept, degree, (sum, own) => Math.max(Math.sqrt(Math.max(sum - own, 0) / spareLess), 1e-6 * Math.abs(dries[0]!)));
      if (index < 0 || times <= studentQuantile(OUTLIER_CHANCE / 2 / kept.length, spareLess)) return;
      yield { place: { at: "point", index }, severity: "doubtful", evidence: evidence(waters, dries, index, off, times, "standard errors", told()) };
      kept = kept.filter((i) => i !== index);
    }
  },
});

/** The point farthest from what the others expect, in units of a scatter that may rest on the sum of squares with and without it. */
function worst(waters: readonly number[], dries: readonly number[], kept: readonly number[], degree: number, scatterOf: (sumOfSquares: number, own: number) => number): { index: number; times: number; off: number } {
  const polynomial = fitPolynomial(kept.map((i) => waters[i]!), kept.map((i) => dries[i]!), degree);
  let index = -1, times = 0, off = 0;
  for (const i of kept) {
    const u = scaled(polynomial, waters[i]!), residual = dries[i]! - valueAt(polynomial, u), free = 1 - spreadAt(polynomial, u).value;
    if (free < 1e-9) continue;
    const size = Math.abs(residual) / Math.sqrt(free) / scatterOf(polynomial.sumOfSquares, residual * residual / free);
    if (size > times) { times = size; index = i; off = residual / free; }
  }
  return { index, times, off };
}

const evidence = (waters: readonly number[], dries: readonly number[], index: number, off: number, times: number, measure: string, robust: string) =>
  ({ dry: dries[index]!, water: waters[index]!, off: Math.abs(off), side: off > 0 ? "above" : "below", times: Number(times.toFixed(1)), measure, robust });

function robustPeak(waters: readonly number[], dries: readonly number[], degree: number, scatter: number): string {
  const found = waters.length > degree + 2 ? robustPolynomial(waters, dries, degree, scatter) : null, top = found && peakOf(found.fit);
  return found && top !== null ? ` A fit that stray points do not pull peaks at ${Number(valueAt(found.fit, top).toPrecision(4))} and ${Number(unscaled(found.fit, top).toFixed(1))} %.` : "";
}
