import { metadata, built } from "../support/host-runtime";
import vm from "node:vm";
import { createRuntime } from "../../src/engine/custom-functions";
import { headlessEngine, type HeadlessEngine, type SheetResults } from "../../src/engine/headless";
import type { Book, BookCell } from "../../src/workbook/file/book";
import { CellError, type Cell } from "../../src/worksheet/cell";
import { parseRange } from "../../src/workbook/address";

declare const nodeRequire: (name: string) => unknown;

let engine: HeadlessEngine;
beforeAll(() => {
  const runtime = createRuntime();
  vm.runInNewContext(built("functions.js").toString("utf8"), { CustomFunctions: runtime.CustomFunctions });
  engine = headlessEngine(nodeRequire, metadata(), runtime);
}, 60_000);
afterAll(() => engine.dispose());

type Content = number | string | boolean;

/** A book of one sheet from cells by name; a text that starts with = is a formula. */
function book(cells: Readonly<Record<string, Content>>): Book {
  const list = Object.entries(cells).map(([name, content]): BookCell => {
    const { row, column } = parseRange(name)!;
    return typeof content === "string" && content.startsWith("=") ? { row, column, value: null, formula: content.slice(1), style: 0 } : { row, column, value: content, style: 0 };
  });
  return {
    sheets: [{
      name: "Sheet1", part: "", hidden: false, protected: false, cells: list, rows: Math.max(...list.map((cell) => cell.row)) + 1, columns: 30,
      merges: [], hiddenRows: [], hiddenColumns: [], widths: new Map(), heights: new Map(), frozen: { rows: 0, columns: 0 }, notes: [], marks: [],
    }],
    names: [], tables: [], styles: [{ format: "General" }], date1904: false, settings: {},
  };
}

const at = ([sheet]: readonly SheetResults[], name: string) => {
  const { row, column } = parseRange(name)!;
  return sheet!.results.find((result) => result.row === row && result.column === column)!;
};
const column = (start: number, name: string, values: readonly Content[]): Record<string, Content> => Object.fromEntries(values.map((value, i) => [`${name}${start + i}`, value]));

test("a column in, a column out, with a bad row in its own cell and its message beside it", async () => {
  const results = await engine.compute(book({ ...column(1, "A", ["wet density", 2, 2.05, 2.1, 2.08]), ...column(1, "B", ["w %", 12, "n/a", 14, 15]), C1: "=TAMP.SOILDRY(A1:A5,B1:B5)" }));
  const { fills } = at(results, "C1");
  expect(fills!.map(([cell]) => cell instanceof CellError ? cell.code : cell)).toEqual(["", expect.closeTo(2 / 1.12, 12), "#VALUE!", expect.closeTo(2.1 / 1.14, 12), expect.closeTo(2.08 / 1.15, 12)]);
  expect((fills![2]![0] as CellError).says).toMatch(/must be a number, not "n\/a"/);
});

test("whole columns are trimmed to their used part", async () => {
  const results = await engine.compute(book({ ...column(1, "A", [2, 2.05, 2.1]), ...column(1, "B", [12, 13, 14]), C1: "=TAMP.SOILDRY(A:A,B:B)" }));
  expect(at(results, "C1").fills).toHaveLength(3);
});

test("a text that looks like a number stays a text, a text like a date too", async () => {
  const results = await engine.compute(book({ A1: '=TAMP.SOILDRY("12",12)', A2: '=TAMP.SOILDRY(2,"1/2")' }));
  for (const [name, says] of [["A1", /text "12"/], ["A2", /not "1\/2"/]] as const) expect((at(results, name).value as CellError).says).toMatch(says);
});

test("native functions take our columns, and ours take theirs", async () => {
  const results = await engine.compute(book({ ...column(1, "A", [2, 2.05]), ...column(1, "B", [12, 13]), C1: "=AVERAGE(TAMP.SOILDRY(A1:A2,B1:B2))", C2: "=TAMP.SOILDRY(SUM(A1:A2)/2,12)", C3: "=TAMP.RELCOMP(C2,TAMP.SOILWET(1.9,2))" }));
  expect(at(results, "C1").value).toBeCloseTo((2 / 1.12 + 2.05 / 1.13) / 2, 12);
  expect(at(results, "C2").value).toBeCloseTo(2.025 / 1.12, 12);
  expect(at(results, "C3").value).toBeCloseTo(100 * (2.025 / 1.12) / (1.9 * 1.02), 10);
});

test("an error passes through by its own code; blanks are told", async () => {
  const results = await engine.compute(book({ A1: "=1/0", B1: 12, C1: "=TAMP.SOILDRY(A1,B1)", C2: "=TAMP.SOILDRY(A9,B1)", C3: "=TAMP.PEAKDRY(A5:A7,B5:B7)" }));
  expect(at(results, "C1").value).toEqual(expect.objectContaining({ code: "#DIV/0!" }));
  expect(at(results, "C2").value).toEqual(expect.objectContaining({ code: "#VALUE!", says: expect.stringMatching(/blank/) }));
  expect(at(results, "C3").value).toEqual(expect.objectContaining({ code: "#N/A", says: expect.stringMatching(/no points/) }));
});

test("a spill into a filled cell says so and fills nothing", async () => {
  const results = await engine.compute(book({ ...column(1, "A", [2, 2.05, 2.1]), B1: 12, C1: "=TAMP.SOILDRY(A1:A3,B1)", C2: "mine" }));
  expect(at(results, "C1").value).toEqual(expect.objectContaining({ code: "#SPILL!" }));
  expect(at(results, "C1").fills).toBeUndefined();
});

test("the peak's block fills thirteen rows and four columns", async () => {
  // published worked example of AS 1289.5.1.1 (set P): 2.01 t/m3 at 11.0 %
  const results = await engine.compute(book({ ...column(1, "A", [8.9, 10.1, 11.4, 13.0]), ...column(1, "B", [1.948, 1.996, 2.006, 1.964]), D1: "=TAMP.PEAKFIT(A1:A4,B1:B4)" }));
  const { fills } = at(results, "D1");
  expect(fills).toHaveLength(13);
  expect((fills![1]![1] as number).toFixed(2)).toBe("2.01");
  expect((fills![2]![1] as number).toFixed(1)).toBe("11.1");
  expect(fills!.every((row: readonly Cell[]) => row.length === 4)).toBe(true);
});

test("ten thousand rows in one call", async () => {
  const rows = 10_000;
  const results = await engine.compute(book({ ...column(1, "A", Array.from({ length: rows }, (_, i) => 1.8 + i % 7 / 10)), ...column(1, "B", Array.from({ length: rows }, (_, i) => 8 + i % 12)), C1: `=TAMP.SOILDRY(A1:A${rows},B1:B${rows})` }));
  expect(at(results, "C1").fills).toHaveLength(rows);
}, 60_000);
