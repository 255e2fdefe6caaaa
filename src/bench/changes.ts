import { CellReader, cellOf } from "../engine/cells";
import type { PageEngine } from "../engine/page";
import type { Cell } from "../worksheet/cell";
import { kindOfRule } from "../workbook/bench/bench-port";
import type { EngineRange, FaceWorkbook } from "../workbook/bench/engine-face";
import type { Book, BookPatch, CellPatch } from "../workbook/file/book";
import { changeOf, fillsOf, plainOf } from "../workbook/file/changes";
import { SIGNATURE } from "../workbook/port";

interface RawCell { readonly v?: unknown; readonly t?: number | null; readonly f?: string | null }
/** What has changed since the file was read, as a patch of it. A cell that is as it was is not named. */
export function changesSince(book: Book, workbook: FaceWorkbook, engine: PageEngine, settings: ReadonlyMap<string, string>): BookPatch {
  const reader = new CellReader(engine.library, engine.injector, workbook.getId());
  const sheets = book.sheets.flatMap((before) => {
    const sheet = workbook.getSheetByName(before.name);
    if (!sheet) return [];
    const id = sheet.getSheetId(), was = new Map(before.cells.map((cell) => [`${cell.row}/${cell.column}`, cell])), cells: CellPatch[] = [];
    const spans = reader.spills(id);
    const valueAt = (row: number, column: number): Cell => cellOf(reader.raw(sheet.getSheet(), id, row, column), undefined);

    sheet.getSheet().getCellMatrix().forValue((row, column, data) => {
      const now = data as RawCell, old = was.get(`${row}/${column}`);
      was.delete(`${row}/${column}`);
      const shown = plainOf(now.f ? valueAt(row, column) : cellOf(now, undefined));
      const span = now.f && shown.error !== "#SPILL!" ? spans.find((one) => one.startRow === row && one.startColumn === column && (one.endRow > row || one.endColumn > column)) : undefined;
      const change = changeOf(old, { row, column, formula: now.f ? now.f.replace(/^=/, "") : undefined, shown, ...(span ? { fills: fillsOf(gridOf(span, valueAt)) } : {}) });
      if (change) cells.push(change);
    });
    // what the engine's matrix no longer holds was cleared
    for (const { row, column, value, formula, error } of was.values()) if (value !== null || formula !== undefined || error !== undefined) cells.push({ row, column, kind: "constant", value: null });

    const marks = sheet.getConditionalFormattingRules().flatMap((rule) => {
      const kind = kindOfRule(rule);
      return kind ? [{ kind, ranges: rule.ranges.map(({ startRow, endRow, startColumn, endColumn }) => ({ row: startRow, column: startColumn, rows: endRow - startRow + 1, columns: endColumn - startColumn + 1 })) }] : [];
    });
    const notes = sheet.getNotes().filter(({ note }) => note.startsWith(SIGNATURE)).map(({ row, col, note }) => ({ row, column: col, text: note }));
    const marksChanged = JSON.stringify(marks) !== JSON.stringify(before.marks.map(({ kind, ranges }) => ({ kind, ranges })));
    const notesChanged = JSON.stringify(notes) !== JSON.stringify(before.notes.filter(({ ours }) => ours).map(({ row, column, text }) => ({ row, column, text })));
    return cells.length > 0 || marksChanged || notesChanged
      ? [{ sheet: before.name, cells, ...(marksChanged ? { marks } : {}), ...(notesChanged ? { notes } : {}) }]
      : [];
  });
  const remembered = Object.fromEntries(settings);
  return { sheets, ...(JSON.stringify(remembered) === JSON.stringify(book.settings) ? {} : { settings: remembered }) };
}

function gridOf({ startRow, endRow, startColumn, endColumn }: EngineRange, valueAt: (row: number, column: number) => Cell): Cell[][] {
  return Array.from({ length: endRow - startRow + 1 }, (_, r) => Array.from({ length: endColumn - startColumn + 1 }, (__, c) => valueAt(startRow + r, startColumn + c)));
}
