import type { HeadlessEngine } from "../../engine/headless";
import { CellError, type Cell } from "../../worksheet/cell";
import { areaName } from "../address";
import { againstWriting, cellsOf, noSheet, refused, spills, targetsOf } from "../consent";
import type { Book, BookCell, BookMark, BookPatch, BookSheet, CellPatch } from "../file/book";
import { changeOf, fillsOf, plainOf } from "../file/changes";
import { MOST_COLUMNS, MOST_ROWS } from "../file/limits";
import { patchBook } from "../file/patch";
import { readBook } from "../file/read";
import { SIGNATURE, type Area, type Content, type Done, type PortEvent, type Snapshot, type WorkbookPort } from "../port";

const MOST_CELLS = 200_000;

/** A workbook file without a window: the same port, for the command line and for tests. */
export interface HeadlessWorkbook extends WorkbookPort {
  /** computes every formula anew */
  recalculate(): Promise<void>;
  select(area: Area): void;
  /** the file with what has changed patched in */
  save(): Uint8Array;
}

interface Sheet {
  readonly before: BookSheet;
  readonly cells: Map<string, BookCell>;
  /** what formulas come to, and what they fill */
  readonly results: Map<string, Cell>;
  readonly filled: Map<string, readonly (readonly Cell[])[]>;
  marks: BookMark[];
  notes: Map<string, { row: number; column: number; text: string; ours: boolean }>;
}

const key = (row: number, column: number): string => `${row}/${column}`;
const done = <T>(value: T): Done<T> => ({ ok: true, value });
/** @throws BookRefusal where the file cannot be opened */
export async function openHeadless(bytes: Uint8Array, engine: HeadlessEngine): Promise<HeadlessWorkbook> {
  const book = readBook(bytes);
  const sheets = new Map(book.sheets.map((before): [string, Sheet] => [before.name, {
    before, results: new Map(), filled: new Map(), marks: [...before.marks],
    cells: new Map(before.cells.map((cell) => [key(cell.row, cell.column), cell])),
    notes: new Map(before.notes.map((note) => [key(note.row, note.column), note])),
  }]));
  const settings = new Map(Object.entries(book.settings));
  const heard: Record<PortEvent, Set<(area: Area) => void>> = { selection: new Set(), change: new Set() };
  const tell = (event: PortEvent, area: Area): void => heard[event].forEach((hear) => hear(area));
  let selected: Area | null = null;

  const valueAt = (sheet: Sheet, row: number, column: number): Cell => {
    const result = sheet.results.get(key(row, column));
    if (result !== undefined) return result;
    const cell = sheet.cells.get(key(row, column));
    return !cell ? null : cell.error === undefined ? cell.value : new CellError(cell.error as CellError["code"], "");
  };
  const isFilled = (sheet: Sheet, row: number, column: number): boolean => {
    const value = valueAt(sheet, row, column);
    return sheet.cells.get(key(row, column))?.formula !== undefined || (value !== null && value !== "");
  };

  function current(): Book {
    return { ...book, sheets: [...sheets.values()].map(({ before, cells }) => ({ ...before, cells: [...cells.values()], rows: Math.max(before.rows, ...[...cells.values()].map(({ row }) => row + 1)), columns: Math.max(before.columns, ...[...cells.values()].map(({ column }) => column + 1)) })) };
  }

  async function recalculate(): Promise<void> {
    for (const { sheet: name, results } of await engine.compute(current())) {
      const sheet = sheets.get(name)!;
      sheet.results.clear();
      sheet.filled.clear();
      for (const { row, column, value, fills } of results) {
        sheet.results.set(key(row, column), value);
        if (!fills) continue;
        sheet.filled.set(key(row, column), fills);
        fills.forEach((line, r) => line.forEach((cell, c) => sheet.results.set(key(row + r, column + c), cell)));
      }
    }
  }

  const put = (sheet: Sheet, { row, column }: Area, content: Content | null): void => {
    const style = sheet.cells.get(key(row, column))?.style ?? 0;
    const now: BookCell = content === null ? { row, column, value: null, style }
      : "formula" in content ? { row, column, value: null, formula: content.formula.replace(/^=/, ""), style }
        : { row, column, ...plainOf(content.value), style };
    sheet.cells.set(key(row, column), now);
  };

  function changes(): BookPatch {
    const patches = [...sheets].map(([name, { before, cells, results, filled, marks, notes }]) => {
      const was = new Map(before.cells.map((cell) => [key(cell.row, cell.column), cell])), changed: CellPatch[] = [];
      for (const [at, { row, column, formula, value, error }] of cells) {
        const shown = formula === undefined ? { value, ...(error === undefined ? {} : { error }) } : plainOf(results.get(at) ?? null), grid = filled.get(at);
        const change = changeOf(was.get(at), { row, column, formula, shown, ...(grid ? { fills: fillsOf(grid) } : {}) });
        if (change) changed.push(change);
      }
      const ours = [...notes.values()].filter((note) => note.ours).map(({ row, column, text }) => ({ row, column, text }));
      return { sheet: name, cells: changed, marks, notes: ours };
    });
    return { sheets: patches, settings: Object.fromEntries(settings) };
  }

  await recalculate();
  return {
    recalculate,
    select(area) {
      selected = area;
      tell("selection", area);
    },
    save: () => patchBook(bytes, changes()),

    abilities: async () => ({ marks: true, notes: true, spills: true }),
    sheets: async () => [...sheets].map(([name, sheet]) => {
      const places = [...sheet.cells.values()].filter(({ row, column }) => isFilled(sheet, row, column)).map(({ row, column }) => [row, column] as const).concat([...sheet.results.keys()].map((at) => at.split("/").map(Number) as [number, number]));
      const used = places.length === 0 ? null : { sheet: name, row: 0, column: 0, rows: Math.max(...places.map(([row]) => row)) + 1, columns: Math.max(...places.map(([, column]) => column)) + 1 };
      return { name, used, hidden: sheet.before.hidden, protected: sheet.before.protected };
    }),
    selection: async () => selected,
    async read(area) {
      const sheet = sheets.get(area.sheet);
      if (!sheet) return noSheet(area);
      const used = [...sheet.cells.values()], results = [...sheet.results.keys()].map((at) => at.split("/").map(Number) as [number, number]);
      const bottom = Math.max(1, ...used.map(({ row }) => row + 1), ...results.map(([row]) => row + 1)), right = Math.max(1, ...used.map(({ column }) => column + 1), ...results.map(([, column]) => column + 1));
      // a whole column means its used part
      const rows = area.rows > bottom ? Math.max(1, Math.min(area.rows, bottom - area.row)) : area.rows, columns = area.columns > right && area.columns > 1000 ? Math.max(1, right - area.column) : area.columns;
      if (rows * columns > MOST_CELLS) return refused("too-large", [area], `${areaName(area)} has more than ${MOST_CELLS.toLocaleString("en")} cells: select fewer.`);
      const grid = <T>(of: (row: number, column: number) => T): T[][] => Array.from({ length: rows }, (_, r) => Array.from({ length: columns }, (__, c) => of(area.row + r, area.column + c)));
      return done<Snapshot>({
        area: { ...area, rows, columns },
        values: grid((row, column) => valueAt(sheet, row, column)),
        formulas: grid((row, column) => { const formula = sheet.cells.get(key(row, column))?.formula; return formula === undefined ? null : `=${formula}`; }),
        formats: grid((row, column) => book.styles[sheet.cells.get(key(row, column))?.style ?? 0]?.format ?? "General"),
        texts: grid((row, column) => { const value = valueAt(sheet, row, column); return value instanceof CellError ? value.code : String(value ?? ""); }),
      });
    },
    async write(what, over) {
      const targets = targetsOf(what);
      const against = againstWriting(targets, over, {
        has: (name) => sheets.has(name),
        isProtected: (name) => sheets.get(name)!.before.protected,
        size: () => ({ rows: MOST_ROWS, columns: MOST_COLUMNS }),
        merges: (name) => sheets.get(name)!.before.merges.map((merge) => ({ sheet: name, ...merge })),
        tables: (name) => book.tables.filter((table) => table.sheet === name).map((table) => ({ sheet: name, ...table.range })),
        isFilled: ({ sheet, row, column }) => isFilled(sheets.get(sheet)!, row, column),
      });
      if (against) return against;
      for (const target of targets) {
        const sheet = sheets.get(target.at.sheet)!;
        if (spills(target)) for (const cell of cellsOf(target.reach)) if (sheet.cells.has(key(cell.row, cell.column))) put(sheet, cell, null);
        put(sheet, target.at, target.content);
      }
      await recalculate();
      for (const { reach } of targets) tell("change", reach);
      return done({ written: targets.map(({ reach }) => reach) });
    },
    async mark(marks) {
      for (const { area } of marks) if (!sheets.has(area.sheet)) return noSheet(area);
      const notesLeftOut: Area[] = [];
      for (const { area, kind, note } of marks) {
        const sheet = sheets.get(area.sheet)!, { row, column, rows, columns } = area;
        const there = sheet.marks.some((mark) => mark.kind === kind && mark.ranges.some((range) => range.row === row && range.column === column && range.rows === rows && range.columns === columns));
        if (!there) sheet.marks.push({ kind, ranges: [{ row, column, rows, columns }] });
        if (!note) continue;
        const old = sheet.notes.get(key(row, column));
        if (old && !old.ours) notesLeftOut.push({ ...area, rows: 1, columns: 1 });
        else sheet.notes.set(key(row, column), { row, column, text: note.startsWith(SIGNATURE) ? note : `${SIGNATURE}: ${note}`, ours: true });
      }
      return done({ notesLeftOut });
    },
    async unmark(name) {
      let removed = 0;
      for (const [own, sheet] of sheets) {
        if (name !== null && own !== name) continue;
        removed += sheet.marks.length;
        sheet.marks = [];
        for (const [at, note] of sheet.notes) if (note.ours) sheet.notes.delete(at);
      }
      return done({ removed });
    },
    async goTo(area) {
      if (!sheets.has(area.sheet)) return noSheet(area);
      selected = area;
      tell("selection", area);
      return done(undefined);
    },
    recall: async (name) => settings.get(name) ?? null,
    remember: async (name, value) => { if (value === null) settings.delete(name); else settings.set(name, value); },
    on(event, hear) {
      heard[event].add(hear);
      return () => { heard[event].delete(hear); };
    },
  };
}
