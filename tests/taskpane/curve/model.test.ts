import { fitTest as fitPoints } from "../../../src/compaction/fit-test";
import { recordRules } from "../../../src/compaction/quality/record";
import { peakBlock } from "../../../src/worksheet/compaction";
import { noChoices, type Choices } from "../../../taskpane/curve/choices";
import { lookAt, marksOf, plotWords, pointWords, type Fitter, type Look } from "../../../taskpane/curve/model";
import { PEAK_BLOCK } from "../../../taskpane/curve/peak-block";
import { sheet, turned } from "../../tables/sheet";

const fitTest: Fitter = (test, word, options) => fitPoints(test, word, { ...options, rules: recordRules });

// AS 1289.5.1.1 worked example with four points, published by a testing laboratory: MDD 2.01 t/m3, OMC 11.0 %
const P = [["Water content (%)", 8.9, 10.1, 11.4, 13.0], ["Dry density (t/m³)", 1.948, 1.996, 2.006, 1.964]];
// Principles of Geotechnical Engineering, 9th edition, 6.4: the point at 14.9 % needs a specific gravity of 2.715
const C = [["Moisture (%)", 8.6, 10.6, 12.5, 14.9, 16.7], ["Dry unit weight (pcf)", 102.21, 112.57, 125.07, 120.63, 103.34]];
// five moulds, published worked problem: at 2.70 the two wet points need 2.76 and 2.81
const N = [["w", 11.205, 12.5, 13.4, 14.775, 15.88], ["Dry density kg/m3", 1929.0, 1949.9, 1959.2, 1958.3, 1942.3]];

const look = (columns: typeof P, choices: Partial<Choices> = {}): Look => lookAt(sheet(turned(columns)), { ...noChoices, ...choices }, fitTest);

test("the published peak of four points", () => {
  const { fit, recognised, kind } = look(P, { curve: "parabola" });
  expect(kind).toBe("fitted");
  expect(recognised).toBe("4 points, A2:B5, down the rows; water content in %, dry density in Mg/m³");
  expect(Math.abs(fit!.maxDryDensity.value - 2.01)).toBeLessThan(0.005);
  expect(Math.abs(fit!.optimumWater.value - 11.0)).toBeLessThan(0.15);
});

describe("points past the zero-air-voids line", () => {
  // the figures quoted rest on water at 1000 kg/m3
  const seen = look(N, { specificGravity: "2.70", waterDensity: "1000" });
  test("are named with their cells and the least specific gravity", () => {
    expect(seen.marks.map((mark) => mark === "past-line")).toEqual([false, false, false, true, true]);
    expect(seen.leastSpecificGravities[3]).toBeCloseTo(2.76, 2);
    expect(seen.leastSpecificGravities[4]).toBeCloseTo(2.81, 2);
    expect(seen.findings.filter(({ id }) => id === "past-line").map(({ area }) => area)).toEqual([
      { sheet: "Lab", row: 4, column: 1, rows: 1, columns: 1 }, { sheet: "Lab", row: 5, column: 1, rows: 1, columns: 1 },
    ]);
    expect(pointWords(seen, 4)).toBe("Point 5 (A6, B6): water content 15.9 %, dry density 1942 kg/m³; past the zero-air-voids line");
    expect(plotWords(seen)).toContain("2 points past the zero-air-voids line");
  });
  test("are marked with a note on the dry density, and only they", () => {
    const marks = marksOf(seen).filter(({ kind }) => kind === "past-line");
    expect(marks.map(({ area }) => [area.row, area.column])).toEqual([[4, 1], [4, 0], [5, 1], [5, 0]]);
    expect(marks[0]!.note).toMatch(/^Tampsheet: /);
    expect(marks[1]!.note).toBeUndefined();
  });
  test("the textbook's point needs 2.715", () => {
    const pcf = look(C, { specificGravity: "2.69", curve: "top three", waterDensity: "62.4" });
    expect(pcf.marks[3]).toBe("past-line");
    expect(Math.abs(pcf.leastSpecificGravities[3]! - 2.715)).toBeLessThan(0.0006);
  });
  test("without a specific gravity nothing is said of the line, and none is drawn", () => {
    const bare = look(N);
    expect(bare.marks).not.toContain("past-line");
    expect(bare.plot!.lines).toEqual([]);
    expect(bare.fit!.saturationAtOptimum).toBeNull();
  });
});

describe("soil, oversize, scatter and a reported peak", () => {
  test("the whole soil's peak (exercise of a UK soil-mechanics text: 1.97, 10 % gravel of 2.73 give 2.03 and 11 %)", () => {
    const A = [["w", 10, 11, 12, 13, 14], ["Dry density (Mg/m³)", 1.8573, 1.9595, 1.9723, 1.969, 1.9254]];
    const { whole } = look(A, { curve: "top three", stonePercent: "10", stoneGravity: "2.73", stoneWater: "0", waterDensity: "1" });
    expect(whole!.peak.dry.toFixed(2)).toBe("2.03");
    expect(Math.round(whole!.peak.water)).toBe(11);
    expect(look(A, { stonePercent: "10" }).whole).toBeNull();
    expect(look(A, { stonePercent: "10" }).settingTroubles[0]).toMatch(/bulk specific gravity of the oversize/);
  });
  test("a scatter of one's own widens the interval, and says that the functions do not know it", () => {
    const usual = look(P), wide = look(P, { wetScatter: "0,8", waterScatter: "0.6" });
    expect(usual.ownScatter).toBe(false);
    expect(wide.ownScatter).toBe(true);
    expect(wide.fit!.maxDryDensity.high ?? Infinity).toBeGreaterThan(usual.fit!.maxDryDensity.high!);
    expect(look(P, { wetScatter: "lots" }).settingTroubles[0]).toMatch(/The scatter of wet density "lots" is not a number between 0.05 and 5: the usual 0.4 is used/);
  });
  test("a reported peak is held against the curve, by the standard's own steps", () => {
    expect(look(P, { reportedDry: "2.01", reportedWater: "11.0", standard: "AS 1289" }).findings.map(({ id }) => id)).toEqual(["too-few-points"]);
    expect(look(P, { reportedDry: "2.15", reportedWater: "11.2", standard: "AS 1289" }).findings.map(({ id }) => id).sort()).toEqual(["reported-elsewhere", "reporting-precision", "too-few-points"]);
  });
  test("tins that differ are told with the cell of their point", () => {
    const rows = [["Wet density (Mg/m³)", "Wet + tin (g)", "Dry + tin (g)", "Tin (g)", "Wet + tin (g)", "Dry + tin (g)", "Tin (g)"], ...[9, 10.5, 12, 13.5, 15].map((w, i) => {
      const wet = (1.85 - 0.005 * (w - 12.2) ** 2) * (1 + w / 100), dry = 100, second = w + (i === 2 ? 1.4 : 0.1);
      return [Number(wet.toFixed(4)), 20 + dry * (1 + w / 100), 20 + dry, 20, 21 + dry * (1 + second / 100), 21 + dry, 21];
    })];
    const seen = lookAt(sheet(rows), noChoices, fitTest);
    expect(seen.findings.filter(({ id }) => id === "tins-differ").map(({ point }) => point)).toEqual([2]);
    // the same beside a water content that the sheet has worked out itself, the second tin on a line of its own
    const lines = (rows.slice(1) as number[][]).flatMap(([density, wet, dry, tin, wet2, dry2, tin2], i) => [
      [Number((wet! - dry! + (i === 2 ? 0.7 : 0.05)).toFixed(2)), density!, wet!, dry!, tin!], [null, null, wet2!, dry2!, tin2!],
    ]);
    const stated = lookAt(sheet([["Water content (%)", "Wet density (Mg/m³)", "Wet + tin (g)", "Dry + tin (g)", "Tin (g)"], ...lines]), noChoices, fitTest);
    expect(stated.table.points).toHaveLength(5);
    expect(stated.findings.filter(({ id }) => id === "tins-differ").map(({ point }) => point)).toEqual([2]);
  });
});

describe("specific gravity and density of water", () => {
  test("either decimal sign will do", () => expect(look(P, { specificGravity: "2,70" }).specificGravity.value).toBe(2.7));
  test.each(["abc", "0.5", "27"])("%s is refused, and the curve waits", (text) => {
    const seen = look(P, { specificGravity: text });
    expect(seen.specificGravity.trouble).toContain("between 1 and 6");
    expect(seen).toMatchObject({ kind: "unreadable", fit: null });
    expect(seen.plot!.points).toHaveLength(4);
  });
  test("an assumed one is passed on as such", () => expect(look(P, { specificGravity: "2.7", assumed: true }).fit!.test.specificGravityAssumed).toBe(true));
  test("water at 20 °C follows the unit", () => {
    // CIPM 2001: 998.2067 kg/m3 at 20 °C
    expect(look(P).water.density).toBeCloseTo(0.9982067, 6);
    expect(look(C).water.density).toBeCloseTo(62.316, 3);
  });
  test("a typed convention is used, one of another unit is refused", () => {
    expect(look(C, { waterDensity: "62.4" }).water).toEqual({ density: 62.4, trouble: null });
    expect(look(C, { waterDensity: "9.81" }).water.trouble).toContain("none in lb/ft³");
  });
});

test("a reading that cannot be read keeps the curve waiting, the others are drawn", () => {
  const seen = lookAt(sheet([["w", "Dry density"], [8.9, 1.948], ["n/a", 1.996], [11.4, 2.006], [13, 1.964]]), noChoices, fitTest);
  expect(seen).toMatchObject({ kind: "unreadable", fit: null, noFit: null });
  expect(seen.recognised).toContain("3 of 4 points");
  expect(seen.plot!.points).toHaveLength(3);
});

test("where no curve can be had, it is said why, and nothing stands for a peak", () => {
  const seen = look([["w", 8, 10, 12, 14], ["Dry density", 1.7, 1.75, 1.81, 1.86]], { curve: "parabola" });
  expect(seen.kind).toBe("no-fit");
  expect(seen.noFit!.says.length).toBeGreaterThan(20);
  expect(seen.plot).toMatchObject({ curve: null, peak: null });
});

test("words without numbers are nothing", () => expect(lookAt(sheet([["Dear", "colleague"], ["see", "below"]]), noChoices, fitTest).kind).toBe("nothing"));

test("the room kept for the formula is what the function fills", () => {
  const block = peakBlock({ waters: [[8.9], [10.1], [11.4], [13]], dries: [[1.948], [1.996], [2.006], [1.964]], curve: null, gs: null, water: null });
  expect(Array.isArray(block)).toBe(true);
  const rows = block as unknown[][];
  expect({ rows: rows.length, columns: rows[0]!.length }).toEqual(PEAK_BLOCK);
});
