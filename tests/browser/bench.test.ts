import ExcelJS from "exceljs";
import { mkdtempSync, readFileSync, writeFileSync } from "node:fs";
import os from "node:os";
import path from "node:path";
import { strFromU8, unzipSync } from "fflate";
import { chromium, type Browser, type Page } from "playwright-core";
import { readBook } from "../../src/workbook/file/read";
import type { Area } from "../../src/workbook/port";

const LOAD_MS = 60_000;
jest.setTimeout(LOAD_MS);
let browser: Browser, page: Page;
const trouble: string[] = [], foreign: string[] = [];
const folder = mkdtempSync(path.join(os.tmpdir(), "tampsheet-"));

/** The office host's own script is kept out by the content policy; the browser says so, and that is as it should be. */
const expected = (text: string): boolean => text.includes("appsforoffice") || /already exists/.test(text);

beforeAll(async () => {
  browser = await chromium.connect(process.env.BROWSER_ENDPOINT!);
  page = await browser.newPage({ viewport: { width: 1440, height: 900 } });
  page.on("console", (message) => { if (message.type() === "error" && !expected(message.text())) trouble.push(message.text()); });
  // the question whether changes may be lost is answered yes
  page.on("dialog", (dialog) => void dialog.accept());
  page.on("pageerror", (error) => trouble.push(error.message));
  page.on("request", (request) => { if (!request.url().startsWith(process.env.BENCH_URL!) && !/^(?:data|blob):/.test(request.url())) foreign.push(request.url()); });
  await page.goto(`${process.env.BENCH_URL}bench/`);
  await page.waitForFunction(() => window.bench?.computedAfterMs, null, { timeout: LOAD_MS });
}, LOAD_MS);
afterAll(() => browser?.close());

const goTo = (area: Area) => page.evaluate((to) => window.bench.desk!.port.goTo(to), area);
const cell = (sheet: string, row: number, column: number): Area => ({ sheet, row, column, rows: 1, columns: 1 });
const value = async (area: Area): Promise<unknown> => page.evaluate(async (at) => {
  const read = await window.bench.desk!.port.read(at);
  return read.ok ? read.value.values[0]![0] : read.says;
}, area);
/** Waits until a cell holds what is wanted of it. */
async function until(area: Area, wanted: (now: unknown) => boolean): Promise<unknown> {
  const end = Date.now() + 10_000;
  for (;;) {
    const now = await value(area);
    if (wanted(now) || Date.now() > end) return now;
    await page.waitForTimeout(50);
  }
}
const speaks = (pattern: RegExp) => page.waitForFunction((source) => new RegExp(source).test(document.getElementById("active-cell")!.textContent!), pattern.source, { timeout: 10_000 });

/** Types into the grid as a person does. */
async function type(area: Area, text: string): Promise<void> {
  await page.locator("#grid canvas").first().click({ position: { x: 300, y: 10 }, force: true }).catch(() => undefined);
  await page.mouse.click(500, 500);
  await goTo(area);
  await page.waitForTimeout(200);
  await page.keyboard.type(text);
  await page.keyboard.press("Enter");
}

const optimum = cell("Lab A", 8, 13), tin = cell("Lab A", 7, 5);

test("the example stands computed: the peak of Lab A in its block", async () => {
  expect(await page.locator("#file-name").textContent()).toBe("example.xlsx");
  expect(await value(cell("Lab A", 7, 12))).toBe("maximum dry density");
  expect(await value(optimum)).toBeCloseTo(14.067, 2);
  expect(await value(cell("Lab C", 9, 3))).toBe(true);
});

test("an edited reading changes the peak, and undo brings it back", async () => {
  const before = await value(optimum);
  await type(tin, "58.60");
  expect(await until(optimum, (now) => now !== before)).toBeCloseTo(13.9, 1);
  expect(await page.locator("#unsaved").isVisible()).toBe(true);
  await page.click("#undo");
  expect(await until(optimum, (now) => now === before)).toBe(before);
  await page.click("#redo");
  expect(await until(tin, (now) => now === 58.6)).toBe(58.6);
  expect(await until(optimum, (now) => now !== before)).not.toBe(before);
  await page.click("#undo");
  expect(await until(optimum, (now) => now === before)).toBe(before);
});

test("the line below the grid speaks the active cell: place, figure, formula, and why it shows an error", async () => {
  await goTo(cell("Field", 2, 2));
  await speaks(/Field, C3 · 1\.826 · =TAMP\.PEAKDRY/);
  await type(cell("Reference", 30, 1), "=TAMP.SOILDRY(2.05,0.125)");
  await goTo(cell("Reference", 30, 1));
  await speaks(/#VALUE!: water content: every value lies below 1\. Give percents as numbers/);
  await page.click("#undo");
});

test("formula autocomplete shows our functions with their arguments", async () => {
  await page.mouse.click(500, 500);
  await goTo(cell("Reference", 30, 0));
  await page.waitForTimeout(200);
  await page.keyboard.type("=TAMP.VOID");
  await page.getByText("TAMP.VOIDFREE", { exact: false }).first().waitFor({ timeout: 10_000 });
  await page.keyboard.type("FREE(");
  await page.getByText("waterDensity", { exact: false }).first().waitFor({ timeout: 10_000 });
  for (let i = 0; i < 3; i++) await page.keyboard.press("Escape");
});

test("what saving could not keep is not offered: a new sheet is refused with a word", async () => {
  const sheets = await page.evaluate(() => window.bench.desk!.port.sheets());
  await page.locator("#grid footer button").first().click();
  await page.locator("#notice", { hasText: "in your own spreadsheet program" }).waitFor({ timeout: 5_000 });
  expect(await page.evaluate(() => window.bench.desk!.port.sheets())).toHaveLength(sheets.length);
  await page.click("#notice-close");
});

describe("a workbook of the user's own, made by another program", () => {
  const file = path.join(folder, "own.xlsx");
  beforeAll(async () => {
    const book = new ExcelJS.Workbook(), sheet = book.addWorksheet("Tests");
    sheet.addRows([["w %", "dry density (Mg/m3)"], [8.9, 1.948], [10.1, 1.996], [11.4, 2.006], [13.0, 1.964]]);
    sheet.getCell("D1").value = { formula: "AVERAGE(A2:A5)", result: 0 };
    sheet.getCell("B2").note = "weighed twice";
    sheet.getCell("A2").numFmt = "0.00";
    sheet.getCell("A7").value = "kept as it is";
    sheet.getCell("A7").font = { bold: true, color: { argb: "FF00AA00" } };
    writeFileSync(file, Buffer.from(await book.xlsx.writeBuffer()));
  });

  test("opens, computes and saves without losing anything", async () => {
    await page.setInputFiles("#file", file);
    await page.waitForFunction(() => document.getElementById("file-name")!.textContent === "own.xlsx", null, { timeout: 20_000 });
    expect(await value(cell("Tests", 0, 3))).toBeCloseTo(10.85, 10);
    await type(cell("Tests", 1, 3), "=TAMP.PEAKDRY(A2:A5,B2:B5)");
    // published worked example of AS 1289.5.1.1 (set P): 2.01 t/m3
    expect(await until(cell("Tests", 1, 3), (now) => typeof now === "number")).toBeCloseTo(2.0077, 4);
    const download = page.waitForEvent("download");
    await page.keyboard.press("Control+s");
    const saved = path.join(folder, "saved.xlsx");
    await (await download).saveAs(saved);
    const again = new ExcelJS.Workbook();
    await again.xlsx.readFile(saved);
    const sheet = again.getWorksheet("Tests")!;
    expect(sheet.getCell("B3").value).toBe(1.996);
    expect((sheet.getCell("D1").value as { result: number }).result).toBeCloseTo(10.85, 10);
    expect(sheet.getCell("D2").formula).toBe("_xldudf_TAMP_PEAKDRY(A2:A5,B2:B5)");
    expect((sheet.getCell("D2").value as { result: number }).result).toBeCloseTo(2.0077, 4);
    expect(sheet.getCell("A7").font).toEqual(expect.objectContaining({ bold: true, color: { argb: "FF00AA00" } }));
    expect(sheet.getCell("B2").note).toBeTruthy();
    // every part but the sheet and what it needs is byte for byte what it was
    const before = unzipSync(readFileSync(file)), after = unzipSync(readFileSync(saved));
    const changed = Object.keys(before).filter((name) => !name.endsWith("/")).filter((name) => !after[name] || strFromU8(before[name]!) !== strFromU8(after[name]!));
    expect(changed.sort()).toEqual(["[Content_Types].xml", "xl/_rels/workbook.xml.rels", "xl/worksheets/sheet1.xml"]);
    expect(readBook(readFileSync(saved)).sheets[0]!.cells.find(({ row, column }) => row === 1 && column === 3)!.formula).toBe("TAMP.PEAKDRY(A2:A5,B2:B5)");
    expect(await page.locator("#unsaved").isVisible()).toBe(false);
  });

  test.each([
    ["text.xlsx", Buffer.from("these are no cells"), /not an \.xlsx workbook/],
    ["old.xlsx", Buffer.from([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, 0, 0]), /old binary format/],
    ["locked.xlsx", Buffer.concat([Buffer.from([0xd0, 0xcf, 0x11, 0xe0]), Buffer.from("EncryptedPackage", "utf16le")]), /password/],
    ["cut.xlsx", Buffer.from([0x50, 0x4b, 3, 4, 1, 2, 3]), /damaged/],
  ])("%s is refused with the reason, and the open workbook stays", async (name, bytes, says) => {
    const open = await page.locator("#file-name").textContent();
    const bad = path.join(folder, name);
    writeFileSync(bad, bytes);
    await page.setInputFiles("#file", bad);
    await page.locator("#notice", { hasText: `${name} was not opened` }).waitFor({ timeout: 5_000 });
    expect(await page.locator("#notice-text").textContent()).toMatch(says);
    expect(await page.locator("#file-name").textContent()).toBe(open);
    expect(await value(cell("Tests", 2, 1))).toBe(1.996);
  });

  test.each(["page", "pane"] as const)("a file dropped on the %s opens too", async (where) => {
    const data = readFileSync(file).toString("base64"), target = where === "page" ? page.mainFrame() : page.frames().find((frame) => frame.url().includes("taskpane"))!;
    await target.evaluate(async ([base64, name]) => {
      const bytes = Uint8Array.from(atob(base64!), (letter) => letter.charCodeAt(0)), transfer = new DataTransfer();
      transfer.items.add(new File([bytes], name!));
      for (const kind of ["dragenter", "dragover", "drop"]) window.dispatchEvent(new DragEvent(kind, { dataTransfer: transfer, bubbles: true, cancelable: true }));
    }, [data, `dropped on ${where}.xlsx`]);
    await page.waitForFunction((name) => document.getElementById("file-name")!.textContent === name, `dropped on ${where}.xlsx`, { timeout: 20_000 });
    expect(await value(cell("Tests", 1, 0))).toBe(8.9);
    expect(await page.locator("#drop").isVisible()).toBe(false);
  });

  test("the keys for saving work in the pane too", async () => {
    const download = page.waitForEvent("download");
    await page.frames().find((frame) => frame.url().includes("taskpane"))!.locator("body").press("Control+s");
    expect((await download).suggestedFilename()).toMatch(/\.xlsx$/);
  });
});

test("a mark counts as a change that is not saved", async () => {
  const mark = await page.evaluate(() => {
    window.bench.desk!.unsaved = false;
    return window.bench.desk!.port.mark([{ area: { sheet: "Tests", row: 1, column: 1, rows: 1, columns: 1 }, kind: "ask" }]);
  });
  expect(mark.ok).toBe(true);
  expect(await page.locator("#unsaved").isVisible()).toBe(true);
  await page.evaluate(() => window.bench.desk!.port.unmark(null));
});

test("the splitter answers to the keyboard, and the pane can be put away", async () => {
  const width = async (): Promise<number> => (await page.locator("#pane").boundingBox())?.width ?? 0;
  const before = await width();
  await page.locator("#splitter").focus();
  await page.keyboard.press("ArrowLeft");
  expect(await width()).toBe(before + 24);
  await page.keyboard.press("ArrowRight");
  await page.click("#toggle-pane");
  expect(await page.locator("#pane").isVisible()).toBe(false);
  await page.click("#toggle-pane");
  expect(await page.locator("#pane").isVisible()).toBe(true);
});

test("nothing is asked of any other place, and nothing went wrong unseen", () => {
  expect(foreign.filter((url) => !url.startsWith("https://appsforoffice.microsoft.com/"))).toEqual([]);
  expect(trouble).toEqual([]);
});

test("at 360 px neither the bar nor the pane reaches beyond the edge", async () => {
  const narrow = await browser.newPage({ viewport: { width: 360, height: 800 } });
  await narrow.goto(new URL("bench/", process.env["BENCH_URL"]).href);
  await narrow.waitForFunction(() => window.bench?.computedAfterMs, null, { timeout: 60_000 });
  const right = await narrow.evaluate(() => ["#toggle-pane", "#grid", "#pane"].map((selector) => document.querySelector(selector)!.getBoundingClientRect().right));
  expect(Math.max(...right)).toBeLessThanOrEqual(360);
  await narrow.close();
});
