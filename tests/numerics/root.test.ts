import { rootBetween } from "../../src/numerics/root";

test.each([
  ["a line", (x: number) => x - 0.3, 0, 1, 0.3], ["a cube root", (x: number) => Math.cbrt(x - 2), 0, 7, 2],
  ["a steep exponential", (x: number) => Math.exp(20 * x) - 5, -2, 3, Math.log(5) / 20], ["a step", (x: number) => x < 0.7 ? -1 : 1, 0, 1, 0.7], ["an end", (x: number) => x, 0, 1, 0],
] as [string, (x: number) => number, number, number, number][])("finds the root of %s", (_, f, low, high, root) => expect(Math.abs(rootBetween(f, low, high, 1e-12) - root)).toBeLessThan(1e-11));
