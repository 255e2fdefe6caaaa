import vm from "node:vm";
import { createRuntime } from "../../src/engine/custom-functions";
import { headlessEngine, type HeadlessEngine } from "../../src/engine/headless";
import { readBook } from "../../src/workbook/file/read";
import { openHeadless } from "../../src/workbook/headless/headless-port";
import { built, metadata } from "../support/host-runtime";
import { area, portContract, type ContractHost } from "../workbook/contract";
import { contractWorkbook } from "../workbook/contract-workbook";
import { differing } from "../workbook/file/make";

declare const nodeRequire: (name: string) => unknown;

let engine: HeadlessEngine, file: Uint8Array;
beforeAll(async () => {
  const runtime = createRuntime();
  vm.runInNewContext(built("functions.js").toString("utf8"), { CustomFunctions: runtime.CustomFunctions });
  engine = headlessEngine(nodeRequire, metadata(), runtime);
  file = new Uint8Array(await contractWorkbook());
}, 60_000);
afterAll(() => engine.dispose());

describe("the file host keeps the port's contract", () => portContract(async (): Promise<ContractHost> => {
  const port = await openHeadless(file, engine);
  const saved = () => readBook(port.save());
  return {
    port,
    note: async (sheet, row, column) => saved().sheets.find(({ name }) => name === sheet)!.notes.find((note) => note.row === row && note.column === column)?.text ?? null,
    ourMarks: async (sheet) => saved().sheets.find(({ name }) => name === sheet)!.marks.length,
    users: async () => JSON.stringify(saved().sheets.map(({ name, cells, notes }) => ({ name, cells, notes: notes.filter(({ ours }) => !ours) }))),
    select: async (at) => port.select(at),
  };
}));

test("a file that was marked, unmarked and not changed is what it was, once its formulas are computed", async () => {
  const first = (await openHeadless(file, engine)).save(), port = await openHeadless(first, engine);
  expect(differing(first, port.save())).toEqual([]);
  await port.mark([{ area: area("Plain", 1, 0), kind: "past-line", note: "look" }]);
  expect(differing(first, port.save()).length).toBeGreaterThan(0);
  await port.unmark(null);
  expect(differing(first, port.save())).toEqual([]);
});

test("our formulas are written, computed and stored with their results", async () => {
  const port = await openHeadless(file, engine);
  await port.write([{ sheet: "Second sheet", row: 0, column: 0, cells: [[{ formula: "=TAMP.SOILDRY(2,Plain!A2:A3)", reaches: { rows: 2, columns: 1 } }]] }], []);
  const cells = readBook(port.save()).sheets[1]!.cells;
  expect(cells[0]).toEqual(expect.objectContaining({ formula: "TAMP.SOILDRY(2,Plain!A2:A3)", value: expect.closeTo(2 / 1.12, 12), fills: { rows: 2, columns: 1, dynamic: true } }));
});
