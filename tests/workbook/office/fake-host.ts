/**
 * A strict fake of the office host's object model, as much as the adapter uses. Strict means: a property that was not loaded and
 * synchronised throws; a write has no effect before a sync; an unknown member throws; an object outlives its batch only to throw;
 * matrices must have the shape of their range. A formula is computed by the few rules that the contract's workbook needs.
 */
import { parseRange } from "../../../src/workbook/address";

export class HostFailure extends Error {
  constructor(readonly code: string, message: string) { super(message); }
}

type Value = string | number | boolean;
interface CellState { formula: Value; format: string }
interface FormatState { type: string; formula: string; fill: string; ink: string; row: number; column: number; rows: number; columns: number }
interface SheetState {
  id: string; name: string; visibility: string; protected: boolean;
  cells: Map<string, CellState>; merges: { row: number; column: number; rows: number; columns: number }[]; tables: { row: number; column: number; rows: number; columns: number }[];
  formats: FormatState[]; notes: Map<string, string>;
}

const key = (row: number, column: number): string => `${row},${column}`;
type Rectangle = { row: number; column: number; rows: number; columns: number };
const meet = (a: Rectangle, b: Rectangle): boolean => a.row < b.row + b.rows && b.row < a.row + a.rows && a.column < b.column + b.columns && b.column < a.column + a.columns;

export class FakeHost {
  readonly sheets: SheetState[] = [];
  readonly properties = new Map<string, string>();
  selection = { sheet: "", row: 0, column: 0, rows: 1, columns: 1 };
  readonly handlers = { selection: new Set<() => unknown>(), changed: new Set<(event: { worksheetId: string }) => unknown>(), calculated: new Set<(event: { worksheetId: string }) => unknown>() };
  /** the host's newest requirement set, as its minor version of ExcelApi 1 */
  api = 18;
  syncs = 0;

  addSheet(name: string, cells: Record<string, Value> = {}): SheetState {
    const sheet: SheetState = { id: `id-${this.sheets.length}`, name, visibility: "Visible", protected: false, cells: new Map(), merges: [], tables: [], formats: [], notes: new Map() };
    for (const [at, formula] of Object.entries(cells)) {
      const { row, column } = parseRange(at)!;
      sheet.cells.set(key(row, column), { formula, format: "General" });
    }
    this.sheets.push(sheet);
    if (!this.selection.sheet) this.selection.sheet = name;
    return sheet;
  }

  /** What a cell shows: a constant, a formula's result, or what a formula above or left of it fills it with. */
  value(sheet: SheetState, row: number, column: number): Value {
    const own = sheet.cells.get(key(row, column));
    if (own) return typeof own.formula === "string" && own.formula.startsWith("=") ? this.compute(sheet, own.formula, 0, 0) : typeof own.formula === "string" && own.formula.startsWith("'") ? own.formula.slice(1) : own.formula;
    const filler = this.filler(sheet, row, column);
    return filler ? this.compute(sheet, filler.formula, row - filler.row, column - filler.column) : "";
  }

  /** The formula that fills a cell by spilling, where there is one; its own cell is filled by itself. */
  filler(sheet: SheetState, row: number, column: number): { formula: string; row: number; column: number } | undefined {
    for (const [at, { formula }] of sheet.cells) {
      const range = typeof formula === "string" ? /^=(\w+:\w+)$/.exec(formula) : null, area = range && parseRange(range[1]!);
      const [r, c] = at.split(",").map(Number) as [number, number];
      if (area && area.rows * area.columns > 1 && row >= r && row < r + area.rows && column >= c && column < c + area.columns) return { formula: formula as string, row: r, column: c };
    }
    return undefined;
  }

  private compute(sheet: SheetState, formula: string, r: number, c: number): Value {
    if (formula === "=1/0") return "#DIV/0!";
    const product = /^=([A-Z]+\d+)\*([\d.]+)$/.exec(formula), range = /^=(\w+:\w+)$/.exec(formula);
    const from = parseRange((product ?? range)?.[1] ?? "");
    if (!from) return "#NAME?";
    const value = this.value(sheet, from.row + (range ? r : 0), from.column + (range ? c : 0));
    return product ? Number(value) * Number(product[2]) : value;
  }

  find(name: string): SheetState | undefined { return this.sheets.find((sheet) => sheet.name === name || sheet.id === name); }

  tellChange(sheet: SheetState): void {
    for (const handler of [...this.handlers.changed, ...this.handlers.calculated]) void handler({ worksheetId: sheet.id });
  }

  /** The globals that the adapter knows. */
  globals(): { Excel: unknown; Office: unknown } {
    const run = async (first: unknown, second?: unknown): Promise<unknown> => {
      const batch = (second ?? first) as (context: Context) => Promise<unknown>;
      const context = new Context(this);
      try {
        return await batch(strict(context) as Context);
      } finally {
        context.ended = true;
      }
    };
    return { Excel: { run }, Office: { context: { requirements: { isSetSupported: (set: string, version: string) => set === "ExcelApi" && Number(version.split(".")[1]) <= this.api } } } };
  }
}

/** Reading a member that is not there is a mistake, not undefined; promises look for `then`, and printing for symbols. */
function strict<T extends object>(target: T): T {
  return new Proxy(target, {
    get(object, name, receiver) {
      if (typeof name === "symbol" || name === "then" || name === "toJSON") return Reflect.get(object, name, receiver);
      if (!(name in object)) throw new Error(`the host has no member ${String(name)} on ${object.constructor.name}`);
      const value = Reflect.get(object, name, receiver) as unknown;
      return value;
    },
    set(object, name, value, receiver) {
      if (!(name in object)) throw new Error(`the host has no member ${String(name)} on ${object.constructor.name}`);
      return Reflect.set(object, name, value, receiver);
    },
  });
}

class Context {
  readonly queue: (() => void)[] = [];
  ended = false;
  readonly workbook: Workbook;
  constructor(readonly host: FakeHost) { this.workbook = strict(new Workbook(this)); }
  later(work: () => void): void {
    if (this.ended) throw new HostFailure("InvalidObjectPath", "the batch of this object is over");
    this.queue.push(work);
  }
  async sync(): Promise<void> {
    if (this.ended) throw new HostFailure("InvalidObjectPath", "the batch is over");
    this.host.syncs++;
    const work = this.queue.splice(0);
    await Promise.resolve();
    for (const one of work) one();
  }
}

abstract class ClientObject {
  protected readonly loaded = new Map<string, unknown>();
  constructor(readonly context: Context) {}
  /** the value of a property as the host has it now */
  protected abstract fetch(name: string): unknown;
  load(names: string): void {
    for (const name of names.split(",")) this.context.later(() => { if (!this.missing()) this.loaded.set(name, this.fetch(name)); this.known = true; });
  }
  protected known = false;
  protected missing(): boolean { return false; }
  get isNullObject(): boolean {
    if (!this.known) throw new HostFailure("PropertyNotLoaded", "isNullObject was read before a sync");
    return this.missing();
  }
  protected read<T>(name: string): T {
    if (!this.loaded.has(name)) throw new HostFailure("PropertyNotLoaded", `${this.constructor.name}.${name} was not loaded and synchronised`);
    return this.loaded.get(name) as T;
  }
}

class Workbook {
  readonly worksheets: Worksheets;
  readonly properties: { custom: CustomProperties };
  readonly onSelectionChanged: Handlers<() => unknown>;
  constructor(private readonly context: Context) {
    this.worksheets = strict(new Worksheets(context));
    this.properties = strict({ custom: strict(new CustomProperties(context)) });
    this.onSelectionChanged = strict(new Handlers(context, context.host.handlers.selection));
  }
  getSelectedRanges() {
    const { context } = this;
    return strict({ areas: strict({ getItemAt: () => strict(new Range(context, () => context.host.find(context.host.selection.sheet), () => context.host.selection)) }) });
  }
  getSelectedRange() { return this.getSelectedRanges().areas.getItemAt(); }
}

class Handlers<Handler> {
  constructor(private readonly context: Context, private readonly set: Set<Handler>) {}
  add(handler: Handler) {
    this.context.later(() => this.set.add(handler));
    const { context, set } = this;
    return strict({ context: { host: context.host }, remove() { set.delete(handler); } });
  }
}

class CustomProperties {
  constructor(private readonly context: Context) {}
  add(name: string, value: string): void { this.context.later(() => this.context.host.properties.set(name, value.slice(0, 255))); }
  getItemOrNullObject(name: string) { return strict(new CustomProperty(this.context, name)); }
}

class CustomProperty extends ClientObject {
  constructor(context: Context, private readonly name: string) { super(context); }
  protected override missing(): boolean { return !this.context.host.properties.has(this.name); }
  protected fetch(name: string): unknown { return name === "value" ? this.context.host.properties.get(this.name) : this.name; }
  get value(): string { return this.read("value"); }
  get key(): string { return this.read("key"); }
  delete(): void { this.context.later(() => this.context.host.properties.delete(this.name)); }
}

class Worksheets extends ClientObject {
  readonly onChanged: Handlers<(event: { worksheetId: string }) => unknown>;
  readonly onCalculated: Handlers<(event: { worksheetId: string }) => unknown>;
  constructor(context: Context) {
    super(context);
    this.onChanged = strict(new Handlers(context, context.host.handlers.changed));
    this.onCalculated = strict(new Handlers(context, context.host.handlers.calculated));
  }
  protected fetch(name: string): unknown {
    const [, property] = name.split("/");
    const items = (this.loaded.get("items") as Worksheet[] | undefined) ?? this.context.host.sheets.map((sheet) => strict(new Worksheet(this.context, sheet.name)));
    this.loaded.set("items", items);
    if (property) for (const item of items) item.take(property);
    return items;
  }
  get items(): Worksheet[] { return this.read("items"); }
  getItemOrNullObject(name: string): Worksheet { return strict(new Worksheet(this.context, name)); }
}

class Worksheet extends ClientObject {
  readonly protection: Protection;
  readonly notes: Notes;
  constructor(context: Context, private readonly key: string) {
    super(context);
    this.protection = strict(new Protection(context, () => this.state()));
    this.notes = strict(new Notes(context, () => this.state()));
  }
  private state(): SheetState | undefined { return this.context.host.find(this.key); }
  protected override missing(): boolean { return !this.state(); }
  protected fetch(name: string): unknown { return name === "name" ? this.state()!.name : name === "visibility" ? this.state()!.visibility : undefined; }
  take(name: string): void { this.loaded.set(name, this.fetch(name)); this.known = true; }
  get name(): string { return this.read("name"); }
  get visibility(): string { return this.read("visibility"); }
  getRangeByIndexes(row: number, column: number, rows: number, columns: number): Range {
    if (!(row >= 0 && column >= 0 && rows > 0 && columns > 0)) throw new HostFailure("InvalidArgument", "no such range");
    return strict(new Range(this.context, () => this.state(), () => ({ row, column, rows, columns })));
  }
  getRange(): Range { return this.getRangeByIndexes(0, 0, 1_048_576, 16_384); }
  getUsedRangeOrNullObject(_valuesOnly: boolean): Range {
    const used = (): Rectangle | undefined => {
      const places = [...this.state()?.cells.keys() ?? []].map((at) => at.split(",").map(Number) as [number, number]);
      if (places.length === 0) return undefined;
      const rows = places.map(([r]) => r), columns = places.map(([, c]) => c), row = Math.min(...rows), column = Math.min(...columns);
      return { row, column, rows: Math.max(...rows) - row + 1, columns: Math.max(...columns) - column + 1 };
    };
    return strict(new Range(this.context, () => this.state(), used));
  }
  activate(): void { this.context.later(() => { this.context.host.selection.sheet = this.state()!.name; }); }
}

class Protection extends ClientObject {
  constructor(context: Context, private readonly state: () => SheetState | undefined) { super(context); }
  protected fetch(): unknown { return this.state()!.protected; }
  get protected(): boolean { return this.read("protected"); }
}

class Range extends ClientObject {
  readonly worksheet: ClientObject & { readonly name: string };
  readonly conditionalFormats: Formats;
  constructor(context: Context, private readonly state: () => SheetState | undefined, private readonly area: () => Rectangle | undefined) {
    super(context);
    this.worksheet = strict(new (class extends ClientObject {
      protected fetch(): unknown { return state()!.name; }
      get name(): string { return this.read("name"); }
    })(context));
    this.conditionalFormats = strict(new Formats(context, state, area));
  }
  protected override missing(): boolean { return !this.state() || !this.area(); }
  protected fetch(name: string): unknown {
    const { row, column, rows, columns } = this.area()!, sheet = this.state()!, host = this.context.host;
    const grid = <T>(of: (r: number, c: number) => T): T[][] => {
      if (rows * columns > 5_000_000) throw new HostFailure("ResponsePayloadSizeLimitExceeded", "too many cells");
      return Array.from({ length: rows }, (_, r) => Array.from({ length: columns }, (__, c) => of(row + r, column + c)));
    };
    const value = (r: number, c: number): Value => host.value(sheet, r, c);
    switch (name) {
      case "rowIndex": return row;
      case "columnIndex": return column;
      case "rowCount": return rows;
      case "columnCount": return columns;
      case "values": return grid(value);
      case "text": return grid((r, c) => String(value(r, c)));
      // a spilled cell answers with the formula that fills it, as the host's desktop object model does
      case "formulas": return grid((r, c) => sheet.cells.get(key(r, c))?.formula ?? host.filler(sheet, r, c)?.formula ?? "");
      case "hasSpill": return grid((r, c) => Boolean(host.filler(sheet, r, c))).flat().some(Boolean) ? null : false;
      case "numberFormat": return grid((r, c) => sheet.cells.get(key(r, c))?.format ?? "General");
      case "valueTypes": return grid((r, c) => { const one = value(r, c); return one === "" ? "Empty" : typeof one === "string" && one.startsWith("#") ? "Error" : typeof one === "number" ? "Double" : typeof one === "boolean" ? "Boolean" : "String"; });
      default: throw new HostFailure("InvalidArgument", `a range has no ${name}`);
    }
  }
  get hasSpill(): boolean | null { return this.read("hasSpill"); }
  getSpillParentOrNullObject(): Range {
    const { row, column } = this.area()!;
    return strict(new Range(this.context, this.state, () => {
      const filler = this.context.host.filler(this.state()!, row, column);
      return filler && { row: filler.row, column: filler.column, rows: 1, columns: 1 };
    }));
  }
  get rowIndex(): number { return this.read("rowIndex"); }
  get columnIndex(): number { return this.read("columnIndex"); }
  get rowCount(): number { return this.read("rowCount"); }
  get columnCount(): number { return this.read("columnCount"); }
  get values(): unknown[][] { return this.read("values"); }
  get text(): string[][] { return this.read("text"); }
  get numberFormat(): unknown[][] { return this.read("numberFormat"); }
  get valueTypes(): string[][] { return this.read("valueTypes"); }
  get formulas(): unknown[][] { return this.read("formulas"); }
  set formulas(given: unknown[][]) {
    const { row, column, rows, columns } = this.area()!;
    if (given.length !== rows || given.some((line) => line.length !== columns)) throw new HostFailure("InvalidArgument", "the matrix has another shape than the range");
    this.context.later(() => {
      const sheet = this.state()!;
      if (sheet.protected) throw new HostFailure("AccessDenied", "protected");
      given.forEach((line, r) => line.forEach((formula, c) => { if (formula === "") sheet.cells.delete(key(row + r, column + c)); else sheet.cells.set(key(row + r, column + c), { formula: formula as Value, format: sheet.cells.get(key(row + r, column + c))?.format ?? "General" }); }));
      this.context.host.tellChange(sheet);
    });
  }
  clear(what: string): void {
    if (what !== "Contents") throw new Error("only contents are cleared; formats are the user's");
    this.context.later(() => { const { row, column, rows, columns } = this.area()!; for (let r = row; r < row + rows; r++) for (let c = column; c < column + columns; c++) this.state()!.cells.delete(key(r, c)); });
  }
  getTables(_fully: boolean) {
    const count = { read: undefined as number | undefined };
    return strict({ getCount: () => {
      this.context.later(() => { count.read = this.state()!.tables.filter((table) => meet(table, this.area()!)).length; });
      return strict({ get value(): number { if (count.read === undefined) throw new HostFailure("ValueNotLoaded", "the count was read before a sync"); return count.read; } });
    } });
  }
  getMergedAreasOrNullObject() {
    const hit = (): boolean => this.state()!.merges.some((merge) => meet(merge, this.area()!));
    return strict(new (class extends ClientObject {
      protected override missing(): boolean { return !hit(); }
      protected fetch(): unknown { return "merged"; }
    })(this.context));
  }
  select(): void { this.context.later(() => { this.context.host.selection = { sheet: this.state()!.name, ...this.area()! }; for (const handler of this.context.host.handlers.selection) void handler(); }); }
}

class Formats extends ClientObject {
  constructor(context: Context, private readonly state: () => SheetState | undefined, private readonly area: () => Rectangle | undefined) { super(context); }
  protected fetch(name: string): unknown {
    const items = this.state()!.formats.filter((format) => meet(format, this.area()!)).map((format) => strict(new Format(this.context, this.state()!, format)));
    if (name === "items/type") for (const item of items) item.take("type");
    this.loaded.set("items", items);
    return items;
  }
  get items(): Format[] { return this.read("items"); }
  add(type: string): Format {
    const format: FormatState = { type, formula: "", fill: "", ink: "", ...this.area()! };
    this.context.later(() => this.state()!.formats.push(format));
    return strict(new Format(this.context, this.state()!, format));
  }
}

class Format extends ClientObject {
  constructor(context: Context, private readonly sheet: SheetState, private readonly format: FormatState) { super(context); }
  protected fetch(): unknown { return this.format.type; }
  take(name: string): void { this.loaded.set(name, this.fetch()); }
  get type(): string { return this.read("type"); }
  stopIfTrue = false;
  get custom() {
    const { context, format } = this;
    if (format.type !== "Custom") throw new HostFailure("InvalidOperation", "not a custom format");
    const colour = (which: "fill" | "ink") => strict({ set color(value: string) { context.later(() => { format[which] = value; }); }, get color(): string { throw new HostFailure("PropertyNotLoaded", "colour"); } });
    return strict({ rule: strict(new Rule(context, format)), format: strict({ fill: colour("fill"), font: colour("ink") }) });
  }
  delete(): void { this.context.later(() => { this.sheet.formats.splice(this.sheet.formats.indexOf(this.format), 1); }); }
}

/** rules are handed out anew at every access, and know what was loaded through any of them */
const loadedRules = new WeakMap<FormatState, string>();
class Rule extends ClientObject {
  constructor(context: Context, private readonly format: FormatState) { super(context); }
  protected fetch(): unknown { loadedRules.set(this.format, this.format.formula); return this.format.formula; }
  get formula(): string {
    const known = loadedRules.get(this.format);
    if (known === undefined) throw new HostFailure("PropertyNotLoaded", "rule.formula");
    return known;
  }
  set formula(value: string) { this.context.later(() => { this.format.formula = value; }); }
}

class Notes extends ClientObject {
  constructor(context: Context, private readonly state: () => SheetState | undefined) { super(context); }
  protected fetch(): unknown {
    const items = [...this.state()!.notes.keys()].map((at) => strict(new Note(this.context, this.state, at)));
    for (const item of items) item.take();
    this.loaded.set("items", items);
    return items;
  }
  get items(): Note[] { return this.read("items"); }
  getItemOrNullObject(at: string): Note { return strict(new Note(this.context, this.state, at)); }
  add(at: string, content: string): void {
    this.context.later(() => {
      if (this.state()!.notes.has(at)) throw new HostFailure("InvalidArgument", "there is a note already");
      this.state()!.notes.set(at, content);
    });
  }
}

class Note extends ClientObject {
  constructor(context: Context, private readonly state: () => SheetState | undefined, private readonly at: string) { super(context); }
  protected override missing(): boolean { return !this.state()?.notes.has(this.at); }
  protected fetch(): unknown { return this.state()!.notes.get(this.at); }
  take(): void { this.loaded.set("content", this.fetch()); this.known = true; }
  get content(): string { return this.read("content"); }
  set content(value: string) { this.context.later(() => this.state()!.notes.set(this.at, value)); }
  delete(): void { this.context.later(() => this.state()!.notes.delete(this.at)); }
}
