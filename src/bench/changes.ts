import { CellReader, cellOf } from "../engine/cells";
import type { PageEngine } from "../engine/page";
import { CellError, type Cell } from "../worksheet/cell";
import { kindOfRule } from "../workbook/bench/bench-port";
import type { FaceWorkbook } from "../workbook/bench/engine-face";
import type { Book, BookCell, BookPatch, CellPatch } from "../workbook/file/book";
import { SIGNATURE } from "../workbook/port";

interface RawCell { readonly v?: unknown; readonly t?: number | null; readonly f?: string | null }
type Plain = number | string | boolean | null;

const plain = (cell: Cell): { value: Plain; error?: string } => cell instanceof CellError ? { value: null, error: cell.code } : { value: cell };
const sameNumber = (a: number, b: number): boolean => a === b || Math.abs(a - b) <= 1e-12 * Math.max(Math.abs(a), Math.abs(b));
const same = (a: Plain, b: Plain): boolean => typeof a === "number" && typeof b === "number" ? sameNumber(a, b) : (a ?? "") === (b ?? "");

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
      if (now.f) {
        const formula = now.f.replace(/^=/, ""), span = spans.find((one) => one.startRow === row && one.startColumn === column);
        const value = plain(valueAt(row, column));
        const fills = span && (span.endRow > row || span.endColumn > column) && value.error !== "#SPILL!"
          ? { rows: span.endRow - row + 1, columns: span.endColumn - column + 1, results: resultsOf(span, valueAt) }
          : undefined;
        if (old?.formula !== formula) cells.push({ row, column, kind: "formula", formula, ...value, ...(fills ? { fills } : {}) });
        // an engine that does not know a function must not spoil the result that another program has left
        else if (value.error !== "#NAME?" && (fills || !sameResult(old, value))) cells.push({ row, column, kind: "result", ...value, ...(fills ? { fills } : {}) });
        return;
      }
      const { value, error } = plain(cellOf(now, undefined));
      const empty = value === null || value === "";
      if (!old ? empty : old.formula === undefined && (error ? old.error === error : same(old.value, value) && old.error === undefined)) return;
      cells.push({ row, column, kind: "constant", value: empty ? null : value, ...(error ? { error } : {}) });
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

const sameResult = (old: BookCell, now: { value: Plain; error?: string }): boolean =>
  now.error !== undefined || old.error !== undefined ? now.error === old.error : same(old.value, now.value);

function resultsOf({ startRow, endRow, startColumn, endColumn }: { startRow: number; endRow: number; startColumn: number; endColumn: number }, valueAt: (row: number, column: number) => Cell) {
  return Array.from({ length: endRow - startRow + 1 }, (_, r) => Array.from({ length: endColumn - startColumn + 1 }, (__, c) => {
    const { value, error } = plain(valueAt(startRow + r, startColumn + c));
    return error === undefined ? value : { error };
  }));
}
