import { CellError, type Block, type Cell } from "../../src/worksheet/cell";
import { curveDry, curveFlags, effortColumn, mouldWet, peakBlock, peakDry, peakWater } from "../../src/worksheet/compaction";
import type { TestCells } from "../../src/worksheet/compaction-test";

const down = (...values: unknown[]): Block => values.map((value) => [value]);
const at = (value: unknown): Block => [[value]];
const says = (pattern: RegExp, code = "#VALUE!") => expect.objectContaining({ code, says: expect.stringMatching(pattern) });
/** published worked example of AS 1289.5.1.1 (set P): 2.01 t/m3 at 11.0 % */
const WATERS = [8.9, 10.1, 11.4, 13.0], DRIES = [1.948, 1.996, 2.006, 1.964];
const cells = (more: Partial<TestCells> = {}): TestCells => ({ waters: down(...WATERS), dries: down(...DRIES), curve: null, gs: null, water: null, ...more });
const only = (block: Cell[][] | CellError): Cell => block instanceof CellError ? block : block[0]![0]!;

describe("the peak's block", () => {
  const rows = peakBlock(cells({ gs: at(2.65) })) as Cell[][];
  test("is ten rows of four, each labelled, in an order that other cells can rely on", () => {
    expect(rows.map((row) => row[0])).toEqual(["", "maximum dry density", "optimum water content, %", "curve", "standard error", "interval", "saturation at the optimum, %", "air voids at the optimum, %", "points used", "what to look at", "curves that do as well", "dry density, whichever of them", "optimum, whichever of them, %"]);
    expect(rows.every((row) => row.length === 4)).toBe(true);
  });
  test("holds the published peak inside its interval", () => {
    const [, [, dry, low, high], [, water, from, to]] = rows as [Cell[], [Cell, number, number, number], [Cell, number, number, number]];
    expect(dry.toFixed(2)).toBe("2.01");
    expect(water).toBeCloseTo(11.1, 1);
    expect(low < dry && dry < high && from < water && water < to).toBe(true);
  });
  test("says what it cannot know", () => {
    const bare = peakBlock(cells()) as Cell[][];
    expect([bare[6]![1], bare[7]![1]]).toEqual(["needs the specific gravity", "needs the specific gravity"]);
    const three = peakBlock(cells({ waters: down(12, 14, 16), dries: down(16.87, 17.11, 16.74) })) as Cell[][];
    expect(three[4]![1]).toBe("no spare point");
    expect(three[5]![1]).toBe("stated scatter");
  });
  test("an end that is not bounded is said in words", () => {
    const open = peakBlock(cells({ waters: down(11, 12, 13, 14), dries: down(1.846, 1.85, 1.8505, 1.847), curve: at("parabola") })) as Cell[][];
    expect(open[2]!.slice(2)).toEqual(["not bounded", "not bounded"]);
  });
});

test("the two figures alone are those of the block", () => {
  const rows = peakBlock(cells()) as Cell[][];
  expect(only(peakDry(cells()))).toBe(rows[1]![1]);
  expect(only(peakWater(cells()))).toBe(rows[2]![1]);
});

test("points across columns, with headings and blanks between, give the same", () => {
  const across = cells({ waters: [["w %", 8.9, "", 10.1, 11.4, 13.0]], dries: [["dry", 1.948, null, 1.996, 2.006, 1.964]] });
  expect(only(peakDry(across))).toBe(only(peakDry(cells())));
});

describe("the curve at given water contents", () => {
  test("a row or column of them", () => {
    expect(only(curveDry(at(10.1), cells()))).toBeCloseTo(1.996, 2);
    const many = curveDry(down(9, 10, 11, 12), cells()) as Cell[][];
    expect(many).toHaveLength(4);
    expect(curveDry([[9, 10, 11]], cells()) as Cell[][]).toHaveLength(1);
  });
  test("outside the data each cell says that nothing was measured there", () => {
    const many = curveDry(down(9, 20), cells()) as Cell[][];
    expect(many[0]![0]).toBeCloseTo(1.95, 2);
    expect(many[1]![0]).toEqual(says(/20 % lies outside .* 8\.9 to 13 %/));
  });
});

describe("what to look at", () => {
  test("a point past the line is named by its row", () => {
    const rows = curveFlags(cells({ waters: down("w", 12.0, 14.1, 16.0, 18.2, 20.1), dries: down("γd", 16.6, 17.24, 17.6, 17.52, 17.34), gs: at(2.68), water: at("kN/m3") })) as Cell[][];
    expect(rows[0]).toEqual(["where", "what", "why"]);
    expect(rows[1]).toEqual(["row 6", "not possible", expect.stringMatching(/^Dry density 17\.34 at 20\.1 % lies past/)]);
  });
  test("where no curve is fitted, that comes first", () => expect((curveFlags(cells({ waters: down(8, 10, 12), dries: down(1.6, 1.7, 1.8) })) as Cell[][])[1]).toEqual(["whole test", "no curve", expect.stringMatching(/wetter/)]));
  test("nothing found is said too", () => expect((curveFlags(cells({ waters: down(10, 12, 14, 16, 18), dries: down(1.771, 1.827, 1.853, 1.829, 1.773) })) as Cell[][])[1]![1]).toBe("nothing found"));
});

describe("bad input", () => {
  test.each([
    ["two points only", { waters: down(10, 12), dries: down(1.8, 1.9) }, /only two points/, "#N/A"],
    ["nothing at all", { waters: down("", ""), dries: down("", "") }, /no points/, "#N/A"],
    ["no water contents", { waters: null }, /give the water contents/, "#VALUE!"],
    ["a text among numbers", { waters: down(8.9, "n/a", 11.4, 13.0) }, /row 2 of the ranges: water content must be a number/, "#VALUE!"],
    ["a blank", { dries: down(1.948, "", 2.006, 1.964) }, /row 2 of the ranges: dry density is blank/, "#VALUE!"],
    ["fractions for percents", { waters: down(0.089, 0.101, 0.114, 0.13) }, /fractions/, "#VALUE!"],
    ["mixed units", { dries: down(1.948, 1996, 2.006, 1.964) }, /row 1.*row 2.*one unit/, "#VALUE!"],
    ["another unit than the density of water's", { dries: down(121.6, 124.6, 125.2, 122.6), gs: at(2.65) }, /row 1 of the ranges: dry density 121\.6 .* give "lb\/ft3"/, "#VALUE!"],
    ["an unknown curve", { curve: at("spline") }, /"auto", "parabola", "cubic", "quartic", "saturation", "top three", "smooth"/, "#VALUE!"],
    ["a range for the specific gravity", { gs: down(2.6, 2.7) }, /give one cell/, "#VALUE!"],
    ["all on one side", { dries: down(1.90, 1.93, 1.96, 1.99) }, /wetter/, "#VALUE!"],
    ["unequal ranges", { dries: down(1.9, 1.93, 1.96) }, /same size/, "#VALUE!"],
  ] as [string, Partial<TestCells>, RegExp, string][])("%s", (_, more, pattern, code) => {
    for (const run of [peakBlock, peakDry, peakWater]) expect(run(cells(more))).toEqual(says(pattern, code));
  });
});

describe("wet density in a mould", () => {
  const wet = (...args: unknown[]) => only(mouldWet(...[0, 1, 2, 3, 4].map((i) => args[i] === undefined ? null : at(args[i])) as unknown as Parameters<typeof mouldWet>));
  test("plain mass over volume where the units go together", () => expect(wet(3168, 1125, 1000)).toBeCloseTo(2.043, 10));
  // municipal D1557 record (set O): 132.2, 143.6, 143.2 lb/ft3 from grams and 0.03320 ft3
  test.each([[3821, 132.2], [3992, 143.6], [3986, 143.2]])("grams with cubic feet: %d g", (gross, printed) => expect((wet(gross, 1830, 0.0332, "g", "ft3") as number).toFixed(1)).toBe(printed.toFixed(1)));
  test.each([["g", undefined, 2.043], [undefined, "cm3", 2.043], ["kg", "m3", 2043], ["kg", "L", 2.043]] as const)("units %s and %s", (mass, volume, expected) => {
    const scale = mass === "kg" ? 0.001 : 1, size = volume === "m3" ? 1e-3 : volume === "L" ? 1 : 1000;
    expect(wet(3168 * scale, 1125 * scale, size, mass, volume)).toBeCloseTo(expected, 8);
  });
  test("without units, what is no soil in any unit is refused, and the likely units named", () => {
    expect(wet(3821, 1830, 0.0332)).toEqual(says(/looks like g over ft³: give "g" and "ft3"/));
    expect(wet(3.168, 1.125, 1000)).toEqual(says(/looks like kg over cm³/));
  });
  test("with units that give no soil it is refused", () => expect(wet(3168, 1125, 1000, "g", "L")).toEqual(says(/no soil is/)));
  test("a mould heavier than mould and soil is refused", () => expect(wet(1125, 3168, 1000)).toEqual(says(/must be above the mass of the mould/)));
});

test("effort of D698 method A (ASTM: 12 400 ft·lbf/ft³, 600 kJ/m³ in its title)", () => expect(only(effortColumn(at(2.495), at(304.8), at(25), at(3), at(944)))).toBeCloseTo(592.5, 0));
