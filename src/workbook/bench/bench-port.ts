import { cellOf, CellReader } from "../../engine/cells";
import { messageKey } from "../../engine/messages";
import type { PageEngine } from "../../engine/page";
import { CellError, type Cell } from "../../worksheet/cell";
import { areaName, overlap } from "../address";
import { markFormula, markKindOf, SIGNATURE, type Area, type Content, type Done, type Mark, type MarkKind, type PortEvent, type Snapshot, type Why, type WorkbookPort } from "../port";
import type { EngineRange, FaceRule, FaceWorksheet, OpenWorkbook } from "./engine-face";

const PATIENCE_MS = 30_000;
const MOST_CELLS = 200_000;

const LOOKS: Readonly<Record<MarkKind, { readonly fill: string; readonly ink: string }>> = {
  "past-line": { fill: "#ffd9cc", ink: "#7a1f05" },
  doubtful: { fill: "#ffeec2", ink: "#5e4300" },
  ask: { fill: "#dcebfa", ink: "#123f66" },
};

const refused = (why: Why, where: readonly Area[], says: string): { ok: false; why: Why; where: readonly Area[]; says: string } => ({ ok: false, why, where, says });
const done = <T>(value: T): Done<T> => ({ ok: true, value });

export const kindOfRule = ({ rule }: FaceRule): MarkKind | undefined => typeof rule.value === "string" ? markKindOf(rule.value) : undefined;

export interface BenchPort extends WorkbookPort {
  /** tells the pane that something is so now: another workbook, another selection, another value */
  tell(event: PortEvent, area: Area): void;
  /** what one cell holds, for the line that speaks it */
  cell(area: Area): { readonly value: Cell; readonly formula: string | null; readonly shown: string; readonly message: string | undefined };
}

/** The workbook port on the page's own engine. */
export function benchPort(engine: PageEngine, open: () => OpenWorkbook): BenchPort {
  const heard: Record<PortEvent, Set<(area: Area) => void>> = { selection: new Set(), change: new Set() };
  const reader = (): CellReader => new CellReader(engine.library, engine.injector, open().workbook.getId());
  const sheetOf = (name: string): FaceWorksheet | null => open().workbook.getSheetByName(name);
  const settled = async (): Promise<void> => {
    await engine.api.getFormula().onCalculationResultApplied(PATIENCE_MS);
  };

  const gone = (area: Area): Done<never> => refused("gone", [area], `There is no sheet "${area.sheet}".`);
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
      if (!sheet) return gone(area);
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
      const commands: { sheet: FaceWorksheet; matrix: Record<number, Record<number, object>> }[] = [];
      const written: Area[] = [], filled: Area[] = [];
      for (const placement of what) {
        const sheet = sheetOf(placement.sheet);
        const whole: Area = { sheet: placement.sheet, row: placement.row, column: placement.column, rows: placement.cells.length, columns: Math.max(0, ...placement.cells.map((row) => row.length)) };
        if (!sheet) return gone(whole);
        if (open().protectedSheets.has(placement.sheet)) return refused("protected", [whole], `The sheet "${placement.sheet}" is protected: unprotect it first, or choose another.`);
        const matrix: Record<number, Record<number, object>> = {}, cells = reader();
        for (const [r, row] of placement.cells.entries()) for (const [c, content] of row.entries()) {
          if (content === null) continue;
          const at: Area = { sheet: placement.sheet, row: placement.row + r, column: placement.column + c, rows: 1, columns: 1 };
          const reach: Area = "formula" in content && content.reaches ? { ...at, ...content.reaches } : at;
          if (beyond(sheet, reach)) return refused("too-large", [reach], `${areaName(reach)} lies beyond the sheet.`);
          const merge = sheet.getMergedRanges().map((range) => areaOf(placement.sheet, range.getRange())).find((one) => overlap(one, reach));
          if (merge) return refused("merged", [merge], `${areaName(merge)} is merged: choose cells that are not.`);
          const spills = reach.rows * reach.columns > 1;
          const table = open().tables.find((one) => overlap(one, reach));
          if (table && spills) return refused("table", [table], `${areaName(table)} is a table, which takes no spilling formulas: choose a place outside it.`);
          for (let row2 = reach.row; row2 < reach.row + reach.rows; row2++) for (let column2 = reach.column; column2 < reach.column + reach.columns; column2++) {
            const cell: Area = { sheet: placement.sheet, row: row2, column: column2, rows: 1, columns: 1 };
            const { raw, value } = valueAt(sheet, cells, row2, column2);
            const empty = !raw?.f && (value === null || value === "");
            if (!empty && !over.some((one) => overlap(one, cell))) filled.push(cell);
            // a spill goes only into empty cells: what the user agreed to lose is cleared in the same step
            if (!empty && spills && (row2 !== at.row || column2 !== at.column)) (matrix[row2] ??= {})[column2] = CLEAR;
          }
          (matrix[at.row] ??= {})[at.column] = contentOf(content);
          written.push(reach);
        }
        commands.push({ sheet, matrix });
      }
      if (filled.length > 0) return refused("filled", filled, `${filled.length} cell${filled.length === 1 ? " is" : "s are"} filled: ${filled.slice(0, 6).map(areaName).join(", ")}${filled.length > 6 ? " …" : ""}.`);
      for (const { sheet, matrix } of commands) {
        await engine.api.executeCommand("sheet.command.set-range-values", { unitId: open().workbook.getId(), subUnitId: sheet.getSheetId(), value: matrix });
      }
      await settled();
      return done({ written });
    },

    mark: async (marks) => {
      const notesLeftOut: Area[] = [];
      for (const { area } of marks) if (!sheetOf(area.sheet)) return gone(area);
      for (const mark of marks) {
        const sheet = sheetOf(mark.area.sheet)!;
        if (!isMarked(sheet, mark)) addMark(sheet, mark);
        if (!mark.note) continue;
        const first = sheet.getRange(mark.area.row, mark.area.column), note = first.getNote();
        if (note && !note.note.startsWith(SIGNATURE)) notesLeftOut.push({ ...mark.area, rows: 1, columns: 1 });
        else first.createOrUpdateNote(noteAt(mark.area.row, mark.area.column, mark.note));
      }
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
      return done({ removed });
    },

    goTo: async (area) => {
      const sheet = sheetOf(area.sheet);
      if (!sheet) return gone(area);
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
      if (value === null) open().settings.delete(key); else open().settings.set(key, value);
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
