import { rule } from "../../findings/finding";
import { leastSpecificGravity, LINE_ALLOWANCE, zeroAirVoids } from "../../phase/lines";
import type { CurveSubject } from "./subject";

/** A point past the zero-air-voids line holds more water and solids than its volume: a reading or the specific gravity is wrong. */
export const pastLine = rule<CurveSubject>()({
  id: "past-line",
  source: { title: "ASTM D698", clause: "zero-air-voids curve" },
  says: "dry density {dry} at {water} % lies past the zero-air-voids line ({line}{assumed}). It would be possible from a specific gravity of {least} up; else a reading is wrong.",
  *look({ test: { waters, dries, specificGravity, specificGravityAssumed, waterDensity } }) {
    if (specificGravity === undefined) return;
    for (const [index, water] of waters.entries()) {
      const dry = dries[index]!, line = zeroAirVoids.value({ waterContent: water, specificGravity, waterDensity });
      if (dry <= line * (1 + LINE_ALLOWANCE)) continue;
      const least = leastSpecificGravity.value({ dryDensity: dry, waterContent: water, waterDensity });
      yield {
        place: { at: "point", index },
        severity: specificGravityAssumed ? "doubtful" : "impossible",
        // rounded up, as the point is not yet possible at the figure rounded down
        evidence: { dry, water, line, assumed: specificGravityAssumed ? ", for an assumed specific gravity" : "", least: least > 0 ? (Math.ceil(least * 1000 - 1e-9) / 1000).toFixed(3) : "none at all" },
      };
    }
  },
});
