import { recogniseTable } from "../../src/tables/recognise";
import { peakFormulas } from "../../src/tables/formulas";
import { cellName } from "../../src/workbook/address";
import { sheet, turned } from "./sheet";

/**
 * Published tests laid out as sheets, raw readings and all. The figures expected are the sources' own;
 * where a source prints none, they are recomputed by definition and marked derived.
 */
const waters = (table: ReturnType<typeof recogniseTable>): number[] => table.points.map(({ water }) => water);
const dries = (table: ReturnType<typeof recogniseTable>): number[] => table.points.map(({ dry }) => dry);

// a BS 1377 laboratory sheet: two tins a point, one mould
const G = {
  gross: [3859, 4061, 4231, 4218, 4197],
  wet: [70, 58, 60, 68, 54, 54, 52, 66, 74, 70], dry: [65.3, 54.5, 55.6, 63.5, 49.7, 49.6, 47.8, 59.3, 65.3, 61.7], tare: [27, 24, 24.6, 25.2, 24, 24.4, 25.3, 25.4, 24.8, 24.5],
  water: [11.87, 12.97, 17.1, 19.22, 21.9], printedDry: [1.62, 1.78, 1.86, 1.82, 1.76],
};

describe("a BS 1377 sheet with two tins a point", () => {
  const twoRows = sheet([
    ["Compaction test", null, null, null, null, null],
    ["Mass of mould", 2015, "g", null, "Volume of mould", 1017.6, "cm3"],
    ["Mould + wet soil (g)", "Tin no", "Wet + tin (g)", "Dry + tin (g)", "Tare (g)"],
    ...G.gross.flatMap((gross, i) => [0, 1].map((tin) => [tin === 0 ? gross : null, 10 + 2 * i + tin, G.wet[2 * i + tin]!, G.dry[2 * i + tin]!, G.tare[2 * i + tin]!])),
  ]);

  test("a second row with a tin only belongs to the point above it", () => {
    const table = recogniseTable(twoRows);
    expect(table.problems).toEqual([]);
    expect(table.points).toHaveLength(5);
    expect(table).toMatchObject({ orientation: "down", waterFrom: "tins", dryFrom: "mould", densityUnit: "Mg/m3", mouldMass: { value: 2015 }, mouldVolume: { value: 1017.6 } });
    // the source prints two decimals
    waters(table).forEach((water, i) => expect(Math.abs(water - G.water[i]!)).toBeLessThan(0.006));
    dries(table).forEach((dry, i) => expect(Math.abs(dry - G.printedDry[i]!)).toBeLessThan(0.0055));
  });

  test("its formulas go through cells in between, one row a point", () => {
    const table = recogniseTable(twoRows);
    const formulas = peakFormulas(table, { curve: "auto", specificGravity: 2.65, waterDensity: null }, "Lab")!;
    expect(formulas.single).toBeNull();
    const block = formulas.block({ row: 0, column: 8 }, { rows: 10, columns: 4 });
    expect(block[1]).toEqual([
      { formula: "=AVERAGE(TAMP.WATERPCT(C4,D4,E4),TAMP.WATERPCT(C5,D5,E5))" },
      { formula: '=TAMP.SOILDRY(TAMP.MOULDWET(A4,B2,F2,"g","cm3"),I2)' },
    ]);
    expect(block.at(-1)).toEqual([{ formula: '=TAMP.PEAKFIT(I2:I6,J2:J6,"auto",2.65,"Mg/m3")', reaches: { rows: 10, columns: 4 } }]);
  });

  test("two tins side by side, points across", () => {
    const side = (values: readonly number[], tin: number): number[] => G.gross.map((_, i) => values[2 * i + tin]!);
    const table = recogniseTable(sheet([
      ["Trial no", 1, 2, 3, 4, 5],
      ["Mass of mould and wet soil, g", ...G.gross], ["Mass of mould, g", 2015, 2015, 2015, 2015, 2015], ["Volume of mould, cm³", 1017.6, 1017.6, 1017.6, 1017.6, 1017.6],
      ["Wet + tin 1 (g)", ...side(G.wet, 0)], ["Dry + tin 1 (g)", ...side(G.dry, 0)], ["Tare 1 (g)", ...side(G.tare, 0)],
      ["Wet + tin 2 (g)", ...side(G.wet, 1)], ["Dry + tin 2 (g)", ...side(G.dry, 1)], ["Tare 2 (g)", ...side(G.tare, 1)],
    ]));
    expect(table).toMatchObject({ orientation: "across", waterFrom: "tins", dryFrom: "mould" });
    expect(table.problems).toEqual([]);
    waters(table).forEach((water, i) => expect(Math.abs(water - G.water[i]!)).toBeLessThan(0.006));
    expect(peakFormulas(table, { curve: "parabola", specificGravity: null, waterDensity: null }, "Lab")!.single).toBe(
      '=TAMP.PEAKFIT((TAMP.WATERPCT(B5:F5,B6:F6,B7:F7)+TAMP.WATERPCT(B8:F8,B9:F9,B10:F10))/2,TAMP.SOILDRY(TAMP.MOULDWET(B2:F2,B3:F3,B4:F4,"g","cm3"),(TAMP.WATERPCT(B5:F5,B6:F6,B7:F7)+TAMP.WATERPCT(B8:F8,B9:F9,B10:F10))/2),"parabola")');
  });
});

// published worked problem with five different moulds
const N = {
  mould: [4612, 4723, 4595, 4667, 4681], gross: [9578, 9843, 9796, 9895, 9977], volume: [2315, 2334, 2341, 2326, 2353],
  pan: [521, 547, 556, 538, 513], wet: [1047, 1186, 1123, 1074, 1053], dry: [994, 1115, 1056, 1005, 979],
  // derived by definition from the readings
  water: [11.205, 12.5, 13.4, 14.775, 15.88], dryDensity: [1929.0, 1949.9, 1959.2, 1958.3, 1942.3],
};

describe("five different moulds", () => {
  const columns = [
    ["Trial", 1, 2, 3, 4, 5], ["Mould", ...N.mould], ["Mould + soil", ...N.gross], ["Vol. of mould", ...N.volume], ["Pan ID", 11, 12, 13, 14, 15],
    ["Pan wt", ...N.pan], ["Pan + wet", ...N.wet], ["Pan + dry", ...N.dry],
  ];
  test.each([["down", turned(columns)], ["across", columns]] as const)("points %s", (orientation, rows) => {
    const table = recogniseTable(sheet(rows.map((row, r) => r === 0 && orientation === "down" ? row : row)), { roles: { 1: "mouldMass" } });
    expect(table.orientation).toBe(orientation);
    expect(table.problems).toEqual([]);
    waters(table).forEach((water, i) => expect(Math.abs(water - N.water[i]!)).toBeLessThan(0.0006));
    dries(table).forEach((dry, i) => expect(Math.abs(dry * 1000 - N.dryDensity[i]!)).toBeLessThan(0.06));
    expect(table.notes.join(" ")).toContain("taken as g and cm³ from their size");
  });

  test("a bare heading Mould is asked about while its unit is not given, and settled once it is", () => {
    const asked = recogniseTable(sheet(turned(columns)));
    expect(asked.series[1]).toMatchObject({ role: "open", candidates: ["mouldMass", "tinNumber"] });
    expect(asked.points).toEqual([]);
    expect(asked.problems[0]!.says).toContain("mass of the empty mould");
    const withUnits = [...turned(columns)];
    withUnits.splice(1, 0, ["", "g", "g", "ml", "", "g", "g", "g"]);
    expect(recogniseTable(sheet(withUnits)).series[1]).toMatchObject({ role: "mouldMass", roleKnown: "heading", unit: "g", unitKnown: "unit row" });
  });
});

test("grams over cubic feet, as a published ASTM D1557 record has them", () => {
  const table = recogniseTable(sheet([
    ["Wt soil + mold (g)", "Wt of mold (g)", "Mold volume (ft3)", "Can + wet (g)", "Can + dry (g)", "Wt of can (g)"],
    [3821, 1830, 0.0332, 601.7, 577.9, 39.6], [3992, 1830, 0.0332, 511.0, 479.3, 38.4], [3986, 1830, 0.0332, 492.5, 452.2, 39.2],
  ]));
  expect(table.densityUnit).toBe("lb/ft3");
  // as printed, to its last figure
  [[4.42, 126.6], [7.19, 133.9], [9.76, 130.4]].forEach(([water, dry], i) => {
    expect(Math.abs(waters(table)[i]! - water!)).toBeLessThan(0.006);
    expect(Math.abs(dries(table)[i]! - dry!)).toBeLessThan(0.06);
  });
  expect(peakFormulas(table, { curve: "top three", specificGravity: 2.7, waterDensity: 62.4 }, "Other sheet")!.single).toBe(
    '=TAMP.PEAKFIT(TAMP.WATERPCT(Lab!D2:D4,Lab!E2:E4,Lab!F2:F4),TAMP.SOILDRY(TAMP.MOULDWET(Lab!A2:A4,Lab!B2:B4,Lab!C2:C4,"g","ft3"),TAMP.WATERPCT(Lab!D2:D4,Lab!E2:E4,Lab!F2:F4)),"top three",2.7,62.4)');
});

test("pounds of wet soil in a mould of a thirtieth of a cubic foot (Principles of Geotechnical Engineering, 9th edition, 6.4)", () => {
  const table = recogniseTable(sheet([
    ["Volume of mold", 1 / 30, "ft³"], [],
    ["Moisture content (%)", "Weight of wet soil (lb)"],
    [8.6, 3.7], [10.6, 4.15], [12.5, 4.69], [14.9, 4.62], [16.7, 4.02],
  ]));
  expect(table.problems).toEqual([]);
  // the source truncates to a tenth
  [102.2, 112.5, 125.0, 120.6, 103.3].forEach((dry, i) => expect(dries(table)[i]! - dry).toBeGreaterThanOrEqual(-0.001));
  [102.2, 112.5, 125.0, 120.6, 103.3].forEach((dry, i) => expect(dries(table)[i]! - dry).toBeLessThan(0.1));
  expect(table.points[0]!.dryCells.map(({ row, column }) => cellName(row, column))).toEqual(["B4"]);
});
