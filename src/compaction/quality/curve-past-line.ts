import { rule } from "../../findings/finding";
import { LINE_ALLOWANCE, zeroAirVoids } from "../../phase/lines";
import { curveName } from "../fit";
import type { CurveSubject } from "./subject";

const STEPS = 100;

/** No compaction curve can cross the line; a polynomial does not know that. */
export const curvePastLine = rule<CurveSubject>()({
  id: "curve-past-line",
  source: { title: "ASTM D698", clause: "zero-air-voids curve" },
  says: "the fitted {curve} crosses the zero-air-voids line from {water} % on, inside the data. Its wet side is not real there.",
  *look({ fit, test: { waters, specificGravity, waterDensity } }) {
    if (!fit || specificGravity === undefined) return;
    const driest = Math.min(...fit.used.map((i) => waters[i]!)), wettest = Math.max(...fit.used.map((i) => waters[i]!));
    for (let step = 0; step <= STEPS; step++) {
      const water = driest + (wettest - driest) * step / STEPS;
      if (fit.at(water) <= zeroAirVoids.value({ waterContent: water, specificGravity, waterDensity }) * (1 + LINE_ALLOWANCE)) continue;
      yield { place: { at: "whole" }, severity: "doubtful", evidence: { curve: curveName(fit.curve), water: Number(water.toFixed(1)) } };
      return;
    }
  },
});
