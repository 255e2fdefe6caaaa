import fc from "fast-check";
import { all, create } from "mathjs";
import type { Interval } from "../../src/formula/interval";
import { quantity } from "../../src/relations/quantities";
import { rangeOf, slopeOf, textOf, workingOf } from "../../src/relations/readings";
import { relation } from "../../src/relations/relation";
import { dryDensityFromWet, wetDensityFromDry } from "../../src/phase/density";
import { leastSpecificGravity, saturationLine } from "../../src/phase/lines";
import { allRelations } from "../relations-of-all-rooms";

const math = create(all!, {});

/** Where a relation has a pole, or a slope that changes its sign, its inputs keep clear of that. */
const CLEAR: Readonly<Record<string, { min: number; max: number }>> = {
  tare: { min: 1, max: 20 }, temperature: { min: 0, max: 40 }, loss: { min: 0, max: 60 }, airVoids: { min: 0, max: 60 }, wetBasisWater: { min: 0, max: 60 }, stonePercent: { min: 0, max: 60 },
  wholeWater: { min: 10, max: 40 }, fineWater: { min: 10, max: 40 }, stoneWater: { min: 0.5, max: 5 }, sandInCone: { min: 1, max: 10 }, sandUsed: { min: 20, max: 60 }, minDryDensity: { min: 1.1, max: 1.3 },
};
const inputRange = (id: string, beside: readonly string[]): { min: number; max: number } =>
  CLEAR[id] ?? (beside.includes("minDryDensity") ? id === "dryDensity" ? { min: 1.4, max: 1.6 } : { min: 1.7, max: 2 } : id.endsWith("Mass") || id === "mouldAndSoil" ? { min: 30, max: 60 } : { min: 1.1, max: 40 });

test("every relation of the project is met", () => expect(allRelations.length).toBeGreaterThanOrEqual(20));

/** Relations that turn: water at 4 °C, a blend where two waters meet. There the range holds every value, and may be wider than its corners. */
const TURNS = new Set(["densityOfWater", "waterOfBlend", "dryShareOfBlend", "moistShareOfBlend", "finesThatFill", "packedDensity"]);

describe.each(allRelations)("%s", (relationName, one) => {
  const node = math.parse(textOf(one)).compile();
  // hoisted: one symbolic derivative costs 8 ms
  const derivatives = Object.fromEntries(one.from.map((name) => [name, math.derivative(textOf(one), name).compile()]));
  const inputs = fc.record(Object.fromEntries(one.from.map((name) => [name, fc.double({ ...inputRange(name, one.from), noNaN: true })]))) as fc.Arbitrary<Record<string, number>>;
  const byPosition = one.by(...one.from);

  test("value, positional function and slopes agree with mathjs", () => {
    let met = 0;
    fc.assert(fc.property(inputs, (x) => {
      const expected = node.evaluate({ ...x }) as number;
      if (!Number.isFinite(expected)) return;
      met++;
      const scale = Math.max(1, Math.abs(expected));
      expect(Math.abs(one.value(x as never) - expected)).toBeLessThanOrEqual(1e-12 * scale);
      expect(byPosition(...one.from.map((name) => x[name]!))).toBe(one.value(x as never));
      for (const name of one.from) {
        const slope = derivatives[name]!.evaluate({ ...x }) as number;
        if (Number.isFinite(slope)) expect(Math.abs(slopeOf(one, name, x as never) - slope)).toBeLessThanOrEqual(1e-9 * Math.max(1, Math.abs(slope), scale));
      }
    }), { numRuns: 1500, seed: 7, endOnFailure: true });
    expect(met).toBeGreaterThan(1000);
  });

  test("the range holds every value in the box and is reached at its corners", () => {
    let met = 0;
    fc.assert(fc.property(inputs, fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 6, maxLength: 6 }), (x, shares) => {
      const box = Object.fromEntries(one.from.map((name) => [name, { low: x[name]! - 0.005, high: x[name]! + 0.005 } as Interval]));
      const range = rangeOf(one, box as never);
      if (!Number.isFinite(range.low) || !Number.isFinite(range.high)) return;
      const inside = one.value(Object.fromEntries(one.from.map((name, i) => [name, box[name]!.low + shares[i]! * 0.01])) as never);
      const slack = 1e-9 * Math.max(1, Math.abs(inside));
      expect(inside).toBeGreaterThanOrEqual(range.low - slack);
      expect(inside).toBeLessThanOrEqual(range.high + slack);
      if (TURNS.has(relationName)) return;
      met++;
      const corners = Array.from({ length: 1 << one.from.length }, (__, bits) => one.value(Object.fromEntries(one.from.map((name, i) => [name, bits >> i & 1 ? box[name]!.high : box[name]!.low])) as never));
      expect(Math.abs(range.low - Math.min(...corners))).toBeLessThanOrEqual(slack);
      expect(Math.abs(range.high - Math.max(...corners))).toBeLessThanOrEqual(slack);
    }), { numRuns: 1000, seed: 8, endOnFailure: true });
    if (!TURNS.has(relationName)) expect(met).toBeGreaterThan(500);
  });

  test("the working shows symbols, then numbers", () => {
    const working = workingOf(one, Object.fromEntries(one.from.map((name, i) => [name, String(i + 2)])) as never);
    for (const name of one.from) expect(working).toContain(quantity(name).symbol);
    expect(working).not.toMatch(/undefined|NaN/);
  });
});

test("the working reads as an engineer would write it", () => {
  expect(workingOf(dryDensityFromWet, { wetDensity: "2.05", waterContent: "12.5" })).toBe("ρ_d = ρ ÷ (1 + w ÷ 100) = 2.05 ÷ (1 + 12.5 ÷ 100)");
});

test("a solved relation undoes the one it came from", () => {
  expect(wetDensityFromDry.value({ dryDensity: dryDensityFromWet.value({ wetDensity: 2.05, waterContent: 12.5 }), waterContent: 12.5 })).toBeCloseTo(2.05, 12);
  expect(textOf(leastSpecificGravity)).toBe("1 / (waterDensity / dryDensity - waterContent / 100)");
  expect(() => saturationLine.solvedFor("dryDensity" as never)).toThrow(/exactly once/);
});

test("misuse is a compile error", () => {
  const misuse = [
    // @ts-expect-error an input is missing
    () => dryDensityFromWet.value({ wetDensity: 2 }),
    // @ts-expect-error tare is no input of this relation
    () => slopeOf(dryDensityFromWet, "tare", { wetDensity: 2, waterContent: 1 }),
    // @ts-expect-error a quantity is misspelt
    () => relation("dryDensity", "wetDensty / (1 + waterContent / 100)", { title: "none" }),
  ];
  expect(misuse).toHaveLength(3);
});
