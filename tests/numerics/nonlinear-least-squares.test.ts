import fc from "fast-check";
import { fitNonlinear, type LeastSquaresModel } from "../../src/numerics/nonlinear-least-squares";

/** y = a exp(b x) at x = 0, 1, …; the residuals carry a shift so that the best curve does not pass through every point. */
function exponential(a: number, b: number, noise: readonly number[]): LeastSquaresModel {
  const measured = noise.map((shift, i) => a * Math.exp(b * i) + shift);
  return {
    points: noise.length, parameters: 2,
    evaluate([p, q], residuals, jacobian) {
      for (let i = 0; i < noise.length; i++) {
        const e = Math.exp(q! * i);
        residuals[i] = p! * e - measured[i]!;
        if (jacobian) { jacobian[2 * i] = e; jacobian[2 * i + 1] = p! * i * e; }
      }
    },
  };
}

test("data without error give the parameters back, from far starts", () => {
  let met = 0;
  fc.assert(fc.property(fc.double({ min: 0.5, max: 5, noNaN: true }), fc.double({ min: -0.6, max: 0.4, noNaN: true }), fc.double({ min: 0.1, max: 10, noNaN: true }), (a, b, start) => {
    const { parameters, converged } = fitNonlinear(exponential(a, b, new Array(7).fill(0)), [start, 0]);
    expect(converged).toBe(true);
    expect(parameters[0]! / a).toBeCloseTo(1, 8);
    expect(parameters[1]!).toBeCloseTo(b, 8);
    met++;
  }), { numRuns: 300, seed: 3 });
  expect(met).toBe(300);
});

test("bounds hold, and a parameter that presses against one ends on it with the rest at their best", () => {
  let bound = 0, inside = 0;
  fc.assert(fc.property(fc.double({ min: 0.5, max: 5, noNaN: true }), fc.double({ min: -0.6, max: 0.4, noNaN: true }), fc.array(fc.double({ min: -0.05, max: 0.05, noNaN: true }), { minLength: 6, maxLength: 9 }), (a, b, noise) => {
    const model = exponential(a, b, noise), high = 0.1;
    const { parameters, onBound, residuals, jacobian } = fitNonlinear(model, [1, 0], { low: [0, -0.3], high: [100, high] });
    expect(parameters[1]!).toBeLessThanOrEqual(high);
    expect(parameters[1]!).toBeGreaterThanOrEqual(-0.3);
    const slope = (j: number): number => residuals.reduce((sum, r, i) => sum + r * jacobian[2 * i + j]!, 0);
    const size = Math.sqrt(residuals.reduce((sum, r) => sum + r * r, 0)) + 1e-9;
    // first-order conditions: flat along what is free, uphill into a bound
    expect(Math.abs(slope(0))).toBeLessThan(1e-5 * size * 10 + 1e-7);
    if (onBound[1]) { bound++; expect(slope(1) * (parameters[1] === high ? -1 : 1)).toBeGreaterThan(-1e-6); } else { inside++; expect(Math.abs(slope(1))).toBeLessThan(1e-4 * size * 30 + 1e-6); }
  }), { numRuns: 800, seed: 4 });
  expect(bound).toBeGreaterThan(50);
  expect(inside).toBeGreaterThan(50);
});

test("a start outside the bounds is moved onto them", () => {
  const { parameters } = fitNonlinear(exponential(2, 0.1, [0, 0, 0, 0]), [50, 3], { low: [0, -1], high: [10, 1] });
  expect(parameters[0]).toBeCloseTo(2, 8);
});

test("parameters that the data cannot tell apart do not stop it", () => {
  const model: LeastSquaresModel = {
    points: 3, parameters: 2,
    evaluate([p, q], residuals, jacobian) { for (let i = 0; i < 3; i++) { residuals[i] = p! + q! - i; if (jacobian) { jacobian[2 * i] = 1; jacobian[2 * i + 1] = 1; } } },
  };
  const { parameters, converged } = fitNonlinear(model, [0, 0]);
  expect(converged).toBe(true);
  expect(parameters[0]! + parameters[1]!).toBeCloseTo(1, 8);
});

test("a programmer's mistakes are thrown", () => {
  expect(() => fitNonlinear(exponential(1, 1, [0, 0]), [1])).toThrow(/2 parameters/);
  expect(() => fitNonlinear(exponential(1, 1, [0, 0]), [1, 1e6])).toThrow(/not finite/);
});
