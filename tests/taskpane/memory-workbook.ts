import { cellName, overlap } from "../../src/workbook/address";
import type { Abilities, Area, Content, Done, Mark, Placement, PortEvent, SheetInfo, Snapshot, WorkbookPort } from "../../src/workbook/port";
import { isBlank, type Cell } from "../../src/worksheet/cell";

interface Held { value: Cell; formula: string | null; format: string }

const one = (sheet: string, row: number, column: number): Area => ({ sheet, row, column, rows: 1, columns: 1 });

/**
 * A workbook in memory that keeps the port's promises but computes nothing: a written formula is kept as it stands.
 * It serves the pane's tests, and records what it was asked to mark.
 */
export class MemoryWorkbook implements WorkbookPort {
  readonly marks: Mark[] = [];
  readonly settings = new Map<string, string>();
  wentTo: Area | null = null;
  private readonly cells = new Map<string, Map<string, Held>>();
  private readonly listeners = new Map<PortEvent, Set<(area: Area) => void>>();
  private selected: Area | null = null;

  constructor(sheets: Readonly<Record<string, readonly (readonly Cell[])[]>>) {
    for (const [name, rows] of Object.entries(sheets)) {
      this.cells.set(name, new Map());
      rows.forEach((row, r) => row.forEach((value, c) => this.put(name, r, c, { value, formula: null, format: "General" })));
    }
  }

  private put(sheet: string, row: number, column: number, held: Held): void {
    const at = `${row},${column}`;
    if (isBlank(held.value) && held.formula === null) this.cells.get(sheet)!.delete(at);
    else this.cells.get(sheet)!.set(at, held);
  }

  private at(sheet: string, row: number, column: number): Held | undefined { return this.cells.get(sheet)?.get(`${row},${column}`); }

  /** What a cell holds: its formula where it has one. */
  holds(sheet: string, row: number, column: number): Cell { const held = this.at(sheet, row, column); return held?.formula ?? held?.value ?? null; }

  type(sheet: string, row: number, column: number, value: Cell, format = "General"): void {
    this.put(sheet, row, column, { value, formula: null, format });
    this.tell("change", one(sheet, row, column));
  }

  select(area: Area): void {
    this.selected = area;
    this.tell("selection", area);
  }

  private tell(event: PortEvent, area: Area): void { for (const hear of this.listeners.get(event) ?? []) hear(area); }

  async abilities(): Promise<Abilities> { return { marks: true, notes: true, spills: true }; }

  async sheets(): Promise<SheetInfo[]> {
    return [...this.cells].map(([name, cells]) => {
      const places = [...cells.keys()].map((key) => key.split(",").map(Number) as [number, number]);
      const row = Math.min(...places.map(([r]) => r)), column = Math.min(...places.map(([, c]) => c));
      const used = places.length === 0 ? null : { sheet: name, row, column, rows: Math.max(...places.map(([r]) => r)) - row + 1, columns: Math.max(...places.map(([, c]) => c)) - column + 1 };
      return { name, used, hidden: false, protected: false };
    });
  }

  async selection(): Promise<Area | null> { return this.selected; }

  async read(area: Area): Promise<Done<Snapshot>> {
    if (!this.cells.has(area.sheet)) return { ok: false, why: "gone", where: [area], says: `There is no sheet ${area.sheet} any more.` };
    const all = <T>(pick: (held: Held | undefined) => T): T[][] => Array.from({ length: area.rows }, (_, r) => Array.from({ length: area.columns }, (__, c) => pick(this.at(area.sheet, area.row + r, area.column + c))));
    return { ok: true, value: { area, values: all((held) => held?.value ?? null), formulas: all((held) => held?.formula ?? null), formats: all((held) => held?.format ?? "General"), texts: all((held) => String(held?.value ?? "")) } };
  }

  async write(what: readonly Placement[], over: readonly Area[]): Promise<Done<{ readonly written: readonly Area[] }>> {
    const targets: { sheet: string; row: number; column: number; content: Content }[] = [], reached: Area[] = [];
    for (const { sheet, row, column, cells } of what) cells.forEach((line, r) => line.forEach((content, c) => {
      if (content === null) return;
      targets.push({ sheet, row: row + r, column: column + c, content });
      const reaches = "formula" in content ? content.reaches : undefined;
      reached.push({ sheet, row: row + r, column: column + c, rows: reaches?.rows ?? 1, columns: reaches?.columns ?? 1 });
    }));
    const filled: Area[] = [];
    for (const area of reached) for (let r = 0; r < area.rows; r++) for (let c = 0; c < area.columns; c++) {
      const cell = one(area.sheet, area.row + r, area.column + c);
      if (this.at(cell.sheet, cell.row, cell.column) && !over.some((agreed) => overlap(agreed, cell))) filled.push(cell);
    }
    if (filled.length > 0) return { ok: false, why: "filled", where: filled, says: `${filled.map(({ row, column }) => cellName(row, column)).join(", ")} hold something.` };
    for (const { sheet, row, column, content } of targets)
      this.put(sheet, row, column, "formula" in content ? { value: 0, formula: content.formula, format: "General" } : { value: content.value, formula: null, format: "General" });
    for (const area of reached) this.tell("change", area);
    return { ok: true, value: { written: reached } };
  }

  async mark(marks: readonly Mark[]): Promise<Done<{ readonly notesLeftOut: readonly Area[] }>> {
    this.marks.push(...marks);
    return { ok: true, value: { notesLeftOut: [] } };
  }

  async unmark(sheet: string | null): Promise<Done<{ readonly removed: number }>> {
    const stay = this.marks.filter(({ area }) => sheet !== null && area.sheet !== sheet);
    const removed = this.marks.length - stay.length;
    this.marks.splice(0, this.marks.length, ...stay);
    return { ok: true, value: { removed } };
  }

  async goTo(area: Area): Promise<Done> {
    this.wentTo = area;
    this.select(area);
    return { ok: true, value: undefined };
  }

  async recall(key: string): Promise<string | null> { return this.settings.get(key) ?? null; }

  async remember(key: string, value: string | null): Promise<void> {
    if (value === null) this.settings.delete(key); else this.settings.set(key, value);
  }

  on(event: PortEvent, hear: (area: Area) => void): () => void {
    const all = this.listeners.get(event) ?? new Set();
    this.listeners.set(event, all.add(hear));
    return () => void all.delete(hear);
  }
}
