import { compareEfforts } from "../../src/compaction/efforts";
import type { Fit } from "../../src/compaction/fit";
import { fitTest } from "../../src/compaction/fit-test";

/** a parabola of seven points: narrow enough intervals to contradict */
function soil(optimum: number, most: number, gs: number | undefined = 2.7): Fit {
  const waters = [-6, -4, -2, 0, 2, 4, 6].map((step) => optimum + step), outcome = fitTest({ waters, dries: waters.map((w) => most - 0.004 * (w - optimum) ** 2), specificGravity: gs, waterDensity: 1 }, "parabola");
  if (!outcome.ok) throw new Error(outcome.noFit.says);
  return outcome.fit;
}

test("heavier compaction gains density and loses water, each step less: per ten times the effort", () => {
  const { tests, steps, contradictions, gainShrinks } = compareEfforts([{ id: "heavy", effort: 2700, fit: soil(11, 1.95) }, { id: "light", effort: 300, fit: soil(16, 1.75) }, { id: "standard", effort: 600, fit: soil(14, 1.85) }]);
  expect(tests.map(({ id }) => id)).toEqual(["light", "standard", "heavy"]);
  expect(steps.map(({ from, to }) => [from, to])).toEqual([["light", "standard"], ["standard", "heavy"]]);
  expect(steps[0]!.gainPerDecade).toBeCloseTo(0.10 / Math.log10(2), 6);
  expect(steps[1]!.waterPerDecade).toBeCloseTo(-3 / Math.log10(4.5), 6);
  expect(contradictions).toEqual([]);
  expect(gainShrinks).toBe(true);
});

test("a pair that says the contrary, beyond both intervals, is told; one within them is not", () => {
  const wrong = compareEfforts([{ id: "standard", effort: 600, fit: soil(12, 1.95) }, { id: "modified", effort: 2700, fit: soil(15, 1.80) }]);
  expect(wrong.contradictions).toEqual([expect.stringMatching(/modified is the heavier compaction, and yet its maximum dry density is below that of standard/), expect.stringMatching(/optimum is wetter than that of standard/)]);
  expect(wrong.gainShrinks).toBeNull();
  expect(compareEfforts([{ id: "standard", effort: 600, fit: soil(14.0, 1.850) }, { id: "modified", effort: 2700, fit: soil(14.1, 1.848) }]).contradictions).toEqual([]);
});

test("the optimums lie on a line of nearly constant saturation; it needs the specific gravity", () => {
  const { optimums } = compareEfforts([{ id: "standard", effort: 600, fit: soil(14, 1.85) }, { id: "modified", effort: 2700, fit: soil(11, 1.97) }]);
  // 100 w / (1 / 1.85 - 1 / 2.7) and its like, derived
  const s = (w: number, d: number): number => w / (1 / d - 1 / 2.7);
  expect(optimums!.saturation).toBeCloseTo((s(14, 1.85) + s(11, 1.97)) / 2, 6);
  expect(optimums!.at(12.5)).toBeGreaterThan(1.85);
  expect(optimums!.at(12.5)).toBeLessThan(1.97);
  // not given at all
  const bare = (optimum: number, most: number): Fit => ({ ...soil(optimum, most), test: { ...soil(optimum, most).test, specificGravity: undefined } });
  expect(compareEfforts([{ id: "standard", effort: 600, fit: bare(14, 1.85) }, { id: "modified", effort: 2700, fit: bare(11, 1.97) }]).optimums).toBeNull();
});
