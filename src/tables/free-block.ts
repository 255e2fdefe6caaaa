import { overlap } from "../workbook/address";
import type { Area } from "../workbook/port";
import type { Place } from "./table";

/** How far to the right a free block is looked for before it goes below. */
const FURTHEST = 40;

/**
 * The first free block for results: right of the table with one column between, stepping over what is filled,
 * else below it. `filled` tells whether a cell holds anything.
 */
export function freeBlock(table: Area, size: { readonly rows: number; readonly columns: number }, filled: (row: number, column: number) => boolean, lastRow: number): Place {
  const isFree = (row: number, column: number): boolean => {
    const area: Area = { sheet: table.sheet, row, column, ...size };
    if (overlap(area, table)) return false;
    // one line of air on every side keeps two blocks apart
    for (let r = Math.max(0, row - 1); r <= row + size.rows; r++) for (let c = Math.max(0, column - 1); c <= column + size.columns; c++) {
      const inTable = r >= table.row && r < table.row + table.rows && c >= table.column && c < table.column + table.columns;
      if (!inTable && filled(r, c)) return false;
    }
    return true;
  };
  const right = table.column + table.columns + 1;
  for (let column = right; column < right + FURTHEST; column++) if (isFree(table.row, column)) return { row: table.row, column };
  for (let row = table.row + table.rows + 1; row <= lastRow + 2; row++) if (isFree(row, table.column)) return { row, column: table.column };
  return { row: lastRow + 3, column: table.column };
}
