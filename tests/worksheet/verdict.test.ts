import { CellError, type Block, type Cell } from "../../src/worksheet/cell";
import { fillVerdict } from "../../src/worksheet/verdict";

const at = (value: unknown): Block | null => value === null ? null : [[value]];
const verdict = (dry: unknown, water: unknown, zone: unknown, gs: unknown = null, density: unknown = null): Cell => {
  const answer = fillVerdict(at(dry), at(water), at(1.9), at(14), at(zone), at(gs), at(density));
  return answer instanceof CellError ? answer : answer[0]![0]!;
};

test("a pass, and every reason against one", () => {
  expect(verdict(1.85, 13, "RC >= 95; gap -2..+2")).toBe("pass");
  expect(verdict(1.75, 17, "RC >= 95; gap -2..+2")).toBe("RC 92.11 % is below 95; gap 3 points is above 2");
  // by definition: e = 2.7/1.75 - 1 = 0.54286, S = 27/0.54286 = 49.74 %, A = 100 (1 - 1.75 (1/2.7 + 0.10)) = 17.69 %
  expect(verdict(1.75, 10, "air <= 10; saturation >= 60", 2.7, 1)).toBe("air 17.69 % is above 10; saturation 49.74 % is below 60");
  expect(verdict(1.85, 13, "ratio 95..115; water >= 8; dry 1.8..2.0")).toBe("ratio 92.86 % of optimum is below 95");
});

test("figures are judged as calculated; what the specification says of rounding is done, and nothing else", () => {
  // 100 x 1.8045 / 1.9 = 94.974
  expect(verdict(1.8045, 14, "RC >= 95")).toBe("RC 94.97 % is below 95 (it would pass only by rounding)");
  expect(verdict(1.8045, 14, "RC >= 95; round 1")).toBe("pass");
  expect(verdict(1.8045, 14, "RC >= 95; round 0.01")).toBe("RC 94.97 % is below 95");
  expect(verdict(1.79, 14, "RC >= 95")).toBe("RC 94.21 % is below 95");
});

test("a column of tests against one reference and one zone", () => {
  expect(fillVerdict([["dry"], [1.85], [""], [1.7]], [["w"], [13], [""], [13]], at(1.9), at(14), at("RC >= 95"), null, null)).toEqual([[""], ["pass"], [""], ["RC 89.47 % is below 95"]]);
});

test.each([
  [[1.85, 13, "RC > 95"], /clause 1/], [[1.85, 13, 95], /must be a text such as/], [[1.85, 13, "air <= 10"], /needs the specific gravity/], [[18.5, 13, "RC >= 95"], /same unit/], [[1.85, 0.13, "RC >= 95"], /below 1/], [[1.85, 13, null], /zone/],
] as [unknown[], RegExp][])("bad input %#", (args, pattern) => {
  const answer = verdict(...args as [unknown, unknown, unknown]);
  expect(answer).toBeInstanceOf(CellError);
  expect((answer as CellError).says).toMatch(pattern);
});
