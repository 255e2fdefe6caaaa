import type { CurveId } from "../fit";
import { cubic } from "./cubic";
import type { Curve } from "./curve";
import { parabola } from "./parabola";
import { quartic } from "./quartic";
import { saturation } from "./saturation";
import { smooth } from "./smooth";
import { topThree } from "./top-three";

/** Every curve, in the order in which `auto` prefers them where they weigh the same. */
export const curves: readonly Curve[] = [parabola, saturation, cubic, quartic, topThree, smooth];

export const curveOf = (id: CurveId): Curve => curves.find((curve) => curve.id === id)!;
