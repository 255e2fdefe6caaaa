import { rule } from "../../findings/finding";
import { curveName } from "../fit";
import type { CurveSubject } from "./subject";
import { CURVES_APART } from "./thresholds";

/** What the answer owes to the choice of a curve. */
export const curvesDisagree = rule<CurveSubject>()({
  id: "curves-disagree",
  source: { title: "Burnham and Anderson, Model Selection and Multimodel Inference (2002)", clause: "section 4.3, doubt about the model" },
  says: "curves that follow these points as well put the peak elsewhere: {own}; {others}. More points about the optimum would tell them apart.",
  *look({ fit }) {
    if (!fit || fit.otherCurves.length === 0) return;
    const own = { curve: fit.curve, water: fit.optimumWater.value, dry: fit.maxDryDensity.value };
    // a curve without a spare point swings as it likes: it widens the interval, but accuses nobody
    const others = fit.otherCurves.filter(({ judged }) => judged);
    const apart = others.filter(({ water, dry }) => Math.abs(water - own.water) > CURVES_APART.water || Math.abs(dry / own.dry - 1) > CURVES_APART.dryDensityShare);
    if (apart.length === 0) return;
    const told = ({ curve, water, dry }: typeof own): string => `${curveName(curve)} ${dry.toPrecision(4)} at ${water.toFixed(1)} %`;
    yield { place: { at: "whole" }, severity: "ask", evidence: { own: told(own), others: apart.map(told).join(", ") } };
  },
});
