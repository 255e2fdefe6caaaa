import type { Area, Placement, WorkbookPort } from "../../src/workbook/port";
import { SIGNATURE } from "../../src/workbook/port";
import { CellError } from "../../src/worksheet/cell";

/**
 * What every adapter of the workbook port must do. The host under test opens with this workbook:
 * sheet "Plain":  A1 "w %", B1 "dry", A2 12, B2 1.8, A3 14, B3 =B2*1.05, A4 =1/0; D1:E2 merged; a note of the user's on B2;
 * sheet "Second sheet": empty; sheet "Locked": protected, A1 "locked".
 */
export interface ContractHost {
  readonly port: WorkbookPort;
  /** the note on a cell, whosever it is */
  note(sheet: string, row: number, column: number): Promise<string | null>;
  /** how many conditional formats of ours a sheet carries */
  ourMarks(sheet: string): Promise<number>;
  /** a fingerprint of everything of the user's: values, formulas, the user's own formats and notes */
  users(): Promise<string>;
  select(area: Area): Promise<void>;
  /** resolves when what was last asked to be listened to is listened to, where that takes time */
  listening?(): Promise<unknown>;
}

export const USER_NOTE = "weighed twice";

export const area = (sheet: string, row: number, column: number, rows = 1, columns = 1): Area => ({ sheet, row, column, rows, columns });
const one = (sheet: string, row: number, column: number, content: Placement["cells"][number][number]): Placement => ({ sheet, row, column, cells: [[content]] });

export function portContract(make: () => Promise<ContractHost>): void {
  let host: ContractHost, port: WorkbookPort;
  beforeEach(async () => {
    host = await make();
    port = host.port;
  });

  const value = async (at: Area): Promise<unknown> => {
    const read = await port.read(at);
    if (!read.ok) throw new Error(read.says);
    return read.value.values[0]![0];
  };

  test("lists its sheets with what they use", async () => {
    const sheets = await port.sheets();
    expect(sheets.map(({ name }) => name)).toEqual(["Plain", "Second sheet", "Locked"]);
    expect(sheets[0]!.used).toEqual(expect.objectContaining({ sheet: "Plain", row: 0, column: 0, rows: 4 }));
    expect(sheets[1]!.used).toBeNull();
    expect(sheets.map((sheet) => sheet.protected)).toEqual([false, false, true]);
  });

  test("reads values, formulas and texts; errors are errors, blanks are blanks", async () => {
    const read = await port.read(area("Plain", 0, 0, 5, 2));
    if (!read.ok) throw new Error(read.says);
    const { values, formulas, texts } = read.value;
    expect(values.slice(0, 3)).toEqual([["w %", "dry"], [12, 1.8], [14, expect.closeTo(1.89, 10)]]);
    expect(values[3]![0]).toBeInstanceOf(CellError);
    expect((values[3]![0] as CellError).code).toBe("#DIV/0!");
    expect(values[3]![1]).toBeNull();
    expect(formulas[2]![1]).toBe("=B2*1.05");
    expect(formulas[1]).toEqual([null, null]);
    expect(texts[0]).toEqual(["w %", "dry"]);
  });

  test("a whole column is read as far as it is used", async () => {
    const read = await port.read(area("Plain", 0, 0, 1_048_576, 1));
    if (!read.ok) throw new Error(read.says);
    expect(read.value.values.length).toBeGreaterThanOrEqual(4);
    expect(read.value.values.length).toBeLessThanOrEqual(20_000);
  });

  test("a sheet that is not there is refused by name, in every request", async () => {
    const nowhere = area("Nowhere", 0, 0);
    for (const answer of [await port.read(nowhere), await port.write([one("Nowhere", 0, 0, { value: 1 })], []), await port.mark([{ area: nowhere, kind: "ask" }]), await port.goTo(nowhere)])
      expect(answer).toEqual(expect.objectContaining({ ok: false, why: "gone", says: expect.stringContaining("Nowhere") }));
  });

  test("writes constants and live formulas into blank cells", async () => {
    const written = await port.write([{ sheet: "Plain", row: 6, column: 0, cells: [[{ value: "peak" }, { value: 3 }, { formula: "=A2*2" }], [{ value: true }, null, { value: -1.5 }]] }], []);
    expect(written.ok).toBe(true);
    expect([await value(area("Plain", 6, 0)), await value(area("Plain", 6, 1)), await value(area("Plain", 6, 2)), await value(area("Plain", 7, 0)), await value(area("Plain", 7, 1)), await value(area("Plain", 7, 2))]).toEqual(["peak", 3, 24, true, null, -1.5]);
  });

  test("never over filled cells without consent, and then nothing is written at all", async () => {
    const before = await host.users();
    const refused = await port.write([one("Plain", 8, 0, { value: 1 }), one("Plain", 1, 0, { value: 99 })], []);
    expect(refused).toEqual(expect.objectContaining({ ok: false, why: "filled", where: [area("Plain", 1, 0)] }));
    expect(await host.users()).toBe(before);
    expect(await value(area("Plain", 8, 0))).toBeNull();
  });

  test("consent names the very cells: one of two is not enough, both are", async () => {
    const what = [{ sheet: "Plain", row: 1, column: 0, cells: [[{ value: 90 }, { value: 91 }]] }];
    expect(await port.write(what, [area("Plain", 1, 0)])).toEqual(expect.objectContaining({ ok: false, where: [area("Plain", 1, 1)] }));
    expect((await port.write(what, [area("Plain", 1, 0, 1, 2)])).ok).toBe(true);
    expect(await value(area("Plain", 1, 1))).toBe(91);
  });

  test("a spill counts with all it will fill", async () => {
    const spill = one("Plain", 1, 2, { formula: "=A1:A3", reaches: { rows: 3, columns: 1 } });
    expect((await port.write([one("Plain", 3, 2, { value: "mine" })], [])).ok).toBe(true);
    expect(await port.write([spill], [])).toEqual(expect.objectContaining({ ok: false, why: "filled", where: [area("Plain", 3, 2)] }));
    expect((await port.write([spill], [area("Plain", 3, 2)])).ok).toBe(true);
    expect(await value(area("Plain", 2, 2))).toBe(12);
    expect(await value(area("Plain", 3, 2))).toBe(14);
    // only the cell that spills has a formula; what it fills has none of its own
    const read = await port.read(area("Plain", 1, 2, 3, 1));
    expect(read.ok && read.value.formulas.map(([formula]) => formula)).toEqual(["=A1:A3", null, null]);
  });

  test("merged and protected cells are refused, and said to be so", async () => {
    expect(await port.write([one("Plain", 1, 4, { value: 1 })], [])).toEqual(expect.objectContaining({ ok: false, why: "merged" }));
    expect(await port.write([one("Locked", 5, 5, { value: 1 })], [])).toEqual(expect.objectContaining({ ok: false, why: "protected", says: expect.stringContaining("Locked") }));
  });

  test("unmarking gives back exactly what was there before marking", async () => {
    const before = await host.users();
    const marked = await port.mark([
      { area: area("Plain", 1, 0, 2, 1), kind: "past-line", note: "Past the line." },
      { area: area("Plain", 1, 1), kind: "doubtful", note: "Look at this." },
      { area: area("Second sheet", 4, 4), kind: "ask" },
    ]);
    // B2 has a note of the user's, which stays
    expect(marked).toEqual({ ok: true, value: { notesLeftOut: [area("Plain", 1, 1)] } });
    expect(await host.note("Plain", 1, 1)).toBe(USER_NOTE);
    expect(await host.note("Plain", 1, 0)).toBe(`${SIGNATURE}: Past the line.`);
    expect([await host.ourMarks("Plain"), await host.ourMarks("Second sheet")]).toEqual([2, 1]);
    expect(await host.users()).toBe(before);

    expect(await port.unmark("Plain")).toEqual({ ok: true, value: { removed: 2 } });
    expect([await host.ourMarks("Plain"), await host.ourMarks("Second sheet")]).toEqual([0, 1]);
    expect(await host.note("Plain", 1, 0)).toBeNull();
    expect(await port.unmark(null)).toEqual({ ok: true, value: { removed: 1 } });
    expect(await host.users()).toBe(before);
  });

  test("marking twice is marking once", async () => {
    const mark = { area: area("Plain", 1, 0), kind: "past-line", note: "Once." } as const;
    await port.mark([mark]);
    await port.mark([{ ...mark, note: "Twice." }]);
    expect(await host.ourMarks("Plain")).toBe(1);
    expect(await host.note("Plain", 1, 0)).toBe(`${SIGNATURE}: Twice.`);
  });

  test("remembers a setting longer than a host keeps in one property, whole and by letters of any width", async () => {
    const long = `{"kept":"${"0123456789".repeat(40)} ρ_d €uro 🧱 ${"x".repeat(300)}"}`;
    await port.remember("long", long);
    expect(await port.recall("long")).toBe(long);
    await port.remember("long", "short");
    expect(await port.recall("long")).toBe("short");
    await port.remember("long", null);
    expect(await port.recall("long")).toBeNull();
  });

  test("remembers small settings, and forgets them", async () => {
    expect(await port.recall("gs")).toBeNull();
    await port.remember("gs", "2.70");
    expect(await port.recall("gs")).toBe("2.70");
    await port.remember("gs", "2.65");
    expect(await port.recall("gs")).toBe("2.65");
    await port.remember("gs", null);
    expect(await port.recall("gs")).toBeNull();
  });

  test("tells of a selection until it is no longer listened to", async () => {
    const heard: Area[] = [];
    const stop = port.on("selection", (at) => heard.push(at));
    await host.listening?.();
    await host.select(area("Plain", 1, 0, 3, 2));
    await until(() => heard.length > 0);
    expect(heard[heard.length - 1]).toEqual(area("Plain", 1, 0, 3, 2));
    expect(await port.selection()).toEqual(area("Plain", 1, 0, 3, 2));
    stop();
    await settle();
    const count = heard.length;
    await host.select(area("Plain", 0, 0));
    await settle();
    expect(heard).toHaveLength(count);
  });

  test("tells of a change", async () => {
    let told = 0;
    port.on("change", () => { told++; });
    await host.listening?.();
    await port.write([one("Plain", 9, 0, { value: 5 })], []);
    await until(() => told > 0);
    expect(told).toBeGreaterThan(0);
  });

  test("goes to a cell", async () => {
    expect((await port.goTo(area("Second sheet", 2, 1))).ok).toBe(true);
    expect(await port.selection()).toEqual(area("Second sheet", 2, 1));
  });
}

/** Waits for what must come, however slow the machine; what must not come is given a fixed while. */
async function until(came: () => boolean): Promise<void> {
  for (let turn = 0; turn < 400 && !came(); turn++) await new Promise((resolve) => setTimeout(resolve, 25));
}

const settle = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 120));
