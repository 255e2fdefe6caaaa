import ExcelJS from "exceljs";
import type { Book, BookCell } from "../../../src/workbook/file/book";
import { readBook } from "../../../src/workbook/file/read";
import { parseRange } from "../../../src/workbook/address";
import { handmade } from "./make";

const cellAt = (book: Book, name: string, sheet = 0): BookCell | undefined => {
  const { row, column } = parseRange(name)!;
  return book.sheets[sheet]!.cells.find((cell) => cell.row === row && cell.column === column);
};

describe("a workbook made by another program", () => {
  let book: Book;
  beforeAll(async () => {
    const made = new ExcelJS.Workbook(), sheet = made.addWorksheet("Lab, 1"), other = made.addWorksheet("Hidden");
    other.state = "hidden";
    sheet.getCell("A1").value = { richText: [{ text: "water " }, { text: "content", font: { bold: true } }] };
    sheet.getCell("A2").value = 12.5;
    sheet.getCell("A2").numFmt = "0.0";
    sheet.getCell("A3").value = true;
    sheet.getCell("A4").value = new Date(Date.UTC(2026, 0, 2));
    sheet.getCell("A5").value = { error: "#N/A" } as ExcelJS.CellErrorValue;
    sheet.getCell("A6").value = "  kept \n spaces <&> ";
    sheet.getCell("B2").value = { formula: "A2*2", result: 25 };
    sheet.fillFormula("C2:C4", "$A2+B1", [1, 2, 3]);
    sheet.getCell("D1").style = { font: { bold: true, italic: true, size: 14, color: { argb: "FF8F3F14" } }, fill: { type: "pattern", pattern: "solid", fgColor: { argb: "FFFFEEAA" } }, alignment: { horizontal: "center", vertical: "top", wrapText: true }, border: { top: { style: "thin", color: { argb: "FF112233" } } } };
    sheet.mergeCells("E1:F2");
    sheet.getColumn(2).width = 30;
    sheet.getRow(3).height = 40;
    sheet.getRow(7).hidden = true;
    sheet.getCell("A7").value = 1;
    sheet.getColumn(7).hidden = true;
    sheet.views = [{ state: "frozen", xSplit: 1, ySplit: 2 }];
    sheet.getCell("B5").note = "a note";
    sheet.addTable({ name: "Readings", ref: "H1", columns: [{ name: "w" }, { name: "dry" }], rows: [[10, 1.8], [12, 1.9]] });
    made.definedNames.add("'Lab, 1'!$A$2", "optimum");
    book = readBook(new Uint8Array(await made.xlsx.writeBuffer() as ArrayBuffer));
  });

  test("values of every kind", () => {
    expect(cellAt(book, "A1")!.value).toBe("water content");
    expect(cellAt(book, "A2")).toEqual(expect.objectContaining({ value: 12.5 }));
    expect(cellAt(book, "A3")!.value).toBe(true);
    expect(cellAt(book, "A4")!.value).toBe(46024);
    expect(cellAt(book, "A5")).toEqual(expect.objectContaining({ value: null, error: "#N/A" }));
    expect(cellAt(book, "A6")!.value).toBe("  kept \n spaces <&> ");
  });
  test("formulas, shared ones written out for each cell", () => {
    expect(cellAt(book, "B2")).toEqual(expect.objectContaining({ formula: "A2*2", value: 25 }));
    expect(["C2", "C3", "C4"].map((name) => cellAt(book, name)!.formula)).toEqual(["$A2+B1", "$A3+B2", "$A4+B3"]);
  });
  test("styles", () => {
    expect(book.styles[cellAt(book, "A2")!.style]!.format).toBe("0.0");
    expect(book.styles[cellAt(book, "D1")!.style]).toEqual({ format: "General", bold: true, italic: true, fontSize: 14, colour: "#8f3f14", fill: "#ffeeaa", horizontal: "center", vertical: "top", wrap: true, borders: { top: { style: "thin", colour: "#112233" } } });
  });
  test("layout, notes, tables, names", () => {
    const [sheet, hidden] = book.sheets;
    expect([sheet!.name, hidden!.hidden]).toEqual(["Lab, 1", true]);
    expect(sheet!.merges).toEqual([{ row: 0, column: 4, rows: 2, columns: 2 }]);
    expect([sheet!.widths.get(1), sheet!.heights.get(2), sheet!.hiddenRows, sheet!.hiddenColumns]).toEqual([30, 40, [6], [6]]);
    expect(sheet!.frozen).toEqual({ rows: 2, columns: 1 });
    expect(sheet!.notes).toEqual([{ row: 4, column: 1, text: "a note", ours: false }]);
    expect(book.tables).toEqual([{ name: "Readings", sheet: "Lab, 1", range: { row: 0, column: 7, rows: 3, columns: 2 }, columns: ["w", "dry"] }]);
    expect(book.names).toEqual([{ name: "optimum", refersTo: "'Lab, 1'!$A$2" }]);
  });
});

test("arrays: what they filled is a cache and is not listed; a format there is kept", () => {
  const book = readBook(handmade({ sheet: '<row r="1"><c r="A1" cm="1"><f t="array" ref="A1:B2">_xldudf_TAMP_SOILDRY(D1:E2,12)</f><v>1</v></c><c r="B1"><v>2</v></c></row><row r="2"><c r="A2" s="1"><v>3</v></c><c r="B2"><v>4</v></c><c r="C2"><v>5</v></c></row>' }));
  expect(book.sheets[0]!.cells.map(({ row, column, value, formula }) => [row, column, value, formula])).toEqual([[0, 0, 1, "TAMP.SOILDRY(D1:E2,12)"], [1, 0, null, undefined], [1, 2, 5, undefined]]);
  expect(cellAt(book, "A1")!.fills).toEqual({ rows: 2, columns: 2, dynamic: true });
});

test("prefixed parts, cells without references, stored control signs, theme colours with a tint", () => {
  const book = readBook(handmade({
    sheet: '<worksheet xmlns="x"><sheetData><row><c t="inlineStr"><is><t>a_x000D_b</t></is></c><c><v>2</v></c></row><row><c s="1"><v>3</v></c></row></sheetData></worksheet>'.replace(/<(\/?)(?=\w)/g, "<$1x:").replace("xmlns=", "xmlns:x="),
    styles: '<styleSheet><fonts><font><color theme="1" tint="0.5"/></font></fonts><fills/><borders/><cellXfs><xf/><xf fontId="0"/></cellXfs></styleSheet>',
    more: { "xl/theme/theme1.xml": '<a:theme xmlns:a="a"><a:clrScheme><a:dk1><a:sysClr val="windowText" lastClr="000000"/></a:dk1><a:lt1><a:sysClr val="window" lastClr="FFFFFF"/></a:lt1><a:dk2><a:srgbClr val="44546A"/></a:dk2><a:lt2><a:srgbClr val="E7E6E6"/></a:lt2></a:clrScheme></a:theme>' },
    workbookLinks: '<Relationship Id="rId9" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/theme" Target="theme/theme1.xml"/>',
  }).slice());
  expect(book.sheets[0]!.cells.map(({ row, column, value }) => [row, column, value])).toEqual([[0, 0, "a\rb"], [0, 1, 2], [1, 0, 3]]);
  expect(book.styles[1]!.colour).toBe("#808080");
});

test("the reading of a Japanese text is no part of it", () => {
  const book = readBook(handmade({ sheet: '<row r="1"><c r="A1" t="inlineStr"><is><t>含水比</t><rPh sb="0" eb="3"><t>ガンスイヒ</t></rPh></is></c><c r="B1"><v>12</v></c></row>' }));
  expect(book.sheets[0]!.cells.map(({ value }) => value)).toEqual(["含水比", 12]);
});

test("twenty thousand single-cell arrays among a hundred thousand cells are read in a blink", () => {
  const rows = Array.from({ length: 20_000 }, (_, r) => `<row r="${r + 1}"><c r="A${r + 1}" cm="1"><f t="array" ref="A${r + 1}">B${r + 1}+1</f><v>1</v></c>${["B", "C", "D", "E"].map((c) => `<c r="${c}${r + 1}"><v>${r}</v></c>`).join("")}</row>`).join("");
  expect(readBook(handmade({ sheet: rows })).sheets[0]!.cells).toHaveLength(100_000);
});
