import { registerNames, type TableService } from "../engine/names";
import type { PageEngine } from "../engine/page";
import { sheetId, workbookData } from "../engine/snapshot";
import { addMark, areaOf, benchPort, noteAt, type BenchPort } from "../workbook/bench/bench-port";
import type { FaceWorkbook, OpenWorkbook } from "../workbook/bench/engine-face";
import { patchBook } from "../workbook/file/patch";
import { readBook } from "../workbook/file/read";
import type { Book } from "../workbook/file/book";
import type { Area } from "../workbook/port";
import { changesSince } from "./changes";

const PATIENCE_MS = 60_000;

interface Open extends OpenWorkbook {
  readonly book: Book;
  readonly bytes: Uint8Array;
  readonly fileName: string;
  readonly stop: () => void;
}

/** The desk holds one open workbook: its file, what was read of it, and the live copy that the engine computes. */
export class Desk {
  readonly port: BenchPort;
  private current: Open | undefined;
  private count = 0;
  /** true while a file is being laid out, when the engine may do what a user may not */
  loading = false;
  unsaved = false;
  private readonly hearers = new Set<() => void>();

  constructor(private readonly engine: PageEngine) {
    this.port = benchPort(engine, () => this.opened(), () => {
      this.unsaved = true;
      this.news();
    });
    this.port.on("selection", () => this.news());
  }

  private opened(): Open {
    if (!this.current) throw new Error("no workbook is open");
    return this.current;
  }

  get fileName(): string { return this.current?.fileName ?? "no workbook"; }

  /** told after every selection, edit, recalculation, opening and saving */
  onNews(hear: () => void): void { this.hearers.add(hear); }
  private news(): void { this.hearers.forEach((hear) => hear()); }

  /** The active cell, where there is one. */
  active(): Area | null {
    const range = this.current?.workbook.getActiveRange();
    return range ? { ...areaOf(this.opened().workbook.getActiveSheet().getSheetName(), range.getRange()), rows: 1, columns: 1 } : null;
  }

  undo(): void { this.opened().workbook.undo(); }
  redo(): void { this.opened().workbook.redo(); }

  /**
   * Opens a file. What is wrong with it is thrown as a BookRefusal before anything changes: the open workbook stays.
   */
  async open(bytes: Uint8Array, fileName: string): Promise<void> {
    const book = readBook(bytes);
    const { api, injector, library, messages } = this.engine;
    const before = this.current, id = `workbook-${++this.count}`;
    this.loading = true;
    try {
      messages.clear();
      const workbook = api.createWorkbook(workbookData(book, id)) as unknown as FaceWorkbook & { insertDefinedName(name: string, refersTo: string): unknown };
      registerNames(book, id, workbook, injector.get(library.ISuperTableService) as TableService);
      for (const [index, sheet] of book.sheets.entries()) {
        const face = workbook.getSheets().find((one) => one.getSheetId() === sheetId(index))!;
        for (const mark of sheet.marks) for (const range of mark.ranges) addMark(face, { kind: mark.kind, area: { sheet: sheet.name, ...range } });
        for (const note of sheet.notes) face.getRange(note.row, note.column).createOrUpdateNote(note.ours ? noteAt(note.row, note.column, note.text) : { ...noteAt(note.row, note.column, ""), id: `note-${note.row}-${note.column}`, note: note.text });
      }
      this.current = {
        book, bytes, fileName, workbook,
        protectedSheets: new Set(book.sheets.filter((sheet) => sheet.protected).map((sheet) => sheet.name)),
        tables: book.tables.map(({ sheet, range }) => ({ sheet, ...range })),
        settings: new Map(Object.entries(book.settings)),
        stop: this.listen(workbook),
      };
      before?.stop();
      if (before) api.disposeUnit(before.workbook.getId());
      const calculation = api.getFormula();
      calculation.executeCalculation();
      await calculation.onCalculationResultApplied(PATIENCE_MS);
      const start = workbook.getSheets().find((sheet) => !sheet.isSheetHidden());
      start?.getRange(0, 0).activate();
    } finally {
      this.loading = false;
    }
    this.unsaved = false;
    this.tellWhereWeAre();
  }

  private listen(workbook: FaceWorkbook): () => void {
    const { api } = this.engine;
    const selection = workbook.onSelectionChange((ranges) => {
      const range = ranges[0];
      if (this.loading || !range) return;
      this.port.tell("selection", areaOf(workbook.getActiveSheet().getSheetName(), range));
    });
    const sheets = api.addEvent(api.Event.ActiveSheetChanged, () => { if (!this.loading) this.tellWhereWeAre(); });
    const values = api.addEvent(api.Event.SheetValueChanged, () => {
      if (this.loading) return;
      this.unsaved = true;
      this.changed();
    });
    // a recalculation changes cells that no one has typed into
    const results = api.getFormula().calculationResultApplied(() => { if (!this.loading) this.changed(); });
    return () => [selection, sheets, values, results].forEach((one) => one.dispose());
  }

  private waiting: ReturnType<typeof setTimeout> | undefined;

  /** Many cells change at once; one word of it is enough. */
  private changed(): void {
    clearTimeout(this.waiting);
    this.waiting = setTimeout(() => {
      const sheet = this.current?.workbook.getActiveSheet().getSheetName();
      if (sheet !== undefined) this.port.tell("change", { sheet, row: 0, column: 0, rows: 1, columns: 1 });
      this.news();
    }, 30);
  }

  private tellWhereWeAre(): void {
    void this.port.selection().then((area) => { if (area) this.port.tell("selection", area); });
    this.news();
  }

  /** What the workbook would be if it were saved now; nothing is taken as saved. */
  preview(): Book {
    const { book, bytes, workbook, settings } = this.opened();
    return readBook(patchBook(bytes, changesSince(book, workbook, this.engine, settings)));
  }

  /** The file as it now is: the user's own bytes with what has changed patched in. */
  save(): { readonly bytes: Uint8Array; readonly fileName: string } {
    const { book, bytes, workbook, fileName, settings } = this.opened();
    const patched = patchBook(bytes, changesSince(book, workbook, this.engine, settings));
    // from now on changes are told from what was just saved
    this.current = { ...this.opened(), bytes: patched, book: readBook(patched) };
    this.unsaved = false;
    this.news();
    return { bytes: patched, fileName };
  }
}
