import { parseRange } from "../address";
import { markKindOf, SIGNATURE } from "../port";
import { BookRefusal, type BookCell, type BookMark, type BookNote, type BookSheet, type Rectangle } from "./book";
import { fromStored, moved } from "./formula-text";
import { MOST_COLUMNS, MOST_ROWS } from "./limits";
import type { Package } from "./package";
import { linksOf } from "./relations";
import { decodeText, readXml } from "./xml";

/** What a sheet's reader needs from elsewhere in the file. */
export interface Surroundings {
  readonly name: string;
  readonly part: string;
  readonly hidden: boolean;
  readonly strings: readonly string[];
  /** counts cells over all sheets, so that the limit is the workbook's */
  readonly count: { cells: number };
}

/** Columns wider than this many are a whole-sheet format, not columns that someone set. */
const SET_COLUMNS = 256;

export function readSheet(pack: Package, { name, part, hidden, strings, count }: Surroundings): BookSheet {
  const cells: BookCell[] = [], merges: Rectangle[] = [], marks: BookMark[] = [], hiddenRows: number[] = [], hiddenColumns: number[] = [];
  const widths = new Map<number, number>(), heights = new Map<number, number>();
  const masters = new Map<string, { row: number; column: number; text: string }>();
  const arrays: { row: number; column: number; range: Rectangle }[] = [];
  const frozen = { rows: 0, columns: 0 };
  let phonetic = 0;
  let isProtected = false, rows = 0, columns = 0, row = -1, column = -1, collecting: "v" | "f" | "t" | "rule" | undefined, text = "";
  let cell: { type: string; style: number; dynamic: boolean; value: string | undefined; formula: { text: string; type: string; ref: string; group: string } | undefined } | undefined;
  let markRanges: Rectangle[] = [];

  const rectangle = (ref: string): Rectangle => {
    const found = parseRange(ref);
    if (!found || found.row + found.rows > MOST_ROWS || found.column + found.columns > MOST_COLUMNS) throw new BookRefusal("damaged", `the sheet "${name}" names cells that no sheet has (${ref.slice(0, 20)}).`);
    return found;
  };

  readXml(part, pack.text(part), pack.depth, {
    open(tag, at) {
      switch (tag) {
        case "row": {
          row = at.r === undefined ? row + 1 : Number(at.r) - 1;
          column = -1;
          if (!(row >= 0 && row < MOST_ROWS)) throw new BookRefusal("damaged", `the sheet "${name}" has a row number that no sheet has.`);
          if (at.hidden === "1" || at.hidden === "true") hiddenRows.push(row);
          if (at.ht !== undefined && at.customHeight !== undefined) heights.set(row, Number(at.ht));
          break;
        }
        case "c": {
          if (++count.cells > pack.mostCells) throw new BookRefusal("too-large", `it holds more than ${pack.mostCells.toLocaleString("en")} cells. Save a smaller copy with the sheets you need.`);
          if (at.r === undefined) column++;
          else {
            const place = rectangle(at.r);
            row = place.row;
            column = place.column;
          }
          cell = { type: at.t ?? "n", style: Number(at.s ?? 0), dynamic: at.cm !== undefined, value: undefined, formula: undefined };
          break;
        }
        case "rPh": phonetic++; break;
        case "v": case "t":
          if (cell && phonetic === 0) { collecting = tag; text = ""; }
          break;
        case "f":
          if (cell) { collecting = "f"; text = ""; cell.formula = { text: "", type: at.t ?? "normal", ref: at.ref ?? "", group: at.si ?? "" }; }
          break;
        case "formula":
          collecting = "rule";
          text = "";
          break;
        case "conditionalFormatting": markRanges = (at.sqref ?? "").split(" ").filter(Boolean).flatMap((ref) => parseRange(ref) ?? []); break;
        case "mergeCell": merges.push(rectangle(at.ref ?? "")); break;
        case "sheetProtection": isProtected = at.sheet === "1" || at.sheet === "true"; break;
        case "pane":
          if (at.state === "frozen" || at.state === "frozenSplit") { frozen.rows = Number(at.ySplit ?? 0); frozen.columns = Number(at.xSplit ?? 0); }
          break;
        case "col": {
          const from = Number(at.min) - 1, to = Math.min(Number(at.max) - 1, from + SET_COLUMNS);
          for (let c = from; c <= to; c++) {
            if (at.width !== undefined) widths.set(c, Number(at.width));
            if (at.hidden === "1" || at.hidden === "true") hiddenColumns.push(c);
          }
          break;
        }
      }
    },
    text(more) { if (collecting) text += more; },
    close(tag) {
      if (tag === "rPh") phonetic--;
      if (phonetic > 0) return;
      if (tag === "f" && cell?.formula) cell.formula.text = text;
      else if (tag === "v" && cell) cell.value = text;
      else if (tag === "t" && cell) cell.value = (cell.value ?? "") + text;
      else if (tag === "formula") {
        const kind = markKindOf(text);
        if (kind) marks.push({ kind, ranges: markRanges });
      } else if (tag === "c" && cell) {
        take(cell);
        cell = undefined;
      }
      if (["f", "v", "t", "formula"].includes(tag)) collecting = undefined;
    },
  });

  function take({ type, style, dynamic, value, formula }: NonNullable<typeof cell>): void {
    rows = Math.max(rows, row + 1);
    columns = Math.max(columns, column + 1);
    const base = { row, column, style, ...valueOf(type, value) };
    if (!formula || formula.type === "dataTable") {
      // a blank cell is worth keeping for its format alone
      if (base.value !== null || base.error !== undefined || style !== 0) cells.push(base);
      return;
    }
    let { text: stored } = formula;
    if (formula.type === "shared") {
      if (stored !== "") masters.set(formula.group, { row, column, text: stored });
      else {
        const master = masters.get(formula.group);
        if (!master) { cells.push(base); return; }
        stored = moved(master.text, row - master.row, column - master.column);
      }
    }
    if (formula.type === "array") {
      const range = rectangle(formula.ref);
      arrays.push({ row, column, range });
      cells.push({ ...base, formula: fromStored(stored), fills: { rows: range.rows, columns: range.columns, dynamic } });
      return;
    }
    cells.push({ ...base, formula: fromStored(stored) });
  }

  function valueOf(type: string, value: string | undefined): { value: BookCell["value"]; error?: string } {
    if (value === undefined) return { value: null };
    switch (type) {
      case "s": return { value: strings[Number(value)] ?? "" };
      case "b": return { value: value === "1" || value === "true" };
      case "e": return { value: null, error: value };
      case "str": case "inlineStr": return { value: decodeText(value) };
      case "d": return { value };
      default: {
        const number = Number(value);
        return value.trim() === "" || !Number.isFinite(number) ? { value: value.trim() === "" ? null : value } : { value: number };
      }
    }
  }

  const caches = filledBy(arrays);
  const kept = arrays.length === 0 ? cells : cells.flatMap((one): BookCell[] =>
    one.formula !== undefined || !caches(one.row, one.column) ? [one] : one.style !== 0 ? [{ row: one.row, column: one.column, value: null, style: one.style }] : []);

  return { name, part, hidden, protected: isProtected, cells: kept, rows, columns, merges, hiddenRows, hiddenColumns, widths, heights, frozen, notes: readNotes(pack, part), marks };
}

/** Arrays up to this many cells are looked up cell by cell, larger ones by their bounds. */
const SMALL_ARRAY = 10_000;

/** Tells what arrays have filled: that is their cache, not a reading. */
function filledBy(arrays: readonly { range: Rectangle }[]): (row: number, column: number) => boolean {
  const small = new Set<number>(), large: Rectangle[] = [];
  for (const { range } of arrays) {
    const size = range.rows * range.columns;
    if (size === 1) continue;
    if (size > SMALL_ARRAY) large.push(range);
    else for (let r = range.row; r < range.row + range.rows; r++) for (let c = range.column; c < range.column + range.columns; c++) small.add(r * MOST_COLUMNS + c);
  }
  return (row, column) => small.has(row * MOST_COLUMNS + column) || large.some((range) => row >= range.row && row < range.row + range.rows && column >= range.column && column < range.column + range.columns);
}

/** Notes of a sheet (legacy comments), ours told by how they begin. */
function readNotes(pack: Package, sheetPart: string): BookNote[] {
  const notes: BookNote[] = [];
  for (const { type, target } of linksOf(pack, sheetPart)) {
    if (type !== "comments" || !pack.has(target)) continue;
    let at: Rectangle | undefined, text = "", inText = false, phonetic = 0;
    readXml(target, pack.text(target), pack.depth, {
      open(tag, { ref = "" }) {
        if (tag === "comment") { at = parseRange(ref); text = ""; }
        if (tag === "rPh") phonetic++;
        if (tag === "t") inText = phonetic === 0;
      },
      close(tag) {
        if (tag === "t") inText = false;
        if (tag === "rPh") phonetic--;
        if (tag === "comment" && at) notes.push({ row: at.row, column: at.column, text: decodeText(text), ours: text.startsWith(SIGNATURE) });
      },
      text(more) { if (inText) text += more; },
    });
  }
  return notes;
}
