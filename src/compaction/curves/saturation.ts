import { NORMAL_95 } from "../../numerics/distributions";
import { fitNonlinear } from "../../numerics/nonlinear-least-squares";
import type { CompactionTest, PeakInterval } from "../fit";
import { readingDoubt } from "../scatter";
import { allPoints, distinctWaters, type Curve, type FitOptions, type FittedCurve, type Reckoning } from "./curve";
import { fitSaturation, saturationBounds, saturationCurve, saturationModel, summitWithSlopes, type SaturationFit, type SaturationPoints, type Vector } from "./saturation-model";

/**
 * The curve bounded by the zero-air-voids line (its form and source: saturation-model.ts). Needs the specific gravity;
 * works from four points up, within bounds that no soil leaves.
 * It has no trend line to agree with, so its points are always weighed by the doubt of their readings.
 */
export const saturation: Curve = {
  id: "saturation",
  parameters: 4,
  weighed: true,
  needs: "the specific gravity and at least four different water contents",
  fit(test, options) {
    const { waters, dries, specificGravity, waterDensity } = test;
    if (specificGravity === undefined || distinctWaters(test) < 4) return "not-enough";
    const plain = fitSaturation({ waters, dries, specificGravity, waterDensity });
    const slope = slopeOf(plain, specificGravity, waterDensity);
    const weights = waters.map((water, i) => 1 / readingDoubt(water, dries[i]!, slope(water), options.scatter));
    const points: SaturationPoints = { waters, dries, specificGravity, waterDensity, weights };
    return fitted(test, options, points, fitSaturation(points, [...plain.parameters]));
  },
};

/** Near enough for a table of peaks: the sum of squares is then its least to far below the scatter. */
const NEAR = 1e-4;

/** The same curve fitted anew from near its answer, as when one point is left out. */
export function refitSaturation(test: CompactionTest, near: readonly number[], weights: readonly number[]): { readonly water: number; readonly dry: number } | null {
  const { waters, dries, waterDensity } = test, specificGravity = test.specificGravity!;
  const fit = fitSaturation({ waters, dries, specificGravity, waterDensity, weights }, near, NEAR);
  return inside(test, summitWithSlopes(fit.parameters as unknown as Vector, specificGravity, waterDensity, null, null));
}

const inside = ({ waters }: CompactionTest, peak: { readonly water: number; readonly dry: number } | null) =>
  peak && peak.water > Math.min(...waters) && peak.water < Math.max(...waters) ? peak : null;

const STEP = 1e-4;
function slopeOf({ shape }: SaturationFit, specificGravity: number, waterDensity: number): (water: number) => number {
  const at = (water: number): number => saturationCurve(water, shape, specificGravity, waterDensity);
  return (water) => (at(water * (1 + STEP)) - at(water * (1 - STEP))) / (2 * STEP * water);
}

export interface FittedSaturation extends FittedCurve { readonly vector: readonly number[]; readonly weights: readonly number[] }

function fitted(test: CompactionTest, options: FitOptions, points: SaturationPoints, fit: SaturationFit): FittedCurve | "no-peak" {
  const { waters, dries, waterDensity } = test, specificGravity = test.specificGravity!;
  const peak = inside(test, summitWithSlopes(fit.parameters as unknown as Vector, specificGravity, waterDensity, null, null));
  if (!peak) return "no-peak";
  const at = (water: number): number => saturationCurve(water, fit.shape, specificGravity, waterDensity);
  let reckoned: Reckoning | undefined;
  return {
    curve: saturation, used: allPoints(test), at, peak, parameters: 4, vector: [...fit.parameters], weights: points.weights!,
    sumOfSquares: waters.reduce((sum, water, i) => sum + (dries[i]! - at(water)) ** 2, 0),
    reckon: () => reckoned ??= reckon(points, fit, peak),
  } as FittedSaturation;
}

/** How hard a pulled fit is held to its target, in steps: the fit it gives is an exact point of the profile wherever it ends. */
const HOLD = 8;
const ROUNDS = 12, CLOSE_ENOUGH = 0.05;

/** A shape in the middle of the bounds with its peak near a water content. */
const plainShape = (water: number): number[] => [0.9, 1.2 * water, 4, 0.3];

/** Of two pulled fits the one that came near the place asked for and rose less. */
function better(a: Tried | null, b: Tried | null, held: number): Tried | null {
  if (!a || !b) return a ?? b;
  const off = (one: Tried): number => Math.abs(one.reached - held);
  return off(a) > 3 * off(b) + 1e-6 ? b : off(b) > 3 * off(a) + 1e-6 ? a : a.rise <= b.rise ? a : b;
}

/** A fit with its peak pulled aside: where the peak came to lie, and the root of the rise in units of the limit. */
interface Tried { readonly reached: number; readonly rise: number; readonly at: readonly number[] }

/**
 * Profile intervals: how far the peak can be pulled before the weighted sum of squares rises by the square of the
 * normal quantile, all other parameters following. Source: Bates and Watts, Nonlinear Regression Analysis (1988), chapter 6.1.
 */
function reckon(points: SaturationPoints, fit: SaturationFit, peak: { readonly water: number; readonly dry: number }): Reckoning {
  const { waters, specificGravity, waterDensity } = points, spare = waters.length - 4;
  const widening = spare > 0 ? Math.max(1, Math.sqrt(fit.sumOfSquares / spare)) : 1, k = NORMAL_95 * widening;
  const bounds = saturationBounds(waters), driest = Math.min(...waters), wettest = Math.max(...waters);
  const byWater = new Float64Array(4), byDry = new Float64Array(4);
  summitWithSlopes(fit.parameters as unknown as Vector, specificGravity, waterDensity, byWater, byDry);
  const free = [0, 1, 2, 3].filter((j) => !fit.onBound[j]);
  const covariance = inverseOfNormal(fit, waters.length, free);
  const deviation = (slopes: ArrayLike<number>): number | null => {
    if (!covariance) return null;
    let sum = 0;
    free.forEach((a, i) => free.forEach((b, j) => { sum += slopes[a]! * slopes[b]! * covariance[i]![j]!; }));
    return sum > 0 ? Math.sqrt(sum) : null;
  };

  const cornered = fit.onBound.some((one) => one);
  /** The best fit with its peak held near a place: where the peak comes to lie, and how far the fit has risen, in units of the limit. */
  const pullOnce = (which: "water" | "dry", held: number, per: number, start: readonly number[], tolerance: number): Tried | null => {
    const pulled = fitNonlinear(saturationModel(points, (at, slopes) => {
      const top = summitWithSlopes(at, specificGravity, waterDensity, which === "water" ? slopes : null, which === "dry" ? slopes : null);
      if (!top) { slopes?.fill(0); return HOLD * held / per; }
      if (slopes) for (let j = 0; j < 4; j++) slopes[j]! *= HOLD / per;
      return HOLD * (top[which] - held) / per;
    }), start, { ...bounds, tolerance, maxEvaluations: 400 });
    const top = summitWithSlopes(pulled.parameters as unknown as Vector, specificGravity, waterDensity, null, null), last = pulled.residuals[waters.length]!;
    return top && { reached: top[which], rise: Math.sqrt(Math.max(0, pulled.sumOfSquares - last * last - fit.sumOfSquares)) / k, at: [...pulled.parameters] };
  };

  /** Roughly first; a fit that seems to pass the limit is brought to its floor before that is believed. */
  const pull = (which: "water" | "dry", held: number, per: number, start: readonly number[]): Tried | null => {
    const rough = pullOnce(which, held, per, start, 1e-2);
    if (rough === null || rough.rise < 0.8) return rough;
    const own = pullOnce(which, held, per, rough.at, 1e-3);
    // a fit on the bounds of its parameters may have another valley beside its own
    return cornered ? better(own, pullOnce(which, held, per, plainShape(which === "water" ? held : peak.water), 1e-2), held) : own;
  };

  /** Walks outward in steps that follow the rise, each begun where the last one ended, until the limit is passed; then between the last two. */
  const end = (which: "water" | "dry", side: -1 | 1, first: number): number | null => {
    const middle = peak[which], last = which === "dry" ? null : side < 0 ? driest : wettest;
    let inside: Tried = { reached: middle, rise: 0, at: [...fit.parameters] }, step = first;
    for (let round = 0; round < ROUNDS; round++) {
      const atEnd = last !== null && side * (inside.reached + side * step - last) >= 0, held = atEnd ? last : inside.reached + side * step;
      const per = Math.max(Math.abs(held - inside.reached), 1e-9 * middle), stuck = (one: Tried | null): boolean => one === null || side * (one.reached - inside.reached) < 0.1 * per;
      let tried = pull(which, held, per, inside.at);
      // in a corner of the bounds a rough fit stops short: to its floor, and from a plain shape
      if (stuck(tried)) tried = better(pullOnce(which, held, per, inside.at, 1e-6), pullOnce(which, held, per, plainShape(which === "water" ? held : peak.water), 1e-6), held);
      if (tried === null || stuck(tried)) {
        // the walk is stuck: a shorter step, or nothing more is possible
        if (step < 0.02 * first) break;
        step /= 4;
        continue;
      }
      if (tried.rise >= 1 - CLOSE_ENOUGH) return between(which, side, inside, tried);
      if (atEnd && Math.abs(tried.reached - last) < 0.02 * (wettest - driest)) return null;
      const gained = (tried.rise - inside.rise) / Math.abs(tried.reached - inside.reached);
      step = Math.min(3 * step, Math.max(0.3 * step, gained > 0 ? 1.03 * (1 - tried.rise) / gained : 3 * step));
      inside = tried;
    }
    if (inside.rise > 0.9) return inside.reached;
    // a density is always located: told on from the rise so far, or from the slopes at the fit
    return which === "water" ? null : inside.rise > 0.2 ? middle + (inside.reached - middle) / inside.rise : middle + side * first;
  };

  const between = (which: "water" | "dry", side: -1 | 1, from: Tried, to: Tried): number => {
    let inside = from, outside = to;
    for (let round = 0; round < 4 && outside.rise - 1 > CLOSE_ENOUGH; round++) {
      const share = (1 - inside.rise) / (outside.rise - inside.rise), held = inside.reached + share * (outside.reached - inside.reached);
      const tried = pull(which, held, Math.max(Math.abs(outside.reached - inside.reached) / 2, 1e-9 * peak[which]), inside.at);
      if (tried === null || side * (tried.reached - inside.reached) <= 0 || side * (outside.reached - tried.reached) <= 0) break;
      if (tried.rise < 1) inside = tried; else outside = tried;
      if (Math.abs(tried.rise - 1) <= CLOSE_ENOUGH) break;
    }
    // the root of the rise is all but a straight line between the two
    return inside.reached + (outside.reached - inside.reached) * (1 - inside.rise) / (outside.rise - inside.rise);
  };
  const firstOf = (slopes: ArrayLike<number>, most: number): number => Math.min(k * (deviation(slopes) ?? Infinity), most);
  const water = firstOf(byWater, (wettest - driest) / 12), dry = firstOf(byDry, 0.01 * k * peak.dry);
  const optimumWater: PeakInterval = { low: end("water", -1, water), high: end("water", 1, water) };
  return {
    method: "profile", widening, optimumWater,
    // where the optimum may lie outside the data, so may a greater density
    maxDryDensity: { low: end("dry", -1, dry), high: optimumWater.low === null || optimumWater.high === null ? null : end("dry", 1, dry) },
    halfBand: (at) => {
      const slopes = curveSlopes(at, fit.parameters as unknown as Vector, specificGravity, waterDensity);
      return k * (deviation(slopes) ?? 1 / Math.min(...points.weights!));
    },
  };
}

function curveSlopes(water: number, vector: Vector, specificGravity: number, waterDensity: number): Float64Array {
  // the model's own derivatives at one point: a residual against nothing
  const jacobian = new Float64Array(4);
  saturationModel({ waters: [water], dries: [0], specificGravity, waterDensity }).evaluate(vector as unknown as Float64Array, new Float64Array(1), jacobian);
  return jacobian;
}

/** (JᵀJ)⁻¹ over the parameters that are not held by a bound, by Gauss and Jordan; null where they cannot be told apart. */
function inverseOfNormal({ jacobian }: SaturationFit, points: number, free: readonly number[]): number[][] | null {
  const p = free.length, scale = free.map((j) => { let sum = 0; for (let i = 0; i < points; i++) sum += jacobian[4 * i + j]! ** 2; return Math.sqrt(sum); });
  if (scale.some((one) => !(one > 0))) return null;
  const rows = free.map((a, i) => [
    ...free.map((b, j) => { let sum = 0; for (let r = 0; r < points; r++) sum += jacobian[4 * r + a]! * jacobian[4 * r + b]!; return sum / scale[i]! / scale[j]!; }),
    ...free.map((_, j) => i === j ? 1 : 0),
  ]);
  for (let c = 0; c < p; c++) {
    let pivot = c;
    for (let r = c + 1; r < p; r++) if (Math.abs(rows[r]![c]!) > Math.abs(rows[pivot]![c]!)) pivot = r;
    if (Math.abs(rows[pivot]![c]!) < 1e-12) return null;
    [rows[c], rows[pivot]] = [rows[pivot]!, rows[c]!];
    const by = rows[c]![c]!;
    for (let m = 0; m < 2 * p; m++) rows[c]![m]! /= by;
    for (let r = 0; r < p; r++) {
      if (r === c) continue;
      const factor = rows[r]![c]!;
      for (let m = 0; m < 2 * p; m++) rows[r]![m]! -= factor * rows[c]![m]!;
    }
  }
  return rows.map((row, i) => row.slice(p).map((value, j) => value / scale[i]! / scale[j]!));
}
