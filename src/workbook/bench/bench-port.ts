import { cellOf, CellReader } from "../../engine/cells";
import { messageKey } from "../../engine/messages";
import type { PageEngine } from "../../engine/page";
import { CellError, type Cell } from "../../worksheet/cell";
import { areaName } from "../address";
import { againstWriting, cellsOf, noSheet, refused, spills, targetsOf } from "../consent";
import { markFormula, markKindOf, SIGNATURE, type Area, type Content, type Done, type Mark, type MarkKind, type PortEvent, type Snapshot, type WorkbookPort } from "../port";
import type { EngineRange, FaceRule, FaceWorksheet, OpenWorkbook } from "./engine-face";

const PATIENCE_MS = 30_000;
const MOST_CELLS = 200_000;

const LOOKS: Readonly<Record<MarkKind, { readonly fill: string; readonly ink: string }>> = {
  "past-line": { fill: "#ffd9cc", ink: "#7a1f05" },
  doubtful: { fill: "#ffeec2", ink: "#5e4300" },
  ask: { fill: "#dcebfa", ink: "#123f66" },
};

const done = <T>(value: T): Done<T> => ({ ok: true, value });

export const kindOfRule = ({ rule }: FaceRule): MarkKind | undefined => typeof rule.value === "string" ? markKindOf(rule.value) : undefined;

export interface BenchPort extends WorkbookPort {
  /** tells the pane that something is so now: another workbook, another selection, another value */
  tell(event: PortEvent, area: Area): void;
  /** what one cell holds, for the line that speaks it */
  cell(area: Area): { readonly value: Cell; readonly formula: string | null; readonly shown: string; readonly message: string | undefined };
}

/** The workbook port on the page's own engine. `touched` hears of changes that the engine does not count as edits. */
export function benchPort(engine: PageEngine, open: () => OpenWorkbook, touched: () => void): BenchPort {
  const heard: Record<PortEvent, Set<(area: Area) => void>> = { selection: new Set(), change: new Set() };
  const reader = (): CellReader => new CellReader(engine.library, engine.injector, open().workbook.getId());
  const sheetOf = (name: string): FaceWorksheet | null => open().workbook.getSheetByName(name);
  const settled = async (): Promise<void> => {
    await engine.api.getFormula().onCalculationResultApplied(PATIENCE_MS);
  };

  const beyond = (sheet: FaceWorksheet, area: Area): boolean => area.row + area.rows > sheet.getMaxRows() || area.column + area.columns > sheet.getMaxColumns();

  function valueAt(sheet: FaceWorksheet, cells: CellReader, row: number, column: number): { raw: { f?: string | null } | null; value: Cell; message: string | undefined } {
    const id = sheet.getSheetId(), own = sheet.getSheet().getCellRaw(row, column) as { f?: string | null } | null;
    const message = engine.messages.get(messageKey(id, row, column));
    return { raw: own, value: cellOf(cells.raw(sheet.getSheet(), id, row, column), message), message };
  }

  const shownAs = (format: string, value: Cell): string => {
    if (value === null) return "";
    if (value instanceof CellError) return value.code;
    if (typeof value === "boolean") return value ? "TRUE" : "FALSE";
    if (typeof value === "string") return value;
    return format === "General" || format === "" ? String(Number(value.toPrecision(10))) : engine.shown(format, value);
  };

  const port: BenchPort = {
    abilities: async () => ({ marks: true, notes: true, spills: true }),

    sheets: async () => open().workbook.getSheets().map((sheet) => {
      let rows = 0, columns = 0;
      sheet.getSheet().getCellMatrix().forValue((row, column, cell) => {
        const { v, f } = cell as { v?: unknown; f?: unknown };
        if ((v !== undefined && v !== null && v !== "") || f) { rows = Math.max(rows, row + 1); columns = Math.max(columns, column + 1); }
      });
      for (const span of reader().spills(sheet.getSheetId())) { rows = Math.max(rows, span.endRow + 1); columns = Math.max(columns, span.endColumn + 1); }
      const name = sheet.getSheetName();
      return { name, used: rows ? { sheet: name, row: 0, column: 0, rows, columns } : null, hidden: sheet.isSheetHidden(), protected: open().protectedSheets.has(name) };
    }),

    selection: async () => {
      const { workbook } = open(), range = workbook.getActiveRange();
      return range ? areaOf(workbook.getActiveSheet().getSheetName(), range.getRange()) : null;
    },

    read: async (area) => {
      const sheet = sheetOf(area.sheet);
      if (!sheet) return noSheet(area);
      // a whole column means its part inside the declared sheet
      const rows = Math.min(area.rows, sheet.getMaxRows() - area.row), columns = Math.min(area.columns, sheet.getMaxColumns() - area.column);
      if (rows * columns > MOST_CELLS) return refused("too-large", [area], `${areaName(area)} has more than ${MOST_CELLS.toLocaleString("en")} cells: select fewer.`);
      const cells = reader(), formats = sheet.getRange(area.row, area.column, rows, columns).getNumberFormats();
      const grid = Array.from({ length: rows }, (_, r) => Array.from({ length: columns }, (__, c) => valueAt(sheet, cells, area.row + r, area.column + c)));
      const format = (r: number, c: number): string => formats[r]?.[c] || "General";
      return done<Snapshot>({
        area: { ...area, rows, columns },
        values: grid.map((row) => row.map(({ value }) => value)),
        formulas: grid.map((row) => row.map(({ raw }) => raw?.f ? raw.f : null)),
        formats: grid.map((row, r) => row.map((_, c) => format(r, c))),
        texts: grid.map((row, r) => row.map(({ value }, c) => shownAs(format(r, c), value))),
      });
    },

    write: async (what, over) => {
      const targets = targetsOf(what), cells = reader();
      const filled = (at: Area): boolean => {
        const { raw, value } = valueAt(sheetOf(at.sheet)!, cells, at.row, at.column);
        return Boolean(raw?.f) || (value !== null && value !== "");
      };
      const against = againstWriting(targets, over, {
        has: (sheet) => sheetOf(sheet) !== null,
        isProtected: (sheet) => open().protectedSheets.has(sheet),
        size: (sheet) => ({ rows: sheetOf(sheet)!.getMaxRows(), columns: sheetOf(sheet)!.getMaxColumns() }),
        merges: (sheet) => sheetOf(sheet)!.getMergedRanges().map((range) => areaOf(sheet, range.getRange())),
        tables: (sheet) => open().tables.filter((table) => table.sheet === sheet),
        isFilled: filled,
      });
      if (against) return against;

      const matrices = new Map<string, Record<number, Record<number, object>>>();
      for (const target of targets) {
        const matrix = matrices.get(target.at.sheet) ?? {};
        matrices.set(target.at.sheet, matrix);
        // a spill goes only into empty cells: what the user agreed to lose is cleared in the same step
        if (spills(target)) for (const cell of cellsOf(target.reach)) if (filled(cell)) (matrix[cell.row] ??= {})[cell.column] = CLEAR;
        (matrix[target.at.row] ??= {})[target.at.column] = contentOf(target.content);
      }
      for (const [sheet, value] of matrices) {
        await engine.api.executeCommand("sheet.command.set-range-values", { unitId: open().workbook.getId(), subUnitId: sheetOf(sheet)!.getSheetId(), value });
      }
      await settled();
      return done({ written: targets.map(({ reach }) => reach) });
    },

    mark: async (marks) => {
      const notesLeftOut: Area[] = [];
      for (const { area } of marks) if (!sheetOf(area.sheet)) return noSheet(area);
      for (const mark of marks) {
        const sheet = sheetOf(mark.area.sheet)!;
        if (!isMarked(sheet, mark)) addMark(sheet, mark);
        if (!mark.note) continue;
        const first = sheet.getRange(mark.area.row, mark.area.column), note = first.getNote();
        if (note && !note.note.startsWith(SIGNATURE)) notesLeftOut.push({ ...mark.area, rows: 1, columns: 1 });
        else first.createOrUpdateNote(noteAt(mark.area.row, mark.area.column, mark.note));
      }
      if (marks.length > 0) touched();
      return done({ notesLeftOut });
    },

    unmark: async (name) => {
      let removed = 0;
      for (const sheet of open().workbook.getSheets()) {
        if (name !== null && sheet.getSheetName() !== name) continue;
        const before = sheet.getConditionalFormattingRules().filter(kindOfRule);
        for (const rule of before) sheet.deleteConditionalFormattingRule(rule.cfId);
        removed += before.length - sheet.getConditionalFormattingRules().filter(kindOfRule).length;
        for (const note of [...sheet.getNotes()]) if (note.note.startsWith(SIGNATURE)) sheet.getRange(note.row, note.col).deleteNote();
      }
      if (removed > 0) touched();
      return done({ removed });
    },

    goTo: async (area) => {
      const sheet = sheetOf(area.sheet);
      if (!sheet) return noSheet(area);
      if (beyond(sheet, area)) return refused("gone", [area], `${areaName(area)} lies beyond the sheet.`);
      const { workbook } = open();
      if (workbook.getActiveSheet().getSheetName() !== area.sheet) workbook.setActiveSheet(sheet);
      sheet.getRange(area.row, area.column, area.rows, area.columns).activate();
      const seen = sheet.getVisibleRange();
      if (!seen || area.row < seen.startRow || area.row > seen.endRow - 1 || area.column < seen.startColumn || area.column > seen.endColumn - 1) sheet.scrollToCell(Math.max(0, area.row - 3), Math.max(0, area.column - 2));
      // the engine tells of selections made by hand only
      port.tell("selection", area);
      return done(undefined);
    },

    recall: async (key) => open().settings.get(key) ?? null,
    remember: async (key, value) => {
      if ((open().settings.get(key) ?? null) === value) return;
      if (value === null) open().settings.delete(key); else open().settings.set(key, value);
      touched();
    },

    on(event, hear) {
      heard[event].add(hear);
      return () => { heard[event].delete(hear); };
    },

    tell: (event, area) => heard[event].forEach((hear) => hear(area)),

    cell(area) {
      const sheet = sheetOf(area.sheet);
      if (!sheet || beyond(sheet, area)) return { value: null, formula: null, shown: "", message: undefined };
      const { raw, value, message } = valueAt(sheet, reader(), area.row, area.column);
      const format = sheet.getRange(area.row, area.column).getNumberFormats()[0]?.[0] || "General";
      return { value, formula: raw?.f || null, shown: shownAs(format, value), message };
    },
  };
  return port;
}

export const areaOf = (sheet: string, { startRow, endRow, startColumn, endColumn }: EngineRange): Area =>
  ({ sheet, row: startRow, column: startColumn, rows: endRow - startRow + 1, columns: endColumn - startColumn + 1 });

const CLEAR = { v: null, f: null, si: null, p: null, t: null };

function contentOf(content: Content): object {
  if ("formula" in content) return { f: content.formula.startsWith("=") ? content.formula : `=${content.formula}`, v: null, si: null, p: null, t: null };
  const { value } = content;
  if (value === null) return CLEAR;
  if (value instanceof CellError) return { ...CLEAR, v: value.code, t: 1 };
  return { ...CLEAR, v: typeof value === "boolean" ? Number(value) : value, t: typeof value === "number" ? 2 : typeof value === "boolean" ? 3 : 1 };
}

/** Marking twice is marking once. */
const isMarked = (sheet: FaceWorksheet, { area, kind }: Mark): boolean => sheet.getConditionalFormattingRules().some((rule) =>
  kindOfRule(rule) === kind && rule.ranges.some((range) => areaName(areaOf(area.sheet, range)) === areaName(area)));

let marks = 0;

/** Marks keep the user's own fill in the cell: the engine lays them over it and takes them off again. */
export function addMark(sheet: FaceWorksheet, { area, kind }: Pick<Mark, "area" | "kind">): void {
  const { fill, ink } = LOOKS[kind];
  sheet.addConditionalFormattingRule({
    cfId: `${SIGNATURE}-${Date.now().toString(36)}-${marks++}`,
    ranges: [{ startRow: area.row, endRow: area.row + area.rows - 1, startColumn: area.column, endColumn: area.column + area.columns - 1 }],
    stopIfTrue: false,
    rule: { type: "highlightCell", subType: "formula", value: `=${markFormula(kind)}`, style: { bg: { rgb: fill }, cl: { rgb: ink } } },
  });
}

export const noteAt = (row: number, column: number, text: string) =>
  ({ id: `${SIGNATURE}-${row}-${column}`, row, col: column, width: 240, height: 110, note: text.startsWith(SIGNATURE) ? text : `${SIGNATURE}: ${text}` });
