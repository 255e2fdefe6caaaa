import { fitTest } from "../../../src/compaction/fit-test";
import { CurveController, TABLE_COLUMNS, type Shown } from "../../../taskpane/curve/controller";
import { readComparing, writeComparing, noComparing } from "../../../taskpane/curve/compare";
import { peakTable } from "../../../src/worksheet/beyond-one-curve";
import type { Area } from "../../../src/workbook/port";
import { MemoryWorkbook } from "../memory-workbook";

const lab = (optimum: number, most: number): [number, number][] => [-4, -2, 0, 2, 4].map((step) => [optimum + step, Number((most - 0.005 * step * step).toFixed(4))]);
const HEAD = ["Water content (%)", "Dry density (Mg/m³)"];
const sheets = {
  Standard: [HEAD, ...lab(14, 1.85)], Modified: [HEAD, ...lab(11, 1.98)], Pounds: [["Water content (%)", "Dry density (pcf)"], ...lab(14, 1.85).map(([w, d]) => [w, d * 62.4])],
  Series: [["Test", ...HEAD], ...lab(17, 1.70).map((p, i) => [i === 0 ? "light" : null, ...p]), ...lab(15, 1.80).map((p, i) => [i === 0 ? "middle" : null, ...p]), ...lab(12, 1.91).map((p, i) => [i === 0 ? "heavy" : null, ...p])],
};
const whole = (sheet: string, rows = 6, columns = 2): Area => ({ sheet, row: 0, column: 0, rows, columns });

async function open(first: Area) {
  const book = new MemoryWorkbook(sheets), shows: Shown[] = [], said: string[] = [];
  let due: (() => void)[] = [];
  const clock = { set: (run: () => void) => { due.push(run); return run; }, clear: (handle: unknown) => { due = due.filter((run) => run !== handle); } };
  book.select(first);
  const controller = new CurveController(book, { show: (one) => shows.push(one), announce: (text) => said.push(text) }, fitTest, clock);
  await controller.start();
  const settle = async (): Promise<void> => { const run = due; due = []; run.forEach((one) => one()); for (let i = 0; i < 80; i++) await Promise.resolve(); };
  return { book, controller, shown: () => shows.at(-1)!, said: () => said.at(-1) ?? "", settle };
}

test("a kept test stands beside the next, in the plot and in the table, and follows its cells", async () => {
  const { book, controller, shown, settle } = await open(whole("Standard"));
  expect(shown().comparison!.tests).toHaveLength(1);
  await controller.keepTest();
  book.select(whole("Modified"));
  await settle();
  const { tests } = shown().comparison!;
  expect(tests.map(({ name, is }) => [name, is])).toEqual([["Modified!A2:B6", "own"], ["Standard!A2:B6", "kept"]]);
  expect(shown().look!.plot!.beside.map(({ name }) => name)).toEqual(["Standard!A2:B6"]);
  const before = tests[1]!.fit!.maxDryDensity.value;
  book.type("Standard", 3, 1, 1.90);
  await settle();
  expect(shown().comparison!.tests[1]!.fit!.maxDryDensity.value).toBeGreaterThan(before);
  await controller.dropTest("Standard!A2:B6");
  expect(shown().comparison!.tests).toHaveLength(1);
  expect(shown().look!.plot!.beside).toEqual([]);
});

test("efforts: what the heavier gains, and a pair that contradicts it", async () => {
  const { book, controller, shown, settle } = await open(whole("Standard"));
  await controller.keepTest();
  book.select(whole("Modified"));
  await settle();
  await controller.choose({ specificGravity: "2.70" });
  await controller.setEffort("Standard!A2:B6", "595");
  expect(shown().comparison!.efforts).toBeNull();
  // a comma is a decimal sign here, as in every field: 2.7 is no effort
  await controller.setEffort("Modified!A2:B6", "2,700");
  expect(shown().comparison!.effortTroubles).toHaveLength(1);
  await controller.setEffort("Modified!A2:B6", "12");
  expect(shown().comparison!.effortTroubles[0]).toMatch(/effort "12" of Modified!A2:B6 is not a number between 50 and 10000/);
  await controller.setEffort("Modified!A2:B6", "2700");
  const { efforts } = shown().comparison!;
  expect(efforts!.steps[0]!.gainPerDecade).toBeCloseTo(0.13 / Math.log10(2700 / 595), 6);
  expect(efforts!.contradictions).toEqual([]);
  await controller.setEffort("Modified!A2:B6", "300");
  expect(shown().comparison!.efforts!.contradictions.length).toBeGreaterThan(0);
});

test("several tests in one selection: one is shown, the others beside it, and the family is at hand", async () => {
  const { controller, shown, said, book } = await open(whole("Series", 16, 3));
  expect(shown().look!.recognised).toMatch(/^3 tests in one selection, light shown: 5 points/);
  expect(shown().look!.fit!.optimumWater.value).toBeCloseTo(17, 6);
  expect(shown().comparison!.tests.map(({ name, is }) => [name, is])).toEqual([["light", "own"], ["middle", "in the selection"], ["heavy", "in the selection"]]);
  expect(shown().comparison!.family!.curves.map(({ id }) => id)).toEqual(["light", "middle", "heavy"]);
  await controller.choose({ test: "heavy" });
  expect(shown().look!.fit!.optimumWater.value).toBeCloseTo(12, 6);
  expect(shown().look!.table.points).toHaveLength(5);
  await controller.write("E1", { rows: 13, columns: 4 });
  expect(said()).toMatch(/^Wrote E1:N4/);
  expect(book.holds("Series", 0, 4)).toBe('=TAMP.PEAKTABLE(A2:A16,B2:B16,C2:C16,"auto")');
  const column = (c: number) => sheets.Series.slice(1).map((row) => [row[c]]);
  const table = peakTable(column(0), { waters: column(1), dries: column(2), curve: null, gs: null, water: null }) as unknown[][];
  expect([table.length, table[0]!.length]).toEqual([4, TABLE_COLUMNS]);
});

test("a test in another unit is named, and compared with nothing", async () => {
  const { book, controller, shown, settle } = await open(whole("Pounds"));
  await controller.keepTest();
  book.select(whole("Standard"));
  await settle();
  expect(shown().comparison!.otherUnit).toEqual(["Pounds!A2:B6"]);
  expect(shown().comparison!.family).toBeNull();
  expect(shown().look!.plot!.beside).toEqual([]);
});

test("what is remembered comes back, and a stranger's workbook is not trusted", () => {
  const comparing = { kept: [{ name: "A", area: whole("Standard") }], efforts: { A: "595" } };
  expect(readComparing(writeComparing(comparing))).toEqual(comparing);
  for (const text of [null, "", "x", "[]", "7", '{"kept":[{"name":1}],"efforts":[]}', '{"kept":[{"name":"A","area":{"sheet":"S","row":-1,"column":0,"rows":1,"columns":1}}]}']) expect(readComparing(text)).toEqual(noComparing);
});
