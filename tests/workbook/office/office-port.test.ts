import { officePort } from "../../../src/workbook/office/office-port";
import { markKindOf } from "../../../src/workbook/port";
import { cellName } from "../../../src/workbook/address";
import { area, portContract, USER_NOTE, type ContractHost } from "../contract";
import { FakeHost } from "./fake-host";

function fakeHost(): FakeHost {
  const fake = new FakeHost();
  const plain = fake.addSheet("Plain", { A1: "w %", B1: "dry", A2: 12, B2: 1.8, A3: 14, B3: "=B2*1.05", A4: "=1/0", D1: "merged" });
  plain.merges.push({ row: 0, column: 3, rows: 2, columns: 2 });
  plain.notes.set("B2", USER_NOTE);
  plain.formats.push({ type: "Custom", formula: "=A1>13", fill: "#00FF00", ink: "", row: 0, column: 0, rows: 10, columns: 1 }, { type: "ColorScale", formula: "", fill: "", ink: "", row: 0, column: 1, rows: 10, columns: 1 });
  fake.addSheet("Second sheet");
  fake.addSheet("Locked", { A1: "locked" }).protected = true;
  Object.assign(globalThis, fake.globals());
  return fake;
}

const contractHost = async (): Promise<ContractHost> => {
  const fake = fakeHost();
  return {
    port: officePort(),
    note: async (sheet, row, column) => fake.find(sheet)!.notes.get(cellName(row, column)) ?? null,
    ourMarks: async (sheet) => fake.find(sheet)!.formats.filter(({ formula }) => markKindOf(formula)).length,
    users: async () => JSON.stringify(fake.sheets.map((sheet) => ({ ...sheet, cells: [...sheet.cells], formats: sheet.formats.filter(({ formula }) => !markKindOf(formula)), notes: [...sheet.notes].filter(([, text]) => !text.startsWith("Tampsheet")) }))),
    select: async ({ sheet, row, column, rows, columns }) => { fake.selection = { sheet, row, column, rows, columns }; for (const handler of fake.handlers.selection) void handler(); },
  };
};

describe("the office adapter keeps the port's contract", () => portContract(contractHost));

describe("what is the office host's own", () => {
  test("an older host without notes marks all the same, and says that it has none", async () => {
    const fake = fakeHost(), port = officePort();
    fake.api = 9;
    expect(await port.abilities()).toEqual({ marks: true, notes: false, spills: false });
    expect(await port.mark([{ area: area("Plain", 1, 0), kind: "ask", note: "no place for this" }])).toEqual({ ok: true, value: { notesLeftOut: [] } });
    expect(fake.find("Plain")!.notes.size).toBe(1);
    expect(await port.unmark("Plain")).toEqual({ ok: true, value: { removed: 1 } });
  });

  test("a table takes a constant but no spill", async () => {
    const fake = fakeHost(), port = officePort();
    fake.find("Plain")!.tables.push({ row: 10, column: 0, rows: 5, columns: 2 });
    expect(await port.write([{ sheet: "Plain", row: 11, column: 0, cells: [[{ formula: "=A1:A3", reaches: { rows: 3, columns: 1 } }]] }], [])).toEqual(expect.objectContaining({ ok: false, why: "table" }));
    expect((await port.write([{ sheet: "Plain", row: 11, column: 0, cells: [[{ value: 4 }]] }], [])).ok).toBe(true);
  });

  test("a text that begins like a formula stays a text", async () => {
    const fake = fakeHost(), port = officePort();
    await port.write([{ sheet: "Plain", row: 11, column: 0, cells: [[{ value: "=HYPERLINK(\"x\")" }, { value: "-5 to +2" }]] }], []);
    expect(fake.find("Plain")!.cells.get("11,0")!.formula).toBe("'=HYPERLINK(\"x\")");
    expect(fake.value(fake.find("Plain")!, 11, 1)).toBe("-5 to +2");
  });

  test("reading takes two round trips, writing three, whatever the size", async () => {
    const fake = fakeHost(), port = officePort();
    fake.syncs = 0;
    await port.read(area("Plain", 0, 0, 4, 2));
    expect(fake.syncs).toBe(2);
    fake.syncs = 0;
    await port.write([{ sheet: "Plain", row: 12, column: 0, cells: Array.from({ length: 20 }, () => [{ value: 1 }, { value: 2 }]) }], []);
    expect(fake.syncs).toBe(3);
  });

  test("a chart is no selection; a host that fails is no chart", async () => {
    fakeHost();
    const host = (globalThis as unknown as { Excel: { run: (batch: (context: unknown) => Promise<unknown>) => Promise<unknown> } }).Excel, port = officePort();
    const failing = (code: string) => { host.run = (batch) => batch({ workbook: { getSelectedRanges: () => ({ areas: { getItemAt: () => ({ load() { /* nothing to load */ }, worksheet: { load() { /* nothing to load */ } } }) } }) }, sync: () => Promise.reject(Object.assign(new Error("x"), { code })) }); };
    failing("InvalidSelection");
    expect(await port.selection()).toBeNull();
    failing("AccessDenied");
    await expect(port.selection()).rejects.toThrow("x");
  });

  test("the host's own refusals become refusals with words; its failures are thrown", async () => {
    const fake = fakeHost(), port = officePort();
    const host = (globalThis as unknown as { Excel: { run: unknown } }).Excel;
    host.run = () => Promise.reject(Object.assign(new Error("x"), { code: "InvalidOperationInCellEditMode" }));
    expect(await port.goTo(area("Plain", 0, 0))).toEqual(expect.objectContaining({ ok: false, says: expect.stringMatching(/being edited/) }));
    host.run = () => Promise.reject(new Error("the connection broke"));
    await expect(port.goTo(area("Plain", 0, 0))).rejects.toThrow(/spreadsheet host failed: the connection broke/);
    expect(fake.sheets).toHaveLength(3);
  });
});
