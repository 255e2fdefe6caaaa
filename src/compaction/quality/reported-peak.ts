import { COMMON_PRACTICE, rule } from "../../findings/finding";
import { densityUnit, unitOfWater } from "../../units/density-units";
import { WATER_KG_M3_AT_20 } from "../../units/water-density";
import { reporting } from "../reporting";
import type { CurveSubject } from "./subject";

/** The densest point is the luckiest reading, not the top of the curve. */
export const highestPointReported = rule<CurveSubject>()({
  id: "highest-point-reported",
  source: COMMON_PRACTICE,
  says: "the reported peak, {dry} at {water} %, is the highest point itself; the curve through all points peaks at {peak} and {optimum} %.",
  *look({ fit, test: { waters, dries, reported } }) {
    if (!fit || reported?.maxDryDensity === undefined || reported.optimumWater === undefined) return;
    const highest = dries.indexOf(Math.max(...dries)), { maxDryDensity, optimumWater } = fit;
    const same = Math.abs(reported.maxDryDensity / dries[highest]! - 1) < SAME && Math.abs(reported.optimumWater - waters[highest]!) < SAME_WATER;
    if (!same || (Math.abs(maxDryDensity.value / reported.maxDryDensity - 1) <= SAME && Math.abs(optimumWater.value - reported.optimumWater) <= SAME_WATER)) return;
    yield { place: { at: "point", index: highest }, severity: "ask", evidence: { dry: reported.maxDryDensity, water: reported.optimumWater, peak: maxDryDensity.value, optimum: Number(optimumWater.value.toFixed(1)) } };
  },
});

/** A reported figure equals a reading where only its rounding parts them: half a step of common reports. */
const SAME = 0.003, SAME_WATER = 0.06;

/** A reported peak that no admissible curve reaches. */
export const reportedElsewhere = rule<CurveSubject>()({
  id: "reported-elsewhere",
  source: COMMON_PRACTICE,
  says: "the reported {what}, {reported}, lies outside what any curve that follows these points allows: {low} to {high}.",
  *look({ fit, test: { reported } }) {
    if (!fit || !reported) return;
    for (const [what, value, { low, high }] of [["maximum dry density", reported.maxDryDensity, fit.joined().maxDryDensity], ["optimum", reported.optimumWater, fit.joined().optimumWater]] as const) {
      if (value === undefined || !((low !== null && value < low) || (high !== null && value > high))) continue;
      yield { place: { at: "whole" }, severity: "doubtful", evidence: { what, reported: value, low: low ?? "no lower bound", high: high ?? "no upper bound" } };
    }
  },
});

/** Every standard says how finely a peak is reported: a figure on another step was rounded by another habit. */
export const reportingPrecision = rule<CurveSubject>()({
  id: "reporting-precision",
  source: { title: "the standard named", clause: "report" },
  says: "{standard} reports the {what} to {step}{unit}: {reported} is on another step; the curve gives {rounded}.",
  *look({ fit, test: { reported, waterDensity } }) {
    if (!fit || !reported?.standard) return;
    const { dryDensity, water } = reporting[reported.standard];
    // the sheet's unit, told from its density of water
    const sheet = unitOfWater(waterDensity, WATER_KG_M3_AT_20)?.id, step = dryDensity.find(({ unit }) => unit === sheet);
    const figures = [
      ...(step && reported.maxDryDensity !== undefined ? [{ what: "maximum dry density", value: reported.maxDryDensity, step: step.step, unit: ` ${densityUnit(step.unit)!.printed}`, fitted: fit.maxDryDensity.value }] : []),
      ...(reported.optimumWater !== undefined ? [{ what: "optimum water content", value: reported.optimumWater, step: water(reported.optimumWater), unit: " %", fitted: fit.optimumWater.value }] : []),
    ];
    for (const { what, value, step: by, unit, fitted } of figures) {
      const steps = value / by;
      if (Math.abs(steps - Math.round(steps)) < 1e-6 * Math.max(1, steps)) continue;
      yield { place: { at: "whole" }, severity: "ask", evidence: { standard: reported.standard, what, step: by, unit, reported: String(value), rounded: String(Number((Math.round(fitted / by) * by).toPrecision(6))) } };
    }
  },
});
