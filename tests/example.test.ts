import { readFileSync } from "node:fs";
import path from "node:path";
import { exampleSheets } from "../assets/example-sheets";
import { readBook } from "../src/workbook/file/read";
import { metadata } from "./support/host-runtime";

const book = readBook(new Uint8Array(readFileSync(path.join(__dirname, "../assets/example.xlsx"))));
const formulas = book.sheets.flatMap(({ cells }) => cells.flatMap(({ formula }) => formula ?? []));

test("every function is exercised in the example workbook", () => {
  const used = new Set(formulas.flatMap((formula) => [...formula.matchAll(/TAMP\.([A-Z]+)\(/g)].map((match) => match[1]!)));
  expect([...used].sort()).toEqual(metadata().functions.map(({ id }) => id).sort());
});

test("the file is what its script says: the same sheets and formulas, each with a result stored", () => {
  expect(book.sheets.map(({ name }) => name)).toEqual(exampleSheets.map(({ name }) => name));
  const scripted = exampleSheets.flatMap(({ rows }) => rows.flat().flatMap((entry) => entry && "formula" in entry ? [entry.formula] : []));
  expect([...formulas].sort()).toEqual([...scripted].sort());
  for (const { cells } of book.sheets) for (const { formula, value, error } of cells) if (formula !== undefined) expect([formula, error, value === null]).toEqual([formula, undefined, false]);
});

test("it says that it is invented", () => expect(book.sheets[0]!.cells.map(({ value }) => String(value)).join(" ")).toMatch(/invented job/));
