import { changeOf, fillsOf, plainOf } from "../../../src/workbook/file/changes";
import { CellError } from "../../../src/worksheet/cell";

const at = { row: 0, column: 0 };
const constant = (value: number | string | boolean | null) => ({ ...at, value, style: 0 });
const formula = (text: string, value: number | null, error?: string) => ({ ...at, value, formula: text, style: 0, ...(error ? { error } : {}) });

test("a cell that is as it was is not named", () => {
  expect(changeOf(constant(5), { ...at, formula: undefined, shown: { value: 5 } })).toBeUndefined();
  expect(changeOf(undefined, { ...at, formula: undefined, shown: { value: null } })).toBeUndefined();
  expect(changeOf(constant(""), { ...at, formula: undefined, shown: { value: null } })).toBeUndefined();
  expect(changeOf(formula("A2", 0.1 + 0.2), { ...at, formula: "A2", shown: { value: 0.3 } })).toBeUndefined();
});
test("a constant that changed, was cleared, or took a formula's place", () => {
  expect(changeOf(constant(5), { ...at, formula: undefined, shown: { value: 6 } })).toEqual({ ...at, kind: "constant", value: 6 });
  expect(changeOf(constant(5), { ...at, formula: undefined, shown: { value: "" } })).toEqual({ ...at, kind: "constant", value: null });
  expect(changeOf(formula("A2", 5), { ...at, formula: undefined, shown: { value: 5 } })).toEqual({ ...at, kind: "constant", value: 5 });
});
test("a formula that is new or another; a result that is another", () => {
  expect(changeOf(constant(5), { ...at, formula: "A2", shown: { value: 5 } })).toEqual({ ...at, kind: "formula", formula: "A2", value: 5 });
  expect(changeOf(formula("A2", 5), { ...at, formula: "A2", shown: { value: 6 } })).toEqual({ ...at, kind: "result", value: 6 });
  expect(changeOf(formula("A2", null, "#N/A"), { ...at, formula: "A2", shown: { value: 6 } })).toEqual({ ...at, kind: "result", value: 6 });
});
test("a function the engine does not know leaves the stored result alone", () => expect(changeOf(formula("THEIRS(A2)", 5), { ...at, formula: "THEIRS(A2)", shown: { value: null, error: "#NAME?" } })).toBeUndefined());
test("errors stand beside values", () => {
  expect(plainOf(new CellError("#N/A", "why"))).toEqual({ value: null, error: "#N/A" });
  expect(fillsOf([[1, new CellError("#VALUE!", "")], ["", true]])).toEqual({ rows: 2, columns: 2, results: [[1, { error: "#VALUE!" }], ["", true]] });
});
