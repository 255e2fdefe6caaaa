import { scaled, valueAt } from "../../src/numerics/polynomial";
import { bisquare, medianScale, robustPolynomial } from "../../src/numerics/robust";
import { publishedTest } from "../published/compaction-tests";

test("bisquare weighs 1 at nothing and nothing from its cut on", () => {
  expect(bisquare(0, 1)).toBe(1);
  expect(bisquare(4.685, 1)).toBe(0);
  expect(bisquare(-4.685 / 2, 1)).toBeCloseTo(0.5625, 12);
});

test("the median scale is the standard deviation of normal errors", () => {
  // quartiles of the normal distribution: ±0.6745
  expect(medianScale([-0.6745, 0.6745, 0.6745], 1)).toBeCloseTo(1, 12);
  expect(medianScale([], 0)).toBe(0);
});

test("two planted strays do not move a parabola of 44 points (published exercise: drop them, then 13.945 % and 1.7515)", () => {
  const { waters, dries } = publishedTest("R"), { fit, weights } = robustPolynomial(waters, dries, 2, 0.001)!;
  const [, b, c] = fit.coefficients as unknown as [number, number, number], u = -b / (2 * c);
  expect(Math.abs(fit.centre + u * fit.halfWidth - 13.945)).toBeLessThan(0.1);
  expect(Math.abs(valueAt(fit, u) - 1.7515)).toBeLessThan(0.003);
  expect(weights.flatMap((weight, i) => weight < 1e-6 ? [waters[i]] : [])).toEqual([10.77, 16.57]);
});

test("points on a curve stay on it", () => {
  const x = [8, 10, 12, 14, 16, 18], y = x.map((w) => 1.8 - 0.004 * (w - 13) ** 2), { fit, weights } = robustPolynomial(x, y, 2, 0.005)!;
  x.forEach((w, i) => expect(valueAt(fit, scaled(fit, w))).toBeCloseTo(y[i]!, 10));
  for (const weight of weights) expect(weight).toBeGreaterThan(0.99);
});
