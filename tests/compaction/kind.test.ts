import { kindOfCurve, usualKinds } from "../../src/compaction/kind";
import { USUAL_SCATTER } from "../../src/compaction/scatter";
import { publishedTest, type SetName } from "../published/compaction-tests";

const of = (...dries: number[]) => ({ waters: dries.map((_, i) => 4 + 2 * i), dries });

test.each([
  ["a plain test", of(1.7, 1.75, 1.8, 1.75), "one peak"],
  ["sand that bulks", of(1.70, 1.62, 1.60, 1.66, 1.74, 1.70), "one and a half peaks"],
  ["two peaks", of(1.6, 1.7, 1.64, 1.72, 1.66), "two peaks"],
  ["a peak, and a rise at the end", of(1.7, 1.8, 1.7, 1.74), "two peaks"],
  ["flat", of(1.8, 1.801, 1.805, 1.8), "no distinct peak"],
  ["rising", of(1.6, 1.7, 1.8), "no distinct peak"],
  ["falling", of(1.8, 1.7, 1.6), "no distinct peak"],
  ["a valley", of(1.8, 1.7, 1.6, 1.7, 1.8), "no distinct peak"],
  ["a dip within the scatter", of(1.70, 1.78, 1.775, 1.80, 1.74), "one peak"],
] as [string, { waters: number[]; dries: number[] }, string][])("%s", (_, points, kind) => {
  expect(kindOfCurve(points, USUAL_SCATTER).kind).toBe(kind);
  // the order of the rows is nothing to the shape
  const order = points.waters.map((__, i) => i).reverse();
  expect(kindOfCurve({ waters: order.map((i) => points.waters[i]!), dries: order.map((i) => points.dries[i]!) }, USUAL_SCATTER).kind).toBe(kind);
});

test("every published test has one peak, also the one with two planted strays among 44 points", () => {
  for (const name of ["A", "C", "E", "G", "H", "L", "N", "O", "P", "R", "S"] as SetName[]) expect([name, kindOfCurve(publishedTest(name), USUAL_SCATTER).kind]).toEqual([name, "one peak"]);
});

test("the liquid limit tells what is usual", () => {
  expect(usualKinds(45)).toEqual(["one peak"]);
  expect(usualKinds(20)).toContain("one and a half peaks");
  expect(usualKinds(80)).toContain("no distinct peak");
});
