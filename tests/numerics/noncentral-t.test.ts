import { studentCdf } from "../../src/numerics/distributions";
import { noncentralStudentCdf, noncentralStudentQuantile, normalCdf } from "../../src/numerics/noncentral-t";

/** Another way to the same number: the definition, integrated over the chi-square variable by Simpson's rule. */
function byIntegration(t: number, degrees: number, shift: number): number {
  // u = sqrt(chi-square / degrees), density c u^(degrees-1) exp(-degrees u²/2)
  const density = (u: number): number => u === 0 && degrees > 1 ? 0 : Math.exp((degrees - 1) * Math.log(u || 1) - degrees * u * u / 2);
  const steps = 4_000, to = 8, h = to / steps;
  let area = 0, weighed = 0;
  for (let i = 0; i <= steps; i++) {
    const u = i * h, weight = (i === 0 || i === steps ? 1 : i % 2 === 1 ? 4 : 2) * density(u);
    area += weight;
    weighed += weight * normalCdf(t * u - shift);
  }
  return weighed / area;
}

test("the normal distribution's table values (Abramowitz and Stegun, table 26.1)", () => {
  for (const [z, below] of [[0, 0.5], [0.5, 0.691462461274013], [1, 0.841344746068543], [2, 0.977249868051821], [3, 0.998650101968370], [4, 0.999968328758167]] as const) {
    expect(Math.abs(normalCdf(z) - below)).toBeLessThan(1e-14);
    expect(Math.abs(normalCdf(-z) - (1 - below))).toBeLessThan(1e-14);
  }
  expect(normalCdf(-10) / 7.619853024160527e-24).toBeCloseTo(1, 12);
});

test("without a shift it is Student's", () => {
  for (const degrees of [1, 3, 9, 40]) for (const t of [-4, -0.5, 0, 1.3, 12]) expect(noncentralStudentCdf(t, degrees, 0)).toBe(studentCdf(t, degrees));
  for (const t of [-2, 0.7, 3]) expect(Math.abs(noncentralStudentCdf(t, 6, 1e-9) - studentCdf(t, 6))).toBeLessThan(1e-8);
});

test.each([1, 2, 4, 9, 30, 200])("%s degrees: the definition integrated by another rule", (degrees) => {
  for (const shift of [-3, -0.4, 0.4, 1.5, 4, 9, 40]) for (const t of [-3, -0.3, 0, 0.8, 2, 5, 12, 45])
    expect(Math.abs(noncentralStudentCdf(t, degrees, shift) - byIntegration(t, degrees, shift))).toBeLessThan(degrees === 1 ? 2e-6 : degrees === 2 ? 1e-8 : 1e-10);
});

test("factor of the characteristic value, 10 % below the limit at a risk of 10 %: the Australian table for 2 to 10 tests (from memory)", () => {
  const table = [0.403, 0.535, 0.617, 0.675, 0.719, 0.755, 0.783, 0.808, 0.828], z10 = 1.2815515655446004;
  table.forEach((k, i) => {
    const n = i + 2;
    // accepted 90 times of 100: P(mean − k s above the limit) where 10 % of the lot lies below it
    expect(Math.abs(noncentralStudentQuantile(0.1, n - 1, z10 * Math.sqrt(n)) / Math.sqrt(n) - k)).toBeLessThan(0.00051);
  });
});

test("a quantile is where its probability is", () => {
  for (const degrees of [1, 4, 25]) for (const shift of [-2, 0.5, 6]) for (const below of [0.001, 0.1, 0.5, 0.9, 0.999]) {
    const t = noncentralStudentQuantile(below, degrees, shift);
    expect(Math.abs(noncentralStudentCdf(t, degrees, shift) - below)).toBeLessThan(1e-9);
  }
});
