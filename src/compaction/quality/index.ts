import { curvePastLine } from "./curve-past-line";
import { curvesDisagree } from "./curves-disagree";
import { gap } from "./gap";
import { influentialPoint } from "./influential-point";
import { kindOfCurveRule } from "./kind-of-curve";
import { missesPoints } from "./misses-points";
import { notBracketed } from "./not-bracketed";
import { outlier } from "./outlier";
import { pastLine } from "./past-line";
import { repeatedPoints } from "./repeated-points";
import { saturationAtOptimum } from "./saturation-at-optimum";
import { gravityAssumed, gravityImplausible } from "./specific-gravity";
import { standsAbove } from "./stands-above";
import { tooFewPoints } from "./too-few-points";
import { wetLeg } from "./wet-leg";

/** What is looked at in the points of a compaction test, in the order in which equals are told. */
export const curveRules = [
  pastLine, missesPoints, kindOfCurveRule, outlier, notBracketed, curvePastLine, saturationAtOptimum, influentialPoint, tooFewPoints, gap,
  standsAbove, curvesDisagree, wetLeg, repeatedPoints, gravityImplausible, gravityAssumed,
] as const;
