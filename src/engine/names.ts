import type { Book } from "../workbook/file/book";
import { sheetId } from "./snapshot";

export interface TableService { registerTable(unitId: string, name: string, table: { sheetId: string; range: object; titleMap: Map<string, number> }): void }

/** Tells the engine the names and tables that formulas refer to. */
export function registerNames(book: Book, unitId: string, workbook: { insertDefinedName(name: string, refersTo: string): unknown }, tables: TableService): void {
  for (const { name, refersTo } of book.names) {
    try {
      workbook.insertDefinedName(name, refersTo);
    } catch {
      // a name the engine does not take leaves its formulas at #NAME?, as a broken name does in any host
    }
  }
  for (const { name, sheet, range, columns } of book.tables) {
    tables.registerTable(unitId, name, {
      sheetId: sheetId(book.sheets.findIndex((one) => one.name === sheet)),
      range: { startRow: range.row, endRow: range.row + range.rows - 1, startColumn: range.column, endColumn: range.column + range.columns - 1 },
      titleMap: new Map(columns.map((column, i) => [column, i])),
    });
  }
}
