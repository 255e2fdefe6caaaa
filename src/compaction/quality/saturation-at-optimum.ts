import { rule } from "../../findings/finding";
import type { CurveSubject } from "./subject";
import { SATURATION_AT_OPTIMUM } from "./thresholds";

/** How full of water a soil is at its optimum hardly differs from soil to soil: a figure outside says that a reading or the specific gravity is off. */
export const saturationAtOptimum = rule<CurveSubject>()({
  id: "saturation-at-optimum",
  source: { title: "JETS 55(3) (2023), saturation of tropical soils at the optimum; bands by grain: common practice" },
  says: "saturation at the optimum is {saturation} %, outside the usual {low} to {high} %{soil}: {check}.",
  *look({ fit, test: { soil, specificGravityAssumed } }) {
    const saturation = fit?.saturationAtOptimum;
    if (saturation === null || saturation === undefined) return;
    const { low, high } = SATURATION_AT_OPTIMUM[soil ?? "untold"];
    if (saturation >= low && saturation <= high) return;
    yield {
      place: { at: "whole" },
      severity: specificGravityAssumed ? "ask" : "doubtful",
      evidence: {
        saturation: Number(saturation.toFixed(1)), low, high, soil: soil ? ` of a ${soil} soil` : "",
        check: specificGravityAssumed ? "have the specific gravity measured before anything is made of it" : "check the specific gravity, the mould's volume and the water contents",
      },
    };
  },
});
