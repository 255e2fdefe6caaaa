import { cellName, columnName } from "../address";
import type { CellStyle } from "./book";
import { cellXml } from "./cell-xml";
import { Package } from "./package";
import { TYPES } from "./relations";
import { escapeXml } from "./xml";

/** A workbook to be made from nothing: constants and formats. Formulas are written into it by `patchBook`, with their results. */
export interface NewBook<Style extends string> {
  readonly title: string;
  readonly styles: Readonly<Record<Style, CellStyle>>;
  readonly sheets: readonly {
    readonly name: string;
    /** column widths in characters, from the first column on */
    readonly widths: readonly number[];
    /** row heights in points, where they are not the default */
    readonly heights?: ReadonlyMap<number, number>;
    readonly frozenRows: number;
    readonly cells: readonly { readonly row: number; readonly column: number; readonly value: number | string | boolean | null; readonly style: Style }[];
  }[];
}

const HEAD = '<?xml version="1.0" encoding="UTF-8" standalone="yes"?>\n';
const MAIN = "http://schemas.openxmlformats.org/spreadsheetml/2006/main";
const OFFICE = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const PACKAGE = "http://schemas.openxmlformats.org/package/2006";
const SPREADSHEET = "application/vnd.openxmlformats-officedocument.spreadsheetml";

export function createBook<Style extends string>({ title, styles, sheets }: NewBook<Style>): Uint8Array {
  const pack = Package.empty(), names = Object.keys(styles) as Style[];
  const parts = sheets.map((_, i) => `xl/worksheets/sheet${i + 1}.xml`);
  pack.put(TYPES, `${HEAD}<Types xmlns="${PACKAGE}/content-types"><Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/><Default Extension="xml" ContentType="application/xml"/>`
    + `<Override PartName="/xl/workbook.xml" ContentType="${SPREADSHEET}.sheet.main+xml"/><Override PartName="/xl/styles.xml" ContentType="${SPREADSHEET}.styles+xml"/><Override PartName="/docProps/core.xml" ContentType="application/vnd.openxmlformats-package.core-properties+xml"/>`
    + `${parts.map((part) => `<Override PartName="/${part}" ContentType="${SPREADSHEET}.worksheet+xml"/>`).join("")}</Types>`);
  pack.put("_rels/.rels", `${HEAD}<Relationships xmlns="${PACKAGE}/relationships"><Relationship Id="rId1" Type="${OFFICE}/officeDocument" Target="xl/workbook.xml"/><Relationship Id="rId2" Type="${PACKAGE}/relationships/metadata/core-properties" Target="docProps/core.xml"/></Relationships>`);
  pack.put("docProps/core.xml", `${HEAD}<cp:coreProperties xmlns:cp="${PACKAGE}/metadata/core-properties" xmlns:dc="http://purl.org/dc/elements/1.1/"><dc:title>${escapeXml(title)}</dc:title><dc:creator>Tampsheet</dc:creator></cp:coreProperties>`);
  pack.put("xl/workbook.xml", `${HEAD}<workbook xmlns="${MAIN}" xmlns:r="${OFFICE}"><sheets>${sheets.map(({ name }, i) => `<sheet name="${escapeXml(name)}" sheetId="${i + 1}" r:id="rId${i + 1}"/>`).join("")}</sheets></workbook>`);
  pack.put("xl/_rels/workbook.xml.rels", `${HEAD}<Relationships xmlns="${PACKAGE}/relationships">${sheets.map((_, i) => `<Relationship Id="rId${i + 1}" Type="${OFFICE}/worksheet" Target="worksheets/sheet${i + 1}.xml"/>`).join("")}<Relationship Id="rId${sheets.length + 1}" Type="${OFFICE}/styles" Target="styles.xml"/></Relationships>`);
  pack.put("xl/styles.xml", stylesXml(names.map((name) => styles[name])));
  sheets.forEach((sheet, i) => pack.put(parts[i]!, sheetXml(sheet, (style) => names.indexOf(style) + 1)));
  return pack.zip();
}

function sheetXml<Style extends string>({ widths, heights, frozenRows, cells }: NewBook<Style>["sheets"][number], styleIndex: (style: Style) => number): string {
  const rows = new Map<number, string[]>();
  let bottom = 0, right = 0;
  for (const { row, column, value, style } of [...cells].sort((a, b) => a.row - b.row || a.column - b.column)) {
    const line = rows.get(row) ?? [];
    rows.set(row, line);
    line.push(cellXml(cellName(row, column), String(styleIndex(style)), value));
    bottom = Math.max(bottom, row);
    right = Math.max(right, column);
  }
  const height = (row: number): string => heights?.has(row) ? ` ht="${heights.get(row)}" customHeight="1"` : "";
  const pane = frozenRows > 0 ? `<pane ySplit="${frozenRows}" topLeftCell="A${frozenRows + 1}" activePane="bottomLeft" state="frozen"/>` : "";
  return `${HEAD}<worksheet xmlns="${MAIN}" xmlns:r="${OFFICE}"><dimension ref="A1:${columnName(right)}${bottom + 1}"/><sheetViews><sheetView workbookViewId="0">${pane}</sheetView></sheetViews><sheetFormatPr defaultRowHeight="15"/>`
    + `<cols>${widths.map((width, i) => `<col min="${i + 1}" max="${i + 1}" width="${width}" customWidth="1"/>`).join("")}</cols>`
    + `<sheetData>${[...rows].map(([row, line]) => `<row r="${row + 1}"${height(row)}>${line.join("")}</row>`).join("")}</sheetData>`
    + `<pageMargins left="0.7" right="0.7" top="0.75" bottom="0.75" header="0.3" footer="0.3"/></worksheet>`;
}

/** Style 0 is the default every workbook has; ours follow. */
function stylesXml(styles: readonly CellStyle[]): string {
  const colour = (hex: string): string => `FF${hex.slice(1).toUpperCase()}`;
  const font = ({ bold, italic, underline, fontSize = 11, colour: ink = "#1f2629" }: CellStyle): string =>
    `<font>${bold ? "<b/>" : ""}${italic ? "<i/>" : ""}${underline ? "<u/>" : ""}<sz val="${fontSize}"/><color rgb="${colour(ink)}"/><name val="Calibri"/><family val="2"/></font>`;
  const fill = ({ fill: ground }: CellStyle): string => ground ? `<fill><patternFill patternType="solid"><fgColor rgb="${colour(ground)}"/><bgColor indexed="64"/></patternFill></fill>` : '<fill><patternFill patternType="none"/></fill>';
  const line = ({ borders }: CellStyle): string => `<border>${(["left", "right", "top", "bottom"] as const).map((side) => borders?.[side] ? `<${side} style="${borders[side].style}"><color rgb="${colour(borders[side].colour)}"/></${side}>` : `<${side}/>`).join("")}<diagonal/></border>`;
  const alignment = ({ horizontal, vertical, wrap }: CellStyle): string => horizontal || vertical || wrap ? `<alignment${horizontal ? ` horizontal="${horizontal}"` : ""}${vertical ? ` vertical="${vertical}"` : ""}${wrap ? ' wrapText="1"' : ""}/>` : "";
  const FIRST_OWN_FORMAT = 164;
  const xf = (style: CellStyle, i: number): string => `<xf numFmtId="${style.format === "General" ? 0 : FIRST_OWN_FORMAT + i}" fontId="${i + 1}" fillId="${i + 2}" borderId="${i + 1}" xfId="0" applyNumberFormat="1" applyFont="1" applyFill="1" applyBorder="1" applyAlignment="1">${alignment(style)}</xf>`;
  const all = <T>(tag: string, items: readonly T[], write: (item: T, i: number) => string, first: string, firstCount: number): string => `<${tag} count="${items.length + firstCount}">${first}${items.map(write).join("")}</${tag}>`;
  const formats = styles.flatMap((style, i) => style.format === "General" ? [] : [`<numFmt numFmtId="${FIRST_OWN_FORMAT + i}" formatCode="${escapeXml(style.format)}"/>`]);
  return `${HEAD}<styleSheet xmlns="${MAIN}">${formats.length > 0 ? `<numFmts count="${formats.length}">${formats.join("")}</numFmts>` : ""}`
    + all("fonts", styles, font, '<font><sz val="11"/><color theme="1"/><name val="Calibri"/><family val="2"/></font>', 1)
    + all("fills", styles, fill, '<fill><patternFill patternType="none"/></fill><fill><patternFill patternType="gray125"/></fill>', 2)
    + all("borders", styles, line, "<border><left/><right/><top/><bottom/><diagonal/></border>", 1)
    + '<cellStyleXfs count="1"><xf numFmtId="0" fontId="0" fillId="0" borderId="0"/></cellStyleXfs>'
    + all("cellXfs", styles, xf, '<xf numFmtId="0" fontId="0" fillId="0" borderId="0" xfId="0"/>', 1)
    + '<cellStyles count="1"><cellStyle name="Normal" xfId="0" builtinId="0"/></cellStyles><dxfs count="0"/></styleSheet>';
}
