import { freeBlock } from "../../src/tables/free-block";
import { peakFormulas, tableFormula } from "../../src/tables/formulas";
import { recogniseTable } from "../../src/tables/recognise";
import type { Place, Table } from "../../src/tables/table";
import { areaName, cellName, overlap, parseRange, rangeName } from "../../src/workbook/address";
import type { Area, Placement, PortEvent, Snapshot, WorkbookPort } from "../../src/workbook/port";
import { isBlank } from "../../src/worksheet/cell";
import { noChoices, readChoices, writeChoices, type Choices } from "./choices";
import { compare, nameOfLook, noComparing, readComparing, writeComparing, type Comparing, type Comparison, type KeptTest } from "./compare";
import { besideInPlot, lookAt, marksOf, typedNumber, type Beside, type Fitter, type Look } from "./model";

/** What the view shows; the controller pushes a new one whenever anything changes. */
export interface Shown {
  readonly look: Look | null;
  /** said instead of a look: nothing selected, too large, the host's refusal */
  readonly instead: string | null;
  /** cells that a write would replace, waiting for the user's consent */
  readonly consent: { readonly cells: readonly Area[]; readonly count: number; readonly at: string } | null;
  readonly canMark: boolean;
  /** the test shown beside others of its selection and those kept from elsewhere */
  readonly comparison: Comparison | null;
}

export interface View {
  show(shown: Shown): void;
  /** one line that is read aloud */
  announce(text: string): void;
}

/** A selection larger than this is no laboratory test; whole columns are cut to the used part first. */
const MOST_CELLS = 20_000;
/** How far above a selection its headings are looked for, and how far a lone cell's table may reach. */
const HEADINGS_ABOVE = 3, REGION = 60, AROUND = 12;
const SETTLE_MS = 120;

export interface Clock { set(run: () => void, ms: number): unknown; clear(handle: unknown): void }

/** Joins the workbook, the model and the view. One piece of work runs at a time; what comes meanwhile waits. */
export class CurveController {
  private look: Look | null = null;
  private snapshot: Snapshot | null = null;
  private choices: Choices = noChoices;
  private consent: { placements: readonly Placement[]; cells: readonly Area[]; at: string } | null = null;
  private instead: string | null = null;
  private canMark = true;
  private timer: unknown = null;
  private readonly pending = new Set<PortEvent>();
  private around: Snapshot | null = null;
  private turn = 0;
  /** how often the user has chosen, and what of it is still on its way into the workbook */
  private chosen = 0;
  private comparing: Comparing = noComparing;
  private kept: readonly (KeptTest & Beside)[] = [];
  private remembering: Promise<unknown> = Promise.resolve();

  constructor(
    private readonly port: WorkbookPort, private readonly view: View, private readonly fitter: Fitter,
    private readonly clock: Clock = { set: (run, ms) => setTimeout(run, ms), clear: (handle) => clearTimeout(handle as number) },
  ) {}

  async start(): Promise<void> {
    this.port.on("selection", () => this.soon("selection"));
    this.port.on("change", () => this.soon("change"));
    this.canMark = (await this.port.abilities()).marks;
    await this.readKept();
    await this.followSelection();
  }

  /** Typing into a cell changes it and moves the selection: both are followed, once things are quiet. */
  private soon(event: PortEvent): void {
    this.pending.add(event);
    this.clock.clear(this.timer);
    this.timer = this.clock.set(() => {
      const pending = new Set(this.pending);
      this.pending.clear();
      void this.follow(pending).catch((error: unknown) => this.hostFailed(error));
    }, SETTLE_MS);
  }

  private async follow(pending: ReadonlySet<PortEvent>): Promise<void> {
    const before = this.snapshot;
    if (pending.has("selection")) await this.followSelection();
    // a table that the selection has just brought is fresh already
    if (pending.has("change") && this.snapshot === before) await this.followChange();
  }

  private hostFailed(error: unknown): void {
    this.view.announce(`The workbook did not answer: ${error instanceof Error ? error.message : String(error)}. Select the table again.`);
  }

  async followSelection(): Promise<void> {
    const turn = ++this.turn;
    const selected = await this.port.selection();
    if (selected === null) return this.say(turn, "Select a laboratory test in the sheet: its two columns, or the whole table with its headings.");
    const used = await this.usedPart(selected.sheet);
    if (turn !== this.turn) return;
    const cut = used && intersection(selected, used);
    const lone = selected.rows === 1 && selected.columns === 1;
    // a click on a cell (to edit it, or from a finding here) does not lose the table that is shown; it is read again,
    // since another workbook may have been opened meanwhile
    if (lone && this.snapshot && overlap(selected, this.snapshot.area)) return this.followChange();
    if (!cut) return lone && this.look ? this.followChange() : this.say(turn, "The selected cells are empty. Select a laboratory test: its two columns, or the whole table with its headings.");
    if (cut.rows * cut.columns > MOST_CELLS) return this.say(turn, `The selection holds ${(cut.rows * cut.columns).toLocaleString("en")} cells. Select one test at a time.`);
    const snapshot = lone ? await this.regionAround(cut, used) : await this.withHeadings(cut, used);
    if (turn !== this.turn || snapshot === null) return;
    if (lone && this.look && !isTest(recogniseTable(snapshot))) return this.followChange();
    await this.take(turn, snapshot);
  }

  /** After an edit the same cells are read again; a recalculation may reach them from anywhere on the sheets. */
  private async followChange(): Promise<void> {
    if (!this.snapshot) return this.followSelection();
    const turn = ++this.turn;
    const again = await this.port.read(this.snapshot.area);
    if (turn !== this.turn) return;
    if (!again.ok) return this.say(turn, again.says);
    this.around = await this.readAround(again.value.area);
    await this.readKept();
    if (turn !== this.turn) return;
    this.snapshot = again.value;
    this.refresh();
  }

  /** The cells about a table, where facts that hold for the whole test (its specific gravity) may stand. */
  private async readAround(area: Area): Promise<Snapshot | null> {
    const used = await this.usedPart(area.sheet);
    const row = Math.max(0, area.row - AROUND), column = Math.max(0, area.column - AROUND);
    const window = used && intersection({ sheet: area.sheet, row, column, rows: area.row + area.rows + AROUND - row, columns: area.column + area.columns + AROUND - column }, used);
    const done = window && await this.port.read(window);
    return done?.ok ? done.value : null;
  }

  /** The kept tests as they stand in the sheet now, each with what the user chose for it. */
  private async readKept(): Promise<void> {
    await this.remembering.catch(() => undefined);
    this.comparing = readComparing(await this.port.recall(COMPARE));
    this.kept = await Promise.all(this.comparing.kept.map(async ({ area, name }): Promise<KeptTest & Beside> => {
      const done = await this.port.read(area);
      if (!done.ok) return { area, name, fit: null, says: done.says, unit: null };
      const look = lookAt(done.value, readChoices(await this.port.recall(keyOf(area))), this.fitter, await this.readAround(area));
      return { area, name, fit: look.fit, says: look.noFit?.says ?? look.table.problems[0]?.says ?? "It is not read yet.", unit: look.unit?.id ?? null };
    }));
  }

  private async compareAnew(change: Comparing): Promise<void> {
    this.remembering = this.remembering.catch(() => undefined).then(() => this.port.remember(COMPARE, change.kept.length === 0 && Object.keys(change.efforts).length === 0 ? null : writeComparing(change)));
    await this.readKept();
    this.show();
  }

  /** Keeps the test that is shown beside whatever is selected next. */
  async keepTest(): Promise<void> {
    if (!this.look?.fit) return;
    const area = this.look.table.area, name = nameOfLook(this.look);
    await this.compareAnew({ ...this.comparing, kept: [...this.comparing.kept.filter((one) => one.name !== name), { area, name }] });
    this.view.announce(`Kept ${name}. Select another test to see both.`);
  }

  async dropTest(name: string): Promise<void> {
    await this.compareAnew({ ...this.comparing, kept: this.comparing.kept.filter((one) => one.name !== name) });
    this.view.announce(`Dropped ${name} from the comparison; its cells are untouched.`);
  }

  async setEffort(name: string, text: string): Promise<void> {
    const { [name]: _, ...others } = this.comparing.efforts;
    await this.compareAnew({ ...this.comparing, efforts: text.trim() === "" ? others : { ...others, [name]: text.trim() } });
  }

  private async usedPart(sheet: string): Promise<Area | null> {
    return (await this.port.sheets()).find(({ name }) => name === sheet)?.used ?? null;
  }

  /** Numbers selected without their headings: the lines above (or beside) are taken in where they say more. */
  private async withHeadings(cut: Area, used: Area): Promise<Snapshot | null> {
    const own = await this.read(cut);
    if (!own || this.headed(own)) return own;
    for (const wider of [growUp(cut, used, HEADINGS_ABOVE), growLeft(cut, used, HEADINGS_ABOVE)]) {
      if (!wider) continue;
      const snapshot = await this.read(wider);
      if (!snapshot || !this.headed(snapshot)) continue;
      const inside = recogniseTable(snapshot).body;
      if (inside && cut.row <= inside.row && cut.column <= inside.column) return snapshot;
    }
    return own;
  }

  private headed(snapshot: Snapshot): boolean {
    const { series } = recogniseTable(snapshot);
    return series.some(({ roleKnown, role }) => roleKnown === "heading" && role !== "other");
  }

  /** The filled block around a lone cell, up to a blank row and a blank column on every side. */
  private async regionAround(cell: Area, used: Area): Promise<Snapshot | null> {
    const window = intersection({ sheet: cell.sheet, row: Math.max(0, cell.row - REGION), column: Math.max(0, cell.column - REGION), rows: 2 * REGION, columns: 2 * REGION }, used);
    const around = window && await this.read(window);
    if (!around) return null;
    const region = filledRegion(around, cell);
    if (region && goesOn(region, window, used)) {
      this.say(this.turn, `The table around ${areaName(cell)} goes on for more than ${REGION} rows or columns. Select the part that is one test.`);
      return null;
    }
    return region ? this.read(region) : this.read(cell);
  }

  private async read(area: Area): Promise<Snapshot | null> {
    const done = await this.port.read(area);
    if (done.ok) return done.value;
    this.say(this.turn, done.says);
    return null;
  }

  private async take(turn: number, snapshot: Snapshot): Promise<void> {
    const key = keyOf(snapshot.area), { chosen } = this;
    await this.remembering.catch(() => undefined);
    const remembered = readChoices(await this.port.recall(key));
    const around = await this.readAround(snapshot.area);
    await this.readKept();
    if (turn !== this.turn) return;
    // what the user chose for this very table while it was being read is newer than what the workbook remembered
    const newer = this.chosen !== chosen && this.snapshot !== null && keyOf(this.snapshot.area) === key;
    Object.assign(this, { snapshot, around, choices: newer ? this.choices : remembered, consent: null });
    this.refresh();
  }

  private say(turn: number, instead: string): void {
    if (turn !== this.turn) return;
    Object.assign(this, { look: null, snapshot: null, consent: null, instead });
    this.show();
  }

  private refresh(): void {
    if (!this.snapshot) return;
    this.look = lookAt(this.snapshot, this.choices, this.fitter, this.around);
    this.instead = null;
    this.show();
  }

  private show(): void {
    const { consent } = this;
    const comparison = this.look && this.look.kind !== "nothing" ? compare(this.look, this.kept, this.comparing) : null;
    this.view.show({ look: this.look && withKept(this.look, comparison), comparison, instead: this.instead, consent: consent && { cells: consent.cells, count: countCells(consent.cells), at: consent.at }, canMark: this.canMark });
  }

  /** The user's word: kept in the workbook for this table, and the pane follows. */
  async choose(change: Partial<Choices>): Promise<void> {
    if (!this.snapshot) return;
    this.chosen++;
    this.choices = { ...this.choices, ...change };
    this.consent = null;
    const key = keyOf(this.snapshot.area), written = writeChoices(this.choices);
    this.refresh();
    // one after the other, so that the last word is the one that stays
    this.remembering = this.remembering.catch(() => undefined).then(() => this.port.remember(key, written));
    await this.remembering;
  }

  async goTo(area: Area): Promise<void> {
    const done = await this.port.goTo(area);
    this.view.announce(done.ok ? `Went to ${rangeName(area)}.` : done.says);
  }

  async mark(): Promise<void> {
    if (!this.look) return;
    const marks = marksOf(this.look);
    if (marks.length === 0) return this.view.announce("No point has a finding, so there is nothing to mark.");
    const done = await this.port.mark(marks);
    if (!done.ok) return this.view.announce(done.says);
    const points = this.look.marks.filter((mark) => mark !== "plain").length;
    const left = done.value.notesLeftOut;
    this.view.announce(`Marked ${points} point${points === 1 ? "" : "s"}.${left.length > 0 ? ` ${left.map(rangeName).join(", ")} already ${left.length === 1 ? "has a note" : "have notes"} of yours, which ${left.length === 1 ? "was" : "were"} left as it stands.` : ""}`);
  }

  async unmark(): Promise<void> {
    const sheet = this.snapshot?.area.sheet ?? (await this.port.selection())?.sheet ?? null;
    const done = await this.port.unmark(sheet);
    if (!done.ok) return this.view.announce(done.says);
    const { removed } = done.value;
    this.view.announce(removed === 0 ? "There is no mark of Tampsheet on this sheet." : `Removed ${removed} mark${removed === 1 ? "" : "s"}; your own formats and notes are untouched.`);
  }

  /** Writes live formulas at an address, or in the first free block where none is given. Filled cells are asked about first. */
  async write(address: string, reaches: { rows: number; columns: number }): Promise<void> {
    const { look, snapshot } = this;
    if (!look?.fit || !snapshot) return;
    const { sheet } = snapshot.area;
    const { specificGravity, choices } = look;
    const water = look.water.trouble === null ? typedNumber(choices.waterDensity) ?? null : null;
    if (look.tests.length > 0) return this.writeTable(look, snapshot, address);
    const formulas = peakFormulas(look.table, { curve: choices.curve, specificGravity: specificGravity.value, waterDensity: water }, sheet);
    if (!formulas) return this.view.announce("There is nothing to write for this table.");
    const at = address.trim() === "" ? await this.freePlace(look.table, { rows: formulas.rowsBefore + reaches.rows, columns: reaches.columns }) : parseRange(address.trim());
    if (!at) return this.view.announce(`"${address.trim()}" is not a cell of this sheet: type one such as ${cellName(look.table.area.row, look.table.area.column + look.table.area.columns + 1)}, or leave it empty.`);
    const placements: Placement[] = [{ sheet, row: at.row, column: at.column, cells: formulas.block(at, reaches) }];
    await this.send(placements, [], cellName(at.row, at.column));
  }

  /** Several tests in one selection: one formula that gives a row for each. */
  private async writeTable(look: Look, snapshot: Snapshot, address: string): Promise<void> {
    const { sheet } = snapshot.area, whole = recogniseTable(snapshot, look.choices.corrections, this.around);
    const water = look.water.trouble === null ? typedNumber(look.choices.waterDensity) ?? null : null;
    const formula = tableFormula(whole, look.testsIn, { curve: look.choices.curve, specificGravity: look.specificGravity.value, waterDensity: water }, sheet);
    if (!formula) return this.view.announce("A table of several tests is written where water content and dry density stand in columns of their own. Select one test at a time.");
    const reaches = { rows: look.tests.length + 1, columns: TABLE_COLUMNS };
    const at = address.trim() === "" ? await this.freePlace(whole, reaches) : parseRange(address.trim());
    if (!at) return this.view.announce(`"${address.trim()}" is not a cell of this sheet: type one such as ${cellName(whole.area.row, whole.area.column + whole.area.columns + 1)}, or leave it empty.`);
    await this.send([{ sheet, row: at.row, column: at.column, cells: [[{ formula, reaches }]] }], [], cellName(at.row, at.column));
  }

  private async send(placements: readonly Placement[], over: readonly Area[], at: string): Promise<void> {
    const done = await this.port.write(placements, over);
    if (done.ok) {
      this.consent = null;
      this.show();
      return this.view.announce(`Wrote ${done.value.written.map(rangeName).join(", ")}. The figures follow the readings.`);
    }
    if (done.why === "filled" && over.length === 0 && done.where.length > 0) {
      this.consent = { placements, cells: merged(done.where), at };
      this.show();
      const { cells } = this.consent;
      return this.view.announce(`${cells.map(rangeName).join(", ")} ${countCells(cells) === 1 ? "is" : "are"} filled. Nothing was written yet.`);
    }
    this.view.announce(done.says);
  }

  async replace(): Promise<void> {
    if (this.consent) await this.send(this.consent.placements, this.consent.cells, this.consent.at);
  }

  keep(): void {
    this.consent = null;
    this.show();
    this.view.announce("Nothing was written.");
  }

  private async freePlace(table: Table, size: { rows: number; columns: number }): Promise<Place> {
    const { area } = table;
    const used = await this.usedPart(area.sheet) ?? area;
    const bottom = Math.max(used.row + used.rows, area.row + area.rows) + size.rows, right = Math.max(used.column + used.columns, area.column + area.columns) + size.columns;
    const around = await this.port.read({ sheet: area.sheet, row: area.row === 0 ? 0 : area.row - 1, column: area.column, rows: Math.min(bottom - area.row + 1, 400), columns: Math.min(right - area.column, 60) });
    const filled = (row: number, column: number): boolean => around.ok && !isBlank(around.value.values[row - around.value.area.row]?.[column - around.value.area.column]);
    return freeBlock(area, size, filled, used.row + used.rows - 1);
  }
}

/** Under which name the comparison travels in the workbook. */
const COMPARE = "compare";
/** Columns of PEAKTABLE; a test holds it to the function. */
export const TABLE_COLUMNS = 10;

/** The plot with the kept curves in it, and the line of optimums where efforts are told. */
function withKept(look: Look, comparison: Comparison | null): Look {
  if (!look.plot || !comparison) return look;
  const kept = comparison.tests.filter(({ is, unit }) => is === "kept" && unit === look.unit?.id), { optimums } = comparison.efforts ?? {};
  return { ...look, plot: {
    ...look.plot,
    beside: [...look.plot.beside, ...kept.flatMap(besideInPlot)],
    lines: [...look.plot.lines, ...(optimums ? [{ labels: ["line of optimums", "optimums"], at: (water: number) => optimums.at(water) }] : [])],
  } };
}

export const keyOf = (area: Area): string => `curve:${areaName(area)}`;

/** Whether a region reaches the edge of the window it was looked for in, while the sheet goes on behind it. */
const goesOn = (region: Area, window: Area, used: Area): boolean =>
  (region.row === window.row && window.row > used.row) || (region.column === window.column && window.column > used.column)
  || (region.row + region.rows === window.row + window.rows && window.row + window.rows < used.row + used.rows)
  || (region.column + region.columns === window.column + window.columns && window.column + window.columns < used.column + used.columns);

const isTest = ({ waterFrom, dryFrom }: Table): boolean => waterFrom !== null && dryFrom !== null;

const countCells = (areas: readonly Area[]): number => areas.reduce((sum, { rows, columns }) => sum + rows * columns, 0);

/** Areas that continue one another downwards, told as one: H3, H4, H5 are H3:H5. The cells are the very same. */
function merged(areas: readonly Area[]): Area[] {
  const out: Area[] = [];
  for (const area of [...areas].sort((a, b) => a.column - b.column || a.row - b.row)) {
    const last = out.at(-1);
    if (last && last.sheet === area.sheet && last.column === area.column && last.columns === area.columns && last.row + last.rows === area.row) out[out.length - 1] = { ...last, rows: last.rows + area.rows };
    else out.push(area);
  }
  return out;
}

function intersection(a: Area, b: Area): Area | null {
  const row = Math.max(a.row, b.row), column = Math.max(a.column, b.column);
  const rows = Math.min(a.row + a.rows, b.row + b.rows) - row, columns = Math.min(a.column + a.columns, b.column + b.columns) - column;
  return rows > 0 && columns > 0 ? { sheet: a.sheet, row, column, rows, columns } : null;
}

function growUp(area: Area, used: Area, by: number): Area | null {
  const row = Math.max(used.row, area.row - by);
  return row < area.row ? { ...area, row, rows: area.rows + area.row - row } : null;
}

function growLeft(area: Area, used: Area, by: number): Area | null {
  const column = Math.max(used.column, area.column - by);
  return column < area.column ? { ...area, column, columns: area.columns + area.column - column } : null;
}

/** The block of filled cells that a cell stands in, grown until every side is blank. */
export function filledRegion({ area, values }: Snapshot, cell: Area): Area | null {
  let top = cell.row - area.row, bottom = top, left = cell.column - area.column, right = left;
  const blank = (r: number, c: number): boolean => isBlank(values[r]?.[c]);
  const anyIn = (rows: readonly [number, number], columns: readonly [number, number]): boolean => {
    for (let r = rows[0]; r <= rows[1]; r++) for (let c = columns[0]; c <= columns[1]; c++) if (!blank(r, c)) return true;
    return false;
  };
  for (let grew = true; grew;) {
    grew = false;
    if (top > 0 && anyIn([top - 1, top - 1], [Math.max(0, left - 1), right + 1])) { top--; grew = true; }
    if (bottom < area.rows - 1 && anyIn([bottom + 1, bottom + 1], [Math.max(0, left - 1), right + 1])) { bottom++; grew = true; }
    if (left > 0 && anyIn([Math.max(0, top - 1), bottom + 1], [left - 1, left - 1])) { left--; grew = true; }
    if (right < area.columns - 1 && anyIn([Math.max(0, top - 1), bottom + 1], [right + 1, right + 1])) { right++; grew = true; }
  }
  if (top === bottom && left === right && blank(top, left)) return null;
  return { sheet: area.sheet, row: area.row + top, column: area.column + left, rows: bottom - top + 1, columns: right - left + 1 };
}
