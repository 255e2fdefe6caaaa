import { freeBlock } from "../../src/tables/free-block";
import { sheet, type Typed } from "./sheet";

const table = { sheet: "Lab", row: 1, column: 0, rows: 3, columns: 2 };
const size = { rows: 4, columns: 2 };
const at = (rows: Typed[][]): { row: number; column: number } => {
  const { values } = sheet(rows);
  return freeBlock(table, size, (row, column) => { const value = values[row]?.[column]; return value !== null && value !== undefined; }, rows.length - 1);
};
const body: Typed[][] = [[null, null], ["w", "d"], [1, 2], [3, 4]];

test("right of the table, one column between", () => expect(at(body)).toEqual({ row: 1, column: 3 }));
test("past what stands there, with air about it", () => expect(at([...body.map((row) => [...row, null, "taken"])])).toEqual({ row: 1, column: 5 }));
test("a cell in the way below the table counts too", () => expect(at([...body, [null, null, null, null, "x"]])).toEqual({ row: 1, column: 6 }));
test("below, where the right is full for a long way", () => {
  const full = body.map((row) => [...row, ...Array.from({ length: 60 }, () => 1)]);
  expect(at(full)).toEqual({ row: 5, column: 0 });
});
