import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";

/** A peak that hangs on one point: without it the same curve says something outside its own interval. */
export const influentialPoint = rule<CurveSubject>()({
  id: "influential-point",
  source: { title: "Cook and Weisberg, Residuals and Influence in Regression (1982)", clause: "deletion of single cases" },
  says: "without this point ({dry} at {water} %) the {what} would be {peak}, outside its 95 % interval: the answer hangs on this reading.",
  *look({ fit, test: { waters, dries } }) {
    if (!fit || fit.curve === "top three" || fit.curve === "smooth") return;
    const { optimumWater, maxDryDensity } = fit;
    const outside = ({ low, high }: { readonly low: number | null; readonly high: number | null }, value: number): boolean => (low !== null && value < low) || (high !== null && value > high);
    for (const [index, peak] of fit.leaveOneOut().entries()) {
      if (!peak) continue;
      const water = outside(optimumWater, peak.water);
      if (!water && !outside(maxDryDensity, peak.dry)) continue;
      yield { place: { at: "point", index }, severity: "doubtful", evidence: { dry: dries[index]!, water: waters[index]!, what: water ? "optimum" : "peak", peak: water ? `${Number(peak.water.toFixed(1))} %` : Number(peak.dry.toPrecision(4)) } };
    }
  },
});
