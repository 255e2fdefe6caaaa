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

/** The same curve fitted anew from near its answer, as when one point is left out. */
export function refitSaturation(test: CompactionTest, near: readonly number[], weights: readonly number[]): { readonly water: number; readonly dry: number } | null {
  const { waters, dries, waterDensity } = test, specificGravity = test.specificGravity!;
  const fit = fitSaturation({ waters, dries, specificGravity, waterDensity, weights }, near);
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

/** How hard a pulled fit is held to its target: the fit it gives is an exact point of the profile wherever it ends. */
const HOLD = 8;
const ROUNDS = 6, CLOSE_ENOUGH = 0.05;

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

  const end = (which: "water" | "dry", side: -1 | 1, first: number): number | null => {
    const middle = peak[which];
    const low = which === "water" ? driest : 0, high = which === "water" ? wettest : Infinity;
    let target = middle + side * first, start: readonly number[] = [...fit.parameters];
    let below = 0, belowAt = middle, above: number | null = null, aboveAt = 0;
    for (let round = 0; round < ROUNDS; round++) {
      const held = Math.min(high, Math.max(low, target)), scale = HOLD / Math.max(Math.abs(held - middle), 1e-9 * Math.abs(middle));
      const pulled = fitNonlinear(saturationModel(points, (at, slopes) => {
        const top = summitWithSlopes(at, specificGravity, waterDensity, which === "water" ? slopes : null, which === "dry" ? slopes : null);
        if (!top) { slopes?.fill(0); return scale * (which === "water" ? -held : held); }
        if (slopes) for (let j = 0; j < 4; j++) slopes[j]! *= scale;
        return scale * (top[which] - held);
      }), start, { ...bounds, tolerance: 1e-3, maxEvaluations: 60 });
      const top = summitWithSlopes(pulled.parameters as unknown as Vector, specificGravity, waterDensity, null, null);
      if (!top) return null;
      const pull = pulled.residuals[waters.length]!, rise = Math.sqrt(Math.max(0, pulled.sumOfSquares - pull * pull - fit.sumOfSquares)) / k;
      start = [...pulled.parameters];
      const reached = top[which];
      // the root of the rise is all but a straight line: what is left of the way is told from it
      if (Math.abs(rise - 1) < CLOSE_ENOUGH) return Math.min(high, Math.max(low, middle + (reached - middle) / rise));
      if (rise < 1) { below = rise; belowAt = reached; } else { above = rise; aboveAt = reached; }
      // held against the end of the data, and still not refused: the data do not bound it
      if (rise < 1 && which === "water" && held === (side < 0 ? low : high)) return null;
      // a bound of the parameters stops it: nothing further is possible
      if (rise < 1 && Math.abs(reached - held) > 0.2 * Math.abs(held - middle)) return reached;
      target = above === null
        ? middle + Math.min(4, 1 / Math.max(rise, 0.25)) * (reached - middle)
        : belowAt + (aboveAt - belowAt) * (1 - below) / (above - below);
    }
    return above === null ? null : belowAt + (aboveAt - belowAt) * (1 - below) / (above - below);
  };
  const firstOf = (slopes: ArrayLike<number>, span: number): number => Math.min(k * (deviation(slopes) ?? Infinity), span);
  const water = firstOf(byWater, (wettest - driest) / 2), dry = firstOf(byDry, 0.05 * peak.dry);
  const optimumWater: PeakInterval = { low: end("water", -1, water), high: end("water", 1, water) };
  return {
    method: "profile", widening, optimumWater,
    maxDryDensity: { low: end("dry", -1, dry), high: end("dry", 1, dry) },
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
