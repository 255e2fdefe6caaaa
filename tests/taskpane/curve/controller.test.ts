import { fitTest } from "../../../src/compaction/fit-test";
import { CurveController, filledRegion, keyOf, type Shown } from "../../../taskpane/curve/controller";
import { PEAK_BLOCK } from "../../../taskpane/curve/peak-block";
import type { Area } from "../../../src/workbook/port";
import { MemoryWorkbook } from "../memory-workbook";
import { sheet } from "../../tables/sheet";

const LAB = [
  ["Gs", 2.7, null, null], [null, null, null, null],
  ["Point", "Water content (%)", "Dry density (t/m³)", null],
  [1, 8.9, 1.948, null], [2, 10.1, 1.996, null], [3, 11.4, 2.006, null], [4, 13.0, 1.964, null],
  [null, null, null, null], [null, null, null, null], ["a remark", null, null, null],
];
const TABLE: Area = { sheet: "Lab", row: 2, column: 0, rows: 5, columns: 3 };
const cell = (row: number, column: number): Area => ({ sheet: "Lab", row, column, rows: 1, columns: 1 });

/** The pane's mind with a workbook in memory, a view that keeps what it was shown, and a clock wound by hand. */
async function open(selected: Area | null = TABLE, rows = LAB): Promise<{ book: MemoryWorkbook; controller: CurveController; shown: () => Shown; said: () => string; settle: () => Promise<void>; waiting: () => number }> {
  const book = new MemoryWorkbook({ Lab: rows });
  if (selected) book.select(selected);
  const shows: Shown[] = [], said: string[] = [];
  let due: (() => void)[] = [];
  const clock = { set: (run: () => void) => { due.push(run); return run; }, clear: (handle: unknown) => { due = due.filter((run) => run !== handle); } };
  const controller = new CurveController(book, { show: (one) => shows.push(one), announce: (text) => said.push(text) }, fitTest, clock);
  await controller.start();
  return {
    book, controller, shown: () => shows.at(-1)!, said: () => said.at(-1) ?? "", waiting: () => due.length,
    async settle() { const run = due; due = []; run.forEach((one) => one()); for (let i = 0; i < 30; i++) await Promise.resolve(); },
  };
}

describe("following the selection", () => {
  test("what the user chooses while the table is read again is not lost to what was remembered before", async () => {
    const { book, controller, shown, settle } = await open();
    const recall = book.recall.bind(book);
    let answer = (): void => undefined;
    const held = new Promise<void>((resolve) => { answer = resolve; });
    book.recall = async (key) => { const before = await recall(key); await held; return before; };
    book.select({ ...TABLE });
    await settle();
    await controller.choose({ waterDensity: "1" });
    expect(shown().look!.choices.waterDensity).toBe("1");
    answer();
    await settle();
    expect(shown().look!.choices.waterDensity).toBe("1");
  });
  test("the selected table is read at once, with the specific gravity beside it", async () => {
    const { shown } = await open();
    expect(shown().look!.recognised).toContain("4 points, B4:C7");
    expect(shown().look!.specificGravity).toMatchObject({ value: 2.7, from: "sheet" });
    expect(shown().look!.fit).not.toBeNull();
  });
  test("whole columns are cut to the used part", async () => {
    const { shown } = await open({ sheet: "Lab", row: 0, column: 1, rows: 1_048_576, columns: 2 });
    expect(shown().look!.table.points).toHaveLength(4);
  });
  test("numbers without their headings find them above", async () => {
    const { shown } = await open({ sheet: "Lab", row: 3, column: 1, rows: 4, columns: 2 });
    expect(shown().look!.table.series.map(({ role, roleKnown }) => [role, roleKnown])).toEqual([["waterContent", "heading"], ["dryDensity", "heading"]]);
  });
  test("a block that goes on and on is not cut to what was looked at: the user is asked for a part", async () => {
    const long = [["Water content (%)", "Dry density (t/m³)"], ...Array.from({ length: 300 }, (_, i) => [8 + i % 7, 1.8 + i % 5 / 50])] as typeof LAB;
    const { shown } = await open(cell(100, 1), long);
    expect(shown().look).toBeNull();
    expect(shown().instead).toMatch(/goes on for more than \d+ rows or columns\. Select the part that is one test/);
  });
  test("a lone cell stands for the filled block about it", async () => {
    const { shown } = await open(cell(5, 2));
    expect(shown().look!.table.points).toHaveLength(4);
  });
  test("a click elsewhere keeps the table that is shown; another block selected replaces it", async () => {
    const { book, shown, settle } = await open();
    book.select(cell(9, 0));
    await settle();
    expect(shown().look!.table.points).toHaveLength(4);
    book.select({ sheet: "Lab", row: 20, column: 0, rows: 3, columns: 3 });
    await settle();
    expect(shown()).toMatchObject({ look: null, instead: expect.stringContaining("empty") });
  });
  test("several events in a row are one piece of work", async () => {
    const { book, waiting } = await open();
    book.select(cell(0, 0)); book.select(cell(1, 0)); book.select(cell(2, 0));
    expect(waiting()).toBe(1);
  });
  test("nothing selected is said", async () => expect((await open(null)).shown().instead).toContain("Select a laboratory test"));
});

test("typing a reading moves the selection and changes the peak", async () => {
  const { book, shown, settle } = await open();
  const before = shown().look!.fit!.maxDryDensity.value;
  book.type("Lab", 5, 2, 2.02);
  book.select(cell(6, 2));
  await settle();
  expect(shown().look!.fit!.maxDryDensity.value).toBeGreaterThan(before + 0.004);
});

test("choices are kept in the workbook for this table and come back with it", async () => {
  const { book, controller, shown, settle } = await open();
  await controller.choose({ curve: "top three", specificGravity: "2.65" });
  expect(shown().look!.fit!.curve).toBe("top three");
  expect(book.settings.get(keyOf(TABLE))).toContain("top three");
  book.select({ ...TABLE, rows: 4 });
  await settle();
  expect(shown().look!.choices.curve).toBe("auto");
  book.select(TABLE);
  await settle();
  expect(shown().look!.choices).toMatchObject({ curve: "top three", specificGravity: "2.65" });
});

describe("writing", () => {
  test("goes to the first free block beside the table, as a live formula", async () => {
    const { book, controller, said } = await open();
    await controller.write("", PEAK_BLOCK);
    expect(book.holds("Lab", 2, 4)).toBe('=TAMP.PEAKFIT(B4:B7,C4:C7,"auto",B1,"Mg/m3")');
    expect(said()).toBe("Wrote E3:H15. The figures follow the readings.");
  });
  test("filled cells are named and asked about, and only those are replaced", async () => {
    const rows = LAB.map((row) => [...row]);
    rows[4]![3] = "mine";
    const { book, controller, shown, said } = await open(TABLE, rows);
    await controller.write("D4", PEAK_BLOCK);
    expect(book.holds("Lab", 3, 3)).toBeNull();
    expect(shown().consent).toEqual({ cells: [cell(4, 3)], count: 1, at: "D4" });
    expect(said()).toContain("D5 is filled");
    controller.keep();
    expect(shown().consent).toBeNull();
    expect(book.holds("Lab", 3, 3)).toBeNull();
    await controller.write("D4", PEAK_BLOCK);
    await controller.replace();
    expect(book.holds("Lab", 3, 3)).toContain("TAMP.PEAKFIT");
    expect(shown().consent).toBeNull();
  });
  test("an address that is none is said", async () => {
    const { controller, said } = await open();
    await controller.write("over there", PEAK_BLOCK);
    expect(said()).toContain('"over there" is not a cell');
  });
});

describe("marks", () => {
  test("go on the points with findings, and come off again", async () => {
    const { book, controller, said } = await open();
    await controller.choose({ specificGravity: "2.62", assumed: false });
    await controller.mark();
    expect(book.marks.map(({ area, kind }) => [area.row, area.column, kind])).toEqual([[6, 2, "past-line"], [6, 1, "past-line"]]);
    expect(said()).toBe("Marked 1 point.");
    await controller.unmark();
    expect(book.marks).toEqual([]);
    expect(said()).toContain("Removed 2 marks");
  });
  test("none to set is said", async () => {
    const { book, controller, said } = await open();
    await controller.mark();
    expect(book.marks).toEqual([]);
    expect(said()).toContain("nothing to mark");
  });
});

test("the filled block about a cell ends at blank rows and columns", () => {
  const block = sheet([[1, 2, null, 9], [3, 4, null, 9], [null, null, null, null], [5, 5, null, null]]);
  expect(filledRegion(block, { ...block.area, row: 1, column: 1, rows: 1, columns: 1 })).toMatchObject({ row: 0, column: 0, rows: 2, columns: 2 });
  expect(filledRegion(block, { ...block.area, row: 2, column: 2, rows: 1, columns: 1 })).toMatchObject({ row: 0, column: 0, rows: 4, columns: 4 });
});
