import { chromium, type Browser, type Page } from "playwright-core";
import { pack, unpack } from "../../src/workbook/frame/cells";
import { methods } from "../../src/workbook/frame/messages";
import type { Area, PortEvent, WorkbookPort } from "../../src/workbook/port";
import { portContract, type ContractHost } from "../workbook/contract";
import { contractWorkbook } from "../workbook/contract-workbook";

jest.setTimeout(60_000);
let browser: Browser, page: Page, file: string;

beforeAll(async () => {
  file = (await contractWorkbook()).toString("base64");
  browser = await chromium.connect(process.env.BROWSER_ENDPOINT!);
  page = await browser.newPage({ viewport: { width: 1280, height: 800 } });
  await page.goto(`${process.env.BENCH_URL}bench/`);
  await page.waitForFunction(() => window.bench?.computedAfterMs, null, { timeout: 60_000 });
});
afterAll(() => browser?.close());

/** The bench's port as seen from here: errors in cells cross as they do into the pane's frame. */
async function benchHost(): Promise<ContractHost> {
  await page.evaluate((base64) => window.bench.desk!.open(Uint8Array.from(atob(base64), (letter) => letter.charCodeAt(0)), "contract.xlsx"), file);
  const call = (method: string) => async (...args: unknown[]): Promise<unknown> => unpack(await page.evaluate(async ([name, given]) => {
    const port = window.bench.desk!.port as unknown as Record<string, (...all: unknown[]) => Promise<unknown>>;
    const plain = (value: unknown): unknown => {
      if (typeof value !== "object" || value === null) return value;
      if ("code" in value && "says" in value && !("ok" in value)) return { tampsheetError: value.code, says: value.says };
      return Array.isArray(value) ? value.map(plain) : Object.fromEntries(Object.entries(value).map(([key, one]) => [key, plain(one)]));
    };
    return plain(await port[name as string]!(...given as unknown[]));
  }, [method, args.map(pack)] as const));

  const heard = new Map<string, (area: Area) => void>();
  let listeners = 0, attached: Promise<unknown> = Promise.resolve();
  const on = (event: PortEvent, hear: (area: Area) => void): (() => void) => {
    const id = `heard${Date.now()}${listeners++}`;
    heard.set(id, hear);
    attached = page.exposeFunction(id, (at: Area) => heard.get(id)?.(at)).then(() => page.evaluate(([name, to]) => {
      window.bench.desk!.port.on(name as PortEvent, (at) => void (window as unknown as Record<string, (at: Area) => void>)[to!]!(at));
    }, [event, id]));
    return () => heard.delete(id);
  };
  const port = { ...Object.fromEntries(methods.map((name) => [name, call(name)])), on } as unknown as WorkbookPort;

  /** what would be saved tells what the workbook holds; the user's own formats stay in the file, which the tests of patching hold */
  const saved = (): Promise<{ name: string; cells: string; notes: { row: number; column: number; text: string; ours: boolean }[]; marks: number }[]> => page.evaluate(() =>
    window.bench.desk!.preview().sheets.map(({ name, cells, notes, marks }) => ({ name, cells: JSON.stringify(cells), notes: [...notes], marks: marks.length })));
  return {
    port,
    listening: async () => { await attached; },
    note: async (sheet, row, column) => (await saved()).find(({ name }) => name === sheet)!.notes.find((note) => note.row === row && note.column === column)?.text ?? null,
    ourMarks: async (sheet) => (await saved()).find(({ name }) => name === sheet)!.marks,
    users: async () => JSON.stringify((await saved()).map(({ name, cells, notes }) => ({ name, cells, notes: notes.filter(({ ours }) => !ours) }))),
    select: async (at) => { await page.evaluate((to) => window.bench.desk!.port.goTo(to), at); },
  };
}

describe("the bench keeps the port's contract", () => portContract(benchHost));
