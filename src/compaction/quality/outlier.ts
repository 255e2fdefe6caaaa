import { rule } from "../../findings/finding";
import { studentQuantile } from "../../numerics/distributions";
import { fitPolynomial, scaled, spreadAt, valueAt } from "../../numerics/polynomial";
import type { CurveSubject } from "./subject";
import { OUTLIER_CHANCE } from "./thresholds";

/**
 * A point that the others do not expect: externally studentised residual against a Student limit shared out over all points.
 * The worst is set aside and the rest judged again, since one stray point hides another.
 */
export const outlier = rule<CurveSubject>()({
  id: "outlier",
  source: { title: "Cook and Weisberg, Residuals and Influence in Regression (1982)", clause: "outlier test by externally studentised residual" },
  says: "dry density {dry} at {water} % stands {off} {side} the curve through the other points, {times} standard errors: look at this reading.",
  *look({ test: { waters, dries }, fit }) {
    const degree = fit ? fit.parameters - 1 : 2, p = degree + 1;
    if (fit?.curve === "top three") return;
    let kept = waters.map((_, i) => i);
    const least = Math.max(p + 3, Math.ceil(kept.length * 0.75));
    while (kept.length >= least && new Set(kept.map((i) => waters[i])).size > p) {
      const polynomial = fitPolynomial(kept.map((i) => waters[i]!), kept.map((i) => dries[i]!), degree);
      const spareLess = kept.length - p - 1;
      let worst = -1, most = 0, off = 0;
      for (const i of kept) {
        const u = scaled(polynomial, waters[i]!), residual = dries[i]! - valueAt(polynomial, u), free = 1 - spreadAt(polynomial, u).value;
        if (free < 1e-9) continue;
        const others = Math.sqrt(Math.max(polynomial.sumOfSquares - residual * residual / free, 0) / spareLess);
        // a set that is exact but for one point has no scatter at all to measure by
        const size = Math.abs(residual) / Math.sqrt(free) / Math.max(others, 1e-6 * Math.abs(dries[i]!));
        if (size > most) { most = size; worst = i; off = residual / free; }
      }
      if (worst < 0 || most <= studentQuantile(OUTLIER_CHANCE / 2 / kept.length, spareLess)) return;
      const dropped = worst;
      yield {
        place: { at: "point", index: dropped },
        severity: "doubtful",
        evidence: { dry: dries[dropped]!, water: waters[dropped]!, off: Math.abs(off), side: off > 0 ? "above" : "below", times: Number(most.toFixed(1)) },
      };
      kept = kept.filter((i) => i !== dropped);
    }
  },
});
