import { rule } from "../../findings/finding";
import { notOnePeak } from "../shape";
import type { CurveSubject } from "./subject";

/** A curve was fitted, but the points have another shape than its one peak. */
export const kindOfCurveRule = rule<CurveSubject>()({
  id: "kind-of-curve",
  source: { title: "Lee and Suedkamp, Highway Research Record 381 (1972)", clause: "four types of compaction curve" },
  says: "{what}",
  *look({ test, fit, scatter }) {
    const odd = fit && notOnePeak(test, scatter);
    if (odd) yield { place: { at: "whole" }, severity: "doubtful", evidence: { what: odd.says } };
  },
});
