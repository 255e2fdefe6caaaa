import { rule } from "../../findings/finding";
import { leastSpecificGravity, LINE_ALLOWANCE, zeroAirVoids } from "../../phase/lines";
import type { CurveSubject } from "./subject";

/** Water contents are read to a tenth of a point at least, whatever whole numbers stand in the sheet. Common practice, no published source. */
const COARSEST_WATER = 0.1;
/** Figures with more decimals than this were computed, not typed: their rounding is no matter. */
const TYPED = 4;

/** The step to which a series was rounded, from the decimals of its figures; 0 where they were computed. */
function stepOf(values: readonly number[]): number {
  const decimals = Math.max(...values.map((value) => String(value).split(".")[1]?.length ?? 0));
  return decimals > TYPED ? 0 : 10 ** -decimals;
}

/**
 * A point past the zero-air-voids line holds more water and solids than its volume: a reading or the specific gravity is wrong.
 * Where the rounding of its two figures might still put it on the line, it is a question.
 */
export const pastLine = rule<CurveSubject>()({
  id: "past-line",
  source: { title: "ASTM D698", clause: "zero-air-voids curve" },
  says: "dry density {dry} at {water} % lies past the zero-air-voids line ({line}{assumed}). It would be possible from a specific gravity of {least} up; else {else}.",
  *look({ test: { waters, dries, specificGravity, specificGravityAssumed, waterDensity } }) {
    if (specificGravity === undefined) return;
    const lineAt = (waterContent: number): number => zeroAirVoids.value({ waterContent, specificGravity, waterDensity });
    const halfWater = Math.min(stepOf(waters), COARSEST_WATER) / 2, halfDry = stepOf(dries) / 2;
    for (const [index, water] of waters.entries()) {
      const dry = dries[index]!, line = lineAt(water);
      if (dry <= line * (1 + LINE_ALLOWANCE)) continue;
      const least = leastSpecificGravity.value({ dryDensity: dry, waterContent: water, waterDensity });
      const sure = dry - halfDry > lineAt(Math.max(0, water - halfWater));
      yield {
        place: { at: "point", index },
        severity: !sure ? "ask" : specificGravityAssumed ? "doubtful" : "impossible",
        // rounded up, as the point is not yet possible at the figure rounded down
        evidence: {
          dry, water, line, assumed: specificGravityAssumed ? ", for an assumed specific gravity" : "", least: least > 0 ? (Math.ceil(least * 1000 - 1e-9) / 1000).toFixed(3) : "none at all",
          else: sure ? "a reading is wrong" : "a reading is wrong, or only rounded: within the rounding of its figures the point may lie on the line",
        },
      };
    }
  },
});
