import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { WIDE_GAP } from "./thresholds";

/** Between two points far apart the curve is drawn by the model, not by the soil. It matters next to the peak. */
export const gap = rule<CurveSubject>()({
  id: "gap",
  source: { title: "ASTM D698", clause: "steps of water content, from memory" },
  says: "a gap of {gap} points of water content, from {from} to {to} %, lies beside the peak: what the curve does there is not measured.",
  *look({ test: { waters }, optimum }) {
    if (optimum === null) return;
    const sorted = [...new Set(waters)].sort((a, b) => a - b);
    for (let i = 1; i < sorted.length; i++) {
      const from = sorted[i - 1]!, to = sorted[i]!, width = to - from;
      // the gap that holds the optimum, and the ones that meet it at a point
      const beside = (sorted[i - 2] ?? from) <= optimum && optimum <= (sorted[i + 1] ?? to);
      if (!beside || width <= Math.max(WIDE_GAP.ask, WIDE_GAP.askShareOfOptimum * optimum)) continue;
      yield { place: { at: "whole" }, severity: width > Math.max(WIDE_GAP.doubtful, WIDE_GAP.askShareOfOptimum * optimum) ? "doubtful" : "ask", evidence: { gap: Number(width.toFixed(1)), from, to } };
    }
  },
});
