import fc from "fast-check";
import { Matrix, QrDecomposition } from "ml-matrix";
import { linearRegression, linearRegressionLine } from "simple-statistics";
import { curvatureAt, fitPolynomial, scaled, slopeAt, spreadAt, unscaled, valueAt } from "../../src/numerics/polynomial";
import nist from "../published/data/nist-linear.json";

const points = fc.uniqueArray(fc.integer({ min: 20, max: 300 }), { minLength: 5, maxLength: 9 }).chain((tenths) => fc.tuple(
  fc.constant(tenths.map((x) => x / 10)), fc.array(fc.double({ min: 1.4, max: 2.2, noNaN: true }), { minLength: tenths.length, maxLength: tenths.length })));

test("values agree with ml-matrix's QR on random tests, degree 2 and 3", () => {
  let met = 0;
  fc.assert(fc.property(points, fc.constantFrom(2, 3), ([x, y], degree) => {
    const fit = fitPolynomial(x, y, degree);
    const design = new Matrix(x.map((value) => Array.from({ length: degree + 1 }, (_, k) => scaled(fit, value) ** k)));
    const other = new QrDecomposition(design).solve(Matrix.columnVector(y)).to1DArray();
    const at = (u: number): number => other.reduce((sum, c, k) => sum + c * u ** k, 0);
    for (const value of x) expect(valueAt(fit, scaled(fit, value))).toBeCloseTo(at(scaled(fit, value)), 9);
    expect(fit.sumOfSquares).toBeCloseTo(x.reduce((sum, value, i) => sum + (y[i]! - at(scaled(fit, value))) ** 2, 0), 9);
    met++;
  }), { numRuns: 500, seed: 21 });
  expect(met).toBe(500);
});

test("a straight line agrees with simple-statistics", () => {
  const x = [8.6, 10.6, 12.5, 14.9, 16.7], y = [102.2, 112.6, 125.1, 120.6, 103.3], fit = fitPolynomial(x, y, 1);
  const line = linearRegressionLine(linearRegression(x.map((value, i) => [value, y[i]!])));
  for (const value of x) expect(valueAt(fit, scaled(fit, value))).toBeCloseTo(line(value), 10);
});

test("slope, curvature and their spread agree with differences and with the covariance written out", () => {
  const x = [9, 10, 12, 13, 15, 18], y = [1.7, 1.75, 1.83, 1.84, 1.8, 1.69], fit = fitPolynomial(x, y, 3), h = 1e-5;
  for (const u of [-0.8, -0.1, 0.4, 0.9]) {
    expect(slopeAt(fit, u)).toBeCloseTo((valueAt(fit, u + h) - valueAt(fit, u - h)) / (2 * h), 7);
    expect(curvatureAt(fit, u)).toBeCloseTo((slopeAt(fit, u + h) - slopeAt(fit, u - h)) / (2 * h), 6);
    const design = new Matrix(x.map((value) => [0, 1, 2, 3].map((k) => scaled(fit, value) ** k)));
    const covariance = new Matrix(new QrDecomposition(design.transpose().mmul(design)).solve(Matrix.eye(4)));
    const g0 = Matrix.rowVector([1, u, u * u, u ** 3]), g1 = Matrix.rowVector([0, 1, 2 * u, 3 * u * u]);
    const spread = spreadAt(fit, u), form = (a: Matrix, b: Matrix): number => a.mmul(covariance).mmul(b.transpose()).get(0, 0);
    expect(spread.value).toBeCloseTo(form(g0, g0), 8);
    expect(spread.slope).toBeCloseTo(form(g1, g1), 7);
    expect(spread.both).toBeCloseTo(form(g0, g1), 8);
  }
  expect(unscaled(fit, scaled(fit, 11.3))).toBeCloseTo(11.3, 12);
});

describe("NIST Statistical Reference Datasets, linear: residual sum of squares and fitted values", () => {
  // coefficients of powers of x are had from ours only with loss on the hardest sets; what we use are values and residuals
  const sets = Object.entries(nist as unknown as Record<string, { powers: number[]; certified: number[]; rss: number; x: number[] | number[][]; y: number[] }>)
    .filter(([name]) => ["Norris", "Pontius", "Wampler1", "Wampler2", "Wampler3", "Wampler4", "Wampler5", "Filip"].includes(name));
  test("all eight polynomial sets are there", () => expect(sets).toHaveLength(8));
  test.each(sets)("%s", (_, { powers, certified, rss, x, y }) => {
    const xs = (x as (number | number[])[]).map((one) => Array.isArray(one) ? one[0]! : one), fit = fitPolynomial(xs, y, powers[powers.length - 1]!);
    if (rss > 1e-10) expect(Math.abs(fit.sumOfSquares / rss - 1)).toBeLessThan(1e-7);
    const size = Math.max(...y.map(Math.abs));
    if (powers.length < 7) for (const value of xs) expect(Math.abs(valueAt(fit, scaled(fit, value)) - certified.reduce((sum, c, k) => sum + c * value ** powers[k]!, 0)) / size).toBeLessThan(1e-9);
  });
});

test("too few points, or too few different x, are a programmer's mistake", () => {
  expect(() => fitPolynomial([1, 2], [1, 2], 2)).toThrow(/3 coefficients/);
  expect(() => fitPolynomial([1, 2, 2, 1], [1, 2, 2, 1], 2)).toThrow(/different x/);
});
