import { once } from "../../src/worksheet/once";

test("the same arguments are computed once, by content", () => {
  let runs = 0;
  const sum = once((values: readonly number[], word: string) => { runs++; return `${word}${values.reduce((a, b) => a + b, 0)}`; });
  expect([sum([1, 2], "a"), sum([1, 2], "a"), sum([1, 2], "b")]).toEqual(["a3", "a3", "b3"]);
  expect(runs).toBe(2);
});

test("undefined, missing, −0 and NaN are not taken for each other", () => {
  let runs = 0;
  const count = once((_: unknown) => ++runs);
  for (const value of [0, -0, NaN, null, undefined, "nothing", Infinity]) count([value]);
  expect(runs).toBeGreaterThanOrEqual(6);
});

test("the oldest answer goes first when there are too many, one asked for again stays", () => {
  const runs: number[] = [];
  const keep = once((n: number) => { runs.push(n); return n; }, 2);
  keep(1); keep(2); keep(1); keep(3); keep(1); keep(2);
  expect(runs).toEqual([1, 2, 3, 2]);
});
