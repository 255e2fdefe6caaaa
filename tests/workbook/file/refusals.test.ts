import { strToU8, zipSync } from "fflate";
import { BookRefusal } from "../../../src/workbook/file/book";
import { LIMITS } from "../../../src/workbook/file/limits";
import { readBook } from "../../../src/workbook/file/read";
import { handmade } from "./make";

const why = (bytes: Uint8Array, limits = LIMITS): string => {
  try {
    readBook(bytes, limits);
  } catch (error) {
    if (!(error instanceof BookRefusal)) throw error;
    expect(error.says.length).toBeGreaterThan(15);
    return error.why;
  }
  return "read";
};
const row = '<row r="1"><c r="A1"><v>1</v></c></row>';
const utf16 = (text: string): number[] => [...text].flatMap((letter) => [letter.charCodeAt(0), 0]);

test("a plain workbook is read", () => expect(why(handmade({ sheet: row }))).toBe("read"));

test.each([
  ["nothing", new Uint8Array(0), "not-xlsx"],
  ["a text", strToU8("w,dry\n12,1.8"), "not-xlsx"],
  ["another zip", zipSync({ "a.txt": strToU8("a") }), "not-xlsx"],
  ["a zip cut short", handmade({ sheet: row }).slice(0, 300), "damaged"],
  ["the old binary format", new Uint8Array([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, ...utf16("Workbook")]), "old-format"],
  ["a password", new Uint8Array([0xd0, 0xcf, 0x11, 0xe0, 0xa1, 0xb1, 0x1a, 0xe1, ...utf16("EncryptedPackage")]), "encrypted"],
  ["macros", handmade({ sheet: row, more: { "xl/vbaProject.bin": "x" } }), "macros"],
  ["XML that breaks off", handmade({ sheet: "<worksheet><sheetData><row>" }), "damaged"],
  ["a sheet part that is missing", handmade({ sheet: row, workbook: '<workbook xmlns:r="r"><sheets><sheet name="S" r:id="rId1"/></sheets></workbook>', more: { "xl/_rels/workbook.xml.rels": '<Relationships><Relationship Id="rId1" Type="x/worksheet" Target="worksheets/none.xml"/></Relationships>' } }), "damaged"],
  ["no worksheet", handmade({ sheet: row, workbook: "<workbook><sheets/></workbook>" }), "not-xlsx"],
  ["a document type with entities", handmade({ sheet: '<!DOCTYPE x [<!ENTITY a "aaaa">]><worksheet><sheetData/></worksheet>'.replace("<!DOCTYPE", "<worksheet/><!DOCTYPE") }), "damaged"],
  ["entities from nowhere", handmade({ sheet: "<worksheet><sheetData><row><c><v>&boom;</v></c></row></sheetData></worksheet>" }), "damaged"],
  ["rows that no sheet has", handmade({ sheet: '<row r="99999999"><c r="A1"/></row>' }), "damaged"],
  ["columns that no sheet has", handmade({ sheet: '<row r="1"><c r="ZZZ1"><v>1</v></c></row>' }), "damaged"],
  ["nesting without end", handmade({ sheet: `<worksheet>${"<a>".repeat(500)}${"</a>".repeat(500)}</worksheet>` }), "damaged"],
] as [string, Uint8Array, string][])("%s is refused with the reason", (_, bytes, reason) => expect(why(bytes)).toBe(reason));

test("a bomb is refused by the size it says it has, before it is unpacked", () => {
  const bomb = handmade({ sheet: row, more: { "xl/media/zeros.bin": "0".repeat(3_000_000) } });
  expect(bomb.length).toBeLessThan(20_000);
  expect(why(bomb, { ...LIMITS, unzippedBytes: 1_000_000 })).toBe("too-large");
});

test("too many cells, too many parts, too many bytes are refused", () => {
  expect(why(handmade({ sheet: Array.from({ length: 50 }, (_, i) => `<row r="${i + 1}"><c r="A${i + 1}"/></row>`).join("") }), { ...LIMITS, cells: 40 })).toBe("too-large");
  expect(why(handmade({ sheet: row }), { ...LIMITS, parts: 3 })).toBe("too-large");
  expect(why(handmade({ sheet: row }), { ...LIMITS, fileBytes: 100 })).toBe("too-large");
});

test("names that mean something to the language mean nothing here", () => {
  const book = readBook(handmade({ sheet: '<row r="1"><c r="A1" t="inlineStr"><is><t>__proto__</t></is></c></row>', workbook: '<workbook xmlns:r="r"><sheets><sheet name="__proto__" r:id="rId1"/></sheets><definedNames><definedName name="constructor">Sheet1!$A$1</definedName></definedNames></workbook>', more: { "__proto__/x.xml": "<a/>" } }));
  expect(book.sheets[0]!.name).toBe("__proto__");
  expect(({} as Record<string, unknown>).x).toBeUndefined();
});
