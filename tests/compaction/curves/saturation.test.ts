import { saturation, type FittedSaturation } from "../../../src/compaction/curves/saturation";
import { fitSaturation, saturationBounds, saturationCurve, saturationModel, summitWithSlopes, type Vector } from "../../../src/compaction/curves/saturation-model";
import { USUAL_SCATTER } from "../../../src/compaction/scatter";
import { fitNonlinear } from "../../../src/numerics/nonlinear-least-squares";
import { seeded } from "../../../src/numerics/random";
import { publishedTest } from "../../published/compaction-tests";

const GS = 2.7, WATER = 0.9982, SHAPE = { mostSaturation: 0.92, waterThere: 18, sharpness: 4, dryShape: 0.5 };
const options = { scatter: USUAL_SCATTER, weigh: false };
const vector = (one: typeof SHAPE): Vector => [one.mostSaturation, one.waterThere, one.sharpness, one.dryShape];

test("the summit is where the curve stands highest, and its slopes by the parameters are those of small changes", () => {
  const random = seeded(7);
  let met = 0;
  for (let k = 0; k < 50; k++) {
    const one: [number, number, number, number] = [0.8 + 0.18 * random.uniform(), 12 + 10 * random.uniform(), 1 + 9 * random.uniform(), 0.1 + 0.6 * random.uniform()];
    const byWater = new Float64Array(4), byDry = new Float64Array(4), top = summitWithSlopes(one, GS, WATER, byWater, byDry);
    const at = (w: number): number => saturationCurve(w, { mostSaturation: one[0], waterThere: one[1], sharpness: one[2], dryShape: one[3] }, GS, WATER);
    if (!top) {
      // no summit at all: it falls from the dry end on
      for (let w = 0.5; w < one[1]; w += 0.5) expect(at(w)).toBeLessThan(at(w - 0.49));
      continue;
    }
    met++;
    expect(at(top.water)).toBeCloseTo(top.dry, 12);
    for (const step of [-0.5, -0.05, 0.05, 0.5]) expect(at(top.water + step)).toBeLessThan(top.dry);
    for (let j = 0; j < 4; j++) {
      const h = 1e-5 * one[j]!, moved = (by: number) => summitWithSlopes(one.map((value, i) => i === j ? value + by : value) as unknown as Vector, GS, WATER, null, null)!;
      expect(Math.abs(byWater[j]! - (moved(h).water - moved(-h).water) / (2 * h))).toBeLessThan(1e-3 * (1 + Math.abs(byWater[j]!)));
      expect(Math.abs(byDry[j]! - (moved(h).dry - moved(-h).dry) / (2 * h))).toBeLessThan(1e-4 * (1 + Math.abs(byDry[j]!)));
    }
  }
  expect(met).toBeGreaterThan(35);
});

test("a curve without scatter is given back, peak and all, from five points up", () => {
  const truth = summitWithSlopes(vector(SHAPE), GS, WATER, null, null)!;
  for (const n of [5, 6, 8]) {
    const waters = Array.from({ length: n }, (_, i) => truth.water + 1.8 * (i - (n - 1) / 2)), fitted = saturation.fit({ waters, dries: waters.map((w) => saturationCurve(w, SHAPE, GS, WATER)), specificGravity: GS, waterDensity: WATER }, options);
    if (typeof fitted === "string") throw new Error(fitted);
    expect(fitted.peak.water).toBeCloseTo(truth.water, 2);
    expect(fitted.peak.dry).toBeCloseTo(truth.dry, 4);
  }
});

/** How far the best fit rises with its peak held at a place, by brute force: many starts, held hard, to the floor. */
function riseAt(fitted: FittedSaturation, waters: readonly number[], dries: readonly number[], which: "water" | "dry", target: number): number {
  const points = { waters, dries, specificGravity: GS, waterDensity: WATER, weights: fitted.weights }, base = fitSaturation(points, fitted.vector).sumOfSquares;
  let least = Infinity;
  for (const from of [[...fitted.vector], [0.9, 20, 4, 0.5], [0.88, 16, 2, 0.4], [0.92, 30, 10, 0.7], [0.92, 13, 1.2, 0.05]]) {
    const hold = which === "water" ? 1000 : 30_000, pulled = fitNonlinear(saturationModel(points, (at, slopes) => {
      const top = summitWithSlopes(at, GS, WATER, which === "water" ? slopes : null, which === "dry" ? slopes : null);
      if (!top) { slopes?.fill(0); return 1e6; }
      if (slopes) for (let j = 0; j < 4; j++) slopes[j]! *= hold;
      return hold * (top[which] - target);
    }), from, { ...saturationBounds(waters), tolerance: 1e-9, maxEvaluations: 3000 });
    least = Math.min(least, pulled.sumOfSquares);
  }
  return Math.sqrt(Math.max(0, least - base));
}

test("its intervals end where the profile, by brute force, passes the limit", () => {
  const random = seeded(11);
  const rises: number[] = [];
  let open = 0;
  for (let k = 0; k < 16; k++) {
    const waters = Array.from({ length: 5 + k % 4 }, (_, i) => 11.5 + 1.9 * (i - (4 + k % 4) / 2)), dries = waters.map((w) => saturationCurve(w, SHAPE, GS, WATER) * (1 + 0.005 * random.normal()));
    const fitted = saturation.fit({ waters, dries, specificGravity: GS, waterDensity: WATER }, options);
    if (typeof fitted === "string") continue;
    const reckoning = fitted.reckon(), limit = 1.959963984540054 * reckoning.widening, bounded = reckoning.optimumWater.low !== null && reckoning.optimumWater.high !== null;
    for (const [which, own] of [["water", reckoning.optimumWater], ["dry", reckoning.maxDryDensity]] as const) for (const side of [-1, 1] as const) {
      const end = side < 0 ? own.low : own.high;
      if (end !== null) {
        rises.push(riseAt(fitted as FittedSaturation, waters, dries, which, end) / limit);
      } else if (which === "water") {
        open++;
        expect([k, side, riseAt(fitted as FittedSaturation, waters, dries, "water", side < 0 ? Math.min(...waters) : Math.max(...waters)) < 1.05 * limit]).toEqual([k, side, true]);
      } else expect([k, side, bounded]).toEqual([k, 1, false]);
    }
  }
  expect(rises.length).toBeGreaterThan(30);
  // a fit that stands on the bounds of its parameters has a profile with corners: there an end may be told on from the last place it reached
  expect(rises.filter((rise) => rise > 0.93 && rise < 1.07).length).toBeGreaterThanOrEqual(0.9 * rises.length);
  expect(Math.min(...rises)).toBeGreaterThan(0.6);
  expect(Math.max(...rises)).toBeLessThan(1.5);
  expect(open).toBeGreaterThan(1);
}, 60_000);

test("with few points or no gravity it says so, and its curve stays under the line on every published set", () => {
  expect(saturation.fit({ ...publishedTest("P"), specificGravity: undefined }, options)).toBe("not-enough");
  expect(saturation.fit({ ...publishedTest("O"), specificGravity: 2.7 }, options)).toBe("not-enough");
  for (const name of ["A", "L", "N"] as const) {
    const test = publishedTest(name), fitted = saturation.fit(test, options);
    if (typeof fitted === "string") throw new Error(`${name}: ${fitted}`);
    for (let w = Math.min(...test.waters); w <= Math.max(...test.waters); w += 0.1) expect(fitted.at(w)).toBeLessThanOrEqual(test.waterDensity / (w / 100 + 1 / test.specificGravity!) * (1 + 1e-12));
  }
});
