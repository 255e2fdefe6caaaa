import { COMMON_PRACTICE, rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { ABOVE } from "./thresholds";

/** A curve forced through far points may stand above the points nearest its peak. */
export const standsAbove = rule<CurveSubject>()({
  id: "stands-above",
  source: COMMON_PRACTICE,
  says: "the fitted peak {peak} stands above the points nearest to it: a parabola through the highest three peaks at {three}. Compare the two before the peak is used.",
  *look({ fit, topThreePeak }) {
    if (!fit || topThreePeak === null || fit.curve === "top three") return;
    const peak = fit.maxDryDensity.value;
    if (peak > topThreePeak * (1 + ABOVE)) yield { place: { at: "whole" }, severity: "ask", evidence: { peak, three: topThreePeak } };
  },
});
