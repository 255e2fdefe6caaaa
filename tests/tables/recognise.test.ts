import { recogniseTable } from "../../src/tables/recognise";
import { peakFormulas } from "../../src/tables/formulas";
import { CellError } from "../../src/worksheet/cell";
import { percent, sheet, turned, type Typed } from "./sheet";

// a worked example of AS 1289.5.1.1 with four points, published by a testing laboratory
const W = [8.9, 10.1, 11.4, 13.0], D = [1.948, 1.996, 2.006, 1.964];
const wet = D.map((dry, i) => Number((dry * (1 + W[i]! / 100)).toFixed(3)));
const rows = (...columns: readonly (readonly Typed[])[]): Typed[][] => turned(columns);
const choices = { curve: "auto", specificGravity: null, waterDensity: null } as const;
const pairs = (table: ReturnType<typeof recogniseTable>): number[][] => table.points.map(({ water, dry }) => [water, dry]);
const wanted = W.map((water, i) => [water, D[i]!]);

describe("shapes of a table", () => {
  const shapes: [name: string, rows: Typed[][], formula: string][] = [
    ["two headed columns", rows(["Water content (%)", ...W], ["Dry density (t/m³)", ...D]), '=TAMP.PEAKFIT(A2:A5,B2:B5,"auto")'],
    ["density first", rows(["DD g/cc", ...D], ["MC %", ...W]), '=TAMP.PEAKFIT(B2:B5,A2:A5,"auto")'],
    ["units in a row below", rows(["Moisture content", "%", ...W], ["Dry density", "Mg/m3", ...D]), '=TAMP.PEAKFIT(A3:A6,B3:B6,"auto")'],
    ["points across", [["w (%)", ...W], ["Dry density, Mg/m³", ...D]], '=TAMP.PEAKFIT(B1:E1,B2:E2,"auto")'],
    ["points across, units in a column", [["w", "%", ...W], ["γd", "t/m3", ...D]], '=TAMP.PEAKFIT(C1:F1,C2:F2,"auto")'],
    ["bare columns", rows(W, D), '=TAMP.PEAKFIT(A1:A4,B1:B4,"auto")'],
    ["bare rows", [W, D], '=TAMP.PEAKFIT(A1:D1,A2:D2,"auto")'],
    ["a blank row between", rows(["Water content", W[0]!, W[1]!, null, W[2]!, W[3]!], ["Dry density", D[0]!, D[1]!, null, D[2]!, D[3]!]), '=TAMP.PEAKFIT(A2:A6,B2:B6,"auto")'],
    ["an average and a note at the foot", rows(["Point", 1, 2, 3, 4, "Average", "Note: oven overnight"], ["Water content", ...W, 10.85, null], ["Dry density", ...D, 1.9785, null]), '=TAMP.PEAKFIT(B2:B5,C2:C5,"auto")'],
    ["a heading over two rows", rows(["Water", "content", ...W], ["Dry", "density", ...D]), '=TAMP.PEAKFIT(A3:A6,B3:B6,"auto")'],
    ["a title and a blank row above", [["Compaction test, sample 3", null], [null, null], ["Moisture %", "Dry unit wt"], ...rows(W, D)], '=TAMP.PEAKFIT(A4:A7,B4:B7,"auto")'],
    ["wet density instead of dry", rows(["MC (%)", ...W], ["Bulk density (Mg/m3)", ...wet]), '=TAMP.PEAKFIT(A2:A5,TAMP.SOILDRY(B2:B5,A2:A5),"auto")'],
    ["a trial water beside the measured one", rows(["Trial MC", 8, 10, 12, 14], ["Oven MC", ...W], ["Dry density", ...D]), '=TAMP.PEAKFIT(B2:B5,C2:C5,"auto")'],
    ["numbered bare columns", rows([1, 2, 3, 4], W, D), '=TAMP.PEAKFIT(B1:B4,C1:C4,"auto")'],
  ];
  test.each(shapes)("%s", (_, cells, formula) => {
    const table = recogniseTable(sheet(cells));
    expect(table.problems).toEqual([]);
    expect(table.points).toHaveLength(4);
    pairs(table).forEach(([water, dry], i) => {
      expect(water).toBeCloseTo(wanted[i]![0]!, 9);
      expect(Math.abs(dry! - wanted[i]![1]!)).toBeLessThan(0.0006);
    });
    expect(table.densityUnit).toBe("Mg/m3");
    expect(peakFormulas(table, choices, "Lab")!.single).toBe(formula);
  });
});

describe("percent and fraction", () => {
  test("cells formatted as % are converted, in the formula too, and it is said", () => {
    const table = recogniseTable(sheet(rows(["Water content", ...W.map((w) => percent(w / 100))], ["Dry density", ...D])));
    expect(pairs(table)[1]![0]).toBeCloseTo(10.1, 9);
    expect(table.notes.join()).toContain("multiplied by 100");
    expect(peakFormulas(table, choices, "Lab")!.single).toBe('=TAMP.PEAKFIT(A2:A5*100,B2:B5,"auto")');
  });
  test("fractions without that format are asked about, and the answer is kept", () => {
    const cells = sheet(rows(["Water content", ...W.map((w) => w / 100)], ["Dry density", ...D]));
    const asked = recogniseTable(cells);
    expect(asked.points).toEqual([]);
    expect(asked.problems[0]).toMatchObject({ cell: { row: 1, column: 0 } });
    expect(asked.problems[0]!.says).toContain("choose \"fraction\"");
    expect(pairs(recogniseTable(cells, { units: { 0: "fraction" } }))[0]![0]).toBeCloseTo(8.9, 9);
  });
  test("a percent typed into a % cell is named", () => {
    const table = recogniseTable(sheet(rows(["Water content", percent(0.089), percent(10.1), percent(0.114), percent(0.13)], ["Dry density", ...D])));
    expect(table.problems).toEqual([{ cell: { row: 2, column: 0 }, says: expect.stringContaining("10.1 in a column of fractions, which is 1010 %") }]);
    expect(table.points).toHaveLength(3);
  });
});

test("one cell formatted as % among percents is named, not guessed", () => {
  const table = recogniseTable(sheet(rows(["Water content", 8.9, percent(0.101), 11.4, 13], ["Dry density", ...D])));
  expect(table.problems).toEqual([{ cell: { row: 2, column: 0 }, says: expect.stringContaining("A3 is formatted as %") }]);
  expect(table.points).toHaveLength(3);
});

test("headed columns that are still empty give way to the raw readings", () => {
  const table = recogniseTable(sheet([
    ["Mould + soil (g)", "Mass of mould (g)", "Volume of mould (cm3)", "Wet + tin", "Dry + tin", "Tare", "Water content (%)", "Wet density", "Dry density"],
    [6116, 4196, 1000, 58.31, 54.54, 17.62, null, null, null], [6222, 4196, 1000, 61.72, 56.78, 16.59, null, null, null],
  ]));
  expect(table).toMatchObject({ waterFrom: "tins", dryFrom: "mould", problems: [] });
  expect(table.points).toHaveLength(2);
});

describe("short forms that mean several things", () => {
  test("the arithmetic tells wet from dry where both say density", () => {
    const table = recogniseTable(sheet(rows(["MC (%)", ...W], ["Density", ...wet], ["Density", ...D])));
    expect(table.series.map(({ role, roleKnown }) => [role, roleKnown])).toEqual([["waterContent", "heading"], ["wetDensity", "arithmetic"], ["dryDensity", "arithmetic"]]);
    expect(pairs(table)[2]).toEqual([11.4, 2.006]);
  });
  test("one column that says density alone stays open, and nothing is computed", () => {
    const table = recogniseTable(sheet(rows(["MC (%)", ...W], ["Density", ...wet])));
    expect(table.series[1]).toMatchObject({ role: "open", candidates: ["dryDensity", "wetDensity"] });
    expect(table.points).toEqual([]);
    expect(table.problems[0]!.says).toContain('"Density" may be dry density or wet density');
    expect(pairs(recogniseTable(sheet(rows(["MC (%)", ...W], ["Density", ...wet])), { roles: { 1: "wetDensity" } }))).toHaveLength(4);
  });
  test("figures that do not agree settle nothing", () => {
    const table = recogniseTable(sheet(rows(["MC (%)", ...W], ["Density", ...wet.map((x) => x * 1.05)], ["Unit weight", ...D])));
    expect(table.series.slice(1).map(({ role }) => role)).toEqual(["open", "open"]);
  });
  test.each([
    ["MC", "%", "waterContent"], ["M1", "g", "open"], ["Tin", "g", "tare"], ["mould", "kg", "mouldMass"], ["w", "", "waterContent"], ["Max. dry density", "Mg/m3", "other"], ["Zero air voids density", "pcf", "other"],
    ["Saturation", "%", "other"], ["Dry unit weight", "kN/m3", "dryDensity"], ["Wet unit weight", "pcf", "wetDensity"], ["Wt. of water", "g", "other"], ["Assumed w", "%", "trialWater"], ["Average w", "%", "waterContent"],
  ])("%s in %s is %s", (heading, unit, role) => {
    const table = recogniseTable(sheet([[heading, "Dry density"], [unit, "Mg/m3"], [1, 1.9], [2, 1.95]]));
    expect(table.series[0]!.role).toBe(role);
  });
  test("raw columns M1, M2, M3 are settled by the water content beside them", () => {
    const table = recogniseTable(sheet([["M2", "M3", "M1", "Water content (%)", "Dry density"], [58.31, 54.54, 17.62, 10.2, 1.74], [61.72, 56.78, 16.59, 12.3, 1.8], [63.2, 57.48, 17.05, 14.1, 1.83]]));
    expect(table.series.map(({ role }) => role)).toEqual(["wetAndTin", "dryAndTin", "tare", "waterContent", "dryDensity"]);
    expect(table.waterFrom).toBe("column");
  });
});

describe("units of density", () => {
  test.each([
    ["kN/m3", 9.80665, "Dry unit weight"], ["kg/m3", 1000, "Dry density"], ["lb/ft3", 62.42796, "Dry unit weight"],
  ])("%s is taken from the size of the numbers, and it is said", (unit, factor, heading) => {
    const table = recogniseTable(sheet(rows(["w", ...W], [heading, ...D.map((x) => x * factor)])));
    expect(table).toMatchObject({ densityUnit: unit, densityUnitKnown: "size" });
    expect(table.notes.join()).toContain("from the size of its numbers");
  });
  test("it may be given once in the title", () => {
    const table = recogniseTable(sheet([["Densities in t/m3", null], ["w", "DD"], ...rows(W, D)]));
    expect(table).toMatchObject({ densityUnit: "Mg/m3", densityUnitKnown: "given once" });
  });
  test("a number that cannot be a soil's in the unit given is named with the unit that it looks like", () => {
    const table = recogniseTable(sheet(rows(["w", ...W], ["Dry density (Mg/m3)", 1948, ...D.slice(1)])));
    expect(table.problems).toEqual([{ cell: { row: 1, column: 1 }, says: expect.stringMatching(/B2 holds 1948.*Mg\/m³; it looks like kg\/m³/) }]);
  });
});

describe("cells that cannot be read", () => {
  const spoiled = (cell: Typed): ReturnType<typeof recogniseTable> => recogniseTable(sheet(rows(["w", W[0]!, cell, W[2]!, W[3]!], ["Dry density", ...D]), { row: 3, column: 1 }));
  test.each<[Typed, RegExp]>([
    ["n/a", /B6 holds the text "n\/a" where the water content should be/], ["10.1", /B6 holds the text "10.1", not a number: retype it/], ["10,1", /decimal sign/],
    [null, /B6 is blank where the water content should be beside C6 \(dry density 1.996\)/], [true, /holds TRUE/], [new CellError("#DIV/0!", ""), /B6 holds the error #DIV\/0!/], [-3, /must be at least 0/],
  ])("%p", (cell, says) => {
    const table = spoiled(cell);
    expect(table.problems).toEqual([{ cell: { row: 5, column: 1 }, says: expect.stringMatching(says) }]);
    expect(table.points).toHaveLength(3);
  });
  test("a percent as text is what the functions take too", () => expect(spoiled("10.1 %")).toMatchObject({ problems: [], points: { length: 4 } }));
  test("a dry tin that weighs no more than the empty one is named", () => {
    const table = recogniseTable(sheet([["Wet + tin", "Dry + tin", "Tare", "Dry density"], [50, 45, 20, 1.8], [50, 19, 20, 1.9], [44, 48, 20, 1.85]]));
    expect(table.problems.map(({ says }) => says)).toEqual([expect.stringMatching(/B3 .* must weigh more than the empty tin in C3/), expect.stringMatching(/A4 .* were the two swapped/)]);
  });
});

describe("what is missing is said", () => {
  test("no tare", () => expect(recogniseTable(sheet([["Wet + tin", "Dry + tin", "Dry density"], [50, 45, 1.8], [50, 44, 1.9]])).problems[0]!.says).toContain("empty tins"));
  test("no volume", () => expect(recogniseTable(sheet([["w (%)", "Mould + soil (g)", "Mass of mould (g)"], [10, 3800, 1800], [12, 3900, 1800]])).problems[0]!.says).toContain("volume of the mould"));
  test("a trial water only", () => expect(recogniseTable(sheet([["Trial MC", "Dry density"], [10, 1.8], [12, 1.9]])).problems[0]!.says).toContain("No measured water content"));
  test("a page of words", () => expect(recogniseTable(sheet([["Hello", "there"], ["more", "words"]]))).toMatchObject({ points: [], problems: [] }));
});

test("the specific gravity in the selection is found, with whether it is assumed", () => {
  const body = [["Water content (%)", "Dry density"], ...rows(W, D)];
  expect(recogniseTable(sheet([["Specific gravity", null, 2.7], ...body])).specificGravity).toEqual({ value: 2.7, cell: { row: 0, column: 2 }, assumed: false });
  expect(recogniseTable(sheet([["Gs (assumed)", 2.67], ...body])).specificGravity).toMatchObject({ value: 2.67, assumed: true });
  expect(recogniseTable(sheet([["Specific gravity", 2.7], ...body]), {}).points).toHaveLength(4);
  const table = recogniseTable(sheet([["Specific gravity", 2.7], ...body]));
  expect(peakFormulas(table, { ...choices, specificGravity: 2.7 }, "Lab")!.single).toBe('=TAMP.PEAKFIT(A3:A6,B3:B6,"auto",B1,"Mg/m3")');
});

test("a specific gravity beside the selection is found, but not one of two", () => {
  const body = sheet([["w (%)", "Dry density"], ...rows(W, D)], { row: 3, column: 0 });
  const one = sheet([["Gs", 2.7], [], [], ["w (%)", "Dry density"], ...rows(W, D)]);
  expect(recogniseTable(body, {}, one).specificGravity).toMatchObject({ value: 2.7, cell: { row: 0, column: 1 } });
  const two = sheet([["Gs", 2.7], ["Gs", 2.65], [], ["w (%)", "Dry density"], ...rows(W, D)]);
  expect(recogniseTable(body, {}, two).specificGravity).toBeNull();
});

test("the user's word overrides everything that was recognised", () => {
  const table = recogniseTable(sheet(rows(["Water content (%)", ...W], ["Dry density (Mg/m3)", ...wet])), { roles: { 1: "wetDensity" }, units: { 1: "Mg/m3" } });
  expect(table.series[1]).toMatchObject({ role: "wetDensity", roleKnown: "chosen", unitKnown: "chosen" });
  expect(pairs(table)[2]![1]).toBeCloseTo(2.006, 3);
});

describe("field tests are not a laboratory test", () => {
  const field = rows(["Test", "F1", "F2", "F3", "F4"], ["Water content (%)", ...W], ["Dry density (Mg/m3)", ...D], ["Relative compaction", 96, 98, 97, 95]);
  test("a column that only field sheets have stops the fit, and says what to do", () => expect(recogniseTable(sheet(field)).problems).toEqual([{ cell: null, says: expect.stringMatching(/"Relative compaction" says that these are field tests/) }]));
  test.each(["Chainage", "Station", "% comp", "From optimum", "Lift no"])("%s tells it too", (heading) => expect(recogniseTable(sheet(rows([heading, 1, 2, 3, 4], ["w (%)", ...W], ["Dry density", ...D]))).problems).toHaveLength(1));
  test("the user's word overrides it", () => expect(recogniseTable(sheet(field), { roles: { 2: "dryDensity" } }).problems).toEqual([]));
});
