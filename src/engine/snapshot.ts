import type { IBorderData, IBorderStyleData, ICellData, IStyleData, IWorkbookData, IWorksheetData } from "@univerjs/core";
import type { Book, BookCell, BookSheet, CellStyle } from "../workbook/file/book";

export const sheetId = (index: number): string => `sheet-${index}`;

/** Room around the used part, so that a user can go on typing; the engine knows no cells beyond what is declared. */
const SPARE = { rows: 200, columns: 20, leastRows: 1000, leastColumns: 30 } as const;

/** Characters to pixels as spreadsheets take them at their default font; points to pixels at 96 dots an inch. */
const pixelsOfWidth = (characters: number): number => Math.round(characters * 7 + 5);
const pixelsOfHeight = (points: number): number => Math.round(points * 96 / 72);

/** A book as the engine's workbook. What it cannot show (charts, pictures) stays in the file and is kept on saving. */
export function workbookData(book: Book, id: string): Partial<IWorkbookData> {
  return {
    id,
    name: "workbook",
    styles: Object.fromEntries(book.styles.map((style, i) => [`style-${i}`, engineStyle(style)])),
    sheetOrder: book.sheets.map((_, i) => sheetId(i)),
    sheets: Object.fromEntries(book.sheets.map((sheet, i) => [sheetId(i), sheetData(sheet, i)])),
  };
}

function sheetData(sheet: BookSheet, index: number): Partial<IWorksheetData> {
  const cellData: Record<number, Record<number, ICellData>> = {};
  for (const cell of sheet.cells) (cellData[cell.row] ??= {})[cell.column] = cellDataOf(cell);
  const rowData: Record<number, { h?: number; hd?: 0 | 1 }> = {}, columnData: Record<number, { w?: number; hd?: 0 | 1 }> = {};
  for (const [row, height] of sheet.heights) rowData[row] = { h: pixelsOfHeight(height) };
  for (const row of sheet.hiddenRows) rowData[row] = { ...rowData[row], hd: 1 };
  for (const [column, width] of sheet.widths) columnData[column] = { w: pixelsOfWidth(width) };
  for (const column of sheet.hiddenColumns) columnData[column] = { ...columnData[column], hd: 1 };
  const { rows, columns } = sheet.frozen;
  return {
    id: sheetId(index),
    name: sheet.name,
    hidden: sheet.hidden ? 1 : 0,
    cellData,
    rowCount: Math.max(SPARE.leastRows, sheet.rows + SPARE.rows),
    columnCount: Math.max(SPARE.leastColumns, sheet.columns + SPARE.columns),
    defaultColumnWidth: 72,
    defaultRowHeight: 22,
    mergeData: sheet.merges.map((merge) => ({ startRow: merge.row, endRow: merge.row + merge.rows - 1, startColumn: merge.column, endColumn: merge.column + merge.columns - 1 })),
    rowData,
    columnData,
    ...(rows || columns ? { freeze: { startRow: rows || -1, startColumn: columns || -1, xSplit: columns, ySplit: rows } } : {}),
  };
}

function cellDataOf({ value, error, formula, style }: BookCell): ICellData {
  const s = `style-${style}`;
  if (formula !== undefined) return { f: `=${formula}`, s };
  if (error !== undefined) return { v: error, t: 1, s };
  if (value === null) return { s };
  if (typeof value === "number") return { v: value, t: 2, s };
  if (typeof value === "boolean") return { v: value ? 1 : 0, t: 3, s };
  return { v: value, t: 1, s };
}

const HORIZONTAL = { left: 1, center: 2, right: 3 } as const;
const VERTICAL = { top: 1, center: 2, bottom: 3 } as const;
const WRAP = 3;
/** the engine's border styles by the names that .xlsx gives them */
const BORDER: Readonly<Record<string, number>> = { thin: 1, hair: 2, dotted: 3, dashed: 4, dashDot: 5, dashDotDot: 6, double: 7, medium: 8, mediumDashed: 9, mediumDashDot: 10, mediumDashDotDot: 11, slantDashDot: 12, thick: 13 };

function engineStyle(style: CellStyle): IStyleData {
  const borders: IBorderData = {};
  for (const [side, key] of [["top", "t"], ["right", "r"], ["bottom", "b"], ["left", "l"]] as const) {
    const border = style.borders?.[side];
    if (border) borders[key] = { s: BORDER[border.style] ?? 1, cl: { rgb: border.colour } } as IBorderStyleData;
  }
  return {
    ...(style.format !== "General" ? { n: { pattern: style.format } } : {}),
    ...(style.bold ? { bl: 1 } : {}),
    ...(style.italic ? { it: 1 } : {}),
    ...(style.underline ? { ul: { s: 1 } } : {}),
    ...(style.colour ? { cl: { rgb: style.colour } } : {}),
    ...(style.fill ? { bg: { rgb: style.fill } } : {}),
    ...(style.fontSize ? { fs: style.fontSize } : {}),
    ...(style.horizontal ? { ht: HORIZONTAL[style.horizontal] } : {}),
    ...(style.vertical ? { vt: VERTICAL[style.vertical] } : { vt: VERTICAL.center }),
    ...(style.wrap ? { tb: WRAP } : {}),
    ...(Object.keys(borders).length > 0 ? { bd: borders } : {}),
  } as IStyleData;
}
