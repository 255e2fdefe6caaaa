import { CellError, type Block, type Cell } from "../../src/worksheet/cell";
import { bankVolumeColumn, shrinkColumn, swellColumn, waterToAdd } from "../../src/worksheet/earthwork";
import { fineDryColumn, fineWaterColumn, wholeDryColumn, wholeWaterColumn } from "../../src/worksheet/compaction";
import { relativeCompactionColumn, relativeDensityColumn, sandConeColumn, waterGapColumn, waterRatioColumn } from "../../src/worksheet/field";
import { densityAs, pastZeroAirVoids, waterDensityAt } from "../../src/worksheet/mass-and-volume";

const at = (value: unknown): Block => [[value]];
const only = (block: Cell[][] | CellError): Cell => block instanceof CellError ? block : block[0]![0]!;
const says = (pattern: RegExp) => expect.objectContaining({ code: "#VALUE!", says: expect.stringMatching(pattern) });

describe("past the zero-air-voids line", () => {
  const past = (dry: unknown, w: unknown, gs: unknown, water: unknown = null, allowance: unknown = null) =>
    only(pastZeroAirVoids(at(dry), at(w), at(gs), at(water), at(allowance)));
  // Principles of Geotechnical Engineering, 9th edition, problem 6.4: S is 102.4 % at 14.9 %, 98 % at 12.5 %
  test("problem 6.4: the fourth point is, the third is not", () => {
    expect(past(120.63, 14.9, 2.69, 62.4)).toBe(true);
    expect(past(125.07, 12.5, 2.69, 62.4)).toBe(false);
  });
  test("the spread of conventions is let be unless the allowance says otherwise", () => {
    const line = 62.4 / (0.149 + 1 / 2.69);
    expect(past(line * 1.0015, 14.9, 2.69, 62.4)).toBe(false);
    expect(past(line * 1.0025, 14.9, 2.69, 62.4)).toBe(true);
    expect(past(line * 1.0015, 14.9, 2.69, 62.4, 0)).toBe(true);
    expect(past(line * 1.0025, 14.9, 2.69, 62.4, 5)).toBe(false);
  });
  test("another unit is refused by name", () => expect(past(120.63, 14.9, 2.69)).toEqual(says(/looks like lb\/ft³: give "lb\/ft3"/)));
});

describe("density of water and units", () => {
  test("20 °C in three units (CIPM 2001)", () => {
    expect(only(waterDensityAt(at(20), null))).toBeCloseTo(0.9982067, 7);
    expect(only(waterDensityAt(at(20), at("kN/m3")))).toBeCloseTo(9.7891, 4);
    expect(only(waterDensityAt(at(4), at("pcf")))).toBeCloseTo(62.426, 3);
  });
  test("outside 0 to 40 °C the formula does not hold", () => expect(only(waterDensityAt(at(60), null))).toEqual(says(/between 0 and 40/)));
  test("units that differ by row", () => {
    expect(densityAs([[1.8], [18]], [["Mg/m3"], ["kN/m3"]], at("kg/m3"))).toEqual([[1800], [expect.closeTo(1835.49, 2)]]);
  });
});

describe("field", () => {
  test("two units, or two soils, are refused", () => {
    expect(only(relativeCompactionColumn(at(115), at(1.9)))).toEqual(says(/one unit/));
    expect(only(relativeCompactionColumn(at(1.8), at(1.9)))).toBeCloseTo(94.7368, 4);
  });
  test("fractions are refused for both water contents", () => {
    expect(waterGapColumn(at(0.12), at(13))).toEqual(says(/water content: .*fractions/));
    expect(waterGapColumn(at(12), at(0.13))).toEqual(says(/optimum water content: .*fractions/));
    expect(only(waterGapColumn(at(12), at(13.5)))).toBe(-1.5);
  });
});

describe("earthwork", () => {
  const add = (...args: unknown[]) => only(waterToAdd(...args.map((arg) => arg === null ? null : at(arg)) as unknown as Parameters<typeof waterToAdd>));
  test("18 L a cubic metre for one point at 1.8 Mg/m3", () => expect(add(1, 1.8, 10, 11, null, null)).toBeCloseTo(18, 10));
  test("the other system's density is refused by name", () => {
    expect(add(1, 110, 10, 11, null, null)).toEqual(says(/looks like lb\/ft³: choose "US"/));
    expect(add(1, 1.8, 10, 11, null, "US")).toEqual(says(/looks like Mg\/m³: choose "SI"/));
    expect(add(1, 1800, 10, 11, null, "SI")).toEqual(says(/looks like kg\/m³/));
  });
  test("an unknown system lists the choices", () => expect(add(1, 1.8, 10, 11, null, "metric")).toEqual(says(/"SI", "US"/)));
  test("a loss of everything cannot be made up", () => expect(add(1, 1.8, 10, 11, 100, null)).toEqual(says(/between 0 and 95/)));
  test("borrow in two units is refused", () => expect(only(bankVolumeColumn(at(100), at(115), at(1.7), null))).toEqual(says(/one unit/)));
});

describe("what the further relations refuse", () => {
  test("a density in another unit than the density of water's", () => expect(only(wholeDryColumn(at(134), at(9.4), at(2.7), null))).toEqual(says(/give "lb\/ft3"/)));
  test("water of the oversize below 1 % is taken as it stands, the fine fraction's is not", () => {
    expect(only(wholeWaterColumn(at(12), at(10), at(0.5)))).toBeCloseTo(10.85, 10);
    expect(wholeWaterColumn(at(0.12), at(10), at(0.5))).toEqual(says(/fractions/));
  });
  test("more oversize than the whole weighs, or holds", () => {
    expect(only(fineDryColumn(at(1.2), at(80), at(2.7), null))).toBeGreaterThan(0);
    expect(only(fineWaterColumn(at(2), at(90), at(3)))).toEqual(says(/hold more water than the whole/));
  });
  test("limits of density the wrong way round, or in two units", () => {
    expect(only(relativeDensityColumn(at(1.6), at(1.8), at(1.5)))).toEqual(says(/must be above the minimum/));
    expect(only(relativeDensityColumn(at(100), at(1.4), at(1.7)))).toEqual(says(/one unit/));
    // outside its limits is a finding, not an error
    expect(only(relativeDensityColumn(at(1.75), at(1.4), at(1.7)))).toBeGreaterThan(100);
  });
  test("no sand in the hole", () => expect(only(sandConeColumn(at(8), at(0.5), at(0.53), at(99)))).toEqual(says(/must be above the mass of sand in the cone/)));
  test("an optimum of nothing", () => expect(only(waterRatioColumn(at(12), at(0)))).toEqual(says(/above 0/)));
  test("a basis that is not known lists those that are", () => {
    expect(only(swellColumn(at(1.8), at(1.4), at("fill")))).toEqual(says(/"bank", "loose"/));
    expect(only(shrinkColumn(at(1.8), at(115), null))).toEqual(says(/one unit/));
  });
});
