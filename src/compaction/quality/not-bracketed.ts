import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { EACH_SIDE } from "./thresholds";

/** The peak is known as well as both its sides are. */
export const notBracketed = rule<CurveSubject>()({
  id: "not-bracketed",
  source: { title: "ASTM D698 and AASHTO T 99", clause: "points on both sides of the optimum, from memory" },
  says: "{count} {side} of the optimum ({optimum} %): the peak is not bracketed by two points on each side. Add {wetter} points.",
  *look({ test: { waters }, optimum }) {
    if (optimum === null || waters.length < 2) return;
    const sides = { dry: waters.filter((water) => water < optimum), wet: waters.filter((water) => water > optimum) };
    for (const side of ["dry", "wet"] as const) {
      const count = new Set(sides[side]).size;
      if (count >= EACH_SIDE) continue;
      yield {
        place: { at: "whole" },
        severity: count === 0 ? "doubtful" : "ask",
        evidence: { count: count === 0 ? "no point is" : "only one point is", side, optimum: Number(optimum.toFixed(1)), wetter: side === "wet" ? "wetter" : "drier" },
      };
    }
  },
});
