import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { GOOD_POINTS, LEAST_POINTS } from "./thresholds";

export const tooFewPoints = rule<CurveSubject>()({
  id: "too-few-points",
  source: { title: "ASTM D698 and BS 1377-4", clause: "number of points of a test, from memory" },
  says: "{count} points: a test should have {wanted}, at least {least}.",
  *look({ test: { waters } }) {
    const count = waters.length;
    if (count < GOOD_POINTS) yield { place: { at: "whole" }, severity: count < LEAST_POINTS ? "doubtful" : "ask", evidence: { count, wanted: GOOD_POINTS, least: LEAST_POINTS } };
  },
});
