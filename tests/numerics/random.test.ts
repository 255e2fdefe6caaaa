import { bootstrap } from "../../src/numerics/bootstrap";
import { seeded } from "../../src/numerics/random";

test("the same seed draws the same numbers, another seed others", () => {
  const draw = (seed: number): number[] => { const random = seeded(seed); return Array.from({ length: 5 }, () => random.normal()); };
  expect(draw(7)).toEqual(draw(7));
  expect(draw(7)).not.toEqual(draw(8));
});

test("uniform and normal draws have the moments of their distributions", () => {
  const random = seeded(1), n = 200_000;
  let sum = 0, squares = 0, fourth = 0, uniform = 0, low = 1, high = 0;
  for (let i = 0; i < n; i++) {
    const z = random.normal(), u = random.uniform();
    sum += z; squares += z * z; fourth += z ** 4; uniform += u;
    low = Math.min(low, u); high = Math.max(high, u);
  }
  // five standard errors of each moment
  expect(Math.abs(sum / n)).toBeLessThan(5 / Math.sqrt(n));
  expect(Math.abs(squares / n - 1)).toBeLessThan(5 * Math.sqrt(2 / n));
  expect(Math.abs(fourth / n - 3)).toBeLessThan(5 * Math.sqrt(96 / n));
  expect(Math.abs(uniform / n - 0.5)).toBeLessThan(5 / Math.sqrt(12 * n));
  expect(low).toBeGreaterThan(0);
  expect(high).toBeLessThan(1);
});

test("a bootstrap of a mean gives its known interval, and an end that rests on no value is null", () => {
  const [mean, oneSided] = bootstrap(2, (random, into) => {
    let sum = 0;
    for (let i = 0; i < 4; i++) sum += random.normal();
    into[0] = 10 + sum / 4;
    into[1] = random.uniform() < 0.1 ? Infinity : random.uniform();
  }, { draws: 20_000, seed: 5, level: 0.95 });
  expect(Math.abs(mean!.low! - (10 - 0.98))).toBeLessThan(0.03);
  expect(Math.abs(mean!.high! - (10 + 0.98))).toBeLessThan(0.03);
  expect(oneSided!.low).toBeGreaterThan(0);
  expect(oneSided!.high).toBeNull();
});
