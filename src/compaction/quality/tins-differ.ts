import { COMMON_PRACTICE, rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { TINS_APART } from "./thresholds";

/** Two tins of one point hold the same soil. Where they differ, the point's water content, and with it its dry density, is as doubtful as their difference. */
export const tinsDiffer = rule<CurveSubject>()({
  id: "tins-differ",
  source: COMMON_PRACTICE,
  says: "the tins of this point give {low} and {high} %, {apart} points apart: more than {limit}. Weigh again, or look for a wrong tare.",
  *look({ test: { tins } }) {
    for (const [index, waters] of (tins ?? []).entries()) {
      if (waters.length < 2) continue;
      const low = Math.min(...waters), high = Math.max(...waters), mean = waters.reduce((sum, water) => sum + water, 0) / waters.length;
      const limit = Math.max(TINS_APART.points, TINS_APART.share * mean);
      if (high - low <= limit) continue;
      yield { place: { at: "point", index }, severity: "doubtful", evidence: { low: Number(low.toFixed(2)), high: Number(high.toFixed(2)), apart: Number((high - low).toFixed(2)), limit: Number(limit.toFixed(2)) } };
    }
  },
});
