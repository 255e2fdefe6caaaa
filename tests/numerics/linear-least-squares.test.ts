import fc from "fast-check";
import { add, exactly, multiply, negative, plain } from "../../src/numerics/double-double";
import { powers, solveLinear } from "../../src/numerics/linear-least-squares";
import { fitPolynomial, scaled, valueAt } from "../../src/numerics/polynomial";

test("sums and products keep what doubles would lose", () => {
  expect(plain(add(add(exactly(1e16), exactly(1)), exactly(-1e16)))).toBe(1);
  // (1 + 2^-30)² − 1 − 2^-29 is 2^-60, which a double's product drops
  const x = exactly(1 + 2 ** -30);
  expect(plain(add(multiply(x, x), negative(add(exactly(1), exactly(2 ** -29)))))).toBe(2 ** -60);
});

test("it agrees with the fast polynomial fit where both are good", () => {
  let met = 0;
  fc.assert(fc.property(fc.uniqueArray(fc.integer({ min: 50, max: 300 }), { minLength: 6, maxLength: 10 }), fc.array(fc.double({ min: 1.4, max: 2.2, noNaN: true }), { minLength: 10, maxLength: 10 }), (tenths, ys) => {
    const x = tenths.map((one) => one / 10), y = ys.slice(0, x.length), fit = fitPolynomial(x, y, 3);
    const { coefficients, sumOfSquares } = solveLinear(powers(x, [0, 1, 2, 3]), y);
    for (const value of x) expect(coefficients.reduce((sum, c, k) => sum + c * value ** k, 0)).toBeCloseTo(valueAt(fit, scaled(fit, value)), 8);
    expect(sumOfSquares).toBeCloseTo(fit.sumOfSquares, 10);
    met++;
  }), { numRuns: 200, seed: 6 });
  expect(met).toBe(200);
});

test("columns that do not determine the answer are a programmer's mistake", () => {
  expect(() => solveLinear(powers([1, 2], [0, 1, 2]), [1, 2])).toThrow(/3 coefficients/);
  expect(() => solveLinear([[exactly(1), exactly(2)], [exactly(2), exactly(4)]], [1, 2])).toThrow(/do not determine/);
});
