import { CellError, type Cell, type ErrorCode } from "../../worksheet/cell";
import { areaName, cellName, overlap } from "../address";
import { markFormula, markKindOf, SIGNATURE, type Area, type Content, type Done, type Mark, type MarkKind, type Placement, type PortEvent, type SheetInfo, type Snapshot, type WorkbookPort } from "../port";
import { againstWriting, noSheet, refused, spills, targetsOf } from "../consent";
import { inPieces, MOST_PIECES, pieceName } from "../pieces";
import { refusalOf } from "./refusals";

const MOST_CELLS = 200_000;
const SETTING = "Tampsheet.";
const piecesOf = (context: Excel.RequestContext, key: string): Excel.CustomProperty[] =>
  Array.from({ length: MOST_PIECES }, (_, i) => context.workbook.properties.custom.getItemOrNullObject(pieceName(SETTING + key, i + 1)));

const LOOKS: Readonly<Record<MarkKind, { readonly fill: string; readonly ink: string }>> = {
  "past-line": { fill: "#FFD9CC", ink: "#7A1F05" },
  doubtful: { fill: "#FFEEC2", ink: "#5E4300" },
  ask: { fill: "#DCEBFA", ink: "#123F66" },
};

const done = <T>(value: T): Done<T> => ({ ok: true, value });
const supports = (version: string): boolean => Office.context.requirements.isSetSupported("ExcelApi", version);

/** The workbook port on the office host's own interface. Every method is one batch, with as few round trips as its answers need. */
export function officePort(): WorkbookPort {
  return {
    abilities: async () => ({ marks: supports("1.6"), notes: supports("1.18"), spills: supports("1.12") }),
    sheets: () => Excel.run(listSheets),
    selection: () => Excel.run(readSelection),
    read: (area) => attempt([area], (context) => readArea(context, area)),
    write: (what, over) => attempt(what.map(placeOf), (context) => writeAll(context, what, over)),
    mark: (marks) => attempt(marks.map(({ area }) => area), (context) => markAll(context, marks)),
    unmark: (sheet) => attempt([], (context) => unmarkSheets(context, sheet)),
    goTo: (area) => attempt([area], (context) => goTo(context, area)),
    recall: (key) => Excel.run(async (context) => {
      const pieces = piecesOf(context, key);
      for (const property of pieces) property.load("value");
      await context.sync();
      const end = pieces.findIndex((property) => property.isNullObject);
      return end === 0 ? null : pieces.slice(0, end < 0 ? undefined : end).map(({ value }) => String(value)).join("");
    }),
    remember: (key, value) => Excel.run(async (context) => {
      const pieces = piecesOf(context, key), texts = value === null ? [] : inPieces(value);
      if (texts.length > MOST_PIECES) throw new Error(`a setting of ${value!.length} characters is too long to travel in the workbook`);
      for (const property of pieces.slice(texts.length)) property.load("key");
      await context.sync();
      // adding under a name that is there replaces its value
      texts.forEach((text, i) => context.workbook.properties.custom.add(pieceName(SETTING + key, i + 1), text));
      for (const property of pieces.slice(texts.length)) if (!property.isNullObject) property.delete();
      await context.sync();
    }),
    on: listen,
  };
}

async function attempt<T>(where: readonly Area[], batch: (context: Excel.RequestContext) => Promise<Done<T>>): Promise<Done<T>> {
  try {
    return await Excel.run(batch);
  } catch (error) {
    return refusalOf(error, where);
  }
}

async function listSheets(context: Excel.RequestContext): Promise<SheetInfo[]> {
  const sheets = context.workbook.worksheets;
  sheets.load("items/name,items/visibility");
  await context.sync();
  const found = sheets.items.map((sheet) => {
    const used = sheet.getUsedRangeOrNullObject(true);
    used.load("rowIndex,columnIndex,rowCount,columnCount");
    sheet.protection.load("protected");
    return { sheet, used };
  });
  await context.sync();
  return found.map(({ sheet, used }) => ({
    name: sheet.name,
    used: used.isNullObject ? null : { sheet: sheet.name, row: used.rowIndex, column: used.columnIndex, rows: used.rowCount, columns: used.columnCount },
    hidden: sheet.visibility !== "Visible",
    protected: sheet.protection.protected,
  }));
}

/** What the host says where something other than cells is selected. */
const NO_CELLS: ReadonlySet<string> = new Set(["InvalidSelection", "ItemNotFound", "InvalidArgument"]);

async function readSelection(context: Excel.RequestContext): Promise<Area | null> {
  // asking for one range fails where several are selected
  const range = supports("1.9") ? context.workbook.getSelectedRanges().areas.getItemAt(0) : context.workbook.getSelectedRange();
  range.load("rowIndex,columnIndex,rowCount,columnCount");
  range.worksheet.load("name");
  try {
    await context.sync();
  } catch (error) {
    // a chart or a shape is selected, which is no failure
    if (NO_CELLS.has(String((error as { code?: unknown }).code))) return null;
    throw error;
  }
  return { sheet: range.worksheet.name, row: range.rowIndex, column: range.columnIndex, rows: range.rowCount, columns: range.columnCount };
}

async function readArea(context: Excel.RequestContext, area: Area): Promise<Done<Snapshot>> {
  const sheet = context.workbook.worksheets.getItemOrNullObject(area.sheet);
  sheet.load("name");
  const used = sheet.getUsedRangeOrNullObject(true);
  used.load("rowIndex,columnIndex,rowCount,columnCount");
  await context.sync();
  if (sheet.isNullObject) return noSheet(area);
  // a whole column means its used part; the rest is blank and is not fetched
  const bottom = used.isNullObject ? 0 : used.rowIndex + used.rowCount, right = used.isNullObject ? 0 : used.columnIndex + used.columnCount;
  const rows = Math.max(1, Math.min(area.rows, bottom - area.row)), columns = Math.max(1, Math.min(area.columns, right - area.column));
  if (rows * columns > MOST_CELLS) return refused("too-large", [area], `${areaName(area)} has more than ${MOST_CELLS.toLocaleString("en")} cells: select fewer.`);
  const range = sheet.getRangeByIndexes(area.row, area.column, rows, columns);
  const spillable = supports("1.12");
  range.load(`values,formulas,numberFormat,text,valueTypes${spillable ? ",hasSpill" : ""}`);
  await context.sync();
  const types = range.valueTypes as string[][];
  const filled = spillable && range.hasSpill !== false ? await filledByOthers(context, sheet, { ...area, rows, columns }, range.formulas as unknown[][]) : new Set<string>();
  return done({
    area: { ...area, rows, columns },
    values: (range.values as unknown[][]).map((row, r) => row.map((value, c) => cellOf(value, types[r]![c]!))),
    formulas: (range.formulas as unknown[][]).map((row, r) => row.map((formula, c) => isFormula(formula) && !filled.has(`${r}/${c}`) ? formula : null)),
    formats: (range.numberFormat as unknown[][]).map((row) => row.map((format) => String(format || "General"))),
    texts: range.text,
  });
}

const isFormula = (formula: unknown): formula is string => typeof formula === "string" && formula.startsWith("=");

/** Above this many formulas, asking for each one's spill would cost more than it tells. */
const MOST_ASKED = 2000;

/** Cells that repeat the formula of the cell which fills them. The host is asked for each; in a great block, equal neighbours are taken so. */
async function filledByOthers(context: Excel.RequestContext, sheet: Excel.Worksheet, area: Area, formulas: readonly (readonly unknown[])[]): Promise<Set<string>> {
  const cells = formulas.flatMap((row, r) => row.flatMap((formula, c) => isFormula(formula) ? [{ r, c, formula }] : []));
  if (cells.length > MOST_ASKED) return new Set(cells.filter(({ r, c, formula }) => formulas[r - 1]?.[c] === formula || formulas[r]![c - 1] === formula).map(({ r, c }) => `${r}/${c}`));
  const asked = cells.map(({ r, c }) => {
    const parent = sheet.getRangeByIndexes(area.row + r, area.column + c, 1, 1).getSpillParentOrNullObject();
    parent.load("rowIndex,columnIndex");
    return { r, c, parent };
  });
  await context.sync();
  return new Set(asked.filter(({ r, c, parent }) => !parent.isNullObject && (parent.rowIndex !== area.row + r || parent.columnIndex !== area.column + c)).map(({ r, c }) => `${r}/${c}`));
}

function cellOf(value: unknown, type: string): Cell {
  if (type === "Empty" || value === "") return null;
  if (type === "Error") return new CellError(String(value) as ErrorCode, "");
  return value as Cell;
}

const placeOf = ({ sheet, row, column, cells }: Placement): Area => ({ sheet, row, column, rows: cells.length, columns: Math.max(0, ...cells.map((row) => row.length)) });

/** A content as the host's `formulas` take it. */
function hostContent(content: Content): string | number | boolean {
  if ("formula" in content) return content.formula.startsWith("=") ? content.formula : `=${content.formula}`;
  if (content.value instanceof CellError) return content.value.code;
  // a text that begins like a formula is kept a text
  return typeof content.value === "string" && /^[=+\-@]/.test(content.value) ? `'${content.value}` : content.value ?? "";
}

async function writeAll(context: Excel.RequestContext, what: readonly Placement[], over: readonly Area[]): Promise<Done<{ written: readonly Area[] }>> {
  const targets = targetsOf(what);
  const sheets = new Map([...new Set(targets.map(({ at }) => at.sheet))].map((name) => {
    const sheet = context.workbook.worksheets.getItemOrNullObject(name);
    sheet.load("name");
    return [name, sheet] as const;
  }));
  await context.sync();
  for (const { reach } of targets) if (sheets.get(reach.sheet)!.isNullObject) return noSheet(reach);

  const looked = targets.map((target) => {
    const { row, column, rows, columns } = target.reach, sheet = sheets.get(target.at.sheet)!;
    const range = sheet.getRangeByIndexes(row, column, rows, columns);
    range.load("formulas");
    sheet.protection.load("protected");
    const tables = range.getTables(false).getCount();
    const merged = supports("1.13") ? range.getMergedAreasOrNullObject() : undefined;
    merged?.load("address");
    return { target, range, tables, merged, sheet };
  });
  await context.sync();

  // what each target's own range answered stands for the sheet: one round trip for all of them
  const answered = (cell: Area) => looked.find(({ target }) => overlap(target.reach, cell))!;
  const against = againstWriting(targets, over, {
    has: () => true,
    isProtected: (sheet) => sheets.get(sheet)!.protection.protected,
    size: () => ({ rows: 1_048_576, columns: 16_384 }),
    merges: (sheet) => looked.filter(({ target, merged }) => target.at.sheet === sheet && merged && !merged.isNullObject).map(({ target }) => target.reach),
    tables: (sheet) => looked.filter(({ target, tables }) => target.at.sheet === sheet && tables.value > 0).map(({ target }) => target.reach),
    isFilled: (cell) => {
      const { target: { reach }, range } = answered(cell);
      return (range.formulas as unknown[][])[cell.row - reach.row]![cell.column - reach.column] !== "";
    },
  });
  if (against) return against;

  for (const { target, range, sheet } of looked) {
    // a spill goes only into empty cells; what the user agreed to lose is cleared, its formats kept
    if (spills(target)) range.clear("Contents");
    sheet.getRangeByIndexes(target.at.row, target.at.column, 1, 1).formulas = [[hostContent(target.content)]];
  }
  await context.sync();
  return done({ written: targets.map(({ reach }) => reach) });
}

async function markAll(context: Excel.RequestContext, marks: readonly Mark[]): Promise<Done<{ notesLeftOut: readonly Area[] }>> {
  const sheets = new Map<string, Excel.Worksheet>();
  for (const { area } of marks) {
    if (sheets.has(area.sheet)) continue;
    const sheet = context.workbook.worksheets.getItemOrNullObject(area.sheet);
    sheet.load("name");
    sheets.set(area.sheet, sheet);
  }
  await context.sync();
  for (const { area } of marks) if (sheets.get(area.sheet)!.isNullObject) return noSheet(area);

  const withNotes = supports("1.18");
  const rangeOf = ({ sheet, row, column, rows, columns }: Area): Excel.Range => sheets.get(sheet)!.getRangeByIndexes(row, column, rows, columns);
  const notes = marks.map(({ area, note }) => {
    if (!withNotes || !note) return undefined;
    const existing = sheets.get(area.sheet)!.notes.getItemOrNullObject(cellName(area.row, area.column));
    existing.load("content");
    return existing;
  });
  const formats = marks.map(({ area }) => {
    const there = rangeOf(area).conditionalFormats;
    there.load("items/type");
    return there;
  });
  await context.sync();
  const rules = formats.map(({ items }) => items.filter(({ type }) => type === "Custom").map((format) => {
    format.custom.rule.load("formula");
    return format.custom.rule;
  }));
  await context.sync();
  for (const [i, { area, kind }] of marks.entries()) {
    // marking twice is marking once
    if (rules[i]!.some(({ formula }) => markKindOf(formula) === kind)) continue;
    const format = rangeOf(area).conditionalFormats.add("Custom");
    format.custom.rule.formula = `=${markFormula(kind)}`;
    format.custom.format.fill.color = LOOKS[kind].fill;
    format.custom.format.font.color = LOOKS[kind].ink;
    format.stopIfTrue = false;
  }
  await context.sync();

  const notesLeftOut: Area[] = [];
  marks.forEach(({ area, note }, i) => {
    const existing = notes[i];
    if (!existing || !note) return;
    const text = note.startsWith(SIGNATURE) ? note : `${SIGNATURE}: ${note}`;
    if (existing.isNullObject) sheets.get(area.sheet)!.notes.add(cellName(area.row, area.column), text);
    else if (existing.content.startsWith(SIGNATURE)) existing.content = text;
    else notesLeftOut.push({ ...area, rows: 1, columns: 1 });
  });
  await context.sync();
  return done({ notesLeftOut });
}

async function unmarkSheets(context: Excel.RequestContext, only: string | null): Promise<Done<{ removed: number }>> {
  const sheets = context.workbook.worksheets;
  sheets.load("items/name");
  await context.sync();
  const wanted = sheets.items.filter(({ name }) => only === null || name === only);
  if (only !== null && wanted.length === 0) return noSheet({ sheet: only, row: 0, column: 0, rows: 1, columns: 1 });
  const withNotes = supports("1.18");
  const found = wanted.map((sheet) => {
    const formats = sheet.getRange().conditionalFormats;
    formats.load("items/type");
    if (withNotes) sheet.notes.load("items/content");
    return { sheet, formats };
  });
  await context.sync();
  const custom = found.flatMap(({ formats }) => formats.items.filter(({ type }) => type === "Custom"));
  for (const format of custom) format.custom.rule.load("formula");
  await context.sync();
  const ours = custom.filter((format) => markKindOf(format.custom.rule.formula) !== undefined);
  for (const format of ours) format.delete();
  if (withNotes) for (const { sheet } of found) for (const note of sheet.notes.items) if (note.content.startsWith(SIGNATURE)) note.delete();
  await context.sync();
  return done({ removed: ours.length });
}

async function goTo(context: Excel.RequestContext, area: Area): Promise<Done> {
  const sheet = context.workbook.worksheets.getItemOrNullObject(area.sheet);
  sheet.load("name");
  await context.sync();
  if (sheet.isNullObject) return noSheet(area);
  sheet.activate();
  sheet.getRangeByIndexes(area.row, area.column, area.rows, area.columns).select();
  await context.sync();
  return done(undefined);
}

/** Listens until the returned function is called. A change is an edit or a recalculation; the area of the latter is its sheet's first cell. */
function listen(event: PortEvent, hear: (area: Area) => void): () => void {
  let stopped = false;
  const added = Excel.run(async (context) => {
    const results: OfficeExtension.EventHandlerResult<never>[] = [];
    if (event === "selection") {
      results.push(context.workbook.onSelectionChanged.add(async () => {
        const area = await Excel.run(readSelection);
        if (area && !stopped) hear(area);
      }) as OfficeExtension.EventHandlerResult<never>);
    } else {
      const sheets = context.workbook.worksheets;
      const changed = async ({ worksheetId }: { worksheetId: string }): Promise<void> => {
        const sheet = await Excel.run(async (inner) => {
          const found = inner.workbook.worksheets.getItemOrNullObject(worksheetId);
          found.load("name");
          await inner.sync();
          return found.isNullObject ? undefined : found.name;
        });
        if (sheet !== undefined && !stopped) hear({ sheet, row: 0, column: 0, rows: 1, columns: 1 });
      };
      if (supports("1.9")) results.push(sheets.onChanged.add(changed) as OfficeExtension.EventHandlerResult<never>);
      if (supports("1.8")) results.push(sheets.onCalculated.add(changed) as OfficeExtension.EventHandlerResult<never>);
    }
    await context.sync();
    return results;
  });
  return () => {
    stopped = true;
    void added.then((results) => {
      const first = results[0];
      // a handler is taken off in the context that put it on
      if (first) return Excel.run(first.context as Excel.RequestContext, async (context) => {
        for (const result of results) result.remove();
        await context.sync();
      });
      return undefined;
    });
  };
}
