import { cellName, columnNumber, parseRange, rangeName } from "../address";
import { BookRefusal, type CellPatch, type Rectangle } from "./book";
import { arrayXml, cellXml, formulaXml, type Result } from "./cell-xml";
import { callsOurs, moved, toStored } from "./formula-text";
import { escapeXml, unescapeXml } from "./xml";

const ROW = /<row\b([^>]*?)(\/>|>([\s\S]*?)<\/row>)/g;
const CELL = /<c\b([^>]*?)(?:\/>|>([\s\S]*?)<\/c>)/g;
const FORMULA = /<f\b([^>]*?)(?:\/>|>([\s\S]*?)<\/f>)/;
const attribute = (attributes: string, name: string): string | undefined => new RegExp(`(?:^|\\s)${name}="([^"]*)"`).exec(attributes)?.[1];

/** What one cell becomes. `formula` absent keeps the formula that stands there. */
interface Edit {
  readonly result: Result;
  readonly formula?: { readonly text: string; readonly range: string | undefined } | null;
  /** only the result of an array that stands there changes, and how far it fills */
  readonly range?: string | undefined;
}

interface Scan { readonly attributes: string; readonly body: string }

/** One cell as it stands, or undefined. */
type Lookup = (row: number, column: number) => Scan | undefined;

function scan(sheetData: string): Map<number, Map<number, Scan>> {
  const rows = new Map<number, Map<number, Scan>>();
  let row = -1;
  for (const match of sheetData.matchAll(ROW)) {
    row = Number(attribute(match[1]!, "r") ?? row + 2) - 1;
    const cells = new Map<number, Scan>();
    let column = -1;
    for (const cell of (match[3] ?? "").matchAll(CELL)) {
      const reference = attribute(cell[1]!, "r");
      column = reference ? columnNumber(reference.replace(/\d+$/, "")) : column + 1;
      cells.set(column, { attributes: cell[1]!, body: cell[2] ?? "" });
    }
    rows.set(row, cells);
  }
  return rows;
}

/**
 * The sheet's XML with some cells changed and every other character as it was.
 * @throws BookRefusal where a change would break what the file holds (a part of an old array formula), or the XML is of a kind that is not patched
 */
export function patchCells(part: string, xml: string, patches: readonly CellPatch[], metadataIndex: () => number): string {
  if (patches.length === 0) return xml;
  const empty = /<sheetData\s*\/>/.exec(xml), open = empty ? undefined : /<sheetData[^>]*>/.exec(xml), close = xml.indexOf("</sheetData>");
  if (!empty && (!open || close < 0)) throw new BookRefusal("cannot-change", `the part ${part} is written in a way that cannot be changed safely (its cells carry a prefix). Save a copy with another spreadsheet program first.`);
  const before = xml.slice(0, empty ? empty.index : open!.index + open![0].length), data = empty ? "" : xml.slice(before.length, close), after = empty ? xml.slice(empty.index + empty[0].length) : xml.slice(close);
  if (/<!--|<!\[CDATA\[/.test(data)) throw new BookRefusal("cannot-change", `the part ${part} holds comments among its cells and cannot be changed safely. Save a copy with another spreadsheet program first.`);

  const rows = scan(data);
  const lookup: Lookup = (row, column) => rows.get(row)?.get(column);
  const edits = editsOf(patches, rows, lookup);
  const written = writeRows(data, edits, lookup, metadataIndex);
  const body = empty ? `${before}<sheetData>${written}</sheetData>${after}` : before + written + after;
  return widenDimension(body, edits);
}

function editsOf(patches: readonly CellPatch[], rows: ReadonlyMap<number, ReadonlyMap<number, Scan>>, lookup: Lookup): Map<number, Map<number, Edit>> {
  const edits = new Map<number, Map<number, Edit>>();
  const set = (row: number, column: number, edit: Edit): void => {
    const line = edits.get(row) ?? new Map<number, Edit>();
    edits.set(row, line.set(column, edit));
  };
  const named = new Set(patches.map(({ row, column }) => `${row}/${column}`));
  const resultOf = ({ value, error }: Pick<CellPatch, "value" | "error">): Result => error === undefined ? value : { error };

  // what an array had filled is emptied first; what it fills now is written over that
  for (const { row, column } of patches) {
    const range = arrayRange(lookup(row, column));
    if (!range) continue;
    eachCell(range, (r, c) => { if (!(r === row && c === column) && !named.has(`${r}/${c}`) && lookup(r, c)) set(r, c, { result: null }); });
  }
  refuseOldArrays(patches, rows);
  expandShared(patches, rows, set);

  for (const patch of patches) {
    const { row, column, kind, formula, fills } = patch;
    const range = fills ? rangeName({ row, column, rows: fills.rows, columns: fills.columns }) : undefined;
    if (kind === "constant") set(row, column, { result: resultOf(patch), formula: null });
    else if (kind === "formula") set(row, column, { result: resultOf(patch), formula: { text: formula!, range: range ?? (callsOurs(formula!) ? cellName(row, column) : undefined) } });
    else set(row, column, { result: resultOf(patch), range: arrayRange(lookup(row, column)) ? range ?? cellName(row, column) : range });
    fills?.results.forEach((line, r) => line.forEach((result, c) => { if (r > 0 || c > 0) set(row + r, column + c, { result, formula: null }); }));
  }
  return edits;
}

function eachCell({ row, column, rows, columns }: Rectangle, visit: (row: number, column: number) => void): void {
  for (let r = row; r < row + rows; r++) for (let c = column; c < column + columns; c++) visit(r, c);
}

function arrayRange(cell: Scan | undefined): Rectangle | undefined {
  const formula = cell && FORMULA.exec(cell.body);
  return formula && attribute(formula[1]!, "t") === "array" ? parseRange(attribute(formula[1]!, "ref") ?? "") : undefined;
}

/** An array formula of the old kind is one piece: a cell of it cannot change alone. */
function refuseOldArrays(patches: readonly CellPatch[], rows: ReadonlyMap<number, ReadonlyMap<number, Scan>>): void {
  const changed = patches.filter(({ kind }) => kind !== "result");
  if (changed.length === 0) return;
  for (const [row, cells] of rows) for (const [column, cell] of cells) {
    if (!cell.body.includes('t="array"')) continue;
    const range = arrayRange(cell);
    if (!range || range.rows * range.columns === 1 || attribute(cell.attributes, "cm")) continue;
    const hit = changed.find((one) => !(one.row === row && one.column === column) && one.row >= range.row && one.row < range.row + range.rows && one.column >= range.column && one.column < range.column + range.columns);
    if (hit) throw new BookRefusal("cannot-change", `${cellName(hit.row, hit.column)} is part of the array formula in ${rangeName(range)}, which changes only as a whole.`);
  }
}

/** A shared formula stands in full in its first cell only. Before that cell changes, its followers are given their own text. */
function expandShared(patches: readonly CellPatch[], rows: ReadonlyMap<number, ReadonlyMap<number, Scan>>, set: (row: number, column: number, edit: Edit) => void): void {
  const masters = new Map<string, { row: number; column: number; text: string }>();
  for (const { row, column, kind } of patches) {
    const formula = kind === "result" ? undefined : FORMULA.exec(rows.get(row)?.get(column)?.body ?? "");
    if (formula && attribute(formula[1]!, "t") === "shared" && formula[2]) masters.set(attribute(formula[1]!, "si") ?? "", { row, column, text: unescapeXml(formula[2]) });
  }
  if (masters.size === 0) return;
  for (const [row, cells] of rows) for (const [column, { body }] of cells) {
    const formula = FORMULA.exec(body);
    if (!formula || attribute(formula[1]!, "t") !== "shared" || formula[2]) continue;
    const master = masters.get(attribute(formula[1]!, "si") ?? "");
    if (master) set(row, column, { result: KEEP, formula: { text: moved(master.text, row - master.row, column - master.column), range: STORED } });
  }
}

/** stands for the result that is there */
const KEEP: Result = { error: "\u0000keep" };
/** stands for a text that is in its stored form already */
const STORED = "\u0000stored";

function writeRows(data: string, edits: ReadonlyMap<number, ReadonlyMap<number, Edit>>, lookup: Lookup, metadataIndex: () => number): string {
  const pending = [...edits.keys()].sort((a, b) => a - b);
  let out = "", at = 0, row = -1;
  const newRow = (index: number): string => {
    const cells = [...edits.get(index)!].sort(([a], [b]) => a - b).map(([column, edit]) => write(index, column, edit, undefined, metadataIndex)).join("");
    return cells ? `<row r="${index + 1}">${cells}</row>` : "";
  };
  for (const match of data.matchAll(ROW)) {
    row = Number(attribute(match[1]!, "r") ?? row + 2) - 1;
    out += data.slice(at, match.index);
    while (pending.length > 0 && pending[0]! < row) out += newRow(pending.shift()!);
    if (pending[0] === row) {
      pending.shift();
      out += rowXml(row, match[1]!, match[3] ?? "", edits.get(row)!, lookup, metadataIndex);
    } else {
      out += match[0];
    }
    at = match.index + match[0].length;
  }
  out += data.slice(at);
  return out + pending.map(newRow).join("");
}

function rowXml(row: number, attributes: string, inner: string, edits: ReadonlyMap<number, Edit>, lookup: Lookup, metadataIndex: () => number): string {
  const pending = [...edits].sort(([a], [b]) => a - b);
  let out = "", at = 0, column = -1;
  for (const match of inner.matchAll(CELL)) {
    const reference = attribute(match[1]!, "r");
    column = reference ? columnNumber(reference.replace(/\d+$/, "")) : column + 1;
    out += inner.slice(at, match.index);
    while (pending.length > 0 && pending[0]![0] < column) {
      const [c, edit] = pending.shift()!;
      out += write(row, c, edit, undefined, metadataIndex);
    }
    out += pending[0]?.[0] === column ? write(row, column, pending.shift()![1], lookup(row, column), metadataIndex) : match[0];
    at = match.index + match[0].length;
  }
  out += inner.slice(at) + pending.map(([c, edit]) => write(row, c, edit, undefined, metadataIndex)).join("");
  const spans = attribute(attributes, "spans");
  const [from = 1, to = 1] = (spans ?? "").split(":").map(Number);
  const least = Math.min(from, ...[...edits.keys()].map((c) => c + 1)), most = Math.max(to, ...[...edits.keys()].map((c) => c + 1));
  const head = spans ? attributes.replace(/spans="[^"]*"/, `spans="${least}:${most}"`) : attributes;
  return out === "" ? `<row${head}/>` : `<row${head}>${out}</row>`;
}

function write(row: number, column: number, edit: Edit, old: Scan | undefined, metadataIndex: () => number): string {
  const reference = cellName(row, column), style = old && attribute(old.attributes, "s");
  if (edit.result === KEEP && old && edit.formula) return `<c${old.attributes}>${old.body.replace(FORMULA, () => formulaXml(edit.formula!.text))}</c>`;
  if (edit.formula) {
    const { text, range } = edit.formula, stored = range === STORED ? text : toStored(text);
    return cellXml(reference, style, edit.result, range && range !== STORED ? { xml: arrayXml(stored, range), metadata: metadataIndex() } : { xml: formulaXml(stored) });
  }
  if (edit.formula === null || !old) return old || edit.result !== null ? cellXml(reference, style, edit.result) : "";
  const formula = FORMULA.exec(old.body);
  if (!formula) return cellXml(reference, style, edit.result);
  const metadata = attribute(old.attributes, "cm");
  const xml = edit.range ? formula[0].replace(/ref="[^"]*"/, `ref="${escapeXml(edit.range)}"`) : formula[0];
  return cellXml(reference, style, edit.result, { xml, metadata: metadata ? Number(metadata) : undefined });
}

function widenDimension(xml: string, edits: ReadonlyMap<number, ReadonlyMap<number, Edit>>): string {
  return xml.replace(/<dimension ref="([^"]*)"/, (whole, ref: string) => {
    const old = parseRange(ref);
    if (!old) return whole;
    let bottom = old.row + old.rows, right = old.column + old.columns, top = old.row, left = old.column;
    for (const [row, cells] of edits) for (const [column, { result, formula }] of cells) {
      if (result === null && !formula) continue;
      top = Math.min(top, row);
      left = Math.min(left, column);
      bottom = Math.max(bottom, row + 1);
      right = Math.max(right, column + 1);
    }
    return `<dimension ref="${rangeName({ row: top, column: left, rows: bottom - top, columns: right - left })}"`;
  });
}
