import ExcelJS from "exceljs";
import fc from "fast-check";
import type { BookPatch, CellPatch } from "../../../src/workbook/file/book";
import { createBook } from "../../../src/workbook/file/create";
import { patchBook } from "../../../src/workbook/file/patch";
import { readBook } from "../../../src/workbook/file/read";
import { cellName } from "../../../src/workbook/address";
import { differing, handmade, parts, sheetOf } from "./make";

const SHEET = "xl/worksheets/sheet1.xml";
const patch = (bytes: Uint8Array, cells: CellPatch[], more: Partial<BookPatch["sheets"][number]> = {}): Uint8Array => patchBook(bytes, { sheets: [{ sheet: "Sheet1", cells, ...more }] });
const constant = (row: number, column: number, value: CellPatch["value"]): CellPatch => ({ row, column, kind: "constant", value });

const rows = '<row r="1" spans="1:2" ht="20" customHeight="1"><c r="A1" s="1"><v>1</v></c><c r="C1" t="s"><v>0</v></c></row><row r="3"><c r="A3"><f>A1*2</f><v>2</v></c></row>';
const book = handmade({ sheet: rows, more: { "xl/media/picture.png": "not touched", "xl/charts/chart1.xml": "<chart/>" } });

describe("cells", () => {
  test("nothing to change leaves every part as it was", () => expect(differing(book, patchBook(book, { sheets: [] }))).toEqual([]));

  test("a changed value keeps its style and every other character of the sheet", () => {
    const after = patch(book, [constant(0, 0, 7.5)]);
    expect(sheetOf(after)).toBe(sheetOf(book).replace('<c r="A1" s="1"><v>1</v></c>', '<c r="A1" s="1"><v>7.5</v></c>'));
    expect(differing(book, after)).toEqual([SHEET]);
  });

  test("new cells and rows find their places; texts, booleans and clearing too", () => {
    const after = patch(book, [constant(0, 1, "  kept <&> \n"), constant(1, 3, true), constant(4, 0, -1), constant(2, 0, null)]);
    const cells = readBook(after).sheets[0]!.cells.map(({ row, column, value, formula }) => [cellName(row, column), value, formula]);
    expect(cells).toEqual([["A1", 1, undefined], ["B1", "  kept <&> \n", undefined], ["C1", "", undefined], ["D2", true, undefined], ["A5", -1, undefined]]);
    expect(sheetOf(after)).toContain('<dimension ref="A1:D5"/>');
    expect([...sheetOf(after).matchAll(/<row r="(\d+)"/g)].map((match) => match[1])).toEqual(["1", "2", "3", "5"]);
    expect(sheetOf(after)).toContain('<row r="1" spans="1:2" ht="20" customHeight="1">');
  });

  test("an empty sheet takes cells", () => expect(readBook(patch(handmade({ sheet: "" }), [constant(2, 2, 3)])).sheets[0]!.cells).toEqual([expect.objectContaining({ row: 2, column: 2, value: 3 })]));
  test("a sheet that is not there is refused", () => expect(() => patchBook(book, { sheets: [{ sheet: "No", cells: [] }] })).toThrow(/no sheet "No"/));
  test("only a result changes: the formula stays as it was stored", () => expect(sheetOf(patch(book, [{ row: 2, column: 0, kind: "result", value: 2.5 }]))).toContain('<c r="A3"><f>A1*2</f><v>2.5</v></c>'));
  test("an error as a result", () => expect(sheetOf(patch(book, [{ row: 2, column: 0, kind: "result", value: null, error: "#N/A" }]))).toContain('<c r="A3" t="e"><f>A1*2</f><v>#N/A</v></c>'));
});

describe("formulas", () => {
  test("a plain one is plain; newer functions get the prefix that the format wants", () => {
    const after = patch(book, [{ row: 5, column: 0, kind: "formula", formula: "STDEV.S(A1:A3)", value: 0.5 }]);
    expect(sheetOf(after)).toContain("<f>_xlfn.STDEV.S(A1:A3)</f><v>0.5</v>");
    expect(parts(after)["xl/metadata.xml"]).toBeUndefined();
  });

  test("ours are stored as the office host resolves them, as dynamic arrays, with their metadata", () => {
    const after = patch(book, [{ row: 5, column: 0, kind: "formula", formula: "TAMP.SOILDRY(A1:A3,12)", value: 1.5, fills: { rows: 3, columns: 1, results: [[1.5], [""], [{ error: "#VALUE!" }]] } }]);
    expect(sheetOf(after)).toContain('<c r="A6" cm="1"><f t="array" ref="A6:A8">_xldudf_TAMP_SOILDRY(A1:A3,12)</f><v>1.5</v></c>');
    expect(sheetOf(after)).toContain('<c r="A8" t="e"><v>#VALUE!</v></c>');
    expect(parts(after)["xl/metadata.xml"]).toContain("XLDAPR");
    expect(parts(after)["[Content_Types].xml"]).toContain("/xl/metadata.xml");
    expect(parts(after)["xl/_rels/workbook.xml.rels"]).toContain("sheetMetadata");
    expect(readBook(after).sheets[0]!.cells.find(({ row }) => row === 5)).toEqual(expect.objectContaining({ formula: "TAMP.SOILDRY(A1:A3,12)", value: 1.5, fills: { rows: 3, columns: 1, dynamic: true } }));
    // a second one uses the same record
    expect(sheetOf(patch(after, [{ row: 9, column: 0, kind: "formula", formula: "TAMP.DRYBASIS(10)", value: 11.1 }]))).toContain('<c r="A10" cm="1"><f t="array" ref="A10">_xldudf_TAMP_DRYBASIS(10)</f>');
  });

  test("foreign metadata is kept, and our record is added behind it", () => {
    const foreign = '<metadata xmlns="m"><metadataTypes count="1"><metadataType name="XLRICHVALUE"/></metadataTypes><futureMetadata name="XLRICHVALUE" count="1"><bk/></futureMetadata><valueMetadata count="1"><bk><rc t="1" v="0"/></bk></valueMetadata></metadata>';
    const rich = handmade({ sheet: rows, more: { "xl/metadata.xml": foreign }, workbookLinks: '<Relationship Id="rId7" Type="http://x/relationships/sheetMetadata" Target="metadata.xml"/>' });
    const after = patch(rich, [{ row: 5, column: 0, kind: "formula", formula: "TAMP.DRYBASIS(10)", value: 11.1 }]);
    const metadata = parts(after)["xl/metadata.xml"]!;
    expect(metadata).toContain('<metadataTypes count="2"><metadataType name="XLRICHVALUE"/><metadataType name="XLDAPR"');
    expect(metadata).toContain('<cellMetadata count="1"><bk><rc t="2" v="0"/></bk></cellMetadata><valueMetadata');
    expect(metadata).toContain('<futureMetadata name="XLRICHVALUE" count="1"><bk/></futureMetadata>');
  });

  test("the order of calculation goes when formulas change, and only then", () => {
    const chained = handmade({ sheet: rows, more: { "xl/calcChain.xml": "<calcChain/>" }, types: '<Override PartName="/xl/calcChain.xml" ContentType="c"/>', workbookLinks: '<Relationship Id="rId8" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/calcChain" Target="calcChain.xml"/>' });
    expect(differing(chained, patch(chained, [{ row: 2, column: 0, kind: "result", value: 5 }]))).toEqual([SHEET]);
    const after = parts(patch(chained, [constant(2, 0, 5)]));
    expect(after["xl/calcChain.xml"]).toBeUndefined();
    expect(after["[Content_Types].xml"]! + after["xl/_rels/workbook.xml.rels"]!).not.toContain("calcChain");
  });

  test("a shared formula's first cell is overwritten: its followers are given their own", () => {
    const shared = handmade({ sheet: '<row r="1"><c r="A1"><f t="shared" ref="A1:A3" si="0">B1&amp;"x"</f><v>1</v></c></row><row r="2"><c r="A2"><f t="shared" si="0"/><v>2</v></c></row><row r="3"><c r="A3"><f t="shared" si="0"/><v>3</v></c></row>' });
    const cells = readBook(patch(shared, [constant(0, 0, 9)])).sheets[0]!.cells;
    expect(cells.map(({ value, formula }) => [value, formula])).toEqual([[9, undefined], [2, 'B2&"x"'], [3, 'B3&"x"']]);
  });

  test("a spill that shrinks empties what it no longer fills", () => {
    const first = patch(book, [{ row: 5, column: 0, kind: "formula", formula: "TAMP.SOILDRY(A1:A3,12)", value: 1, fills: { rows: 3, columns: 1, results: [[1], [2], [3]] } }]);
    const after = sheetOf(patch(first, [{ row: 5, column: 0, kind: "result", value: 1, fills: { rows: 2, columns: 1, results: [[1], [2]] } }]));
    expect(after).toContain('ref="A6:A7"');
    expect(after).toContain('<c r="A8"/>');
    const blocked = sheetOf(patch(first, [{ row: 5, column: 0, kind: "result", value: null, error: "#SPILL!" }, constant(6, 0, "mine")]));
    expect(blocked).toContain('<f t="array" ref="A6">');
    expect(blocked).toContain(">mine<");
  });

  test("a cell of an old array formula does not change alone", () => {
    const array = handmade({ sheet: '<row r="1"><c r="A1"><f t="array" ref="A1:A2">B1:B2</f><v>1</v></c></row><row r="2"><c r="A2"><v>2</v></c></row>' });
    expect(() => patch(array, [constant(1, 0, 5)])).toThrow(/A2 is part of the array formula in A1:A2/);
  });
});

describe("marks and notes", () => {
  const user = handmade({
    sheet: `<worksheet xmlns="m" xmlns:r="r"><sheetData>${rows}</sheetData><conditionalFormatting sqref="A1:A9"><cfRule type="expression" dxfId="0" priority="3"><formula>A1&gt;13</formula></cfRule></conditionalFormatting><pageMargins left="1"/><legacyDrawing r:id="rId2"/></worksheet>`,
    styles: '<styleSheet><fonts/><cellXfs><xf/><xf/></cellXfs><dxfs count="1"><dxf><font><b/></font></dxf></dxfs><tableStyles/></styleSheet>',
    sheetLinks: '<Relationship Id="rId1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/comments" Target="../comments1.xml"/><Relationship Id="rId2" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/vmlDrawing" Target="../drawings/vmlDrawing1.vml"/>',
    more: { "xl/comments1.xml": '<comments><authors><author>Someone</author></authors><commentList><comment ref="A1" authorId="0"><text><t>mine</t></text></comment></commentList></comments>', "xl/drawings/vmlDrawing1.vml": '<xml><v:shape id="_x0000_s1025"></v:shape></xml>' },
  });
  const marks = [{ kind: "past-line", ranges: [{ row: 1, column: 0, rows: 2, columns: 1 }, { row: 4, column: 1, rows: 1, columns: 1 }] }, { kind: "ask", ranges: [{ row: 0, column: 0, rows: 1, columns: 1 }] }] as const;
  const notes = [{ row: 1, column: 1, text: "Tampsheet: look <here> & there" }];

  test.each([["a workbook without any", book], ["a workbook with the user's own", user]])("%s: marking, then unmarking, gives every part back", (_, bytes) => {
    const marked = patch(bytes, [], { marks, notes });
    const sheet = readBook(marked).sheets[0]!;
    expect(sheet.marks).toEqual(marks);
    expect(sheet.notes.filter(({ ours }) => ours)).toEqual([{ ...notes[0], ours: true }]);
    const back = patch(marked, [], { marks: [], notes: [] });
    expect(differing(bytes, back)).toEqual([]);
  });

  test("the user's own formats, notes and priorities stay in front", () => {
    const marked = parts(patch(user, [], { marks, notes }));
    expect(marked[SHEET]).toContain('dxfId="0" priority="3"><formula>A1&gt;13</formula>');
    expect([...marked[SHEET]!.matchAll(/priority="(\d+)"/g)].map((match) => match[1])).toEqual(["3", "4", "5"]);
    expect(marked["xl/comments1.xml"]).toContain("<text><t>mine</t></text>");
    expect(marked["xl/comments1.xml"]).toContain("<author>Someone</author><author>Tampsheet</author>");
    expect(marked["xl/styles.xml"]).toContain('<dxfs count="3"><dxf><font><b/></font></dxf><dxf>');
    // a conditional format stands before the page's margins, as the format demands
    expect(marked[SHEET]!.indexOf("Tampsheet:ask")).toBeLessThan(marked[SHEET]!.indexOf("<pageMargins"));
  });

  test("a mark that another program has saved in its own words is known, and goes", () => {
    const foreign = handmade({ sheet: `<worksheet xmlns="m"><sheetData>${rows}</sheetData><conditionalFormatting sqref="A1"><cfRule type="expression" priority="2" aboveAverage="0" dxfId="0"><formula>A1&gt;1</formula></cfRule><cfRule type="expression" priority="1" dxfId="1"><formula>&quot;Tampsheet:past-line&quot;&lt;&gt;&quot;&quot;</formula></cfRule></conditionalFormatting></worksheet>` });
    expect(readBook(foreign).sheets[0]!.marks).toEqual([{ kind: "past-line", ranges: [{ row: 0, column: 0, rows: 1, columns: 1 }] }]);
    const back = sheetOf(patch(foreign, [], { marks: [] }));
    expect(back).not.toContain("Tampsheet");
    expect(back).toContain("<formula>A1&gt;1</formula>");
  });

  test("another program reads marks and notes as conditional formats and notes", async () => {
    const made = createBook({ title: "t", styles: { plain: { format: "0.00" } }, sheets: [{ name: "Sheet1", widths: [10], frozenRows: 1, cells: [{ row: 0, column: 0, value: 1.5, style: "plain" }] }] });
    const workbook = new ExcelJS.Workbook();
    await workbook.xlsx.load(patch(made, [constant(1, 0, "x")], { marks, notes: [{ ...notes[0]!, column: 0 }] }).buffer as ArrayBuffer);
    const sheet = workbook.getWorksheet("Sheet1")!;
    expect(sheet.getCell("A1").numFmt).toBe("0.00");
    expect(sheet.getCell("A2").value).toBe("x");
    expect(JSON.stringify(sheet.getCell("A2").note)).toContain("look <here> & there");
    expect((sheet as unknown as { conditionalFormattings: unknown[] }).conditionalFormattings).toHaveLength(2);
  });
});

describe("settings", () => {
  const remembered = (bytes: Uint8Array, settings: Record<string, string>): Uint8Array => patchBook(bytes, { sheets: [], settings });
  test("a long one travels in pieces of 255 characters, as desktop hosts keep no more, and comes back whole", () => {
    const long = "0123456789".repeat(90), after = remembered(book, { long });
    expect(readBook(after).settings).toEqual({ long });
    const xml = parts(after)["docProps/custom.xml"]!;
    expect([...xml.matchAll(/<vt:lpwstr>([^<]*)<\/vt:lpwstr>/g)].map(([, text]) => text!.length)).toEqual([255, 255, 255, 135]);
    expect(readBook(remembered(after, { long: "short" })).settings).toEqual({ long: "short" });
  });
  test("they travel in the file, and leave nothing behind", () => {
    const after = remembered(book, { gs: "2.70", "columns/Lab A": '{"a":"<&>"}' });
    expect(readBook(after).settings).toEqual({ gs: "2.70", "columns/Lab A": '{"a":"<&>"}' });
    expect(differing(book, remembered(after, {}))).toEqual([]);
  });
  test("properties of the user's own stay", () => {
    const own = '<Properties xmlns="p" xmlns:vt="v"><property fmtid="{x}" pid="5" name="Client"><vt:lpwstr>someone</vt:lpwstr></property></Properties>';
    const file = handmade({ sheet: rows, more: { "docProps/custom.xml": own, "_rels/.rels": '<Relationships><Relationship Id="rId1" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/officeDocument" Target="xl/workbook.xml"/><Relationship Id="rId3" Type="http://schemas.openxmlformats.org/officeDocument/2006/relationships/custom-properties" Target="docProps/custom.xml"/></Relationships>' } });
    const after = remembered(file, { gs: "2.7" });
    expect(parts(after)["docProps/custom.xml"]).toContain('pid="6" name="Tampsheet.gs"');
    expect(differing(file, remembered(after, {}))).toEqual([]);
  });
});

test("whatever is patched, the cells that are not named keep every character (random patches)", () => {
  const cellsOf = (xml: string): Map<string, string> => new Map([...xml.matchAll(/<c r="([A-Z]+\d+)"[^>]*?(?:\/>|>[\s\S]*?<\/c>)/g)].map((match) => [match[1]!, match[0]]));
  const grid = handmade({ sheet: Array.from({ length: 8 }, (_, r) => `<row r="${2 * r + 1}">${Array.from({ length: 5 }, (__, c) => r % 3 === c % 3 ? `<c r="${cellName(2 * r, c)}" s="1"><f>A${r + 1}+1</f><v>${r}</v></c>` : `<c r="${cellName(2 * r, c)}"><v>${c}</v></c>`).join("\n")}</row>`).join("\n") });
  const content = fc.oneof(fc.double({ noNaN: true, noDefaultInfinity: true }), fc.string(), fc.boolean(), fc.constant(null));
  let named = 0;
  fc.assert(fc.property(fc.uniqueArray(fc.tuple(fc.integer({ min: 0, max: 18 }), fc.integer({ min: 0, max: 8 }), content), { maxLength: 12, selector: ([r, c]) => `${r}/${c}` }), (changes) => {
    const after = patch(grid, changes.map(([row, column, value]) => constant(row, column, value)));
    const before = cellsOf(sheetOf(grid)), now = cellsOf(sheetOf(after)), touched = new Set(changes.map(([row, column]) => cellName(row, column)));
    for (const [name, xml] of before) if (!touched.has(name)) expect(now.get(name)).toBe(xml);
    for (const name of now.keys()) expect(before.has(name) || touched.has(name)).toBe(true);
    const read = readBook(after).sheets[0]!.cells;
    for (const [row, column, value] of changes) {
      named++;
      const found = read.find((cell) => cell.row === row && cell.column === column);
      // signs that XML cannot hold, or changes, are the one loss: a carriage return comes back as a line feed
      if (typeof value === "string") expect(String(found?.value ?? "").replace(/\r/g, "\n")).toBe(value.replace(/\r\n?/g, "\n"));
      else expect(found?.value ?? null).toBe(value === 0 ? 0 : value);
    }
    const numbers = [...sheetOf(after).matchAll(/<row r="(\d+)"/g)].map((match) => Number(match[1]));
    expect(numbers).toEqual([...numbers].sort((a, b) => a - b));
  }), { numRuns: 300, seed: 17 });
  expect(named).toBeGreaterThan(800);
});
