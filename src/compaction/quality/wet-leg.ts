import { COMMON_PRACTICE, rule } from "../../findings/finding";
import { airVoidsOfPoint } from "../../phase/lines";
import type { CurveSubject } from "./subject";
import { WET_LEG } from "./thresholds";

/** Wet of the optimum a soil keeps what little air it has: the leg runs near parallel to the zero-air-voids line. */
export const wetLeg = rule<CurveSubject>()({
  id: "wet-leg",
  source: COMMON_PRACTICE,
  says: "wet of the optimum the air voids run from {least} to {most} %: that leg should lie near parallel to the zero-air-voids line, at 0 to {limit} % and within {change} points. Check the specific gravity and the wet points.",
  *look({ test: { waters, dries, specificGravity, specificGravityAssumed, waterDensity }, fit }) {
    if (!fit || specificGravity === undefined || specificGravityAssumed) return;
    const air = waters.flatMap((waterContent, i) => waterContent > fit.optimumWater.value ? [airVoidsOfPoint.value({ dryDensity: dries[i]!, waterContent, specificGravity, waterDensity })] : []);
    if (air.length < 2) return;
    const least = Math.min(...air), most = Math.max(...air);
    // a negative one is a point past the line, which has a finding of its own
    if (least < 0 || (most <= WET_LEG.mostAir && most - least <= WET_LEG.change)) return;
    yield { place: { at: "whole" }, severity: "ask", evidence: { least: Number(least.toFixed(1)), most: Number(most.toFixed(1)), limit: WET_LEG.mostAir, change: WET_LEG.change } };
  },
});
