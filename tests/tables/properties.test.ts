import fc from "fast-check";
import { peakFormulas } from "../../src/tables/formulas";
import { recogniseTable } from "../../src/tables/recognise";
import { CellError, type Cell } from "../../src/worksheet/cell";
import { sheet, turned, type Typed } from "./sheet";

const runs = 300, seed = 7;

/** Water contents that rise, and dry densities of a curve with some scatter, in Mg/m3. */
const test5 = fc.tuple(fc.double({ min: 6, max: 25, noNaN: true }), fc.double({ min: 1.3, max: 2.2, noNaN: true }), fc.array(fc.double({ min: -0.004, max: 0.004, noNaN: true }), { minLength: 4, maxLength: 8 }))
  .map(([start, top, scatter]) => scatter.map((off, i) => ({ water: start + 1.5 * i, dry: top - 0.006 * (i - scatter.length / 2) ** 2 + off })));

const UNITS = [["Mg/m3", 1, "Mg/m³"], ["kg/m3", 1000, "kg/m3"], ["kN/m3", 9.80665, "kN/m³"], ["lb/ft3", 62.4279606, "pcf"]] as const;

test("a table comes back as it was laid out, whichever way", () => {
  let met = 0, across = 0, fractions = 0;
  fc.assert(fc.property(test5, fc.constantFrom(...UNITS), fc.record({ across: fc.boolean(), densityFirst: fc.boolean(), wet: fc.boolean(), percentFormat: fc.boolean(), unitRow: fc.boolean(), title: fc.boolean() }), (points, [unit, factor, spelled], how) => {
    const heading = (words: string, inside: string): Typed[] => how.unitRow ? [words, inside] : [`${words} (${inside})`];
    const water: Typed[] = [...heading("Water content", "%"), ...points.map(({ water: w }): Typed => how.percentFormat ? { value: w / 100, format: "0.0%" } : w)];
    const density: Typed[] = [...heading(how.wet ? "Bulk density" : "Dry density", spelled), ...points.map(({ water: w, dry }): Typed => dry * factor * (how.wet ? 1 + w / 100 : 1))];
    const lines = how.densityFirst ? [density, water] : [water, density];
    const body = how.across ? lines : turned(lines);
    const table = recogniseTable(sheet(how.title ? [["Compaction test 4"], [], ...body] : body));
    expect(table.problems).toEqual([]);
    expect(table.orientation).toBe(how.across ? "across" : "down");
    expect(table.densityUnit).toBe(unit);
    expect(table.points).toHaveLength(points.length);
    table.points.forEach((point, i) => {
      expect(point.water).toBeCloseTo(points[i]!.water, 9);
      expect(point.dry / factor).toBeCloseTo(points[i]!.dry, 9);
    });
    expect(peakFormulas(table, { curve: "auto", specificGravity: null, waterDensity: null }, "Lab")!.single!.includes("*100")).toBe(how.percentFormat);
    met++; across += Number(how.across); fractions += Number(how.percentFormat);
  }), { numRuns: runs, seed });
  expect(met).toBe(runs);
  expect(Math.min(across, runs - across, fractions, runs - fractions)).toBeGreaterThan(runs / 4);
});

test("no selection, however odd, breaks the reading or makes a number of nothing", () => {
  const cell: fc.Arbitrary<Cell> = fc.oneof(
    fc.double(), fc.integer(), fc.string(), fc.boolean(), fc.constant(null), fc.constant(new CellError("#N/A", "")),
    fc.constantFrom("Water content", "w", "MC", "Dry density (pcf)", "Density", "m1", "m2", "Wet + tin", "Dry + tin", "Tare", "Mould + soil", "Mould", "Volume", "%", "g", "Average", "12,5", "9 %"), fc.double({ min: 0, max: 30, noNaN: true }), fc.double({ min: 1, max: 2.3, noNaN: true }));
  const heading = fc.constantFrom("Water content (%)", "Dry density", "Bulk density", "Wet + tin", "Dry + tin", "Tare", "Mould + soil (g)", "Mass of mould (g)", "Volume (cm3)", "Density");
  const reading = fc.double({ min: 1, max: 2.3, noNaN: true });
  let met = 0, withPoints = 0;
  fc.assert(fc.property(fc.integer({ min: 1, max: 5 }).chain((columns) => fc.tuple(fc.array(fc.oneof(cell, heading, heading), { minLength: columns, maxLength: columns }), fc.array(fc.array(fc.oneof(cell, reading, reading, reading), { minLength: columns, maxLength: columns }), { minLength: 1, maxLength: 9 }))), ([first, rest]) => {
    const rows = [first, ...rest];
    const table = recogniseTable(sheet(rows));
    for (const { water, dry, waterCells, dryCells } of table.points) {
      expect(Number.isFinite(water) && water >= 0 && Number.isFinite(dry) && dry > 0).toBe(true);
      expect(waterCells.length * dryCells.length).toBeGreaterThan(0);
    }
    for (const { says } of table.problems) expect(says).not.toMatch(/undefined|NaN|\[object/);
    if (table.points.length > 0) { withPoints++; peakFormulas(table, { curve: "auto", specificGravity: 2.7, waterDensity: null }, "Lab")!.block({ row: 0, column: 9 }, { rows: 10, columns: 4 }); }
    met++;
  }), { numRuns: 3000, seed });
  expect(met).toBe(3000);
  expect(withPoints).toBeGreaterThan(30);
});
