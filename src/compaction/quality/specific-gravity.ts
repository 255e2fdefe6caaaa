import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { PLAUSIBLE_GRAVITY } from "./thresholds";

export const gravityAssumed = rule<CurveSubject>()({
  id: "gravity-assumed",
  source: { title: "ASTM D698", clause: "the report states how the specific gravity was had" },
  says: "the specific gravity {gravity} is assumed: the zero-air-voids line, saturation and air voids rest on it.",
  *look({ test: { specificGravity, specificGravityAssumed } }) {
    if (specificGravity !== undefined && specificGravityAssumed) yield { place: { at: "whole" }, severity: "ask", evidence: { gravity: specificGravity } };
  },
});

export const gravityImplausible = rule<CurveSubject>()({
  id: "gravity-implausible",
  source: { title: "Handbook of Geotechnical Investigation and Design Tables", clause: "specific gravities of soils" },
  says: "a specific gravity of {gravity} is rare: most inorganic soils lie between 2.60 and 2.80. Is it right?",
  *look({ test: { specificGravity } }) {
    if (specificGravity !== undefined && (specificGravity < PLAUSIBLE_GRAVITY.low || specificGravity > PLAUSIBLE_GRAVITY.high)) yield { place: { at: "whole" }, severity: "ask", evidence: { gravity: specificGravity } };
  },
});
