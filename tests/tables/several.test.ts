import { recogniseTable } from "../../src/tables/recognise";
import { severalTests } from "../../src/tables/several";
import { tableFormula } from "../../src/tables/formulas";
import { sheet, turned, type Typed } from "./sheet";

const rows = (names: readonly Typed[], head = "Test"): Typed[][] => [[head, "Water content (%)", "Dry density (Mg/m³)"],
  ...[8, 10, 12, 14, 9, 11, 13].map((w, i): Typed[] => [names[i] ?? null, w, 1.8 + (i % 3) / 50])];
const told = (all: readonly (readonly Typed[])[]) => {
  const snapshot = sheet(all), table = recogniseTable(snapshot);
  return { table, ...severalTests(table, snapshot) };
};

test("a name beside every point, or beside the first of each test as a merged cell leaves it", () => {
  for (const names of [["A", "A", "A", "A", "B", "B", "B"], ["A", null, null, null, "B", null, null]]) {
    const { tests, index } = told(rows(names));
    expect(tests).toEqual([{ name: "A", points: [0, 1, 2, 3] }, { name: "B", points: [4, 5, 6] }]);
    expect(index).toBe(0);
  }
});
test("points of one test need not stand together, and numbers name a test too", () => expect(told(rows([1, 2, 1, 2, 1, 2, 1])).tests).toEqual([{ name: "1", points: [0, 2, 4, 6] }, { name: "2", points: [1, 3, 5] }]));
test("across the columns", () => expect(told(turned(rows(["A", "A", "A", "A", "B", "B", "B"]))).tests).toHaveLength(2));
test.each([
  ["a number for every point", rows([1, 2, 3, 4, 5, 6, 7], "Test no")], ["one name", rows(["A", null, null, null, null, null, null])],
  ["a test of two points", rows(["A", "A", "A", "A", "A", "B", "B"])], ["points before the first name", rows([null, "A", "A", "A", "B", "B", "B"])], ["a column of remarks", rows(["wet", "wet", "wet", "wet", "dry", "dry", "dry"], "Remark")],
] as [string, Typed[][]][])("one test: %s", (_, all) => expect(told(all).tests).toEqual([]));

test("its live formula gives a row for each test", () => {
  const { table, index } = told(rows(["A", null, null, null, "B", null, null]));
  expect(tableFormula(table, index, { curve: "auto", specificGravity: 2.7, waterDensity: null }, "Lab")).toBe('=TAMP.PEAKTABLE(A2:A8,B2:B8,C2:C8,"auto",2.7,"Mg/m3")');
  expect(tableFormula(table, index, { curve: "cubic", specificGravity: null, waterDensity: null }, "Other")).toBe('=TAMP.PEAKTABLE(Lab!A2:A8,Lab!B2:B8,Lab!C2:C8,"cubic")');
});
