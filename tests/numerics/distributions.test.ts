import { readFileSync } from "node:fs";
import path from "node:path";
import { incompleteBeta, logGamma, NORMAL_95, studentCdf, studentQuantile } from "../../src/numerics/distributions";

/** Values from a 50-digit computation (general-purpose arbitrary-precision library); the grid stands beside. */
const grid = JSON.parse(readFileSync(path.join(__dirname, "../published/data/distributions.json"), "utf8")) as {
  incompleteBeta: { a: number; b: number; x: number; value: number }[]; tQuantile: { nu: number; p: number; value: number }[]; tCdf: { nu: number; t: number; value: number }[];
};
const wrong = (got: number, value: number): number => Math.abs(got / value - 1);

/** least positive number with all its digits: below it a value is not representable to the accuracy asked for */
const SMALLEST = 2.3e-308;

test("incomplete beta over the whole grid, to 1e-12 where the value is representable", () => {
  const cases = grid.incompleteBeta.filter(({ value }) => value > SMALLEST);
  expect(cases.length).toBeGreaterThan(300);
  expect(cases.filter(({ a, b, x, value }) => !(wrong(incompleteBeta(x, a, b), value) < 1e-12))).toEqual([]);
});

test("Student t over the whole grid, to 1e-12", () => {
  const cases = grid.tCdf.filter(({ value }) => value > SMALLEST);
  expect(cases.length).toBeGreaterThan(200);
  expect(cases.filter(({ nu, t, value }) => !(wrong(studentCdf(t, nu), value) < 1e-12))).toEqual([]);
});

test("Student quantiles over the whole grid, to 1e-12", () => {
  const cases = grid.tQuantile.filter(({ p }) => p !== 0.5);
  expect(cases.length).toBeGreaterThan(250);
  const quantile = (p: number, nu: number): number => p < 0.5 ? -studentQuantile(p, nu) : studentQuantile(1 - p, nu);
  expect(cases.filter(({ nu, p, value }) => !(wrong(quantile(p, nu), value) < 1e-12)).map((one) => ({ ...one, got: quantile(one.p, one.nu) }))).toEqual([]);
});

// standard tables of the t distribution, two-sided 95 % (any statistics text)
test.each([[1, 12.706], [2, 4.303], [3, 3.182], [4, 2.776], [5, 2.571], [10, 2.228], [30, 2.042], [120, 1.980]])("t at %d degrees is %d", (degrees, t) => expect(studentQuantile(0.025, degrees)).toBeCloseTo(t, 3));

test("quantile undoes the distribution", () => {
  for (const degrees of [1, 2, 3, 7, 40]) for (const above of [0.4, 0.1, 0.025, 1e-4, 1e-7]) expect(1 - studentCdf(studentQuantile(above, degrees), degrees)).toBeCloseTo(above, 11);
});

test("many degrees of freedom come to the normal deviate", () => expect(studentQuantile(0.025, 1e7)).toBeCloseTo(NORMAL_95, 6));

test.each([[1, 0], [2, 0], [5, Math.log(24)], [0.5, 0.5 * Math.log(Math.PI)], [11, Math.log(3628800)]])("log gamma of %d", (x, value) => expect(logGamma(x)).toBeCloseTo(value, 12));
