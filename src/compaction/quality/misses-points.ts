import { COMMON_PRACTICE, rule } from "../../findings/finding";
import { curveName } from "../fit";
import { curveScatter } from "../scatter";
import type { CurveSubject } from "./subject";
import { FOLLOWS } from "./thresholds";

/** A plain curve forced on a peaky test: its peak is not the test's. */
export const missesPoints = rule<CurveSubject>()({
  id: "misses-points",
  source: COMMON_PRACTICE,
  says: "the {curve} does not follow these points: it misses the point at {water} % by {off}. Do not use its peak; choose another curve, or look at the readings.",
  *look({ fit, test: { waters, dries }, scatter }) {
    if (!fit || fit.standardError === null || fit.standardError <= FOLLOWS * curveScatter(dries, scatter)) return;
    const worst = fit.used.reduce((a, b) => Math.abs(fit.residuals[b]!) > Math.abs(fit.residuals[a]!) ? b : a);
    yield { place: { at: "whole" }, severity: "doubtful", evidence: { curve: curveName(fit.curve), water: waters[worst]!, off: Math.abs(fit.residuals[worst]!) } };
  },
});
