import { CellError } from "../../src/worksheet/cell";
import { readPairs } from "../../src/worksheet/pairs";

const down = (...values: unknown[]) => values.map((value) => [value]);
const read = (waters: unknown[][], dries: unknown[][]) => readPairs("waterContent", waters, "dryDensity", dries);

test("headings and rows blank on both sides are passed over; rows keep their place", () =>
  expect(read(down("w", 10, "", 12, null), down("dry", 1.8, null, 1.9, ""))).toEqual({ first: [10, 12], second: [1.8, 1.9], rows: [2, 4] }));

test("points across columns", () => expect(read([[10, 12]], [[1.8, 1.9]])).toEqual({ first: [10, 12], second: [1.8, 1.9], rows: [1, 2] }));

test.each([
  [down(10, "", 12), down(1.8, 1.85, 1.9), /row 2 .*water content is blank beside dry density "1.85"/],
  [down(10, 11, 12), down(1.8, null, 1.9), /row 2 .*dry density is blank/],
  [down(10, "n/a", 12), down(1.8, 1.85, 1.9), /row 2 .*must be a number, not "n\/a"/],
  [down(10, 11, 12), down(1.8, "1.85", 1.9), /row 2 .*text "1.85"/],
  [[[10, 11]], [[1.8, ""]], /column 2/],
  [down(10, 11), down(1.8), /same size/],
  [[[1, 2], [3, 4]], [[1, 2], [3, 4]], /one row or one column/],
  [down(0.1, 0.12), down(1.8, 1.9), /fractions/],
  [down(10, true), down(1.8, 1.9), /row 2 .*TRUE/],
] as [unknown[][], unknown[][], RegExp][])("%j with %j is refused by name and place", (waters, dries, says) => {
  const answer = read(waters, dries);
  expect(answer).toBeInstanceOf(CellError);
  expect((answer as CellError).says).toMatch(says);
});

test("a host's error passes through", () => {
  const error = new CellError("#DIV/0!", "");
  expect(read(down(10, error), down(1.8, 1.9))).toBe(error);
  // a blank beside it does not turn it into words about an object
  expect(read(down(10, error), down(1.8, ""))).toBe(error);
  expect(read(down(10, null), down(1.8, error))).toBe(error);
});
