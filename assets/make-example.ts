/**
 * Makes assets/example.xlsx: `npm run example`, after `npm run build` has made the functions bundle that computes it.
 * Formulas are live, stored as the office host resolves them, with the results the bundle gives.
 */
import { readFileSync, writeFileSync } from "node:fs";
import { createRequire } from "node:module";
import path from "node:path";
import vm from "node:vm";
import { createRuntime, type FunctionsMetadata } from "../src/engine/custom-functions";
import { headlessEngine, type HeadlessEngine } from "../src/engine/headless";
import type { BookPatch, CellPatch, CellStyle } from "../src/workbook/file/book";
import { createBook } from "../src/workbook/file/create";
import { patchBook } from "../src/workbook/file/patch";
import { readBook } from "../src/workbook/file/read";
import { CellError, type Cell } from "../src/worksheet/cell";
import { exampleSheets, type Style } from "./example-sheets";

const line = { style: "thin", colour: "#8a8578" } as const;
const styles: Record<Style, CellStyle> = {
  title: { format: "General", bold: true, fontSize: 14, colour: "#8f3f14" },
  note: { format: "General", italic: true, colour: "#586166" },
  heading: { format: "General", bold: true, fill: "#efe9dd", wrap: true, vertical: "center", borders: { bottom: line } },
  unit: { format: "General", colour: "#586166" },
  text: { format: "General" },
  input: { format: "General", fill: "#fff7d6" },
  whole: { format: "0" },
  tenth: { format: "0.0" },
  hundredth: { format: "0.00" },
  thousandth: { format: "0.000" },
};

const HEADING_HEIGHT = 33;

/** The workbook without its formulas. */
const bare = (): Uint8Array => createBook({
  title: "Tampsheet example: an invented job",
  styles,
  sheets: exampleSheets.map(({ name, widths, rows, frozenRows }) => ({
    name, widths, frozenRows,
    heights: new Map(rows.flatMap((row, r) => row.some((entry) => entry && "value" in entry && entry.style === "heading") ? [[r, HEADING_HEIGHT] as const] : [])),
    cells: rows.flatMap((row, r) => row.flatMap((entry, c) => entry ? [{ row: r, column: c, value: "value" in entry ? entry.value : null, style: entry.style }] : [])),
  })),
});

const plain = (cell: Cell): { value: number | string | boolean | null; error?: string } => cell instanceof CellError ? { value: null, error: cell.code } : { value: cell };

/** The whole workbook: formulas written, computed by the shipped bundle, results stored beside them. */
export async function makeExample(engine: HeadlessEngine): Promise<Uint8Array> {
  const bytes = bare();
  const formulas = (results: (sheet: string, row: number, column: number) => Partial<CellPatch>): BookPatch => ({
    sheets: exampleSheets.map(({ name, rows }) => ({
      sheet: name,
      cells: rows.flatMap((row, r) => row.flatMap((entry, c): CellPatch[] => entry && "formula" in entry ? [{ row: r, column: c, kind: "formula", formula: entry.formula, value: null, ...results(name, r, c) }] : [])),
    })),
  });
  const computed = await engine.compute(readBook(patchBook(bytes, formulas(() => ({})))));
  return patchBook(bytes, formulas((sheet, row, column) => {
    const found = computed.find((one) => one.sheet === sheet)!.results.find((one) => one.row === row && one.column === column)!;
    const fills = found.fills && { rows: found.fills.length, columns: found.fills[0]!.length, results: found.fills.map((cells) => cells.map((cell) => cell instanceof CellError ? { error: cell.code } : cell)) };
    return { ...plain(found.value), ...(fills ? { fills } : {}) };
  }));
}

/** The engine with the functions bundle in dist/. */
export function builtEngine(root: string, nodeRequire: (name: string) => unknown): HeadlessEngine {
  const runtime = createRuntime();
  vm.runInNewContext(readFileSync(path.join(root, "dist/functions.js"), "utf8"), { CustomFunctions: runtime.CustomFunctions });
  return headlessEngine(nodeRequire, JSON.parse(readFileSync(path.join(root, "dist/functions.json"), "utf8")) as FunctionsMetadata, runtime);
}

if (process.argv[1]?.endsWith("make-example.ts")) {
  const root = path.resolve(path.dirname(process.argv[1]), "..");
  void (async () => {
    const engine = builtEngine(root, createRequire(path.join(root, "package.json")));
    writeFileSync(path.join(root, "assets/example.xlsx"), await makeExample(engine));
    engine.dispose();
    console.log("assets/example.xlsx is made.");
    process.exit(0);
  })();
}
