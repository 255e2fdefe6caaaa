import fc from "fast-check";
import { dryDensityFromWet } from "../../src/phase/density";
import { zeroAirVoids } from "../../src/phase/lines";
import { CellError, type Block, type Cell } from "../../src/worksheet/cell";
import { relationColumn } from "../../src/worksheet/relation-column";

const down = (...values: unknown[]): Block => values.map((value) => [value]);
const first = (block: Cell[][] | CellError): Cell[] => {
  if (block instanceof CellError) throw new Error(`refused: ${block.says}`);
  return block.map((row) => row[0]!);
};
const soilDry = (wetDensity: Block, waterContent: Block) => relationColumn(dryDensityFromWet, { wetDensity, waterContent });
const same = (a: Cell, b: Cell): boolean => a instanceof CellError && b instanceof CellError ? a.code === b.code && a.says === b.says : Object.is(a, b);

test("a column equals its rows one by one", () => {
  const cell = fc.oneof(fc.double({ min: 1, max: 60, noNaN: true }), fc.constantFrom<unknown>("", null, "n/a", "3,5", true, -3, Infinity, new CellError("#DIV/0!", "")));
  let rows = 0, errors = 0;
  fc.assert(fc.property(fc.array(fc.tuple(cell, cell), { minLength: 2, maxLength: 12 }), (pairs) => {
    const whole = soilDry(pairs.map(([a]) => [a]), pairs.map(([, b]) => [b]));
    for (const [i, answer] of first(whole).entries()) {
      const [a, b] = pairs[i]!;
      if (a === "n/a" && b === "n/a") continue; // a heading inside a range, a text in a lone cell
      expect(same(answer, first(soilDry([[a]], [[b]]))[0]!)).toBe(true);
      rows++;
      if (answer instanceof CellError) errors++;
    }
  }), { numRuns: 3000, seed: 1 });
  expect(rows).toBeGreaterThan(5000);
  expect(errors).toBeGreaterThan(1000);
});

test("a host's error comes back as the same error, in its own row", () => {
  const division = new CellError("#DIV/0!", "");
  const answers = first(soilDry(down(2, division, 2), down(12, 12, 14)));
  expect(answers[1]).toBe(division);
  expect(answers[0]).toBeCloseTo(2 / 1.12, 12);
  expect(answers[2]).toBeCloseTo(2 / 1.14, 12);
});

test("headings and blank rows give blanks; trailing blanks are trimmed; a constant does not fill a blank row", () => {
  const answers = first(soilDry(down("wet density", 2, "", 2.1, null, ""), [[12]]));
  expect(answers).toEqual(["", 2 / 1.12, "", 2.1 / 1.12]);
});

test("a heading over a blank is not taken for a heading row", () => {
  const [top] = first(soilDry(down("wet", 2), down("", 12)));
  expect(top).toBeInstanceOf(CellError);
});

test("whole columns are trimmed together: one that ends earlier keeps the rows of the other", () => {
  const long = (...values: unknown[]) => down(...values, ...Array<unknown>(1000).fill(null));
  const answers = first(soilDry(long(2, 2.1, 2.2), long(12, 13, null)));
  expect(answers).toHaveLength(3);
  expect(answers[2]).toEqual(expect.objectContaining({ code: "#VALUE!", says: expect.stringMatching(/water content is blank/) }));
});

test("all blank gives one blank", () => expect(soilDry(down(null, ""), down("", null))).toEqual([[""]]));

test("a row of water contents against a column of specific gravities makes a table", () => {
  const table = relationColumn(zeroAirVoids, { waterContent: [[10, 15, 20]], specificGravity: down(2.6, 2.7), waterDensity: [[1]] });
  expect(table).toHaveLength(2);
  expect((table as Cell[][])[1]![2]).toBeCloseTo(1 / (0.2 + 1 / 2.7), 12);
});

test.each([
  [down(1, 2, 3), down(1, 2)], [[[1, 2]], [[1, 2, 3]]], [down(1, 2, 3), [[1, 2], [3, 4]]],
] as [Block, Block][])("ranges of unequal size are refused, not padded", (a, b) => {
  expect(soilDry(a, b)).toEqual(expect.objectContaining({ code: "#VALUE!", says: expect.stringMatching(/same size/) }));
});

describe("percents", () => {
  test.each([[[[0.125]]], [down(0.12, 0.13)], [down(0, 0.13, "")]] as [Block][])("fractions are refused, one cell or many: %j", (water) => {
    const wet = water.length === 1 ? [[2]] : down(...water.map(() => 2));
    expect(soilDry(wet, water)).toEqual(expect.objectContaining({ says: expect.stringMatching(/fractions/) }));
  });
  test.each([[down(0.7, 3), 2 / 1.007], [down("0.7 %", 3), 2 / 1.007], [[["0.8 %"]], 2 / 1.008], [[["12.5%"]], 2 / 1.125], [[[0]], 2]] as [Block, number][])("%j is read", (water, expected) => {
    expect(first(soilDry(down(...water.map(() => 2)), water))[0]).toBeCloseTo(expected, 12);
  });
});

describe("what a bad cell is told", () => {
  test.each([
    ["12.5", /is the text "12.5", not a number/], ["12,5", /decimal sign/], ["n/a", /must be a number, not "n\/a"/], [true, /not TRUE/], [-1, /at least 0, not -1/], [5000, /between 0 and 2000/],
    ["", /is blank/], [null, /is blank/], [NaN, /must be a number/], [Infinity, /must be a number/], ["x".repeat(80), /…/],
  ] as [unknown, RegExp][])("water content %j", (water, says) => {
    expect(first(soilDry([[2]], [[water]]))[0]).toEqual(expect.objectContaining({ code: "#VALUE!", says: expect.stringMatching(says) }));
  });
});
