import { curvePastLine } from "./curve-past-line";
import { gap } from "./gap";
import { missesPoints } from "./misses-points";
import { notBracketed } from "./not-bracketed";
import { outlier } from "./outlier";
import { pastLine } from "./past-line";
import { repeatedPoints } from "./repeated-points";
import { gravityAssumed, gravityImplausible } from "./specific-gravity";
import { standsAbove } from "./stands-above";
import { tooFewPoints } from "./too-few-points";

/** Everything that is looked at in a compaction test, in the order in which equals are told. */
export const curveRules = [
  pastLine, missesPoints, outlier, notBracketed, curvePastLine, tooFewPoints, gap, standsAbove, repeatedPoints, gravityImplausible, gravityAssumed,
] as const;
