import { diag, inv, matrix, multiply, transpose } from "mathjs";
import { seeded } from "../../src/numerics/random";
import type { CompactionTest, CurveWord, FitOutcome } from "../../src/compaction/fit";
import { fitTest } from "../../src/compaction/fit-test";
import { publishedTest } from "../published/compaction-tests";

const of = (waters: number[], dries: number[], more: Partial<CompactionTest> = {}): CompactionTest => ({ waters, dries, waterDensity: 1, ...more });
const why = (outcome: FitOutcome): string => outcome.ok ? `fit by ${outcome.fit.curve}` : outcome.noFit.why;
const fit = (test: CompactionTest, curve: CurveWord = "auto") => {
  const outcome = fitTest(test, curve);
  if (!outcome.ok) throw new Error(outcome.noFit.says);
  return outcome.fit;
};

describe("where there is no peak, it says what to do instead of showing one", () => {
  test.each([
    ["no points", of([], []), "auto", "too-few-points", /no points/],
    ["one point", of([12], [1.8]), "auto", "too-few-points", /one point/],
    ["two points only", of([12, 14], [1.8, 1.85]), "parabola", "too-few-points", /only two points/],
    ["two water contents", of([12, 12, 14, 14], [1.8, 1.81, 1.85, 1.84]), "auto", "too-few-points", /two different water contents/],
    ["one water content", of([12, 12, 12, 12], [1.8, 1.81, 1.85, 1.84]), "auto", "no-spread", /same water content/],
    ["identical points", of([12, 12, 12], [1.8, 1.8, 1.8]), "auto", "no-spread", /same water content/],
    ["a cubic on three water contents", of([12, 14, 16], [1.8, 1.85, 1.8]), "cubic", "too-few-points", /at least four/],
    ["all dry of optimum", of([8, 10, 12, 14], [1.6, 1.7, 1.78, 1.84]), "auto", "rising", /wetter/],
    ["all wet of optimum", of([14, 16, 18, 20], [1.84, 1.78, 1.7, 1.6]), "auto", "falling", /drier/],
    ["rising, by the top three", of([8, 10, 12, 14], [1.6, 1.7, 1.78, 1.84]), "top three", "rising", /wetter/],
    ["flat", of([8, 10, 12, 14], [1.8, 1.8005, 1.8004, 1.8001]), "parabola", "flat", /no peak to find/],
    ["exactly flat", of([8, 10, 12, 14], [1.8, 1.8, 1.8, 1.8]), "auto", "flat", /no peak to find/],
    ["a valley", of([8, 10, 12, 14, 16], [1.84, 1.78, 1.75, 1.79, 1.839]), "auto", "falling", /drier/],
    ["a valley with a bump inside", of([8, 9, 10, 12, 14, 16], [1.80, 1.815, 1.75, 1.74, 1.77, 1.805]), "parabola", "valley", /valley/],
    ["clean sand that bulks", of([0.2, 4, 6, 10, 14, 17], [1.70, 1.62, 1.60, 1.66, 1.745, 1.71]), "parabola", "not-one-peak", /one and a half peaks\. Clean sand bulks so: judge it by relative density/],
    // a quartic would follow these points to 14.9 %: they are sent to relative density all the same
    ["clean sand that bulks, which a quartic would follow", of([0.5, 4, 6, 10, 14, 17], [1.70, 1.62, 1.60, 1.66, 1.745, 1.71]), "auto", "not-one-peak", /judge it by relative density/],
    ["two peaks", of([8, 10, 12, 14, 16], [1.6, 1.75, 1.64, 1.76, 1.66]), "auto", "not-one-peak", /two peaks, at 10 and 14 %, with a dip at 12 %/],
    ["a peaky set", publishedTest("E"), "auto", "no-curve-follows", /misses the point/],
    ["every curve past the line", publishedTest("G"), "auto", "no-curve-follows", /zero-air-voids line for a specific gravity of 2.65/],
  ] as [string, CompactionTest, CurveWord, string, RegExp][])("%s", (_, test, curve, reason, says) => {
    const outcome = fitTest(test, curve);
    expect(why(outcome)).toBe(reason);
    expect(outcome.ok ? "" : outcome.noFit.says).toMatch(says);
    expect(outcome.ok ? "" : outcome.noFit.says).not.toMatch(/NaN|undefined|Infinity/);
  });
});

describe("auto says which curve it took and why", () => {
  test("the parabola where the cubic is no better", () => {
    const one = fit(of([10, 12, 14, 16, 18], [1.771, 1.827, 1.853, 1.829, 1.773]));
    expect(one.curve).toBe("parabola");
    expect(one.reason).toMatch(/weighs least: \d+\.\d against \d+\.\d for the cubic/);
  });
  test("the plainer curve where the difference tells nothing", () => expect(fit(publishedTest("A")).reason).toMatch(/the plainer curve, and as good: 9\.9 against 10\.4 for the saturation curve; 9\.4 for the cubic/));
  test("the curve bounded by the line before a cubic as good", () => expect(fit(publishedTest("L")).reason).toMatch(/as good: 8\.4 against 14\.8 for the parabola; 8\.0 for the cubic/));
  test("the cubic where it is clearly better and no specific gravity is known", () => expect(fit({ ...publishedTest("L"), specificGravity: undefined }).reason).toMatch(/weighs least: 8\.0 against 14\.8 for the parabola/));
  test("four points leave a cubic no spare point", () => expect(fit(publishedTest("P")).reason).toMatch(/only curve admitted \(cubic: no spare point; quartic: too few points\)/));
  test("three points have one parabola", () => expect(fit(publishedTest("S")).reason).toMatch(/three points/));
});

describe("intervals", () => {
  test("without a spare point they rest on a stated scatter, and say so", () => {
    for (const one of [fit(publishedTest("S")), fit(publishedTest("A"), "top three"), fit(publishedTest("P"), "cubic")]) {
      expect(one.intervalFrom).toBe("stated scatter");
      expect(one.standardError).toBeNull();
      expect(one.intervalNote).toMatch(/stated scatter of 0\.4 % in wet density and 0\.3 points in water content: no point is left over/);
    }
  });
  test("an end that the data do not bound is null, and said in words", () => {
    const one = fit(of([11, 12, 13, 14], [1.846, 1.85, 1.8505, 1.847]), "parabola");
    expect(one.optimumWater).toEqual(expect.objectContaining({ low: null, high: null }));
    expect(one.maxDryDensity.high).toBeNull();
    expect(one.maxDryDensity.low).toBeLessThan(one.maxDryDensity.value);
    expect(one.intervalNote).toMatch(/not located within these data/);
  });
  test("a parabola's optimum has Fieller's interval, from the doubt of every reading", () => {
    const test = of([10, 12, 14, 16, 18], [1.771, 1.827, 1.853, 1.829, 1.773]), { optimumWater, at } = fit(test, "parabola");
    // the formula of Fieller (1954) with the covariance (XᵀX)⁻¹XᵀΣX(XᵀX)⁻¹ by a general library, in x = w − 14
    const x = test.waters.map((w) => w - 14), design = matrix(x.map((one) => [1, one, one * one])), h = 1e-5;
    const sigma = test.waters.map((w, i) => ((at(w + h) - at(w - h)) / (2 * h) + test.dries[i]! / (100 + w)) ** 2 * 0.3 ** 2 + (0.004 * test.dries[i]!) ** 2);
    const normal = inv(multiply(transpose(design), design)), pull = multiply(normal, transpose(design));
    const covariance = multiply(multiply(pull, diag(sigma)), transpose(pull)).toArray() as number[][];
    const [, b, c] = multiply(pull, matrix([...test.dries])).toArray() as number[];
    const k2 = 1.959963984540054 ** 2, p = 4 * c! * c! - 4 * k2 * covariance[2]![2]!, q = 4 * b! * c! - 4 * k2 * covariance[1]![2]!, r = b! * b! - k2 * covariance[1]![1]!, root = Math.sqrt(q * q - 4 * p * r);
    expect(optimumWater.low! - 14).toBeCloseTo((-q - root) / (2 * p), 6);
    expect(optimumWater.high! - 14).toBeCloseTo((-q + root) / (2 * p), 6);
  });
  test("points that scatter more than their readings' doubts say widen it, and it says so", () => {
    const calm = fit(of([9, 11, 13, 15, 17, 19], [1.72, 1.80, 1.843, 1.845, 1.805, 1.725]), "parabola"), wild = fit(of([9, 11, 13, 15, 17, 19], [1.72, 1.83, 1.80, 1.88, 1.79, 1.725]), "parabola");
    expect(calm.widening).toBe(1);
    expect(wild.widening).toBeGreaterThan(1.5);
    expect(wild.intervalNote).toMatch(/widened \d\.\d times because the points scatter more/);
    expect(wild.optimumWater.high! - wild.optimumWater.low!).toBeGreaterThan(calm.optimumWater.high! - calm.optimumWater.low!);
  });
  test.each([["parabola", false], ["parabola", true], ["cubic", false], ["smooth", false]] as [CurveWord, boolean][])("95 %% intervals of the %s (weighed: %s) hold the truth: seeded, 7 points, 0.4 %% and 0.3 points of scatter", (curve, weigh) => {
    const random = seeded(2026), runs = curve === "smooth" ? 300 : 2000;
    let water = 0, density = 0, fitted = 0;
    for (let run = 0; run < runs; run++) {
      const truth = [8, 10, 12, 14, 16, 18, 20].map((w) => ({ w, wet: (1.85 - 0.005 * (w - 14) ** 2) * (1 + w / 100) * (1 + 0.004 * random.normal()), read: w + 0.3 * random.normal() }));
      const outcome = fitTest(of(truth.map(({ read }) => read), truth.map(({ wet, read }) => wet / (1 + read / 100))), curve, { weigh });
      if (!outcome.ok) continue;
      fitted++;
      const { optimumWater, maxDryDensity } = outcome.fit;
      if (14 >= (optimumWater.low ?? -Infinity) && 14 <= (optimumWater.high ?? Infinity)) water++;
      if (1.85 >= (maxDryDensity.low ?? -Infinity) && 1.85 <= (maxDryDensity.high ?? Infinity)) density++;
    }
    expect(fitted).toBeGreaterThan(0.98 * runs);
    const least = curve === "smooth" ? [0.9, 0.9] : [0.93, 0.93];
    expect(water / fitted).toBeGreaterThan(least[0]!);
    expect(density / fitted).toBeGreaterThan(least[1]!);
    if (curve !== "smooth") expect(Math.max(water, density) / fitted).toBeLessThan(0.98);
  });
  test("an interval joined with the doubt about the curve holds the own one", () => {
    const one = fit(publishedTest("A"));
    expect(one.otherCurves.map(({ curve }) => curve)).toEqual(["saturation", "cubic", "quartic"]);
    expect(one.joined().optimumWater.low ?? -Infinity).toBeLessThanOrEqual(one.optimumWater.low!);
    expect(one.joined().optimumWater.high ?? Infinity).toBeGreaterThanOrEqual(one.optimumWater.high!);
  });
});

describe("every curve by its name", () => {
  const N = { ...publishedTest("N"), specificGravity: 2.85 };
  test.each(["parabola", "cubic", "quartic", "saturation", "top three", "smooth"] as CurveWord[])("the %s finds the peak of the smoothest published set (N: 13.9 to 14.1 %, 1960 to 1961)", (curve) => {
    const one = fit(N, curve);
    expect(one.curve).toBe(curve);
    expect(one.optimumWater.value).toBeGreaterThan(13.6);
    expect(one.optimumWater.value).toBeLessThan(14.4);
    expect(one.maxDryDensity.value).toBeGreaterThan(1957.5);
    expect(one.maxDryDensity.value).toBeLessThan(1963.0);
    expect(one.optimumWater.low ?? -Infinity).toBeLessThan(one.optimumWater.value);
    expect(one.optimumWater.high ?? Infinity).toBeGreaterThan(one.optimumWater.value);
    expect(one.maxDryDensity.low!).toBeLessThan(one.maxDryDensity.value);
  });
  test("a quartic through five points is theirs (A, recomputed: 12.10/1.972, derived)", () => {
    const { optimumWater, maxDryDensity } = fit(publishedTest("A"), "quartic");
    expect(optimumWater.value).toBeCloseTo(12.10, 2);
    expect(maxDryDensity.value).toBeCloseTo(1.972, 3);
  });
  test("the saturation curve needs the specific gravity, and says so", () => {
    const outcome = fitTest(publishedTest("P"), "saturation");
    expect(why(outcome)).toBe("needs-gravity");
    expect(outcome.ok ? "" : outcome.noFit.says).toMatch(/give the specific gravity/);
  });
  test("the smooth curve passes through its points and keeps their shape", () => {
    const test = publishedTest("E"), one = fit(test, "smooth");
    test.waters.forEach((w, i) => expect(one.at(w)).toBeCloseTo(test.dries[i]!, 12));
    let turns = 0, before = one.at(8.4);
    let rising = true;
    for (let w = 8.45; w <= 16.8; w += 0.05) {
      const now = one.at(w);
      if (now > before !== rising) { turns++; rising = now > before; }
      before = now;
    }
    expect(turns).toBe(1);
  });
  test("leave one out tells the peak without each point", () => {
    const test = publishedTest("N");
    for (const curve of ["parabola", "cubic", "saturation"] as CurveWord[]) {
      const one = fit(test, curve), table = one.leaveOneOut();
      expect(table).toHaveLength(5);
      table.forEach((peak, i) => {
        const again = fitTest({ ...test, waters: test.waters.filter((_, k) => k !== i), dries: test.dries.filter((_, k) => k !== i) }, curve);
        expect(peak === null).toBe(!again.ok);
        if (peak && again.ok && curve !== "saturation") expect(peak).toEqual({ water: again.fit.optimumWater.value, dry: again.fit.maxDryDensity.value });
        if (peak && again.ok && curve === "saturation") expect(Math.abs(peak.water - again.fit.optimumWater.value)).toBeLessThan(0.5);
      });
    }
  });
});

test("the curve's band narrows to its points and holds the curve", () => {
  const one = fit(publishedTest("P"));
  for (const w of [9, 10, 11, 12, 13]) {
    const { low, high } = one.bandAt(w);
    expect(low).toBeLessThan(one.at(w));
    expect(high).toBeGreaterThan(one.at(w));
  }
});

test("saturation and air voids at the optimum need the specific gravity", () => {
  expect(fit(publishedTest("P")).saturationAtOptimum).toBeNull();
  const { saturationAtOptimum, airVoidsAtOptimum } = fit({ ...publishedTest("P"), specificGravity: 2.65 });
  // about 91 % at the published peak of 2.01 and 11.0 % (derived by definition); the fit lies 0.1 points wetter
  expect(Math.abs(saturationAtOptimum! - 91)).toBeLessThan(1);
  expect(airVoidsAtOptimum).toBeGreaterThan(0);
});
